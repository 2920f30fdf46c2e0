//! The drawings of the wind sheet.

use crate::checks::Job;
use crate::sketch::Drawing;
use crate::trace::Sheet;

/// Drawings, named on the sheet.
pub fn drawings(_s: &mut Sheet, _job: &Job<'_>) -> Vec<Drawing> {
    Vec::new()
}
