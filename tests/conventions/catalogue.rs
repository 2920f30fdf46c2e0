//! `perpend checks` lists what sheets print, and nothing else.

use std::collections::BTreeSet;

use perpend::checks::catalogue::{self, ALL, Known};

use crate::jobs;

/// Ids of verdicts and of results without a verdict with their clauses, of all demo jobs and of many others.
fn printed() -> BTreeSet<(String, String)> {
    let mut texts: Vec<String> = jobs::demos().into_iter().map(|(_, text)| text).collect();
    texts.extend((0..60).map(jobs::varied));
    let mut out = BTreeSet::new();
    for text in &texts {
        let (_, results) = perpend::check("job.toml", text).unwrap_or_else(|e| panic!("{e}"));
        for s in &results.sections {
            out.extend(s.sheet.verdicts.iter().map(|v| (v.id.clone(), v.clause.clone())));
            out.extend(s.sheet.unshown.iter().map(|u| (u.id.clone(), u.clause.clone())));
        }
    }
    out
}

fn is(known: &Known, clause: &str) -> bool {
    known.clause == clause || known.words.contains(&format!("({clause})"))
}

#[test]
fn every_verdict_is_listed_with_its_clause() {
    for (id, clause) in printed() {
        assert!(
            catalogue::of(&id).any(|known| is(known, &clause)),
            "{id} [{clause}] is not listed in src/checks/catalogue.rs"
        );
    }
}

/// By demo jobs or their variations; what those do not print is named here, and printed by tests of its own check.
#[test]
fn nothing_is_listed_that_is_never_printed() {
    let printed = printed();
    let elsewhere = [
        "bracing-x",
        "horizontal",
        "cantilever",
        "pattern",
        "brings",
        "leans",
        "none",
        "pier-edge",
        "pier-flexure",
        "middle-edge",
    ];
    for known in ALL {
        let seen = printed
            .iter()
            .any(|(id, clause)| catalogue::of(id).any(|k| std::ptr::eq(k, known)) && is(known, clause));
        assert!(
            seen || known.ids.iter().any(|id| elsewhere.contains(id)),
            "{:?}: {} is listed, and no job prints it",
            known.ids,
            known.words
        );
    }
}
