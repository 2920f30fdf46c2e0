//! What each triangle and each continuous side can bear, as parts of `m_H`.

use super::mesh::{Mesh, Rim};
use crate::solve::plate::{Held, Plate};

/// Bed joints with less than this part of `m_H` count as cracked: their cones would have no inside.
pub const NIL: f64 = 1e-4;

/// Strengths as parts of `m_H`.
pub struct Strengths {
    /// `m_V / m_H` of each triangle; exactly 0 where its bed joints count as cracked.
    pub bed: Vec<f64>,
    /// The moment that can hold each side against turning; 0 unless it lies on a continuous stretch.
    pub clamp: Vec<f64>,
}

/// The strengths of a meshed panel.
pub fn strengths(plate: &Plate<'_>, mesh: &Mesh) -> Strengths {
    let mut bed = Vec::with_capacity(mesh.triangles.len());
    let mut clamp = vec![0.0; mesh.sides.len()];
    for triangle in &mesh.triangles {
        let p = triangle.nodes.map(|n| mesh.nodes[n]);
        // The bed joints weaken upwards, so the highest corner is the weakest. The middle of the triangle
        // is never in doubt about the side of an opening edge that it lies on.
        let x = (p[0][0] + p[1][0] + p[2][0]) / 3.0;
        let part = (plate.m_V)(x, p[0][1].max(p[1][1]).max(p[2][1])) / plate.m_H;
        let part = if part > NIL { part } else { 0.0 };
        for &s in &triangle.sides {
            if let Some((edge, moment)) = continuous(plate, mesh.sides[s].rim) {
                let own = if edge < 2 { 1.0 } else { part };
                let least = own.min(moment / plate.m_H);
                clamp[s] = if least > NIL { least } else { 0.0 };
            }
        }
        bed.push(part);
    }
    Strengths { bed, clamp }
}

/// The edge of a continuous side and the moment that its stretch brings, N.
fn continuous(plate: &Plate<'_>, rim: Rim) -> Option<(usize, f64)> {
    let Rim::Held { edge, stretch } = rim else { return None };
    match plate.edges.get(edge)?.get(stretch)?.held {
        Held::Continuous(moment) | Held::Weight(moment) => Some((edge, moment)),
        Held::Simple | Held::Free => None,
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::solve::plate::Stretch;
    use crate::solve::plate::safe::mesh::mesh;

    /// Bed joints that fall from 0.6 at the foot to 0.2 at the top, m_H 2; a base that brings more than the wall, a top
    /// that brings 0.1. No triangle bears more than its weakest corner, and no clamp more than the wall beside it.
    #[test]
    fn a_triangle_bears_what_its_weakest_corner_bears() {
        let whole = |held| vec![Stretch { from: 0.0, to: 1.0, held }];
        let m_V = |_: f64, y: f64| 0.6 - 0.4 * y;
        let plate = Plate {
            l: 1.0,
            h: 1.0,
            openings: Vec::new(),
            edges: [
                whole(Held::Continuous(9.0)),
                whole(Held::Simple),
                whole(Held::Continuous(9.0)),
                whole(Held::Weight(0.1)),
            ],
            m_H: 2.0,
            m_V: &m_V,
        };
        let mesh = mesh(&plate, 0.25);
        let found = strengths(&plate, &mesh);
        for (triangle, bed) in mesh.triangles.iter().zip(&found.bed) {
            let corners = triangle.nodes.map(|n| m_V(0.0, mesh.nodes[n][1]) / 2.0);
            let weakest = corners.into_iter().fold(f64::INFINITY, f64::min);
            assert!((bed - weakest).abs() < 1e-12, "{bed} of {corners:?}");
            for &s in &triangle.sides {
                let wanted = match mesh.sides[s].rim {
                    Rim::Held { edge: 0, .. } => 1.0,
                    Rim::Held { edge: 2, .. } => weakest,
                    Rim::Held { edge: 3, .. } => 0.05,
                    _ => 0.0,
                };
                assert!((found.clamp[s] - wanted).abs() < 1e-12, "{} for {wanted}", found.clamp[s]);
            }
        }
    }
}
