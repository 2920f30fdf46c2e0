//! Which walls take the wind, and how much of it, before and after.

use kurbo::Point;

use super::around::{Around, PlanWind, surroundings};
use super::board::{Board, Words};
use super::drawing::{Drawing, Role};
use super::note::Note;
use super::plan::{self, Fate, PlanWall, When, wall_note};
use super::scale::{Frame, Scale, fit_pair};
use super::text::Text;

/// What the stability plan shows, for one direction of wind.
#[derive(Clone, Debug)]
pub struct StabilityPlan {
    /// Identifier of the drawing: `stability-x`.
    pub name: String,
    /// Which floor.
    pub title: String,
    /// All walls of the plan.
    pub walls: Vec<PlanWall>,
    /// Shares of the bracing walls, each with its wall's index in `walls`.
    pub shares: Vec<Share>,
    /// Direction of the wind.
    pub wind: PlanWind,
}

/// What a bracing wall takes of the storey's wind, as printed (`38 %`).
#[derive(Clone, Debug)]
pub struct Share {
    /// Index of the wall in [`StabilityPlan::walls`].
    pub wall: usize,
    /// Share before the removal; none for a new wall.
    pub before: Option<String>,
    /// Share after the removal; none for a removed wall.
    pub after: Option<String>,
}

/// Draws the plan before and after at one scale, each with its shares: in `row` beside each other, or each within
/// `alone` one above the other, whichever is larger.
pub fn stability_plans(view: &StabilityPlan, row: Frame, alone: Frame) -> [Drawing; 2] {
    fit_pair((row, alone), plan::size(&view.walls), 50.0, |scale| {
        [When::Before, When::After].map(|when| draw(view, when, scale))
    })
}

fn draw(view: &StabilityPlan, when: When, scale: Scale) -> Drawing {
    let mut board = Board::default();
    plan::walls(&mut board, &view.walls, scale, when);
    for (wall, share) in bracing(view) {
        let note = Note::new(Role::Load, Point::ZERO, Text::mark(&wall.name));
        if let Some(words) = words(share, wall.fate, when) {
            board.note(wall_note(wall, scale, note.words(&words)));
        }
    }
    let around = Around { winds: &[view.wind], north: None, dimensions: false, clear: 0.0 };
    surroundings(&mut board, &view.walls, &around, scale);
    let has = |fate| view.walls.iter().any(|wall| wall.fate == fate);
    let after = when == When::After;
    let gone = match (has(Fate::Removed), after) {
        (true, true) => "; dashed: removed",
        (true, false) => "; thin lines across a wall: where it is cut",
        (false, _) => "",
    };
    let crossed = if has(Fate::Added) && after { "; crossed hatching: new" } else { "" };
    board.finish(Words {
        name: format!("{}-{}", view.name, when.word()),
        caption: format!(
            "Shares of the storey's wind, {}, {} the removal{gone}{crossed}",
            view.title,
            when.word()
        ),
        scale: scale.text(),
        alt: alt(view, when),
    })
}

/// The shares with their walls.
fn bracing(view: &StabilityPlan) -> impl Iterator<Item = (&PlanWall, &Share)> {
    view.shares.iter().filter_map(|share| Some((view.walls.get(share.wall)?, share)))
}

/// What a wall takes on this plan: `24 %`; nothing where it is not there, `removed` where it stood.
fn words(share: &Share, fate: Fate, when: When) -> Option<String> {
    let value = if when == When::Before { &share.before } else { &share.after };
    let removed = when == When::After && fate == Fate::Removed;
    value.clone().or_else(|| removed.then(|| "removed".to_owned()))
}

fn alt(view: &StabilityPlan, when: When) -> String {
    let time = when.word();
    let mut alt = format!(
        "Plan of the {} {time} the removal, with each bracing wall's share of the storey's wind. ",
        view.title
    );
    for (wall, share) in bracing(view) {
        if let Some(words) = words(share, wall.fate, when) {
            let takes = if words == "removed" { "is" } else { "takes" };
            alt += &format!("{} {takes} {words}. ", wall.name);
        }
    }
    alt.trim_end().to_owned()
}
