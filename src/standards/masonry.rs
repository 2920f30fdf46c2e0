//! What masonry is made of, in the words the tables of EN 1996-1-1 use.

use std::fmt;

pub use super::tables::annex_e::Edge;
pub use super::tables::wind::Terrain as TerrainCategory;

/// A kind of masonry unit, as the UK National Annex's tables tell them apart.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum UnitKind {
    /// Fired clay brick.
    ClayBrick,
    /// Calcium silicate (sand-lime) unit of brick size.
    CalciumSilicateBrick,
    /// Aggregate concrete unit of brick size.
    ConcreteBrick,
    /// Aggregate concrete block, dense or lightweight.
    AggregateBlock,
    /// Autoclaved aerated concrete block.
    AacBlock,
    /// Manufactured (cast) stone unit.
    ManufacturedStone,
    /// Dimensioned natural stone unit.
    NaturalStone,
}

impl UnitKind {
    /// Every kind, in the order of the tables.
    pub const ALL: [Self; 7] = [
        Self::ClayBrick,
        Self::CalciumSilicateBrick,
        Self::ConcreteBrick,
        Self::AggregateBlock,
        Self::AacBlock,
        Self::ManufacturedStone,
        Self::NaturalStone,
    ];
}

impl fmt::Display for UnitKind {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::ClayBrick => "clay brick",
            Self::CalciumSilicateBrick => "calcium silicate brick",
            Self::ConcreteBrick => "aggregate concrete brick",
            Self::AggregateBlock => "aggregate concrete block",
            Self::AacBlock => "autoclaved aerated concrete block",
            Self::ManufacturedStone => "manufactured stone",
            Self::NaturalStone => "dimensioned natural stone",
        })
    }
}

/// The group of a unit by its voids: EN 1996-1-1 3.1.1, Table 3.1.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Group {
    /// Voids of at most 25 %: solid, frogged and most perforated bricks, solid blocks.
    One,
    /// Vertical holes, above 25 %.
    Two,
}

impl fmt::Display for Group {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::One => "Group 1",
            Self::Two => "Group 2",
        })
    }
}

/// General purpose mortar by its strength class, or lime mortar.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Mortar {
    /// Class M12, designation (i).
    M12,
    /// Class M6, designation (ii).
    M6,
    /// Class M4, designation (iii).
    M4,
    /// Class M2, designation (iv).
    M2,
    /// Lime mortar without cement, as found in older walls.
    Lime,
}

impl Mortar {
    /// Every mortar, strongest first.
    pub const ALL: [Self; 5] = [Self::M12, Self::M6, Self::M4, Self::M2, Self::Lime];

    /// Compressive strength f_m, N/mm²: the class number of EN 998-2; for lime 1.0.
    ///
    /// The lime value is a cautious assumption from memory (confidence L): state it as one.
    pub const fn f_m(self) -> f64 {
        match self {
            Self::M12 => 12.0,
            Self::M6 => 6.0,
            Self::M4 => 4.0,
            Self::M2 => 2.0,
            Self::Lime => 1.0,
        }
    }
}

impl fmt::Display for Mortar {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::M12 => "M12",
            Self::M6 => "M6",
            Self::M4 => "M4",
            Self::M2 => "M2",
            Self::Lime => "lime",
        })
    }
}

/// Category of masonry units by their attestation: EN 1996-1-1 2.4.3, EN 771.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Category {
    /// Category I: declared strength with not more than 5 % probability of falling short.
    One,
    /// Category II: any other, and every unit in an existing wall unless shown otherwise.
    Two,
}

impl fmt::Display for Category {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::One => "Category I",
            Self::Two => "Category II",
        })
    }
}

/// Class of execution control: UK National Annex to EN 1996-1-1, Table NA.1.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum ExecutionClass {
    /// Class 1: supervised and tested work.
    One,
    /// Class 2: any other, and every existing wall unless shown otherwise.
    Two,
}

impl fmt::Display for ExecutionClass {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::One => "class 1",
            Self::Two => "class 2",
        })
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn mortars_stand_strongest_first() {
        for pair in Mortar::ALL.windows(2) {
            assert!(pair[0].f_m() > pair[1].f_m(), "{} before {}", pair[0], pair[1]);
        }
    }
}
