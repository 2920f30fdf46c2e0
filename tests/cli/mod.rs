//! The command as a person runs it.

mod again;
mod many;
mod output;
mod practice;
mod sign;
mod teach;
mod trouble;
mod watch;

use std::path::Path;
use std::process::{Command, Output};

use tempfile::TempDir;

use crate::jobs;

/// A folder of its own in which the command runs.
struct Place(TempDir);

/// What the command left: exit code, output, errors.
struct Ran {
    code: i32,
    out: String,
    err: String,
}

impl Place {
    fn empty() -> Self {
        Self(tempfile::tempdir().expect("a folder"))
    }

    /// A place with job files in it: name and text.
    fn with(files: &[(&str, &str)]) -> Self {
        let place = Self::empty();
        for (name, text) in files {
            place.put(name, text.as_bytes());
        }
        place
    }

    fn path(&self) -> &Path {
        self.0.path()
    }

    fn put(&self, name: &str, bytes: &[u8]) {
        let path = self.path().join(name);
        std::fs::create_dir_all(path.parent().expect("a folder")).expect("a folder");
        std::fs::write(path, bytes).expect("a file");
    }

    fn get(&self, name: &str) -> Vec<u8> {
        std::fs::read(self.path().join(name)).unwrap_or_else(|e| panic!("{name}: {e}"))
    }

    /// Everything in the folder, by name.
    fn list(&self) -> Vec<String> {
        names(self.path())
    }

    fn command(&self, args: &[&str]) -> Command {
        let mut command = Command::new(env!("CARGO_BIN_EXE_perpend"));
        command.args(args).current_dir(self.path()).env_remove("NO_COLOR");
        command
    }

    fn run(&self, args: &[&str]) -> Ran {
        self.command(args).output().expect("the command runs").into()
    }
}

impl From<Output> for Ran {
    fn from(output: Output) -> Self {
        let text = |bytes: Vec<u8>| String::from_utf8(bytes).expect("UTF-8");
        Self {
            code: output.status.code().expect("an exit code"),
            out: text(output.stdout),
            err: text(output.stderr),
        }
    }
}

fn names(folder: &Path) -> Vec<String> {
    let entries = std::fs::read_dir(folder).expect("a folder");
    let mut all: Vec<String> =
        entries.map(|e| e.expect("an entry").file_name().into_string().expect("UTF-8")).collect();
    all.sort();
    all
}

/// The demo job of that name.
fn demo(name: &str) -> String {
    jobs::demos().into_iter().find(|(n, _)| n == name).unwrap_or_else(|| panic!("no demo job {name}")).1
}

/// The exit code that the outcome of a job asks for.
fn expected(text: &str) -> i32 {
    let (_, results) = perpend::check("job", text).expect("a valid job");
    i32::from(results.outcome.kind() != "adequate")
}

const PACK: &str = "2419 Calculations (A).pdf";
const SUMMARY: &str = "2419 Summary (A).pdf";

#[test]
fn from_an_empty_folder_to_a_pack() {
    let place = Place::empty();
    let start = place.run(&["start", "house.toml"]);
    assert_eq!((start.code, start.err.as_str()), (0, ""));
    assert!(start.out.contains("perpend check house.toml"), "{}", start.out);
    assert_eq!(place.get("house.toml"), jobs::START.as_bytes());

    let check = place.run(&["check", "house.toml"]);
    assert_eq!((check.code, check.err.as_str()), (expected(jobs::START), ""));
    assert!(check.out.contains("2419") && check.out.contains("\nOutcome: "), "{}", check.out);
    assert_eq!(place.list(), ["house.toml"]);

    let sheet = place.run(&["sheet", "house.toml"]);
    assert_eq!((sheet.code, sheet.err.as_str()), (expected(jobs::START), ""));
    assert!(sheet.out.starts_with(PACK), "{}", sheet.out);
    assert_eq!(place.list(), [PACK, SUMMARY, "house.toml"]);
    for pdf in [PACK, SUMMARY] {
        assert!(place.get(pdf).starts_with(b"%PDF-1.7"));
        assert!(sheet.out.contains(pdf), "{}", sheet.out);
    }
}

#[test]
fn exit_codes_say_the_outcome() {
    let place = Place::with(&[("bad.toml", "[job]\n")]);
    let mut seen = std::collections::BTreeSet::from([2]);
    for (name, text) in jobs::demos() {
        let file = format!("{name}.toml");
        place.put(&file, text.as_bytes());
        let ran = place.run(&["check", &file]);
        assert_eq!(ran.code, expected(&text), "{name}");
        seen.insert(ran.code);
    }
    assert_eq!(seen, [0, 1, 2].into());
    assert_eq!(place.run(&["check", "bad.toml"]).code, 2);
    assert_eq!(place.run(&["check", "missing.toml"]).code, 2);
    assert_eq!(place.run(&["chek", "bad.toml"]).code, 2);
    assert_eq!(place.run(&["check"]).code, 2);
    assert_eq!(place.run(&["check", "--no-such-flag", "bad.toml"]).code, 2);
}

/// The job from a plan reads and checks as it is written; its code says that it is conditional.
#[test]
fn the_job_from_a_plan_is_complete() {
    let place = Place::empty();
    let start = place.run(&["start", "--plan", "kitchen.toml"]);
    assert_eq!((start.code, start.err.as_str()), (0, ""));
    let check = place.run(&["check", "kitchen.toml"]);
    assert_eq!((check.code, check.err.as_str()), (1, ""));
    assert!(check.out.contains("Outcome: adequate once"), "{}", check.out);
}

#[test]
fn start_leaves_a_file_alone() {
    let place = Place::with(&[("house.toml", "mine")]);
    let ran = place.run(&["start", "house.toml"]);
    assert_eq!(ran.code, 2);
    assert!(
        ran.err.contains("house.toml") && ran.err.contains("left alone") && ran.err.contains("help:"),
        "{}",
        ran.err
    );
    assert_eq!(place.get("house.toml"), b"mine");
    assert_eq!(place.list(), ["house.toml"]);
}

#[test]
fn help_teaches_with_examples() {
    let place = Place::empty();
    let whole = place.run(&["--help"]);
    assert_eq!(whole.code, 0);
    for part in [
        "perpend start rear-opening.toml",
        "perpend check",
        "perpend sheet",
        "Exit codes: 0 adequate",
        "unsigned",
    ] {
        assert!(whole.out.contains(part), "{part} is not in {}", whole.out);
    }
    for command in ["start", "check", "sheet", "sign"] {
        let help = place.run(&[command, "--help"]);
        assert_eq!(help.code, 0);
        let example = format!("perpend {command} ");
        assert!(help.out.contains("Example") && help.out.matches(&example).count() >= 2, "{}", help.out);
    }
}

#[test]
fn without_arguments_it_says_what_it_can() {
    let ran = Place::empty().run(&[]);
    assert_eq!(ran.code, 2);
    assert!(ran.err.contains("Examples:") && ran.out.is_empty(), "{}{}", ran.out, ran.err);
}

#[test]
fn the_version_is_that_of_the_sheets() {
    let ran = Place::empty().run(&["--version"]);
    assert_eq!((ran.code, ran.out.trim()), (0, concat!("perpend ", env!("CARGO_PKG_VERSION"))));
}
