//! `[[panels]]`.

use serde_json::Value;

use super::super::edges::PLACE;
use super::super::ground::HEIGHT;
use super::super::openings::{self, AT, SILL, WIDTH};
use super::super::panels::{DEAD, LENGTH, PRESSURE, WALL_AT};
use super::super::returns::MARK;
use super::super::words::{ARCHES, EDGES, EdgeWord};
use super::form::{Form, cause, choice, line, list, mark, pick, quantity, tables, text};
use super::plan::{frame, lintel};
use crate::building::{PanelRoute, Sharing};

/// One panel.
pub fn one() -> Value {
    let arching = Form::new("Abutments for arching; with route = \"arching\", and only then.")
        .need("abutment", text("Why the abutments hold.", "Stiff columns at both ends, built tight."))
        .need("spans", pick(ARCHES, "The way it arches."))
        .done();
    let wind = quantity(&PRESSURE, "Net pressure of its own.", "0.60 kN/m2");
    let between = list(
        line("Mark of a plan wall.", "party wall"),
        (0, None),
        "Walls that hold its ends, where the plan shows several panels on its wall.",
    );
    let after = span("After the removal: the same entries, all of them again.")
        .may("wall_at", quantity(&WALL_AT, "Where the removed wall met it, from the left end.", "3.10 m"));
    Form::new("One outer wall between its supports. What the plan shows may be left out.")
        .need("mark", mark(MARK, "Its mark.", "P1"))
        .may("on", line("Mark of the plan wall that it is part of.", "rear wall"))
        .may("between", between)
        .may("title", line("What it is called on its sheet.", "Rear wall beside the nib"))
        .may("build_up", line("Name of its build-up.", "outer cavity wall"))
        .may("storey", line("Mark of its storey.", "ground"))
        .may("height", quantity(&HEIGHT, "Its height.", "2.40 m"))
        .may("dead_above", quantity(&DEAD, "Dead load on its loaded leaf at the top.", "8.5 kN/m"))
        .may("wind", cause(wind))
        .may(
            "route",
            choice(
                PanelRoute::WORDS,
                &format!("How it is checked; without the entry \"{}\".", PanelRoute::Flexure.word()),
            ),
        )
        .may(
            "sharing",
            choice(
                Sharing::WORDS,
                &format!(
                    "How two leaves share the wind; without the entry \"{}\".",
                    Sharing::Strength.word()
                ),
            ),
        )
        .may("before", span("Before the removal.").done())
        .may("after", after.done())
        .may(
            "openings",
            tables(opening(), false, "Doors and windows, seen from outside; in place of those of the plan."),
        )
        .may("arching", arching)
        .done()
}

fn span(what: &str) -> Form {
    let between = list(
        line("Mark of a plan wall.", "party wall"),
        (2, Some(2)),
        "The two plan walls that hold its ends; in place of `length`, where floors stand on the plan.",
    );
    Form::new(what)
        .may("length", quantity(&LENGTH, "Clear length between its supports.", "3.10 m"))
        .may("between", between)
        .may("top", edge("top", false))
        .may("base", edge("base", true))
        .may("left", edge("left edge, seen from outside", false))
        .may("right", edge("right edge, seen from outside", false))
}

/// A damp-proof course runs along the base alone.
fn edge(which: &str, base: bool) -> Value {
    let words = EDGES.iter().filter(|(_, kind)| base || *kind != EdgeWord::Dpc);
    let words: Vec<&str> = words.map(|(word, _)| *word).collect();
    Form::new(&format!("How its {which} is held: {{ edge = \"simple\", reason = \"...\" }}."))
        .need("edge", choice(&words, "How it is held."))
        .need("reason", text("Why.", "Party wall, toothed."))
        .may(
            "from",
            quantity(
                &PLACE,
                "Start of the stretch that is held, from the left end or the foot; goes with `to`.",
                "0 m",
            ),
        )
        .may("to", quantity(&PLACE, "End of that stretch; the rest is free.", "1.2 m"))
        .done()
}

fn opening() -> Value {
    Form::new("One opening of the panel.")
        .need("at", quantity(&AT, "From the left end of the panel after the removal.", "0.90 m"))
        .need("width", quantity(&WIDTH, "Its width.", "1.20 m"))
        .may("sill", quantity(&SILL, "Height of its sill; 0 m, a door, without it.", "0.90 m"))
        .need("height", quantity(&openings::HEIGHT, "Its height.", "1.20 m"))
        .may("frame", frame())
        .may("lintel", lintel())
        .done()
}
