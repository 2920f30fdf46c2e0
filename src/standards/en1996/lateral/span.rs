//! Moments per unit width of plates and of spans one way, and the pressure a leaf can take.

use crate::calc;
use crate::quantity::functions::sq;
use crate::quantity::{Force, Length, Num, Stress};
use crate::trace::Sheet;

/// Moments of a plate: about the bed joints per unit length, about the perpends per unit height.
#[derive(Clone, Copy, Debug)]
pub struct Moments {
    /// Failure parallel to the bed joints.
    pub M_Ed1: Force,
    /// Failure across them.
    pub M_Ed2: Force,
}

/// `M_Ed1 = mu alpha_2 W_Ed l²` and `M_Ed2 = alpha_2 W_Ed l²`: 5.5.5(7) eq. 5.17 and 5.18. All stand on the sheet.
pub fn plate(s: &mut Sheet, mu: Num, alpha_2: Num, W_Ed: Stress, l: Length) -> Moments {
    calc!(
        s,
        "5.5.5(7) eq. 5.17",
        "moment per unit length, failure parallel to the bed joints",
        M_Ed1 = mu * alpha_2 * W_Ed * sq(l)
    );
    calc!(
        s,
        "5.5.5(7) eq. 5.18",
        "moment per unit height, failure across the bed joints",
        M_Ed2 = alpha_2 * W_Ed * sq(l)
    );
    Moments { M_Ed1, M_Ed2 }
}

/// `W h²/8` between top and base, per unit length; continuity at either is not used. `W_Ed` and `h` stand on the sheet.
pub fn vertical(s: &mut Sheet, W_Ed: Stress, h: Length) -> Force {
    calc!(
        s,
        "statics",
        "moment per unit length, between top and base, both taken simple",
        M_Ed1 = W_Ed * sq(h) / 8.0
    );
    M_Ed1
}

/// `W l²/8` between the vertical edges, per unit height; continuity is not used. `W_Ed` and `l` stand on the sheet.
pub fn horizontal(s: &mut Sheet, W_Ed: Stress, l: Length) -> Force {
    calc!(
        s,
        "statics",
        "moment per unit height, between the vertical edges, both taken simple",
        M_Ed2 = W_Ed * sq(l) / 8.0
    );
    M_Ed2
}

/// `W h²/2` at the foot of a wall held there alone, per unit length. `W_Ed` and `h` stand on the sheet.
pub fn cantilever(s: &mut Sheet, W_Ed: Stress, h: Length) -> Force {
    calc!(s, "statics", "moment per unit length at the foot, nothing else held", M_Ed1 = W_Ed * sq(h) / 2.0);
    M_Ed1
}

#[cfg(test)]
mod tests {
    use super::*;

    /// By hand, 1 kN/m² on 3 m x 2 m: plate with alpha_2 0.05, mu 0.4: 0.45 and 0.18 kNm/m; upright 0.5;
    /// sideways 1.125; cantilever 2.0 kNm/m.
    #[test]
    fn moments_by_hand() {
        let mut s = Sheet::silent();
        let (w, l, h) = (Stress::new(1e-3), Length::new(3000.0), Length::new(2000.0));
        let m = plate(&mut s, Num::new(0.4), Num::new(0.05), w, l);
        let close = |force: Force, kNm: f64| (force.base() / 1e3 - kNm).abs() < 1e-12;
        assert!(close(m.M_Ed1, 0.18) && close(m.M_Ed2, 0.45));
        assert!(close(vertical(&mut s, w, h), 0.5));
        assert!(close(horizontal(&mut s, w, l), 1.125));
        assert!(close(cantilever(&mut s, w, h), 2.0));
    }
}
