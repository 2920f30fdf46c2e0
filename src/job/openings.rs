//! `[[panels.openings]]`: doors and windows of a panel, where it does not have them from the plan.

use super::limits::{Limits, Odd};
use super::plan;
use super::reader::Table;
use crate::building::{PanelOpening, Span};
use crate::error::Kind;
use crate::quantity::Length;
use crate::quantity::functions::min;

pub(super) const AT: Limits = Limits::new(0.0, 20.0, "m");
pub(super) const WIDTH: Limits =
    Limits::new(0.2, 10.0, "m").odd(&[Odd::Above(4.0, "wide for an opening in masonry")]);
pub(super) const HEIGHT: Limits = Limits::new(0.2, 6.0, "m");
pub(super) const SILL: Limits = Limits::new(0.0, 4.0, "m");

/// Masonry narrower than this beside, between, over or under openings is not counted on by anybody: give the
/// openings as one, or end the panel there, mm. Common practice, no published source.
const SLIVER: f64 = 100.0;

/// Reads the openings of a panel, from left to right.
pub fn read(t: &Table<'_>) -> Option<Vec<PanelOpening>> {
    let one = |o: &Table<'_>| {
        let at = o.need("at").quantity(&AT);
        let width = o.need("width").quantity(&WIDTH);
        let sill = if o.has("sill") { o.may("sill").quantity(&SILL) } else { Some(Length::ZERO) };
        let height = o.need("height").quantity(&HEIGHT);
        let frame = plan::frame(o);
        let bearing = plan::lintel(o);
        o.finish();
        Some(PanelOpening {
            at: at?,
            width: width?,
            sill: sill?,
            height: height?,
            frame: frame?,
            bearing: bearing?,
        })
    };
    let all: Vec<_> = t.may("openings").tables(&format!("{}, opening", t.name), "").iter().map(one).collect();
    let mut all: Vec<PanelOpening> = all.into_iter().collect::<Option<_>>()?;
    all.sort_by(|a, b| a.at.base().total_cmp(&b.at.base()));
    Some(all)
}

/// Those of the panel before the removal: it is the left part of the panel after it or the right one, by where the
/// wall met it.
pub fn before(after: &Span, before: &Span, wall_at: Option<Length>) -> Vec<PanelOpening> {
    let spare = after.length - before.length;
    let left = wall_at.is_none_or(|at| (at - before.length).abs() <= (at - spare).abs());
    let start = if left { Length::ZERO } else { spare };
    let inside = |o: &&PanelOpening| o.at >= start && o.at + o.width <= start + before.length;
    let moved = |o: &PanelOpening| PanelOpening { at: o.at - start, ..o.clone() };
    after.openings.iter().filter(inside).map(moved).collect()
}

/// Whether the openings lie in the panel, apart from each other and from its ends, without slivers.
pub fn fit(t: &Table<'_>, all: &[PanelOpening], length: Length, height: Length) {
    let place = || if t.has("openings") { t.place("openings") } else { t.head() };
    let fault = |what: String, allowed: String, help: &str| {
        t.fault(Kind::Contradiction, what).at(place(), "openings").allowed(allowed).help(help);
    };
    let mm = |l: Length| format!("{:.0} mm", l.base());
    let mut reached = Length::ZERO;
    for (i, o) in all.iter().enumerate() {
        let n = i + 1;
        let (end, top) = (o.at + o.width, o.sill + o.height);
        if end > length || top > height {
            fault(
                format!("opening {n} lies outside the panel"),
                format!("openings inside {} by {}", mm(length), mm(height)),
                "correct the opening or the panel",
            );
            return;
        }
        if o.at < reached {
            fault(
                format!("opening {n} overlaps the one to its left"),
                "openings apart from each other".to_owned(),
                "correct one of the two, or write them as one",
            );
            return;
        }
        let next = all.get(i + 1).map_or(length, |next| next.at);
        let slivers = [
            ("to the left of", o.at - reached, false),
            ("to the right of", next - end, false),
            ("under", o.sill, true),
            ("over", height - top, true),
        ];
        for (side, width, may_be_none) in slivers {
            let none = width.base() <= 0.0;
            if width.base() < SLIVER && !(none && may_be_none) && width.base() >= 0.0 {
                fault(
                    format!("the masonry {side} opening {n} is {} wide", mm(width)),
                    format!("at least {SLIVER} mm, or none over or under it"),
                    "narrower pieces are not counted on: give openings as one, or the panel up to the opening \
                     with a free edge there",
                );
                return;
            }
        }
        if let Some(bearing) = o.bearing.filter(|b| *b > min(o.at - reached, next - end)) {
            fault(
                format!(
                    "the lintel of opening {n} bears {} at either end, more than the masonry there",
                    mm(bearing)
                ),
                format!("at most {}", mm(min(o.at - reached, next - end))),
                "correct the bearing, or write openings under one lintel as one",
            );
            return;
        }
        reached = end;
    }
}
