//! A wall panel looked at on its face, with the support of each edge, before and after.
//!
//! Edges after the key of EN 1996-1-1 Annex E (from memory, check against the standard): free edge
//! a thin line, simply supported edge single hatching, continuous edge crossed hatching. The
//! caption says so in words.

use kurbo::{Point, Rect, Vec2};

use super::board::{Board, Words, corners, polygon};
use super::dimension::{self, mm};
use super::drawing::{Drawing, Role};
use super::hatch::diagonals;
use super::note::{Note, Spot};
use super::pen::{Ink, Pen};
use super::scale::{Frame, Scale, fit, fit_row};
use super::text::Text;
use super::view::{Action, Ruler, Side, list};

/// What the elevation of a panel shows.
#[derive(Clone, Debug)]
pub struct PanelElevation {
    /// Mark of the panel.
    pub mark: String,
    /// `before` or `after`, or empty where there is one state only.
    pub state: String,
    /// Length between the supports, mm.
    pub length: f64,
    /// Height between the supports, mm.
    pub height: f64,
    /// Left edge.
    pub left: Edge,
    /// Right edge.
    pub right: Edge,
    /// Top edge.
    pub top: Edge,
    /// Base.
    pub base: Edge,
    /// Openings.
    pub openings: Vec<Opening>,
    /// Walls that meet the panel from behind: returns, and the wall that goes.
    pub walls: Vec<WallBehind>,
    /// Yield lines, as ends in mm from the lower left corner.
    pub yield_lines: Vec<[(f64, f64); 2]>,
    /// Load or result written on the panel.
    pub values: Vec<Action>,
}

/// Support of one edge and why it counts as such.
#[derive(Clone, Debug)]
pub struct Edge {
    /// How it is held.
    pub support: Support,
    /// Reason, short: `bonded to R1`; may be empty.
    pub why: String,
}

/// How an edge is held.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Support {
    /// Not held.
    Free,
    /// Held, free to turn.
    Simple,
    /// Held and continuous.
    Continuous,
}

impl Support {
    fn word(self) -> &'static str {
        match self {
            Support::Free => "free",
            Support::Simple => "simple",
            Support::Continuous => "continuous",
        }
    }
}

/// An opening in a panel.
#[derive(Clone, Debug)]
pub struct Opening {
    /// Left side from the panel's left edge, mm.
    pub x: f64,
    /// Sill above the panel's base, mm.
    pub y: f64,
    /// Width, mm.
    pub width: f64,
    /// Height, mm.
    pub height: f64,
    /// What it is: `window`.
    pub words: String,
}

/// A wall that meets the panel from behind.
#[derive(Clone, Debug)]
pub struct WallBehind {
    /// Centre line from the panel's left edge, mm.
    pub x: f64,
    /// Thickness, mm.
    pub thickness: f64,
    /// Mark or words.
    pub words: String,
    /// Whether it is taken out.
    pub removed: bool,
}

/// Width of the band that shows a support, and between its hatch lines, mm on paper.
const BAND: f64 = 2.8;
const BAND_HATCH: f64 = 1.1;

/// Between two drawings side by side, mm on paper.
const APART: f64 = 8.0;

/// Draws one panel.
pub fn panel_elevation(view: &PanelElevation, frame: Frame) -> Drawing {
    fit(frame, 20.0, |scale| draw(view, scale))
}

/// Draws the panel before and after, at one scale, side by side within the frame.
pub fn panel_pair(before: &PanelElevation, after: &PanelElevation, frame: Frame) -> [Drawing; 2] {
    fit_row(frame, APART, 20.0, |scale| [draw(before, scale), draw(after, scale)])
}

fn draw(view: &PanelElevation, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let ruler = Ruler::new(scale, Side::Left);
    let panel = Rect::from_points(ruler.at(0.0, 0.0), ruler.at(view.length, view.height));
    edges(&mut board, view, panel);
    walls(&mut board, view, ruler);
    openings(&mut board, view, ruler);
    for line in &view.yield_lines {
        let [from, to] = line.map(|(x, y)| ruler.at(x, y));
        board.line(Pen::Axis, from, to);
    }
    words(&mut board, view, panel);
    let (x, y) = (panel.x0 - BAND, panel.y1 + BAND);
    let stations = stations(view);
    let xs: Vec<f64> = stations.iter().map(|x| ruler.at(*x, 0.0).x).collect();
    let texts: Vec<Text> = steps(&stations).into_iter().map(Text::from).collect();
    let deeper = |edge, length| if in_two_lines(edge, length) { 3.5 } else { 0.0 };
    let mut row = y + 8.5;
    if texts.len() > 1 {
        dimension::chain_across(&mut board, &xs, row, y, &texts);
        row += dimension::ROW + 1.0;
    }
    dimension::across(&mut board, (panel.x0, panel.x1), row, y, mm(view.length));
    dimension::up(
        &mut board,
        (panel.y1, panel.y0),
        x - 8.5 - deeper(&view.left, panel.height()),
        x,
        mm(view.height),
    );
    let (state, dash) = (&view.state, if view.state.is_empty() { "" } else { "-" });
    let title = if state.is_empty() { String::new() } else { format!(", {state}") };
    board.finish(Words {
        name: format!("{}-panel{dash}{state}", view.mark),
        caption: format!("{} elevation{title}. {}", view.mark, key(view)),
        scale: scale.text(),
        alt: alt(view),
    })
}

/// Places along the base that are dimensioned: ends, sides of openings, centre lines of walls.
fn stations(view: &PanelElevation) -> Vec<f64> {
    let openings = view.openings.iter().flat_map(|o| [o.x, o.x + o.width]);
    let walls = view.walls.iter().map(|wall| wall.x);
    let mut places: Vec<f64> = [0.0, view.length].into_iter().chain(openings).chain(walls).collect();
    places.sort_by(f64::total_cmp);
    places.dedup_by(|a, b| (*a - *b).abs() < 0.5);
    places
}

/// Distances between neighbours.
fn steps(places: &[f64]) -> Vec<String> {
    places.windows(2).map(|pair| mm(pair[1] - pair[0])).collect()
}

/// Bands and outlines of the edges, and their reasons.
fn edges(board: &mut Board, view: &PanelElevation, panel: Rect) {
    let Rect { x0, y0, x1, y1 } = panel;
    let sides = [
        (&view.top, (x0, y0), (x1, y0), Vec2::new(0.0, -1.0)),
        (&view.base, (x0, y1), (x1, y1), Vec2::new(0.0, 1.0)),
        (&view.left, (x0, y0), (x0, y1), Vec2::new(-1.0, 0.0)),
        (&view.right, (x1, y0), (x1, y1), Vec2::new(1.0, 0.0)),
    ];
    for (edge, from, to, out) in sides {
        let (from, to) = (Point::from(from), Point::from(to));
        let band = Rect::from_points(from, to + out * BAND);
        let ring = corners(band);
        let pen = if edge.support == Support::Free { Pen::Beyond } else { Pen::Outline };
        board.line(pen, from, to);
        if edge.support != Support::Free {
            board.hatching(diagonals(&ring, BAND_HATCH, 0.0, true), &ring);
            board.line(Pen::Beyond, from + out * BAND, to + out * BAND);
        }
        if edge.support == Support::Continuous {
            board.hatching(diagonals(&ring, BAND_HATCH, 0.0, false), &ring);
        }
        let middle = from.midpoint(to);
        let target = middle + out * (BAND / 2.0);
        let mut note = Note::new(Role::Note, target, Text::plain(&edge_words(edge)));
        if out.y == 0.0 && in_two_lines(edge, (to - from).hypot()) {
            note.lines = vec![Text::plain(&format!("{}:", edge.support.word())), Text::plain(&edge.why)];
        }
        for share in [0.5, 0.4, 0.6, 0.3, 0.7, 0.2, 0.8, 0.1, 0.9] {
            let beside = from.lerp(to, share) + out * (BAND + 1.2);
            note = match out.x == 0.0 {
                true => note.spot(Spot::new(beside, 0.0, out.y)),
                false => note.spot(Spot::upwards(beside, out.x, 0.0)),
            };
        }
        board.note(note);
    }
}

fn edge_words(edge: &Edge) -> String {
    let support = edge.support.word();
    if edge.why.is_empty() { support.to_owned() } else { format!("{support}: {}", edge.why) }
}

/// Whether the words on an edge are longer than the edge, mm on paper.
fn in_two_lines(edge: &Edge, length: f64) -> bool {
    !edge.why.is_empty() && Text::plain(&edge_words(edge)).extent(8.0).width + 2.0 > length
}

fn walls(board: &mut Board, view: &PanelElevation, ruler: Ruler) {
    for wall in &view.walls {
        let (pen, word) = if wall.removed { (Pen::Removed, " removed") } else { (Pen::Beyond, "") };
        let half = wall.thickness / 2.0;
        for x in [wall.x - half, wall.x + half] {
            board.line(pen, ruler.at(x, 0.0), ruler.at(x, view.height));
        }
        let text = format!("{}{word}", wall.words);
        let at = |share: f64| ruler.at(wall.x, share * view.height);
        let right = ruler.at(wall.x + half, 0.5 * view.height).x + 1.2;
        let left = ruler.at(wall.x - half, 0.5 * view.height).x - 1.2;
        let mut note = Note::new(Role::Mark, at(0.7), Text::mark(&text));
        for share in [0.75, 0.25, 0.9, 0.12] {
            note = note.spot(Spot::upwards((right, at(share).y), 1.0, 0.0)).spot(Spot::upwards(
                (left, at(share).y),
                -1.0,
                0.0,
            ));
        }
        board.note(note);
    }
}

fn openings(board: &mut Board, view: &PanelElevation, ruler: Ruler) {
    for opening in &view.openings {
        let area = Rect::from_points(
            ruler.at(opening.x, opening.y),
            ruler.at(opening.x + opening.width, opening.y + opening.height),
        );
        let ring = corners(area);
        board.fill(Ink::Opening, polygon(&ring));
        board.stroke(Pen::Outline, polygon(&ring));
        let size = format!("{} × {}", mm(opening.width), mm(opening.height));
        board.note(
            Note::new(Role::Note, area.center(), Text::plain(&opening.words))
                .words(&size)
                .spot(Spot::new(area.center(), 0.0, 0.0))
                .rank(1),
        );
    }
}

/// Mark and values, in the middle or wherever the panel is clear.
fn words(board: &mut Board, view: &PanelElevation, panel: Rect) {
    let target = panel.origin() + Vec2::new(0.3 * panel.width(), 0.45 * panel.height());
    let mut note = Note::new(Role::Mark, target, Text::mark(&view.mark));
    for value in &view.values {
        note = note.line(value.text());
    }
    for down in [0.5, 0.35, 0.65, 0.2, 0.8, 0.1, 0.9] {
        for across in [0.5, 0.35, 0.65, 0.25, 0.75, 0.18, 0.82, 0.12, 0.88] {
            let at = panel.origin() + Vec2::new(across * panel.width(), down * panel.height());
            note = note.spot(Spot::new(at, 0.0, 0.0));
        }
    }
    board.note(note.rank(1));
}

/// The key in words, for what is there.
fn key(view: &PanelElevation) -> String {
    let edges = [&view.left, &view.right, &view.top, &view.base];
    let has = |support| edges.iter().any(|edge| edge.support == support);
    let mut parts = Vec::new();
    if has(Support::Free) {
        parts.push("thin line: free edge".to_owned());
    }
    if has(Support::Simple) {
        parts.push("single hatching: simply supported".to_owned());
    }
    if has(Support::Continuous) {
        parts.push("crossed hatching: continuous".to_owned());
    }
    if view.walls.iter().any(|wall| wall.removed) {
        parts.push("dashed: removed".to_owned());
    }
    if !view.yield_lines.is_empty() {
        parts.push("chain lines: yield lines".to_owned());
    }
    let key = parts.join("; ");
    key[..1].to_uppercase() + &key[1..]
}

fn alt(view: &PanelElevation) -> String {
    let state = if view.state.is_empty() { String::new() } else { format!(" {} the removal", view.state) };
    let mut alt = format!(
        "Elevation of panel {}{state}, {} mm long and {} mm high. Left edge {}; right edge {}; top {}; base {}. ",
        view.mark,
        mm(view.length),
        mm(view.height),
        edge_words(&view.left),
        edge_words(&view.right),
        edge_words(&view.top),
        edge_words(&view.base),
    );
    for opening in &view.openings {
        alt += &format!(
            "{} {} mm wide and {} mm high, {} mm from the left edge and {} mm above the base. ",
            opening.words,
            mm(opening.width),
            mm(opening.height),
            mm(opening.x),
            mm(opening.y)
        );
    }
    for wall in &view.walls {
        let word = if wall.removed { "removed, met" } else { "meets" };
        alt += &format!("{} {word} the panel {} mm from its left edge. ", wall.words, mm(wall.x));
    }
    let steps = steps(&stations(view));
    if steps.len() > 1 {
        alt += &format!("Along the base from the left: {} mm. ", list(&steps));
    }
    if !view.yield_lines.is_empty() {
        alt += &format!("{} yield lines are drawn. ", view.yield_lines.len());
    }
    let values: Vec<String> = view.values.iter().map(Action::spoken).collect();
    if !values.is_empty() {
        alt += &format!("{}.", list(&values));
    }
    alt.trim_end().to_owned()
}
