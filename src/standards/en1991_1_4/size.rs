//! Size factor and dynamic factor: 6.1, 6.2.

use super::sensible;
use crate::quantity::functions::metres;
use crate::quantity::{Length, Num};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, require};

/// c_s c_d of a masonry building `h` high: 1.0, 6.2(1)a.
///
/// The UK annex parts the two: c_s of Table NA.3 is at most 1.0, so 1.0 is safe; c_d of Figure NA.9 is
/// 1.0 for low stiff buildings. From memory, check against the standard (M).
///
/// # Errors
/// 15 m and more (6.2(1)a, from memory, H), or no height.
pub fn size_and_dynamics(s: &mut Sheet, h: Length) -> Result<Num, Outside> {
    let clause = "6.2(1)a";
    sensible(clause, "a height", h > Length::ZERO)?;
    require!(s, "wind", clause, "buildings below 15 m", metres(h) < 15.0);
    let source = "UK NA.2.20, from memory, check against the standard (M)";
    given!(s, "size factor: Table NA.3 gives at most this", source, c_s = Num::new(1.0));
    given!(s, "dynamic factor: a low, stiff masonry building", source, c_d = Num::new(1.0));
    calc!(s, clause, "size and dynamic factor", c_sd = c_s * c_d);
    Ok(c_sd)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn one_below_15_m_and_refused_above() {
        let of = |h: f64| {
            let mut s = Sheet::recorder();
            given!(s, "", "", h = Length::new(h * 1e3));
            let out = size_and_dynamics(&mut s, h);
            assert!(s.faults.is_empty(), "{:?}", s.faults);
            out.map(Num::base)
        };
        assert_eq!(of(7.5).unwrap(), 1.0);
        assert_eq!(of(15.0).unwrap_err().clause, "6.2(1)a");
        assert!(of(0.0).is_err() && of(f64::NAN).is_err());
    }
}
