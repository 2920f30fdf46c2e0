//! The worst case of every check on the sheet: a column for each section and case in which one governs.

use super::actions::{self, Case};
use super::check::Check;
use super::matrix::{Matrix, Place, short};
use super::model::Model;
use super::vertical::{Reductions, Slender};
use super::{flexure, in_plane, sliding, vertical};
use crate::given;
use crate::quantity::{Num, Stress};
use crate::standards::annex::Annex;
use crate::trace::Sheet;

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
    if m.sheared() || m.flange.is_some() {
        let source = m.masonry.gamma_v_source.as_str();
        given!(s, "material factor, shear", source, gamma_Mv = m.masonry.gamma_v);
    }
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

/// One check in one case on a silent sheet.
pub fn silently(m: &Model, annex: &Annex, ready: Ready, case: Case, check: Check) -> Sheet {
    let mut s = Sheet::silent();
    let reductions =
        ready.slender.filter(|_| check.reduced()).map(|sl| vertical::reductions(&mut s, m, sl, annex, case));
    let place = Place { case, at: check.section(), checks: vec![check] };
    work(&mut s, m, annex, ready, &place, reductions, "");
    s
}

/// As many places as stand side by side on a sheet.
const ABREAST: usize = 3;
/// With a flange its longer formulas need the room.
const FLANGED: usize = 2;

/// Records the worst case of each check, `drawing` beside the table of cases: a column for every section and case in which one governs.
pub fn record(
    s: &mut Sheet,
    m: &Model,
    annex: &Annex,
    ready: Ready,
    matrix: &Matrix,
    mu_source: &str,
    drawing: Option<&str>,
) {
    s.heading(1, "Checks, the worst case of each");
    s.table(|| matrix.table());
    if let Some(name) = drawing {
        s.drawings(&[name]);
    }
    let across = across_the_wall(s, m, annex, ready, matrix);
    let places = matrix.places(m);
    // What is the same in every column stands before them.
    actions::tilt(s, m, annex);
    if let Some(first) = places.first().filter(|first| places.iter().all(|p| p.case == first.case)) {
        actions::factors(s, first.case, annex, m.helping);
    }
    given!(s, "dead load at the head", "load table", G_h = m.at_head.G);
    given!(s, "imposed load at the head", "load table", Q_h = m.at_head.Q);
    let (upright, in_plane): (Vec<Place>, Vec<Place>) =
        places.into_iter().partition(|p| p.checks.iter().all(|c| c.upright()));
    for (title, places) in
        [("In the plane of the return", in_plane), ("Pressed over the whole length", upright)]
    {
        if places.is_empty() {
            continue;
        }
        s.heading(2, title);
        // Even shares read better than full tables and a rest.
        let abreast = if m.flange.is_some() && title.starts_with("In the plane") { FLANGED } else { ABREAST };
        let tables = places.len().div_ceil(abreast);
        for few in places.chunks(places.len().div_ceil(tables)) {
            if let [one] = few {
                s.heading(2, format!("At the {}: {}", one.at.words(), one.case.name()));
            }
            s.columns(&few.iter().map(Place::head).collect::<Vec<_>>(), |s, i| {
                let place = &few[i];
                s.case = place.case.name();
                let reductions = across.iter().find(|(case, _)| *case == place.case).map(|(_, r)| *r);
                work(s, m, annex, ready, place, reductions, mu_source);
            });
        }
    }
    s.case.clear();
}

/// Reductions across the wall for every case that needs them: once where the loads stand central, for
/// then no factor changes them.
fn across_the_wall(
    s: &mut Sheet,
    m: &Model,
    annex: &Annex,
    ready: Ready,
    matrix: &Matrix,
) -> Vec<(Case, Reductions)> {
    let Some(slender) = ready.slender else { return Vec::new() };
    let mut cases: Vec<Case> = Vec::new();
    for (k, _) in matrix.checks.iter().enumerate().filter(|(_, c)| c.reduced()) {
        cases.extend(matrix.worst(k).map(|i| matrix.cases[i]).filter(|c| !cases.contains(c)));
    }
    s.heading(2, "Reduction across the wall");
    if vertical::central(m) {
        let Some(first) = cases.first() else { return Vec::new() };
        let r = vertical::reductions(s, m, slender, annex, *first);
        r.least(s);
        return cases.into_iter().map(|case| (case, r)).collect();
    }
    let heads: Vec<String> = cases.iter().map(|c| short(*c)).collect();
    let of = s.columns(&heads, |s, i| {
        let r = vertical::reductions(s, m, slender, annex, cases[i]);
        r.least(s);
        r
    });
    cases.into_iter().zip(of).collect()
}

/// The least reduction; 1 where slenderness left its range, which no return passes anyhow.
fn least(s: &mut Sheet, reductions: Option<Reductions>) -> Num {
    match reductions {
        Some(r) => r.least_of(),
        None => {
            s.note(
                "No reduction across the wall is known, slenderness being outside the method: 1 is put in.",
            );
            Num::new(1.0)
        }
    }
}

/// Works the checks of one place: the actions once, the stresses once.
fn work(
    s: &mut Sheet,
    m: &Model,
    annex: &Annex,
    ready: Ready,
    place: &Place,
    reductions: Option<Reductions>,
    mu_source: &str,
) {
    let id = |c: Check| format!("{}{}", m.leaf, c.id());
    let Place { case, at, ref checks } = *place;
    if checks.iter().all(|c| c.upright()) {
        for check in checks {
            if let Some(r) = reductions {
                vertical::resistance(s, m, annex, case, at, r, ready.f_d, &id(*check));
            }
        }
        return;
    }
    let a = actions::at(s, m, annex, case, at);
    if checks.contains(&Check::Overturning) {
        in_plane::overturning(s, m, &a, &id(Check::Overturning));
    }
    let stressed = checks.iter().any(|c| c.stressed()).then(|| in_plane::stresses(s, m, &a));
    for &check in checks {
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
