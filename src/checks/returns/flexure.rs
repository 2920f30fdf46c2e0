//! Flexure in plane with precompression, where no damp-proof course crosses the section.

use super::actions::Actions;
use super::model::{At, Model};
use crate::quantity::functions::{min, sq};
use crate::quantity::{Num, Stress};
use crate::trace::Sheet;
use crate::{calc, given, verify};

/// M <= (f_xk1/gamma_M + sigma_d) Z. In-plane use of f_xk1 has no clause of its own, and the sheet
/// says so. `f_d` stands on the sheet. At the foot the result is information and gives no verdict.
pub fn flexure(s: &mut Sheet, m: &Model, a: &Actions, f_d: Stress, id: &str) {
    let (l, t, M_Ed) = (m.l, m.t, a.M_Ed);
    s.note("The in-plane use of f_xk1 has no clause of its own: 6.3.4 and 5.5.5(8) are applied by analogy.");
    given!(
        s,
        "flexural strength, failure parallel to the bed joints",
        "materials sheet",
        f_xk1 = m.masonry.f_xk1
    );
    given!(s, "material factor, flexure", m.masonry.gamma_f_source.as_str(), gamma_Mf = m.masonry.gamma_f);
    given!(s, "dead load at the section", "load table", G = m.vertical(a.at).G);
    given!(s, "helping factor", "basis of this job", gamma_h = Num::new(m.helping));
    calc!(
        s,
        "6.3.4, by analogy",
        "stress from dead load that helps, at most 0.2 f_d",
        sigma_h = min(gamma_h * G / (t * l), 0.2 * f_d)
    );
    calc!(s, "geometry", "section modulus", Z = t * sq(l) / 6.0);
    calc!(s, "6.3.1 eq. 6.16, by analogy", "resistance in flexure", M_Rd = (f_xk1 / gamma_Mf + sigma_h) * Z);
    if a.at == At::Foot {
        let held = M_Ed <= M_Rd;
        s.rule(
            id,
            "6.3.1, by analogy",
            "flexure at a bonded foot, for information: the checks without tension decide",
            format!(
                "{} against {}",
                crate::quantity::print::show("M_Ed", M_Ed.dynamic()),
                crate::quantity::print::show("M_Rd", M_Rd.dynamic())
            ),
            held,
        );
    } else {
        verify!(s, id, "6.3.1, by analogy", "flexure at mid-height", M_Ed <= M_Rd);
    }
}
