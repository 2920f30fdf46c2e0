//! What the drawing of a footing shows, from its worst case.

use super::combination::Case;
use super::pressure::{self, Pressed, Shape};
use super::sheet::worst;
use super::stands::Stands;
use crate::building::{Proof, Return};
use crate::quantity::{Stress, print};
use crate::sketch::{Action, Drawing, FootingSketch, Frame, Pressure, footing_sketch};

const FRAME: Frame = Frame::new(120.0, 82.0);

/// The drawing; none where nothing was worked out.
pub fn drawing(ret: &Return, st: &Stands<'_>, all: &[(Case, Pressed)]) -> Option<Drawing> {
    let (case, x) = worst(all).map(|i| all[i])?;
    let f = st.footing;
    let pressure =
        |p: Stress, words: &str| Action::new("", &print::show("p", p.dynamic()).to_string(), words);
    let length = pressure::length(st).base();
    let at = x.at.base();
    let free = at >= 0.0;
    let after = match x.shape {
        Shape::Nothing => None,
        Shape::Trapezium(least) => Some(Pressure {
            pressed: length,
            free,
            at_edge: pressure(x.p_max, ""),
            rest: (least / x.p_max).base(),
            at_rest: Some(pressure(least, "")),
        }),
        Shape::Triangle(part) => Some(Pressure {
            pressed: part.base().round(),
            free,
            at_edge: pressure(x.p_max, ""),
            rest: 0.0,
            at_rest: None,
        }),
    };
    let before = x.p_0.filter(|_| after.is_some()).map(|p| ((p / x.p_max).base(), pressure(p, "before")));
    let word = if f.proof == Proof::Assumed { "assumed" } else { "seen" };
    let view = FootingSketch {
        mark: f.mark.clone(),
        of: ret.mark.clone(),
        length: st.whole.l.base(),
        beyond_junction: f.beyond_junction.value.base(),
        beyond_free_end: f.beyond_free_end.value.base(),
        thickness: f.thickness.base(),
        words: format!("{} mm wide, {word}", print::show("L", f.width.dynamic()).value),
        // As many digits as the sheet prints.
        resultant: if at.abs() < 10.0 { (at * 10.0).round() / 10.0 } else { at.round() },
        force: Action::new("N_F", &print::show("N_F", x.N_F.dynamic()).to_string(), ""),
        after,
        before,
        case: case.name(st),
    };
    Some(footing_sketch(&view, FRAME))
}
