//! How large a panel may be: Annex F between floors, the area limits of BS 5628-1 36.3 elsewhere, named as such.

use crate::quantity::{Length, Num};
use crate::standards::tables::annex_e::{Edge, Edges};
use crate::standards::tables::panel_limits as limits;
use crate::trace::{Outside, Sheet};
use crate::{calc, given, lookup, require};

/// BS 5628-1 36.3: a wall held at its base alone is at most this many t_ef high. From memory (M), check
/// against the standard.
const FREE_STANDING: f64 = 12.0;

/// Tries the size limits of a panel. `h`, `l` and `t_ef` stand on the sheet.
///
/// Spanning between floors (`one_way`, or both vertical edges free): Annex F, `h <= 30 t_ef`. Three or
/// four edges held: BS 5628-1 36.3, `h l <= k t_ef²` and no side above `50 t_ef`. Base alone: `12 t_ef`.
///
/// # Errors
/// [`Outside`] where a limit is passed: that is no failure, the method does not reach.
pub fn limits(
    s: &mut Sheet,
    id: &str,
    edges: Edges,
    one_way: bool,
    h: Length,
    l: Length,
    t_ef: Length,
) -> Result<(), Outside> {
    let free = |e| e == Edge::Free;
    let source = |confidence: &str| format!("from memory, check against the standard ({confidence})");
    if one_way || (free(edges.left) && free(edges.right) && !free(edges.top) && !free(edges.base)) {
        let k = Num::new(limits::ANNEX_F_TOP_AND_BASE);
        given!(s, "greatest height over effective thickness, top and base held", &source("H"), k_F = k);
        require!(
            s,
            id,
            "Annex F",
            "height of at most 30 effective thicknesses between floors",
            h <= k_F * t_ef
        );
        return Ok(());
    }
    if let Some(support) = limits::support(edges) {
        let clause = "BS 5628-1 36.3";
        lookup!(
            s,
            clause,
            "greatest area over the square of the effective thickness",
            k_A = limits::area_over_t_ef_squared(support),
            Num::new(1.0)
        );
        given!(s, "greatest side over effective thickness", clause, k_S = Num::new(limits::SIDE));
        calc!(s, "geometry", "area of the panel", A = h * l);
        require!(s, id, clause, "area, in place of Annex F", A <= k_A * t_ef * t_ef);
        require!(s, id, clause, "height within the limit", h <= k_S * t_ef);
        require!(s, id, clause, "length within the limit", l <= k_S * t_ef);
        return Ok(());
    }
    if free(edges.top) && !free(edges.base) {
        let k = Num::new(FREE_STANDING);
        given!(s, "greatest height over effective thickness, held at the base alone", &source("M"), k_F = k);
        require!(
            s,
            id,
            "BS 5628-1 36.3",
            "height of at most 12 effective thicknesses of a wall held at its base alone",
            h <= k_F * t_ef
        );
        return Ok(());
    }
    given!(s, "greatest side over effective thickness", "BS 5628-1 36.3", k_S = Num::new(limits::SIDE));
    require!(s, id, "BS 5628-1 36.3", "length within the limit", l <= k_S * t_ef);
    Ok(())
}

#[cfg(test)]
mod tests {
    use super::*;
    use Edge::{Continuous as C, Free as F, Simple as S};

    /// Source: the coefficients 1500, 1350, 2250, 2025, 50 as printed in IStructE, Manual for the design
    /// of plain masonry in building structures, 2nd ed., 2005, and C. Arya, Design of Structural
    /// Elements, Fig. 5.26; the row for t_ef 156 mm is by hand: 36.504, 32.8536, 54.756, 49.2804 m², 7.8 m.
    #[test]
    fn the_areas_of_a_156_mm_wall() {
        let e = |top, base, left, right| Edges::new(top, base, left, right);
        for (edges, area) in [
            (e(F, S, C, C), 36.504e6),
            (e(F, S, C, S), 32.8536e6),
            (e(S, C, C, C), 54.756e6),
            (e(S, S, C, C), 49.2804e6),
        ] {
            let at = |area: f64| {
                let mut s = Sheet::recorder();
                given!(s, "", "", h = Length::new(7500.0));
                given!(s, "", "", l = Length::new(area / 7500.0));
                given!(s, "", "", t_ef = Length::new(156.0));
                let result = limits(&mut s, "size", edges, false, h, l, t_ef);
                assert!(s.faults.is_empty(), "{:?}", s.faults);
                result
            };
            assert!(at(area - 10.0).is_ok(), "{edges:?}");
            assert!(at(area + 10.0).is_err(), "{edges:?}");
        }
        let side = |l: f64| {
            let (h, t) = (Length::new(2000.0), Length::new(156.0));
            limits(&mut Sheet::silent(), "size", e(S, S, S, S), false, h, Length::new(l), t)
        };
        assert!(side(7800.0).is_ok() && side(7800.1).is_err());
    }

    /// Annex F, 30 t between floors: 102.5 mm reaches 3075 mm. From memory, check against the standard.
    #[test]
    fn thirty_thicknesses_between_floors() {
        let floors = Edges::new(S, S, F, F);
        let at = |h: f64| {
            let (h, t) = (Length::new(h), Length::new(102.5));
            limits(&mut Sheet::silent(), "size", floors, false, h, Length::new(9000.0), t)
        };
        assert!(at(3075.0).is_ok() && at(3075.1).is_err());
    }
}
