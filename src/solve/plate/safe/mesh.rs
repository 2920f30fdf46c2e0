//! The mesh: grid cells outside the openings, each cut by its diagonals into four triangles.

use std::collections::HashMap;

use super::lines::{grid, held_at, same};
use crate::solve::plate::Plate;

/// What lies along a side of a triangle.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Rim {
    /// A second triangle.
    Inside,
    /// Nothing: an opening, or a free stretch of an edge.
    Free,
    /// A support.
    Held {
        /// 0 left, 1 right, 2 base, 3 top.
        edge: usize,
        /// Which stretch of that edge.
        stretch: usize,
    },
}

/// A side of one or two triangles.
#[derive(Clone, Copy, Debug)]
pub struct Side {
    /// Its two ends.
    pub nodes: [usize; 2],
    /// What lies along it.
    pub rim: Rim,
}

/// A triangle. The side with number i lies opposite the corner with number i.
#[derive(Clone, Copy, Debug)]
pub struct Triangle {
    /// Its corners, anticlockwise.
    pub nodes: [usize; 3],
    /// Its sides.
    pub sides: [usize; 3],
}

/// The mesh.
#[derive(Clone, Debug, Default)]
pub struct Mesh {
    /// Where the nodes are, mm.
    pub nodes: Vec<[f64; 2]>,
    /// The triangles, four a cell: at its base, right, top and left.
    pub triangles: Vec<Triangle>,
    /// The sides.
    pub sides: Vec<Side>,
    /// Whether a node stands on a support; an end of a held stretch counts.
    pub held: Vec<bool>,
}

impl Mesh {
    /// The left and the right side of a cell.
    pub fn uprights(&self, cell: usize) -> [usize; 2] {
        [3, 1].map(|k| self.triangles[4 * cell + k].sides[2])
    }
}

/// The mesh of a panel, no grid step longer than `spacing`, mm.
pub fn mesh(plate: &Plate<'_>, spacing: f64) -> Mesh {
    let (x, y) = grid(plate, spacing);
    let mut mesh = Mesh::default();
    let mut book = Book::default();
    for (j, y) in y.windows(2).enumerate() {
        for (i, x) in x.windows(2).enumerate() {
            let centre = [(x[0] + x[1]) / 2.0, (y[0] + y[1]) / 2.0];
            if open_at(plate, centre) {
                continue;
            }
            let corners = [(0, 0), (1, 0), (1, 1), (0, 1)]
                .map(|(a, b)| book.corner(&mut mesh.nodes, (i + a, j + b), [x[a], y[b]]));
            mesh.nodes.push(centre);
            let middle = mesh.nodes.len() - 1;
            for k in 0..4 {
                let nodes = [corners[k], corners[(k + 1) % 4], middle];
                let sides = [1, 2, 0].map(|a| book.side(&mut mesh.sides, nodes[a], nodes[(a + 1) % 3]));
                mesh.triangles.push(Triangle { nodes, sides });
            }
        }
    }
    find_supports(plate, &mut mesh);
    mesh
}

fn open_at(plate: &Plate<'_>, [x, y]: [f64; 2]) -> bool {
    plate.openings.iter().any(|o| o.x.0 < x && x < o.x.1 && o.y.0 < y && y < o.y.1)
}

/// Numbers already given.
#[derive(Default)]
struct Book {
    corners: HashMap<(usize, usize), usize>,
    sides: HashMap<[usize; 2], usize>,
}

impl Book {
    /// The number of the node at a crossing of grid lines, new where a cell first asks for it.
    fn corner(&mut self, nodes: &mut Vec<[f64; 2]>, crossing: (usize, usize), at: [f64; 2]) -> usize {
        *self.corners.entry(crossing).or_insert_with(|| {
            nodes.push(at);
            nodes.len() - 1
        })
    }

    /// The number of the side between two nodes. It is free until a second triangle asks for it.
    fn side(&mut self, sides: &mut Vec<Side>, a: usize, b: usize) -> usize {
        let nodes = [a.min(b), a.max(b)];
        if let Some(&old) = self.sides.get(&nodes) {
            sides[old].rim = Rim::Inside;
            return old;
        }
        sides.push(Side { nodes, rim: Rim::Free });
        self.sides.insert(nodes, sides.len() - 1);
        sides.len() - 1
    }
}

/// Marks the sides on held stretches and their nodes.
fn find_supports(plate: &Plate<'_>, mesh: &mut Mesh) {
    let same = same(plate);
    mesh.held = vec![false; mesh.nodes.len()];
    for side in mesh.sides.iter_mut().filter(|s| s.rim == Rim::Free) {
        let [a, b] = side.nodes.map(|n| mesh.nodes[n]);
        let [x, y] = [(a[0] + b[0]) / 2.0, (a[1] + b[1]) / 2.0];
        let edges = [(x, y), (plate.l - x, y), (y, x), (plate.h - y, x)];
        let Some(edge) = edges.iter().position(|e| e.0 < same) else { continue };
        if let Some(stretch) = held_at(plate, edge, edges[edge].1) {
            side.rim = Rim::Held { edge, stretch };
            for node in side.nodes {
                mesh.held[node] = true;
            }
        }
    }
}
