//! Outer walls that lose a support.

use super::storey::{Floor, Line, Support};
use super::{FoundPanel, FoundReturn, FoundSpan, REACH};
use crate::building::{Along, PanelOpening, PlanOpening};
use crate::quantity::Length;

/// Panels of the outer walls that the line of the wall that comes out meets.
pub fn of(floor: &Floor<'_>, returns: &[FoundReturn]) -> Vec<FoundPanel> {
    let gone = floor.gone();
    let mut met: Vec<(&Line<'_>, Option<&FoundReturn>)> = Vec::new();
    for r in returns {
        if let Some(line) = floor.lines.iter().find(|l| l.wall.mark == r.meets) {
            met.push((line, Some(r)));
        }
    }
    // Where nothing of it stays at an end, it met the wall itself.
    for end in [gone.from, gone.to] {
        if let Some(line) = floor.meets(gone.along, gone.at, end)
            && !met.iter().any(|(l, _)| l.wall.mark == line.wall.mark)
        {
            met.push((line, None));
        }
    }
    met.into_iter().flat_map(|(line, stays)| on(floor, line, stays)).collect()
}

/// The panels on either side of the wall that comes out; one over both where nothing that holds it stays.
fn on(floor: &Floor<'_>, line: &Line<'_>, stays: Option<&FoundReturn>) -> Vec<FoundPanel> {
    let gone = floor.gone();
    let s = gone.at;
    let Some(outside) = floor.outside(line, s) else { return Vec::new() };
    let row = floor.row(line);
    let supports = floor.supports(line);
    let end = |at: f64| Support { at, half: 0.0, mark: String::new() };
    let low = supports.iter().rev().find(|x| x.at < s).cloned().unwrap_or_else(|| end(row.from));
    let high = supports.iter().find(|x| x.at > s).cloned().unwrap_or_else(|| end(row.to));
    let at_gone = |mark: &str| Support { at: s, half: 0.0, mark: mark.to_owned() };
    let before = at_gone(&gone.wall.mark);
    let doors = floor.doors(line);
    let span = |a: &Support, z: &Support| FoundSpan {
        range: (Length::new(a.at), Length::new(z.at)),
        held: in_view(line.along, outside, [a, z]).map(|x| (!x.mark.is_empty()).then(|| x.mark.clone())),
        openings: within(&doors, (a.at, z.at), rightwards(line.along, outside)),
    };
    let wall_at = |a: f64, z: f64| {
        let left = in_view(line.along, outside, [a, z])[0];
        Length::new((s - left).abs())
    };
    let one = |before: FoundSpan, a: &Support, z: &Support| FoundPanel {
        on: line.wall.mark.clone(),
        before,
        after: span(a, z),
        wall_at: wall_at(a.at, z.at),
    };
    let sides = [(&low, &before), (&before, &high)];
    match stays.filter(|r| r.holds) {
        Some(r) => {
            let now = at_gone(&r.mark);
            let pairs = sides.into_iter().zip([(&low, &now), (&now, &high)]);
            let real = pairs.filter(|((a, z), _)| z.at - a.at > REACH);
            real.map(|((a, z), (c, e))| one(span(a, z), c, e)).collect()
        }
        None => {
            // Before, the longer of the two spans.
            let (a, z) = if s - low.at >= high.at - s { sides[0] } else { sides[1] };
            vec![one(span(a, z), &low, &high)]
        }
    }
}

/// Two things at the lesser and the greater end of a line, as left and right seen from outside.
fn in_view<T>(along: Along, outside: f64, [low, high]: [T; 2]) -> [T; 2] {
    if rightwards(along, outside) { [low, high] } else { [high, low] }
}

/// Whether greater x or y lies to the right, seen from outside. Looking towards greater y, greater x is to the right;
/// looking towards greater x, greater y is to the left.
fn rightwards(along: Along, outside: f64) -> bool {
    match along {
        Along::X => outside < 0.0,
        Along::Y => outside > 0.0,
    }
}

/// The openings that reach into a stretch, from its left end seen from outside; what lies beyond its ends is cut off.
fn within(doors: &[(f64, f64, &PlanOpening)], (a, z): (f64, f64), rightwards: bool) -> Vec<PanelOpening> {
    let one = |&(from, to, o): &(f64, f64, &PlanOpening)| {
        let (from, to) = (from.max(a), to.min(z));
        (to > from).then(|| PanelOpening {
            at: Length::new(if rightwards { from - a } else { z - to }),
            width: Length::new(to - from),
            sill: o.sill,
            height: o.height,
            frame: o.frame,
            bearing: o.bearing,
        })
    };
    let mut out: Vec<PanelOpening> = doors.iter().filter_map(one).collect();
    out.sort_by(|p, q| p.at.base().total_cmp(&q.at.base()));
    out
}
