//! `[[returns]]`: what stays and braces.

use super::bearing;
use super::entry::{Entry, quoted};
use super::footing;
use super::ground::{self, DRAWN, HEIGHT, STRIP};
use super::limits::{Limits, Odd};
use super::names::{Names, Seen};
use super::plan::plan_length;
use super::reader::{Reader, Span, Table};
use super::words::HEADS;
use crate::building::found::{self, Found, FoundReturn};
use crate::building::{
    Acts, BaseJoint, BracingWall, BuildUp, Cause, FloorKind, FromAbove, Head, Load, Path, PlanWall,
    Restraint, Return, ShareBy, Stability, Stands, Storey,
};
use crate::error::Kind;
use crate::quantity::{Length, Num, Stress};

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

/// Difference of a wall's height from its storey's that passes without a word.
const HEIGHT_DIFFERS: Length = Length::new(300.0);

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

/// A base that is not spoken of is a dpc where the plan shows the return.
fn base(t: &Table<'_>, found: bool) -> (Option<BaseJoint>, Option<String>) {
    let base = match found && !t.has("base") {
        true => Some(BaseJoint::Dpc),
        false => t.need("base").choice(BaseJoint::WORDS, BaseJoint::from_word),
    };
    match (base, t.has("base_reason")) {
        (Some(BaseJoint::Bonded), false) => {
            t.fault(Kind::Missing, "the base is bonded, but `base_reason` is missing")
                .at(t.place("base"), "bonded")
                .allowed("\"bonded\" with the reason, or \"dpc\"")
                .help("add base_reason = \"who saw it, where and when\", or write base = \"dpc\"");
            (base, None)
        }
        (Some(BaseJoint::Dpc), true) => {
            t.clash("`base_reason` is why a base is bonded, but the base is a dpc", "base_reason", "base")
                .allowed("`base_reason` with base = \"bonded\"")
                .help("take `base_reason` out, or correct the base");
            (base, None)
        }
        (Some(BaseJoint::Dpc), false) => (base, Some(String::new())),
        _ => (base, t.may("base_reason").text()),
    }
}

fn head<'a>(t: &Table<'a>, around: &Around<'_, 'a>, mark: Option<&str>) -> Option<Head> {
    let word = t.need("head").pick(HEADS);
    let given = t.has("propped_by");
    let along = around.stability.map(|(_, s)| s.wind_along);
    let entry = t.need("propped_by");
    let by = match given {
        false => None,
        // Without bracing walls of its own the job names walls of its plan.
        true if around.led && around.bracing.is_empty() => props_on_plan(&entry, around, mark),
        true => ground::props(&entry, around.bracing, along, mark),
    };
    match (word?, given) {
        (true, false) => {
            t.fault(Kind::Contradiction, "the head is propped, but `propped_by` is missing")
                .at(t.place("head"), "propped by what?")
                .and(t.head(), "has no `propped_by`")
                .allowed("\"propped\" with the marks of the walls that take the reaction, or \"free\"")
                .help("add propped_by = [\"...\"] with marks of [[bracing]] walls, or write head = \"free\"");
            None
        }
        (false, true) => {
            t.clash("the head is free, but `propped_by` names walls", "head", "propped_by")
                .allowed("`propped_by` with head = \"propped\"")
                .help("write head = \"propped\", or take `propped_by` out");
            None
        }
        (true, true) => by.map(Head::Propped),
        (false, false) => Some(Head::Free),
    }
}

/// Walls of the plan that take the reaction at a head: they stay, and they are not the return.
fn props_on_plan<'a>(entry: &Entry<'a>, around: &Around<'_, 'a>, own: Option<&str>) -> Option<Vec<String>> {
    let items = entry.list("a list of marks of plan walls: [\"party wall\", \"flank wall\"]")?;
    let mut marks = Vec::new();
    for item in &items {
        let mark = around.plan.refer(item)?;
        let removed = around.plan.item(&mark).is_some_and(|w| w.removed);
        if removed || own == Some(mark.as_str()) || marks.contains(&mark) {
            item.fault(Kind::NotAllowed, format_args!("\"{mark}\" cannot prop it"))
                .at(item.place(), if removed { "comes out" } else { "itself, or named twice" })
                .allowed("other walls of the plan that stay, each once")
                .help("name the walls that take the reaction, or write head = \"free\"");
            return None;
        }
        marks.push(mark);
    }
    Some(marks)
}

/// The path and the height that a floor collects; `drawn` where the plan shows it.
fn path(t: &Table<'_>, drawn: Option<Length>) -> (Option<Path>, Option<Length>) {
    let path = t.need("path").choice(Path::WORDS, Path::from_word);
    let strip = t.may("strip_height").quantity(&STRIP);
    let by_floor = matches!(path, Some(Path::UpAndDown | Path::Both));
    if by_floor && drawn.is_some() && !t.has("strip_height") {
        return (path, drawn);
    }
    match path {
        Some(Path::UpAndDown | Path::Both) if !t.has("strip_height") => {
            t.fault(Kind::Contradiction, "the floor brings wind to its head, but `strip_height` is missing")
                .at(t.place("path"), "through the floor")
                .and(t.head(), "has no `strip_height`")
                .allowed("the height of wind face that the floor collects")
                .help(
                    "add strip_height = \"... m\": half this storey and half the one above, or to the ridge",
                );
        }
        Some(Path::Sideways) if t.has("strip_height") => {
            t.clash(
                "the wind comes sideways, but `strip_height` is what a floor collects",
                "strip_height",
                "path",
            )
            .allowed("`strip_height` with path = \"up and down\" or \"both\"")
            .help("take `strip_height` out, or name the other path");
        }
        _ => {}
    }
    (path, strip)
}

fn from_above(t: &Table<'_>) -> Option<FromAbove> {
    if !t.has("from_above") {
        return Some(FromAbove::default());
    }
    let above = t.need("from_above").table(&format!("{}, from above", t.name))?;
    let force = above.need("force").quantity(&FORCE);
    let moment = above.need("moment").quantity(&MOMENT);
    above.finish();
    Some(FromAbove { force: force?, moment: moment? })
}

/// Holds the height of a return or panel against its storey.
pub fn against_storey(
    t: &Table<'_>,
    height: Option<Length>,
    storey: Option<&Storey>,
    storey_table: &Table<'_>,
) {
    let (Some(height), Some(storey)) = (height, storey) else { return };
    if height > storey.total_height {
        t.fault(Kind::Contradiction, "it is higher than the whole structure above its storey's base")
            .at(t.place("height"), "height")
            .and(storey_table.place("total_height"), "total height")
            .allowed("the clear height between its supports")
            .help("correct one of the two");
    } else if (height - storey.clear_height).abs() > HEIGHT_DIFFERS {
        t.warn(format_args!(
            "height is {:.0} mm, but storey \"{}\" is {:.0} mm high",
            height.base(),
            storey.mark,
            storey.clear_height.base()
        ));
    }
}

fn restraint_fits(
    t: &Table<'_>,
    restraint: Option<Restraint>,
    storey: Option<&Storey>,
    storey_table: &Table<'_>,
) {
    let (Some(Restraint::Concrete), Some(storey)) = (restraint, storey) else { return };
    if storey.floor_above != FloorKind::Concrete {
        t.fault(Kind::Contradiction, "a concrete floor is to hold its head, but the storey has none above")
            .at(t.place("restraint"), "what holds head and foot")
            .and(storey_table.place("floor_above"), "what is above")
            .allowed("\"concrete floor\" under a concrete floor")
            .help("write restraint = \"timber floor\" or \"none\", or correct the floor above the storey");
    }
}

/// Holds the returns against each other: a wall that props another must not need a prop itself, and
/// more tributary width than front is said aloud.
pub fn together(returns: &Names<'_, Return>, around: &Around<'_, '_>) {
    for seen in returns.iter() {
        let Some(Return { head: Head::Propped(by), .. }) = &seen.item else { continue };
        for mark in by {
            if let Some(prop) = returns.get(mark)
                && matches!(&prop.item, Some(Return { head: Head::Propped(_), .. }))
            {
                seen.table
                    .fault(Kind::Contradiction, format_args!("\"{mark}\" props it, and needs a prop itself"))
                    .at(seen.table.place("propped_by"), "propped by")
                    .and(prop.table.place("head"), "propped as well")
                    .allowed("walls whose own head is free")
                    .help("name the walls at which the force ends");
            }
        }
    }
    for seen in returns.iter() {
        if let (Some(wall), Some(item)) = (around.bracing.get(&seen.name), &seen.item) {
            same_wall(seen, item, wall);
        }
    }
    let Some((st, stability)) = around.stability else { return };
    for seen in returns.iter().filter(|s| s.item.as_ref().is_some_and(|r| r.storey != stability.storey)) {
        seen.table
            .fault(Kind::Contradiction, "it stands in another storey than the one judged")
            .at(seen.table.place("storey"), "its storey")
            .and(st.place("storey"), "the storey judged")
            .allowed("returns in the storey of the removed wall")
            .help("correct one of the two; what is above comes in as `from_above`");
    }
    let sum: Length = returns.iter().filter_map(|s| s.item.as_ref()).map(|r| r.tributary_width).sum();
    let front = stability.front.1 - stability.front.0;
    if sum > front + Length::new(1.0) {
        st.warn(format_args!(
            "the returns' tributary widths add up to {:.2} m on a front of {:.2} m",
            sum.base() / 1e3,
            front.base() / 1e3
        ));
    }
}

/// A bracing wall with the mark of a return is that return.
fn same_wall(seen: &Seen<'_, Return>, item: &Return, wall: &Seen<'_, BracingWall>) {
    let Some(bracing) = &wall.item else { return };
    if (item.length - bracing.length).abs() > Length::new(1.0) {
        seen.table
            .fault(Kind::Contradiction, "it has another length as a bracing wall")
            .at(seen.table.place("length"), "as a return")
            .and(wall.table.place("length"), "as a bracing wall")
            .allowed("one length for one mark")
            .help("correct one of the two");
    }
    if bracing.stands == Stands::Before {
        seen.table
            .fault(Kind::Contradiction, "a return stays, but the bracing wall of its mark comes out")
            .at(seen.table.place("mark"), "stays")
            .and(wall.table.place("stands"), "stands before only")
            .allowed("a return that stands after the removal")
            .help("write stands = \"after\" for the piece that stays, and give the wall that comes out its own mark");
    }
}
