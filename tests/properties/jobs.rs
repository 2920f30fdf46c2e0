//! Any job text: it is read or refused with reasons; it never panics and never breaks a lock.

use perpend::error::Error;
use proptest::prelude::*;

use crate::jobs::demos;

/// Choices that a job may turn to another word.
const CHOICES: [(&str, &[&str]); 14] = [
    ("path = ", &["sideways", "up and down", "both"]),
    ("base = \"", &["dpc"]),
    ("mortar = ", &["M12", "M6", "M4", "M2", "lime"]),
    ("restraint = ", &["timber floor", "concrete floor", "none"]),
    ("route = \"stated", &["stated", "terrain"]),
    ("route = \"f", &["flexure", "one way"]),
    ("stands = ", &["before and after", "before", "after"]),
    ("sharing = ", &["strength", "stiffness"]),
    ("proof = \"seen", &["seen", "assumed"]),
    ("joists = ", &["into the wall", "along the wall"]),
    ("straps = ", &["none", "seen", "to be fitted"]),
    ("proof = \"shear", &["by rule", "shear flow"]),
    ("class = \"", &["1", "2A"]),
    ("unit = ", &["clay brick", "concrete brick", "aggregate block", "aac block"]),
];

/// The text with quantities scaled and words exchanged, as the two lists of picks say.
fn varied(
    text: &str,
    scales: &[(prop::sample::Index, f64)],
    turns: &[(prop::sample::Index, prop::sample::Index)],
) -> String {
    let mut lines: Vec<String> = text.lines().map(str::to_owned).collect();
    for (pick, scale) in scales {
        let places: Vec<usize> = (0..lines.len()).filter(|&n| quantity(&lines[n]).is_some()).collect();
        let n = *pick.get(&places);
        if let Some((from, to, value)) = quantity(&lines[n]) {
            let digits = format!("{:.3}", value * scale);
            lines[n].replace_range(from..to, &digits);
        }
    }
    for (pick, word) in turns {
        let places: Vec<(usize, &[&str])> = lines
            .iter()
            .enumerate()
            .filter_map(|(n, l)| CHOICES.iter().find(|c| l.starts_with(c.0)).map(|c| (n, c.1)))
            .collect();
        let (n, words) = *pick.get(&places);
        let (from, to) = (lines[n].find('"').unwrap_or(0), lines[n].find('"').unwrap_or(0) + 1);
        let end = to + lines[n][to..].find('"').unwrap_or(0) + 1;
        lines[n].replace_range(from..end, &format!("\"{}\"", word.get(words)));
    }
    lines.join("\n")
}

/// The first `"12.3 unit"` of a line: where its figures are, and what they say.
fn quantity(line: &str) -> Option<(usize, usize, f64)> {
    let line = line.split('#').next().unwrap_or("");
    let from = line.find("= \"").map(|at| at + 3).or_else(|| line.find("[\"").map(|at| at + 2))?;
    let len = line[from..].find(' ')?;
    let value = line[from..from + len].parse().ok()?;
    Some((from, from + len, value))
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    #[test]
    fn a_varied_job_never_breaks_a_lock(
        job in any::<prop::sample::Index>(),
        scales in prop::collection::vec((any::<prop::sample::Index>(), 0.3..3.0_f64), 0..6),
        turns in prop::collection::vec((any::<prop::sample::Index>(), any::<prop::sample::Index>()), 0..3),
    ) {
        let jobs = demos();
        let (name, text) = job.get(&jobs);
        let text = varied(text, &scales, &turns);
        match perpend::check(name, &text) {
            Ok((building, results)) => {
                // What is valid comes to one of the four outcomes, and what fails is said to fail.
                let fails = results.sections.iter().any(|s| {
                    let sheet = &s.sheet;
                    sheet.verdicts.iter().any(|v| !v.holds) || sheet.unshown.iter().any(|u| u.hold.is_none())
                });
                prop_assert_eq!(fails, results.outcome.kind() == "not-adequate");
                for section in &results.sections {
                    prop_assert!(section.sheet.verdicts.iter().all(|v| v.ratio >= 0.0), "{}", section.id);
                }
                // Returns, or a plan that carries its loads to the ground.
                prop_assert!(!building.returns.is_empty() || !building.floors.is_empty());
            }
            Err(Error::Job(report)) => prop_assert!(!report.diagnostics().is_empty()),
            Err(other) => prop_assert!(false, "{}", other),
        }
    }
}

/// The variation reaches the checks: enough of what it makes is valid.
#[test]
fn variations_are_mostly_read() {
    use proptest::strategy::ValueTree;
    use proptest::test_runner::TestRunner;
    let mut runner = TestRunner::deterministic();
    let jobs = demos();
    let strategy = (
        any::<prop::sample::Index>(),
        prop::collection::vec((any::<prop::sample::Index>(), 0.5..2.0_f64), 1..4),
    );
    let read = (0..40)
        .filter(|_| {
            let (job, scales) = strategy.new_tree(&mut runner).expect("a value").current();
            let (name, text) = job.get(&jobs);
            perpend::job::read(name, &varied(text, &scales, &[])).is_ok()
        })
        .count();
    assert!(read >= 8, "{read} of 40");
}
