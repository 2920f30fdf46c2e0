//! The wind sheet: what [`crate::wind`] works out, the drawings, and how far the wind may grow.

mod forces;
pub mod margins;
mod views;

use super::{Job, Section};
use crate::trace::Sheet;
use crate::wind::{decided, of_site};

/// The wind sheet.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let mut s = Sheet::recorder();
    let mut drawings = Vec::new();
    match of_site(&mut s, job.building, &job.annex) {
        Ok(derived) => {
            if let Some(wind) = decided(&mut s, job.building, &job.annex, derived.as_ref()) {
                margins::table(&mut s, job, derived.as_ref());
                drawings = views::drawings(&mut s, job, &wind, derived.as_ref());
            }
        }
        Err(outside) => s.leave(outside),
    }
    let mut section = Section::plain("wind", "Wind", s);
    section.drawings = drawings;
    vec![section]
}
