//! Basic wind velocity: 4.2.

use crate::quantity::functions::{metres, pow};
use crate::quantity::{Length, Num, Speed};
use crate::trace::Sheet;
use crate::{calc, decide};

/// Basic wind velocity: 4.2(1) and (2)P, UK NA.2.4 to NA.2.7, altitude factor UK NA.2.5 at height z.
///
/// Where orography counts, `A` is the altitude of the foot of the hill (UK NA.2.5).
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

#[cfg(test)]
mod tests {
    use super::*;

    /// By hand: 22 m/s at 100 m above the sea, 20 m up: 1 + 0.1 x 0.5^0.2 = 1.08706, 23.915 m/s.
    #[test]
    fn altitude_counts_less_higher_up_and_meets_at_10_m() {
        let of = |z: f64| {
            let one = Num::new(1.0);
            let (v_map, A, z) = (Speed::new(22e3), Length::new(100e3), Length::new(z));
            basic_velocity(&mut Sheet::silent(), v_map, A, z, one, one, one).base() / 1e3
        };
        assert!((of(10e3) - 24.2).abs() < 1e-9);
        assert!((of(10_000.001) - of(10e3)).abs() < 1e-6);
        assert!((of(20e3) - 23.915).abs() < 5e-4);
    }
}
