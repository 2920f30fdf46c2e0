//! The whole building against wind in both directions, storey by storey, before the removal and after it.
//!
//! * [`levels`]: wind and tilt of every level; [`lines`]: the walls that brace, in lines
//! * [`piers`]: every length of wall between openings, checked as a cantilever of its storey by the very
//!   checks of a return

pub mod levels;
pub mod lines;
pub mod piers;
mod storey;

pub use storey::complete;

use super::{Job, Section};
use crate::building::{Along, Building, Proof, Side};
use crate::quantity::{Force, print};
use crate::trace::{Column, Sheet, Table, Unshown};
use levels::Level;
use piers::Used;

/// One direction of the wind, with what it finds.
pub struct Direction {
    /// The wind blows along this.
    pub along: Along,
    /// Levels, lowest first.
    pub levels: Vec<Level>,
    /// Every pier of every line.
    pub piers: Vec<Used>,
}

/// Directions in which wind reaches the building: none along a row with neighbours at both ends.
pub fn directions(b: &Building) -> Vec<Along> {
    let both = |a: Side, z: Side| b.neighbours.contains(&a) && b.neighbours.contains(&z);
    let mut out = Vec::new();
    if !both(Side::Left, Side::Right) {
        out.push(Along::X);
    }
    if !both(Side::Down, Side::Up) {
        out.push(Along::Y);
    }
    out
}

/// The whole building, where the plan has floors and the wind is known.
pub fn of(job: &Job<'_>) -> Vec<Direction> {
    let (Some(down), Ok(wind)) = (&job.down, &job.wind) else { return Vec::new() };
    directions(job.building)
        .into_iter()
        .map(|along| {
            let levels = levels::of(job.building, down, along, wind);
            let piers = piers::of(job, down, along, &levels, wind.along(along));
            Direction { along, levels, piers }
        })
        .collect()
}

/// Whether the job rests its bracing walls on these sheets.
fn counts(b: &Building) -> bool {
    b.links.iter().any(|l| l.link == "bracing wall" && l.proof == Proof::Calculated)
}

/// Whether the removal asks more of a length: a greater share or a greater use.
fn grows(p: &Used) -> bool {
    let more = |after: f64, before: f64| after > before * (1.0 + 1e-6);
    let uses = p.before.as_ref().zip(p.after.as_ref());
    let shares = p.share_before.zip(p.share_after);
    uses.is_none_or(|(b, a)| more(a.0, b.0)) || shares.is_none_or(|(b, a)| more(a, b))
}

/// Of each wall that gets more by the removal and does not carry its share alone after it, the length used most.
fn over(d: &Direction) -> Vec<&Used> {
    let used = |p: &Used| p.after.as_ref().map_or(0.0, |a| a.0);
    let mut out: Vec<&Used> = Vec::new();
    for p in d.piers.iter().filter(|p| grows(p) && used(p) > 1.0) {
        match out.iter_mut().find(|o| o.wall == p.wall && o.storey == p.storey) {
            Some(known) if used(p) > used(known) => *known = p,
            Some(_) => {}
            None => out.push(p),
        }
    }
    out
}

/// Use before and after, in words.
fn uses_of(p: &Used) -> String {
    let ratio = |x: &Option<(f64, String)>| x.as_ref().map_or("none".to_owned(), |u| print::ratio(u.0));
    format!("use {} before the removal, {} after it", ratio(&p.before), ratio(&p.after))
}

/// What is to be shown of a direction, where walls that get more by the removal do not carry their share alone.
fn hold_text(b: &Building, d: &Direction) -> Option<String> {
    let name = |p: &&Used| format!("{}, {} ({})", p.wall, b.storeys[p.storey].mark, uses_of(p));
    let walls: Vec<String> = over(d).iter().map(name).collect();
    (!walls.is_empty()).then(|| {
        format!(
            "Before the wall comes down, show how the house stands against wind along {}: by the sheet of the whole \
             building these walls get more by the removal and do not carry it alone: {}.",
            d.along.word(),
            walls.join("; ")
        )
    })
}

/// A hold point for every direction in which walls that get more by the removal do not carry their share
/// alone after it, where the job does not rest on these figures anyhow.
pub fn holds(job: &Job<'_>) -> Vec<(String, String)> {
    if counts(job.building) {
        return Vec::new();
    }
    let text = |d: &Direction| hold_text(job.building, d).map(|text| (String::new(), text));
    job.whole.iter().filter_map(text).collect()
}

/// The same in the results, so that no failure waits in a table alone.
fn unshown(s: &mut Sheet, job: &Job<'_>, d: &Direction) {
    let hold = hold_text(job.building, d).and_then(|text| job.hold_of(&text));
    for (n, p) in over(d).into_iter().enumerate() {
        s.unshown(Unshown {
            id: format!("alone-{}-{n}", d.along.word()),
            clause: "6.2, first principles".to_owned(),
            words: format!(
                "{}, {}, {:.2} to {:.2} m, wind along {}",
                p.wall,
                job.building.storeys[p.storey].mark,
                p.from / 1e3,
                p.to / 1e3,
                d.along.word()
            ),
            finding: format!("Taken alone: {}.", uses_of(p)),
            ratio: p.after.as_ref().map(|a| a.0),
            hold: hold.clone(),
        });
    }
}

/// Lengths that do not carry their wind alone and whose use the removal does not raise, in words.
pub fn as_it_stands(job: &Job<'_>) -> Vec<String> {
    if counts(job.building) {
        return Vec::new();
    }
    let b = job.building;
    let over = |p: &&Used| !grows(p) && p.after.as_ref().is_some_and(|a| a.0 > 1.0);
    let name = |p: &Used| {
        format!("{}, {}, {:.2} to {:.2} m", p.wall, b.storeys[p.storey].mark, p.from / 1e3, p.to / 1e3)
    };
    let mut out: Vec<String> = job.whole.iter().flat_map(|d| &d.piers).filter(over).map(name).collect();
    out.dedup();
    out
}

/// The sheet of the whole building.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let b = job.building;
    if job.whole.is_empty() {
        return Vec::new();
    }
    let mut s = Sheet::recorder();
    neighbours(&mut s, b);
    s.note(if b.wind.site.as_ref().is_some_and(|site| site.roof.is_some()) {
        "Wind on each level: the net overall pressure on half the storey under it and half the storey over it; at the roof \
         half a gable, or what the slopes bring, from the wind sheet."
    } else {
        "Wind on each level: the net overall pressure on half the storey under it and half the storey over it; at the roof \
         the height up to the ridge is taken as an upright face."
    });
    s.note(
        "A timber floor shares by tributary width, a \
         concrete one by stiffness with torsion; in one line the lengths between openings share by length. The lengths \
         that stay of the wall that comes out are not counted after it: they have sheets of their own. Each length \
         stands as a cantilever of its storey, its head free, under the load of the take-down on its loaded leaf and \
         its share of wind and tilt, the moment of the levels above included. Walls across it and the wall over and under \
         openings, which tie lengths together and help much, are left out: a use of infinity says that a length alone \
         overturns.",
    );
    let counts = counts(b);
    s.note(if counts {
        "The bracing walls are calculated here: the link of that name rests on these uses."
    } else {
        "The link \"bracing wall\" of this job rests on what the chain sheet says of it; where a length gets \
         more by the removal and its use is above 1 after it, a hold point asks for more. A use above 1 that does not grow \
         is the house as it stands, by more than is counted here: the removal changes nothing there."
    });
    for d in &job.whole {
        s.heading(1, format!("Wind along {}", d.along.word()));
        s.table(|| wind(b, d));
        s.table(|| uses(b, d));
        if counts {
            verdict(&mut s, d);
        } else {
            unshown(&mut s, job, d);
        }
    }
    vec![Section::plain("whole", "The whole building against wind", s)]
}

fn neighbours(s: &mut Sheet, b: &Building) {
    let names: Vec<&str> = b.neighbours.iter().map(|n| n.word()).collect();
    s.note(match names.as_slice() {
        [] => "No neighbour adjoins: wind is taken along both directions.".to_owned(),
        names => format!(
            "Neighbours adjoin on the side of the plan named: {}. Where both ends of a direction have neighbours the row \
             stands together and the wind along it is not worked here; one neighbour is not counted on.",
            names.join(", ")
        ),
    });
}

fn kn(f: Force) -> String {
    print::show("F", f.dynamic()).value
}

fn wind(b: &Building, d: &Direction) -> Table {
    let rows = d.levels.iter().map(|l| {
        vec![
            format!("head of {}", b.storeys[l.storey].mark),
            print::show("h", l.strip.dynamic()).value,
            print::show("L", l.front.dynamic()).value,
            kn(l.F_roof),
            kn(l.F_k),
            kn(l.F_above),
            kn(l.dead),
            kn(l.imposed),
        ]
    });
    Table {
        caption: "Levels: strip and front, the part of the roof, the wind of the level with it, all wind from there up (characteristic), and the \
                  vertical load that leans there, unfactored"
            .to_owned(),
        columns: vec![
            Column::words("level"),
            Column::numbers("strip, mm"),
            Column::numbers("front, mm"),
            Column::numbers("roof, kN"),
            Column::numbers("wind, kN"),
            Column::numbers("from there up, kN"),
            Column::numbers("dead, kN"),
            Column::numbers("imposed, kN"),
        ],
        rows: rows.collect(),
        strong: Vec::new(),
    }
}

fn uses(b: &Building, d: &Direction) -> Table {
    let percent = |x: Option<f64>| x.map_or("–".to_owned(), |p| format!("{:.0} %", 100.0 * p));
    let ratio = |x: &Option<(f64, String)>| x.as_ref().map_or("–".to_owned(), |(r, _)| print::ratio(*r));
    let mut strong = Vec::new();
    let rows = d.piers.iter().enumerate().map(|(i, p)| {
        if p.after.as_ref().is_some_and(|(r, _)| *r > 1.0) {
            strong.push(i);
        }
        vec![
            p.wall.clone(),
            b.storeys[p.storey].mark.clone(),
            format!("{:.2} to {:.2}", p.from / 1e3, p.to / 1e3),
            percent(p.share_before),
            percent(p.share_after),
            ratio(&p.before),
            ratio(&p.after),
            governs(p),
        ]
    });
    let rows: Vec<Vec<String>> = rows.collect();
    Table {
        caption: "Every length of wall along the wind: its share of the storey, and its largest use of all checks of a \
                  return under all combinations and both senses of the wind"
            .to_owned(),
        columns: vec![
            Column::words("wall"),
            Column::words("storey"),
            Column::words("from, to, m"),
            Column::numbers("before"),
            Column::numbers("after"),
            Column::numbers("use before"),
            Column::numbers("use after"),
            Column::words("governed by"),
        ],
        rows,
        strong,
    }
}

/// What governs, of before and after where they differ.
fn governs(p: &Used) -> String {
    match (&p.before, &p.after) {
        (Some((_, before)), Some((_, after))) if before != after => format!("{before}; after {after}"),
        (_, Some((_, what))) | (Some((_, what)), None) => what.clone(),
        (None, None) => String::new(),
    }
}

/// The largest use after the removal, as a verdict.
fn verdict(s: &mut Sheet, d: &Direction) {
    let after = d.piers.iter().filter_map(|p| Some((p.after.as_ref()?.0, p)));
    let Some((ratio, pier)) = after.max_by(|a, b| a.0.total_cmp(&b.0)) else { return };
    s.case = format!("{}, {:.2} to {:.2} m", pier.wall, pier.from / 1e3, pier.to / 1e3);
    let source = "table above, worked silently by the checks of a return";
    crate::given!(s, "largest use of a bracing wall", source, eta_w = crate::quantity::Num::new(ratio));
    crate::given!(s, "limit of a use", "EN 1990 6.4.2", eta_1 = crate::quantity::Num::new(1.0));
    let id = format!("bracing-{}", d.along.word());
    crate::verify!(s, &id, "6.2, first principles", "bracing walls of the building", eta_w <= eta_1);
    s.case.clear();
}
