//! A sheet's entries as blocks of the pack.

use serde_json::{Value as Json, json};

use super::{anchor, bar, unshown_words, verdict_words};
use crate::checks::Section;
use crate::quantity::print;
use crate::trace::math::{self, Node};
use crate::trace::{Column, Entry, Op, Row, Step, Table, Value, Verdict, spoken};

/// The blocks of a section, in order.
pub fn of_section(s: &Section) -> Vec<Json> {
    s.sheet.entries.iter().flat_map(|e| block(s, e)).collect()
}

fn result(v: &Value) -> Json {
    let shown = print::show(&v.name, v.value);
    json!({"value": shown.value, "unit": shown.unit})
}

fn symbol(v: &Value) -> Json {
    math::symbol(&v.name).json()
}

fn block(s: &Section, entry: &Entry) -> Option<Json> {
    Some(match entry {
        Entry::Heading(level, text) => json!({"kind": "heading", "level": level, "text": text}),
        Entry::Given { value, words, source } => json!({
            "kind": "given", "symbol": symbol(value), "result": result(value), "words": words, "source": source,
        }),
        Entry::Lookup { value, words, clause, rows, source } => json!({
            "kind": "lookup", "symbol": symbol(value), "result": result(value), "words": words,
            "clause": clause, "rows": rows, "source": source,
        }),
        Entry::Found { value, words, clause } => json!({
            "kind": "found", "symbol": symbol(value), "result": result(value), "words": words, "clause": clause,
        }),
        Entry::Step(step) => self::step(step),
        // The words are those of the way it went, so the relation stands as it was found to be.
        Entry::Decide { relation, words, clause } => json!({
            "kind": "decide", "clause": clause, "words": words, "holds": true,
            "condition": math::relation_found(relation).json(), "values": math::relation_values(relation).json(),
        }),
        Entry::Require { relation, words, clause } => json!({
            "kind": "require", "clause": clause, "words": words, "holds": relation.holds,
            "condition": math::relation(relation).json(), "values": written(relation),
        }),
        Entry::Verify(v) => verdict(s, v),
        Entry::Outside(o) => json!({
            "kind": "outside", "id": o.id, "clause": o.clause, "words": o.words, "anchor": anchor(s, &o.id),
        }),
        Entry::Unshown(u) => json!({
            "kind": "unshown", "id": u.id, "clause": u.clause, "words": u.words, "finding": u.finding,
            "ratio": u.ratio.map_or_else(String::new, print::ratio), "bar": bar(u.ratio.unwrap_or(0.0)),
            "verdict": unshown_words(u), "anchor": anchor(s, &u.id),
        }),
        Entry::Rule { id, words, clause, finding, met } => json!({
            "kind": "rule", "id": id, "clause": clause, "words": words, "finding": finding, "met": met,
        }),
        Entry::Note(text) => json!({"kind": "note", "text": text}),
        Entry::Table(t) => table(t),
        Entry::Columns(c) => {
            json!({"kind": "columns", "heads": c.heads, "rows": c.rows.iter().filter_map(|r| row(s, r)).collect::<Vec<_>>()})
        }
        Entry::Drawings(names) => {
            let drawings: Vec<_> = s.drawings.iter().filter(|d| names.contains(&d.name)).collect();
            if drawings.is_empty() {
                return None;
            }
            json!({"kind": "drawings", "drawings": drawings})
        }
    })
}

/// A row of columns: the block of the first column that has it, with what each column finds.
fn row(s: &Section, row: &Row) -> Option<Json> {
    let (_, lead) = row.lead()?;
    let mut out = block(s, lead)?;
    let cell = |e: &Option<Entry>| match e {
        Some(Entry::Verify(v)) => verdict(s, v),
        Some(e) => match (e.value(), e.relation()) {
            (Some(v), _) => result(v),
            (_, Some(r)) => json!({"value": row.way(e, r), "unit": ""}),
            _ => Json::Null,
        },
        None => Json::Null,
    };
    if matches!(lead, Entry::Verify(_)) || lead.value().is_some() || lead.relation().is_some() {
        out["cells"] = row.cells.iter().map(cell).collect();
        // The source of a row names every column's own; a branch says both ways it went.
        let key = if matches!(lead, Entry::Given { .. }) { "source" } else { "clause" };
        if !matches!(lead, Entry::Verify(_)) {
            out[key] = json!(row.sources());
        }
        if lead.relation().is_some() || matches!(lead, Entry::Verify(_)) {
            out["words"] = json!(row.words());
        }
        if matches!(lead, Entry::Lookup { .. }) {
            out["entered"] = json!(row.entered());
        }
    }
    Some(out)
}

/// The values of a relation under its own sign: the template sets a false one as a comparison.
fn written(r: &crate::trace::Relation) -> Json {
    match math::relation_values(r) {
        Node::Rel(_, a, b) => Node::Rel(r.op, a, b).json(),
        other => other.json(),
    }
}

fn step(step: &Step) -> Json {
    let formula = math::formula(step);
    let numbers = math::substitution(step).unwrap_or_else(|| formula.clone());
    json!({
        "kind": "step", "clause": step.clause, "words": step.words, "symbol": symbol(&step.result),
        "formula": formula.json(), "substitution": numbers.json(), "result": result(&step.result),
        "spoken": spoken::step(step),
    })
}

fn verdict(s: &Section, v: &Verdict) -> Json {
    json!({
        "kind": "verify", "id": v.id, "clause": v.clause, "words": v.words,
        "relation": math::pair(Op::Le, math::symbol(&v.demand.name), math::symbol(&v.resistance.name)).json(),
        "demand": result(&v.demand), "resistance": result(&v.resistance),
        "ratio": print::ratio(v.ratio), "bar": bar(v.ratio), "verdict": verdict_words(v.holds),
        "anchor": anchor(s, &v.id), "case": v.case,
    })
}

fn table(t: &Table) -> Json {
    let column = |c: &Column| {
        let head = if c.symbol { math::symbol(&c.head).json() } else { json!(c.head) };
        json!({"head": head, "align": if c.numeric { "decimal" } else { "left" }})
    };
    json!({
        "kind": "table", "caption": t.caption, "columns": t.columns.iter().map(column).collect::<Vec<_>>(),
        "rows": t.rows, "strong": t.strong,
    })
}
