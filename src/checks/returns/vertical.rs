//! Vertical resistance across the thickness: slenderness, 6.1.2 at head, middle and foot, Annex G.

use super::actions::{Case, factors};
use super::model::{At, Model};
use crate::quantity::functions::{abs, min};
use crate::quantity::{Force, Length, Moment, Num, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1996::{reduction, slenderness};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, require, verify};

/// What does not depend on the case: effective height and thickness, initial eccentricity.
#[derive(Clone, Copy, Debug)]
pub struct Slender {
    /// Effective height.
    pub h_ef: Length,
    /// Effective thickness.
    pub t_ef: Length,
    /// Initial eccentricity.
    pub e_init: Length,
}

/// Effective height and thickness, and the slenderness check. `h`, `l` and `t` stand on the sheet.
///
/// # Errors
/// [`Outside`] where the head is not held across the wall: 5.5.1.2 has no factor for that.
pub fn slenderness(s: &mut Sheet, m: &Model, annex: &Annex, id: &str) -> Result<Slender, Outside> {
    let (h, l, t) = (m.h, m.l, m.t);
    let Some(rho) = m.rho_2 else {
        return Err(Outside::new(
            id,
            "5.5.1.2",
            "the head is not held across the thickness: no effective height is given for that",
        ));
    };
    given!(s, "factor for the restraint at head and foot", "5.5.1.2(11)(i), (ii)", rho_2 = rho);
    let h_ef = slenderness::effective_height(s, m.stiffened, h, l, t, rho_2);
    let t_ef = match m.t_other {
        None => {
            calc!(s, "5.5.1.3(1)", "effective thickness", t_ef = t);
            t_ef
        }
        Some(other) => {
            given!(s, "other leaf, no thicker", "job file", t_1 = if other > t { t } else { other });
            given!(s, "this leaf", "job file", t_2 = t);
            given!(
                s,
                "relative stiffness factor, UK",
                "UK NA Table NA.1 note",
                k_tef = Num::new(annex.k_tef)
            );
            slenderness::effective_thickness_cavity(s, k_tef, t_1, t_2)
        }
    };
    calc!(s, "5.5.1.4(1)", "slenderness", lambda_h = h_ef / t_ef);
    given!(s, "limit of the slenderness", "5.5.1.4(2)", lambda_max = Num::new(annex.slenderness_limit));
    verify!(s, id, "5.5.1.4(2)", "slenderness", lambda_h <= lambda_max);
    calc!(s, "5.5.1.1(4)", "initial eccentricity", e_init = h_ef / 450.0);
    require!(s, id, "6.1.2.2, Annex G", "slenderness within the limit", lambda_h <= lambda_max);
    Ok(Slender { h_ef, t_ef, e_init })
}

/// Reductions at head, middle and foot in one case.
#[derive(Clone, Copy, Debug)]
pub struct Reductions {
    /// At the head.
    pub head: Num,
    /// In the middle.
    pub middle: Num,
    /// At the foot.
    pub foot: Num,
}

/// Whether all loads at the head stand in the middle of the thickness.
pub fn central(m: &Model) -> bool {
    let v = m.vertical(At::Head);
    v.T_G == Moment::ZERO && v.T_Q == Moment::ZERO || v.G + v.Q <= Force::ZERO
}

impl Reductions {
    /// The least of the three.
    pub fn least_of(self) -> Num {
        self.least(&mut Sheet::silent())
    }

    /// The least of the three, on the sheet.
    pub fn least(self, s: &mut Sheet) -> Num {
        let (Phi_h, Phi_m, Phi_f) = (self.head, self.middle, self.foot);
        calc!(s, "6.1.2.1(2)", "least reduction across the wall", Phi = min(Phi_h, min(Phi_m, Phi_f)));
        Phi
    }
}

/// Phi at head, middle and foot. The eccentricity of the loads falls from its value at the head to
/// nil at the foot; half of it is taken in the middle.
pub fn reductions(s: &mut Sheet, m: &Model, sl: Slender, annex: &Annex, case: Case) -> Reductions {
    let (t, e_init, f_k) = (m.t, sl.e_init, m.masonry.f_k);
    let v = m.vertical(At::Head);
    let e_h = if central(m) {
        given!(
            s,
            "eccentricity of the loads at the head",
            "load table: all loads central",
            e_h = Length::ZERO
        );
        e_h
    } else {
        let (gamma_G, gamma_Q, ..) = factors(s, case, annex, m.helping);
        given!(s, "dead load at the head", "load table", G_h = v.G);
        given!(s, "imposed load at the head", "load table", Q_h = v.Q);
        given!(s, "moment of the dead load across the wall", "load table", T_G = v.T_G);
        given!(s, "moment of the imposed load across the wall", "load table", T_Q = v.T_Q);
        calc!(
            s,
            "6.1.2.2(1)",
            "eccentricity of the loads at the head",
            e_h = abs(gamma_G * T_G + gamma_Q * T_Q) / (gamma_G * G_h + gamma_Q * Q_h)
        );
        e_h
    };
    let head = reduction::at_head(s, t, e_init, e_h);
    let middle = reduction::in_middle(s, annex, t, sl.t_ef, sl.h_ef, e_init, e_h, f_k);
    let foot = reduction::at_foot(s, t, e_init);
    Reductions { head, middle, foot }
}

/// N against Phi t l f_d at one section, evenly pressed along its length.
pub fn resistance(
    s: &mut Sheet,
    m: &Model,
    annex: &Annex,
    case: Case,
    at: At,
    r: Reductions,
    f_d: Stress,
    id: &str,
) {
    let (l, t) = (m.l, m.t);
    let (gamma_G, gamma_Q, ..) = factors(s, case, annex, m.helping);
    let (part, phi, words) = match at {
        At::Head => (0.0, r.head, "vertical resistance at the head"),
        At::Middle => (0.5, r.middle, "vertical resistance in the middle"),
        At::Foot => (1.0, r.foot, "vertical resistance at the foot"),
    };
    given!(s, "dead load at the head", "load table", G_h = m.at_head.G);
    given!(s, "imposed load at the head", "load table", Q_h = m.at_head.Q);
    given!(s, "own weight of the leaf", "above", G_w = m.own);
    given!(s, "part of the own weight that stands above", "geometry", k_G = Num::new(part));
    given!(s, "reduction across the wall at this height", "above", Phi_i = phi);
    calc!(s, "EN 1990 6.4.3.2", "vertical force", N_Ed = gamma_G * (G_h + k_G * G_w) + gamma_Q * Q_h);
    calc!(s, "6.1.2.1(2) eq. 6.2", "vertical resistance", N_Rd = Phi_i * t * l * f_d);
    verify!(s, id, "6.1.2.1(1) eq. 6.1", words, N_Ed <= N_Rd);
}
