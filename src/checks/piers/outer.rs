//! Which walls the wind can reach across.

use super::around::Around;
use crate::building::{Along, Building, Side};
use crate::checks::whole::lines::LINE;
use crate::solve::descent::{Axis, Place};

/// How far beyond its face one looks for a floor or a roof: farther than either may stand out, mm.
const BESIDE: f64 = 300.0;

/// Whether wind presses across a stretch of wall of storey `k`: somewhere along it one side has nothing
/// but outside, neither a floor or roof over it, of this storey or one above, nor a neighbour.
///
/// What the plan leaves out, a stair without a floor under a roof that is not given, counts as outside:
/// on the safe side.
pub fn in_the_wind(b: &Building, around: &Around, k: usize, place: Place, thickness: f64) -> bool {
    [false, true].into_iter().any(|upper| {
        !neighbour(b, around, place, thickness, upper) && open(around, k, place, thickness, upper)
    })
}

/// Whether a point beside the stretch has no floor and no roof over it.
fn open(around: &Around, k: usize, place: Place, thickness: f64, upper: bool) -> bool {
    let off = thickness / 2.0 + BESIDE;
    let across = if upper { place.at + off } else { place.at - off };
    let l = place.to - place.from;
    [0.05, 0.5, 0.95].into_iter().any(|part| {
        let s = place.from + part * l;
        let (x, y) = if place.along == Axis::X { (s, across) } else { (across, s) };
        !around.covered(k, x, y)
    })
}

/// Whether a neighbour adjoins on that side: it does so along the outermost line of the plan.
fn neighbour(b: &Building, around: &Around, place: Place, thickness: f64, upper: bool) -> bool {
    let (side, across) = match (place.along, upper) {
        (Axis::X, false) => (Side::Down, Along::X),
        (Axis::X, true) => (Side::Up, Along::X),
        (Axis::Y, false) => (Side::Left, Along::Y),
        (Axis::Y, true) => (Side::Right, Along::Y),
    };
    if !b.neighbours.contains(&side) {
        return false;
    }
    let (low, high) = around.front(across);
    let face = if upper { high - place.at } else { place.at - low };
    face - thickness / 2.0 <= LINE
}
