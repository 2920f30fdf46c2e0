//! A panel held along three edges whose free vertical edge carries a line load, by the yield-line patterns of Annex E.
//!
//! The work equations of Annex E for one free vertical edge, with the work of the line load added: own derivation. The
//! patterns are straight, so the coefficient is what Annex E's own are, no more.

use crate::quantity::Num;
use crate::standards::tables::annex_e::{Edge, Edges};
use crate::trace::Sheet;
use crate::{calc, found, given};

/// How far down the free edge moves under the line load, on average over the height and for a deflection of 1 at the
/// most.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Spread {
    /// The load is even over the whole height.
    Even,
    /// It lies somewhere: all of it moves as the edge does where it moves most, on the safe side.
    Anywhere,
}

/// A pattern with the lengths at which the coefficient is largest, over the length of the panel.
#[derive(Clone, Copy, Debug, PartialEq)]
enum Pattern {
    /// Lines from the corners of the held edge to the free edge: heights of the wedges there.
    Wedges(f64, f64),
    /// Lines from those corners meet, and one goes on to the free edge: where they meet.
    Ridge(f64, f64),
}

/// Strength of edges over that of the panel: 2 where continuous, else 1; opposite the free edge, top, base.
#[derive(Clone, Copy, Debug)]
struct Held {
    k_O: f64,
    k_T: f64,
    k_B: f64,
}

/// What the coefficient follows from: ratio of strengths, height over length, half the width that the line load
/// comes from over the length.
#[derive(Clone, Copy, Debug)]
struct Sides {
    mu: f64,
    eta: f64,
    lambda: f64,
    spread: Spread,
}

impl Pattern {
    /// Work of the loads over that of the lines; nothing where it does not fit the panel.
    fn alpha(self, held: Held, of: Sides) -> f64 {
        let Sides { mu, eta, lambda, spread } = of;
        let even = spread == Spread::Even;
        match self {
            Self::Wedges(a, b) => {
                let edge = if even { eta - (a + b) / 2.0 } else { eta };
                (eta / 2.0 - (a + b) / 6.0 + lambda * edge)
                    / (a + b + (held.k_O - 1.0) * eta + mu * held.k_B / a + mu * held.k_T / b)
            }
            Self::Ridge(x, y) => {
                let edge = if even { eta / 2.0 } else { eta };
                (eta * (0.5 - x / 6.0) + lambda * edge)
                    / (held.k_O * eta / x + mu * held.k_B / y + mu * held.k_T / (eta - y))
            }
        }
    }
}

/// The largest value of `f` between two ends by sections; `f` has one top there.
fn top(low: f64, high: f64, f: impl Fn(f64) -> f64) -> f64 {
    const GOLD: f64 = 0.618_033_988_749_894_8;
    let (mut a, mut z) = (low, high);
    for _ in 0..60 {
        let (p, q) = (z - GOLD * (z - a), a + GOLD * (z - a));
        if f(p) < f(q) { a = p } else { z = q }
    }
    f64::midpoint(a, z)
}

/// The pattern of the largest coefficient.
fn worst(held: Held, of: Sides) -> Pattern {
    let eta = of.eta;
    // The heights of equal wedges stand as the roots of what holds their edges, so one search is enough.
    let (b, t) = (held.k_B.sqrt(), held.k_T.sqrt());
    let wedges = |c: f64| Pattern::Wedges(c * b, c * t);
    let c = top(1e-6, eta / (b + t), |c| wedges(c).alpha(held, of));
    // The ridge lies where its two sides are as strong.
    let y = eta * b / (b + t);
    let x = top(1e-6, 1.0, |x| Pattern::Ridge(x, y).alpha(held, of));
    let (one, two) = (wedges(c), Pattern::Ridge(x, y));
    if one.alpha(held, of) >= two.alpha(held, of) { one } else { two }
}

/// Coefficient of the panel: `w = M_Rd2 / (alpha_2 l²)`. `edges` has one free vertical edge, top and base and the other
/// are held. `mu`, `eta` and `lambda_o` stand on the sheet.
pub fn alpha_2(s: &mut Sheet, edges: Edges, mu: Num, eta: Num, lambda_o: Num, spread: Spread) -> Num {
    let strength = |e: Edge| Num::new(if e == Edge::Continuous { 2.0 } else { 1.0 });
    let outer = if edges.left == Edge::Free { edges.right } else { edges.left };
    let source = "1 where the edge is simple, 2 where it is continuous";
    let clause = "yield lines of Annex E, with a line load on the free edge";
    given!(s, "edge opposite the free one", source, k_O = strength(outer));
    given!(s, "top edge", source, k_T = strength(edges.top));
    given!(s, "base edge", source, k_B = strength(edges.base));
    let held = Held { k_O: k_O.base(), k_T: k_T.base(), k_B: k_B.base() };
    let of = Sides { mu: mu.base(), eta: eta.base(), lambda: lambda_o.base(), spread };
    let sought = "found so that the coefficient is largest; any other length gives less";
    match worst(held, of) {
        Pattern::Wedges(a, b) => {
            let words = format!("height of the lower wedge at the free edge, over l: {sought}");
            found!(s, clause, &words, y_1 = Num::new(a));
            found!(s, clause, "height of the upper wedge, over l, likewise", y_2 = Num::new(b));
            if spread == Spread::Even {
                calc!(
                    s,
                    clause,
                    "mean deflection of the free edge, times the height",
                    e_o = eta - (y_1 + y_2) / 2.0
                );
                wedges(s, (mu, eta, lambda_o), (k_O, k_T, k_B), (y_1, y_2), e_o)
            } else {
                calc!(
                    s,
                    clause,
                    "the load where the free edge moves most, times the height",
                    e_o = 1.0 * eta
                );
                wedges(s, (mu, eta, lambda_o), (k_O, k_T, k_B), (y_1, y_2), e_o)
            }
        }
        Pattern::Ridge(a, b) => {
            let words = format!("from the held vertical edge to the meeting point, over l: {sought}");
            found!(s, clause, &words, x = Num::new(a));
            found!(s, clause, "from the base to the horizontal line, over l, likewise", y = Num::new(b));
            let e_o = if spread == Spread::Even {
                calc!(s, clause, "mean deflection of the free edge, times the height", e_o = eta / 2.0);
                e_o
            } else {
                calc!(
                    s,
                    clause,
                    "the load where the free edge moves most, times the height",
                    e_o = 1.0 * eta
                );
                e_o
            };
            calc!(
                s,
                clause,
                "bending moment coefficient",
                alpha_2 = (eta * (0.5 - x / 6.0) + lambda_o * e_o)
                    / (mu * k_B / y + mu * k_T / (eta - y) + eta * k_O / x)
            );
            alpha_2
        }
    }
}

fn wedges(
    s: &mut Sheet,
    (mu, eta, lambda_o): (Num, Num, Num),
    (k_O, k_T, k_B): (Num, Num, Num),
    (y_1, y_2): (Num, Num),
    e_o: Num,
) -> Num {
    let clause = "yield lines of Annex E, with a line load on the free edge";
    calc!(
        s,
        clause,
        "bending moment coefficient",
        alpha_2 = (eta / 2.0 - (y_1 + y_2) / 6.0 + lambda_o * e_o)
            / (y_1 + y_2 + (k_O - 1.0) * eta + mu * k_B / y_1 + mu * k_T / y_2)
    );
    alpha_2
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::standards::tables::annex_e::theory;

    fn edges(top: Edge, base: Edge, outer: Edge) -> Edges {
        Edges::new(top, base, outer, Edge::Free)
    }

    fn coefficient(edges: Edges, mu: f64, eta: f64, lambda: f64, spread: Spread) -> f64 {
        let mut s = Sheet::recorder();
        given!(s, "", "", mu = Num::new(mu));
        given!(s, "", "", eta = Num::new(eta));
        given!(s, "", "", lambda_o = Num::new(lambda));
        let alpha = alpha_2(&mut s, edges, mu, eta, lambda_o, spread);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        alpha.base()
    }

    /// Without a line load it is the pattern of Annex E for a free vertical edge.
    #[test]
    fn without_a_load_it_is_annex_e() {
        for kind in [Edge::Simple, Edge::Continuous] {
            for outer in [Edge::Simple, Edge::Continuous] {
                for (mu, eta) in [(1.0, 1.0), (0.35, 3.0), (0.6, 0.4), (0.2, 1.5)] {
                    let e = edges(kind, kind, outer);
                    let by_table = theory(e, mu, eta).expect("a pattern").alpha;
                    let own = coefficient(e, mu, eta, 0.0, Spread::Even);
                    assert!((own / by_table - 1.0).abs() < 1e-6, "{e:?} {mu} {eta}: {own} {by_table}");
                }
            }
        }
    }

    /// No other lengths of either pattern give more: a grid of them.
    #[test]
    fn no_other_length_gives_more() {
        let held = Held { k_O: 1.0, k_T: 2.0, k_B: 1.0 };
        for (mu, eta, lambda) in [(0.4, 3.0, 1.0), (0.8, 0.7, 0.3), (0.3, 1.2, 2.5)] {
            for spread in [Spread::Even, Spread::Anywhere] {
                let of = Sides { mu, eta, lambda, spread };
                let best = worst(held, of).alpha(held, of);
                for i in 1..80 {
                    for k in 1..80 {
                        let (a, b) = (eta * f64::from(i) / 80.0, eta * f64::from(k) / 80.0);
                        if a + b <= eta {
                            assert!(Pattern::Wedges(a, b).alpha(held, of) <= best * (1.0 + 1e-4), "{a} {b}");
                        }
                        assert!(
                            Pattern::Ridge(f64::from(i) / 80.0, b).alpha(held, of) <= best * (1.0 + 1e-4)
                        );
                    }
                }
            }
        }
    }

    /// A load anywhere never asks for less than an even one, and more load never for less.
    #[test]
    fn more_load_asks_for_more() {
        let e = edges(Edge::Simple, Edge::Simple, Edge::Simple);
        let at = |lambda: f64, spread| coefficient(e, 0.4, 3.0, lambda, spread);
        assert!(at(0.5, Spread::Even) > at(0.0, Spread::Even));
        assert!(at(0.5, Spread::Anywhere) > at(0.5, Spread::Even));
    }
}
