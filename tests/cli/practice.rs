//! Whose packs they are: the practice file that a person names, leaves beside the jobs, or sets once for all.

use super::{PACK, Place, SUMMARY};
use crate::jobs;

fn named(name: &str) -> String {
    format!("[practice]\nname = \"{name}\"\n")
}

/// The practice file inside the pack that was written.
fn inside(place: &Place) -> Option<String> {
    perpend::archive::held(place.get(PACK)).expect("a pack").practice
}

#[test]
fn a_file_that_is_named_comes_before_the_one_beside_the_job_and_that_before_the_usual_one() {
    let (flag, beside, usual) = (named("Elder"), named("Ash"), named("Rowan"));
    let place = Place::with(&[("job.toml", jobs::START), ("flag.toml", &flag), ("usual/all.toml", &usual)]);
    let sheet = |args: &[&str], env: bool| {
        let mut command = place.command(&[&["sheet", "--only", "pack", "job.toml"], args].concat());
        if env {
            command.env("PERPEND_PRACTICE", "usual/all.toml");
        }
        let ran: super::Ran = command.output().expect("the command runs").into();
        assert_eq!((ran.code, ran.err.as_str()), (0, ""), "{}", ran.out);
        inside(&place)
    };
    assert_eq!(sheet(&[], false), None);
    assert_eq!(sheet(&[], true), Some(usual));
    place.put("practice.toml", beside.as_bytes());
    assert_eq!(sheet(&[], true), Some(beside));
    assert_eq!(sheet(&["--practice", "flag.toml"], true), Some(flag));
}

#[test]
fn from_an_empty_folder_to_a_pack_in_a_style_of_ones_own() {
    let place = Place::empty();
    let start = place.run(&["start", "--practice", "practice.toml"]);
    assert_eq!((start.code, start.err.as_str()), (0, ""));
    assert!(start.out.contains("perpend sheet --practice practice.toml"), "{}", start.out);
    place.run(&["start", "job.toml"]);
    let ran = place.run(&["sheet", "job.toml"]);
    assert_eq!((ran.code, ran.err.as_str()), (0, ""));
    assert_eq!(place.list(), [PACK, SUMMARY, "job.toml", "practice.toml"]);
    assert_eq!(inside(&place).as_deref(), Some(perpend::job::start::PRACTICE));
    let again = place.run(&["recheck", PACK]);
    assert!(again.code == 0 && again.out.contains("every printed result stands"), "{}", again.out);
    // Several jobs: each in a process of its own, in the same style.
    place.put("other.toml", jobs::START.replacen("\"2419\"", "\"2420\"", 1).as_bytes());
    place.run(&["sheet", "--only", "pack", "job.toml", "other.toml"]);
    let other = perpend::archive::held(place.get("2420 Calculations (A).pdf")).expect("a pack");
    assert_eq!(other.practice.as_deref(), Some(perpend::job::start::PRACTICE));
}

#[test]
fn a_practice_that_cannot_be_used_leaves_nothing_behind() {
    for (text, found) in [
        ("[practice]\n", "`name` is missing"),
        ("[practice]\nname = \"Elder\"\n[style]\nlogo = \"gone.svg\"\nlogo_words = \"A mark\"\n", "gone.svg"),
        ("[practice]\nname = \"Elder\"\n[style]\naccent = \"#eeeeee\"\n", "contrast"),
        ("[practice\n", "practice.toml:1"),
    ] {
        let place = Place::with(&[("job.toml", jobs::START), ("practice.toml", text)]);
        let ran = place.run(&["sheet", "job.toml"]);
        assert_eq!((ran.code, ran.out.as_str()), (2, ""), "{text}");
        assert!(ran.err.contains(found) && ran.err.contains("help"), "{found} is not in\n{}", ran.err);
        assert_eq!(place.list(), ["job.toml", "practice.toml"]);
    }
    let place = Place::with(&[("job.toml", jobs::START)]);
    let ran = place.run(&["check", "--practice", "gone.toml", "job.toml"]);
    assert_eq!(ran.code, 2);
    assert!(
        ran.err.contains("gone.toml cannot be read") && ran.err.contains("perpend start --practice"),
        "{}",
        ran.err
    );
}

#[test]
fn an_issued_pack_stays_under_another_practice() {
    let issued = jobs::START.replacen("status = \"preliminary\"", "status = \"for construction\"", 1);
    let place = Place::with(&[("job.toml", &issued)]);
    assert_eq!(place.run(&["sheet", "job.toml"]).code, 0);
    let before = place.get(PACK);
    place.put("practice.toml", named("Elder").as_bytes());
    for only in ["pack", "summary"] {
        let ran = place.run(&["sheet", "--only", only, "job.toml"]);
        assert_eq!(ran.code, 2);
        assert!(ran.err.contains("the practice file is another"), "{}", ran.err);
    }
    assert_eq!(place.get(PACK), before);
    let ran = place.run(&["compare", PACK, "job.toml"]);
    assert!(
        ran.code == 1
            && ran.out.contains("Practice file\n    the whole file\n      was not there\n      now 2 lines"),
        "{}",
        ran.out
    );
}
