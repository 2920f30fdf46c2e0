//! Partial factors and combination factors of actions, and imposed loads of houses.
//!
//! BS EN 1990:2002+A1:2005 with its UK National Annex, Tables NA.A1.1 and NA.A1.2; BS EN
//! 1991-1-1:2002 with its UK National Annex. From memory (H unless marked).

use std::fmt;

use crate::standards::source::{Confidence, Looked, Source};

const SURE: Source = Source::memory(Confidence::High);

/// Partial factors of a set of design values of actions.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Factors {
    /// Permanent, unfavourable.
    pub g_sup: f64,
    /// Permanent, favourable.
    pub g_inf: f64,
    /// Variable, unfavourable (favourable: 0).
    pub q: f64,
}

/// A set of design values of actions (EN 1990 A1.3).
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Set {
    /// Set A: loss of equilibrium (EQU), Table NA.A1.2(A).
    A,
    /// Set B: strength (STR, GEO), Table NA.A1.2(B), expression 6.10.
    B,
    /// Set C: ground (STR, GEO), Table NA.A1.2(C).
    C,
}

impl fmt::Display for Set {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::A => "set A (EQU)",
            Self::B => "set B (STR)",
            Self::C => "set C (GEO)",
        })
    }
}

/// Partial factors gamma_G and gamma_Q, no unit.
///
/// UK National Annex to EN 1990, Tables NA.A1.2(A) to (C).
pub fn gamma(set: Set) -> Looked<Factors> {
    let (value, table) = match set {
        Set::A => (Factors { g_sup: 1.1, g_inf: 0.9, q: 1.5 }, "UK NA Table NA.A1.2(A)"),
        Set::B => (Factors { g_sup: 1.35, g_inf: 1.0, q: 1.5 }, "UK NA Table NA.A1.2(B)"),
        Set::C => (Factors { g_sup: 1.0, g_inf: 1.0, q: 1.3 }, "UK NA Table NA.A1.2(C)"),
    };
    Looked::new(value, table, SURE).row("set", set)
}

/// Alternative where EQU also involves strength (note to Table NA.A1.2(A)): 1.35 and 1.15. From
/// memory (H).
pub const EQU_WITH_STRENGTH: Factors = Factors { g_sup: 1.35, g_inf: 1.15, q: 1.5 };
/// Reduction factor xi of expression 6.10b (Table NA.A1.2(B)). From memory (H).
pub const XI: f64 = 0.925;

/// Combination factors psi_0, psi_1, psi_2.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Psi {
    /// Combination value.
    pub psi_0: f64,
    /// Frequent value.
    pub psi_1: f64,
    /// Quasi-permanent value.
    pub psi_2: f64,
}

/// A variable action of a house.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Variable {
    /// Category A: floors of dwellings.
    Domestic,
    /// Category H: roofs not accessible except for upkeep.
    Roof,
    /// Snow, site at most 1000 m above sea level.
    Snow,
    /// Wind.
    Wind,
}

impl fmt::Display for Variable {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::Domestic => "imposed, category A (domestic)",
            Self::Roof => "imposed, category H (roof)",
            Self::Snow => "snow, up to 1000 m",
            Self::Wind => "wind",
        })
    }
}

/// Combination factors psi, no unit.
///
/// UK National Annex to EN 1990, Table NA.A1.1.
pub fn psi(action: Variable) -> Looked<Psi> {
    let [psi_0, psi_1, psi_2] = match action {
        Variable::Domestic => [0.7, 0.5, 0.3],
        Variable::Roof => [0.7, 0.0, 0.0],
        Variable::Snow | Variable::Wind => [0.5, 0.2, 0.0],
    };
    Looked::new(Psi { psi_0, psi_1, psi_2 }, "UK NA Table NA.A1.1", SURE).row("action", action)
}

/// An imposed load.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Imposed {
    /// Spread load q_k, kN/m².
    pub q_k: f64,
    /// Concentrated load Q_k, kN.
    pub point: f64,
}

/// A loaded place in a house.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Place {
    /// A1: rooms of a self-contained dwelling.
    Floor,
    /// A5: balcony of a dwelling.
    Balcony,
    /// H: roof of less than 30 degrees, not accessible except for upkeep.
    Roof,
    /// Loft over a ceiling, light storage.
    Loft,
}

impl fmt::Display for Place {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::Floor => "floor of a dwelling, A1",
            Self::Balcony => "balcony of a dwelling, A5",
            Self::Roof => "roof below 30 degrees, not accessible, H",
            Self::Loft => "loft over a ceiling",
        })
    }
}

/// Imposed load: q_k in kN/m², Q_k in kN.
///
/// UK National Annex to EN 1991-1-1, Tables NA.3 and NA.7 (table numbers from memory).
pub fn imposed(place: Place) -> Looked<Imposed> {
    let (q_k, point) = match place {
        Place::Floor => (1.5, 2.0),
        Place::Balcony => (2.5, 2.0),
        Place::Roof => (0.6, 0.9),
        Place::Loft => (0.25, 0.9),
    };
    Looked::new(Imposed { q_k, point }, "UK NA to EN 1991-1-1", SURE).row("place", place)
}

/// Movable partitions as a spread load (EN 1991-1-1 6.3.1.2(8)): (self weight up to, kN/m; load,
/// kN/m²). From memory (H).
pub const MOVABLE_PARTITIONS: [(f64, f64); 3] = [(1.0, 0.5), (2.0, 0.8), (3.0, 1.2)];

#[cfg(test)]
mod tests {
    use super::*;

    /// The factors named in the combinations of this program: 0.9, 1.35, 1.5, 1.05, 0.75.
    #[test]
    fn factors_of_the_combinations() {
        assert_eq!(gamma(Set::A).value.g_inf, 0.9);
        let b = gamma(Set::B).value;
        assert_eq!((b.g_sup, b.q), (1.35, 1.5));
        assert!((b.q * psi(Variable::Domestic).value.psi_0 - 1.05).abs() < 1e-12);
        assert!((b.q * psi(Variable::Wind).value.psi_0 - 0.75).abs() < 1e-12);
    }

    #[test]
    fn combination_factors_fall_from_0_to_2() {
        for action in [Variable::Domestic, Variable::Roof, Variable::Snow, Variable::Wind] {
            let p = psi(action).value;
            assert!(p.psi_0 >= p.psi_1 && p.psi_1 >= p.psi_2 && p.psi_2 >= 0.0);
        }
    }
}
