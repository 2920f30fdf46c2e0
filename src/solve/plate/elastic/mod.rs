//! Elastic moments of a panel and the pressure at its first crack: information, never a verdict.
//!
//! A thin isotropic plate (Kirchhoff). Its moments are those of least complementary energy among all moments
//! in equilibrium (Castigliano); the moments are the ones of [`super::safe`], constant in each triangle with
//! continuous normal moments, the mixed element of Hellan, Herrmann and Johnson. Thickness and modulus drop
//! out. The beams that [`super::safe`] adds to weak bed joints are left out, as no strength enters here.
//!
//! * `energy`: the quadratic programme
//! * `criterion`: how much of a strength a moment takes
//! * `patches`, `clip`: means over squares of the wall
//! * `clamps`: means along continuous edges

mod clamps;
mod clip;
mod criterion;
mod energy;
mod patches;

use super::safe::loads::loads;
use super::safe::mesh::Mesh;
use super::safe::statics::{Moments, even};
use super::safe::strengths::Strengths;
use super::safe::{Field, Meshed, meshed};
use crate::solve::plate::{Held, Plate, Stretch, Trouble};
use criterion::Use;

/// Poisson's ratio of masonry: common practice, no published source.
pub const POISSON: f64 = 0.2;

/// The side of the squares over which moments are averaged, mm: common practice, no published source.
///
/// At the re-entrant corners of openings elastic moments grow without end as the mesh gets finer. Masonry of
/// units about this long does not feel a peak narrower than a unit, so a peak by itself means nothing.
pub const PATCH: f64 = 250.0;

/// Uses nearer than this part of the greatest are one: which of them is named must not hang on rounding.
const TIE: f64 = 1e-6;

/// The first crack of an elastic panel.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct FirstCrack {
    /// The pressure at which the averaged moments first reach the strength, N/mm2; 0 where a bed joint has
    /// no strength to begin with.
    pub pressure: f64,
    /// The middle of the patch where they do, mm; on the edge where the clamp of a continuous edge gives.
    pub at: (f64, f64),
    /// Whether bending about the bed joints governs there rather than bending across them.
    pub bed_joint: bool,
    /// The same pressure by the moments as they are, not averaged, N/mm2. With a corner of an opening it
    /// falls without end as the mesh gets finer.
    pub peak: f64,
}

/// The pressure at the first crack of a panel, grid steps no longer than `spacing`, moments averaged over
/// squares of side `patch` ([`PATCH`]), mm.
///
/// Johansen's criterion, sagging and hogging: `(m_H - m_x) (m_V - m_y) >= m_xy^2`. A square stands on every
/// node, clipped to the wall that hangs together with its middle, and counts with its least `m_V`. On a
/// continuous edge the normal moment is averaged along the edge and held against what the wall and its clamp
/// can bring there; one that can bring nothing counts as simple.
///
/// At a spacing of `max(l, h) / 32` four panels of 4.0 x 2.6 m with a window came out between 0.2 % below and
/// 1.2 % above a spacing of `max(l, h) / 96` (own trial).
///
/// # Errors
/// [`Trouble::Floating`] where a piece of the panel is not held, [`Trouble::NotSolved`] where the solver did
/// not converge, where there is no wall, or where spacing, patch, size or `m_H` is not above 0.
pub fn first_crack(plate: &Plate<'_>, spacing: f64, patch: f64) -> Result<FirstCrack, Trouble> {
    if !(patch > 0.0 && patch.is_finite()) {
        return Err(Trouble::NotSolved("the patch must be above 0".to_owned()));
    }
    let solved = solve(plate, spacing, POISSON)?;
    let mut uses = patches::uses(plate, &solved, patch);
    uses.extend(clamps::uses(plate, &solved, patch));
    let most = uses.iter().map(|u| u.part).fold(0.0, f64::max);
    let Some(first) = uses.iter().find(|u| u.part >= most * (1.0 - TIE)) else {
        return Err(Trouble::NotSolved("there is no wall".to_owned()));
    };
    Ok(FirstCrack {
        pressure: most.recip(),
        at: (first.at[0], first.at[1]),
        bed_joint: first.bed_joint,
        peak: peak(plate, &solved).recip(),
    })
}

/// The elastic moments of every triangle for a pressure of 1 N/mm2, in N, with `poisson` for Poisson's ratio.
///
/// # Errors
/// As [`first_crack`]; [`Trouble::NotSolved`] too where `poisson` is not above -1 and at most 1/2.
pub fn field(plate: &Plate<'_>, spacing: f64, poisson: f64) -> Result<Vec<Field>, Trouble> {
    let Solved { mesh, fields, .. } = solve(plate, spacing, poisson)?;
    let one = |(triangle, &moments): (&[usize; 3], &Moments)| Field {
        corners: triangle.map(|n| mesh.nodes[n]),
        moments: [moments; 3],
    };
    Ok(mesh.triangles.iter().map(|t| &t.nodes).zip(&fields).map(one).collect())
}

/// The elastic state at a pressure of 1.
struct Solved {
    mesh: Mesh,
    strengths: Strengths,
    /// The normal moment of every side.
    normal: Vec<f64>,
    /// The moments of every triangle.
    fields: Vec<Moments>,
}

/// The plate while every joint is closed: what the weight alone holds against turning is a hinge.
fn uncracked<'a>(plate: &Plate<'a>) -> Plate<'a> {
    let simple = |s: &Stretch| match s.held {
        Held::Weight(_) => Stretch { held: Held::Simple, ..*s },
        Held::Free | Held::Simple | Held::Continuous(_) => *s,
    };
    let edges = plate.edges.each_ref().map(|edge| edge.iter().map(simple).collect());
    Plate { edges, openings: plate.openings.clone(), ..*plate }
}

fn solve(plate: &Plate<'_>, spacing: f64, poisson: f64) -> Result<Solved, Trouble> {
    if !(poisson > -1.0 && poisson <= 0.5) {
        return Err(Trouble::NotSolved("Poisson's ratio must be above -1 and at most 1/2".to_owned()));
    }
    let Meshed { mesh, strengths, .. } = meshed(&uncracked(plate), spacing)?;
    let normal = energy::normal_moments(&mesh, &strengths.clamp, &loads(plate, &mesh), poisson)?;
    let fields = mesh.triangles.iter().map(|t| even(&mesh, t, &normal, 1.0)).collect();
    Ok(Solved { mesh, strengths, normal, fields })
}

/// The greatest use by the moments as they are.
fn peak(plate: &Plate<'_>, solved: &Solved) -> f64 {
    let Solved { strengths, normal, fields, .. } = solved;
    let wall = fields
        .iter()
        .zip(&strengths.bed)
        .map(|(m, bed)| Use::of(m, plate.m_H, bed * plate.m_H, [0.0; 2]).part);
    let clamps = strengths.clamp.iter().zip(normal).filter(|(clamp, _)| **clamp > 0.0);
    wall.chain(clamps.map(|(clamp, m)| m.abs() / (clamp * plate.m_H))).fold(0.0, f64::max)
}
