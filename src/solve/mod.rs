//! Searches that print nothing.

pub mod root;
pub mod torsion;
