//! Perpend: calculation packs for masonry that stays when a load-bearing wall comes out.

pub mod pack;
pub mod quantity;
