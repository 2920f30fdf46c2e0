//! Packs made before: worked again, and held against each other.

mod first_issue;
mod revisions;

use std::path::Path;

use perpend::archive::compare::{self, Differences};
use perpend::archive::{Held, Rechecked, Unfit, held};
use perpend::report::record::{self, Record};
use perpend::{digest, draw, pack, recheck, report, sheet};

use crate::examples::job::{BLOCK_140, PLAIN_RETURN, with_return};
use crate::jobs;

fn job() -> String {
    with_return(BLOCK_140, PLAIN_RETURN)
}

/// A pack of the plain job with `change` made to what it prints, as somebody would who wants another result.
fn pack_with(change: impl Fn(&mut pack::data::Pack)) -> Vec<u8> {
    let text = job();
    let (building, results) = draw("job.toml", &text).expect("a valid job");
    let mut data = report::pack(&building, &results, &text, &digest(&text));
    change(&mut data);
    pack::typeset(data, &[], &digest(&text), None).expect("a pack").pdf
}

fn again(pdf: Vec<u8>) -> Rechecked {
    recheck("job.toml", held(pdf).expect("a pack")).expect("a valid job")
}

#[test]
fn a_pack_rechecks() {
    let made = sheet("job.toml", &job(), Path::new("")).expect("a pack");
    let Held { job: inside, practice, record } = held(made.typeset.pdf.clone()).expect("a pack");
    assert_eq!(practice, None);
    assert_eq!(inside, job());
    assert_eq!(record.outcome, made.results.outcome.words());
    assert!(record.results.len() > 3 && record.sheets.iter().all(|s| !s.lines.is_empty()));
    let found = again(made.typeset.pdf);
    assert!(found.stands(), "{:?}", found.differences);
}

/// One digit of the job file: 1200 mm become 1300 mm.
#[test]
fn one_digit_of_the_job_is_seen() {
    let found = again(pack_with(|p| p.inputs = p.inputs.replace("\"1200 mm\"", "\"1300 mm\"")));
    assert!(!found.stands() && !found.same_job);
    assert!(!found.differences.results.is_empty() && !found.differences.sheets.is_empty());
    // A remark changes no figure, and is not the job file all the same.
    let found = again(pack_with(|p| p.inputs += "# a remark\n"));
    assert!(!found.stands() && !found.same_job && found.differences.is_empty());
}

/// Each digit of a result, of a use and of a line of working, one at a time.
#[test]
fn one_digit_of_the_results_is_seen() {
    let text = job();
    let (building, results) = draw("job.toml", &text).expect("a valid job");
    let true_one = record::of_job(&building, &results, &digest(&text));
    let found = |record: Record| {
        let held = Held { job: text.clone(), practice: None, record };
        recheck("job.toml", held).expect("a valid job")
    };
    assert!(found(true_one.clone()).stands());
    let other = |s: &str| {
        let at = s.find(|c: char| c.is_ascii_digit())?;
        let digit = if s.as_bytes()[at] == b'9' { "8" } else { "9" };
        Some(format!("{}{digit}{}", &s[..at], &s[at + 1..]))
    };
    for n in 0..true_one.results.len() {
        for use_of_it in [false, true] {
            let mut changed = true_one.clone();
            let row = &mut changed.results[n];
            let place = if use_of_it { &mut row.ratio } else { &mut row.demand };
            let Some(wrong) = other(place) else { continue };
            *place = wrong;
            let found = found(changed);
            assert!(!found.stands() && found.differences.results.len() == 1, "{n}: {:?}", found.differences);
        }
    }
    let mut changed = true_one;
    let line =
        changed.sheets.iter_mut().flat_map(|s| &mut s.lines).find_map(|l| other(l).map(|new| (l, new)));
    let (line, wrong) = line.expect("a line with a figure");
    *line = wrong;
    let found = found(changed);
    assert!(!found.stands() && found.differences.sheets.len() == 1, "{:?}", found.differences);
}

#[test]
fn files_that_are_no_packs() {
    assert_eq!(held(b"x".to_vec()).err(), Some(Unfit::Broken));
    let bare = b"%PDF-1.7\n1 0 obj\n<</Type/Catalog/Pages 2 0 R>>\nendobj\n2 0 obj\n<</Type/Pages/Kids[3 0 R]/Count 1>>\n\
        endobj\n3 0 obj\n<</Type/Page/Parent 2 0 R/MediaBox[0 0 9 9]>>\nendobj\ntrailer\n<</Root 1 0 R/Size 4>>\n%%EOF\n";
    assert_eq!(held(bare.to_vec()).err(), Some(Unfit::Without("job.toml")));
    let record = |from: &'static str, to: &'static str| {
        held(pack_with(|p| {
            assert!(p.record.contains(from), "{from}");
            p.record = p.record.replacen(from, to, 1);
        }))
    };
    assert!(matches!(record("{", "["), Err(Unfit::Foreign(what)) if what.contains("not JSON")));
    assert!(
        matches!(record("\"Perpend\"", "\"Another\""), Err(Unfit::Foreign(what)) if what.contains("not of Perpend"))
    );
    assert!(
        matches!(record("\"format\": 1", "\"format\": \"x\""), Err(Unfit::Foreign(what)) if what.contains("form"))
    );
    assert!(
        matches!(record("\"outcome\"", "\"outcame\""), Err(Unfit::Foreign(what)) if what.contains("outcome"))
    );
    assert_eq!(
        record("\"format\": 1", "\"format\": 7").err(),
        Some(Unfit::Later(7, env!("CARGO_PKG_VERSION").to_owned()))
    );
}

/// Demo jobs two by two: what is gone one way is new the other way, and a job is like itself.
#[test]
fn every_pair_of_demo_jobs_compares_both_ways() {
    let one = |(name, text): &(String, String)| {
        let (b, results) = draw(name, text).unwrap_or_else(|e| panic!("{name}: {e}"));
        record::of_job(&b, &results, &digest(text))
    };
    let all: Vec<Record> = jobs::demos().iter().map(one).collect();
    let turned = |d: &Differences| {
        let mut both: Vec<_> =
            d.results.iter().map(|c| (c.what.clone(), c.now.clone(), c.was.clone())).collect();
        both.sort();
        both
    };
    for a in &all {
        assert!(compare::records(a, a).is_empty());
        for b in all.iter().filter(|b| b.number > a.number) {
            let (there, back) = (compare::records(a, b), compare::records(b, a));
            assert!(!there.is_empty(), "{} {}", a.number, b.number);
            let mut plain: Vec<_> =
                there.results.iter().map(|c| (c.what.clone(), c.was.clone(), c.now.clone())).collect();
            plain.sort();
            // Words of a check that is on both sides are those of the earlier one: only what stands is compared.
            let values = |all: &[(String, Option<String>, Option<String>)]| {
                let mut values: Vec<_> = all.iter().map(|(_, was, now)| (was.clone(), now.clone())).collect();
                values.sort();
                values
            };
            assert_eq!(values(&plain), values(&turned(&back)), "{} {}", a.number, b.number);
        }
    }
}
