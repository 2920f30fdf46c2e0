//! What the command prints and writes: JSON, colour, file names, places.

use serde_json::Value;

use super::{PACK, Place, SUMMARY, demo, expected, names};
use crate::jobs;

fn json(text: &str) -> Vec<Value> {
    serde_json::from_str(text).unwrap_or_else(|e| panic!("{e}: {text}"))
}

#[test]
fn json_is_sound_for_good_and_bad_jobs() {
    let short = demo("short-nib");
    let bad = jobs::START.replace("length = \"7.4 m\"", "").replace("dead = \"18 kN\"", "dead = \"18 kNN\"");
    let place = Place::with(&[("good.toml", jobs::START), ("short.toml", &short), ("bad.toml", &bad)]);
    let ran = place.run(&["check", "--json", "good.toml", "bad.toml", "short.toml", "missing.toml"]);
    assert_eq!((ran.code, ran.err.as_str()), (2, ""));
    let all = json(&ran.out);
    let files: Vec<&str> = all.iter().map(|r| r["file"].as_str().expect("a name")).collect();
    assert_eq!(files, ["good.toml", "bad.toml", "short.toml", "missing.toml"]);

    assert_eq!(all[0]["job"], "2419");
    let checks = all[0]["sheets"]
        .as_array()
        .expect("sheets")
        .iter()
        .flat_map(|s| s["checks"].as_array().expect("checks"));
    let mut count = 0;
    for check in checks {
        count += 1;
        assert!(check["ratio"].is_number() && check["clause"].is_string(), "{check}");
        let within = check["ratio"].as_f64().expect("a number") <= 1.0;
        assert_eq!(check["verdict"] == "adequate", within, "{check}");
    }
    assert!(count > 10, "{count} checks");

    assert_eq!(all[1]["outcome"], "error");
    let first = &all[1]["diagnostics"][0];
    assert!(first["line"].is_number() || first["places"].is_array() || first["at"].is_object(), "{first}");
    assert_eq!(all[2]["outcome"], "not-adequate");
    assert_eq!(all[3]["outcome"], "error");
    assert!(all[3]["message"].as_str().expect("words").contains("missing.toml"));
}

/// The lines and the JSON of the same job say the same.
#[test]
fn lines_and_json_agree() {
    let place = Place::with(&[("house.toml", jobs::START)]);
    let lines = place.run(&["check", "house.toml"]).out;
    let record = &json(&place.run(&["check", "--json", "house.toml"]).out)[0];
    let words = record["words"].as_str().expect("words");
    assert!(lines.trim_end().ends_with(&format!("Outcome: {words}")), "{lines}");
    for sheet in record["sheets"].as_array().expect("sheets") {
        for check in sheet["checks"].as_array().expect("checks") {
            let (what, ratio) =
                (check["check"].as_str().expect("words"), check["ratio_printed"].as_str().expect("a ratio"));
            assert!(lines.lines().any(|l| l.contains(what) && l.contains(ratio)), "{what} {ratio}: {lines}");
        }
    }
}

#[test]
fn no_colour_when_piped_or_unwanted() {
    let place = Place::with(&[("house.toml", jobs::START), ("bad.toml", "[job]\nnumbr = 1\n")]);
    let plain = place.run(&["check", "house.toml", "bad.toml"]);
    assert!(!plain.out.contains('\x1b') && !plain.err.contains('\x1b'), "{}{}", plain.out, plain.err);
    let mut forced = place.command(&["check", "house.toml", "bad.toml"]);
    let forced: super::Ran = forced.env("CLICOLOR_FORCE", "1").output().expect("runs").into();
    assert!(forced.err.contains('\x1b'), "colour can be had: {}", forced.err);
    let mut refused = place.command(&["check", "house.toml", "bad.toml"]);
    let refused: super::Ran = refused.env("NO_COLOR", "1").output().expect("runs").into();
    assert_eq!((refused.out, refused.err), (plain.out, plain.err));
}

#[test]
fn a_missing_folder_is_made() {
    let place = Place::with(&[("house.toml", jobs::START)]);
    let ran = place.run(&["sheet", "house.toml", "--into", "packs/2026/für A"]);
    assert_eq!((ran.code, ran.err.as_str()), (expected(jobs::START), ""));
    assert_eq!(names(&place.path().join("packs/2026/für A")), [PACK, SUMMARY]);
}

#[test]
fn the_pack_stands_beside_its_job() {
    let place = Place::with(&[("a folder/house.toml", jobs::START)]);
    place.run(&["sheet", "a folder/house.toml"]);
    assert_eq!(names(&place.path().join("a folder")), [PACK, SUMMARY, "house.toml"]);
}

#[test]
fn either_document_alone() {
    for (which, file) in [("pack", PACK), ("summary", SUMMARY)] {
        let place = Place::with(&[("house.toml", jobs::START)]);
        let ran = place.run(&["sheet", "--only", which, "house.toml"]);
        assert_eq!((ran.code, ran.err.as_str()), (expected(jobs::START), ""));
        assert_eq!(place.list(), [file, "house.toml"]);
    }
    let place = Place::with(&[("house.toml", jobs::START)]);
    let ran = place.run(&["sheet", "--only", "both", "house.toml"]);
    assert_eq!(ran.code, 2);
    assert!(ran.err.contains("pack") && ran.err.contains("summary"), "{}", ran.err);
}

#[test]
fn hard_words_of_the_job_are_told() {
    let long = "Taking out the wall, and after that this, and that, and the other, and one more, and so on, until nobody who reads it knows what it was about.";
    let text = jobs::START.replace("Taking out the wall between kitchen and dining room and putting in a steel beam on the two nibs that stay.", long);
    assert_ne!(text, jobs::START);
    let place = Place::with(&[("house.toml", &text)]);
    let ran = place.run(&["sheet", "--only", "summary", "house.toml"]);
    assert!(ran.out.contains("note: a sentence of the summary has 29 words, 25 is plain"), "{}", ran.out);
}

#[test]
fn file_names_keep_to_plain_signs() {
    let text = jobs::START
        .replace("number = \"2419\"", "number = \"24-19_b\"")
        .replace("letter = \"A\"", "letter = \"C1\"");
    let place = Place::with(&[("dëmo job.toml", &text)]);
    let ran = place.run(&["sheet", "dëmo job.toml", "--times"]);
    assert_ne!(ran.code, 2, "{}", ran.err);
    assert!(ran.out.contains("layout") && ran.out.contains(" ms"), "{}", ran.out);
    assert_eq!(place.list(), ["24-19_b Calculations (C1).pdf", "24-19_b Summary (C1).pdf", "dëmo job.toml"]);
    for number in ["../24", "24/19", "24 19", ""] {
        let text = jobs::START.replace("number = \"2419\"", &format!("number = \"{number}\""));
        let place = Place::with(&[("job.toml", &text)]);
        assert_eq!(place.run(&["sheet", "job.toml"]).code, 2, "{number:?}");
        assert_eq!(place.list(), ["job.toml"]);
    }
}
