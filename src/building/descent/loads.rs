//! Loads that the job leaves to the take-down.

use super::TakeDown;
use crate::building::{Before, Building};
use crate::quantity::LineLoad;
use crate::solve::descent::{self, Place, Wall};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;

/// What the job file leaves to the take-down, by mark; what the plan added is left to it as well.
#[derive(Clone, Debug, Default)]
pub struct Led {
    /// Panels without a dead load above them.
    pub panels: Vec<String>,
    /// Returns without the dead load of the wall that they meet.
    pub junctions: Vec<String>,
}

/// Takes the loads that the job does not give from the plan as it was led down: on returns without loads that are
/// walls of the plan, on panels the least dead load over the length of their wall, and at junctions the least over
/// the wall met with its own weight.
pub fn take_loads(b: &mut Building, down: &TakeDown, led: &Led) {
    let number = |b: &Building, mark: &str| b.storeys.iter().position(|s| s.mark == mark);
    for i in 0..b.returns.len() {
        let r = &b.returns[i];
        let Some(storey) = number(b, &r.storey).filter(|_| r.loads.is_empty()) else { continue };
        let loads = down.on_return(b, &r.mark.clone(), storey);
        b.returns[i].loads = loads;
    }
    for i in 0..b.returns.len() {
        let r = &b.returns[i];
        // A footing lies under the lowest storey.
        if number(b, &r.storey) != Some(0) || r.footing.as_ref().is_none_or(|f| f.before.is_some()) {
            continue;
        }
        let Some((wall, on)) = down.before.wall(b, &r.mark, 0) else { continue };
        let (length, foot) = (wall.place.to - wall.place.from, on.foot.total());
        let per = |x: f64| LineLoad::new(x / length);
        if let Some(f) = &mut b.returns[i].footing {
            f.before = Some(Before { led: true, dead: per(foot[0]), imposed: per(foot[1]) });
        }
    }
    let left_out =
        |b: &Building, mark: &String, list: &[String]| list.contains(mark) || b.found.added.contains(mark);
    for i in 0..b.returns.len() {
        let r = &b.returns[i];
        let Some(storey) = number(b, &r.storey).filter(|_| left_out(b, &r.mark, &led.junctions)) else {
            continue;
        };
        if let Some((wall, on)) = down.on_leaf.wall(b, &r.junction.to, storey) {
            let (dead, lift) = least_dead(wall, on, over_helping(b));
            b.returns[i].junction.dead = LineLoad::new(dead + wall.weight);
            b.returns[i].junction.uplift = LineLoad::new(lift);
        }
    }
    for i in 0..b.panels.len() {
        let p = &b.panels[i];
        let (Some(on), Some(storey)) = (&p.on, number(b, &p.storey)) else { continue };
        if left_out(b, &p.mark, &led.panels)
            && let Some((wall, on)) = down.on_leaf.wall(b, on, storey)
        {
            let (dead, lift) = least_dead(wall, on, over_helping(b));
            b.panels[i].dead_above = LineLoad::new(dead);
            b.panels[i].lift_above = LineLoad::new(lift);
        }
    }
}

/// How much dead load that helps one unit of uplift undoes: EN 1990 6.4.3.2.
fn over_helping(b: &Building) -> f64 {
    let helping = b.basis.helping_factor.value;
    Combination::Helping.factors(&Annex::UK, helping).gamma_U / helping
}

/// Dead load and uplift per length at the head of a wall where the least is left of the one, each unit of the other
/// undoing `undoes` of it; point loads left out: what helps a panel must be there over all of it.
fn least_dead(wall: &Wall, on: &descent::OnWall, undoes: f64) -> (f64, f64) {
    let Place { from, to, .. } = wall.place;
    let mut cuts = vec![from, to];
    cuts.extend(on.head.lines.iter().flat_map(|l| [l.from, l.to]).filter(|c| from < *c && *c < to));
    cuts.sort_by(f64::total_cmp);
    cuts.dedup();
    let over = |a: f64, z: f64| {
        let covers = |l: &&descent::Line| l.from <= a && z <= l.to;
        on.head.lines.iter().filter(covers).fold((0.0, 0.0), |(g, u), l| (g + l.load[0], u + l.load[2]))
    };
    let left = |(g, u): &(f64, f64)| g - undoes * u;
    let pieces = cuts.windows(2).map(|c| over(c[0], c[1]));
    pieces.min_by(|a, z| left(a).total_cmp(&left(z))).unwrap_or_default()
}
