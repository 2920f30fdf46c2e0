//! Overall pressure on the building for wind along x and along y of the plan.

use super::velocity::Onto;
use crate::building::Site;
use crate::quantity::functions::max;
use crate::quantity::{Num, Stress};
use crate::standards::en1991_1_4 as wind;
use crate::standards::source::OutOfTable;
use crate::standards::tables::walls::{Zone, c_pe, lack_of_correlation};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, lookup};

/// Loaded area from which c_pe,10 holds, m².
const WHOLE: f64 = 10.0;

/// A limit of Table 7.1.
pub fn out(e: OutOfTable) -> Outside {
    Outside::new("wind", "EN 1991-1-4 7.2.2", e.to_string())
}

/// Net overall pressure along x and along y, each the worse of its two senses.
///
/// # Errors
/// [`Outside`] for h/d above 5 and for buildings of 15 m and more.
pub fn overall(s: &mut Sheet, site: &Site, onto: &[Onto; 4]) -> Result<[Stress; 2], Outside> {
    s.heading(1, "Overall pressure");
    given!(s, "height of the building", "job file", h = site.height);
    let c_sd = wind::size_and_dynamics(s, h)?;
    let heads = ["wind along x".to_owned(), "wind along y".to_owned()];
    let found = s.columns(&heads, |s, i| {
        given!(s, "peak pressure of the one sense", "above", q_1 = onto[2 * i].q_p);
        given!(s, "of the other", "above", q_2 = onto[2 * i + 1].q_p);
        calc!(s, "both senses", "peak velocity pressure", q_p = max(q_1, q_2));
        let (along, across) = if i == 0 { site.size } else { (site.size.1, site.size.0) };
        given!(s, "depth along the wind, neighbours included", "job file", d = along);
        given!(s, "breadth across it, neighbours included", "job file", b = across);
        if h > b {
            s.note("The building is higher than it is broad; its whole height takes the wind of its top, the safe side (7.2.2(1)).");
        }
        calc!(s, "7.2.2(1)", "height over depth", r_hd = h / d);
        let one = Num::new(1.0);
        let at = |zone| c_pe(zone, r_hd.base(), WHOLE).map_err(out);
        lookup!(s, "Table 7.1", "windward wall", c_D = at(Zone::D)?, one);
        lookup!(s, "Table 7.1", "leeward wall", c_E = at(Zone::E)?, one);
        if site.lack_of_correlation {
            let k = lack_of_correlation(r_hd.base()).map_err(out)?;
            lookup!(s, "7.2.2(3)", "lack of correlation of windward and leeward", k_c = k, one);
            calc!(s, "7.2.2, 5.3", "net overall pressure", q_net = c_sd * q_p * k_c * (c_D - c_E));
            return Ok(q_net);
        }
        calc!(s, "7.2.2, 5.3", "net overall pressure", q_net = c_sd * q_p * (c_D - c_E));
        Ok(q_net)
    });
    let all: Vec<Stress> = found.into_iter().collect::<Result<_, _>>()?;
    Ok([all[0], all[1]])
}
