//! The plan that everything else refers to: walls, returns and panels with their marks.

use kurbo::{Point, Vec2};

use super::board::{Board, Words};
use super::dimension::{self, mm};
use super::drawing::{Drawing, Role};
use super::note::{Note, Spot};
use super::pen::Pen;
use super::plan::{self, Fate, PlanWall, paper, wall_note};
use super::scale::{Frame, Scale, fit};
use super::text::Text;
use super::view::list;

/// What the key plan shows. Places in mm, x to the right, y up the sheet.
#[derive(Clone, Debug)]
pub struct KeyPlan {
    /// Identifier of the drawing: `key-plan`, `ground-floor`.
    pub name: String,
    /// Which floor: `ground floor`.
    pub title: String,
    /// Walls; a return is a wall too.
    pub walls: Vec<PlanWall>,
    /// Marks of returns.
    pub marks: Vec<PlanMark>,
    /// Panels: a line with ticks beside the wall shows from where to where each runs.
    pub panels: Vec<PlanMark>,
    /// Beams and padstones, as centre lines with their mark.
    pub beams: Vec<PlanMark>,
    /// Floors with the way they span; may be empty.
    pub spans: Vec<PlanSpan>,
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

/// A floor on the plan: an arrow with two heads shows the way it spans.
#[derive(Clone, Debug)]
pub struct PlanSpan {
    /// `F1`.
    pub mark: String,
    /// Least x and y, mm.
    pub from: (f64, f64),
    /// Greatest x and y, mm.
    pub to: (f64, f64),
    /// Spans along x; along y otherwise.
    pub along_x: bool,
}

/// A wind arrow at an edge of the plan.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum PlanWind {
    /// Blows to the right, from the left edge.
    Rightwards,
    /// Blows to the left.
    Leftwards,
    /// Blows up the sheet.
    Upwards,
    /// Blows down the sheet.
    Downwards,
}

impl PlanWind {
    fn along(self) -> Vec2 {
        match self {
            PlanWind::Rightwards => Vec2::new(1.0, 0.0),
            PlanWind::Leftwards => Vec2::new(-1.0, 0.0),
            PlanWind::Upwards => Vec2::new(0.0, -1.0),
            PlanWind::Downwards => Vec2::new(0.0, 1.0),
        }
    }

    fn words(self) -> &'static str {
        match self {
            PlanWind::Rightwards => "from the left",
            PlanWind::Leftwards => "from the right",
            PlanWind::Upwards => "from below",
            PlanWind::Downwards => "from above",
        }
    }
}

/// Draws the key plan.
pub fn key_plan(view: &KeyPlan, frame: Frame) -> Drawing {
    fit(frame, 50.0, |scale| draw(view, scale))
}

fn draw(view: &KeyPlan, scale: Scale) -> Drawing {
    let mut board = Board::default();
    plan::walls(&mut board, &view.walls, scale);
    for beam in &view.beams {
        let (from, to) = (paper(scale, beam.from), paper(scale, beam.to));
        board.line(Pen::Axis, from, to);
        board.note(stretch_note(from, to, 1.2, Text::mark(&beam.mark)));
    }
    for span in &view.spans {
        spans(&mut board, span, scale);
    }
    for mark in &view.marks {
        let (from, to) = (paper(scale, mark.from), paper(scale, mark.to));
        let half = view.walls.iter().map(|wall| wall.thickness / 2.0).fold(0.0, f64::max);
        board.note(stretch_note(from, to, scale.paper(half) + 1.2, Text::mark(&mark.mark)).rank(1));
    }
    for panel in &view.panels {
        stretch(&mut board, view, panel, scale);
    }
    let marked = |name: &str| view.marks.iter().any(|mark| mark.mark == name);
    let told = |w: &PlanWall| view.walls.len() <= NAMED || w.fate != Fate::Stays;
    for wall in view.walls.iter().filter(|w| !w.name.is_empty() && !marked(&w.name) && told(w)) {
        let word = match wall.fate {
            Fate::Stays => "",
            Fate::Removed => " removed",
            Fate::Added => " new",
        };
        let text = Text::plain(&format!("{}{word}", wall.name));
        board.note(wall_note(wall, scale, Note::new(Role::Note, Point::ZERO, text)));
    }
    surroundings(&mut board, &view.walls, &view.winds, Some(view.north), scale, true);
    board.finish(Words {
        name: view.name.clone(),
        caption: format!("Key plan, {}{}", view.title, key(view)),
        scale: scale.text(),
        alt: alt(view),
    })
}

/// The arrow of a floor, clear of the walls it spans between, off the middle where marks stand.
fn spans(board: &mut Board, span: &PlanSpan, scale: Scale) {
    let (a, z) = (paper(scale, span.from), paper(scale, span.to));
    let area = kurbo::Rect::from_points(a, z);
    let (from, to) = match span.along_x {
        true => {
            let y = area.y0 + 0.62 * area.height();
            (Point::new(area.x0 + 0.12 * area.width(), y), Point::new(area.x0 + 0.42 * area.width(), y))
        }
        false => {
            let x = area.x0 + 0.24 * area.width();
            (Point::new(x, area.y0 + 0.25 * area.height()), Point::new(x, area.y0 + 0.75 * area.height()))
        }
    };
    board.line(Pen::Leader, from, to);
    let along = (to - from).normalize() * 1.6;
    for (tip, back) in [(from, along), (to, -along)] {
        for turn in [0.4, -0.4] {
            let (s, c) = f64::sin_cos(turn);
            board.line(Pen::Leader, tip, tip + Vec2::new(back.x * c - back.y * s, back.x * s + back.y * c));
        }
    }
    board.note(stretch_note(from, to, 1.0, Text::mark(&span.mark)).rank(2));
}

/// More walls than these are not all named: nobody could read it.
const NAMED: usize = 60;

/// Distance of a panel's line from the thickest wall's face, mm on paper.
const STRETCH: f64 = 2.2;

/// The line that shows how far a panel runs, on the side away from the middle of the plan.
fn stretch(board: &mut Board, view: &KeyPlan, panel: &PlanMark, scale: Scale) {
    let (from, to) = (paper(scale, panel.from), paper(scale, panel.to));
    let along = (to - from).normalize();
    let side = along.turn_90();
    let centre = plan::extent(&view.walls, scale).center();
    let out = if (from.midpoint(to) - centre).dot(side) < 0.0 { -side } else { side };
    let half = view.walls.iter().map(|wall| wall.thickness / 2.0).fold(0.0, f64::max);
    let shift = out * (scale.paper(half) + STRETCH);
    board.line(Pen::Leader, from + shift, to + shift);
    for end in [from, to] {
        board.line(Pen::Leader, end + shift - out, end + shift + out);
    }
    let mut note = Note::new(Role::Mark, from.midpoint(to) + shift, Text::mark(&panel.mark));
    for share in [0.5, 0.4, 0.6, 0.3, 0.7] {
        for sign in [1.0, -1.0] {
            let at = from.lerp(to, share) + shift + out * sign;
            note = note.spot(Spot::new(at, (out.x * sign).round(), (out.y * sign).round()));
        }
    }
    board.note(note.rank(1));
}

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

/// Overall dimensions, wind arrows and north point around a plan.
pub(super) fn surroundings(
    board: &mut Board,
    walls: &[PlanWall],
    winds: &[PlanWind],
    north: Option<f64>,
    scale: Scale,
    dimensions: bool,
) {
    let extent = plan::extent(walls, scale);
    if dimensions {
        let (w, h) = (extent.width() * scale.0, extent.height() * scale.0);
        dimension::across(board, (extent.x0, extent.x1), extent.y1 + 11.0, extent.y1, mm(w));
        dimension::up(board, (extent.y1, extent.y0), extent.x0 - 11.0, extent.x0, mm(h));
    }
    let (left, below) = if dimensions { (19.0, 18.0) } else { (5.0, 5.0) };
    let c = extent.center();
    for wind in winds {
        let tip = match wind {
            PlanWind::Rightwards => Point::new(extent.x0 - left, c.y),
            PlanWind::Leftwards => Point::new(extent.x1 + 9.0, c.y),
            PlanWind::Upwards => Point::new(c.x, extent.y1 + below),
            PlanWind::Downwards => Point::new(c.x, extent.y0 - 8.0),
        };
        plan::wind(board, tip, wind.along(), "wind");
    }
    if let Some(north) = north {
        plan::north(board, Point::new(extent.x1 + 14.0, extent.y0 + 3.0), north);
    }
}

fn key(view: &KeyPlan) -> String {
    let has = |fate| view.walls.iter().any(|wall| wall.fate == fate);
    let mut key = String::new();
    if has(Fate::Removed) {
        key += "; dashed: removed";
    }
    if has(Fate::Added) {
        key += "; crossed hatching: new";
    }
    if view.walls.len() > NAMED {
        key += "; walls that stay are not named";
    }
    if !view.beams.is_empty() {
        key += "; chain line: beam over";
    }
    if !view.spans.is_empty() {
        key += "; arrows with two heads: the way floors over it span";
    }
    key
}

fn alt(view: &KeyPlan) -> String {
    let extent = plan::extent(&view.walls, Scale(1.0));
    let mut alt = format!(
        "Key plan of the {}, {} mm by {} mm overall. ",
        view.title,
        mm(extent.width()),
        mm(extent.height())
    );
    for (fate, word) in [(Fate::Stays, "stay"), (Fate::Removed, "removed"), (Fate::Added, "new")] {
        let walls: Vec<String> = view
            .walls
            .iter()
            .filter(|wall| wall.fate == fate && !wall.name.is_empty())
            .map(|wall| {
                format!("{} ({} mm thick, {} mm long)", wall.name, mm(wall.thickness), mm(wall.length()))
            })
            .collect();
        if !walls.is_empty() {
            alt += &format!("Walls, {word}: {}. ", list(&walls));
        }
    }
    let marks: Vec<String> =
        view.marks.iter().chain(&view.panels).chain(&view.beams).map(|mark| mark.mark.clone()).collect();
    for span in &view.spans {
        alt += &format!("Floor {} spans along {}. ", span.mark, if span.along_x { "x" } else { "y" });
    }
    if !marks.is_empty() {
        alt += &format!("Marked: {}. ", list(&marks));
    }
    let winds: Vec<String> = view.winds.iter().map(|wind| wind.words().to_owned()).collect();
    if !winds.is_empty() {
        alt += &format!("Wind arrows {}. ", list(&winds));
    }
    alt += &format!("North is {} degrees clockwise from the top of the sheet.", mm(view.north));
    alt
}
