//! What the drawings of a panel at collapse show: the weakest crack pattern before and after the removal.

use super::panel_views::face;
use super::panels::bracket::found::{leaves, worked};
use super::panels::bracket::sheet::of_wall;
use super::panels::bracket::{Bounds, Found};
use super::panels::{self, PanelModel};
use crate::building::{Panel, PanelRoute, Span};
use crate::quantity::Stress;
use crate::quantity::print::show;
use crate::sketch::{
    Action, Cell, Crack, CrackKind, Drawing, Frame, PanelCracks, PanelFace, cracks_pair, panel_cracks,
};
use crate::standards::annex::Annex;
use crate::trace::Sheet;

/// Before and after stand side by side at one scale, mm.
const FRAME: Frame = Frame::new(168.0, 76.0);

/// The pattern before and after, where limit analysis was worked for both; one alone where it was not.
pub fn drawings(p: &Panel, m: &PanelModel, annex: &Annex) -> Vec<Drawing> {
    let before = view(p, m, annex, &m.before, "before");
    let after = view(p, m, annex, &m.after, "after");
    let states = [&before, &after].map(|v| v.as_ref().map(|v| v.face.state.clone()));
    let mut all: Vec<Drawing> = match (before, after) {
        (Some(before), Some(after)) => cracks_pair(&before, &after, FRAME).into(),
        (before, after) => before.or(after).iter().map(|one| panel_cracks(one, FRAME)).collect(),
    };
    // A mark with the name of a leaf behind it is for reading, not for a name.
    for (drawing, state) in all.iter_mut().zip(states.into_iter().flatten()) {
        drawing.name = format!("{}-cracks-{state}", p.mark);
    }
    all
}

fn view(p: &Panel, m: &PanelModel, annex: &Annex, span: &Span, state: &str) -> Option<PanelCracks> {
    if !worked(m, span) {
        return None;
    }
    let all = leaves(m, annex, span)?;
    let i = strongest(&all)?;
    let picture = all.get(i)?.picture.as_ref()?;
    let pressure = |f: &Found| Stress::new(f.low.pressure());
    let bounds: Vec<Bounds> = all
        .iter()
        .map(|f| Bounds { low: pressure(f), high: f.high.as_ref().map(|h| Stress::new(h.pressure)) })
        .collect();
    // Leaves that share by stiffness have no bracket together: that of the leaf drawn stands there.
    let wall = of_wall(&mut Sheet::silent(), m, &bounds).or(bounds.get(i).copied())?;
    let written = |symbol: &str, w: Stress, words: &str| {
        Action::new(symbol, &show(symbol, w.dynamic()).to_string(), words)
    };
    let mut values = Vec::new();
    if let Some(high) = wall.high {
        values.push(written("w_U", high, "weakest"));
    }
    if let Some(hand) = panels::by_hand(m, annex, span) {
        let words = if m.route == PanelRoute::LimitAnalysis { "by hand" } else { "by hand (decides)" };
        values.push(written("w_Rd", hand, words));
    }
    let mark = if all.len() > 1 { format!("{}, {}", p.mark, m.leaf_name(i)) } else { p.mark.clone() };
    Some(PanelCracks {
        face: PanelFace { mark, ..face(p, span, state) },
        cracks: picture.cracks.iter().map(crack).collect(),
        deflection: picture.cells.iter().map(|c| Cell { x: c.x, y: c.y, share: c.share }).collect(),
        takes: written("w_S", wall.low, "takes"),
        wind: written("W_Ed", m.q_net * annex.gamma_Q, "wind"),
        values,
    })
}

/// The leaf that takes the most: its cracks are those that let the wall go.
fn strongest(all: &[Found]) -> Option<usize> {
    (0..all.len()).max_by(|&a, &b| all[a].low.field.total_cmp(&all[b].low.field))
}

fn crack(c: &crate::solve::plate::upper::Crack) -> Crack {
    let kind = match c.hinge {
        true => CrackKind::Hinge,
        false if c.rotation > 0.0 => CrackKind::Sagging,
        false => CrackKind::Hogging,
    };
    Crack { from: c.from, to: c.to, kind }
}
