//! The materials sheet: strengths of every leaf that the job uses, derived once.

use super::{Job, Section, masonry};
use crate::building::{BuildUp, Leaf, Material};
use crate::quantity::print;
use crate::trace::Sheet;

/// As many materials as stand side by side on a sheet.
const ABREAST: usize = 3;

/// A material in use, at one thickness.
struct Used<'a> {
    material: &'a Material,
    build_up: &'a BuildUp,
    leaf: &'a Leaf,
}

/// Every material and thickness in use, a column each.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let mut s = Sheet::recorder();
    let used = used(job);
    sources(&mut s, &used);
    for few in used.chunks(ABREAST) {
        s.columns(&few.iter().map(name).collect::<Vec<_>>(), |s, i| {
            let Used { material, build_up, leaf } = few[i];
            if let Err(outside) =
                masonry::derive(s, job.building, &job.annex, material, build_up, leaf.thickness)
            {
                s.leave(outside);
            }
        });
    }
    vec![Section::plain("materials", "Materials", s)]
}

/// How each material is known, said once.
fn sources(s: &mut Sheet, used: &[Used<'_>]) {
    for u in used {
        if let Some(source) = &u.material.source {
            s.note(format!("How {} is known: {}.", u.material.name, source.trim_end_matches('.')));
        }
    }
}

fn name(u: &Used<'_>) -> String {
    let thickness = print::show("t", u.leaf.thickness.dynamic());
    format!("{}, {thickness}, in {}", u.material.name, u.build_up.name)
}

fn used<'a>(job: &Job<'a>) -> Vec<Used<'a>> {
    let b = job.building;
    let mut out: Vec<Used<'a>> = Vec::new();
    for build_up in &b.build_ups {
        for leaf in &build_up.leaves {
            let Some(material) = b.material(&leaf.material) else { continue };
            let same = |u: &Used<'_>| {
                u.material.name == material.name
                    && u.leaf.thickness == leaf.thickness
                    && u.build_up.collar_joint == build_up.collar_joint
            };
            if !out.iter().any(same) {
                out.push(Used { material, build_up, leaf });
            }
        }
    }
    out
}
