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
    calc!(s, "EN 1990 6.4.3.2", "stress from dead load that helps", sigma_v = gamma_h * G_m / t);
    calc!(s, "6.3.1(4)", "the same, at most 0.2 f_d", sigma_d = min(sigma_v, 0.2 * f_d));
    Precompression { sigma_v, sigma_d }
}

/// Bending about the bed joints.
#[derive(Clone, Copy, Debug)]
pub struct Parallel {
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
    calc!(s, "geometry", "section modulus per unit length, actual thickness", Z = sq(t) / 6.0);
    calc!(s, "2.4.1", "design strength, failure parallel to the bed joints", f_xd1 = f_xk1 / gamma_Mf);
    calc!(s, "6.3.1(4) eq. 6.16", "the same with precompression", f_xd1_app = f_xd1 + sigma_d);
    calc!(s, "6.3.1(3) eq. 6.15", "resistance per unit length, parallel", M_Rd1 = f_xd1_app * Z);
    Parallel { f_xd1_app, Z, M_Rd1 }
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
    calc!(s, "2.4.1", "design strength, failure across the bed joints", f_xd2 = f_xk2 / gamma_Mf);
    calc!(s, "6.3.1(3) eq. 6.15", "resistance per unit height, across", M_Rd2 = f_xd2 * Z);
    Across { f_xd2, M_Rd2 }
}

/// Orthogonal ratio `mu = f_xd1,app / f_xd2`, not above 1: 5.5.5, Annex E. Both strengths stand on the sheet.
pub fn orthogonal_ratio(s: &mut Sheet, f_xd1_app: Stress, f_xd2: Stress) -> Num {
    let one = Num::new(1.0);
    crate::given!(s, "largest orthogonal ratio of the table", "Annex E", mu_max = one);
    calc!(s, "5.5.5, Annex E", "orthogonal ratio", mu = min(f_xd1_app / f_xd2, mu_max));
    mu
}
