//! Build-ups as drawings see them.

use crate::building::{BuildUp, Building, Leaf};
use crate::sketch::Layer;
use crate::sketch::hatch::Material;
use crate::standards::masonry::UnitKind;

/// How a leaf is hatched.
pub fn leaf_material(b: &Building, leaf: &Leaf) -> Material {
    match b.material(&leaf.material).map(|m| m.unit) {
        Some(UnitKind::AggregateBlock | UnitKind::AacBlock) => Material::Block,
        _ => Material::Brick,
    }
}

/// The layers of a build-up, outer first.
pub fn layers(b: &Building, build_up: &BuildUp) -> Vec<Layer> {
    let mut out = Vec::new();
    for (n, leaf) in build_up.leaves.iter().enumerate() {
        if n > 0 {
            let width = build_up.cavity.map_or(0.0, |c| c.base());
            out.push(Layer::Cavity { width });
        }
        out.push(Layer::Leaf { thickness: leaf.thickness.base(), material: leaf_material(b, leaf) });
    }
    out
}
