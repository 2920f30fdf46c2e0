//! `[[floor_edges]]`, `[diaphragm]` and `[collapse]`: how the floor takes part, and the building's class.

use super::ground::STRIP;
use super::limits::{Limits, Odd};
use super::names::Names;
use super::reader::Table;
use super::returns::MARK;
use crate::building::{
    BracingWall, Collapse, CollapseClass, Diaphragm, DiaphragmProof, FloorEdge, Joists, Link, Panel, Proof,
    Stability, Stands, Storey, Strap, StrapsKnown,
};
use crate::error::Kind;
use crate::quantity::Length;
use crate::standards::masonry::Edge;
use crate::standards::tables::approved_document_a as ada;

pub(super) const SPACING: Limits = Limits::new(0.1, 6.0, "m")
    .odd(&[Odd::Above(ada::STRAP_SPACING_M, "more than Approved Document A, 2C, has for straps")]);
pub(super) const STRENGTH: Limits = Limits::new(0.5, 50.0, "kN")
    .odd(&[Odd::Below(4.0, "little for a restraint strap"), Odd::Above(20.0, "much for a restraint strap")]);
pub(super) const SPAN: Limits =
    Limits::new(0.5, 40.0, "m").odd(&[Odd::Above(15.0, "long for a floor of a house")]);
pub(super) const DEPTH: Limits =
    Limits::new(0.5, 40.0, "m").odd(&[Odd::Below(1.5, "a strip more than a floor")]);
pub(super) const FLOW: Limits = Limits::new(0.1, 50.0, "kN/m")
    .odd(&[Odd::Above(8.0, "more than boards or sheets on joists take, mostly a slip of the unit")]);

/// Differences between two heights of the same strip of wind face that are only rounding.
const SAME_STRIP: Length = Length::new(50.0);
/// As far as bearings and thicknesses make a span differ from the distance of centre lines.
const WALLS: Length = Length::new(600.0);

/// Reads one floor edge.
pub fn edge<'a>(
    t: &Table<'a>,
    panels: &Names<'a, Panel>,
    storeys: &Names<'a, Storey>,
    stability: Option<(&Table<'a>, &Stability)>,
) -> Option<FloorEdge> {
    let mark = t.need("mark").mark(MARK);
    let panel = panels.refer(&t.need("panel"));
    let strip_height: Option<Length> = t.need("strip_height").quantity(&STRIP);
    let joists = t.need("joists").choice(Joists::WORDS, Joists::from_word);
    let known = if t.has("straps") {
        t.need("straps").choice(StrapsKnown::WORDS, StrapsKnown::from_word)
    } else {
        Some(StrapsKnown::None)
    };
    let words = if known == Some(StrapsKnown::Seen) { t.need("words").text() } else { t.may("words").text() };
    let strap = straps(t, known);

    if let Some(seen) = panel.as_ref().and_then(|p| panels.get(p))
        && let Some(held) = &seen.item
    {
        if held.after.top.kind == Edge::Free {
            t.fault(Kind::Contradiction, format_args!("the top edge of {} is free", held.mark))
                .at(seen.table.place("after"), "free at the top after the removal")
                .and(t.place("panel"), "the floor holds its top")
                .allowed("a panel whose top edge is simple or continuous after the removal")
                .help("correct the edge of the panel, or take this floor edge out");
        }
        let storey = storeys.get(&held.storey);
        if let (Some(strip), Some(storey)) = (strip_height, storey)
            && let Some(item) = &storey.item
            && strip > item.total_height
        {
            t.fault(Kind::Contradiction, "the strip of wind face is higher than the structure")
                .at(t.place("strip_height"), "strip")
                .and(storey.table.place("total_height"), "total height")
                .allowed("half this storey and half the one above, or up to the ridge")
                .help("correct one of the two");
        }
        if let (Some(strip), Some((_, st))) = (strip_height, stability)
            && st.storey == held.storey
            && strip < st.strip_height - SAME_STRIP
        {
            t.warn(format_args!(
                "the floor collects a strip of {:.2} m here, but {:.2} m under [stability]",
                strip.base() / 1e3,
                st.strip_height.base() / 1e3
            ));
        }
    }
    Some(FloorEdge {
        mark: mark?,
        panel: panel?,
        strip_height: strip_height?,
        joists: joists?,
        known: known?,
        words: words.unwrap_or_default(),
        strap: strap?,
    })
}

/// Holds floor edges against each other: a panel has one.
pub fn one_each(edges: &Names<'_, FloorEdge>) {
    let all: Vec<_> = edges.iter().filter_map(|e| Some((e, e.item.as_ref()?))).collect();
    for (n, (seen, edge)) in all.iter().enumerate() {
        if let Some((first, _)) = all[..n].iter().find(|(_, other)| other.panel == edge.panel) {
            seen.table
                .fault(Kind::Contradiction, format_args!("{} has a floor edge already", edge.panel))
                .at(seen.table.place("panel"), "again")
                .and(first.table.place("panel"), "the first")
                .allowed("one floor edge at each panel")
                .help("take one out, or name the panel that it is about");
        }
    }
}

/// Holds floor edges against the links: straps that are not there were not seen.
pub fn against_links(edges: &Names<'_, FloorEdge>, tables: &[Table<'_>], links: &[Option<Link>]) {
    let given = tables.iter().zip(links).filter_map(|(t, l)| Some((t, l.as_ref()?)));
    let seen = given.filter(|(_, l)| l.link == "floor edge" && l.proof == Proof::Seen);
    for (t, link) in seen {
        let about = |e: &FloorEdge| {
            link.of.is_empty() || link.of.iter().any(|mark| *mark == e.mark || *mark == e.panel)
        };
        let bare = edges
            .iter()
            .find(|e| e.item.as_ref().is_some_and(|item| item.known != StrapsKnown::Seen && about(item)));
        if let Some(edge) = bare {
            edge.table
                .fault(Kind::Contradiction, "the link is seen, but its straps are not")
                .at(edge.table.place("straps"), "straps")
                .and(t.place("proof"), "the link's proof")
                .allowed("proof = \"seen\" where every floor edge that it is about has straps = \"seen\"")
                .help("write proof = \"calculated\", which follows the floor edges, or correct what is known of the straps");
        }
    }
}

/// The straps, which belong to an edge that has or gets some.
fn straps(t: &Table<'_>, known: Option<StrapsKnown>) -> Option<Option<Strap>> {
    let known = known?;
    if known == StrapsKnown::None {
        let mut clean = true;
        for key in ["spacing", "strength"] {
            if t.has(key) {
                clean = false;
                t.fault(
                    Kind::Contradiction,
                    format_args!("no strap is said to be there, but `{key}` is given"),
                )
                .at(t.place(key), format!("`{key}`"))
                .and(t.place("straps"), "no straps")
                .allowed("`spacing` and `strength` with straps = \"seen\" or \"to be fitted\"")
                .help(format!("take `{key}` out, or say what is known of the straps"));
            }
        }
        return clean.then_some(None);
    }
    let spacing = t.need("spacing").quantity(&SPACING);
    let strength = t.need("strength").cause(|e| e.quantity(&STRENGTH));
    Some(Some(Strap { spacing: spacing?, strength: strength? }))
}

/// Reads `[diaphragm]`.
pub fn diaphragm<'a>(
    t: &Table<'a>,
    storeys: &Names<'a, Storey>,
    stability_table: Option<&Table<'a>>,
    stability: Option<&Stability>,
    bracing: &Names<'a, BracingWall>,
    led: bool,
) -> Option<Diaphragm> {
    let storey = storeys.refer(&t.need("storey"));
    let span: Option<Length> = t.need("span").quantity(&SPAN);
    let span_before: Option<Length> = t.may("span_before").quantity(&SPAN);
    let depth = t.need("depth").quantity(&DEPTH);
    let openings = t.need("openings").text();
    let proof = t.need("proof").choice(DiaphragmProof::WORDS, DiaphragmProof::from_word);
    let resistance = match proof {
        Some(DiaphragmProof::ShearFlow) => t.need("resistance").cause(|e| e.quantity(&FLOW)).map(Some),
        _ => {
            if t.has("resistance") && proof.is_some() {
                t.clash("a resistance is given, but the proof is by rule", "resistance", "proof")
                    .allowed("`resistance` with proof = \"shear flow\"")
                    .help("take `resistance` out, or write proof = \"shear flow\"");
            }
            Some(None)
        }
    };
    t.finish();

    // With floors on the plan the storey's wind comes from it.
    if stability_table.is_none() && !led {
        t.fault(Kind::Missing, "the wind on the floor comes from [stability], which is not there")
            .at(t.head(), "has no storey's wind")
            .allowed("[diaphragm] with [stability] and [[bracing]], or with floors on the plan")
            .help("add [stability] and [[bracing]], or take [diaphragm] out");
        return None;
    }
    if let (Some(name), Some(st), Some(table)) = (&storey, stability, stability_table) {
        if *name != st.storey {
            t.fault(Kind::Contradiction, "the floor is that of another storey than the one judged")
                .at(t.place("storey"), "the floor's storey")
                .and(table.place("storey"), "the storey judged")
                .allowed("the storey of [stability]")
                .help("name the same storey in both places");
        }
        let front = st.front.1 - st.front.0;
        for (key, given) in [("span", span), ("span_before", span_before)] {
            if given.is_some_and(|l| l > front + WALLS * 2.0) {
                t.fault(Kind::Contradiction, "the floor spans farther than the wind face is long")
                    .at(t.place(key), "span")
                    .and(table.place("front"), "extent of the wind face")
                    .allowed("at most the front: the distance between two bracing walls")
                    .help("correct one of the two");
            }
        }
        let widest = widest(st, bracing);
        if let (Some(l), Some(widest)) = (span, widest)
            && l < widest - WALLS
        {
            t.warn(format_args!(
                "the span is {:.2} m, but two neighbouring bracing walls stand {:.2} m apart after the removal",
                l.base() / 1e3,
                widest.base() / 1e3
            ));
        }
    }
    Some(Diaphragm {
        storey: storey?,
        span: span?,
        span_before,
        depth: depth?,
        openings: openings?,
        proof: proof?,
        resistance: resistance?,
    })
}

/// The greatest distance between neighbouring bracing walls along the wind after the removal.
fn widest(st: &Stability, bracing: &Names<'_, BracingWall>) -> Option<Length> {
    let stays = |w: &&BracingWall| w.along == st.wind_along && w.stands != Stands::Before;
    let mut at: Vec<f64> =
        bracing.iter().filter_map(|b| b.item.as_ref()).filter(stays).map(|w| w.at.base()).collect();
    at.sort_by(f64::total_cmp);
    at.windows(2).map(|p| p[1] - p[0]).reduce(f64::max).map(Length::new)
}

/// Reads `[collapse]`.
pub fn collapse(t: &Table<'_>) -> Option<Collapse> {
    let class = t.need("class").choice(CollapseClass::WORDS, CollapseClass::from_word);
    let reason = t.need("reason").text();
    t.finish();
    Some(Collapse { class: class?, reason: reason? })
}
