//! Rows of a bearing.

use super::materials::{factors, mortar};
use super::reach::Tried;
use super::{Row, all, row, words};
use crate::building::Bearing;
use crate::checks::Job;
use crate::checks::bearings::margins::Held;
use crate::quantity::print::show;
use crate::quantity::{Force, Length};

/// Rows of one bearing.
pub(super) fn rows(job: &Job<'_>, bearing: &Bearing) -> Vec<Row> {
    let b = job.building;
    let held = Held::of(b, bearing, &job.annex);
    let Some((held, load)) = held.and_then(|h| h.load().map(|load| (h, load))) else {
        return all("outside the method");
    };
    match held.tried(b) {
        Tried::Passes => {}
        Tried::Fails => return all("does not pass as it is: see its sheet"),
        Tried::Outside => return all("outside the method"),
    }
    let kn = |x: f64| show("N", Force::new(x * 1e3).dynamic()).to_string();
    let mm = |x: f64| show("l", Length::new(x).dynamic()).to_string();
    let of = |what: &str, now: String, found: Option<_>, print: &dyn Fn(f64) -> String, way: &str| {
        found.map(|r| row(what, now, words(&r, way, print)))
    };
    let (dead, imposed) = (load.dead.base() / 1e3, load.imposed.base() / 1e3);
    let off = load.eccentricity.abs().base();
    let factor = |x: f64| format!("{x:.2}");
    let mut out: Vec<Row> = [
        of("dead load of the beam's end", kn(dead), held.dead(), &kn, "up to"),
        of("imposed load of the beam's end", kn(imposed), held.imposed(), &kn, "up to"),
        of(
            "length of bearing; its edge nearer an end stays",
            mm(bearing.length.base()),
            held.shortest(),
            &mm,
            "down to",
        ),
        of("load off the middle of the leaf", mm(off), held.off_the_middle(), &mm, "up to"),
    ]
    .into_iter()
    .flatten()
    .collect();
    out.extend(held.factor().map(|r| {
        let to = format!("{}; the others no part of it", words(&r, "compression up to", &factor));
        row("material factors of compression, flexure, shear", factors(b), to)
    }));
    let build_up = b.returns.iter().find(|r| r.mark == bearing.on).map(|r| &r.build_up);
    out.extend(build_up.and_then(|name| mortar(b, name, &|b| held.tried(b) == Tried::Passes)));
    out.push(row("wind", String::new(), "no part of this check".to_owned()));
    out
}
