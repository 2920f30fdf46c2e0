//! Orography factor of isolated hills, ridges, cliffs and escarpments: Annex A.3.
//!
//! The form is from memory (H), the digits of the polynomials from memory (M). What speaks for the
//! digits: the formula downwind of cliffs meets the one of the crest within 0.033 over the whole range of
//! heights, though the two share no coefficient (a test holds that), and every digit agrees with a public
//! transcription by another hand.

mod location;

use super::sensible;
use crate::quantity::{Length, Num};
use crate::trace::{Outside, Sheet};
use crate::{calc, decide, given};

/// The shape of the ground.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Ground {
    /// Falls on every side.
    Hill,
    /// Falls on two sides.
    Ridge,
    /// Falls on one side, steeply.
    Cliff,
    /// Falls on one side.
    Escarpment,
}

impl Ground {
    /// Whether the ground falls again beyond the crest.
    pub const fn falls_again(self) -> bool {
        matches!(self, Self::Hill | Self::Ridge)
    }
}

/// The slope and the site on it: Figures A.2 and A.3.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Slope {
    /// What it is.
    pub ground: Ground,
    /// Height of the feature over the ground upwind, H.
    pub height: Length,
    /// Actual length of the upwind slope, L_u.
    pub upwind: Length,
    /// Actual length of the downwind slope, L_d; read for hills and ridges only.
    pub downwind: Length,
    /// Distance of the site from the crest, upwind negative, X.
    pub from_crest: Length,
}

/// Orography factor c_o at height `z`: A.3(1) to (3). `z` stands on the sheet; the slope is put there.
///
/// Whether a hill counts at all is read on the site: UK Figure NA.2, 4.3.3(2). It never slows the wind here.
///
/// # Errors
/// A slope without length, a height below nought, or figures that are no numbers.
pub fn orography(sheet: &mut Sheet, slope: Slope, z: Length) -> Result<Num, Outside> {
    let clause = "A.3";
    let lengths = [slope.height, slope.upwind, slope.from_crest, z];
    sensible(clause, "figures of the slope that are numbers", lengths.iter().all(|l| l.is_finite()))?;
    let source = "job file";
    given!(sheet, "height of the hill or cliff", source, H = slope.height);
    given!(sheet, "length of the upwind slope", source, L_u = slope.upwind);
    given!(sheet, "distance from the crest, upwind negative", source, X = slope.from_crest);
    sensible(clause, "a slope with a length", L_u > Length::ZERO)?;
    sensible(clause, "a height of the feature not below nought", H >= Length::ZERO)?;
    sensible(clause, "a height over ground not below nought", z >= Length::ZERO)?;
    calc!(sheet, "A.3(1)", "upwind slope", phi = H / L_u);
    if decide!(sheet, "A.3(1)", "level enough: no effect", "the slope counts", phi < 0.05) {
        given!(sheet, "orography factor", "A.3(1)", c_o = Num::new(1.0));
        return Ok(c_o);
    }
    let shallow = decide!(sheet, "A.3(1) Table A.2", "shallow", "steep", phi <= 0.3);
    let L_e = if shallow {
        calc!(sheet, "Table A.2", "effective length", L_e = L_u);
        L_e
    } else {
        calc!(sheet, "Table A.2", "effective length", L_e = H / 0.3);
        L_e
    };
    sheet.note("The coefficients of Annex A.3 are from memory, check against the standard (M).");
    let s = location::location(sheet, slope, X, L_u, L_e, z)?;
    if shallow {
        calc!(sheet, "A.3(1)", "orography factor", c_o = 1.0 + 2.0 * s * phi);
        return Ok(c_o);
    }
    calc!(sheet, "A.3(1)", "orography factor", c_o = 1.0 + 0.6 * s);
    Ok(c_o)
}

#[cfg(test)]
mod tests {
    use super::*;

    const KINDS: [Ground; 4] = [Ground::Hill, Ground::Ridge, Ground::Cliff, Ground::Escarpment];

    /// c_o of a feature of `h` m over `l` m, `x` m from the crest, `z` m up; L_d as long as L_u.
    fn of(ground: Ground, h: f64, l: f64, x: f64, z: f64) -> Result<f64, Outside> {
        let m = |x: f64| Length::new(x * 1e3);
        let mut s = Sheet::recorder();
        given!(s, "", "", z = m(z));
        let slope = Slope { ground, height: m(h), upwind: m(l), downwind: m(l), from_crest: m(x) };
        let c_o = orography(&mut s, slope, z);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        c_o.map(Num::base)
    }

    /// By hand at the crest, r = 0.5: A = 0.0097 - 0.10719 + 0.45333 - 0.95575 + 1.0124 = 0.41249.
    /// Slope 0.2: 1 + 2 x 0.41249 x 0.2; slope 0.5: L_e = 30/0.3 = 100 m, 1 + 0.6 x 0.41249.
    #[test]
    fn at_the_crest_by_hand() {
        for kind in KINDS {
            assert!((of(kind, 20.0, 100.0, 0.0, 50.0).unwrap() - 1.164_99).abs() < 2e-5);
            assert!((of(kind, 30.0, 60.0, 0.0, 50.0).unwrap() - 1.247_49).abs() < 2e-5);
        }
    }

    /// By hand, z = 10, L_e = 100: r = 0.1, log r = -1: A -0.0202, B -0.5213, C 0.355. At X = 100: s = C.
    #[test]
    fn behind_a_cliff_by_hand() {
        assert!((of(Ground::Cliff, 20.0, 100.0, 100.0, 10.0).unwrap() - 1.142).abs() < 1e-9);
        assert!((of(Ground::Cliff, 20.0, 100.0, 10.0, 10.0).unwrap() - (1.0 + 0.4 * 0.8561)).abs() < 1e-9);
    }

    /// By hand, r = 0.1, x = 0.5: A 0.83852; up B 2.54337, down B -1.66464.
    #[test]
    fn on_the_slopes_by_hand() {
        let up = 1.0 + 0.4 * 0.838_52 * (-0.5 * 2.543_37_f64).exp();
        let down = 1.0 + 0.4 * 0.838_52 * (-0.5 * 1.664_64_f64).exp();
        assert!((of(Ground::Ridge, 20.0, 100.0, -50.0, 10.0).unwrap() - up).abs() < 1e-5);
        assert!((of(Ground::Ridge, 20.0, 100.0, 50.0, 10.0).unwrap() - down).abs() < 1e-5);
    }

    #[test]
    fn never_below_one_and_never_much_above_the_crest() {
        for kind in KINDS {
            for slope in [0.05, 0.2, 0.3, 0.6] {
                for z in [0.0, 2.0, 8.0, 40.0, 90.0, 150.0] {
                    let at = |x: f64| of(kind, 100.0 * slope, 100.0, x, z).unwrap();
                    let crest = at(0.0);
                    // The formula behind cliffs rises above its crest by up to 0.054 in s.
                    let over =
                        if kind.falls_again() { 1e-12 } else { 0.054 * (2.0 * slope).min(0.6) + 1e-12 };
                    for i in -40..=90 {
                        let c = at(f64::from(i) * 5.0);
                        assert!((1.0..=crest + over).contains(&c), "{kind:?} {slope} {z} {i}: {c} {crest}");
                    }
                }
            }
        }
    }

    /// Upwind it grows towards the crest; behind a hill it falls away from it.
    #[test]
    fn grows_towards_the_crest() {
        let at = |x: i32| of(Ground::Hill, 20.0, 100.0, f64::from(x), 8.0).unwrap();
        assert!((-150..0).all(|x| at(x) < at(x + 1)));
        assert!((0..200).all(|x| at(x) > at(x + 1)));
    }

    /// Both formulas give A at X = 0, so there is no step; nor at a cliff, which is interpolated.
    #[test]
    fn no_step_at_the_crest() {
        for kind in KINDS {
            for z in [1.0, 8.0, 30.0, 120.0] {
                let at = |x: f64| of(kind, 25.0, 100.0, x, z).unwrap();
                assert!((at(-1e-6) - at(1e-6)).abs() < 1e-7, "{kind:?} {z}");
                assert!((at(10.0 - 1e-6) - at(10.0 + 1e-6)).abs() < 1e-7, "{kind:?} {z}");
            }
        }
    }

    #[test]
    fn falls_with_height_at_the_crest() {
        let at = |z: i32| of(Ground::Ridge, 20.0, 100.0, 0.0, f64::from(z)).unwrap();
        assert!((0..195).all(|z| at(z) > at(z + 1)));
        assert_eq!(at(201), 1.0);
    }

    /// The digits: behind a cliff the formula begins within 0.033 of the crest's, at every height.
    #[test]
    fn the_two_polynomials_meet() {
        for i in 10..=200 {
            let z = f64::from(i);
            let at = |x: f64| (of(Ground::Cliff, 30.0, 100.0, x, z).unwrap() - 1.0) / 0.6;
            assert!((at(0.0) - at(10.0)).abs() < 0.033, "{z}");
        }
    }

    #[test]
    fn shallow_meets_steep_and_level_ground_has_none() {
        let at = |h: f64| of(Ground::Hill, h, 100.0, -20.0, 8.0).unwrap();
        assert!((at(30.0 - 1e-7) - at(30.0 + 1e-7)).abs() < 1e-6);
        assert_eq!(at(4.99), 1.0);
        assert!(at(5.01) > 1.03);
    }

    #[test]
    fn beyond_the_reach_there_is_none() {
        for kind in KINDS {
            assert_eq!(of(kind, 20.0, 100.0, -151.0, 8.0).unwrap(), 1.0);
            let x = if kind.falls_again() { 201.0 } else { 351.0 };
            assert_eq!(of(kind, 20.0, 100.0, x, 8.0).unwrap(), 1.0);
        }
    }

    #[test]
    fn figures_that_are_no_slope_are_refused() {
        for (h, l, x, z) in [
            (20.0, 0.0, 0.0, 8.0),
            (-1.0, 100.0, 0.0, 8.0),
            (20.0, 100.0, 0.0, -1.0),
            (20.0, 100.0, f64::NAN, 8.0),
            (f64::NAN, 100.0, 0.0, 8.0),
            (20.0, f64::INFINITY, 0.0, 8.0),
        ] {
            assert!(of(Ground::Hill, h, l, x, z).is_err(), "{h} {l} {x} {z}");
        }
    }
}
