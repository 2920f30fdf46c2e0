//! Looking over the finished sheets. The typesetter reports neither text over text nor text
//! past the margins, and misses signs silently outside PDF/A.

use std::fmt;

use typst::layout::Abs;
use typst_layout::PagedDocument;

use super::ink::{Ink, Sheet};

/// Ink may touch by this much, in points, before it counts: letters lean over their boxes.
const TOLERANCE: f64 = 0.6;
/// Ink may lean into a margin by this much, in points: the tail of a j begins left of its box.
const LEAN: f64 = 1.5;
/// The margins that text keeps to, in millimetres: binding edge, outer edge, head and foot.
const MARGINS: Margins = Margins { left: 25.0, right: 15.0, top: 10.0, bottom: 8.0 };

struct Margins {
    left: f64,
    right: f64,
    top: f64,
    bottom: f64,
}

/// A flaw on a sheet.
#[derive(Debug, Clone, PartialEq)]
pub struct Finding {
    /// The sheet, counted from 1.
    pub sheet: usize,
    /// Place of the text in mm from the sheet's top left corner.
    pub at: (f64, f64),
    /// What is wrong.
    pub flaw: Flaw,
}

/// What can be wrong with text on a sheet.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Flaw {
    /// Two pieces of text print over each other.
    Overlap(String, String),
    /// Text runs into a margin or off the sheet.
    Outside(String),
    /// A line runs through text, or an area is drawn over it.
    Crossed(String),
    /// A sign that the face does not hold.
    Missing(String),
}

impl fmt::Display for Finding {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let (x, y) = self.at;
        write!(f, "sheet {}, {x:.0} mm across, {y:.0} mm down: ", self.sheet)?;
        match &self.flaw {
            Flaw::Overlap(a, b) => write!(f, "\"{a}\" prints over \"{b}\""),
            Flaw::Outside(text) => write!(f, "\"{text}\" runs into the margin"),
            Flaw::Crossed(text) => write!(f, "\"{text}\" is drawn over"),
            Flaw::Missing(text) => write!(f, "a sign of \"{text}\" is missing"),
        }
    }
}

/// Flaws as lines; one that stands on every sheet is told once.
pub(super) fn told(findings: &[Finding]) -> Vec<String> {
    let mut out: Vec<(&Finding, usize)> = Vec::new();
    for finding in findings {
        match out.iter_mut().find(|(first, _)| first.flaw == finding.flaw) {
            Some((_, more)) => *more += 1,
            None => out.push((finding, 0)),
        }
    }
    let line = |(finding, more): (&Finding, usize)| match more {
        0 => finding.to_string(),
        more => format!("{finding}, and {more} times more"),
    };
    out.into_iter().map(line).collect()
}

/// Every flaw of a laid-out document, sheet by sheet.
pub(super) fn audit(document: &PagedDocument) -> Vec<Finding> {
    let mut findings = Vec::new();
    for (index, page) in document.pages().iter().enumerate() {
        let mut sheet = Sheet::of(page);
        let size = page.frame.size();
        let mut report = |ink: &Ink, flaw| {
            let at = (ink.min.x.to_mm(), ink.min.y.to_mm());
            findings.push(Finding { sheet: index + 1, at, flaw });
        };
        for ink in &sheet.inks {
            if ink.missing {
                report(ink, Flaw::Missing(ink.text.clone()));
            }
            if outside(ink, size.x, size.y) {
                report(ink, Flaw::Outside(ink.text.clone()));
            }
            if sheet.spoils(ink, Abs::pt(TOLERANCE)) {
                report(ink, Flaw::Crossed(ink.text.clone()));
            }
        }
        for (ink, other) in overlaps(&mut sheet.inks) {
            report(ink, Flaw::Overlap(ink.text.clone(), other.text.clone()));
        }
    }
    findings
}

/// The text of each sheet of a laid-out document, in the order in which it prints.
#[cfg(test)]
pub(super) fn sheets(document: &PagedDocument) -> Vec<String> {
    let words = |sheet: Sheet| sheet.inks.into_iter().map(|ink| ink.text).collect::<String>();
    document.pages().iter().map(|page| words(Sheet::of(page))).collect()
}

/// The text of each sheet that a reader sees: not what is cut off, covered, too small or too pale.
pub(super) fn legible(document: &PagedDocument) -> Vec<String> {
    let words = |sheet: &Sheet| sheet.legible().map(|ink| ink.text.as_str()).collect::<String>();
    document.pages().iter().map(|page| words(&Sheet::of(page))).collect()
}

fn outside(ink: &Ink, width: Abs, height: Abs) -> bool {
    let slack = Abs::pt(LEAN);
    ink.min.x + slack < Abs::mm(MARGINS.left)
        || ink.max.x - slack > width - Abs::mm(MARGINS.right)
        || ink.min.y + slack < Abs::mm(MARGINS.top)
        || ink.max.y - slack > height - Abs::mm(MARGINS.bottom)
}

/// Pairs whose ink boxes share more than the tolerance both ways. Sorted by height first, so
/// that each piece meets only those that begin above its foot.
fn overlaps(inks: &mut [Ink]) -> Vec<(&Ink, &Ink)> {
    let slack = Abs::pt(TOLERANCE);
    inks.sort_by_key(|ink| ink.min.y);
    let mut pairs = Vec::new();
    for (index, a) in inks.iter().enumerate() {
        for b in inks[index + 1..].iter().take_while(|b| b.min.y + slack < a.max.y) {
            let shared = a.min.x + slack < b.max.x && b.min.x + slack < a.max.x;
            if shared && b.max.y > b.min.y + slack && !tucked_in(a, b) {
                pairs.push((a, b));
            }
        }
    }
    pairs
}

/// Whether one is an index that the face for mathematics tucks under the arm of its base
/// (`V` and its subscript) or into a root sign. A piece that covers the middle of another is
/// never that.
fn tucked_in(a: &Ink, b: &Ink) -> bool {
    let (base, index) = if a.size > b.size { (a, b) } else { (b, a) };
    let root = base.text == "√";
    base.mathematics
        && index.mathematics
        && base.size > index.size
        && (root || (!base.holds(index.centre()) && !index.holds(base.centre())))
}
