//! The grid lines of the mesh along one direction.

use crate::solve::plate::{Held, Plate, Stretch};

/// Two places nearer than this part of the longer side of the panel are one place.
const SAME: f64 = 1e-6;

/// The length below which two places of the panel are one, mm.
pub fn same(plate: &Plate<'_>) -> f64 {
    SAME * plate.l.max(plate.h)
}

/// The lines across x and across y, mm, no two further apart than `spacing`.
///
/// The shorter side of the panel is cut at least half as often as the longer, for it may span alone.
pub fn grid(plate: &Plate<'_>, spacing: f64) -> (Vec<f64>, Vec<f64>) {
    let [left, right, base, top] = &plate.edges;
    let ends = |a: &[Stretch], b: &[Stretch]| -> Vec<f64> {
        a.iter().chain(b).flat_map(|s| [s.from, s.to]).collect()
    };
    let mut x = ends(base, top);
    let mut y = ends(left, right);
    for o in &plate.openings {
        x.extend([o.x.0, o.x.1]);
        y.extend([o.y.0, o.y.1]);
    }
    let same = same(plate);
    let lines = |fixed, side: f64| {
        let finer = 2.0 * spacing * side / plate.l.max(plate.h);
        divided(fixed, side, spacing.min(finer), same)
    };
    (lines(x, plate.l), lines(y, plate.h))
}

/// 0, `end` and the `fixed` places between them in order, each gap cut evenly.
fn divided(mut fixed: Vec<f64>, end: f64, spacing: f64, same: f64) -> Vec<f64> {
    fixed.retain(|&at| at > same && at < end - same);
    fixed.push(end);
    fixed.sort_by(f64::total_cmp);
    fixed.dedup_by(|later, earlier| *later - *earlier < same);
    let mut lines = vec![0.0];
    let mut from = 0.0;
    for to in fixed {
        // Even: the load stands at the nodes, and a span with no node in its middle would miss its peak.
        // Two at least: one step across a pier could not bend and turn at once.
        let steps = 2 * (((to - from) / spacing / 2.0 - 1e-9).ceil() as usize).max(1);
        lines.extend((1..=steps).map(|i| from + (to - from) * i as f64 / steps as f64));
        from = to;
    }
    lines
}

/// The stretch of `edge` (0 left, 1 right, 2 base, 3 top) at the place `at`, unless it is free there.
pub fn held_at(plate: &Plate<'_>, edge: usize, at: f64) -> Option<usize> {
    let stretches = plate.edges.get(edge)?;
    let found = stretches.iter().position(|s| s.from <= at && at <= s.to)?;
    (stretches[found].held != Held::Free).then_some(found)
}
