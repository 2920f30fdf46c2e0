//! What is verified.
pub mod masonry;
pub mod panels;
pub mod returns;
