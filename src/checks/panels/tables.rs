//! Tables of a panel's sheet: how it is held, before and after side by side, and how far things may move.

use super::model::PanelModel;
use super::remedy;
use super::run::Outcome;
use crate::building::PanelRoute;
use crate::quantity::print::{self, show};
use crate::quantity::{Length, Stress};
use crate::standards::annex::Annex;
use crate::trace::{Column, Table};

/// How the edges are held before and after, and why.
pub fn held(m: &PanelModel) -> Table {
    let (b, a) = (&m.before, &m.after);
    let row = |name: &str, b: &crate::building::Edge, a: &crate::building::Edge| {
        let why = if b.reason == a.reason { "the same".to_owned() } else { a.reason.clone() };
        vec![name.to_owned(), how(b), b.reason.clone(), how(a), why]
    };
    Table {
        caption: "Edges, seen from outside".to_owned(),
        columns: ["edge", "before", "why", "after", "why"].map(Column::words).to_vec(),
        rows: vec![
            row("top", &b.top, &a.top),
            row("base", &b.base, &a.base),
            row("left", &b.left, &a.left),
            row("right", &b.right, &a.right),
        ],
        strong: Vec::new(),
    }
}

/// How far each thing may move before the panel fails, the others as they are.
pub fn moves(m: &PanelModel, annex: &Annex) -> Table {
    let caption = "Up to where the panel passes by the route that decides, one thing at a time; rounded down";
    let coarse = "; by limit analysis on a coarse grid, lowered for it by 2.5 % and more";
    let limit = m.route == PanelRoute::LimitAnalysis;
    Table {
        caption: format!("{caption}{}", if limit { coarse } else { "" }),
        columns: ["", "as it is", "passes up to"].map(Column::words).to_vec(),
        rows: remedy::margins(m, annex).into_iter().map(Vec::from).collect(),
        strong: Vec::new(),
    }
}

/// How an edge is held, with its stretch where that is not all of it.
fn how(e: &crate::building::Edge) -> String {
    let mm = |l: Length| show("l", l.dynamic()).to_string();
    let kind = if e.dpc { format!("{} at the dpc", e.kind) } else { e.kind.to_string() };
    match e.stretch {
        None => kind,
        Some((from, to)) => format!("{kind} from {} to {}, else free", mm(from), mm(to)),
    }
}

/// Before and after in two columns.
pub fn side_by_side(m: &PanelModel, before: Option<&Outcome>, after: Option<&Outcome>) -> Table {
    let cell = |o: Option<&Outcome>, f: &dyn Fn(&Outcome) -> Option<String>| {
        o.map_or_else(|| "outside the method".to_owned(), |o| f(o).unwrap_or_else(|| "–".to_owned()))
    };
    let mut rows = Vec::new();
    let mut row = |name: String, f: &dyn Fn(&Outcome) -> Option<String>| {
        let cells = [cell(before, f), cell(after, f)];
        if cells.iter().any(|c| c != "–") {
            let [b, a] = cells;
            rows.push(vec![name, b, a]);
        }
    };
    row("length".to_owned(), &|o| Some(show("l", o.l.dynamic()).to_string()));
    for i in 0..m.leaves.len() {
        let of = if m.leaves.len() == 1 { String::new() } else { format!(", {}", m.leaf_name(i)) };
        let force = |name: &'static str, x: crate::quantity::Force| show(name, x.dynamic()).to_string();
        // Both leaves have the same edges, so the same case.
        if i == 0 {
            row("case of Annex E, or how worked".to_owned(), &|o| o.leaves.get(i).map(|x| x.label.clone()));
        }
        row(format!("coefficient{of}"), &|o| o.leaves.get(i)?.alpha_2.map(|x| print::significant(x.base())));
        row(format!("moment, parallel{of}"), &|o| o.leaves.get(i)?.parallel.map(|x| force("M_Ed1", x.0)));
        row(format!("resistance, parallel{of}"), &|o| o.leaves.get(i)?.parallel.map(|x| force("M_Rd1", x.1)));
        row(format!("moment, across{of}"), &|o| o.leaves.get(i)?.across.map(|x| force("M_Ed2", x.0)));
        row(format!("resistance, across{of}"), &|o| o.leaves.get(i)?.across.map(|x| force("M_Rd2", x.1)));
        if m.leaves.len() > 1 {
            row(format!("pressure it can take{of}"), &|o| {
                o.leaves.get(i).map(|x| show("w_Rd", x.w_Rd.dynamic()).to_string())
            });
        }
    }
    row("design pressure".to_owned(), &|o| Some(show("W_Ed", o.W_Ed.dynamic()).to_string()));
    row("pressure the panel can take".to_owned(), &|o| Some(show("w_Rd", o.w_Rd.dynamic()).to_string()));
    let deciding = m.route == PanelRoute::LimitAnalysis;
    let low = if deciding { "limit analysis, safe side (decides)" } else { "limit analysis, safe side" };
    let pressure = |w: Stress| show("w_Rd", w.dynamic()).to_string();
    row(low.to_owned(), &|o| o.bounds.map(|b| pressure(b.low)));
    row("limit analysis, weakest crack pattern".to_owned(), &|o| o.bounds?.high.map(pressure));
    row("by hand".to_owned(), &|o| o.hand.map(pressure));
    row("use".to_owned(), &|o| Some(print::ratio(o.ratio)));
    let strong = vec![rows.len() - 1];
    Table {
        caption: "Before and after, side by side; after decides".to_owned(),
        columns: vec![Column::words(""), Column::numbers("before"), Column::numbers("after")],
        rows,
        strong,
    }
}
