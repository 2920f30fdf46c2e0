//! The upper side of a panel's collapse pressure: the weakest crack pattern that a grid of nodes allows.
//!
//! Discontinuity layout optimisation for plates: M. Gilbert, L. He, C. C. Smith and C. V. Le, Automatic
//! yield-line analysis of slabs using discontinuity layout optimization, Proc. R. Soc. A 470 (2014) 20140071.
//!
//! Every pair of nodes that see each other is a line that may crack. A linear programme picks the rotations
//! that fit together and take the least energy for the work that the wind does.
//!
//! * `nodes`: the grid, and which of its cells are solid
//! * `lines`: the lines that may crack
//! * `cost`: the energy that each takes
//! * `held`: pieces that nothing holds
//! * `work`: what the wind does on a line
//! * `modes`: how lines move, and how they fit together at nodes
//! * `programme`: the linear programme
//! * `pattern`: few long cracks for the drawing
//!
//! Lengths are in mm, moments per length in N (N mm/mm), pressures in N/mm2. Deflections are positive the way
//! the wind pushes.

mod cost;
mod held;
mod lines;
mod modes;
mod nodes;
mod pattern;
mod programme;
mod work;

use crate::solve::plate::{Plate, Trouble};
use lines::{Kind, Line, Reach};
use nodes::{Grid, Point};
use programme::Mechanism;

/// A line along which the panel turns.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Crack {
    /// One end, mm.
    pub from: Point,
    /// The other end, mm; to the right of `from`, or above it.
    pub to: Point,
    /// How far it opens against the widest one, which is 1: positive for sagging, negative for hogging.
    pub rotation: f64,
    /// Whether it lies on a support.
    pub hinge: bool,
}

/// What the mechanism gives.
#[derive(Clone, Debug)]
pub struct Upper {
    /// Collapse pressure, N/mm2: no smaller than the true one of the plate as described.
    pub pressure: f64,
    /// Every line that turns by more than a thousandth of the largest rotation. Drawings take [`pattern`].
    pub lines: Vec<Crack>,
    /// Number of nodes.
    pub nodes: usize,
    /// Number of potential lines.
    pub potential: usize,
    /// What lies below a line less what lies above it, for [`Upper::deflection`].
    jumps: Vec<Jump>,
}

/// The step in deflection across a line.
#[derive(Clone, Copy, Debug)]
struct Jump {
    from: Point,
    to: Point,
    /// Deflection at `from` (mm) and slopes along x and y, the side on the right less the side on the left.
    step: [f64; 3],
}

/// The spacing of nodes that keeps a panel both quick and close: a sixteenth of its longer side, mm.
pub fn usual_spacing(plate: &Plate<'_>) -> f64 {
    plate.l.max(plate.h) / 16.0
}

/// The collapse pressure and its mechanism, with nodes at most `spacing` (mm) apart.
///
/// A spacing that is not a positive number becomes [`usual_spacing`].
///
/// # Errors
/// [`Trouble::Floating`] for a piece without support, [`Trouble::NotSolved`] where the programme has no answer.
pub fn upper(plate: &Plate<'_>, spacing: f64) -> Result<Upper, Trouble> {
    let (grid, lines) = prepare(plate, spacing, Reach::Nearest)?;
    let found = programme::solve(plate, &grid, &lines, 0.0)?;
    let largest = found.largest(&lines);
    let jumps = lines.iter().zip(&found.steps).map(|(line, step)| Jump {
        from: grid.points[line.a],
        to: grid.points[line.b],
        step: step.map(|s| s / largest),
    });
    Ok(Upper {
        pressure: found.pressure,
        lines: cracks(&grid, &lines, &found, 1e-3),
        nodes: grid.points.len(),
        potential: lines.len(),
        jumps: jumps.collect(),
    })
}

/// Few long cracks that collapse the panel at nearly the least pressure, for drawing.
///
/// # Errors
/// As for [`upper`].
pub fn pattern(plate: &Plate<'_>, spacing: f64) -> Result<Vec<Crack>, Trouble> {
    let (grid, lines) = prepare(plate, spacing, Reach::All)?;
    let found = programme::solve(plate, &grid, &lines, pattern::JOINT * plate.h)?;
    Ok(pattern::tidy(&cracks(&grid, &lines, &found, 1e-3), plate.l.max(plate.h)))
}

impl Upper {
    /// Deflection of the mechanism at points of the solid, mm for a largest rotation of 1.
    ///
    /// Adds the steps met on the way straight up out of the panel. A point on the side of an opening counts
    /// to its right, so take points inside the solid, for instance the middles of grid cells.
    pub fn deflection(&self, points: &[Point]) -> Vec<f64> {
        points.iter().map(|&p| self.jumps.iter().map(|jump| jump.at(p)).sum()).collect()
    }
}

impl Jump {
    /// The step as `p` feels it: nothing unless the line passes above.
    fn at(&self, p: Point) -> f64 {
        let (a, b) = (self.from, self.to);
        let above = a.0 <= p.0 && p.0 < b.0 && nodes::height(a, b, p.0) > p.1;
        if above { self.step[0] + self.step[1] * (p.0 - a.0) + self.step[2] * (p.1 - a.1) } else { 0.0 }
    }
}

/// The grid and the lines, once every piece is known to be held.
fn prepare(plate: &Plate<'_>, spacing: f64, reach: Reach) -> Result<(Grid, Vec<Line>), Trouble> {
    let spacing = if spacing.is_finite() && spacing > 0.0 { spacing } else { usual_spacing(plate) };
    let grid = Grid::new(plate, spacing);
    let lines = lines::all(plate, &grid, reach);
    held::check(&grid, &lines)?;
    Ok((grid, lines))
}

/// The lines that turn by more than `least` of the largest rotation; free edges turn without cracking.
fn cracks(grid: &Grid, lines: &[Line], found: &Mechanism, least: f64) -> Vec<Crack> {
    let largest = found.largest(lines);
    let turning = lines
        .iter()
        .zip(&found.rotations)
        .filter(|(line, turn)| line.kind != Kind::Free && turn.abs() > least * largest);
    turning
        .map(|(line, turn)| Crack {
            from: grid.points[line.a],
            to: grid.points[line.b],
            rotation: turn / largest,
            hinge: line.kind == Kind::Hinge,
        })
        .collect()
}
