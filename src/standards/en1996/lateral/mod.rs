//! Walls across their plane: 5.5.5, 6.3.1, 6.3.2, 6.5, Annexes E and F.
//!
//! All clause and equation numbers from memory, check against the standard.
//!
//! * [`strength`]: precompression, design flexural strengths, orthogonal ratio, resistances
//! * [`coefficient`]: alpha_2 by Annex E, or by the work equation of a yield-line pattern
//! * [`span`]: moments of plates and of spans one way
//! * [`arching`]: thrust between abutments
//! * [`ties`]: what wall ties pass between leaves
//! * [`size`]: size limits

pub mod arching;
pub mod coefficient;
pub mod free_edge;
pub mod size;
pub mod span;
pub mod strength;
pub mod ties;
