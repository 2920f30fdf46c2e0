//! What each leaf resists per unit width: the same before and after.

use super::model::{PanelLeaf, PanelModel};
use crate::quantity::functions::max;
use crate::quantity::{Area, Force, Length, LineLoad, Num, Stress, Weight};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::standards::en1996::{lateral::strength as clause, slenderness};
use crate::trace::Sheet;
use crate::{calc, given};

/// Design strengths and resistances of one leaf.
#[derive(Clone, Copy, Debug)]
pub struct Strength {
    /// Actual thickness.
    pub t: Length,
    /// Design compressive strength.
    pub f_d: Stress,
    /// Vertical stress that helps, not capped.
    pub sigma_v: Stress,
    /// The same, at most 0.2 f_d.
    pub sigma_d: Stress,
    /// Stress of the dead load on top of the leaf that helps, not capped.
    pub sigma_top: Stress,
    /// Own weight that helps: stress per height above the joint.
    pub sigma_own: Weight,
    /// Design strength parallel to the bed joints, without the help of dead load.
    pub f_xd1: Stress,
    /// Apparent design strength parallel to the bed joints.
    pub f_xd1_app: Stress,
    /// Section modulus per unit width.
    pub Z: Area,
    /// Resistance per unit length, parallel.
    pub M_Rd1: Force,
    /// Across the bed joints, where there is such a strength: resistance per unit height and orthogonal ratio.
    pub across: Option<(Force, Num)>,
}

/// Strengths of leaf `i`, written on the sheet.
pub fn of_leaf(s: &mut Sheet, m: &PanelModel, annex: &Annex, i: usize) -> Strength {
    let leaf = &m.leaves[i];
    let materials = "materials sheet";
    given!(s, "actual thickness", "job file", t = leaf.t);
    given!(s, "clear height", "job file", h = m.h);
    given!(s, "characteristic compressive strength", materials, f_k = leaf.masonry.f_k);
    let sources = (leaf.masonry.gamma_c_source.as_str(), leaf.masonry.gamma_f_source.as_str());
    given!(s, "material factor, compression", sources.0, gamma_Mc = leaf.masonry.gamma_c);
    given!(s, "material factor, flexure", sources.1, gamma_Mf = leaf.masonry.gamma_f);
    calc!(s, "2.4.1", "design compressive strength", f_d = f_k / gamma_Mc);
    given!(s, "helping factor", "basis of this job", gamma_h = Num::new(m.helping));
    let G_a = helps(s, leaf, annex, gamma_h);
    given!(s, "weight of the masonry", "materials", rho_m = leaf.masonry.density);
    let pre = clause::precompression(s, gamma_h, G_a, rho_m, t, h, f_d);
    let sigma_d = pre.sigma_d;
    given!(s, "flexural strength, failure parallel to the bed joints", materials, f_xk1 = leaf.masonry.f_xk1);
    let parallel = clause::parallel(s, t, f_xk1, gamma_Mf, sigma_d);
    let (f_xd1_app, Z) = (parallel.f_xd1_app, parallel.Z);
    let across = match leaf.masonry.f_xk2 {
        Some(strength) => {
            given!(s, "flexural strength, failure across the bed joints", materials, f_xk2 = strength);
            let across = clause::across(s, f_xk2, gamma_Mf, Z);
            let f_xd2 = across.f_xd2;
            (f_xd2 > Stress::ZERO).then(|| (across.M_Rd2, clause::orthogonal_ratio(s, f_xd1_app, f_xd2)))
        }
        None => {
            s.note("No flexural strength across the bed joints is taken: the masonry states none.");
            None
        }
    };
    Strength {
        t,
        f_d,
        sigma_v: pre.sigma_v,
        sigma_d,
        sigma_top: gamma_h * G_a / t,
        sigma_own: gamma_h * rho_m,
        f_xd1: parallel.f_xd1,
        f_xd1_app,
        Z,
        M_Rd1: parallel.M_Rd1,
        across,
    }
}

/// Dead load on top of a leaf that can help; the helping factor `gamma_h` stands on the sheet.
pub fn helps(s: &mut Sheet, leaf: &PanelLeaf, annex: &Annex, gamma_h: Num) -> LineLoad {
    let from = if leaf.loaded { "loads" } else { "this leaf carries no floor" };
    if leaf.U_above == LineLoad::ZERO {
        given!(s, "dead load on top of the leaf", from, G_a = leaf.G_above);
        return G_a;
    }
    given!(s, "dead load on top of the leaf, all of it", from, G_t = leaf.G_above);
    given!(s, "roof uplift on it", from, U_a = leaf.U_above);
    let clause = Combination::Helping.clause();
    let factor = Combination::Helping.factors(annex, gamma_h.base()).gamma_U;
    given!(s, "factor on uplift where dead load helps", clause, gamma_u = Num::new(factor));
    let nil = LineLoad::ZERO;
    given!(s, "least", "no load", G_0 = nil);
    calc!(
        s,
        "EN 1990 6.4.3.2",
        "dead load less the uplift over the helping factor",
        G_a = max(G_t - gamma_u / gamma_h * U_a, G_0)
    );
    G_a
}

/// Effective thickness, for the size limits alone.
pub fn effective_thickness(s: &mut Sheet, m: &PanelModel, annex: &Annex) -> Length {
    if m.leaves.len() == 1 {
        given!(s, "actual thickness", "job file", t = m.leaves[0].t);
        calc!(s, "5.5.1.3(1)", "effective thickness", t_ef = t);
        return t_ef;
    }
    let i = m.loaded();
    let (loaded, other) = (m.leaves[i].t, m.leaves[1 - i].t);
    let other = if other > loaded { loaded } else { other };
    given!(s, "other leaf, no thicker", "job file", t_1 = other);
    given!(s, "loaded leaf", "job file", t_2 = loaded);
    given!(s, "relative stiffness factor, UK", "UK NA to 5.5.1.3(3)", k_tef = Num::new(annex.k_tef));
    slenderness::effective_thickness_cavity(s, k_tef, t_1, t_2)
}
