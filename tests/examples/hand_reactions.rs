//! What a panel with openings brings to straps and to a return, through a whole job: by equilibrium, in plain numbers.

use perpend::building::Building;
use perpend::checks::{self, Section};

use super::job::{BLOCK_140, PLAIN_RETURN, with_return};

/// A panel of 140 mm block, 4.0 x 2.5 m, with a door of 1.2 x 2.1 m in its middle whose frame passes its wind to the
/// head. Net pressure 0.70 kN/m².
fn job(tributary: &str, left: &str) -> Building {
    let held = |reason: &str| format!("{{ edge = \"simple\", reason = \"{reason}\" }}");
    let edges = format!(
        "top = {0}\nbase = {0}\nleft = {left}\nright = {1}\n",
        held("Held."),
        if left.contains("free") { left.to_owned() } else { held("R1, butted and strapped.") }
    );
    let panel = format!(
        "\n[[panels]]\nmark = \"P1\"\ntitle = \"Front wall\"\nbuild_up = \"wall\"\nstorey = \"ground\"\n\
         height = \"2.5 m\"\ndead_above = \"8 kN/m\"\n[panels.before]\nlength = \"2.0 m\"\n{edges}\
         [panels.after]\nlength = \"4.0 m\"\n{edges}[[panels.openings]]\nat = \"1.4 m\"\nwidth = \"1.2 m\"\n\
         height = \"2.1 m\"\nframe = \"head and sill\"\n[[floor_edges]]\nmark = \"E1\"\npanel = \"P1\"\n\
         strip_height = \"1.25 m\"\njoists = \"along the wall\"\nstraps = \"seen\"\nwords = \"AM, 1 March 2026.\"\n\
         spacing = \"1.2 m\"\nstrength = {{ value = \"8 kN\", reason = \"Declared.\" }}\n[collapse]\nclass = \"1\"\n\
         reason = \"A house.\"\n"
    );
    let lines =
        PLAIN_RETURN.replace("tributary_width = \"0.1 m\"", &format!("tributary_width = \"{tributary}\""));
    let text = format!("{}{panel}", with_return(BLOCK_140, &lines));
    perpend::job::read("hand.toml", &text).unwrap_or_else(|e| panic!("{}", e.render(false)))
}

fn section(b: &Building, id: &str) -> Section {
    let all = checks::results(b).sections;
    let found = all.into_iter().find(|s| s.id == id).unwrap_or_else(|| panic!("no section {id}"));
    assert!(found.sheet.faults.is_empty(), "{:?}", found.sheet.faults);
    found
}

fn value(s: &Section, symbol: &str) -> f64 {
    s.sheet.standing(symbol).unwrap_or_else(|| panic!("{symbol} does not stand")).value
}

const FREE: &str = "{ edge = \"free\", reason = \"Movement joint.\" }";
const HELD: &str = "{ edge = \"simple\", reason = \"Wall.\" }";

/// Sides free, so that top and base bring all: moments about the base. W = 1.5 x 0.70 = 1.05 kN/m². On the solid,
/// (4.0 x 2.5 - 1.2 x 2.1) at their middles: 4.0 x 2.5 x 1.25 - 1.2 x 2.1 x 1.05 = 9.854 m³; the door's wind at its head,
/// 1.2 x 2.1 x 2.1 = 5.292 m³. Top: 1.05 x (9.854 + 5.292) / 2.5 = 6.361 kN over 4.0 m, 1.590 kN/m. Half of the wind on the
/// height is 1.05 x 1.25 = 1.3125 kN/m, and the strip of 1.25 m has no rest: the straps get 1.590 kN/m.
#[test]
fn straps_get_what_the_panel_brings_where_that_is_more() {
    let edge = section(&job("0.1 m", FREE), "floor-edges");
    let top = 1.05 * (4.0 * 2.5 * 1.25 - 1.2 * 2.1 * 1.05 + 1.2 * 2.1 * 2.1) / 2.5 / 4.0;
    for symbol in ["n_top", "n_s"] {
        let got = value(&edge, symbol);
        assert!((got / top - 1.0).abs() < 2e-3, "{symbol} = {got}, by hand {top}");
    }
    assert!(top > 1.3125);
}

/// A return that counts 0.1 m of front gets more from a panel of 4 m: not silent, and not adequate. One that counts 4 m
/// does not: no panel of 4 m in all brings more than that to a side.
#[test]
fn a_return_that_counts_less_than_a_panel_brings_fails_the_panel() {
    let short = section(&job("0.1 m", HELD), "P1");
    let row = short.sheet.unshown.iter().find(|u| u.id == "brings-R1").expect("a row");
    assert!(row.hold.is_none() && row.ratio.is_some_and(|r| r > 1.0), "{row:?}");
    let wide = section(&job("4 m", HELD), "P1");
    assert!(wide.sheet.unshown.iter().all(|u| u.id != "brings-R1"), "{:?}", wide.sheet.unshown);
    assert!(format!("{:?}", wide.sheet.entries).contains("To R1 by limit analysis: P1 brings"));
}
