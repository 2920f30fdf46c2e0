//! Dimension lines: mm without unit, oblique ticks, extension lines; text above a horizontal line
//! and upwards beside a vertical one.

use kurbo::{Point, Vec2};

use super::board::Board;
use super::drawing::Role;
use super::pen::Pen;
use super::place::{Note, Spot};
use super::text::Text;

/// Extension line past the dimension line, and its gap to what is measured, mm.
const PAST: f64 = 1.2;
const GAP: f64 = 1.0;
/// Text off its line, mm.
const LIFT: f64 = 0.75;
/// Half a tick's width, mm.
const TICK: f64 = 0.9;
/// Type size of dimensions, pt.
const SIZE: f64 = 7.5;
/// Distance between two parallel dimension lines, mm.
pub const ROW: f64 = 6.0;

/// Which way a dimension line runs.
#[derive(Clone, Copy, PartialEq)]
enum Way {
    Across,
    Up,
}

/// A whole number of mm, one decimal where it is not whole.
pub fn mm(length: f64) -> String {
    if (length - length.round()).abs() < 0.05 {
        format!("{}", length.round())
    } else {
        format!("{length:.1}")
    }
}

/// Horizontal dimension from `x0` to `x1` at height `y`; extension lines come from `from`.
pub fn across(board: &mut Board, (x0, x1): (f64, f64), y: f64, from: f64, text: impl Into<Text>) {
    chain(board, Way::Across, &[x0, x1], y, from, &[text.into()]);
}

/// Horizontal chain of dimensions through the places `xs`.
pub fn chain_across(board: &mut Board, xs: &[f64], y: f64, from: f64, texts: &[Text]) {
    chain(board, Way::Across, xs, y, from, texts);
}

/// Vertical dimension from `y0` to `y1` at `x`; extension lines come from `from`.
pub fn up(board: &mut Board, (y0, y1): (f64, f64), x: f64, from: f64, text: impl Into<Text>) {
    chain(board, Way::Up, &[y0, y1], x, from, &[text.into()]);
}

/// Vertical chain of dimensions through the places `ys`.
pub fn chain_up(board: &mut Board, ys: &[f64], x: f64, from: f64, texts: &[Text]) {
    chain(board, Way::Up, ys, x, from, texts);
}

/// Whether each text of a chain fits above its own piece of line.
pub fn fits(places: &[f64], texts: &[Text]) -> bool {
    places
        .windows(2)
        .zip(texts)
        .all(|(pair, text)| text.extent(SIZE).width + 1.6 <= (pair[1] - pair[0]).abs())
}

fn chain(board: &mut Board, way: Way, places: &[f64], level: f64, from: f64, texts: &[Text]) {
    let at = |place: f64, level: f64| match way {
        Way::Across => Point::new(place, level),
        Way::Up => Point::new(level, place),
    };
    let side = if level >= from { 1.0 } else { -1.0 };
    let (first, last) = (places[0], places[places.len() - 1]);
    board.line(Pen::Dimension, at(first, level), at(last, level));
    for place in places {
        if (level - from).abs() > GAP {
            board.line(
                Pen::Dimension,
                at(*place, from + side * GAP),
                at(*place, level + side * PAST),
            );
        }
        let tick = Vec2::new(TICK, -TICK);
        board.line(
            Pen::Outline,
            at(*place, level) - tick,
            at(*place, level) + tick,
        );
    }
    for (index, (pair, text)) in places.windows(2).zip(texts).enumerate() {
        let middle = at((pair[0] + pair[1]) / 2.0, level);
        let note = Note {
            size: SIZE,
            rank: 0,
            ..Note::new(Role::Dimension, middle, text.clone())
        };
        // Text stands on its own piece of the line. Only past the ends of the whole chain may it
        // stand beside it: over a neighbour's piece it would give the neighbour a wrong length.
        let mut note = match way {
            Way::Across => note.spot(Spot::new((middle.x, level - LIFT), 0.0, -1.0)),
            Way::Up => note.spot(Spot::upwards((level - LIFT, middle.y), -1.0, 0.0)),
        };
        let ends = [
            (index == 0, pair[0], pair[0] - pair[1]),
            (index + 2 == places.len(), pair[1], pair[1] - pair[0]),
        ];
        for (_, end, out) in ends.into_iter().filter(|(is_end, ..)| *is_end) {
            let out = out.signum();
            let beside = end + out * 1.6;
            note = match way {
                Way::Across => note
                    .spot(Spot::new((beside, level - LIFT), out, -1.0).cost(1.0))
                    .spot(Spot::new((beside, level), out, 0.0).cost(1.5)),
                Way::Up => note
                    .spot(Spot::upwards((level - LIFT, beside), -1.0, out).cost(1.0))
                    .spot(Spot::upwards((level, beside), 0.0, out).cost(1.5)),
            };
        }
        let beyond = level + side * (PAST + LIFT);
        board.note(match way {
            Way::Across => note.spot(Spot::new((middle.x, beyond), 0.0, side).cost(2.0)),
            Way::Up => note.spot(Spot::upwards((beyond, middle.y), side, 0.0).cost(2.0)),
        });
    }
}
