//! `[wind]`.

use serde_json::{Value, json};

use super::super::sectors::{C_E, C_ET, DISTANCE};
use super::super::wind::{
    ALTITUDE, APART, BUILDINGS, FROM_CREST, HILL, MAP_SPEED, OPENINGS, OROGRAPHY, P_USUAL, PITCH, PRESSURE,
    PROBABILITY, REFERENCE_HEIGHT, SEASON, SIDE, SLOPE,
};
use super::super::words::{ANY, BEARING, GROUND, ROOFS, TERRAIN, TURN};
use super::form::{Form, cause, choice, either, factor, figure, flag, list, pick, quantity, tables, text};
use crate::building::{Along, Side, WindRoute};

pub fn wind() -> Value {
    Form::new("Wind on the house.")
        .need("route", choice(WindRoute::WORDS, "The one that decides; all that are given are shown."))
        .may("stated", stated())
        .may("site", site())
        .may("sectors", tables(sector(), false, "What lies around the site; needed with [wind.site]. One for any bearing, or several that go round once."))
        .done()
}

fn stated() -> Value {
    Form::new("Pressures stated by the engineer; needed with route \"stated\".")
        .need(
            "overall",
            quantity(&PRESSURE, "Net on the whole building: for returns and the storey.", "0.50 kN/m2"),
        )
        .need("panel", quantity(&PRESSURE, "Net on one panel.", "0.63 kN/m2"))
        .need("reason", text("Where they come from.", "Houses of the same height on all sides."))
        .done()
}

fn site() -> Value {
    let level = text("Level ground, and how that is known.", "None: level ground for 1 km.");
    let c_o = figure(&OROGRAPHY, "Orography factor; in place of `orography`.", 1.1);
    let p = "Yearly probability of a stronger wind.";
    Form::new("The site, for the routes \"terrain\" and \"charts\".")
        .need("v_map", quantity(&MAP_SPEED, "Wind speed from the map, UK Figure NA.1.", "22.0 m/s"))
        .need(
            "altitude",
            quantity(&ALTITUDE, "Altitude of the site; of the foot of the hill where there is one.", "85 m"),
        )
        .may(
            "height",
            quantity(
                &REFERENCE_HEIGHT,
                "Height of the building; that of the lowest storey without it.",
                "7.4 m",
            ),
        )
        .need(
            "along_x",
            quantity(&SIDE, "The whole building with its neighbours, along x of the plan.", "12.8 m"),
        )
        .need(
            "along_y",
            quantity(&SIDE, "The whole building with its neighbours, along y of the plan.", "8.9 m"),
        )
        .may("c_season", factor(1.0, &SEASON, "Season factor.", 0.9))
        .may("probability", factor(P_USUAL, &PROBABILITY, p, 0.01))
        .may(
            "orography",
            either(
                "Level ground in words, or a hill with its size; or `c_o` in its place.",
                vec![level, hill()],
            ),
        )
        .may("c_o", cause(c_o))
        .may("town", town())
        .may(
            "lack_of_correlation",
            flag("Whether 0.85 stands on windward plus leeward; without the entry false."),
        )
        .may("dominant_opening", opening())
        .may("roof", roof())
        .done()
}

fn hill() -> Value {
    Form::new("What lifts the wind.")
        .need("form", pick(GROUND, "Its form."))
        .need("height", quantity(&HILL, "Its height.", "16 m"))
        .need("upwind", quantity(&SLOPE, "Length of the slope upwind.", "210 m"))
        .may(
            "downwind",
            quantity(&SLOPE, "Length of the slope downwind; with a hill or ridge only.", "260 m"),
        )
        .need(
            "from_crest",
            quantity(&FROM_CREST, "From the crest to the house; upwind of it negative.", "-5 m"),
        )
        .need("words", text("How that is known.", "From the map, RH."))
        .done()
}

fn town() -> Value {
    Form::new("Displacement height, with the charts or category IV.")
        .need("buildings", quantity(&BUILDINGS, "Height of the buildings around.", "7.2 m"))
        .need("apart", quantity(&APART, "How far apart they stand upwind.", "14 m"))
        .need("words", text("How that is known.", "Paced, RH, 14 October 2026."))
        .done()
}

fn opening() -> Value {
    Form::new("An opening at least twice as large as those of all other faces together.")
        .need("side", choice(Side::WORDS, "Side of the plan."))
        .need("area", quantity(&OPENINGS, "Its area.", "5.0 m2"))
        .need("others", quantity(&OPENINGS, "Area of the openings of all other faces.", "1.5 m2"))
        .need("words", text("What it is.", "Folding doors, taken as open in a storm."))
        .done()
}

fn roof() -> Value {
    Form::new("The roof, whose uplift is led down with its loads.")
        .need("form", pick(ROOFS, "Its form."))
        .may("pitch", figure(&PITCH, "Pitch in degrees; not of a flat roof.", 35.0))
        .may("ridge", choice(Along::WORDS, "Direction of the ridge; not of a flat roof."))
        .need("eaves", quantity(&REFERENCE_HEIGHT, "Height of the eaves above the ground.", "5.1 m"))
        .done()
}

fn sector() -> Value {
    let any = json!({ "description": "One sector for every bearing.", "const": ANY });
    let degrees = json!({
        "description": format!("A bearing in degrees clockwise from north, a multiple of {BEARING}."),
        "type": "number",
        "minimum": TURN.low,
        "exclusiveMaximum": TURN.high,
        "multipleOf": BEARING,
    });
    let degrees = list(degrees, (0, None), "Bearings, for example [210, 240, 270].");
    Form::new("What lies around the site on some bearings.")
        .need(
            "bearings",
            either(
                "Bearings that it is about: \"any\", or a list in steps of 30 degrees.",
                vec![any, degrees],
            ),
        )
        .may("category", pick(TERRAIN, "Terrain category, for the route \"terrain\"."))
        .may("c_e", figure(&C_E, "For the charts: exposure factor read from UK Figure NA.7.", 2.05))
        .may("shore", quantity(&DISTANCE, "Distance to the shore upwind; goes with `c_e`.", "60 km"))
        .may("c_eT", figure(&C_ET, "In towns: read from UK Figure NA.8.", 0.91))
        .may(
            "into_town",
            quantity(&DISTANCE, "From the edge of the town upwind; goes with `c_eT`.", "0.4 km"),
        )
        .may("read_by", text("Who read the charts, and when; goes with `c_e`.", "RH, 20 October 2026"))
        .done()
}
