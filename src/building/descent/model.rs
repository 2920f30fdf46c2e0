//! The building as the descent of loads takes it: lines and areas, in mm and N.

use super::{Stack, stands_in};
use crate::building::found::REACH;
use crate::building::{Along, Building, PlanWall, heights};
use crate::quantity::Length;
use crate::solve::descent::{self, Axis, Floor, Model, Opening, Place, Wall};

/// What stands before the removal or `after` it, of loaded leaves alone with `leaf`.
pub(super) fn model(b: &Building, after: bool, leaf: bool) -> (Vec<Stack>, Model) {
    let number = |mark: &str| b.storeys.iter().position(|s| s.mark == mark);
    let mut m = Model { storeys: b.storeys.len(), reach: REACH, ..Model::default() };
    let mut stacks = Vec::new();
    for (i, wall) in b.plan.iter().enumerate() {
        if wall.removed && after {
            continue;
        }
        for (k, storey) in b.storeys.iter().enumerate() {
            if let (true, Some(one)) = (stands_in(b, wall, &storey.mark), led(b, wall, k, leaf)) {
                m.walls.push(one);
                stacks.push(Stack { wall: i, storey: k });
            }
        }
    }
    for f in &b.floors {
        let Some(load) = b.area_loads.iter().find(|a| a.name == f.load) else { continue };
        let range = |a: Length, b: Length| (a.base().min(b.base()), a.base().max(b.base()));
        m.floors.push(Floor {
            storey: number(&f.storey).unwrap_or(0),
            x: range(f.from.0, f.to.0),
            y: range(f.from.1, f.to.1),
            spans: axis(f.spans),
            load: [load.dead.base(), load.imposed.base(), load.uplift.base()],
        });
    }
    if after {
        for beam in &b.beams {
            if let Some(place) = line(beam.from, beam.to) {
                m.beams.push(descent::Beam {
                    storey: number(&beam.storey).unwrap_or(0),
                    place,
                    weight: beam.weight.base(),
                    bearing: beam.bearing.base(),
                });
            }
        }
    }
    (stacks, m)
}

/// A plan wall in storey `k`, of its loaded leaf alone with `leaf`; nothing where it lies neither along x nor along y.
fn led(b: &Building, wall: &PlanWall, k: usize, leaf: bool) -> Option<Wall> {
    let place = line(wall.from, wall.to)?;
    let build_up = b.build_up(&wall.build_up)?;
    let leaves = build_up.leaves.iter().filter(|l| l.loaded || !leaf);
    let per_area: f64 =
        leaves.filter_map(|l| Some(b.material(&l.material)?.density.base() * l.thickness.base())).sum();
    let thickness = build_up.thickness().base();
    let height = storey_height(b, k).base();
    let backwards = start(wall.from, wall.to) != place.from;
    let mut openings: Vec<Opening> = wall
        .openings
        .iter()
        .filter(|o| o.storey == b.storeys[k].mark)
        .map(|o| {
            let (a, z) = (o.from.base(), (o.from + o.width).base());
            let (from, to) =
                if backwards { (place.to - z, place.to - a) } else { (place.from + a, place.from + z) };
            let over = (height - (o.sill + o.height).base()).max(0.0);
            Opening { from, to, over: per_area * over, under: per_area * o.sill.base() }
        })
        .collect();
    openings.sort_by(|a, b| a.from.total_cmp(&b.from));
    Some(Wall { storey: k, place, thickness, weight: per_area * height, openings })
}

/// Height of wall from one floor to the next; the clear height under the roof.
pub fn storey_height(b: &Building, k: usize) -> Length {
    heights::storey_height(&b.storeys, k)
}

const fn axis(along: Along) -> Axis {
    match along {
        Along::X => Axis::X,
        Along::Y => Axis::Y,
    }
}

fn start(from: (Length, Length), to: (Length, Length)) -> f64 {
    if from.1 == to.1 { from.0.base() } else { from.1.base() }
}

/// Where a plan wall lies, if it lies along x or y.
pub fn line_of(wall: &PlanWall) -> Option<Place> {
    line(wall.from, wall.to)
}

/// A line along x or y.
fn line(from: (Length, Length), to: (Length, Length)) -> Option<Place> {
    let (a, z) = ((from.0.base(), from.1.base()), (to.0.base(), to.1.base()));
    if a.1 == z.1 {
        Some(Place { along: Axis::X, at: a.1, from: a.0.min(z.0), to: a.0.max(z.0) })
    } else if a.0 == z.0 {
        Some(Place { along: Axis::Y, at: a.0, from: a.1.min(z.1), to: a.1.max(z.1) })
    } else {
        None
    }
}
