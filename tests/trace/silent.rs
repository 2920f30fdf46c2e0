//! A silent sheet keeps verdicts and what left its range, nothing else, and computes the same.

use perpend::quantity::functions::KN;
use perpend::quantity::{Force, Length, Num};
use perpend::trace::{Outside, Sheet, Table};
use perpend::{calc, decide, given, verify};

fn work(s: &mut Sheet) -> f64 {
    s.heading(1, "Shear");
    s.note("A remark.");
    s.table(Table::default);
    s.drawings(&["a"]);
    s.rule("rule", "clause", "words", "finding".to_owned(), true);
    given!(s, "force", "job file", N_Ed = Force::new(12_345.678));
    given!(s, "factor", "job file", mu = Num::new(0.4));
    decide!(s, "", "pressed", "not pressed", N_Ed > 0.0 * KN);
    calc!(s, "first principles", "resistance", V_Rd = mu * N_Ed / 2.5);
    given!(s, "shear", "statics", V_Ed = Force::new(2e3));
    s.case = "helping".to_owned();
    let ratio = verify!(s, "sliding", "first principles", "sliding", V_Ed <= V_Rd);
    s.leave(Outside::new("slenderness", "5.5.1.4(2)", "slenderness"));
    ratio
}

#[test]
fn silence_keeps_only_verdicts() {
    let (mut loud, mut silent) = (Sheet::recorder(), Sheet::silent());
    let (a, b) = (work(&mut loud), work(&mut silent));
    assert_eq!(a.to_bits(), b.to_bits());
    assert_eq!(loud.verdicts, silent.verdicts);
    assert_eq!(loud.outside, silent.outside);
    assert!(silent.entries.is_empty() && silent.faults.is_empty() && !silent.recording());
    assert!(silent.standing("N_Ed").is_none());
    assert!(loud.entries.len() > 9 && loud.recording());
    assert!(!loud.holds(), "what left its range does not hold");
}

/// A silent sheet has no locks: it is the recording sheet of the same check that holds them.
#[test]
fn silence_does_not_look_at_symbols() {
    let mut s = Sheet::silent();
    let l = Length::new(1.0);
    calc!(s, "", x = l * 2.0);
    assert_eq!(x.base(), 2.0);
    assert!(s.faults.is_empty());
}

/// Demand over resistance: the comparison rules, never a rounded quotient; nothing that resists is no comfort.
#[test]
fn ratios_follow_the_comparison() {
    let ratio = |demand: f64, resistance: f64| {
        let mut s = Sheet::silent();
        let (d, r) = (Force::new(demand), Force::new(resistance));
        let found = verify!(s, "x", "", "", d <= r);
        let v = &s.verdicts[0];
        assert_eq!(found.to_bits(), v.ratio.to_bits());
        assert_eq!(v.holds, demand <= resistance);
        assert_eq!(v.holds, v.ratio <= 1.0, "{demand} {resistance}: {}", v.ratio);
        found
    };
    assert_eq!(ratio(1.0, 2.0), 0.5);
    assert_eq!(ratio(2.0, 2.0), 1.0);
    assert_eq!(ratio(3.0, 0.0), f64::INFINITY);
    assert_eq!(ratio(3.0, -1.0), f64::INFINITY);
    assert_eq!(ratio(0.0, 0.0), 1.0);
    // One bit over is over, although the quotient rounds to 1.
    let r = 0.1 + 0.2;
    assert!(ratio(r, 0.3) > 1.0);
    assert!(ratio(1e300_f64.next_up(), 1e300) > 1.0);
    // Neither demand nor resistance that is undefined passes.
    assert!(ratio(f64::NAN, 1.0) > 1.0 || ratio(f64::NAN, 1.0).is_nan());
}
