//! C. Arya, Design of Structural Elements, chapter on masonry to BS 5628-1 (title from memory, values
//! from a public copy of the book).

use perpend::standards::tables::panel_limits::{SIDE, Support, TOP_AND_BASE, area_over_t_ef_squared};
use perpend::standards::tables::stiffness::{PIER_OVER_WALL, SPACING_OVER_WIDTH, rho_t};

/// Fig. 5.26 (BS 5628-1, 32.3 there, 36.3 in 2005; the same in IStructE, Manual for the design of
/// plain masonry in building structures, 2nd ed., 2005): the coefficients are printed exactly. The
/// effective thickness of 156 mm is ours; areas to 0.001 m².
#[test]
fn limits_of_panels() {
    let t_ef = 0.156_f64;
    for (support, coefficient, area) in [
        (Support::ThreeEdgesTwoContinuous, 1500.0, 36.504),
        (Support::ThreeEdges, 1350.0, 32.8536),
        (Support::FourEdgesThreeContinuous, 2250.0, 54.756),
        (Support::FourEdges, 2025.0, 49.2804),
    ] {
        let looked = area_over_t_ef_squared(support).value;
        assert_eq!(looked, coefficient, "{support}");
        assert!((looked * t_ef * t_ef - area).abs() < 0.001, "{support}");
    }
    assert!((SIDE * t_ef - 7.8).abs() < 1e-9);
    assert!((TOP_AND_BASE * t_ef - 6.24).abs() < 1e-9);
}

/// Table 5.12 (BS 5628-1 Table 5): stiffness coefficient K of walls with piers, one decimal.
#[test]
fn stiffness_coefficient_of_piers() {
    const PRINTED: [[f64; 3]; 3] = [[1.0, 1.4, 2.0], [1.0, 1.2, 1.4], [1.0, 1.0, 1.0]];
    for (i, spacing) in SPACING_OVER_WIDTH.into_iter().enumerate() {
        for (j, pier) in PIER_OVER_WALL.into_iter().enumerate() {
            assert_eq!(rho_t(spacing, pier).unwrap().value, PRINTED[i][j], "{spacing} {pier}");
        }
    }
    // The note to the table allows linear interpolation; the point itself is ours.
    assert!((rho_t(8.0, 2.0).unwrap().value - 1.3).abs() < 1e-12);
}
