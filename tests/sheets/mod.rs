//! Every demo job as text: front words, results, hold points and every sheet, held against `snapshots/`.
//!
//! After a change that is meant, write them anew and read the difference before it is kept:
//!
//! ```text
//! INSTA_UPDATE=always cargo test --test main sheets
//! git diff tests/sheets/snapshots
//! ```

mod summaries;

use std::fmt::Write as _;

use perpend::checks::Section;
use perpend::pack::data::{Pack, Scheduled};
use perpend::report;
use perpend::trace::text;

use crate::jobs;

/// A whole pack as text.
fn pack(name: &str, job: &str) -> String {
    let (building, results) = perpend::draw(name, job).unwrap_or_else(|e| panic!("{name}: {e}"));
    // The digest would change the text with every remark in the job file.
    let pack = report::pack(&building, &results, job, "");
    let mut out = String::new();
    front(&mut out, &pack);
    for (section, set) in results.sections.iter().zip(&pack.sections) {
        let outcome = set.outcome.as_ref().map_or(String::new(), |o| format!(": {}", o.words));
        title(&mut out, &format!("{}{}{outcome}", marked(section), section.title));
        out.push_str(&text::sheet(&section.sheet));
        for drawing in &section.drawings {
            let _ = writeln!(
                out,
                "\n[{}] {} {}\n  {}",
                drawing.name, drawing.caption, drawing.scale, drawing.alt
            );
        }
    }
    title(&mut out, "Cautions");
    lines(&mut out, &pack.cautions);
    out
}

fn marked(section: &Section) -> String {
    if section.mark.is_empty() { String::new() } else { format!("{}  ", section.mark) }
}

fn title(out: &mut String, words: &str) {
    let _ = writeln!(out, "\n\n{}\n{words}\n", "#".repeat(words.chars().count()));
}

fn lines(out: &mut String, lines: &[String]) {
    for line in lines {
        let _ = writeln!(out, "  {line}");
    }
}

fn front(out: &mut String, pack: &Pack) {
    let job = &pack.job;
    let _ = writeln!(out, "{} {}, revision {}", job.number, job.title, job.revision);
    let _ =
        writeln!(out, "{}; for {}; to {}; {}", job.address.join(", "), job.client, job.authority, job.status);
    let _ = writeln!(out, "visited: {}; made by {}; {}", job.visited, pack.made.name, pack.unsigned_text);
    let _ = writeln!(out, "\nOUTCOME: {}\n{}", pack.outcome.words, pack.outcome.sentence);
    lines(out, &pack.warnings);
    for part in &pack.summary {
        let _ = writeln!(out, "\n{}", part.title);
        lines(out, &part.lines);
    }
    title(out, "Results");
    for row in &pack.schedule {
        let Scheduled { mark, check, demand, resistance, ratio, verdict, anchor, .. } = row;
        let _ = writeln!(
            out,
            "  {mark:<4} {check:<44} {demand:>14} {resistance:>14} {ratio:>6}  {verdict}  ({anchor})"
        );
    }
    title(out, "Hold points");
    for hold in &pack.holds {
        let closed = if hold.closed.is_empty() { "open" } else { &hold.closed };
        let _ = writeln!(out, "  {} {}: {} [{closed}]", hold.mark, hold.waiting.join(", "), hold.text);
    }
    title(out, "Assumptions");
    for assumption in &pack.assumptions {
        let _ = writeln!(out, "  {} {} [{}]", assumption.mark, assumption.text, assumption.source);
    }
}

#[test]
fn every_demo_job_as_text() {
    insta::with_settings!({prepend_module_to_snapshot => false, omit_expression => true}, {
        for (name, job) in jobs::demos() {
            insta::assert_snapshot!(name.clone(), pack(&name, &job));
        }
    });
}

/// The sheets of demo jobs together show every one of the four outcomes but one that no one wants on a front sheet.
#[test]
fn demo_jobs_differ_in_outcome() {
    let outcomes: std::collections::BTreeSet<&str> = jobs::demos()
        .iter()
        .map(|(name, job)| perpend::check(name, job).expect("a valid job").1.outcome.kind())
        .collect();
    assert!(outcomes.len() >= 3, "{outcomes:?}");
}
