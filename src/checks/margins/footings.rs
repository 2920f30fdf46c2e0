//! Rows of a footing.

use super::materials::{factors, mortar, worked_again};
use super::reach::{Reach, Tried};
use super::{Row, all, row, words};
use crate::building::{Footing, Return};
use crate::checks::Job;
use crate::checks::footings::margins;
use crate::checks::returns::build::{Change, Inputs};
use crate::quantity::print::show;
use crate::quantity::{Force, Length, Stress};

fn tried(job: &Job<'_>, mark: &str) -> Tried {
    let found = job.building.footings().find(|(r, _)| r.mark == mark);
    match (&job.wind, found) {
        (Ok(wind), Some((ret, f))) => margins::tried(&Inputs::new(job, ret, wind), ret, f, Change::NONE),
        _ => Tried::Outside,
    }
}

/// Rows of one footing.
pub(super) fn rows(job: &Job<'_>, ret: &Return, f: &Footing) -> Vec<Row> {
    let Ok(wind) = &job.wind else { return all("outside the method") };
    match tried(job, &ret.mark) {
        Tried::Passes => {}
        Tried::Fails => return all("does not pass as it is: see its sheet"),
        Tried::Outside => return all("outside the method"),
    }
    let i = Inputs::new(job, ret, wind);
    let mm = |x: f64| show("l", Length::new(x).dynamic()).to_string();
    let kn = |x: f64| show("N", Force::new(x * 1e3).dynamic()).to_string();
    let pressure = |x: f64| show("p", Stress::new(x / 1e3).dynamic()).to_string();
    let net = |x: f64| show("q_net", Stress::new(x / 1e3).dynamic()).to_string();
    let mut out = Vec::new();
    let q = net(i.wind.overall.base() * 1e3);
    let to = margins::wind(&i, f)
        .map_or_else(|| "no wind comes down to it".to_owned(), |r| words(&r, "up to", &net));
    out.push(row("net overall pressure, characteristic", q, to));
    let mut add =
        |what: &str, now: String, found: Option<Reach>, print: &dyn Fn(f64) -> String, way: &str| {
            out.extend(found.map(|r| row(what, now, words(&r, way, print))));
        };
    let length = "length of the return, loads in proportion";
    add(length, mm(ret.length.base()), margins::length(&i, f), &mm, "down to");
    add("width of the footing", mm(f.width.base()), margins::width(&i, f), &mm, "down to");
    let off = margins::off_the_middle(&i, f);
    add(
        "wall off the middle of the footing",
        mm(f.offset.abs().base()),
        off,
        &mm,
        "either way by up to another",
    );
    let allowed = pressure(f.allowable.value.base() * 1e3);
    add("pressure that the ground is allowed", allowed, margins::allowable(&i, f), &pressure, "down to");
    if let Some((least, most)) = margins::dead(&i, f) {
        let down = if least.end { "without any of it".to_owned() } else { words(&least, "down to", &kn) };
        let to = format!("{down}; {}", words(&most, "up to", &kn));
        out.push(row("dead load at the head, in proportion", kn(margins::dead_now(ret)), to));
    }
    let imposed = margins::imposed(&i, f).map(|r| words(&r, "up to", &kn));
    let now = kn(margins::imposed_now(ret));
    out.extend(imposed.map(|to| row("imposed load at the head, in proportion", now, to)));
    out.push(row(
        "material factors of compression, flexure, shear",
        factors(job.building),
        "no part of this check".to_owned(),
    ));
    let passes = |job: &Job<'_>| tried(job, &ret.mark) == Tried::Passes;
    out.extend(mortar(job.building, &ret.build_up, &|b| worked_again(b, &passes)));
    out
}
