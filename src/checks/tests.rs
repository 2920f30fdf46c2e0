//! The drawings of whole jobs: labels apart from each other and inside the frame, every value spoken.

#[path = "../../tests/jobs/mod.rs"]
mod jobs;

use super::run;
use crate::sketch::Drawing;
use crate::sketch::pen::Pen;
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

/// Every demo job has its key plan before and after at one scale, legible, both on one sheet.
#[test]
fn key_plans_of_the_demo_jobs_stand_together() {
    for (name, text) in jobs::demos() {
        let building = crate::job::read(&name, &text).expect("a valid job");
        let results = run(&building);
        let section = results.sections.iter().find(|s| s.id == "plan").expect("a plan");
        let [before, after] = section.drawings.as_slice() else { panic!("{name}: two plans") };
        assert_eq!((before.name.as_str(), after.name.as_str()), ("key-plan-before", "key-plan-after"));
        assert_eq!(before.scale, after.scale, "{name}");
        let wide = |d: &Drawing| outlines(d).map(|b| b.width()).expect("walls");
        assert!(wide(before) >= 52.0 && (wide(before) - wide(after)).abs() < 0.1, "{name}: {}", wide(before));
        let in_row = before.width + after.width + 8.0 <= 170.0;
        let top = |d: &Drawing| outlines(d).map(|b| b.y0).expect("walls");
        assert!(!in_row || (top(before) - top(after)).abs() < 0.1, "{name}: not on one line");
        let high = if in_row { before.height.max(after.height) } else { before.height + after.height };
        assert!(high <= 222.0, "{name}: {high} mm high");
        assert_eq!(before.strokes(Pen::Removed).count(), 0, "{name}");
        assert!(after.strokes(Pen::Removed).count() > 0, "{name}");
        let says = |d: &Drawing, words: &str| d.labels().any(|l| l.plain() == words);
        let wall = &building.removed.wall;
        assert!(
            says(before, &format!("{wall} comes out")) && says(after, &format!("{wall} removed")),
            "{name}"
        );
        for mark in building.returns.iter().map(|r| &r.mark) {
            assert!(!says(before, mark) && says(after, mark), "{name}: {mark}");
        }
        assert!(building.panels.iter().all(|p| says(after, &p.mark)), "{name}");
    }
}

/// What the cut walls cover on the paper.
fn outlines(drawing: &Drawing) -> Option<kurbo::Rect> {
    drawing.strokes(Pen::Cut).map(kurbo::Shape::bounding_box).reduce(|a, b| a.union(b))
}
