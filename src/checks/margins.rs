//! How far each assumption may move before something fails: one table on the front sheets.
//!
//! Everything is found by search on the checks themselves, one assumption at a time, all else as the job has it, and
//! rounded to the side that fails first. What fails as it is has its remedies on its own sheet.

use super::panels::remedy as of_panel;
use super::returns::build::{Change, Inputs};
use super::returns::{margins as of_return, remedy as passes_of_return};
use super::{Job, Section, masonry, panel_sheet};
use crate::building::{Building, Cause, Panel, PanelRoute, Return};
use crate::quantity::print::show;
use crate::quantity::{Force, Length, LineLoad, Num, Stress};
use crate::solve::root;
use crate::standards::masonry::Mortar;
use crate::trace::{Column, Sheet, Table};

/// The factors on material factors that are tried: as they are to three times, and how finely.
const FACTOR: (f64, u32, f64) = (3.0, 40, 1e-3);
/// The same where every step is a limit analysis.
const COARSE: (f64, u32, f64) = (1.6, 3, 0.05);

/// Classes of mortar from strong to weak; what a lime mortar bears is no class.
const CLASSES: [Mortar; 4] = [Mortar::M12, Mortar::M6, Mortar::M4, Mortar::M2];

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
    sheet.table(|| Table {
        caption: "Found by search on the checks of each sheet, rounded to the safe side".to_owned(),
        columns: vec![
            Column::words(""),
            Column::words("assumption"),
            Column::words("as it is"),
            Column::words("passes"),
        ],
        rows,
        strong: Vec::new(),
    });
    sheet.note(
        "One assumption at a time is moved until a use of that sheet reaches 1.00, all others as they are. A margin says \
         how wrong an assumption may be, not that it may be chosen so. Two that move together use up each other's margin.",
    );
    vec![Section::plain("margins", "How far each assumption may move", sheet)]
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
        let more = if end { " and more" } else { "" };
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
        let more = if end { " and more" } else { "" };
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

/// A job with another building of the same loads, wind and shares; what a return or a panel does not ask for is left out.
fn like<'a>(job: &Job<'_>, building: &'a Building) -> Job<'a> {
    Job {
        building,
        annex: job.annex,
        wind: job.wind.clone(),
        down: None,
        storey: job.storey.clone(),
        whole: Vec::new(),
        piers: Vec::new(),
        holds: Vec::new(),
        failing: Vec::new(),
        outside: Vec::new(),
        drawn: false,
    }
}

/// Material factors and mortar, each tried on a building that differs in them alone.
fn materials(
    job: &Job<'_>,
    build_up: &str,
    tried: (f64, u32, f64),
    passes: &dyn Fn(&Job<'_>) -> bool,
) -> Vec<Row> {
    let b = job.building;
    let mut out = Vec::new();
    let now = masonry::factors(&mut Sheet::silent(), b);
    let at = |factor: f64| passes(&like(job, &with_factor(b, &now, factor)));
    let print = |factor: f64| {
        // Rounded down, save what is a hundredth already.
        let one = |n: usize| format!("{:.2}", (now[n].0.base() * factor * 100.0 + 1e-6).floor() / 100.0);
        format!("{}, {}, {}", one(0), one(1), one(2))
    };
    let (end, steps, precision) = tried;
    if let Some(factor) = root::greatest(at, 1.0, end, steps, precision) {
        let more = if factor >= end { " and more" } else { "" };
        out.push(row(
            "material factors of compression, flexure, shear",
            print(1.0),
            format!("up to {}{more}", print(factor)),
        ));
    }
    out.extend(mortar(b, build_up, passes));
    out
}

/// The building with all material factors times `factor`.
fn with_factor(b: &Building, now: &[(Num, String); 3], factor: f64) -> Building {
    let mut other = b.clone();
    let stated = |n: usize| Some(Cause { value: now[n].0.base() * factor, reason: "tried".to_owned() });
    other.basis.gamma_m_compression = stated(0);
    other.basis.gamma_m_flexure = stated(1);
    other.basis.gamma_m_shear = stated(2);
    other
}

/// The weakest class of mortar down to which it passes, of all leaves of a wall together.
fn mortar(b: &Building, build_up: &str, passes: &dyn Fn(&Job<'_>) -> bool) -> Option<Row> {
    let wall = b.build_up(build_up)?;
    let of_wall = |name: &str| wall.leaves.iter().any(|leaf| leaf.material == name);
    let own = b.materials.iter().filter(|m| of_wall(&m.name));
    let classes: Vec<usize> =
        own.clone().map(|m| CLASSES.iter().position(|c| *c == m.mortar)).collect::<Option<Vec<_>>>()?;
    // A stated strength does not ask the mortar.
    if own.clone().any(|m| m.f_k.is_some() || m.f_vk0.is_some() || m.f_xk1.is_some()) {
        return Some(row(
            "class of mortar",
            "strengths are stated".to_owned(),
            "not by its class".to_owned(),
        ));
    }
    let weakest = *classes.iter().max()?;
    let with = |class: Mortar| {
        let mut other = b.clone();
        for m in other.materials.iter_mut().filter(|m| of_wall(&m.name)) {
            let at = CLASSES.iter().position(|c| *c == m.mortar);
            let to = CLASSES.iter().position(|c| *c == class);
            if at < to {
                m.mortar = class;
            }
        }
        other
    };
    let reached = CLASSES[weakest + 1..]
        .iter()
        .take_while(|class| {
            // Mortar changes stiffness, and with it shares of the wind: the whole job is worked again.
            let other = with(**class);
            passes(&Job { drawn: false, ..Job::new(&other) })
        })
        .last();
    let to = match (reached, weakest + 1 == CLASSES.len()) {
        (Some(class), _) => format!("down to {class}"),
        (None, true) => "no weaker class is known".to_owned(),
        (None, false) => format!("not with {}", CLASSES[weakest + 1]),
    };
    Some(row("class of mortar", CLASSES[weakest].to_string(), to))
}
