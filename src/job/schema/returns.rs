//! `[[returns]]`, `[[bearings]]` and `[[padstones]]`.

use serde_json::Value;

use super::super::bearing::{ALONG, ECCENTRICITY, THICKNESS, TO_END, WALL_LOAD};
use super::super::bearings::{self, CONCRETE, LEVEL, STONE_HEIGHT, STONE_LENGTH, STONE_WIDTH};
use super::super::footing::{self, ALLOWABLE, BEYOND, DENSITY, LINE, OFFSET};
use super::super::ground::{HEIGHT, STRIP};
use super::super::returns::{FORCE, LENGTH, MARK, MOMENT, MU, OPENING, POSITION, SUPPORTED, TRIBUTARY};
use super::super::wind::PRESSURE;
use super::super::words::{HEADS, KNOWN, LEAVES, PADSTONES};
use super::form::{
    Form, cause, choice, factor, flag, line, list, mark, pair, pick, quantity, tables, text, usually, whole,
};
use crate::building::found::MU_USUAL;
use crate::building::{Acts, BaseJoint, Path, Restraint};
use crate::quantity::Length;

/// One return.
pub fn one() -> Value {
    let props = list(
        line("Mark of a wall.", "party wall"),
        (1, None),
        "Walls that take the reaction at the head, for example [\"party wall\"]; with head = \"propped\" only.",
    );
    let above = Form::new("Characteristic wind that comes from storeys above.")
        .need("force", quantity(&FORCE, "Force at the head.", "0 kN"))
        .need("moment", quantity(&MOMENT, "Moment at the head.", "0 kNm"))
        .done();
    let wind = quantity(
        &PRESSURE,
        "Net overall pressure of its own; not where the floor shares by stiffness.",
        "0.60 kN/m2",
    );
    let width = "Wind face that stays with this return: half the distance to the next support on each side.";
    Form::new("One piece of wall that stays. What the plan shows may be left out.")
        .need("mark", mark(MARK, "Its mark.", "R1"))
        .may("title", line("What it is called on its sheet.", "Nib at the rear wall"))
        .may("build_up", line("Name of its build-up.", "inner wall"))
        .may("storey", line("Mark of its storey, that of the removed wall.", "ground"))
        .may("length", quantity(&LENGTH, "Its length from the face that it meets to its end.", "640 mm"))
        .may("height", quantity(&HEIGHT, "Its height between floor and what holds its head.", "2.40 m"))
        .may("position", pair(&POSITION, "Where its mark stands on the plan, x and y.", ["3.2 m", "0.32 m"]))
        .may("base", choice(BaseJoint::WORDS, "What it stands on; \"bonded\" needs `base_reason`."))
        .may(
            "base_reason",
            text("Why the base is bonded; with base = \"bonded\" only.", "Seen below the floor, RH."),
        )
        .may("mu", factor(MU_USUAL, &MU, "Friction at its base.", 0.3))
        .need("head", pick(HEADS, "How its head is held along the wall; \"propped\" needs `propped_by`."))
        .may("propped_by", props)
        .need("path", choice(Path::WORDS, "How wind comes to it; with the floor it needs `strip_height`."))
        .may(
            "strip_height",
            quantity(&STRIP, "Wind face that the floor collects; not with path = \"sideways\".", "2.65 m"),
        )
        .may("tributary_width", quantity(&TRIBUTARY, width, "0.40 m"))
        .may("from_above", above)
        .may("wind", cause(wind))
        .may("restraint", choice(Restraint::WORDS, "What holds its head and foot across."))
        .may(
            "supported_wall_height",
            quantity(&SUPPORTED, "Overall height of the wall that it buttresses.", "5.2 m"),
        )
        .may(
            "nearest_opening",
            quantity(&OPENING, "From the return to the nearest opening in that wall.", "900 mm"),
        )
        .may(
            "far_end",
            text(
                "What stiffens its other upright edge, and how that is known.",
                "Bonded to the chimney breast, RH.",
            ),
        )
        .may(
            "acts",
            choice(
                Acts::WORDS,
                &format!(
                    "Which leaves of a cavity return act; without the entry \"{}\".",
                    Acts::Loaded.word()
                ),
            ),
        )
        .may("loads", tables(load(), false, "What stands on it; its own weight is added."))
        .may("junction", junction())
        .may("footing", footing())
        .done()
}

fn load() -> Value {
    Form::new("One characteristic load on the return.")
        .need("what", line("What it is.", "beam B1"))
        .need("dead", quantity(&FORCE, "Its dead load.", "18 kN"))
        .need("imposed", quantity(&FORCE, "Its imposed load.", "9 kN"))
        .may("uplift", quantity(&FORCE, "Roof uplift contained in this load; 0 kN without it.", "0 kN"))
        .need("at", quantity(&ALONG, "From the junction end to the load, at most the length.", "540 mm"))
        .may(
            "eccentricity",
            quantity(&ECCENTRICITY, "Across the thickness, either sign; 0 mm without it.", "0 mm"),
        )
        .may("leaf", whole(LEAVES, "The leaf that it stands on, outer first; the loaded one without it."))
        .may("source", text("Where the load comes from.", "Load take-down, page 3"))
        .done()
}

fn junction() -> Value {
    Form::new("The wall that it meets.")
        .may("to", line("Mark of that wall.", "rear wall"))
        .need("bonded", flag("Whether the two are bonded; then `proof` and `words` are needed."))
        .may("proof", pick(KNOWN, "How that is known."))
        .may("words", text("Who saw it, where and when.", "Opened up at 1.2 m, RH, 14 October 2026."))
        .may("thickness", quantity(&THICKNESS, "Thickness of the loaded leaf of the wall met.", "100 mm"))
        .may("left", quantity(&TO_END, "Along that wall to its end or an opening, to the left.", "1.8 m"))
        .may("right", quantity(&TO_END, "The same to the right.", "2.0 m"))
        .may(
            "next_wall_left",
            quantity(&TO_END, "Clear distance to the next wall along the wind, to the left.", "3.1 m"),
        )
        .may("next_wall_right", quantity(&TO_END, "The same to the right.", "3.1 m"))
        .may(
            "dead",
            quantity(&WALL_LOAD, "Dead load in the wall met, at the foot of the return.", "9.0 kN/m"),
        )
        .done()
}

fn footing() -> Value {
    let before = Form::new("Characteristic load on the footing before the removal, without its own weight.")
        .need("dead", quantity(&LINE, "Dead load.", "14 kN/m"))
        .need("imposed", quantity(&LINE, "Imposed load.", "4.8 kN/m"))
        .done();
    Form::new("What the return stands on in the ground.")
        .need("mark", mark(MARK, "Its mark.", "F1"))
        .need("width", quantity(&footing::WIDTH, "Its width across the wall.", "450 mm"))
        .need("thickness", quantity(&footing::THICKNESS, "Thickness of its concrete.", "150 mm"))
        .may(
            "beyond_free_end",
            usually(Length::ZERO, &BEYOND, "How far it runs on beyond the free end.", "150 mm"),
        )
        .may(
            "beyond_junction",
            usually(Length::ZERO, &BEYOND, "How far it runs on beyond the junction.", "150 mm"),
        )
        .may("density", usually(footing::CONCRETE, &DENSITY, "Weight of its concrete.", "22 kN/m3"))
        .need("allowable", cause(quantity(&ALLOWABLE, "Allowable pressure on the ground.", "100 kN/m2")))
        .need("proof", pick(KNOWN, "How it is known; \"assumed\" is a hold point."))
        .need("words", text("Who saw it, where and when.", "Trial hole, RH, 14 October 2026."))
        .may(
            "offset",
            quantity(
                &OFFSET,
                "Middle of the wall from the middle of the footing, positive to the inner leaf.",
                "0 mm",
            ),
        )
        .may("before", before)
        .done()
}

/// One bearing.
pub fn bearing() -> Value {
    Form::new("The bearing of a beam on a return; loads and place are those of the load it names.")
        .need("mark", mark(MARK, "Its mark.", "B1-R1"))
        .need("beam", line("The beam.", "B1"))
        .need("on", line("Mark of the return.", "R1"))
        .need("load", line("`what` of a load of that return.", "beam B1"))
        .need(
            "bearing_length",
            quantity(&bearings::LENGTH, "Along the wall, its middle at the load.", "150 mm"),
        )
        .need("bearing_width", quantity(&bearings::WIDTH, "Across the wall, at most the leaf.", "100 mm"))
        .may(
            "level",
            quantity(
                &LEVEL,
                "Underside of the beam above the foot; the head of the return without it.",
                "2.40 m",
            ),
        )
        .may("padstone", pick(PADSTONES, "Whether a padstone is chosen; without the entry it is."))
        .done()
}

/// One padstone.
pub fn padstone() -> Value {
    Form::new("One padstone that the practice has at hand.")
        .need("name", line("Its name.", "PS 215"))
        .need("length", quantity(&STONE_LENGTH, "Along the wall.", "215 mm"))
        .need("width", quantity(&STONE_WIDTH, "Across the wall.", "100 mm"))
        .need("height", quantity(&STONE_HEIGHT, "Its height.", "140 mm"))
        .need("strength", quantity(&CONCRETE, "Cylinder strength f_ck of its concrete.", "25 N/mm2"))
        .done()
}
