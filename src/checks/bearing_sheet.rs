//! The sheet of each bearing.

use super::bearings::check;
use super::{Job, Section, bearing_views};
use crate::trace::Sheet;

/// One section a bearing.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    job.building
        .bearings
        .iter()
        .map(|bearing| {
            let mut sheet = Sheet::recorder();
            let name = |kind: &str| format!("{}-{kind}", bearing.mark);
            sheet.drawings(&[&name("elevation"), &name("section")]);
            let checked = check(&mut sheet, job.building, bearing, &job.annex);
            let drawings = checked.map(|c| bearing_views::drawings(job.building, &c)).unwrap_or_default();
            Section {
                id: bearing.mark.clone(),
                mark: bearing.mark.clone(),
                title: format!("Bearing of {} on {}", bearing.beam, bearing.on),
                sheet,
                drawings,
            }
        })
        .collect()
}
