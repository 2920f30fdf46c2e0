//! Probability factor: 4.2(2)P note 4.

use super::sensible;
use crate::quantity::Num;
use crate::quantity::functions::{ln, pow};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, require};

/// Shape parameter and exponent: UK NA.2.8, as the EN recommends. From memory, check against the
/// standard (H).
const SHAPE: (f64, f64) = (0.2, 0.5);
/// Yearly probability that the map's wind is exceeded: 4.2(1)P. From memory (H).
const OF_THE_MAP: f64 = 0.02;

/// Probability factor c_prob for a yearly probability of exceedance `p`: 4.2(2)P note 4, eq. 4.2.
///
/// # Errors
/// `p` not above 0, or above 0.5: a return period below two years is in no table of EN 1991-1-6
/// (Table 3.1, from memory, M).
pub fn probability(s: &mut Sheet, p: Num) -> Result<Num, Outside> {
    let clause = "4.2(2)P note 4";
    given!(s, "yearly probability that the wind is exceeded", "job file", p);
    sensible(clause, "a yearly probability above nought", p > 0.0)?;
    require!(s, "wind", "EN 1991-1-6 Table 3.1", "a return period of two years and more", p <= 0.5);
    let source = "4.2(2)P note 4, UK NA, from memory, check against the standard (H)";
    given!(s, "shape parameter", source, K = Num::new(SHAPE.0));
    given!(s, "exponent", source, n = Num::new(SHAPE.1));
    given!(s, "yearly probability of the map's wind", source, p_map = Num::new(OF_THE_MAP));
    calc!(
        s,
        "4.2(2)P eq. 4.2",
        "probability factor",
        c_prob = pow((1.0 - K * ln(-ln(1.0 - p))) / (1.0 - K * ln(-ln(1.0 - p_map))), n)
    );
    Ok(c_prob)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn of(p: f64) -> Result<f64, Outside> {
        let mut s = Sheet::recorder();
        given!(s, "", "", p = Num::new(p));
        let c = probability(&mut s, p);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        c.map(Num::base)
    }

    #[test]
    fn the_probability_of_the_map_gives_one() {
        assert_eq!(of(0.02).unwrap(), 1.0);
    }

    /// By hand: ln(-ln 0.9) = -2.25037, ln(-ln 0.98) = -3.90194: sqrt(1.45007/1.78039) = 0.90249.
    #[test]
    fn ten_years_by_hand() {
        assert!((of(0.1).unwrap() - 0.90249).abs() < 1e-5);
    }

    #[test]
    fn rarer_wind_is_stronger() {
        let values: Vec<f64> = [0.5, 0.2, 0.1, 0.02, 0.01, 0.001].iter().map(|p| of(*p).unwrap()).collect();
        assert!(values.windows(2).all(|w| w[0] < w[1]), "{values:?}");
    }

    #[test]
    fn no_probability_is_refused() {
        for p in [0.0, -0.1, 0.51, 1.0, f64::NAN] {
            assert!(of(p).is_err(), "{p}");
        }
    }
}
