//! Effective height and thickness, slenderness: 5.5.1.2 to 5.5.1.4.

use crate::quantity::functions::{cbrt, cube, max, sq};
use crate::quantity::{Length, Num};
use crate::trace::Sheet;
use crate::{calc, decide, given};

/// How many vertical edges of a wall are stiffened.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Stiffened {
    /// None.
    None,
    /// One (rho_3).
    One,
    /// Both (rho_4).
    Two,
}

/// Effective height h_ef = rho_n h. `h` clear height, `l` length of the wall, `t` its thickness and
/// `rho_2` must stand on the sheet.
///
/// 5.5.1.2(11): rho_3 eq. 5.6 and 5.7, rho_4 eq. 5.8 and 5.9; 5.5.1.2(8): no benefit where
/// `l >= 15 t` (one edge) or `l >= 30 t` (two). From memory, check against the standard.
pub fn effective_height(
    s: &mut Sheet,
    stiffened: Stiffened,
    h: Length,
    l: Length,
    t: Length,
    rho_2: Num,
) -> Length {
    let counts = match stiffened {
        Stiffened::None => false,
        Stiffened::One => decide!(
            s,
            "5.5.1.2(8)",
            "the stiffened vertical edge counts",
            "too long for the stiffened edge to count",
            l < 15.0 * t
        ),
        Stiffened::Two => decide!(
            s,
            "5.5.1.2(8)",
            "the stiffened vertical edges count",
            "too long for the stiffened edges to count",
            l < 30.0 * t
        ),
    };
    if !counts {
        calc!(s, "5.5.1.2(10)", "effective height", h_ef = rho_2 * h);
        return h_ef;
    }
    if stiffened == Stiffened::One {
        let low = decide!(s, "5.5.1.2(11)", "eq. 5.6", "eq. 5.7", h <= 3.5 * l);
        if low {
            calc!(
                s,
                "5.5.1.2(11) eq. 5.6",
                "one vertical edge stiffened",
                rho_3 = rho_2 / (1.0 + sq(rho_2 * h / (3.0 * l)))
            );
            calc!(s, "5.5.1.2(10)", "effective height", h_ef = rho_3 * h);
            h_ef
        } else {
            given!(s, "least value of the factor", "5.5.1.2(11) eq. 5.7", rho_min = Num::new(0.3));
            calc!(s, "5.5.1.2(11) eq. 5.7", "one vertical edge stiffened", rho_3 = max(1.5 * l / h, rho_min));
            calc!(s, "5.5.1.2(10)", "effective height", h_ef = rho_3 * h);
            h_ef
        }
    } else {
        let low = decide!(s, "5.5.1.2(11)", "eq. 5.8", "eq. 5.9", h <= 1.15 * l);
        if low {
            calc!(
                s,
                "5.5.1.2(11) eq. 5.8",
                "two vertical edges stiffened",
                rho_4 = rho_2 / (1.0 + sq(rho_2 * h / l))
            );
            calc!(s, "5.5.1.2(10)", "effective height", h_ef = rho_4 * h);
            h_ef
        } else {
            calc!(s, "5.5.1.2(11) eq. 5.9", "two vertical edges stiffened", rho_4 = 0.5 * l / h);
            calc!(s, "5.5.1.2(10)", "effective height", h_ef = rho_4 * h);
            h_ef
        }
    }
}

/// Effective thickness of a cavity wall, `cbrt(k_tef t_1^3 + t_2^3)` with t_2 the loaded leaf and t_1
/// the other, taken no thicker than t_2. For slenderness and panel size only.
///
/// 5.5.1.3(3) eq. 5.11, k_tef of the UK National Annex; from memory, check against the standard.
pub fn effective_thickness_cavity(s: &mut Sheet, k_tef: Num, t_1: Length, t_2: Length) -> Length {
    calc!(s, "5.5.1.3(3) eq. 5.11", "effective thickness", t_ef = cbrt(k_tef * cube(t_1) + cube(t_2)));
    t_ef
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Two 100 mm leaves have an effective thickness of 126 mm: common practice, no published source.
    #[test]
    fn two_hundred_millimetre_leaves() {
        let mut s = Sheet::silent();
        let t = Length::new(100.0);
        let t_ef = effective_thickness_cavity(&mut s, Num::new(1.0), t, t);
        assert_eq!(format!("{:.0}", t_ef.base()), "126");
    }

    /// rho_3 passes from eq. 5.6 to eq. 5.7 at h = 3.5 l without a jump of more than a few hundredths.
    #[test]
    fn stiffened_edges_never_raise_the_effective_height() {
        let mut s = Sheet::silent();
        let t = Length::new(100.0);
        for l in [200.0, 400.0, 640.0, 900.0, 1200.0] {
            let h = Length::new(2400.0);
            let at = |s: &mut Sheet, n| effective_height(s, n, h, Length::new(l), t, Num::new(1.0)).base();
            let (none, one, two) =
                (at(&mut s, Stiffened::None), at(&mut s, Stiffened::One), at(&mut s, Stiffened::Two));
            assert!(two <= one && one <= none, "{l}: {two} {one} {none}");
        }
    }
}
