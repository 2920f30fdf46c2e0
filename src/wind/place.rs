//! Where a panel lies on the outside of the whole building.

use crate::building::{Building, Panel, Side, Site, found};
use crate::quantity::Length;
use crate::quantity::functions::{max, min};
use crate::standards::tables::walls::Zone;

/// A panel on a side of the building.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct OnSide {
    /// The side.
    pub side: Side,
    /// From the corner towards lesser x or y to the nearer end of the panel, and from the other corner to its other end.
    pub from_corners: [Length; 2],
}

/// The rectangle of the whole building on the plan, neighbours included: x and y, from and to.
///
/// With one neighbour the building goes on beyond that side; with neighbours at both ends where it ends is not
/// known, and it is taken to end with the house, as if its corners were there: the safe side.
pub fn outline(b: &Building, site: &Site) -> [(Length, Length); 2] {
    let ends = extent(b);
    let along = |i: usize, size: Length, less: Side, more: Side| {
        let (low, high) = ends[i];
        let (has_less, has_more) = (b.neighbours.contains(&less), b.neighbours.contains(&more));
        match (has_less, has_more) {
            (true, false) => (min(high - size, low), high),
            (false, true) => (low, max(low + size, high)),
            _ => (low, high),
        }
    };
    [along(0, site.size.0, Side::Left, Side::Right), along(1, site.size.1, Side::Down, Side::Up)]
}

/// The rectangle round the walls of the plan: x and y, from and to. No rectangle where there are none.
pub fn extent(b: &Building) -> [(Length, Length); 2] {
    let mut ends = [(f64::INFINITY, f64::NEG_INFINITY); 2];
    for wall in &b.plan {
        let half = b.build_up(&wall.build_up).map_or(0.0, |u| u.thickness().base() / 2.0);
        for (x, y) in [wall.from, wall.to] {
            for (range, v) in ends.iter_mut().zip([x.base(), y.base()]) {
                range.0 = range.0.min(v - half);
                range.1 = range.1.max(v + half);
            }
        }
    }
    ends.map(|(low, high)| (Length::new(low), Length::new(high)))
}

/// Where the size of the building and the plan with its neighbours do not go together, in words.
pub fn odd(b: &Building) -> Vec<String> {
    let (Some(site), false) = (&b.wind.site, b.plan.is_empty()) else { return Vec::new() };
    let axes = [
        ("along_x", site.size.0, [Side::Left, Side::Right]),
        ("along_y", site.size.1, [Side::Down, Side::Up]),
    ];
    let mut words = Vec::new();
    for ((key, size, sides), (low, high)) in axes.into_iter().zip(extent(b)) {
        let alone = !sides.iter().any(|side| b.neighbours.contains(side));
        let (size, plan) = (size.base(), (high - low).base());
        let close = (size - plan).abs() <= CLOSE * plan;
        let fits = if alone { close } else { close || size > plan };
        if !fits {
            let neighbours =
                if alone { "without a neighbour on that axis" } else { "without its neighbours" };
            words.push(format!(
                "[wind.site] says {key} = {:.2} m, but the plan is {:.2} m long {neighbours}: see which is right",
                size / 1e3,
                plan / 1e3
            ));
        }
    }
    words
}

/// Part by which the size of the building may differ from its plan.
const CLOSE: f64 = 0.05;

/// Where a panel lies, as far as the plan says.
pub fn of(b: &Building, site: &Site, p: &Panel) -> Option<OnSide> {
    let on = p.on.as_ref()?;
    let (from, to) = p.after.ends?;
    let side = found::facing(b, on, (from + to) / 2.0)?;
    let [x, y] = outline(b, site);
    let (low, high) = match side {
        Side::Down | Side::Up => x,
        Side::Left | Side::Right => y,
    };
    let nil = |l: Length| if l < Length::ZERO { Length::ZERO } else { l };
    Some(OnSide { side, from_corners: [nil(from - low), nil(high - to)] })
}

/// The zone with the highest suction that a panel reaches, whose nearer end is `from` the windward corner;
/// `b` and `d` across and along the wind, `h` the height.
pub fn zone(from: Length, h: Length, b: Length, d: Length) -> Zone {
    let Ok(zones) = crate::standards::tables::walls::side_zones(h.base(), b.base(), d.base()) else {
        return Zone::A;
    };
    let z = zones.value;
    if from.base() < z.a || z.b <= 0.0 {
        Zone::A
    } else if from.base() < z.a + z.b || z.c <= 0.0 {
        Zone::B
    } else {
        Zone::C
    }
}
