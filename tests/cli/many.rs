//! Several jobs in one call.

use super::{Place, demo, names};
use crate::jobs;

#[test]
fn one_bad_job_holds_up_no_other() {
    let (first, last) = (demo("short-nib"), demo("lime-terrace"));
    let place =
        Place::with(&[("a.toml", &first), ("b.toml", "[job]\n"), ("c.toml", jobs::START), ("d.toml", &last)]);
    let ran =
        place.run(&["sheet", "a.toml", "b.toml", "c.toml", "missing.toml", "d.toml", "--into", "packs"]);
    assert_eq!(ran.code, 2);
    assert!(ran.err.contains("b.toml") && ran.err.contains("missing.toml"), "{}", ran.err);
    let packs = names(&place.path().join("packs"));
    assert_eq!(packs.len(), 6, "a pack and a summary each: {packs:?}");
    // In the order of the call.
    let mut numbers: Vec<&str> = ran.out.lines().map(|l| &l["packs/".len().."packs/".len() + 4]).collect();
    numbers.dedup();
    let number = |text: &str| {
        text.lines().find_map(|l| l.strip_prefix("number = \"")).expect("a number")[..4].to_owned()
    };
    assert_eq!(numbers, [number(&first), number(jobs::START), number(&last)]);
}

/// A job gives the same pack alone and among others.
#[test]
fn alone_and_among_others_the_same() {
    let texts: Vec<String> = (0..6).map(jobs::varied).collect();
    let files: Vec<String> = (0..6).map(|n| format!("{n}.toml")).collect();
    let place = Place::with(&[]);
    for (file, text) in files.iter().zip(&texts) {
        place.put(file, text.as_bytes());
    }
    let mut args = vec!["sheet", "--into", "together"];
    args.extend(files.iter().map(String::as_str));
    assert_ne!(place.run(&args).code, 2);
    for file in &files[..3] {
        assert_ne!(place.run(&["sheet", "--into", "alone", file]).code, 2);
    }
    let alone = names(&place.path().join("alone"));
    assert_eq!(alone.len(), 6);
    assert_eq!(names(&place.path().join("together")).len(), 12);
    for pack in alone {
        assert!(place.get(&format!("alone/{pack}")) == place.get(&format!("together/{pack}")), "{pack}");
    }
}

#[test]
fn two_jobs_of_one_number_do_not_replace_each_other() {
    let other = jobs::START.replace("7 Tansy Rise", "8 Tansy Rise");
    let place = Place::with(&[("one.toml", jobs::START), ("two.toml", &other)]);
    let ran = place.run(&["sheet", "one.toml", "two.toml"]);
    assert_eq!(ran.code, 2);
    assert!(
        ran.err.contains("one.toml has just been written there") && ran.err.contains("help:"),
        "{}",
        ran.err
    );
    assert_eq!(ran.out.lines().count(), 2, "{}", ran.out);
    assert_eq!(place.list().len(), 4);
}

#[test]
fn several_jobs_are_checked_in_order() {
    let place = Place::empty();
    let files: Vec<String> = (0..8).map(|n| format!("{n}.toml")).collect();
    for (n, file) in files.iter().enumerate() {
        place.put(file, jobs::varied(n as u64).as_bytes());
    }
    let mut args = vec!["check"];
    args.extend(files.iter().map(String::as_str));
    let ran = place.run(&args);
    let numbers: Vec<&str> = ran.out.lines().filter(|l| l.starts_with("V00")).map(|l| &l[..5]).collect();
    assert_eq!(numbers, ["V0000", "V0001", "V0002", "V0003", "V0004", "V0005", "V0006", "V0007"]);
}
