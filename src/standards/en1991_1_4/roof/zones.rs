//! Zones in bands across the wind: Figures 7.6 and 7.8b. From memory, check against the standard (H).

use super::super::{is_length, sensible};
use crate::calc;
use crate::quantity::functions::min;
use crate::quantity::{Area, Length};
use crate::trace::{Outside, Sheet};

/// e, which measures every zone: the lesser of b and 2h. Figures 7.6 to 7.8.
///
/// # Errors
/// A side not above nought.
pub fn measure(s: &mut Sheet, h: Length, b: Length, d: Length) -> Result<Length, Outside> {
    let clause = "7.2.3 to 7.2.5";
    sensible(clause, "a height", is_length(h))?;
    sensible(clause, "a breadth", is_length(b))?;
    sensible(clause, "a depth", is_length(d))?;
    calc!(s, "Figures 7.6 to 7.8", "measure of the zones", e = min(b, 2.0 * h));
    Ok(e)
}

/// Areas on plan of a roof whose zones lie in bands from its windward edge.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Bands {
    /// Both corners together.
    pub f: Area,
    /// Edge between them.
    pub g: Area,
    /// From e/10 to e/2.
    pub h: Area,
    /// Beyond e/2.
    pub i: Area,
}

/// F and G over e/10, F over e/4 at either end, H up to e/2, I beyond; each as far as the roof reaches.
pub fn bands(s: &mut Sheet, e: Length, b: Length, d: Length) -> Bands {
    let clause = "Figures 7.6 to 7.8";
    calc!(s, clause, "depth of the edge zones", d_e = min(e / 10.0, d));
    calc!(s, clause, "depth to the end of zone H", d_H = min(e / 2.0, d));
    calc!(s, clause, "area of zone F, both corners", A_F = e / 2.0 * d_e);
    calc!(s, clause, "area of zone G", A_G = (b - e / 2.0) * d_e);
    calc!(s, clause, "area of zone H", A_H = b * (d_H - d_e));
    calc!(s, clause, "area of zone I", A_I = b * (d - d_H));
    Bands { f: A_F, g: A_G, h: A_H, i: A_I }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::given;

    /// The hall of Steel Buildings in Europe, Single-Storey Steel Buildings, Part 3, Appendix B, wind on
    /// the gable: h 8, b 32, d 60 m, e 16 m; so e/10 1.6, e/4 4, e/2 8 m.
    #[test]
    fn bands_of_the_published_hall_and_of_short_roofs() {
        for (h, b, d) in [(8.0, 32.0, 60.0), (7.0, 9.0, 12.0), (9.0, 6.0, 2.0), (9.0, 9.0, 0.5)] {
            let mut s = Sheet::recorder();
            let m = |x: f64| Length::new(x * 1e3);
            given!(s, "", "", h = m(h));
            given!(s, "", "", b = m(b));
            given!(s, "", "", d = m(d));
            let e = measure(&mut s, h, b, d).unwrap();
            let z = bands(&mut s, e, b, d);
            assert!(s.faults.is_empty(), "{:?}", s.faults);
            let sum = (z.f + z.g + z.h + z.i).base();
            assert!((sum / (b * d).base() - 1.0).abs() < 1e-12);
            assert!([z.f, z.g, z.h, z.i].iter().all(|a| a.base() >= 0.0));
            if b == m(32.0) {
                assert_eq!(e, m(16.0));
                let parts = [z.f, z.g, z.h, z.i].map(|a| a.base() / 1e6);
                for (part, by_hand) in parts.iter().zip([12.8, 38.4, 204.8, 1664.0]) {
                    assert!((part - by_hand).abs() < 1e-9, "{parts:?}");
                }
            }
        }
    }
}
