//! Overall pressure on the building for wind along x and along y of the plan.

use super::velocity::{self, Onto};
use crate::building::{Along, RoofForm, Site};
use crate::quantity::functions::max;
use crate::quantity::{Length, Num, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1991_1_4::{self as wind, Strip, Surfaces};
use crate::standards::source::OutOfTable;
use crate::standards::tables::walls::{Zone, c_pe, lack_of_correlation};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, lookup};

/// Loaded area from which c_pe,10 holds, m².
const WHOLE: f64 = 10.0;

/// Net overall pressures for wind along one direction.
#[derive(Clone, Debug, PartialEq)]
pub struct Overall {
    /// At the top, and over the whole height where that is not in strips.
    pub top: Stress,
    /// Strips below the top one, lowest first, of a building higher than it is broad.
    pub strips: Vec<(Strip, Stress)>,
}

/// A limit of Table 7.1.
pub fn out(e: OutOfTable) -> Outside {
    Outside::new("wind", "EN 1991-1-4 7.2.2", e.to_string())
}

/// Net overall pressure along x and along y, each the worse of its two senses.
///
/// # Errors
/// [`Outside`] for h/d above 5 and for buildings of 15 m and more.
pub fn overall(
    s: &mut Sheet,
    site: &Site,
    onto: &[Onto; 4],
    charts: bool,
    annex: &Annex,
) -> Result<[Overall; 2], Outside> {
    s.heading(1, "Overall pressure");
    given!(s, "height of the building", "job file", h = site.height);
    let c_sd = wind::size_and_dynamics(s, h)?;
    let heads = ["wind along x".to_owned(), "wind along y".to_owned()];
    let found = s.columns(&heads, |s, i| {
        let senses = [onto[2 * i], onto[2 * i + 1]];
        given!(s, "peak pressure of the one sense", "above", q_1 = senses[0].q_p);
        given!(s, "of the other", "above", q_2 = senses[1].q_p);
        calc!(s, "both senses", "peak velocity pressure", q_p = max(q_1, q_2));
        let direction = if i == 0 { Along::X } else { Along::Y };
        let (along, across) = if i == 0 { site.size } else { (site.size.1, site.size.0) };
        given!(s, "depth along the wind, neighbours included", "job file", d = along);
        given!(s, "breadth across it, neighbours included", "job file", b = across);
        calc!(s, "7.2.2(1)", "height over depth", r_hd = h / d);
        let one = Num::new(1.0);
        let at = |zone| c_pe(zone, r_hd.base(), WHOLE).map_err(out);
        lookup!(s, "Table 7.1", "windward wall", c_D = at(Zone::D)?, one);
        lookup!(s, "Table 7.1", "leeward wall", c_E = at(Zone::E)?, one);
        let k_c = if site.lack_of_correlation {
            let k = lack_of_correlation(r_hd.base()).map_err(out)?;
            lookup!(s, "7.2.2(3)", "lack of correlation of windward and leeward", k_c = k, one);
            k_c
        } else {
            given!(s, "lack of correlation of windward and leeward", "not taken, safe side", k_c = one);
            k_c
        };
        // On the sheet only where there is some.
        let on = surfaces(site, direction);
        let mut quiet = Sheet::silent();
        let some = wind::friction(&mut quiet, q_p, (h, d, b), on)? > Stress::ZERO;
        let q_fr = if some { wind::friction(s, q_p, (h, d, b), on)? } else { Stress::ZERO };
        let q_net = if some {
            calc!(s, "7.2.2, 5.3", "net overall pressure", q_net = c_sd * q_p * k_c * (c_D - c_E) + q_fr);
            q_net
        } else {
            calc!(s, "7.2.2, 5.3", "net overall pressure", q_net = c_sd * q_p * k_c * (c_D - c_E));
            q_net
        };
        let strips = if h > b { wind::strips(s, h, b)? } else { Vec::new() };
        if !strips.is_empty() && charts {
            s.note("The charts were read at the top alone: the whole height takes its wind, the safe side.");
            return Ok(Overall { top: q_net, strips: Vec::new() });
        }
        let mut lower = Vec::new();
        for strip in strips.iter().filter(|x| x.to < h) {
            let both = senses.map(|o| velocity::at_height(site, &o, strip.z_e, annex));
            let [one, other] = both;
            let top =
                format!("strip up to {:.2} m, peak pressure there, worked as above", strip.to.base() / 1e3);
            given!(s, &top, "7.2.2(1)", q_z = max(one?, other?));
            // The leeward wall takes the wind of the whole height.
            calc!(
                s,
                "7.2.2, 5.3",
                "net overall pressure of the strip, friction apart",
                q_st = c_sd * k_c * (q_z * c_D - q_p * c_E)
            );
            lower.push((*strip, q_st + q_fr));
        }
        Ok(Overall { top: q_net, strips: lower })
    });
    s.note(
        "Friction along walls and roof is left out where it is not shown: the surfaces along the wind are at most four times \
         those across it (5.3(4)), or end within the length that has none (7.5(3)).",
    );
    let all: Vec<Overall> = found.into_iter().collect::<Result<_, _>>()?;
    all.try_into().map_err(|_| Outside::new("wind", "job file", "two directions"))
}

/// Surfaces along and across the wind, the safe side where the roof is not given.
fn surfaces(site: &Site, along: Along) -> Surfaces {
    let (h, across) = (site.height, if along == Along::X { site.size.1 } else { site.size.0 });
    match &site.roof {
        // Its slopes meet the wind.
        Some(roof) if roof.form != RoofForm::Flat && roof.ridge != along => {
            Surfaces { h_along: h, h_across: roof.eaves, roof: Length::ZERO }
        }
        Some(roof) => {
            let slope = across / roof.pitch.to_radians().cos();
            Surfaces { h_along: roof.eaves, h_across: roof.eaves, roof: slope }
        }
        None => Surfaces { h_along: h, h_across: h, roof: across },
    }
}
