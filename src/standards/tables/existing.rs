//! Assumptions for old masonry that nobody has tested.
//!
//! From judgement, recalculation and a practice value; no standard stands behind them. Confidence
//! L: an input with a stated reason, never a silent default. The partial factors of an existing
//! wall are those of category II and class 2 in [`super::gamma_m`].

use crate::standards::source::{Confidence, Source};

/// The source of every value here.
pub const SOURCE: Source = Source::named("assumption from judgement, no standard", Confidence::Low);

/// Normalised strength f_b of an old brick of unknown kind, N/mm² (L).
pub const F_B_OLD_BRICK: f64 = 8.5;
/// f_k of old brickwork in lime mortar, a single leaf, N/mm² (L).
pub const F_K_SINGLE_LEAF: f64 = 2.2;
/// f_k of old brickwork in lime mortar, 215 mm bonded, with the 0.8 of a joint along the face,
/// N/mm² (L).
pub const F_K_215_BONDED: f64 = 1.8;
/// Permissible pressure on unknown brickwork under service loads, N/mm²: 4 tonf/ft² is 0.429
/// (practice value from a public forum) (L).
pub const PERMISSIBLE: f64 = 0.42;

#[cfg(test)]
mod tests {
    use super::*;
    use crate::standards::masonry::{Group, Mortar, UnitKind};
    use crate::standards::tables::compressive::{COLLAR_JOINT, k};

    /// The assumed f_k follow from the assumed f_b and f_m by 3.6.1.2, rounded to 0.1 N/mm².
    #[test]
    fn assumed_strengths_hang_together() {
        let k = k(UnitKind::ClayBrick, Group::One, false).unwrap().value;
        let f_k = k * F_B_OLD_BRICK.powf(0.7) * Mortar::Lime.f_m().powf(0.3);
        assert!((f_k - F_K_SINGLE_LEAF).abs() <= 0.05, "{f_k}");
        assert!((f_k * COLLAR_JOINT - F_K_215_BONDED).abs() <= 0.05, "{f_k}");
    }
}
