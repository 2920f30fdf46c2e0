//! Peak velocity pressure from the charts of the UK National Annex, read by the engineer: UK NA.2.17,
//! Figures NA.7 and NA.8. The charts themselves are not held.

use super::sensible;
use crate::quantity::functions::{max, metres, sq};
use crate::quantity::{Density, Length, Num, Speed, Stress};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, require};

const ID: &str = "wind";
/// Least height of the charts, mm: UK Figures NA.7 and NA.8. From memory (M).
const LEAST_HEIGHT: f64 = 2e3;
/// Greatest height to which the orography factor goes by the charts, m: UK NA.2.17. From memory (M).
const OROGRAPHY_TO: f64 = 50.0;

/// What was read from the charts, and where.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Reading {
    /// Exposure factor c_e, Figure NA.7.
    pub c_e: f64,
    /// Distance to the shore upwind, km.
    pub shore_km: f64,
    /// The reading in a town; none in the country.
    pub town: Option<Town>,
}

/// What was read from the chart for towns.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Town {
    /// Exposure correction c_e,T, Figure NA.8.
    pub c_e_T: f64,
    /// Distance from the edge of the town upwind, km.
    pub into_km: f64,
}

/// Height at which the charts are read: `z - h_dis`, not below 2 m. UK NA.2.17.
///
/// # Errors
/// A height or displacement below nought.
pub fn reading_height(s: &mut Sheet, z: Length, h_dis: Length) -> Result<Length, Outside> {
    let clause = "UK NA.2.17";
    sensible(clause, "a height over ground", z > Length::ZERO)?;
    sensible("A.5(1)", "a displaced ground is never lowered", h_dis >= Length::ZERO)?;
    let source = "UK Figure NA.7, from memory, check against the standard (M)";
    given!(s, "least height of the charts", source, z_low = Length::new(LEAST_HEIGHT));
    calc!(s, clause, "height at which the charts are read", z_d = max(z - h_dis, z_low));
    Ok(z_d)
}

/// Peak velocity pressure by the charts: UK NA.2.17.
///
/// `q_p = c_e c_e,T q_b`, c_e,T in towns only, times `((c_o + 0.6)/1.6)^2` where orography counts.
/// `z_d` is the height of [`reading_height`].
///
/// # Errors
/// Orography above 50 m; `c_o` below 1; a reading that the charts cannot give.
pub fn peak_pressure_read(
    s: &mut Sheet,
    v_b: Speed,
    z: Length,
    z_d: Length,
    c_o: Num,
    rho: Density,
    reading: Reading,
) -> Result<Stress, Outside> {
    let clause = "UK NA.2.17";
    let measured = reading.shore_km >= 0.0 && reading.town.is_none_or(|t| t.into_km >= 0.0);
    sensible(clause, "distances to the shore and into the town not below nought", measured)?;
    sensible("4.3.3", "a hill does not slow the wind", c_o >= 1.0)?;
    calc!(s, "4.5(1) eq. 4.10", "basic velocity pressure", q_b = 0.5 * rho * sq(v_b));
    let at = metres(z_d).base();
    let source = format!("read from UK Figure NA.7 at {at:.1} m, {} km from the shore", reading.shore_km);
    given!(s, "exposure factor", &source, c_e = Num::new(reading.c_e));
    sensible(clause, "an exposure factor above nought", c_e > 0.0)?;
    let q_g = if let Some(town) = reading.town {
        let source = format!("read from UK Figure NA.8 at {at:.1} m, {} km into the town", town.into_km);
        given!(s, "correction in towns", &source, c_e_T = Num::new(town.c_e_T));
        sensible(clause, "a correction in towns above nought", c_e_T > 0.0)?;
        require!(s, ID, clause, "a town shelters and never exposes", c_e_T <= 1.0);
        calc!(s, clause, "peak velocity pressure on level ground, town", q_g = c_e * c_e_T * q_b);
        q_g
    } else {
        calc!(s, clause, "peak velocity pressure on level ground, country", q_g = c_e * q_b);
        q_g
    };
    if c_o > 1.0 {
        given!(
            s,
            "height to which the charts serve with orography",
            "UK NA.2.17, from memory, check against the standard (M)",
            z_o = Length::new(OROGRAPHY_TO * 1e3)
        );
        require!(s, ID, clause, "with orography, heights up to 50 m", z <= z_o);
        calc!(s, clause, "peak velocity pressure", q_p = q_g * sq((c_o + 0.6) / 1.6));
        return Ok(q_p);
    }
    calc!(s, clause, "peak velocity pressure", q_p = q_g);
    Ok(q_p)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::standards::en1991_1_4::air;

    fn of(z: f64, h_dis: f64, c_o: f64, reading: Reading) -> Result<f64, Outside> {
        let mut s = Sheet::recorder();
        given!(s, "", "", v_b = Speed::new(22e3));
        given!(s, "", "", z = Length::new(z * 1e3));
        given!(s, "", "", h_dis = Length::new(h_dis * 1e3));
        given!(s, "", "", c_o = Num::new(c_o));
        given!(s, "", "", rho = air(1.226));
        let z_d = reading_height(&mut s, z, h_dis)?;
        let q = peak_pressure_read(&mut s, v_b, z, z_d, c_o, rho, reading);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        q.map(|q| q.base() * 1e6)
    }

    fn country(c_e: f64) -> Reading {
        Reading { c_e, shore_km: 40.0, town: None }
    }

    fn town(c_e: f64, c_e_T: f64) -> Reading {
        Reading { c_e, shore_km: 40.0, town: Some(Town { c_e_T, into_km: 2.0 }) }
    }

    /// By hand: q_b = 0.613 x 22^2 = 296.7 N/m²; 2.1 in the country 623.05; 0.8 in the town 498.44.
    #[test]
    fn country_and_town_by_hand() {
        assert!((of(7.5, 0.0, 1.0, country(2.1)).unwrap() - 623.05).abs() < 0.01);
        assert!((of(7.5, 0.0, 1.0, town(2.1, 0.8)).unwrap() - 498.44).abs() < 0.01);
    }

    /// ((1.32 + 0.6)/1.6)^2 = 1.44.
    #[test]
    fn orography_by_hand_and_its_limit() {
        assert!((of(7.5, 0.0, 1.32, country(2.1)).unwrap() / 623.05 - 1.44).abs() < 1e-4);
        assert!(of(50.0, 0.0, 1.1, country(3.0)).is_ok());
        assert_eq!(of(50.1, 0.0, 1.1, country(3.0)).unwrap_err().clause, "UK NA.2.17");
        assert!(of(50.1, 0.0, 1.0, country(3.0)).is_ok());
    }

    #[test]
    fn the_charts_are_read_above_the_roofs_and_not_below_2_m() {
        let at = |z: f64, h_dis: f64| {
            let mut s = Sheet::silent();
            reading_height(&mut s, Length::new(z * 1e3), Length::new(h_dis * 1e3)).unwrap().base() / 1e3
        };
        assert!((at(7.5, 4.5) - 3.0).abs() < 1e-12);
        assert_eq!(at(5.0, 4.5), 2.0);
    }

    #[test]
    fn readings_that_no_chart_gives_are_refused() {
        for bad in [0.0, -1.0, f64::NAN] {
            assert!(of(7.5, 0.0, 1.0, country(bad)).is_err(), "{bad}");
            assert!(of(7.5, 0.0, 1.0, town(2.0, bad)).is_err(), "{bad}");
        }
        assert!(of(7.5, 0.0, 1.0, town(2.0, 1.01)).is_err());
        assert!(of(7.5, 0.0, 0.9, country(2.0)).is_err());
        assert!(of(7.5, -1.0, 1.0, country(2.0)).is_err());
        assert!(of(7.5, 0.0, 1.0, Reading { shore_km: f64::NAN, ..country(2.0) }).is_err());
    }
}
