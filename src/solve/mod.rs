//! Searches that print nothing.

pub mod descent;
pub mod plate;
pub mod root;
pub mod torsion;
