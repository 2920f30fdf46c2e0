//! J. Roberts, teaching solution "Design Example V3", 2013: cavity wall to EN 1996-1-1 with its UK
//! National Annex.

use perpend::standards::masonry::{Group, Mortar, UnitKind};
use perpend::standards::tables::compressive::{Conditioning, conditioning, k, shape_factor};

/// Block of 2.9 N/mm², 215 mm high and 140 mm wide, air-dry, mortar M4: shape factor 1.3 (one
/// decimal), f_b = 3.77 and f_k = 2.88 N/mm² (two decimals).
#[test]
fn strength_of_the_chosen_block() {
    let delta = shape_factor(215.0, 140.0).unwrap().value;
    assert!((delta - 1.3).abs() < 0.05, "{delta}");
    let f_b = 2.9 * conditioning(Conditioning::AirDry).value * delta;
    assert!((f_b - 3.77).abs() < 0.005, "{f_b}");
    let k = k(UnitKind::AggregateBlock, Group::One, false).unwrap().value;
    assert_eq!(k, 0.75);
    let f_k = k * f_b.powf(0.7) * Mortar::M4.f_m().powf(0.3);
    assert!((f_k - 2.88).abs() < 0.005, "{f_k}");
}
