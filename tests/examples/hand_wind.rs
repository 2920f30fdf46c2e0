//! Wind by terrain category by hand, through a whole job, against the values on the wind sheet.
//!
//! Numbers of EN 1991-1-4 and its UK National Annex typed again (from memory, check against the standard):
//! terrain III z_0 0.3 m, z_min 5 m; Table 7.1 at h/d between 0.25 and 1; air 1.226 kg/m³.

use super::job::{BLOCK_140, PLAIN_RETURN, with_return};
use perpend::trace::{Entry, Sheet};

const TERRAIN: &str = r#"
[wind.site]
v_map = "22.5 m/s"
altitude = "120 m"
height = "12.0 m"
along_x = "20.0 m"
along_y = "20.0 m"
c_o = { value = 1.1, reason = "A long slope." }
lack_of_correlation = true

[[wind.sectors]]
bearings = "any"
category = "III"
"#;

/// The value printed under `name`, last.
fn printed(s: &Sheet, name: &str) -> f64 {
    let of = |e: &Entry| match e {
        Entry::Given { value, .. } | Entry::Lookup { value, .. } | Entry::Found { value, .. } => {
            Some(value.clone())
        }
        Entry::Step(step) => Some(step.result.clone()),
        _ => None,
    };
    // Of columns the last.
    let flat = s.entries.iter().flat_map(|e| match e {
        Entry::Columns(c) => c.rows.iter().filter_map(|r| r.entries().last().cloned()).collect(),
        other => vec![other.clone()],
    });
    let flat: Vec<Entry> = flat.collect();
    let found = flat.iter().rev().filter_map(of).find(|v| v.name == name);
    found.unwrap_or_else(|| panic!("{name} stands")).value.value
}

/// Height 12 m, so that the altitude factor takes its second form; h/d = 0.6; no panel, so that an area of 1 m²
/// is taken for the local coefficients, the safe side.
#[test]
fn wind_by_terrain_by_hand() {
    let text = with_return(BLOCK_140, PLAIN_RETURN)
        .replace("route = \"stated\"", "route = \"terrain\"")
        .replace("\n[materials.block]", &format!("{TERRAIN}\n[materials.block]"));
    let (_, results) = perpend::check("wind.toml", &text).unwrap_or_else(|e| panic!("{e}"));
    let s = &results.sections.iter().find(|s| s.id == "wind").expect("the wind sheet").sheet;
    assert!(s.outside.is_empty() && s.faults.is_empty());
    let same = |name: &str, hand: f64| {
        let there = printed(s, name);
        assert!((there - hand).abs() <= 1e-9 * hand.abs(), "{name}: sheet {there}, hand {hand}");
    };

    // c_alt = 1 + 0.001 x 120 x (10/12)^0.2 = 1.1157; v_b = 25.10 m/s.
    let c_alt = 1.0 + 0.001 * 120.0 * (10.0_f64 / 12.0).powf(0.2);
    assert!((c_alt - 1.1157).abs() < 5e-5, "{c_alt}");
    let v_b = c_alt * 22.5;
    same("v_b", v_b * 1e3);
    // k_r = 0.19 (0.3/0.05)^0.07 = 0.2154; c_r = 0.2154 ln(12/0.3) = 0.7945; v_m = 0.7945 x 1.1 x v_b.
    let k_r = 0.19 * (0.3_f64 / 0.05).powf(0.07);
    let c_r = k_r * (12.0_f64 / 0.3).ln();
    assert!((k_r - 0.2154).abs() < 5e-5 && (c_r - 0.7945).abs() < 1e-4, "{k_r} {c_r}");
    let v_m = c_r * 1.1 * v_b;
    same("v_m", v_m * 1e3);
    // I_v = 1/(1.1 ln 40); q_p = (1 + 7 I_v) 0.5 x 1.226 v_m² in N/m², that is 1e-6 N/mm².
    let i_v = 1.0 / (1.1 * 40.0_f64.ln());
    let q_p = (1.0 + 7.0 * i_v) * 0.5 * 1.226 * v_m * v_m * 1e-6;
    same("q_p", q_p);
    // h/d = 12/20 = 0.6 along x and y. Of 10 m² and more, D: 0.7 at 0.25, 0.8 at 1: 0.7467; E: -0.3 and -0.5: -0.3933.
    let step = (0.6_f64 - 0.25) / 0.75;
    let (c_d, c_e) = (0.7 + 0.1 * step, -0.3 - 0.2 * step);
    assert!((c_d - 0.7467).abs() < 5e-5 && (c_e + 0.3933).abs() < 5e-5);
    // Overall, with 0.85 for lack of correlation; c_s c_d is 1.
    same("q_net", q_p * 0.85 * (c_d - c_e));
    // Locally, of 1 m²: D 1.0 against -0.3 inside; A -1.4 against +0.2 inside.
    same("q_in", q_p * 1.3);
    same("q_out", q_p * 1.6);
    same("q_panel", q_p * 1.6);
}
