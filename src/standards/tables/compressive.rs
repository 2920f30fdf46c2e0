//! Compressive strength: K, the shape factor, conditioning factors and the limits of f_b and f_m.
//!
//! BS EN 1996-1-1:2005+A1:2012, 3.6.1.2 with UK National Annex (2013), Table NA.4, and EN 772-1
//! Annex A. `f_k = K f_b^0.7 f_m^0.3`, N/mm². From memory.

use std::fmt;

use super::interpolate::{number, place};
use crate::standards::masonry::{Group, UnitKind};
use crate::standards::source::{Confidence, Looked, OutOfTable, Source};

const SURE: Source = Source::memory(Confidence::High);
const FAIR: Source = Source::memory(Confidence::Medium);
const CONCRETE: Source = Source::named(
    "Concrete Block Association newsletter, 2015, p. 12, and from memory, check against the standard",
    Confidence::High,
);

/// UK NA to 3.6.1.2(2): f_b counts up to this, general purpose mortar, N/mm². From memory (M); the
/// EN has 75.
pub const F_B_LIMIT: f64 = 110.0;
/// EN 3.6.1.2(2): f_b counts up to this, N/mm². From memory (H).
pub const F_B_LIMIT_EN: f64 = 75.0;
/// UK NA to 3.6.1.2(2): f_m counts up to this, N/mm². From memory (M).
pub const F_M_LIMIT: f64 = 12.0;
/// EN 3.6.1.2(2): f_m counts up to this, N/mm². From memory (H).
pub const F_M_LIMIT_EN: f64 = 20.0;
/// EN 3.6.1.2(2): f_m counts up to this times f_b. From memory (H).
pub const F_M_PER_F_B: f64 = 2.0;
/// 3.6.1.2(6): K times this where a mortar joint runs parallel to the face through the wall. From
/// memory (H).
pub const COLLAR_JOINT: f64 = 0.8;
/// Constant K of masonry in general purpose mortar, no unit.
///
/// UK National Annex, Table NA.4. `laid_flat` is for aggregate concrete units on their face. Both
/// brick and block of aggregate concrete take the same row.
///
/// # Errors
/// A kind and group that the table does not hold, or units laid flat that are not of aggregate
/// concrete.
pub fn k(unit: UnitKind, group: Group, laid_flat: bool) -> Result<Looked<f64>, OutOfTable> {
    use UnitKind as U;
    let (value, source) = match (unit, group, laid_flat) {
        (U::ClayBrick, Group::One, false) => (0.5, FAIR),
        (U::ClayBrick, Group::Two, false) => (0.4, FAIR),
        (U::CalciumSilicateBrick, Group::One, false) => (0.5, FAIR),
        (U::CalciumSilicateBrick, Group::Two, false) => (0.4, FAIR),
        (U::ConcreteBrick | U::AggregateBlock, Group::One, false) => (0.75, CONCRETE),
        (U::ConcreteBrick | U::AggregateBlock, Group::One, true) => (0.5, FAIR),
        (U::ConcreteBrick | U::AggregateBlock, Group::Two, false) => (0.7, FAIR),
        (U::AacBlock, Group::One, false) => (0.75, FAIR),
        (U::ManufacturedStone, Group::One, false) => (0.75, CONCRETE),
        (U::NaturalStone, Group::One, false) => (0.45, FAIR),
        _ => {
            let lay = if laid_flat { " laid flat" } else { "" };
            return Err(OutOfTable::new(
                format!("K of {unit}, {group}{lay}"),
                "Groups 1 and 2 of clay, calcium silicate and aggregate concrete, Group 1 of aerated concrete and stone; \
                 laid flat only aggregate concrete, Group 1",
            ));
        }
    };
    let looked = Looked::new(value, "UK NA Table NA.4", source)
        .row("unit", unit)
        .row("group", if group == Group::One { "1" } else { "2" });
    Ok(if laid_flat { looked.row("laid", "flat") } else { looked })
}

/// Heights of the rows of [`SHAPE_FACTOR`], mm.
pub const SHAPE_HEIGHT: [f64; 7] = [40.0, 50.0, 65.0, 100.0, 150.0, 200.0, 250.0];
/// Least horizontal dimensions of the columns of [`SHAPE_FACTOR`], mm.
pub const SHAPE_WIDTH: [f64; 5] = [50.0, 100.0, 150.0, 200.0, 250.0];
/// EN 772-1 Table A.1, shape factor delta; NaN where the table has no entry. From memory (H).
pub const SHAPE_FACTOR: [[f64; 5]; 7] = [
    [0.8, 0.7, f64::NAN, f64::NAN, f64::NAN],
    [0.85, 0.75, 0.7, f64::NAN, f64::NAN],
    [0.95, 0.85, 0.75, 0.7, 0.65],
    [1.15, 1.0, 0.9, 0.8, 0.75],
    [1.3, 1.2, 1.1, 1.0, 0.95],
    [1.45, 1.35, 1.25, 1.15, 1.1],
    [1.55, 1.45, 1.35, 1.25, 1.15],
];

/// Shape factor delta of a unit, no unit.
///
/// EN 772-1 Annex A, Table A.1: height of the unit as laid, and its least horizontal dimension, in
/// mm; linear in both. Units higher or wider than 250 mm take the row or column of 250 mm.
///
/// # Errors
/// Below 40 mm high or 50 mm wide, or among cells the table leaves empty.
pub fn shape_factor(height: f64, width: f64) -> Result<Looked<f64>, OutOfTable> {
    let out = || {
        OutOfTable::new(
            format!("the shape factor of a unit {} mm high and {} mm wide", number(height), number(width)),
            "height from 40 mm, least horizontal dimension from 50 mm, and no empty cell of the table",
        )
    };
    let found = |rows: &[f64], x: f64| x.is_finite().then(|| place(rows, x.min(250.0))).flatten();
    let row = found(&SHAPE_HEIGHT, height).ok_or_else(out)?;
    let column = found(&SHAPE_WIDTH, width).ok_or_else(out)?;
    let value = row.of(|i| column.of(|j| SHAPE_FACTOR[i][j]));
    if value.is_nan() {
        return Err(out());
    }
    let ends = |rows: &[f64], low: usize, high: usize, x: f64| {
        if low != high {
            format!("{} mm, between {} and {} mm", number(x), number(rows[low]), number(rows[high]))
        } else if rows[low] < x {
            format!("{} mm, taken as {} mm", number(x), number(rows[low]))
        } else {
            format!("{} mm", number(x))
        }
    };
    Ok(Looked::new(value, "EN 772-1 Table A.1", SURE)
        .row("height", ends(&SHAPE_HEIGHT, row.low, row.high, height))
        .row("least horizontal dimension", ends(&SHAPE_WIDTH, column.low, column.high, width)))
}

/// State of the units when they were tested.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Conditioning {
    /// Air-dry.
    AirDry,
    /// At 6 % moisture.
    SixPercent,
    /// Oven-dry.
    OvenDry,
    /// After immersion.
    Immersed,
}

impl fmt::Display for Conditioning {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::AirDry => "air-dry",
            Self::SixPercent => "6 % moisture",
            Self::OvenDry => "oven-dry",
            Self::Immersed => "immersed",
        })
    }
}

/// Factor that brings a tested strength to the air-dry state, no unit.
///
/// EN 772-1 Annex A. From memory (H).
pub fn conditioning(state: Conditioning) -> Looked<f64> {
    let value = match state {
        Conditioning::AirDry | Conditioning::SixPercent => 1.0,
        Conditioning::OvenDry => 0.8,
        Conditioning::Immersed => 1.2,
    };
    Looked::new(value, "EN 772-1 Annex A", SURE).row("tested", state)
}

#[cfg(test)]
mod tests {
    use super::*;

    /// The well-known 1.38 of a unit 215 mm high and 100 mm wide; J. Roberts, Design Example V3,
    /// 2013, prints 1.3 for 215 by 140 mm.
    #[test]
    fn shape_factors_in_common_use() {
        assert!((shape_factor(215.0, 100.0).unwrap().value - 1.38).abs() < 1e-9);
        assert!((shape_factor(215.0, 140.0).unwrap().value - 1.3).abs() < 1e-9);
        assert!((shape_factor(65.0, 102.5).unwrap().value - 0.845).abs() < 1e-9);
    }

    #[test]
    fn empty_cells_and_ends_of_the_table() {
        assert!(shape_factor(40.0, 101.0).is_err());
        assert!(shape_factor(45.0, 120.0).is_err());
        assert!(shape_factor(39.9, 100.0).is_err());
        assert!(shape_factor(65.0, 49.0).is_err());
        assert!(shape_factor(f64::NAN, 100.0).is_err());
        let tall = shape_factor(440.0, 100.0).unwrap();
        assert_eq!(tall.value, 1.45);
        assert_eq!(tall.rows[0].1, "440 mm, taken as 250 mm");
    }

    #[test]
    fn k_is_refused_where_the_table_is_silent() {
        assert_eq!(k(UnitKind::AggregateBlock, Group::One, false).unwrap().value, 0.75);
        assert_eq!(k(UnitKind::ClayBrick, Group::One, false).unwrap().value, 0.5);
        assert!(k(UnitKind::AacBlock, Group::Two, false).is_err());
        assert!(k(UnitKind::ClayBrick, Group::One, true).is_err());
    }
}
