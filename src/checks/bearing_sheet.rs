//! The sheet of the bearings of each beam.

use super::bearings::{check, remarks};
use super::{Job, Section, bearing_views};
use crate::building::Bearing;
use crate::trace::Sheet;

/// As many bearings as stand side by side.
const ABREAST: usize = 3;

/// One section a beam, its bearings in the order of the job; further ones of many on a section of their own.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let all = &job.building.bearings;
    let mut beams: Vec<&str> = Vec::new();
    for bearing in all {
        if !beams.contains(&bearing.beam.as_str()) {
            beams.push(&bearing.beam);
        }
    }
    let of = |beam: &str| all.iter().filter(|x| x.beam == beam).collect::<Vec<_>>();
    beams
        .iter()
        .flat_map(|beam| of(beam).chunks(ABREAST).map(|few| section(job, few)).collect::<Vec<_>>())
        .collect()
}

fn section<'a>(job: &'a Job<'_>, bearings: &[&'a Bearing]) -> Section {
    let mut sheet = Sheet::recorder();
    let names = |kind: &str| bearings.iter().map(|x| format!("{}-{kind}", x.mark)).collect::<Vec<_>>();
    for kind in ["elevation", "section"] {
        let names = names(kind);
        sheet.drawings(&names.iter().map(String::as_str).collect::<Vec<_>>());
    }
    remarks(&mut sheet, bearings);
    let checked = check(&mut sheet, job.building, bearings, &job.annex);
    let each = checked.iter().flatten();
    let drawings = job.drawings(|| each.flat_map(|c| bearing_views::drawings(job.building, c)));
    let list = |of: &dyn Fn(&Bearing) -> &str, between: &str| {
        bearings.iter().map(|x| of(x)).collect::<Vec<_>>().join(between)
    };
    Section {
        id: list(&|x| &x.mark, "-"),
        mark: list(&|x| &x.mark, ", "),
        title: format!("Bearing of {} on {}", bearings[0].beam, list(&|x| &x.on, " and ")),
        sheet,
        drawings,
        leans: Vec::new(),
    }
}
