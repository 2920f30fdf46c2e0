//! Every check under every case: silently first, then the worst of each on the sheet, named.

use super::actions::{self, Case, Direction};
use super::model::{At, Model};
use super::vertical::{Reductions, Slender};
use super::{flexure, in_plane, sliding, vertical};
use crate::given;
use crate::quantity::{Num, Stress, print};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::trace::{Column, Sheet, Table};

/// One check of a return in one case. The order is the order on the sheet.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Check {
    /// Overturning at the foot.
    Overturning,
    /// Toe at the foot.
    Toe,
    /// Shear at the foot.
    Shear,
    /// Sliding at the dpc.
    Sliding,
    /// Shear at a bonded junction.
    Junction,
    /// Shear at the head.
    ShearHead,
    /// Mid-height of a return whose head is held: no tension, or flexure with precompression.
    Middle,
    /// Flexure at a bonded foot, for information.
    Flexure,
    /// Vertical resistance at the head.
    VerticalHead,
    /// In the middle.
    VerticalMiddle,
    /// At the foot.
    VerticalFoot,
}

impl Check {
    /// Every check, in order.
    pub const ALL: [Self; 11] = [
        Self::Overturning,
        Self::Toe,
        Self::Shear,
        Self::Sliding,
        Self::Junction,
        Self::ShearHead,
        Self::Middle,
        Self::Flexure,
        Self::VerticalHead,
        Self::VerticalMiddle,
        Self::VerticalFoot,
    ];

    /// Its id, unique on a sheet.
    pub const fn id(self) -> &'static str {
        match self {
            Self::Overturning => "overturning",
            Self::Toe => "toe",
            Self::Shear => "shear",
            Self::Sliding => "sliding",
            Self::Junction => "junction",
            Self::ShearHead => "shear-head",
            Self::Middle => "middle",
            Self::Flexure => "flexure",
            Self::VerticalHead => "vertical-head",
            Self::VerticalMiddle => "vertical-middle",
            Self::VerticalFoot => "vertical-foot",
        }
    }

    /// Its name in the table of cases.
    const fn head(self) -> &'static str {
        match self {
            Self::Overturning => "overturning",
            Self::Toe => "toe",
            Self::Shear => "shear",
            Self::Sliding => "sliding",
            Self::Junction => "junction",
            Self::ShearHead => "shear, head",
            Self::Middle => "mid-height",
            Self::Flexure => "flexure",
            Self::VerticalHead => "vertical, head",
            Self::VerticalMiddle => "vertical, middle",
            Self::VerticalFoot => "vertical, foot",
        }
    }

    /// Whether it applies to this return.
    pub fn applies(self, m: &Model) -> bool {
        match self {
            Self::Shear | Self::ShearHead => m.sheared(),
            Self::Sliding => m.dpc && m.sheared(),
            Self::Junction => m.flange.is_some(),
            Self::Middle => m.propped,
            Self::Flexure => !m.dpc && !m.propped,
            _ => true,
        }
    }

    /// Where along the height it looks.
    fn section(self) -> At {
        match self {
            Self::ShearHead | Self::VerticalHead => At::Head,
            Self::VerticalMiddle | Self::Middle => At::Middle,
            _ => At::Foot,
        }
    }
}

/// What stands before the cases: strength and slenderness.
#[derive(Clone, Copy, Debug)]
pub struct Ready {
    /// Design compressive strength.
    pub f_d: Stress,
    /// Slenderness; none where it is outside the method.
    pub slender: Option<Slender>,
}

/// Strength and slenderness, once for all cases. What is outside the method is noted on the sheet.
pub fn prepare(s: &mut Sheet, m: &Model, annex: &Annex) -> Option<Ready> {
    let id = |name: &str| format!("{}{name}", m.leaf);
    let f_d = match in_plane::compressive_strength(s, m, &id("area")) {
        Ok(f_d) => f_d,
        Err(outside) => {
            s.leave(outside);
            return None;
        }
    };
    let slender = match vertical::slenderness(s, m, annex, &id("slenderness")) {
        Ok(sl) => Some(sl),
        Err(outside) => {
            s.leave(outside);
            None
        }
    };
    Some(Ready { f_d, slender })
}

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
            let s = silently(m, annex, ready, case, check);
            s.verdicts.iter().map(|v| v.ratio).fold(f64::NAN, f64::max)
        };
        let ratios = cases.iter().map(|&c| checks.iter().map(|&k| ratio(c, k)).collect()).collect();
        Self { cases, checks, ratios }
    }

    /// Whether everything holds, on silent sheets; ends at the first that does not.
    pub fn holds(m: &Model, annex: &Annex, ready: Ready) -> bool {
        let checks = Self::checks(m);
        let holds = |case: Case| checks.iter().all(|&check| silently(m, annex, ready, case, check).holds());
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

/// One check in one case on a silent sheet.
fn silently(m: &Model, annex: &Annex, ready: Ready, case: Case, check: Check) -> Sheet {
    let mut s = Sheet::silent();
    work(&mut s, m, annex, ready, case, &[check], "");
    s
}

/// Two letters for a case: combination and direction.
fn short(case: Case) -> String {
    let combination = match case.combination {
        Combination::Helping => "H",
        Combination::PressingWind => "W",
        Combination::PressingImposed => "Q",
        Combination::Gravity => "G",
    };
    let direction = if case.direction == Direction::ToFree { "f" } else { "j" };
    format!("{combination} {direction}")
}

/// Records the worst case of each check, checks of the same case under one heading.
pub fn record(s: &mut Sheet, m: &Model, annex: &Annex, ready: Ready, matrix: &Matrix, mu_source: &str) {
    s.heading(1, "Checks, the worst case of each");
    s.table(|| matrix.table());
    for (i, case) in matrix.cases.iter().enumerate() {
        let governed: Vec<Check> = matrix
            .checks
            .iter()
            .enumerate()
            .filter(|&(k, _)| matrix.worst(k) == Some(i))
            .map(|(_, &c)| c)
            .collect();
        if governed.is_empty() {
            continue;
        }
        s.case = case.name();
        let name = case.name();
        let mut letters = name.chars();
        let title: String = letters
            .next()
            .map(|c| c.to_uppercase().collect::<String>() + letters.as_str())
            .unwrap_or_default();
        s.heading(2, title);
        work(s, m, annex, ready, *case, &governed, mu_source);
    }
    if Check::Flexure.applies(m) {
        let case = matrix.worst(0).map_or_else(|| matrix.cases[0], |i| matrix.cases[i]);
        s.case = case.name();
        work(s, m, annex, ready, case, &[Check::Flexure], mu_source);
    }
    s.case.clear();
}

/// The least reduction; 1 where slenderness left its range, which no return passes anyhow.
fn least(s: &mut Sheet, reductions: Option<Reductions>) -> Num {
    match reductions {
        Some(r) => r.least(s),
        None => {
            given!(
                s,
                "reduction across the wall: slenderness is outside the method",
                "this sheet",
                Phi = Num::new(1.0)
            );
            Phi
        }
    }
}

/// Works checks of one case: the actions once per section, the stresses once, the reductions once.
fn work(
    s: &mut Sheet,
    m: &Model,
    annex: &Annex,
    ready: Ready,
    case: Case,
    checks: &[Check],
    mu_source: &str,
) {
    let id = |c: Check| format!("{}{}", m.leaf, c.id());
    let vertical_checks: Vec<Check> = checks
        .iter()
        .copied()
        .filter(|c| matches!(c, Check::VerticalHead | Check::VerticalMiddle | Check::VerticalFoot))
        .collect();
    let reductions = ready
        .slender
        .filter(|_| {
            !vertical_checks.is_empty() || checks.iter().any(|c| matches!(c, Check::Toe | Check::Middle))
        })
        .map(|sl| vertical::reductions(s, m, sl, annex, case));
    for at in [At::Foot, At::Middle, At::Head] {
        let here: Vec<Check> =
            checks.iter().copied().filter(|c| c.section() == at && !vertical_checks.contains(c)).collect();
        if here.is_empty() {
            continue;
        }
        let a = actions::at(s, m, annex, case, at);
        if here.contains(&Check::Overturning) {
            in_plane::overturning(s, m, &a, &id(Check::Overturning));
        }
        let stressed = here
            .iter()
            .any(|c| {
                matches!(c, Check::Toe | Check::Shear | Check::ShearHead | Check::Junction | Check::Middle)
            })
            .then(|| in_plane::stresses(s, m, &a));
        for check in here {
            let id = id(check);
            match (check, &stressed) {
                (Check::Toe, Some(st)) => {
                    let phi = least(s, reductions);
                    in_plane::toe(s, &a, st, phi, ready.f_d, &id);
                }
                (Check::Shear | Check::ShearHead, Some(st)) => sliding::shear(s, m, annex, &a, st, &id),
                (Check::Junction, Some(st)) => {
                    if let Some(f) = a.flange {
                        sliding::junction(s, m, f, &a, st, &id);
                    }
                }
                (Check::Middle, Some(st)) => {
                    let phi = least(s, reductions);
                    flexure::at_mid_height(s, m, &a, st, phi, ready.f_d, &id);
                }
                (Check::Sliding, _) => sliding::sliding(s, m, &a, mu_source, &id),
                (Check::Flexure, _) => flexure::at_bonded_foot(s, m, &a, ready.f_d, &id),
                _ => {}
            }
        }
    }
    for check in vertical_checks {
        if let Some(r) = reductions {
            vertical::resistance(s, m, annex, case, check.section(), r, ready.f_d, &id(check));
        }
    }
}
