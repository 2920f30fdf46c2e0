//! Wind across a pier: what each leaf resists as a panel does, and the moment that the loaded leaf has of it.

use super::bays::Bay;
use super::model::{PierModel, Wind};
use super::work::{self, Ready};
use crate::checks::masonry::Masonry;
use crate::checks::panels::form::{self, Form, LeafOutcome, State};
use crate::checks::panels::sharing;
use crate::checks::panels::strength::Strength;
use crate::checks::returns::vertical;
use crate::quantity::functions::{max, min};
use crate::quantity::{Force, Length, LineLoad, Moment, Num, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::standards::en1996::lateral::{size, span, strength as flexure};
use crate::standards::masonry::Edge;
use crate::trace::Sheet;
use crate::{calc, given};

/// What the wind does to the loaded leaf.
#[derive(Clone, Copy, Debug)]
pub struct Blown {
    /// Moment at mid-height on the whole pier.
    pub M_l: Moment,
    /// What the leaf resists per length in flexure with precompression.
    pub M_r: Force,
}

/// A leaf with what it takes.
struct Leaf {
    strength: Strength,
    out: LeafOutcome,
}

/// Wind on the loaded leaf in one combination; none where it does not press.
pub fn wind(s: &mut Sheet, p: &PierModel, annex: &Annex, ready: Ready, c: Combination) -> Option<Blown> {
    let w = p.wind.as_ref()?;
    let factor = c.factors(annex, p.m.helping).gamma_W;
    if factor <= 0.0 {
        return None;
    }
    let (Bay { l: l_bay, l_w, edges }, h) = (w.bay, p.m.h);
    given!(s, "net pressure on a panel", "wind sheet", q_panel = w.q_panel);
    given!(s, "length of the bay", "plan", l_bay);
    given!(s, "length of wind face, half of an opening beside it", "plan", l_w);
    given!(s, "factor on wind", c.clause(), gamma_W = Num::new(factor));
    calc!(s, "EN 1990 6.4.3.2", "wind on the bay, design", W_Ed = gamma_W * q_panel * l_w / l_bay);
    s.note(format!("The bay is held at floor and ceiling; its vertical edges are {}.", edge_words(edges)));
    let leaves = s.columns(&w.panel.leaf_names(), |s, k| one(s, p, w, annex, ready, W_Ed, k));
    let W_l = share(s, p, &leaves, W_Ed);
    let i = w.panel.loaded();
    let Leaf { strength, out } = &leaves[i];
    given!(s, "pressure on the loaded leaf", "above", W_Ed = W_l);
    given!(s, "resistance per length of the loaded leaf", "above", M_Rd1 = strength.M_Rd1);
    let (M_Ed1, M_r) = match (out.mu, out.alpha_2, strength.across) {
        (Some(ratio), Some(coefficient), Some((across, _))) => {
            given!(s, "orthogonal ratio of the loaded leaf", "above", mu = ratio);
            given!(s, "its bending moment coefficient", "above", alpha_2 = coefficient);
            given!(s, "length of the bay", "above", l = l_bay);
            let M_Ed1 = span::plate(s, mu, alpha_2, W_Ed, l).M_Ed1;
            given!(s, "resistance per height of the loaded leaf", "above", M_Rd2 = across);
            calc!(s, "5.5.5", "resistance per length that goes with the ratio", M_r = min(M_Rd1, M_Rd2));
            (M_Ed1, M_r)
        }
        _ => {
            let M_Ed1 = span::vertical(s, W_Ed, h);
            calc!(s, "6.3.1", "resistance per length", M_r = 1.0 * M_Rd1);
            (M_Ed1, M_r)
        }
    };
    given!(s, "length", "above", l = p.m.l);
    calc!(s, "statics", "moment of the wind at mid-height on the loaded leaf", M_l = M_Ed1 * l);
    Some(Blown { M_l, M_r })
}

fn edge_words(edges: crate::standards::tables::annex_e::Edges) -> &'static str {
    match (edges.left == Edge::Free, edges.right == Edge::Free) {
        (true, true) => "free: it spans between floor and ceiling alone",
        (false, false) => "held by walls that meet it",
        _ => "one free, the other held by a wall that meets it",
    }
}

/// One leaf: its strength, and the pressure that it takes over the bay, both ways where Annex E and its size
/// limits allow it, else between floor and ceiling.
fn one(s: &mut Sheet, p: &PierModel, w: &Wind, annex: &Annex, ready: Ready, W_Ed: Stress, k: usize) -> Leaf {
    let loaded = w.panel.leaves[k].loaded;
    let strength = if loaded { strength_loaded(s, p, annex, ready) } else { strength_other(s, p) };
    given!(s, "length of the bay", "above", l = w.bay.l);
    let state = |form| State {
        m: &w.panel,
        edges: w.bay.edges,
        form,
        l,
        W_Ed,
        phase: "after",
        judged: false,
        beside: false,
    };
    let both_ways = Form::of(w.panel.route, w.bay.edges, "pier-flexure")
        .is_ok_and(|form| form == Form::Plate)
        && limits(p, w, annex)
        && form::leaf(&mut Sheet::silent(), state(Form::Plate), &w.panel.after, &strength).is_ok();
    let form = if both_ways { Form::Plate } else { Form::Vertical };
    let out = form::leaf(s, state(form), &w.panel.after, &strength).unwrap_or_default();
    Leaf { strength, out }
}

/// Whether the bay keeps the size limits of a panel, on the effective thickness.
fn limits(p: &PierModel, w: &Wind, annex: &Annex) -> bool {
    let s = &mut Sheet::silent();
    let Ok(slender) = vertical::slenderness(s, &p.m, annex, "pier-slenderness") else { return false };
    size::limits(s, "size", w.bay.edges, false, p.m.h, w.bay.l, slender.t_ef).is_ok()
}

/// How much of the wind stays on the loaded leaf.
fn share(s: &mut Sheet, p: &PierModel, leaves: &[Leaf], W_Ed: Stress) -> Stress {
    let Some(other) = &p.other else {
        calc!(s, "statics", "on the wall, all of it", W_l = 1.0 * W_Ed);
        return W_l;
    };
    if !sharing::counted(s, p.ties, "") {
        calc!(s, "6.5", "on the loaded leaf: too few ties to share", W_l = 1.0 * W_Ed);
        return W_l;
    }
    let takes = |k: usize| max(leaves[k].out.w_Rd, Stress::ZERO);
    given!(s, "what the outer leaf takes", "above", w_Rd_o = takes(0));
    given!(s, "what the inner leaf takes", "above", w_Rd_i = takes(1));
    if w_Rd_o + w_Rd_i <= Stress::ZERO {
        calc!(s, "6.3.1(6)", "on the loaded leaf: neither resists", W_l = 1.0 * W_Ed);
        return W_l;
    }
    let (_, W_o, W_i) = sharing::by_strength(s, W_Ed, w_Rd_o, w_Rd_i);
    if other.outer {
        calc!(s, "6.3.1(6)", "left to the loaded leaf", W_l = W_Ed - min(W_o, w_Rd_o));
        W_l
    } else {
        calc!(s, "6.3.1(6)", "left to the loaded leaf", W_l = W_Ed - min(W_i, w_Rd_i));
        W_l
    }
}

/// The loaded leaf, under the dead load that helps, less the uplift.
fn strength_loaded(s: &mut Sheet, p: &PierModel, annex: &Annex, ready: Ready) -> Strength {
    let (m, h) = (&p.m, p.m.h);
    given!(s, "actual thickness", "job file", t = m.t);
    given!(s, "design compressive strength", "above", f_d = ready.f_d);
    given!(s, "length", "above", l = m.l);
    given!(s, "helping factor", "basis of this job", gamma_h = Num::new(m.helping));
    given!(s, "dead load at the head", work::LED, G_h = m.at_head.G);
    let G_a = if work::lifted(p) {
        given!(s, "roof uplift at the head", work::LED, U_h = m.at_head.U);
        let clause = Combination::Helping.clause();
        let factor = Combination::Helping.factors(annex, m.helping).gamma_U;
        given!(s, "factor on uplift where dead load helps", clause, gamma_u = Num::new(factor));
        calc!(
            s,
            "EN 1990 6.4.3.2",
            "dead load per length, less the uplift over the helping factor",
            G_a = (G_h - gamma_u / gamma_h * U_h) / l
        );
        G_a
    } else {
        calc!(s, "statics", "dead load per length", G_a = G_h / l);
        G_a
    };
    bending(s, &m.masonry, gamma_h, G_a, t, h, f_d)
}

/// The other leaf, under its own weight in this storey alone.
fn strength_other(s: &mut Sheet, p: &PierModel) -> Strength {
    let (m, h) = (&p.m, p.m.h);
    // A wall of one leaf never comes here.
    let (thickness, masonry) = p.other.as_ref().map_or((m.t, &m.masonry), |o| (o.t, &o.masonry));
    let source = format!("materials sheet, {}", masonry.name);
    given!(s, "actual thickness", "job file", t = thickness);
    given!(s, "characteristic compressive strength", &source, f_k = masonry.f_k);
    let from = masonry.gamma_c_source.as_str();
    given!(s, "material factor, compression", from, gamma_Mc = masonry.gamma_c);
    calc!(s, "2.4.1", "design compressive strength", f_d = f_k / gamma_Mc);
    given!(s, "helping factor", "basis of this job", gamma_h = Num::new(m.helping));
    given!(s, "dead load on top of the leaf", "this leaf carries no floor", G_a = LineLoad::ZERO);
    bending(s, masonry, gamma_h, G_a, t, h, f_d)
}

/// Flexure of a leaf, 6.3.1(3) and (4), as that of a panel.
fn bending(
    s: &mut Sheet,
    masonry: &Masonry,
    gamma_h: Num,
    G_a: LineLoad,
    t: Length,
    h: Length,
    f_d: Stress,
) -> Strength {
    let source = format!("materials sheet, {}", masonry.name);
    given!(s, "weight of the masonry", "materials", rho_m = masonry.density);
    let pre = flexure::precompression(s, gamma_h, G_a, rho_m, t, h, f_d);
    given!(s, "flexural strength, failure parallel to the bed joints", &source, f_xk1 = masonry.f_xk1);
    given!(s, "material factor, flexure", masonry.gamma_f_source.as_str(), gamma_Mf = masonry.gamma_f);
    let parallel = flexure::parallel(s, t, f_xk1, gamma_Mf, pre.sigma_d);
    let (f_xd1_app, Z) = (parallel.f_xd1_app, parallel.Z);
    let across = masonry.f_xk2.and_then(|strength| {
        given!(s, "flexural strength, failure across the bed joints", &source, f_xk2 = strength);
        let across = flexure::across(s, f_xk2, gamma_Mf, Z);
        let f_xd2 = across.f_xd2;
        (f_xd2 > Stress::ZERO).then(|| (across.M_Rd2, flexure::orthogonal_ratio(s, f_xd1_app, f_xd2)))
    });
    Strength {
        t,
        f_d,
        sigma_v: pre.sigma_v,
        sigma_d: pre.sigma_d,
        sigma_top: gamma_h * G_a / t,
        sigma_own: gamma_h * rho_m,
        f_xd1: parallel.f_xd1,
        f_xd1_app,
        Z,
        M_Rd1: parallel.M_Rd1,
        across,
    }
}
