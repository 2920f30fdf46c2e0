//! EN 1991-1-4, clause 4 with a terrain category, and the walls of Table 7.1.

use crate::quantity::functions::{KG_M3, ln, max, metres, pow, sq};
use crate::quantity::{Density, Length, Num, Speed, Stress};
use crate::trace::Sheet;
use crate::{calc, decide, given};

/// The edition every sheet prints.
pub const EDITION: &str = "BS EN 1991-1-4:2005+A1:2010 with UK National Annex";

/// Basic wind velocity: 4.2(1) and (2)P, UK NA.2.4 to NA.2.7, altitude factor UK NA.2.5 at height z.
pub fn basic_velocity(
    s: &mut Sheet,
    v_map: Speed,
    A: Length,
    z: Length,
    c_dir: Num,
    c_season: Num,
    c_prob: Num,
) -> Speed {
    let low = decide!(s, "UK NA.2.5", "eq. NA.2a", "eq. NA.2b", metres(z) <= 10.0);
    let c_alt = if low {
        calc!(s, "UK NA.2.5, eq. NA.2a", "altitude factor, A in m", c_alt = 1.0 + 0.001 * metres(A));
        c_alt
    } else {
        calc!(
            s,
            "UK NA.2.5, eq. NA.2b",
            "altitude factor, A and z in m",
            c_alt = 1.0 + 0.001 * metres(A) * pow(10.0 / metres(z), 0.2)
        );
        c_alt
    };
    calc!(s, "UK NA.2.4, eq. NA.1", "fundamental basic velocity", v_b0 = c_alt * v_map);
    calc!(s, "4.2(2)P eq. 4.1", "basic wind velocity", v_b = c_dir * c_season * c_prob * v_b0);
    v_b
}

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
    given!(s, "roughness length of category II", "4.3.2(1)", z_II = Length::new(50.0));
    calc!(s, "4.3.2(1) eq. 4.5", "terrain factor", k_r = 0.19 * pow(z_0 / z_II, 0.07));
    calc!(s, "4.3.2(1)", "height that counts", z_e = max(z, z_min));
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

    /// Steel Buildings in Europe, Single-Storey Steel Buildings, Part 3, Appendix B, sheets 2 and 3 of
    /// 11: v_b 26 m/s, rho 1.25, terrain III, z 8 m: q_p 659 N/m² with each step rounded as printed; the
    /// unrounded chain is 0.4 % higher, so 0.5 % is accepted.
    #[test]
    fn peak_pressure_of_the_published_hall() {
        let mut s = Sheet::silent();
        let m = |x: f64| Length::new(x * 1e3);
        let q = peak_pressure(&mut s, Speed::new(26e3), m(8.0), m(0.3), m(5.0), Num::new(1.0), air(1.25));
        assert!((q.base() * 1e6 / 659.0 - 1.0).abs() < 0.005, "{}", q.base() * 1e6);
    }
}
