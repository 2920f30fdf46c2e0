//! Wind and tilt of every level of the building in one direction.

use crate::building::{Along, Building, TakeDown, line_of, storey_height, strip_height};
use crate::quantity::{Force, Length, Moment};
use crate::solve::descent::Axis;
use crate::wind::Wind;

/// The head of a storey.
#[derive(Clone, Debug)]
pub struct Level {
    /// Place of the storey under it in the building.
    pub storey: usize,
    /// Extent of the wind face across the wind: where it begins and how long it is.
    pub begin: Length,
    /// Its length.
    pub front: Length,
    /// Height of wind face collected.
    pub strip: Length,
    /// Part of the roof in the wind of the level; nil where the roof is an upright face.
    pub F_roof: Force,
    /// Characteristic wind of the level, with the roof.
    pub F_k: Force,
    /// Characteristic wind of this level and all above it.
    pub F_above: Force,
    /// Moment of the levels above about this one, characteristic.
    pub M_above: Moment,
    /// Dead load that passes the head of the storey.
    pub dead: Force,
    /// Imposed load that passes it.
    pub imposed: Force,
}

/// The direction of a plan's lengths that lie along the wind.
pub const fn axis(along: Along) -> Axis {
    match along {
        Along::X => Axis::X,
        Along::Y => Axis::Y,
    }
}

/// Levels of the building for wind along `along`, lowest first.
pub fn of(b: &Building, down: &TakeDown, along: Along, wind: &Wind) -> Vec<Level> {
    let roof = wind.roof(along);
    let (begin, end) = front(b, along);
    let n = b.storeys.len();
    let top = |k: usize| k + 1 == n;
    let strip = |k: usize| match roof {
        // Up to the ceiling, and half of a gable; the slopes bring their own part.
        Some(r) if top(k) => storey_height(b, k) / 2.0 + r.gable / 2.0,
        _ => strip_height(&b.storeys, k),
    };
    let mut out: Vec<Level> = Vec::new();
    let (mut F_above, mut M_above) = (Force::ZERO, Moment::ZERO);
    for k in (0..n).rev() {
        // What is above turns about this level by the height of the storey between.
        M_above =
            out.last().map_or(Moment::ZERO, |up: &Level| M_above + up.F_above * storey_height(b, k + 1));
        let F_roof = roof.filter(|_| top(k)).map_or(Force::ZERO, |r| r.force * (end - begin));
        let F_k = wind.level(b, along, k).overall * (end - begin) * strip(k) + F_roof;
        F_above = F_above + F_k;
        let load = passing(down, k);
        out.push(Level {
            storey: k,
            begin,
            front: end - begin,
            strip: strip(k),
            F_roof,
            F_k,
            F_above,
            M_above,
            dead: Force::new(load[0]),
            imposed: Force::new(load[1]),
        });
    }
    out.reverse();
    out
}

/// Dead and imposed load that passes the heads of all walls of storey `k`, after the removal.
fn passing(down: &TakeDown, k: usize) -> [f64; 2] {
    let state = &down.after;
    let here = state.walls.iter().zip(&state.down.walls).filter(|(s, _)| s.storey == k);
    here.fold([0.0; 2], |sum, (_, on)| {
        let load = on.head.total();
        [sum[0] + load[0], sum[1] + load[1]]
    })
}

/// Extent of the building across the wind, faces of its walls included.
pub fn front(b: &Building, along: Along) -> (Length, Length) {
    let across = axis(along).across();
    let mut ends = (f64::INFINITY, f64::NEG_INFINITY);
    for wall in &b.plan {
        let Some(place) = line_of(wall) else { continue };
        let half = b.build_up(&wall.build_up).map_or(0.0, |u| u.thickness().base() / 2.0);
        let (low, high) =
            if place.along == across { (place.from, place.to) } else { (place.at - half, place.at + half) };
        ends = (ends.0.min(low), ends.1.max(high));
    }
    (Length::new(ends.0), Length::new(ends.1))
}
