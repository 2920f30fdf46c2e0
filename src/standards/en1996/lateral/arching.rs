//! Walls arching between supports: 6.3.2.

use crate::quantity::functions::{MPA, sq};
use crate::quantity::{Length, LineLoad, Num, Stress};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, require};

/// What an arch resists and what its abutments must take.
#[derive(Clone, Copy, Debug)]
pub struct Arch {
    /// Design lateral resistance per area.
    pub q_lat_d: Stress,
    /// Design thrust per unit length on the abutments.
    pub N_ad: LineLoad,
}

/// Greatest l_a/t.
const SLENDERNESS: f64 = 20.0;

/// Lateral resistance `q_lat,d = f_d (t/l_a)²`, thrust `N_ad = 1.5 f_d t/10`, rise `0.9 t - d_a`.
///
/// 6.3.2(4) and (5), from memory, check against the standard. `f_d` (in the direction of the thrust), `t`,
/// `l_a` and `sigma_v` (stress from vertical dead load that helps) stand on the sheet.
///
/// # Errors
/// [`Outside`] where l_a/t is above 20 or sigma_v below 0.1 N/mm².
pub fn resistance(
    s: &mut Sheet,
    id: &str,
    f_d: Stress,
    t: Length,
    l_a: Length,
    sigma_v: Stress,
) -> Result<Arch, Outside> {
    given!(s, "greatest slenderness of an arch", "6.3.2(5)", lambda_max = Num::new(SLENDERNESS));
    require!(s, id, "6.3.2(5)", "slenderness of an arch, l_a/t of at most 20", l_a / t <= lambda_max);
    require!(
        s,
        id,
        "6.3.2(5)",
        "stress from vertical load of at least 0.1 N/mm² in an arching wall",
        sigma_v >= 0.1 * MPA
    );
    given!(s, "deflection of the arch, nil up to a slenderness of 25", "6.3.2(4)", d_a = Length::ZERO);
    calc!(s, "6.3.2(4)", "rise of the arch", r = 0.9 * t - d_a);
    calc!(s, "6.3.2(5)", "thrust per unit length that the abutments must take", N_ad = 1.5 * f_d * t / 10.0);
    calc!(
        s,
        "first principles",
        "what this thrust would resist at this rise, for comparison",
        q_arch = 8.0 * N_ad * r / sq(l_a)
    );
    calc!(s, "6.3.2(5)", "design lateral resistance", q_lat_d = f_d * sq(t / l_a));
    Ok(Arch { q_lat_d, N_ad })
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Identity of 6.3.2 by hand (derived, no published number): f_d 1.0 N/mm², t 102.5 mm:
    /// N_ad = 1.5 x 1.0 x 102.5/10 = 15.375 kN/m. At l_a 2000: (102.5/2000)² = 2.6266 kN/m².
    #[test]
    fn an_arch_by_hand_and_its_limits() {
        let arch = |l_a: f64, sigma: f64| {
            resistance(
                &mut Sheet::silent(),
                "arching",
                Stress::new(1.0),
                Length::new(102.5),
                Length::new(l_a),
                Stress::new(sigma),
            )
        };
        let a = arch(2000.0, 0.1).expect("19.5 is within 20");
        assert!((a.N_ad.base() - 15.375).abs() < 1e-12, "N/mm is kN/m");
        assert!((a.q_lat_d.base() * 1e3 - 2.626_562_5).abs() < 1e-9);
        // l_a 2500: 24.4 t, which the same formula would give 1.681 kN/m²: refused.
        let o = arch(2500.0, 0.5).expect_err("24.4 is above 20");
        assert_eq!(o.clause, "6.3.2(5)");
        assert!(arch(2000.0, 0.099).is_err(), "too little vertical stress");
        assert!(arch(2050.0, 0.1).is_ok(), "l_a/t of exactly 20");
    }
}
