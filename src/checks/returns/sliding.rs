//! Shear in plane, sliding at the dpc, and the vertical shear at a bonded junction.

use super::actions::Actions;
use super::in_plane::Stressed;
use super::model::{At, Flange, Model};
use crate::quantity::functions::abs;
use crate::quantity::{Force, Length, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1996::shear as clause;
use crate::trace::Sheet;
use crate::{calc, given, verify};

/// Shear on the compressed length: 6.2 with 3.6.2. At a damp-proof course f_vk0 is nil unless tested.
pub fn shear(s: &mut Sheet, m: &Model, annex: &Annex, a: &Actions, st: &Stressed, id: &str) {
    let (t, V_Ed, l_c) = (m.t, a.V_Ed, st.l_c);
    let f_b = m.masonry.f_b;
    let words = if a.at == At::Head { "shear in plane at the head" } else { "shear in plane at the foot" };
    given!(s, "material factor, shear", m.masonry.gamma_v_source.as_str(), gamma_Mv = m.masonry.gamma_v);
    if l_c <= Length::ZERO {
        given!(s, "shear resistance, nothing compressed", "6.2(1)", V_Rd = Force::ZERO);
        verify!(s, id, "6.2(1) eq. 6.12", words, V_Ed <= V_Rd);
        return;
    }
    let f_vk0 = if m.dpc && a.at == At::Foot {
        given!(
            s,
            "initial shear strength at a damp-proof course, not tested",
            "3.6.2, method",
            f_vk0 = Stress::ZERO
        );
        f_vk0
    } else {
        given!(s, "initial shear strength", "materials sheet", f_vk0 = m.masonry.f_vk0);
        f_vk0
    };
    let sigma_d = if a.flange.is_some() {
        given!(s, "vertical force in the return itself", "from the stress block", N_web = st.N_web);
        calc!(s, "3.6.2(3)", "compressive stress over the compressed length", sigma_d = N_web / (t * l_c));
        sigma_d
    } else {
        let N_Ed = st.N_web;
        calc!(s, "3.6.2(3)", "compressive stress over the compressed length", sigma_d = N_Ed / (t * l_c));
        sigma_d
    };
    let f_vd = clause::design_strength(s, annex, m.masonry.perpends_filled, f_vk0, sigma_d, f_b, gamma_Mv);
    calc!(s, "6.2(2) eq. 6.13", "shear resistance", V_Rd = f_vd * t * l_c);
    verify!(s, id, "6.2(1) eq. 6.12", words, V_Ed <= V_Rd);
}

/// Sliding at the damp-proof course: V <= mu N / gamma_M. What a flange brings is left out of N: its
/// friction would have to reach the return as tension across the junction.
pub fn sliding(s: &mut Sheet, m: &Model, a: &Actions, mu_source: &str, id: &str) {
    let (N_Ed, V_Ed) = (a.N_Ed, a.V_Ed);
    given!(s, "material factor, shear", m.masonry.gamma_v_source.as_str(), gamma_Mv = m.masonry.gamma_v);
    given!(s, "coefficient of friction at the dpc", mu_source, mu = m.mu);
    if let Some(f) = a.flange {
        let (gamma_G, G_f) = (a.gamma_G, f.G_f);
        // Uplift on the flange stays taken off: on the safe side.
        calc!(s, "statics", "vertical force without the flange's load", N_s = N_Ed - gamma_G * G_f);
        calc!(s, "first principles", "sliding resistance", V_Rds = mu * N_s / gamma_Mv);
        verify!(s, id, "first principles", "sliding at the dpc", V_Ed <= V_Rds);
    } else {
        calc!(s, "first principles", "sliding resistance", V_Rds = mu * N_Ed / gamma_Mv);
        verify!(s, id, "first principles", "sliding at the dpc", V_Ed <= V_Rds);
    }
}

/// Vertical shear between return and flange: what the flange takes of N, less what it brings, over the
/// height. 3.6.2(7): f_vk0 may be used for a bonded junction; from memory, check against the standard.
pub fn junction(s: &mut Sheet, m: &Model, f: Flange, a: &Actions, st: &Stressed, id: &str) {
    let (t, h, gamma_G) = (m.t, m.h, a.gamma_G);
    given!(s, "vertical force in the flange", "from the stress block", N_fl = st.N_flange);
    given!(s, "dead load that the flange brings, characteristic", "load table", G_f = f.G_f);
    let N_f = if f.U_f > Force::ZERO {
        given!(s, "factor on roof uplift", "above", gamma_U = a.gamma_U);
        given!(s, "roof uplift on the flange, characteristic", "above", U_f = f.U_f);
        calc!(s, "EN 1990 6.4.3.2", "in this case", N_f = gamma_G * G_f - gamma_U * U_f);
        N_f
    } else {
        calc!(s, "EN 1990 6.4.3.2", "in this case", N_f = gamma_G * G_f);
        N_f
    };
    calc!(s, "statics", "vertical shear at the junction", V_j = abs(N_fl - N_f));
    given!(s, "initial shear strength", "materials sheet", f_vk0 = m.masonry.f_vk0);
    given!(s, "material factor, shear", m.masonry.gamma_v_source.as_str(), gamma_Mv = m.masonry.gamma_v);
    calc!(
        s,
        "3.6.2(7), 6.2",
        "resistance of the bonded junction over the height",
        V_Rdj = f_vk0 / gamma_Mv * t * h
    );
    verify!(s, id, "3.6.2(7), 6.2", "vertical shear at the junction", V_j <= V_Rdj);
}
