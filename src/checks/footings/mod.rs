//! The footing under a return: what it presses on the ground, before and after the removal.
//!
//! * [`stands`]: what stands on it, from the return's own models
//! * [`combination`]: characteristic loads together, and the direction of the wind
//! * [`pressure`]: the pressure under one combination
//! * [`sheet`]: its section; [`view`]: its drawing; [`margins`]: how far its assumptions may move

pub mod combination;
pub mod margins;
pub mod pressure;
pub mod sheet;
pub mod stands;
pub mod view;

pub use sheet::section;
