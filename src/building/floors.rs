//! How the floor takes part: its edge along an outer wall, its plane, and the class of the building.

use super::{Cause, CollapseClass, DiaphragmProof, Joists, StrapsKnown};
use crate::quantity::{Force, Length, LineLoad};

/// The edge of a floor or roof along the top of a panel.
#[derive(Clone, Debug)]
pub struct FloorEdge {
    /// Mark.
    pub mark: String,
    /// The panel whose top it holds, by mark.
    pub panel: String,
    /// Height of wind face that this floor collects.
    pub strip_height: Length,
    /// How the joists run.
    pub joists: Joists,
    /// What is known of straps.
    pub known: StrapsKnown,
    /// Who saw them and when, or what is to be done; never empty where they were seen.
    pub words: String,
    /// The straps, where there are or will be any.
    pub strap: Option<Strap>,
}

/// Straps along an edge, all alike.
#[derive(Clone, Debug)]
pub struct Strap {
    /// Greatest distance between two.
    pub spacing: Length,
    /// Declared strength of one in tension.
    pub strength: Cause<Force>,
}

/// A floor or roof that brings the wind in its plane to the bracing walls.
#[derive(Clone, Debug)]
pub struct Diaphragm {
    /// The storey at whose head it lies.
    pub storey: String,
    /// Distance between the bracing walls that take the force after the removal.
    pub span: Length,
    /// The same before, where it is given.
    pub span_before: Option<Length>,
    /// Depth along the wind.
    pub depth: Length,
    /// Its openings, in words.
    pub openings: String,
    /// How it is shown.
    pub proof: DiaphragmProof,
    /// Design resistance per depth; there with `proof` by shear flow, and only then.
    pub resistance: Option<Cause<LineLoad>>,
}

/// The consequence class for disproportionate collapse.
#[derive(Clone, Debug)]
pub struct Collapse {
    /// Class.
    pub class: CollapseClass,
    /// Why.
    pub reason: String,
}
