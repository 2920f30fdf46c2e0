//! `[plan]` and `[area_loads]`.

use serde_json::Value;

use super::super::ground::ON_PLAN;
use super::super::plan::{ALONG, AREA, BEAM, BEARING, DEAD, LINTEL, OPENING, SILL, WIDTH};
use super::super::words::{NORTH, TURN};
use super::form::{Form, choice, either, figure, flag, line, list, pair, pick, quantity, tables, text};
use crate::building::{Along, Frame, Side};
use crate::standards::tables::selfweight::{Per, WEIGHTS};

pub fn plan() -> Value {
    let north = either(
        "Where north is: a side of the page, or degrees clockwise from its top.",
        vec![
            pick(NORTH, "Side of the page."),
            figure(&TURN, "Degrees clockwise from the top of the page.", 30.0),
        ],
    );
    let neighbours = list(
        choice(Side::WORDS, "A side of the plan."),
        (0, None),
        "Sides on which a neighbour adjoins, for example [\"left\"]; [] for none. Needed with floors.",
    );
    Form::new("The plan: x to the right, y up the page, lines in the middle of walls.")
        .need("north", north)
        .may("neighbours", neighbours)
        .need("walls", tables(wall(), true, "Walls as lines."))
        .may(
            "floors",
            tables(floor(), false, "Floors and roofs; with them all loads are led down to the ground."),
        )
        .may("beams", tables(beam(), false, "Beams that stand once the wall is out."))
        .done()
}

fn wall() -> Value {
    let storeys = list(
        line("Mark of a storey.", "ground"),
        (0, None),
        "Storeys that it stands in; every one without it.",
    );
    Form::new("One wall of the plan.")
        .need("mark", line("Its name.", "rear wall"))
        .need("build_up", line("Name of its build-up.", "outer cavity wall"))
        .need("from", pair(&ON_PLAN, "Where it begins, x and y.", ["0 m", "0 m"]))
        .need("to", pair(&ON_PLAN, "Where it ends, x and y.", ["6.4 m", "0 m"]))
        .may("removed", flag("Whether it is the wall that comes out; without the entry false."))
        .may("storeys", storeys)
        .may("free_end", flag("Whether an end of an outer wall meets no wall; without the entry false."))
        .may("openings", tables(opening(), false, "Doors and windows, wall on both sides of each."))
        .done()
}

fn opening() -> Value {
    Form::new("One opening of a wall of the plan.")
        .need("storey", line("Mark of its storey.", "ground"))
        .need("from", quantity(&ALONG, "From the `from` of the wall to the opening.", "1.1 m"))
        .need("width", quantity(&WIDTH, "Its width.", "1.8 m"))
        .need("height", quantity(&OPENING, "Its height.", "1.2 m"))
        .may("sill", quantity(&SILL, "Height of its sill; 0 m, a door, without it.", "0.9 m"))
        .may("frame", frame())
        .may("lintel", lintel())
        .done()
}

/// How the frame of an opening passes its wind on.
pub fn frame() -> Value {
    choice(
        Frame::WORDS,
        &format!(
            "Where the frame passes its wind on; without the entry \"{}\", the worst of all.",
            Frame::Unknown.word()
        ),
    )
}

/// How far a lintel bears.
pub fn lintel() -> Value {
    quantity(&LINTEL, "Bearing of its lintel at either end.", "150 mm")
}

fn floor() -> Value {
    Form::new("One floor or roof: a rectangle that spans one way.")
        .need("mark", line("Its name.", "F1"))
        .need("load", line("Name of one of [area_loads].", "first floor"))
        .need("storey", line("Mark of the storey under it.", "ground"))
        .need("from", pair(&ON_PLAN, "One corner, x and y.", ["0 m", "0 m"]))
        .need("to", pair(&ON_PLAN, "The opposite corner, x and y.", ["5.0 m", "3.4 m"]))
        .need("spans", choice(Along::WORDS, "Direction of its joists."))
        .done()
}

fn beam() -> Value {
    Form::new("One beam.")
        .need("mark", line("Its name.", "B1"))
        .need("storey", line("Mark of the storey under it.", "ground"))
        .need("from", pair(&ON_PLAN, "One end, bearing included, x and y.", ["0.80 m", "3.4 m"]))
        .need("to", pair(&ON_PLAN, "The other end, bearing included, x and y.", ["3.90 m", "3.4 m"]))
        .need("weight", quantity(&BEAM, "Its own weight.", "0.35 kN/m"))
        .need("bearing", quantity(&BEARING, "Length of its bearing at each end.", "150 mm"))
        .done()
}

/// What one floor or roof weighs and carries.
pub fn area_load() -> Value {
    let names: Vec<&str> = WEIGHTS.iter().filter(|w| w.per == Per::Area).map(|w| w.name).collect();
    let of = list(
        choice(&names, "A name of the list of weights."),
        (0, None),
        "What it is made of, from the list of weights; in place of `dead`.",
    );
    Form::new("What one floor or roof weighs and carries, characteristic, on plan.")
        .may("of", of)
        .may("dead", quantity(&DEAD, "Dead load, with its `source`; in place of `of`.", "0.6 kN/m2"))
        .need("imposed", quantity(&AREA, "Imposed load.", "1.5 kN/m2"))
        .may(
            "uplift",
            quantity(&AREA, "Uplift of a roof; from [wind.site] and its roof without it.", "0.2 kN/m2"),
        )
        .may(
            "source",
            text("Where the loads come from; needed with `dead`.", "Opened up, RH, 14 October 2026."),
        )
        .done()
}
