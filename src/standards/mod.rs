//! Clauses of the standards.
pub mod annex;
pub mod en1990;
pub mod en1991_1_4;
pub mod en1992;
pub mod en1996;
pub mod masonry;
pub mod source;
pub mod tables;
