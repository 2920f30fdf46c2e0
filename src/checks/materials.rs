//! The materials sheet: strengths of every leaf that the job uses, derived once.

use super::{Job, Section, masonry};
use crate::quantity::print;
use crate::trace::Sheet;

/// One block a material and thickness in use.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let mut s = Sheet::recorder();
    let b = job.building;
    let mut done: Vec<(String, u64, bool)> = Vec::new();
    for build_up in &b.build_ups {
        for leaf in &build_up.leaves {
            let key = (leaf.material.clone(), leaf.thickness.base().to_bits(), build_up.collar_joint);
            let Some(material) = b.material(&leaf.material) else { continue };
            if done.contains(&key) {
                continue;
            }
            let thickness = print::show("t", leaf.thickness.dynamic());
            s.heading(1, format!("{}, {thickness}, in {}", material.name, build_up.name));
            if let Some(source) = &material.source {
                s.note(format!("How it is known: {}.", source.trim_end_matches('.')));
            }
            if let Err(outside) = masonry::derive(&mut s, b, &job.annex, material, build_up, leaf.thickness) {
                s.leave(outside);
            }
            done.push(key);
        }
    }
    vec![Section::plain("materials", "Materials", s)]
}
