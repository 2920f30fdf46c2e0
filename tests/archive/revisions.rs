//! Issues of one job held against each other: what a later one says of an earlier.

use std::path::Path;

use perpend::archive::compare::{Change, records};
use perpend::archive::{Held, since};
use perpend::pack::data;
use perpend::report::record::{self, Record};
use perpend::{Source, digest, draw, file_name, report, set};

use crate::jobs;
use crate::pdf::reader::{Read, squeeze};

const A: &str = "note = \"First issue\"\n";

/// The start job issued again, with a note of where the pack of A lies.
fn second(pack: &str) -> String {
    let again = format!(
        "{A}pack = \"{pack}\"\n\n[[revisions]]\nletter = \"B\"\ndate = 2026-11-30\nnote = \"Lighter beam\"\n"
    );
    let text = jobs::START.replacen(A, &again, 1);
    assert_ne!(text, jobs::START);
    text
}

fn lighter(text: &str) -> String {
    let out = text.replacen("dead = \"18 kN\"", "dead = \"17 kN\"", 1);
    assert_ne!(out, text);
    out
}

fn text_of(pdf: &[u8]) -> String {
    Read::new(pdf).texts().concat()
}

fn made(text: &str, folder: &Path) -> Result<(String, Vec<u8>), String> {
    let (b, results) = draw("job.toml", text).unwrap_or_else(|e| panic!("{e}"));
    let made = set(&b, &results, &Source { text, folder, house: None });
    made.map(|made| (file_name(&b), made.pdf)).map_err(|e| e.to_string())
}

/// A folder with the pack of A in it, and its name.
fn issued() -> (tempfile::TempDir, String) {
    let dir = tempfile::tempdir().expect("a folder");
    let (name, pdf) = made(jobs::START, dir.path()).expect("a pack");
    std::fs::write(dir.path().join(&name), pdf).expect("a file");
    (dir, name)
}

#[test]
fn a_new_issue_lists_what_changed() {
    let (dir, name) = issued();
    let (b, pdf) = made(&lighter(&second(&name)), dir.path()).expect("a pack");
    assert_eq!(b, "2419 Calculations (B).pdf");
    let text = text_of(&pdf);
    for words in [
        "Changes since revision A of 21 October 2026",
        "R1 overturning",
        "dead = \"17 kN\"",
        "lines of working",
    ] {
        assert!(text.contains(&squeeze(words)), "{words} is not in the pack");
    }
    let (_, plain) =
        made(&second(&name).replacen(&format!("pack = \"{name}\"\n"), "", 1), dir.path()).expect("a pack");
    assert!(!text_of(&plain).contains("Changessince"), "nothing is listed without the earlier pack");
}

/// A bar stands beside what changed and beside nothing else: each row and each sheet of the later issue is held against
/// the earlier one by what it prints.
#[test]
fn marks_stand_on_what_changed_alone() {
    let (_dir, name) = issued();
    let job = |text: &str| {
        let (b, results) = draw("job.toml", text).expect("a valid job");
        (report::pack(&b, &results, text, &digest(text)), record::of_job(&b, &results, &digest(text)), b)
    };
    let (before, was, _) = job(jobs::START);
    let held = Held { job: jobs::START.to_owned(), practice: None, record: was };
    for (text, changes) in [(second(&name), false), (lighter(&second(&name)), true)] {
        let (mut after, now, b) = job(&text);
        since::mark(&mut after, &b.revisions[0], &held, &now, "");
        for (old, new) in before.schedule.iter().zip(&after.schedule) {
            let printed = |r: &data::Scheduled| (r.demand.clone(), r.resistance.clone(), r.ratio.clone());
            assert_eq!(new.changed, printed(old) != printed(new), "{} {}", new.mark, new.check);
        }
        let sheets: Vec<&str> = after.sections.iter().filter(|s| s.changed).map(|s| s.id.as_str()).collect();
        assert_eq!(!sheets.is_empty(), changes, "{sheets:?}");
        assert_eq!(sheets.iter().any(|id| id.contains("R1")), changes, "{sheets:?}");
        // A lighter beam leaves bricks and panels as they were.
        assert!(!sheets.iter().any(|id| id.contains("materials") || id.contains("P1")), "{sheets:?}");
        assert_eq!(after.schedule.iter().any(|r| r.changed), changes);
    }
}

#[test]
fn a_pack_that_is_not_the_earlier_issue_is_refused() {
    let (dir, name) = issued();
    let refused = |text: &str| made(text, dir.path()).expect_err("another pack");
    let other = second(&name).replacen("number = \"2419\"", "number = \"2420\"", 1);
    assert!(refused(&other).contains("it is the pack of job 2419, revision A"), "{}", refused(&other));
    std::fs::write(dir.path().join("broken.pdf"), b"%PDF-1.7 and no more").expect("a file");
    assert!(refused(&second("broken.pdf")).contains("does not read as a PDF"));
    assert!(refused(&second("gone.pdf")).contains("cannot be read"));
    let on_last = jobs::START.replacen(A, &format!("{A}pack = \"x.pdf\"\n"), 1);
    let said = draw("job.toml", &on_last).map(|_| ()).expect_err("the current issue").to_string();
    assert!(said.contains("the current issue has no earlier pack"), "{said}");
}

/// Every pair of three issues of every demo job: alike with itself, and the same changes from either side.
#[test]
fn every_pair_of_issues_compares() {
    let of = |name: &str, text: &str| -> Record {
        let (b, results) = draw(name, text).unwrap_or_else(|e| panic!("{name}: {e}"));
        record::of_job(&b, &results, &digest(text))
    };
    for (name, text) in jobs::demos() {
        let factor = "gamma_M = { value = 3.2, reason = \"Another mason.\" }\n";
        let second = match text.find("[basis]") {
            _ if text.contains("\ngamma_M = { value = 3.0") => text.replacen("value = 3.0", "value = 3.2", 1),
            Some(at) => {
                let next = at + text[at..].find('\n').expect("more lines") + 1;
                format!("{}{factor}{}", &text[..next], &text[next..])
            }
            None => format!("{text}\n[basis]\n{factor}"),
        };
        let third = second.replacen("title = \"", "title = \"Again: ", 1);
        let issues = [text, second, third].map(|t| of(&name, &t));
        for was in &issues {
            for now in &issues {
                let (there, back) = (records(was, now), records(now, was));
                let turned =
                    |c: &Change| Change { what: c.what.clone(), was: c.now.clone(), now: c.was.clone() };
                let mut a: Vec<Change> = there.results.iter().map(turned).collect();
                let mut b = back.results.clone();
                let key = |c: &Change| (c.what.clone(), c.was.clone(), c.now.clone());
                a.sort_by_key(key);
                b.sort_by_key(key);
                assert_eq!(a, b, "{name}");
                assert_eq!(there.is_empty(), was == now, "{name}");
                assert_eq!(there.sheets.len(), back.sheets.len(), "{name}");
            }
        }
    }
}
