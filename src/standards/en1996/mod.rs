//! EN 1996-1-1 with the UK National Annex: quantities in, quantities out, the sheet beside.
//!
//! A function's parameters carry the symbols' names and must already stand on the sheet.

pub mod concentrated;
pub mod flange;
pub mod lateral;
pub mod reduction;
pub mod section;
pub mod shear;
pub mod slenderness;

/// The edition every sheet prints.
pub const EDITION: &str = "BS EN 1996-1-1:2005+A1:2012 with UK National Annex (2013)";
