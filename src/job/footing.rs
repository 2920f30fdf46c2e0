//! `[returns.footing]`: what a return stands on in the ground.

use super::limits::{Limits, Odd};
use super::reader::Table;
use super::returns::MARK;
use super::words::KNOWN;
use crate::building::{Before, BuildUp, Cause, Footing};
use crate::error::Kind;
use crate::quantity::{Length, Q, Weight, unit};

pub(super) const WIDTH: Limits = Limits::new(50.0, 3000.0, "mm").odd(&[
    Odd::Below(300.0, "narrow for a footing; measure it again"),
    Odd::Above(1200.0, "wide for the footing of an inner wall"),
]);
pub(super) const THICKNESS: Limits = Limits::new(50.0, 1500.0, "mm")
    .odd(&[Odd::Below(100.0, "thin for a footing"), Odd::Above(600.0, "more a trench fill than a strip")]);
pub(super) const BEYOND: Limits = Limits::new(0.0, 3000.0, "mm");
pub(super) const DENSITY: Limits = Limits::new(15.0, 27.0, "kN/m3");
pub(super) const ALLOWABLE: Limits = Limits::new(20.0, 1000.0, "kN/m2").odd(&[
    Odd::Below(50.0, "soft ground: ask whether a strip footing serves there at all"),
    Odd::Above(200.0, "much without a report on the ground"),
]);
pub(super) const OFFSET: Limits = Limits::new(-1000.0, 1000.0, "mm");
pub(super) const LINE: Limits =
    Limits::new(0.0, 500.0, "kN/m").odd(&[Odd::Above(150.0, "much for a wall of a house")]);

/// Weight of plain concrete (EN 1991-1-1 Table A.1; from memory, check against the standard).
pub(super) const CONCRETE: Weight = Weight::new(24e-6);

/// Reads the footing of the return in `owner`, whose wall is `wall`.
pub fn read(t: &Table<'_>, owner: &Table<'_>, wall: Option<&BuildUp>) -> Option<Footing> {
    let mark = t.need("mark").mark(MARK);
    let width: Option<Length> = t.need("width").quantity(&WIDTH);
    let thickness: Option<Length> = t.need("thickness").quantity(&THICKNESS);
    let beyond_free_end = usual(t, "beyond_free_end", Length::ZERO, &BEYOND);
    let beyond_junction = usual(t, "beyond_junction", Length::ZERO, &BEYOND);
    let density = usual(t, "density", CONCRETE, &DENSITY);
    let allowable = t.need("allowable").cause(|e| e.quantity(&ALLOWABLE));
    let proof = t.need("proof").pick(KNOWN);
    let words = t.need("words").text();
    let offset = if t.has("offset") { t.need("offset").quantity(&OFFSET) } else { Some(Length::ZERO) };
    let before = if t.has("before") {
        t.need("before").table(&format!("{}, before", t.name)).and_then(|b| before(&b)).map(Some)
    } else {
        Some(None)
    };
    t.finish();

    if let (Some(width), Some(wall)) = (width, wall) {
        under_the_wall(t, owner, width, offset.unwrap_or(Length::ZERO), wall);
    }
    if let Some(thickness) = thickness {
        let ends = [("beyond_free_end", &beyond_free_end), ("beyond_junction", &beyond_junction)];
        for (key, beyond) in ends {
            if beyond.as_ref().is_some_and(|b| b.value > thickness) {
                let end = key.replace('_', " ");
                t.warn(format_args!(
                    "it counts further {end} than it is thick: a strip without steel spreads a load about that far"
                ));
            }
        }
    }
    Some(Footing {
        mark: mark?,
        width: width?,
        thickness: thickness?,
        beyond_free_end: beyond_free_end?,
        beyond_junction: beyond_junction?,
        density: density?,
        allowable: allowable?,
        proof: proof?,
        words: words?,
        offset: offset?,
        before: before?,
    })
}

/// A quantity with a usual value: that one may be left out or stand bare, any other carries its reason.
fn usual<const F: i8, const L: i8, const T: i8>(
    t: &Table<'_>,
    key: &'static str,
    usual: Q<F, L, T>,
    limits: &Limits,
) -> Option<Cause<Q<F, L, T>>> {
    let typed = t.peek(key).and_then(|text| unit::read(text, usual.dynamic().dim).ok());
    let usually = typed.is_some_and(|v| (v.value - usual.base()).abs() <= 1e-9 * usual.base().abs());
    if !t.has(key) || usually {
        return Some(Cause { value: usual, reason: String::new() });
    }
    t.need(key).cause(|e| e.quantity(limits))
}

fn before(t: &Table<'_>) -> Option<Before> {
    let dead = t.need("dead").quantity(&LINE);
    let imposed = t.need("imposed").quantity(&LINE);
    t.finish();
    Some(Before { led: false, dead: dead?, imposed: imposed? })
}

/// The wall stands on its footing with its whole thickness.
fn under_the_wall(t: &Table<'_>, owner: &Table<'_>, width: Length, offset: Length, wall: &BuildUp) {
    let whole = wall.whole();
    let label = format!("that wall is {:.1} mm thick", whole.base());
    if width < whole {
        t.fault(Kind::Contradiction, "it is narrower than the wall that stands on it")
            .at(t.place("width"), "width of the footing")
            .and(owner.place("build_up"), label)
            .allowed("at least the thickness of the wall")
            .help("correct the width, which is measured across the wall, or the build-up");
    } else if offset.abs() + whole / 2.0 > width / 2.0 {
        t.fault(Kind::Contradiction, "the wall stands beyond its edge")
            .at(t.place("offset"), "from the middle of the footing to the middle of the wall")
            .and(owner.place("build_up"), label)
            .allowed("an offset that leaves the whole thickness of the wall on the footing")
            .help("correct the offset, the width or the build-up");
    }
}
