//! A wall panel at collapse: where it cracks and turns, how far it moves, and what it takes against the wind on it.
//!
//! Made to be read without colour and on a poor copy: a crack that opens on the face away from the wind is one heavy
//! line, one that opens on the face towards it heavy dashes, a support along which the panel turns a row of rings.

use kurbo::{Circle, Line, Rect, Shape};

use super::board::{Board, Words, polygon};
use super::drawing::{Drawing, Role};
use super::ground::crosses;
use super::load;
use super::note::{Note, Spot};
use super::panel_cracks_words as words;
use super::panel_deflection::Deflection;
use super::panel_edges::{BAND, Edges, PanelFace};
use super::pen::{Ink, Pen};
use super::scale::{APART, Frame, Scale, fit, fit_row_or_column};
use super::view::{Action, Ruler, Side};

/// What the drawing of a panel at collapse shows.
#[derive(Clone, Debug)]
pub struct PanelCracks {
    /// The panel.
    pub face: PanelFace,
    /// Cracks and hinges of the pattern.
    pub cracks: Vec<Crack>,
    /// How far the panel moves, cell by cell; cells do not overlap and none lie in an opening. May be empty.
    pub deflection: Vec<Cell>,
    /// What the panel takes; its words stand before it: `takes`.
    pub takes: Action,
    /// The wind on it; its words stand before it: `wind`.
    pub wind: Action,
    /// Further results, below.
    pub values: Vec<Action>,
}

/// A straight line along which the panel turns.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Crack {
    /// One end, mm from the lower left corner of the panel.
    pub from: (f64, f64),
    /// The other end, mm.
    pub to: (f64, f64),
    /// How it opens.
    pub kind: CrackKind,
}

/// How a crack opens.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum CrackKind {
    /// On the face away from the wind.
    Sagging,
    /// On the face towards the wind.
    Hogging,
    /// Not a crack across the panel: a support along which it turns.
    Hinge,
}

/// A rectangle of the panel and how far it moves.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Cell {
    /// From where to where along the panel, mm from its left edge.
    pub x: (f64, f64),
    /// From where to where up the panel, mm from its base.
    pub y: (f64, f64),
    /// Deflection in the middle of the cell against the largest of the panel, 0 to 1.
    pub share: f64,
}

/// The smallest scale (`1:n`) at which before and after stand side by side if they have room one above the other.
pub const SMALLEST: f64 = 100.0;

/// A dash and a gap of a crack towards the wind, mm on paper.
const DASH: (f64, f64) = (2.6, 1.5);
/// From the middle of a crack to the hatching, mm on paper.
const BESIDE: f64 = 0.95;
/// Radius of the rings of a hinge, and between their centres, mm on paper.
const RING: (f64, f64) = (0.7, 3.2);
/// Clear space that the results had better have around them, mm on paper; each one missed costs 1.
const ROOM: [f64; 4] = [2.4, 1.6, 1.0, 0.6];
/// From what is drawn to results above it, and the room of one line of words between, mm on paper.
const ABOVE: (f64, f64) = (1.5, 3.8);
/// Places tried for the results along the panel and up it.
const PLACES: (usize, usize) = (17, 13);

/// Draws one panel.
pub fn panel_cracks(view: &PanelCracks, frame: Frame) -> Drawing {
    fit(frame, 20.0, |scale| draw(view, scale))
}

/// Draws the panel before and after, at one scale, side by side within the frame.
///
/// Where that would be smaller than [`SMALLEST`], each of the two has the frame for itself and they stand one above
/// the other: cracks of a small drawing run together.
pub fn cracks_pair(before: &PanelCracks, after: &PanelCracks, frame: Frame) -> [Drawing; 2] {
    fit_row_or_column(frame, APART, (20.0, SMALLEST), |scale| [draw(before, scale), draw(after, scale)])
}

fn draw(view: &PanelCracks, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let ruler = Ruler::new(scale, Side::Left);
    let deflection = Deflection::new(&view.deflection);
    deflection.draw(&mut board, view.face.height, ruler);
    let lines = || {
        let real = view.cracks.iter().filter(|crack| crack.from != crack.to);
        real.map(|c| (c.kind, Line::new(ruler.at(c.from.0, c.from.1), ruler.at(c.to.0, c.to.1))))
    };
    lines().for_each(|(_, line)| clear(&mut board, line));
    let edges = Edges { face: &view.face, worded: false };
    // Before and after hang from one line, with a band at the top or without.
    let panel = Rect::from_points(ruler.at(0.0, 0.0), ruler.at(view.face.length, view.face.height));
    board.keep(panel.inflate(BAND, BAND));
    edges.draw(&mut board, ruler);
    for opening in &view.face.openings {
        opening.draw(&mut board, ruler, Pen::Beyond, (view.face.length, view.face.height));
    }
    // Rings last: a crack that meets a hinge runs below them.
    for kind in [CrackKind::Sagging, CrackKind::Hogging, CrackKind::Hinge] {
        for (_, line) in lines().filter(|(its, _)| *its == kind) {
            match kind {
                CrackKind::Sagging => board.line(Pen::Sagging, line.p0, line.p1),
                CrackKind::Hogging => dashes(&mut board, line),
                CrackKind::Hinge => rings(&mut board, line),
            }
        }
    }
    edges.dimensions(&mut board, ruler, &[]);
    results(&mut board, view, ruler, &deflection);
    let dash = if view.face.state.is_empty() { "" } else { "-" };
    board.finish(Words {
        name: format!("{}-cracks{dash}{}", view.face.mark, view.face.state),
        caption: words::caption(view, &edges, deflection.is_seen()),
        scale: scale.text(),
        alt: words::alt(view, &edges),
    })
}

/// Clears the hatching beside a crack, so that the two do not run together on a poor copy.
fn clear(board: &mut Board, line: Line) {
    let side = (line.p1 - line.p0).normalize().turn_90() * BESIDE;
    board.fill(Ink::Paper, polygon(&[line.p0 + side, line.p1 + side, line.p1 - side, line.p0 - side]));
}

/// Dashes that begin and end with the line. A pen that dashes by itself would draw a short crack whole, as one that
/// opens on the other face.
fn dashes(board: &mut Board, line: Line) {
    let (dash, gap) = DASH;
    let count = ((line.length() + gap) / (dash + gap)).round().max(2.0);
    let pitch = dash + gap;
    let stretched = line.length() / (count * pitch - gap);
    for step in 0..count as usize {
        let from = stretched * pitch * step as f64 / line.length();
        let to = from + stretched * dash / line.length();
        board.line(Pen::Hogging, line.p0.lerp(line.p1, from), line.p0.lerp(line.p1, to));
    }
}

/// Rings along a support, none at a corner, where another support begins.
fn rings(board: &mut Board, line: Line) {
    let (radius, apart) = RING;
    board.line(Pen::Beyond, line.p0, line.p1);
    let count = (line.length() / apart).round().max(1.0);
    for step in 0..count as usize {
        let centre = line.p0.lerp(line.p1, (step as f64 + 0.5) / count);
        board.fill(Ink::Paper, Circle::new(centre, radius).to_path(0.01));
        load::circle(board, Pen::Hinge, centre, radius);
    }
}

/// What the panel takes and the wind on it: where the panel is clear, else above everything; on hatching or in an
/// opening only where words of edges leave no room there.
fn results(board: &mut Board, view: &PanelCracks, ruler: Ruler, deflection: &Deflection) {
    let middle = ruler.at(view.face.length / 2.0, view.face.height / 2.0);
    let mut note = Note::new(Role::Load, middle, words::led_by(&view.takes)).line(words::led_by(&view.wind));
    for value in &view.values {
        note = note.line(words::led_by(value));
    }
    let lines = barriers(view, ruler);
    let size = (note.width(), note.height());
    let mut spot = |spot: Spot, cost: f64| {
        let area = note.block(&spot, size).area;
        let missed = |room: &&f64| lines.iter().any(|line| crosses(*line, area.inflate(**room, **room)));
        let missed = ROOM.iter().filter(missed).count() as f64;
        note.spots.push(spot.cost(cost + missed));
    };
    let (columns, rows) = PLACES;
    for row in 1..rows {
        for column in 1..columns {
            let share = |n: usize, of: usize| n as f64 / of as f64;
            let (x, y) = (view.face.length * share(column, columns), view.face.height * share(row, rows));
            // Of places alike, the one nearer the middle; of hatched ones, the one that hides less.
            let off = (share(column, columns) - 0.5).abs() + (share(row, rows) - 0.5).abs();
            let cost = off + 2.0 * deflection.at(x, y);
            if !view.face.openings.iter().any(|o| o.holds(x, y)) {
                spot(Spot::new(ruler.at(x, y), 0.0, 0.0), cost);
                spot(Spot::upwards(ruler.at(x, y), 0.0, 0.0), cost + 3.0);
            }
        }
    }
    for opening in &view.face.openings {
        let centre = opening.area(ruler).center();
        spot(Spot::new(centre, 0.0, 0.0), 11.0);
        spot(Spot::upwards(centre, 0.0, 0.0), 13.0);
    }
    // Above what is drawn; words of the top edge may stand there first.
    let above = board.bounds().y0 - ABOVE.0;
    spot(Spot::new((middle.x, above), 0.0, -1.0), 0.0);
    spot(Spot::new((middle.x, above - ABOVE.1), 0.0, -1.0), 0.0);
    board.note(note);
}

/// Lines from which the results had better keep a distance.
fn barriers(view: &PanelCracks, ruler: Ruler) -> Vec<Line> {
    let ring = |(x0, y0): (f64, f64), (x1, y1): (f64, f64)| {
        let corners = [(x0, y0), (x1, y0), (x1, y1), (x0, y1)].map(|(x, y)| ruler.at(x, y));
        (0..4).map(move |n| Line::new(corners[n], corners[(n + 1) % 4]))
    };
    let openings = view.face.openings.iter().flat_map(|o| ring((o.x, o.y), (o.x + o.width, o.y + o.height)));
    let cracks =
        view.cracks.iter().map(|c| Line::new(ruler.at(c.from.0, c.from.1), ruler.at(c.to.0, c.to.1)));
    ring((0.0, 0.0), (view.face.length, view.face.height)).chain(openings).chain(cracks).collect()
}
