//! One panel by hand, every step in plain numbers, against the values that stand on the sheet.
//!
//! Independent arithmetic: nothing here calls the code that it tests, save for the sheet's own values. The
//! cells of Annex E, case F, are typed again from the table (from memory, check against the standard).

use perpend::building::{Edge as Held, PanelRoute, Sharing, Span};
use perpend::checks::masonry::Masonry;
use perpend::checks::panels::bracket::Effort;
use perpend::checks::panels::{PanelLeaf, PanelModel, check};
use perpend::quantity::{Length, LineLoad, Num, Stress, Weight};
use perpend::standards::annex::Annex;
use perpend::standards::masonry::Edge::{Continuous, Simple};
use perpend::trace::Sheet;

/// A single leaf of 102.5 mm clay brick, 2.4 m high and 4.0 m long after the removal, all values stated.
pub fn brick_leaf() -> PanelModel {
    let factor = |x| (Num::new(x), "stated".to_owned());
    let ((gamma_c, gamma_c_source), (gamma_f, gamma_f_source), (gamma_v, gamma_v_source)) =
        (factor(3.0), factor(2.7), factor(2.5));
    let masonry = Masonry {
        name: "brick".to_owned(),
        thickness: Length::new(102.5),
        f_b: Stress::new(20.0),
        f_k: Stress::new(5.0),
        f_vk0: Stress::new(0.2),
        f_xk1: Stress::new(0.4),
        f_xk2: Some(Stress::new(1.1)),
        gamma_c,
        gamma_f,
        gamma_v,
        gamma_c_source,
        gamma_f_source,
        gamma_v_source,
        density: Weight::new(20e-6),
        perpends_filled: true,
    };
    let span = |length| {
        let held = |kind| Held { kind, stretch: None, dpc: false, reason: "as the example says".to_owned() };
        let (top, base, left, right) = (held(Simple), held(Simple), held(Continuous), held(Simple));
        Span { length: Length::new(length), ends: None, top, base, left, right, openings: Vec::new() }
    };
    PanelModel {
        mark: "P1".to_owned(),
        h: Length::new(2400.0),
        leaves: vec![PanelLeaf {
            t: Length::new(102.5),
            masonry,
            G_above: LineLoad::new(8.5),
            U_above: LineLoad::ZERO,
            loaded: true,
        }],
        q_net: Stress::new(0.45e-3),
        q_source: "stated".to_owned(),
        helping: 0.9,
        route: PanelRoute::Flexure,
        sharing: Sharing::Strength,
        ties: None,
        tie_strength: None,
        arching: None,
        before: span(2000.0),
        after: span(4000.0),
        // The hand route alone.
        effort: Effort::Search,
        strengths_on: None,
    }
}

/// A wall of 102.5 mm clay brick, 2.4 m high, 4.0 m between a bonded return (left, continuous) and a simple
/// edge (right), top and base simple; 8.5 kN/m of dead load on top; net pressure 0.45 kN/m².
#[test]
fn a_panel_of_case_f_by_hand() {
    let m = brick_leaf();
    let mut s = Sheet::recorder();
    check(&mut s, &m, &Annex::UK);
    assert!(s.faults.is_empty(), "{:?}", s.faults);
    assert!(s.outside.is_empty(), "{:?}", s.outside);
    let sheet = |name: &str| s.standing(name).unwrap_or_else(|| panic!("{name} stands")).value;
    let same = |name: &str, hand: f64| {
        let there = sheet(name);
        assert!((there - hand).abs() <= 1e-10 * hand.abs(), "{name}: sheet {there}, hand {hand}");
    };

    // Wind: 1.5 x 0.45 = 0.675 kN/m² = 0.675e-3 N/mm².
    let w = 1.5 * 0.45e-3;
    same("W_Ed", w);

    // Stress at mid-height: own weight of 1.2 m of wall, 20 kN/m³ x 0.1025 m x 1.2 m = 2.46 kN/m;
    // with the load above 8.5 + 2.46 = 10.96 kN/m = 10.96 N/mm; 0.9 x 10.96/102.5 = 0.0962 N/mm².
    let g_mid = 8.5 + 20.0 * 0.1025 * 1.2;
    assert!((g_mid - 10.96_f64).abs() < 1e-12);
    let sigma = 0.9 * g_mid / 102.5;
    // Cap: f_d = 5.0/3.0 = 1.6667, a fifth of it 0.3333: does not bite.
    let f_d = 5.0 / 3.0;
    assert!(sigma < 0.2 * f_d);
    same("f_d", f_d);
    same("sigma_d", sigma);

    // Strengths: 0.4/2.7 + 0.0962 = 0.2444 and 1.1/2.7 = 0.4074 N/mm².
    let f_1 = 0.4 / 2.7 + sigma;
    let f_2 = 1.1 / 2.7;
    same("f_xd1_app", f_1);
    same("f_xd2", f_2);

    // Orthogonal ratio 0.2444/0.4074 = 0.5998.
    let mu = f_1 / f_2;
    assert!((mu - 0.599_85).abs() < 5e-5, "{mu}");
    same("mu", mu);

    // Section modulus per unit length 102.5²/6 = 1751.04 mm³/mm, resistances 0.4279 and 0.7134 kNm/m.
    let z = 102.5 * 102.5 / 6.0;
    let (m_rd1, m_rd2) = (f_1 * z, f_2 * z);
    same("Z", z);
    same("M_Rd1", m_rd1);
    same("M_Rd2", m_rd2);

    // Case F: h/l = 2400/4000 = 0.6, between 0.5 and 0.75 (share 0.4 of the right column); mu between 0.6 and
    // 0.5 (share of the lower row (0.6 - 0.59985)/0.1).
    // Printed: mu 0.6: 0.022, 0.033; mu 0.5: 0.024, 0.036. Each is first raised to Johansen's formula
    // a b/(8 (1 + a/b + b/a)), a = 2/(sqrt 2 + 1) for one continuous vertical edge, b = (h/l)/sqrt(mu).
    let a = 2.0 / (2.0_f64.sqrt() + 1.0);
    let johansen = |mu: f64, h_l: f64| {
        let b = h_l / mu.sqrt();
        a * b / (8.0 * (1.0 + a / b + b / a))
    };
    let (c11, c12) = (0.022_f64.max(johansen(0.6, 0.5)), 0.033_f64.max(johansen(0.6, 0.75)));
    let (c21, c22) = (0.024_f64.max(johansen(0.5, 0.5)), 0.036_f64.max(johansen(0.5, 0.75)));
    // Johansen at the four: 0.02183, 0.03315, 0.02421, 0.03588: the second and the third raise their cells.
    assert!(c11 == 0.022 && c12 > 0.033 && c21 > 0.024 && c22 == 0.036);
    let column = (0.6 - 0.5) / (0.75 - 0.5);
    let row = (0.6 - mu) / (0.6 - 0.5);
    let between =
        (c11 * (1.0 - column) + c12 * column) * (1.0 - row) + (c21 * (1.0 - column) + c22 * column) * row;
    // Between cells the formula is larger still: 0.02670 against 0.02646.
    let alpha = between.max(johansen(mu, 0.6));
    assert!(alpha > between);
    assert!((0.0264..0.0272).contains(&alpha), "{alpha}");
    same("alpha_2", alpha);

    // Moments: M_Ed2 = alpha 0.675 x 4.0², about 0.287 kNm/m; M_Ed1 = mu times that.
    let m_ed2 = alpha * w * 4000.0 * 4000.0;
    let m_ed1 = mu * m_ed2;
    same("M_Ed2", m_ed2);
    same("M_Ed1", m_ed1);

    // Uses: the same in both directions, about 0.40.
    let ratio = m_ed2 / m_rd2;
    assert!((m_ed1 / m_rd1 - ratio).abs() < 1e-12);
    assert_eq!(s.verdicts.len(), 2);
    for v in &s.verdicts {
        assert!(v.holds && (v.ratio - ratio).abs() < 1e-12, "{v:?}");
    }
    assert!((0.39..0.42).contains(&ratio), "{ratio}");

    // What it could take: 0.7134/(alpha x 16) kN/m², over 1.5 for the characteristic pressure.
    same("w_Rd", m_rd2 / (alpha * 4000.0 * 4000.0));
}
