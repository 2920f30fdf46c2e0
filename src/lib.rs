//! Perpend: calculation packs for masonry that stays when a load-bearing wall comes out.
#![recursion_limit = "512"]
#![allow(non_snake_case, reason = "symbols are written as the standards write them: N_Ed, gamma_M")]

pub mod building;
pub mod checks;
pub mod error;
pub mod job;
pub mod pack;
pub mod quantity;
pub mod report;
pub mod sketch;
pub mod solve;
pub mod standards;
pub mod trace;
