//! The summary for the client of every demo job: as text, and what must hold of each.

use std::fmt::Write as _;
use std::path::Path;

use perpend::checks::outcome::Outcome;
use perpend::pack::data::Client;
use perpend::report::{client, plain};
use perpend::{Source, digest, draw, pack, summarise};

use crate::jobs;

fn all() -> Vec<(String, Client, Outcome)> {
    let one = |(name, text): &(String, String)| {
        let (b, results) = draw(name, text).unwrap_or_else(|e| panic!("{name}: {e}"));
        (name.clone(), client::of_job(&b, &results, &digest(text)), results.outcome)
    };
    jobs::demos().iter().map(one).collect()
}

fn text(c: &Client) -> String {
    let mut out =
        format!("Summary for {}\n{}. {}.\n\n{}\n", c.client, c.title, c.address.join(", "), c.headline);
    for part in &c.parts {
        let _ = writeln!(out, "\n{}", part.title);
        for line in &part.lines {
            let _ = writeln!(out, "  {line}");
        }
        for step in &part.steps {
            let _ = writeln!(out, "  - {step}");
        }
        if let Some(drawing) = &part.drawing {
            let _ = writeln!(out, "  [{}]", drawing["alt"].as_str().unwrap_or_default());
        }
    }
    out
}

#[test]
fn summaries_as_text() {
    insta::with_settings!({prepend_module_to_snapshot => false, omit_expression => true}, {
        for (name, client, _) in all() {
            insta::assert_snapshot!(format!("summary-{name}"), text(&client));
        }
    });
}

/// 25 words a sentence, no signs; no clause, no formula, no Eurocode symbol.
#[test]
fn every_sentence_is_plain() {
    for (name, client, _) in all() {
        let own = [client.headline.clone(), client.title.clone()];
        for line in client.parts.iter().flat_map(|p| p.lines.iter().chain(&p.steps)).chain(&own) {
            assert_eq!(plain::hard(line), [], "{name}: {line}");
            assert!(!line.contains('_') && !line.contains("EN 19") && !line.contains("kN"), "{name}: {line}");
        }
    }
}

/// What the pack finds is said as it is: a failure first of all, and no step towards the work after it.
#[test]
fn nothing_is_softened() {
    let mut seen = std::collections::BTreeSet::new();
    for (name, client, outcome) in all() {
        let words = text(&client);
        let stop = words.contains("do not let work on the wall begin");
        match outcome {
            Outcome::Adequate => {
                assert!(client.may_start && client.headline.contains("is enough"), "{name}");
                assert!(words.contains("nobody may rely on them"), "{name}");
            }
            Outcome::Conditional(n) => {
                assert!(!client.may_start && client.headline.contains("only once"), "{name}");
                let named = client.parts.iter().flat_map(|p| &p.steps).filter(|s| {
                    s.split_once(": ")
                        .is_some_and(|(m, _)| m.strip_prefix('H').is_some_and(|n| n.parse::<u32>().is_ok()))
                });
                assert_eq!(named.count(), n, "{name}: every open hold point is named");
            }
            Outcome::NotAdequate => {
                assert!(client.headline.contains("not enough") && words.contains("Not enough: "), "{name}");
            }
            Outcome::Outside => {
                assert!(client.headline.contains("cannot say") && words.contains("Not judged: "), "{name}");
            }
        }
        let fails = matches!(outcome, Outcome::NotAdequate | Outcome::Outside);
        assert_eq!((stop, words.contains("takes out the wall")), (fails, !fails), "{name}");
        seen.insert(outcome.kind());
    }
    assert!(seen.len() >= 3, "demo jobs of every kind: {seen:?}");
}

#[test]
fn two_pages_at_most_and_nothing_overlaps() {
    for (name, text) in jobs::demos() {
        let (b, results) = draw(&name, &text).expect("a valid job");
        let from = Source { text: &text, folder: Path::new(""), house: None };
        let made = summarise(&b, &results, &from).expect("a summary");
        assert!(made.typeset.pages <= 2, "{name}: {} pages", made.typeset.pages);
        assert_eq!(made.typeset.warnings, [] as [String; 0], "{name}");
        assert_eq!(made.hard, [], "{name}");
        let flaws =
            pack::inspect_client(&client::of_job(&b, &results, &digest(&text)), None).expect("a summary");
        assert_eq!(flaws, [], "{name}");
        let again = summarise(&b, &results, &from).expect("a summary");
        assert!(again.typeset.pdf == made.typeset.pdf, "{name}: the same bytes");
    }
}
