//! A wall panel looked at on its face, with the support of each edge, before and after.

use kurbo::{Rect, Vec2};

use super::board::{Board, Words};
use super::dimension::mm;
use super::drawing::{Drawing, Role};
use super::note::{Note, Spot};
use super::panel_edges::{Edges, PanelFace, steps};
use super::pen::Pen;
use super::scale::{Frame, Scale, fit, fit_row};
use super::text::Text;
use super::text::list;
use super::view::{Action, Ruler, Side};

/// What the elevation of a panel shows.
#[derive(Clone, Debug)]
pub struct PanelElevation {
    /// The panel.
    pub face: PanelFace,
    /// Walls that meet the panel from behind: returns, and the wall that goes.
    pub walls: Vec<WallBehind>,
    /// Load or result written on the panel.
    pub values: Vec<Action>,
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
    let panel = Rect::from_points(ruler.at(0.0, 0.0), ruler.at(view.face.length, view.face.height));
    let edges = Edges { face: &view.face, worded: true };
    edges.draw(&mut board, ruler);
    walls(&mut board, view, ruler);
    openings(&mut board, view, ruler);
    words(&mut board, view, panel);
    edges.dimensions(&mut board, ruler, &stations(view));
    let (state, dash) = (&view.face.state, if view.face.state.is_empty() { "" } else { "-" });
    let title = if state.is_empty() { String::new() } else { format!(", {state}") };
    board.finish(Words {
        name: format!("{}-panel{dash}{state}", view.face.mark),
        caption: format!("{} elevation{title}. {}", view.face.mark, key(view)),
        scale: scale.text(),
        alt: alt(view),
    })
}

/// Places along the base that are dimensioned: ends, sides of openings, centre lines of walls.
fn stations(view: &PanelElevation) -> Vec<f64> {
    let openings = view.face.openings.iter().flat_map(|o| [o.x, o.x + o.width]);
    let walls = view.walls.iter().map(|wall| wall.x);
    let mut places: Vec<f64> = [0.0, view.face.length].into_iter().chain(openings).chain(walls).collect();
    places.sort_by(f64::total_cmp);
    places.dedup_by(|a, b| (*a - *b).abs() < 0.5);
    places
}

fn walls(board: &mut Board, view: &PanelElevation, ruler: Ruler) {
    for wall in &view.walls {
        let (pen, word) = if wall.removed { (Pen::Removed, " removed") } else { (Pen::Beyond, "") };
        let half = wall.thickness / 2.0;
        for x in [wall.x - half, wall.x + half] {
            board.line(pen, ruler.at(x, 0.0), ruler.at(x, view.face.height));
        }
        let text = format!("{}{word}", wall.words);
        let at = |share: f64| ruler.at(wall.x, share * view.face.height);
        let right = ruler.at(wall.x + half, 0.5 * view.face.height).x + 1.2;
        let left = ruler.at(wall.x - half, 0.5 * view.face.height).x - 1.2;
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
    for opening in &view.face.openings {
        opening.draw(board, ruler, Pen::Outline, (view.face.length, view.face.height));
        let area = opening.area(ruler);
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
    let mut note = Note::new(Role::Mark, target, Text::mark(&view.face.mark));
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
    let mut parts = Edges { face: &view.face, worded: true }.key();
    if view.walls.iter().any(|wall| wall.removed) {
        parts.push("dashed: removed".to_owned());
    }
    let key = parts.join("; ");
    key[..1].to_uppercase() + &key[1..]
}

fn alt(view: &PanelElevation) -> String {
    let state =
        if view.face.state.is_empty() { String::new() } else { format!(" {} the removal", view.face.state) };
    let mut alt = format!(
        "Elevation of panel {}{state}, {} mm long and {} mm high. ",
        view.face.mark,
        mm(view.face.length),
        mm(view.face.height)
    );
    alt += &Edges { face: &view.face, worded: true }.spoken();
    for opening in &view.face.openings {
        alt += &opening.spoken();
    }
    for wall in &view.walls {
        let word = if wall.removed { "removed, met" } else { "meets" };
        alt += &format!("{} {word} the panel {} mm from its left edge. ", wall.words, mm(wall.x));
    }
    let steps = steps(&stations(view));
    if steps.len() > 1 {
        alt += &format!("Along the base from the left: {} mm. ", list(&steps));
    }
    let values: Vec<String> = view.values.iter().map(Action::spoken).collect();
    if !values.is_empty() {
        alt += &format!("{}.", list(&values));
    }
    alt.trim_end().to_owned()
}
