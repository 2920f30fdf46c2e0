//! Mean moments over squares of the wall.

use super::Solved;
use super::clip::{area, clipped};
use super::criterion::Use;
use crate::solve::plate::Plate;
use crate::solve::plate::safe::statics::Moments;

/// A triangle of which a square holds less than this part of the square's area counts as outside.
const SLIVER: f64 = 1e-9;

/// The use of strength in the square of side `patch` on every node.
///
/// Only wall that hangs together with the node inside the square counts: the wall beyond a narrow opening
/// bends by itself.
pub fn uses(plate: &Plate<'_>, solved: &Solved, patch: f64) -> Vec<Use> {
    let mesh = &solved.mesh;
    let mut at_node = vec![Vec::new(); mesh.nodes.len()];
    let mut at_side = vec![Vec::new(); mesh.sides.len()];
    for (t, triangle) in mesh.triangles.iter().enumerate() {
        triangle.nodes.iter().for_each(|&n| at_node[n].push(t));
        triangle.sides.iter().for_each(|&s| at_side[s].push(t));
    }
    let mut reached = vec![usize::MAX; mesh.triangles.len()];
    let mut one = |(node, &at): (usize, &[f64; 2])| {
        let mut square = Square::new(at, patch);
        let mut queue = at_node[node].clone();
        queue.iter().for_each(|&t| reached[t] = node);
        while let Some(t) = queue.pop() {
            if !square.add(plate, solved, t) {
                continue;
            }
            for &next in mesh.triangles[t].sides.iter().flat_map(|&s| &at_side[s]) {
                if std::mem::replace(&mut reached[next], node) != node {
                    queue.push(next);
                }
            }
        }
        Use::of(&square.mean(), plate.m_H, square.bed, at)
    };
    mesh.nodes.iter().enumerate().map(&mut one).collect()
}

/// A square and what has been found in it.
struct Square {
    low: [f64; 2],
    high: [f64; 2],
    area: f64,
    /// Moments times area.
    sum: Moments,
    /// The least `m_V`.
    bed: f64,
}

impl Square {
    fn new(at: [f64; 2], side: f64) -> Self {
        let [low, high] = [-0.5, 0.5].map(|half| at.map(|v| v + half * side));
        Self { low, high, area: 0.0, sum: Moments::default(), bed: f64::INFINITY }
    }

    /// Adds what lies inside of a triangle; whether anything does.
    fn add(&mut self, plate: &Plate<'_>, solved: &Solved, t: usize) -> bool {
        let corners = solved.mesh.triangles[t].nodes.map(|n| solved.mesh.nodes[n]);
        let within = |c: &[f64; 2]| (0..2).all(|i| self.low[i] <= c[i] && c[i] <= self.high[i]);
        let (inside, bed) = if corners.iter().all(within) {
            (area(&corners), solved.strengths.bed[t] * plate.m_H)
        } else {
            let part = clipped(&corners, self.low, self.high);
            let top = part.iter().map(|c| c[1]).fold(f64::NEG_INFINITY, f64::max);
            // At the middle of the triangle, which is in no doubt about the side of an opening's edge.
            let x = corners.iter().map(|c| c[0]).sum::<f64>() / 3.0;
            (area(&part), if part.is_empty() { f64::INFINITY } else { (plate.m_V)(x, top) })
        };
        if inside <= SLIVER * (self.high[0] - self.low[0]) * (self.high[1] - self.low[1]) {
            return false;
        }
        let m = &solved.fields[t];
        self.area += inside;
        self.sum.x += inside * m.x;
        self.sum.y += inside * m.y;
        self.sum.xy += inside * m.xy;
        self.bed = self.bed.min(bed);
        true
    }

    fn mean(&self) -> Moments {
        let Moments { x, y, xy } = self.sum;
        Moments { x: x / self.area, y: y / self.area, xy: xy / self.area }
    }
}
