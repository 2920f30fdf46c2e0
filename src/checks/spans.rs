//! Where floors span from support to support, before the removal and after it: for the key plan.

use crate::building::{Along, Building, PlanFloor, State, TakeDown};
use crate::sketch::PlanMark;
use crate::solve::descent::{From, Line, Place};

/// Share of a floor across its span at which it is looked at, off the middle where marks stand.
const LOOK: f64 = 0.36;

/// Every span of the floors over `storey`, along the line on which each floor is looked at: from one support
/// that the take-down leads its load to, to the next.
pub fn of(b: &Building, down: &TakeDown, storey: &str, after: bool) -> Vec<PlanMark> {
    let [before, now] =
        [&down.before, if after { &down.after } else { &down.before }].map(|s| by_floor(b, s));
    let gone = down.before.walls.iter().position(|s| b.plan[s.wall].removed);
    let gone = gone.map(|i| down.before.model.walls[i].place);
    let here = b.floors.iter().enumerate().filter(|(_, f)| f.storey == storey);
    here.flat_map(|(n, floor)| {
        let across = look(floor, &before[n], gone);
        let passes = |(_, l): &&(Place, &Line)| l.from <= across && across <= l.to;
        let mut at: Vec<f64> = now[n].iter().filter(passes).map(|(p, _)| p.at).collect();
        at.sort_by(f64::total_cmp);
        at.dedup();
        let point = |s: f64| if floor.spans == Along::X { (s, across) } else { (across, s) };
        let bays = at.windows(2).map(|bay| (point(bay[0]), point(bay[1])));
        bays.map(|(from, to)| PlanMark { mark: floor.mark.clone(), from, to }).collect::<Vec<_>>()
    })
    .collect()
}

/// The line across the span on which a floor is looked at: where the wall that comes out bears it, if it
/// does, since there the spans change.
fn look(floor: &PlanFloor, before: &[(Place, &Line)], gone: Option<Place>) -> f64 {
    let (a, z) = match floor.spans {
        Along::X => (floor.from.1.base(), floor.to.1.base()),
        Along::Y => (floor.from.0.base(), floor.to.0.base()),
    };
    let (a, z) = (a.min(z), a.max(z));
    let usual = a + LOOK * (z - a);
    let on_it = before.iter().filter(|(p, _)| Some(*p) == gone).map(|(_, l)| (l.from, l.to));
    match on_it.reduce(|x, y| (x.0.min(y.0), x.1.max(y.1))) {
        Some((from, to)) if !(from..=to).contains(&usual) => from + LOOK * (to - from),
        _ => usual,
    }
}

/// For each floor the walls and beams that it bears on, each with the load that it brings.
fn by_floor<'a>(b: &Building, state: &'a State) -> Vec<Vec<(Place, &'a Line)>> {
    let walls = state.model.walls.iter().map(|w| w.place).zip(state.down.walls.iter().map(|c| &c.head));
    let beams = state.model.beams.iter().map(|w| w.place).zip(state.down.beams.iter().map(|c| &c.loads));
    let mut out = vec![Vec::new(); b.floors.len()];
    for (place, loads) in walls.chain(beams) {
        for line in &loads.lines {
            if let From::Floor(n) = line.by {
                out[n].push((place, line));
            }
        }
    }
    out
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::building::take_down;

    /// Spans of the ground floor, each as its mark, its length and its place across, in mm.
    fn spans(b: &Building, after: bool) -> Vec<(String, i64, i64)> {
        let down = take_down(b).expect("it has floors").unwrap_or_else(|e| panic!("{}", e.what));
        let all = of(b, &down, "ground", after);
        let across = |s: &PlanMark| if s.from.1 == s.to.1 { s.from.1 } else { s.from.0 };
        let length = |s: &PlanMark| (s.to.0 - s.from.0).hypot(s.to.1 - s.from.1).round() as i64;
        all.iter().map(|s| (s.mark.clone(), length(s), across(s).round() as i64)).collect()
    }

    fn semi() -> Building {
        let text = include_str!("../../jobs/semi.toml");
        crate::job::read("job.toml", text).unwrap_or_else(|e| panic!("{}", e.render(false)))
    }

    #[test]
    fn a_beam_in_place_of_the_wall_keeps_the_spans() {
        let b = semi();
        let before = spans(&b, false);
        assert_eq!(before, spans(&b, true));
        // F1 is borne by the kitchen wall from y = 0.9 to 2.7 m, and is looked at there.
        let of_f1: Vec<_> = before.iter().filter(|s| s.0 == "F1").map(|s| (s.1, s.2)).collect();
        assert_eq!(of_f1, [(3200, 1296), (3200, 1296)]);
    }

    #[test]
    fn without_a_beam_the_floor_spans_over_what_is_gone() {
        let mut b = semi();
        b.beams.clear();
        b.plan.retain(|w| w.mark != "bedroom wall");
        let of_f1 = |after| spans(&b, after).iter().filter(|s| s.0 == "F1").map(|s| s.1).collect::<Vec<_>>();
        assert_eq!((of_f1(false), of_f1(true)), (vec![3200, 3200], vec![6400]));
    }
}
