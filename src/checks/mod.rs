//! What is verified.
pub mod masonry;
pub mod returns;
