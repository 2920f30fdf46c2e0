//! Floors, the class of the building, the chain to the ground, and what is open.

use serde_json::{Value, json};

use super::super::floors::{DEPTH, FLOW, SPACING, SPAN, STRENGTH};
use super::super::ground::STRIP;
use super::super::limits::one_of;
use super::super::photographs::{IMAGES, WITHIN};
use super::super::returns::MARK;
use super::super::words::LINKS;
use super::form::{Form, cause, choice, line, list, mark, named, pair, quantity, tables, text};
use crate::building::{CollapseClass, DiaphragmProof, Joists, Proof, StrapsKnown};

pub fn floor_edge() -> Value {
    let strength = quantity(&STRENGTH, "Declared strength of one strap; with straps.", "8 kN");
    Form::new("The edge of a floor that holds a panel.")
        .need("mark", mark(MARK, "Its mark.", "E1"))
        .need("panel", line("Mark of a panel whose top is held after the removal.", "P1"))
        .need(
            "strip_height",
            quantity(
                &STRIP,
                "Wind face that this floor collects: half this storey and half the next.",
                "2.65 m",
            ),
        )
        .need("joists", choice(Joists::WORDS, "Which way the joists run."))
        .may(
            "straps",
            choice(StrapsKnown::WORDS, "What is known of straps; without the entry there are none."),
        )
        .may(
            "words",
            text("Who saw them, where and when; needed with straps = \"seen\".", "RH, 14 October 2026."),
        )
        .may("spacing", quantity(&SPACING, "Distance between straps; with straps.", "1.0 m"))
        .may("strength", cause(strength))
        .done()
}

pub fn diaphragm() -> Value {
    let flow = quantity(
        &FLOW,
        "Design resistance for each metre of depth; with proof = \"shear flow\" only.",
        "5.0 kN/m",
    );
    Form::new("The floor in its plane.")
        .need("storey", line("Mark of the storey under it, that of [stability].", "ground"))
        .need(
            "span",
            quantity(&SPAN, "Between the bracing walls that take the force after the removal.", "6.2 m"),
        )
        .may("span_before", quantity(&SPAN, "The same before the removal.", "3.15 m"))
        .need("depth", quantity(&DEPTH, "Along the wind, solid where it meets the bracing walls.", "3.6 m"))
        .need("openings", text("Its openings, and where they are.", "None at the rear."))
        .need("proof", choice(DiaphragmProof::WORDS, "How it is shown; \"shear flow\" needs `resistance`."))
        .may("resistance", cause(flow))
        .done()
}

pub fn collapse() -> Value {
    Form::new("Class for disproportionate collapse, Approved Document A, A3; a hold point without it.")
        .need("class", choice(CollapseClass::WORDS, "The class."))
        .need("reason", text("Why that class.", "Single-occupancy house of two storeys."))
        .done()
}

pub fn link() -> Value {
    Form::new("One link of the chain.")
        .need("link", choice(LINKS, "Which link."))
        .need("proof", choice(Proof::WORDS, "How it is known; an assumed link makes the result conditional."))
        .may(
            "words",
            text(
                "The rule, the witness, or what is to be done; needed unless it is calculated.",
                "Opened up, RH, 14 October 2026.",
            ),
        )
        .may("for", marks())
        .done()
}

fn marks() -> Value {
    list(
        line("A mark of this file.", "R1"),
        (0, None),
        "What it is about, by marks, for example [\"R1\"]; everything without it.",
    )
}

pub fn assumption() -> Value {
    Form::new("One assumption.")
        .need("text", text("What is taken for granted.", "The joists lap on the kitchen wall."))
        .may("source", text("Where it comes from.", "RH, 14 October 2026."))
        .done()
}

pub fn hold_point() -> Value {
    Form::new("One hold point.")
        .need("text", text("What must be done.", "Before the wall comes down, the bond of R1 is opened up."))
        .may(
            "plain",
            line(
                "The same in plain words, for the client's summary.",
                "The builder looks behind the plaster.",
            ),
        )
        .may("for", marks())
        .may("closed", line("Who closed it, and when; a closed one no longer counts.", "RH, 30 October 2026"))
        .done()
}

pub fn photograph() -> Value {
    let endings: Vec<String> = IMAGES.iter().map(|e| (*e).to_owned()).collect();
    let file = json!({
        "description": format!("Path beside the job file, / between folders, ending in {}; for example \"photos/nib.jpg\".", one_of(&endings)),
        "type": "string",
        "pattern": path(),
        "examples": ["photos/nib.jpg"],
    });
    Form::new("One photograph.")
        .need("file", file)
        .need("caption", line("What it shows.", "Nib R1 from the kitchen"))
        .may("mark", line("A mark of this file that it is about.", "R1"))
        .may("marks", tables(pointed(), false, "What is pointed at in the picture."))
        .done()
}

fn pointed() -> Value {
    let at = "Of the width from the left, and of the height from the top, of the upright picture.";
    Form::new("One mark in the picture.")
        .need("of", line("A mark of this file: the part that is seen there.", "R1"))
        .need("at", pair(&WITHIN, at, ["32 %", "60 %"]))
        .done()
}

/// No drive or backslash, not from the root, and an ending of an image in either case.
fn path() -> String {
    let either_case = |c: char| match c {
        '.' => "\\.".to_owned(),
        _ => format!("[{}{c}]", c.to_ascii_uppercase()),
    };
    let endings: Vec<String> = IMAGES.iter().map(|e| e.chars().map(either_case).collect()).collect();
    format!("^\\s*[^/\\\\:\\s][^\\\\:]*({})\\s*$", endings.join("|"))
}

pub fn responsible() -> Value {
    let who = line("Who has it.", "The contractor's temporary works designer");
    named(who, "Who does what, any task: design_of_propping = \"...\".")
}
