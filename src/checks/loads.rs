//! Unfactored loads: what whoever designs the propping needs.

use super::{Job, Section};
use crate::building::Return;
use crate::quantity::{Force, LineLoad, print};
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
        caption: "Unfactored loads on what stays, own weight not included".to_owned(),
        columns: vec![
            Column::words("on"),
            Column::words("load"),
            Column::numbers("dead, kN"),
            Column::numbers("imposed, kN"),
            Column::numbers("roof uplift, kN"),
            Column::words("from"),
        ],
        rows: b.returns.iter().flat_map(rows).collect(),
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

fn rows(r: &Return) -> Vec<Vec<String>> {
    let kn = |f: Force| print::show("G", f.dynamic()).value;
    r.loads
        .iter()
        .map(|l| {
            vec![r.mark.clone(), l.what.clone(), kn(l.dead), kn(l.imposed), kn(l.uplift), l.source.clone()]
        })
        .collect()
}
