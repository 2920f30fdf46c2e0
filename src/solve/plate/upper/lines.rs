//! The lines that may crack.

use super::cost::cost;
use super::nodes::{Grid, Point};
use crate::solve::plate::{Held, Opening, Plate, Stretch};

/// What a line can do.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Kind {
    /// Crosses the solid: it opens like a crack.
    Crack,
    /// On a support: it turns and does not move.
    Hinge,
    /// On a free edge or the edge of an opening: it turns, twists and moves at no cost.
    Free,
}

/// A potential line between two nodes.
pub struct Line {
    /// Node on the left, or the lower one of an upright line.
    pub a: usize,
    /// The other node.
    pub b: usize,
    /// What it can do.
    pub kind: Kind,
    /// Energy for a rotation of 1, N mm.
    pub cost: f64,
}

/// How far lines go.
#[derive(Clone, Copy, PartialEq, Eq)]
pub enum Reach {
    /// To the nearest node in each direction: longer lines are sums of these.
    Nearest,
    /// Past nodes too, so that a price for each line favours long ones.
    All,
}

/// Nodes whose directions differ by less than this angle are in line (rad).
const IN_LINE: f64 = 1e-9;

/// Every potential line of the plate.
pub fn all(plate: &Plate<'_>, grid: &Grid, reach: Reach) -> Vec<Line> {
    let mut lines = Vec::new();
    for a in 0..grid.points.len() {
        for b in seen(grid, a, reach) {
            if let Some((kind, held)) = kind(plate, grid, a, b) {
                let cost = cost(plate, grid, (grid.points[a], grid.points[b]), held);
                lines.push(Line { a, b, kind, cost });
            }
        }
    }
    lines
}

/// Nodes after `a` in number that may be the other end of a line.
fn seen(grid: &Grid, a: usize, reach: Reach) -> Vec<usize> {
    let from = grid.points[a];
    let later = (a + 1..grid.points.len()).map(|b| {
        let (dx, dy) = (grid.points[b].0 - from.0, grid.points[b].1 - from.1);
        (dy.atan2(dx), dx.hypot(dy), b)
    });
    if reach == Reach::All {
        return later.map(|(_, _, b)| b).collect();
    }
    // An uneven grid has no greatest common divisor, so nodes in line are found by their direction.
    let mut later = later.collect::<Vec<_>>();
    later.sort_by(|p, q| p.0.total_cmp(&q.0));
    let in_line = later.chunk_by(|p, q| q.0 - p.0 < IN_LINE);
    in_line.filter_map(|row| row.iter().min_by(|p, q| p.1.total_cmp(&q.1))).map(|nearest| nearest.2).collect()
}

/// What the line between two nodes can do, and how it is held if it is boundary; `None` where it is no line.
fn kind(plate: &Plate<'_>, grid: &Grid, a: usize, b: usize) -> Option<(Kind, Option<Held>)> {
    let ((i, j), (k, m)) = (grid.at[a], grid.at[b]);
    if i != k && j != m {
        let (p, q) = (grid.points[a], grid.points[b]);
        let blocked = plate.openings.iter().any(|o| crosses(o, p, q));
        return (!blocked).then_some((Kind::Crack, None));
    }
    // Along a grid line: the cells on both sides of each step tell.
    let upright = i == k;
    let steps = (k - i) + (m - j);
    let sides = |step: usize| {
        let (start, beside) = if upright { ((i, j + step), (1, 0)) } else { ((i + step, j), (0, 1)) };
        usize::from(grid.is_solid(start, (0, 0))) + usize::from(grid.is_solid(start, beside))
    };
    match (0..steps).map(sides).min() {
        Some(2) => Some((Kind::Crack, None)),
        Some(1) if steps == 1 => {
            let held = held(plate, grid, a, b);
            Some((if held == Held::Free { Kind::Free } else { Kind::Hinge }, Some(held)))
        }
        _ => None,
    }
}

/// Whether the line from `p` to `q`, neither level nor upright, passes through the opening.
fn crosses(opening: &Opening, p: Point, q: Point) -> bool {
    let part = |from: f64, to: f64, (low, high): (f64, f64)| {
        let (s, t) = ((low - from) / (to - from), (high - from) / (to - from));
        (s.min(t), s.max(t))
    };
    let (x, y) = (part(p.0, q.0, opening.x), part(p.1, q.1, opening.y));
    x.1.min(y.1).min(1.0) - x.0.max(y.0).max(0.0) > 1e-6
}

/// How a piece of boundary is held.
fn held(plate: &Plate<'_>, grid: &Grid, a: usize, b: usize) -> Held {
    let ((i, j), (k, m)) = (grid.at[a], grid.at[b]);
    let (columns, rows) = grid.cells();
    let (edge, upright) = match () {
        () if i == k && i == 0 => (0, true),
        () if i == k && i == columns => (1, true),
        () if j == m && j == 0 => (2, false),
        () if j == m && j == rows => (3, false),
        () => return Held::Free, // the edge of an opening
    };
    let (p, q) = (grid.points[a], grid.points[b]);
    let middle = if upright { (p.1 + q.1) / 2.0 } else { (p.0 + q.0) / 2.0 };
    let here = |s: &&Stretch| s.from <= middle && middle <= s.to;
    plate.edges[edge].iter().find(here).map_or(Held::Free, |s| s.held)
}
