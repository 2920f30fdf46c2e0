//! Flat roofs: 7.2.3, Table 7.2, Figure 7.6.

use super::{RoofWind, at, whose_values, zones};
use crate::quantity::{Length, LineLoad, Num, Stress};
use crate::standards::tables::roofs::{Roof, RoofZone, Sign};
use crate::trace::{Outside, Sheet};
use crate::{calc, lookup};

/// A flat roof with sharp eaves, -5 to 5 degrees: 7.2.3. Parapets and rounded eaves are gentler.
///
/// # Errors
/// A steeper roof, or sides not above nought.
pub fn flat(
    s: &mut Sheet,
    q_p: Stress,
    c_pi: Num,
    h: Length,
    b: Length,
    d: Length,
    pitch: f64,
) -> Result<RoofWind, Outside> {
    let look = |zone| at(Roof::Flat, zone, pitch, Sign::Suction);
    let (table, one) = ("Table 7.2", Num::new(1.0));
    let e = zones::measure(s, h, b, d)?;
    let zones::Bands { f: A_F, g: A_G, h: A_H, i: A_I } = zones::bands(s, e, b, d);
    lookup!(s, table, "zone F, suction", c_F_s = look(RoofZone::F)?, one);
    lookup!(s, table, "zone G, suction", c_G_s = look(RoofZone::G)?, one);
    lookup!(s, table, "zone H, suction", c_H_s = look(RoofZone::H)?, one);
    lookup!(s, table, "zone I, suction", c_I_s = look(RoofZone::I)?, one);
    calc!(
        s,
        "7.2.3",
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
    use crate::given;

    /// By hand: h 3, b 6, d 5 m: e 6; F 3 x 0.6 = 1.8, G 1.8, H 6 x 2.4 = 14.4, I 6 x 2 = 12 m²;
    /// 1.8 x 1.8 + 1.2 x 1.8 + 0.7 x 14.4 + 0.2 x 12 = 17.88 over 30 m² is 0.596; with 0.2 inside 0.796.
    #[test]
    fn by_hand() {
        let mut s = Sheet::recorder();
        given!(s, "", "", q_p = Stress::new(1e-3));
        given!(s, "", "", c_pi = Num::new(0.2));
        given!(s, "", "", h = Length::new(3e3));
        given!(s, "", "", b = Length::new(6e3));
        given!(s, "", "", d = Length::new(5e3));
        let wind = flat(&mut s, q_p, c_pi, h, b, d, 1.0).unwrap();
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        assert!((wind.uplift.base() * 1e3 - 0.796).abs() < 1e-9, "{wind:?}");
        assert!(flat(&mut s, q_p, c_pi, h, b, d, 10.0).is_err());
        assert!(flat(&mut s, q_p, c_pi, h, b, Length::ZERO, 1.0).is_err());
    }
}
