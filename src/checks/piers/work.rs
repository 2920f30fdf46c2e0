//! One pier in one combination: head and foot. What stands at mid-height is in [`super::middle`].

use super::model::PierModel;
use crate::checks::returns::actions::{self, Case, Direction};
use crate::checks::returns::in_plane::compressive_strength;
use crate::checks::returns::model::At;
use crate::checks::returns::vertical::{self, Slender};
use crate::quantity::functions::{abs, max};
use crate::quantity::{Force, Length, Moment, Num, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::standards::en1996::reduction;
use crate::trace::{Outside, Sheet};
use crate::{calc, given, verify};

/// Where loads come from.
pub const LED: &str = "load take-down";

/// What does not depend on the combination.
#[derive(Clone, Copy, Debug)]
pub struct Ready {
    /// Design compressive strength.
    pub f_d: Stress,
    /// Effective height and thickness, initial eccentricity.
    pub slender: Slender,
}

/// Geometry, strength and slenderness.
///
/// # Errors
/// [`Outside`] below the least plan area and beyond the limit of slenderness.
pub fn prepare(s: &mut Sheet, p: &PierModel, annex: &Annex) -> Result<Ready, Outside> {
    let m = &p.m;
    given!(s, "length", "plan", l = m.l);
    given!(s, "actual thickness of the loaded leaf", "job file", t = m.t);
    given!(s, "clear height", "job file", h = m.h);
    let source = format!("materials sheet, {}", m.masonry.name);
    given!(s, "characteristic compressive strength", &source, f_k = m.masonry.f_k);
    let _ = (l, t, h, f_k);
    let f_d = compressive_strength(s, m, "pier-area")?;
    let slender = vertical::slenderness(s, m, annex, "pier-slenderness")?;
    Ok(Ready { f_d, slender })
}

/// Sections that are looked at, from the head down: under a beam mid-height alone, for head and foot stand
/// on the whole pier.
pub const fn sections(p: &PierModel) -> &'static [At] {
    if p.under.is_some() { &[At::Middle] } else { &[At::Head, At::Middle, At::Foot] }
}

/// Factors of a combination, on the sheet: dead, imposed, roof uplift.
pub fn factors(s: &mut Sheet, p: &PierModel, annex: &Annex, c: Combination) -> (Num, Num, Num) {
    let case = Case { combination: c, direction: Direction::ToFree };
    let (gamma_G, gamma_Q, _) = actions::factors(s, case, annex, p.m.helping);
    let gamma_U = Num::new(c.factors(annex, p.m.helping).gamma_U);
    if lifted(p) {
        given!(s, "factor on roof uplift", c.clause(), gamma_U);
    }
    (gamma_G, gamma_Q, gamma_U)
}

/// Whether the roof lifts at its head.
pub fn lifted(p: &PierModel) -> bool {
    p.m.at_head.U > Force::ZERO
}

/// The moment of floors and beams across the wall at its head. The factors stand on the sheet.
///
/// One side: at one third of the bearing, its depth the thickness of the leaf; both sides: each on half of it.
/// BS 5628-1 clause 31, from memory (M).
pub fn moment_at_head(s: &mut Sheet, p: &PierModel, (gamma_G, gamma_Q, gamma_U): (Num, Num, Num)) -> Moment {
    let t = p.m.t;
    if !p.from_aside() {
        given!(s, "moment across at the head", "nothing bears from one side", T_Ed = Moment::ZERO);
        return T_Ed;
    }
    let source = "BS 5628-1 clause 31, from memory (M)";
    let e_b = if p.both_sides() {
        calc!(
            s,
            "BS 5628-1 clause 31, from memory (M)",
            "lever of a floor, borne from both sides",
            e_b = t / 3.0
        );
        e_b
    } else {
        calc!(
            s,
            "BS 5628-1 clause 31, from memory (M)",
            "lever of a floor, borne from one side",
            e_b = t / 6.0
        );
        e_b
    };
    let [one, two] = p.sides;
    let words = "take-down, floors and beam ends";
    given!(s, "dead load from the lower side of the plan", words, G_1 = one.G);
    given!(s, "from the upper side", words, G_2 = two.G);
    given!(s, "imposed load from the lower side of the plan", words, Q_1 = one.Q);
    given!(s, "from the upper side", words, Q_2 = two.Q);
    if lifted(p) {
        given!(s, "roof uplift from the lower side of the plan", words, U_1 = one.U);
        given!(s, "from the upper side", words, U_2 = two.U);
        calc!(
            s,
            source,
            "moment across at the head",
            T_Ed = abs(gamma_G * (G_2 - G_1) + gamma_Q * (Q_2 - Q_1) - gamma_U * (U_2 - U_1)) * e_b
        );
        T_Ed
    } else {
        calc!(
            s,
            source,
            "moment across at the head",
            T_Ed = abs(gamma_G * (G_2 - G_1) + gamma_Q * (Q_2 - Q_1)) * e_b
        );
        T_Ed
    }
}

/// N at a section, and the length of the block centred on it.
pub struct Pressed {
    /// Vertical force.
    pub N_Ed: Force,
    /// Length that it presses.
    pub l_c: Length,
}

/// Vertical force at a section and the length of the block centred on it along the wall. `l` and the factors
/// stand on the sheet.
pub fn pressed(
    s: &mut Sheet,
    p: &PierModel,
    (gamma_G, gamma_Q, gamma_U): (Num, Num, Num),
    at: At,
) -> Pressed {
    let l = p.m.l;
    let v = p.m.at_head;
    given!(s, "dead load at the head", LED, G_h = v.G);
    given!(s, "imposed load at the head", LED, Q_h = v.Q);
    given!(s, "own weight of the loaded leaf", LED, G_w = p.m.own);
    given!(s, "wall over the openings beside it", LED, G_o = p.over);
    given!(s, "part of the own weight that stands above", "geometry", k_G = Num::new(at.share()));
    let below = if at == At::Head { 0.0 } else { 1.0 };
    given!(s, "1 below the openings' heads", "geometry", k_H = Num::new(below));
    let N_Ed = if lifted(p) {
        given!(s, "roof uplift at the head", LED, U_h = v.U);
        calc!(
            s,
            "EN 1990 6.4.3.2",
            "vertical force",
            N_Ed = gamma_G * (G_h + k_H * G_o + k_G * G_w) + gamma_Q * Q_h - gamma_U * U_h
        );
        N_Ed
    } else {
        calc!(
            s,
            "EN 1990 6.4.3.2",
            "vertical force",
            N_Ed = gamma_G * (G_h + k_H * G_o + k_G * G_w) + gamma_Q * Q_h
        );
        N_Ed
    };
    if N_Ed <= Force::ZERO {
        s.note("Nothing presses the section: the roof lifts more than stands there.");
        return Pressed { N_Ed, l_c: Length::ZERO };
    }
    if p.under.is_some() {
        calc!(s, "6.1.3(5)", "the stretch, evenly pressed as the clause takes it", l_c = 1.0 * l);
        return Pressed { N_Ed, l_c };
    }
    Pressed { N_Ed, l_c: block(s, p, (gamma_G, gamma_Q, gamma_U), at, N_Ed) }
}

/// Length of the block centred on N along the wall. `l`, `N_Ed` and the factors stand on the sheet.
fn block(
    s: &mut Sheet,
    p: &PierModel,
    (gamma_G, gamma_Q, gamma_U): (Num, Num, Num),
    at: At,
    N_Ed: Force,
) -> Length {
    let l = p.m.l;
    let along = if at == At::Head { p.m.at_head } else { p.at_foot };
    let moments = "take-down, about mid-length";
    given!(s, "first moment of the dead load along", moments, S_G = along.S_G);
    given!(s, "first moment of the imposed load along", moments, S_Q = along.S_Q);
    let M_N = if lifted(p) {
        given!(s, "first moment of the uplift along", moments, S_U = along.S_U);
        calc!(s, "statics", "moment along", M_N = gamma_G * S_G + gamma_Q * S_Q - gamma_U * S_U);
        M_N
    } else {
        calc!(s, "statics", "moment along", M_N = gamma_G * S_G + gamma_Q * S_Q);
        M_N
    };
    given!(s, "least length pressed", "geometry", l_0 = Length::ZERO);
    calc!(
        s,
        "first principles, as at the toe of a return",
        "length of the block centred on N",
        l_c = max(l - 2.0 * abs(M_N) / N_Ed, l_0)
    );
    l_c
}

/// Head or foot: N against Phi t l_c f_d.
pub fn at_end(s: &mut Sheet, p: &PierModel, annex: &Annex, ready: Ready, c: Combination, at: At) {
    let (t, e_init, f_d) = (p.m.t, ready.slender.e_init, ready.f_d);
    let gammas = factors(s, p, annex, c);
    let Pressed { N_Ed, l_c } = pressed(s, p, gammas, at);
    if N_Ed <= Force::ZERO {
        return;
    }
    let (phi, id, words) = if at == At::Head {
        let T_Ed = moment_at_head(s, p, gammas);
        calc!(s, "6.1.2.2(1)", "eccentricity of the loads at the head", e_h = T_Ed / N_Ed);
        (reduction::at_head(s, t, e_init, e_h), "pier-head", "vertical resistance at the head")
    } else {
        (reduction::at_foot(s, t, e_init), "pier-foot", "vertical resistance at the foot")
    };
    let above = "above";
    given!(s, "reduction across the wall at this height", above, Phi_i = phi);
    calc!(s, "6.1.2.1(2) eq. 6.2", "vertical resistance", N_Rd = Phi_i * t * l_c * f_d);
    verify!(s, id, "6.1.2.1(1) eq. 6.1", words, N_Ed <= N_Rd);
}
