//! The building, complete and valid: what the checks may rely on.
//!
//! Reading and judging the job file happens in `job`; nothing here can be half given. Lengths,
//! forces and stresses are typed quantities; a value that departs from a rule carries its reason.

mod descent;
mod floors;
pub mod found;
mod heights;
mod parts;
mod plan;
mod practice;
mod site;
mod things;
mod words;

pub use descent::{
    LED, Led, Stack, State, TakeDown, Trouble, line_of, stands_in, storey_height, take_down, take_loads,
};
pub use floors::{Collapse, Diaphragm, FloorEdge, Strap};
pub use found::Found;
pub use heights::strip_height;
pub use parts::{
    Basis, BuildUp, Cause, Identity, Leaf, Material, Person, Revision, Signatures, Storey, Strength,
    UnitStrength,
};
pub use plan::{AreaLoad, At, PlanBeam, PlanFloor, PlanOpening, PlanWall};
pub use practice::{Logo, Practice};
pub use site::{
    Dominant, Feature, Orography, Readings, Roof, RoofForm, Sector, Site, StatedWind, Town, Wind,
};
pub use things::{
    Arching, Assumption, Bearing, Before, BracingWall, Edge, Flange, Footing, FromAbove, Head, HoldPoint,
    Link, Load, Padstone, Panel, PanelOpening, Photograph, Pointed, Removed, Return, Span, Stability,
};
pub use words::{
    Acts, Along, BaseJoint, CollapseClass, DiaphragmProof, Ends, FloorKind, Frame, Joists, PanelRoute, Path,
    Proof, Restraint, ShareBy, Sharing, Side, Stands, Status, StrapsKnown, WindRoute,
};

/// Everything a pack is made from.
#[derive(Clone, Debug)]
pub struct Building {
    /// Who, where, what for.
    pub identity: Identity,
    /// Who made and who checked it.
    pub signatures: Signatures,
    /// At least one; the last is the current.
    pub revisions: Vec<Revision>,
    /// Safety basis.
    pub basis: Basis,
    /// Wind on the site.
    pub wind: Wind,
    /// Masonry by name.
    pub materials: Vec<Material>,
    /// Wall build-ups by name.
    pub build_ups: Vec<BuildUp>,
    /// Storeys, lowest first.
    pub storeys: Vec<Storey>,
    /// Walls as lines, for the key plan; may be empty.
    pub plan: Vec<PlanWall>,
    /// What floors and roofs weigh, by name.
    pub area_loads: Vec<AreaLoad>,
    /// Floors and roofs on the plan; where there are none nothing is led down.
    pub floors: Vec<PlanFloor>,
    /// Beams on the plan.
    pub beams: Vec<PlanBeam>,
    /// Sides of the plan on which a neighbour adjoins.
    pub neighbours: Vec<Side>,
    /// Where north is, degrees clockwise from the top of the page.
    pub north: f64,
    /// The wall that comes out.
    pub removed: Removed,
    /// The storey's stability, before and after.
    pub stability: Option<Stability>,
    /// What stays and braces.
    pub returns: Vec<Return>,
    /// Where beams bear on returns.
    pub bearings: Vec<Bearing>,
    /// Padstones to choose from.
    pub padstones: Vec<Padstone>,
    /// Outer walls between supports.
    pub panels: Vec<Panel>,
    /// Edges of floors along the panels.
    pub floor_edges: Vec<FloorEdge>,
    /// The floor in its plane, where it is given.
    pub diaphragm: Option<Diaphragm>,
    /// Class for disproportionate collapse, where it is stated.
    pub collapse: Option<Collapse>,
    /// The chain from the wind face to the ground.
    pub links: Vec<Link>,
    /// What was taken to be so.
    pub assumptions: Vec<Assumption>,
    /// What must be closed before the wall comes down.
    pub hold_points: Vec<HoldPoint>,
    /// Photographs, with paths relative to the job file.
    pub photographs: Vec<Photograph>,
    /// Who is responsible for what, in the order given.
    pub responsible: Vec<(String, String)>,
    /// The practice that makes the pack, where it has a file.
    pub practice: Option<Practice>,
    /// What the plan shows of the removal, where it has floors.
    pub found: Found,
    /// Possible but odd values, as sentences.
    pub warnings: Vec<String>,
}

impl Building {
    /// The build-up named `name`. A valid building has every one that it names.
    pub fn build_up(&self, name: &str) -> Option<&BuildUp> {
        self.build_ups.iter().find(|b| b.name == name)
    }

    /// The material named `name`.
    pub fn material(&self, name: &str) -> Option<&Material> {
        self.materials.iter().find(|m| m.name == name)
    }

    /// The panel marked `mark`.
    pub fn panel(&self, mark: &str) -> Option<&Panel> {
        self.panels.iter().find(|p| p.mark == mark)
    }

    /// Every footing, with the return that stands on it.
    pub fn footings(&self) -> impl Iterator<Item = (&Return, &Footing)> {
        self.returns.iter().filter_map(|r| Some((r, r.footing.as_ref()?)))
    }

    /// The storey marked `mark`.
    pub fn storey(&self, mark: &str) -> Option<&Storey> {
        self.storeys.iter().find(|s| s.mark == mark)
    }
}
