//! Loads along a line: what is spread and what stands at a point.

use super::From;

/// Dead, imposed and uplift.
pub type Triple = [f64; 3];

/// `a + b`.
pub fn add(a: Triple, b: Triple) -> Triple {
    [a[0] + b[0], a[1] + b[1], a[2] + b[2]]
}

/// `k a`.
pub fn times(a: Triple, k: f64) -> Triple {
    a.map(|x| x * k)
}

/// A load spread evenly, per length.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Line {
    /// Where it begins.
    pub from: f64,
    /// Where it ends.
    pub to: f64,
    /// Per length.
    pub load: Triple,
    /// What brings it.
    pub by: From,
    /// The part of it that comes from the lower side across; none where it stands in the middle.
    pub low: Option<f64>,
}

/// A load at a point.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Point {
    /// Where.
    pub at: f64,
    /// How much.
    pub load: Triple,
    /// What brings it.
    pub by: From,
    /// The part of it that comes from the lower side across; none where it stands in the middle.
    pub low: Option<f64>,
}

/// Loads along a line.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Loads {
    /// Spread.
    pub lines: Vec<Line>,
    /// At points.
    pub points: Vec<Point>,
}

impl Loads {
    /// All of it.
    pub fn total(&self) -> Triple {
        let lines = self.lines.iter().map(|l| times(l.load, l.to - l.from));
        lines.chain(self.points.iter().map(|p| p.load)).fold([0.0; 3], add)
    }

    /// First moment about `at`.
    pub fn moment(&self, at: f64) -> Triple {
        let lines = self.lines.iter().map(|l| times(l.load, (l.to - l.from) * ((l.from + l.to) / 2.0 - at)));
        lines.chain(self.points.iter().map(|p| times(p.load, p.at - at))).fold([0.0; 3], add)
    }

    /// The spread loads between two places, cut to them.
    pub fn lines_within(&self, from: f64, to: f64) -> impl Iterator<Item = Line> {
        self.lines.iter().filter_map(move |l| {
            let cut = Line { from: l.from.max(from), to: l.to.min(to), ..*l };
            (cut.to > cut.from).then_some(cut)
        })
    }
}
