//! Printed numbers of the standards, as data with pure lookups.
//!
//! Edition: BS EN 1996-1-1:2005+A1:2012 with its UK National Annex of 2013, and companions as
//! named at each table. Numbers are `f64` in N/mm² and mm unless a lookup says otherwise. Every
//! lookup yields a [`Looked`](super::source::Looked) (value, the rows that selected it, source)
//! or an [`OutOfTable`](super::source::OutOfTable). Nobody had the standards open when these
//! tables were typed: the source beside each says so.

pub mod actions;
pub mod annex_e;
pub mod annex_e_cells;
pub mod annex_e_theory;
pub mod approved_document_a;
pub mod compressive;
pub mod existing;
pub mod flexural;
pub mod gamma_m;
mod interpolate;
pub mod panel_limits;
pub mod roofs;
pub mod selfweight;
pub mod shear;
pub mod stiffness;
pub mod walls;
pub mod wind;
