//! Photographs: what their marks show, in words, and on which of them a part is seen.

use crate::building::{Building, Photograph, Pointed};
use crate::checks::{Results, Section};
use crate::pack::data;

/// The name by which the pack's data calls photograph `n`; every photograph arrives as JPEG.
pub fn path(n: usize) -> String {
    format!("/photo/{n}.jpg")
}

/// The photographs of a job.
pub(super) fn of_job(b: &Building, results: &Results) -> Vec<data::Photograph> {
    let one = |(n, p): (usize, &Photograph)| {
        let words = words(&p.marks);
        let end = if p.caption.ends_with('.') { "" } else { "." };
        data::Photograph {
            path: path(n),
            caption: p.caption.clone(),
            mark: p.mark.clone().unwrap_or_default(),
            alt: if words.is_empty() { p.caption.clone() } else { format!("{}{end} {words}", p.caption) },
            words,
            marks: p.marks.iter().map(|m| pointed(m, results)).collect(),
        }
    };
    b.photographs.iter().enumerate().map(one).collect()
}

/// Numbers of the photographs on which the part of a section is seen, from 1.
pub(super) fn seen(b: &Building, s: &Section) -> Vec<usize> {
    let shows =
        |p: &Photograph| p.mark.iter().chain(p.marks.iter().map(|m| &m.of)).any(|mark| is_of(s, mark));
    (1..).zip(&b.photographs).filter(|(_, p)| shows(p)).map(|(n, _)| n).collect()
}

/// Whether a section is that of a mark: one of several things has commas between.
fn is_of(s: &Section, mark: &str) -> bool {
    s.mark.split(", ").any(|own| own == mark)
}

fn pointed(m: &Pointed, results: &Results) -> data::Pointed {
    let section = results.sections.iter().find(|s| is_of(s, &m.of));
    data::Pointed {
        of: m.of.clone(),
        x: m.at.0,
        y: m.at.1,
        sheet: section.map(|s| s.id.clone()).unwrap_or_default(),
    }
}

/// `Marked: R1 at the left, half way up; P2 at the right, near the top.` Empty where nothing is marked.
fn words(marks: &[Pointed]) -> String {
    let one = |m: &Pointed| format!("{} {}", m.of, place(m.at));
    let all: Vec<String> = marks.iter().map(one).collect();
    if all.is_empty() { String::new() } else { format!("Marked: {}.", all.join("; ")) }
}

/// Where a point lies, by thirds of the picture.
fn place((x, y): (f64, f64)) -> &'static str {
    let third = |part: f64| if part < 1.0 / 3.0 { 0 } else { usize::from(part > 2.0 / 3.0) + 1 };
    [
        ["at the left, near the top", "at the left, half way up", "at the left, near the foot"],
        ["in the middle, near the top", "in the middle", "in the middle, near the foot"],
        ["at the right, near the top", "at the right, half way up", "at the right, near the foot"],
    ][third(x)][third(y)]
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn places_are_told_by_thirds() {
        let mark = |of: &str, x: f64, y: f64| Pointed { of: of.to_owned(), at: (x, y) };
        assert_eq!(words(&[]), "");
        let said =
            words(&[mark("R1", 0.1, 0.5), mark("P2", 1.0, 0.0), mark("R2", 0.5, 0.5), mark("P1", 0.4, 1.0)]);
        let wanted = "Marked: R1 at the left, half way up; P2 at the right, near the top; R2 in the middle; P1 in the \
                      middle, near the foot.";
        assert_eq!(said, wanted);
    }
}
