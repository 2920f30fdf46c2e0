//! What of the masonry is pressed: by the beam itself, or through a padstone. All of it is taken as
//! pressed evenly and centred on the load.

use super::site::Site;
use crate::building::Padstone;
use crate::quantity::functions::{abs, max, min};
use crate::quantity::{Area, Length, Stress};
use crate::trace::Sheet;
use crate::{calc, given};

/// The end of the beam.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Beam {
    /// Place of the load from the junction end, the middle of the bearing.
    pub x_c: Length,
    /// Length of the bearing along the wall.
    pub l_b: Length,
    /// Width across.
    pub w_b: Length,
}

impl Beam {
    /// The beam of the job file.
    pub fn of(site: &Site<'_>) -> Self {
        Self { x_c: site.load.at, l_b: site.bearing.length, w_b: site.bearing.width }
    }
}

/// A padstone as a seat needs it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Stone {
    /// Length along the wall.
    pub l_p: Length,
    /// Width across.
    pub w_p: Length,
    /// Height.
    pub h_p: Length,
    /// Cylinder strength of the concrete.
    pub f_ck: Stress,
}

/// A beam's end, directly on the masonry or on a padstone.
#[derive(Clone, Debug, PartialEq)]
pub struct Seat {
    /// The beam's end.
    pub beam: Beam,
    /// The padstone.
    pub stone: Option<Stone>,
}

/// What presses the masonry.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Pressed {
    /// Length along the wall, centred on the load.
    pub l_A: Length,
    /// Width across.
    pub w_A: Length,
    /// From the end of the wall to the nearer edge of the bearing or padstone.
    pub a_1: Length,
    /// Height of the masonry below.
    pub h_c: Length,
    /// Middle of the padstone from the junction end, where there is one.
    pub x_p: Option<Length>,
    /// Area of the padstone that the beam presses.
    pub A_0: Option<Area>,
}

impl Seat {
    /// The beam directly on the masonry.
    pub const fn bare(beam: Beam) -> Self {
        Self { beam, stone: None }
    }

    /// The beam on a padstone.
    ///
    /// # Errors
    /// Why it cannot lie there, in words.
    pub fn on(site: &Site<'_>, beam: Beam, p: &Padstone) -> Result<Self, &'static str> {
        if p.length > site.model.l {
            Err("longer than the return")
        } else if p.width > site.model.t {
            Err("wider than the leaf")
        } else if p.length < beam.l_b {
            Err("shorter than the bearing")
        } else if p.width < beam.w_b {
            Err("narrower than the bearing")
        } else if p.height >= site.bearing.level {
            Err("as high as the wall")
        } else {
            let stone = Stone { l_p: p.length, w_p: p.width, h_p: p.height, f_ck: p.strength };
            Ok(Self { beam, stone: Some(stone) })
        }
    }

    /// What presses the masonry; `x_c`, `e_c`, `l` and `t` stand on the sheet, `c_60` for a padstone.
    pub fn pressed(&self, s: &mut Sheet, site: &Site<'_>, c_60: crate::quantity::Num) -> Pressed {
        let Beam { x_c, l_b, w_b } = self.beam;
        let (l, t, e_c) = (site.model.l, site.model.t, site.e_c);
        given!(s, "bearing, along the wall", "job file", l_b);
        given!(s, "bearing, across", "job file", w_b);
        given!(s, "bearing above the foot", "job file", h_b = site.bearing.level);
        let Some(Stone { l_p, w_p, h_p, .. }) = self.stone else {
            calc!(s, "geometry", "length pressed", l_A = l_b);
            calc!(s, "geometry", "width pressed", w_A = min(w_b, t - 2.0 * e_c));
            calc!(s, "6.1.3(2)", "height of wall below", h_c = h_b);
            calc!(
                s,
                "6.1.3(2)",
                "nearer end to bearing",
                a_1 = max(min(x_c, l - x_c), l_b / 2.0) - l_b / 2.0
            );
            return Pressed { l_A, w_A, a_1, h_c, x_p: None, A_0: None };
        };
        given!(s, "padstone, along the wall", "list of padstones", l_p);
        given!(s, "padstone, across", "list of padstones", w_p);
        given!(s, "padstone, height", "list of padstones", h_p);
        calc!(s, "geometry", "middle of the padstone", x_p = max(min(x_c, l - l_p / 2.0), l_p / 2.0));
        calc!(s, "geometry", "load to its nearer end", s_p = l_p / 2.0 - abs(x_c - x_p));
        calc!(s, "6.1.3(6)", "length that counts", l_A = min(l_b + 2.0 * c_60 * h_p, 2.0 * s_p));
        calc!(s, "geometry", "load off its middle", e_p = e_c - min(e_c, (t - w_p) / 2.0));
        calc!(s, "6.1.3(6)", "width that counts", w_A = min(w_b + 2.0 * c_60 * h_p, w_p - 2.0 * e_p));
        calc!(s, "geometry", "area under the beam", A_0 = l_b * min(w_b, w_p - 2.0 * e_p));
        calc!(s, "6.1.3(2)", "height of wall below", h_c = h_b - h_p);
        calc!(s, "6.1.3(2)", "nearer end to padstone", a_1 = max(min(x_p, l - x_p), l_p / 2.0) - l_p / 2.0);
        Pressed { l_A, w_A, a_1, h_c, x_p: Some(x_p), A_0: Some(A_0) }
    }
}
