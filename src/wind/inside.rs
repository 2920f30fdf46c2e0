//! Internal pressure, with the opening that dominates left open or shut.

use super::walls::out;
use crate::building::{Side, Site};
use crate::calc;
use crate::given;
use crate::quantity::Num;
use crate::quantity::functions::{max, min};
use crate::standards::en1991_1_4 as wind;
use crate::standards::tables::walls::{Zone, c_pe};
use crate::trace::{Outside, Sheet};

/// What presses outward and what sucks inward the most, for wind onto one side.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Inside {
    /// c_pi.
    pub pressure: Num,
    /// c_si.
    pub suction: Num,
}

/// How a side lies to wind onto another.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Lies {
    /// It meets the wind.
    Windward,
    /// It is behind.
    Leeward,
    /// The wind goes along it.
    Aside,
}

/// How `side` lies to wind onto `onto`.
pub fn lies(side: Side, onto: Side) -> Lies {
    let opposite = |s: Side| match s {
        Side::Left => Side::Right,
        Side::Right => Side::Left,
        Side::Down => Side::Up,
        Side::Up => Side::Down,
    };
    if side == onto {
        Lies::Windward
    } else if opposite(side) == onto {
        Lies::Leeward
    } else {
        Lies::Aside
    }
}

/// Internal coefficients for wind onto `onto`; `r_hd` is h/d for it.
///
/// # Errors
/// [`Outside`] of Table 7.1, or where the opening does not dominate.
pub fn of(s: &mut Sheet, site: &Site, onto: Side, r_hd: f64) -> Result<Inside, Outside> {
    let usual = wind::no_dominant_face(&mut Sheet::silent());
    let Some(dominant) = &site.dominant else {
        given!(s, "internal pressure", "7.2.9(6)", c_pi = usual.pressure);
        given!(s, "internal suction", "7.2.9(6)", c_si = usual.suction);
        return Ok(Inside { pressure: c_pi, suction: c_si });
    };
    // A window takes its share of the wall: the coefficient of its zone; aside the highest suction, zone A.
    let zone = match lies(dominant.side, onto) {
        Lies::Windward => Zone::D,
        Lies::Leeward => Zone::E,
        Lies::Aside => Zone::A,
    };
    let at = c_pe(zone, r_hd, 10.0).map_err(out)?;
    let open = wind::dominant_face(s, dominant.area, dominant.others, Num::new(at.value))?;
    given!(s, "inside with the opening open", "above", c_io = open.pressure);
    given!(s, "internal pressure with it shut", "7.2.9(6)", c_p0 = usual.pressure);
    given!(s, "internal suction with it shut", "7.2.9(6)", c_s0 = usual.suction);
    calc!(s, "7.2.9(3), (5)", "internal pressure, open or shut", c_pi = max(c_io, c_p0));
    calc!(s, "7.2.9(3), (5)", "internal suction, open or shut", c_si = min(c_io, c_s0));
    Ok(Inside { pressure: c_pi, suction: c_si })
}
