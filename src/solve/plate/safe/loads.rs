//! The wind at the nodes of the mesh, for a pressure of 1.

use super::lines::same;
use super::mesh::{Mesh, Rim};
use super::statics::shape;
use crate::solve::plate::{Carry, Opening, Plate};

/// The force at every node for a pressure of 1, mm2.
///
/// The solid counts a third of each triangle to each corner, a line load half of each side to each end: what
/// deflections that are linear in each triangle ask for.
pub fn loads(plate: &Plate<'_>, mesh: &Mesh) -> Vec<f64> {
    let mut loads = vec![0.0; mesh.nodes.len()];
    for triangle in &mesh.triangles {
        let (_, double) = shape(mesh, triangle);
        for node in triangle.nodes {
            loads[node] += double / 6.0;
        }
    }
    for opening in &plate.openings {
        let lines = carrying(plate, opening);
        let length: f64 = lines.iter().map(Line::length).sum();
        if length > 0.0 {
            let each = (opening.x.1 - opening.x.0) * (opening.y.1 - opening.y.0) / length;
            lines.iter().for_each(|line| spread(line, each, same(plate), mesh, &mut loads));
        }
    }
    loads
}

/// A straight edge of an opening: its two ends.
struct Line([f64; 2], [f64; 2]);

impl Line {
    fn length(&self) -> f64 {
        (self.1[0] - self.0[0]) + (self.1[1] - self.0[1])
    }

    fn passes(&self, at: [f64; 2], same: f64) -> bool {
        (0..2).all(|i| self.0[i] - same < at[i] && at[i] < self.1[i] + same)
    }
}

/// The edges of an opening that take its wind. An edge on the rim of the panel has no wall to take any.
fn carrying(plate: &Plate<'_>, opening: &Opening) -> Vec<Line> {
    let ((x0, x1), (y0, y1)) = (opening.x, opening.y);
    let same = same(plate);
    let inside = |at: f64, end: f64| at > same && at < end - same;
    let jambs = [x0, x1].into_iter().filter(|&x| inside(x, plate.l)).map(|x| Line([x, y0], [x, y1]));
    let across = [y0, y1].into_iter().filter(|&y| inside(y, plate.h)).map(|y| Line([x0, y], [x1, y]));
    match opening.carry {
        Carry::Nowhere => Vec::new(),
        Carry::Jambs => jambs.collect(),
        Carry::AllRound => jambs.chain(across).collect(),
        Carry::HeadAndSill => {
            let across: Vec<_> = across.collect();
            // From base to top there is neither head nor sill, and the wind must not get lost.
            if across.is_empty() { jambs.collect() } else { across }
        }
    }
}

/// Adds a load of `each` per length of the line to the nodes along it.
fn spread(line: &Line, each: f64, same: f64, mesh: &Mesh, loads: &mut [f64]) {
    for side in mesh.sides.iter().filter(|s| s.rim == Rim::Free) {
        let [a, b] = side.nodes.map(|n| mesh.nodes[n]);
        if line.passes(a, same) && line.passes(b, same) {
            let half = each * (b[0] - a[0]).hypot(b[1] - a[1]) / 2.0;
            side.nodes.iter().for_each(|&n| loads[n] += half);
        }
    }
}
