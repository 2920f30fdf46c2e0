//! A panel with doors and windows by limit analysis: what a moment field carries, and what the weakest crack
//! pattern takes. The true value of the theory lies between the two.
//!
//! * [`wall`]: one leaf of a panel as the analyses see it
//! * [`found`]: the analyses of one leaf, several leaves at once, nothing worked twice
//! * [`sheet`]: what of it stands on the sheet, and which value decides
//! * [`reactions`]: what comes to the edges

pub mod found;
pub mod reactions;
pub mod sheet;
pub mod wall;

pub use found::{Effort, Found, prepare};
pub use sheet::Bounds;
