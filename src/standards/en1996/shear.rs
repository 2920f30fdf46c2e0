//! Shear: 3.6.2 and 6.2.

use crate::quantity::functions::{MM, min};
use crate::quantity::{Num, Stress};
use crate::standards::annex::Annex;
use crate::trace::Sheet;
use crate::{calc, decide, given};

/// Design shear strength f_vd from the initial strength `f_vk0` and the compressive stress `sigma_d`.
///
/// 3.6.2(3) eq. 3.5, perpends filled: `f_vk = f_vk0 + 0.4 sigma_d`, at most `0.065 f_b`, with f_b the
/// normalised unit strength. 3.6.2(4) eq. 3.6, perpends not filled: `0.5 f_vk0 + 0.4 sigma_d`, at most
/// `0.045 f_b`. From memory, check against the standard.
pub fn design_strength(
    s: &mut Sheet,
    annex: &Annex,
    perpends_filled: bool,
    f_vk0: Stress,
    sigma_d: Stress,
    f_b: Stress,
    gamma_Mv: Num,
) -> Stress {
    if perpends_filled {
        given!(
            s,
            "limit of the shear strength over the unit strength",
            "3.6.2(3), UK NA",
            k_v = Num::new(annex.shear_limit)
        );
        calc!(
            s,
            "3.6.2(3) eq. 3.5",
            "characteristic shear strength",
            f_vk = min(f_vk0 + 0.4 * sigma_d, k_v * f_b)
        );
        calc!(s, "2.4.3(1)", "design shear strength", f_vd = f_vk / gamma_Mv);
        f_vd
    } else {
        given!(
            s,
            "limit of the shear strength over the unit strength",
            "3.6.2(4), UK NA",
            k_v = Num::new(annex.shear_limit_unfilled)
        );
        calc!(
            s,
            "3.6.2(4) eq. 3.6",
            "characteristic shear strength, perpends not filled",
            f_vk = min(0.5 * f_vk0 + 0.4 * sigma_d, k_v * f_b)
        );
        calc!(s, "2.4.3(1)", "design shear strength", f_vd = f_vk / gamma_Mv);
        f_vd
    }
}

/// Compressed length of a rectangular section, l_c = l for e <= l/6, else 3(l/2 - e), never below zero.
///
/// 6.2(1)–(3): linear stress, the part in tension left out.
pub fn compressed_length(
    s: &mut Sheet,
    l: crate::quantity::Length,
    e: crate::quantity::Length,
) -> crate::quantity::Length {
    let whole = decide!(
        s,
        "6.2(2)",
        "the whole length is compressed",
        "the part in tension is left out",
        e <= l / 6.0
    );
    if whole {
        calc!(s, "6.2(2)", "compressed length", l_c = l);
        return l_c;
    }
    if e < l / 2.0 {
        calc!(s, "6.2(2)", "compressed length", l_c = 3.0 * (l / 2.0 - e));
        return l_c;
    }
    decide!(s, "6.2(2)", "", "no length stays compressed", e < l / 2.0);
    calc!(s, "6.2(2)", "compressed length", l_c = 0.0 * MM);
    l_c
}
