//! Pieces of the panel that hang together, and which of them can fall without bending.

use super::mesh::{Mesh, Rim};

/// The triangles of one piece.
pub type Piece = Vec<usize>;

/// Triangles that share sides, piece by piece.
pub fn pieces(mesh: &Mesh) -> Vec<Piece> {
    let mut at_side = vec![Vec::new(); mesh.sides.len()];
    for (t, triangle) in mesh.triangles.iter().enumerate() {
        triangle.sides.iter().for_each(|&s| at_side[s].push(t));
    }
    let mut seen = vec![false; mesh.triangles.len()];
    let mut pieces = Vec::new();
    for start in 0..seen.len() {
        if std::mem::replace(&mut seen[start], true) {
            continue;
        }
        let mut piece = vec![start];
        let mut next = 0;
        while let Some(&t) = piece.get(next) {
            for &other in mesh.triangles[t].sides.iter().flat_map(|&s| &at_side[s]) {
                if !std::mem::replace(&mut seen[other], true) {
                    piece.push(other);
                }
            }
            next += 1;
        }
        pieces.push(piece);
    }
    pieces
}

/// Whether a piece can move without bending: nothing holds it, or one straight line alone does and `clamps`
/// finds no side that resists turning about that line.
pub fn floats(mesh: &Mesh, piece: &Piece, clamps: impl Fn(usize) -> bool) -> bool {
    let mut edges: Vec<usize> = Vec::new();
    for &s in piece.iter().flat_map(|&t| &mesh.triangles[t].sides) {
        if let Rim::Held { edge, .. } = mesh.sides[s].rim {
            if clamps(s) {
                return false;
            }
            edges.push(edge);
        }
    }
    edges.iter().all(|e| Some(e) == edges.first())
}

/// A point in the piece: the middle of the triangle nearest to its centroid, as that may lie in an opening.
pub fn middle(mesh: &Mesh, piece: &Piece) -> (f64, f64) {
    let middles: Vec<_> = piece
        .iter()
        .map(|&t| {
            let p = mesh.triangles[t].nodes.map(|n| mesh.nodes[n]);
            let double =
                (p[1][0] - p[0][0]) * (p[2][1] - p[0][1]) - (p[1][1] - p[0][1]) * (p[2][0] - p[0][0]);
            (double, (p[0][0] + p[1][0] + p[2][0]) / 3.0, (p[0][1] + p[1][1] + p[2][1]) / 3.0)
        })
        .collect();
    let area: f64 = middles.iter().map(|m| m.0).sum();
    let x = middles.iter().map(|m| m.0 * m.1).sum::<f64>() / area;
    let y = middles.iter().map(|m| m.0 * m.2).sum::<f64>() / area;
    let away = |m: &(f64, f64, f64)| (m.1 - x).hypot(m.2 - y);
    middles.iter().min_by(|a, b| away(a).total_cmp(&away(b))).map_or((x, y), |m| (m.1, m.2))
}
