//! Annotated drawings to scale, as data: strokes with pen names, hatching, labels, dimensions.
//!
//! Each drawing takes a small view of what it shows (lengths in mm at full size, values as they
//! are printed) and yields a [`Drawing`] in paper millimetres with its caption, its scale and its
//! spoken text. Drawn lengths are the given lengths divided by the scale, nothing else.
//!
//! * [`drawing`], [`pen`]: the finished drawing
//! * [`text`]: how much paper a line of text takes
//! * [`scale`]: preferred scales and the largest one that fits
//! * [`note`], [`ground`], [`place`]: labels, what they keep off, and where they go
//! * [`board`]: strokes, fills and wishes for labels, until the drawing is finished
//! * [`dimension`], [`hatch`], [`load`], [`view`]: what drawings are made of
//! * [`panel_edges`], [`panel_opening`]: what both drawings of a panel's face are made of
//! * the drawings: one file each; `return_elevation` and `return_section` have a second for their actions

pub mod around;
pub mod bearing_elevation;
pub mod bearing_section;
pub mod board;
pub mod chain;
mod choices;
pub mod dimension;
pub mod drawing;
pub mod footing;
mod grid;
pub mod ground;
pub mod ground_profile;
pub mod hatch;
pub mod key_plan;
pub mod load;
pub mod load_stack;
mod margin_plot;
pub mod note;
pub mod panel_cracks;
#[cfg(test)]
mod panel_cracks_tests;
mod panel_cracks_words;
mod panel_deflection;
pub mod panel_edges;
pub mod panel_elevation;
mod panel_lines;
pub mod panel_opening;
pub mod panel_section;
pub mod pen;
pub mod place;
pub mod plan;
#[cfg(test)]
mod preview;
#[cfg(test)]
mod properties;
pub mod return_actions;
pub mod return_elevation;
mod return_loads;
pub mod return_section;
mod return_stress;
mod rings;
#[cfg(test)]
mod samples;
pub mod scale;
pub mod stability_plan;
#[cfg(test)]
pub(crate) mod tests;
pub mod text;
pub mod view;
pub mod wind_elevation;
pub mod wind_plan;

pub use around::PlanWind;
pub use bearing_elevation::{BearingElevation, Stone, bearing_elevation};
pub use bearing_section::{BearingSection, bearing_section};
pub use chain::{Branch, Chain, ChainLink, Known, chain};
pub use drawing::{Drawing, Item};
pub use footing::{FootingSketch, Pressure, footing_sketch};
pub use ground_profile::{GroundProfile, ground_profile};
pub use key_plan::{KeyPlan, PlanMark, key_plan, key_plans};
pub use load_stack::{LoadStack, StackStorey, StackWall, load_stack};
pub use margin_plot::{MarginPlot, margin_plot};
pub use panel_cracks::{Cell, Crack, CrackKind, PanelCracks, cracks_pair, panel_cracks};
pub use panel_edges::{Edge, PanelFace, Support};
pub use panel_elevation::{PanelElevation, WallBehind, panel_elevation, panel_pair};
pub use panel_opening::Opening;
pub use panel_section::{Floor, PanelSection, panel_section};
pub use plan::{Fate, Gap, PlanWall, When};
pub use return_actions::{Curve, ReturnActions, return_actions};
pub use return_elevation::{PlacedLoad, ReturnElevation, return_elevation};
pub use return_section::{Flange, ReturnSection, Stress, Toe, return_section};
pub use scale::Frame;
pub use stability_plan::{Share, StabilityPlan, stability_plans};
pub use view::{Action, Layer, Side, Wind};
pub use wind_elevation::{WindElevation, WindLevel, wind_elevation, wind_elevations};
pub use wind_plan::{Piece, WallZone, WindPanel, WindPlan, wind_plans};
