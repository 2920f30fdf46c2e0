//! What the plan shows of the removal, beside what the job file says.

use super::{Job, Section};
use crate::building::found::{self, FoundPanel, FoundReturn, FoundSpan};
use crate::building::{Building, Panel, Return};
use crate::quantity::Length;
use crate::trace::{Column, Sheet, Table};

/// Differences smaller than this are how lines are drawn.
const DRAWN: f64 = 50.0;

/// The sheet of what was found, where the plan shows something.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let b = job.building;
    if b.found.returns.is_empty() && b.found.panels.is_empty() {
        return Vec::new();
    }
    let mut s = Sheet::recorder();
    s.note(
        "Read from the lines of the plan in the storey of the wall that comes out. A wall counts as a support of another \
         where it is at least a fifth of the clear height long before its first opening (5.5.1.2(6)). The tributary width \
         is half the distance to the next support on each side.",
    );
    if !b.found.returns.is_empty() {
        s.table(|| returns(b));
    }
    if !b.found.panels.is_empty() {
        s.table(|| panels(b));
    }
    let rows = differences(b);
    if !rows.is_empty() {
        s.table(|| Table {
            caption: "Where the job file differs from its plan; the job file is used".to_owned(),
            columns: vec![
                Column::words("mark"),
                Column::words("what"),
                Column::numbers("job file, m"),
                Column::numbers("plan, m"),
            ],
            rows,
            strong: Vec::new(),
        });
    }
    vec![Section::plain("found", "What stays and what loses a support", s)]
}

/// Hold points: what was found and is not worked, or worked with edges that nobody has seen.
pub fn holds(b: &Building) -> Vec<(String, String)> {
    let mut out = Vec::new();
    for r in &b.found.returns {
        if !b.returns.iter().any(|own| own.mark == r.mark) {
            out.push((
                r.mark.clone(),
                format!(
                    "Before the wall comes down: show that {}, {} m long at the {}, carries what it gets; it is not \
                     worked here.",
                    r.mark,
                    m(r.length),
                    r.meets
                ),
            ));
        }
    }
    for p in &b.found.panels {
        let doors = p.after.openings.len();
        let own = found::treated(b, p);
        if doors == 0 || own.is_some_and(|own| own.after.openings.len() >= doors) {
            continue;
        }
        let (mark, how) = match own {
            Some(own) => (own.mark.clone(), "it is worked here as a wall without openings"),
            None => (p.on.clone(), "it is not worked here"),
        };
        out.push((
            mark,
            format!(
                "Before the wall comes down: show that the {} {}, {} m long, with its {} carries the wind; {how}.",
                p.on,
                held(&p.after),
                m(p.after.length()),
                if doors == 1 { "opening".to_owned() } else { format!("{doors} openings") },
            ),
        ));
    }
    for p in b.panels.iter().filter(|p| p.edges_taken) {
        out.push((
            p.mark.clone(),
            format!(
                "Before the wall comes down: see what holds the edges of {}; how they are held was taken from the plan.",
                p.mark
            ),
        ));
    }
    out
}

fn m(l: Length) -> String {
    format!("{:.2}", l.base() / 1e3)
}

/// From what to what a panel runs.
fn held(span: &FoundSpan) -> String {
    let end = |i: usize| span.held[i].clone().unwrap_or_else(|| "a free end".to_owned());
    format!("from {} to {}", end(0), end(1))
}

fn returns(b: &Building) -> Table {
    let rows = b.found.returns.iter().map(|r| {
        let own = b.returns.iter().any(|x| x.mark == r.mark);
        let how = match (own, b.found.added.contains(&r.mark)) {
            (_, true) => "on its sheet, as a free cantilever: the job file does not speak of it",
            (true, false) => "on its sheet",
            (false, false) => "not worked: a hold point",
        };
        vec![
            r.mark.clone(),
            r.meets.clone(),
            m(r.length),
            m(r.tributary),
            r.nearest_opening.map_or_else(|| "none".to_owned(), m),
            m(r.supported),
            how.to_owned(),
        ]
    });
    Table {
        caption: "What stays in the line of the wall that comes out, m".to_owned(),
        columns: vec![
            Column::words("mark"),
            Column::words("meets"),
            Column::numbers("length"),
            Column::numbers("tributary"),
            Column::numbers("to opening"),
            Column::numbers("height met"),
            Column::words("worked"),
        ],
        rows: rows.collect(),
        strong: Vec::new(),
    }
}

fn panels(b: &Building) -> Table {
    let rows = b.found.panels.iter().map(|p| {
        let doors = p.after.openings.len();
        let how = match found::treated(b, p) {
            Some(own) if own.after.openings.len() < doors => {
                format!("{}, without its openings: a hold point", own.mark)
            }
            Some(own) if b.found.added.contains(&own.mark) => {
                format!("{}, edges taken from the plan", own.mark)
            }
            Some(own) => own.mark.clone(),
            None => "not worked: a hold point".to_owned(),
        };
        vec![
            p.on.clone(),
            held(&p.before),
            m(p.before.length()),
            held(&p.after),
            m(p.after.length()),
            doors.to_string(),
            how,
        ]
    });
    Table {
        caption: "Outer walls that lose a support, from line to line of the plan, m".to_owned(),
        columns: vec![
            Column::words("wall"),
            Column::words("before"),
            Column::numbers("length"),
            Column::words("after"),
            Column::numbers("length"),
            Column::numbers("openings"),
            Column::words("worked as"),
        ],
        rows: rows.collect(),
        strong: Vec::new(),
    }
}

/// What differs by more than the plan is drawn to: mark, what, by hand, from the plan.
fn differences(b: &Building) -> Vec<Vec<String>> {
    let of_returns = b.found.returns.iter().flat_map(|f| {
        let own = b.returns.iter().find(|r| r.mark == f.mark);
        own.map_or_else(Vec::new, |r| of_return(r, f))
    });
    let of_panels = b.found.panels.iter().flat_map(|f| {
        found::treated(b, f).filter(|p| p.after.ends.is_some()).map_or_else(Vec::new, |p| of_panel(p, f))
    });
    of_returns.chain(of_panels).collect()
}

fn of_return(r: &Return, f: &FoundReturn) -> Vec<Vec<String>> {
    let j = &r.junction;
    let same = j.to == f.meets;
    let pairs = [
        ("length", r.length, Some(f.length)),
        ("tributary width", r.tributary_width, Some(f.tributary)),
        ("height of wind face that the floor collects", r.strip_height.unwrap_or(f.strip), Some(f.strip)),
        ("height of the wall met", r.supported_wall_height, Some(f.supported)),
        (
            "nearest opening",
            r.nearest_opening.unwrap_or(f.to_end[0]),
            r.nearest_opening.and(f.nearest_opening),
        ),
        ("wall met, to one side", less(j.left, j.right), same.then(|| less(f.to_end[0], f.to_end[1]))),
        ("wall met, to the other", more(j.left, j.right), same.then(|| more(f.to_end[0], f.to_end[1]))),
    ];
    rows(&r.mark, &pairs)
}

fn of_panel(p: &Panel, f: &FoundPanel) -> Vec<Vec<String>> {
    rows(
        &p.mark,
        &[
            ("length before", p.before.length, Some(f.before.length())),
            ("length after", p.after.length, Some(f.after.length())),
        ],
    )
}

fn rows(mark: &str, pairs: &[(&str, Length, Option<Length>)]) -> Vec<Vec<String>> {
    let far = |(_, hand, plan): &&(&str, Length, Option<Length>)| {
        plan.is_some_and(|p| (p - *hand).abs().base() > DRAWN)
    };
    let row = |(what, hand, plan): &(&str, Length, Option<Length>)| {
        vec![mark.to_owned(), (*what).to_owned(), m(*hand), plan.map_or_else(String::new, m)]
    };
    pairs.iter().filter(far).map(row).collect()
}

fn less(a: Length, b: Length) -> Length {
    if a < b { a } else { b }
}

fn more(a: Length, b: Length) -> Length {
    if a < b { b } else { a }
}
