//! Which walls the wind can reach across.

use crate::building::{Along, Building, Side};
use crate::checks::whole::levels;
use crate::checks::whole::lines::LINE;
use crate::solve::descent::{Axis, Place};

/// How far beyond its face one looks for a floor or a roof: farther than either may stand out, mm.
const BESIDE: f64 = 300.0;

/// Whether wind presses across a stretch of wall of storey `k`: somewhere along it one side has nothing
/// but outside, neither a floor or roof over it, of this storey or one above, nor a neighbour.
///
/// What the plan leaves out, a stair without a floor under a roof that is not given, counts as outside:
/// on the safe side.
pub fn in_the_wind(b: &Building, k: usize, place: Place, thickness: f64) -> bool {
    [false, true]
        .into_iter()
        .any(|upper| !neighbour(b, place, thickness, upper) && open(b, k, place, thickness, upper))
}

/// Whether a point beside the stretch has no floor and no roof over it.
fn open(b: &Building, k: usize, place: Place, thickness: f64, upper: bool) -> bool {
    let off = thickness / 2.0 + BESIDE;
    let across = if upper { place.at + off } else { place.at - off };
    let l = place.to - place.from;
    [0.05, 0.5, 0.95].into_iter().any(|part| {
        let s = place.from + part * l;
        let (x, y) = if place.along == Axis::X { (s, across) } else { (across, s) };
        !covered(b, k, x, y)
    })
}

/// Whether a floor or roof over storey `k`, or over one above it, lies over a point.
fn covered(b: &Building, k: usize, x: f64, y: f64) -> bool {
    let within = |a: f64, z: f64, at: f64| a.min(z) <= at && at <= a.max(z);
    b.floors.iter().any(|f| {
        let high_enough = b.storeys.iter().position(|s| s.mark == f.storey).is_some_and(|n| n >= k);
        high_enough && within(f.from.0.base(), f.to.0.base(), x) && within(f.from.1.base(), f.to.1.base(), y)
    })
}

/// Whether a neighbour adjoins on that side: it does so along the outermost line of the plan.
fn neighbour(b: &Building, place: Place, thickness: f64, upper: bool) -> bool {
    let (side, across) = match (place.along, upper) {
        (Axis::X, false) => (Side::Down, Along::X),
        (Axis::X, true) => (Side::Up, Along::X),
        (Axis::Y, false) => (Side::Left, Along::Y),
        (Axis::Y, true) => (Side::Right, Along::Y),
    };
    // Asked first: where the plan ends takes every wall of it.
    if !b.neighbours.contains(&side) {
        return false;
    }
    let (low, high) = levels::front(b, across);
    let face = if upper { high.base() - place.at } else { place.at - low.base() };
    face - thickness / 2.0 <= LINE
}
