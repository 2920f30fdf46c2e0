//! External pressure on flat, monopitch and duopitch roofs.
//!
//! BS EN 1991-1-4:2005+A1:2010, 7.2.3 to 7.2.5, Tables 7.2 to 7.4b: c_pe,10 alone, for roofs as a whole.
//! From memory (M). Tables 7.2, 7.4a and 7.4b agree with a public reproduction of the Bulgarian edition; no
//! second text of Tables 7.3a and 7.3b was at hand. The UK National Annex of 2011 has roof values of its own,
//! Tables NA.5 to NA.7b (numbers from its contents list): they are not held, and may be greater.

use std::fmt;

use super::interpolate::{Place, number, place};
use crate::standards::source::{Confidence, Looked, OutOfTable, Source};

const FAIR: Source = Source::memory(Confidence::Medium);

/// A roof and the wind on it.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Roof {
    /// Flat, sharp eaves: Table 7.2. Parapets and rounded eaves are gentler.
    Flat,
    /// Monopitch, wind on the low eaves: Table 7.3a, 0 degrees.
    MonopitchLow,
    /// Monopitch, wind on the high eaves: Table 7.3a, 180 degrees.
    MonopitchHigh,
    /// Monopitch, wind on the sloping side: Table 7.3b, 90 degrees.
    MonopitchSide,
    /// Duopitch, wind on the eaves: Table 7.4a, 0 degrees.
    DuopitchEaves,
    /// Duopitch, wind on the gable: Table 7.4b, 90 degrees.
    DuopitchGable,
}

/// A zone of Figures 7.6 to 7.8.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum RoofZone {
    /// Windward corners.
    F,
    /// The windward corner at the high eaves of a monopitch roof.
    FUp,
    /// The windward corner at the low eaves of a monopitch roof.
    FLow,
    /// Windward edge between the corners.
    G,
    /// Behind F and G.
    H,
    /// The rest; on the lee slope of a duopitch roof, below J.
    I,
    /// On the lee slope of a duopitch roof, at the ridge.
    J,
}

impl fmt::Display for RoofZone {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::F => "F",
            Self::FUp => "F up",
            Self::FLow => "F low",
            Self::G => "G",
            Self::H => "H",
            Self::I => "I",
            Self::J => "J",
        })
    }
}

/// Which of a zone's two values.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Sign {
    /// The lesser one: suction, as far as there is any.
    Suction,
    /// The greater one: pressure, or nought.
    Pressure,
}

/// Rows of the tables of pitched roofs, degrees.
pub const PITCHES: [f64; 6] = [5.0, 15.0, 30.0, 45.0, 60.0, 75.0];

/// A zone's two values at every pitch: suction, pressure. Where a table prints one value, it stands twice.
type Row = (RoofZone, [f64; 6], [f64; 6]);

const fn one(zone: RoofZone, values: [f64; 6]) -> Row {
    (zone, values, values)
}

/// Table 7.4a, c_pe,10. From memory (M). The reproduction has -0.6 as both values of zone I at 5 degrees; the
/// nought here is never the worse, and nothing takes it.
pub const DUOPITCH_EAVES: [Row; 5] = [
    (RoofZone::F, [-1.7, -0.9, -0.5, 0.0, 0.7, 0.8], [0.0, 0.2, 0.7, 0.7, 0.7, 0.8]),
    (RoofZone::G, [-1.2, -0.8, -0.5, 0.0, 0.7, 0.8], [0.0, 0.2, 0.7, 0.7, 0.7, 0.8]),
    (RoofZone::H, [-0.6, -0.3, -0.2, 0.0, 0.7, 0.8], [0.0, 0.2, 0.4, 0.6, 0.7, 0.8]),
    (RoofZone::I, [-0.6, -0.4, -0.4, -0.2, -0.2, -0.2], [0.0, 0.0, 0.0, 0.0, -0.2, -0.2]),
    (RoofZone::J, [-0.6, -1.0, -0.5, -0.3, -0.3, -0.3], [0.2, 0.0, 0.0, 0.0, -0.3, -0.3]),
];
/// Table 7.4b, c_pe,10. From memory (M).
pub const DUOPITCH_GABLE: [Row; 4] = [
    one(RoofZone::F, [-1.6, -1.3, -1.1, -1.1, -1.1, -1.1]),
    one(RoofZone::G, [-1.3, -1.3, -1.4, -1.4, -1.2, -1.2]),
    one(RoofZone::H, [-0.7, -0.6, -0.8, -0.9, -0.8, -0.8]),
    one(RoofZone::I, [-0.6, -0.5, -0.5, -0.5, -0.5, -0.5]),
];
/// Table 7.3a, 0 degrees, c_pe,10: the windward slope of Table 7.4a. From memory (M).
pub const MONOPITCH_LOW: [Row; 3] = [DUOPITCH_EAVES[0], DUOPITCH_EAVES[1], DUOPITCH_EAVES[2]];
/// Table 7.3a, 180 degrees, c_pe,10. From memory (M).
pub const MONOPITCH_HIGH: [Row; 3] = [
    one(RoofZone::F, [-2.3, -2.5, -1.1, -0.6, -0.5, -0.5]),
    one(RoofZone::G, [-1.3, -1.3, -0.8, -0.5, -0.5, -0.5]),
    one(RoofZone::H, [-0.8, -0.9, -0.8, -0.7, -0.5, -0.5]),
];
/// Table 7.3b, c_pe,10. From memory (M).
pub const MONOPITCH_SIDE: [Row; 5] = [
    one(RoofZone::FUp, [-2.1, -2.4, -2.1, -1.5, -1.2, -1.2]),
    one(RoofZone::FLow, [-2.1, -1.6, -1.3, -1.3, -1.2, -1.2]),
    one(RoofZone::G, [-1.8, -1.9, -1.5, -1.4, -1.2, -1.2]),
    one(RoofZone::H, [-0.6, -0.8, -1.0, -1.0, -1.0, -1.0]),
    one(RoofZone::I, [-0.5, -0.7, -0.8, -0.9, -0.7, -0.5]),
];
/// Table 7.2, sharp eaves: zone, suction, pressure. From memory (M).
pub const FLAT: [(RoofZone, f64, f64); 4] = [
    (RoofZone::F, -1.8, -1.8),
    (RoofZone::G, -1.2, -1.2),
    (RoofZone::H, -0.7, -0.7),
    (RoofZone::I, -0.2, 0.2),
];

/// External pressure coefficient c_pe,10 of a zone, no unit, positive towards the roof.
///
/// EN 1991-1-4 Tables 7.2 to 7.4b. `pitch` in degrees: -5 to 5 for flat roofs, 5 to 75 for others. Linear
/// between pitches for values of one sign; where the sign changes the other sign counts as nought, so
/// that suction stays up to the pitch from which the table has none.
///
/// # Errors
/// A pitch that the table does not hold, or a zone that the roof does not have.
pub fn c_pe_10(roof: Roof, zone: RoofZone, pitch: f64, sign: Sign) -> Result<Looked<f64>, OutOfTable> {
    let (table, rows): (_, &[Row]) = match roof {
        Roof::Flat => return flat(zone, pitch, sign),
        Roof::MonopitchLow => ("EN 1991-1-4 Table 7.3a, 0 degrees", &MONOPITCH_LOW),
        Roof::MonopitchHigh => ("EN 1991-1-4 Table 7.3a, 180 degrees", &MONOPITCH_HIGH),
        Roof::MonopitchSide => ("EN 1991-1-4 Table 7.3b", &MONOPITCH_SIDE),
        Roof::DuopitchEaves => ("EN 1991-1-4 Table 7.4a", &DUOPITCH_EAVES),
        Roof::DuopitchGable => ("EN 1991-1-4 Table 7.4b", &DUOPITCH_GABLE),
    };
    let row = rows.iter().find(|r| r.0 == zone).ok_or_else(|| absent(zone))?;
    let at = place(&PITCHES, pitch)
        .ok_or_else(|| OutOfTable::new(format!("a pitch of {pitch} degrees"), "5 to 75 degrees"))?;
    let value = match sign {
        Sign::Suction => between(at, &row.1, |x| x.min(0.0)),
        Sign::Pressure => between(at, &row.2, |x| x.max(0.0)),
    };
    Ok(looked(value, table, zone, pitch))
}

fn flat(zone: RoofZone, pitch: f64, sign: Sign) -> Result<Looked<f64>, OutOfTable> {
    let row = FLAT.iter().find(|r| r.0 == zone).ok_or_else(|| absent(zone))?;
    if !(-5.0..=5.0).contains(&pitch) {
        return Err(OutOfTable::new(format!("a pitch of {pitch} degrees"), "-5 to 5 degrees: a flat roof"));
    }
    let value = if sign == Sign::Suction { row.1 } else { row.2 };
    Ok(looked(value, "EN 1991-1-4 Table 7.2", zone, pitch).row("eaves", "sharp"))
}

fn looked(value: f64, table: &'static str, zone: RoofZone, pitch: f64) -> Looked<f64> {
    Looked::new(value, table, FAIR).row("zone", zone).row("pitch", format!("{} degrees", number(pitch)))
}

fn absent(zone: RoofZone) -> OutOfTable {
    OutOfTable::new(format!("zone {zone}"), "the zones that this roof has")
}

/// The value between two rows; the sign that is not asked for counts as nought where both signs meet.
fn between(at: Place, row: &[f64; 6], own: impl Fn(f64) -> f64) -> f64 {
    if at.low == at.high || row[at.low] * row[at.high] > 0.0 {
        at.of(|i| row[i])
    } else {
        at.of(|i| own(row[i]))
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const PITCHED: [(Roof, &[Row]); 5] = [
        (Roof::MonopitchLow, &MONOPITCH_LOW),
        (Roof::MonopitchHigh, &MONOPITCH_HIGH),
        (Roof::MonopitchSide, &MONOPITCH_SIDE),
        (Roof::DuopitchEaves, &DUOPITCH_EAVES),
        (Roof::DuopitchGable, &DUOPITCH_GABLE),
    ];

    fn of(roof: Roof, zone: RoofZone, pitch: f64, sign: Sign) -> f64 {
        c_pe_10(roof, zone, pitch, sign).unwrap().value
    }

    #[test]
    fn rows_and_between_them() {
        let eaves = |zone, pitch, sign| of(Roof::DuopitchEaves, zone, pitch, sign);
        assert_eq!(eaves(RoofZone::F, 5.0, Sign::Suction), -1.7);
        assert!((eaves(RoofZone::F, 10.0, Sign::Suction) + 1.3).abs() < 1e-12);
        assert!((eaves(RoofZone::H, 37.5, Sign::Pressure) - 0.5).abs() < 1e-12);
        assert!((eaves(RoofZone::J, 10.0, Sign::Suction) + 0.8).abs() < 1e-12);
        assert!((eaves(RoofZone::J, 10.0, Sign::Pressure) - 0.1).abs() < 1e-12);
        assert!((eaves(RoofZone::I, 67.5, Sign::Pressure) + 0.2).abs() < 1e-12);
        assert!((of(Roof::MonopitchSide, RoofZone::FLow, 10.0, Sign::Suction) + 1.85).abs() < 1e-12);
    }

    /// Between 45 and 60 degrees the windward slope goes from none to pressure: none stays as suction.
    #[test]
    fn signs_are_not_mixed() {
        assert_eq!(of(Roof::DuopitchEaves, RoofZone::F, 52.5, Sign::Suction), 0.0);
        assert_eq!(of(Roof::DuopitchEaves, RoofZone::F, 60.0, Sign::Suction), 0.7);
        assert_eq!(of(Roof::DuopitchEaves, RoofZone::I, 52.5, Sign::Pressure), 0.0);
    }

    #[test]
    fn suction_is_never_above_pressure() {
        for (roof, rows) in PITCHED {
            for (zone, ..) in rows {
                for half in 10..=150 {
                    let pitch = f64::from(half) / 2.0;
                    let (low, high) =
                        (of(roof, *zone, pitch, Sign::Suction), of(roof, *zone, pitch, Sign::Pressure));
                    assert!(
                        low <= high && low >= -2.5 && high <= 0.8,
                        "{roof:?} {zone} {pitch}: {low} {high}"
                    );
                }
            }
        }
        assert!(FLAT.iter().all(|r| r.1 <= r.2));
    }

    /// Edges are sucked more than what lies behind them, where there is suction at all.
    #[test]
    fn edges_are_sucked_more_than_the_field() {
        let lists = PITCHED.iter().filter(|p| p.0 != Roof::MonopitchHigh);
        for (roof, rows) in lists {
            let row = |zone| rows.iter().find(|r| r.0 == zone).unwrap().1;
            for (g, h) in row(RoofZone::G).iter().zip(row(RoofZone::H)) {
                assert!(*g <= h, "{roof:?}");
            }
        }
        assert!(FLAT.windows(2).all(|w| w[0].1 < w[1].1));
    }

    /// On the windward slope pressure grows and suction fades with the pitch.
    #[test]
    fn steeper_windward_slopes_are_pressed_more() {
        for (zone, suction, pressure) in MONOPITCH_LOW {
            assert!(suction.windows(2).all(|w| w[0] < w[1]), "{zone}");
            assert!(pressure.windows(2).all(|w| w[0] <= w[1]), "{zone}");
        }
    }

    #[test]
    fn outside_the_tables() {
        for pitch in [4.9, 75.1, -10.0, f64::NAN] {
            for (roof, rows) in PITCHED {
                assert!(c_pe_10(roof, rows[0].0, pitch, Sign::Suction).is_err(), "{roof:?} {pitch}");
            }
        }
        assert!(c_pe_10(Roof::Flat, RoofZone::F, 5.1, Sign::Suction).is_err());
        assert!(c_pe_10(Roof::Flat, RoofZone::F, f64::NAN, Sign::Suction).is_err());
        assert!(c_pe_10(Roof::Flat, RoofZone::J, 0.0, Sign::Suction).is_err());
        assert!(c_pe_10(Roof::DuopitchGable, RoofZone::J, 30.0, Sign::Suction).is_err());
        assert_eq!(c_pe_10(Roof::Flat, RoofZone::I, 0.0, Sign::Pressure).unwrap().value, 0.2);
    }
}
