//! Perpend: calculation packs for masonry that stays when a load-bearing wall comes out.

pub mod building;
pub mod error;
pub mod job;
pub mod quantity;
pub mod standards;
