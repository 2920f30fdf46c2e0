//! A longer return changes its uses without a jump, save at the thresholds that the clauses name.

use perpend::checks::returns::build::Change;
use perpend::quantity::Length;

use super::{Case, building, worked, worst};

/// Ratios at a length, `NaN`s and the infinite left out of comparisons.
fn at(case: &Case, l: f64) -> Vec<f64> {
    let b = building(case);
    let change = Change { length: Some(Length::new(l)), ..Change::NONE };
    worked(&b, change).map(|(_, _, m)| worst(&m).into_iter().map(|x| x.1).collect()).unwrap_or_default()
}

fn leap(a: f64, b: f64) -> f64 {
    // Far beyond use 10 a return is as bad as it gets: near the end of its standing its use grows without bound.
    if !(a < 10.0 && b < 10.0) { 0.0 } else { (a - b).abs() / a.max(b).max(0.05) }
}

/// Lengths at which a ratio leaps, closed in to a millionth of a millimetre.
fn jumps(case: &Case, from: u32, to: u32) -> Vec<f64> {
    let mut out = Vec::new();
    let mut before = at(case, f64::from(from));
    for l in from..to {
        let after = at(case, f64::from(l + 1));
        if before.len() == after.len() {
            for k in 0..before.len() {
                if leap(before[k], after[k]) > 0.03
                    && let Some(place) = close_in(case, k, f64::from(l), f64::from(l + 1))
                {
                    out.push(place);
                }
            }
        }
        before = after;
    }
    out
}

/// Halves towards the larger leap; `None` where it melts away, so that the slope is steep but no jump.
fn close_in(case: &Case, k: usize, mut low: f64, mut high: f64) -> Option<f64> {
    let ratio = |l: f64| at(case, l).get(k).copied().unwrap_or(f64::NAN);
    let (mut a, mut b) = (ratio(low), ratio(high));
    for _ in 0..20 {
        let middle = f64::midpoint(low, high);
        let m = ratio(middle);
        if leap(a, m) >= leap(m, b) {
            (high, b) = (middle, m);
        } else {
            (low, a) = (middle, m);
        }
    }
    (leap(a, b) > 0.02).then_some(high)
}

fn case(bonded: bool, propped: bool) -> Case {
    Case {
        l: 800.0,
        h: 2500.0,
        bonded,
        propped,
        dpc: true,
        path: 0,
        b_t: 600.0,
        loads: vec![(25.0, 10.0, 0.0, 0.7, 6.0), (15.0, 0.0, 0.0, 0.4, 0.0)],
        above: (0.1, 0.0),
        flange: (700.0, 900.0, 100.0),
    }
}

#[test]
fn a_plain_return_has_no_jumps() {
    assert_eq!(jumps(&case(false, false), 500, 1500), Vec::<f64>::new());
    assert_eq!(jumps(&case(false, true), 300, 900), Vec::<f64>::new());
}

/// A bonded junction stiffens one edge: it counts only below l = 15 t (5.5.1.2(8)), and eq. 5.6 gives way to
/// eq. 5.7 at h = 3.5 l (5.5.1.2(11)). There, and nowhere else, the reduction leaps.
#[test]
fn a_bonded_return_jumps_only_where_the_clauses_do() {
    let (t, h) = (140.0, 2500.0);
    let named = [15.0 * t, h / 3.5];
    for (from, to) in [(600, 1000), (1900, 2300)] {
        for place in jumps(&case(true, false), from, to) {
            assert!(
                named.iter().any(|n| (place - n).abs() < 1e-3),
                "a jump at {place} mm, none is named there"
            );
        }
    }
    assert!(!jumps(&case(true, false), 2095, 2105).is_empty(), "the limit of 15 t is there and is seen");
}
