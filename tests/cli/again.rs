//! `recheck` and `compare` as a person runs them.

use super::{PACK, Place, SUMMARY};
use crate::jobs;

#[test]
fn a_pack_is_worked_again_and_compared_with_its_job() {
    let later = jobs::START.replacen("dead = \"18 kN\"", "dead = \"17 kN\"", 1);
    assert_ne!(later, jobs::START);
    let place = Place::with(&[("job.toml", jobs::START), ("later.toml", &later)]);
    place.run(&["sheet", "job.toml"]);
    let left = place.list();

    let ran = place.run(&["recheck", PACK]);
    assert_eq!((ran.code, ran.err.as_str()), (0, ""));
    assert!(ran.out.contains("every printed result stands"), "{}", ran.out);
    assert!(ran.out.contains(&format!("made by Perpend {}", env!("CARGO_PKG_VERSION"))), "{}", ran.out);

    let ran = place.run(&["compare", PACK, "job.toml"]);
    assert_eq!((ran.code, ran.out.trim()), (0, "alike: the same job, the same results"));

    let ran = place.run(&["compare", PACK, "later.toml"]);
    assert_eq!(ran.code, 1, "{}", ran.err);
    for words in [
        "Inputs: 1 line",
        "was dead = \"18 kN\"",
        "now dead = \"17 kN\"",
        "R1 overturning",
        "lines of working",
    ] {
        assert!(ran.out.contains(words), "{words} is not in {}", ran.out);
    }
    let working = place.run(&["compare", "--working", PACK, "later.toml"]);
    assert!(working.out.lines().count() > ran.out.lines().count() + 20, "{}", working.out);
    assert_eq!(place.list(), left, "nothing is written");
}

#[test]
fn what_is_no_pack_is_refused_and_holds_up_no_other() {
    let place = Place::with(&[("job.toml", jobs::START), ("x.pdf", "nothing")]);
    place.run(&["sheet", "job.toml"]);
    let half = place.get(PACK);
    place.put("half.pdf", &half[..half.len() / 2]);
    let ran = place.run(&["recheck", "x.pdf", "half.pdf", "none.pdf", PACK]);
    assert_eq!(ran.code, 2);
    assert!(ran.out.contains("every printed result stands"), "{}", ran.out);
    for words in ["x.pdf: it does not read as a PDF", "half.pdf: it", "none.pdf cannot be read"] {
        assert!(ran.err.contains(words), "{words} is not in {}", ran.err);
    }
    assert_eq!(ran.err.matches("help:").count(), 3, "{}", ran.err);
    assert_eq!(place.run(&["compare", "x.pdf", "job.toml"]).code, 2);
}

/// A draft is replaced; what was issued stays as it went out, whatever is asked for.
#[test]
fn an_issued_pack_is_never_overwritten() {
    let draft = jobs::START.to_owned();
    let issued = draft.replacen("status = \"preliminary\"", "status = \"for building control\"", 1);
    assert_ne!(draft, issued);
    let changed = |text: &str| text.replacen("dead = \"18 kN\"", "dead = \"17 kN\"", 1);
    let place = Place::with(&[("job.toml", &draft)]);
    for text in [&draft, &changed(&draft), &issued] {
        place.put("job.toml", text.as_bytes());
        assert_ne!(place.run(&["sheet", "job.toml"]).code, 2);
    }
    let (pack, summary) = (place.get(PACK), place.get(SUMMARY));
    assert_eq!(place.run(&["sheet", "job.toml"]).code, 0, "the same job gives the same pack");

    place.put("job.toml", changed(&issued).as_bytes());
    for args in [
        &["sheet", "job.toml"][..],
        &["sheet", "--only", "summary", "job.toml"],
        &["sheet", "job.toml", "job.toml"],
    ] {
        let ran = place.run(args);
        assert_eq!(ran.code, 2, "{args:?}: {}", ran.out);
        for words in ["is revision A as issued, for building control", "next letter under [[revisions]]"] {
            assert!(ran.err.contains(words), "{words} is not in {}", ran.err);
        }
        assert!(place.get(PACK) == pack && place.get(SUMMARY) == summary, "{args:?}");
    }
    // Back to a draft in the job file does not free its place either.
    place.put("job.toml", changed(&draft).as_bytes());
    assert_eq!(place.run(&["sheet", "job.toml"]).code, 2);

    let next = changed(&issued).replacen("letter = \"A\"", "letter = \"B\"", 1);
    place.put("job.toml", next.as_bytes());
    assert_eq!(place.run(&["sheet", "job.toml"]).code, 0);
    assert!(place.get(PACK) == pack);
    assert!(place.list().contains(&"2419 Calculations (B).pdf".to_owned()), "{:?}", place.list());
}

/// Another version of the program may make another pack of the same job: it does not overwrite one that was issued either.
#[test]
fn another_version_does_not_overwrite_an_issued_pack() {
    let text = jobs::START.replacen("status = \"preliminary\"", "status = \"for construction\"", 1);
    let (b, results) = perpend::draw("job.toml", &text).expect("a valid job");
    let mut data = perpend::report::pack(&b, &results, &text, &perpend::digest(&text));
    data.record = data.record.replacen(
        &format!("\"version\": \"{}\"", env!("CARGO_PKG_VERSION")),
        "\"version\": \"0.0.9\"",
        1,
    );
    let old = perpend::pack::typeset(data, &[], "another", None).expect("a pack").pdf;
    let place = Place::with(&[("job.toml", &text)]);
    place.put(PACK, &old);
    for args in [&["sheet", "job.toml"][..], &["sheet", "--only", "summary", "job.toml"]] {
        let ran = place.run(args);
        assert_eq!(ran.code, 2, "{args:?}");
        assert!(ran.err.contains("this version of the program"), "{}", ran.err);
    }
    assert!(place.get(PACK) == old && !place.list().contains(&SUMMARY.to_owned()));
}
