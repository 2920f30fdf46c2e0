//! Nothing overlaps, leaves its place or is missing, on the demo jobs and on variations of them.

use std::path::Path;

use perpend::{check, draw, pack, photographs, report};

use crate::jobs;

fn flaws(name: &str, text: &str) -> Vec<String> {
    let (building, results) = draw(name, text).unwrap_or_else(|e| panic!("{name}: {e}\n{text}"));
    let data = report::pack(&building, &results, text, &perpend::digest(text));
    let files = photographs(&building, Path::new("jobs")).unwrap_or_else(|e| panic!("{name}: {e}"));
    let found = pack::inspect(&data, &files, None).unwrap_or_else(|e| panic!("{name}: {e}"));
    pack::evict(2);
    found.iter().map(|flaw| format!("{name}: {flaw}")).collect()
}

#[test]
fn demo_jobs_have_no_flaw_on_paper() {
    let all: Vec<String> = jobs::demos().iter().flat_map(|(name, text)| flaws(name, text)).collect();
    assert!(all.is_empty(), "{} flaws\n{}", all.len(), all.join("\n"));
}

#[test]
fn variations_have_no_flaw_on_paper() {
    let all: Vec<String> = (0..20).flat_map(|n| flaws(&format!("variation {n}"), &jobs::varied(n))).collect();
    assert!(all.is_empty(), "{} flaws\n{}", all.len(), all.join("\n"));
}

/// The variations are worth their name: none like another, and several outcomes among them.
#[test]
fn variations_vary() {
    let outcomes: Vec<&str> = (0..40)
        .map(|n| {
            let text = jobs::varied(n);
            check("variation", &text).unwrap_or_else(|e| panic!("variation {n}: {e}")).1.outcome.kind()
        })
        .collect();
    let kinds: std::collections::BTreeSet<_> = outcomes.iter().collect();
    assert!(kinds.len() >= 3, "{outcomes:?}");
}
