//! More wind, more dead load, the mirror.

use perpend::checks::returns::actions::{self, Direction};
use perpend::checks::returns::build::Change;
use perpend::checks::returns::check::Check;
use perpend::checks::returns::model::{At, Model};
use perpend::checks::returns::{in_plane, sliding};
use perpend::quantity::Force;
use perpend::standards::annex::Annex;
use perpend::standards::en1990::Combination;
use perpend::trace::Sheet;
use proptest::prelude::*;

use super::{any_case, building, worked, worst};

/// Resistance to shear at the foot and to sliding in one direction of the helping combination.
fn resistances(m: &Model, direction: Direction) -> (f64, f64) {
    let case = actions::Case { combination: Combination::Helping, direction };
    let mut s = Sheet::silent();
    let a = actions::at(&mut s, m, &Annex::UK, case, At::Foot);
    let st = in_plane::stresses(&mut s, m, &a);
    sliding::shear(&mut s, m, &Annex::UK, &a, &st, "shear");
    sliding::sliding(&mut s, m, &a, "test", "sliding");
    let of = |id: &str| s.verdicts.iter().find(|v| v.id == id).expect("a verdict").resistance.value.value;
    (of("shear"), of("sliding"))
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    /// More wind never lowers the use of any check: the worst of both directions. Without roof uplift, which grows with
    /// the wind and may take a load off the edge that it leans on.
    #[test]
    fn more_wind_never_lowers_a_use(c in any_case(), from in 0.0..2.0_f64, more in 0.0..1.0_f64) {
        let mut b = building(&c);
        b.returns[0].loads.iter_mut().for_each(|load| load.uplift = Force::ZERO);
        let wind = |wind| worked(&b, Change { wind, ..Change::NONE });
        let (Some((_, _, less)), Some((_, _, more))) = (wind(from), wind(from + more)) else { return Ok(()) };
        let falls = worst(&more).iter().any(|&(check, ratio)| check == Check::Overturning && ratio > 1.0);
        for (check, before) in worst(&less) {
            // Once N has left the section nothing stands: the junction then only carries what the flange brings,
            // less than before; overturning and the toe have failed by then.
            if check == Check::Junction && falls {
                continue;
            }
            // A check may begin with the wind: shear of a head that is held.
            let after = worst(&more).into_iter().find(|x| x.0 == check).map(|x| x.1);
            prop_assert!(after.is_some(), "{check:?} is gone");
            let after = after.unwrap_or(f64::NAN);
            prop_assert!(after >= before * (1.0 - 1e-12) || before.is_nan(), "{:?}: {} then {}", check, before, after);
        }
    }

    /// More dead load at mid-length never lowers a resistance to shear or sliding where dead load helps.
    #[test]
    fn more_dead_load_never_lowers_a_resistance(mut c in any_case(), more in 0.0..50.0_f64) {
        // A flange shifts the middle of the section: then a load at mid-length of the web is no longer central.
        c.bonded = false;
        let b = building(&c);
        let dead = |dead: f64| worked(&b, Change { dead: Force::new(dead * 1e3), ..Change::NONE });
        let (Some((less, ..)), Some((heavier, ..))) = (dead(0.0), dead(more)) else { return Ok(()) };
        for direction in Direction::BOTH {
            let (before, after) = (resistances(&less, direction), resistances(&heavier, direction));
            prop_assert!(after.0 >= before.0 * (1.0 - 1e-12), "shear {:?} {:?}", before, after);
            prop_assert!(after.1 >= before.1 * (1.0 - 1e-12), "sliding {:?} {:?}", before, after);
        }
    }

    /// The mirrored job: loads counted from the other end, the wind from the other side, the same numbers.
    #[test]
    fn the_mirror_gives_the_mirrored_result(mut c in any_case()) {
        c.bonded = false;
        let b = building(&c);
        let mut mirrored = c.clone();
        mirrored.loads.iter_mut().for_each(|l| l.3 = 1.0 - l.3);
        // Loads of several leaves and signs across the wall are not touched by this mirror.
        let (Some((_, _, one)), Some((_, _, other))) =
            (worked(&b, Change::NONE), worked(&building(&mirrored), Change::NONE)) else { return Ok(()) };
        prop_assert_eq!(&one.checks, &other.checks);
        for (i, case) in one.cases.iter().enumerate() {
            let j = other
                .cases
                .iter()
                .position(|x| x.combination == case.combination && x.direction != case.direction)
                .expect("the other direction");
            for (k, check) in one.checks.iter().enumerate() {
                let (x, y) = (one.ratios[i][k], other.ratios[j][k]);
                let same = x.to_bits() == y.to_bits() || (x - y).abs() <= 1e-7 * x.abs() || x > 1e6 && y > 1e6;
                prop_assert!(same, "{:?} {}: {} mirrored {}", check, case.name(), x, y);
            }
        }
    }

    /// The case that is printed is the worst of all, for every check.
    #[test]
    fn the_worst_case_is_printed(c in any_case()) {
        let b = building(&c);
        let Some((_, _, matrix)) = worked(&b, Change::NONE) else { return Ok(()) };
        for (k, check) in matrix.checks.iter().enumerate() {
            let all: Vec<f64> = matrix.ratios.iter().map(|r| r[k]).collect();
            let printed = matrix.worst(k).map(|i| all[i]);
            let largest = all.iter().copied().fold(f64::NAN, f64::max);
            prop_assert!(printed == Some(largest) || largest.is_nan(), "{:?}: {:?} {:?}", check, printed, all);
        }
    }
}

/// Which checks a return has: a held head is checked at mid-height, a bonded one at its junction, a dpc for
/// sliding; a held head without wind over its height has no shear.
#[test]
fn checks_follow_the_return() {
    use Check::{Flexure, Junction, Middle, Shear, ShearHead, Sliding, Toe};
    let mut c = super::Case {
        l: 900.0,
        h: 2500.0,
        bonded: false,
        propped: false,
        dpc: true,
        path: 0,
        b_t: 500.0,
        loads: vec![(30.0, 10.0, 0.0, 0.5, 0.0)],
        above: (0.0, 0.0),
        flange: (1000.0, 1000.0, 100.0),
    };
    let has = |c: &super::Case, check| {
        worked(&building(c), Change::NONE).expect("inside").2.checks.contains(&check)
    };
    assert!(has(&c, Toe) && has(&c, Shear) && has(&c, ShearHead) && has(&c, Sliding));
    assert!(!has(&c, Junction) && !has(&c, Middle) && !has(&c, Flexure));
    c.dpc = false;
    assert!(!has(&c, Sliding));
    c.bonded = true;
    assert!(has(&c, Junction));
    c.propped = true;
    assert!(has(&c, Middle) && has(&c, Shear));
    c.path = 1;
    assert!(has(&c, Middle) && !has(&c, Shear) && !has(&c, ShearHead));
}
