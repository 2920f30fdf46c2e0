//! Every check in every case: the ratios, the worst of each, and the places where one governs.

use super::actions::{Case, Direction};
use super::check::Check;
use super::model::{At, Model};
use super::run::{self, Ready};
use crate::quantity::print;
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::trace::{Column, Table};

/// Ratios of every check in every case; `NaN` where a check does not apply.
pub struct Matrix {
    /// Cases in order.
    pub cases: Vec<Case>,
    /// Checks that apply, in order.
    pub checks: Vec<Check>,
    /// Ratio by case and check.
    pub ratios: Vec<Vec<f64>>,
}

impl Matrix {
    /// Runs everything on silent sheets.
    pub fn run(m: &Model, annex: &Annex, ready: Ready) -> Self {
        let cases = Case::all();
        let checks = Self::checks(m);
        let ratio = |case: Case, check: Check| {
            let s = run::silently(m, annex, ready, case, check);
            s.verdicts.iter().map(|v| v.ratio).fold(f64::NAN, f64::max)
        };
        let ratios = cases.iter().map(|&c| checks.iter().map(|&k| ratio(c, k)).collect()).collect();
        Self { cases, checks, ratios }
    }

    /// Whether everything holds, on silent sheets; ends at the first that does not.
    pub fn holds(m: &Model, annex: &Annex, ready: Ready) -> bool {
        let checks = Self::checks(m);
        let holds =
            |case: Case| checks.iter().all(|&check| run::silently(m, annex, ready, case, check).holds());
        Case::all().into_iter().all(holds)
    }

    fn checks(m: &Model) -> Vec<Check> {
        Check::ALL.into_iter().filter(|c| c.applies(m) && *c != Check::Flexure).collect()
    }

    /// The case in which check number `k` is used most; the first of equals.
    pub fn worst(&self, k: usize) -> Option<usize> {
        let at = |i: usize| self.ratios[i][k];
        (0..self.cases.len()).filter(|&i| !at(i).is_nan()).reduce(|a, b| if at(b) > at(a) { b } else { a })
    }

    /// Every section and case in which a check is worst, from the foot up, those in plane first.
    /// Flexure at a bonded foot, for information, goes with overturning.
    pub fn places(&self, m: &Model) -> Vec<Place> {
        let mut out: Vec<Place> = Vec::new();
        for upright in [false, true] {
            for at in [At::Foot, At::Middle, At::Head] {
                for (i, &case) in self.cases.iter().enumerate() {
                    let governs = |&(k, c): &(usize, &Check)| {
                        c.upright() == upright && c.section() == at && self.worst(k) == Some(i)
                    };
                    let mut checks: Vec<Check> =
                        self.checks.iter().enumerate().filter(governs).map(|(_, &c)| c).collect();
                    if checks.contains(&Check::Overturning) && Check::Flexure.applies(m) {
                        checks.push(Check::Flexure);
                    }
                    if !checks.is_empty() {
                        out.push(Place { case, at, checks });
                    }
                }
            }
        }
        out
    }

    /// The table of all ratios, the worst of each check marked: a row a check, a column a case.
    pub fn table(&self) -> Table {
        let mut columns = vec![Column::words("check")];
        columns.extend(self.cases.iter().map(|c| Column::numbers(&short(*c))));
        let cell = |i: usize, k: usize| {
            let r = self.ratios[i][k];
            if r.is_nan() {
                return "–".to_owned();
            }
            let mark = if self.worst(k) == Some(i) { "*" } else { "" };
            format!("{}{mark}", print::ratio(r))
        };
        let rows = self
            .checks
            .iter()
            .enumerate()
            .map(|(k, check)| {
                let mut row = vec![check.head().to_owned()];
                row.extend((0..self.cases.len()).map(|i| cell(i, k)));
                row
            })
            .collect();
        Table {
            caption: "Use in every case; * is worked below. H helping; W pressing, wind leads; Q pressing, imposed \
                      leads; G gravity alone. f: pushed towards the free end; j: towards the junction."
                .to_owned(),
            columns,
            rows,
            strong: Vec::new(),
        }
    }
}

/// Two letters for a case: combination and direction.
pub fn short(case: Case) -> String {
    let combination = match case.combination {
        Combination::Helping => "H",
        Combination::PressingWind => "W",
        Combination::PressingImposed => "Q",
        Combination::Gravity => "G",
    };
    let direction = if case.direction == Direction::ToFree { "f" } else { "j" };
    format!("{combination} {direction}")
}

/// A section in one case, with the checks that are worst there.
#[derive(Clone, Debug)]
pub struct Place {
    /// The case.
    pub case: Case,
    /// Where.
    pub at: At,
    /// In order.
    pub checks: Vec<Check>,
}

impl Place {
    /// Head of its column: where, and the case in two letters.
    pub fn head(&self) -> String {
        format!("{}, {}", self.at.words(), short(self.case))
    }
}
