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
/// tension carries N in a block centred on it, or the section is uncracked with f_xk1 and its pressed
/// edge does not crush. The route of the lower use decides and is named; the other is not worked where
/// it is not needed.
pub fn at_mid_height(s: &mut Sheet, m: &Model, a: &Actions, st: &Stressed, Phi: Num, f_d: Stress, id: &str) {
    let used = |route: &dyn Fn(&mut Sheet)| {
        let mut silent = Sheet::silent();
        route(&mut silent);
        silent.verdicts.iter().map(|v| v.ratio).fold(0.0, f64::max)
    };
    let by_block = |s: &mut Sheet| in_plane::toe(s, a, st, Phi, f_d, id);
    let by_flexure = |s: &mut Sheet| uncracked(s, m, a, Phi, f_d, id);
    if used(&by_block) <= used(&by_flexure) { by_block(s) } else { by_flexure(s) }
}

/// The uncracked section: what it stretches by 6.3.1, what it presses within the reduced strength.
fn uncracked(s: &mut Sheet, m: &Model, a: &Actions, Phi: Num, f_d: Stress, id: &str) {
    let (M_Ed, N_Ed, l, t) = (a.M_Ed, a.N_Ed, m.l, m.t);
    let M_Rd = resistance(s, m, a, f_d);
    verify!(s, id, "6.3.1, by analogy", "flexure at mid-height", M_Ed <= M_Rd);
    given!(s, "least reduction across the wall: head, middle, foot", "vertical resistance, this sheet", Phi);
    calc!(s, "6.1.2.1(2) with first principles", "strength of the pressed edge", f_dp = Phi * f_d);
    calc!(
        s,
        "first principles",
        "stress at the pressed edge in plane, uncracked",
        sigma_p = N_Ed / (t * l) + 6.0 * M_Ed / (t * sq(l))
    );
    let edge = format!("{id}-edge");
    verify!(s, &edge, "first principles", "pressed edge at mid-height", sigma_p <= f_dp);
}
