//! Self weights of common materials and build-ups.
//!
//! Typical values from memory, within the ranges of EN 1991-1-1 Annex A and practice lists in the
//! manner of BS 648; check against the standard, and against the building.

use crate::standards::source::{Confidence, Looked, OutOfTable, Source};

const FAIR: Source = Source::memory(Confidence::Medium);

/// What a weight is given for.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Per {
    /// kN/m³.
    Volume,
    /// kN/m² of floor, of roof slope or of one wall face.
    Area,
}

/// One weight.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Weight {
    /// Name used to ask for it.
    pub name: &'static str,
    /// kN/m³ or kN/m².
    pub value: f64,
    /// Which of the two.
    pub per: Per,
}

const fn volume(name: &'static str, value: f64) -> Weight {
    Weight { name, value, per: Per::Volume }
}

const fn area(name: &'static str, value: f64) -> Weight {
    Weight { name, value, per: Per::Area }
}

/// The weights held. Brickwork ranges from 18 to 22 kN/m³ about its typical 20. From memory (M).
pub const WEIGHTS: [Weight; 18] = [
    volume("brickwork", 20.0),
    volume("dense block", 20.0),
    volume("lightweight aggregate block", 14.0),
    volume("aerated block", 7.0),
    volume("mass concrete", 24.0),
    volume("reinforced concrete", 25.0),
    volume("timber C16", 3.7),
    volume("timber C24", 4.2),
    area("plaster, two coats, 13 mm", 0.25),
    area("plasterboard, 12.5 mm", 0.12),
    area("lath and plaster", 0.45),
    area("timber floor with plasterboard ceiling", 0.6),
    area("timber floor with lath and plaster", 0.8),
    area("stud partition", 0.35),
    area("slate roof, on slope", 0.75),
    area("concrete tile roof, on slope", 0.85),
    volume("brickwork, low", BRICKWORK[0]),
    volume("brickwork, high", BRICKWORK[2]),
];

/// Brickwork: low, typical, high, kN/m³. A light wall helps less: where weight helps, take the low.
pub const BRICKWORK: [f64; 3] = [18.0, 20.0, 22.0];

/// Self weight by name, kN/m³ or kN/m² as the entry says.
///
/// # Errors
/// A name the list does not hold.
pub fn weight(name: &str) -> Result<Looked<Weight>, OutOfTable> {
    let found = WEIGHTS.iter().find(|w| w.name == name).ok_or_else(|| {
        let names: Vec<_> = WEIGHTS.iter().map(|w| w.name).collect();
        OutOfTable::new(format!("the self weight of \"{name}\""), names.join("; "))
    })?;
    Ok(Looked::new(*found, "typical weights", FAIR).row("material", found.name))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn names_are_unique_and_found() {
        for w in WEIGHTS {
            assert_eq!(weight(w.name).unwrap().value, w);
            assert_eq!(WEIGHTS.iter().filter(|o| o.name == w.name).count(), 1, "{}", w.name);
        }
        assert!(weight("gold").unwrap_err().allowed.contains("dense block"));
    }

    #[test]
    fn brickwork_lies_in_its_range() {
        let typical = weight("brickwork").unwrap().value.value;
        assert!(BRICKWORK[0] < typical && typical < BRICKWORK[2] && typical == BRICKWORK[1]);
    }
}
