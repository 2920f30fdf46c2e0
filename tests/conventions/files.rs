//! Short files, and a coverage file beside every standard.

use super::{root, sources};

/// Files are split at this many lines.
const MOST_LINES: usize = 600;

#[test]
fn no_source_file_is_long() {
    let long: Vec<String> = sources()
        .into_iter()
        .map(|(file, text)| (file, text.lines().count()))
        .filter(|(_, n)| *n > MOST_LINES)
        .map(|(file, n)| format!("{file}: {n} lines"))
        .collect();
    assert!(long.is_empty(), "{}", long.join("\n"));
}

#[test]
fn every_standard_has_its_coverage() {
    let standards = root().join("src/standards");
    let mut seen = 0;
    for entry in std::fs::read_dir(standards).expect("the standards") {
        let folder = entry.expect("an entry").path();
        if folder.is_dir() {
            let file = folder.join("COVERAGE.md");
            let text =
                std::fs::read_to_string(&file).unwrap_or_else(|_| panic!("{} is missing", file.display()));
            assert!(text.lines().count() > 5, "{} says nothing", file.display());
            seen += 1;
        }
    }
    assert!(seen >= 4, "{seen} folders");
}
