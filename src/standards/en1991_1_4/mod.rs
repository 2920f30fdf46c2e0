//! EN 1991-1-4: wind climate, peak pressure by three ways, orography, walls inside and out, roofs.
//!
//! The parameters of a function carry the symbols' names and stand on the sheet already, unless the
//! function says otherwise.

mod charts;
mod displacement;
mod friction;
mod internal;
mod orography;
mod pressure;
mod probability;
mod reference;
pub mod roof;
mod size;
mod velocity;

pub use charts::{Reading, Town, peak_pressure_read, reading_height};
pub use displacement::displacement;
pub use friction::{Surfaces, friction};
pub use internal::{Internal, dominant_face, no_dominant_face};
pub use orography::{Ground, Slope, orography};
pub use pressure::{air, peak_pressure, peak_pressure_displaced};
pub use probability::probability;
pub use reference::{Strip, strips};
pub use size::size_and_dynamics;
pub use velocity::basic_velocity;

use crate::quantity::Length;
use crate::trace::Outside;

/// The edition every sheet prints.
pub const EDITION: &str = "BS EN 1991-1-4:2005+A1:2010 with UK National Annex";

/// Whether a length is one: above nought, and finite.
fn is_length(l: Length) -> bool {
    l > Length::ZERO && l.is_finite()
}

/// Refuses figures that no building has, without a line on the sheet: `words` says what is wanted.
fn sensible(clause: &str, words: &str, holds: bool) -> Result<(), Outside> {
    if holds { Ok(()) } else { Err(Outside::new("wind", clause, words)) }
}
