//! Sections in compression that cannot take tension: 6.2(2) for the compressed length, the rest first
//! principles, and said so on the sheet.
//!
//! A section is one or two rectangles in a row, measured from the toe (the edge pressed hardest):
//! width `b_1` over the depth `d_1`, then width `b_2` to the full depth `L_s`. A plain return has
//! `d_1 = L_s = l`. The resultant N acts at the distance `a` from the toe.

use crate::quantity::functions::{cube, max, min, sq, sqrt};
use crate::quantity::{Area, Force, Length, Stress};
use crate::solve::root;
use crate::trace::Sheet;
use crate::{calc, decide, found};

/// Depths and widths from the toe.
#[derive(Clone, Copy, Debug)]
pub struct Section {
    /// Width at the toe.
    pub b_1: Length,
    /// Depth of the first rectangle.
    pub d_1: Length,
    /// Width beyond.
    pub b_2: Length,
    /// Whole depth.
    pub L_s: Length,
}

/// Linear stress with no tension.
#[derive(Clone, Copy, Debug)]
pub struct Triangle {
    /// Distance from the toe to the neutral axis; beyond `L_s` where the whole depth is compressed.
    pub c: Length,
    /// Stress at the toe.
    pub sigma_toe: Stress,
    /// Part of N carried by the first rectangle.
    pub N_1: Force,
    /// Part of N carried by the second.
    pub N_2: Force,
}

impl Section {
    /// Distance from the toe to the centroid of the whole section.
    pub fn centroid(&self) -> Length {
        let (a1, a2) = (self.b_1 * self.d_1, self.b_2 * (self.L_s - self.d_1));
        (a1 * (self.d_1 / 2.0) + a2 * ((self.d_1 + self.L_s) / 2.0)) / (a1 + a2)
    }

    /// Area and first moment about the toe of `1 - s/c` over the compressed part, by rectangle.
    fn moments(&self, c: f64) -> ([f64; 2], [f64; 2]) {
        let (b1, d1, b2, depth) = (self.b_1.base(), self.d_1.base(), self.b_2.base(), self.L_s.base());
        let p1 = c.min(d1);
        let p2 = c.min(depth).max(d1);
        let zero = |p: f64, q: f64| (q - p) - (q * q - p * p) / (2.0 * c);
        let first = |p: f64, q: f64| (q * q - p * p) / 2.0 - (q * q * q - p * p * p) / (3.0 * c);
        ([b1 * zero(0.0, p1), b2 * zero(d1, p2)], [b1 * first(0.0, p1), b2 * first(d1, p2)])
    }

    /// Where the neutral axis lies when N acts at `a`; `None` outside the section or past its middle.
    pub fn neutral_axis(&self, a: Length) -> Option<Length> {
        let place = |c: f64| {
            let (s0, s1) = self.moments(c);
            (s1[0] + s1[1]) / (s0[0] + s0[1])
        };
        let far = self.L_s.base() * 1e6;
        if a.base() <= 0.0 || a.base() >= place(far) {
            return None;
        }
        root::bisect(|c| place(c) - a.base(), a.base().min(1.0) * 1e-3, far).map(Length::new)
    }
}

/// Triangular stress of a section of two rectangles. `N_Ed`, `a`, `b_1`, `d_1`, `b_2` and `L_s` stand
/// on the sheet. First principles, not a formula of the code; the place of N is computed again from
/// the neutral axis found, and printed. `None` where N falls outside the section.
pub fn triangle(s: &mut Sheet, section: Section, N_Ed: Force, a: Length) -> Option<Triangle> {
    let Section { b_1, d_1, b_2, L_s } = section;
    let axis = section.neutral_axis(a)?;
    found!(
        s,
        "first principles",
        "neutral axis from the toe, found so that the stress block acts where N does",
        c = axis
    );
    calc!(s, "first principles", "compressed depth in each rectangle", p_1 = min(c, d_1));
    calc!(s, "first principles", p_2 = max(min(c, L_s), d_1));
    calc!(s, "first principles", "stress area at unit toe stress", A_1 = b_1 * (p_1 - sq(p_1) / (2.0 * c)));
    calc!(s, "first principles", A_2 = b_2 * ((p_2 - d_1) - (sq(p_2) - sq(d_1)) / (2.0 * c)));
    calc!(
        s,
        "first principles",
        "first moments about the toe",
        S_1 = b_1 * (sq(p_1) / 2.0 - cube(p_1) / (3.0 * c))
    );
    calc!(
        s,
        "first principles",
        S_2 = b_2 * ((sq(p_2) - sq(d_1)) / 2.0 - (cube(p_2) - cube(d_1)) / (3.0 * c))
    );
    calc!(s, "first principles", "place of the block, to compare with a", a_c = (S_1 + S_2) / (A_1 + A_2));
    calc!(s, "first principles", "triangular edge stress at the toe", sigma_toe = N_Ed / (A_1 + A_2));
    calc!(s, "first principles", "part of N in the first rectangle", N_1 = sigma_toe * A_1);
    calc!(s, "first principles", "part of N in the second", N_2 = sigma_toe * A_2);
    if (a_c - a).abs() > Length::new(1e-6 * L_s.base()) && s.recording() {
        s.fault("a_c = S_1/(A_1 + A_2)".to_owned(), format!("stress block at {a_c:?}, N at {a:?}"));
    }
    Some(Triangle { c, sigma_toe, N_1, N_2 })
}

/// Area of the uniform stress block that is centred on N. Symbols as for [`triangle`]; zero where N
/// falls outside the section, the whole area where N acts at its centroid or past it.
pub fn block_area(s: &mut Sheet, section: Section, a: Length) -> Area {
    let Section { b_1, d_1, b_2, L_s } = section;
    if a <= Length::ZERO {
        calc!(s, "first principles", "area of the uniform stress block", A_c = 0.0 * b_1 * d_1);
        return A_c;
    }
    let within = decide!(
        s,
        "first principles",
        "the block lies in the first rectangle",
        "the block reaches into the second rectangle",
        2.0 * a <= d_1
    );
    if within {
        calc!(s, "first principles", "area of the uniform stress block", A_c = 2.0 * a * b_1);
        return A_c;
    }
    let inside = sq(a) + (b_1 - b_2) * d_1 * (2.0 * a - d_1) / b_2;
    if inside.base() < 0.0 {
        calc!(
            s,
            "first principles",
            "area of the uniform stress block: the whole section",
            A_c = b_1 * d_1 + b_2 * (L_s - d_1)
        );
        return A_c;
    }
    // In three steps: as one formula its numbers are wider than a sheet.
    calc!(s, "first principles", "step of the width over the second width", r_b = (b_1 - b_2) / b_2);
    calc!(
        s,
        "first principles",
        "reach of the block past N",
        x_r = sqrt(sq(a) + r_b * d_1 * (2.0 * a - d_1))
    );
    calc!(s, "first principles", "depth of the block centred on N", y_c = min(a + x_r, L_s));
    calc!(s, "first principles", "area of the uniform stress block", A_c = b_1 * d_1 + b_2 * (y_c - d_1));
    A_c
}

#[cfg(test)]
mod tests {
    use super::*;

    fn mm(x: f64) -> Length {
        Length::new(x)
    }

    /// A section of two equal widths is a rectangle: 3a and 2N/(3 a b) come back.
    #[test]
    fn equal_widths_give_the_rectangle() {
        let sec = Section { b_1: mm(100.0), d_1: mm(300.0), b_2: mm(100.0), L_s: mm(1000.0) };
        let t = triangle(&mut Sheet::silent(), sec, Force::new(20e3), mm(200.0)).expect("N is inside");
        assert!((t.c.base() - 600.0).abs() < 1e-6);
        assert!((t.sigma_toe.base() - 2.0 * 20e3 / (600.0 * 100.0)).abs() < 1e-9);
        assert!((block_area(&mut Sheet::silent(), sec, mm(200.0)).base() - 40e3).abs() < 1e-6);
    }

    /// Uncracked flanged section: N/A + N e y/I by hand. Flange 500 x 100 at the toe, web 100 x 600.
    /// A = 110e3, centroid from the toe (50e3*50 + 60e3*400)/110e3 = 240.909, I = 4.166667e7
    /// + 50e3*190.909^2 + 1.8e9 + 60e3*159.091^2 = 5.182576e9; N = 30 kN at 180 mm from the toe.
    #[test]
    fn an_uncracked_flanged_section_by_bending_theory() {
        let sec = Section { b_1: mm(500.0), d_1: mm(100.0), b_2: mm(100.0), L_s: mm(700.0) };
        assert!((sec.centroid().base() - 240.909_090_9).abs() < 1e-6);
        let t = triangle(&mut Sheet::silent(), sec, Force::new(30e3), mm(180.0)).expect("N is inside");
        let inertia: f64 = 500.0 * 100f64.powi(3) / 12.0
            + 50e3 * 190.909_090_9f64.powi(2)
            + 100.0 * 600f64.powi(3) / 12.0
            + 60e3 * 159.090_909_1f64.powi(2);
        let e = 240.909_090_9 - 180.0;
        let toe = 30e3 / 110e3 + 30e3 * e * 240.909_090_9 / inertia;
        let far = 30e3 / 110e3 - 30e3 * e * (700.0 - 240.909_090_9) / inertia;
        assert!(far > 0.0, "the hand case must be uncracked");
        assert!((t.sigma_toe.base() - toe).abs() < 1e-6, "{} {toe}", t.sigma_toe.base());
        assert!((t.N_1.base() + t.N_2.base() - 30e3).abs() < 1e-6);
    }

    /// The uniform block is centred on N, by sums over thin strips.
    #[test]
    fn the_block_is_centred_on_the_resultant() {
        for (b_1, d_1, b_2, depth, a) in [
            (500.0, 100.0, 100.0, 700.0, 150.0),
            (100.0, 600.0, 500.0, 700.0, 380.0),
            (100.0, 600.0, 500.0, 700.0, 340.0),
        ] {
            let sec = Section { b_1: mm(b_1), d_1: mm(d_1), b_2: mm(b_2), L_s: mm(depth) };
            let area = block_area(&mut Sheet::silent(), sec, mm(a)).base();
            let y = if area <= b_1 * d_1 { area / b_1 } else { d_1 + (area - b_1 * d_1) / b_2 };
            let n = 20_000;
            let ds = y / f64::from(n);
            let (mut s0, mut s1) = (0.0, 0.0);
            for i in 0..n {
                let s = (f64::from(i) + 0.5) * ds;
                let b = if s < d_1 { b_1 } else { b_2 };
                s0 += b * ds;
                s1 += b * s * ds;
            }
            assert!((s1 / s0 - a).abs() < 0.05, "{b_1} {d_1}: block at {} not {a}", s1 / s0);
        }
    }

    #[test]
    fn outside_the_section_nothing_stands() {
        let sec = Section { b_1: mm(100.0), d_1: mm(600.0), b_2: mm(100.0), L_s: mm(600.0) };
        assert!(triangle(&mut Sheet::silent(), sec, Force::new(1e3), mm(-5.0)).is_none());
        assert_eq!(block_area(&mut Sheet::silent(), sec, mm(-5.0)), Area::ZERO);
    }
}
