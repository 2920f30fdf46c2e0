//! The section of a footing.

use super::combination::{Case, Combination};
use super::pressure::{self, Pressed, Shape};
use super::stands::Stands;
use super::view;
use crate::building::{Footing, Proof, Return};
use crate::checks::returns::build::Inputs;
use crate::checks::{Job, Section};
use crate::quantity::{Length, Stress, print};
use crate::trace::{Column, Outside, Sheet, Table};

/// As many cases as stand side by side.
const ABREAST: usize = 3;

/// The section of the footing under a return, where it has one.
pub fn section(job: &Job<'_>, ret: &Return) -> Option<Section> {
    let footing = ret.footing.as_ref()?;
    let mut sheet = Sheet::recorder();
    let mut drawings = Vec::new();
    match stands(job, ret, footing) {
        Ok(st) => {
            let pressed = check(&mut sheet, &st);
            drawings = job.drawings(|| view::drawing(ret, &st, &pressed));
            if let Some(drawing) = drawings.first() {
                sheet.drawings(&[&drawing.name]);
                // Seen first, then worked.
                sheet.entries.rotate_right(1);
            }
            if let Some(width) = (!sheet.holds()).then(|| wide_enough(job, ret, footing)) {
                sheet.heading(1, "What would make it pass");
                sheet.note(width);
            }
        }
        Err(outside) => sheet.leave(outside),
    }
    Some(Section {
        id: footing.mark.clone(),
        mark: footing.mark.clone(),
        title: format!("Footing under {}", ret.mark),
        sheet,
        drawings,
        leans: Vec::new(),
    })
}

fn stands<'a>(job: &Job<'_>, ret: &'a Return, footing: &'a Footing) -> Result<Stands<'a>, Outside> {
    let wind = job.wind.as_ref().map_err(Clone::clone)?.of_return(job.building, ret);
    let inputs = Inputs { building: job.building, ret, wind, storey: job.sharing(), annex: &job.annex };
    Stands::of(&inputs, ret, footing)
}

/// Checks a footing; yields each case with what it presses.
pub fn check(s: &mut Sheet, st: &Stands<'_>) -> Vec<(Case, Pressed)> {
    remarks(s, st);
    s.heading(1, "What stands on it");
    pressure::common(s, st);
    s.heading(1, "Pressure on the ground, before and after the removal");
    let cases: Vec<Case> = Combination::all(st).into_iter().map(|c| Case::worse(c, st)).collect();
    let mut out = Vec::new();
    let tables = cases.len().div_ceil(ABREAST);
    for few in cases.chunks(cases.len().div_ceil(tables)) {
        let heads: Vec<String> = few.iter().map(|c| c.combination.name()).collect();
        out.extend(s.columns(&heads, |s, i| {
            s.case = few[i].name(st);
            (few[i], pressure::of(s, st, few[i], "pressure"))
        }));
    }
    s.case.clear();
    s.table(|| table(st, &out));
    s.note(growth(st, &out));
    out
}

/// What the reader must know before the numbers.
fn remarks(s: &mut Sheet, st: &Stands<'_>) {
    let f = st.footing;
    let words = f.words.trim_end_matches('.');
    s.note(match f.proof {
        Proof::Assumed => {
            format!("The footing was not seen; it is assumed: {words}. A hold point goes with it.")
        }
        _ => format!("The footing was seen: {words}."),
    });
    s.note(
        "First principles, no clause: the strip is stiff, the pressure under it is linear, the ground takes no \
         tension. All loads are characteristic and whole (in G + Q + W too); imposed load and wind are each \
         taken as there or absent, wind and tilt both ways. Settlement is not worked out.",
    );
    if st.pushed() && !st.whole.propped {
        s.note("The tilt of 5.3(2) acts in every combination, here with characteristic loads.");
    }
    if st.whole.propped {
        s.note(
            "The head is held: the force at the head and the tilt go to the walls that hold it, and the wind \
             on the return passes no moment to its foot.",
        );
    }
    if !Combination::all(st).iter().any(|c| c.wind) {
        s.note("No wind comes down to this footing: with W the combinations would be the same as without.");
    }
    if st.flanged {
        s.note(
            "The flange is left out: what it brings goes down to the footing of the wall met, which is not this \
             strip.",
        );
    }
    if st.off_middle() {
        s.note(
            "The loads press off the middle of the footing across the wall: the pressure along it is taken times \
             the factor of the far edge (1 + 6 e/B, a triangle beyond B/6).",
        );
    }
}

fn kn_m2(p: Stress) -> String {
    print::show("p", p.dynamic()).value
}

fn table(st: &Stands<'_>, all: &[(Case, Pressed)]) -> Table {
    let p_all = st.footing.allowable.value;
    let given = st.footing.before.is_some();
    let mut columns = vec![Column::words("loads"), Column::words("worse direction")];
    if given {
        columns.push(Column::numbers("before, kN/m²"));
    }
    columns.push(Column::numbers("after, kN/m²"));
    if given {
        columns.push(Column::numbers("growth, kN/m²"));
    }
    columns.extend([Column::numbers("allowed, kN/m²"), Column::numbers("use"), Column::words("pressed")]);
    let rows = all
        .iter()
        .map(|(case, x)| {
            let way = case.push(st).map_or("either", |_| case.direction.words());
            let mut row = vec![case.combination.name(), way.to_owned()];
            if let Some(p_0) = x.p_0 {
                row.push(kn_m2(p_0));
            } else if given {
                row.push("–".to_owned());
            }
            row.push(kn_m2(x.p_max));
            if given {
                row.push(x.p_0.map_or("–".to_owned(), |p_0| kn_m2(x.p_max - p_0)));
            }
            let pressed = match x.shape {
                Shape::Trapezium(_) => "whole length".to_owned(),
                Shape::Triangle(part) => format!("{} mm", print::show("L", part.dynamic()).value),
                Shape::Nothing => "nothing bears".to_owned(),
            };
            row.extend([kn_m2(p_all), print::ratio((x.p_max / p_all).base()), pressed]);
            row
        })
        .collect();
    let strong = worst(all).into_iter().collect();
    Table { caption: "Largest pressure on the ground".to_owned(), columns, rows, strong }
}

/// The case that presses hardest.
pub fn worst(all: &[(Case, Pressed)]) -> Option<usize> {
    (0..all.len()).reduce(|a, b| if all[b].1.p_max > all[a].1.p_max { b } else { a })
}

/// By how much the removal changes the pressure, in words.
fn growth(st: &Stands<'_>, all: &[(Case, Pressed)]) -> String {
    let Some((case, x)) = worst(all).map(|i| &all[i]) else { return String::new() };
    let Some(p_0) = x.p_0 else {
        return "What pressed this footing before the removal is not given: by how much the pressure grows is \
                not shown."
            .to_owned();
    };
    if !x.p_max.is_finite() || p_0 <= Stress::ZERO {
        return "By how much the pressure grows cannot be given as a ratio.".to_owned();
    }
    let change = (x.p_max / p_0).base() - 1.0;
    let word = if change < 0.0 { "falls" } else { "grows" };
    let percent = change.abs() * 100.0;
    let mut words = format!(
        "Under {} the pressure {word} from {} to {} kN/m², by {percent:.0} %. Before the removal the wall was long \
         and its wind is left out of the column before, so the growth is not shown too small.",
        case.combination.name(),
        kn_m2(p_0),
        kn_m2(x.p_max)
    );
    if all.iter().any(|(_, x)| x.p_0.is_some_and(|p| p > st.footing.allowable.value)) {
        words.push_str(
            " Before the removal already the pressure was more than is allowed here; that it stood is no proof.",
        );
    }
    words
}

/// The narrowest footing that would pass, everything else unchanged.
fn wide_enough(job: &Job<'_>, ret: &Return, footing: &Footing) -> String {
    let step = Length::new(50.0);
    let passes = |width: Length| {
        let wider = Footing { width, ..footing.clone() };
        let mut s = Sheet::silent();
        stands(job, ret, &wider).is_ok_and(|st| {
            check(&mut s, &st);
            s.holds()
        })
    };
    let first = Length::new((footing.width.base() / 50.0).floor() * 50.0 + 50.0);
    let widths = (0..40).map(|n| first + step * f64::from(n));
    match widths.into_iter().find(|w| passes(*w)) {
        Some(w) => format!(
            "A footing {:.0} mm wide, in steps of 50 mm, with all else as it is; or more length, less load.",
            w.base()
        ),
        None => format!(
            "No footing up to {:.0} mm wide, with all else as it is: the resultant lies too far from its middle. \
             More length helps, or another place of the load.",
            (first + step * 39.0).base()
        ),
    }
}
