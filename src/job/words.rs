//! The words of the job file for the kinds that the standards' tables are entered with.

use crate::building::{Proof, RoofForm};
use crate::standards::en1991_1_4::Ground;
use crate::standards::masonry::{Edge, Mortar, TerrainCategory, UnitKind};

/// Kinds of unit.
pub const UNITS: &[(&str, UnitKind)] = &[
    ("clay brick", UnitKind::ClayBrick),
    ("calcium silicate brick", UnitKind::CalciumSilicateBrick),
    ("concrete brick", UnitKind::ConcreteBrick),
    ("aggregate block", UnitKind::AggregateBlock),
    ("aac block", UnitKind::AacBlock),
    ("manufactured stone", UnitKind::ManufacturedStone),
    ("natural stone", UnitKind::NaturalStone),
];

/// Mortars.
pub const MORTARS: &[(&str, Mortar)] = &[
    ("M12", Mortar::M12),
    ("M6", Mortar::M6),
    ("M4", Mortar::M4),
    ("M2", Mortar::M2),
    ("lime", Mortar::Lime),
];

/// Terrain categories.
pub const TERRAIN: &[(&str, TerrainCategory)] = &[
    ("0", TerrainCategory::Sea),
    ("I", TerrainCategory::I),
    ("II", TerrainCategory::II),
    ("III", TerrainCategory::III),
    ("IV", TerrainCategory::IV),
];

/// What lifts the wind: Annex A.3.
pub const GROUND: &[(&str, Ground)] = &[
    ("hill", Ground::Hill),
    ("ridge", Ground::Ridge),
    ("cliff", Ground::Cliff),
    ("escarpment", Ground::Escarpment),
];

/// Forms of roof.
pub const ROOFS: &[(&str, RoofForm)] =
    &[("duopitch", RoofForm::Duopitch), ("monopitch", RoofForm::Monopitch), ("flat", RoofForm::Flat)];

/// Edges of a panel.
pub const EDGES: &[(&str, EdgeWord)] = &[
    ("free", EdgeWord::Free),
    ("simple", EdgeWord::Simple),
    ("continuous", EdgeWord::Continuous),
    ("dpc", EdgeWord::Dpc),
];

/// How a job file says that an edge is held.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum EdgeWord {
    /// Not at all.
    Free,
    /// Against moving.
    Simple,
    /// Against moving and turning.
    Continuous,
    /// Against moving at a damp-proof course, and against turning by the weight on it alone.
    Dpc,
}

impl EdgeWord {
    /// As the clauses know it: 5.5.5(5) takes an edge at a dpc as simple.
    pub const fn kind(self) -> Edge {
        match self {
            Self::Free => Edge::Free,
            Self::Simple | Self::Dpc => Edge::Simple,
            Self::Continuous => Edge::Continuous,
        }
    }
}

/// Links of the chain from the wind face to the ground, in its order.
pub const LINKS: &[&str] =
    &["wind face", "panel", "floor edge", "diaphragm", "bracing wall", "junction", "dpc", "footing"];

/// How what a wall stands on or meets is known.
pub const KNOWN: &[(&str, Proof)] = &[("seen", Proof::Seen), ("assumed", Proof::Assumed)];

/// Categories of units, by the number that the tables are entered with.
pub const CATEGORIES: &[(&str, u8)] = &[("I", 1), ("II", 2)];

/// Classes of execution.
pub const CLASSES: &[u8] = &[1, 2];

/// Groups of units.
pub const GROUPS: &[u8] = &[1, 2];

/// Leaves of a wall, outer first.
pub const LEAVES: &[u8] = &[1, 2];

/// Which strength of a unit is given: whether it is the mean one.
pub const STRENGTHS: &[(&str, bool)] = &[("mean", true), ("normalised", false)];

/// Whether upright joints are filled.
pub const PERPENDS: &[(&str, bool)] = &[("filled", true), ("unfilled", false)];

/// Heads of returns: whether something holds them.
pub const HEADS: &[(&str, bool)] = &[("free", false), ("propped", true)];

/// What lies under a beam: whether a padstone is chosen.
pub const PADSTONES: &[(&str, bool)] = &[("chosen", true), ("none", false)];

/// Spans of an arching panel: whether it is upright.
pub const ARCHES: &[(&str, bool)] = &[("vertically", true), ("horizontally", false)];

/// What the wind is read for without bearings.
pub const ANY: &str = "any";

/// Degrees from one bearing of UK Table NA.1 to the next.
pub const BEARING: f64 = 30.0;

/// Where north is on the page, degrees clockwise from its top.
pub const NORTH: &[(&str, f64)] = &[("up", 0.0), ("right", 90.0), ("down", 180.0), ("left", 270.0)];

/// A turn in degrees.
pub const TURN: super::limits::Limits = super::limits::Limits::new(0.0, 360.0, "");
