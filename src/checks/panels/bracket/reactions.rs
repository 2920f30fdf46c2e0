//! What the wind on a panel brings to its edges, by the moment field of the safe side.

use super::found::{Effort, Found, leaves, worked};
use crate::building::{Edge, Span};
use crate::checks::panels::form::State;
use crate::checks::panels::model::PanelModel;
use crate::quantity::print::show;
use crate::quantity::{Force, LineLoad, Stress};
use crate::standards::annex::Annex;
use crate::standards::masonry::Edge as Kind;
use crate::trace::{Column, Sheet, Table};

/// One stretch of an edge: from where to where it is held, mm, and what it gets per length of wall, N/mm.
#[derive(Clone, Debug, PartialEq)]
pub struct Reaction {
    /// Left, right, base or top.
    pub edge: &'static str,
    /// Length over all its stretches that gets something, mm.
    pub length: f64,
    /// The greatest of its stretches, averaged over that stretch, N/mm.
    pub most: f64,
    /// In all, N.
    pub total: f64,
}

/// What comes to the edges of a panel after the removal, where limit analysis was worked beside its own check or for
/// it; the other sheets that carry it on ask for it here.
pub fn of(m: &PanelModel, annex: &Annex) -> Option<Vec<Reaction>> {
    if m.effort == Effort::Search || !worked(m, &m.after) {
        return None;
    }
    let all = leaves(m, annex, &m.after)?;
    Some(at_design(&m.after, m.h.base(), m.q_net * annex.gamma_Q, &all))
}

const NAMES: [&str; 4] = ["left", "right", "base", "top"];

/// What comes to each edge under the pressure `W_Ed`, both leaves together: the leaves share in proportion to their
/// safe side, and their moment fields shrink with the pressure.
pub fn at_design(span: &Span, h: f64, W_Ed: Stress, all: &[Found]) -> Vec<Reaction> {
    let sum: f64 = all.iter().map(|f| f.low.field).sum();
    if sum <= 0.0 {
        return Vec::new();
    }
    let part = W_Ed.base() / sum;
    let lengths = [h, h, span.length.base(), span.length.base()];
    let edges = [&span.left, &span.right, &span.base, &span.top];
    let one = |e: usize| -> Option<Reaction> {
        let first = all.first()?;
        let many = first.low.reactions[e].len();
        let per_length = |i: usize| part * all.iter().filter_map(|f| f.low.reactions[e].get(i)).sum::<f64>();
        let stretches = first.low.lengths[e].iter().copied();
        let (mut most, mut total, mut length) = (0.0_f64, 0.0, 0.0);
        for (i, l) in (0..many).zip(stretches) {
            let w = per_length(i);
            if w != 0.0 {
                most = if w.abs() > most.abs() { w } else { most };
                total += w * l;
                length += l;
            }
        }
        (held(edges[e]) && length > 0.0).then_some(Reaction {
            edge: NAMES[e],
            length: length.min(lengths[e]),
            most,
            total,
        })
    };
    (0..4).filter_map(one).collect()
}

fn held(edge: &Edge) -> bool {
    edge.kind != Kind::Free
}

/// The table, with the wind on the whole panel to compare the sum with.
pub fn table(s: &mut Sheet, state: State<'_>, span: &Span, all: &[Found]) {
    if state.phase == "before" {
        return;
    }
    let (h, W_Ed) = (state.m.h.base(), state.W_Ed);
    s.table(|| {
        let reactions = at_design(span, h, W_Ed, all);
        let line = |x: f64| show("w_Ed", LineLoad::new(x).dynamic()).value;
        let force = |x: f64| show("V_Ed", Force::new(x).dynamic()).value;
        let mut rows: Vec<Vec<String>> = reactions
            .iter()
            .map(|r| vec![r.edge.to_owned(), line(r.total / r.length), line(r.most), force(r.total)])
            .collect();
        let sum: f64 = reactions.iter().map(|r| r.total).sum();
        rows.push(vec!["all edges".to_owned(), String::new(), String::new(), force(sum)]);
        let whole = W_Ed.base() * span.length.base() * h;
        rows.push(vec![
            "wind on the panel and its openings".to_owned(),
            String::new(),
            String::new(),
            force(whole),
        ]);
        let strong = Vec::new();
        Table {
            caption: "What the design wind brings to the edges, by the moment field of the safe side"
                .to_owned(),
            columns: vec![
                Column::words("edge"),
                Column::numbers("mean, kN/m"),
                Column::numbers("largest stretch, kN/m"),
                Column::numbers("in all, kN"),
            ],
            rows,
            strong,
        }
    });
}
