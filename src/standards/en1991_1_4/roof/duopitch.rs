//! Duopitch roofs, both slopes alike: 7.2.5, Tables 7.4a and 7.4b, Figure 7.8.

use super::{RoofWind, at, whose_values, zones};
use crate::quantity::functions::min;
use crate::quantity::{Length, LineLoad, Num, Stress};
use crate::standards::tables::roofs::{Roof, RoofZone, Sign};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, lookup};

/// Wind on the eaves, 5 to 75 degrees: Table 7.4a. `d` goes over both slopes.
///
/// Each slope takes its least or its greatest values as a whole, whichever is worse (note to the table):
/// all suction for the uplift; pressure on the windward and suction on the lee slope for what goes along.
/// The rise of a slope is its length times the sine of the pitch, so it takes the pressure there.
///
/// # Errors
/// Another pitch, or sides not above nought.
pub fn duopitch_on_eaves(
    s: &mut Sheet,
    q_p: Stress,
    c_pi: Num,
    h: Length,
    b: Length,
    d: Length,
    pitch: f64,
) -> Result<RoofWind, Outside> {
    let look = |zone, sign| at(Roof::DuopitchEaves, zone, pitch, sign);
    let (table, figure, one) = ("Table 7.4a", "Figure 7.8", Num::new(1.0));
    lookup!(s, table, "zone F, suction", c_F_s = look(RoofZone::F, Sign::Suction)?, one);
    lookup!(s, table, "zone G, suction", c_G_s = look(RoofZone::G, Sign::Suction)?, one);
    lookup!(s, table, "zone H, suction", c_H_s = look(RoofZone::H, Sign::Suction)?, one);
    lookup!(s, table, "zone I, suction", c_I_s = look(RoofZone::I, Sign::Suction)?, one);
    lookup!(s, table, "zone J, suction", c_J_s = look(RoofZone::J, Sign::Suction)?, one);
    lookup!(s, table, "zone F, pressure", c_F_p = look(RoofZone::F, Sign::Pressure)?, one);
    lookup!(s, table, "zone G, pressure", c_G_p = look(RoofZone::G, Sign::Pressure)?, one);
    lookup!(s, table, "zone H, pressure", c_H_p = look(RoofZone::H, Sign::Pressure)?, one);
    let e = zones::measure(s, h, b, d)?;
    calc!(s, figure, "depth of the edge zones", d_e = min(e / 10.0, d / 2.0));
    calc!(s, figure, "area of zone F, both corners", A_F = e / 2.0 * d_e);
    calc!(s, figure, "area of zone G", A_G = (b - e / 2.0) * d_e);
    calc!(s, figure, "area of zone H, and of zone I", A_H = b * (d / 2.0 - d_e));
    calc!(s, figure, "area of zone J", A_J = b * d_e);
    calc!(s, figure, "area of a slope, on plan", A_sl = b * d / 2.0);
    calc!(
        s,
        table,
        "mean of the windward slope, suction",
        c_ws = (A_F * c_F_s + A_G * c_G_s + A_H * c_H_s) / A_sl
    );
    calc!(
        s,
        table,
        "mean of the windward slope, pressure",
        c_wp = (A_F * c_F_p + A_G * c_G_p + A_H * c_H_p) / A_sl
    );
    calc!(s, table, "mean of the lee slope, suction", c_ls = (A_H * c_I_s + A_J * c_J_s) / A_sl);
    calc!(s, "7.2.5", "mean of the whole roof", c_m = (c_ws + c_ls) / 2.0);
    calc!(s, "5.2, 7.2.9", "mean uplift, on plan", q_up = q_p * (c_pi - c_m));
    let rise = format!("tangent of the pitch of {pitch} degrees");
    given!(s, "rise over run of a slope", &rise, t_r = Num::new(pitch.to_radians().tan()));
    calc!(s, figure, "rise of the roof", h_r = t_r * d / 2.0);
    calc!(
        s,
        "5.3, 7.2.5",
        "along the wind, per length of ridge; the pressure inside is in balance",
        w_r = q_p * (c_wp - c_ls) * h_r
    );
    whose_values(s);
    Ok(RoofWind { uplift: q_up, along: w_r })
}

/// Wind on the gable, 5 to 75 degrees: Table 7.4b. `b` goes over both slopes, `d` along the ridge.
///
/// What the slopes push across the wind is in balance.
///
/// # Errors
/// Another pitch, or sides not above nought.
pub fn duopitch_on_gable(
    s: &mut Sheet,
    q_p: Stress,
    c_pi: Num,
    h: Length,
    b: Length,
    d: Length,
    pitch: f64,
) -> Result<RoofWind, Outside> {
    let look = |zone| at(Roof::DuopitchGable, zone, pitch, Sign::Suction);
    let (table, one) = ("Table 7.4b", Num::new(1.0));
    lookup!(s, table, "zone F, suction", c_F_s = look(RoofZone::F)?, one);
    lookup!(s, table, "zone G, suction", c_G_s = look(RoofZone::G)?, one);
    lookup!(s, table, "zone H, suction", c_H_s = look(RoofZone::H)?, one);
    lookup!(s, table, "zone I, suction", c_I_s = look(RoofZone::I)?, one);
    let e = zones::measure(s, h, b, d)?;
    let zones::Bands { f: A_F, g: A_G, h: A_H, i: A_I } = zones::bands(s, e, b, d);
    calc!(
        s,
        "7.2.5",
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

    /// Uplift and force along the wind in units of q_p, and of q_p times a metre.
    fn of(way: Way, h: f64, b: f64, d: f64, pitch: f64) -> Result<(f64, f64), Outside> {
        let mut s = Sheet::recorder();
        given!(s, "", "", q_p = Stress::new(1e-3));
        given!(s, "", "", c_pi = Num::new(0.2));
        given!(s, "", "", h = Length::new(h * 1e3));
        given!(s, "", "", b = Length::new(b * 1e3));
        given!(s, "", "", d = Length::new(d * 1e3));
        let wind = way(&mut s, q_p, c_pi, h, b, d, pitch);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        wind.map(|w| (w.uplift.base() * 1e3, w.along.base()))
    }

    /// By hand: h 7, b 10, d 8 m, 30 degrees: e 10; F 5, G 5, H = I 30, J 10 m² of 40 m² a slope.
    /// Windward suction (5 x 0.5 + 5 x 0.5 + 30 x 0.2)/40 = 0.275, pressure (10 x 0.7 + 30 x 0.4)/40 = 0.475;
    /// lee (30 x 0.4 + 10 x 0.5)/40 = 0.425. Uplift 0.35 + 0.2; along 0.9 x 4 m x 0.57735 = 2.07846.
    #[test]
    fn eaves_by_hand() {
        let (up, along) = of(duopitch_on_eaves, 7.0, 10.0, 8.0, 30.0).unwrap();
        assert!((up - 0.55).abs() < 1e-9, "{up}");
        assert!((along - 2.078_46).abs() < 1e-5, "{along}");
    }

    /// By hand: h 7, b 8, d 10 m, 30 degrees: e 8; F 4 x 0.8 = 3.2, G 3.2, H 8 x 3.2 = 25.6, I 48 m² of 80:
    /// (3.2 x 1.1 + 3.2 x 1.4 + 25.6 x 0.8 + 48 x 0.5)/80 = 0.656; with 0.2 inside 0.856.
    #[test]
    fn gable_by_hand() {
        let (up, along) = of(duopitch_on_gable, 7.0, 8.0, 10.0, 30.0).unwrap();
        assert!((up - 0.856).abs() < 1e-9, "{up}");
        assert_eq!(along, 0.0);
    }

    /// Uplift is no greater than the worst zone has it; what goes along never goes back.
    #[test]
    fn between_the_extremes() {
        for pitch in 5..=75 {
            for (h, b, d) in [(5.0, 4.0, 9.0), (8.0, 12.0, 7.0), (9.0, 30.0, 2.0)] {
                let (up, along) = of(duopitch_on_eaves, h, b, d, f64::from(pitch)).unwrap();
                assert!((-0.8..=1.9 + 1e-9).contains(&up), "{pitch} {up}");
                assert!(along >= 0.0, "{pitch} {along}");
                let (up, _) = of(duopitch_on_gable, h, b, d, f64::from(pitch)).unwrap();
                assert!((0.7 - 1e-9..=1.8 + 1e-9).contains(&up), "{pitch} {up}");
            }
        }
    }

    #[test]
    fn steeper_roofs_are_pushed_more() {
        let along = |pitch: i32| of(duopitch_on_eaves, 7.0, 10.0, 8.0, f64::from(pitch)).unwrap().1;
        assert!((15..75).all(|p| along(p) < along(p + 1)));
    }

    #[test]
    fn outside() {
        for way in [duopitch_on_eaves as Way, duopitch_on_gable] {
            assert!(of(way, 7.0, 10.0, 8.0, 4.0).is_err() && of(way, 7.0, 10.0, 8.0, 76.0).is_err());
            assert!(of(way, 7.0, 10.0, 8.0, f64::NAN).is_err() && of(way, 0.0, 10.0, 8.0, 30.0).is_err());
            assert!(of(way, 7.0, -1.0, 8.0, 30.0).is_err() && of(way, 7.0, 10.0, f64::NAN, 30.0).is_err());
        }
    }
}
