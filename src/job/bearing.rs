//! What stands on a return, and the wall that it meets.

use super::limits::{Limits, Odd};
use super::reader::Table;
use super::returns::{Around, FORCE};
use super::words::{KNOWN, LEAVES};
use crate::building::found::FoundReturn;
use crate::building::{BuildUp, Flange, Load, Proof};
use crate::error::Kind;
use crate::quantity::{Force, Length, LineLoad};

pub(super) const ALONG: Limits = Limits::new(0.0, 6.0, "m");
pub(super) const ECCENTRICITY: Limits = Limits::new(-300.0, 300.0, "mm");
pub(super) const THICKNESS: Limits = Limits::new(40.0, 600.0, "mm");
pub(super) const TO_END: Limits = Limits::new(0.0, 50.0, "m");
pub(super) const WALL_LOAD: Limits =
    Limits::new(0.0, 500.0, "kN/m").odd(&[Odd::Above(150.0, "much for a wall of a house")]);

/// Reads one load on a return of the given length and build-up.
pub fn load(
    t: &Table<'_>,
    owner: &Table<'_>,
    length: Option<Length>,
    wall: Option<&BuildUp>,
) -> Option<Load> {
    let what = t.need("what").line();
    let dead: Option<Force> = t.need("dead").quantity(&FORCE);
    let imposed = t.need("imposed").quantity(&FORCE);
    let uplift: Option<Force> = t.may("uplift").quantity(&FORCE);
    let at: Option<Length> = t.need("at").quantity(&ALONG);
    let eccentricity: Option<Length> = t.may("eccentricity").quantity(&ECCENTRICITY);
    let leaf = t.may("leaf").whole(LEAVES);
    let source = t.may("source").text();
    t.finish();

    if let (Some(at), Some(length)) = (at, length)
        && at > length
    {
        t.fault(Kind::Contradiction, "it stands beyond the end of the return")
            .at(t.place("at"), "place of the load")
            .and(owner.place("length"), "length of the return")
            .allowed("0 mm at the junction end to the length of the return at its free end")
            .help("correct one of the two");
    }
    if let (Some(dead), Some(uplift)) = (dead, uplift)
        && uplift * 1.5 > dead * 0.9
    {
        t.warn("the uplift is more than its dead load holds down");
    }
    let place = match (leaf, wall) {
        (Some(leaf), Some(wall)) if usize::from(leaf) > wall.leaves.len() => {
            t.fault(Kind::Contradiction, "it stands on leaf 2 of a wall of one leaf")
                .at(t.place("leaf"), "leaf")
                .and(owner.place("build_up"), "one leaf")
                .allowed("1 for the outer leaf, 2 for the inner")
                .help("take `leaf` out, or correct the build-up");
            return None;
        }
        (Some(leaf), _) => usize::from(leaf) - 1,
        (None, Some(wall)) => wall.loaded().0,
        (None, None) => 0,
    };
    if let (Some(e), Some(leaf)) = (eccentricity, wall.and_then(|w| w.leaves.get(place))) {
        let thickness = leaf.thickness;
        if e.abs() * 2.0 > thickness {
            t.fault(Kind::Contradiction, "it stands beside the leaf that carries it")
                .at(t.place("eccentricity"), "from the middle of the leaf")
                .and(owner.place("build_up"), format!("that leaf is {:.1} mm thick", thickness.base()))
                .allowed("at most half the thickness to either side")
                .help("correct the eccentricity, or the leaf");
        } else if e.abs() * 3.0 > thickness {
            t.warn("the load stands in the outer sixth of the leaf");
        }
    }
    Some(Load {
        what: what?,
        dead: dead?,
        imposed: imposed?,
        uplift: uplift.unwrap_or(Force::ZERO),
        at: at?,
        eccentricity: eccentricity.unwrap_or(Length::ZERO),
        leaf: place,
        source: source.unwrap_or_default(),
    })
}

/// Reads the junction with the wall that the return buttresses; what it does not give comes from the plan.
pub fn junction<'a>(t: &Table<'a>, around: &Around<'_, 'a>, found: Option<&FoundReturn>) -> Option<Flange> {
    // A junction with another wall than the one found is all by hand.
    let found = found.filter(|f| !t.has("to") || t.peek("to").is_some_and(|to| to.trim() == f.meets));
    let to = match found {
        Some(f) if !t.has("to") => Some(f.meets.clone()),
        _ if around.plan.is_empty() => t.need("to").line(),
        _ => around.plan.refer(&t.need("to")),
    };
    let bonded = t.need("bonded").flag();
    let proof = t.may("proof").pick(KNOWN);
    let words = t.may("words").text();
    let length = |key: &'static str, limits: &Limits, drawn: Option<Length>| match drawn {
        Some(drawn) if !t.has(key) => Some(drawn),
        _ => t.need(key).quantity(limits),
    };
    let thickness = length("thickness", &THICKNESS, found.map(|f| f.thickness));
    let left = length("left", &TO_END, found.map(|f| f.to_end[0]));
    let right = length("right", &TO_END, found.map(|f| f.to_end[1]));
    let next = |key: &'static str, drawn: Option<Length>| {
        if t.has(key) { t.may(key).quantity(&TO_END) } else { drawn }
    };
    let next_wall_left = next("next_wall_left", found.and_then(|f| f.to_next[0]));
    let next_wall_right = next("next_wall_right", found.and_then(|f| f.to_next[1]));
    // What the take-down brings is put in once the building is whole.
    let dead = match found {
        Some(_) if !t.has("dead") => Some(LineLoad::ZERO),
        _ => t.need("dead").quantity(&WALL_LOAD),
    };
    t.finish();

    if bonded == Some(true) {
        for key in ["proof", "words"].into_iter().filter(|key| !t.has(key)) {
            t.fault(Kind::Contradiction, format_args!("it is bonded, but `{key}` is missing"))
                .at(t.place("bonded"), "how is that known?")
                .and(t.head(), format!("has no `{key}`"))
                .allowed("bonded = true with proof = \"seen\" or \"assumed\", and the words for it")
                .help("add proof = \"seen\" and words = \"who, where, when\"; or proof = \"assumed\", a hold point");
        }
    }
    let leaf =
        to.as_ref().and_then(|to| around.plan.item(to)).and_then(|w| around.build_ups.item(&w.build_up));
    if let (Some(thickness), Some(wall)) = (thickness, leaf) {
        let met = wall.loaded().1.thickness;
        if (thickness - met).abs() > Length::new(1.0) {
            t.warn(format_args!(
                "thickness is {:.1} mm, but the loaded leaf of \"{}\" is {:.1} mm",
                thickness.base(),
                wall.name,
                met.base()
            ));
        }
    }
    Some(Flange {
        to: to?,
        bonded: bonded?,
        proof: proof.unwrap_or(Proof::Assumed),
        words: words.unwrap_or_default(),
        thickness: thickness?,
        left: left?,
        right: right?,
        next_wall_left,
        next_wall_right,
        dead: dead?,
        uplift: LineLoad::ZERO,
    })
}
