//! What is verified.
pub mod masonry;
pub mod returns;
pub mod stability;
pub mod wind;
