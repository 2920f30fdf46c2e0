//! `[plan]` and `[area_loads]`: walls as lines, floors and beams.

use toml::de::DeValue;

use super::entry::quoted;
use super::ground::ON_PLAN;
use super::limits::{Limits, Odd, nearest, one_of};
use super::names::Names;
use super::reader::{Reader, Span, Table};
use super::words::{NORTH, TURN};
use crate::building::found;
use crate::building::{
    Along, AreaLoad, BuildUp, Building, Frame, PlanBeam, PlanFloor, PlanOpening, PlanWall, Side, Storey,
    TakeDown, take_down,
};
use crate::error::Kind;
use crate::quantity::{Length, LineLoad, Stress};
use crate::standards::tables::selfweight::{self, Per};

pub(super) const AREA: Limits =
    Limits::new(0.0, 20.0, "kN/m2").odd(&[Odd::Above(8.0, "much for a floor of a house")]);
pub(super) const DEAD: Limits = Limits::new(0.05, 20.0, "kN/m2")
    .odd(&[Odd::Below(0.2, "little for a floor or roof"), Odd::Above(8.0, "much for a floor of a house")]);
pub(super) const BEAM: Limits =
    Limits::new(0.0, 10.0, "kN/m").odd(&[Odd::Above(2.0, "heavy for a beam in a house")]);
/// 100 mm as the least for a lintel, and 150 mm for wider openings: common practice, no published source.
pub(super) const LINTEL: Limits =
    Limits::new(20.0, 600.0, "mm").odd(&[Odd::Below(100.0, "short for the bearing of a lintel")]);
pub(super) const BEARING: Limits =
    Limits::new(50.0, 600.0, "mm").odd(&[Odd::Below(90.0, "short for a bearing")]);
pub(super) const WIDTH: Limits =
    Limits::new(0.2, 10.0, "m").odd(&[Odd::Above(4.0, "wide for an opening in masonry")]);
pub(super) const OPENING: Limits = Limits::new(0.2, 6.0, "m");
pub(super) const SILL: Limits = Limits::new(0.0, 4.0, "m");
pub(super) const ALONG: Limits = Limits::new(0.0, 100.0, "m");

/// Reads the direction of north, degrees clockwise from the top of the page.
pub fn north(t: &Table<'_>) -> Option<f64> {
    let entry = t.need("north");
    match &entry.value {
        Some((DeValue::Integer(_) | DeValue::Float(_), _)) => entry.number(&TURN),
        _ => entry.pick(NORTH),
    }
}

/// Reads the sides on which neighbours adjoin: asked for where floors stand on the plan.
pub fn neighbours(t: &Table<'_>) -> Option<Vec<Side>> {
    let entry = if t.has("floors") { t.need("neighbours") } else { t.may("neighbours") };
    if !t.has("floors") && !t.has("neighbours") {
        return Some(Vec::new());
    }
    let items =
        entry.list("the sides of the plan on which a neighbour adjoins, in square brackets; [] for none")?;
    items.iter().map(|e| e.choice(Side::WORDS, Side::from_word)).collect()
}

/// Reads one wall of the plan.
pub fn wall<'a>(
    t: &Table<'a>,
    build_ups: &Names<'a, BuildUp>,
    around: &Names<'a, Storey>,
) -> Option<PlanWall> {
    let mark = t.need("mark").line();
    let build_up = build_ups.refer(&t.need("build_up"));
    let from: Option<(Length, Length)> = t.need("from").pair(&ON_PLAN);
    let to = t.need("to").pair(&ON_PLAN);
    let removed = t.may("removed").flag().unwrap_or(false);
    let storeys = marks(t, "storeys", around);
    let free_end = t.may("free_end").flag().unwrap_or(false);
    let openings: Vec<_> = t
        .may("openings")
        .tables(&format!("{}, opening", t.name), "")
        .iter()
        .map(|o| opening(o, around))
        .collect();
    if from.is_some() && from == to {
        t.clash("the wall begins and ends in one point", "to", "from")
            .allowed("two different points")
            .help("correct one of the two points");
        return None;
    }
    let openings: Vec<PlanOpening> = openings.into_iter().collect::<Option<_>>()?;
    let wall = PlanWall {
        mark: mark?,
        build_up: build_up?,
        from: from?,
        to: to?,
        removed,
        storeys: storeys?,
        free_end,
        openings,
    };
    in_order(t, &wall).then_some(wall)
}

/// Length of a wall on the plan.
pub fn plan_length(wall: &PlanWall) -> Length {
    let (dx, dy) = (wall.to.0 - wall.from.0, wall.to.1 - wall.from.1);
    Length::new(dx.base().hypot(dy.base()))
}

/// Reads one opening of a wall.
fn opening<'a>(t: &Table<'a>, storeys: &Names<'a, Storey>) -> Option<PlanOpening> {
    let storey = storeys.refer(&t.need("storey"));
    let from = t.need("from").quantity(&ALONG);
    let width = t.need("width").quantity(&WIDTH);
    let height: Option<Length> = t.need("height").quantity(&OPENING);
    let sill = if t.has("sill") { t.may("sill").quantity(&SILL) } else { Some(Length::ZERO) };
    let frame = frame(t);
    let bearing = lintel(t);
    t.finish();
    if let (Some(height), Some(sill), Some(seen)) =
        (height, sill, storey.as_ref().and_then(|s| storeys.item(s)))
        && height + sill > seen.clear_height
    {
        t.fault(Kind::Contradiction, "the opening is higher than its storey")
            .at(t.place("height"), "with its sill")
            .allowed(format!("a sill and height of {:.2} m together", seen.clear_height.base() / 1000.0))
            .help("correct the sill or the height");
        return None;
    }
    Some(PlanOpening {
        storey: storey?,
        from: from?,
        width: width?,
        sill: sill?,
        height: height?,
        frame: frame?,
        bearing: bearing?,
    })
}

/// How far the lintel of an opening bears at either end: `Some(None)` where the job does not say.
pub fn lintel(t: &Table<'_>) -> Option<Option<Length>> {
    if t.has("lintel") { t.may("lintel").quantity(&LINTEL).map(Some) } else { Some(None) }
}

/// How the frame of an opening passes the wind on; unknown where it is not said.
pub fn frame(t: &Table<'_>) -> Option<Frame> {
    let entry = t.may("frame");
    match &entry.value {
        Some(_) => entry.choice(Frame::WORDS, Frame::from_word),
        None => Some(Frame::Unknown),
    }
}

/// Whether the openings of each storey lie in the wall, apart from each other, in the order of the file.
fn in_order(t: &Table<'_>, wall: &PlanWall) -> bool {
    let length = plan_length(wall);
    for (i, o) in wall.openings.iter().enumerate() {
        if o.from <= Length::ZERO || o.from + o.width >= length {
            t.fault(Kind::Contradiction, format_args!("opening {} reaches the end of the wall", i + 1))
                .at(t.place("openings"), "openings")
                .allowed(format!(
                    "openings between the ends of the wall, {:.0} mm long, with wall on both sides",
                    length.base()
                ))
                .help("correct the opening, or end the wall where it ends");
            return false;
        }
        let meets =
            |p: &&PlanOpening| p.storey == o.storey && p.from < o.from + o.width && o.from < p.from + p.width;
        if let Some(other) = wall.openings[..i].iter().position(|p| meets(&p)) {
            t.fault(Kind::Contradiction, format_args!("openings {} and {} overlap", other + 1, i + 1))
                .at(t.place("openings"), "openings")
                .allowed("openings apart from each other")
                .help("correct one of the two, or write them as one");
            return false;
        }
    }
    true
}

/// A list of storeys; empty where it is not given.
fn marks<'a>(t: &Table<'a>, key: &'static str, storeys: &Names<'a, Storey>) -> Option<Vec<String>> {
    if !t.has(key) {
        return Some(Vec::new());
    }
    let items = t.may(key).list("a list of storeys in square brackets")?;
    items.iter().map(|e| storeys.refer(e)).collect()
}

/// Reads what one floor or roof weighs.
pub fn area_load(name: &str, t: &Table<'_>) -> Option<AreaLoad> {
    let parts = parts(t);
    let dead = if t.has("of") {
        if t.has("dead") {
            t.clash("the dead load is given twice", "dead", "of")
                .allowed("`of` with names from the list of weights, or `dead` with its source")
                .help("take one of the two out");
        }
        parts.as_ref().map(|p| Stress::new(p.iter().map(|(_, w)| w * 1e-3).sum()))
    } else {
        t.need("dead").quantity(&DEAD)
    };
    let imposed = t.need("imposed").quantity(&AREA);
    let uplift = if t.has("uplift") { t.may("uplift").quantity(&AREA) } else { Some(Stress::ZERO) };
    let source = if t.has("of") { t.may("source").text() } else { t.need("source").text() };
    t.finish();
    Some(AreaLoad {
        name: name.to_owned(),
        parts: parts?,
        dead: dead?,
        imposed: imposed?,
        uplift: uplift?,
        uplift_given: t.has("uplift"),
        source: source.unwrap_or_default(),
    })
}

/// Parts of the dead load by their names in the list of weights.
fn parts(t: &Table<'_>) -> Option<Vec<(String, f64)>> {
    if !t.has("of") {
        return Some(Vec::new());
    }
    let names: Vec<&str> =
        selfweight::WEIGHTS.iter().filter(|w| w.per == Per::Area).map(|w| w.name).collect();
    let items = t.may("of").list("a list of names in square brackets")?;
    let weights = items.iter().map(|e| {
        let name = e.line()?;
        let found = selfweight::WEIGHTS.iter().find(|w| w.per == Per::Area && w.name == name);
        if found.is_none() {
            let all: Vec<String> = names.iter().map(|n| quoted(n)).collect();
            e.fault(Kind::UnknownName, format_args!("there is no weight {}", quoted(&name)))
                .at(e.place(), "not in the list")
                .allowed(one_of(&all))
                .help(match nearest(&name, names.iter().copied()) {
                    Some(near) => format!("write {}, or state `dead` with its source", quoted(near)),
                    None => "name one of the list, or state `dead` with its source".to_owned(),
                });
        }
        found.map(|w| (w.name.to_owned(), w.value))
    });
    weights.collect::<Vec<_>>().into_iter().collect()
}

/// Reads one floor or roof.
pub fn floor<'a>(
    t: &Table<'a>,
    loads: &Names<'a, AreaLoad>,
    storeys: &Names<'a, Storey>,
) -> Option<PlanFloor> {
    let mark = t.need("mark").line();
    let load = loads.refer(&t.need("load"));
    let storey = storeys.refer(&t.need("storey"));
    let from: Option<(Length, Length)> = t.need("from").pair(&ON_PLAN);
    let to: Option<(Length, Length)> = t.need("to").pair(&ON_PLAN);
    let spans = t.need("spans").choice(Along::WORDS, Along::from_word);
    if let (Some(a), Some(z)) = (from, to)
        && (a.0 == z.0 || a.1 == z.1)
    {
        t.clash("the floor has no area", "to", "from")
            .allowed("two opposite corners")
            .help("correct one of the two corners");
        return None;
    }
    Some(PlanFloor { mark: mark?, load: load?, storey: storey?, from: from?, to: to?, spans: spans? })
}

/// Reads one beam.
pub fn beam<'a>(t: &Table<'a>, storeys: &Names<'a, Storey>) -> Option<PlanBeam> {
    let mark = t.need("mark").line();
    let storey = storeys.refer(&t.need("storey"));
    let from: Option<(Length, Length)> = t.need("from").pair(&ON_PLAN);
    let to: Option<(Length, Length)> = t.need("to").pair(&ON_PLAN);
    let weight: Option<LineLoad> = t.need("weight").quantity(&BEAM);
    let bearing: Option<Length> = t.need("bearing").quantity(&BEARING);
    if let (Some(a), Some(z), Some(bearing)) = (from, to, bearing) {
        let length = (z.0 - a.0).abs() + (z.1 - a.1).abs();
        if a.0 != z.0 && a.1 != z.1 {
            t.clash("the beam lies neither along x nor along y", "to", "from")
                .allowed("two ends with the same x or the same y")
                .help("correct one of the two ends");
            return None;
        }
        if length <= 2.0 * bearing {
            t.clash("the beam is no longer than its bearings", "to", "bearing")
                .allowed("from end to end, bearings included")
                .help("correct the ends or the bearing");
            return None;
        }
    }
    Some(PlanBeam { mark: mark?, storey: storey?, from: from?, to: to?, weight: weight?, bearing: bearing? })
}

/// Where the marks of a plan stand in the file.
pub struct Marks(Vec<(String, Span)>);

impl Marks {
    /// Of walls, floors and beams.
    pub fn new(
        walls: &Names<'_, PlanWall>,
        floors: &Names<'_, PlanFloor>,
        beams: &Names<'_, PlanBeam>,
    ) -> Self {
        let of_walls = walls.iter().map(|s| (s.name.clone(), s.place.clone()));
        let of_floors = floors.iter().map(|s| (s.name.clone(), s.place.clone()));
        let of_beams = beams.iter().map(|s| (s.name.clone(), s.place.clone()));
        Self(of_walls.chain(of_floors).chain(of_beams).collect())
    }
}

/// Walls that lie neither along x nor along y carry nothing here: refused where loads are led down.
pub fn along(walls: &Names<'_, PlanWall>) {
    for seen in walls.iter() {
        let Some(w) = &seen.item else { continue };
        if w.from.0 != w.to.0 && w.from.1 != w.to.1 {
            seen.table
                .clash("the wall lies neither along x nor along y", "to", "from")
                .allowed("with [[plan.floors]]: walls along x or y, for loads are led down along them")
                .help("correct one of the two ends, or draw the wall as steps");
        }
    }
}

/// Records ends of outer walls that meet no other wall.
pub fn closes(walls: &Names<'_, PlanWall>, around: &found::Around<'_>) {
    for end in found::open_ends(around) {
        let Some(seen) = walls.get(&end.mark) else { continue };
        let point = |(x, y): (f64, f64)| format!("({:.2} m, {:.2} m)", x / 1e3, y / 1e3);
        let near = end.nearest.as_ref().map_or_else(String::new, |(mark, gap)| {
            format!(": it ends at {}, {:.0} mm from {}", point(end.at), gap, quoted(mark))
        });
        seen.table
            .fault(
                Kind::Contradiction,
                format_args!("the outside of storey {} does not close{near}", quoted(&end.storey)),
            )
            .at(seen.place.clone(), "an end of it meets no wall")
            .allowed("outer walls whose ends meet another wall, within 150 mm and half their thickness")
            .help("correct its end, add the wall that is missing, or write free_end = true where it ends at an opening");
    }
}

/// Leads the loads of the plan down; records where one does not reach the ground.
pub fn to_the_ground(reader: &Reader, b: &Building, marks: &Marks) -> Option<TakeDown> {
    let trouble = match take_down(b)? {
        Ok(down) => return Some(down),
        Err(trouble) => trouble,
    };
    let place = marks.0.iter().find(|(mark, _)| *mark == trouble.mark).map(|(_, place)| place.clone());
    let when = if trouble.after { "once the wall is out" } else { "before the removal" };
    let fault = reader
        .fault(Kind::Contradiction, format!("{}: {}, {when}", quoted(&trouble.mark), trouble.what))
        .at(place.unwrap_or(0..0), "its load reaches no ground")
        .allowed("every floor on walls or beams, every wall on walls or beams, every beam on walls");
    fault.help(if trouble.sketch.is_empty() {
        "add what carries it to the plan, or correct its ends".to_owned()
    } else {
        format!(
            "add what carries it to the plan, or correct its corners; under it stand:\n    {}",
            trouble.sketch
        )
    });
    None
}
