//! What a steel goal-post frame in the place of a return would have to do. Its design stays with others.

use super::actions;
use super::build::Inputs;
use super::model::Model;
use crate::quantity::functions::cube;
use crate::quantity::{Force, Length, LineLoad, Moment, Num, print};
use crate::trace::Sheet;
use crate::{calc, given};

/// Sway limit of the frame: its height over this, under the characteristic wind. Common practice, no published source.
pub const SWAY: f64 = 500.0;

/// Shear, feet, vertical loads and stiffness of a frame in the place of the return, as steps.
///
/// Statics; EN 1990 eq. 6.10; BS EN 1996-1-1 5.3(2) for the tilt. The frame takes the wind, the tilt and the vertical
/// loads at the head of every leaf that acts.
pub fn demands(s: &mut Sheet, i: &Inputs<'_>, models: &[&Model]) {
    let Some(first) = models.first() else { return };
    s.heading(2, "A steel frame in its place: what it would have to do");
    s.note(
        "A goal-post frame of beam and two legs, standing on feet of its own in the line of the wall. Its members, \
         joints, feet and footings are designed by others; this is what they have to be designed for. All the wind is \
         taken at the head, on the safe side.",
    );
    let whole = if models.len() > 1 { "the leaves together" } else { "above" };
    let force = |f: fn(&Model) -> Force| models.iter().map(|m| f(m)).sum::<Force>();
    let line = models.iter().map(|m| m.lateral.w_k).sum::<LineLoad>();
    given!(s, "clear height", "job file", h = first.h);
    given!(s, "force at the head, characteristic", whole, H_k = force(|m| m.lateral.H_k));
    given!(s, "line load over the height", whole, w_k = line);
    given!(s, "dead load that leans on this return", whole, G_nu = force(|m| m.lateral.G_nu));
    given!(s, "imposed load that leans on it", whole, Q_nu = force(|m| m.lateral.Q_nu));
    given!(s, "height of the structure, in m in the next line", "job file", h_tot = first.lateral.h_nu);
    let nu = actions::radians(s, h_tot);
    calc!(s, "statics", "wind on the frame", W_k = H_k + w_k * h);
    calc!(s, "statics, 5.3(2)", "shear on it, tilt included", V_k = W_k + nu * (G_nu + Q_nu));
    given!(s, "factor on wind", "EN 1990 NA.A1.2", gamma_W = Num::new(i.annex.gamma_Q));
    given!(s, "pressing factor on dead load", "EN 1990 NA.A1.2(B)", gamma_Gp = Num::new(i.annex.gamma_G_sup));
    given!(s, "pressing factor on imposed load", "EN 1990 NA.A1.2(B)", gamma_Qp = Num::new(i.annex.gamma_Q));
    calc!(
        s,
        "EN 1990 eq. 6.10",
        "shear on it, design",
        V_d = gamma_W * W_k + nu * (gamma_Gp * G_nu + gamma_Qp * Q_nu)
    );
    given!(s, "distance of its legs: the wall removed", "job file", l_F = i.building.removed.length);
    given!(
        s,
        "moment from the storeys above",
        whole,
        M_k = models.iter().map(|m| m.lateral.M_k).sum::<Moment>()
    );
    let M_F = if M_k == Moment::ZERO {
        calc!(s, "statics", "moment about its feet, design", M_F = V_d * h);
        M_F
    } else {
        calc!(s, "statics", "moment about its feet, design", M_F = V_d * h + gamma_W * M_k);
        M_F
    };
    calc!(s, "statics", "push and pull at its feet", R_F = M_F / l_F);
    vertical(s, models, gamma_Gp, gamma_Qp);
    stiffness(s, i, models, V_k, h);
    let _ = R_F;
}

/// The vertical loads that it would carry.
fn vertical(s: &mut Sheet, models: &[&Model], gamma_Gp: Num, gamma_Qp: Num) {
    let sum = |f: fn(&Model) -> Force| models.iter().map(|m| f(m)).sum::<Force>();
    given!(s, "dead load at the head", "load table", G_h = sum(|m| m.at_head.G));
    given!(s, "imposed load at the head", "load table", Q_h = sum(|m| m.at_head.Q));
    calc!(s, "EN 1990 eq. 6.10", "vertical load on it, design", N_F = gamma_Gp * G_h + gamma_Qp * Q_h);
    let _ = N_F;
    s.note(
        "The vertical loads are those at the head of the return now. What the frame carries of the wall and floor over \
         the opening comes on top.",
    );
}

/// The stiffness it would need, against the masonry that it replaces.
fn stiffness(s: &mut Sheet, i: &Inputs<'_>, models: &[&Model], V_k: Force, h: Length) {
    given!(s, "height over sway", "common practice, no published source", k_u = Num::new(SWAY));
    calc!(s, "common practice, no published source", "sway limit, characteristic wind", u_F = h / k_u);
    calc!(s, "statics", "stiffness it would need", K_F = V_k / u_F);
    given!(
        s,
        "modulus of elasticity over f_k",
        "3.7.2(2), UK NA; from memory (H)",
        K_E = Num::new(i.annex.E_over_f_k)
    );
    let K_m = if let [m] = models {
        let (f_k, t, l) = (m.masonry.f_k, m.t, m.l);
        given!(s, "characteristic compressive strength", "above", f_k);
        given!(s, "actual thickness of the leaf", "above", t);
        given!(s, "length of the return", "above", l);
        calc!(
            s,
            "statics, shear modulus 0.4 E (3.7.3)",
            "stiffness of the return, uncracked",
            K_m = K_E * f_k * t / (4.0 * cube(h / l) + 3.0 * (h / l))
        );
        K_m
    } else {
        let of = |m: &&Model| {
            let r = h / m.l;
            K_E * m.masonry.f_k * m.t / (4.0 * cube(r) + 3.0 * r)
        };
        given!(
            s,
            "stiffness of the return, uncracked",
            "E t / (4 (h/l)³ + 3 h/l), leaves together",
            K_m = models.iter().map(of).sum::<LineLoad>()
        );
        K_m
    };
    calc!(s, "statics", "its share beside the return", r_K = K_F / (K_F + K_m));
    s.note(format!(
        "Beside the return left standing and uncracked, a frame of just that stiffness draws {} % of the force, and \
         the rest stays with masonry that does not pass. To draw nine tenths of it the frame must be at least nine times \
         as stiff as the return, or the return must be cut free of it. The same holds for every other wall that shares \
         the storey by stiffness.",
        print::significant(r_K.base() * 100.0)
    ));
}
