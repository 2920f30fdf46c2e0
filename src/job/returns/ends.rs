//! Base and head of a return, and what comes from above.

use super::{Around, FORCE, MOMENT};
use crate::building::{BaseJoint, FromAbove, Head, Path};
use crate::error::Kind;
use crate::job::entry::Entry;
use crate::job::ground::{self, STRIP};
use crate::job::reader::Table;
use crate::job::words::HEADS;
use crate::quantity::Length;

/// A base that is not spoken of is a dpc where the plan shows the return.
pub(super) fn base(t: &Table<'_>, found: bool) -> (Option<BaseJoint>, Option<String>) {
    let base = match found && !t.has("base") {
        true => Some(BaseJoint::Dpc),
        false => t.need("base").choice(BaseJoint::WORDS, BaseJoint::from_word),
    };
    match (base, t.has("base_reason")) {
        (Some(BaseJoint::Bonded), false) => {
            t.fault(Kind::Missing, "the base is bonded, but `base_reason` is missing")
                .at(t.place("base"), "bonded")
                .allowed("\"bonded\" with the reason, or \"dpc\"")
                .help("add base_reason = \"who saw it, where and when\", or write base = \"dpc\"");
            (base, None)
        }
        (Some(BaseJoint::Dpc), true) => {
            t.clash("`base_reason` is why a base is bonded, but the base is a dpc", "base_reason", "base")
                .allowed("`base_reason` with base = \"bonded\"")
                .help("take `base_reason` out, or correct the base");
            (base, None)
        }
        (Some(BaseJoint::Dpc), false) => (base, Some(String::new())),
        _ => (base, t.may("base_reason").text()),
    }
}

/// A propped head with the walls that prop it, or a free one.
pub(super) fn head<'a>(t: &Table<'a>, around: &Around<'_, 'a>, mark: Option<&str>) -> Option<Head> {
    let word = t.need("head").pick(HEADS);
    let given = t.has("propped_by");
    let along = around.stability.map(|(_, s)| s.wind_along);
    let entry = t.need("propped_by");
    let by = match given {
        false => None,
        // Without bracing walls of its own the job names walls of its plan.
        true if around.led && around.bracing.is_empty() => props_on_plan(&entry, around, mark),
        true => ground::props(&entry, around.bracing, along, mark),
    };
    match (word?, given) {
        (true, false) => {
            t.fault(Kind::Contradiction, "the head is propped, but `propped_by` is missing")
                .at(t.place("head"), "propped by what?")
                .and(t.head(), "has no `propped_by`")
                .allowed("\"propped\" with the marks of the walls that take the reaction, or \"free\"")
                .help("add propped_by = [\"...\"] with marks of [[bracing]] walls, or write head = \"free\"");
            None
        }
        (false, true) => {
            t.clash("the head is free, but `propped_by` names walls", "head", "propped_by")
                .allowed("`propped_by` with head = \"propped\"")
                .help("write head = \"propped\", or take `propped_by` out");
            None
        }
        (true, true) => by.map(Head::Propped),
        (false, false) => Some(Head::Free),
    }
}

/// Walls of the plan that take the reaction at a head: they stay, and they are not the return.
fn props_on_plan<'a>(entry: &Entry<'a>, around: &Around<'_, 'a>, own: Option<&str>) -> Option<Vec<String>> {
    let items = entry.list("a list of marks of plan walls: [\"party wall\", \"flank wall\"]")?;
    let mut marks = Vec::new();
    for item in &items {
        let mark = around.plan.refer(item)?;
        let removed = around.plan.item(&mark).is_some_and(|w| w.removed);
        if removed || own == Some(mark.as_str()) || marks.contains(&mark) {
            item.fault(Kind::NotAllowed, format_args!("\"{mark}\" cannot prop it"))
                .at(item.place(), if removed { "comes out" } else { "itself, or named twice" })
                .allowed("other walls of the plan that stay, each once")
                .help("name the walls that take the reaction, or write head = \"free\"");
            return None;
        }
        marks.push(mark);
    }
    Some(marks)
}

/// The path and the height that a floor collects; `drawn` where the plan shows it.
pub(super) fn path(t: &Table<'_>, drawn: Option<Length>) -> (Option<Path>, Option<Length>) {
    let path = t.need("path").choice(Path::WORDS, Path::from_word);
    let strip = t.may("strip_height").quantity(&STRIP);
    let by_floor = matches!(path, Some(Path::UpAndDown | Path::Both));
    if by_floor && drawn.is_some() && !t.has("strip_height") {
        return (path, drawn);
    }
    match path {
        Some(Path::UpAndDown | Path::Both) if !t.has("strip_height") => {
            t.fault(Kind::Contradiction, "the floor brings wind to its head, but `strip_height` is missing")
                .at(t.place("path"), "through the floor")
                .and(t.head(), "has no `strip_height`")
                .allowed("the height of wind face that the floor collects")
                .help(
                    "add strip_height = \"... m\": half this storey and half the one above, or to the ridge",
                );
        }
        Some(Path::Sideways) if t.has("strip_height") => {
            t.clash(
                "the wind comes sideways, but `strip_height` is what a floor collects",
                "strip_height",
                "path",
            )
            .allowed("`strip_height` with path = \"up and down\" or \"both\"")
            .help("take `strip_height` out, or name the other path");
        }
        _ => {}
    }
    (path, strip)
}

/// What the return of the storey above brings; nothing where the entry is not there.
pub(super) fn from_above(t: &Table<'_>) -> Option<FromAbove> {
    if !t.has("from_above") {
        return Some(FromAbove::default());
    }
    let above = t.need("from_above").table(&format!("{}, from above", t.name))?;
    let force = above.need("force").quantity(&FORCE);
    let moment = above.need("moment").quantity(&MOMENT);
    above.finish();
    Some(FromAbove { force: force?, moment: moment? })
}
