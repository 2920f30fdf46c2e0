//! Wind on a roof as a whole: 7.2.3 to 7.2.5.
//!
//! Everything is per area on plan: a pressure on a slope has the same vertical part per plan area. In
//! every function `h` is the height of the building to the ridge, `b` the breadth across the wind, `d`
//! the depth along it, `q_p` the peak velocity pressure at h, `c_pi` the internal coefficient that presses
//! outward the most; all stand on the sheet. What presses a roof down is not sought.

mod duopitch;
mod flat;
mod monopitch;
mod zones;

pub use duopitch::{duopitch_on_eaves, duopitch_on_gable};
pub use flat::flat;
pub use monopitch::{monopitch_on_high_eaves, monopitch_on_low_eaves, monopitch_on_side};

use crate::quantity::{LineLoad, Stress};
use crate::standards::source::Looked;
use crate::standards::tables::roofs::{Roof, RoofZone, Sign, c_pe_10};
use crate::trace::{Outside, Sheet};

/// Wind on a roof, characteristic.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct RoofWind {
    /// Greatest mean uplift of the whole roof per area on plan; below nought it presses down at its least.
    pub uplift: Stress,
    /// Greatest horizontal force along the wind per length of ridge or eaves, for the storey under it.
    pub along: LineLoad,
}

/// A coefficient of `roof` at `pitch` degrees.
fn at(roof: Roof, zone: RoofZone, pitch: f64, sign: Sign) -> Result<Looked<f64>, Outside> {
    c_pe_10(roof, zone, pitch, sign)
        .map_err(|e| Outside::new("roof", "EN 1991-1-4 7.2.3 to 7.2.5", e.to_string()))
}

/// What every roof says about its values.
fn whose_values(s: &mut Sheet) {
    s.note(
        "The roof coefficients are those of the EN for areas of 10 m² and more. The UK National Annex has its own \
         in Tables NA.5 to NA.7b, and they may be greater: check against them.",
    );
}
