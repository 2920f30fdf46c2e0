//! What the check of one panel needs.

use super::bracket::Effort;
use crate::building::{self, Arching, Building, Cause, Panel, PanelRoute, Sharing, Span};
use crate::checks::masonry::Masonry;
use crate::quantity::{Force, Length, LineLoad, PerArea, Stress};
use crate::standards::tables::annex_e::{Edge, Edges};

/// One leaf.
#[derive(Clone, Debug)]
pub struct PanelLeaf {
    /// Actual thickness, less any chase.
    pub t: Length,
    /// Strengths and material factors.
    pub masonry: Masonry,
    /// Dead load per length on top of this leaf, characteristic, nothing that may be absent.
    pub G_above: LineLoad,
    /// Roof uplift per length on top of this leaf, characteristic, where it is not off the dead load yet.
    pub U_above: LineLoad,
    /// Carries the floors; the other leaf has its own weight alone.
    pub loaded: bool,
}

/// A panel with both its states.
#[derive(Clone, Debug)]
pub struct PanelModel {
    /// Mark.
    pub mark: String,
    /// Clear height.
    pub h: Length,
    /// One leaf, or two, outer first.
    pub leaves: Vec<PanelLeaf>,
    /// Net wind pressure, characteristic.
    pub q_net: Stress,
    /// Where it comes from.
    pub q_source: String,
    /// Factor on dead load that helps.
    pub helping: f64,
    /// Which route decides.
    pub route: PanelRoute,
    /// How two leaves share.
    pub sharing: Sharing,
    /// Wall ties per area.
    pub ties: Option<PerArea>,
    /// Characteristic strength of one tie.
    pub tie_strength: Option<Cause<Force>>,
    /// Abutments, for the arching route.
    pub arching: Option<Arching>,
    /// Before the removal.
    pub before: Span,
    /// After the removal.
    pub after: Span,
    /// How much of a limit analysis is worked.
    pub effort: Effort,
    /// The sheet on which the same leaves, of the same height and load, are worked already.
    pub strengths_on: Option<String>,
}

impl PanelModel {
    /// The leaf that carries the floors.
    pub fn loaded(&self) -> usize {
        self.leaves.iter().position(|l| l.loaded).unwrap_or(0)
    }

    /// Where the strengths of leaf `i` stand: above on this sheet, or on another.
    pub fn leaf_from(&self, i: usize) -> String {
        match &self.strengths_on {
            Some(mark) => format!("{}, sheet {mark}", self.leaf_name(i)),
            None => format!("{}, above", self.leaf_name(i)),
        }
    }

    /// The same where the leaf is named by its column.
    pub fn strength_from(&self) -> String {
        match &self.strengths_on {
            Some(mark) => format!("strength, sheet {mark}"),
            None => "strength, above".to_owned(),
        }
    }

    /// What the leaves are called, in order.
    pub fn leaf_names(&self) -> Vec<String> {
        (0..self.leaves.len()).map(|i| self.leaf_name(i).to_owned()).collect()
    }

    /// What leaf `i` is called.
    pub fn leaf_name(&self, i: usize) -> &'static str {
        match (self.leaves.len(), i) {
            (1, _) => "wall",
            (_, 0) => "outer leaf",
            _ => "inner leaf",
        }
    }
}

/// The edges of a span, for a check that knows whole edges alone: one that is held over a part counts as free.
pub fn edges(span: &Span) -> Edges {
    let of = |e: &building::Edge| if e.stretch.is_some() { Edge::Free } else { e.kind };
    Edges::new(of(&span.top), of(&span.base), of(&span.left), of(&span.right))
}

/// What the check of panel `p` needs. `masonry` holds the strengths of its leaves, outer first; `q_net` is the
/// net pressure on panels of this site with its source, unless the panel states its own. `None` where the
/// panel's build-up is unknown or has another number of leaves, which no valid building has.
pub fn model(
    b: &Building,
    p: &Panel,
    masonry: &[Masonry],
    q_net: Stress,
    q_source: &str,
) -> Option<PanelModel> {
    let build_up = b.build_up(&p.build_up)?;
    if build_up.leaves.len() != masonry.len() || masonry.is_empty() {
        return None;
    }
    let (loaded, _) = build_up.loaded();
    let leaves = build_up
        .leaves
        .iter()
        .zip(masonry)
        .enumerate()
        .map(|(i, (leaf, m))| PanelLeaf {
            t: leaf.thickness,
            masonry: m.clone(),
            G_above: if i == loaded { p.dead_above } else { LineLoad::ZERO },
            U_above: if i == loaded { p.lift_above } else { LineLoad::ZERO },
            loaded: i == loaded,
        })
        .collect();
    let (q_net, q_source) = match &p.wind {
        Some(stated) => (stated.value, format!("stated: {}", stated.reason)),
        None => (q_net, q_source.to_owned()),
    };
    Some(PanelModel {
        mark: p.mark.clone(),
        h: p.height,
        leaves,
        q_net,
        q_source,
        helping: b.basis.helping_factor.value,
        route: p.route,
        sharing: p.sharing,
        ties: build_up.ties,
        tie_strength: build_up.tie_strength.clone(),
        arching: p.arching.clone(),
        before: p.before.clone(),
        after: p.after.clone(),
        effort: Effort::default(),
        strengths_on: None,
    })
}
