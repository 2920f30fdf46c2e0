//! Loads led down a building to the ground by statics alone: floors and roofs to walls and beams,
//! beams to walls, walls to the walls below.
//!
//! Everything lies along x or y. A floor spans one way, as simple spans between the supports that
//! lie under it; a beam is a simple beam between the middles of its bearings; what stands over an
//! opening goes to its two sides by the lever rule. Forces in N, lengths in mm. A load is dead,
//! imposed and roof uplift, in this order, each positive.
//!
//! * [`Model`]: what stands; [`lead_down`]: what arrives where
//! * `spread`: floors to supports; `down`: walls and beams, storey by storey

mod down;
mod load;
mod spread;
#[cfg(test)]
mod tests;

pub use down::lead_down;
pub use load::{Line, Loads, Point, Triple, add, times};

/// Direction of a length.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Axis {
    /// Along x.
    X,
    /// Along y.
    Y,
}

impl Axis {
    /// The other direction.
    pub const fn across(self) -> Self {
        match self {
            Self::X => Self::Y,
            Self::Y => Self::X,
        }
    }
}

/// Where something long lies: its direction, its place across it, and its extent along it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Place {
    /// Direction of its length.
    pub along: Axis,
    /// Place across.
    pub at: f64,
    /// Where it begins; less than `to`.
    pub from: f64,
    /// Where it ends.
    pub to: f64,
}

/// A hole in a wall.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Opening {
    /// Where it begins, along the wall.
    pub from: f64,
    /// Where it ends.
    pub to: f64,
    /// Weight of wall over it, per length.
    pub over: f64,
    /// Weight of wall under its sill, per length.
    pub under: f64,
}

/// A wall of one storey.
#[derive(Clone, Debug, PartialEq)]
pub struct Wall {
    /// Storey, 0 the lowest.
    pub storey: usize,
    /// Where it stands.
    pub place: Place,
    /// Thickness: what meets it may bear anywhere on it.
    pub thickness: f64,
    /// Own weight per length where it has no opening.
    pub weight: f64,
    /// In order, apart from each other.
    pub openings: Vec<Opening>,
}

/// A beam at the head of a storey.
#[derive(Clone, Debug, PartialEq)]
pub struct Beam {
    /// Storey under it.
    pub storey: usize,
    /// From end to end, bearings included.
    pub place: Place,
    /// Own weight per length.
    pub weight: f64,
    /// Length of bearing at each end.
    pub bearing: f64,
}

/// A floor or roof at the head of a storey, a rectangle.
#[derive(Clone, Debug, PartialEq)]
pub struct Floor {
    /// Storey under it.
    pub storey: usize,
    /// Extent along x.
    pub x: (f64, f64),
    /// Extent along y.
    pub y: (f64, f64),
    /// Direction in which it spans.
    pub spans: Axis,
    /// Load per area.
    pub load: Triple,
}

/// What stands, with the places of everything in its list as names.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Model {
    /// How many storeys.
    pub storeys: usize,
    /// Walls.
    pub walls: Vec<Wall>,
    /// Beams.
    pub beams: Vec<Beam>,
    /// Floors and roofs.
    pub floors: Vec<Floor>,
    /// How far a floor may stand out beyond its last support, and how far lines may miss each other.
    pub reach: f64,
}

/// A wall or a beam, by its place in the list.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Support {
    /// A wall.
    Wall(usize),
    /// A beam.
    Beam(usize),
}

/// What brings a load.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum From {
    /// A floor.
    Floor(usize),
    /// The wall above.
    Wall(usize),
    /// A beam's end, 0 the first.
    Beam(usize, usize),
    /// Own weight.
    Own,
}

/// The part of a wall between two openings, or an opening and an end.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Pier {
    /// Where it begins.
    pub from: f64,
    /// Where it ends.
    pub to: f64,
    /// Load at its head, jambs included.
    pub head: Triple,
    /// First moment of that load about the middle of the pier.
    pub moment: Triple,
    /// Load at its foot: its own weight and that over the openings beside it added.
    pub foot: Triple,
    /// First moment of the load at the foot about the middle of the pier.
    pub foot_moment: Triple,
    /// Of the load at its head what floors and beams bring from the lower and from the upper side across.
    pub sides: [Triple; 2],
}

/// What a wall carries.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct OnWall {
    /// At its head, as it arrives.
    pub head: Loads,
    /// At its foot, as it goes on.
    pub foot: Loads,
    /// Between openings.
    pub piers: Vec<Pier>,
}

/// What a beam carries, and where it puts it.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct OnBeam {
    /// What stands on it, own weight included.
    pub loads: Loads,
    /// Reaction at the first and the second end.
    pub reactions: [Triple; 2],
    /// What is under each end.
    pub under: [Option<Support>; 2],
}

/// What arrives where.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Descent {
    /// One for each wall.
    pub walls: Vec<OnWall>,
    /// One for each beam.
    pub beams: Vec<OnBeam>,
    /// All that was put on.
    pub applied: Triple,
    /// All that reaches the ground.
    pub ground: Triple,
}

/// Why a load does not reach the ground.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Trouble {
    /// A floor has no support at an edge, over this stretch across its span.
    FloorFloats {
        /// Which floor.
        floor: usize,
        /// Where the stretch begins.
        from: f64,
        /// Where it ends.
        to: f64,
    },
    /// Nothing stands under part of a wall.
    WallFloats {
        /// Which wall.
        wall: usize,
        /// Where that part begins.
        from: f64,
        /// Where it ends.
        to: f64,
    },
    /// Nothing is under an end of a beam.
    BeamFloats {
        /// Which beam.
        beam: usize,
        /// Which end, 0 the first.
        end: usize,
    },
    /// An opening leaves no wall beside it to carry what is over it.
    NoJamb {
        /// Which wall.
        wall: usize,
        /// Which opening.
        opening: usize,
    },
    /// Beams that carry each other in a ring.
    Ring {
        /// One of them.
        beam: usize,
    },
}
