//! Identity, basis, wind, materials, build-ups and storeys.

use super::{FloorKind, Status};
use crate::quantity::{Force, Length, PerArea, Stress, Weight};
use crate::standards::masonry::{Mortar, UnitKind};

/// A value that departs from what the tool would derive, with the reason given for it.
#[derive(Clone, Debug, PartialEq)]
pub struct Cause<T> {
    /// The value.
    pub value: T,
    /// Why; never empty.
    pub reason: String,
}

/// What the pack is about.
#[derive(Clone, Debug)]
pub struct Identity {
    /// Job number.
    pub number: String,
    /// Title of the job.
    pub title: String,
    /// Address lines.
    pub address: Vec<String>,
    /// Client.
    pub client: String,
    /// Who the pack is submitted to.
    pub authority: String,
    /// Status of this issue.
    pub status: Status,
    /// Date of the visit, ISO; none prints "not visited".
    pub visited: Option<String>,
    /// One sentence on the building.
    pub building: String,
    /// One sentence on the work.
    pub work: String,
}

/// Someone who signs.
#[derive(Clone, Debug)]
pub struct Person {
    /// Name.
    pub name: String,
    /// Initials.
    pub letters: String,
    /// Letters after the name.
    pub qualification: Option<String>,
    /// How the client reaches them.
    pub contact: Option<String>,
    /// ISO date.
    pub date: String,
}

/// Who made and who checked.
#[derive(Clone, Debug)]
pub struct Signatures {
    /// The engineer.
    pub made: Person,
    /// A second person; none prints "self-checked, no second person".
    pub checked: Option<Person>,
}

/// One issue of the pack.
#[derive(Clone, Debug)]
pub struct Revision {
    /// Letter.
    pub letter: String,
    /// ISO date.
    pub date: String,
    /// What changed.
    pub note: String,
    /// The pack as it was issued, relative to the job file: a later issue lists what changed since.
    pub pack: Option<String>,
}

/// Safety basis. A material factor left `None` follows UK NA Table NA.1 from class and category.
#[derive(Clone, Debug)]
pub struct Basis {
    /// Execution class, 1 or 2.
    pub execution_class: u8,
    /// Unit category, 1 or 2.
    pub unit_category: u8,
    /// Stated factor for compression.
    pub gamma_m_compression: Option<Cause<f64>>,
    /// Stated factor for flexure.
    pub gamma_m_flexure: Option<Cause<f64>>,
    /// Stated factor for shear.
    pub gamma_m_shear: Option<Cause<f64>>,
    /// Factor on dead load where it helps; the default 0.9 has an empty reason.
    pub helping_factor: Cause<f64>,
}

/// Strength of the unit as known.
#[derive(Clone, Debug, PartialEq)]
pub enum UnitStrength {
    /// Declared mean strength, air dry; the shape factor applies to height and width.
    Mean {
        /// Strength.
        strength: Stress,
        /// Height of the unit.
        height: Length,
        /// Width of the unit.
        width: Length,
    },
    /// Normalised strength f_b.
    Normalised(Stress),
}

/// A strength stated in place of the derived one.
pub type Strength = Option<Cause<Stress>>;

/// Masonry: units in mortar.
#[derive(Clone, Debug)]
pub struct Material {
    /// Name in the job file.
    pub name: String,
    /// Kind of unit.
    pub unit: UnitKind,
    /// Group of EN 1996-1-1 Table 3.1, 1 or 2.
    pub group: u8,
    /// Strength of the unit.
    pub strength: UnitStrength,
    /// Aggregate blocks laid flat.
    pub laid_flat: bool,
    /// Mortar.
    pub mortar: Mortar,
    /// Water absorption of clay units, as a ratio (0.09 for 9 %).
    pub water_absorption: Option<f64>,
    /// Weight per volume.
    pub density: Weight,
    /// Perpends filled with mortar.
    pub perpends_filled: bool,
    /// How the material is known.
    pub source: Option<String>,
    /// Stated in place of the derived normalised unit strength.
    pub f_b: Strength,
    /// Stated in place of the derived compressive strength.
    pub f_k: Strength,
    /// Stated in place of the derived initial shear strength.
    pub f_vk0: Strength,
    /// Stated in place of the derived flexural strength parallel to the bed joints.
    pub f_xk1: Strength,
    /// Stated in place of the derived flexural strength perpendicular to the bed joints.
    pub f_xk2: Strength,
}

/// One leaf, with its actual thickness.
#[derive(Clone, Debug)]
pub struct Leaf {
    /// Material by name.
    pub material: String,
    /// Actual thickness less any chase.
    pub thickness: Length,
    /// Depth of the chase already taken off.
    pub chase: Length,
    /// Carries the floor and roof loads.
    pub loaded: bool,
}

/// How a wall is built: one leaf, or two with a cavity.
#[derive(Clone, Debug)]
pub struct BuildUp {
    /// Name in the job file.
    pub name: String,
    /// Leaves, outer first; one or two; exactly one is loaded.
    pub leaves: Vec<Leaf>,
    /// Cavity between two leaves.
    pub cavity: Option<Length>,
    /// Wall ties per area.
    pub ties: Option<PerArea>,
    /// Characteristic strength of one tie.
    pub tie_strength: Option<Cause<Force>>,
    /// A mortar joint runs parallel to the face through the wall (3.6.1.2(6)).
    pub collar_joint: bool,
}

impl BuildUp {
    /// All leaves and the cavity.
    pub fn thickness(&self) -> Length {
        self.leaves.iter().map(|l| l.thickness).sum::<Length>() + self.cavity.unwrap_or(Length::ZERO)
    }

    /// The loaded leaf and its place in `leaves`.
    pub fn loaded(&self) -> (usize, &Leaf) {
        self.leaves.iter().enumerate().find(|(_, l)| l.loaded).unwrap_or((0, &self.leaves[0]))
    }

    /// Thickness of the whole wall: leaves and cavity.
    pub fn whole(&self) -> Length {
        self.leaves.iter().map(|l| l.thickness).sum::<Length>() + self.cavity.unwrap_or(Length::ZERO)
    }

    /// Middle of leaf `k` from the middle of the wall, positive towards the inner leaf.
    pub fn place_of(&self, k: usize) -> Length {
        let before: Length = self.leaves[..k].iter().map(|l| l.thickness).sum();
        let cavity = if k > 0 { self.cavity.unwrap_or(Length::ZERO) } else { Length::ZERO };
        before + cavity + self.leaves[k].thickness / 2.0 - self.whole() / 2.0
    }
}

/// One storey.
#[derive(Clone, Debug)]
pub struct Storey {
    /// Mark.
    pub mark: String,
    /// Clear height.
    pub clear_height: Length,
    /// What is above.
    pub floor_above: FloorKind,
    /// Height from this storey's base to the top of the structure.
    pub total_height: Length,
}
