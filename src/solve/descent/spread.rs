//! Floors to the walls and beams under them.

use super::load::{Line, times};
use super::{Axis, Floor, From, Model, Place, Support, Trouble};

/// Walls and beams of every storey by direction, sorted by their place across.
pub struct Under {
    /// For each storey and direction.
    lists: Vec<[Vec<(f64, Support)>; 2]>,
}

const fn slot(axis: Axis) -> usize {
    match axis {
        Axis::X => 0,
        Axis::Y => 1,
    }
}

impl Under {
    /// Sorts what stands.
    pub fn new(model: &Model) -> Self {
        let mut lists = vec![[Vec::new(), Vec::new()]; model.storeys];
        let walls = model.walls.iter().enumerate().map(|(i, w)| (w.storey, w.place, Support::Wall(i)));
        let beams = model.beams.iter().enumerate().map(|(i, b)| (b.storey, b.place, Support::Beam(i)));
        for (storey, place, support) in walls.chain(beams) {
            if let Some(list) = lists.get_mut(storey) {
                list[slot(place.along)].push((place.at, support));
            }
        }
        for list in lists.iter_mut().flatten() {
            list.sort_by(|a, b| a.0.total_cmp(&b.0));
        }
        Self { lists }
    }

    /// Those of a storey and direction whose place across lies between two others.
    pub fn between(&self, storey: usize, along: Axis, low: f64, high: f64) -> &[(f64, Support)] {
        let Some(list) = self.lists.get(storey).map(|l| &l[slot(along)]) else { return &[] };
        let first = list.partition_point(|(at, _)| *at < low);
        let last = list.partition_point(|(at, _)| *at <= high);
        &list[first..last.max(first)]
    }
}

/// Where a support lies.
pub fn place_of(model: &Model, support: Support) -> Place {
    match support {
        Support::Wall(i) => model.walls[i].place,
        Support::Beam(i) => model.beams[i].place,
    }
}

/// The loads that floor `n` puts on its supports.
///
/// # Errors
/// [`Trouble::FloorFloats`] over a stretch where its first or last support lies farther from its edge
/// than the model's reach, or where it has fewer than two.
pub fn floor(model: &Model, under: &Under, n: usize) -> Result<Vec<(Support, Line)>, Trouble> {
    let floor = &model.floors[n];
    let (span, wide) = extents(floor);
    let (low, high) = (span.0 - model.reach, span.1 + model.reach);
    let near = under.between(floor.storey, floor.spans.across(), low, high);
    let mut cuts = vec![wide.0, wide.1];
    for &(_, support) in near {
        let place = place_of(model, support);
        cuts.extend([place.from, place.to].into_iter().filter(|c| wide.0 < *c && *c < wide.1));
    }
    cuts.sort_by(f64::total_cmp);
    cuts.dedup();
    let mut out: Vec<(Support, Line)> = Vec::new();
    for pair in cuts.windows(2) {
        let (from, to) = (pair[0], pair[1]);
        let here = supports(model, near, from, to);
        if !reaches(&here, span, model.reach) {
            // The whole stretch is named, however many pieces of it float.
            let floats = |c: &&[f64]| !reaches(&supports(model, near, c[0], c[1]), span, model.reach);
            let end = cuts.windows(2).filter(|c| c[0] >= from).take_while(floats).last().map_or(to, |c| c[1]);
            return Err(Trouble::FloorFloats { floor: n, from, to: end });
        }
        for (i, &(at, support)) in here.iter().enumerate() {
            // Half of each span; what stands out beyond the last support is its own.
            let left = if i == 0 { at - span.0 } else { (at - here[i - 1].0) / 2.0 };
            let right = here.get(i + 1).map_or(span.1 - at, |next| (next.0 - at) / 2.0);
            let load = times(floor.load, left + right);
            // Beyond its last support a floor only lies on the wall's own thickness.
            let low = match i {
                0 => 0.0,
                _ if i + 1 == here.len() => 1.0,
                _ => left / (left + right),
            };
            let low = Some(low);
            // What goes on as it was is one load.
            let goes_on = |(s, l): &&mut (Support, Line)| {
                *s == support && l.to == from && l.load == load && l.low == low
            };
            match out.iter_mut().rev().take(near.len()).find(goes_on) {
                Some((_, line)) => line.to = to,
                None => out.push((support, Line { from, to, load, by: From::Floor(n), low })),
            }
        }
    }
    Ok(out)
}

/// Whether supports carry a floor from edge to edge.
fn reaches(here: &[(f64, Support)], span: (f64, f64), reach: f64) -> bool {
    let (Some(first), Some(last)) = (here.first(), here.last()) else { return false };
    here.len() > 1 && first.0 - span.0 <= reach && span.1 - last.0 <= reach
}

/// Extent along the span, and across it.
const fn extents(floor: &Floor) -> ((f64, f64), (f64, f64)) {
    match floor.spans {
        Axis::X => (floor.x, floor.y),
        Axis::Y => (floor.y, floor.x),
    }
}

/// Supports that pass under the whole stretch, in order across; of two in one line the beam, which
/// bears on the wall.
fn supports(model: &Model, near: &[(f64, Support)], from: f64, to: f64) -> Vec<(f64, Support)> {
    let mut out: Vec<(f64, Support)> = Vec::new();
    for &(at, support) in near {
        let place = place_of(model, support);
        if place.from > from || place.to < to {
            continue;
        }
        match out.last_mut() {
            Some(last) if at - last.0 <= model.reach / 4.0 => {
                if matches!(support, Support::Beam(_)) {
                    *last = (at, support);
                }
            }
            _ => out.push((at, support)),
        }
    }
    out
}
