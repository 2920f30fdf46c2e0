//! How much of the wall it meets may act with a bonded return: 5.5.3.

use crate::calc;
use crate::quantity::Length;
use crate::quantity::functions::min;
use crate::trace::Sheet;

/// What limits a flange on one side of the return.
#[derive(Clone, Copy, Debug)]
pub struct Side {
    /// Distance to the end of the wall met, or to an opening in it.
    pub to_end: Length,
    /// Clear distance to the next shear wall, where there is one.
    pub to_next: Option<Length>,
}

/// Width of flange on the left side. `h_tot`, `h` and `t_f` stand on the sheet.
///
/// 5.5.3(3): the least of h_tot/5, half the clear distance to the next shear wall, the distance to the
/// end of the wall, half the clear height, and 6 times the thickness of the intersecting wall.
pub fn left(s: &mut Sheet, side: Side, h_tot: Length, h: Length, t_f: Length) -> Length {
    crate::given!(s, "distance to the end or an opening, left", "job file", c_L = side.to_end);
    if let Some(next) = side.to_next {
        crate::given!(s, "clear distance to the next shear wall, left", "job file", s_L = next);
        calc!(
            s,
            "5.5.3(3)",
            "flange on the left",
            b_L = min(min(h_tot / 5.0, s_L / 2.0), min(min(c_L, h / 2.0), 6.0 * t_f))
        );
        return b_L;
    }
    calc!(s, "5.5.3(3)", "flange on the left", b_L = min(h_tot / 5.0, min(min(c_L, h / 2.0), 6.0 * t_f)));
    b_L
}

/// Width of flange on the right side; as [`left`].
pub fn right(s: &mut Sheet, side: Side, h_tot: Length, h: Length, t_f: Length) -> Length {
    crate::given!(s, "distance to the end or an opening, right", "job file", c_R = side.to_end);
    if let Some(next) = side.to_next {
        crate::given!(s, "clear distance to the next shear wall, right", "job file", s_R = next);
        calc!(
            s,
            "5.5.3(3)",
            "flange on the right",
            b_R = min(min(h_tot / 5.0, s_R / 2.0), min(min(c_R, h / 2.0), 6.0 * t_f))
        );
        return b_R;
    }
    calc!(s, "5.5.3(3)", "flange on the right", b_R = min(h_tot / 5.0, min(min(c_R, h / 2.0), 6.0 * t_f)));
    b_R
}
