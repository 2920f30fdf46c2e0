//! Wind climate and terrain: roughness, direction, air density.
//!
//! BS EN 1991-1-4:2005+A1:2010 with its UK National Annex. From memory (H).

use std::fmt;

use super::interpolate::number;
use crate::standards::source::{Confidence, Looked, OutOfTable, Source};

const SURE: Source = Source::memory(Confidence::High);

/// A terrain category of Table 4.1.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Terrain {
    /// 0: sea or coast open to the sea.
    Sea,
    /// I: lakes, flat land without obstacles.
    I,
    /// II: low vegetation, isolated obstacles.
    II,
    /// III: regular cover: villages, suburbs, forest.
    III,
    /// IV: at least 15 % covered by buildings of more than 15 m on average.
    IV,
}

impl Terrain {
    /// Every category, smoothest first.
    pub const ALL: [Self; 5] = [Self::Sea, Self::I, Self::II, Self::III, Self::IV];
}

impl fmt::Display for Terrain {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::Sea => "0",
            Self::I => "I",
            Self::II => "II",
            Self::III => "III",
            Self::IV => "IV",
        })
    }
}

/// Roughness of a terrain category.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Roughness {
    /// Roughness length z_0, m.
    pub z_0: f64,
    /// Least height z_min, m: below it the wind of z_min counts.
    pub z_min: f64,
}

/// Roughness length and least height, m.
///
/// EN 1991-1-4 Table 4.1 (the UK National Annex uses charts instead: say so).
pub fn roughness(terrain: Terrain) -> Looked<Roughness> {
    let (z_0, z_min) = match terrain {
        Terrain::Sea => (0.003, 1.0),
        Terrain::I => (0.01, 1.0),
        Terrain::II => (0.05, 2.0),
        Terrain::III => (0.3, 5.0),
        Terrain::IV => (1.0, 10.0),
    };
    Looked::new(Roughness { z_0, z_min }, "EN 1991-1-4 Table 4.1", SURE).row("terrain category", terrain)
}

/// Roughness length of category II, the reference of k_r, m (4.3.2).
pub const Z_0_II: f64 = 0.05;

/// Air density in the UK, kg/m³ (UK NA 2.18). From memory (H).
pub const AIR_DENSITY_UK: f64 = 1.226;
/// Air density recommended by the EN, kg/m³ (4.5(1)). From memory (H).
pub const AIR_DENSITY_EN: f64 = 1.25;

/// UK Table NA.1: direction factor at 0, 30, ... 330 degrees clockwise from north. From memory (H).
pub const C_DIR: [f64; 12] = [0.78, 0.73, 0.73, 0.74, 0.73, 0.80, 0.85, 0.93, 1.00, 0.99, 0.91, 0.82];

/// Direction factor c_dir, no unit, for wind from `degrees` clockwise from north.
///
/// UK National Annex to EN 1991-1-4, Table NA.1; linear between its directions. `None`, the
/// direction not known, gives 1.0.
///
/// # Errors
/// Degrees outside 0 to 360.
pub fn c_dir(degrees: Option<f64>) -> Result<Looked<f64>, OutOfTable> {
    const TABLE: &str = "UK NA Table NA.1";
    let Some(degrees) = degrees else {
        return Ok(Looked::new(1.0, TABLE, SURE).row("wind from", "any direction"));
    };
    if !(0.0..=360.0).contains(&degrees) {
        return Err(OutOfTable::new(format!("a wind direction of {degrees} degrees"), "0 to 360 degrees"));
    }
    let sector = degrees / 30.0;
    let low = sector.floor();
    let share = sector - low;
    let at = |i: f64| C_DIR[i as usize % 12];
    let value = if share == 0.0 { at(low) } else { at(low) * (1.0 - share) + at(low + 1.0) * share };
    Ok(Looked::new(value, TABLE, SURE).row("wind from", format!("{} degrees", number(degrees))))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn rougher_ground_has_longer_roughness_and_higher_least_height() {
        for pair in Terrain::ALL.windows(2) {
            let (a, b) = (roughness(pair[0]).value, roughness(pair[1]).value);
            assert!(a.z_0 < b.z_0 && a.z_min <= b.z_min);
        }
        assert_eq!(roughness(Terrain::II).value.z_0, Z_0_II);
    }

    #[test]
    fn direction_goes_round() {
        let of = |d: f64| c_dir(Some(d)).unwrap().value;
        assert_eq!(of(240.0), 1.0);
        assert_eq!(of(0.0), of(360.0));
        assert!((of(345.0) - 0.80).abs() < 1e-12);
        assert!((of(225.0) - 0.965).abs() < 1e-12);
        assert_eq!(c_dir(None).unwrap().value, 1.0);
        assert!(c_dir(Some(-1.0)).is_err());
        assert!(c_dir(Some(f64::NAN)).is_err());
    }
}
