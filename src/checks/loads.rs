//! Unfactored loads: what whoever designs the propping needs.

use super::{Job, Section};
use crate::building::{LED, Return};
use crate::quantity::{Force, LineLoad, print};
use crate::solve::descent::Triple;
use crate::trace::{Column, Sheet, Table};

/// The sheet of unfactored loads.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let mut s = Sheet::recorder();
    let b = job.building;
    s.note(format!(
        "Unfactored loads for whoever designs the temporary support. The wall removed carried: {}.",
        b.removed.carried.trim_end_matches('.')
    ));
    s.table(|| Table {
        caption: if job.down.is_some() {
            "Unfactored loads on what stays and on what comes out, own weight not included"
        } else {
            "Unfactored loads on what stays, own weight not included; what comes out is not led down"
        }
        .to_owned(),
        columns: vec![
            Column::words("on"),
            Column::words("load"),
            Column::numbers("dead, kN"),
            Column::numbers("imposed, kN"),
            Column::numbers("roof uplift, kN"),
            Column::words("from"),
        ],
        rows: b.returns.iter().flat_map(rows).chain(beams(job)).collect(),
        strong: vec![],
    });
    s.table(|| Table {
        caption: "Dead load in the outer walls at the head of each panel, unfactored".to_owned(),
        columns: vec![
            Column::words("panel"),
            Column::numbers("dead, kN/m"),
            Column::numbers("roof uplift, kN/m"),
        ],
        rows: b
            .panels
            .iter()
            .map(|p| {
                let per = |g: LineLoad| print::show("g", g.dynamic()).value;
                vec![p.mark.clone(), per(p.dead_above), per(p.lift_above)]
            })
            .collect(),
        strong: vec![],
    });
    vec![Section::plain("loads", "Unfactored loads", s)]
}

/// Ends of beams on what has no sheet of its own, and what the wall that comes out carries before.
fn beams(job: &Job<'_>) -> Vec<Vec<String>> {
    let (b, Some(down)) = (job.building, &job.down) else { return Vec::new() };
    let kn = |x: f64| print::show("G", Force::new(x).dynamic()).value;
    let row = |on: String, what: String, load: Triple| {
        vec![on, what, kn(load[0]), kn(load[1]), kn(load[2]), LED.to_owned()]
    };
    let mut out = Vec::new();
    for (beam, carried) in b.beams.iter().zip(&down.after.down.beams) {
        for end in 0..2 {
            let under = carried.under[end].map_or_else(|| "nothing".to_owned(), |u| down.after.under(b, u));
            if !b.returns.iter().any(|r| r.mark == under && !r.loads.is_empty()) {
                out.push(row(under, format!("end of {}", beam.mark), carried.reactions[end]));
            }
        }
    }
    let before = &down.before;
    for (stack, carried) in before.walls.iter().zip(&before.down.walls) {
        let wall = &b.plan[stack.wall];
        if wall.removed && b.storeys[stack.storey].mark == b.removed.storey {
            out.push(row(
                wall.mark.clone(),
                "all that it carries at its head, before".to_owned(),
                carried.head.total(),
            ));
        }
    }
    out
}

fn rows(r: &Return) -> Vec<Vec<String>> {
    let kn = |f: Force| print::show("G", f.dynamic()).value;
    r.loads
        .iter()
        .map(|l| {
            vec![r.mark.clone(), l.what.clone(), kn(l.dead), kn(l.imposed), kn(l.uplift), l.source.clone()]
        })
        .collect()
}
