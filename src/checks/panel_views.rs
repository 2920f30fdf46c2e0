//! What the drawings of a panel show.

use super::links;
use super::panels::PanelModel;
use super::shapes::layers;
use crate::building::{BuildUp, Building, Edge, FloorKind, Panel, PanelOpening, Span, StrapsKnown};
use crate::quantity::{Length, LineLoad, print};
use crate::sketch::{
    self, Action, Drawing, Floor, Frame, PanelElevation, PanelFace, PanelSection, Support, WallBehind, Wind,
    panel_pair, panel_section,
};
use crate::standards::masonry::Edge as Kind;

/// Frames on the sheet, mm: before and after stand side by side at one scale.
const ELEVATION: Frame = Frame::new(168.0, 80.0);
const SECTION: Frame = Frame::new(96.0, 84.0);
/// Depth at which floors are drawn, mm; the job file does not give it. For the picture only.
const FLOOR_DEPTH: f64 = 220.0;

/// Elevation before and after, and the section.
pub fn drawings(b: &Building, p: &Panel, m: &PanelModel, wind: Wind) -> Vec<Drawing> {
    let Some(build_up) = b.build_up(&p.build_up) else { return Vec::new() };
    let thickness = b.build_up(&b.removed.build_up).map_or(100.0, |u| u.loaded().1.thickness.base());
    let wall = |words: String, removed: bool| {
        p.wall_at.map(|x| WallBehind { x: x.base(), thickness, words, removed })
    };
    let stays: Vec<&str> = b
        .returns
        .iter()
        .filter(|r| p.on.as_deref() == Some(&r.junction.to))
        .map(|r| r.mark.as_str())
        .collect();
    // The drawing adds that it is removed.
    let now = if stays.is_empty() { "wall".to_owned() } else { format!("wall beyond {}", stays.join(", ")) };
    let before = elevation(p, &p.before, "before", m, wall("wall".to_owned(), false));
    let after = elevation(p, &p.after, "after", m, wall(now, true));
    let [mut first, mut second] = panel_pair(&before, &after, ELEVATION);
    first.name = format!("{}-before", p.mark);
    second.name = format!("{}-after", p.mark);
    let mut third = panel_section(&section(b, p, m, build_up, wind), SECTION);
    third.name = format!("{}-section", p.mark);
    vec![first, second, third]
}

fn opening(o: &PanelOpening) -> sketch::Opening {
    let words = if o.sill == Length::ZERO { "door" } else { "window" };
    sketch::Opening {
        x: o.at.base(),
        y: o.sill.base(),
        width: o.width.base(),
        height: o.height.base(),
        words: words.to_owned(),
        bearing: o.bearing.map(Length::base),
    }
}

fn edge(e: &Edge) -> sketch::Edge {
    let support = match e.kind {
        Kind::Free => Support::Free,
        Kind::Simple => Support::Simple,
        Kind::Continuous => Support::Continuous,
    };
    // The reason stands in the table of the sheet; the drawing has the key.
    sketch::Edge { support, why: String::new(), held: e.stretch.map(|(a, z)| (a.base(), z.base())) }
}

/// A state of the panel as both drawings of it show it.
pub(super) fn face(p: &Panel, span: &Span, state: &str) -> PanelFace {
    PanelFace {
        mark: p.mark.clone(),
        state: state.to_owned(),
        length: span.length.base(),
        height: p.height.base(),
        left: edge(&span.left),
        right: edge(&span.right),
        top: edge(&span.top),
        base: edge(&span.base),
        openings: span.openings.iter().map(opening).collect(),
    }
}

fn elevation(
    p: &Panel,
    span: &Span,
    state: &str,
    m: &PanelModel,
    wall: Option<WallBehind>,
) -> PanelElevation {
    let inside = wall.filter(|w| w.x >= 0.0 && w.x <= span.length.base());
    PanelElevation {
        face: face(p, span, state),
        walls: inside.into_iter().collect(),
        values: vec![Action::new("q_net", &print::show("q_net", m.q_net.dynamic()).to_string(), "")],
    }
}

fn section(b: &Building, p: &Panel, m: &PanelModel, build_up: &BuildUp, wind: Wind) -> PanelSection {
    let all = layers(b, build_up);
    let (k, _) = build_up.loaded();
    let loaded = if all.len() == 3 { 2 * k } else { 0 };
    let above = b.storey(&p.storey).map_or(FloorKind::Timber, |s| s.floor_above);
    let words = match above {
        FloorKind::Timber => "timber floor",
        FloorKind::Concrete => "concrete floor",
        FloorKind::Roof => "roof",
    };
    let words = match (above, b.storeys.last().is_some_and(|s| s.mark == p.storey)) {
        (FloorKind::Concrete, true) => "roof slab",
        (FloorKind::Timber, true) => "roof",
        _ => words,
    };
    let edge = b.floor_edges.iter().find(|e| links::concerned(b, e).contains(&p.mark));
    let held = |e: &Edge| match (e.kind, edge.map(|e| e.known)) {
        (Kind::Free, _) => "not held",
        (_, Some(StrapsKnown::None)) => "no strap known",
        (_, Some(StrapsKnown::ToBeFitted)) => "straps to be fitted",
        (_, Some(StrapsKnown::Seen)) => "strapped",
        (_, None) => "held",
    };
    PanelSection {
        mark: p.mark.clone(),
        height: p.height.base(),
        layers: all,
        floors: vec![Floor {
            level: p.height.base() + FLOOR_DEPTH,
            depth: FLOOR_DEPTH,
            concrete: above == FloorKind::Concrete,
            words: format!("{words}, {}", held(&p.after.top)),
        }],
        dpc: Some(0.0),
        // Spacing of ties on a square grid, from their number per area.
        ties: build_up.ties.map(|n| {
            ((1.0 / n.base()).sqrt(), format!("{} ties per m²", print::significant(n.base() * 1e6)))
        }),
        wind: Some((wind, Action::new("q_net", &print::show("q_net", m.q_net.dynamic()).to_string(), ""))),
        precompression: (p.dead_above > LineLoad::ZERO)
            .then(|| (loaded, Action::new("g_k", &print::show("g", p.dead_above.dynamic()).to_string(), ""))),
    }
}
