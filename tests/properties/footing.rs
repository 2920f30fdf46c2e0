//! A footing: continuous where it begins to lift, in balance strip by strip, mirrored, never relieved by load
//! on its pressed end.

use perpend::building::{Building, Cause, Footing, Proof};
use perpend::checks::footings::combination::{Case, Combination};
use perpend::checks::footings::pressure::{self, Pressed, Shape};
use perpend::checks::footings::stands::Stands;
use perpend::checks::returns::actions::Direction;
use perpend::quantity::{Length, Moment, Stress, Weight};
use perpend::trace::Sheet;
use proptest::prelude::*;

use super::{any_case, building, with_inputs};

const GRAVITY: Combination = Combination { imposed: true, wind: false, uplift: false };

fn footing(width: f64, free: f64, junction: f64, offset: f64) -> Footing {
    let cause = |mm| Cause { value: Length::new(mm), reason: "a property".to_owned() };
    Footing {
        mark: "F1".to_owned(),
        width: Length::new(width),
        thickness: Length::new(200.0),
        beyond_free_end: cause(free),
        beyond_junction: cause(junction),
        density: Cause { value: Weight::new(24e-6), reason: String::new() },
        allowable: Cause { value: Stress::new(0.1), reason: "a property".to_owned() },
        proof: Proof::Seen,
        words: "seen".to_owned(),
        offset: Length::new(offset),
        before: None,
    }
}

fn standing<T>(b: &Building, f: &Footing, with: impl FnOnce(Stands<'_>) -> T) -> T {
    with_inputs(b, |i| with(Stands::of(i, i.ret, f).expect("within the tables")))
}

fn press(st: &Stands<'_>, combination: Combination, direction: Direction) -> Pressed {
    pressure::of(&mut Sheet::silent(), st, Case { combination, direction }, "pressure")
}

fn worst(st: &Stands<'_>, combination: Combination) -> f64 {
    Direction::BOTH.map(|d| press(st, combination, d).p_max.base()).into_iter().fold(0.0, f64::max)
}

/// A pressure of mean 1 over a length of 1 whose resultant is `e` from the middle: at `u` from the pressed edge.
fn spread(e: f64, u: f64) -> f64 {
    if e <= 1.0 / 6.0 {
        1.0 + 6.0 * e * (1.0 - 2.0 * u)
    } else {
        let part = 3.0 * (0.5 - e);
        if u < part { 2.0 / part * (1.0 - u / part) } else { 0.0 }
    }
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(96))]

    /// Strips of pressure add up to the load, and their moments to its moment, along and across.
    #[test]
    fn strips_carry_the_load(
        c in any_case(), width in 300.0..900.0_f64, ends in (0.0..300.0_f64, 0.0..300.0_f64), offset in -80.0..80.0_f64,
    ) {
        let (b, f) = (building(&c), footing(width, ends.0, ends.1, offset));
        standing(&b, &f, |st| {
            for combination in Combination::all(&st) {
                for direction in Direction::BOTH {
                    let x = press(&st, combination, direction);
                    if matches!(x.shape, Shape::Nothing) {
                        prop_assert!(x.p_max.base().is_infinite());
                        continue;
                    }
                    let long = pressure::length(&st).base();
                    let load = x.N_F.base();
                    let along = x.at.base().abs() / long;
                    // A single leaf over the middle of its own load: N at the offset, the footing at nought.
                    let across = if st.off_middle() {
                        let t = st.loads.T_G.base()
                            + if combination.imposed { st.loads.T_Q.base() } else { 0.0 }
                            - if combination.uplift { st.T_U.base() } else { 0.0 };
                        t.abs() / load / width
                    } else { 0.0 };
                    let n = 400;
                    let (mut sum, mut m_x, mut m_y, mut top) = (0.0, 0.0, 0.0, 0.0_f64);
                    for i in 0..n {
                        let u = (f64::from(i) + 0.5) / f64::from(n);
                        for k in 0..n {
                            let v = (f64::from(k) + 0.5) / f64::from(n);
                            let p = spread(along, u) * spread(across, v) * load / (long * width);
                            let d = p * long * width / f64::from(n * n);
                            (sum, m_x, m_y) = (sum + d, m_x + d * (0.5 - u) * long, m_y + d * (0.5 - v) * width);
                            top = top.max(p);
                        }
                    }
                    let edge = spread(along, 0.0) * spread(across, 0.0) * load / (long * width);
                    prop_assert!((edge / x.p_max.base() - 1.0).abs() < 1e-9, "{} {}", edge, x.p_max.base());
                    prop_assert!(top <= x.p_max.base() * (1.0 + 1e-9));
                    // Close to turning over the pressed part is narrower than a few strips.
                    if along < 0.48 && across < 0.48 {
                        prop_assert!((sum / load - 1.0).abs() < 1e-2, "{} {}", sum, load);
                        prop_assert!((m_x - load * along * long).abs() < 1e-2 * load * long);
                        prop_assert!((m_y - load * across * width).abs() < 1e-2 * load * width);
                    }
                }
            }
            Ok(())
        })?;
    }

    /// Where it begins to lift, trapezium and triangle give the same.
    #[test]
    fn it_begins_to_lift_without_a_step(c in any_case(), width in 300.0..900.0_f64, ends in (0.0..300.0_f64, 0.0..300.0_f64)) {
        let (b, f) = (building(&c), footing(width, ends.0, ends.1, 0.0));
        standing(&b, &f, |mut st| {
            let x = press(&st, GRAVITY, Direction::ToFree);
            let long = pressure::length(&st);
            let now = x.N_F * x.at;
            let start = st.loads.S_G;
            let mut at = |share: f64| {
                st.loads.S_G = start - now + x.N_F * long * (share / 6.0);
                press(&st, GRAVITY, Direction::ToFree)
            };
            let (below, above) = (at(1.0 - 1e-9), at(1.0 + 1e-9));
            prop_assert!(matches!(below.shape, Shape::Trapezium(_)) && matches!(above.shape, Shape::Triangle(_)));
            prop_assert!((above.p_max.base() / below.p_max.base() - 1.0).abs() < 1e-7);
            prop_assert!(above.p_max >= below.p_max);
            Ok(())
        })?;
    }

    /// More load on the end that is pressed never lowers the pressure under G + Q; nor does more of every load
    /// where nothing pushes.
    #[test]
    fn load_on_the_pressed_end_never_relieves(c in any_case(), more in 0.0..60.0_f64, times in 1.0..3.0_f64) {
        let (b, f) = (building(&c), footing(600.0, 100.0, 0.0, 0.0));
        standing(&b, &f, |mut st| {
            for direction in Direction::BOTH {
                let before = press(&st, GRAVITY, direction);
                let end = pressure::length(&st) / 2.0 * before.at.base().signum();
                let (g, s_g) = (st.loads.G, st.loads.S_G);
                let force = perpend::quantity::Force::new(more * 1e3);
                // The middle of the footing is 50 mm from that of the return.
                st.loads.G = g + force;
                st.loads.S_G = s_g + force * (end + Length::new(50.0));
                let after = press(&st, GRAVITY, direction);
                (st.loads.G, st.loads.S_G) = (g, s_g);
                prop_assert!(after.p_max.base() >= before.p_max.base() * (1.0 - 1e-9), "{:?} {:?}", before, after);
            }
            st.whole.lateral = perpend::checks::returns::model::Lateral { h_nu: st.whole.lateral.h_nu, ..Default::default() };
            let before = worst(&st, GRAVITY);
            let v = &mut st.loads;
            (v.G, v.Q, v.S_G, v.S_Q) = (v.G * times, v.Q * times, v.S_G * times, v.S_Q * times);
            prop_assert!(worst(&st, GRAVITY) >= before * (1.0 - 1e-9), "{} falls", before);
            Ok(())
        })?;
    }

    /// Loads counted from the other end, the strip mirrored: the same pressures, from the other side.
    #[test]
    fn the_mirror_presses_alike(mut c in any_case(), width in 300.0..900.0_f64, ends in (0.0..300.0_f64, 0.0..300.0_f64)) {
        c.bonded = false;
        let mut mirrored = c.clone();
        mirrored.loads.iter_mut().for_each(|l| l.3 = 1.0 - l.3);
        let of = |c, free, junction| {
            let (b, f) = (building(c), footing(width, free, junction, 0.0));
            standing(&b, &f, |st| {
                Combination::all(&st)
                    .into_iter()
                    .map(|k| Direction::BOTH.map(|d| press(&st, k, d)))
                    .collect::<Vec<_>>()
            })
        };
        let (one, other) = (of(&c, ends.0, ends.1), of(&mirrored, ends.1, ends.0));
        prop_assert_eq!(one.len(), other.len());
        for ([a, b], [x, y]) in one.into_iter().zip(other) {
            for (p, q) in [(a, y), (b, x)] {
                let (u, v) = (p.p_max.base(), q.p_max.base());
                prop_assert!(u == v || (u / v - 1.0).abs() < 1e-6, "{} {}", u, v);
                prop_assert!((p.at.base() + q.at.base()).abs() < 1e-6 * (1.0 + p.at.base().abs()));
            }
        }
    }

    /// More wind never lowers the largest pressure of all combinations.
    #[test]
    fn more_wind_never_lowers_the_pressure(c in any_case(), more in 1.0..3.0_f64) {
        let (b, f) = (building(&c), footing(600.0, 0.0, 0.0, 0.0));
        standing(&b, &f, |mut st| {
            let top = |st: &Stands<'_>| Combination::all(st).into_iter().map(|k| worst(st, k)).fold(0.0, f64::max);
            let before = top(&st);
            let l = &mut st.whole.lateral;
            (l.w_k, l.H_k, l.M_k) = (l.w_k * more, l.H_k * more, l.M_k * more);
            prop_assert!(top(&st) >= before * (1.0 - 1e-9));
            Ok(())
        })?;
    }
}

/// The flange brings nothing to the strip under the return.
#[test]
fn a_flange_is_left_out() {
    let b = super::base();
    let f = footing(600.0, 0.0, 0.0, 0.0);
    let mut butted = b.clone();
    butted.returns[0].junction.bonded = false;
    let of = |b: &Building| standing(b, &f, |st| (st.loads.G, st.loads.S_G, st.flanged));
    let (with, without) = (of(&b), of(&butted));
    assert_eq!((with.0, with.1), (without.0, without.1));
    assert!(with.2 && !without.2);
    assert_ne!(with.1, Moment::ZERO);
}
