//! Footings by hand, every step in plain numbers (kN and m), against the sheet of the footing.
//!
//! First principles: a stiff strip, linear pressure, no tension on the ground. Nothing here calls a
//! formula of the tool.

use super::job::{BLOCK_140, with_return};
use perpend::checks::Section;
use perpend::trace::{Entry, Verdict};

/// The return: 900 x 140 mm, 2.5 m high, of block at 20 kN/m³; beam of 20 + 8 kN at 600 mm.
fn job(front: &str, head: &str, offset: &str, more: &str) -> String {
    let lines = format!(
        r#"
[[returns]]
mark = "R1"
title = "Return"
build_up = "wall"
storey = "ground"
length = "900 mm"
height = "2.5 m"
base = "dpc"
{head}
path = "sideways"
tributary_width = "{front}"
restraint = "timber floor"
supported_wall_height = "5 m"
{more}

[[returns.loads]]
what = "beam"
dead = "20 kN"
imposed = "8 kN"
at = "600 mm"

[returns.junction]
to = "front wall"
bonded = false
proof = "seen"
words = "Butted."
thickness = "140 mm"
left = "2 m"
right = "2 m"
dead = "9 kN/m"

[returns.footing]
mark = "F1"
width = "500 mm"
thickness = "200 mm"
beyond_free_end = {{ value = "200 mm", reason = "Runs on." }}
beyond_junction = {{ value = "100 mm", reason = "Runs on." }}
allowable = {{ value = "100 kN/m2", reason = "Invented." }}
proof = "seen"
words = "Trial hole."
offset = "{offset}"
before = {{ dead = "15 kN/m", imposed = "5 kN/m" }}
"#
    );
    with_return(BLOCK_140, &lines)
}

fn footing(text: &str) -> Section {
    let (_, results) = perpend::check("hand.toml", text).unwrap_or_else(|e| panic!("{e}"));
    assert_eq!(results.faults().count(), 0);
    results.sections.into_iter().find(|s| s.id == "F1").expect("the sheet of F1")
}

/// Largest pressure in kN/m² and whether it is adequate, for G + Q, G + W and G + Q + W.
fn against(text: &str, hand: [(f64, &str); 3]) {
    let section = footing(text);
    let found: Vec<&Verdict> = section.sheet.verdicts.iter().collect();
    assert_eq!(found.len(), 3);
    for (v, (p, case)) in found.iter().zip(hand) {
        close(v.demand.value.value, p * 1e-3);
        close(v.resistance.value.value, 0.1);
        assert_eq!(v.holds, p <= 100.0, "{case}");
        assert_eq!(v.case, case);
    }
}

fn close(found: f64, hand: f64) {
    assert!((found - hand).abs() <= 1e-9 * hand.abs(), "{found} and by hand {hand}");
}

/// Values of a symbol on the sheet, one for each column.
fn values(section: &Section, name: &str) -> Vec<f64> {
    let flat = section.sheet.entries.iter().flat_map(Entry::flat);
    flat.filter_map(Entry::value).filter(|v| v.name == name).map(|v| v.value.value).collect()
}

const FREE: &str = "head = \"free\"";

#[test]
fn a_footing_pressed_over_its_whole_length() {
    // What stands on it.
    let own = 20.0 * 0.900 * 0.140 * 2.5; // 6.3 kN
    let (dead, imposed) = (20.0 + own, 8.0); // 26.3 and 8 kN
    let (dead_moment, imposed_moment) = (20.0 * (0.600 - 0.450), 8.0 * (0.600 - 0.450)); // 3.0 and 1.2 kNm
    // The footing: 0.1 + 0.9 + 0.2 m long, its middle 0.05 m beyond that of the return.
    let (width, length, middle) = (0.5, 1.2, 0.05);
    let weight = 24.0 * width * 0.2 * length; // 2.88 kN
    // Wind on 1 m of front, 0.6 kN/m²; tilt 1/(100 sqrt(6.25)) = 0.004 of half of 200 + 80 kN.
    let tilt = 0.004 * (100.0 + 40.0); // 0.56 kN at the head
    let line = 0.6 * 1.0; // kN/m
    let still = tilt * 2.5 + tilt * 0.2; // 1.512 kNm at the underside, tilt alone
    let windy = (tilt * 2.5 + line * 2.5 * 2.5 / 2.0) + (tilt + line * 2.5) * 0.2; // 3.687 kNm
    let pressed = |load: f64, moment: f64, push: f64| {
        let n = load + weight;
        let m = moment - load * middle + push;
        let e = m / n;
        assert!(e > 0.0 && e <= length / 6.0, "{e}");
        n / (width * length) * (1.0 + 6.0 * e / length)
    };
    let both = (dead + imposed, dead_moment + imposed_moment);
    let hand = [
        pressed(both.0, both.1, still),    // e = 3.997 / 37.18 = 0.1075: 95.3 kN/m²
        pressed(dead, dead_moment, windy), // e = 5.372 / 29.18 = 0.184: 93.4 kN/m²
        pressed(both.0, both.1, windy),    // e = 6.172 / 37.18 = 0.166: 113.4 kN/m²
    ];
    assert!((hand[0] - 95.27).abs() < 0.01 && (hand[2] - 113.4).abs() < 0.1, "{hand:?}");
    let text = job("1.0 m", FREE, "0 mm", "");
    against(
        &text,
        [
            (hand[0], "G + Q, tilt towards the free end"),
            (hand[1], "G + W, wind and tilt towards the free end"),
            (hand[2], "G + Q + W, wind and tilt towards the free end"),
        ],
    );
    // Before: 15 and 5 kN/m on 0.5 m, and 0.2 m of concrete.
    let before = [20.0 / 0.5 + 4.8, 15.0 / 0.5 + 4.8, 20.0 / 0.5 + 4.8]; // 44.8, 34.8, 44.8 kN/m²
    let section = footing(&text);
    for (found, hand) in values(&section, "p_0").iter().zip(before) {
        close(*found, hand * 1e-3);
    }
    let growth = values(&section, "p_Delta");
    assert_eq!(growth.len(), 3);
    for (k, found) in growth.iter().enumerate() {
        close(*found, (hand[k] - before[k]) * 1e-3);
    }
}

#[test]
fn a_footing_that_lifts() {
    // As above with wind from 2 m of front.
    let tilt = 0.56;
    let line = 0.6 * 2.0;
    let still = tilt * 2.5 + tilt * 0.2;
    let windy: f64 = (tilt * 2.5 + line * 2.5 * 2.5 / 2.0) + (tilt + line * 2.5) * 0.2; // 5.15 + 0.712 = 5.862 kNm
    // G + Q: as above.
    let n = 34.3 + 2.88;
    let e = (4.2 - 34.3 * 0.05 + still) / n;
    let gravity = n / (0.5 * 1.2) * (1.0 + 6.0 * e / 1.2);
    // G + W: e = (3 - 1.315 + 5.862) / 29.18 = 0.2586 m, more than 1.2/6 = 0.2 m.
    let n = 26.3 + 2.88;
    let e = (3.0 - 26.3 * 0.05 + windy) / n;
    assert!((e - 0.2586).abs() < 1e-4, "{e}");
    let lifting = 2.0 * n / (3.0 * 0.5 * (1.2 / 2.0 - e)); // 114.0 kN/m²
    let part = 3.0 * (1.2 / 2.0 - e); // 1.024 m
    // G + Q + W: e = (4.2 - 1.715 + 5.862) / 37.18 = 0.2245 m: it lifts as well.
    let n = 34.3 + 2.88;
    let e = (4.2 - 34.3 * 0.05 + windy) / n;
    assert!(e > 0.2, "{e}");
    let all = 2.0 * n / (3.0 * 0.5 * (1.2 / 2.0 - e)); // 132.0 kN/m²
    let text = job("2.0 m", FREE, "0 mm", "");
    against(
        &text,
        [
            (gravity, "G + Q, tilt towards the free end"),
            (lifting, "G + W, wind and tilt towards the free end"),
            (all, "G + Q + W, wind and tilt towards the free end"),
        ],
    );
    close(values(&footing(&text), "L_p")[0], part * 1e3);
}

#[test]
fn a_held_head_passes_shear_and_no_moment() {
    // Wind from 2 m of front on a head that is held: half of 1.2 x 2.5 kN at the foot, 0.2 m above the underside.
    let push = 1.2 * 2.5 / 2.0 * 0.2; // 0.3 kNm
    let of = |load: f64, moment: f64, push: f64| {
        let n = load + 2.88;
        let e = (moment - load * 0.05 + push) / n;
        n / 0.6 * (1.0 + 6.0 * e / 1.2)
    };
    let held = "head = \"propped\"\npropped_by = [\"left wall\", \"right wall\"]";
    against(
        &job("2.0 m", held, "0 mm", ""),
        [
            (of(34.3, 4.2, 0.0), "G + Q"),
            (of(26.3, 3.0, push), "G + W, wind towards the free end"),
            (of(34.3, 4.2, push), "G + Q + W, wind towards the free end"),
        ],
    );
}

#[test]
fn a_wall_off_the_middle_presses_the_far_edge_more() {
    // 60 mm across: e_y = 34.3 x 0.06 / 37.18 = 0.0554 m, under 0.5/6; 26.3 x 0.06 / 29.18 = 0.0541 m.
    let of = |load: f64, moment: f64, push: f64| {
        let n = load + 2.88;
        let (e, across) = ((moment - load * 0.05 + push) / n, load * 0.06 / n);
        assert!(across < 0.5 / 6.0);
        n / 0.6 * (1.0 + 6.0 * e / 1.2) * (1.0 + 6.0 * across / 0.5)
    };
    let text = job("1.0 m", FREE, "60 mm", "");
    against(
        &text,
        [
            (of(34.3, 4.2, 1.512), "G + Q, tilt towards the free end"),
            (of(26.3, 3.0, 3.687), "G + W, wind and tilt towards the free end"),
            (of(34.3, 4.2, 3.687), "G + Q + W, wind and tilt towards the free end"),
        ],
    );
    // 150 mm across: beyond 0.5/6, a triangle across too. G + Q: e_y = 34.3 x 0.15 / 37.18 = 0.1384 m.
    let across: f64 = 34.3 * 0.15 / 37.18;
    let e = (4.2 - 34.3 * 0.05 + 1.512) / 37.18;
    let hand = 37.18 / 0.6 * (1.0 + 6.0 * e / 1.2) * 2.0 * 0.5 / (3.0 * (0.5 / 2.0 - across));
    let section = footing(&job("1.0 m", FREE, "-150 mm", ""));
    close(section.sheet.verdicts[0].demand.value.value, hand * 1e-3);
    // Before: 20 kN/m at 0.15 m and 24 x 0.5 x 0.2 = 2.4 kN/m in the middle.
    let across = 20.0 * 0.15 / 22.4;
    let before = 2.0 * 22.4 / (3.0 * (0.5 / 2.0 - across));
    close(values(&section, "p_0")[0], before * 1e-3);
}

#[test]
fn a_footing_that_turns_over_is_not_adequate() {
    let section = footing(&job("8.0 m", FREE, "0 mm", ""));
    let over = &section.sheet.verdicts[1];
    assert!(!over.holds && over.ratio.is_infinite() && over.demand.value.value.is_infinite());
}

/// Both leaves of a cavity wall stand on the footing, each at its own place, though one alone takes wind.
#[test]
fn a_cavity_wall_presses_with_both_leaves() {
    let cavity = r#"
[build_ups.wall]
cavity = "60 mm"
[[build_ups.wall.leaves]]
material = "block"
thickness = "100 mm"
[[build_ups.wall.leaves]]
material = "block"
thickness = "140 mm"
loaded = true
"#;
    let plain = job("1.0 m", FREE, "0 mm", "");
    let start = plain.find("[build_ups.wall]").expect("the wall");
    let end = plain.find("[[storeys]]").expect("the house");
    let section = footing(&format!("{}{cavity}{}", &plain[..start], &plain[end..]));
    // Own weights of 20 x 0.9 x 2.5 = 45 kN per metre of thickness; beam on the inner leaf.
    let (outer, inner) = (4.5, 6.3 + 20.0);
    close(values(&section, "G")[0], (outer + inner) * 1e3);
    // The wall is 300 mm thick: leaves 100 and 80 mm from its middle, outwards and inwards.
    let across = inner * 0.080 - outer * 0.100;
    close(values(&section, "T_G")[0], across * 1e6);
    // G + Q: the tilt as for one leaf.
    let n = outer + inner + 8.0 + 2.88;
    let e = (4.2 - (n - 2.88) * 0.05 + 1.512) / n;
    let e_y = (across + 8.0 * 0.080) / n;
    assert!(e < 0.2 && e_y < 0.5 / 6.0, "{e} {e_y}");
    let hand = n / 0.6 * (1.0 + 6.0 * e / 1.2) * (1.0 + 6.0 * e_y / 0.5);
    close(section.sheet.verdicts[0].demand.value.value, hand * 1e-3);
}
