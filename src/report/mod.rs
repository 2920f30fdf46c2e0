//! From building and results to the pack's data and to the terminal's lines: words, no engineering.
//!
//! * [`pack`]: the data that the templates read
//! * [`lines`]: the same results as plain text
//! * [`machine`]: the same results as JSON
//! * [`client`]: the summary for the client, in plain English; [`plain`] says which sentences are not
//! * [`record`]: all that a pack prints, to travel inside it

mod blocks;
pub mod client;
mod front;
pub mod lines;
mod listing;
pub mod machine;
pub mod notation;
pub mod photographs;
pub mod plain;
pub mod record;

use crate::building::Building;
use crate::checks::outcome::{self, Outcome};
use crate::checks::{Results, Section};
use crate::job::date_in_words;
use crate::pack::data::{self, OutcomeKind};
use crate::quantity::print;
use crate::sketch::text::list;
use crate::trace::{Unshown, Value, Verdict};

/// Name and version, as printed.
pub const PROGRAM: (&str, &str) = ("Perpend", env!("CARGO_PKG_VERSION"));

/// The words where no second person has checked.
pub const SELF_CHECKED: &str = "self-checked, no second person";

/// The pack's data. `text` is the job file and `digest` its SHA-256 in hexadecimal.
pub fn pack(b: &Building, results: &Results, text: &str, digest: &str) -> data::Pack {
    let revision = b.revisions.last().map_or(String::new(), |r| r.letter.clone());
    let of_person = |p: &crate::building::Person| (p.name.clone(), p.letters.clone(), date_in_words(&p.date));
    let (name, letters, date) = of_person(&b.signatures.made);
    let made = data::Made {
        name,
        letters,
        qualification: b.signatures.made.qualification.clone().unwrap_or_default(),
        date,
    };
    let checked = match &b.signatures.checked {
        None => data::Checked {
            text: SELF_CHECKED.to_owned(),
            name: String::new(),
            letters: String::new(),
            date: String::new(),
        },
        Some(p) => {
            let (name, letters, date) = of_person(p);
            data::Checked { text: String::new(), name, letters, date }
        }
    };
    data::Pack {
        program: data::Program { name: PROGRAM.0.to_owned(), version: PROGRAM.1.to_owned() },
        digest: grouped(&digest.chars().take(16).collect::<String>()),
        digest_full: digest.to_owned(),
        job: data::Job {
            number: b.identity.number.clone(),
            title: b.identity.title.clone(),
            address: b.identity.address.clone(),
            client: b.identity.client.clone(),
            authority: b.identity.authority.clone(),
            status: b.identity.status.word().to_owned(),
            visited: b.identity.visited.as_deref().map_or("not visited".to_owned(), date_in_words),
            revision,
        },
        made,
        checked,
        signed: false,
        unsigned_text: "not valid unless signed".to_owned(),
        revisions: b
            .revisions
            .iter()
            .map(|r| data::Revision {
                letter: r.letter.clone(),
                date: date_in_words(&r.date),
                note: r.note.clone(),
            })
            .collect(),
        changes: None,
        outcome: data::FrontOutcome {
            kind: kind(results.outcome),
            words: results.outcome.words(),
            sentence: front::sentence(results),
        },
        summary: front::summary(b, results),
        assumptions: front::assumptions(b),
        holds: results
            .holds
            .iter()
            .map(|h| data::Hold {
                mark: h.mark.clone(),
                text: h.text.clone(),
                closed: h.closed.clone().unwrap_or_default(),
                waiting: h.of.clone(),
            })
            .collect(),
        schedule: results.sections.iter().flat_map(schedule).collect(),
        warnings: b.warnings.clone(),
        // The chain has its own section with the same links.
        chain: Vec::new(),
        sections: results.sections.iter().map(|s| section(b, s, results)).collect(),
        cautions: front::cautions(b),
        photographs: photographs::of_job(b, results),
        inputs: text.to_owned(),
        practice: b.practice.as_ref().map(|p| data::Practice {
            text: p.text.clone(),
            digest: p.digest.clone(),
            notes: p.notes.clone(),
        }),
        record: serde_json::to_string_pretty(&record::of_job(b, results, digest)).unwrap_or_default(),
        listing: listing::of(text),
        notation: notation::used(&results.sections),
    }
}

/// Hexadecimal digits in groups of four.
pub fn grouped(hex: &str) -> String {
    hex.as_bytes().chunks(4).map(|c| String::from_utf8_lossy(c).into_owned()).collect::<Vec<_>>().join(" ")
}

fn kind(outcome: Outcome) -> OutcomeKind {
    match outcome {
        Outcome::Adequate => OutcomeKind::Adequate,
        Outcome::Conditional(_) => OutcomeKind::Conditional,
        Outcome::Outside => OutcomeKind::Outside,
        Outcome::NotAdequate => OutcomeKind::NotAdequate,
    }
}

fn section(b: &Building, s: &Section, results: &Results) -> data::Section {
    let judged = !s.mark.is_empty();
    let outcome = outcome::of_sheet(&s.sheet, &s.concerns(), &results.holds);
    let plain_failure = !judged && s.sheet.judges();
    data::Section {
        id: s.id.clone(),
        title: s.title.clone(),
        mark: s.mark.clone(),
        outcome: (judged || plain_failure).then(|| data::SectionOutcome {
            kind: kind(outcome),
            words: if s.sheet.judges() { words(s, outcome, results) } else { UNJUDGED.to_owned() },
        }),
        blocks: blocks::of_section(s),
        // Returns and panels open a sheet; what belongs to them follows where there is room.
        new_page: b.returns.iter().any(|r| r.mark == s.mark) || b.panels.iter().any(|p| p.mark == s.mark),
        changed: false,
        seen: photographs::seen(b, s),
    }
}

/// What stands over a sheet that has a mark and no verdict.
const UNJUDGED: &str = "by rule alone, no verdict";

/// More open hold points than these are counted, not named.
const NAMED: usize = 4;

/// The outcome of a sheet in words, with the hold points that it waits for by their marks.
fn words(s: &Section, outcome: Outcome, results: &Results) -> String {
    let marks = s.concerns();
    let open = outcome::open(&marks, &results.holds);
    let waits: Vec<&str> = s.sheet.unshown.iter().filter_map(|u| u.hold.as_deref()).collect();
    match outcome {
        Outcome::Conditional(_) if !waits.is_empty() => {
            format!("not shown: {}", list(&front::distinct(&waits)))
        }
        Outcome::Conditional(n) if n <= NAMED => {
            format!("adequate once {} {} closed", list(&open), if n == 1 { "is" } else { "are" })
        }
        _ => outcome.words(),
    }
}

/// Lines of the results schedule, in the order of the section.
pub fn schedule(s: &Section) -> Vec<data::Scheduled> {
    let amount = |v: &Value| print::show(&v.name, v.value).to_string();
    let mark = s.mark.clone();
    // Of a sheet without a mark the title stands before each result: the column of marks is narrow.
    let told = |words: &str| if mark.is_empty() { format!("{}: {words}", s.title) } else { words.to_owned() };
    // Of a sheet of several things each result goes under the mark that ends its words.
    let own = |words: &str| {
        let ends = |m: &&str| words.ends_with(&format!(", {m}"));
        match s.mark.split(", ").find(ends) {
            Some(m) if s.mark.contains(", ") => (m.to_owned(), words[..words.len() - m.len() - 2].to_owned()),
            _ => (mark.clone(), told(words)),
        }
    };
    let verdict = |v: &Verdict| data::Scheduled {
        mark: own(&v.words).0,
        check: own(&v.words).1,
        demand: amount(&v.demand),
        resistance: amount(&v.resistance),
        ratio: print::ratio(v.ratio),
        bar: bar(v.ratio),
        verdict: verdict_words(v.holds).to_owned(),
        anchor: anchor(s, &v.id),
        changed: false,
    };
    let outside = s.sheet.outside.iter().map(|o| data::Scheduled {
        mark: mark.clone(),
        check: told(&o.words),
        demand: String::new(),
        resistance: String::new(),
        ratio: String::new(),
        bar: 0.0,
        verdict: "outside the method".to_owned(),
        anchor: anchor(s, &o.id),
        changed: false,
    });
    let unshown = s.sheet.unshown.iter().map(|u| data::Scheduled {
        mark: own(&u.words).0,
        // Its words name the thing: no title before them.
        check: if mark.is_empty() { u.words.clone() } else { own(&u.words).1 },
        demand: String::new(),
        resistance: String::new(),
        ratio: u.ratio.map_or_else(String::new, print::ratio),
        bar: bar(u.ratio.unwrap_or(0.0)),
        verdict: unshown_words(u),
        anchor: anchor(s, &u.id),
        changed: false,
    });
    s.sheet.verdicts.iter().map(verdict).chain(outside).chain(unshown).collect()
}

/// What stands in place of a verdict.
pub fn unshown_words(u: &Unshown) -> String {
    u.hold.as_ref().map_or_else(|| verdict_words(false).to_owned(), |h| format!("hold point {h}"))
}

/// `adequate` or `not adequate`.
pub const fn verdict_words(holds: bool) -> &'static str {
    if holds { "adequate" } else { "not adequate" }
}

/// The ratio for the scale, never above 2.
fn bar(ratio: f64) -> f64 {
    if ratio.is_finite() { ratio.clamp(0.0, 2.0) } else { 2.0 }
}

/// The anchor of a check on its sheet.
fn anchor(s: &Section, id: &str) -> String {
    format!("{}-{id}", s.id)
}
