//! Panels with doors and windows by hand: piers and strips in plain numbers, against what stands on the sheet.
//!
//! Independent arithmetic: the work of the loads is added up over the deflected shape itself, square by square, and
//! the lengths of the patterns are tried one by one; strips are beams cut in two thousand pieces.

use perpend::building::{Frame, PanelOpening};
use perpend::checks::panels::opened::strip;
use perpend::checks::panels::{PanelModel, check};
use perpend::quantity::{Length, LineLoad, Stress};
use perpend::standards::annex::Annex;
use perpend::standards::masonry::Edge::{Continuous, Free, Simple};
use perpend::trace::{Entry, Sheet};
use proptest::prelude::*;

use super::hand_panel::brick_leaf;

pub fn window(at: f64, width: f64, sill: f64, height: f64, frame: Frame) -> PanelOpening {
    let mm = Length::new;
    PanelOpening { at: mm(at), width: mm(width), sill: mm(sill), height: mm(height), frame, bearing: None }
}

/// A brick leaf of 102.5 mm, 2.4 m high and 4.0 m long on four simple edges, 8.5 kN/m on top, with these openings.
pub fn panel(openings: &[PanelOpening]) -> PanelModel {
    let mut m = brick_leaf();
    m.after.left.kind = Simple;
    m.after.openings = openings.to_vec();
    m
}

pub fn pressure(m: &PanelModel) -> f64 {
    let mut s = Sheet::recorder();
    check(&mut s, m, &Annex::UK);
    assert!(s.faults.is_empty() && s.outside.is_empty(), "{:?} {:?}", s.faults, s.outside);
    s.standing("w_Rd").expect("it stands").value
}

/// Resistances of the leaf at mid-height: (0.4/2.7 + 0.9 x 10.96/102.5) Z and 1.1/2.7 Z, as in the panel by hand.
pub fn resistances() -> (f64, f64) {
    let z = 102.5 * 102.5 / 6.0;
    let sigma = 0.9 * (8.5 + 20.0 * 0.1025 * 1.2) / 102.5;
    ((0.4 / 2.7 + sigma) * z, 1.1 / 2.7 * z)
}

/// What a pier takes whose far edge is free under the wind of `b` of an opening: the least over both patterns, tried in
/// steps. `l`, `h` and `b` in mm; strength `m_2` about a vertical crack, `m_1` about a bed joint; all edges simple.
fn pier(l: f64, h: f64, b: f64, m_1: f64, m_2: f64) -> f64 {
    let steps = 120;
    let shape = |line: &dyn Fn(f64, f64) -> f64| {
        // Deflection over the face, and over the free edge.
        let (mut face, mut edge) = (0.0, 0.0);
        for i in 0..steps {
            let y = h * (f64::from(i) + 0.5) / f64::from(steps);
            edge += line(l, y) * h / f64::from(steps);
            for k in 0..steps {
                let x = l * (f64::from(k) + 0.5) / f64::from(steps);
                face += line(x, y) * (h / f64::from(steps)) * (l / f64::from(steps));
            }
        }
        face + b / 2.0 * edge
    };
    let mut least = f64::INFINITY;
    for i in 1..=60 {
        // Wedges of height a at top and base: the vertical crack turns by 1/l over 2 a, the bed joints by 1/a over l.
        let a = h / 2.0 * f64::from(i) / 60.0;
        let inside = m_2 * 2.0 * a / l + 2.0 * m_1 * l / a;
        least = least.min(inside / shape(&|x, y| (x / l).min(y / a).min((h - y) / a)));
        // Lines meet x from the held edge at mid-height: 1/x over h, and 2/h over l twice.
        let x_r = l * f64::from(i) / 60.0;
        let inside = m_2 * h / x_r + 2.0 * m_1 * l / (h / 2.0);
        least = least.min(inside / shape(&|x, y| (x / x_r).min(2.0 * y / h).min(2.0 * (h - y) / h)));
    }
    least
}

/// One window, its frame fixed at the jambs: two piers that span both ways, and the wall over and under it.
#[test]
fn one_window_by_hand() {
    let (m_1, m_2) = resistances();
    let (left, right) = (pier(1000.0, 2400.0, 1200.0, m_1, m_2), pier(1800.0, 2400.0, 1200.0, m_1, m_2));
    let between = 8.0 * m_2 / (1200.0 * 1200.0);
    let hand = left.min(right).min(between);
    let sheet = pressure(&panel(&[window(1000.0, 1200.0, 900.0, 1200.0, Frame::Jambs)]));
    // The hand tries lengths in sixtieths: never below the sheet, and close to it.
    assert!(sheet <= hand * 1.002 && hand <= sheet * 1.01, "{sheet} {hand}");
    assert!(right < left && right < between, "{left} {right} {between}");
}

/// Between two windows a pier spans between top and base: its own wind and half of each opening on its width.
#[test]
fn a_pier_between_two_windows_by_hand() {
    let (m_1, m_2) = resistances();
    let both = [
        window(600.0, 1100.0, 900.0, 1200.0, Frame::Jambs),
        window(2100.0, 1300.0, 900.0, 1200.0, Frame::Jambs),
    ];
    // 0.4 m of pier under (0.4 + 1.1/2 + 1.3/2) m of wind.
    let middle = 8.0 * m_1 / (2400.0 * 2400.0) * 0.4 / (0.4 + 0.55 + 0.65);
    let ends = pier(600.0, 2400.0, 1100.0, m_1, m_2).min(pier(600.0, 2400.0, 1300.0, m_1, m_2));
    assert!(middle < ends);
    let sheet = pressure(&panel(&both));
    assert!((sheet - middle).abs() < 1e-9 * middle, "{sheet} {middle}");
}

/// A window that stands free of a held vertical edge on one side: the pier there spans between top and base alone.
#[test]
fn a_pier_with_a_free_edge_by_hand() {
    let (m_1, _) = resistances();
    let mut m = panel(&[window(2800.0, 800.0, 900.0, 1200.0, Frame::Jambs)]);
    m.after.right.kind = Free;
    let hand = 8.0 * m_1 / (2400.0 * 2400.0) * 0.4 / (0.4 + 0.4);
    let sheet = pressure(&m);
    assert!((sheet - hand).abs() < 1e-9 * hand, "{sheet} {hand}");
}

/// A pier wider than the strip that spreads the load of its jamb: 0.7 h over the root of mu, here 2.17 m of 2.8 m.
#[test]
fn a_wide_pier_with_a_free_edge_by_hand() {
    let (m_1, m_2) = resistances();
    let mut m = panel(&[window(400.0, 800.0, 900.0, 1200.0, Frame::Jambs)]);
    m.after.right.kind = Free;
    let strip = 0.7 * 2400.0 / (m_1 / m_2).sqrt();
    assert!(strip < 2800.0);
    // Its own wind, and half of the opening on the strip: parts of one strength.
    let hand = 1.0 / (2400.0 * 2400.0 / (8.0 * m_1) * (1.0 + 400.0 / strip));
    let sheet = pressure(&m);
    assert!((sheet - hand).abs() < 1e-9 * hand, "{sheet} {hand}");
}

/// Top and base are what piers span between: without one of them nothing is said.
#[test]
fn a_free_top_is_outside() {
    let mut m = panel(&[window(1000.0, 1200.0, 900.0, 1200.0, Frame::Jambs)]);
    m.after.top.kind = Free;
    let mut s = Sheet::recorder();
    check(&mut s, &m, &Annex::UK);
    assert!(s.outside.iter().any(|o| o.words.contains("top and base held")), "{:?}", s.outside);
}

/// What nobody knows is the worst of what may be, and the sheet says which.
#[test]
fn an_unknown_frame_is_the_worst() {
    for (sill, height) in [(900.0, 1200.0), (0.0, 2100.0), (1500.0, 600.0)] {
        let at = |frame| pressure(&panel(&[window(1000.0, 1200.0, sill, height, frame)]));
        let known = [Frame::Jambs, Frame::AllRound, Frame::HeadAndSill].map(at);
        let least = known.into_iter().fold(f64::INFINITY, f64::min);
        assert_eq!(at(Frame::Unknown), least, "{known:?}");
    }
    let mut s = Sheet::recorder();
    check(&mut s, &panel(&[window(1000.0, 1200.0, 900.0, 1200.0, Frame::Unknown)]), &Annex::UK);
    let notes = s.entries.iter().flat_map(Entry::flat);
    assert!(
        notes
            .into_iter()
            .any(|e| matches!(e, Entry::Note(n) if n.contains("is the worst for the wall, and worked here")))
    );
}

/// Largest moment of a beam of 2.4 m under what comes to a jamb, per half of the width: by two thousand pieces.
fn beam(o: &PanelOpening, h: f64) -> f64 {
    let (b, s, w) = (o.width.base(), o.sill.base(), o.height.base());
    let d = h - s - w;
    let door = s == 0.0;
    // To head, sill and each jamb per length; all for half of the opening's width.
    let (line, jamb) = match o.frame {
        Frame::Jambs | Frame::Unknown => (0.0, 1.0),
        Frame::AllRound if door => (b * w / (b + 2.0 * w), 2.0 * w / (b + 2.0 * w)),
        Frame::AllRound => (b * w / (2.0 * (b + w)), w / (b + w)),
        Frame::HeadAndSill if door => (w, 0.0),
        Frame::HeadAndSill => (w / 2.0, 0.0),
    };
    let load = |y: f64| {
        if y < s {
            (s + line) / s
        } else if y < s + w {
            jamb
        } else {
            (d + line) / d
        }
    };
    let n = 2000;
    let piece = h / f64::from(n);
    let at = |i: i32| (f64::from(i) + 0.5) * piece;
    let base: f64 = (0..n).map(|i| load(at(i)) * piece * (h - at(i)) / h).sum();
    let (mut shear, mut moment, mut most) = (base, 0.0_f64, 0.0_f64);
    for i in 0..n {
        moment += (shear - load(at(i)) * piece / 2.0) * piece;
        shear -= load(at(i)) * piece;
        most = most.max(moment);
    }
    most
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(200))]

    /// The strip at a jamb is a beam under what its opening brings, however the frame is fixed.
    #[test]
    fn a_strip_is_a_beam(width in 3..30_i32, sill in 0..16_i32, height in 3..20_i32, frame in 0..3_usize) {
        let h = 2400.0;
        let sill = if sill < 2 { 0.0 } else { f64::from(sill) * 100.0 };
        let height = (f64::from(height) * 100.0).min(h - sill - 100.0);
        prop_assume!(height > 200.0);
        let frame = [Frame::Jambs, Frame::AllRound, Frame::HeadAndSill][frame];
        let o = window(500.0, f64::from(width) * 100.0, sill, height, frame);
        let mut s = Sheet::recorder();
        perpend::given!(s, "clear height", "test", h = Length::new(h));
        let got = strip::moment(&mut s, &o, frame, h).base();
        prop_assert!(s.faults.is_empty(), "{:?}", s.faults);
        let hand = beam(&o, 2400.0);
        prop_assert!((got - hand).abs() < 3e-3 * hand, "{o:?}: {got} by hand {hand}");
    }

    /// A panel seen in a mirror takes the same; twice the strength twice as much; a stronger edge or more load on top
    /// no less.
    #[test]
    fn mirrored_and_stronger(at in 3..12_i32, width in 5..20_i32, sill in 0..10_i32, frame in 0..4_usize) {
        let frame = [Frame::Jambs, Frame::AllRound, Frame::HeadAndSill, Frame::Unknown][frame];
        let (at, width) = (f64::from(at) * 100.0, f64::from(width) * 100.0);
        let sill = if sill < 2 { 0.0 } else { f64::from(sill) * 100.0 };
        let m = panel(&[window(at, width, sill, 1200.0, frame)]);
        let w = pressure(&m);
        let mirrored = pressure(&panel(&[window(4000.0 - at - width, width, sill, 1200.0, frame)]));
        prop_assert!((mirrored - w).abs() < 1e-9 * w, "{w} {mirrored}");
        let mut held = m.clone();
        held.after.left.kind = Continuous;
        prop_assert!(pressure(&held) >= w * (1.0 - 1e-9));
        let mut heavier = m.clone();
        heavier.leaves[0].G_above = LineLoad::new(12.0);
        prop_assert!(pressure(&heavier) >= w * (1.0 - 1e-9));
        let mut stronger = m.clone();
        let masonry = &mut stronger.leaves[0].masonry;
        masonry.f_xk2 = masonry.f_xk2.map(|f| f * 2.0);
        masonry.f_xk1 = Stress::new(masonry.f_xk1.base() * 2.0);
        prop_assert!(pressure(&stronger) >= w * (1.0 - 1e-9));
    }
}
