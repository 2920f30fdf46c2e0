//! `[[storeys]]`, `[removed]`, `[stability]` and `[[bracing]]`.

use serde_json::Value;

use super::super::ground::{
    FORCE_ABOVE, HEIGHT, ON_PLAN, REMOVED_LENGTH, STOREY_LOAD, STRIP, TOTAL_HEIGHT, WALL_LENGTH,
};
use super::form::{Form, choice, line, pair, quantity, text};
use crate::building::{Along, Ends, FloorKind, ShareBy, Stands};

pub fn storey() -> Value {
    let total = "From this storey's base to the top of the structure; less than that of the storey below.";
    Form::new("One storey.")
        .need("mark", line("Its name.", "ground"))
        .need("clear_height", quantity(&HEIGHT, "Height from floor to ceiling.", "2.40 m"))
        .need("floor_above", choice(FloorKind::WORDS, "What is above; the roof above the last storey only."))
        .need("total_height", quantity(&TOTAL_HEIGHT, total, "7.40 m"))
        .done()
}

pub fn removed() -> Value {
    Form::new("The wall that comes out.")
        .need(
            "wall",
            line(
                "Mark of the plan wall with removed = true; any words where there is no plan.",
                "kitchen wall",
            ),
        )
        .may("build_up", line("Name of its build-up; that of the plan wall without it.", "inner wall"))
        .may("length", quantity(&REMOVED_LENGTH, "How much comes out; the plan wall without it.", "2.40 m"))
        .may("storey", line("Its storey; that of the plan wall without it.", "ground"))
        .need("carried", text("What it carried.", "First-floor joists from both sides."))
        .need("braced", text("What it braced.", "The rear wall at mid-length."))
        .done()
}

pub fn stability() -> Value {
    let front = "Extent of the wind face across the wind, the smaller position first.";
    let strip = "Wind face collected at the head of this storey: half this storey and half the next.";
    Form::new("How the storey stands; needed with returns unless floors stand on the plan.")
        .need("storey", line("Mark of the storey, that of the removed wall.", "ground"))
        .need("wind_along", choice(Along::WORDS, "The direction in which the removed wall braced."))
        .need("front", pair(&ON_PLAN, front, ["0 m", "6.4 m"]))
        .need("strip_height", quantity(&STRIP, strip, "2.65 m"))
        .need(
            "share_by",
            choice(
                ShareBy::WORDS,
                "How the walls share the wind; \"stiffness\" under a concrete floor only.",
            ),
        )
        .may(
            "storeys_above_force",
            quantity(&FORCE_ABOVE, "Characteristic wind on all above that strip; 0 without it.", "9 kN"),
        )
        .need(
            "vertical_load_dead",
            quantity(&STOREY_LOAD, "Dead load of the whole house at this level, for the tilt.", "310 kN"),
        )
        .need("vertical_load_imposed", quantity(&STOREY_LOAD, "Imposed load of the same.", "85 kN"))
        .done()
}

pub fn bracing() -> Value {
    Form::new("One wall that braces.")
        .need("mark", line("Its name; the mark of a return makes it that return.", "party wall"))
        .need("along", choice(Along::WORDS, "Direction of its length."))
        .need("at", quantity(&ON_PLAN, "Position across its length.", "0 m"))
        .may("other_at", quantity(&ON_PLAN, "Position of its middle along its length.", "4.4 m"))
        .need("length", quantity(&WALL_LENGTH, "Its length.", "8.9 m"))
        .need("height", quantity(&HEIGHT, "Its height in this storey.", "2.40 m"))
        .need("build_up", line("Name of its build-up.", "party wall"))
        .need("stands", choice(Stands::WORDS, "When it stands."))
        .may(
            "ends",
            choice(
                Ends::WORDS,
                &format!(
                    "How it is held at head and foot; without the entry \"{}\".",
                    Ends::Cantilever.word()
                ),
            ),
        )
        .done()
}
