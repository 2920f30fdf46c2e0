//! Every section of a pier under every combination: what governs.

use super::middle;
use super::model::PierModel;
use super::work::{self, Ready};
use crate::checks::returns::model::At;
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::trace::{Outside, Sheet};

/// The worst combination of each section, and of all.
#[derive(Clone, Debug)]
pub struct Worst {
    /// Section, combination in which it is worst, use there, and what governs it.
    pub sections: Vec<(At, Combination, f64, String)>,
    /// Slenderness over its limit.
    pub slender: f64,
}

impl Worst {
    /// The largest use of a section.
    pub fn by_load(&self) -> f64 {
        self.sections.iter().map(|s| s.2).fold(0.0, f64::max)
    }

    /// The largest use and what governs it.
    pub fn largest(&self) -> (f64, String) {
        self.sections.iter().fold((self.slender, "slenderness".to_owned()), |worst, (_, c, ratio, words)| {
            if *ratio > worst.0 { (*ratio, format!("{words}, {}", short(*c))) } else { worst }
        })
    }
}

/// A combination in a letter, as in the tables of returns.
pub const fn short(c: Combination) -> &'static str {
    match c {
        Combination::Helping => "H",
        Combination::PressingWind => "W",
        Combination::PressingImposed => "Q",
        Combination::Gravity => "G",
    }
}

/// One section in one combination.
pub fn section(s: &mut Sheet, p: &PierModel, annex: &Annex, ready: Ready, c: Combination, at: At) {
    if at == At::Middle {
        middle::at_mid_height(s, p, annex, ready, c);
    } else {
        work::at_end(s, p, annex, ready, c, at);
    }
}

/// Runs every section under every combination on silent sheets.
///
/// # Errors
/// [`Outside`] below the least plan area and beyond the limit of slenderness.
pub fn run(p: &PierModel, annex: &Annex) -> Result<Worst, Outside> {
    let mut s = Sheet::silent();
    let ready = work::prepare(&mut s, p, annex)?;
    let slender = s.verdicts.iter().map(|v| v.ratio).fold(0.0, f64::max);
    let mut sections = Vec::new();
    for &at in work::sections(p) {
        let mut worst: Option<(At, Combination, f64, String)> = None;
        for c in Combination::ALL {
            let mut s = Sheet::silent();
            section(&mut s, p, annex, ready, c, at);
            for v in s.verdicts {
                if worst.as_ref().is_none_or(|w| v.ratio > w.2) {
                    worst = Some((at, c, v.ratio, name(&v.id, at).to_owned()));
                }
            }
        }
        sections.extend(worst);
    }
    Ok(Worst { sections, slender })
}

/// What governs, in a word or two.
fn name(id: &str, at: At) -> &'static str {
    match (id, at) {
        ("pier-flexure", _) => "flexure",
        ("pier-edge", _) => "edge",
        (_, At::Head) => "head",
        (_, At::Foot) => "foot",
        (_, At::Middle) => "middle",
    }
}
