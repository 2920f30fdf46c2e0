//! The plan that everything else refers to, before and after: walls, returns and panels with their marks.

use kurbo::{Point, Rect, Vec2};

use super::around::{Around, PlanWind, surroundings};
use super::board::{Board, Words};
use super::dimension::mm;
use super::drawing::{Drawing, Role};
use super::note::{Note, Spot};
use super::panel_lines::{ROW, rows, stretch};
use super::pen::Pen;
use super::plan::{self, Fate, PlanWall, When, paper, wall_note};
use super::scale::{Frame, Scale, fit, fit_pair};
use super::text::Text;
use super::text::list;

/// What the key plan shows. Places in mm, x to the right, y up the sheet.
#[derive(Clone, Debug)]
pub struct KeyPlan {
    /// Identifier of the drawing: `key-plan-before`.
    pub name: String,
    /// Which floor: `ground floor`.
    pub title: String,
    /// Before the removal or after it.
    pub when: When,
    /// Walls, those that go and come as well; a return is a wall too.
    pub walls: Vec<PlanWall>,
    /// Marks of returns.
    pub marks: Vec<PlanMark>,
    /// Panels: a line with ticks beside the wall shows from where to where each runs.
    pub panels: Vec<PlanMark>,
    /// Beams and padstones, as centre lines with their mark.
    pub beams: Vec<PlanMark>,
    /// Floors, one line from support to support for each span.
    pub spans: Vec<PlanMark>,
    /// Where north is, degrees clockwise from the top of the sheet.
    pub north: f64,
    /// Wind directions considered.
    pub winds: Vec<PlanWind>,
}

/// A mark on the plan and the stretch of wall it stands for.
#[derive(Clone, Debug)]
pub struct PlanMark {
    /// `R1`, `P2`, `B1`.
    pub mark: String,
    /// Start of the stretch, mm.
    pub from: (f64, f64),
    /// End of the stretch, mm.
    pub to: (f64, f64),
}

/// Draws the key plan before and after at one scale: in `row` beside each other, or each within `alone` one
/// above the other, whichever is larger.
pub fn key_plans(views: &[KeyPlan; 2], row: Frame, alone: Frame) -> [Drawing; 2] {
    let out = |view: &KeyPlan| rows(&view.panels).into_iter().max().unwrap_or(0);
    let clear = ROW * out(&views[0]).max(out(&views[1])) as f64;
    fit_pair((row, alone), plan::size(&views[0].walls), 50.0, |scale| {
        views.each_ref().map(|view| draw(view, Some(clear), scale))
    })
}

/// Draws one plan alone, without room for what stands beside another.
pub fn key_plan(view: &KeyPlan, frame: Frame) -> Drawing {
    fit(frame, 20.0, |scale| draw(view, None, scale))
}

/// One plan; of a pair what stands around it stands `pair` mm farther out than usual.
fn draw(view: &KeyPlan, pair: Option<f64>, scale: Scale) -> Drawing {
    let clear = pair.unwrap_or(0.0);
    let mut board = Board::default();
    plan::walls(&mut board, &view.walls, scale, view.when);
    let half = scale.paper(view.walls.iter().map(|wall| wall.thickness / 2.0).fold(0.0, f64::max));
    for beam in &view.beams {
        let (from, to) = (paper(scale, beam.from), paper(scale, beam.to));
        board.line(Pen::Axis, from, to);
        board.note(stretch_note(from, to, 1.2, Text::mark(&beam.mark)));
    }
    for span in &view.spans {
        arrow(&mut board, span, half, scale);
    }
    for mark in &view.marks {
        let (from, to) = (paper(scale, mark.from), paper(scale, mark.to));
        board.note(stretch_note(from, to, half + 1.2, Text::mark(&mark.mark)).rank(1));
    }
    for (panel, row) in view.panels.iter().zip(rows(&view.panels)) {
        stretch(&mut board, view, panel, row, scale);
    }
    let marked = |name: &str| view.marks.iter().any(|mark| mark.mark == name);
    let all_named = all_named(view, scale);
    let told = |w: &PlanWall| all_named || w.fate != Fate::Stays;
    let there = |w: &PlanWall| view.when == When::After || view.when.shows(w.fate);
    for wall in view.walls.iter().filter(|w| !w.name.is_empty() && !marked(&w.name) && told(w) && there(w)) {
        let text = Text::plain(&format!("{}{}", wall.name, word(wall.fate, view.when)));
        board.note(wall_note(wall, scale, Note::new(Role::Note, Point::ZERO, text)));
    }
    let (before, after) = (view.when == When::Before, view.when == When::After);
    let around = Around {
        winds: if after { &view.winds } else { &[] },
        north: before.then_some(view.north),
        dimensions: before,
        clear,
    };
    surroundings(&mut board, &view.walls, &around, scale);
    // The north point stands over the one plan, wind over the other: both take as much.
    if pair.is_some() {
        let extent = plan::extent(&view.walls, scale);
        board.keep(Rect { y0: extent.y0 - HEAD - clear, ..extent });
    }
    board.finish(Words {
        name: view.name.clone(),
        caption: format!(
            "Key plan, {}, {} the removal{}",
            view.title,
            view.when.word(),
            key(view, all_named)
        ),
        scale: scale.text(),
        alt: alt(view),
    })
}

/// What is said behind the name of a wall.
fn word(fate: Fate, when: When) -> &'static str {
    match (fate, when) {
        (Fate::Stays, _) => "",
        (Fate::Removed, When::Before) => " comes out",
        (Fate::Removed, When::After) => " removed",
        (Fate::Added, _) => " new",
    }
}

/// The arrow of one span of a floor, from face to face of the walls that it bears on.
fn arrow(board: &mut Board, span: &PlanMark, half: f64, scale: Scale) {
    let (a, z) = (paper(scale, span.from), paper(scale, span.to));
    let along = (z - a).normalize();
    let clear = along * (half + 1.0).min((z - a).hypot() / 4.0);
    let (from, to) = (a + clear, z - clear);
    board.line(Pen::Leader, from, to);
    for (tip, back) in [(from, along * 1.6), (to, along * -1.6)] {
        for turn in [0.4, -0.4] {
            let (s, c) = f64::sin_cos(turn);
            board.line(Pen::Leader, tip, tip + Vec2::new(back.x * c - back.y * s, back.x * s + back.y * c));
        }
    }
    board.note(stretch_note(from, to, 1.0, Text::mark(&span.mark)).rank(2));
}

/// More walls than these are not all named: nobody could read it.
const NAMED: usize = 60;

/// Paper that a name needs, mm²: it is about 15 mm by 3 mm, with some room around it.
const ROOM: f64 = 60.0;

/// Whether every wall can be named so that somebody reads it.
fn all_named(view: &KeyPlan, scale: Scale) -> bool {
    let paper = plan::extent(&view.walls, scale).area();
    view.walls.len() <= NAMED && ROOM * view.walls.len() as f64 <= paper
}

/// Paper over a plan for the north point, mm.
const HEAD: f64 = 18.5;

/// A mark beside a stretch of wall.
fn stretch_note(from: Point, to: Point, off: f64, text: Text) -> Note {
    let middle = from.midpoint(to);
    let upright = (to - from).x.abs() < (to - from).y.abs();
    let mut note = Note::new(Role::Mark, middle, text);
    for share in [0.5, 0.3, 0.7] {
        let at = from.lerp(to, share);
        for sign in [1.0, -1.0] {
            note = note.spot(match upright {
                true => Spot::new((at.x + sign * off, at.y), sign, 0.0),
                false => Spot::new((at.x, at.y + sign * off), 0.0, sign),
            });
        }
    }
    note
}

fn key(view: &KeyPlan, all_named: bool) -> String {
    let has = |fate| view.walls.iter().any(|wall| wall.fate == fate);
    let mut key = String::new();
    let before = view.when == When::Before;
    if has(Fate::Removed) {
        key += if before { "; thin lines across a wall: where it is cut" } else { "; dashed: removed" };
    }
    let mut gaps = view.walls.iter().filter(|w| view.when.shows(w.fate)).flat_map(|w| &w.openings);
    if gaps.any(|gap| gap.window) {
        key += "; thin lines along a gap: window";
    }
    if has(Fate::Added) && !before {
        key += "; crossed hatching: new";
    }
    if !all_named {
        key += "; walls that stay are not named";
    }
    if !view.beams.is_empty() {
        key += "; chain line: beam over";
    }
    if !view.spans.is_empty() {
        key += "; arrows with two heads: floors over it, from support to support";
    }
    key
}

fn alt(view: &KeyPlan) -> String {
    let extent = plan::extent(&view.walls, Scale(1.0));
    let mut alt = format!(
        "Key plan of the {} {} the removal, {} mm by {} mm overall. ",
        view.title,
        view.when.word(),
        mm(extent.width()),
        mm(extent.height())
    );
    let before = view.when == When::Before;
    let gone = if before { "to come out" } else { "removed" };
    for (fate, word) in [(Fate::Stays, "stay"), (Fate::Removed, gone), (Fate::Added, "new")] {
        if before && !view.when.shows(fate) {
            continue;
        }
        let walls: Vec<String> = view
            .walls
            .iter()
            .filter(|wall| wall.fate == fate && !wall.name.is_empty())
            .map(|wall| {
                let openings = match wall.openings.len() {
                    0 => String::new(),
                    1 => ", 1 opening".to_owned(),
                    n => format!(", {n} openings"),
                };
                format!(
                    "{} ({} mm thick, {} mm long{openings})",
                    wall.name,
                    mm(wall.thickness),
                    mm(wall.length())
                )
            })
            .collect();
        if !walls.is_empty() {
            alt += &format!("Walls, {word}: {}. ", list(&walls));
        }
    }
    let marks: Vec<String> =
        view.marks.iter().chain(&view.panels).chain(&view.beams).map(|mark| mark.mark.clone()).collect();
    for span in &view.spans {
        let along = if span.from.1 == span.to.1 { "x" } else { "y" };
        let length = (span.to.0 - span.from.0).hypot(span.to.1 - span.from.1);
        alt += &format!("Floor {} spans {} mm along {along}. ", span.mark, mm(length));
    }
    if !marks.is_empty() {
        alt += &format!("Marked: {}. ", list(&marks));
    }
    let after = view.when == When::After;
    let winds: Vec<String> =
        view.winds.iter().filter(|_| after).map(|wind| wind.words().to_owned()).collect();
    if !winds.is_empty() {
        alt += &format!("Wind arrows {}. ", list(&winds));
    }
    if before {
        alt += &format!("North is {} degrees clockwise from the top of the sheet.", mm(view.north));
    }
    alt.trim_end().to_owned()
}
