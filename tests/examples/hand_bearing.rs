//! Bearings by hand, every step in plain numbers (N and mm), against the verdicts of the tool.
//!
//! Independent arithmetic: nothing here calls a formula of the tool. 6.1.3 of EN 1996-1-1, K = 0.75 for aggregate block,
//! gamma_M 3.0 in compression, 0.6 f_ck/1.5 for plain concrete: typed again from memory, check against the standard.

use super::job::{BLOCK_140, with_return};
use perpend::trace::Verdict;

fn lines(length: u32, loads: &str, bearing: &str) -> String {
    format!(
        r#"
[[returns]]
mark = "R1"
title = "Return"
build_up = "wall"
storey = "ground"
length = "{length} mm"
height = "2.5 m"
base = "dpc"
head = "free"
path = "sideways"
tributary_width = "0.1 m"
restraint = "timber floor"
supported_wall_height = "5 m"
{loads}
[returns.junction]
to = "front wall"
bonded = false
proof = "seen"
words = "Butted."
thickness = "140 mm"
left = "2 m"
right = "2 m"
dead = "9 kN/m"

[[bearings]]
mark = "B1-R1"
beam = "B1"
on = "R1"
load = "beam"
{bearing}
"#
    )
}

fn verdicts(text: &str) -> Vec<Verdict> {
    let (_, results) = perpend::check("hand.toml", text).unwrap_or_else(|e| panic!("{e}"));
    assert!(results.faults().next().is_none());
    let sheet = &results.sections.iter().find(|s| s.id == "B1-R1").expect("the sheet of the bearing").sheet;
    assert!(sheet.outside.is_empty(), "{:?}", sheet.outside);
    sheet.verdicts.clone()
}

/// Every verdict in order: id, demand, resistance.
fn compare(text: &str, hand: &[(&str, f64, f64)]) {
    let found = verdicts(text);
    assert_eq!(
        found.iter().map(|v| v.id.as_str()).collect::<Vec<_>>(),
        hand.iter().map(|h| h.0).collect::<Vec<_>>()
    );
    for (v, (id, demand, resistance)) in found.iter().zip(hand) {
        let close = |a: f64, b: f64| (a - b).abs() <= 1e-9 * b.abs();
        assert!(
            close(v.demand.value.value, *demand) && close(v.resistance.value.value, *resistance),
            "{id}: sheet {:?} <= {:?}, hand {demand} <= {resistance}",
            v.demand.value,
            v.resistance.value
        );
        assert_eq!(v.holds, demand <= resistance, "{id}");
        assert_eq!(v.case, "pressing, imposed leads");
    }
}

/// Annex G with E = 1000 f_k.
fn annex_g(t: f64, e: f64, slenderness: f64) -> f64 {
    let lambda = slenderness * (1.0_f64 / 1000.0).sqrt();
    let u = (lambda - 0.063) / (0.73 - 1.17 * e / t);
    (1.0 - 2.0 * e / t) * (-u * u / 2.0).exp()
}

fn f_k() -> f64 {
    0.75 * 10f64.powf(0.7) * 4f64.powf(0.3)
}

/// A beam near the free end of a 700 mm return of 140 mm block, off the middle both ways, on a padstone that the end
/// pushes aside; another load beside it.
#[test]
fn on_a_padstone_pushed_aside_by_the_end() {
    let loads = r#"
[[returns.loads]]
what = "beam"
dead = "30 kN"
imposed = "12 kN"
at = "560 mm"
eccentricity = "-10 mm"

[[returns.loads]]
what = "wall above"
dead = "8 kN"
imposed = "2 kN"
at = "200 mm"
eccentricity = "4 mm"
"#;
    let bearing = r#"
bearing_length = "120 mm"
bearing_width = "90 mm"
level = "2.3 m"

[[padstones]]
name = "long"
length = "300 mm"
width = "140 mm"
height = "150 mm"
strength = "20 N/mm2"

[[padstones]]
name = "too long"
length = "800 mm"
width = "140 mm"
height = "50 mm"
strength = "20 N/mm2"
"#;
    let (l, t, h) = (700.0, 140.0, 2500.0);
    let n = 1.35 * 30e3 + 1.5 * 12e3;
    // Small plan area: 0.098 m2.
    let f_d = f_k() / 3.0 * (0.7 + 3.0 * 0.098);
    // The padstone of 300 mm lies from 400 to 700 mm, its middle at 550 mm: the load is 140 mm from its nearer end.
    let run = 1.0 / 60f64.to_radians().tan();
    let l_a = f64::min(120.0 + 2.0 * run * 150.0, 2.0 * 140.0);
    assert_eq!(l_a, 280.0);
    // Across it fills the leaf: the load is 10 mm off its middle.
    let w_a = f64::min(90.0 + 2.0 * run * 150.0, 140.0 - 2.0 * 10.0);
    assert_eq!(w_a, 120.0);
    let (a_b, h_c, a_1) = (l_a * w_a, 2300.0 - 150.0, 0.0);
    // 140 + 620.7 mm each side reaches past both ends: the whole return.
    let l_efm = 700.0;
    assert!(140.0 + run * h_c / 2.0 > 560.0);
    let ratio: f64 = a_b / (l_efm * t);
    assert!(ratio < 0.45);
    let beta = (1.0 + 0.3 * a_1 / h_c) * (1.5 - 1.1 * ratio);
    assert!((1.0..1.25).contains(&beta), "{beta}");
    let n_rdc = beta * a_b * f_d;
    // Concrete: 120 mm by 90 mm, which the padstone carries whole.
    let n_rdp = 0.6 * 20.0 / 1.5 * 120.0 * 90.0;
    // Mid-height: the other load has spread over the whole return as well.
    let other = (1.35 * 8e3 + 1.5 * 2e3) / l;
    let g_w = 20e-6 * t * (h - h_c / 2.0);
    let n_em = n + (other + 1.35 * g_w) * l_efm;
    let e_h = (n * 10.0 + other * 4.0 * l_efm) / (n + other * l_efm);
    let e_mk = f64::max(e_h / 2.0 + 2500.0 / 450.0, 0.05 * t);
    let n_rdm = annex_g(t, e_mk, 2500.0 / 140.0) * f_d * t * l_efm;
    let text = with_return(BLOCK_140, &lines(700, loads, bearing));
    compare(&text, &[("bearing", n, n_rdc), ("padstone", n, n_rdp), ("middle", n_em, n_rdm)]);
}

/// A beam at a third of a return of 3 m, directly on the masonry: the spread is cut nowhere, and the load at the far end
/// does not meet it. Under units of Group 2 nothing is enhanced.
#[test]
fn directly_on_a_long_return() {
    let loads = r#"
[[returns.loads]]
what = "beam"
dead = "30 kN"
imposed = "12 kN"
at = "1000 mm"

[[returns.loads]]
what = "far beam"
dead = "40 kN"
imposed = "9 kN"
at = "2900 mm"
"#;
    let bearing = r#"
bearing_length = "200 mm"
bearing_width = "140 mm"
padstone = "none"
"#;
    let (t, h) = (140.0, 2500.0);
    let n = 1.35 * 30e3 + 1.5 * 12e3;
    let f_d = f_k() / 3.0;
    let run = h / 2.0 / 60f64.to_radians().tan();
    let l_efm = 200.0 + 2.0 * run;
    let (a_b, a_1) = (200.0 * 140.0, 900.0);
    let formula = (1.0 + 0.3 * a_1 / h) * (1.5 - 1.1 * a_b / (l_efm * t));
    let beta = f64::min(f64::max(formula, 1.0), f64::min(1.25 + a_1 / (2.0 * h), 1.5));
    assert!(2900.0 - run > 1100.0 + run, "the far load must not meet it");
    let n_em = n + 1.35 * 20e-6 * t * (h / 2.0) * l_efm;
    let n_rdm = annex_g(t, f64::max(2500.0 / 450.0, 0.05 * t), 2500.0 / 140.0) * f_d * t * l_efm;
    let text = with_return(BLOCK_140, &lines(3000, loads, bearing));
    compare(&text, &[("bearing", n, beta * a_b * f_d), ("middle", n_em, n_rdm)]);

    // Group 2: K = 0.70 for aggregate block, and beta = 1.
    let hollow = text.replacen("group = 1", "group = 2", 1);
    let change = verdicts(&hollow)[0].resistance.value.value / (a_b * f_d);
    assert!((change - 0.70 / 0.75).abs() < 1e-9, "{change}");
}

/// The load more than a quarter of the thickness off the middle: neither adequate nor not adequate.
#[test]
fn too_far_off_the_middle_is_outside() {
    let loads = r#"
[[returns.loads]]
what = "beam"
dead = "3 kN"
imposed = "1 kN"
at = "500 mm"
eccentricity = "35.1 mm"
"#;
    let bearing = "bearing_length = \"100 mm\"\nbearing_width = \"60 mm\"\n";
    let check = |e: &str| {
        let text = with_return(BLOCK_140, &lines(1000, &loads.replace("35.1 mm", e), bearing));
        let (_, results) = perpend::check("hand.toml", &text).unwrap_or_else(|e| panic!("{e}"));
        let s = &results.sections.iter().find(|s| s.id == "B1-R1").expect("its sheet").sheet;
        (s.outside.len(), s.verdicts.len())
    };
    assert_eq!(check("35.1 mm"), (1, 0));
    assert_eq!(check("35 mm"), (0, 2));
}
