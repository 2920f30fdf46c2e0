//! Mean moments along continuous edges, held against what their clamps can bring.

use super::Solved;
use super::criterion::Use;
use crate::solve::plate::Plate;
use crate::solve::plate::safe::mesh::Rim;

/// A clamped side, by its place along its edge.
struct Piece {
    edge: usize,
    stretch: usize,
    from: f64,
    to: f64,
    /// Its moment for a pressure of 1.
    moment: f64,
    /// What it can bring.
    strength: f64,
}

/// The use of the clamp over a length of `patch` round every node of continuous edges.
///
/// The length ends with the stretch, and where there is no wall: beyond, another clamp or none holds.
pub fn uses(plate: &Plate<'_>, solved: &Solved, patch: f64) -> Vec<Use> {
    let pieces = pieces(plate, solved);
    let mut uses = Vec::new();
    for run in pieces.chunk_by(|a, b| a.edge == b.edge && a.stretch == b.stretch && a.to == b.from) {
        let ends = run.iter().map(|p| p.from).chain(run.last().map(|p| p.to));
        uses.extend(ends.map(|at| round(plate, run, at, patch)));
    }
    uses
}

/// The clamped sides in order along their edges.
fn pieces(plate: &Plate<'_>, solved: &Solved) -> Vec<Piece> {
    let mesh = &solved.mesh;
    let clamped = mesh.sides.iter().enumerate().filter_map(|(s, side)| {
        let strength = solved.strengths.clamp[s] * plate.m_H;
        let Rim::Held { edge, stretch } = side.rim else { return None };
        let along = if edge < 2 { 1 } else { 0 };
        let [a, b] = side.nodes.map(|n| mesh.nodes[n][along]);
        let piece = Piece { edge, stretch, from: a.min(b), to: a.max(b), moment: solved.normal[s], strength };
        (strength > 0.0).then_some(piece)
    });
    let mut pieces: Vec<_> = clamped.collect();
    pieces.sort_by(|a, b| a.edge.cmp(&b.edge).then(a.from.total_cmp(&b.from)));
    pieces
}

/// The use over a length of `patch` round `at`, with the least strength in it.
fn round(plate: &Plate<'_>, run: &[Piece], at: f64, patch: f64) -> Use {
    let (mut length, mut sum, mut strength, mut edge) = (0.0, 0.0, f64::INFINITY, 0);
    for piece in run {
        let inside = piece.to.min(at + patch / 2.0) - piece.from.max(at - patch / 2.0);
        if inside > 0.0 {
            length += inside;
            sum += inside * piece.moment;
            strength = strength.min(piece.strength);
            edge = piece.edge;
        }
    }
    let place = [[0.0, at], [plate.l, at], [at, 0.0], [at, plate.h]];
    Use { part: f64::abs(sum / length) / strength, bed_joint: edge >= 2, at: place[edge] }
}
