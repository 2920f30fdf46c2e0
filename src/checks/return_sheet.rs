//! The sheet of each return.

use super::returns::build::Inputs;
use super::returns::check;
use super::{Job, Section, footings, named, return_views};
use crate::trace::Sheet;

/// One section a return, and behind it one for its footing.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    job.building
        .returns
        .iter()
        .flat_map(|ret| {
            let mut sheet = Sheet::recorder();
            let mut drawings = Vec::new();
            match &job.wind {
                Ok(wind) => {
                    let inputs = Inputs::new(job, ret, wind);
                    let checked = check(&mut sheet, &inputs);
                    drawings =
                        job.drawings(|| return_views::drawings(job.building, ret, &checked, &job.annex));
                    let plots = job.drawings(|| return_views::plots(&inputs));
                    if !plots.is_empty() {
                        sheet.heading(1, "How far it may move");
                        named(&mut sheet, &plots);
                    }
                    drawings.extend(plots);
                }
                Err(outside) => sheet.leave(outside.clone()),
            }
            let section = Section {
                id: ret.mark.clone(),
                mark: ret.mark.clone(),
                title: ret.title.clone(),
                sheet,
                drawings,
                leans: Vec::new(),
            };
            std::iter::once(section).chain(footings::section(job, ret))
        })
        .collect()
}
