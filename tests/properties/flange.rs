//! A flange of the web's own width is a longer web; the general section is the plain clause there.

use perpend::checks::returns::actions::{Actions, Case, Direction, Toe};
use perpend::checks::returns::build::Change;
use perpend::checks::returns::in_plane::{self, Stressed};
use perpend::checks::returns::model::{At, Flange, Model};
use perpend::quantity::{Force, Length, LineLoad, Moment, Num};
use perpend::standards::annex::Annex;
use perpend::standards::en1990::Combination;
use perpend::standards::en1996::section::{Section, block_area, triangle};
use perpend::standards::en1996::shear::compressed_length;
use perpend::trace::Sheet;
use proptest::prelude::*;

use super::{any_case, building, worked};

/// Any model to start from.
fn model() -> Model {
    let c = super::Case {
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
    worked(&building(&c), Change::NONE).expect("inside").0
}

/// Stresses under N at `x` from mid-length of the web, positive towards the free end.
fn stressed(m: &Model, flange: Option<Flange>, n: f64, x: f64, toe: Toe) -> (Stressed, f64) {
    let a = Actions {
        at: At::Foot,
        N_Ed: Force::new(n),
        M_Ed: Moment::new((n * x).abs()),
        V_Ed: Force::ZERO,
        toe,
        back: x < 0.0,
        flange,
        gamma_G: Num::new(1.0),
        gamma_U: Num::new(1.5),
    };
    let mut s = Sheet::recorder();
    perpend::given!(s, "", "", l = m.l);
    perpend::given!(s, "", "", t = m.t);
    if let Some(f) = flange {
        perpend::given!(s, "", "", b_f = f.b_f);
        perpend::given!(s, "", "", t_f = f.t_f);
        let _ = (b_f, t_f);
    }
    perpend::given!(s, "", "", N_Ed = a.N_Ed);
    perpend::given!(s, "", "", M_Ed = a.M_Ed);
    let _ = (l, t, N_Ed, M_Ed);
    let st = in_plane::stresses(&mut s, m, &a);
    in_plane::overturning(&mut s, m, &a, "overturning");
    assert!(s.faults.is_empty(), "{:?}", s.faults);
    (st, s.verdicts[0].ratio)
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    /// With b_f = t the flanged section is a web of length l + t_f, wherever N stands in it.
    #[test]
    fn a_flange_of_the_webs_width_is_a_longer_web(
        l in 300.0..2000.0_f64, t_f in 90.0..250.0_f64, place in 0.01..0.99_f64, n in 1.0..200.0_f64,
    ) {
        let mut web = model();
        web.l = Length::new(l);
        let mut longer = web.clone();
        longer.l = Length::new(l + t_f);
        // N from the free end, then from mid-length of each; the middle of the longer web is its centroid.
        let from_free = place * (l + t_f);
        let (x, x_longer) = (l / 2.0 - from_free, (l + t_f) / 2.0 - from_free);
        let toe = if x_longer >= 0.0 { Toe::Free } else { Toe::Junction };
        let flange = Flange { b_f: web.t, t_f: Length::new(t_f), G_f: Force::ZERO, U_f: Force::ZERO };
        let n = n * 1e3;
        let (one, _) = stressed(&web, Some(flange), n, x, toe);
        let (two, overturning) = stressed(&longer, None, n, x_longer, toe);
        let close = |a: f64, b: f64| (a - b).abs() <= 1e-6 * b.abs().max(1.0);
        prop_assert!(close(one.a.base(), two.a.base()), "a {:?} {:?}", one.a, two.a);
        prop_assert!(close(one.A_c.base(), two.A_c.base()), "A_c {:?} {:?}", one.A_c, two.A_c);
        prop_assert!(close(one.sigma_toe.unwrap().base(), two.sigma_toe.unwrap().base()));
        prop_assert!(close(one.N_web.base() + one.N_flange.base(), n));
        // Compressed length of the web: what is left of the whole when the flange is taken off.
        let whole = two.l_c.base();
        let web_part = if toe == Toe::Free { whole.min(l) } else { (whole - t_f).max(0.0) };
        prop_assert!(close(one.l_c.base(), web_part), "{} {}", one.l_c.base(), web_part);
        prop_assert!(overturning < 1.0);
    }

    /// The general section with equal widths equals 6.2(2): 3(l/2 - e) and 2 N/(t l_c), t (l - 2 e).
    #[test]
    fn equal_widths_give_the_plain_clause(
        l in 300.0..2000.0_f64, t in 90.0..250.0_f64, split in 0.05..0.95_f64, over in 0.0..0.49_f64,
    ) {
        let e = over * l;
        let mm = Length::new;
        let sec = Section { b_1: mm(t), d_1: mm(split * l), b_2: mm(t), L_s: mm(l) };
        let mut s = Sheet::silent();
        let n = 40e3;
        let l_c = compressed_length(&mut s, mm(l), mm(e)).base();
        if let Some(block) = triangle(&mut s, sec, Force::new(n), mm(l / 2.0 - e)) {
            prop_assert!((block.c.base().min(l) - l_c).abs() <= 1e-6 * l_c, "{} {}", block.c.base(), l_c);
            let edge = if e <= l / 6.0 { n / (t * l) * (1.0 + 6.0 * e / l) } else { 2.0 * n / (t * l_c) };
            prop_assert!((block.sigma_toe.base() - edge).abs() <= 1e-6 * edge);
        } else {
            prop_assert!(e < 1e-3 * l, "N within the section always finds its axis");
        }
        let area = block_area(&mut s, sec, mm(l / 2.0 - e)).base();
        prop_assert!((area - t * (l - 2.0 * e)).abs() <= 1e-6 * area);
    }

    /// The pressed edge changes at the centroid of the section, and there both readings agree: one stress all over.
    #[test]
    fn the_pressed_edge_changes_at_the_centroid(c in any_case()) {
        let mut c = c;
        c.bonded = true;
        let Some((m, ..)) = worked(&building(&c), Change::NONE) else { return Ok(()) };
        let Some(f) = m.flange else { return Ok(()) };
        let (area_f, area) = (f.b_f.base() * f.t_f.base(), m.l.base() * m.t.base());
        let centroid = -area_f * (m.l.base() + f.t_f.base()) / 2.0 / (area_f + area);
        let n = 50e3;
        let (free, over_1) = stressed(&m, Some(f), n, centroid + 1e-3, Toe::Free);
        let (junction, over_2) = stressed(&m, Some(f), n, centroid - 1e-3, Toe::Junction);
        let close = |a: f64, b: f64| (a - b).abs() <= 1e-3 * b.abs();
        prop_assert!(close(free.N_web.base(), junction.N_web.base()), "{:?} {:?}", free, junction);
        prop_assert!(close(free.sigma_toe.unwrap().base(), n / (area_f + area)));
        prop_assert!(close(junction.sigma_toe.unwrap().base(), n / (area_f + area)));
        prop_assert!(close(free.A_c.base(), junction.A_c.base()), "{:?} {:?}", free.A_c, junction.A_c);
        prop_assert!(close(over_1, over_2), "overturning {} {}", over_1, over_2);
    }
}

/// A bonded cantilever of 900 mm with room for its flange.
fn bonded(b_t: f64, load: (f64, f64, f64, f64, f64)) -> super::Case {
    super::Case {
        l: 900.0,
        h: 2500.0,
        bonded: true,
        propped: false,
        dpc: true,
        path: 0,
        b_t,
        loads: vec![load],
        above: (0.0, 0.0),
        flange: (1500.0, 1500.0, 140.0),
    }
}

/// The edge that a case presses follows the resultant, not the wind alone: the flange's own weight may outweigh it.
#[test]
fn the_flange_may_hold_the_resultant_back() {
    use perpend::checks::returns::actions;
    let c = bonded(0.0, (5.0, 0.0, 0.0, 0.5, 0.0));
    let (m, ..) = worked(&building(&c), Change::NONE).expect("inside");
    let case = Case { combination: Combination::Helping, direction: Direction::ToFree };
    let a = actions::at(&mut Sheet::silent(), &m, &Annex::UK, case, At::Foot);
    assert!(a.back, "the flange's load turns towards the junction: {a:?}");
    assert_eq!(a.toe, Toe::Free, "and yet the resultant is on the free side of the centroid");
}

/// Overturning is about the edge that N moves towards: l/2 from mid-length at the free end, l/2 + t_f at the outer face of
/// the flange.
#[test]
fn overturning_about_either_edge() {
    let m = model();
    let flange =
        Flange { b_f: Length::new(800.0), t_f: Length::new(140.0), G_f: Force::ZERO, U_f: Force::ZERO };
    let ratio = |x: f64, toe| stressed(&m, Some(flange), 40e3, x, toe).1;
    // l = 900 mm: 100/450 and 100/(450 + 140).
    assert!((ratio(100.0, Toe::Free) - 100.0 / 450.0).abs() < 1e-12);
    assert!((ratio(-100.0, Toe::Free) - 100.0 / 590.0).abs() < 1e-12);
    assert!((ratio(-500.0, Toe::Junction) - 500.0 / 590.0).abs() < 1e-12);
}

/// Roof uplift on the wall met comes off the flange's load: 2 kN/m over its width, where N leaves the wall and with its
/// own arm; the sheet keeps its locks and the junction carries what the flange takes less what it still brings.
#[test]
fn uplift_on_the_flange_is_taken_off() {
    use perpend::checks::returns::{actions, check};
    let c = bonded(300.0, (30.0, 5.0, 0.0, 0.5, 0.0));
    let mut b = building(&c);
    let (calm, ..) = worked(&b, Change::NONE).expect("inside");
    b.returns[0].junction.uplift = LineLoad::new(2.0);
    let (m, ..) = worked(&b, Change::NONE).expect("inside");
    let f = m.flange.expect("a flange");
    let lift = 2.0 * f.b_f.base();
    assert!((f.U_f.base() - lift).abs() < 1e-9);
    let foot = |m: &Model, combination| {
        let case = Case { combination, direction: Direction::ToFree };
        actions::at(&mut Sheet::silent(), m, &Annex::UK, case, At::Foot).N_Ed.base()
    };
    let less = foot(&calm, Combination::Helping) - foot(&m, Combination::Helping);
    assert!((less - 1.5 * lift).abs() < 1e-6, "{less} of {lift}");
    assert_eq!(foot(&calm, Combination::Gravity), foot(&m, Combination::Gravity));
    let arm = (900.0 + 140.0) / 2.0;
    assert!((m.vertical(At::Foot).S_U.base() + lift * arm).abs() < 1e-6);
    // Twice the wind lifts twice as much.
    let (blown, ..) = worked(&b, Change { wind: 2.0, ..Change::NONE }).expect("inside");
    assert!((blown.flange.expect("a flange").U_f.base() - 2.0 * lift).abs() < 1e-9);
    super::with_inputs(&b, |i| {
        let mut s = Sheet::recorder();
        check(&mut s, i);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        assert!(s.verdicts.iter().any(|v| v.id.ends_with("junction")), "{:?}", s.verdicts.len());
    });
}
