//! `[basis]` and `[wind]`.

use super::limits::{Limits, Odd};
use super::reader::Table;
use super::words::TERRAIN;
use crate::building::{Basis, Cause, StatedWind, TerrainWind, Wind, WindRoute};
use crate::error::Kind;
use crate::quantity::Length;

const GAMMA: Limits = Limits::new(1.0, 5.0, "").odd(&[
    Odd::Below(2.0, "less than UK NA Table NA.1 has for masonry walls"),
    Odd::Above(3.5, "more than the usual factor of 3 on everything"),
]);
const HELPING: Limits = Limits::new(0.8, 1.0, "");

/// Usual factor on dead load that helps: EN 1990 Table A1.2(A).
const HELPING_USUAL: f64 = 0.9;

/// Net pressures; 5 kN/m2 is typed in place of 0.5 more often than it is meant.
const PRESSURE: Limits = Limits::new(0.05, 10.0, "kN/m2").odd(&[
    Odd::Below(0.25, "less than even a sheltered site gives, mostly a slip of the point"),
    Odd::Above(2.0, "more than UK sites of two or three storeys give, mostly a slip of the point"),
]);
const MAP_SPEED: Limits = Limits::new(15.0, 45.0, "m/s").odd(&[
    Odd::Below(21.0, "below the lowest line of the UK wind map"),
    Odd::Above(31.0, "above the highest line of the UK wind map"),
]);
const ALTITUDE: Limits =
    Limits::new(-10.0, 1350.0, "m").odd(&[Odd::Above(500.0, "higher than almost every house in the UK")]);
const REFERENCE_HEIGHT: Limits =
    Limits::new(2.0, 60.0, "m").odd(&[Odd::Above(20.0, "tall for a masonry house")]);
const SIDE: Limits = Limits::new(2.0, 200.0, "m").odd(&[Odd::Above(60.0, "long for a masonry house")]);
const DIRECTION: Limits = Limits::new(0.7, 1.0, "");
const SEASON: Limits = Limits::new(0.6, 1.0, "");
const PROBABILITY: Limits = Limits::new(0.7, 1.3, "");
const OROGRAPHY: Limits = Limits::new(1.0, 2.5, "");

/// Reads `[basis]`; without it, existing work of class 2 with units of category II.
pub fn basis(t: Option<&Table<'_>>) -> Option<Basis> {
    let usual = || Cause { value: HELPING_USUAL, reason: String::new() };
    let Some(t) = t else {
        return Some(Basis {
            execution_class: 2,
            unit_category: 2,
            gamma_m_compression: None,
            gamma_m_flexure: None,
            gamma_m_shear: None,
            helping_factor: usual(),
        });
    };
    let execution_class =
        if t.has("execution_class") { t.need("execution_class").whole(&[1, 2]) } else { Some(2) };
    let unit_category =
        if t.has("unit_category") { t.need("unit_category").pick(&[("I", 1), ("II", 2)]) } else { Some(2) };
    let one = t.may("gamma_M").cause(|e| e.number(&GAMMA));
    let each = ["gamma_M_compression", "gamma_M_flexure", "gamma_M_shear"];
    for key in each {
        if t.has("gamma_M") && t.has(key) {
            t.clash(
                format_args!("`gamma_M` sets every factor, and `{key}` sets one of them"),
                key,
                "gamma_M",
            )
            .allowed("`gamma_M` alone, or any of the three others")
            .help("take one of them out");
        }
    }
    let [gamma_m_compression, gamma_m_flexure, gamma_m_shear] =
        each.map(|key| t.may(key).cause(|e| e.number(&GAMMA)).or_else(|| one.clone()));
    let helping_factor = t.may("helping_factor").factor(HELPING_USUAL, &HELPING);
    t.finish();
    Some(Basis {
        execution_class: execution_class?,
        unit_category: unit_category?,
        gamma_m_compression,
        gamma_m_flexure,
        gamma_m_shear,
        helping_factor: helping_factor?,
    })
}

/// Reads `[wind]`.
pub fn wind(t: &Table<'_>) -> Option<Wind> {
    let route = t.need("route").choice(WindRoute::WORDS, WindRoute::from_word);
    let stated = t.may("stated").table("stated wind").and_then(|t| stated(&t));
    let terrain = t.may("terrain").table("wind by terrain").and_then(|t| terrain(&t));
    for (wanted, key) in [(WindRoute::Stated, "stated"), (WindRoute::Terrain, "terrain")] {
        if route == Some(wanted) && !t.has(key) {
            t.fault(
                Kind::Contradiction,
                format_args!("the route is \"{key}\", but there is no [wind.{key}]"),
            )
            .at(t.place("route"), "route")
            .and(t.head(), format!("nothing under it is called `{key}`"))
            .allowed("the route of a table that is there")
            .help(format!("add [wind.{key}], or name the other route"));
        }
    }
    t.finish();
    Some(Wind { route: route?, stated, terrain })
}

fn stated(t: &Table<'_>) -> Option<StatedWind> {
    let overall = t.need("overall").quantity(&PRESSURE);
    let panel = t.need("panel").quantity(&PRESSURE);
    let reason = t.need("reason").text();
    t.finish();
    Some(StatedWind { overall: overall?, panel: panel?, reason: reason? })
}

fn terrain(t: &Table<'_>) -> Option<TerrainWind> {
    let v_map = t.need("v_map").quantity(&MAP_SPEED);
    let altitude = t.need("altitude").quantity(&ALTITUDE);
    let category = t.need("category").pick(TERRAIN);
    let height: Option<Length> = t.need("height").quantity(&REFERENCE_HEIGHT);
    let breadth = t.need("breadth").quantity(&SIDE);
    let depth = t.need("depth").quantity(&SIDE);
    let c_dir = t.may("c_dir").factor(1.0, &DIRECTION);
    let c_season = t.may("c_season").factor(1.0, &SEASON);
    let c_prob = t.may("c_prob").factor(1.0, &PROBABILITY);
    let c_o = orography(t);
    let lack_of_correlation = t.may("lack_of_correlation").flag().unwrap_or(false);
    if t.may("dominant_opening").flag() == Some(true) {
        t.fault(Kind::NotAllowed, "a dominant opening is not carried through the terrain route")
            .at(t.place("dominant_opening"), "beyond this route")
            .allowed("false")
            .help("work out the net pressures by 7.2.9 of EN 1991-1-4 and state them under [wind.stated]");
    }
    t.finish();
    Some(TerrainWind {
        v_map: v_map?,
        altitude: altitude?,
        category: category?,
        height: height?,
        breadth: breadth?,
        depth: depth?,
        c_dir: c_dir?,
        c_season: c_season?,
        c_prob: c_prob?,
        c_o: c_o?,
        lack_of_correlation,
    })
}

/// Level ground needs a reason as much as a hill needs a factor.
fn orography(t: &Table<'_>) -> Option<Cause<f64>> {
    match (t.has("orography"), t.has("c_o")) {
        (true, true) => {
            t.clash(
                "`orography` says that there is none, and `c_o` gives a factor for it",
                "c_o",
                "orography",
            )
            .allowed("one of the two")
            .help("keep `orography` for level ground, or `c_o` with its reason for a hill");
            None
        }
        (false, true) => t.may("c_o").cause(|e| e.number(&OROGRAPHY)),
        _ => t.need("orography").text().map(|reason| Cause { value: 1.0, reason }),
    }
}
