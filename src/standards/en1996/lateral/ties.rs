//! What wall ties pass from one leaf to the other: 6.5.

use crate::calc;
use crate::quantity::{Force, Num, PerArea, Stress};
use crate::trace::Sheet;

/// Least number of ties, per m²: 6.5, 8.5.2.2, UK; from memory, check against the standard.
pub const LEAST_PER_M2: f64 = 2.5;

/// Pressure that the ties can pass: `w_t = n_t F_d`, `F_d = F_k/gamma_Mt`.
///
/// 6.5, `n_t >= W_Ed/F_d` written as a resistance. `n_t`, `F_k` and `gamma_Mt` stand on the sheet.
pub fn transfer(s: &mut Sheet, n_t: PerArea, F_k: Force, gamma_Mt: Num) -> Stress {
    calc!(s, "2.4.1", "design strength of one tie", F_d = F_k / gamma_Mt);
    calc!(s, "6.5", "pressure that the ties can pass", w_t = n_t * F_d);
    w_t
}

#[cfg(test)]
mod tests {
    use super::*;

    /// By hand: 2.5 per m² of 1.8 kN with a factor of 3.0: 2.5 x 0.6 = 1.5 kN/m².
    #[test]
    fn ties_pass_their_number_times_their_strength() {
        let w = transfer(&mut Sheet::silent(), PerArea::new(2.5e-6), Force::new(1800.0), Num::new(3.0));
        assert!((w.base() * 1e3 - 1.5).abs() < 1e-12);
    }
}
