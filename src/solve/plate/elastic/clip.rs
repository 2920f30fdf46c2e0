//! The part of a triangle that lies in an upright rectangle (Sutherland and Hodgman).

/// What is left of a shape between `low` and `high`, its corners in their order; empty where nothing is.
pub fn clipped(corners: &[[f64; 2]], low: [f64; 2], high: [f64; 2]) -> Vec<[f64; 2]> {
    let mut shape = corners.to_vec();
    for axis in 0..2 {
        for (bound, sense) in [(low[axis], 1.0), (high[axis], -1.0)] {
            shape = behind(&shape, axis, |at| sense * (at - bound));
        }
    }
    shape
}

/// The part of a shape where `within` its coordinate on an axis is not below 0.
fn behind(shape: &[[f64; 2]], axis: usize, within: impl Fn(f64) -> f64) -> Vec<[f64; 2]> {
    let mut kept = Vec::with_capacity(shape.len() + 1);
    for (from, to) in shape.iter().zip(shape.iter().cycle().skip(1)) {
        let (a, b) = (within(from[axis]), within(to[axis]));
        if a >= 0.0 {
            kept.push(*from);
        }
        if (a < 0.0) != (b < 0.0) {
            let part = a / (a - b);
            kept.push([0, 1].map(|i| from[i] + part * (to[i] - from[i])));
        }
    }
    kept
}

/// The area of a shape whose corners go anticlockwise.
pub fn area(shape: &[[f64; 2]]) -> f64 {
    let turns = shape.iter().zip(shape.iter().cycle().skip(1)).map(|(p, q)| p[0] * q[1] - p[1] * q[0]);
    turns.sum::<f64>() / 2.0
}

#[cfg(test)]
mod tests {
    use super::{area, clipped};

    /// By hand: the corner of 1 x 1 cut off at 45 degrees loses an eighth where half its legs are outside.
    #[test]
    fn a_triangle_in_a_square() {
        let triangle = [[0.0, 0.0], [2.0, 0.0], [0.0, 2.0]];
        let at = |low, high| area(&clipped(&triangle, low, high));
        assert!((at([0.0, 0.0], [2.0, 2.0]) - 2.0).abs() < 1e-12);
        assert!((at([0.0, 0.0], [1.0, 1.0]) - 1.0).abs() < 1e-12);
        assert!((at([0.5, 0.5], [1.0, 1.0]) - 0.25).abs() < 1e-12);
        assert!((at([0.5, 0.5], [3.0, 3.0]) - 0.5).abs() < 1e-12);
        assert_eq!(at([1.5, 1.5], [3.0, 3.0]), 0.0);
        // The square lies wholly in the triangle, or nothing of it does.
        assert!((at([0.25, 0.25], [0.75, 0.75]) - 0.25).abs() < 1e-12);
        assert_eq!(at([-2.0, -2.0], [-1.0, -1.0]), 0.0);
    }
}
