//! `[[photographs]]`: pictures beside the job file, and what is pointed at in them.

use super::limits::Limits;
use super::names::known;
use super::paths::{ends, inside};
use super::reader::{Span, Table};
use crate::building::{Photograph, Pointed};
use crate::error::Kind;
use crate::quantity::Num;

/// Endings of image files that the pack can hold.
pub(super) const IMAGES: &[&str] = &[".jpg", ".jpeg", ".png"];

/// Where a mark may stand, of the width from the left and of the height from the top.
pub(super) const WITHIN: Limits = Limits::new(0.0, 100.0, "%");
/// Marks that are nearer to each other both ways print over each other, parts of width and height: a ring is 2.8 mm
/// wide on a picture 81 mm wide.
const APART: (f64, f64) = (0.05, 0.07);
/// What a difference of two decimals may be off by.
const HAIR: f64 = 1e-9;
/// More labels than this hide the picture. By judgement.
const MOST: usize = 12;

/// What a mark may be of.
const PARTS: &str = "return, bearing, panel, floor edge or bracing wall";

/// Reads one photograph; its path stays beside the job file.
pub fn read(t: &Table<'_>, names: &[&str]) -> Option<Photograph> {
    let file = t.need("file").line().filter(|path| beside(t, path));
    let caption = t.need("caption").line();
    let entry = t.may("mark");
    let mark = entry.line().filter(|mark| known(&entry, mark, PARTS, names));
    let marks = pointed(t, names);
    t.finish();
    Some(Photograph { file: file?, caption: caption?, mark, marks: marks? })
}

/// Reads what is pointed at: `marks = [{ of = "R1", at = ["32 %", "60 %"] }]`.
fn pointed(t: &Table<'_>, names: &[&str]) -> Option<Vec<Pointed>> {
    let one = |m: &Table<'_>| {
        let entry = m.need("of");
        let of = entry.line().filter(|mark| known(&entry, mark, PARTS, names));
        let at: Option<(Num, Num)> = m.need("at").pair(&WITHIN);
        m.finish();
        let at = at.map(|(x, y)| (x.base(), y.base()))?;
        Some((Pointed { of: of?, at }, m.place("at")))
    };
    let tables = t.may("marks").tables(&format!("{}, mark", t.name), "of");
    let all: Vec<Option<(Pointed, Span)>> = tables.iter().map(one).collect();
    if tables.len() > MOST {
        t.fault(Kind::NotAllowed, format_args!("it has {} marks", tables.len()))
            .at(t.place("marks"), "too many for one picture")
            .allowed(format!("at most {MOST} marks in a photograph"))
            .help("leave out what the caption says, or show the rest on another photograph");
        return None;
    }
    let read: Vec<&(Pointed, Span)> = all.iter().flatten().collect();
    for (n, (mark, place)) in read.iter().enumerate() {
        let near = |other: &Pointed| {
            (other.at.0 - mark.at.0).abs() < APART.0 - HAIR && (other.at.1 - mark.at.1).abs() < APART.1 - HAIR
        };
        let Some((first, before)) = read[..n].iter().find(|(other, _)| near(other)) else { continue };
        t.fault(
            Kind::Contradiction,
            format_args!("the marks of {} and {} stand on top of each other", first.of, mark.of),
        )
        .at(place.clone(), "too near to the other")
        .and(before.clone(), "the other")
        .allowed(format!(
            "marks at least {:.0} % of the width or {:.0} % of the height apart",
            APART.0 * 100.0,
            APART.1 * 100.0
        ))
        .help("move one of the two to where its part is seen alone, or leave it out");
    }
    all.into_iter().map(|found| found.map(|(mark, _)| mark)).collect()
}

fn beside(t: &Table<'_>, path: &str) -> bool {
    inside(t, "file", path, "photograph") && ends(t, "file", path, IMAGES)
}
