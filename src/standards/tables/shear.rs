//! Initial shear strength f_vk0.
//!
//! BS EN 1996-1-1:2005+A1:2012, 3.6.2, Table 3.4, with UK National Annex (2013), Table NA.5. N/mm².
//! From memory (M).

use crate::standards::masonry::{Mortar, UnitKind};
use crate::standards::source::{Confidence, Looked, Source};

const TABLE: &str = "Table 3.4 (UK NA Table NA.5)";
const FAIR: Source = Source::memory(Confidence::Medium);
const LIME_SOURCE: Source = Source::memory(Confidence::Low);

/// Table NA.5, clay units: columns M12, M6 and M4, M2. From memory (M).
pub const CLAY: [f64; 3] = [0.3, 0.2, 0.1];
/// Table NA.5, calcium silicate units. From memory (M).
pub const CALCIUM_SILICATE: [f64; 3] = [0.2, 0.15, 0.1];
/// Table NA.5, aggregate concrete, aerated concrete, manufactured and natural stone units. From
/// memory (M).
pub const CONCRETE_AND_STONE: [f64; 3] = [0.2, 0.15, 0.1];
/// Lime mortar with any unit: not in the table, a cautious assumption from memory (L).
pub const LIME: f64 = 0.1;

/// Characteristic initial shear strength f_vk0, N/mm².
///
/// EN 1996-1-1 Table 3.4 with UK Table NA.5, general purpose mortar. At a damp-proof course it is
/// nought unless tested: that is the caller's to say.
pub fn f_vk0(unit: UnitKind, mortar: Mortar) -> Looked<f64> {
    let row = match unit {
        UnitKind::ClayBrick => &CLAY,
        UnitKind::CalciumSilicateBrick => &CALCIUM_SILICATE,
        UnitKind::ConcreteBrick
        | UnitKind::AggregateBlock
        | UnitKind::AacBlock
        | UnitKind::ManufacturedStone
        | UnitKind::NaturalStone => &CONCRETE_AND_STONE,
    };
    let looked = match mortar {
        Mortar::M12 => Looked::new(row[0], TABLE, FAIR),
        Mortar::M6 | Mortar::M4 => Looked::new(row[1], TABLE, FAIR),
        Mortar::M2 => Looked::new(row[2], TABLE, FAIR),
        Mortar::Lime => Looked::new(LIME, "no table", LIME_SOURCE),
    };
    looked.row("unit", unit).row("mortar", mortar)
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Common practice, no published source: block work 0.15, brick work 0.2 N/mm².
    #[test]
    fn practice_values_in_m4() {
        assert_eq!(f_vk0(UnitKind::AggregateBlock, Mortar::M4).value, 0.15);
        assert_eq!(f_vk0(UnitKind::ClayBrick, Mortar::M4).value, 0.2);
    }

    #[test]
    fn weaker_mortar_never_gains_and_lime_is_marked_low() {
        for unit in UnitKind::ALL {
            for pair in Mortar::ALL.windows(2) {
                assert!(f_vk0(unit, pair[0]).value >= f_vk0(unit, pair[1]).value);
            }
            assert_eq!(f_vk0(unit, Mortar::Lime).source.confidence, Confidence::Low);
        }
    }
}
