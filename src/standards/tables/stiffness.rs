//! Stiffness coefficient of walls stiffened by piers.
//!
//! BS EN 1996-1-1:2005+A1:2012, 5.5.1.3(2), Table 5.1: effective thickness `t_ef = rho_t t`. The
//! same numbers stand in BS 5628-1 Table 5 as printed in C. Arya, Design of Structural Elements,
//! Table 5.12 (title from memory, values from a public copy). From memory (H).

use super::interpolate::{number, place};
use crate::standards::source::{Confidence, Looked, OutOfTable, Source};

const SOURCE: Source = Source::named(
    "from memory, check against the standard; the same as BS 5628-1 Table 5 in C. Arya, Design of Structural Elements",
    Confidence::High,
);

/// Rows: pier spacing (centres) over pier width.
pub const SPACING_OVER_WIDTH: [f64; 3] = [6.0, 10.0, 20.0];
/// Columns: pier thickness over wall thickness.
pub const PIER_OVER_WALL: [f64; 3] = [1.0, 2.0, 3.0];
/// Table 5.1, rho_t.
pub const RHO_T: [[f64; 3]; 3] = [[1.0, 1.4, 2.0], [1.0, 1.2, 1.4], [1.0, 1.0, 1.0]];

/// Coefficient rho_t, no unit: linear between rows and columns, never beyond them.
///
/// EN 1996-1-1 Table 5.1. Piers wider apart than 20 widths give nothing (rho_t = 1); closer than 6
/// widths count as 6, thicker than 3 walls count as 3.
///
/// # Errors
/// A spacing not above nought, or a pier thinner than the wall.
pub fn rho_t(spacing_over_width: f64, pier_over_wall: f64) -> Result<Looked<f64>, OutOfTable> {
    if !(spacing_over_width > 0.0
        && spacing_over_width.is_finite()
        && pier_over_wall >= 1.0
        && pier_over_wall.is_finite())
    {
        return Err(OutOfTable::new(
            format!("spacing over width {spacing_over_width}, pier over wall {pier_over_wall}"),
            "spacing above 0, pier at least as thick as the wall",
        ));
    }
    let row = place(&SPACING_OVER_WIDTH, spacing_over_width.clamp(6.0, 20.0));
    let column = place(&PIER_OVER_WALL, pier_over_wall.min(3.0));
    let (Some(row), Some(column)) = (row, column) else {
        return Err(OutOfTable::new("rho_t", "the rows of Table 5.1"));
    };
    Ok(Looked::new(row.of(|i| column.of(|j| RHO_T[i][j])), "Table 5.1", SOURCE)
        .row("pier spacing over pier width", number(spacing_over_width))
        .row("pier thickness over wall thickness", number(pier_over_wall)))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn beyond_the_ends_nothing_is_gained() {
        assert_eq!(rho_t(3.0, 3.0).unwrap().value, 2.0);
        assert_eq!(rho_t(6.0, 4.0).unwrap().value, 2.0);
        assert_eq!(rho_t(25.0, 3.0).unwrap().value, 1.0);
        assert!(rho_t(8.0, 0.5).is_err());
        assert!(rho_t(f64::NAN, 2.0).is_err());
    }
}
