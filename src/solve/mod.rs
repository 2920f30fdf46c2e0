//! Searches that print nothing.

pub mod descent;
pub mod root;
pub mod torsion;
