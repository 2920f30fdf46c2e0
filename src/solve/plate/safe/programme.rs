//! The cone programme: the greatest load factor with equilibrium at every node and Johansen's criterion in
//! every triangle. Moments are parts of `m_H`; the loads set the unit of the factor.

use clarabel::solver::SupportedConeT::{NonnegativeConeT, SecondOrderConeT, ZeroConeT};

use super::mesh::{Mesh, Rim};
use super::rows::{Rows, stacked};
use super::solver::solved;
use super::statics::fields;
use super::strengths::Strengths;
use super::strips::Strip;
use crate::solve::plate::Trouble;

/// What the solver finds.
pub struct Found {
    /// The load factor.
    pub factor: f64,
    /// The normal moment of every side, then the strip moment of every side.
    pub moments: Vec<f64>,
    /// The solver's word.
    pub status: String,
}

/// What the programme is made of.
pub struct Problem<'a> {
    /// The mesh.
    pub mesh: &'a Mesh,
    /// Its strengths.
    pub strengths: &'a Strengths,
    /// Its strips, one a cell or none.
    pub strips: &'a [Option<Strip>],
    /// What the moments carry from each node.
    pub forces: &'a [Vec<(usize, f64)>],
}

impl Problem<'_> {
    /// The greatest factor on `loads`, one a node.
    ///
    /// # Errors
    /// [`Trouble::NotSolved`] where the solver ends with anything but a solution.
    pub fn greatest(&self, loads: &[f64]) -> Result<Found, Trouble> {
        let unknowns = Unknowns::new(self);
        let mut equal = equilibrium(self, &unknowns, loads);
        let (mut least, mut cones) = (Rows::default(), Rows::default());
        clamps(&unknowns, self.strengths, &mut least);
        for (t, &bed) in self.strengths.bed.iter().enumerate() {
            let triangle = &self.mesh.triangles[t];
            let fields = fields(self.mesh, triangle);
            let sum = |part: [f64; 3]| unknowns.terms((0..3).map(|i| (triangle.sides[i], part[i])));
            let (y, twist) = (sum(fields.map(|f| f.y)), sum(fields.map(|f| f.xy)));
            if bed == 0.0 {
                equal.push(&y, 0.0);
                equal.push(&twist, 0.0);
            }
            for strip in self.strip_parts(t) {
                let mut x = sum(fields.map(|f| f.x));
                x.extend(unknowns.terms(strip.into_iter()));
                if bed > 0.0 {
                    johansen(&mut cones, &x, &times(&y, 1.0 / bed), &times(&twist, bed.sqrt().recip()));
                } else {
                    // A cone without an inside stalls the solver; with m_y and m_xy nought it is a line.
                    least.push(&x, 1.0);
                    least.push(&times(&x, -1.0), 1.0);
                }
            }
        }
        let kinds: Vec<_> = [ZeroConeT(equal.len()), NonnegativeConeT(least.len())]
            .into_iter()
            .chain((0..cones.len() / 3).map(|_| SecondOrderConeT(3)))
            .collect();
        let (matrix, right) = stacked([equal, least, cones], unknowns.count + 1);
        let (x, status) = solved(&matrix, &right, &kinds)?;
        let moments = unknowns.number.iter().map(|n| n.map_or(0.0, |n| x[n])).collect();
        Ok(Found { factor: x[unknowns.count], moments, status })
    }

    /// What the strip moments add to `m_x` at the left and right end of a triangle, where it is greatest or
    /// least; nothing, once, where there is no strip.
    fn strip_parts(&self, t: usize) -> Vec<Vec<(usize, f64)>> {
        let x = self.mesh.triangles[t].nodes.map(|n| self.mesh.nodes[n][0]);
        let ends = [x[0].min(x[1]).min(x[2]), x[0].max(x[1]).max(x[2])];
        match &self.strips[t / 4] {
            None => vec![Vec::new()],
            Some(strip) => ends.iter().map(|&x| strip.terms(x, self.mesh.sides.len())).collect(),
        }
    }
}

/// Which moments there are at all, numbered: of all sides, then of all strips. The load factor comes last.
struct Unknowns {
    number: Vec<Option<usize>>,
    count: usize,
}

impl Unknowns {
    fn new(problem: &Problem<'_>) -> Self {
        let mesh = problem.mesh;
        let sides = mesh.sides.iter().zip(&problem.strengths.clamp);
        let mut carries: Vec<bool> = sides.map(|(s, &clamp)| s.rim == Rim::Inside || clamp > 0.0).collect();
        carries.resize(2 * mesh.sides.len(), false);
        for side in problem.strips.iter().flatten().flat_map(|s| s.sides).flatten() {
            carries[mesh.sides.len() + side] = true;
        }
        let mut count = 0;
        let mut next = || {
            count += 1;
            count - 1
        };
        let number = carries.into_iter().map(|c| c.then(&mut next)).collect();
        Self { number, count }
    }

    /// Multiples of moments as columns of the matrix; moments that are not there drop out.
    fn terms(&self, moments: impl Iterator<Item = (usize, f64)>) -> Vec<(usize, f64)> {
        moments.filter_map(|(id, times)| Some((self.number[id]?, times))).collect()
    }
}

fn times(terms: &[(usize, f64)], factor: f64) -> Vec<(usize, f64)> {
    terms.iter().map(|t| (t.0, factor * t.1)).collect()
}

/// At every node that is not held the moments carry the load.
fn equilibrium(problem: &Problem<'_>, unknowns: &Unknowns, loads: &[f64]) -> Rows {
    let mut rows = Rows::default();
    for node in (0..loads.len()).filter(|&n| !problem.mesh.held[n]) {
        let mut terms = unknowns.terms(problem.forces[node].iter().copied());
        terms.push((unknowns.count, -loads[node]));
        rows.push(&terms, 0.0);
    }
    rows
}

/// The moment on a continuous side stays within what holds it, either way.
fn clamps(unknowns: &Unknowns, strengths: &Strengths, least: &mut Rows) {
    let count = strengths.clamp.len();
    for (side, &clamp) in strengths.clamp.iter().enumerate().filter(|(_, c)| **c > 0.0) {
        let both = unknowns.terms([(side, 1.0), (count + side, 1.0)].into_iter());
        least.push(&both, clamp);
        least.push(&times(&both, -1.0), clamp);
    }
}

/// Johansen's criterion, sagging and hogging: with `a = m_x / m_H`, `b = m_y / m_V` and
/// `c = m_xy / sqrt(m_H m_V)`, `(1 -/+ a) (1 -/+ b) >= c^2`, that is `|(a - b, 2 c)| <= 2 -/+ (a + b)`.
fn johansen(cones: &mut Rows, a: &[(usize, f64)], b: &[(usize, f64)], c: &[(usize, f64)]) {
    for sign in [1.0, -1.0] {
        cones.push(&[times(a, sign), times(b, sign)].concat(), 2.0);
        cones.push(&[a, &times(b, -1.0)].concat(), 0.0);
        cones.push(&times(c, 2.0), 0.0);
    }
}
