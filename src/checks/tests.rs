//! The drawings of whole jobs: labels apart from each other and inside the frame, every value spoken.

#[path = "../../tests/jobs/mod.rs"]
mod jobs;

use super::run;
use crate::sketch::tests::sound;
use crate::trace::Entry;

fn drawings_are_sound(name: &str, text: &str) {
    let building = crate::job::read(name, text).unwrap_or_else(|e| panic!("{name}: {}", e.render(false)));
    let results = run(&building);
    let mut seen = 0;
    for section in &results.sections {
        for drawing in &section.drawings {
            sound(drawing);
            seen += 1;
        }
        // A name without its drawing would print an empty place.
        for entry in &section.sheet.entries {
            let Entry::Drawings(names) = entry else { continue };
            for wanted in names {
                let there = section.drawings.iter().any(|d| d.name == *wanted);
                assert!(there || !section.sheet.outside.is_empty(), "{name}: {wanted} is not drawn");
            }
        }
    }
    assert!(seen > 3, "{name}: {seen} drawings");
}

#[test]
fn drawings_of_the_demo_jobs_are_sound() {
    for (name, text) in jobs::demos() {
        drawings_are_sound(&name, &text);
    }
}

#[test]
fn drawings_of_variations_are_sound() {
    for n in 0..60 {
        drawings_are_sound(&format!("variation {n}"), &jobs::varied(n));
    }
}
