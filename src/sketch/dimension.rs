//! Dimension lines: mm without unit, oblique ticks, extension lines; text above a horizontal line
//! and upwards beside a vertical one.

use kurbo::{Point, Vec2};

use super::board::Board;
use super::drawing::Role;
use super::note::{Note, Spot};
use super::pen::Pen;
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
        // A hair up, so that 6646.25 found in two ways prints the same.
        format!("{:.1}", length + 1e-6)
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
    let [first, .., last] = *places else { return };
    board.line(Pen::Dimension, at(first, level), at(last, level));
    for place in places {
        if (level - from).abs() > GAP {
            board.line(Pen::Dimension, at(*place, from + side * GAP), at(*place, level + side * PAST));
        }
        let tick = Vec2::new(TICK, -TICK);
        board.line(Pen::Outline, at(*place, level) - tick, at(*place, level) + tick);
    }
    for (index, (pair, text)) in places.windows(2).zip(texts).enumerate() {
        let middle = at((pair[0] + pair[1]) / 2.0, level);
        let note = Note { size: SIZE, rank: 0, ..Note::new(Role::Dimension, middle, text.clone()) };
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

#[cfg(test)]
mod tests {
    use super::*;
    use crate::sketch::board::Words;
    use crate::sketch::drawing::Drawing;

    fn drawn(places: &[f64]) -> Drawing {
        let mut board = Board::default();
        let texts: Vec<Text> = places.windows(2).map(|p| mm(100.0 * (p[1] - p[0])).into()).collect();
        chain_across(&mut board, places, 10.0, 0.0, &texts);
        let empty = String::new;
        board.finish(Words { name: empty(), caption: empty(), scale: empty(), alt: empty() })
    }

    #[test]
    fn lengths_are_whole_millimetres_or_have_one_decimal() {
        assert_eq!(mm(640.0), "640");
        assert_eq!(mm(102.5), "102.5");
        assert_eq!(mm(99.999), "100");
    }

    #[test]
    fn a_number_never_stands_over_the_neighbouring_piece() {
        // Pieces of 4.1, 3 and 4 mm are narrower than their numbers.
        let drawing = drawn(&[0.0, 4.1, 7.1, 11.1]);
        let line =
            drawing.strokes(Pen::Dimension).next().and_then(|p| kurbo::Shape::as_line(&p.segments().next()?));
        let line = line.expect("the dimension line comes first");
        for (label, (low, high)) in drawing.labels().zip([(0.0, 4.1), (4.1, 7.1), (7.1, 11.1)]) {
            let centre = label.area().center().x - line.p0.x;
            let own = (low..=high).contains(&centre);
            assert!(own || !(0.0..=11.1).contains(&centre), "{} at {centre}", label.plain());
        }
    }

    #[test]
    fn vertical_dimensions_read_upwards() {
        let mut board = Board::default();
        up(&mut board, (0.0, -40.0), -10.0, 0.0, mm(800.0));
        let empty = String::new;
        let drawing = board.finish(Words { name: empty(), caption: empty(), scale: empty(), alt: empty() });
        let label = drawing.labels().next().expect("one label");
        assert_eq!((label.plain().as_str(), label.rotate), ("800", -90.0));
    }
}
