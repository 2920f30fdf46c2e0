//! An outer wall across its plane, before and after the removal.
//!
//! * [`mod@model`]: what the check needs, quantities only, and how a building yields it
//! * [`strength`]: what each leaf resists per unit width
//! * [`form`]: which way the panel spans, what pressure a leaf can take
//! * [`opened`]: the same with doors and windows, by piers and strips
//! * [`bracket`]: the same by limit analysis, between a safe side and an upper one
//! * [`sharing`]: two leaves and their ties
//! * [`run`]: the check: before as information, after as the verdict, both side by side
//! * [`remedy`]: what would make it pass
//! * [`tables`]: before and after side by side, and other tables of the sheet

pub mod bracket;
pub mod form;
pub mod model;
pub mod opened;
pub mod remedy;
pub mod run;
pub mod sharing;
pub mod strength;
pub mod tables;

pub use model::{PanelLeaf, PanelModel, model};
pub use remedy::{Remedy, remedies};
pub use run::{by_hand, check, hold_points};

#[cfg(test)]
mod properties;
#[cfg(test)]
mod tests;
#[cfg(test)]
mod tests_bracket;
#[cfg(test)]
mod tests_bracket_hand;
#[cfg(test)]
mod tests_model;
