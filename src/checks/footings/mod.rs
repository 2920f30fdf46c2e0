//! The footing under a return: what it presses on the ground, before and after the removal.
//!
//! * [`stands`]: what stands on it, from the return's own models
//! * [`combination`]: characteristic loads together, and the direction of the wind
//! * [`pressure`]: the pressure under one combination
//! * [`sheet`]: its section; [`view`]: its drawing

pub mod combination;
pub mod pressure;
pub mod sheet;
pub mod stands;
pub mod view;

pub use sheet::section;
