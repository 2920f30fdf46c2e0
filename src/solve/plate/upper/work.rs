//! The work of a unit pressure on a line.
//!
//! The deflection of a point is the sum of the steps at the lines met on the way straight up out of the panel.
//! So each line counts the load that lies below it. Its work needs that load and the first moments of it.

use super::nodes::{Point, height};
use crate::solve::plate::{Carry, Opening, Plate};

/// A load that has a closed form.
enum Part {
    /// `q` per area over a rectangle.
    Area { x: (f64, f64), y: (f64, f64), q: f64 },
    /// `q` per height along an upright line, on the solid to its right or left.
    Upright { x: f64, y: (f64, f64), q: f64, right: bool },
    /// `q` per length along a level line, on the solid above or below it.
    Level { x: (f64, f64), y: f64, q: f64, above: bool },
}

/// The loads of a unit pressure.
pub struct Loads(Vec<Part>);

impl Loads {
    /// The solid and what the openings pass on.
    pub fn new(plate: &Plate<'_>) -> Self {
        let mut parts = vec![Part::Area { x: (0.0, plate.l), y: (0.0, plate.h), q: 1.0 }];
        for opening in &plate.openings {
            parts.push(Part::Area { x: opening.x, y: opening.y, q: -1.0 });
            parts.extend(frame(plate, opening));
        }
        Self(parts)
    }

    /// Load below the line from `a` to `b` (mm2) and its first moments along x and y about `a` (mm3).
    pub fn below(&self, a: Point, b: Point) -> [f64; 3] {
        let mut sum = [0.0; 3];
        // No way up crosses an upright line.
        if b.0 > a.0 {
            for part in &self.0 {
                add(&mut sum, part.below(a, b), 1.0);
            }
        }
        [sum[0], sum[1] - a.0 * sum[0], sum[2] - a.1 * sum[0]]
    }
}

/// The line loads on the edges of an opening.
///
/// An edge that lies on the edge of the panel has no wall to load: its share goes to the others. An opening from base
/// to top has neither head nor sill, and its wind goes to the jambs.
fn frame(plate: &Plate<'_>, opening: &Opening) -> Vec<Part> {
    let (x, y) = (opening.x, opening.y);
    let (width, rise) = (x.1 - x.0, y.1 - y.0);
    let near = 1e-9 * plate.l.max(plate.h);
    let whole = y.0 <= near && y.1 >= plate.h - near;
    let mut edges = Vec::new();
    if matches!(opening.carry, Carry::Jambs | Carry::AllRound)
        || (opening.carry == Carry::HeadAndSill && whole)
    {
        let jambs = [(x.0, false, x.0 > near), (x.1, true, x.1 < plate.l - near)];
        let real = jambs.into_iter().filter(|jamb| jamb.2);
        edges.extend(real.map(|(x, right, _)| (rise, Part::Upright { x, y, q: 1.0, right })));
    }
    if matches!(opening.carry, Carry::HeadAndSill | Carry::AllRound) {
        let levels = [(y.0, false, y.0 > near), (y.1, true, y.1 < plate.h - near)];
        let real = levels.into_iter().filter(|level| level.2);
        edges.extend(real.map(|(y, above, _)| (width, Part::Level { x, y, q: 1.0, above })));
    }
    let around = edges.iter().map(|edge| edge.0).sum::<f64>();
    edges.into_iter().map(|(_, part)| part.times(width * rise / around)).collect()
}

impl Part {
    fn times(self, factor: f64) -> Self {
        match self {
            Self::Area { x, y, q } => Self::Area { x, y, q: q * factor },
            Self::Upright { x, y, q, right } => Self::Upright { x, y, q: q * factor, right },
            Self::Level { x, y, q, above } => Self::Level { x, y, q: q * factor, above },
        }
    }

    /// Load below the line and its first moments about the corner of the panel.
    fn below(&self, a: Point, b: Point) -> [f64; 3] {
        match *self {
            Self::Area { x, y, q } => area(a, b, x, y).map(|v| v * q),
            Self::Upright { x, y, q, right } => {
                let within = if right { a.0 <= x && x < b.0 } else { a.0 < x && x <= b.0 };
                if within { column(a, b, x, y).map(|v| v * q) } else { [0.0; 3] }
            }
            Self::Level { x, y, q, above } => level(a, b, x, y, above).map(|v| v * q),
        }
    }
}

/// The part of the upright at `x` that lies below the line: length and first moments.
fn column(a: Point, b: Point, x: f64, y: (f64, f64)) -> [f64; 3] {
    let top = height(a, b, x).clamp(y.0, y.1);
    [top - y.0, x * (top - y.0), (top * top - y.0 * y.0) / 2.0]
}

/// The part of a rectangle that lies below the line: uprights summed over x.
fn area(a: Point, b: Point, x: (f64, f64), y: (f64, f64)) -> [f64; 3] {
    let mut sum = [0.0; 3];
    for cut in pieces(a, b, x, &[y.0, y.1]).windows(2) {
        // On each piece the integrand is at most quadratic, so Simpson's rule is exact.
        let width = cut[1] - cut[0];
        for (at, weight) in [(cut[0], 1.0), ((cut[0] + cut[1]) / 2.0, 4.0), (cut[1], 1.0)] {
            add(&mut sum, column(a, b, at, y), weight * width / 6.0);
        }
    }
    sum
}

/// The part of a level load that lies below the line. A load on the solid below it is also below a line along it.
fn level(a: Point, b: Point, x: (f64, f64), y: f64, above: bool) -> [f64; 3] {
    let near = 1e-7 * (b.0 - a.0);
    let mut sum = [0.0; 3];
    for cut in pieces(a, b, x, &[y]).windows(2) {
        let (u, v) = (cut[0], cut[1]);
        let clear = height(a, b, (u + v) / 2.0) - y;
        if clear > if above { near } else { -near } {
            add(&mut sum, [v - u, (v * v - u * u) / 2.0, y * (v - u)], 1.0);
        }
    }
    sum
}

/// The stretch that the line and `x` share, cut where the line passes one of the `levels`.
fn pieces(a: Point, b: Point, x: (f64, f64), levels: &[f64]) -> Vec<f64> {
    let (from, to) = (a.0.max(x.0), b.0.min(x.1));
    if from >= to {
        return Vec::new();
    }
    let meets = levels.iter().map(|y| a.0 + (y - a.1) / (b.1 - a.1) * (b.0 - a.0));
    let mut cuts = meets.filter(|at| from < *at && *at < to).collect::<Vec<_>>();
    cuts.extend([from, to]);
    cuts.sort_by(f64::total_cmp);
    cuts
}

fn add(sum: &mut [f64; 3], more: [f64; 3], times: f64) {
    for (s, m) in sum.iter_mut().zip(more) {
        *s += m * times;
    }
}
