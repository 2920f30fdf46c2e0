//! Clauses of the standards.
pub mod masonry;
