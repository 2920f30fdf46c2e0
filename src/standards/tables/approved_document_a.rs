//! Rules of thumb with legal standing: Approved Document A, section 2C, of the Building
//! Regulations of England, 2013 edition.
//!
//! From a public copy, a local authority's leaflet, NHBC Standards 2020 and memory; check
//! against the document. Printed beside a calculation, never instead of it. Lengths in mm unless
//! the name says m.

use crate::standards::source::{Confidence, Looked, OutOfTable, Source};

/// Source of the rules on size, openings and the return's length.
pub const SOURCE: Source = Source::named(
    "Approved Document A, 2013 edition, from a public copy, check against the document",
    Confidence::High,
);
/// Source of the distance to the first opening and of the least corner.
pub const SOURCE_DISTANCE: Source = Source::named(
    "Approved Document A, 2013 edition, from a public copy, check against the document",
    Confidence::Medium,
);

/// Longest wall between buttressing walls, piers or chimneys, m (H).
pub const WALL_LENGTH_M: f64 = 12.0;
/// Highest wall, m (H).
pub const WALL_HEIGHT_M: f64 = 12.0;
/// Most storeys of a residential building (H).
pub const STOREYS: u32 = 3;
/// A buttressing wall's length is at least this share of the overall height of the supported wall
/// (H).
pub const BUTTRESS_LENGTH: f64 = 1.0 / 6.0;
/// From a buttressing wall's supported wall to its first opening, mm (M).
pub const BUTTRESS_TO_OPENING: f64 = 550.0;
/// An opening up to this area, m², counts as none, where it stands clear of the support (M).
pub const SMALL_OPENING_M2: f64 = 0.1;
/// An opening in a buttressing wall is at most this share of the floor-to-ceiling height (M).
pub const BUTTRESS_OPENING_HEIGHT: f64 = 0.9;
/// Least depth of a lintel with the masonry over it in a buttressing wall, mm (M).
pub const BUTTRESS_LINTEL: f64 = 150.0;
/// Least return at a corner, mm (M).
pub const CORNER: f64 = 665.0;
/// A pier that buttresses: least width, mm (H).
pub const PIER_WIDTH: f64 = 190.0;
/// A pier that buttresses: total depth, times the supported wall's thickness (H).
pub const PIER_DEPTH: f64 = 3.0;
/// All openings together: at most this share of the wall's length (H).
pub const OPENINGS_SHARE: f64 = 2.0 / 3.0;
/// Widest opening, m (H).
pub const OPENING_WIDTH_M: f64 = 3.0;
/// Highest opening, m (H).
pub const OPENING_HEIGHT_M: f64 = 2.1;
/// Deepest vertical chase, share of the leaf's thickness (H).
pub const CHASE_VERTICAL: f64 = 1.0 / 3.0;
/// Deepest horizontal chase, share of the leaf's thickness (H).
pub const CHASE_HORIZONTAL: f64 = 1.0 / 6.0;
/// Widest floor opening at a supported wall, m (H).
pub const FLOOR_OPENING_M: f64 = 3.0;
/// Straps at floors and roofs: greatest spacing, m (H).
pub const STRAP_SPACING_M: f64 = 2.0;
/// Straps: section, mm x mm (H).
pub const STRAP_SECTION: [f64; 2] = [30.0, 5.0];
/// Straps: declared tensile strength, kN (H).
pub const STRAP_STRENGTH_KN: f64 = 8.0;
/// Straps across joists: fewest joists crossed (H).
pub const STRAP_JOISTS: u32 = 3;
/// Wall ties: greatest spacing across and up, mm (H).
pub const TIE_SPACING: [f64; 2] = [900.0, 450.0];
/// Wall ties beside openings and joints: greatest spacing up, mm (H).
pub const TIE_SPACING_AT_EDGES: f64 = 300.0;
/// Wall ties beside openings and joints: within this of the edge, mm (H).
pub const TIE_EDGE_ZONE: f64 = 225.0;

/// Least length of a wall tie, mm, by cavity width, mm.
///
/// Approved Document A, section 2C (H).
///
/// # Errors
/// A cavity below 50 or above 175 mm.
pub fn tie_length(cavity: f64) -> Result<Looked<f64>, OutOfTable> {
    const ROWS: [(f64, f64, f64); 5] = [
        (50.0, 75.0, 200.0),
        (76.0, 100.0, 225.0),
        (101.0, 125.0, 250.0),
        (126.0, 150.0, 275.0),
        (151.0, 175.0, 300.0),
    ];
    // Rows are in whole millimetres: a cavity between two rows belongs to the wider one.
    let row = ROWS.iter().find(|r| cavity <= r.1).filter(|_| cavity >= ROWS[0].0);
    let (from, to, length) =
        row.ok_or_else(|| OutOfTable::new(format!("a cavity of {cavity} mm"), "50 to 175 mm"))?;
    Ok(Looked::new(*length, "Approved Document A, 2C", SOURCE).row("cavity", format!("{from} to {to} mm")))
}

/// What bears on the wall beside its openings, for the factor X.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum FloorSpan {
    /// Floors span parallel to the wall.
    Parallel,
    /// Timber floor bearing, span up to 4.5 m.
    Timber4500,
    /// Timber floor bearing, span up to 6.0 m.
    Timber6000,
    /// Concrete floor bearing, span up to 4.5 m.
    Concrete4500,
    /// Concrete floor bearing, span up to 6.0 m.
    Concrete6000,
}

/// Factor X for the width of a pier: a pier is at least the openings beside it over X.
///
/// Approved Document A, section 2C (H). `roof_bears` where the roof spans into the wall (span up
/// to 9 m); `thickness` of the inner leaf, mm: 100 and more, or 90 and more.
///
/// # Errors
/// An inner leaf thinner than 90 mm.
pub fn factor_x(roof_bears: bool, thickness: f64, floor: FloorSpan) -> Result<Looked<f64>, OutOfTable> {
    let cells = match (roof_bears, thickness) {
        (false, t) if t >= 100.0 => [6.0, 6.0, 6.0, 6.0, 6.0],
        (false, t) if t >= 90.0 => [6.0, 6.0, 6.0, 6.0, 5.0],
        (true, t) if t >= 100.0 => [6.0, 6.0, 5.0, 4.0, 3.0],
        (true, t) if t >= 90.0 => [6.0, 4.0, 4.0, 3.0, 3.0],
        (_, t) => {
            return Err(OutOfTable::new(format!("an inner leaf of {t} mm"), "90 mm and more"));
        }
    };
    let column =
        ["parallel", "timber, to 4.5 m", "timber, to 6.0 m", "concrete, to 4.5 m", "concrete, to 6.0 m"];
    let i = floor as usize;
    Ok(Looked::new(cells[i], "Approved Document A, 2C, factor X", SOURCE)
        .row("roof", if roof_bears { "spans into the wall, to 9 m" } else { "spans parallel" })
        .row("inner leaf", if thickness >= 100.0 { "from 100 mm" } else { "from 90 mm" })
        .row("floor", column[i]))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn tie_lengths_grow_with_the_cavity_and_end_with_it() {
        assert_eq!(tie_length(50.0).unwrap().value, 200.0);
        assert_eq!(tie_length(75.5).unwrap().value, 225.0);
        assert_eq!(tie_length(175.0).unwrap().value, 300.0);
        assert!(tie_length(49.0).is_err());
        assert!(tie_length(176.0).is_err());
        assert!(tie_length(f64::NAN).is_err());
    }

    #[test]
    fn factor_x_falls_with_heavier_floors_and_thinner_leaves() {
        use FloorSpan as F;
        let spans = [F::Parallel, F::Timber4500, F::Timber6000, F::Concrete4500, F::Concrete6000];
        for roof in [false, true] {
            for pair in spans.windows(2) {
                let of = |t, s| factor_x(roof, t, s).unwrap().value;
                assert!(of(100.0, pair[0]) >= of(100.0, pair[1]));
                assert!(of(100.0, pair[1]) >= of(90.0, pair[1]));
            }
        }
        assert!(factor_x(true, 89.0, F::Parallel).is_err());
        assert!(factor_x(true, f64::NAN, F::Parallel).is_err());
    }
}
