//! Between what a pier carries the wind sideways: walls that meet it hold it, openings leave it free.

use super::across;
use super::around::Lines;
use super::model::{PierModel, Wind};
use super::work;
use crate::building::{BuildUp, Edge as Held, PanelRoute, Sharing, Span, State};
use crate::checks::panels::bracket::Effort;
use crate::checks::panels::{PanelLeaf, PanelModel};
use crate::quantity::{Length, LineLoad, Moment, Stress};
use crate::solve::descent::Place;
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::standards::masonry::Edge;
use crate::standards::tables::annex_e::Edges;
use crate::trace::Sheet;

/// How far lines on the plan may miss each other, mm.
const REACH: f64 = 150.0;

/// A stretch of a pier between walls that meet it, openings and ends.
#[derive(Clone, Copy, Debug)]
pub struct Bay {
    /// Length.
    pub l: Length,
    /// Length of wind face: half of an opening that it ends at added.
    pub l_w: Length,
    /// Floor and ceiling hold it simply, walls that meet it too; an opening or a bare end is free.
    pub edges: Edges,
}

/// The bays of pier `n` of wall `i`. A wall that meets it holds it where it is a fifth of the height long
/// there, 5.5.1.2(5).
pub fn of(state: &State, lines: &Lines, i: usize, n: usize, h: Length) -> Vec<Bay> {
    let (wall, pier) = (&state.model.walls[i], &state.down.walls[i].piers[n]);
    let near = REACH + wall.thickness / 2.0;
    let stretch = Place { from: pier.from, to: pier.to, ..wall.place };
    let mut stops: Vec<f64> = Vec::new();
    for (other, on) in
        lines.near(stretch, near).into_iter().map(|k| (&state.model.walls[k], &state.down.walls[k]))
    {
        if other.storey != wall.storey || other.place.along == wall.place.along {
            continue;
        }
        let meets = on.piers.iter().any(|q| {
            let long = q.to - q.from >= h.base() / 5.0;
            long && q.from - near <= wall.place.at && wall.place.at <= q.to + near
        });
        let at = other.place.at;
        if meets && pier.from - near <= at && at <= pier.to + near {
            stops.push(at.clamp(pier.from, pier.to));
        }
    }
    // What meets it within reach of an end holds that end.
    let at_end = |end: f64| stops.iter().any(|s| (s - end).abs() <= near);
    let (first, last) = (at_end(pier.from), at_end(pier.to));
    let mut cuts: Vec<(f64, bool)> = stops
        .iter()
        .filter(|s| (**s - pier.from).abs() > near && (**s - pier.to).abs() > near)
        .map(|s| (*s, true))
        .chain([(pier.from, first), (pier.to, last)])
        .collect();
    cuts.sort_by(|a, b| a.0.total_cmp(&b.0));
    let width = |k: usize| wall.openings.get(k).map_or(0.0, |o| o.to - o.from);
    let openings = (n.checked_sub(1).map_or(0.0, width), width(n));
    let edge = |held: bool| if held { Edge::Simple } else { Edge::Free };
    cuts.windows(2)
        .filter(|c| c[1].0 > c[0].0)
        .map(|c| {
            let half = |ends_here: bool, opening: f64| if ends_here { opening / 2.0 } else { 0.0 };
            let l = c[1].0 - c[0].0;
            let face = l + half(c[0].0 == pier.from, openings.0) + half(c[1].0 == pier.to, openings.1);
            Bay {
                l: Length::new(l),
                l_w: Length::new(face),
                edges: Edges::new(Edge::Simple, Edge::Simple, edge(c[0].1), edge(c[1].1)),
            }
        })
        .collect()
}

/// Wind on the bay in which it bends the loaded leaf most.
pub fn worst(
    p: &PierModel,
    bays: Vec<Bay>,
    q_panel: Stress,
    build_up: &BuildUp,
    annex: &Annex,
) -> Option<Wind> {
    let panel = panel(p, build_up, q_panel);
    let wind = |bay: Bay| Wind { q_panel, bay, panel: panel.clone() };
    let mut out: Option<(Moment, Bay)> = None;
    let ready = work::prepare(&mut Sheet::silent(), p, annex).ok();
    for bay in bays {
        let blown = PierModel { wind: Some(wind(bay)), ..p.clone() };
        let M = ready.map_or(Moment::ZERO, |r| {
            across::wind(&mut Sheet::silent(), &blown, annex, r, Combination::Helping)
                .map_or(Moment::ZERO, |x| x.M_l)
        });
        if out.is_none_or(|(most, _)| M > most) {
            out = Some((M, bay));
        }
    }
    out.map(|(_, bay)| wind(bay))
}

/// The leaves as the checks of a panel want them.
fn panel(p: &PierModel, build_up: &BuildUp, q_net: Stress) -> PanelModel {
    let leaf = |t, masonry: &crate::checks::masonry::Masonry, loaded| PanelLeaf {
        t,
        masonry: masonry.clone(),
        G_above: LineLoad::ZERO,
        U_above: LineLoad::ZERO,
        loaded,
    };
    let own = leaf(p.m.t, &p.m.masonry, true);
    let leaves = match &p.other {
        Some(o) if o.outer => vec![leaf(o.t, &o.masonry, false), own],
        Some(o) => vec![own, leaf(o.t, &o.masonry, false)],
        None => vec![own],
    };
    let held = Held { kind: Edge::Simple, stretch: None, dpc: false, reason: String::new() };
    let span = Span {
        length: p.m.l,
        ends: None,
        top: held.clone(),
        base: held.clone(),
        left: held.clone(),
        right: held,
        openings: Vec::new(),
    };
    PanelModel {
        mark: String::new(),
        h: p.m.h,
        leaves,
        q_net,
        q_source: String::new(),
        helping: p.m.helping,
        route: PanelRoute::Flexure,
        sharing: Sharing::Strength,
        ties: build_up.ties,
        tie_strength: None,
        arching: None,
        before: span.clone(),
        after: span,
        effort: Effort::default(),
        strengths_on: None,
    }
}
