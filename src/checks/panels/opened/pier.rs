//! A pier of a panel with openings: what it takes on its own face, and the strips at its jambs.

use super::strip;
use crate::building::{Frame, PanelOpening};
use crate::checks::panels::form::{Form, State};
use crate::checks::panels::strength::Strength;
use crate::quantity::functions::{min, sq, sqrt};
use crate::quantity::{Length, Num, Stress};
use crate::standards::en1996::lateral::free_edge::Spread;
use crate::standards::en1996::lateral::{coefficient, free_edge};
use crate::standards::masonry::Edge;
use crate::standards::tables::annex_e::Edges;
use crate::trace::{Outside, Sheet};
use crate::{calc, given};

/// How wide a strip may be over `h / sqrt(mu)`, so that twisting and bending along the bed joints spread the load of
/// one jamb over it. Lower bound, own derivation: with `beta = b sqrt(mu) / h` the strip needs
/// `m_x = beta² m_H` at its middle and `m_xy = beta sqrt(m_H m_V)` at its ends, and Johansen's criterion
/// `(m_H - m_x)(m_V + m_y) >= m_xy²` holds up to `beta = 1 / sqrt(2)`.
const SPREAD: f64 = 0.7;

/// A pier.
pub struct Pier<'a> {
    /// Its name on the sheet.
    pub name: &'a str,
    /// Its width.
    pub width: Length,
    /// How its outer edge is held; none between two openings.
    pub outer: Option<Edge>,
    /// Whether the outer edge is on its left.
    pub left_end: bool,
    /// The openings beside it.
    pub beside: &'a [&'a PanelOpening],
}

/// Pressure that the pier can take on its own face and from the openings beside it. `h` stands on the sheet.
pub fn takes(s: &mut Sheet, state: State<'_>, strength: &Strength, p: &Pier<'_>) -> Result<Stress, Outside> {
    let from = state.m.strength_from();
    let h = state.m.h;
    given!(s, &format!("length of {}", p.name), "job file", l = p.width);
    given!(s, "resistance per unit length, parallel to the bed joints", &from, M_Rd1 = strength.M_Rd1);
    if let Some(w) = both_ways(s, state, strength, p) {
        return Ok(w);
    }
    calc!(s, "statics, 6.3.1", "pressure on its own face, between top and base", w_o2 = 8.0 * M_Rd1 / sq(h));
    let mut so_far = w_o2;
    for (n, o) in p.beside.iter().enumerate() {
        let A_j = strip::moment(s, o, o.frame, h);
        given!(s, "width of the opening", "job file", b_o = o.width);
        let b_s = breadth(s, strength, h, l);
        calc!(
            s,
            "statics, 6.3.1",
            "pressure that a strip at the jamb takes from the opening",
            w_j = 2.0 * M_Rd1 * b_s / (b_o * A_j)
        );
        if n > 0 {
            given!(s, "what it takes with the opening on its other side", "above", w_f = so_far);
            calc!(s, "lower bound", "pressure that it takes with both", w_p2 = w_f / (1.0 + w_f / w_j));
            so_far = w_p2;
        } else {
            given!(s, "what it takes on its own face", "above", w_f = so_far);
            calc!(
                s,
                "lower bound",
                "pressure that it takes: each load with a part of its strength",
                w_p1 = w_f / (1.0 + w_f / w_j)
            );
            so_far = w_p1;
        }
    }
    Ok(so_far)
}

/// Width of the strip.
fn breadth(s: &mut Sheet, strength: &Strength, h: Length, l: Length) -> Length {
    match strength.across {
        Some((_, ratio)) if ratio > Num::new(0.0) => {
            given!(
                s,
                "part of h over the root of mu that spreads the load",
                "lower bound, own derivation",
                k_b = Num::new(SPREAD)
            );
            given!(s, "orthogonal ratio", "strength of the leaf", mu = ratio);
            calc!(s, "lower bound, own derivation", "width of the strip", b_s = min(l, k_b * h / sqrt(mu)));
            b_s
        }
        _ => {
            given!(s, "width of the strip", "no strength along the bed joints limits it", b_s = l);
            b_s
        }
    }
}

/// What a pier takes both ways, where its outer edge is held and Annex E applies: by the yield lines of Annex E with
/// half of the wind on the breadth of the opening as a line load on its free edge. `h` and `l` stand on the sheet.
fn both_ways(s: &mut Sheet, state: State<'_>, strength: &Strength, p: &Pier<'_>) -> Option<Stress> {
    let (outer, (resistance, ratio)) = (p.outer.filter(|e| *e != Edge::Free)?, strength.across?);
    let [o] = p.beside else { return None };
    if state.form != Form::Plate {
        return None;
    }
    let (h, l, id) = (state.m.h, p.width, format!("{}-{}", state.form.id(), state.phase));
    coefficient::applies(&mut Sheet::silent(), &id, strength.t, ratio).ok()?;
    let (left, right) = if p.left_end { (outer, Edge::Free) } else { (Edge::Free, outer) };
    let edges = Edges::new(state.edges.top, state.edges.base, left, right);
    let from = state.m.strength_from();
    given!(s, "actual thickness", &from, t = strength.t);
    given!(s, "orthogonal ratio", &from, mu = ratio);
    coefficient::applies(s, &id, t, mu).ok()?;
    calc!(s, "Annex E", "height over length", eta = h / l);
    given!(s, "width of the opening", "job file", b_o = o.width);
    calc!(s, "statics", "half the width of the opening over the length", lambda_o = b_o / (2.0 * l));
    let spread = if o.frame == Frame::Jambs { Spread::Even } else { Spread::Anywhere };
    let alpha_2 = free_edge::alpha_2(s, edges, mu, eta, lambda_o, spread);
    given!(s, "resistance per unit height, across the bed joints", &from, M_Rd2 = resistance);
    calc!(
        s,
        "5.5.5(7), 6.3.1",
        "pressure that it takes, the opening's wind on its free edge",
        w_o1 = M_Rd2 / (alpha_2 * sq(l))
    );
    Some(w_o1)
}
