//! Strips: in cells with weak bed joints `m_x` may change evenly from one upright side to the other.
//!
//! Constant moments cannot follow a bending moment along x unless `m_y` and `m_xy` make up the steps at the
//! diagonals. Where bed joints have next to no strength they cannot, and the field would lock: a wall that
//! spans from side to side as a stack of beams would come out as a mechanism. A strip adds the beam: its
//! moment on an upright side is an unknown of its own, and its shear steps load that side evenly.

use super::mesh::{Mesh, Rim};
use super::strengths::Strengths;

/// Cells weaker than this part of `m_H` get a strip. Above it the constant moments alone are within 1 %.
const WEAK: f64 = 0.1;

/// The strip moments of a cell.
#[derive(Clone, Copy, Debug)]
pub struct Strip {
    /// Its left and right side; none where no strip moment can pass.
    pub sides: [Option<usize>; 2],
    /// Where it begins, mm.
    from: f64,
    /// How wide and how high it is, mm.
    size: [f64; 2],
    /// The nodes of its left and right side.
    nodes: [[usize; 2]; 2],
}

impl Strip {
    /// The strip moment at `x` as parts of the moments of its sides; their unknowns come after `count` others.
    pub fn terms(&self, x: f64, count: usize) -> Vec<(usize, f64)> {
        let right = (x - self.from) / self.size[0];
        let parts = self.sides.into_iter().zip([1.0 - right, right]);
        parts.filter_map(|(side, part)| Some((count + side?, part))).collect()
    }
}

/// The strip of every cell, none where its bed joints are strong enough.
pub fn strips(mesh: &Mesh, strengths: &Strengths) -> Vec<Option<Strip>> {
    let weak: Vec<bool> = strengths.bed.chunks(4).map(|cell| cell.iter().any(|&b| b < WEAK)).collect();
    let mut passes: Vec<bool> =
        mesh.sides.iter().zip(&strengths.clamp).map(|(s, &c)| s.rim == Rim::Inside || c > 0.0).collect();
    // The moment must go on beyond a side, so a strong neighbour ends the strip.
    for cell in (0..weak.len()).filter(|&c| !weak[c]) {
        mesh.uprights(cell).iter().for_each(|&s| passes[s] = false);
    }
    let strip = |cell: usize| {
        let sides = mesh.uprights(cell);
        let nodes = sides.map(|s| mesh.sides[s].nodes);
        let ([x, y], [_, top]) = (mesh.nodes[nodes[0][0]], mesh.nodes[nodes[0][1]]);
        let size = [mesh.nodes[nodes[1][0]][0] - x, (top - y).abs()];
        Strip { sides: sides.map(|s| passes[s].then_some(s)), from: x, size, nodes }
    };
    (0..weak.len()).map(|cell| weak[cell].then(|| strip(cell))).collect()
}

/// Adds what strip moments carry to the forces of [`super::statics::forces`]. The unknown of a side's strip
/// moment comes after those of all sides, in the same order.
pub fn add_forces(mesh: &Mesh, strips: &[Option<Strip>], forces: &mut [Vec<(usize, f64)>]) {
    for strip in strips.iter().flatten() {
        // A moment that falls away from its side carries load there and leans on the other side.
        let share = strip.size[1] / strip.size[0] / 2.0;
        for (side, near, far) in [(strip.sides[0], 0, 1), (strip.sides[1], 1, 0)] {
            let Some(side) = side else { continue };
            let id = mesh.sides.len() + side;
            strip.nodes[near].iter().for_each(|&n| forces[n].push((id, share)));
            strip.nodes[far].iter().for_each(|&n| forces[n].push((id, -share)));
        }
    }
}

/// Moves the load at the middle of every cell with a strip to its corners: a strip loads its sides alone.
pub fn move_loads(mesh: &Mesh, strips: &[Option<Strip>], loads: &mut [f64]) {
    for (cell, strip) in strips.iter().enumerate() {
        let Some(strip) = strip else { continue };
        let middle = std::mem::take(&mut loads[mesh.triangles[4 * cell].nodes[2]]);
        strip.nodes.iter().flatten().for_each(|&n| loads[n] += middle / 4.0);
    }
}
