//! Peak velocity pressure with a terrain category: 4.3 to 4.5, with a displaced ground A.5.
//!
//! This is the text of the EN; the UK National Annex uses charts instead (`charts.rs`).

use super::sensible;
use crate::quantity::functions::{KG_M3, ln, max, metres, pow, sq};
use crate::quantity::{Density, Length, Num, Speed, Stress};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, require};

/// Peak velocity pressure by clause 4 with a terrain category: 4.3.1 to 4.5.
///
/// `z_0`, `z_min` of Table 4.1; below z_min the wind of z_min counts. This is the text of the EN; the
/// UK National Annex uses charts instead. `rho` is a national value.
pub fn peak_pressure(
    s: &mut Sheet,
    v_b: Speed,
    z: Length,
    z_0: Length,
    z_min: Length,
    c_o: Num,
    rho: Density,
) -> Stress {
    let k_r = terrain_factor(s, z_0);
    calc!(s, "4.3.2(1)", "height that counts", z_e = max(z, z_min));
    from_height(s, v_b, z_e, z_0, k_r, c_o, rho)
}

/// As [`peak_pressure`], with the ground raised by `h_dis` among close buildings: Annex A.5.
///
/// # Errors
/// `h_dis` in another terrain than category IV (A.5(1), from memory, M); a negative `h_dis`; `c_o`
/// below 1; heights above 200 m (4.3.2(1), from memory, H).
pub fn peak_pressure_displaced(
    s: &mut Sheet,
    v_b: Speed,
    z: Length,
    h_dis: Length,
    z_0: Length,
    z_min: Length,
    c_o: Num,
    rho: Density,
) -> Result<Stress, Outside> {
    let id = "wind";
    require!(s, id, "4.3.2(1)", "heights up to 200 m", metres(z) <= 200.0);
    sensible("4.3.3", "a hill does not slow the wind", c_o >= 1.0)?;
    sensible("A.5(1)", "a displaced ground is never lowered", h_dis >= Length::ZERO)?;
    if metres(h_dis) > 0.0 {
        require!(s, id, "A.5(1)", "displaced ground in terrain category IV only", metres(z_0) >= 1.0);
    }
    let k_r = terrain_factor(s, z_0);
    calc!(s, "A.5(1), 4.3.2(1)", "height that counts", z_e = max(z - h_dis, z_min));
    Ok(from_height(s, v_b, z_e, z_0, k_r, c_o, rho))
}

fn terrain_factor(s: &mut Sheet, z_0: Length) -> Num {
    given!(s, "roughness length of category II", "4.3.2(1)", z_II = Length::new(50.0));
    calc!(s, "4.3.2(1) eq. 4.5", "terrain factor", k_r = 0.19 * pow(z_0 / z_II, 0.07));
    k_r
}

fn from_height(
    s: &mut Sheet,
    v_b: Speed,
    z_e: Length,
    z_0: Length,
    k_r: Num,
    c_o: Num,
    rho: Density,
) -> Stress {
    calc!(s, "4.3.2(1) eq. 4.4", "roughness factor", c_r = k_r * ln(z_e / z_0));
    calc!(s, "4.3.1(1) eq. 4.3", "mean wind velocity", v_m = c_r * c_o * v_b);
    calc!(s, "4.4(1) eq. 4.7", "turbulence intensity", I_v = 1.0 / (c_o * ln(z_e / z_0)));
    calc!(s, "4.5(1) eq. 4.8", "peak velocity pressure", q_p = (1.0 + 7.0 * I_v) * 0.5 * rho * sq(v_m));
    q_p
}

/// Density of air from the national value in kg/m³.
pub fn air(kg_m3: f64) -> Density {
    kg_m3 * KG_M3
}

#[cfg(test)]
mod tests {
    use super::*;

    fn m(x: f64) -> Length {
        Length::new(x * 1e3)
    }

    /// Steel Buildings in Europe, Single-Storey Steel Buildings, Part 3, Appendix B, sheets 2 and 3 of
    /// 11: v_b 26 m/s, rho 1.25, terrain III, z 8 m: q_p 659 N/m² with each step rounded as printed; the
    /// unrounded chain is 0.4 % higher, so 0.5 % is accepted.
    #[test]
    fn peak_pressure_of_the_published_hall() {
        let mut s = Sheet::silent();
        let q = peak_pressure(&mut s, Speed::new(26e3), m(8.0), m(0.3), m(5.0), Num::new(1.0), air(1.25));
        assert!((q.base() * 1e6 / 659.0 - 1.0).abs() < 0.005, "{}", q.base() * 1e6);
    }

    fn displaced(z: f64, h_dis: f64, z_0: f64, c_o: f64) -> Result<f64, Outside> {
        let mut s = Sheet::recorder();
        given!(s, "", "", v_b = Speed::new(26e3));
        given!(s, "", "", z = m(z));
        given!(s, "", "", h_dis = m(h_dis));
        given!(s, "", "", z_0 = m(z_0));
        given!(s, "", "", z_min = m(if metres(z_0) >= 1.0 { 10.0 } else { 5.0 }));
        given!(s, "", "", c_o = Num::new(c_o));
        given!(s, "", "", rho = air(1.226));
        let q = peak_pressure_displaced(&mut s, v_b, z, h_dis, z_0, z_min, c_o, rho);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        q.map(|q| q.base() * 1e6)
    }

    /// The same wind blows at z over displaced ground as at z - h_dis over the plain, never below z_min.
    #[test]
    fn displaced_ground_is_a_shift_of_height() {
        assert_eq!(displaced(20.0, 6.0, 1.0, 1.0).unwrap(), displaced(14.0, 0.0, 1.0, 1.0).unwrap());
        assert_eq!(displaced(12.0, 6.0, 1.0, 1.0).unwrap(), displaced(10.0, 0.0, 1.0, 1.0).unwrap());
        assert!(displaced(20.0, 6.0, 1.0, 1.0).unwrap() < displaced(20.0, 0.0, 1.0, 1.0).unwrap());
    }

    #[test]
    fn without_displacement_it_is_the_plain_route() {
        let c_o = Num::new(1.2);
        let plain =
            peak_pressure(&mut Sheet::silent(), Speed::new(26e3), m(8.0), m(0.3), m(5.0), c_o, air(1.226));
        assert_eq!(displaced(8.0, 0.0, 0.3, 1.2).unwrap(), plain.base() * 1e6);
    }

    #[test]
    fn displacement_is_refused_where_the_annex_does_not_give_it() {
        assert_eq!(displaced(8.0, 3.0, 0.3, 1.0).unwrap_err().clause, "A.5(1)");
        assert!(displaced(8.0, -1.0, 1.0, 1.0).is_err());
        assert!(displaced(8.0, f64::NAN, 1.0, 1.0).is_err());
        assert!(displaced(201.0, 0.0, 1.0, 1.0).is_err());
        assert!(displaced(8.0, 0.0, 0.3, 0.9).is_err());
    }
}
