//! Whether the outside of every storey closes.

use super::storey::{Line, lines};
use super::{Around, REACH, across};
use crate::building::Along;

/// An end of an outer wall that meets nothing.
#[derive(Clone, Debug, PartialEq)]
pub struct OpenEnd {
    /// The wall, by mark.
    pub mark: String,
    /// The storey, by mark.
    pub storey: String,
    /// Where it ends, (x, y) in mm.
    pub at: (f64, f64),
    /// The wall that comes nearest, by mark, and how far off it is in mm.
    pub nearest: Option<(String, f64)>,
}

/// Ends of outer walls that meet no other wall, in the storeys that have a floor or roof over them; a
/// wall that says that it ends free is left out.
pub fn open_ends(around: &Around<'_>) -> Vec<OpenEnd> {
    let mut out = Vec::new();
    for storey in &around.storeys {
        if !around.floors.iter().any(|f| f.storey == storey.mark) {
            continue;
        }
        let all = lines(around, &storey.mark);
        for line in all.iter().filter(|l| !l.wall.free_end && on_the_edge(around, &storey.mark, l)) {
            for end in [line.from, line.to] {
                if all.iter().any(|o| o.wall.mark != line.wall.mark && touches(o, line, end)) {
                    continue;
                }
                let at = place(line.along, end, line.at);
                if out.iter().any(|o: &OpenEnd| o.mark == line.wall.mark && o.at == at) {
                    continue;
                }
                let others = all.iter().filter(|o| o.wall.mark != line.wall.mark);
                let nearest =
                    others.map(|o| (o.wall.mark.clone(), distance(o, at))).min_by(|a, b| a.1.total_cmp(&b.1));
                out.push(OpenEnd { mark: line.wall.mark.clone(), storey: storey.mark.clone(), at, nearest });
            }
        }
    }
    out
}

/// A point of the plan from its place along and across.
const fn place(along: Along, s: f64, at: f64) -> (f64, f64) {
    match along {
        Along::X => (s, at),
        Along::Y => (at, s),
    }
}

/// Whether `other` meets the end of `line` at `end`: across it there, or on in its line.
fn touches(other: &Line<'_>, line: &Line<'_>, end: f64) -> bool {
    let reach = REACH + line.thickness.max(other.thickness) / 2.0;
    if other.along == across(line.along) {
        (other.at - end).abs() <= reach && other.from - reach <= line.at && line.at <= other.to + reach
    } else {
        (other.at - line.at).abs() <= REACH && other.from - REACH <= end && end <= other.to + REACH
    }
}

/// From a wall to a point.
fn distance(line: &Line<'_>, (x, y): (f64, f64)) -> f64 {
    let (s, at) = if line.along == Along::X { (x, y) } else { (y, x) };
    (s - s.clamp(line.from, line.to)).hypot(at - line.at)
}

/// Whether floors lie on one side of the middle of a wall only.
fn on_the_edge(around: &Around<'_>, storey: &str, line: &Line<'_>) -> bool {
    let middle = (line.from + line.to) / 2.0;
    let step = line.thickness / 2.0 + REACH;
    let covered = |at: f64| super::storey::covered(around, storey, place(line.along, middle, at));
    covered(line.at - step) != covered(line.at + step)
}
