//! What the normal moment of a side does: the moments of its triangles and the forces at their nodes.
//!
//! A triangle has one constant moment field, fixed by the normal moments of its three sides. Sides share
//! their moment, so normal moments are continuous, and such a field is in true equilibrium with forces at
//! the nodes alone. Those forces follow from virtual work with deflections that are linear in each triangle.
//!
//! Sagging is positive: the moment that bends the middle of a panel the way the pressure pushes.

use super::mesh::{Mesh, Triangle};

/// The moments of a triangle.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Moments {
    /// Opens vertical cracks.
    pub x: f64,
    /// Opens bed joints.
    pub y: f64,
    /// Twist.
    pub xy: f64,
}

/// The sides of a triangle as vectors, anticlockwise, and twice its area.
pub fn shape(mesh: &Mesh, triangle: &Triangle) -> ([[f64; 2]; 3], f64) {
    let p = triangle.nodes.map(|n| mesh.nodes[n]);
    let e = [0, 1, 2].map(|i| {
        let (from, to) = (p[(i + 1) % 3], p[(i + 2) % 3]);
        [to[0] - from[0], to[1] - from[1]]
    });
    (e, e[0][0] * e[1][1] - e[0][1] * e[1][0])
}

/// The field of a triangle for a normal moment of 1 on each of its sides in turn and none on the others.
///
/// A product of the two other side vectors has no normal moment on those sides; its size is set by side i.
pub fn fields(mesh: &Mesh, triangle: &Triangle) -> [Moments; 3] {
    let (e, double) = shape(mesh, triangle);
    [0, 1, 2].map(|i| {
        let (j, k) = (e[(i + 1) % 3], e[(i + 2) % 3]);
        let size = -(e[i][0] * e[i][0] + e[i][1] * e[i][1]) / (double * double);
        Moments { x: size * j[0] * k[0], y: size * j[1] * k[1], xy: size * (j[0] * k[1] + j[1] * k[0]) / 2.0 }
    })
}

/// The moments of a triangle where the normal moments of all sides are `normal`, times `unit`.
pub fn even(mesh: &Mesh, triangle: &Triangle, normal: &[f64], unit: f64) -> Moments {
    let mut even = Moments::default();
    for (one, &side) in fields(mesh, triangle).iter().zip(&triangle.sides) {
        let times = normal[side] * unit;
        even.x += times * one.x;
        even.y += times * one.y;
        even.xy += times * one.xy;
    }
    even
}

/// For every node the sides whose moments carry load from it, with the force for a moment of 1.
///
/// The force is side length times the turn across the side when the node alone moves by 1 with the
/// pressure. The outward slope of that hat on side s is `-(e_s . e_i) / (2 A |e_s|)`, e_i the side opposite
/// the node. A pure number: no scale enters.
pub fn forces(mesh: &Mesh) -> Vec<Vec<(usize, f64)>> {
    let mut forces = vec![Vec::new(); mesh.nodes.len()];
    for triangle in &mesh.triangles {
        let (e, double) = shape(mesh, triangle);
        for i in 0..3 {
            for s in 0..3 {
                let turn = -(e[s][0] * e[i][0] + e[s][1] * e[i][1]) / double;
                add(&mut forces[triangle.nodes[i]], triangle.sides[s], turn);
            }
        }
    }
    forces
}

fn add(list: &mut Vec<(usize, f64)>, side: usize, turn: f64) {
    match list.iter_mut().find(|(s, _)| *s == side) {
        Some((_, sum)) => *sum += turn,
        None => list.push((side, turn)),
    }
}
