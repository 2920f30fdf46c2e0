//! The bending moment coefficient alpha_2: Annex E by its table, or the work equation of a yield-line
//! pattern written out.

use crate::quantity::functions::sqrt;
use crate::quantity::{Length, Num};
use crate::standards::source::Looked;
use crate::standards::tables::annex_e::{self, Edge, Edges, Match, Tabulated};
use crate::standards::tables::annex_e_theory::{Pattern, Shape, evaluate, theory};
use crate::trace::{Outside, Sheet};
use crate::{calc, found, given, lookup, require};

/// alpha_2 and the name of the panel it belongs to.
#[derive(Clone, Debug, PartialEq)]
pub struct Coefficient {
    /// `M_Ed2 = alpha_2 W_Ed l²`.
    pub alpha_2: Num,
    /// `E`, or the yield-line pattern where Annex E has no letter or does not reach.
    pub label: String,
    /// The straight yield-line pattern's own value at this place.
    pub by_pattern: f64,
}

/// Greatest thickness of a single leaf that Annex E serves: 5.5.5(7), from memory (H).
const THICKEST: f64 = 250.0;

const CLAUSE: &str = "5.5.5(7), Annex E";

/// Tries the limits of the coefficients. `t` and `mu` stand on the sheet.
///
/// # Errors
/// [`Outside`] where the leaf is thicker than 250 mm or mu is nil.
pub fn applies(s: &mut Sheet, id: &str, t: Length, mu: Num) -> Result<(), Outside> {
    let clause = CLAUSE;
    given!(s, "thickest leaf that the coefficients serve", clause, t_max = Length::new(THICKEST));
    require!(s, id, clause, "a leaf of at most 250 mm", t <= t_max);
    require!(s, id, clause, "some strength across a bed joint", mu > 0.0);
    Ok(())
}

/// alpha_2 of a panel with at most one free edge, shown with the cells or the work equation it comes from.
///
/// 5.5.5(7), Annex E; linear between cells, each cell first raised to the yield-line value where that is
/// larger; outside the table, and for edges without a letter, the straight pattern itself. [`applies`] comes first. `l`, `h`
/// and `mu` stand on the sheet.
///
/// # Errors
/// [`Outside`] where mu is nil or two edges are free.
pub fn alpha_2(
    s: &mut Sheet,
    id: &str,
    edges: Edges,
    h: Length,
    l: Length,
    mu: Num,
) -> Result<Coefficient, Outside> {
    let clause = CLAUSE;
    calc!(s, clause, "height over length", eta = h / l);
    let outside = || Outside::new(id, clause, "a plate with at most one free edge");
    let pattern = theory(edges, mu.base(), eta.base()).ok_or_else(outside)?;
    let by_pattern = pattern.alpha;
    match annex_e::case_of(edges) {
        Some(found) => {
            let table = annex_e::tabulated(found.case, mu.base(), eta.base()).map_err(|_| outside())?;
            if table.inside {
                // The words are for a sheet that is printed: a search asks for thousands of values.
                let bare = Looked::new(table.value, "Annex E", table.source);
                let value = if s.recording() { looked(found, &table) } else { bare };
                lookup!(s, clause, "bending moment coefficient", alpha_2 = value, Num::new(1.0));
                let label = found.case.letter().to_string();
                return Ok(Coefficient { alpha_2, label, by_pattern });
            }
            s.note(format!(
                "Case {}, but mu or h/l lies outside the printed table: the yield-line pattern itself gives \
                 the coefficient.",
                found.case
            ));
            let alpha_2 = work_equation(s, pattern, edges, mu, eta);
            Ok(Coefficient { alpha_2, label: format!("{}, by formula", found.case), by_pattern })
        }
        None => {
            s.note("Annex E has no letter for these edges: the yield-line pattern gives the coefficient.");
            let alpha_2 = work_equation(s, pattern, edges, mu, eta);
            Ok(Coefficient { alpha_2, label: "no letter, by formula".to_owned(), by_pattern })
        }
    }
}

/// The table's value with everything that selected it.
fn looked(found: Match, table: &Tabulated) -> Looked<f64> {
    let lies = match (found.mirrored, found.turned) {
        (false, false) => "as in the figure",
        (true, false) => "left and right exchanged",
        (false, true) => "top and base exchanged",
        (true, true) => "left and right, top and base exchanged",
    };
    let three = |x: f64| format!("{x:.3}");
    let four = |x: f64| format!("{x:.4}");
    let mut value = Looked::new(table.value, "Annex E", table.source)
        .row("case", found.case)
        .row("edges lie", lies)
        .row("at mu", format!("{}, h/l {}", four(table.mu), four(table.h_over_l)));
    for (n, cell) in table.cells.iter().enumerate() {
        // The first cell says what the figures are; the others follow it.
        let (at, printed, taken, share) = match n {
            0 => ("cells: mu", "printed ", "taken ", "share "),
            _ => ("mu", "", "", ""),
        };
        value = value.row(
            at,
            format!(
                "{}, h/l {}: {printed}{}, {taken}{}, {share}{}",
                cell.mu,
                cell.h_over_l,
                three(cell.printed),
                four(cell.used()),
                three(cell.share)
            ),
        );
    }
    value.row(
        "pattern here, the least taken",
        format!("{} ({})", four(table.pattern.alpha), table.pattern.name()),
    )
}

/// `1 + i` of an edge: 2 where it is continuous, 1 where it is simple or free.
fn strength_of(edge: Edge) -> Num {
    Num::new(if edge == Edge::Continuous { 2.0 } else { 1.0 })
}

/// Writes the work equation of `pattern` as steps and yields alpha_2 by it.
///
/// Unit length between vertical supports, strength 1 about a vertical crack and mu about a bed joint:
/// alpha_2 = work of the load over work of the yield lines. Lengths are stated as found; any others give a
/// smaller value. `mu` and `eta` stand on the sheet.
fn work_equation(s: &mut Sheet, pattern: Pattern, edges: Edges, mu: Num, eta: Num) -> Num {
    let Edges { top, base, left, right } = edges;
    let clause = "Annex E, yield lines";
    let source = "1 where the edge is simple, 2 where it is continuous";
    let sought = "found so that the coefficient is largest; any other length gives less";
    let alpha = match pattern.shape {
        Shape::Slab { .. } => {
            given!(s, "top edge", source, k_T = strength_of(top));
            given!(s, "base edge", source, k_B = strength_of(base));
            given!(s, "left edge", source, k_L = strength_of(left));
            given!(s, "right edge", source, k_R = strength_of(right));
            let approximate = "K. W. Johansen's approximate formula for four edges (1972, from memory)";
            calc!(s, clause, "reduced length, over l", a_r = 2.0 / (sqrt(k_L) + sqrt(k_R)));
            calc!(s, clause, "reduced height, over l", b_r = 2.0 / (sqrt(k_T) + sqrt(k_B)) * eta / sqrt(mu));
            calc!(
                s,
                approximate,
                "bending moment coefficient",
                alpha_2 = a_r * b_r / (8.0 * (1.0 + a_r / b_r + b_r / a_r))
            );
            alpha_2
        }
        Shape::FreeTopY { x: at_x, y: at_y } => {
            opposite(s, edges);
            given!(s, "edge opposite the free one", source, k_O = opposite_strength(edges));
            given!(s, "left edge", source, k_L = strength_of(left));
            given!(s, "right edge", source, k_R = strength_of(right));
            found!(
                s,
                clause,
                &format!("from the left edge to the vertical line, over l: {sought}"),
                x = Num::new(at_x)
            );
            found!(
                s,
                clause,
                &format!("from the held horizontal edge to the meeting point, over l: {sought}"),
                y = Num::new(at_y)
            );
            calc!(
                s,
                clause,
                "bending moment coefficient",
                alpha_2 = (eta / 2.0 - y / 6.0) / (eta * k_L / x + eta * k_R / (1.0 - x) + mu * k_O / y)
            );
            alpha_2
        }
        Shape::FreeTopV { x_1: at_1, x_2: at_2 } => {
            opposite(s, edges);
            given!(s, "edge opposite the free one", source, k_O = opposite_strength(edges));
            given!(s, "left edge", source, k_L = strength_of(left));
            given!(s, "right edge", source, k_R = strength_of(right));
            found!(
                s,
                clause,
                &format!("width of the left wedge at the free edge, over l: {sought}"),
                x_1 = Num::new(at_1)
            );
            found!(s, clause, "width of the right wedge, over l, likewise", x_2 = Num::new(at_2));
            calc!(
                s,
                clause,
                "bending moment coefficient",
                alpha_2 = (eta / 2.0 - (x_1 + x_2) * eta / 6.0)
                    / (mu * (x_1 + x_2 + k_O - 1.0) / eta + eta * k_L / x_1 + eta * k_R / x_2)
            );
            alpha_2
        }
        Shape::FreeSideY { x: at_x, y: at_y } => {
            given!(s, "edge opposite the free one", source, k_O = opposite_strength(edges));
            given!(s, "top edge", source, k_T = strength_of(top));
            given!(s, "base edge", source, k_B = strength_of(base));
            found!(
                s,
                clause,
                &format!("from the held vertical edge to the meeting point, over l: {sought}"),
                x = Num::new(at_x)
            );
            found!(
                s,
                clause,
                &format!("from the base to the horizontal line, over l: {sought}"),
                y = Num::new(at_y)
            );
            calc!(
                s,
                clause,
                "bending moment coefficient",
                alpha_2 = eta * (0.5 - x / 6.0) / (mu * k_B / y + mu * k_T / (eta - y) + eta * k_O / x)
            );
            alpha_2
        }
        Shape::FreeSideV { y_1: at_1, y_2: at_2 } => {
            given!(s, "edge opposite the free one", source, k_O = opposite_strength(edges));
            given!(s, "top edge", source, k_T = strength_of(top));
            given!(s, "base edge", source, k_B = strength_of(base));
            found!(
                s,
                clause,
                &format!("height of the lower wedge at the free edge, over l: {sought}"),
                y_1 = Num::new(at_1)
            );
            found!(s, clause, "height of the upper wedge, over l, likewise", y_2 = Num::new(at_2));
            calc!(
                s,
                clause,
                "bending moment coefficient",
                alpha_2 = (eta / 2.0 - (y_1 + y_2) / 6.0)
                    / (y_1 + y_2 + (k_O - 1.0) * eta + mu * k_B / y_1 + mu * k_T / y_2)
            );
            alpha_2
        }
    };
    check_again(s, pattern, edges, mu, eta, alpha);
    alpha
}

fn opposite(s: &mut Sheet, edges: Edges) {
    if edges.base == Edge::Free {
        s.note("The base is free: the pattern is that of a free top, turned over.");
    }
}

/// Strength of the edge opposite the free one.
fn opposite_strength(edges: Edges) -> Num {
    let Edges { top, base, left, right } = edges;
    strength_of(match Edge::Free {
        free if top == free => base,
        free if base == free => top,
        free if right == free => left,
        _ => right,
    })
}

/// The printed equation against the one the lengths were found with.
fn check_again(s: &mut Sheet, pattern: Pattern, edges: Edges, mu: Num, eta: Num, printed: Num) {
    if !s.recording() {
        return;
    }
    let again = evaluate(pattern.shape, edges, mu.base(), eta.base());
    if again.is_none_or(|a| (a - printed.base()).abs() > 1e-12 * a.abs()) {
        s.fault(
            "coefficient by the work equation".to_owned(),
            format!("{printed:?} printed, {again:?} found"),
        );
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn on_sheet(edges: Edges, mu: f64, eta: f64) -> (Sheet, Result<Coefficient, Outside>) {
        let mut s = Sheet::recorder();
        given!(s, "", "", h = Length::new(2400.0));
        given!(s, "", "", l = Length::new(2400.0 / eta));
        given!(s, "", "", mu = Num::new(mu));
        let result = alpha_2(&mut s, "flexure", edges, h, l, mu);
        let mu = mu.base();
        assert!(s.faults.is_empty(), "{edges:?} {mu} {eta}: {:?}", s.faults);
        (s, result)
    }

    fn every() -> impl Iterator<Item = Edges> {
        let kinds = [Edge::Free, Edge::Simple, Edge::Continuous];
        (0..81).map(move |n| Edges::new(kinds[n % 3], kinds[n / 3 % 3], kinds[n / 9 % 3], kinds[n / 27]))
    }

    /// Every mix of edges, in and out of the table: the printed equation is the pattern's own value, and
    /// two free edges are outside.
    #[test]
    fn what_is_printed_is_the_pattern() {
        for edges in every() {
            let free = [edges.top, edges.base, edges.left, edges.right];
            let free = free.iter().filter(|e| **e == Edge::Free).count();
            for (mu, eta) in [(0.6, 0.6), (0.35, 1.1), (0.03, 0.9), (1.0, 0.2), (0.5, 2.7), (0.1, 0.25)] {
                let (s, result) = on_sheet(edges, mu, eta);
                let Ok(c) = result else {
                    assert!(free > 1, "{edges:?}");
                    continue;
                };
                assert!(free <= 1);
                if s.entries.iter().any(|e| matches!(e, crate::trace::Entry::Lookup { .. })) {
                    // Linear between raised cells: within 6 % of the pattern between them.
                    assert!(
                        (c.alpha_2.base() / c.by_pattern - 1.0).abs() < 0.06,
                        "{edges:?} {mu} {eta} {c:?}"
                    );
                } else {
                    assert!((c.alpha_2.base() - c.by_pattern).abs() < 1e-12, "{edges:?} {mu} {eta} {c:?}");
                }
            }
        }
    }

    /// Annex E, case E at mu 1.0 and h/l 1.0: 0.042 printed (from memory), 1/24 by theory for a square.
    #[test]
    fn a_square_on_four_simple_edges() {
        let simple = Edges::new(Edge::Simple, Edge::Simple, Edge::Simple, Edge::Simple);
        let (_, c) = on_sheet(simple, 1.0, 1.0);
        let c = c.expect("case E");
        assert_eq!((c.label.as_str(), c.alpha_2.base()), ("E", 0.042));
        assert!((c.by_pattern - 1.0 / 24.0).abs() < 1e-12);
    }

    #[test]
    fn the_limits_of_the_coefficients() {
        let at = |t: f64, mu: f64| applies(&mut Sheet::silent(), "flexure", Length::new(t), Num::new(mu));
        assert!(at(250.0, 0.1).is_ok());
        assert!(at(250.1, 0.1).is_err());
        assert!(at(100.0, 0.0).is_err(), "no strength across a bed joint");
    }
}
