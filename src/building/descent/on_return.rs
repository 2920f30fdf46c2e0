//! What arrives at the head of a return after the removal.

use super::{LED, TakeDown};
use crate::building::{Building, Load, PlanWall};
use crate::quantity::{Force, Length};
use crate::solve::descent::{self, Axis, From, Place};

impl TakeDown {
    /// Loads at the head of the return marked `mark`, a wall of the plan, after the removal: one entry for
    /// everything that brings some, its place from the junction end.
    pub fn on_return(&self, b: &Building, mark: &str, storey: usize) -> Vec<Load> {
        let Some((wall, on)) = self.on_leaf.wall(b, mark, storey) else { return Vec::new() };
        let Place { along, at, from, to } = wall.place;
        let end = |s: f64| match along {
            Axis::X => (s, at),
            Axis::Y => (at, s),
        };
        // The junction lies at the end nearer to the wall met.
        let met = b.returns.iter().find(|r| r.mark == mark).map(|r| r.junction.to.as_str());
        let met = met.and_then(|to| b.plan.iter().find(|w| w.mark == to));
        let first = met.is_none_or(|m| away(m, end(from)) <= away(m, end(to)));
        // A return begins at the face of the wall that it meets; what stands within that wall stands at its face.
        let face = met.and_then(|m| b.build_up(&m.build_up)).map_or(0.0, |u| u.thickness().base() / 2.0);
        let place = |s: f64| ((if first { s - from } else { to - s }) - face).max(0.0);
        let leaf = b
            .plan
            .iter()
            .find(|w| w.mark == mark)
            .and_then(|w| b.build_up(&w.build_up))
            .map_or(0, |u| u.loaded().0);
        // Of a wall with openings the return is the length at the junction, and carries what that carries.
        if let [lowest, .., highest] = on.piers.as_slice() {
            let pier = if first { lowest } else { highest };
            let middle = (pier.from + pier.to) / 2.0;
            // Dead, imposed and uplift may stand in different places.
            let one = |i: usize, what: &str| {
                let only = |k: usize| Force::new(if i == k { pier.head[k] } else { 0.0 });
                Load {
                    what: format!("{what} of all above"),
                    dead: only(0),
                    imposed: only(1),
                    uplift: only(2),
                    at: Length::new(place(middle + pier.moment[i] / pier.head[i])),
                    eccentricity: Length::ZERO,
                    leaf,
                    source: LED.to_owned(),
                }
            };
            let parts = [(0, "dead load"), (1, "imposed load"), (2, "uplift")];
            return parts
                .into_iter()
                .filter(|p| pier.head[p.0] > 0.0)
                .map(|(i, what)| one(i, what))
                .collect();
        }
        let mut by: Vec<From> = Vec::new();
        let all = on.head.lines.iter().map(|l| l.by).chain(on.head.points.iter().map(|p| p.by));
        for one in all {
            if !by.contains(&one) {
                by.push(one);
            }
        }
        let mut out = Vec::new();
        for one in by {
            let part = descent::Loads {
                lines: on.head.lines.iter().filter(|l| l.by == one).copied().collect(),
                points: on.head.points.iter().filter(|p| p.by == one).copied().collect(),
            };
            let (total, moment) = (part.total(), part.moment(from));
            let size = total.iter().sum::<f64>();
            if size <= 0.0 {
                continue;
            }
            // The place of all three together: they come along the same lines.
            let centre = from + moment.iter().sum::<f64>() / size;
            out.push(Load {
                what: self.on_leaf.name(b, one),
                dead: Force::new(total[0]),
                imposed: Force::new(total[1]),
                uplift: Force::new(total[2]),
                at: Length::new(place(centre)),
                eccentricity: Length::ZERO,
                leaf,
                source: LED.to_owned(),
            });
        }
        out
    }
}

/// How far a point lies from a plan wall.
fn away(wall: &PlanWall, p: (f64, f64)) -> f64 {
    let (a, z) = ((wall.from.0.base(), wall.from.1.base()), (wall.to.0.base(), wall.to.1.base()));
    let (dx, dy) = (z.0 - a.0, z.1 - a.1);
    let share = (((p.0 - a.0) * dx + (p.1 - a.1) * dy) / (dx * dx + dy * dy)).clamp(0.0, 1.0);
    (p.0 - a.0 - share * dx).hypot(p.1 - a.1 - share * dy)
}
