//! Perpend: calculation packs for masonry that stays when a load-bearing wall comes out.
#![recursion_limit = "512"]

pub mod quantity;
pub mod trace;
pub mod standards;
pub mod building;
