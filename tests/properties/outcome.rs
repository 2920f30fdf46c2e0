//! The four outcomes: what fails fails, what is outside is outside, what is open is a condition.

use perpend::checks::Section;
use perpend::checks::outcome::{Hold, Outcome, of_job, of_sheet};
use perpend::quantity::Force;
use perpend::trace::{Outside, Sheet};
use perpend::verify;
use proptest::prelude::*;

fn sheet(fails: usize, holds: usize, outside: usize) -> Sheet {
    let mut s = Sheet::silent();
    for (count, demand) in [(holds, 1.0), (fails, 2.0)] {
        for n in 0..count {
            let (V_Ed, V_Rd) = (Force::new(demand), Force::new(1.0));
            verify!(s, &format!("check-{n}"), "", "", V_Ed <= V_Rd);
        }
    }
    (0..outside).for_each(|_| s.leave(Outside::new("x", "clause", "limit")));
    s
}

fn hold(of: &[&str], closed: bool) -> Hold {
    Hold {
        mark: "H1".to_owned(),
        text: "Before the wall comes down: look.".to_owned(),
        of: of.iter().map(|&m| m.to_owned()).collect(),
        closed: closed.then(|| "RH, 1 May 2026".to_owned()),
        about: perpend::checks::outcome::About::House,
    }
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    #[test]
    fn precedence(
        sheets in prop::collection::vec((0..2_usize, 0..3_usize, 0..2_usize), 1..4),
        open in 0..3_usize,
        closed in 0..3_usize,
    ) {
        let sections: Vec<Section> = sheets
            .iter()
            .enumerate()
            .map(|(n, &(f, h, o))| Section::plain(&format!("s{n}"), "Title", sheet(f, h, o)))
            .collect();
        let holds: Vec<Hold> = (0..open).map(|_| hold(&["R1"], false)).chain((0..closed).map(|_| hold(&[], true))).collect();
        let found = of_job(&sections, &holds);
        let fails = sheets.iter().any(|s| s.0 > 0);
        let outside = sheets.iter().any(|s| s.2 > 0);
        let expected = if fails {
            Outcome::NotAdequate
        } else if outside {
            Outcome::Outside
        } else if open > 0 {
            Outcome::Conditional(open)
        } else {
            Outcome::Adequate
        };
        prop_assert_eq!(found, expected);
    }
}

/// A hold point concerns the marks that it names, or all where it names none; a closed one concerns nobody.
#[test]
fn hold_points_concern_whom_they_name() {
    let good = sheet(0, 1, 0);
    let of = |mark: &str, holds: &[Hold]| of_sheet(&good, mark, holds);
    assert_eq!(of("R1", &[hold(&["R1"], false)]), Outcome::Conditional(1));
    assert_eq!(of("R2", &[hold(&["R1"], false)]), Outcome::Adequate);
    assert_eq!(of("R2", &[hold(&[], false), hold(&["R1", "R2"], false)]), Outcome::Conditional(2));
    assert_eq!(of("R1", &[hold(&["R1"], true)]), Outcome::Adequate);
    let bad = sheet(1, 3, 1);
    assert_eq!(of_sheet(&bad, "R1", &[hold(&[], false)]), Outcome::NotAdequate);
    assert_eq!(of_sheet(&sheet(0, 3, 1), "R1", &[hold(&[], false)]), Outcome::Outside);
}

/// The only words there are.
#[test]
fn words() {
    let all = [
        (Outcome::Adequate, "adequate", "adequate"),
        (Outcome::Conditional(1), "adequate once 1 hold point is closed", "conditional"),
        (Outcome::Conditional(4), "adequate once 4 hold points are closed", "conditional"),
        (Outcome::NotAdequate, "not adequate", "not-adequate"),
        (Outcome::Outside, "outside the method", "outside"),
    ];
    for (outcome, words, kind) in all {
        assert_eq!(outcome.words(), words);
        assert_eq!(outcome.kind(), kind);
    }
}

/// A link "footing" is calculated for the returns whose footing this pack has, and assumed for the rest.
#[test]
fn a_footing_is_calculated_only_where_it_is_here() {
    let (_, text) =
        crate::jobs::demos().into_iter().find(|(n, _)| n.contains("rear-opening")).expect("the demo job");
    let links = |text: &str| {
        let b = perpend::job::read("links.toml", text).unwrap_or_else(|e| panic!("{}", e.render(false)));
        perpend::checks::links::links(&b)
            .into_iter()
            .filter(|l| l.link == "footing")
            .map(|l| (l.of.join(" "), l.proof.word()))
            .collect::<Vec<_>>()
    };
    let own = |of: &str, proof| (of.to_owned(), proof);
    assert_eq!(links(&text), [own("R1 R2", "calculated")]);
    // About all: the walls that hold the heads stand on footings too.
    let all = text.replace("for = [\"R1\", \"R2\"]", "");
    assert_eq!(links(&all), [own("R1 R2", "calculated"), own("party wall flank wall", "assumed")]);
    // By the mark of the footing, and a return without one.
    let start = text.find("[returns.footing]\nmark = \"F2\"").expect("F2");
    let end = start + text[start..].find("\n\n").expect("an empty line");
    let less = format!("{}{}", &text[..start], &text[end..]);
    assert_eq!(links(&less), [own("R1", "calculated"), own("R2", "assumed")]);
    assert_eq!(links(&less.replace("for = [\"R1\", \"R2\"]", "for = [\"F1\"]")), [own("F1", "calculated")]);
    // Elsewhere, by name.
    let words = less.replace("for = [\"R1\", \"R2\"]", "words = \"Sheet 12 of the builder's engineer.\"");
    assert_eq!(links(&words), [own("", "calculated")]);
}

/// A footing that nobody saw is a hold point of the return and of the footing, unless a link tells of it.
#[test]
fn a_footing_not_seen_is_held() {
    let (_, text) =
        crate::jobs::demos().into_iter().find(|(n, _)| n.contains("hold-points")).expect("the demo job");
    let holds = |text: &str| {
        let (_, results) = perpend::check("holds.toml", text).unwrap_or_else(|e| panic!("{e}"));
        let mut of: Vec<String> = results
            .holds
            .iter()
            .filter(|h| h.of.iter().any(|m| m.starts_with('F')))
            .map(|h| h.of.join(" "))
            .collect();
        of.sort();
        (of, results.outcome)
    };
    // Each link tells of its own.
    assert_eq!(holds(&text), (vec!["R1 F1".to_owned(), "R2 F2".to_owned()], Outcome::Conditional(5)));
    let start = text.find("[[links]]\nlink = \"footing\"").expect("a link");
    let second = start + 9 + text[start + 9..].find("[[links]]").expect("another");
    let end = second + text[second..].find("\n\n").expect("an empty line");
    let told = format!("{}{}", &text[..second], &text[end..])
        .replace("measure the footing.\"\nfor = [\"R1\"]", "measure the footing.\"\nfor = [\"F1\", \"R2\"]");
    let (of, outcome) = holds(&told);
    assert_eq!((of, outcome), (vec!["F1 R2 R1 F2".to_owned()], Outcome::Conditional(4)));
}
