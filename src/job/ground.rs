//! `[[storeys]]`, `[removed]`, `[[bracing]]` and `[stability]`: the house around the returns.

use super::limits::{Limits, Odd};
use super::names::{Names, Seen, known};
use super::plan::plan_length;
use super::reader::Table;
use crate::building::{
    Along, BracingWall, BuildUp, Ends, FloorKind, PlanWall, Removed, ShareBy, Stability, Stands, Storey,
};
use crate::error::Kind;
use crate::quantity::{Force, Length};

/// Clear height of a storey, and of every wall in it.
pub const HEIGHT: Limits = Limits::new(1.5, 6.0, "m")
    .odd(&[Odd::Below(2.0, "low for a storey"), Odd::Above(3.6, "high for a storey of a house")]);
pub(super) const TOTAL_HEIGHT: Limits =
    Limits::new(1.5, 30.0, "m").odd(&[Odd::Above(15.0, "tall for a masonry house")]);
/// A place on the plan.
pub const ON_PLAN: Limits = Limits::new(-100.0, 100.0, "m");
pub(super) const REMOVED_LENGTH: Limits =
    Limits::new(0.3, 20.0, "m").odd(&[Odd::Above(8.0, "long for a wall of a house")]);
pub(super) const WALL_LENGTH: Limits =
    Limits::new(0.05, 50.0, "m").odd(&[Odd::Above(20.0, "long for one wall of a house")]);
/// Height of wind face that one floor or roof collects.
pub const STRIP: Limits =
    Limits::new(0.5, 15.0, "m").odd(&[Odd::Above(6.0, "more than a storey and a gable")]);
pub(super) const FORCE_ABOVE: Limits =
    Limits::new(0.0, 1000.0, "kN").odd(&[Odd::Above(100.0, "much for a house")]);
pub(super) const STOREY_LOAD: Limits =
    Limits::new(0.0, 20000.0, "kN").odd(&[Odd::Above(3000.0, "much for a house")]);

/// Farthest that a bracing wall may stand beyond the end of the wind face: about a wall's thickness.
const BEYOND: Length = Length::new(600.0);
/// Differences between the plan and a measured length that are only rounding.
pub const DRAWN: Length = Length::new(50.0);
/// Height of wind face that may stay out of the sum without a word.
const UNCOUNTED: Length = Length::new(300.0);

/// Reads one storey.
pub fn storey(t: &Table<'_>) -> Option<Storey> {
    let mark = t.need("mark").line();
    let clear_height: Option<Length> = t.need("clear_height").quantity(&HEIGHT);
    let floor_above = t.need("floor_above").choice(FloorKind::WORDS, FloorKind::from_word);
    let total_height: Option<Length> = t.need("total_height").quantity(&TOTAL_HEIGHT);
    if let (Some(clear), Some(total)) = (clear_height, total_height)
        && total < clear
    {
        t.clash("the structure is lower than its own storey", "total_height", "clear_height")
            .allowed("a total height, from this storey's base to the top of the structure, of at least the clear height")
            .help("correct one of the two");
        return None;
    }
    Some(Storey {
        mark: mark?,
        clear_height: clear_height?,
        floor_above: floor_above?,
        total_height: total_height?,
    })
}

/// Holds storeys against the one below: lowest first, and a roof over the last one only.
pub fn stacked(storeys: &Names<'_, Storey>) {
    let all: Vec<_> = storeys.iter().filter_map(|s| Some((s, s.item.as_ref()?))).collect();
    for pair in all.windows(2) {
        let [(below, low), (above, high)] = pair else { continue };
        if high.total_height >= low.total_height {
            above
                .table
                .fault(
                    Kind::Contradiction,
                    "more stands above its base than above that of the storey before it",
                )
                .at(above.table.place("total_height"), "from this storey's base")
                .and(below.table.place("total_height"), "from the base of the storey before")
                .allowed("storeys lowest first; each total height less than the one before")
                .help("put the storeys in order, or correct one of the two heights");
        }
        if low.floor_above == FloorKind::Roof {
            below
                .table
                .fault(Kind::Contradiction, "it has the roof above, but another storey follows")
                .at(below.table.place("floor_above"), "roof")
                .and(above.place.clone(), "a storey above it")
                .allowed("\"roof\" above the last storey only")
                .help("write \"timber\" or \"concrete\", or put the storeys in order, lowest first");
        }
    }
}

/// Reads `[removed]`.
pub fn removed<'a>(
    t: &Table<'a>,
    plan: &Names<'a, PlanWall>,
    build_ups: &Names<'a, BuildUp>,
    storeys: &Names<'a, Storey>,
) -> Option<Removed> {
    let entry = t.need("wall");
    let wall = if plan.is_empty() { entry.line() } else { plan.refer(&entry) };
    let drawn = wall.as_ref().and_then(|w| plan.item(w));
    let build_up = match drawn {
        Some(line) if !t.has("build_up") => Some(line.build_up.clone()),
        _ => build_ups.refer(&t.need("build_up")),
    };
    let length: Option<Length> = match drawn {
        Some(line) if !t.has("length") => Some(plan_length(line)),
        _ => t.need("length").quantity(&REMOVED_LENGTH),
    };
    let storey = match drawn.map(|line| line.storeys.as_slice()) {
        Some([only]) if !t.has("storey") => Some(only.clone()),
        _ => storeys.refer(&t.need("storey")),
    };
    let carried = t.need("carried").text();
    let braced = t.need("braced").text();
    t.finish();

    if let Some(on_plan) = wall.as_ref().and_then(|w| plan.get(w))
        && let Some(line) = &on_plan.item
    {
        if !line.removed {
            t.fault(Kind::Contradiction, format_args!("\"{}\" stays on the plan", on_plan.name))
                .at(t.place("wall"), "comes out")
                .and(on_plan.place.clone(), "has no `removed = true`")
                .allowed("a plan wall with removed = true")
                .help("add removed = true to that wall of the plan, or name the wall that comes out");
        } else {
            against_plan(t, on_plan, line, build_up.as_deref(), length);
            for other in
                plan.iter().filter(|o| o.item.as_ref().is_some_and(|w| w.removed && w.mark != line.mark))
            {
                other
                    .table
                    .fault(
                        Kind::Contradiction,
                        "it comes out on the plan, but another wall is named as the one removed",
                    )
                    .at(other.table.place("removed"), "comes out")
                    .and(t.place("wall"), "the wall removed")
                    .allowed("one wall that comes out")
                    .help("take removed = true out here, or name this wall under [removed]");
            }
        }
    }
    Some(Removed {
        wall: wall?,
        build_up: build_up?,
        length: length?,
        storey: storey?,
        carried: carried?,
        braced: braced?,
    })
}

/// Holds the removed wall against its line on the plan.
fn against_plan(
    t: &Table<'_>,
    on_plan: &Seen<'_, PlanWall>,
    line: &PlanWall,
    build_up: Option<&str>,
    length: Option<Length>,
) {
    if build_up.is_some_and(|b| b != line.build_up) {
        t.fault(Kind::Contradiction, "the wall has two build-ups")
            .at(t.place("build_up"), "here")
            .and(on_plan.table.place("build_up"), "on the plan")
            .allowed("the same build-up in both places")
            .help("correct one of the two");
    }
    if length.is_some_and(|l| l > plan_length(line) + DRAWN) {
        t.fault(Kind::Contradiction, "more comes out than the plan has of this wall")
            .at(t.place("length"), "taken out")
            .and(on_plan.table.place("to"), format!("{:.0} mm long on the plan", plan_length(line).base()))
            .allowed("at most the length on the plan")
            .help("correct the length or the plan");
    }
}

/// Reads one bracing wall.
pub fn bracing_wall<'a>(t: &Table<'a>, build_ups: &Names<'a, BuildUp>) -> Option<BracingWall> {
    let mark = t.need("mark").line();
    let along = t.need("along").choice(Along::WORDS, Along::from_word);
    let at = t.need("at").quantity(&ON_PLAN);
    let other_at = t.may("other_at").quantity(&ON_PLAN);
    let length = t.need("length").quantity(&WALL_LENGTH);
    let height = t.need("height").quantity(&HEIGHT);
    let build_up = build_ups.refer(&t.need("build_up"));
    let stands = t.need("stands").choice(Stands::WORDS, Stands::from_word);
    let ends = t.may("ends");
    let ends =
        if ends.value.is_some() { ends.choice(Ends::WORDS, Ends::from_word) } else { Some(Ends::Cantilever) };
    Some(BracingWall {
        mark: mark?,
        along: along?,
        at: at?,
        other_at,
        length: length?,
        height: height?,
        build_up: build_up?,
        stands: stands?,
        ends: ends?,
    })
}

/// Reads `[stability]`; the walls are put in by the caller once everything has referred to them.
pub fn stability<'a>(
    t: &Table<'a>,
    storeys: &Names<'a, Storey>,
    bracing: &Names<'a, BracingWall>,
    removed: Option<&Table<'a>>,
) -> Option<Stability> {
    let storey = storeys.refer(&t.need("storey"));
    let wind_along = t.need("wind_along").choice(Along::WORDS, Along::from_word);
    let front: Option<(Length, Length)> = t.need("front").pair(&ON_PLAN);
    let strip_height: Option<Length> = t.need("strip_height").quantity(&STRIP);
    let share_by = t.need("share_by").choice(ShareBy::WORDS, ShareBy::from_word);
    let force_above: Option<Force> = t.may("storeys_above_force").quantity(&FORCE_ABOVE);
    let dead = t.need("vertical_load_dead").quantity(&STOREY_LOAD);
    let imposed = t.need("vertical_load_imposed").quantity(&STOREY_LOAD);
    t.finish();

    let backwards = front.is_some_and(|(a, b)| b <= a);
    if backwards {
        t.fault(Kind::NotAllowed, "the wind face ends before it begins")
            .at(t.place("front"), "front")
            .allowed("the smaller position first: [\"0 m\", \"6.4 m\"]")
            .help("put the two the other way round");
    }
    let front = front.filter(|_| !backwards);
    if let (Some(removed), Some(name)) = (removed, &storey)
        && removed.peek("storey").is_some_and(|s| s.trim() != name)
    {
        t.fault(Kind::Contradiction, "the wall comes out of another storey than the one judged")
            .at(t.place("storey"), "judged")
            .and(removed.place("storey"), "the wall's storey")
            .allowed("the storey of the removed wall")
            .help("name the same storey in both places");
    }
    if let Some(seen) = storey.as_ref().and_then(|s| storeys.get(s))
        && let Some(item) = &seen.item
    {
        floor_can_share(t, share_by, &seen.table, item);
        face_height(t, strip_height, &seen.table, item);
    }
    if let (Some(along), Some(front)) = (wind_along, front) {
        places(t, along, front, bracing);
    }
    Some(Stability {
        storey: storey?,
        wind_along: wind_along?,
        front: front?,
        strip_height: strip_height?,
        share_by: share_by?,
        force_above: force_above.unwrap_or(Force::ZERO),
        dead: dead?,
        imposed: imposed?,
        walls: Vec::new(),
        from_plan: false,
    })
}

fn floor_can_share(t: &Table<'_>, share_by: Option<ShareBy>, storey_table: &Table<'_>, storey: &Storey) {
    if share_by == Some(ShareBy::Stiffness) && storey.floor_above != FloorKind::Concrete {
        t.fault(
            Kind::Contradiction,
            format_args!(
                "a {} floor does not share wind by the stiffness of the walls",
                storey.floor_above.word()
            ),
        )
        .at(t.place("share_by"), "needs a stiff floor")
        .and(storey_table.place("floor_above"), "what is above")
        .allowed("\"stiffness\" under a concrete floor, \"tributary width\" under any")
        .help("write share_by = \"tributary width\", or correct the floor above the storey");
    }
    if share_by == Some(ShareBy::Width) && storey.floor_above == FloorKind::Concrete {
        t.warn("`share_by` is \"tributary width\" under a concrete floor, which shares by stiffness");
    }
}

fn face_height(t: &Table<'_>, strip: Option<Length>, storey_table: &Table<'_>, storey: &Storey) {
    let Some(strip) = strip else { return };
    if strip > storey.total_height {
        t.fault(Kind::Contradiction, "the strip of wind face is higher than the structure")
            .at(t.place("strip_height"), "strip")
            .and(storey_table.place("total_height"), "total height")
            .allowed("half this storey and half the one above, or up to the ridge")
            .help("correct one of the two");
        return;
    }
    let uncounted = storey.total_height - storey.clear_height * 0.5 - strip;
    if uncounted > UNCOUNTED && !t.has("storeys_above_force") {
        t.warn(format_args!(
            "about {:.1} m of wind face above the strip is not counted, because `storeys_above_force` is not given",
            uncounted.base() / 1e3
        ));
    }
}

fn places(t: &Table<'_>, along: Along, front: (Length, Length), bracing: &Names<'_, BracingWall>) {
    let mut after = 0;
    for seen in bracing.iter() {
        let Some(wall) = seen.item.as_ref().filter(|w| w.along == along) else { continue };
        after += usize::from(wall.stands != Stands::Before);
        if wall.at < front.0 - BEYOND || wall.at > front.1 + BEYOND {
            seen.table
                .fault(Kind::Contradiction, "it stands outside the wind face")
                .at(seen.table.place("at"), "position")
                .and(t.place("front"), "extent of the wind face")
                .allowed("a position within the front, across the wind")
                .help("correct one of the two; both are measured across the wind");
        }
    }
    if after == 0 && bracing.iter().all(|b| b.item.is_some()) {
        t.fault(Kind::Contradiction, format_args!("no wall braces along {} after the removal", along.word()))
            .at(t.place("wind_along"), "direction of the wind")
            .and(t.head(), "has no bracing wall in this direction")
            .allowed("at least one [[bracing]] wall along the wind that stands after")
            .help("add the walls and returns that brace, or correct their `along` and `stands`");
    }
}

/// Reads the marks of bracing walls that hold a head in plane: each there, along the wind, standing after.
pub fn props<'a>(
    entry: &super::entry::Entry<'a>,
    bracing: &Names<'a, BracingWall>,
    wind_along: Option<Along>,
    own_mark: Option<&str>,
) -> Option<Vec<String>> {
    let wanted = "a list of marks of bracing walls: [\"party wall\", \"W4\"]";
    let items = entry.list(wanted)?;
    if items.is_empty() {
        entry.wrong_type(wanted, "name the walls that take the reaction, or write head = \"free\"");
    }
    let mut marks = Vec::new();
    for item in &items {
        let mark = bracing.refer(item)?;
        if marks.contains(&mark) {
            item.fault(Kind::NotAllowed, format_args!("\"{mark}\" props it twice"))
                .at(item.place(), "again")
                .allowed("each wall once")
                .help("take one of them out");
        }
        if own_mark == Some(mark.as_str()) {
            item.fault(Kind::NotAllowed, "it cannot prop itself")
                .at(item.place(), "its own mark")
                .allowed("other bracing walls")
                .help("name the walls that take the reaction, or write head = \"free\"");
        }
        if let Some(seen) = bracing.get(&mark)
            && let Some(wall) = &seen.item
        {
            if wall.stands == Stands::Before {
                item.fault(Kind::Contradiction, format_args!("\"{mark}\" props it, but comes out"))
                    .at(item.place(), "props")
                    .and(seen.table.place("stands"), "stands before only")
                    .allowed("walls that stand after the removal")
                    .help("name a wall that stays");
            }
            if wind_along.is_some_and(|along| along != wall.along) {
                item.fault(
                    Kind::Contradiction,
                    format_args!("\"{mark}\" props it, but runs across the wind"),
                )
                .at(item.place(), "props")
                .and(seen.table.place("along"), "its direction")
                .allowed("walls along the wind")
                .help("name a wall along the wind");
            }
        }
        marks.push(mark);
    }
    Some(marks)
}

/// Reads a list of marks that must be there.
pub fn marks(entry: &super::entry::Entry<'_>, names: &[&str]) -> Option<Vec<String>> {
    if entry.value.is_none() {
        return Some(Vec::new());
    }
    let items = entry.list("a list of marks: [\"R1\", \"P1\"]")?;
    let read = |item: &super::entry::Entry<'_>| {
        item.line()
            .filter(|mark| known(item, mark, "return, bearing, panel, floor edge or bracing wall", names))
    };
    items.iter().map(read).collect::<Vec<_>>().into_iter().collect()
}
