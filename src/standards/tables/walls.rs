//! External pressure on the walls of a rectangular building.
//!
//! BS EN 1991-1-4:2005+A1:2010 with its UK National Annex, 7.2.2, Table 7.1 and Figure 7.5. From
//! memory (H); overall coefficients of the UK annex (M).

use std::fmt;

use super::interpolate::{number, place};
use crate::standards::source::{Confidence, Looked, OutOfTable, Source};

const SURE: Source = Source::memory(Confidence::High);
const FAIR: Source = Source::memory(Confidence::Medium);

/// A zone of Figure 7.5.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Zone {
    /// Side wall, at the windward corner.
    A,
    /// Side wall, next to A.
    B,
    /// Side wall, the rest.
    C,
    /// Windward wall.
    D,
    /// Leeward wall.
    E,
}

impl fmt::Display for Zone {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::A => "A",
            Self::B => "B",
            Self::C => "C",
            Self::D => "D",
            Self::E => "E",
        })
    }
}

/// Columns of [`C_PE_10`] and [`C_PE_1`]: height over depth along the wind, h/d.
pub const H_OVER_D: [f64; 3] = [0.25, 1.0, 5.0];
/// Table 7.1, c_pe,10, rows A to E. From memory (H).
pub const C_PE_10: [[f64; 3]; 5] =
    [[-1.2, -1.2, -1.2], [-0.8, -0.8, -0.8], [-0.5, -0.5, -0.5], [0.7, 0.8, 0.8], [-0.3, -0.5, -0.7]];
/// Table 7.1, c_pe,1, rows A to E. From memory (H).
pub const C_PE_1: [[f64; 3]; 5] =
    [[-1.4, -1.4, -1.4], [-1.1, -1.1, -1.1], [-0.5, -0.5, -0.5], [1.0, 1.0, 1.0], [-0.3, -0.5, -0.7]];
/// UK NA: net overall coefficient of windward and leeward walls, columns [`H_OVER_D`]. From memory
/// (M).
pub const NET_OVERALL: [f64; 3] = [0.8, 1.1, 1.3];

/// External pressure coefficient c_pe, no unit, positive towards the wall.
///
/// EN 1991-1-4 Table 7.1, linear in h/d between its columns; loaded area in m²: c_pe,1 up to 1 m²,
/// c_pe,10 from 10 m², `c_pe,1 - (c_pe,1 - c_pe,10) log10(A)` between (7.2.1). h/d below 0.25
/// counts as 0.25.
///
/// # Errors
/// h/d above 5 (force coefficients apply there), or figures not above nought.
pub fn c_pe(zone: Zone, h_over_d: f64, area: f64) -> Result<Looked<f64>, OutOfTable> {
    if !(area > 0.0 && area.is_finite()) {
        return Err(OutOfTable::new(format!("a loaded area of {area} m²"), "above 0 m²"));
    }
    let column = column(h_over_d)?;
    let row = zone as usize;
    let ten = column.of(|i| C_PE_10[row][i]);
    let one = column.of(|i| C_PE_1[row][i]);
    let share = area.clamp(1.0, 10.0).log10();
    Ok(Looked::new(one - (one - ten) * share, "EN 1991-1-4 Table 7.1", SURE)
        .row("zone", zone)
        .row("h/d", number(h_over_d))
        .row("loaded area", format!("{} m²", number(area)))
        .row("coefficient for 10 m²", number(ten))
        .row("for 1 m²", number(one)))
}

/// Net overall coefficient of windward and leeward walls together, no unit.
///
/// UK National Annex to EN 1991-1-4, 7.2.2. The three values are within 0.05 of 0.85 times
/// windward less leeward of Table 7.1, so the lack of correlation seems to be in them already: do
/// not apply [`lack_of_correlation`] on top until the annex has been read.
///
/// # Errors
/// h/d above 5, or not above nought.
pub fn net_overall(h_over_d: f64) -> Result<Looked<f64>, OutOfTable> {
    let value = column(h_over_d)?.of(|i| NET_OVERALL[i]);
    Ok(Looked::new(value, "UK NA to EN 1991-1-4, 7.2.2", FAIR).row("h/d", number(h_over_d)))
}

/// Factor for the lack of correlation between windward and leeward pressures, no unit.
///
/// EN 1991-1-4 7.2.2(3): 0.85 up to h/d of 1, 1.0 at 5, linear between. From memory (H).
///
/// # Errors
/// h/d above 5, or not above nought.
pub fn lack_of_correlation(h_over_d: f64) -> Result<Looked<f64>, OutOfTable> {
    let value = column(h_over_d)?.of(|i| [0.85, 0.85, 1.0][i]);
    Ok(Looked::new(value, "EN 1991-1-4 7.2.2(3)", SURE).row("h/d", number(h_over_d)))
}

fn column(h_over_d: f64) -> Result<super::interpolate::Place, OutOfTable> {
    let usable = h_over_d.is_finite() && h_over_d > 0.0;
    usable
        .then(|| place(&H_OVER_D, h_over_d.max(H_OVER_D[0])))
        .flatten()
        .ok_or_else(|| OutOfTable::new(format!("h/d of {}", number(h_over_d)), "above 0, up to 5"))
}

/// Lengths of the zones of a side wall along the wind, in the unit of the input.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SideZones {
    /// e: the lesser of b and 2 h.
    pub e: f64,
    /// Length of A.
    pub a: f64,
    /// Length of B.
    pub b: f64,
    /// Length of C.
    pub c: f64,
}

/// Zones of a side wall of depth `depth` along the wind; `breadth` across it, `height`.
///
/// EN 1991-1-4 Figure 7.5. All in one unit of length.
///
/// # Errors
/// Figures not above nought.
pub fn side_zones(height: f64, breadth: f64, depth: f64) -> Result<Looked<SideZones>, OutOfTable> {
    for (what, x) in [("height", height), ("breadth", breadth), ("depth", depth)] {
        if !(x > 0.0 && x.is_finite()) {
            return Err(OutOfTable::new(format!("a {what} of {x}"), "above 0"));
        }
    }
    let e = breadth.min(2.0 * height);
    let (a, b, c, row) = if e >= 5.0 * depth {
        (depth, 0.0, 0.0, "e at least 5 d: A alone")
    } else if e >= depth {
        (e / 5.0, depth - e / 5.0, 0.0, "e at least d: A and B")
    } else {
        (e / 5.0, 0.8 * e, depth - e, "e less than d: A, B and C")
    };
    Ok(Looked::new(SideZones { e, a, b, c }, "EN 1991-1-4 Figure 7.5", SURE).row("zones", row))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn coefficients_at_the_columns_and_between() {
        let of = |z, hd, area| c_pe(z, hd, area).unwrap().value;
        assert!((of(Zone::D, 1.0, 10.0) - 0.8).abs() < 1e-12);
        assert!((of(Zone::D, 0.1, 20.0) - 0.7).abs() < 1e-12);
        assert!((of(Zone::E, 3.0, 10.0) + 0.6).abs() < 1e-12);
        assert!((of(Zone::A, 0.5, 1.0) + 1.4).abs() < 1e-12);
        assert!((of(Zone::A, 0.5, 10.0_f64.sqrt()) + 1.3).abs() < 1e-12);
        assert!(c_pe(Zone::A, 5.1, 1.0).is_err());
        assert!(c_pe(Zone::A, 1.0, 0.0).is_err());
        assert!(c_pe(Zone::A, f64::NAN, 1.0).is_err());
    }

    #[test]
    fn overall_coefficients_grow_with_h_over_d() {
        let of = |hd| net_overall(hd).unwrap().value;
        assert!(of(0.25) < of(0.6) && of(0.6) < of(1.0) && of(1.0) < of(5.0));
        assert_eq!(of(0.1), of(0.25));
        for (i, net) in NET_OVERALL.iter().enumerate() {
            let sum = C_PE_10[Zone::D as usize][i] - C_PE_10[Zone::E as usize][i];
            assert!((net - 0.85 * sum).abs() <= 0.05 + 1e-12, "{net} against 0.85 x {sum}");
        }
        let factor = |hd| lack_of_correlation(hd).unwrap().value;
        assert_eq!((factor(0.3), factor(1.0), factor(5.0)), (0.85, 0.85, 1.0));
        assert!((factor(3.0) - 0.925).abs() < 1e-12);
    }

    #[test]
    fn zones_fill_the_depth() {
        for (h, b, d) in [(8.0, 32.0, 60.0), (8.0, 32.0, 10.0), (8.0, 32.0, 3.0), (5.0, 4.0, 4.0)] {
            let z = side_zones(h, b, d).unwrap().value;
            assert!((z.a + z.b + z.c - d).abs() < 1e-12, "{h} {b} {d}");
        }
    }
}
