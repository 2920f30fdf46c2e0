//! What would make a return pass, by search on the same check on silent sheets.

use super::build::{Change, Inputs, models};
use super::matrix::Matrix;
use super::run::prepare;
use crate::quantity::{Force, Length, Stress, print};
use crate::solve::root;
use crate::trace::{Column, Sheet, Table};

/// Whether the return with `change` is adequate in every check and inside every clause.
pub fn passes(i: &Inputs<'_>, change: Change) -> bool {
    let mut s = Sheet::silent();
    let Ok(all) = models(&mut s, i, change) else { return false };
    all.iter().all(|m| {
        let mut s = Sheet::silent();
        let Some(ready) = prepare(&mut s, m, i.annex) else { return false };
        s.holds() && Matrix::holds(m, i.annex, ready)
    })
}

/// The least length that passes, all else as it is; to the millimetre, rounded up.
pub fn shortest(i: &Inputs<'_>) -> Option<Length> {
    let try_length = |mm: f64| passes(i, Change { length: Some(Length::new(mm)), ..Change::NONE });
    let own = i.ret.length.base();
    let from = if passes(i, Change::NONE) { 100.0 } else { own };
    root::least(try_length, from, 6000.0, 120, 0.5)
        .map(|mm| Length::new(mm.ceil()))
        .filter(|l| try_length(l.base()))
}

/// The least dead load at mid-length to be added, to 0.1 kN, rounded up.
pub fn dead_needed(i: &Inputs<'_>) -> Option<Force> {
    let add = |kn: f64| passes(i, Change { dead: Force::new(kn * 1e3), ..Change::NONE });
    root::least(add, 0.0, 400.0, 200, 0.02)
        .map(|kn| (kn * 10.0).ceil() / 10.0)
        .filter(|&kn| add(kn))
        .map(|kn| Force::new(kn * 1e3))
}

/// As many times the wind are tried.
pub const MOST_WIND: f64 = 8.0;

/// The largest net overall pressure that passes, rounded down to 0.01 kN/m².
pub fn wind_taken(i: &Inputs<'_>) -> Option<Stress> {
    let blow = |factor: f64| passes(i, Change { wind: factor, ..Change::NONE });
    let q = i.wind.overall;
    let factor = root::greatest(blow, 0.0, MOST_WIND, 160, 1e-4)?;
    Some(Stress::new((q.base() * factor * 1e5).floor() / 1e5))
}

/// A table of what would make a return pass; the words say when nothing in reach does.
pub fn table(i: &Inputs<'_>) -> Table {
    let show = |name: &str, value: Option<crate::quantity::Dyn>, none: &str| {
        value.map_or_else(|| none.to_owned(), |v| print::show(name, v).to_string())
    };
    let now = |name: &str, v: crate::quantity::Dyn| print::show(name, v).to_string();
    let rows = vec![
        vec![
            "length, loads keeping their place in proportion".to_owned(),
            now("l", i.ret.length.dynamic()),
            show("l", shortest(i).map(|l| l.dynamic()), "none up to 6 m"),
        ],
        vec![
            "dead load added at mid-length".to_owned(),
            now("G", Force::ZERO.dynamic()),
            show("G", dead_needed(i).map(|g| g.dynamic()), "none up to 400 kN"),
        ],
        vec![
            "net overall wind pressure, at most".to_owned(),
            now("q", i.wind.overall.dynamic()),
            show("q", wind_taken(i).map(|q| q.dynamic()), "fails without wind"),
        ],
    ];
    Table {
        caption: "What would make it pass, each change alone, found by search on the same checks".to_owned(),
        columns: vec![Column::words("change"), Column::numbers("now"), Column::numbers("needed")],
        rows,
        strong: vec![],
    }
}
