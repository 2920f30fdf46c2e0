//! The load take-down: what every wall carries down to the ground, before the removal and after it.

use super::shapes::leaf_material;
use super::{Job, Section};
use crate::building::{Building, State, TakeDown, line_of, stands_in, storey_height};
use crate::quantity::{Force, LineLoad, print};
use crate::sketch::hatch::Material;
use crate::sketch::{Drawing, Frame, LoadStack, StackStorey, StackWall, load_stack};
use crate::solve::descent::{From, Pier, Place, Triple};
use crate::trace::{Column, Sheet, Table};

/// The take-down sheet, where the job gives floors on its plan.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let b = job.building;
    let Some(down) = &job.down else { return Vec::new() };
    let mut s = Sheet::recorder();
    s.note(
        "Characteristic loads, led down by statics. Floors and roofs span one way, as simple spans between the walls \
         and beams under them: continuous joists may put up to a quarter more on a wall in their middle. What stands \
         over an opening goes to the wall beside it. Walls weigh from floor to floor.",
    );
    s.drawings(&["load-stack"]);
    s.heading(1, "What weighs");
    s.table(|| weights(b));
    s.table(|| floors(b));
    s.heading(1, "What walls carry");
    s.table(|| walls(b, down));
    if !b.beams.is_empty() {
        s.heading(1, "Beams and their ends");
        s.table(|| beams(b, &down.after));
    }
    let rows = piers(b, &down.after);
    if !rows.is_empty() {
        s.heading(1, "Walls beside openings");
        s.table(|| Table {
            caption: "After the removal, loads at head and foot of each length of wall between openings; the moment \
                      of the dead load about its middle"
                .to_owned(),
            columns: vec![
                Column::words("wall"),
                Column::words("storey"),
                Column::words("from, to, m"),
                Column::numbers("head, dead, kN"),
                Column::numbers("imposed"),
                Column::numbers("moment, kNm"),
                Column::numbers("foot, dead, kN"),
                Column::numbers("imposed"),
            ],
            rows,
            strong: Vec::new(),
        });
    }
    s.heading(1, "What goes in comes out");
    s.table(|| balance(down));
    given_by_hand(&mut s, b, down);
    let mut section = Section::plain("takedown", "Load take-down", s);
    section.drawings.extend(job.drawings(|| stack(b, down)));
    vec![section]
}

const STACK: Frame = Frame::new(165.0, 110.0);

/// The way down the line of the wall that comes out, where it lies along x or y.
fn stack(b: &Building, down: &TakeDown) -> Option<Drawing> {
    let gone = b.plan.iter().find(|w| w.removed)?;
    let line = line_of(gone)?;
    let on = |place: Place| place.along == line.along && (place.at - line.at).abs() < 150.0;
    let state = &down.after;
    let storeys = b.storeys.iter().enumerate().map(|(k, storey)| {
        let here = state.walls.iter().zip(&state.model.walls).zip(&state.down.walls);
        let here: Vec<_> = here.filter(|((s, w), _)| s.storey == k && on(w.place)).collect();
        let walls = here.iter().map(|((s, w), carried)| {
            let foot = carried.foot.total();
            StackWall {
                from: w.place.from,
                to: w.place.to,
                material: b
                    .build_up(&b.plan[s.wall].build_up)
                    .map_or(Material::Brick, |u| leaf_material(b, u.loaded().1)),
                mark: b.plan[s.wall].mark.clone(),
                foot: if k == 0 { format!("{} + {} kN", kn(foot[0]), kn(foot[1])) } else { String::new() },
            }
        });
        let beams = b.beams.iter().zip(&state.model.beams).filter(|(_, m)| m.storey == k && on(m.place));
        StackStorey {
            name: storey.mark.clone(),
            height: storey_height(b, k).base(),
            walls: walls.collect(),
            removed: if storey.mark == b.removed.storey { vec![(line.from, line.to)] } else { Vec::new() },
            beams: beams.map(|(beam, m)| (m.place.from, m.place.to, beam.mark.clone())).collect(),
            loads: floors_on(b, state, k, &on),
        }
    });
    Some(load_stack(&LoadStack { title: gone.mark.clone(), storeys: storeys.collect() }, STACK))
}

/// What floors and roofs put on the line at the head of storey `k`: their spread loads added up, and
/// the stretch they cover.
fn floors_on(b: &Building, state: &State, k: usize, on: &dyn Fn(Place) -> bool) -> Vec<(f64, f64, String)> {
    let of_walls = state.model.walls.iter().zip(&state.down.walls).map(|(w, c)| (w.storey, w.place, &c.head));
    let of_beams =
        state.model.beams.iter().zip(&state.down.beams).map(|(w, c)| (w.storey, w.place, &c.loads));
    let mut by_floor: Vec<(usize, f64, f64, Triple)> = Vec::new();
    for (_, _, loads) in of_walls.chain(of_beams).filter(|(storey, place, _)| *storey == k && on(*place)) {
        for line in &loads.lines {
            let From::Floor(n) = line.by else { continue };
            match by_floor.iter_mut().find(|f| f.0 == n && (f.3[0] - line.load[0]).abs() < 1e-9) {
                Some(f) => (f.1, f.2) = (f.1.min(line.from), f.2.max(line.to)),
                None => by_floor.push((n, line.from, line.to, line.load)),
            }
        }
    }
    let words =
        |n: usize, load: Triple| format!("{} {} + {} kN/m", b.floors[n].mark, kn_m(load[0]), kn_m(load[1]));
    by_floor.into_iter().map(|(n, from, to, load)| (from, to, words(n, load))).collect()
}

fn kn(x: f64) -> String {
    print::show("G", Force::new(x).dynamic()).value
}

fn kn_m(x: f64) -> String {
    print::show("g", LineLoad::new(x).dynamic()).value
}

fn weights(b: &Building) -> Table {
    let area = |x: crate::quantity::Stress| print::show("q", x.dynamic()).value;
    let rows = b.area_loads.iter().map(|a| {
        let from = if a.parts.is_empty() {
            a.source.clone()
        } else {
            let parts: Vec<String> = a.parts.iter().map(|(name, w)| format!("{name} {w}")).collect();
            format!("{} (typical weights, from memory (M): check against the building)", parts.join(", "))
        };
        let lift = if a.uplift_given || a.uplift == crate::quantity::Stress::ZERO {
            ""
        } else {
            "; uplift from the wind sheet"
        };
        let from = format!("{}{lift}", if lift.is_empty() { &from } else { from.trim_end_matches('.') });
        vec![a.name.clone(), area(a.dead), area(a.imposed), area(a.uplift), from]
    });
    Table {
        caption: "Floors and roofs, kN/m² on plan".to_owned(),
        columns: vec![
            Column::words("name"),
            Column::numbers("dead"),
            Column::numbers("imposed"),
            Column::numbers("uplift"),
            Column::words("from"),
        ],
        rows: rows.collect(),
        strong: Vec::new(),
    }
}

fn floors(b: &Building) -> Table {
    let rows = b.floors.iter().filter_map(|f| {
        let load = b.area_loads.iter().find(|a| a.name == f.load)?;
        let (x, y) = ((f.to.0 - f.from.0).abs().base(), (f.to.1 - f.from.1).abs().base());
        let total = |per: f64| kn(per * x * y);
        Some(vec![
            f.mark.clone(),
            format!("{}, over {}", f.load, f.storey),
            format!("{:.2} by {:.2}", x / 1e3, y / 1e3),
            f.spans.word().to_owned(),
            total(load.dead.base()),
            total(load.imposed.base()),
            total(load.uplift.base()),
        ])
    });
    Table {
        caption: "Floors and roofs on the plan".to_owned(),
        columns: vec![
            Column::words("mark"),
            Column::words("which"),
            Column::words("x by y, m"),
            Column::words("spans along"),
            Column::numbers("dead, kN"),
            Column::numbers("imposed, kN"),
            Column::numbers("uplift, kN"),
        ],
        rows: rows.collect(),
        strong: Vec::new(),
    }
}

/// Every wall of every storey, lowest first, with what it carries at head and foot.
fn walls(b: &Building, down: &TakeDown) -> Table {
    let mut rows = Vec::new();
    let mut strong = Vec::new();
    for (k, storey) in b.storeys.iter().enumerate() {
        for (n, wall) in b.plan.iter().enumerate().filter(|(_, w)| stands_in(b, w, &storey.mark)) {
            let of = |state: &State| {
                state.of_plan(n, k).map(|(w, on)| (length(w.place), on.head.total(), on.foot.total()))
            };
            let (before, after) = (of(&down.before), of(&down.after));
            let Some((l, ..)) = before.or(after) else { continue };
            let cells = |x: Option<(f64, Triple, Triple)>| match x {
                Some((_, head, foot)) => [kn(head[0]), kn(head[1]), kn(foot[0]), kn(foot[1])],
                None => ["–"; 4].map(str::to_owned),
            };
            if before.is_some() != after.is_some() || changed(before, after) {
                strong.push(rows.len());
            }
            let mut row = vec![wall.mark.clone(), storey.mark.clone(), format!("{:.2}", l / 1e3)];
            row.extend(cells(before));
            row.extend(cells(after));
            rows.push(row);
        }
    }
    let heights: Vec<String> = b
        .storeys
        .iter()
        .enumerate()
        .map(|(k, s)| format!("{} {}", s.mark, print::show("h", storey_height(b, k).dynamic())))
        .collect();
    Table {
        caption: format!(
            "Dead and imposed load at head and foot of every wall, kN, before the removal (b) and after it (a); heavy: \
             changed. Height of wall: {}",
            heights.join(", ")
        ),
        columns: vec![
            Column::words("wall"),
            Column::words("storey"),
            Column::numbers("l, m"),
            Column::numbers("b: head G"),
            Column::numbers("Q"),
            Column::numbers("foot G"),
            Column::numbers("Q"),
            Column::numbers("a: head G"),
            Column::numbers("Q"),
            Column::numbers("foot G"),
            Column::numbers("Q"),
        ],
        rows,
        strong,
    }
}

fn changed(before: Option<(f64, Triple, Triple)>, after: Option<(f64, Triple, Triple)>) -> bool {
    let far = |a: Triple, b: Triple| (0..3).any(|i| (a[i] - b[i]).abs() > 1.0);
    before.zip(after).is_some_and(|(b, a)| far(b.2, a.2))
}

const fn length(place: Place) -> f64 {
    place.to - place.from
}

/// What stands on each beam, and its ends.
fn beams(b: &Building, state: &State) -> Table {
    let mut rows = Vec::new();
    for (i, on) in state.down.beams.iter().enumerate() {
        let spread: Vec<String> = on
            .loads
            .lines
            .iter()
            .map(|l| {
                format!(
                    "{} {} + {} kN/m over {:.2} m",
                    state.name(b, l.by),
                    kn_m(l.load[0]),
                    kn_m(l.load[1]),
                    (l.to - l.from) / 1e3
                )
            })
            .collect();
        let points = on
            .loads
            .points
            .iter()
            .map(|p| format!("{} {} + {} kN", state.name(b, p.by), kn(p.load[0]), kn(p.load[1])));
        let all: Vec<String> = spread.into_iter().chain(points).collect();
        for end in 0..2 {
            let under = on.under[end].map_or_else(|| "nothing".to_owned(), |u| state.under(b, u));
            let words = if end == 0 { all.join("; ") } else { "the same".to_owned() };
            let r = on.reactions[end];
            rows.push(vec![b.beams[i].mark.clone(), words, under, kn(r[0]), kn(r[1]), kn(r[2])]);
        }
    }
    Table {
        caption: "Each beam as a simple beam between the middles of its bearings; reactions by moments, dead + imposed"
            .to_owned(),
        columns: vec![
            Column::words("beam"),
            Column::words("carries, dead + imposed"),
            Column::words("end on"),
            Column::numbers("dead, kN"),
            Column::numbers("imposed, kN"),
            Column::numbers("uplift, kN"),
        ],
        rows,
        strong: Vec::new(),
    }
}

/// Piers of walls with openings.
fn piers(b: &Building, state: &State) -> Vec<Vec<String>> {
    let mut rows = Vec::new();
    for (stack, on) in state.walls.iter().zip(&state.down.walls) {
        if on.piers.len() < 2 {
            continue;
        }
        let (wall, storey) = (&b.plan[stack.wall], &b.storeys[stack.storey]);
        for pier in &on.piers {
            let Pier { from, to, head, moment, foot, .. } = *pier;
            rows.push(vec![
                wall.mark.clone(),
                storey.mark.clone(),
                format!("{:.2} to {:.2}", from / 1e3, to / 1e3),
                kn(head[0]),
                kn(head[1]),
                kn(moment[0] / 1e3),
                kn(foot[0]),
                kn(foot[1]),
            ]);
        }
    }
    rows
}

/// What was put on against what reaches the ground.
fn balance(down: &TakeDown) -> Table {
    let row = |words: &str, t: Triple| vec![words.to_owned(), kn(t[0]), kn(t[1]), kn(t[2])];
    Table {
        caption: "All floors, roofs, walls and beams against the feet of the lowest walls, kN".to_owned(),
        columns: vec![
            Column::words(""),
            Column::numbers("dead"),
            Column::numbers("imposed"),
            Column::numbers("uplift"),
        ],
        rows: vec![
            row("put on, before", down.before.down.applied),
            row("at the ground, before", down.before.down.ground),
            row("put on, after", down.after.down.applied),
            row("at the ground, after", down.after.down.ground),
        ],
        strong: Vec::new(),
    }
}

/// Loads that the job gives by hand beside those of the take-down.
fn given_by_hand(s: &mut Sheet, b: &Building, down: &TakeDown) {
    let mut rows = Vec::new();
    for r in &b.returns {
        let Some(storey) = b.storeys.iter().position(|st| st.mark == r.storey) else { continue };
        let led = down.on_return(b, &r.mark, storey);
        let taken = r.loads.iter().all(|l| l.source == crate::building::LED);
        if led.is_empty() || taken {
            continue;
        }
        let sum = |loads: &[crate::building::Load], of: &dyn Fn(&crate::building::Load) -> Force| {
            loads.iter().map(|l| of(l).base()).sum::<f64>()
        };
        for (words, of) in [
            ("dead", &(|l: &crate::building::Load| l.dead) as &dyn Fn(&crate::building::Load) -> Force),
            ("imposed", &|l: &crate::building::Load| l.imposed),
        ] {
            let (hand, here) = (sum(&r.loads, of), sum(&led, of));
            let over = if here > 0.0 { print::significant(hand / here) } else { "–".to_owned() };
            rows.push(vec![r.mark.clone(), words.to_owned(), kn(hand), kn(here), over]);
        }
    }
    if rows.is_empty() {
        return;
    }
    s.table(|| Table {
        caption: "Loads given by hand, which are used, beside those of the take-down, kN".to_owned(),
        columns: vec![
            Column::words("return"),
            Column::words("load"),
            Column::numbers("by hand"),
            Column::numbers("take-down"),
            Column::numbers("by hand / take-down"),
        ],
        rows,
        strong: Vec::new(),
    });
}
