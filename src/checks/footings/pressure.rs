//! The pressure under a footing in one case: linear under a stiff strip, no tension on the ground.

use super::combination::{Case, Combination};
use super::stands::Stands;
use crate::checks::returns::actions::{self, Direction};
use crate::checks::returns::model::At;
use crate::checks::returns::statics;
use crate::quantity::functions::abs;
use crate::quantity::{Force, Length, LineLoad, Moment, Num, Stress};
use crate::trace::Sheet;
use crate::{calc, decide, given, verify};

const FIRST: &str = "first principles";
const TOGETHER: &str = "characteristic, EN 1990 6.5.3";

/// How the ground is pressed along the footing.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Shape {
    /// Over the whole length: the pressure at the other end.
    Trapezium(Stress),
    /// It lifts: the length that presses.
    Triangle(Length),
    /// The resultant leaves the footing.
    Nothing,
}

/// What a case presses.
#[derive(Clone, Copy, Debug)]
pub struct Pressed {
    /// Load on the ground, footing included.
    pub N_F: Force,
    /// Place of the resultant from the middle of the footing, positive towards the free end.
    pub at: Length,
    /// Largest pressure; infinite where nothing bears.
    pub p_max: Stress,
    /// How it is spread.
    pub shape: Shape,
    /// Pressure before the removal, where its loads are given.
    pub p_0: Option<Stress>,
}

/// Length of the footing that counts.
pub fn length(st: &Stands<'_>) -> Length {
    st.whole.l + st.footing.beyond_junction.value + st.footing.beyond_free_end.value
}

/// What is the same in every case: loads, geometry, the footing's weight. Yields its length, the place of
/// its middle from that of the return, positive towards the free end, and its weight.
pub fn common(s: &mut Sheet, st: &Stands<'_>) -> (Length, Length, Force) {
    let (f, v) = (st.footing, &st.loads);
    let l = st.whole.l;
    given!(s, "length of the return", "job file", l);
    given!(s, "width of the footing", "job file", B = f.width);
    given!(s, "thickness of the footing", "job file", t_F = f.thickness);
    let (L_e, L_j) = (f.beyond_free_end.value, f.beyond_junction.value);
    let x_F = if L_e == Length::ZERO && L_j == Length::ZERO {
        given!(s, "length of the footing that counts", "that of the return", L = l);
        let _ = L;
        Length::ZERO
    } else {
        given!(s, "counts beyond the free end", why(&f.beyond_free_end.reason).as_str(), L_e);
        given!(s, "counts beyond the junction", why(&f.beyond_junction.reason).as_str(), L_j);
        calc!(s, "geometry", "length that counts", L = L_j + l + L_e);
        let _ = L;
        if L_e == L_j {
            Length::ZERO
        } else {
            calc!(s, "geometry", "its middle from that of the return", x_F = (L_e - L_j) / 2.0);
            x_F
        }
    };
    let L = length(st);
    let source = if f.density.reason.is_empty() {
        "EN 1991-1-1 Table A.1, plain concrete; from memory, check against the standard (H)".to_owned()
    } else {
        format!("stated: {}", f.density.reason)
    };
    given!(s, "weight of the footing per volume", source.as_str(), g_c = f.density.value);
    calc!(s, "statics", "weight of the footing", G_F = g_c * B * t_F * L);
    let left = if st.flanged { ", flange left out" } else { "" };
    let deep = if st.deep { ", with the wall in the depth of the floor" } else { "" };
    let source = format!("load table of {}{left}{deep}", st.mark);
    let source = source.as_str();
    given!(s, "dead load at the foot", source, G = v.G);
    given!(s, "imposed load", source, Q = v.Q);
    given!(s, "first moment of the dead load", source, S_G = v.S_G);
    given!(s, "first moment of the imposed load", source, S_Q = v.S_Q);
    if v.U > Force::ZERO {
        given!(s, "roof uplift", source, U = v.U);
        given!(s, "first moment of the uplift", source, S_U = v.S_U);
        let _ = (U, S_U);
    }
    let _ = (G, Q, S_G, S_Q);
    if st.off_middle() {
        let source = "places of the loads from the middle of the footing";
        given!(s, "moment of the dead load across the footing", source, T_G = v.T_G);
        given!(s, "of the imposed load", source, T_Q = v.T_Q);
        let _ = (T_G, T_Q);
        if v.U > Force::ZERO {
            given!(s, "of the uplift", source, T_U = st.T_U);
            let _ = T_U;
        }
    }
    if st.pushed() {
        let lat = st.whole.lateral;
        let source = format!("sheet of {}", st.mark);
        let source = source.as_str();
        if !st.whole.propped {
            given!(s, "force at the head, characteristic", source, H_k = lat.H_k);
            let _ = H_k;
        }
        if lat.w_k > LineLoad::ZERO {
            given!(s, "line load over the height, characteristic", source, w_k = lat.w_k);
            let _ = w_k;
        }
        if lat.M_k > Moment::ZERO {
            given!(s, "moment from the storeys above, characteristic", source, M_k = lat.M_k);
            let _ = M_k;
        }
        given!(s, "clear height", "job file", h = st.whole.h);
        let _ = h;
        if !st.whole.propped {
            actions::tilt_characteristic(s, &st.whole);
        }
    }
    let source = format!("stated: {}", f.allowable.reason);
    given!(s, "pressure that the ground is allowed", source.as_str(), p_all = f.allowable.value);
    let _ = p_all;
    if let Some(before) = f.before {
        let source = if before.led { crate::building::LED } else { "job file" };
        given!(s, "dead load before", source, g_0 = before.dead);
        given!(s, "imposed load before", source, q_0 = before.imposed);
        let _ = (g_0, q_0);
    }
    (L, x_F, G_F)
}

fn why(reason: &str) -> String {
    if reason.is_empty() { "not counted".to_owned() } else { format!("stated: {reason}") }
}

/// The pressure in one case against what is allowed.
pub fn of(s: &mut Sheet, st: &Stands<'_>, case: Case, id: &str) -> Pressed {
    let (L, x_F, G_F) = common(s, st);
    let B = st.footing.width;
    let c = case.combination;
    let (G, Q, S_G, S_Q) = (st.loads.G, st.loads.Q, st.loads.S_G, st.loads.S_Q);
    let (U, S_U) = (st.loads.U, st.loads.S_U);
    given!(s, "imposed load counts", TOGETHER, k_Q = Combination::counts(c.imposed));
    let (N_R, M_NF) = if U == Force::ZERO {
        calc!(s, "statics", "load at the foot of the return", N_R = G + k_Q * Q);
        calc!(s, "statics", "its moment about mid-length", M_NF = S_G + k_Q * S_Q);
        (N_R, M_NF)
    } else {
        given!(s, "roof uplift counts", TOGETHER, k_U = Combination::counts(c.uplift));
        calc!(s, "statics", "load at the foot of the return", N_R = G + k_Q * Q - k_U * U);
        calc!(s, "statics", "its moment about mid-length", M_NF = S_G + k_Q * S_Q - k_U * S_U);
        (N_R, M_NF)
    };
    calc!(s, "statics", "load on the ground", N_F = N_R + G_F);
    let middle = x_F == Length::ZERO;
    let M_F = match pushing(s, st, case) {
        Some((k_d, M_u)) if middle => {
            calc!(s, "statics", "moment about the middle", M_F = M_NF + k_d * M_u);
            M_F
        }
        Some((k_d, M_u)) => {
            calc!(s, "statics", "moment about the middle", M_F = M_NF - N_R * x_F + k_d * M_u);
            M_F
        }
        None if middle => {
            calc!(s, "statics", "moment about the middle", M_F = M_NF);
            M_F
        }
        None => {
            calc!(s, "statics", "moment about the middle", M_F = M_NF - N_R * x_F);
            M_F
        }
    };
    let (p_max, shape) = bears(s, st, (B, L), N_F, M_F, c);
    let p_all = st.footing.allowable.value;
    // The name of the combination is one word, so that columns are named by it whole.
    let words = format!("pressure under {}", c.name().replace(' ', "\u{a0}"));
    verify!(s, id, "first principles; allowable stated", &words, p_max <= p_all);
    let p_0 = before(s, st, k_Q);
    if let Some(p_0) = p_0.filter(|_| p_max.is_finite()) {
        calc!(s, "after less before", "growth by the removal", p_Delta = p_max - p_0);
        let _ = p_Delta;
    }
    Pressed { N_F, at: M_F / N_F, p_max, shape, p_0 }
}

/// Direction and moment of wind and tilt at the underside of the footing; none where nothing pushes.
fn pushing(s: &mut Sheet, st: &Stands<'_>, case: Case) -> Option<(Num, Moment)> {
    if !st.pushed() {
        return None;
    }
    let t_F = st.footing.thickness;
    given!(s, "wind counts", TOGETHER, k_W = Combination::counts(case.combination.wind));
    let way = if case.direction == Direction::ToFree { 1.0 } else { -1.0 };
    given!(s, "direction: 1 towards the free end", "worse of both", k_d = Num::new(way));
    // A held head passes force and tilt on: neither is worked out here.
    let H_t = if st.whole.propped { Force::ZERO } else { actions::tilt_characteristic(s, &st.whole) };
    let (M_WF, V_F) = statics::characteristic::at(s, &st.whole, k_W, H_t, At::Foot);
    if !st.whole.sheared() {
        calc!(s, "statics", "wind and tilt at the underside", M_u = M_WF);
        return Some((k_d, M_u));
    }
    calc!(s, "statics", "wind and tilt at the underside", M_u = M_WF + V_F * t_F);
    Some((k_d, M_u))
}

/// The largest pressure, and how the ground is pressed.
fn bears(
    s: &mut Sheet,
    st: &Stands<'_>,
    (B, L): (Length, Length),
    N_F: Force,
    M_F: Moment,
    c: Combination,
) -> (Stress, Shape) {
    let nothing = |s: &mut Sheet| {
        let words = "the resultant leaves the footing: nothing bears";
        given!(s, "largest pressure", words, p_max = Stress::new(f64::INFINITY));
        (p_max, Shape::Nothing)
    };
    if N_F <= Force::ZERO {
        return nothing(s);
    }
    calc!(s, FIRST, "eccentricity along", e_F = abs(M_F) / N_F);
    if e_F >= L / 2.0 {
        decide!(s, FIRST, "it stands", "it turns over", e_F < L / 2.0);
        return nothing(s);
    }
    let across = if st.off_middle() {
        match across(s, st, B, N_F, c) {
            Some(k_y) => Some(k_y),
            None => return nothing(s),
        }
    } else {
        None
    };
    let pressed = decide!(s, FIRST, "presses over its length", "lifts: it presses in part", e_F <= L / 6.0);
    match (pressed, across) {
        (true, None) => {
            calc!(s, FIRST, "largest pressure", p_max = N_F / (B * L) * (1.0 + 6.0 * e_F / L));
            calc!(s, FIRST, "least pressure", p_min = N_F / (B * L) * (1.0 - 6.0 * e_F / L));
            (p_max, Shape::Trapezium(p_min))
        }
        (true, Some(k_y)) => {
            calc!(s, FIRST, "largest pressure", p_max = k_y * N_F / (B * L) * (1.0 + 6.0 * e_F / L));
            calc!(s, FIRST, "least pressure", p_min = k_y * N_F / (B * L) * (1.0 - 6.0 * e_F / L));
            (p_max, Shape::Trapezium(p_min))
        }
        (false, None) => {
            calc!(s, FIRST, "pressed length", L_p = 3.0 * (L / 2.0 - e_F));
            calc!(s, FIRST, "largest pressure", p_max = 2.0 * N_F / (3.0 * B * (L / 2.0 - e_F)));
            (p_max, Shape::Triangle(L_p))
        }
        (false, Some(k_y)) => {
            calc!(s, FIRST, "pressed length", L_p = 3.0 * (L / 2.0 - e_F));
            calc!(s, FIRST, "largest pressure", p_max = k_y * 2.0 * N_F / (3.0 * B * (L / 2.0 - e_F)));
            (p_max, Shape::Triangle(L_p))
        }
    }
}

/// How much the far edge is pressed above the mean across the footing; none where nothing bears.
fn across(s: &mut Sheet, st: &Stands<'_>, B: Length, N_F: Force, c: Combination) -> Option<Num> {
    let (T_G, T_Q, T_U) = (st.loads.T_G, st.loads.T_Q, st.T_U);
    given!(s, "imposed load counts", TOGETHER, k_Q = Combination::counts(c.imposed));
    let T_F = if st.loads.U == Force::ZERO {
        calc!(s, "statics", "moment across the footing", T_F = abs(T_G + k_Q * T_Q));
        T_F
    } else {
        given!(s, "roof uplift counts", TOGETHER, k_U = Combination::counts(c.uplift));
        calc!(s, "statics", "moment across the footing", T_F = abs(T_G + k_Q * T_Q - k_U * T_U));
        T_F
    };
    calc!(s, FIRST, "eccentricity across", e_y = T_F / N_F);
    if e_y >= B / 2.0 {
        decide!(s, FIRST, "it stands", "it turns over across", e_y < B / 2.0);
        return None;
    }
    if decide!(s, FIRST, "pressed over its width", "pressed over part of its width", e_y <= B / 6.0) {
        calc!(s, FIRST, "far edge over the mean", k_y = 1.0 + 6.0 * e_y / B);
        Some(k_y)
    } else {
        calc!(s, FIRST, "far edge over the mean", k_y = 2.0 * B / (3.0 * (B / 2.0 - e_y)));
        Some(k_y)
    }
}

/// The pressure before the removal, without wind; none where its loads are not given.
fn before(s: &mut Sheet, st: &Stands<'_>, k_Q: Num) -> Option<Stress> {
    let f = st.footing;
    let before = f.before?;
    let (g_0, q_0, B, t_F, g_c) = (before.dead, before.imposed, f.width, f.thickness, f.density.value);
    calc!(s, "statics", "load per length before", n_0 = g_0 + k_Q * q_0);
    if f.offset == Length::ZERO {
        calc!(s, FIRST, "pressure before, no wind", p_0 = n_0 / B + g_c * t_F);
        return Some(p_0);
    }
    given!(s, "wall off the middle of the footing", "job file", y_F = f.offset.abs());
    calc!(s, "statics", "the same with the footing", n_F = n_0 + g_c * B * t_F);
    if n_F <= LineLoad::ZERO {
        return None;
    }
    calc!(s, FIRST, "eccentricity across, before", e_0 = n_0 * y_F / n_F);
    if e_0 <= B / 6.0 {
        calc!(s, FIRST, "pressure before, no wind", p_0 = n_F / B * (1.0 + 6.0 * e_0 / B));
        Some(p_0)
    } else {
        calc!(s, FIRST, "pressure before, no wind", p_0 = 2.0 * n_F / (3.0 * (B / 2.0 - e_0)));
        Some(p_0)
    }
}
