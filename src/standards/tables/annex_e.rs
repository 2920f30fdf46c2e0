//! Bending moment coefficients of panels under lateral load: Annex E with its cells made safe.
//!
//! BS EN 1996-1-1:2005+A1:2012 with the UK National Annex of 2013, Annex E (informative), used by
//! 5.5.5(7): `M_Ed2 = alpha_2 W_Ed l^2` per unit height, `M_Ed1 = mu alpha_2 W_Ed l^2` per unit
//! length, for single leaves of at most 250 mm.
//!
//! * [`Edges`], [`case_of`]: the letter of a panel
//! * [`tabulated`]: the table, each cell first raised to the yield-line formula where that is
//!   larger; three printed decimals are up to 10 % unsafe at small alpha_2
//! * [`alpha_2`]: the table where the panel has a letter, the formula where it has none
//! * the formulas are in [`super::annex_e_theory`], the printed cells in [`super::annex_e_cells`]

use std::fmt;

use super::annex_e_cells::{H_OVER_L, MU, cells};
pub use super::annex_e_theory::{Pattern, theory};
use super::interpolate::{Place, number, place};
use crate::standards::source::{Confidence, OutOfTable, Source};

/// How one edge of a panel is held across its plane.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Edge {
    /// Not held.
    Free,
    /// Held, free to turn.
    Simple,
    /// Held, with the wall's own strength carried past the edge.
    Continuous,
}

impl fmt::Display for Edge {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::Free => "free",
            Self::Simple => "simply supported",
            Self::Continuous => "continuous",
        })
    }
}

/// The four edges of a panel, seen from outside.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub struct Edges {
    /// Upper edge.
    pub top: Edge,
    /// Lower edge.
    pub base: Edge,
    /// Left edge.
    pub left: Edge,
    /// Right edge.
    pub right: Edge,
}

impl Edges {
    /// Edges in the order top, base, left, right.
    pub const fn new(top: Edge, base: Edge, left: Edge, right: Edge) -> Self {
        Self { top, base, left, right }
    }
}

/// A panel of Annex E by its letter.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
#[allow(missing_docs)] // each letter's edges stand at its cells
pub enum Case {
    A,
    B,
    C,
    D,
    E,
    F,
    G,
    H,
    I,
    J,
    K,
    L,
}

impl Case {
    /// Every case, A to L.
    pub const ALL: [Self; 12] = [
        Self::A,
        Self::B,
        Self::C,
        Self::D,
        Self::E,
        Self::F,
        Self::G,
        Self::H,
        Self::I,
        Self::J,
        Self::K,
        Self::L,
    ];

    /// The letter printed in the standard.
    pub const fn letter(self) -> char {
        (b'A' + self as u8) as char
    }

    /// The edges as this file keeps them; [`case_of`] also accepts their mirror images.
    ///
    /// The edge conditions are identified by the numbers: for each letter only this set agrees
    /// with yield-line theory.
    pub const fn edges(self) -> Edges {
        use Edge::{Continuous as C, Free as F, Simple as S};
        let (top, base, left, right) = match self {
            Self::A => (F, S, S, S),
            Self::B => (F, S, C, S),
            Self::C => (F, S, C, C),
            Self::D => (F, C, C, C),
            Self::E => (S, S, S, S),
            Self::F => (S, S, C, S),
            Self::G => (S, S, C, C),
            Self::H => (S, C, C, C),
            Self::I => (C, C, C, C),
            Self::J => (S, S, S, F),
            Self::K => (S, S, C, F),
            Self::L => (S, C, C, F),
        };
        Edges::new(top, base, left, right)
    }
}

impl fmt::Display for Case {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "{}", self.letter())
    }
}

/// A letter and how the panel lies against the standard's figure.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Match {
    /// The letter.
    pub case: Case,
    /// Left and right are exchanged.
    pub mirrored: bool,
    /// Top and base are exchanged (cases H and L; their yield-line result is the same).
    pub turned: bool,
}

/// The letter of a panel; `None` where Annex E has no such panel.
///
/// EN 1996-1-1 Annex E. Left and right may be exchanged in every case; top and base only where the
/// figure says "one horizontal edge" (H, L).
pub fn case_of(edges: Edges) -> Option<Match> {
    for (mirrored, turned) in [(false, false), (true, false), (false, true), (true, true)] {
        for case in Case::ALL {
            if turned && !matches!(case, Case::H | Case::L) {
                continue;
            }
            let mut figure = case.edges();
            if mirrored {
                std::mem::swap(&mut figure.left, &mut figure.right);
            }
            if turned {
                std::mem::swap(&mut figure.top, &mut figure.base);
            }
            if figure == edges {
                return Some(Match { case, mirrored, turned });
            }
        }
    }
    None
}

/// One cell that took part in a result.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Cell {
    /// Row.
    pub mu: f64,
    /// Column.
    pub h_over_l: f64,
    /// alpha_2 as printed in the standard.
    pub printed: f64,
    /// alpha_2 by the yield-line formula at this row and column.
    pub formula: f64,
    /// Share of this cell in the result; the shares add up to 1.
    pub share: f64,
}

impl Cell {
    /// The larger of table and formula: the safe one.
    pub const fn used(&self) -> f64 {
        self.printed.max(self.formula)
    }
}

/// alpha_2 of a panel with a letter.
#[derive(Clone, Debug, PartialEq)]
pub struct Tabulated {
    /// alpha_2.
    pub value: f64,
    /// The letter.
    pub case: Case,
    /// The orthogonal ratio used: not above 1.
    pub mu: f64,
    /// h/l.
    pub h_over_l: f64,
    /// Whether mu and h/l lie inside the printed table; outside, the formula gave the value.
    pub inside: bool,
    /// The one, two or four cells used; empty outside the table.
    pub cells: Vec<Cell>,
    /// The yield-line pattern at this mu and h/l itself, to print beside the table's value.
    pub pattern: Pattern,
    /// Where the numbers come from.
    pub source: Source,
}

/// The source of the table: cells from memory, recalculated one by one.
pub const SOURCE: Source = Source::named(
    "from memory, check against the standard; recalculated by yield-line theory",
    Confidence::High,
);
/// The source of the column h/l = 2.00 at mu of 0.25 and less.
pub const SOURCE_LAST_COLUMN: Source = Source::memory(Confidence::Medium);
/// The source of a value by formula.
pub const SOURCE_THEORY: Source = Source::named(
    "straight yield-line patterns; four edges by the approximate formula of K. W. Johansen, \
     Yield-line Formulae for Slabs, 1972 (from memory)",
    Confidence::High,
);

/// alpha_2 by the table of a case, made safe.
///
/// EN 1996-1-1 Annex E: linear in mu and in h/l between cells, each cell first raised to the
/// yield-line formula where that is larger, and the result raised to the formula at the very point.
/// Where mu is below 0.05, or h/l is below 0.3 or above
/// 2, the formula itself. mu above 1 is taken as 1.
///
/// # Errors
/// mu or h/l not above nought: a bed joint without strength is outside the method.
pub fn tabulated(case: Case, mu: f64, h_over_l: f64) -> Result<Tabulated, OutOfTable> {
    let pattern = pattern(case.edges(), mu, h_over_l)?;
    let mu = mu.min(1.0);
    let mut result = Tabulated {
        value: pattern.alpha,
        case,
        mu,
        h_over_l,
        inside: false,
        cells: Vec::new(),
        pattern,
        source: SOURCE_THEORY,
    };
    let (Some(row), Some(column)) = (place(&MU, mu), place(&H_OVER_L, h_over_l)) else {
        return Ok(result);
    };
    result.inside = true;
    result.source = SOURCE;
    for (i, row_share) in shares(row) {
        for (j, column_share) in shares(column) {
            let formula = pattern_at(case, MU[i], H_OVER_L[j]);
            let printed = cells(case)[i][j];
            let share = row_share * column_share;
            result.cells.push(Cell { mu: MU[i], h_over_l: H_OVER_L[j], printed, formula, share });
            if H_OVER_L[j] == 2.0 && MU[i] <= 0.25 {
                result.source = result.source.weaker(SOURCE_LAST_COLUMN);
            }
        }
    }
    let between: f64 = result.cells.iter().map(|c| c.used() * c.share).sum();
    // A straight line between raised cells lies up to 2.6 % below the pattern between them.
    result.value = between.max(result.pattern.alpha);
    Ok(result)
}

/// alpha_2 of a panel: by the table where it has a letter, by the formula where it has none.
#[derive(Clone, Debug, PartialEq)]
pub enum Alpha2 {
    /// A panel of Annex E.
    Tabulated(Match, Tabulated),
    /// Any other panel with at most one free edge.
    Formula(Pattern),
}

impl Alpha2 {
    /// alpha_2.
    pub const fn value(&self) -> f64 {
        match self {
            Self::Tabulated(_, table) => table.value,
            Self::Formula(pattern) => pattern.alpha,
        }
    }
}

/// alpha_2 of a panel with at most one free edge.
///
/// # Errors
/// Two or more free edges (a one-way span or a cantilever is no plate), or mu or h/l not above
/// nought.
pub fn alpha_2(edges: Edges, mu: f64, h_over_l: f64) -> Result<Alpha2, OutOfTable> {
    match case_of(edges) {
        Some(found) => Ok(Alpha2::Tabulated(found, tabulated(found.case, mu, h_over_l)?)),
        None => Ok(Alpha2::Formula(pattern(edges, mu, h_over_l)?)),
    }
}

fn pattern(edges: Edges, mu: f64, h_over_l: f64) -> Result<Pattern, OutOfTable> {
    theory(edges, mu, h_over_l).ok_or_else(|| {
        OutOfTable::new(
            format!(
                "a panel with top {}, base {}, left {}, right {}, mu {}, h/l {}",
                edges.top,
                edges.base,
                edges.left,
                edges.right,
                number(mu),
                number(h_over_l)
            ),
            "at most one free edge, mu above 0, h/l above 0",
        )
    })
}

/// The formula at a cell; a case has at most one free edge and a cell's mu and h/l are positive.
fn pattern_at(case: Case, mu: f64, h_over_l: f64) -> f64 {
    theory(case.edges(), mu, h_over_l).map_or(f64::INFINITY, |p| p.alpha)
}

/// The rows a place touches with their shares: one row, or two.
fn shares(place: Place) -> impl Iterator<Item = (usize, f64)> + Clone {
    let pair = [(place.low, 1.0 - place.share), (place.high, place.share)];
    pair.into_iter().take(if place.low == place.high { 1 } else { 2 })
}

#[cfg(test)]
#[path = "annex_e_tests.rs"]
mod tests;
