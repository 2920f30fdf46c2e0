//! How far each assumption may move before something fails: one table on the front sheets.
//!
//! Everything is found by search on the checks themselves, one assumption at a time, all else as the job has it, and
//! rounded to the side that fails first. What fails as it is has its remedies on its own sheet.

mod bearings;
mod footings;
mod materials;
pub mod reach;

use super::panels::remedy as of_panel;
use super::returns::build::{Change, Inputs};
use super::returns::{margins as of_return, remedy as passes_of_return};
use super::{Job, Section, panel_sheet};
use crate::building::{Panel, PanelRoute, Return};
use crate::quantity::print::show;
use crate::quantity::{Force, Length, LineLoad, Stress};
use crate::trace::{Column, Sheet, Table};
use materials::materials;
use reach::{Reach, Tried};

/// The factors on material factors that are tried: as they are to three times, and how finely.
const FACTOR: (f64, u32, f64) = (3.0, 40, 1e-3);
/// The same where every step is a limit analysis.
const COARSE: (f64, u32, f64) = (1.6, 3, 0.05);

/// The sheet, in a pack alone: its searches take longer than the checks.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    if !job.drawn || (job.building.returns.is_empty() && job.building.panels.is_empty()) {
        return Vec::new();
    }
    let mut sheet = Sheet::recorder();
    let mut rows = Vec::new();
    for r in &job.building.returns {
        rows.extend(block(&r.mark, return_rows(job, r)));
    }
    for p in &job.building.panels {
        rows.extend(block(&p.mark, panel_rows(job, p)));
    }
    table(&mut sheet, "Found by search on the checks of each sheet, rounded to the safe side", rows);
    let of_bearings = job.building.bearings.iter().flat_map(|x| block(&x.mark, bearings::rows(job, x)));
    table(&mut sheet, "Bearings of beams, each on the seat of its sheet: the same", of_bearings.collect());
    let of_footings = job.building.footings().flat_map(|(r, f)| block(&f.mark, footings::rows(job, r, f)));
    table(&mut sheet, "Footings: the same", of_footings.collect());
    sheet.note(
        "One assumption at a time is moved until a use of that sheet reaches 1.00, all others as they are. A margin says \
         how wrong an assumption may be, not that it may be chosen so. Two that move together use up each other's margin.",
    );
    vec![Section::plain("margins", "How far each assumption may move", sheet)]
}

fn table(sheet: &mut Sheet, caption: &str, rows: Vec<Vec<String>>) {
    if rows.is_empty() {
        return;
    }
    sheet.table(|| Table {
        caption: caption.to_owned(),
        columns: vec![
            Column::words(""),
            Column::words("assumption"),
            Column::words("as it is"),
            Column::words("passes"),
        ],
        rows,
        strong: Vec::new(),
    });
}

/// Assumption, as it is, how far it passes.
type Row = [String; 3];

/// Rows of one thing: its mark before the first.
fn block(mark: &str, rows: Vec<Row>) -> Vec<Vec<String>> {
    let head = |n: usize| if n == 0 { mark.to_owned() } else { String::new() };
    rows.into_iter().enumerate().map(|(n, [what, now, to])| vec![head(n), what, now, to]).collect()
}

fn row(what: &str, now: String, to: String) -> Row {
    [what.to_owned(), now, to]
}

/// How far it passes: `up to 24 kN`, and what comes beyond where that is not a use above 1.00.
fn words(r: &Reach, way: &str, print: &dyn Fn(f64) -> String) -> String {
    let further = if way.ends_with("down to") { "less" } else { "more" };
    match (r.moved, r.end, r.beyond) {
        (_, true, _) => format!("{way} {}, {further} not tried", print(r.value)),
        (false, _, Tried::Outside) => "no further: outside the method".to_owned(),
        (false, ..) => "no further".to_owned(),
        (true, _, Tried::Outside) => format!("{way} {}, then outside the method", print(r.value)),
        (true, ..) => format!("{way} {}", print(r.value)),
    }
}

fn all(why: &str) -> Vec<Row> {
    vec![row("any", String::new(), why.to_owned())]
}

fn holds(job: &Job<'_>, r: &Return) -> bool {
    let passes = |wind| passes_of_return::passes(&Inputs::new(job, r, wind), Change::NONE);
    job.wind.as_ref().is_ok_and(passes)
}

fn return_rows(job: &Job<'_>, r: &Return) -> Vec<Row> {
    let Ok(wind) = &job.wind else { return all("outside the method") };
    let i = Inputs::new(job, r, wind);
    if !holds(job, r) {
        return all("does not pass as it is: see its sheet");
    }
    let stress = |q: Stress| show("q_net", q.dynamic()).to_string();
    let mm = |l: Length| show("l", l.dynamic()).to_string();
    let force = |n: Force| show("G", n.dynamic()).to_string();
    let mut out = Vec::new();
    if let Some((q, end)) = of_return::most_wind(&i) {
        let more = if end { ", more not tried" } else { "" };
        out.push(row(
            "net overall pressure, characteristic",
            stress(i.wind.overall),
            format!("up to {}{more}", stress(q)),
        ));
    }
    if let Some(l) = of_return::shortest(&i) {
        out.push(row("length, loads in proportion", mm(r.length), format!("down to {}", mm(l))));
    }
    match of_return::dead_spare(&i) {
        Some((_, given)) if given == Force::ZERO => {}
        Some((spare, given)) if spare >= given => {
            out.push(row("dead load at its head", force(given), "without any of it".to_owned()));
        }
        Some((spare, given)) => {
            out.push(row(
                "dead load at its head",
                force(given),
                format!("with {} less at mid-length", force(spare)),
            ));
        }
        None => {}
    }
    let passes = |job: &Job<'_>| {
        job.building.returns.iter().find(|own| own.mark == r.mark).is_some_and(|r| holds(job, r))
    };
    out.extend(materials(job, &r.build_up, FACTOR, &passes));
    out
}

fn panel_rows(job: &Job<'_>, p: &Panel) -> Vec<Row> {
    let Ok(m) = panel_sheet::model(job, p) else { return all("outside the method") };
    if !of_panel::passes(&m, &job.annex) {
        return all("does not pass as it is: see its sheet");
    }
    let weak = panel_sheet::named(job, p).find(|r| !holds(job, r));
    if let Some(r) = weak {
        return all(&format!("is held by {}, which does not pass: see its sheet", r.mark));
    }
    let stress = |q: Stress| show("q_net", q.dynamic()).to_string();
    let mm = |l: Length| show("l", l.dynamic()).to_string();
    let mut out = Vec::new();
    if let Some(q) = of_panel::greatest_wind(&m, &job.annex) {
        out.push(row("net pressure on it, characteristic", stress(m.q_net), format!("up to {}", stress(q))));
    }
    if let Some(l) = of_panel::longest(&m, &job.annex) {
        let end = l.base() >= (2.0 * m.after.length.base() / 10.0).floor() * 10.0;
        let more = if end { ", more not tried" } else { "" };
        out.push(row("length, added at its right end", mm(m.after.length), format!("up to {}{more}", mm(l))));
    }
    let given = m.leaves[m.loaded()].G_above;
    if given > LineLoad::ZERO {
        let line = |g: LineLoad| show("g", g.dynamic()).to_string();
        let to = match of_panel::dead_down_to(&m, &job.annex) {
            Some(LineLoad::ZERO) => "without any of it".to_owned(),
            Some(g) => format!("down to {}", line(g)),
            None => line(given),
        };
        out.push(row("dead load on the loaded leaf", line(given), to));
    }
    let passes = |job: &Job<'_>| {
        let own = job.building.panels.iter().find(|own| own.mark == p.mark);
        matches!(own.map(|p| panel_sheet::model(job, p)), Some(Ok(m)) if of_panel::passes(&m, &job.annex))
    };
    // A limit analysis is worked at every step.
    let tried = if m.route == PanelRoute::LimitAnalysis { COARSE } else { FACTOR };
    out.extend(materials(job, &p.build_up, tried, &passes));
    out
}
