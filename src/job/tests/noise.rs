//! No text makes the reader panic, and every refusal says where.

use proptest::prelude::*;

use super::{DEMOS, GOOD};
use crate::error::Report;
use crate::job::read;

/// What a mutation may put into a job file: the sort of thing that a hand or a broken disk does.
const PIECES: &[&str] = &[
    "\"",
    "'",
    "=",
    "[",
    "]",
    "[[",
    "]]",
    "{",
    "}",
    ",",
    ".",
    "#",
    "\n",
    "\r\n",
    "\r",
    "\t",
    "\\",
    "0",
    "-1",
    "nan",
    "inf",
    "1e999",
    "99999999999999999999",
    "true",
    "\"\"",
    "\" \"",
    "\"900 mm\"",
    "\"900\"",
    "\"1e9 m\"",
    "\"-5 kN\"",
    "2026-02-30",
    "12:00:00",
    "2026-10-14T12:00:00Z",
    "[returns]",
    "[[returns]]",
    "[plan]",
    "{ value = 1 }",
    "é",
    "\u{202e}",
    "\u{feff}",
    "\u{0}",
    "\"\\u0000\"",
    "🧱",
    "removed = true\n",
    "'''",
    "\"\"\"",
];

fn settings() -> ProptestConfig {
    ProptestConfig { cases: 300, failure_persistence: None, ..ProptestConfig::default() }
}

fn judge(name: &str, text: &str) -> Result<(), TestCaseError> {
    match read(name, text) {
        Ok(building) => prop_assert!(!building.identity.number.is_empty()),
        Err(report) => refused(&report, text)?,
    }
    Ok(())
}

fn refused(report: &Report, text: &str) -> Result<(), TestCaseError> {
    prop_assert!(!report.diagnostics().is_empty());
    for d in report.diagnostics() {
        for span in std::iter::once(&d.span).chain(d.others.iter().map(|o| &o.span)) {
            prop_assert!(text.get(span.clone()).is_some_and(|s| !s.contains('\n')), "{d:?}");
        }
        prop_assert!(!d.message.is_empty() && !d.allowed.is_empty() && !d.help.is_empty(), "{d:?}");
    }
    prop_assert!(report.render(false).contains("to put right"));
    prop_assert!(report.render(true).len() > report.render(false).len());
    prop_assert_eq!(report.records().len(), report.diagnostics().len());
    Ok(())
}

fn floor(text: &str, at: usize) -> usize {
    (0..=at.min(text.len())).rev().find(|&i| text.is_char_boundary(i)).unwrap_or(0)
}

proptest! {
    #![proptest_config(settings())]

    #[test]
    fn mutated_jobs_are_read_or_refused(
        job in 0..DEMOS.len(),
        edits in prop::collection::vec((any::<prop::sample::Index>(), 0usize..12, prop::sample::select(PIECES)), 1..6),
    ) {
        let (name, text) = DEMOS[job];
        let mut text = text.to_owned();
        for (place, cut, piece) in edits {
            let from = floor(&text, place.index(text.len() + 1));
            let to = floor(&text, from + cut).max(from);
            text.replace_range(from..to, piece);
        }
        judge(name, &text)?;
    }

    /// Whole values exchanged keep the TOML sound, so that the judgements behind it are reached.
    #[test]
    fn exchanged_values_are_read_or_refused(
        edits in prop::collection::vec((any::<prop::sample::Index>(), any::<prop::sample::Index>(), any::<bool>()), 1..12),
    ) {
        let mut lines: Vec<String> = GOOD.lines().map(str::to_owned).collect();
        for (one, other, whole) in edits {
            let (i, j) = (one.index(lines.len()), other.index(lines.len()));
            if whole {
                lines.swap(i, j);
            } else if let (Some((key, _)), Some((_, value))) = (lines[i].split_once(" = "), lines[j].split_once(" = ")) {
                lines[i] = format!("{key} = {value}");
            }
        }
        judge("exchanged.toml", &lines.join("\n"))?;
    }

    #[test]
    fn bytes_are_read_or_refused(bytes in prop::collection::vec(any::<u8>(), 0..400)) {
        judge("bytes.toml", &String::from_utf8_lossy(&bytes))?;
    }

    #[test]
    fn toml_like_text_is_read_or_refused(text in "([a-z_]{1,8} = (\"[ -~]{0,8}\"|[0-9.]{1,6}|\\[\\]|\\{\\})\n|\\[{1,2}[a-z.]{1,12}\\]{1,2}\n){0,20}") {
        judge("like.toml", &text)?;
    }
}

#[test]
fn nothing_and_odd_endings_are_refused_with_a_place() {
    for text in
        ["", "\n", "\r", "[job]", "[[job]]", "job = 1", "\u{feff}", "[returns]\n", "materials = []", "é"]
    {
        let report = read("odd.toml", text).expect_err("no job stands in so little text");
        refused(&report, text).unwrap_or_else(|e| panic!("{text:?}: {e}"));
    }
}

#[test]
fn deep_brackets_do_not_exhaust_the_stack() {
    for piece in ["[", "{a=", "[[", "a.", "\"", "{"] {
        let text = format!("a = {}", piece.repeat(20_000));
        assert!(read("deep.toml", &text).is_err(), "{piece}");
    }
}

#[test]
fn thousands_of_faults_are_all_shown() {
    let text: String = (0..3000).map(|i| format!("entry_{i} = 1\n")).collect();
    let report = read("long.toml", &text).expect_err("nobody reads these");
    assert!(report.diagnostics().len() > 3000);
    assert!(report.render(false).contains("--> long.toml:3000:1\n"));
}
