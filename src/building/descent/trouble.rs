//! A load that does not reach the ground, told by the marks of the job.

use super::Stack;
use crate::building::Building;
use crate::solve::descent::{self, Axis, Model, Place};

/// A load that does not reach the ground, with what it is of.
#[derive(Clone, Debug, PartialEq)]
pub struct Trouble {
    /// Mark of the floor, wall or beam.
    pub mark: String,
    /// What is wrong, in words.
    pub what: String,
    /// Whether it is so with the wall out.
    pub after: bool,
    /// A small sketch: the supports in order along the line looked at.
    pub sketch: String,
}

pub(super) fn named(
    b: &Building,
    walls: &[Stack],
    m: &Model,
    trouble: descent::Trouble,
    after: bool,
) -> Trouble {
    let metres = |x: f64| format!("{:.2} m", x / 1000.0);
    let wall = |i: usize| &b.plan[walls[i].wall].mark;
    let (mark, what, sketch) = match trouble {
        descent::Trouble::FloorFloats { floor, from, to } => {
            let f = &m.floors[floor];
            let across = if f.spans == Axis::X { "y" } else { "x" };
            let what = format!(
                "the floor has no support at an edge over {across} = {} to {}",
                metres(from),
                metres(to)
            );
            (b.floors[floor].mark.clone(), what, strip(b, walls, m, floor, (from + to) / 2.0))
        }
        descent::Trouble::WallFloats { wall: w, from, to } => (
            wall(w).clone(),
            format!(
                "in storey \"{}\" nothing stands under it from {} to {} of the plan",
                b.storeys[walls[w].storey].mark,
                metres(from),
                metres(to)
            ),
            String::new(),
        ),
        descent::Trouble::BeamFloats { beam, end } => {
            let at = if end == 0 { b.beams[beam].from } else { b.beams[beam].to };
            (
                b.beams[beam].mark.clone(),
                format!(
                    "the end near ({}, {}) has no bearing: no wall and no beam is under it",
                    metres(at.0.base()),
                    metres(at.1.base())
                ),
                String::new(),
            )
        }
        descent::Trouble::NoJamb { wall: w, opening } => (
            wall(w).clone(),
            format!("opening {} leaves no wall beside it to carry what is over it", opening + 1),
            String::new(),
        ),
        descent::Trouble::Ring { beam } => {
            (b.beams[beam].mark.clone(), "beams carry each other in a ring".to_owned(), String::new())
        }
    };
    Trouble { mark, what, after, sketch }
}

/// The supports of a floor in order along its span, at one place across it:
/// `0.00 |party wall ---- 3.20 |kitchen wall ---- 6.40 nothing`.
fn strip(b: &Building, walls: &[Stack], m: &Model, floor: usize, across: f64) -> String {
    let f = &m.floors[floor];
    let (span, along) = if f.spans == Axis::X { (f.x, Axis::Y) } else { (f.y, Axis::X) };
    let covers = |p: Place| {
        p.along == along
            && p.from <= across
            && across <= p.to
            && span.0 - m.reach <= p.at
            && p.at <= span.1 + m.reach
    };
    let mut found: Vec<(f64, String)> = Vec::new();
    for (i, w) in m.walls.iter().enumerate().filter(|(_, w)| w.storey == f.storey && covers(w.place)) {
        found.push((w.place.at, b.plan[walls[i].wall].mark.clone()));
    }
    for (i, beam) in m.beams.iter().enumerate().filter(|(_, x)| x.storey == f.storey && covers(x.place)) {
        found.push((beam.place.at, b.beams[i].mark.clone()));
    }
    for edge in [span.0, span.1] {
        if !found.iter().any(|(at, _)| (at - edge).abs() <= m.reach) {
            found.push((edge, "nothing".to_owned()));
        }
    }
    found.sort_by(|a, b| a.0.total_cmp(&b.0));
    let parts: Vec<String> = found.iter().map(|(at, name)| format!("{:.2} |{name}", at / 1000.0)).collect();
    parts.join(" ------ ")
}
