//! The safe side of the collapse pressure: a moment field in equilibrium that breaks nowhere.
//!
//! Equilibrium method of limit analysis (the static theorem of plasticity) with Johansen's criterion for
//! plates that are equally strong in sagging and hogging. The pressure is the greatest for which such a
//! field exists among those of constant moments in each triangle, with beams added where bed joints are weak.
//!
//! * `lines`, `mesh`: cells and triangles round the openings
//! * `statics`: what the moment on a side does to nodes and triangles
//! * `strengths`, `strips`: what triangles bear, and the beams that weak bed joints need
//! * `loads`: the wind at the nodes
//! * `pieces`: parts that nothing holds
//! * `programme`, `rows`, `solver`: the cone programme

mod lines;
pub(super) mod loads;
pub(super) mod mesh;
mod pieces;
mod programme;
pub(super) mod rows;
pub(super) mod solver;
pub(super) mod statics;
pub(super) mod strengths;
mod strips;

use crate::solve::plate::{Plate, Trouble};
use loads::loads;
use mesh::{Mesh, Rim, Triangle, mesh};
use pieces::{Piece, floats, middle, pieces};
use programme::{Found, Problem};
pub use statics::Moments;
use statics::{even, forces};
use strengths::{Strengths, strengths};
use strips::{add_forces, move_loads, strips};

/// A factor below this part of its scale, `m_H / max(l, h)^2`, is nought: the panel is a mechanism.
const NOUGHT: f64 = 1e-6;

/// What to multiply [`Safe::pressure`] by for a spacing of `max(l, h) / 32`.
///
/// The load stands at the nodes, so a coarse mesh can miss a peak between them and lie above the exact value.
/// Against a spacing of `max(l, h) / 64`, 54 panels (three shapes, edges and strengths, with and without a
/// window, own trial) came out between 0.99 % below and 0.094 % above; the worst, 4.0 x 2.6 m on simple
/// edges, lies about 0.13 % above its limit. With bed joints of a twelfth of `m_H` or less a panel was 0.57 % above;
/// the factor is a little less than twice that. Of 107 random ones one lay more than
/// 0.1 % above a mesh of 48 steps, by 0.25 %. At `max(l, h) / 16` it is not enough.
pub const LOWERED: f64 = 0.99;

/// What counts of a pressure found on a mesh of `parts.1` steps along the longer side, where one of `parts.0`, fewer,
/// gives `coarse`: [`LOWERED`] at most, and less where the coarser mesh lies above.
///
/// Loads stand at nodes, so a narrow pier that spans upwards with few of them misses part of its largest moment, by a
/// part that falls with the square of the step. Two meshes show it; it is taken off one and a half times. Own trial: a
/// pier of 0.2 m beside an opening of 5.1 m lies 5.2 % higher on 16 steps than on 32, which are 1.3 % too high.
pub fn counts(coarse: f64, fine: f64, parts: (f64, f64)) -> f64 {
    let (few, many) = (parts.0.powi(2), parts.1.powi(2));
    let above = (coarse / fine - 1.0).max(0.0) * few / (many - few);
    LOWERED.min(1.0 - 1.5 * above)
}

/// A triangle of the moment field.
#[derive(Clone, Copy, Debug)]
pub struct Field {
    /// Its corners, anticlockwise, mm.
    pub corners: [[f64; 2]; 3],
    /// The moments at its corners at collapse, N; sagging (bending with the pressure) is positive. They are
    /// the same at all three unless bed joints are weak there.
    pub moments: [Moments; 3],
}

/// The safe side.
#[derive(Clone, Debug)]
pub struct Safe {
    /// The collapse pressure from below, N/mm2, not yet lowered by [`LOWERED`].
    pub pressure: f64,
    /// The moment field at that pressure.
    pub field: Vec<Field>,
    /// Left, right, base, top: what each stretch gives at that pressure, in the order of `Plate::edges`, N per
    /// mm of the wall that it holds, averaged. Positive pushes against the wind; 0 where it is free or where
    /// there is no wall. A node where two stretches meet is shared by the lengths of the sides that meet.
    pub reactions: [Vec<f64>; 4],
    /// The length of wall that each of these stretches holds, mm.
    pub lengths: [Vec<f64>; 4],
    /// How many triangles the mesh has.
    pub triangles: usize,
    /// The solver's word for how it ended.
    pub status: String,
}

/// The safe side of the collapse pressure of a panel, grid steps no longer than `spacing`, mm.
///
/// # Errors
/// [`Trouble::Floating`] where a piece of the panel falls at no pressure at all, [`Trouble::NotSolved`] where
/// the solver did not converge, where there is no wall, or where spacing, size or `m_H` is not above 0.
pub fn safe(plate: &Plate<'_>, spacing: f64) -> Result<Safe, Trouble> {
    let Meshed { mesh, strengths, pieces } = meshed(plate, spacing)?;
    let size = plate.l.max(plate.h);
    let strips = strips(&mesh, &strengths);
    let mut forces = forces(&mesh);
    add_forces(&mesh, &strips, &mut forces);
    let problem = Problem { mesh: &mesh, strengths: &strengths, strips: &strips, forces: &forces };
    let mut loads = loads(plate, &mesh);
    move_loads(&mesh, &strips, &mut loads);
    loads.iter_mut().for_each(|load| *load /= size * size);
    let found = problem.greatest(&loads)?;
    if found.factor < NOUGHT {
        for piece in &pieces {
            if problem.greatest(&alone(&mesh, piece, &loads))?.factor < NOUGHT {
                return Err(floating(&mesh, piece));
            }
        }
    }
    let (reactions, lengths) = reactions(plate, &problem, &found, &loads);
    Ok(Safe {
        pressure: found.factor * plate.m_H / (size * size),
        field: field(&problem, &found, plate.m_H),
        reactions,
        lengths,
        triangles: mesh.triangles.len(),
        status: found.status,
    })
}

/// A panel in triangles, every piece of it held.
pub(super) struct Meshed {
    /// The mesh.
    pub mesh: Mesh,
    /// What it bears.
    pub strengths: Strengths,
    /// Its pieces.
    pub pieces: Vec<Piece>,
}

/// Cuts a panel into triangles.
///
/// # Errors
/// [`Trouble::Floating`] where a piece can move without bending, [`Trouble::NotSolved`] where there is no
/// wall or where spacing, size or `m_H` is not above 0.
pub(super) fn meshed(plate: &Plate<'_>, spacing: f64) -> Result<Meshed, Trouble> {
    if ![spacing, plate.l, plate.h, plate.m_H].iter().all(|&v| v > 0.0 && v.is_finite()) {
        return Err(Trouble::NotSolved("sizes, spacing and m_H must be above 0".to_owned()));
    }
    let mesh = mesh(plate, spacing);
    if mesh.triangles.is_empty() {
        return Err(Trouble::NotSolved("there is no wall".to_owned()));
    }
    let strengths = strengths(plate, &mesh);
    let pieces = pieces(&mesh);
    match pieces.iter().find(|p| floats(&mesh, p, |s| strengths.clamp[s] > 0.0)) {
        Some(piece) => Err(floating(&mesh, piece)),
        None => Ok(Meshed { mesh, strengths, pieces }),
    }
}

fn floating(mesh: &Mesh, piece: &Piece) -> Trouble {
    let (x, y) = middle(mesh, piece);
    Trouble::Floating(x, y)
}

/// The loads of one piece and none elsewhere.
fn alone(mesh: &Mesh, piece: &[usize], loads: &[f64]) -> Vec<f64> {
    let mut alone = vec![0.0; loads.len()];
    for &node in piece.iter().flat_map(|&t| &mesh.triangles[t].nodes) {
        alone[node] = loads[node];
    }
    alone
}

fn field(problem: &Problem<'_>, found: &Found, m_H: f64) -> Vec<Field> {
    let mesh = problem.mesh;
    let one = |(t, triangle): (usize, &Triangle)| {
        let even = even(mesh, triangle, &found.moments, m_H);
        let corners = triangle.nodes.map(|n| mesh.nodes[n]);
        let strip = |x| problem.strips[t / 4].iter().flat_map(move |s| s.terms(x, mesh.sides.len()));
        let moments = corners.map(|c| {
            let x: f64 = strip(c[0]).map(|(id, part)| part * found.moments[id] * m_H).sum();
            Moments { x: even.x + x, ..even }
        });
        Field { corners, moments }
    };
    mesh.triangles.iter().enumerate().map(one).collect()
}

/// One number for each stretch of each edge.
type OfStretches = [Vec<f64>; 4];

/// What is left over of the load at the held nodes, shared out to their stretches, and the lengths of wall held.
fn reactions(
    plate: &Plate<'_>,
    problem: &Problem<'_>,
    found: &Found,
    loads: &[f64],
) -> (OfStretches, OfStretches) {
    let mesh = problem.mesh;
    let mut shares = vec![0.0; mesh.nodes.len()];
    let on_supports = || {
        mesh.sides.iter().filter_map(|side| {
            let Rim::Held { edge, stretch } = side.rim else { return None };
            let [a, b] = side.nodes.map(|n| mesh.nodes[n]);
            Some((side, edge, stretch, (b[0] - a[0]).hypot(b[1] - a[1])))
        })
    };
    for (side, _, _, length) in on_supports() {
        side.nodes.iter().for_each(|&n| shares[n] += length);
    }
    let residual = |node: usize| {
        let carried: f64 = problem.forces[node].iter().map(|&(id, force)| force * found.moments[id]).sum();
        (found.factor * loads[node] - carried) * plate.m_H
    };
    let mut sums = [0, 1, 2, 3].map(|e| vec![(0.0, 0.0); plate.edges[e].len()]);
    for (side, edge, stretch, length) in on_supports() {
        let sum = &mut sums[edge][stretch];
        sum.0 += side.nodes.iter().map(|&n| residual(n) * length / shares[n]).sum::<f64>();
        sum.1 += length;
    }
    let per_length = |&(force, length): &(f64, f64)| if length > 0.0 { force / length } else { 0.0 };
    let lengths = [0, 1, 2, 3].map(|e: usize| sums[e].iter().map(|s| s.1).collect());
    (sums.map(|edge| edge.iter().map(per_length).collect()), lengths)
}
