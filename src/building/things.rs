//! What is checked and what carries it: returns, panels, bracing walls, links, hold points.

use super::{
    Acts, Along, BaseJoint, Cause, Ends, Frame, PanelRoute, Path, Proof, Restraint, ShareBy, Sharing, Stands,
};
use crate::quantity::{Force, Length, LineLoad, Moment, Num, Stress, Weight};

/// The wall that comes out.
#[derive(Clone, Debug)]
pub struct Removed {
    /// Mark or name.
    pub wall: String,
    /// Build-up by name.
    pub build_up: String,
    /// Length taken out.
    pub length: Length,
    /// Storey by mark.
    pub storey: String,
    /// What it carried.
    pub carried: String,
    /// What it braced.
    pub braced: String,
}

/// A wall that takes wind in its plane, in the storey of the removed wall.
#[derive(Clone, Debug)]
pub struct BracingWall {
    /// Mark; a return of the same mark is this wall.
    pub mark: String,
    /// Direction of its length.
    pub along: Along,
    /// Position across its length.
    pub at: Length,
    /// Position of its middle along its length; needed for torsion.
    pub other_at: Option<Length>,
    /// Length.
    pub length: Length,
    /// Height.
    pub height: Length,
    /// Build-up by name.
    pub build_up: String,
    /// When it stands.
    pub stands: Stands,
    /// Cantilever or fixed at both ends.
    pub ends: Ends,
}

/// How the storey's wind is shared, before and after.
#[derive(Clone, Debug)]
pub struct Stability {
    /// Storey by mark.
    pub storey: String,
    /// Wind direction in which the removed wall braced.
    pub wind_along: Along,
    /// Extent of the wind face, across the wind.
    pub front: (Length, Length),
    /// Height of wind face collected at the head of this storey.
    pub strip_height: Length,
    /// How the force is shared.
    pub share_by: ShareBy,
    /// Characteristic wind force of everything above.
    pub force_above: Force,
    /// Dead load of the storey at this level, for the tilt.
    pub dead: Force,
    /// Imposed load of the storey at this level, for the tilt.
    pub imposed: Force,
    /// The walls.
    pub walls: Vec<BracingWall>,
    /// All of it comes from the plan, not from the job file.
    pub from_plan: bool,
}

/// A vertical load on a return.
#[derive(Clone, Debug)]
pub struct Load {
    /// What brings it.
    pub what: String,
    /// Characteristic dead load.
    pub dead: Force,
    /// Characteristic imposed load.
    pub imposed: Force,
    /// Characteristic roof uplift contained in this load.
    pub uplift: Force,
    /// Place along the return from the junction end.
    pub at: Length,
    /// Eccentricity across the thickness.
    pub eccentricity: Length,
    /// Which leaf, by place in the build-up.
    pub leaf: usize,
    /// Where the figures come from.
    pub source: String,
}

/// The junction with the wall that the return buttresses.
#[derive(Clone, Debug)]
pub struct Flange {
    /// The wall met.
    pub to: String,
    /// Bonded, so that a flange may be counted.
    pub bonded: bool,
    /// How that is known.
    pub proof: Proof,
    /// Who saw it and when, or what is assumed.
    pub words: String,
    /// Thickness of the leaf met.
    pub thickness: Length,
    /// Distance to the end or an opening, each side.
    pub left: Length,
    /// Distance to the end or an opening, each side.
    pub right: Length,
    /// Clear distance to the next shear wall, each side.
    pub next_wall_left: Option<Length>,
    /// Clear distance to the next shear wall, each side.
    pub next_wall_right: Option<Length>,
    /// Dead load per length in the wall met at the foot of the return, own weight included.
    pub dead: LineLoad,
    /// Roof uplift that is not off this load yet.
    pub uplift: LineLoad,
}

/// How the head of a return is held in its plane.
#[derive(Clone, Debug, PartialEq)]
pub enum Head {
    /// Cantilever.
    Free,
    /// Held by the named bracing walls.
    Propped(Vec<String>),
}

/// Wind from the storeys above, characteristic.
#[derive(Clone, Copy, Debug, Default)]
pub struct FromAbove {
    /// Force at the head.
    pub force: Force,
    /// Moment at the head.
    pub moment: Moment,
}

/// A return: a short length of wall that takes wind in its plane.
#[derive(Clone, Debug)]
pub struct Return {
    /// Mark.
    pub mark: String,
    /// Title.
    pub title: String,
    /// Build-up by name.
    pub build_up: String,
    /// Storey by mark.
    pub storey: String,
    /// Length in its plane.
    pub length: Length,
    /// Clear height.
    pub height: Length,
    /// Place of the mark on the plan.
    pub position: Option<(Length, Length)>,
    /// The joint at its foot.
    pub base: BaseJoint,
    /// Why the base is held to be bonded.
    pub base_reason: String,
    /// Coefficient of friction at the dpc, with its reason.
    pub mu: Cause<Num>,
    /// Head in plane.
    pub head: Head,
    /// How the wind reaches it.
    pub path: Path,
    /// Tributary width of wind face.
    pub tributary_width: Length,
    /// Height of wind face that the floor collects (up-and-down path).
    pub strip_height: Option<Length>,
    /// Wind from above.
    pub from_above: FromAbove,
    /// Own net overall pressure instead of the site's.
    pub wind: Option<Cause<Stress>>,
    /// What holds head and foot out of plane.
    pub restraint: Restraint,
    /// Overall height of the wall it buttresses.
    pub supported_wall_height: Length,
    /// Distance to the nearest opening in that wall.
    pub nearest_opening: Option<Length>,
    /// What stiffens the other vertical edge, and how that is known; none where that end is free.
    pub far_end: Option<String>,
    /// Which leaves act.
    pub acts: Acts,
    /// Vertical loads; own weight is added by the check.
    pub loads: Vec<Load>,
    /// Junction with the supported wall.
    pub junction: Flange,
    /// What it stands on in the ground, where that is to be checked.
    pub footing: Option<Footing>,
}

/// The strip footing under a return.
#[derive(Clone, Debug)]
pub struct Footing {
    /// Mark.
    pub mark: String,
    /// Width, across the wall.
    pub width: Length,
    /// Thickness of the concrete.
    pub thickness: Length,
    /// How far it counts beyond the free end of the return; 0 has an empty reason.
    pub beyond_free_end: Cause<Length>,
    /// How far it counts beyond the junction end; 0 has an empty reason.
    pub beyond_junction: Cause<Length>,
    /// Weight of the footing; the usual one has an empty reason.
    pub density: Cause<Weight>,
    /// Pressure that the ground is allowed.
    pub allowable: Cause<Stress>,
    /// Seen or assumed.
    pub proof: Proof,
    /// Who saw it and when, or what is assumed.
    pub words: String,
    /// Middle of the wall from the middle of the footing, positive towards the inner leaf.
    pub offset: Length,
    /// What pressed it before the removal.
    pub before: Option<Before>,
}

/// Characteristic loads per length on a footing before the removal, without the footing itself.
#[derive(Clone, Copy, Debug)]
pub struct Before {
    /// It comes from the plan, not from the job file.
    pub led: bool,
    /// Dead.
    pub dead: LineLoad,
    /// Imposed.
    pub imposed: LineLoad,
}

/// Where a beam bears on a return. Dead load, imposed load, place and eccentricity are those of the load.
#[derive(Clone, Debug)]
pub struct Bearing {
    /// Mark.
    pub mark: String,
    /// The beam, by mark.
    pub beam: String,
    /// The return, by mark.
    pub on: String,
    /// The load of that return, by what brings it; no other load of the return is called so.
    pub load: String,
    /// Length of the bearing along the wall, centred on the load; it stays on the wall.
    pub length: Length,
    /// Width of the bearing across the wall, at most the leaf's thickness.
    pub width: Length,
    /// Height of the underside of the beam above the foot of the return.
    pub level: Length,
    /// Whether a padstone of the list is put under the beam.
    pub padstone: bool,
}

/// A padstone of the practice's list.
#[derive(Clone, Debug)]
pub struct Padstone {
    /// Name.
    pub name: String,
    /// Length along the wall.
    pub length: Length,
    /// Width across the wall.
    pub width: Length,
    /// Height.
    pub height: Length,
    /// Characteristic cylinder strength of its concrete, f_ck.
    pub strength: Stress,
}

/// One edge of a panel.
#[derive(Clone, Debug)]
pub struct Edge {
    /// Free, simple or continuous.
    pub kind: crate::standards::masonry::Edge,
    /// The stretch of the edge that is held so, from the left end or the foot; none where all of it is.
    pub stretch: Option<(Length, Length)>,
    /// Whether a damp-proof course runs along it: simple by hand, held against turning by the weight on it alone in
    /// limit analysis.
    pub dpc: bool,
    /// Why.
    pub reason: String,
}

/// A panel between its supports, before or after.
#[derive(Clone, Debug)]
pub struct Span {
    /// Length between vertical supports.
    pub length: Length,
    /// Where it begins and ends along its plan wall, in the plan's x or y, smaller first; none where the job
    /// does not name the walls that hold it.
    pub ends: Option<(Length, Length)>,
    /// Top edge.
    pub top: Edge,
    /// Base edge.
    pub base: Edge,
    /// Left edge, seen from outside.
    pub left: Edge,
    /// Right edge.
    pub right: Edge,
    /// Doors and windows from left to right, apart from each other and from the ends.
    pub openings: Vec<PanelOpening>,
}

/// A door or window of a panel.
#[derive(Clone, Debug, PartialEq)]
pub struct PanelOpening {
    /// From the left end of the panel to it, seen from outside.
    pub at: Length,
    /// Width.
    pub width: Length,
    /// Height of the sill above the foot of the panel; nil for a door.
    pub sill: Length,
    /// Height of the opening.
    pub height: Length,
    /// How its frame passes the wind on.
    pub frame: Frame,
    /// How far its lintel bears on the wall at either end, where that is known.
    pub bearing: Option<Length>,
}

/// What resists the arch thrust.
#[derive(Clone, Debug)]
pub struct Arching {
    /// Reason why the abutments hold.
    pub abutment: String,
    /// Spans vertically (between floors) or horizontally (between returns).
    pub vertical: bool,
}

/// An outer wall across its plane.
#[derive(Clone, Debug)]
pub struct Panel {
    /// Mark.
    pub mark: String,
    /// Title.
    pub title: String,
    /// Build-up by name.
    pub build_up: String,
    /// Storey by mark.
    pub storey: String,
    /// Clear height.
    pub height: Length,
    /// Plan wall it belongs to.
    pub on: Option<String>,
    /// Dead load per length on the loaded leaf at the top of the panel.
    pub dead_above: LineLoad,
    /// Roof uplift that is not off this load yet.
    pub lift_above: LineLoad,
    /// Own net pressure instead of the site's.
    pub wind: Option<Cause<Stress>>,
    /// Which route decides.
    pub route: PanelRoute,
    /// How two leaves share the wind.
    pub sharing: Sharing,
    /// Before the removal.
    pub before: Span,
    /// After the removal.
    pub after: Span,
    /// Whether an edge was taken from the plan, because the job does not say how it is held.
    pub edges_taken: bool,
    /// Where the removed wall met it, from the left end of the panel after removal.
    pub wall_at: Option<Length>,
    /// Abutments, for the arching route.
    pub arching: Option<Arching>,
}

/// One link of the chain from the wind face to the ground.
#[derive(Clone, Debug)]
pub struct Link {
    /// Which link.
    pub link: String,
    /// How it is known.
    pub proof: Proof,
    /// The rule, the witness, or what is to be done.
    pub words: String,
    /// Marks it concerns; empty for all.
    pub of: Vec<String>,
}

/// Something taken to be so.
#[derive(Clone, Debug)]
pub struct Assumption {
    /// Text.
    pub text: String,
    /// Where it comes from.
    pub source: String,
}

/// Something to be closed before the wall comes down.
#[derive(Clone, Debug)]
pub struct HoldPoint {
    /// Text.
    pub text: String,
    /// The same in plain words, for the client.
    pub plain: Option<String>,
    /// Marks it concerns; empty for all.
    pub of: Vec<String>,
    /// Who closed it and when.
    pub closed: Option<String>,
}

/// A photograph beside the job file.
#[derive(Clone, Debug)]
pub struct Photograph {
    /// Path relative to the job file.
    pub file: String,
    /// Caption.
    pub caption: String,
    /// Mark it belongs to.
    pub mark: Option<String>,
    /// What is pointed at in it.
    pub marks: Vec<Pointed>,
}

/// A part that is seen at a point of a photograph.
#[derive(Clone, Debug, PartialEq)]
pub struct Pointed {
    /// Mark of the part.
    pub of: String,
    /// Place in the upright picture as parts of its width from the left and of its height from the top, 0 to 1.
    pub at: (f64, f64),
}
