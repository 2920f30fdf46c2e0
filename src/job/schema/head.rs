//! `[job]`, `[signatures]`, `[[revisions]]` and `[basis]`.

use serde_json::Value;

use super::super::basis::{GAMMA, HELPING, HELPING_USUAL};
use super::super::identity::{ADDRESS, LETTER, NUMBER};
use super::super::words::{CATEGORIES, CLASSES};
use super::form::{Form, cause, choice, date, factor, figure, line, list, mark, pick, text, whole};
use crate::building::Status;

pub fn job() -> Value {
    let address = list(
        line("One line of it.", "7 Tansy Rise"),
        (1, Some(ADDRESS)),
        &format!("Address of the site, 1 to {ADDRESS} lines; for example [\"7 Tansy Rise\", \"Ambleford\"]."),
    );
    Form::new("Who, where, what for.")
        .need("number", mark(NUMBER, "Job number; it goes into the name of the pack.", "2419"))
        .need("title", line("What the pack is about.", "Rear opening, kitchen to dining room"))
        .need("address", address)
        .need("client", line("For whom.", "Mrs P. Oake"))
        .need("authority", line("Who approves.", "Ambleford Borough Council, building control"))
        .need(
            "status",
            choice(Status::WORDS, "What the issue is for; from the third word on it counts as issued."),
        )
        .may("visited", date("Day of the visit; without it the pack says \"not visited\"."))
        .need("building", text("What the building is.", "Two-storey semi-detached house of about 1962."))
        .need("work", text("What is to be done.", "Taking out the wall between kitchen and dining room."))
        .done()
}

pub fn signatures() -> Value {
    let made = person("Who made the calculation.");
    let checked = person("A second person who checked it; without the table the pack says \"self-checked\".");
    Form::new("Who made it and who checked it.").need("made", made).may("checked", checked).done()
}

fn person(what: &str) -> Value {
    Form::new(what)
        .need("name", line("Name.", "R. Hollin"))
        .need("letters", mark(LETTER, "Initials, for the title block.", "RH"))
        .may("qualification", line("Qualification.", "CEng MIStructE"))
        .may("contact", line("How the client reaches this person; stands in the summary.", "01632 960 142"))
        .need("date", date("Day of the signature."))
        .done()
}

pub fn revision() -> Value {
    Form::new("One issue of the pack.")
        .need("letter", mark(LETTER, "Its letter.", "A"))
        .need("date", date("Day of the issue, not before it was made."))
        .need("note", line("What is new in it.", "First issue"))
        .may(
            "pack",
            line(
                "On an earlier issue: the pack as it was sent, a path beside the job file. The current issue lists what changed since.",
                "issued/2419 Calculations (A).pdf",
            ),
        )
        .done()
}

pub fn basis() -> Value {
    let gamma = |what: &str| cause(figure(&GAMMA, what, 3.0));
    Form::new("Factors. Without it: existing work of class 2, units of category II.")
        .may("execution_class", whole(CLASSES, "Class of execution control; without the entry 2."))
        .may("unit_category", pick(CATEGORIES, "Category of the units; without the entry \"II\"."))
        .may("gamma_M", gamma("One material factor on everything; never beside the three others."))
        .may("gamma_M_compression", gamma("Material factor in compression."))
        .may("gamma_M_flexure", gamma("Material factor in flexure."))
        .may("gamma_M_shear", gamma("Material factor in shear."))
        .may("helping_factor", factor(HELPING_USUAL, &HELPING, "Factor on dead load that helps.", 1.0))
        .done()
}
