//! Yield-line formulas behind Annex E, for any mix of simple and continuous edges.
//!
//! BS EN 1996-1-1:2005+A1:2012, Annex E prints alpha_2 for twelve panels. The numbers are those of
//! straight yield-line patterns: K. W. Johansen's approximate formula for a slab on four edges,
//! and the larger of two patterns where one edge is free (derivations our own; agreement with the
//! printed cells is tested cell by cell). Unit length between the vertical edges (or from the
//! supported vertical edge to the free one), height `H = h/l`, strength 1 about a vertical crack
//! and `mu` about a bed joint; `i` is 1 for a continuous edge and 0 for a simple one.
//!
//! Each pattern has one or two free lengths. Its alpha_2 is a concave function of a length over a
//! convex one, so the largest value is where the slope is nought, or at the end of the range if
//! that comes first. The lengths therefore have closed forms and nothing is searched.
//!
//! Straight patterns miss the fans that form at the corners of continuous edges. The true
//! optimum is 1 to 22 % higher there (largest for case D), by comparison with limit analysis.

use super::annex_e::{Edge, Edges};

/// The yield-line pattern that governs and the lengths that fix it, in units of the length l.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Shape {
    /// Four supported edges: Johansen's approximate formula on reduced sides.
    Slab {
        /// Reduced length a_r.
        a_r: f64,
        /// Reduced height b_r, stretched by 1/sqrt(mu).
        b_r: f64,
    },
    /// Free top: two inclined lines from the lower corners meet, a vertical line goes to the top.
    FreeTopY {
        /// From the left edge to the vertical line.
        x: f64,
        /// From the base to the meeting point.
        y: f64,
    },
    /// Free top: two inclined lines from the lower corners reach the top apart.
    FreeTopV {
        /// From the left edge to its line's end at the top.
        x_1: f64,
        /// From the right edge to its line's end at the top.
        x_2: f64,
    },
    /// Free vertical edge: two inclined lines from the supported edge's corners meet, a horizontal
    /// line goes to the free edge.
    FreeSideY {
        /// From the supported vertical edge to the meeting point.
        x: f64,
        /// From the base to the horizontal line.
        y: f64,
    },
    /// Free vertical edge: two inclined lines from the supported edge's corners reach the free
    /// edge apart.
    FreeSideV {
        /// From the base to the lower line's end at the free edge.
        y_1: f64,
        /// From the top to the upper line's end at the free edge.
        y_2: f64,
    },
}

/// A governing pattern with its moment coefficient.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Pattern {
    /// Which pattern, and its lengths.
    pub shape: Shape,
    /// alpha_2: `M_Ed2 = alpha_2 W_Ed l^2` per unit height.
    pub alpha: f64,
}

impl Pattern {
    /// The pattern in words.
    pub const fn name(&self) -> &'static str {
        match self.shape {
            Shape::Slab { .. } => "slab on four edges, approximate formula",
            Shape::FreeTopY { .. } => "free top, Y pattern",
            Shape::FreeTopV { .. } => "free top, V pattern",
            Shape::FreeSideY { .. } => "free vertical edge, Y pattern",
            Shape::FreeSideV { .. } => "free vertical edge, V pattern",
        }
    }
}

/// alpha_2 by the governing straight yield-line pattern.
///
/// EN 1996-1-1 Annex E, theory (see the module's heading for the source). All edges supported, or
/// one free. A free base is the panel with a free top turned over: its lengths are measured from
/// the supported top. With the left edge free, lengths along the wall are measured from the right
/// edge. `mu` above 1 is taken as 1. `None` where two or more edges are free, or `mu` or `h/l` is
/// not above nought: outside the method.
pub fn theory(edges: Edges, mu: f64, h_over_l: f64) -> Option<Pattern> {
    let usable = |x: f64| x.is_finite() && x > 0.0;
    if !usable(mu) || !usable(h_over_l) {
        return None;
    }
    let mu = mu.min(1.0);
    let Edges { top, base, left, right } = edges;
    let free = [top, base, left, right].iter().filter(|e| **e == Edge::Free).count();
    Some(match free {
        0 => slab(edges, mu, h_over_l),
        1 if top == Edge::Free => free_top(left, right, base, mu, h_over_l),
        1 if base == Edge::Free => free_top(left, right, top, mu, h_over_l),
        1 if right == Edge::Free => free_side(left, base, top, mu, h_over_l),
        1 => free_side(right, base, top, mu, h_over_l),
        _ => return None,
    })
}

/// alpha_2 of given lengths: the work equation the sheet prints, evaluated again.
///
/// The caller passes the lengths of [`theory`]; any other lengths that fit the panel give a
/// smaller alpha_2. `None` where the shape does not belong to these edges.
pub fn evaluate(shape: Shape, edges: Edges, mu: f64, h_over_l: f64) -> Option<f64> {
    let Edges { top, base, left, right } = edges;
    let mu = mu.min(1.0);
    let top_free = top == Edge::Free;
    let (side, foot) = (if right == Edge::Free { left } else { right }, if top_free { base } else { top });
    let level = top_free || base == Edge::Free;
    match (shape, level) {
        (Shape::Slab { a_r, b_r }, false) => Some(johansen(a_r, b_r)),
        (Shape::FreeTopY { x, y }, true) => Some(top_y(left, right, foot, mu, h_over_l, x, y)),
        (Shape::FreeTopV { x_1, x_2 }, true) => Some(top_v(left, right, foot, mu, h_over_l, x_1, x_2)),
        (Shape::FreeSideY { x, y }, false) => Some(side_y(side, base, top, mu, h_over_l, x, y)),
        (Shape::FreeSideV { y_1, y_2 }, false) => Some(side_v(side, base, top, mu, h_over_l, y_1, y_2)),
        _ => None,
    }
}

/// `1 + i`: sagging strength, and the edge's hogging strength where it is continuous.
const fn strengths(edge: Edge) -> f64 {
    match edge {
        Edge::Continuous => 2.0,
        Edge::Simple | Edge::Free => 1.0,
    }
}

/// `i`: 1 for a continuous edge, else 0.
const fn hogging(edge: Edge) -> f64 {
    strengths(edge) - 1.0
}

/// `a_r b_r / (8 (1 + a_r/b_r + b_r/a_r))` (K. W. Johansen, Yield-line Formulae for Slabs, 1972;
/// from memory, agrees with the printed cells of cases E to I).
fn johansen(a_r: f64, b_r: f64) -> f64 {
    a_r * b_r / (8.0 * (1.0 + a_r / b_r + b_r / a_r))
}

fn slab(edges: Edges, mu: f64, height: f64) -> Pattern {
    let reduced = |one: Edge, other: Edge| 2.0 / (strengths(one).sqrt() + strengths(other).sqrt());
    let a_r = reduced(edges.left, edges.right);
    let b_r = reduced(edges.top, edges.base) * height / mu.sqrt();
    Pattern { shape: Shape::Slab { a_r, b_r }, alpha: johansen(a_r, b_r) }
}

/// `(H/2 - y/6) / (H (1+i_L)/x + H (1+i_R)/(1-x) + mu (1+i_B)/y)`.
fn top_y(left: Edge, right: Edge, base: Edge, mu: f64, height: f64, x: f64, y: f64) -> f64 {
    (height / 2.0 - y / 6.0)
        / (height * strengths(left) / x + height * strengths(right) / (1.0 - x) + mu * strengths(base) / y)
}

/// `(H/2 - (x_1+x_2) H/6) / (mu (x_1+x_2+i_B)/H + H (1+i_L)/x_1 + H (1+i_R)/x_2)`.
fn top_v(left: Edge, right: Edge, base: Edge, mu: f64, height: f64, x_1: f64, x_2: f64) -> f64 {
    (height / 2.0 - (x_1 + x_2) * height / 6.0)
        / (mu * (x_1 + x_2 + hogging(base)) / height
            + height * strengths(left) / x_1
            + height * strengths(right) / x_2)
}

/// The better of the two patterns with a free top.
///
/// Between two edges of strengths a² and b², the cheapest split of a length s is a : b and costs
/// (a + b)²/s; what is left is one length a pattern, the root of a quadratic.
fn free_top(left: Edge, right: Edge, base: Edge, mu: f64, height: f64) -> Pattern {
    let (a, b) = (strengths(left).sqrt(), strengths(right).sqrt());
    let x = a / (a + b);

    let (vertical, bed) = (height * (a + b).powi(2), mu * strengths(base));
    let y = (((bed * bed + 3.0 * vertical * height * bed).sqrt() - bed) / vertical).min(height);
    let y_pattern =
        Pattern { shape: Shape::FreeTopY { x, y }, alpha: top_y(left, right, base, mu, height, x, y) };

    let slope = mu * (3.0 + hogging(base)) / height;
    let s = (((vertical * vertical + 3.0 * vertical * slope).sqrt() - vertical) / slope).min(1.0);
    let (x_1, x_2) = (s * x, s * (1.0 - x));
    let v_pattern = Pattern {
        shape: Shape::FreeTopV { x_1, x_2 },
        alpha: top_v(left, right, base, mu, height, x_1, x_2),
    };
    larger(y_pattern, v_pattern)
}

/// `H (1/2 - x/6) / (mu (1+i_B)/y + mu (1+i_T)/(H-y) + H (1+i_L)/x)`.
fn side_y(side: Edge, base: Edge, top: Edge, mu: f64, height: f64, x: f64, y: f64) -> f64 {
    height * (0.5 - x / 6.0)
        / (mu * strengths(base) / y + mu * strengths(top) / (height - y) + height * strengths(side) / x)
}

/// `(H/2 - (y_1+y_2)/6) / (y_1+y_2 + i_L H + mu (1+i_B)/y_1 + mu (1+i_T)/y_2)`.
fn side_v(side: Edge, base: Edge, top: Edge, mu: f64, height: f64, y_1: f64, y_2: f64) -> f64 {
    (height / 2.0 - (y_1 + y_2) / 6.0)
        / (y_1 + y_2 + hogging(side) * height + mu * strengths(base) / y_1 + mu * strengths(top) / y_2)
}

/// The better of the two patterns with a free vertical edge; found as in [`free_top`].
fn free_side(side: Edge, base: Edge, top: Edge, mu: f64, height: f64) -> Pattern {
    let (c, d) = (strengths(base).sqrt(), strengths(top).sqrt());
    let split = c / (c + d);

    let (bed, upright) = (mu * (c + d).powi(2) / height, height * strengths(side));
    let x = (((upright * upright + 3.0 * bed * upright).sqrt() - upright) / bed).min(1.0);
    let y = height * split;
    let y_pattern =
        Pattern { shape: Shape::FreeSideY { x, y }, alpha: side_y(side, base, top, mu, height, x, y) };

    let (bed, slope) = (mu * (c + d).powi(2), 3.0 * height + hogging(side) * height);
    let s = (((bed * bed + 3.0 * height * bed * slope).sqrt() - bed) / slope).min(height);
    let (y_1, y_2) = (s * split, s * (1.0 - split));
    let v_pattern = Pattern {
        shape: Shape::FreeSideV { y_1, y_2 },
        alpha: side_v(side, base, top, mu, height, y_1, y_2),
    };
    larger(y_pattern, v_pattern)
}

fn larger(one: Pattern, other: Pattern) -> Pattern {
    if other.alpha > one.alpha { other } else { one }
}

#[cfg(test)]
#[path = "annex_e_theory_tests.rs"]
pub(super) mod tests;
