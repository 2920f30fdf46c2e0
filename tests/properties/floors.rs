//! Floor edges and floors: more wind never lowers a use, closer straps and deeper floors never raise it.

use perpend::building::{Building, CollapseClass, Proof};
use perpend::checks::{self, links, outcome};
use perpend::quantity::{Force, Length, LineLoad, Stress};
use proptest::prelude::*;

use crate::examples::{hand_diaphragm, hand_floor_edge};
use crate::jobs::demos;

const SEEN: &str = "straps = \"seen\"\nwords = \"Seen.\"\nspacing = \"1.2 m\"\nstrength = { value = \"8 kN\", reason = \"Stated.\" }\n";

#[derive(Clone, Copy, Debug)]
struct Edge {
    q: f64,
    strip: f64,
    dead: f64,
    spacing: f64,
    strength: f64,
}

/// Use of the strap at an edge.
fn strap(e: Edge) -> f64 {
    let mut b: Building = hand_floor_edge::job(SEEN);
    b.wind.stated.as_mut().expect("stated").panel = Stress::new(e.q * 1e-3);
    b.panels[0].dead_above = LineLoad::new(e.dead);
    b.floor_edges[0].strip_height = Length::new(e.strip);
    let strap = b.floor_edges[0].strap.as_mut().expect("a strap");
    strap.spacing = Length::new(e.spacing);
    strap.strength.value = Force::new(e.strength * 1e3);
    let section = hand_floor_edge::sheet(&b);
    let verdict = &section.sheet.verdicts[0];
    assert_eq!(verdict.holds, verdict.ratio <= 1.0);
    verdict.ratio
}

#[derive(Clone, Copy, Debug)]
struct Floor {
    q: f64,
    span: f64,
    depth: f64,
    resistance: f64,
    dead: f64,
}

/// Use of the floor.
fn floor(f: Floor) -> f64 {
    let mut b: Building = hand_diaphragm::job(hand_diaphragm::FLOW);
    b.wind.stated.as_mut().expect("stated").overall = Stress::new(f.q * 1e-3);
    b.stability.as_mut().expect("a storey").dead = Force::new(f.dead * 1e3);
    let d = b.diaphragm.as_mut().expect("a floor");
    d.span = Length::new(f.span);
    d.depth = Length::new(f.depth);
    d.resistance.as_mut().expect("a resistance").value = LineLoad::new(f.resistance);
    let section = hand_diaphragm::sheet(&b);
    let verdict = &section.sheet.verdicts[0];
    assert_eq!(verdict.holds, verdict.ratio <= 1.0);
    verdict.ratio
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(48))]

    #[test]
    fn straps(
        (q, strip, dead, spacing, strength) in
            (0.2..2.0_f64, 1000.0..5000.0_f64, 0.0..120.0_f64, 300.0..3000.0_f64, 2.0..20.0_f64),
        more in 1.0..3.0_f64,
    ) {
        let e = Edge { q, strip, dead, spacing, strength };
        let now = strap(e);
        let other = strap(Edge { q: q * more, ..e });
        prop_assert!(other >= now, "{} against {}", other, now);
        let other = strap(Edge { strip: strip * more, ..e });
        prop_assert!(other >= now, "{} against {}", other, now);
        let other = strap(Edge { spacing: spacing / more, ..e });
        prop_assert!(other <= now, "{} against {}", other, now);
        let other = strap(Edge { strength: strength * more, ..e });
        prop_assert!(other <= now, "{} against {}", other, now);
        // Dead load presses the masonry that holds the strap.
        let other = strap(Edge { dead: dead * more, ..e });
        prop_assert!(other <= now, "{} against {}", other, now);
    }

    #[test]
    fn floors(
        (q, span, depth, resistance, dead) in
            (0.2..2.0_f64, 2000.0..9000.0_f64, 1000.0..9000.0_f64, 0.5..8.0_f64, 0.0..500.0_f64),
        more in 1.0..3.0_f64,
    ) {
        let f = Floor { q, span, depth, resistance, dead };
        let now = floor(f);
        let other = floor(Floor { q: q * more, ..f });
        prop_assert!(other >= now, "{} against {}", other, now);
        let other = floor(Floor { span: span * more, ..f });
        prop_assert!(other >= now, "{} against {}", other, now);
        let other = floor(Floor { depth: depth * more, ..f });
        prop_assert!(other <= now, "{} against {}", other, now);
        let other = floor(Floor { resistance: resistance * more, ..f });
        prop_assert!(other <= now, "{} against {}", other, now);
        // What stands on the storey leans with it.
        let other = floor(Floor { dead: dead * more, ..f });
        prop_assert!(other >= now, "{} against {}", other, now);
    }
}

/// Every assumed link has a hold point of its words, open and in the drawing by its own mark, whether the job gives the
/// link, is silent on it, or claims a calculation that is not there.
#[test]
fn every_assumed_link_is_held_and_drawn() {
    let mut seen = 0;
    for (name, text) in demos() {
        let whole = perpend::job::read(&name, &text).unwrap_or_else(|e| panic!("{}", e.render(false)));
        let silent = Building { links: Vec::new(), ..whole.clone() };
        let mut bare = whole.clone();
        bare.floor_edges.clear();
        bare.diaphragm = None;
        for b in [whole, silent, bare] {
            let results = checks::run(&b);
            let chain = results.sections.iter().find(|s| s.id == "chain").expect("a chain");
            let alt = &chain.drawings[0].alt;
            for link in links::links(&b).iter().filter(|l| l.proof == Proof::Assumed) {
                let text = links::hold_text(link);
                let hold =
                    results.holds.iter().find(|h| h.text == text).unwrap_or_else(|| panic!("{name}: {text}"));
                assert!(hold.closed.is_none());
                assert!(
                    alt.contains(&format!("(hold point {})", hold.mark)),
                    "{name}: {} in {alt}",
                    hold.mark
                );
                seen += 1;
            }
            assert!(!alt.contains("(hold point)"), "{name}: {alt}");
            // None is said twice.
            let mut texts: Vec<_> = results.holds.iter().map(|h| &h.text).collect();
            texts.sort();
            texts.dedup();
            assert_eq!(texts.len(), results.holds.len(), "{name}");
        }
    }
    assert!(seen > 20, "{seen}");
}

/// A class that nobody stated is held, and so is one whose ties nobody checked; class 1 is not.
#[test]
fn the_class_is_stated_or_held() {
    let mut b = hand_floor_edge::job(SEEN);
    let held = |b: &Building| {
        let all = outcome::holds(b);
        all.iter().filter(|h| h.text.contains("Approved Document A, A3") && h.of.is_empty()).count()
    };
    assert_eq!(held(&b), 0);
    b.collapse.as_mut().expect("stated").class = CollapseClass::TwoA;
    assert_eq!(held(&b), 1);
    b.collapse = None;
    assert_eq!(held(&b), 1);
}
