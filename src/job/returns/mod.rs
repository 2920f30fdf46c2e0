//! `[[returns]]`: what stays and braces.

mod against;
mod ends;

use super::bearing;
use super::entry::quoted;
use super::footing;
use super::ground::{DRAWN, HEIGHT};
use super::limits::{Limits, Odd};
use super::names::{Names, Seen};
use super::plan::plan_length;
use super::reader::{Reader, Span, Table};
use crate::building::found::{self, Found, FoundReturn};
use crate::building::{
    Acts, BracingWall, BuildUp, Cause, Load, PlanWall, Restraint, Return, ShareBy, Stability, Storey,
};
use crate::error::Kind;
use crate::quantity::{Length, Num, Stress};

use against::restraint_fits;
pub use against::{against_storey, together};
use ends::{base, from_above, head, path};

/// Most characters of a mark.
pub const MARK: usize = 12;

pub(super) const LENGTH: Limits = Limits::new(50.0, 6000.0, "mm").odd(&[
    Odd::Below(200.0, "a nib this short is a scar on the wall more than a return; measure it again"),
    Odd::Above(2500.0, "this is a wall more than a return"),
]);
pub(super) const POSITION: Limits = Limits::new(-100.0, 100.0, "m");
pub(super) const MU: Limits =
    Limits::new(0.1, 1.0, "").odd(&[Odd::Above(0.6, "high for a joint with a damp-proof course")]);
pub(super) const TRIBUTARY: Limits =
    Limits::new(0.0, 20.0, "m").odd(&[Odd::Above(6.0, "wide for one return")]);
pub(super) const SUPPORTED: Limits =
    Limits::new(1.5, 30.0, "m").odd(&[Odd::Above(12.0, "tall for the wall of a house")]);
pub(super) const OPENING: Limits = Limits::new(0.0, 20.0, "m");
/// A force on a wall of a house.
pub const FORCE: Limits =
    Limits::new(0.0, 2000.0, "kN").odd(&[Odd::Above(300.0, "much for a wall of a house")]);
pub(super) const MOMENT: Limits =
    Limits::new(0.0, 2000.0, "kNm").odd(&[Odd::Above(100.0, "much for a return")]);

/// What a return may refer to.
pub struct Around<'r, 'a> {
    /// Build-ups.
    pub build_ups: &'r Names<'a, BuildUp>,
    /// Storeys.
    pub storeys: &'r Names<'a, Storey>,
    /// Walls of the plan.
    pub plan: &'r Names<'a, PlanWall>,
    /// Bracing walls.
    pub bracing: &'r Names<'a, BracingWall>,
    /// What the plan shows of the removal.
    pub found: &'r Found,
    /// The storey of the wall that comes out, by mark.
    pub found_in: &'r str,
    /// Whether floors stand on the plan, so that its loads are led down.
    pub led: bool,
    /// The storey's stability, with its table.
    pub stability: Option<(&'r Table<'a>, &'r Stability)>,
}

/// Holds a return against the plan wall of the same mark, whose loads it takes.
fn against_plan(t: &Table<'_>, seen: &Seen<'_, PlanWall>, length: Length, found: Option<&FoundReturn>) {
    let Some(wall) = &seen.item else { return };
    let drawn = found.map_or(plan_length(wall), |f| f.length);
    if (drawn - length).abs() > DRAWN {
        t.fault(Kind::Contradiction, "the return is not as long as its wall on the plan")
            .at(t.place("length"), "here")
            .and(seen.table.place("to"), format!("{:.0} mm long on the plan", drawn.base()))
            .allowed("the same length in both places")
            .help("correct one of the two");
    }
}

/// Reads one return.
pub fn read<'a>(t: &Table<'a>, around: &Around<'_, 'a>) -> Option<Return> {
    let mark = t.need("mark").mark(MARK);
    let drawn = mark.as_ref().filter(|_| around.led).and_then(|m| around.plan.item(m));
    let found = mark.as_ref().and_then(|m| around.found.of_return(m));
    let title = match found {
        Some(f) if !t.has("title") => Some(found::title_of_return(f)),
        _ => t.need("title").line(),
    };
    let build_up = match drawn {
        Some(wall) if !t.has("build_up") => Some(wall.build_up.clone()),
        _ => around.build_ups.refer(&t.need("build_up")),
    };
    let storey = match drawn {
        Some(wall) if !t.has("storey") && !wall.storeys.is_empty() => Some(wall.storeys[0].clone()),
        _ => around.storeys.refer(&t.need("storey")),
    };
    let length: Option<Length> = match drawn {
        Some(wall) if !t.has("length") => Some(found.map_or(plan_length(wall), |f| f.length)),
        _ => t.need("length").quantity(&LENGTH),
    };
    let of_storey = storey.as_ref().and_then(|s| around.storeys.item(s)).map(|s| s.clear_height);
    let height: Option<Length> = match (drawn, of_storey) {
        (Some(_), Some(clear)) if !t.has("height") => Some(clear),
        _ => t.need("height").quantity(&HEIGHT),
    };
    let position = t.may("position").pair(&POSITION);
    let (base, base_reason) = base(t, found.is_some());
    let mu = t.may("mu").factor(found::MU_USUAL, &MU);
    let head = head(t, around, mark.as_deref());
    let (path, strip_height) = path(t, found.map(|f| f.strip));
    let tributary_width = match found {
        Some(f) if !t.has("tributary_width") => Some(f.tributary),
        _ => t.need("tributary_width").quantity(&TRIBUTARY),
    };
    let from_above = from_above(t);
    let wind = own_wind(t, around);
    let floor = storey.as_ref().and_then(|s| around.storeys.item(s)).and_then(found::restraint);
    let restraint = match (found, floor) {
        (Some(_), Some(held)) if !t.has("restraint") => Some(held),
        _ => t.need("restraint").choice(Restraint::WORDS, Restraint::from_word),
    };
    let supported_wall_height = match found {
        Some(f) if !t.has("supported_wall_height") => Some(f.supported),
        _ => t.need("supported_wall_height").quantity(&SUPPORTED),
    };
    let nearest_opening = match found {
        Some(f) if !t.has("nearest_opening") => f.nearest_opening,
        _ => t.may("nearest_opening").quantity(&OPENING),
    };
    let far_end = t.may("far_end").text();
    let acts = t.may("acts");
    let acts =
        if acts.value.is_some() { acts.choice(Acts::WORDS, Acts::from_word) } else { Some(Acts::Loaded) };
    let wall = build_up.as_ref().and_then(|b| around.build_ups.item(b));
    let loads: Vec<Option<Load>> = t
        .may("loads")
        .tables(&format!("{}, load", t.name), "what")
        .iter()
        .map(|lt| bearing::load(lt, t, length, wall))
        .collect();
    let junction = match found {
        Some(f) if !t.has("junction") => Some(found::junction(f)),
        _ => t
            .need("junction")
            .table(&format!("{}, junction", t.name))
            .and_then(|j| bearing::junction(&j, around, found)),
    };
    let footing = if t.has("footing") {
        t.need("footing")
            .table(&format!("{}, footing", t.name))
            .and_then(|f| footing::read(&f, t, wall))
            .map(Some)
    } else {
        Some(None)
    };

    if let Some(seen) = storey.as_ref().and_then(|s| around.storeys.get(s)) {
        against_storey(t, height, seen.item.as_ref(), &seen.table);
        restraint_fits(t, restraint, seen.item.as_ref(), &seen.table);
    }
    if let (Some(height), Some(supported)) = (height, supported_wall_height)
        && supported < height
    {
        t.clash("the wall that it buttresses is lower than the return", "supported_wall_height", "height")
            .allowed("the overall height of the supported wall, all storeys")
            .help("correct one of the two");
    }
    if acts == Some(Acts::Each) && wall.is_some_and(|w| w.leaves.len() == 1) {
        t.clash("each leaf is to act, but the build-up has one leaf", "acts", "build_up")
            .allowed("\"each leaf\" with two leaves")
            .help("take `acts` out, or correct the build-up");
    }
    if let (Some(width), Some((st, stability))) = (tributary_width, around.stability)
        && width > stability.front.1 - stability.front.0 + Length::new(1.0)
    {
        t.fault(Kind::Contradiction, "its tributary width is more than the whole wind face")
            .at(t.place("tributary_width"), "tributary width")
            .and(st.place("front"), "extent of the wind face")
            .allowed("half the distance to the next support on each side")
            .help("correct one of the two");
    }
    if tributary_width == Some(Length::ZERO) {
        t.warn("tributary width is 0: no wind at all comes to it");
    }
    let on_plan = mark.as_ref().and_then(|m| around.plan.get(m)).filter(|_| around.led);
    if let (Some(seen), Some(length)) = (on_plan, length) {
        against_plan(t, seen, length, found);
    }
    if !t.has("loads") && on_plan.is_none() {
        t.warn("no load from above is given; its own weight alone holds it down");
    }
    Some(Return {
        mark: mark?,
        title: title?,
        build_up: build_up?,
        storey: storey?,
        length: length?,
        height: height?,
        position,
        base: base?,
        base_reason: base_reason?,
        mu: mu.map(|c| Cause { value: Num::from(c.value), reason: c.reason })?,
        head: head?,
        path: path?,
        tributary_width: tributary_width?,
        strip_height,
        from_above: from_above?,
        wind,
        restraint: restraint?,
        supported_wall_height: supported_wall_height?,
        nearest_opening,
        far_end,
        acts: acts?,
        loads: loads.into_iter().collect::<Option<_>>()?,
        junction: junction?,
        footing: footing?,
    })
}

/// A pressure of its own, where the floor does not share the force of the whole storey.
fn own_wind(t: &Table<'_>, around: &Around<'_, '_>) -> Option<Cause<Stress>> {
    let shared = around.stability.is_some_and(|(_, s)| s.share_by == ShareBy::Stiffness);
    if t.has("wind") && shared {
        let whole = around.stability.map_or_else(|| t.head(), |(st, _)| st.place("share_by"));
        t.fault(
            Kind::Contradiction,
            "a return cannot have a wind of its own where the floor shares by stiffness",
        )
        .at(t.place("wind"), "its own pressure")
        .and(whole, "shared by stiffness")
        .allowed("`wind` on a return with share_by = \"tributary width\"")
        .help("state the pressure of the whole building under [wind.stated]");
    }
    t.may("wind").cause(|e| e.quantity(&super::wind::PRESSURE))
}

/// Marks of the footings with their places, whether the rest of them could be read or not.
pub fn footings(returns: &Names<'_, Return>) -> Vec<(String, Span)> {
    returns.iter().filter_map(|seen| seen.table.peek_under("footing", "mark")).collect()
}

/// Records the mark of a footing that an earlier one has.
pub fn footing_twice(reader: &Reader, earlier: &[(String, Span)], mark: &str, place: &Span) {
    let Some((_, first)) = earlier.iter().find(|(m, _)| m.to_lowercase() == mark.to_lowercase()) else {
        return;
    };
    reader
        .fault(Kind::Contradiction, format!("two footings have the mark {}", quoted(mark)))
        .at(place.clone(), "here again")
        .and(first.clone(), "first")
        .allowed("each mark once; case does not tell marks apart")
        .help("give one of them another mark");
}
