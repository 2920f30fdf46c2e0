//! What would make a panel pass: by search on the same check, on a silent sheet.

use super::bracket::Effort;
use super::model::PanelModel;
use super::run::check;
use crate::building::PanelRoute;
use crate::quantity::print::show;
use crate::quantity::{Length, LineLoad, Stress};
use crate::solve::root::{greatest, least};
use crate::standards::annex::Annex;
use crate::standards::tables::annex_e::Edge;
use crate::trace::{Sheet, Value};

/// Lengths are given in steps of 10 mm, loads with the three digits that are printed; always rounded to the
/// side that passes.
const LENGTH_STEP: f64 = 10.0;

/// Wall that stays beside an opening as it is widened, mm: narrower masonry is not counted on.
const NARROWEST: f64 = 100.0;

fn digits_step(x: f64) -> f64 {
    if x > 0.0 { 10f64.powf(x.log10().floor() - 2.0) } else { 1.0 }
}

fn down(x: f64, step: f64) -> f64 {
    (x / step).floor() * step
}

/// One way to pass, or the finding that there is none that way.
#[derive(Clone, Debug, PartialEq)]
pub struct Remedy {
    /// Which: `wind`, `length`, `dead-load`, `edge`.
    pub id: &'static str,
    /// The value at which it passes, where there is one.
    pub value: Option<Value>,
    /// One sentence for the sheet.
    pub sentence: String,
}

/// Whether the panel passes: every verdict after the removal holds and no limit is left.
pub fn passes(m: &PanelModel, annex: &Annex) -> bool {
    let mut s = Sheet::silent();
    check(&mut s, &PanelModel { effort: Effort::Search, ..m.clone() }, annex);
    s.holds()
}

/// Greatest net pressure, characteristic, at which the panel passes, up to 20 kN/m²; `None` where it does
/// not pass without wind.
pub fn greatest_wind(m: &PanelModel, annex: &Annex) -> Option<Stress> {
    let at = |q: f64| passes(&PanelModel { q_net: Stress::new(q), ..m.clone() }, annex);
    greatest(at, 0.0, 20e-3, 1, 1e-9).map(|q| Stress::new(down(q, digits_step(q))))
}

/// Greatest length after the removal, up to the given one times four, at which the panel passes; `None`
/// where even a tenth of it does not.
pub fn greatest_length(m: &PanelModel, annex: &Annex) -> Option<Length> {
    let l = m.after.length.base();
    let at = |l: f64| {
        let mut shorter = m.clone();
        shorter.after.length = Length::new(l);
        passes(&shorter, annex)
    };
    let (steps, precision) = if m.route == PanelRoute::LimitAnalysis { (39, 20.0) } else { (195, 0.5) };
    greatest(at, l / 10.0, l * 4.0, steps, precision).map(|l| Length::new(down(l, LENGTH_STEP)))
}

/// How finely a length is searched from its own value up: steps, and mm. A limit analysis is worked at each.
fn fineness(m: &PanelModel) -> (u32, f64) {
    if m.route == PanelRoute::LimitAnalysis { (10, 50.0) } else { (40, 2.0) }
}

/// Greatest length of a panel that passes, from its own to twice that.
pub fn longest(m: &PanelModel, annex: &Annex) -> Option<Length> {
    let l = m.after.length.base();
    let at = |l: f64| {
        let mut longer = m.clone();
        longer.after.length = Length::new(l);
        passes(&longer, annex)
    };
    let (steps, precision) = fineness(m);
    greatest(at, l, 2.0 * l, steps, precision).map(|l| Length::new(down(l, LENGTH_STEP)))
}

/// Greatest width of opening `i` of a panel that passes, widened evenly to both sides, and the width at which only
/// 100 mm of wall are left beside it.
pub fn widest(m: &PanelModel, annex: &Annex, i: usize) -> Option<(Length, Length)> {
    let all = &m.after.openings;
    let o = all.get(i)?;
    let (from, to) = (o.at.base(), (o.at + o.width).base());
    let left = i.checked_sub(1).map_or(0.0, |j| (all[j].at + all[j].width).base());
    let right = all.get(i + 1).map_or(m.after.length.base(), |next| next.at.base());
    let spare = (from - left).min(right - to) - NARROWEST;
    let width = to - from;
    let at = |w: f64| {
        let mut wider = m.clone();
        let o = &mut wider.after.openings[i];
        o.at = Length::new((from + to - w) / 2.0);
        o.width = Length::new(w);
        passes(&wider, annex)
    };
    let most = width + 2.0 * spare.max(0.0);
    let (steps, precision) = fineness(m);
    let w = greatest(at, width, most, steps, precision)?;
    Some((Length::new(down(w, LENGTH_STEP)), Length::new(down(most, LENGTH_STEP))))
}

/// How far a panel with openings that passes may move, as lines of a table: what, as it is, up to.
pub fn margins(m: &PanelModel, annex: &Annex) -> Vec<[String; 3]> {
    let mm = |l: Length| show("l", l.dynamic()).to_string();
    let mut out = Vec::new();
    if let Some(q) = greatest_wind(m, annex) {
        let pressure = |q: Stress| show("q_net", q.dynamic()).to_string();
        out.push(["net pressure, characteristic".to_owned(), pressure(m.q_net), pressure(q)]);
    }
    if let Some(l) = longest(m, annex) {
        let end = down(2.0 * m.after.length.base(), LENGTH_STEP);
        let to = if l.base() >= end { format!("{} and more", mm(l)) } else { mm(l) };
        out.push(["length, added at its right end".to_owned(), mm(m.after.length), to]);
    }
    for (i, o) in m.after.openings.iter().enumerate() {
        let Some((w, most)) = widest(m, annex, i) else { continue };
        let to = if w >= most { format!("{}, no wall left beside it", mm(w)) } else { mm(w) };
        out.push([format!("width of opening {}, about its middle", i + 1), mm(o.width), to]);
    }
    out
}

/// Least dead load per length on the loaded leaf at which the panel passes, up to 500 kN/m; `None` where
/// none does.
pub fn least_dead(m: &PanelModel, annex: &Annex) -> Option<LineLoad> {
    let i = m.loaded();
    let at = |g: f64| {
        let mut heavier = m.clone();
        heavier.leaves[i].G_above = LineLoad::new(g);
        passes(&heavier, annex)
    };
    let (steps, precision) = if m.route == PanelRoute::LimitAnalysis { (12, 2.0) } else { (100, 1e-3) };
    least(at, 0.0, 500.0, steps, precision)
        .map(|g| LineLoad::new((g / digits_step(g)).ceil() * digits_step(g)))
}

/// The dead load on the loaded leaf down to which a panel passes without a gap, from what it has; `None` where it does
/// not pass with that.
pub fn dead_down_to(m: &PanelModel, annex: &Annex) -> Option<LineLoad> {
    let i = m.loaded();
    let given = m.leaves[i].G_above.base();
    let at = |less: f64| {
        let mut lighter = m.clone();
        lighter.leaves[i].G_above = LineLoad::new(given - less);
        passes(&lighter, annex)
    };
    let (steps, part) = if m.route == PanelRoute::LimitAnalysis { (4, 20.0) } else { (40, 1000.0) };
    let left = given - greatest(at, 0.0, given, steps, given / part)?;
    // Rounded up: a little more load than the least that passes.
    let step = digits_step(left);
    Some(LineLoad::new(((left / step).ceil() * step).min(given)))
}

/// Simple edges that would do it if one of them alone were continuous, by name.
pub fn continuous_edges(m: &PanelModel, annex: &Annex) -> Vec<&'static str> {
    let names = ["top", "base", "left", "right"];
    (0..4)
        .filter(|&i| {
            let mut held = m.clone();
            let a = &mut held.after;
            let edge = [&mut a.top, &mut a.base, &mut a.left, &mut a.right].into_iter().nth(i);
            match edge {
                Some(edge) if edge.kind == Edge::Simple => {
                    edge.kind = Edge::Continuous;
                    passes(&held, annex)
                }
                _ => false,
            }
        })
        .map(|i| names[i])
        .collect()
}

/// What would make the panel pass, one change at a time.
pub fn remedies(m: &PanelModel, annex: &Annex) -> Vec<Remedy> {
    let value = |name: &str, v: crate::quantity::Dyn| Value { name: name.to_owned(), value: v };
    let shown = |v: &Value| show(&v.name, v.value).to_string();
    let mut out = Vec::new();

    let wind = greatest_wind(m, annex).map(|q| value("q_net", q.dynamic()));
    let sentence = match &wind {
        Some(q) => format!("As it stands the panel takes a net pressure of {}, characteristic.", shown(q)),
        None => "The panel does not pass even without wind.".to_owned(),
    };
    out.push(Remedy { id: "wind", value: wind, sentence });

    let length = greatest_length(m, annex).map(|l| value("l", l.dynamic()));
    let sentence = match &length {
        Some(l) if l.value.value < m.after.length.base() => format!(
            "It passes up to a length of {} between vertical supports: a return, pier or post no further apart.",
            shown(l)
        ),
        Some(_) => "Its length is not what makes it fail.".to_owned(),
        None => "No shorter length makes it pass.".to_owned(),
    };
    out.push(Remedy { id: "length", value: length, sentence });

    let dead = least_dead(m, annex).map(|g| value("g", g.dynamic()));
    let sentence = match &dead {
        Some(g) => {
            format!("It passes with a dead load of {} on the loaded leaf, if that load is there.", shown(g))
        }
        None => "No dead load makes it pass: it counts only up to a fifth of the design strength.".to_owned(),
    };
    out.push(Remedy { id: "dead-load", value: dead, sentence });

    let edges = continuous_edges(m, annex);
    let sentence = match edges.as_slice() {
        [] => "No single simple edge, made continuous, makes it pass.".to_owned(),
        [one] => format!("It passes with the {one} edge continuous, if that can be built and shown."),
        several => format!("It passes with one of these edges continuous: {}.", several.join(", ")),
    };
    out.push(Remedy { id: "edge", value: None, sentence });
    out
}
