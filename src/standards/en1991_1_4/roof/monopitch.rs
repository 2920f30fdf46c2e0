//! Monopitch roofs: 7.2.4, Tables 7.3a and 7.3b, Figure 7.7.

use super::{RoofWind, at, whose_values, zones};
use crate::quantity::functions::min;
use crate::quantity::{Area, Length, LineLoad, Num, Stress};
use crate::standards::tables::roofs::{Roof, RoofZone, Sign};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, lookup};

/// Areas on plan with the wind on either eaves: F and G over e/10, H beyond.
fn areas(s: &mut Sheet, e: Length, b: Length, d: Length) -> (Area, Area, Area) {
    let figure = "Figure 7.7";
    calc!(s, figure, "depth of the edge zones", d_e = min(e / 10.0, d));
    calc!(s, figure, "area of zone F, both corners", A_F = e / 2.0 * d_e);
    calc!(s, figure, "area of zone G", A_G = (b - e / 2.0) * d_e);
    calc!(s, figure, "area of zone H", A_H = b * (d - d_e));
    (A_F, A_G, A_H)
}

/// Rise of the whole roof.
fn rise(s: &mut Sheet, d: Length, pitch: f64) -> Length {
    let source = format!("tangent of the pitch of {pitch} degrees");
    given!(s, "rise over run of a slope", &source, t_r = Num::new(pitch.to_radians().tan()));
    calc!(s, "Figure 7.7", "rise of the roof", h_r = t_r * d);
    h_r
}

/// Wind on the low eaves, 5 to 75 degrees: Table 7.3a, 0 degrees.
///
/// What goes along is that of the slope alone: the high wall behind it counts with the walls.
///
/// # Errors
/// Another pitch, or sides not above nought.
pub fn monopitch_on_low_eaves(
    s: &mut Sheet,
    q_p: Stress,
    c_pi: Num,
    h: Length,
    b: Length,
    d: Length,
    pitch: f64,
) -> Result<RoofWind, Outside> {
    let look = |zone, sign| at(Roof::MonopitchLow, zone, pitch, sign);
    let (table, one) = ("Table 7.3a", Num::new(1.0));
    lookup!(s, table, "zone F, suction", c_F_s = look(RoofZone::F, Sign::Suction)?, one);
    lookup!(s, table, "zone G, suction", c_G_s = look(RoofZone::G, Sign::Suction)?, one);
    lookup!(s, table, "zone H, suction", c_H_s = look(RoofZone::H, Sign::Suction)?, one);
    lookup!(s, table, "zone F, pressure", c_F_p = look(RoofZone::F, Sign::Pressure)?, one);
    lookup!(s, table, "zone G, pressure", c_G_p = look(RoofZone::G, Sign::Pressure)?, one);
    lookup!(s, table, "zone H, pressure", c_H_p = look(RoofZone::H, Sign::Pressure)?, one);
    let e = zones::measure(s, h, b, d)?;
    let (A_F, A_G, A_H) = areas(s, e, b, d);
    let clause = "7.2.4";
    calc!(s, clause, "mean of the whole roof", c_m = (A_F * c_F_s + A_G * c_G_s + A_H * c_H_s) / (b * d));
    calc!(s, clause, "the same, pressure", c_wp = (A_F * c_F_p + A_G * c_G_p + A_H * c_H_p) / (b * d));
    calc!(s, "5.2, 7.2.9", "mean uplift, on plan", q_up = q_p * (c_pi - c_m));
    let h_r = rise(s, d, pitch);
    calc!(s, "5.3, 7.2.4", "along the wind, per length of eaves", w_r = q_p * c_wp * h_r);
    whose_values(s);
    Ok(RoofWind { uplift: q_up, along: w_r })
}

/// Wind on the high eaves, 5 to 75 degrees: Table 7.3a, 180 degrees.
///
/// What goes along is the suction of the slope alone: the high wall before it counts with the walls.
///
/// # Errors
/// Another pitch, or sides not above nought.
pub fn monopitch_on_high_eaves(
    s: &mut Sheet,
    q_p: Stress,
    c_pi: Num,
    h: Length,
    b: Length,
    d: Length,
    pitch: f64,
) -> Result<RoofWind, Outside> {
    let look = |zone| at(Roof::MonopitchHigh, zone, pitch, Sign::Suction);
    let (table, one) = ("Table 7.3a", Num::new(1.0));
    lookup!(s, table, "zone F, suction", c_F_s = look(RoofZone::F)?, one);
    lookup!(s, table, "zone G, suction", c_G_s = look(RoofZone::G)?, one);
    lookup!(s, table, "zone H, suction", c_H_s = look(RoofZone::H)?, one);
    let e = zones::measure(s, h, b, d)?;
    let (A_F, A_G, A_H) = areas(s, e, b, d);
    let clause = "7.2.4";
    calc!(s, clause, "mean of the whole roof", c_m = (A_F * c_F_s + A_G * c_G_s + A_H * c_H_s) / (b * d));
    calc!(s, "5.2, 7.2.9", "mean uplift, on plan", q_up = q_p * (c_pi - c_m));
    let h_r = rise(s, d, pitch);
    calc!(s, "5.3, 7.2.4", "along the wind, per length of eaves", w_r = -(q_p * c_m * h_r));
    whose_values(s);
    Ok(RoofWind { uplift: q_up, along: w_r })
}

/// Wind on a sloping side, 5 to 75 degrees: Table 7.3b. `b` goes from low to high eaves.
///
/// What the slope pulls across the wind, towards the high eaves, is not given.
///
/// # Errors
/// Another pitch, or sides not above nought.
pub fn monopitch_on_side(
    s: &mut Sheet,
    q_p: Stress,
    c_pi: Num,
    h: Length,
    b: Length,
    d: Length,
    pitch: f64,
) -> Result<RoofWind, Outside> {
    let look = |zone| at(Roof::MonopitchSide, zone, pitch, Sign::Suction);
    let (table, one) = ("Table 7.3b", Num::new(1.0));
    lookup!(s, table, "zone F up, suction", c_F_up = look(RoofZone::FUp)?, one);
    lookup!(s, table, "zone F low, suction", c_F_low = look(RoofZone::FLow)?, one);
    lookup!(s, table, "zone G, suction", c_G_s = look(RoofZone::G)?, one);
    lookup!(s, table, "zone H, suction", c_H_s = look(RoofZone::H)?, one);
    lookup!(s, table, "zone I, suction", c_I_s = look(RoofZone::I)?, one);
    let e = zones::measure(s, h, b, d)?;
    let zones::Bands { f: A_F, g: A_G, h: A_H, i: A_I } = zones::bands(s, e, b, d);
    calc!(s, table, "zone F, mean of its two corners", c_F_s = (c_F_up + c_F_low) / 2.0);
    calc!(
        s,
        "7.2.4",
        "mean of the whole roof",
        c_m = (A_F * c_F_s + A_G * c_G_s + A_H * c_H_s + A_I * c_I_s) / (b * d)
    );
    calc!(s, "5.2, 7.2.9", "mean uplift, on plan", q_up = q_p * (c_pi - c_m));
    whose_values(s);
    Ok(RoofWind { uplift: q_up, along: LineLoad::ZERO })
}

#[cfg(test)]
mod tests {
    use super::*;

    type Way = fn(&mut Sheet, Stress, Num, Length, Length, Length, f64) -> Result<RoofWind, Outside>;
    const WAYS: [Way; 3] = [monopitch_on_low_eaves, monopitch_on_high_eaves, monopitch_on_side];

    /// A lean-to with h 4, b 6, d 3 m; uplift in units of q_p, along in q_p times a metre.
    fn of(way: Way, pitch: f64) -> Result<(f64, f64), Outside> {
        let mut s = Sheet::recorder();
        given!(s, "", "", q_p = Stress::new(1e-3));
        given!(s, "", "", c_pi = Num::new(0.2));
        given!(s, "", "", h = Length::new(4e3));
        given!(s, "", "", b = Length::new(6e3));
        given!(s, "", "", d = Length::new(3e3));
        let wind = way(&mut s, q_p, c_pi, h, b, d, pitch);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        wind.map(|w| (w.uplift.base() * 1e3, w.along.base()))
    }

    /// By hand at 15 degrees, e 6: F 1.8, G 1.8, H 14.4 of 18 m², so 0.1, 0.1, 0.8; rise 3 x 0.26795 m.
    /// Low: 0.09 + 0.08 + 0.24 = 0.41, pressure 0.2. High: 0.25 + 0.13 + 0.72 = 1.10.
    #[test]
    fn eaves_by_hand() {
        let (up, along) = of(monopitch_on_low_eaves, 15.0).unwrap();
        assert!((up - 0.61).abs() < 1e-9 && (along - 0.2 * 0.803_85).abs() < 1e-5, "{up} {along}");
        let (up, along) = of(monopitch_on_high_eaves, 15.0).unwrap();
        assert!((up - 1.30).abs() < 1e-9 && (along - 1.1 * 0.803_85).abs() < 1e-5, "{up} {along}");
    }

    /// By hand at 15 degrees, e 6, e/2 = d: no I; 0.1 x (2.4 + 1.6)/2 + 0.1 x 1.9 + 0.8 x 0.8 = 1.03.
    #[test]
    fn side_by_hand() {
        let (up, along) = of(monopitch_on_side, 15.0).unwrap();
        assert!((up - 1.23).abs() < 1e-9, "{up}");
        assert_eq!(along, 0.0);
    }

    #[test]
    fn outside_and_never_against_the_wind() {
        for way in WAYS {
            assert!(of(way, 4.9).is_err() && of(way, 75.1).is_err() && of(way, f64::NAN).is_err());
            assert!((5..=75).all(|p| of(way, f64::from(p)).unwrap().1 >= 0.0));
        }
    }
}
