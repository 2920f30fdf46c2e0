//! Which walls take the wind, and how much of it, before and after.

use kurbo::Point;

use super::board::{Board, Words};
use super::drawing::{Drawing, Role};
use super::key_plan::{PlanWind, surroundings};
use super::note::Note;
use super::plan::{self, Fate, PlanWall, wall_note};
use super::scale::{Frame, Scale, fit};
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

/// Draws the stability plan.
pub fn stability_plan(view: &StabilityPlan, frame: Frame) -> Drawing {
    fit(frame, 50.0, |scale| draw(view, scale))
}

fn draw(view: &StabilityPlan, scale: Scale) -> Drawing {
    let mut board = Board::default();
    plan::walls(&mut board, &view.walls, scale);
    for (wall, share) in bracing(view) {
        let mut note = Note::new(Role::Load, Point::ZERO, Text::mark(&wall.name));
        for line in lines(share, wall.fate) {
            note = note.words(&line);
        }
        board.note(wall_note(wall, scale, note));
    }
    surroundings(&mut board, &view.walls, &[view.wind], None, scale, false);
    let has = |fate| view.walls.iter().any(|wall| wall.fate == fate);
    let dashed = if has(Fate::Removed) { "; dashed: removed" } else { "" };
    let crossed = if has(Fate::Added) { "; crossed hatching: new" } else { "" };
    board.finish(Words {
        name: view.name.clone(),
        caption: format!("Shares of the storey's wind, {}, before and after{dashed}{crossed}", view.title),
        scale: scale.text(),
        alt: alt(view),
    })
}

/// The shares with their walls.
fn bracing(view: &StabilityPlan) -> impl Iterator<Item = (&PlanWall, &Share)> {
    view.shares.iter().filter_map(|share| Some((view.walls.get(share.wall)?, share)))
}

/// `before 24 %` and `after 31 %`; empty where there is nothing to say.
fn lines(share: &Share, fate: Fate) -> [String; 2] {
    let line = |word, value: &Option<String>, none: (Fate, &str)| match value {
        Some(value) => format!("{word} {value}"),
        None if fate == none.0 => none.1.to_owned(),
        None => String::new(),
    };
    [
        line("before", &share.before, (Fate::Added, "new")),
        line("after", &share.after, (Fate::Removed, "removed")),
    ]
}

fn alt(view: &StabilityPlan) -> String {
    let mut alt = format!("Plan of the {} with each bracing wall's share of the storey's wind. ", view.title);
    for (wall, share) in bracing(view) {
        alt += &match (&share.before, &share.after) {
            (Some(before), Some(after)) => {
                format!("{} takes {before} before and {after} after the removal. ", wall.name)
            }
            (Some(before), None) => format!("{} takes {before} before the removal. ", wall.name),
            (None, Some(after)) => format!("{} takes {after} after the removal. ", wall.name),
            (None, None) => format!("{} takes nothing. ", wall.name),
        };
    }
    alt.trim_end().to_owned()
}
