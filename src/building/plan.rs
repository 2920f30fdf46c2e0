//! The plan: walls, floors and beams as they lie; metres of the plan in mm.

use super::{Along, Frame};
use crate::quantity::{Length, LineLoad, Stress};

/// A point of the plan, (x, y).
pub type At = (Length, Length);

/// A wall as a line on the plan.
#[derive(Clone, Debug)]
pub struct PlanWall {
    /// Mark; a return of the same mark is this wall.
    pub mark: String,
    /// Build-up by name.
    pub build_up: String,
    /// Start (x, y).
    pub from: At,
    /// End (x, y).
    pub to: At,
    /// Comes out.
    pub removed: bool,
    /// Storeys in which it stands, by mark; empty for all, or for the one of the removed wall.
    pub storeys: Vec<String>,
    /// Ends free on purpose, at an opening that reaches a corner for instance.
    pub free_end: bool,
    /// Doors and windows.
    pub openings: Vec<PlanOpening>,
}

/// A door or window of a plan wall.
#[derive(Clone, Debug)]
pub struct PlanOpening {
    /// Storey by mark.
    pub storey: String,
    /// From the start of the wall to the opening.
    pub from: Length,
    /// Width.
    pub width: Length,
    /// Height of the sill above the floor; nil for a door.
    pub sill: Length,
    /// Height of the opening.
    pub height: Length,
    /// How its frame passes the wind on.
    pub frame: Frame,
    /// How far its lintel bears on the wall at either end, where that is known.
    pub bearing: Option<Length>,
}

/// What a floor or roof weighs and carries, per area on plan.
#[derive(Clone, Debug)]
pub struct AreaLoad {
    /// Name in the job file.
    pub name: String,
    /// Parts of the dead load from the list of weights: name and kN/m²; empty where it is stated.
    pub parts: Vec<(String, f64)>,
    /// Characteristic dead load.
    pub dead: Stress,
    /// Characteristic imposed load.
    pub imposed: Stress,
    /// Characteristic uplift of the wind.
    pub uplift: Stress,
    /// Whether the job gives the uplift; else that of the wind sheet is taken, where it is worked out.
    pub uplift_given: bool,
    /// Where the figures come from.
    pub source: String,
}

/// A floor or roof: a rectangle that spans one way.
#[derive(Clone, Debug)]
pub struct PlanFloor {
    /// Mark.
    pub mark: String,
    /// What it weighs, by name.
    pub load: String,
    /// The storey under it, by mark.
    pub storey: String,
    /// A corner.
    pub from: At,
    /// The corner opposite.
    pub to: At,
    /// Direction in which it spans.
    pub spans: Along,
}

/// A beam at the head of a storey, there once the wall is out.
#[derive(Clone, Debug)]
pub struct PlanBeam {
    /// Mark.
    pub mark: String,
    /// The storey under it, by mark.
    pub storey: String,
    /// One end, bearing included.
    pub from: At,
    /// The other.
    pub to: At,
    /// Own weight.
    pub weight: LineLoad,
    /// Length of bearing at each end.
    pub bearing: Length,
}
