//! `[materials]` and `[build_ups]`.

use serde_json::Value;

use super::super::materials::{
    ABSORPTION, CAVITY, CHASE, DENSITY, F_B, F_K, F_VK0, F_XK, THICKNESS, TIE_STRENGTH, TIES, UNIT_HEIGHT,
    UNIT_STRENGTH, UNIT_WIDTH,
};
use super::super::words::{GROUPS, MORTARS, PERPENDS, STRENGTHS, UNITS};
use super::form::{Form, cause, flag, line, list, pick, quantity, text, whole};

pub fn material() -> Value {
    Form::new("One masonry: its units and its mortar.")
        .need("unit", pick(UNITS, "Kind of unit."))
        .need("group", whole(GROUPS, "Group of the unit, by its holes."))
        .need("strength", quantity(&UNIT_STRENGTH, "Compressive strength of the unit.", "20 N/mm2"))
        .need("strength_is", pick(STRENGTHS, "Which strength that is; the mean needs the size of the unit."))
        .may(
            "unit_height",
            quantity(&UNIT_HEIGHT, "Height of the unit; needed with the mean strength.", "65 mm"),
        )
        .may(
            "unit_width",
            quantity(&UNIT_WIDTH, "Width of the unit; needed with the mean strength.", "102.5 mm"),
        )
        .may("laid_flat", flag("Whether aggregate blocks lie on their side; without the entry false."))
        .need("mortar", pick(MORTARS, "Mortar by strength class."))
        .may("water_absorption", quantity(&ABSORPTION, "Water absorption; of clay brick only.", "9 %"))
        .need("density", quantity(&DENSITY, "Weight of the masonry.", "20 kN/m3"))
        .may("perpends", pick(PERPENDS, "Upright joints; without the entry \"filled\"."))
        .may("source", text("How it is known.", "Seen outside and in the loft, RH."))
        .may("f_b", cause(quantity(&F_B, "Stated normalised strength of the unit.", "25 N/mm2")))
        .may("f_k", cause(quantity(&F_K, "Stated compressive strength of the wall.", "2.2 N/mm2")))
        .may("f_vk0", cause(quantity(&F_VK0, "Stated shear strength without load.", "0.15 N/mm2")))
        .may(
            "f_xk1",
            cause(quantity(&F_XK, "Stated flexural strength, failure along the bed joints.", "0.3 N/mm2")),
        )
        .may(
            "f_xk2",
            cause(quantity(&F_XK, "Stated flexural strength, failure across the bed joints.", "0.9 N/mm2")),
        )
        .done()
}

pub fn build_up() -> Value {
    Form::new("One wall: a leaf, or two with a cavity.")
        .may("cavity", quantity(&CAVITY, "Width of the cavity; needed with two leaves.", "75 mm"))
        .may("ties", quantity(&TIES, "Wall ties; with two leaves.", "2.5 per m2"))
        .may("tie_strength", cause(quantity(&TIE_STRENGTH, "Characteristic strength of one tie.", "1.8 kN")))
        .may("collar_joint", flag("Whether a joint runs inside a wall of one leaf, parallel to its face."))
        .need("leaves", list(leaf(), (1, Some(2)), "Leaves, the outer one first: one or two."))
        .done()
}

fn leaf() -> Value {
    Form::new("One leaf.")
        .need("material", line("Name of a material of this file.", "red brick"))
        .need("thickness", quantity(&THICKNESS, "Thickness without plaster and render.", "102.5 mm"))
        .may("chase", quantity(&CHASE, "Depth of chases, which comes off the thickness.", "20 mm"))
        .may("loaded", flag("Whether it carries floor and roof; exactly one of two leaves does."))
        .done()
}
