//! How much of the strength a moment takes.

use crate::solve::plate::safe::statics::Moments;
use crate::solve::plate::safe::strengths::NIL;

/// What the moments of one place take of its strength.
pub struct Use {
    /// The part of the strength taken; its inverse is what the moments can be multiplied by.
    pub part: f64,
    /// Whether bending about the bed joints has the greater share.
    pub bed_joint: bool,
    /// The place, mm.
    pub at: [f64; 2],
}

impl Use {
    /// Johansen's criterion. With `a = m_x / m_H`, `b = m_y / m_V` and `c = m_xy / sqrt(m_H m_V)`, moments
    /// divided by `k` just reach `(1 - a / k) (1 - b / k) = (c / k)^2`, that is `(k - a) (k - b) = c^2`: `k` is
    /// a principal value of `a, b, c`. Sagging and hogging together take the greatest by size.
    ///
    /// A bed joint with next to no strength has cracked at any moment: the part is without end.
    pub fn of(m: &Moments, m_H: f64, m_V: f64, at: [f64; 2]) -> Self {
        // Greater, so that no number at all counts as none too.
        if m_V > NIL * m_H {
            let (a, b) = (m.x / m_H, m.y / m_V);
            let twist = m.xy * m.xy / (m_H * m_V);
            let middle = (a + b) / 2.0;
            let part = middle.abs() + ((a - b) * (a - b) / 4.0 + twist).sqrt();
            // The direction of that principal value leans to the greater of the two in its sense.
            let bed_joint = if middle < 0.0 { b < a } else { b > a };
            Self { part, bed_joint, at }
        } else {
            Self { part: f64::INFINITY, bed_joint: true, at }
        }
    }
}
