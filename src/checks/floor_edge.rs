//! The edge of a floor along the top of a panel: the wind that draws the wall off it, and its straps.

use super::panels::bracket::reactions;
use super::panels::{PanelModel, strength};
use super::{Job, Section, links, panel_sheet};
use crate::building::{FloorEdge, Joists, StrapsKnown};
use crate::quantity::functions::{KN, MPA, max};
use crate::quantity::print::show;
use crate::quantity::{Length, LineLoad, Num, Stress};
use crate::standards::annex::Annex;
use crate::standards::tables::approved_document_a as ada;
use crate::standards::tables::gamma_m;
use crate::trace::{Sheet, Unshown};
use crate::{calc, decide, given, lookup, verify};

/// As many edges as stand side by side.
const ABREAST: usize = 3;
/// Where the rules on straps stand.
const RULE: &str = "Approved Document A, 2013, 2C";

/// One section for all floor edges, where there are any.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let b = job.building;
    let mut s = Sheet::recorder();
    let mut edges: Vec<(&FloorEdge, PanelModel)> = Vec::new();
    for e in &b.floor_edges {
        let Some(panel) = b.panel(&e.panel) else { continue };
        match panel_sheet::model(job, panel) {
            Ok(m) => edges.push((e, hardest(job, e, m))),
            Err(outside) => s.leave(outside),
        }
    }
    if b.floor_edges.is_empty() {
        return Vec::new();
    }
    s.note(
        "Suction draws the wall outward, and straps hold its top to the floor; friction and built-in joists are not \
         counted. The wind is the greatest net pressure of the panels held, whichever way it acts.",
    );
    let tables = edges.len().div_ceil(ABREAST).max(1);
    for few in edges.chunks(edges.len().div_ceil(tables).max(1)) {
        let heads: Vec<String> = few.iter().map(|(e, _)| format!("{} at {}", e.mark, e.panel)).collect();
        s.columns(&heads, |s, i| {
            let (e, m) = &few[i];
            s.of = if edges.len() > 1 { e.mark.clone() } else { String::new() };
            check(s, e, m, &job.annex);
        });
    }
    s.of.clear();
    for (e, _) in &edges {
        by_rule(&mut s, e);
        if e.known == StrapsKnown::None {
            s.unshown(Unshown {
                id: format!("none-{}", e.mark),
                clause: "statics".to_owned(),
                words: if b.floor_edges.len() > 1 {
                    format!("straps, {}", e.mark)
                } else {
                    "straps".to_owned()
                },
                finding: "None is known to hold the wall to the floor.".to_owned(),
                ratio: None,
                hold: job.hold_of(&links::edge_text(b, e)),
            });
        }
    }
    s.note(
        "What a strap takes hold of in the floor, and how it is fixed there, is by rule and by seeing; it is not \
         calculated. The ties of a cavity wall bring the wind on the outer leaf to the strapped one: see the panel.",
    );
    let marks: Vec<&str> = b.floor_edges.iter().map(|e| e.mark.as_str()).collect();
    let section = Section::plain("floor-edges", "The floor edge and its straps", s);
    vec![Section { mark: marks.join(", "), ..section }]
}

/// The model of the edge's own panel under the greatest pressure of the panels that the edge holds.
fn hardest(job: &Job<'_>, e: &FloorEdge, mut m: PanelModel) -> PanelModel {
    let held = links::concerned(job.building, e);
    for panel in job.building.panels.iter().filter(|p| held.contains(&p.mark)) {
        if let Ok(other) = panel_sheet::model(job, panel)
            && other.q_net > m.q_net
        {
            m.q_net = other.q_net;
            m.q_source = format!("{}, {}", other.q_source, panel.mark);
        }
    }
    m
}

/// The force on one strap against what it takes, and the spacing that would do.
///
/// Statics; EN 1990 eq. 6.10; UK NA to BS EN 1996-1-1, Table NA.1, for the material factor. Verdict id:
/// `strap`. Where no strap is known nothing is verified: a hold point stands in its place.
pub fn check(s: &mut Sheet, e: &FloorEdge, m: &PanelModel, annex: &Annex) {
    given!(s, "net pressure on the panel, characteristic", &m.q_source, q_net = m.q_net);
    given!(s, "factor on wind", "EN 1990 NA.A1.2", gamma_W = Num::new(annex.gamma_Q));
    given!(s, "wind face that the floor collects", "job file", h_s = e.strip_height);
    let n_s = pull(s, m, annex, gamma_W, q_net, h_s);
    let leaf = &m.leaves[m.loaded()];
    given!(s, "factor on dead load that helps", "basis of this job", gamma_h = Num::new(m.helping));
    let G_a = strength::helps(s, leaf, annex, gamma_h);
    given!(s, "thickness of the loaded leaf", "job file", t = leaf.t);
    calc!(s, "EN 1990 6.4.3.2", "stress where straps hold", sigma_v = gamma_h * G_a / t);
    given!(
        s,
        "stress from which the lower factor counts",
        "UK NA Table NA.1, note; from memory (L)",
        sigma_min = MPA * gamma_m::STRAP_STRESS
    );
    let pressed = decide!(
        s,
        "UK NA Table NA.1",
        "pressed enough for the lower factor",
        "little stress: the higher factor",
        sigma_v >= sigma_min
    );
    let factor = gamma_m::strap(if pressed { gamma_m::STRAP_STRESS } else { 0.0 });
    lookup!(s, "UK NA Table NA.1", "material factor, straps", gamma_Ms = factor, Num::new(1.0));
    match &e.strap {
        Some(strap) => {
            let source = format!("stated: {}", strap.strength.reason);
            given!(s, "declared strength of a strap", &source, F_sk = strap.strength.value);
            given!(s, "spacing of the straps", "job file", s_s = strap.spacing);
            calc!(s, "statics", "force on one strap", F_s = n_s * s_s);
            calc!(s, "2.4.1", "design strength of a strap", F_Rd = F_sk / gamma_Ms);
            verify!(s, "strap", "2.4.1", "force on one strap", F_s <= F_Rd);
            calc!(s, "statics", "spacing that would do", s_max = F_Rd / n_s);
            let _ = s_max;
        }
        None => {
            given!(
                s,
                "declared strength, strap of the rule",
                "Approved Document A, 2C (H); none is known here",
                F_sk = KN * ada::STRAP_STRENGTH_KN
            );
            calc!(s, "2.4.1", "design strength of a strap", F_Rd = F_sk / gamma_Ms);
            calc!(s, "statics", "spacing that would do", s_max = F_Rd / n_s);
            let _ = s_max;
        }
    }
}

/// What the floor edge gets: the wind on its strip, and no less than what the panel's limit analysis brings to its top
/// with the rest of the strip. The arguments stand on the sheet.
fn pull(s: &mut Sheet, m: &PanelModel, annex: &Annex, gamma_W: Num, q_net: Stress, h_s: Length) -> LineLoad {
    let top = reactions::of(m, annex).and_then(|all| all.into_iter().find(|r| r.edge == "top"));
    let Some(top) = top else {
        calc!(s, "EN 1990 eq. 6.10", "pull on the floor edge", n_s = gamma_W * q_net * h_s);
        return n_s;
    };
    let source = format!("limit analysis, sheet {}", m.mark);
    given!(
        s,
        "top of the panel with its openings, largest stretch, design",
        &source,
        n_top = LineLoad::new(top.most)
    );
    given!(s, "clear height of the panel", "job file", h = m.h);
    given!(s, "least", "no wind face", h_0 = Length::ZERO);
    calc!(s, "statics", "rest of the strip, beyond half the panel", h_rest = max(h_s - h / 2.0, h_0));
    calc!(
        s,
        "EN 1990 eq. 6.10",
        "pull on the floor edge",
        n_s = max(gamma_W * q_net * h_s, n_top + gamma_W * q_net * h_rest)
    );
    n_s
}

/// The rule on straps beside the calculation, never instead of it.
fn by_rule(s: &mut Sheet, e: &FloorEdge) {
    let mm = |x: Length| show("l", x.dynamic()).to_string();
    let [wide, thick] = ada::STRAP_SECTION;
    let most = Length::new(ada::STRAP_SPACING_M * 1e3);
    let (finding, met) = match (&e.strap, e.known) {
        (Some(strap), known) => {
            let word = if known == StrapsKnown::Seen { "seen" } else { "to be fitted" };
            (format!("{word} at {} against {}", mm(strap.spacing), mm(most)), strap.spacing <= most)
        }
        (None, _) => (format!("none is known, against {}", mm(most)), false),
    };
    s.rule(
        &format!("straps-{}", e.mark),
        RULE,
        &format!("{}: straps of {wide} x {thick} mm along the wall", e.mark),
        finding,
        met,
    );
    let words = match e.joists {
        Joists::Along => format!(
            "{}: the joists run along the wall, so a strap crosses at least {} of them, with packing between \
             ({RULE}).",
            e.mark,
            ada::STRAP_JOISTS
        ),
        Joists::Into => format!(
            "{}: the joists run into the wall. The rule spares straps in houses of up to two storeys where joists at \
             1.2 m or closer bear 90 mm on the wall, or 75 mm on a plate ({RULE}, from memory, check against the \
             document (M)); what such a bearing holds is not calculated.",
            e.mark
        ),
    };
    s.note(words);
    if !e.words.is_empty() {
        s.note(format!("{}: {}: {}.", e.mark, e.known.word(), e.words.trim_end_matches('.')));
    }
}
