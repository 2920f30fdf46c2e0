//! Friction of the wind along walls and roof: 5.3(4), 7.5. From memory, check against the standard (H).

use super::{is_length, sensible};
use crate::quantity::functions::min;
use crate::quantity::{Length, Num, Stress};
use crate::trace::{Outside, Sheet};
use crate::{calc, decide, given};

/// c_fr of rough surfaces, among them brickwork and tiles laid flat: Table 7.10; ripples and ribs have twice as much.
pub const ROUGH: f64 = 0.02;

/// Surfaces of a building along and across the wind.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Surfaces {
    /// Height of the walls along the wind.
    pub h_along: Length,
    /// Height of the walls across it, no higher than they are anywhere.
    pub h_across: Length,
    /// Width of roof that lies along the wind, measured on the slope; nil where its slopes meet the wind.
    pub roof: Length,
}

/// Friction as a pressure on the walls across the wind: 7.5. Nought where 5.3(4) lets it be left out or where the
/// building is no longer than the part that 7.5(3) leaves out. `q_p`, the height `h`, the depth `d` along the wind and
/// the breadth `b` across it stand on the sheet.
///
/// # Errors
/// Lengths not above nought.
pub fn friction(
    s: &mut Sheet,
    q_p: Stress,
    (h, d, b): (Length, Length, Length),
    on: Surfaces,
) -> Result<Stress, Outside> {
    let clause = "7.5";
    sensible(
        clause,
        "lengths of the building",
        [h, d, b, on.h_along, on.h_across].into_iter().all(is_length),
    )?;
    given!(s, "height of the walls along the wind", "job file", h_al = on.h_along);
    given!(s, "of the walls across it", "job file", h_ac = on.h_across);
    given!(s, "roof that lies along the wind, on the slope", "job file", b_ro = on.roof);
    calc!(s, "5.3(4)", "surfaces along the wind", A_al = d * (2.0 * h_al + b_ro));
    calc!(s, "5.3(4)", "surfaces across it, front and back", A_ac = 2.0 * b * h_ac);
    let left_out = "friction is left out: at most four times";
    if decide!(s, "5.3(4)", left_out, "friction counts", A_al <= 4.0 * A_ac) {
        return Ok(Stress::ZERO);
    }
    calc!(s, "7.5(3)", "length that has no friction", d_0 = min(2.0 * b, 4.0 * h));
    if decide!(s, "7.5(3)", "no longer than that: no friction", "longer than that", d <= d_0) {
        return Ok(Stress::ZERO);
    }
    given!(
        s,
        "friction coefficient, rough surfaces",
        "Table 7.10, from memory, check against the standard (H)",
        c_fr = Num::new(ROUGH)
    );
    calc!(s, "7.5(3)", "area with friction", A_fr = (d - d_0) * (2.0 * h_al + b_ro));
    calc!(s, "7.5(1), 5.3", "friction as a pressure on the front", q_fr = c_fr * q_p * A_fr / (b * h_ac));
    Ok(q_fr)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn of(h: f64, d: f64, b: f64, on: (f64, f64, f64)) -> Result<f64, Outside> {
        let m = |x: f64| Length::new(x * 1e3);
        let mut s = Sheet::recorder();
        given!(s, "", "", q_p = Stress::new(0.8e-3));
        given!(s, "", "", h = m(h));
        given!(s, "", "", d = m(d));
        given!(s, "", "", b = m(b));
        let on = Surfaces { h_along: m(on.0), h_across: m(on.1), roof: m(on.2) };
        let out = friction(&mut s, q_p, (h, d, b), on).map(|q| q.base() * 1e3);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        out
    }

    /// A row 60 m long, 8 m broad, walls 5 m high, roof 10 m on the slope: 60 x 20 = 1200 m² against 4 x 80 = 320 m².
    /// The first 16 m have none; 44 x 20 = 880 m² x 0.02 x 0.8 = 14.08 kN on 40 m².
    #[test]
    fn by_hand() {
        assert!((of(7.5, 60.0, 8.0, (5.0, 5.0, 10.0)).unwrap() - 0.352).abs() < 1e-12);
    }

    #[test]
    fn a_house_has_none_and_a_longer_row_has_no_less() {
        assert_eq!(of(7.5, 9.0, 12.0, (7.5, 5.0, 0.0)).unwrap(), 0.0);
        // More than four times, and still no longer than 2 b.
        assert_eq!(of(7.5, 20.0, 10.0, (5.0, 2.0, 11.0)).unwrap(), 0.0);
        let mut last = 0.0;
        for d in [17.0, 20.0, 40.0, 80.0] {
            let q = of(7.5, d, 8.0, (5.0, 5.0, 10.0)).unwrap();
            assert!(q >= last, "{d}");
            last = q;
        }
        assert!(last > 0.0);
        assert!(
            of(0.0, 9.0, 9.0, (5.0, 5.0, 0.0)).is_err() && of(7.0, f64::NAN, 9.0, (5.0, 5.0, 0.0)).is_err()
        );
    }
}
