//! What the command says of itself.

use perpend::checks::catalogue::ALL;

use super::Place;

#[test]
fn every_check_is_listed_with_its_clause() {
    let ran = Place::empty().run(&["checks"]);
    assert_eq!((ran.code, ran.err.as_str()), (0, ""));
    for known in ALL {
        assert!(ran.out.contains(&format!("{}  [{}]", known.words, known.clause)), "{}", known.words);
    }
}

/// One JSON document, and nothing else, that names the tables of the start job.
#[test]
fn the_schema_is_printed_as_json() {
    let ran = Place::empty().run(&["schema"]);
    assert_eq!((ran.code, ran.err.as_str()), (0, ""));
    let schema: serde_json::Value = serde_json::from_str(&ran.out).expect("JSON");
    assert_eq!(schema["$schema"], "https://json-schema.org/draft/2020-12/schema");
    for line in perpend::job::start::TEMPLATE.lines().filter(|l| l.starts_with('[')) {
        let head = line.trim_start_matches('[').split([']', '.']).next().expect("a head");
        assert!(schema["properties"][head].is_object(), "{line}");
    }
}

/// From the same source as the help: each names every command and flag.
#[test]
fn completions_and_manual_know_every_command_and_flag() {
    let place = Place::empty();
    let manual = place.run(&["manual"]);
    assert_eq!((manual.code, manual.err.as_str()), (0, ""));
    assert!(manual.out.contains(".TH perpend 1"), "{}", manual.out);
    let command = perpend::cli::command();
    for sub in command.get_subcommands().filter(|s| !s.is_hide_set()) {
        assert!(manual.out.contains(&sub.get_name().to_uppercase()), "{}", sub.get_name());
        for flag in sub.get_arguments().filter_map(|a| a.get_long()) {
            assert!(manual.out.contains(&flag.replace('-', "\\-")), "{flag}");
        }
    }
    for shell in ["bash", "zsh", "fish", "elvish", "powershell"] {
        let ran = place.run(&["completions", shell]);
        assert_eq!((ran.code, ran.err.as_str()), (0, ""), "{shell}");
        for sub in command.get_subcommands().filter(|s| !s.is_hide_set()) {
            assert!(ran.out.contains(sub.get_name()), "{shell}: {}", sub.get_name());
        }
    }
    assert_eq!(place.run(&["completions", "none"]).code, 2);
}
