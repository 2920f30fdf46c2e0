//! Flexure in plane with precompression, where no damp-proof course crosses the section.

use super::actions::Actions;
use super::in_plane::{self, Stressed};
use super::model::Model;
use crate::quantity::functions::{min, sq};
use crate::quantity::{Moment, Num, Stress, print};
use crate::trace::Sheet;
use crate::{calc, given, verify};

/// Resistance (f_xk1/gamma_M + sigma_h) Z. In-plane use of f_xk1 has no clause of its own, and the
/// sheet says so. `f_d` stands on the sheet.
fn resistance(s: &mut Sheet, m: &Model, a: &Actions, f_d: Stress) -> Moment {
    let (l, t) = (m.l, m.t);
    s.note(
        "The use of the flexural strength in plane has no clause of its own: 6.3.1 is applied by analogy.",
    );
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
        "6.3.1(4), by analogy",
        "stress from dead load that helps, at most a fifth of the strength",
        sigma_h = min(gamma_h * G / (t * l), 0.2 * f_d)
    );
    calc!(s, "geometry", "section modulus", Z = t * sq(l) / 6.0);
    calc!(s, "6.3.1 eq. 6.16, by analogy", "resistance in flexure", M_Rd = (f_xk1 / gamma_Mf + sigma_h) * Z);
    M_Rd
}

/// Flexure at a bonded foot: information, the checks without tension decide.
pub fn at_bonded_foot(s: &mut Sheet, m: &Model, a: &Actions, f_d: Stress, id: &str) {
    let M_Rd = resistance(s, m, a, f_d);
    s.rule(
        id,
        "6.3.1, by analogy",
        "flexure at a bonded foot, for information: the checks without tension decide",
        format!("{} against {}", print::show("M_Ed", a.M_Ed.dynamic()), print::show("M_Rd", M_Rd.dynamic())),
        a.M_Ed <= M_Rd,
    );
}

/// Mid-height of a return whose head is held. Two routes, each enough by itself: the section without
/// tension carries N in a block centred on it, or the section is uncracked with f_xk1. The route of
/// the lower use decides and is named; the other is not worked where it is not needed.
pub fn at_mid_height(s: &mut Sheet, m: &Model, a: &Actions, st: &Stressed, Phi: Num, f_d: Stress, id: &str) {
    let by_block = {
        let mut silent = Sheet::silent();
        in_plane::toe(&mut silent, a, st, Phi, f_d, id);
        silent.verdicts[0].ratio
    };
    let by_flexure = {
        let M_Rd = resistance(&mut Sheet::silent(), m, a, f_d);
        if M_Rd > Moment::ZERO { (a.M_Ed / M_Rd).base() } else { f64::INFINITY }
    };
    if by_block <= by_flexure {
        in_plane::toe(s, a, st, Phi, f_d, id);
    } else {
        let M_Ed = a.M_Ed;
        let M_Rd = resistance(s, m, a, f_d);
        verify!(s, id, "6.3.1, by analogy", "flexure at mid-height", M_Ed <= M_Rd);
    }
}
