//! The job file as a JSON Schema (draft 2020-12), for editors that complete and check while one types.
//!
//! Words, limits and units are those of the reader, taken from the constants beside it; the tests
//! hold every key and every form against what the reader asks for and takes. A schema sees one
//! entry at a time: what contradicts, adds up or refers to a name is the reader's business.

mod form;
mod head;
mod house;
mod masonry;
mod panels;
mod plan;
mod proof;
mod returns;
mod site;

#[cfg(test)]
mod tests;

use serde_json::{Value, json};

use form::{Form, named, tables};

/// The schema of a job file.
pub fn schema() -> Value {
    let root = Form::new(
        "One job of Perpend. This schema knows entries, kinds, units and words. It sees no contradictions, sums, \
         references or limits of quantities: `perpend check` decides whether a job is good.",
    )
    .need("job", head::job())
    .need("signatures", head::signatures())
    .need("revisions", tables(head::revision(), true, "Issues of the pack, oldest first; the last is current."))
    .may("basis", head::basis())
    .need("wind", site::wind())
    .need("materials", named(masonry::material(), "Masonry by name: [materials.\"red brick\"]."))
    .need("build_ups", named(masonry::build_up(), "Walls by name, built of the materials: [build_ups.\"inner wall\"]."))
    .need("storeys", tables(house::storey(), true, "Storeys of the house, lowest first."))
    .may("plan", plan::plan())
    .may("area_loads", named(plan::area_load(), "What floors and roofs of the plan weigh and carry, by name."))
    .need("removed", house::removed())
    .may("stability", house::stability())
    .may("bracing", tables(house::bracing(), false, "Walls that brace the storey, before and after; goes with [stability]."))
    .may("returns", tables(returns::one(), false, "What stays of the wall and braces."))
    .may("bearings", tables(returns::bearing(), false, "Where beams bear on the returns."))
    .may("padstones", tables(returns::padstone(), false, "What can be put under beams; the smallest that works is taken."))
    .may("panels", tables(panels::one(), false, "Outer walls between their supports, before and after."))
    .may("floor_edges", tables(proof::floor_edge(), false, "Edges of floors that hold panels, one for each panel."))
    .may("diaphragm", proof::diaphragm())
    .may("collapse", proof::collapse())
    .need("links", tables(proof::link(), true, "The chain from the wind face to the ground: how each link is known."))
    .may("assumptions", tables(proof::assumption(), false, "What the calculation takes for granted."))
    .may("hold_points", tables(proof::hold_point(), false, "What must be closed before the wall comes down."))
    .may("photographs", tables(proof::photograph(), false, "Photographs beside the job file."))
    .may("responsible", proof::responsible())
    .done();
    let mut whole = json!({
        "$schema": "https://json-schema.org/draft/2020-12/schema",
        "title": "Perpend job file",
    });
    if let (Some(whole), Value::Object(root)) = (whole.as_object_mut(), root) {
        whole.extend(root);
    }
    whole
}
