//! Actions and supports: arrows, distributed loads, moments, restraints, break lines.

use kurbo::{Arc, BezPath, Point, Rect, Shape, Vec2};

use super::board::{Board, polygon, polyline};
use super::pen::{Ink, Pen};

/// Length and half width of an arrowhead, mm.
pub const HEAD: (f64, f64) = (2.2, 0.75);
/// Greatest distance between the arrows of a distributed load, mm.
const COMB: f64 = 12.0;

/// A force: shaft and solid head, its point at `tip`.
pub fn arrow(board: &mut Board, tail: Point, tip: Point) {
    let along = (tip - tail).normalize();
    board.line(Pen::Load, tail, tip - along * (HEAD.0 * 0.8));
    head(board, tip, along);
}

/// A solid arrowhead.
pub fn head(board: &mut Board, tip: Point, along: Vec2) {
    let back = tip - along * HEAD.0;
    let side = along.turn_90() * HEAD.1;
    board.fill(Ink::Arrow, polygon(&[tip, back + side, back - side]));
}

/// A load spread evenly along the line `from`–`to`, pushing along `push`: the arrow points stand
/// on the line, their tails on its parallel.
pub fn comb(board: &mut Board, from: Point, to: Point, push: Vec2) {
    let count = (((to - from).hypot() / COMB).ceil() as usize).max(2);
    board.line(Pen::Load, from - push, to - push);
    for step in 0..=count {
        let tip = from.lerp(to, step as f64 / count as f64);
        arrow(board, tip - push, tip);
    }
}

/// A moment: three quarters of a circle with a head at its end.
pub fn moment(board: &mut Board, centre: Point, radius: f64, clockwise: bool) {
    let turn = if clockwise { 1.0 } else { -1.0 };
    // Both senses leave the gap at the bottom and end beside it.
    let start = std::f64::consts::FRAC_PI_2 + turn * 0.8;
    let sweep = turn * 4.4;
    let arc = Arc::new(centre, (radius, radius), start, sweep, 0.0);
    let mut path = BezPath::new();
    path.move_to(centre + Vec2::from_angle(start) * radius);
    path.extend(arc.append_iter(0.01));
    board.stroke(Pen::Load, path);
    // Nothing is written inside the arc.
    board.reserve(Rect::from_center_size(centre, (2.0 * radius, 2.0 * radius)));
    let end = Vec2::from_angle(start + sweep);
    head(board, centre + end * radius + end.turn_90() * turn * HEAD.0, end.turn_90() * turn);
}

/// A direction shown by an open arrow, such as the wind's: it carries no value.
pub fn open_arrow(board: &mut Board, tail: Point, tip: Point) {
    let along = (tip - tail).normalize();
    let side = along.turn_90();
    let (neck, half, wide) = (tip - along * 3.6, 1.0, 2.2);
    board.stroke(
        Pen::Outline,
        polygon(&[
            tail + side * half,
            neck + side * half,
            neck + side * wide,
            tip,
            neck - side * wide,
            neck - side * half,
            tail - side * half,
        ]),
    );
}

/// A restraint that holds `tip` along `out`: triangle, and a hatched ground behind it.
pub fn restraint(board: &mut Board, tip: Point, out: Vec2) {
    let (depth, half) = (3.4, 2.0);
    let side = out.turn_90();
    let base = tip + out * depth;
    let outline = polygon(&[tip, base + side * half, base - side * half]);
    board.fill(Ink::Paper, outline.clone());
    board.stroke(Pen::Outline, outline);
    // Rollers: the point is held along `out` only.
    let ground = base + out * 0.9;
    board.line(Pen::Support, ground - side * 3.0, ground + side * 3.0);
    ticks(board, ground - side * 3.0, ground + side * 3.0, out);
}

/// Ground under a line: the line in the support pen and short strokes behind it.
pub fn ground(board: &mut Board, from: Point, to: Point, behind: Vec2) {
    board.line(Pen::Support, from, to);
    ticks(board, from, to, behind);
}

fn ticks(board: &mut Board, from: Point, to: Point, behind: Vec2) {
    let along = (to - from).normalize();
    let count = ((to - from).hypot() / 1.5).round().max(1.0) as usize;
    for step in 0..count {
        let at = from.lerp(to, (step as f64 + 0.7) / count as f64);
        board.line(Pen::Beyond, at, at + behind * 1.3 - along * 1.3);
    }
}

/// A line with a zigzag in its middle: the thing goes on past it.
pub fn break_line(board: &mut Board, pen: Pen, from: Point, to: Point) {
    let along = (to - from).normalize();
    let side = along.turn_90();
    let middle = from.midpoint(to);
    let (step, rise) = (0.8, 1.4);
    board.stroke(
        pen,
        polyline(&[
            from,
            middle - along * step,
            middle - along * (step / 2.0) + side * rise,
            middle + along * (step / 2.0) - side * rise,
            middle + along * step,
            to,
        ]),
    );
}

/// A circle, for marks and north points.
pub fn circle(board: &mut Board, pen: Pen, centre: Point, radius: f64) {
    board.stroke(pen, kurbo::Circle::new(centre, radius).to_path(0.01));
}
