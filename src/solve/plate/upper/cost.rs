//! The energy that a line takes.

use super::nodes::{Grid, Point};
use crate::solve::plate::{Held, Plate};

/// Energy for a rotation of 1 along a line from `p` to `q`, N mm; `held` for a piece of boundary.
pub fn cost(plate: &Plate<'_>, grid: &Grid, (p, q): (Point, Point), held: Option<Held>) -> f64 {
    match held {
        None => dissipation(plate, grid, p, q),
        Some(Held::Free | Held::Simple) => 0.0,
        // The wall itself cracks beside a support that is stronger than the wall.
        Some(Held::Continuous(m) | Held::Weight(m)) => {
            (m.max(0.0) * (q.0 - p.0).hypot(q.1 - p.1)).min(dissipation(plate, grid, p, q))
        }
    }
}

/// `m_n` along the line, N mm, with `m_n = m_H nx^2 + m_V ny^2` and n the normal of the line.
///
/// `m_V` is taken by two Gauss points on each piece between grid lines, exact where it is linear. The points lie
/// inside the pieces, so a jump at a grid line is never met along the line. An upright line on a jump needs no
/// choice of side, since `m_V` has no part in it. A level line takes `m_V` at its own height.
fn dissipation(plate: &Plate<'_>, grid: &Grid, p: Point, q: Point) -> f64 {
    let (dx, dy) = (q.0 - p.0, q.1 - p.1);
    let length = dx.hypot(dy);
    let vertical_cracks = plate.m_H * dy * dy / length;
    if dx == 0.0 {
        return vertical_cracks;
    }
    let m_v = |t: f64| (plate.m_V)(p.0 + t * dx, p.1 + t * dy).max(0.0);
    let offset = 0.5 / 3.0_f64.sqrt();
    let piece = |cut: &[f64]| {
        let (middle, width) = ((cut[0] + cut[1]) / 2.0, cut[1] - cut[0]);
        width / 2.0 * (m_v(middle - offset * width) + m_v(middle + offset * width))
    };
    let mean = cuts(grid, p, q).windows(2).map(piece).sum::<f64>();
    vertical_cracks + mean * dx * dx / length
}

/// Where the line meets grid lines, as parts of its length from 0 to 1.
fn cuts(grid: &Grid, p: Point, q: Point) -> Vec<f64> {
    let inside = |t: &f64| *t > 0.0 && *t < 1.0;
    let across = grid.xs.iter().map(|x| (x - p.0) / (q.0 - p.0));
    let up = grid.ys.iter().map(|y| (y - p.1) / (q.1 - p.1));
    let mut cuts = across.chain(up).filter(inside).collect::<Vec<_>>();
    cuts.extend([0.0, 1.0]);
    cuts.sort_by(f64::total_cmp);
    cuts
}
