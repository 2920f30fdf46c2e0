//! Partial factors for materials, gamma_M.
//!
//! UK National Annex (2013) to BS EN 1996-1-1:2005+A1:2012, 2.4.3, Table NA.1. From memory.

use std::fmt;

use crate::standards::masonry::{Category, ExecutionClass};
use crate::standards::source::{Confidence, Looked, Source};

const TABLE: &str = "UK NA Table NA.1";

/// What the partial factor is for.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Action {
    /// Masonry in compression.
    Compression,
    /// Masonry in bending across its plane.
    Flexure,
    /// Masonry in bending, in a laterally loaded panel whose removal would not affect the
    /// stability of the building.
    FlexureOfNonCriticalPanel,
    /// Masonry in shear.
    Shear,
    /// Straps, brackets and hangers.
    Straps,
    /// Wall ties.
    WallTies,
}

impl fmt::Display for Action {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::Compression => "compression",
            Self::Flexure => "flexure",
            Self::FlexureOfNonCriticalPanel => "flexure, panel not critical to stability",
            Self::Shear => "shear",
            Self::Straps => "straps",
            Self::WallTies => "wall ties",
        })
    }
}

/// Factor on gamma_M for accidental design situations (UK NA Table NA.1). From memory (M).
pub const ACCIDENTAL: f64 = 0.5;
/// gamma_M for serviceability (2.4.4). From memory (H).
pub const SERVICEABILITY: f64 = 1.0;

/// Partial factor gamma_M, no unit.
///
/// UK National Annex, Table NA.1, by category of unit and class of execution control.
pub fn gamma_m(action: Action, category: Category, class: ExecutionClass) -> Looked<f64> {
    use Category as Cat;
    use ExecutionClass as Class;
    let first = matches!(class, Class::One);
    let (value, confidence) = match action {
        Action::Compression => (
            match (category, first) {
                (Cat::One, true) => 2.3,
                (Cat::One, false) => 2.7,
                (Cat::Two, true) => 2.6,
                (Cat::Two, false) => 3.0,
            },
            Confidence::High,
        ),
        Action::Flexure => (if first { 2.3 } else { 2.7 }, Confidence::Medium),
        Action::FlexureOfNonCriticalPanel => (if first { 2.0 } else { 2.4 }, Confidence::Medium),
        Action::Shear => (2.5, Confidence::Medium),
        Action::Straps => (1.5, Confidence::Medium),
        Action::WallTies => (WALL_TIES, Confidence::Low),
    };
    Looked::new(value, TABLE, Source::memory(confidence))
        .row("for", action)
        .row("units", category)
        .row("execution", class)
}

/// Wall ties in existing and new walls; 3.5 has also been seen in print. From memory (L).
pub const WALL_TIES: f64 = 3.0;
/// Straps in masonry that is pressed by less than [`STRAP_STRESS`]. From memory (L).
pub const STRAPS_LOW_STRESS: f64 = 3.0;
/// Design compressive stress in the masonry, N/mm2, from which the factor of straps is that of the table;
/// below it the note to the table asks for [`STRAPS_LOW_STRESS`]. From memory (L).
pub const STRAP_STRESS: f64 = 0.4;

/// Partial factor of a horizontal restraint strap, no unit, by the design compressive stress in the masonry
/// that holds it, N/mm2.
///
/// UK National Annex, Table NA.1 with its note on restraint straps. From memory (L): the higher factor
/// counts wherever the stress is not shown.
pub fn strap(stress: f64) -> Looked<f64> {
    let pressed = stress >= STRAP_STRESS;
    let value = if pressed { 1.5 } else { STRAPS_LOW_STRESS };
    Looked::new(value, TABLE, Source::memory(Confidence::Low))
        .row("for", Action::Straps)
        .row("masonry pressed", if pressed { "by 0.4 N/mm² or more" } else { "by less than 0.4 N/mm²" })
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Existing walls: category II, class 2.
    #[test]
    fn existing_walls() {
        let of = |a| gamma_m(a, Category::Two, ExecutionClass::Two).value;
        assert_eq!(of(Action::Compression), 3.0);
        assert_eq!(of(Action::Flexure), 2.7);
        assert_eq!(of(Action::Shear), 2.5);
    }

    /// The factor of the table counts from the stress on; below it, and where the stress is unknown, the higher.
    #[test]
    fn straps_need_pressed_masonry() {
        let table = gamma_m(Action::Straps, Category::Two, ExecutionClass::Two).value;
        assert_eq!(strap(STRAP_STRESS).value, table);
        assert_eq!(strap(STRAP_STRESS.next_down()).value, STRAPS_LOW_STRESS);
        assert_eq!(strap(f64::NAN).value, STRAPS_LOW_STRESS);
        assert!(STRAPS_LOW_STRESS > table);
    }

    #[test]
    fn less_control_never_lowers_a_factor() {
        for action in [
            Action::Compression,
            Action::Flexure,
            Action::FlexureOfNonCriticalPanel,
            Action::Shear,
            Action::Straps,
            Action::WallTies,
        ] {
            for category in [Category::One, Category::Two] {
                let one = gamma_m(action, category, ExecutionClass::One).value;
                let two = gamma_m(action, category, ExecutionClass::Two).value;
                assert!(one <= two && one > 1.0);
                assert!(
                    gamma_m(action, Category::One, ExecutionClass::Two).value
                        <= gamma_m(action, Category::Two, ExecutionClass::Two).value
                );
            }
        }
    }
}
