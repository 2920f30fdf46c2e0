//! A return in its own plane.
pub mod actions;
pub mod flexure;
pub mod in_plane;
pub mod model;
pub mod rules;
pub mod run;
pub mod sliding;
pub mod vertical;
