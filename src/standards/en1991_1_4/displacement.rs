//! Displacement height among closely spaced buildings: Annex A.5.

use super::sensible;
use crate::quantity::Length;
use crate::quantity::functions::min;
use crate::trace::{Outside, Sheet};
use crate::{calc, decide, given};

/// Displacement height h_dis: A.5(1). From memory, check against the standard (H).
///
/// `h_ave` is the average height of the buildings upwind, `x` the distance to them, `h` the height of
/// the building. It serves terrain category IV, in the UK towns; not further out.
///
/// # Errors
/// A length below nought, or no height at all.
pub fn displacement(s: &mut Sheet, h_ave: Length, x: Length, h: Length) -> Result<Length, Outside> {
    let clause = "A.5(1)";
    sensible(clause, "a building with a height", h > Length::ZERO)?;
    sensible(clause, "buildings upwind with a height", h_ave >= Length::ZERO)?;
    sensible(clause, "buildings upwind, none downwind", x >= Length::ZERO)?;
    given!(s, "average height of the buildings upwind", "job file", h_ave);
    given!(s, "distance to them", "job file", x);
    if decide!(s, clause, "close by", "further off", x <= 2.0 * h_ave) {
        calc!(s, clause, "displacement height", h_dis = min(0.8 * h_ave, 0.6 * h));
        return Ok(h_dis);
    }
    if decide!(s, clause, "within six heights", "beyond six heights: none", x < 6.0 * h_ave) {
        calc!(s, clause, "displacement height", h_dis = min(1.2 * h_ave - 0.2 * x, 0.6 * h));
        return Ok(h_dis);
    }
    given!(s, "displacement height", clause, h_dis = Length::ZERO);
    Ok(h_dis)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn of(h_ave: f64, x: f64, h: f64) -> Result<f64, Outside> {
        let mut s = Sheet::recorder();
        given!(s, "", "", h_ave = Length::new(h_ave * 1e3));
        given!(s, "", "", x = Length::new(x * 1e3));
        given!(s, "", "", h = Length::new(h * 1e3));
        let out = displacement(&mut s, h_ave, x, h);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        out.map(|l| l.base() / 1e3)
    }

    /// By hand: 6 m buildings 10 m off: 0.8 x 6 = 4.8, 0.6 x 7.5 = 4.5; 20 m off: 7.2 - 4 = 3.2.
    #[test]
    fn by_hand() {
        assert!((of(6.0, 10.0, 7.5).unwrap() - 4.5).abs() < 1e-12);
        assert!((of(6.0, 10.0, 9.0).unwrap() - 4.8).abs() < 1e-12);
        assert!((of(6.0, 20.0, 7.5).unwrap() - 3.2).abs() < 1e-12);
        assert_eq!(of(6.0, 36.0, 7.5).unwrap(), 0.0);
        assert_eq!(of(0.0, 0.0, 7.5).unwrap(), 0.0);
    }

    /// It falls with the distance, without a step, and never counts more than 0.6 of the height.
    #[test]
    fn falls_with_distance_without_a_step() {
        for h in [3.0, 7.5, 30.0] {
            let values: Vec<f64> = (0..=500).map(|i| of(6.0, f64::from(i) * 0.1, h).unwrap()).collect();
            for pair in values.windows(2) {
                assert!(pair[0] >= pair[1] && pair[0] - pair[1] <= 0.02 + 1e-9, "{pair:?}");
                assert!(pair[0] <= 0.6 * h + 1e-12 && pair[1] >= -1e-12);
            }
        }
    }

    #[test]
    fn higher_neighbours_displace_more() {
        for x in [0.0, 8.0, 15.0, 40.0] {
            let values: Vec<f64> = (0..20).map(|i| of(f64::from(i), x, 12.0).unwrap()).collect();
            assert!(values.windows(2).all(|w| w[0] <= w[1]), "{x}: {values:?}");
        }
    }

    #[test]
    fn lengths_below_nought_are_refused() {
        assert!(of(-1.0, 1.0, 7.0).is_err() && of(1.0, -1.0, 7.0).is_err() && of(1.0, 1.0, 0.0).is_err());
        assert!(of(f64::NAN, 1.0, 7.0).is_err() && of(1.0, f64::NAN, 7.0).is_err());
    }
}
