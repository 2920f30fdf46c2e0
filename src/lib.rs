//! Perpend: calculation packs for masonry that stays when a load-bearing wall comes out.

pub mod building;
pub mod quantity;
pub mod standards;
