//! What is not shown is never silent: it stands among the results, on the front sheet and in the chain.

use perpend::checks::{Results, run};
use perpend::report;

fn demo(name: &str) -> String {
    crate::jobs::demos().into_iter().find(|(n, _)| n.contains(name)).expect("a demo job").1
}

fn results(text: &str) -> (perpend::building::Building, Results) {
    let b = perpend::job::read("job.toml", text).unwrap_or_else(|e| panic!("{}", e.render(false)));
    let results = run(&b);
    (b, results)
}

/// A panel whose edge names a return that fails is not adequate, whatever its own checks say.
#[test]
fn a_panel_is_held_no_better_than_its_return() {
    let (_, results) = results(&demo("short-nib"));
    let of = |id: &str| &results.sections.iter().find(|s| s.id == id).expect("its sheet").sheet;
    assert!(of("R1").verdicts.iter().any(|v| !v.holds), "the nib is too short");
    let (leans, alone) = (of("P1"), of("P2"));
    assert!(leans.verdicts.iter().all(|v| v.holds));
    assert_eq!(
        leans.unshown.iter().map(|u| (u.words.as_str(), u.hold.is_none())).collect::<Vec<_>>(),
        [("support by R1", true)]
    );
    assert!(alone.unshown.is_empty(), "P2 does not lean on it");
    // With a nib that passes nothing is said.
    let (_, passes) = self::results(&demo("rear-opening"));
    assert!(passes.sections.iter().all(|s| s.sheet.unshown.is_empty()));
}

/// Walls that get more by the removal and do not carry it alone stand among the results with their use, and the
/// front sheet does not say that every check passes.
#[test]
fn walls_that_do_not_carry_their_share_stand_among_the_results() {
    for name in ["end-terrace", "semi", "bungalow", "through-room"] {
        let (b, results) = results(&demo(name));
        let whole = results.sections.iter().find(|s| s.id == "whole").expect("its sheet");
        assert!(!whole.sheet.unshown.is_empty(), "{name}");
        for u in &whole.sheet.unshown {
            let hold = u.hold.as_ref().expect("a hold point");
            let hold = results.holds.iter().find(|h| &h.mark == hold).expect("in the list");
            assert!(
                u.ratio.is_some_and(|r| r > 1.0) && hold.text.contains("after it"),
                "{name}: {}",
                hold.text
            );
        }
        let rows = report::schedule(whole);
        assert!(rows.iter().any(|r| r.verdict.starts_with("hold point H") && !r.ratio.is_empty()));
        let pack = report::pack(&b, &results, "", "0123456789abcdef");
        assert!(!pack.outcome.sentence.contains("Every check passes"), "{name}: {}", pack.outcome.sentence);
    }
}

/// A floor edge without straps has a row of its own.
#[test]
fn an_edge_without_straps_is_a_result() {
    let (b, results) = results(&demo("hold-points"));
    let edges = results.sections.iter().find(|s| s.id == "floor-edges").expect("its sheet");
    let rows = report::schedule(edges);
    assert_eq!(rows.iter().map(|r| r.check.as_str()).collect::<Vec<_>>(), ["straps"]);
    assert!(rows[0].verdict.starts_with("hold point H"));
    let json = report::machine::of_job("job.toml", &b, &results);
    let sheets = json["sheets"].as_array().expect("sheets");
    assert!(sheets.iter().any(|s| s["not_shown"].as_array().is_some_and(|n| !n.is_empty())));
}

/// What is calculated and fails is drawn as broken, and a butted junction is not drawn as if it were counted.
#[test]
fn the_chain_says_what_fails() {
    let alt = |name: &str| {
        let (_, results) = results(&demo(name));
        let chain = results.sections.iter().find(|s| s.id == "chain").expect("its sheet");
        chain.drawings[0].alt.clone()
    };
    let fails = alt("short-nib");
    assert!(fails.contains("not adequate (see R1)"), "{fails}");
    assert!(fails.contains("R2 seen (butted, not counted)"), "{fails}");
    let holds = alt("rear-opening");
    assert!(!holds.contains("not adequate"), "{holds}");
}

/// Mid-height by flexure keeps its pressed edge: under so much load that the section crushes, bond does not help.
#[test]
fn bond_does_not_help_against_crushing() {
    let (_, results) = results(&demo("lime-terrace"));
    let r2 = &results.sections.iter().find(|s| s.id == "R2").expect("its sheet").sheet;
    let middle: Vec<f64> = r2.verdicts.iter().filter(|v| v.id.contains("middle")).map(|v| v.ratio).collect();
    assert!(middle.iter().any(|r| *r > 1.0), "{middle:?}");
}

/// What a return leaves outside the method its panel leaves outside too: neither adequate nor not.
#[test]
fn a_panel_held_by_what_is_outside_is_outside() {
    let text = demo("rear-opening").replacen("restraint = \"timber floor\"", "restraint = \"none\"", 1);
    let (_, results) = results(&text);
    let of = |id: &str| &results.sections.iter().find(|s| s.id == id).expect("its sheet").sheet;
    assert!(!of("R1").outside.is_empty() && of("R1").verdicts.iter().all(|v| v.holds));
    assert!(of("P1").outside.iter().any(|o| o.words.contains("held by R1")), "{:?}", of("P1").outside);
    assert!(perpend::checks::outcome::holds_all(of("P1")), "it is not said to fail");
    let chain = results.sections.iter().find(|s| s.id == "chain").expect("its sheet");
    assert!(chain.drawings[0].alt.contains("outside the method (see P1)"), "{}", chain.drawings[0].alt);
}
