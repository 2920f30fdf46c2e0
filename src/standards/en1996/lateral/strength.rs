//! What a leaf resists across its plane: 6.3.1.

use crate::calc;
use crate::quantity::functions::{min, sq};
use crate::quantity::{Area, Force, Length, LineLoad, Num, Stress, Weight};
use crate::trace::Sheet;

/// Compressive stress at mid-height that helps, before and after the cap.
#[derive(Clone, Copy, Debug)]
pub struct Precompression {
    /// As loaded.
    pub sigma_v: Stress,
    /// At most 0.2 f_d.
    pub sigma_d: Stress,
}

/// Stress at mid-height from dead load alone, times the helping factor, at most `0.2 f_d`.
///
/// 6.3.1(4). `gamma_h`, `G_a` (dead load per length on top of the leaf), `rho_m`, `t`, `h` and `f_d`
/// stand on the sheet.
pub fn precompression(
    s: &mut Sheet,
    gamma_h: Num,
    G_a: LineLoad,
    rho_m: Weight,
    t: Length,
    h: Length,
    f_d: Stress,
) -> Precompression {
    calc!(
        s,
        "statics",
        "dead load at mid-height, half the own weight added",
        G_m = G_a + rho_m * t * h / 2.0
    );
    calc!(s, "EN 1990 6.4.3.2", "helping stress of dead load", sigma_v = gamma_h * G_m / t);
    calc!(s, "6.3.1(4)", "the same, capped", sigma_d = min(sigma_v, 0.2 * f_d));
    Precompression { sigma_v, sigma_d }
}

/// Bending about the bed joints.
#[derive(Clone, Copy, Debug)]
pub struct Parallel {
    /// Design strength f_xd1, without precompression.
    pub f_xd1: Stress,
    /// Apparent design strength f_xd1,app.
    pub f_xd1_app: Stress,
    /// Section modulus per unit length.
    pub Z: Area,
    /// Resistance per unit length.
    pub M_Rd1: Force,
}

/// Resistance per unit length, failure parallel to the bed joints, on the actual thickness.
///
/// 6.3.1(3) eq. 6.15 and 6.3.1(4) eq. 6.16: `f_xd1,app = f_xk1/gamma_M + sigma_d`. `t`, `f_xk1`,
/// `gamma_Mf` and `sigma_d` stand on the sheet.
pub fn parallel(s: &mut Sheet, t: Length, f_xk1: Stress, gamma_Mf: Num, sigma_d: Stress) -> Parallel {
    calc!(s, "geometry", "section modulus per length", Z = sq(t) / 6.0);
    calc!(s, "2.4.1", "design strength, parallel", f_xd1 = f_xk1 / gamma_Mf);
    calc!(s, "6.3.1(4) eq. 6.16", "with precompression", f_xd1_app = f_xd1 + sigma_d);
    calc!(s, "6.3.1(3) eq. 6.15", "resistance, parallel", M_Rd1 = f_xd1_app * Z);
    Parallel { f_xd1, f_xd1_app, Z, M_Rd1 }
}

/// Bending about the perpends.
#[derive(Clone, Copy, Debug)]
pub struct Across {
    /// Design strength f_xd2.
    pub f_xd2: Stress,
    /// Resistance per unit height.
    pub M_Rd2: Force,
}

/// Resistance per unit height, failure across the bed joints: 6.3.1(3) eq. 6.15. `f_xk2`, `gamma_Mf`
/// and `Z` stand on the sheet.
pub fn across(s: &mut Sheet, f_xk2: Stress, gamma_Mf: Num, Z: Area) -> Across {
    calc!(s, "2.4.1", "design strength, across", f_xd2 = f_xk2 / gamma_Mf);
    calc!(s, "6.3.1(3) eq. 6.15", "resistance, across", M_Rd2 = f_xd2 * Z);
    Across { f_xd2, M_Rd2 }
}

/// Orthogonal ratio `mu = f_xd1,app / f_xd2`, not above 1: 5.5.5, Annex E. Both strengths stand on the sheet.
pub fn orthogonal_ratio(s: &mut Sheet, f_xd1_app: Stress, f_xd2: Stress) -> Num {
    let one = Num::new(1.0);
    crate::given!(s, "largest orthogonal ratio of the table", "Annex E", mu_max = one);
    calc!(s, "5.5.5, Annex E", "orthogonal ratio", mu = min(f_xd1_app / f_xd2, mu_max));
    mu
}

#[cfg(test)]
mod tests {
    use super::*;

    /// By hand: 10 kN/m on 100 mm, 20 kN/m³, 2.4 m: 10 + 20 x 0.1 x 1.2 = 12.4 kN/m; 0.9 x 12.4/100 = 0.1116
    /// N/mm²; f_d 0.5 caps it at 0.1.
    #[test]
    fn precompression_and_its_cap() {
        let at = |f_d: f64| {
            precompression(
                &mut Sheet::silent(),
                Num::new(0.9),
                LineLoad::new(10.0),
                Weight::new(20e-6),
                Length::new(100.0),
                Length::new(2400.0),
                Stress::new(f_d),
            )
        };
        assert!((at(2.0).sigma_d.base() - 0.1116).abs() < 1e-12);
        assert!((at(0.5).sigma_d.base() - 0.1).abs() < 1e-12);
        assert!((at(0.5).sigma_v.base() - 0.1116).abs() < 1e-12);
    }

    /// By hand: f_xk1 0.27, gamma_M 2.7, sigma_d 0.1: 0.1 + 0.1 = 0.2 N/mm²; t 120: Z = 2400; 0.48 kNm/m.
    /// f_xk2 1.08: 0.4 N/mm², 0.96 kNm/m; mu = 0.5, and 1 where the bed joint is the stronger.
    #[test]
    fn strengths_and_resistances() {
        let mut s = Sheet::silent();
        let (gamma, t) = (Num::new(2.7), Length::new(120.0));
        let p = parallel(&mut s, t, Stress::new(0.27), gamma, Stress::new(0.1));
        assert!((p.f_xd1_app.base() - 0.2).abs() < 1e-12 && (p.Z.base() - 2400.0).abs() < 1e-9);
        assert!((p.M_Rd1.base() - 480.0).abs() < 1e-9);
        let a = across(&mut s, Stress::new(1.08), gamma, p.Z);
        assert!((a.M_Rd2.base() - 960.0).abs() < 1e-9);
        assert!((orthogonal_ratio(&mut s, p.f_xd1_app, a.f_xd2).base() - 0.5).abs() < 1e-12);
        assert_eq!(orthogonal_ratio(&mut s, a.f_xd2, p.f_xd1_app), 1.0);
    }
}
