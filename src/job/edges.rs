//! How an edge of a panel is held, all of it or a stretch of it.

use super::limits::Limits;
use super::reader::Table;
use super::words::{EDGES, EdgeWord};
use crate::building::{Edge, Span};
use crate::error::Kind;
use crate::quantity::Length;
use crate::standards::masonry;

pub(super) const PLACE: Limits = Limits::new(0.0, 20.0, "m");

/// A stretch shorter than this holds nothing that anybody would count on, mm. Common practice, no published source.
const SHORTEST: f64 = 200.0;

/// Reads one edge: its kind and the reason, and from where to where it is held where that is not all of it. A damp-proof
/// course can run along the base alone.
pub fn read(t: &Table<'_>, key: &'static str) -> Option<Edge> {
    let entry = t.need(key);
    let wanted = "{ edge = \"simple\", reason = \"...\" }";
    if let Some(toml::de::DeValue::String(_)) = entry.present(wanted) {
        t.fault(Kind::Missing, format_args!("`{key}` says how the edge is held, but not why"))
            .at(entry.place(), "no reason")
            .allowed(wanted)
            .help(format!("write {key} = {{ edge = \"...\", reason = \"...\" }}"));
        return None;
    }
    let table = entry.table(&format!("{}, {key}", t.name))?;
    let kind = table.need("edge").pick(EDGES);
    if kind == Some(EdgeWord::Dpc) && key != "base" {
        table
            .fault(Kind::NotAllowed, format_args!("`{key}` is held at a dpc"))
            .at(table.place("edge"), "only the base can be")
            .allowed("\"free\", \"simple\" or \"continuous\"; \"dpc\" for the base")
            .help("say how this edge is held");
        return None;
    }
    let dpc = kind == Some(EdgeWord::Dpc);
    let kind = kind.map(EdgeWord::kind);
    let reason = table.need("reason").text();
    let part = table.has("from") || table.has("to");
    let stretch = if part {
        let (from, to) = (table.need("from").quantity(&PLACE), table.need("to").quantity(&PLACE));
        from.zip(to).map(Some)
    } else {
        Some(None)
    };
    table.finish();
    if part && kind == Some(masonry::Edge::Free) {
        table
            .clash(
                "a stretch is given of an edge that is free",
                "edge",
                if table.has("from") { "from" } else { "to" },
            )
            .allowed("`from` and `to` of the stretch that is \"simple\" or \"continuous\"; the rest is free")
            .help("say how the stretch is held, or take `from` and `to` out");
        return None;
    }
    Some(Edge { kind: kind?, stretch: stretch?, dpc, reason: reason? })
}

/// Whether the stretches held lie on their edges.
pub fn fit(t: &Table<'_>, span: &Span, height: Length) {
    let edges = [
        ("top", &span.top, span.length),
        ("base", &span.base, span.length),
        ("left", &span.left, height),
        ("right", &span.right, height),
    ];
    for (key, edge, length) in edges {
        let Some((from, to)) = edge.stretch else { continue };
        if (to - from).base() >= SHORTEST && to <= length {
            continue;
        }
        let mm = |l: Length| format!("{:.0} mm", l.base());
        t.fault(Kind::Contradiction, format_args!("`{key}` is held from {} to {}", mm(from), mm(to)))
            .at(t.place(key), format!("the edge is {} long", mm(length)))
            .allowed(format!(
                "a stretch of at least {SHORTEST} mm between 0 and {}, from the left end or from the foot",
                mm(length)
            ))
            .help("correct the stretch, or say that the edge is free");
    }
}
