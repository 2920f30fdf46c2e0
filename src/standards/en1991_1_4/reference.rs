//! Reference heights of the windward wall: 7.2.2(1), Figure 7.4. From memory, check against the
//! standard (H).

use super::{is_length, sensible};
use crate::quantity::{Length, Num, print};
use crate::trace::{Column, Outside, Sheet, Table};
use crate::{calc, decide, found};

/// A strip of the windward wall with one pressure.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Strip {
    /// Its lower edge over ground.
    pub from: Length,
    /// Its upper edge.
    pub to: Length,
    /// The height whose wind counts for it.
    pub z_e: Length,
}

/// The strips of a windward wall `h` high and `b` wide, lowest first: 7.2.2(1).
///
/// For the other walls the wind of the whole height counts (UK NA, from memory, M). Between the lowest
/// and the highest strip of a tall building the strips are as high as they may be and at most `b`: each
/// takes the wind of its own top.
///
/// # Errors
/// Height or breadth not above nought.
pub fn strips(s: &mut Sheet, h: Length, b: Length) -> Result<Vec<Strip>, Outside> {
    let clause = "7.2.2(1) Figure 7.4";
    sensible(clause, "a height", is_length(h))?;
    sensible(clause, "a breadth", is_length(b))?;
    let one = Strip { from: Length::ZERO, to: h, z_e: h };
    if decide!(s, clause, "one height for the whole wall", "in strips", h <= b) {
        return Ok(vec![one]);
    }
    let low = Strip { from: Length::ZERO, to: b, z_e: b };
    let out = if decide!(s, clause, "two strips", "more than two strips", h <= 2.0 * b) {
        vec![low, Strip { from: b, ..one }]
    } else {
        calc!(s, clause, "height between the lowest and the highest strip", h_mid = h - 2.0 * b);
        let count = (h_mid / b).base().ceil().max(1.0);
        found!(s, clause, "number of strips between, none higher than b", n_strip = Num::new(count));
        calc!(s, clause, "height of a strip between", h_strip = h_mid / n_strip);
        let edge = |i: f64| if i < count { b + h_strip * i } else { h - b };
        let mut out = vec![low];
        let mut i = 0.0;
        while i < count {
            out.push(Strip { from: edge(i), to: edge(i + 1.0), z_e: edge(i + 1.0) });
            i += 1.0;
        }
        out.push(Strip { from: h - b, ..one });
        out
    };
    s.table(|| table(&out));
    Ok(out)
}

fn table(strips: &[Strip]) -> Table {
    let show = |l: Length| print::show("z", l.dynamic()).value;
    Table {
        caption: "Strips of the windward wall, mm".to_owned(),
        columns: vec![
            Column::numbers("from"),
            Column::numbers("to"),
            Column { symbol: true, ..Column::numbers("z_e") },
        ],
        rows: strips.iter().map(|p| vec![show(p.from), show(p.to), show(p.z_e)]).collect(),
        strong: vec![],
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::given;

    fn of(h: f64, b: f64) -> Result<Vec<(f64, f64, f64)>, Outside> {
        let mut s = Sheet::recorder();
        given!(s, "", "", h = Length::new(h * 1e3));
        given!(s, "", "", b = Length::new(b * 1e3));
        let out = strips(&mut s, h, b);
        assert!(s.faults.is_empty(), "{:?}", s.faults);
        let m = |l: Length| l.base() / 1e3;
        out.map(|list| list.iter().map(|p| (m(p.from), m(p.to), m(p.z_e))).collect())
    }

    #[test]
    fn by_hand() {
        assert_eq!(of(8.0, 32.0).unwrap(), [(0.0, 8.0, 8.0)]);
        assert_eq!(of(8.0, 8.0).unwrap(), [(0.0, 8.0, 8.0)]);
        assert_eq!(of(12.0, 8.0).unwrap(), [(0.0, 8.0, 8.0), (8.0, 12.0, 12.0)]);
        assert_eq!(of(16.0, 8.0).unwrap(), [(0.0, 8.0, 8.0), (8.0, 16.0, 16.0)]);
        assert_eq!(
            of(20.0, 5.0).unwrap(),
            [(0.0, 5.0, 5.0), (5.0, 10.0, 10.0), (10.0, 15.0, 15.0), (15.0, 20.0, 20.0)]
        );
        assert_eq!(of(13.0, 5.0).unwrap(), [(0.0, 5.0, 5.0), (5.0, 8.0, 8.0), (8.0, 13.0, 13.0)]);
    }

    /// Strips fill the wall, none takes the wind of less than its top, and none between is above b.
    #[test]
    fn strips_fill_the_wall() {
        for (h, b) in [(3.0, 9.0), (9.0, 6.0), (9.0, 4.0), (17.3, 3.1), (40.0, 2.7)] {
            let list = of(h, b).unwrap();
            assert_eq!((list[0].0, list[list.len() - 1].1), (0.0, h));
            assert!(list.windows(2).all(|w| w[0].1 == w[1].0), "{list:?}");
            assert!(list.iter().all(|p| p.2 >= p.1 && p.1 > p.0), "{list:?}");
            if list.len() > 1 {
                assert!(list.iter().all(|p| p.1 - p.0 <= b + 1e-9), "{list:?}");
            }
        }
    }

    #[test]
    fn no_wall_is_refused() {
        assert!(
            of(0.0, 5.0).is_err()
                && of(5.0, 0.0).is_err()
                && of(f64::NAN, 5.0).is_err()
                && of(f64::INFINITY, 5.0).is_err()
        );
    }
}
