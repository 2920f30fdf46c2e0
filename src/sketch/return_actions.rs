//! Bending moment and shear along the height of a return, beside a line that stands for it.

use kurbo::{Line, Point, Vec2};

use super::board::{Board, Words, polyline};
use super::dimension::{self, mm};
use super::drawing::{Drawing, Role, Style};
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::scale::{Frame, Scale, fit};
use super::text::Text;
use super::text::list;

/// What the diagrams of a return show.
#[derive(Clone, Debug)]
pub struct ReturnActions {
    /// Mark of the return.
    pub mark: String,
    /// Height, mm.
    pub height: f64,
    /// Whether the head is held.
    pub propped: bool,
    /// Combination the values belong to; may be empty.
    pub case: String,
    /// The curves, left to right.
    pub curves: Vec<Curve>,
}

/// One quantity along the height.
#[derive(Clone, Debug)]
pub struct Curve {
    /// Symbol: `M_Ed`.
    pub symbol: String,
    /// Its name in words: `bending moment`.
    pub words: String,
    /// Height above the base (mm) and value, from base to head, in one unit.
    pub samples: Vec<(f64, f64)>,
    /// Values to print: height above the base (mm), text with its unit.
    pub values: Vec<(f64, String)>,
}

/// Width of a curve, and clear distance between two curves with their labels, mm on paper.
const ORDINATE: f64 = 8.0;
const APART: f64 = 3.0;
/// Distance between the ordinates drawn inside a curve, mm on paper.
const HATCH: f64 = 2.5;

/// Draws moment and shear along the height.
pub fn return_actions(view: &ReturnActions, frame: Frame) -> Drawing {
    fit(frame, 20.0, |scale| draw(view, scale))
}

fn draw(view: &ReturnActions, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let y = |z: f64| -scale.paper(z);
    let (foot, top) = (Point::new(0.0, 0.0), Point::new(0.0, y(view.height)));
    board.line(Pen::Outline, foot, top);
    load::ground(&mut board, foot - Vec2::new(4.0, 0.0), foot + Vec2::new(4.0, 0.0), Vec2::new(0.0, 1.0));
    if view.propped {
        load::restraint(&mut board, top, Vec2::new(-1.0, 0.0));
    }
    dimension::up(&mut board, (0.0, top.y), -7.5, -4.0, mm(view.height));

    let mut edge = 4.0;
    for curve in &view.curves {
        let values = || curve.samples.iter().map(|(_, v)| *v);
        let (low, high) = (values().fold(0.0, f64::min), values().fold(0.0, f64::max));
        let unit = if high > low { ORDINATE / (high - low) } else { 0.0 };
        let labels = curve.values.iter().map(|(_, text)| Text::plain(text).extent(8.0).width);
        let label = labels.fold(0.0, f64::max) + 2.0;
        let base = edge + APART + if low < 0.0 { label } else { 0.0 } - low * unit;
        draw_curve(&mut board, curve, base, unit, &y, top.y);
        edge = base + (high * unit + label).max(title(curve).extent(8.0).width);
    }
    let case = if view.case.is_empty() { String::new() } else { format!(", {}", view.case) };
    board.finish(Words {
        name: format!("{}-actions", view.mark),
        caption: format!("{} in its plane{case}; ordinates not to the scale of the height", view.mark),
        scale: scale.text(),
        alt: alt(view),
    })
}

fn draw_curve(board: &mut Board, curve: &Curve, base: f64, unit: f64, y: &dyn Fn(f64) -> f64, top: f64) {
    let at = |(z, v): (f64, f64)| Point::new(base + v * unit, y(z));
    let points: Vec<Point> = curve.samples.iter().copied().map(at).collect();
    let (Some(first), Some(last)) = (curve.samples.first(), curve.samples.last()) else {
        return;
    };
    let mut ring = vec![Point::new(base, y(first.0))];
    ring.extend(&points);
    ring.push(Point::new(base, y(last.0)));
    let (from, to) = (first.0, last.0);
    let count = ((y(from) - y(to)) / HATCH).round().max(1.0) as usize;
    let ordinates = (1..count).map(|step| {
        let z = from + (to - from) * step as f64 / count as f64;
        Line::new(Point::new(base, y(z)), at((z, value_at(&curve.samples, z))))
    });
    board.hatching(ordinates.collect(), &ring);
    board.stroke(Pen::Diagram, polyline(&ring));
    board.line(Pen::Beyond, Point::new(base, 0.0), Point::new(base, top));

    let head = Point::new(base, top - 4.0);
    board.note(Note::new(Role::Note, head, title(curve)).spot(Spot::new(head, 1.0, -1.0)).rank(0));
    for (z, text) in &curve.values {
        let value = value_at(&curve.samples, *z);
        let tip = at((*z, value));
        let out = if value < 0.0 { -1.0 } else { 1.0 };
        let beside = |dy: f64| Point::new(tip.x + out * 1.2, tip.y + dy);
        board.note(
            Note::new(Role::Load, tip, Text::plain(text))
                .spot(Spot::new(beside(0.0), out, 0.0))
                .spot(Spot::new(beside(1.0), out, 1.0))
                .spot(Spot::new(beside(-1.0), out, -1.0))
                .spot(Spot::new((base - out * 1.2, tip.y), -out, 0.0).cost(1.0))
                .rank(1),
        );
    }
}

/// `M_Ed, bending moment`.
fn title(curve: &Curve) -> Text {
    Text::symbol(&curve.symbol).and(&format!(", {}", curve.words), Style::Plain)
}

/// The value at a height, straight between samples.
fn value_at(samples: &[(f64, f64)], z: f64) -> f64 {
    let pair = samples.windows(2).find(|pair| pair[0].0 <= z && z <= pair[1].0 && pair[0].0 < pair[1].0);
    match pair {
        Some(pair) => {
            let share = (z - pair[0].0) / (pair[1].0 - pair[0].0);
            pair[0].1 + share * (pair[1].1 - pair[0].1)
        }
        None => samples.last().map_or(0.0, |last| last.1),
    }
}

fn alt(view: &ReturnActions) -> String {
    let mut alt = format!("Diagrams along the {} mm height of return {}", mm(view.height), view.mark);
    if !view.case.is_empty() {
        alt += &format!(", {}", view.case);
    }
    alt += if view.propped { "; the head is held. " } else { "; the head is free. " };
    for curve in &view.curves {
        let values: Vec<String> =
            curve.values.iter().map(|(z, text)| format!("{text} at {} mm above the base", mm(*z))).collect();
        alt += &format!("{} {}: {}. ", curve.words, curve.symbol.replace('_', ""), list(&values));
    }
    alt.trim_end().to_owned()
}
