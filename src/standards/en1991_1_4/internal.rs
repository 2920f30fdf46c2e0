//! Internal pressure: 7.2.9. From memory, check against the standard (H).
//!
//! 7.2.9(2) is left to the engineer: a building with more than 30 % of openings on two sides or more is
//! a canopy or free-standing walls (7.3, 7.4). So is 7.2.9(3): a dominant opening that is shut in a storm
//! may count as shut, and open as an accident.

use super::sensible;
use crate::quantity::{Area, Num};
use crate::trace::{Outside, Sheet};
use crate::{calc, decide, given, require};

/// Coefficients of internal pressure; where they differ, the worse counts.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Internal {
    /// c_pi that presses outward the most.
    pub pressure: Num,
    /// c_pi that sucks inward the most.
    pub suction: Num,
}

/// Without a dominant face: +0.2 or -0.3, whichever is worse. 7.2.9(6) note 2.
pub fn no_dominant_face(s: &mut Sheet) -> Internal {
    given!(s, "internal pressure", "7.2.9(6)", c_pi = Num::new(0.2));
    given!(s, "internal suction", "7.2.9(6)", c_si = Num::new(-0.3));
    Internal { pressure: c_pi, suction: c_si }
}

/// With a dominant face: 7.2.9(5) eq. 7.2 and 7.3.
///
/// `A_op` is the area of openings in that face, `A_rest` in all others, `c_op` the external coefficient
/// at its openings (weighted by area where it differs): twice the rest 0.75 c_pe, three times and more
/// 0.90 c_pe, linear between.
///
/// # Errors
/// No opening, or fewer than twice the rest: no face is dominant, use [`no_dominant_face`].
pub fn dominant_face(s: &mut Sheet, A_op: Area, A_rest: Area, c_op: Num) -> Result<Internal, Outside> {
    let clause = "7.2.9(5)";
    sensible(clause, "an external coefficient that is a number", c_op.is_finite())?;
    sensible(clause, "openings in the face", A_op > Area::ZERO)?;
    sensible(clause, "openings elsewhere not below nought", A_rest >= Area::ZERO)?;
    given!(s, "openings in the dominant face", "job file", A_op);
    given!(s, "openings in all other faces", "job file", A_rest);
    given!(s, "external coefficient at the openings", "Table 7.1", c_op);
    require!(s, "wind", "7.2.9(4)", "openings at least twice those elsewhere", A_op >= 2.0 * A_rest);
    let k_i = if decide!(s, clause, "three times and more", "from two to three times", A_op >= 3.0 * A_rest) {
        given!(s, "share of the outer pressure", "7.2.9(5) eq. 7.3", k_i = Num::new(0.9));
        k_i
    } else {
        calc!(s, clause, "share of the outer pressure", k_i = 0.75 + 0.15 * (A_op / A_rest - 2.0));
        k_i
    };
    calc!(s, clause, "coefficient of internal pressure", c_pi = k_i * c_op);
    Ok(Internal { pressure: c_pi, suction: c_pi })
}

#[cfg(test)]
mod tests {
    use super::*;

    fn of(op: f64, rest: f64, c: f64) -> Result<f64, Outside> {
        let mut s = Sheet::recorder();
        given!(s, "", "", A_op = Area::new(op * 1e6));
        given!(s, "", "", A_rest = Area::new(rest * 1e6));
        given!(s, "", "", c_op = Num::new(c));
        let out = dominant_face(&mut s, A_op, A_rest, c_op);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        out.map(|i| {
            assert_eq!(i.pressure, i.suction);
            i.pressure.base()
        })
    }

    #[test]
    fn dominant_by_twice_by_three_times_and_between() {
        for c in [0.8, -0.5] {
            assert!((of(4.0, 2.0, c).unwrap() - 0.75 * c).abs() < 1e-12);
            assert!((of(5.0, 2.0, c).unwrap() - 0.825 * c).abs() < 1e-12);
            assert!((of(6.0, 2.0, c).unwrap() - 0.90 * c).abs() < 1e-12);
            assert!((of(6.0 - 1e-9, 2.0, c).unwrap() - 0.90 * c).abs() < 1e-9);
            assert_eq!(of(9.0, 0.0, c).unwrap(), 0.90 * c);
        }
    }

    #[test]
    fn no_dominance_is_an_outcome_of_its_own() {
        assert_eq!(of(3.9, 2.0, 0.8).unwrap_err().clause, "7.2.9(4)");
        assert!(of(0.0, 0.0, 0.8).is_err() && of(2.0, -1.0, 0.8).is_err());
        assert!(of(f64::NAN, 1.0, 0.8).is_err() && of(4.0, 1.0, f64::NAN).is_err());
    }

    #[test]
    fn without_dominance_both_signs_stand() {
        let mut s = Sheet::recorder();
        let i = no_dominant_face(&mut s);
        assert_eq!((i.pressure.base(), i.suction.base()), (0.2, -0.3));
        assert_eq!(s.entries.len(), 2);
    }
}
