//! `[[bearings]]` and `[[padstones]]`: where beams bear on returns, and what can be put under them.

use super::entry::{one_line, quoted};
use super::limits::{Limits, Odd, nearest, one_of};
use super::names::{Names, Seen};
use super::reader::{Reader, Span, Table};
use super::returns::MARK;
use super::words::PADSTONES;
use crate::building::{Bearing, BuildUp, Building, Load, Padstone, Return};
use crate::error::Kind;
use crate::quantity::{Force, Length, Stress};

pub(super) const LENGTH: Limits = Limits::new(20.0, 1000.0, "mm").odd(&[
    Odd::Below(75.0, "short for the end of a beam"),
    Odd::Above(400.0, "a beam seldom bears evenly on so much"),
]);
pub(super) const WIDTH: Limits =
    Limits::new(20.0, 600.0, "mm").odd(&[Odd::Below(50.0, "narrow for the end of a beam")]);
pub(super) const LEVEL: Limits =
    Limits::new(0.5, 6.0, "m").odd(&[Odd::Below(1.8, "low for the underside of a beam over an opening")]);
pub(super) const STONE_LENGTH: Limits = Limits::new(50.0, 2000.0, "mm");
pub(super) const STONE_WIDTH: Limits = Limits::new(50.0, 600.0, "mm");
pub(super) const STONE_HEIGHT: Limits =
    Limits::new(40.0, 600.0, "mm").odd(&[Odd::Below(65.0, "flat for a padstone: a course of brick is more")]);
pub(super) const CONCRETE: Limits =
    Limits::new(8.0, 60.0, "N/mm2").odd(&[Odd::Above(50.0, "strong for a padstone; f_ck is meant")]);

/// What the last place may be missed by before a bearing hangs over the end.
const HAIR: Length = Length::new(1e-6);

/// Reads one bearing.
pub fn bearing(
    t: &Table<'_>,
    returns: &Names<'_, Return>,
    build_ups: &Names<'_, BuildUp>,
    led: bool,
) -> Option<Bearing> {
    let mark = t.need("mark").mark(MARK);
    let beam = t.need("beam").line();
    let on = returns.refer(&t.need("on"));
    let called = t.need("load").line();
    let length: Option<Length> = t.need("bearing_length").quantity(&LENGTH);
    let width: Option<Length> = t.need("bearing_width").quantity(&WIDTH);
    let level: Option<Length> = t.may("level").quantity(&LEVEL);
    let padstone = t.may("padstone");
    let padstone = if padstone.value.is_some() { padstone.pick(PADSTONES) } else { Some(true) };

    // A return with faults has its own diagnostics; the bearing cannot be held against it.
    let seen = on.as_ref().and_then(|on| returns.get(on));
    let ret = seen.and_then(|s| s.item.as_ref().map(|item| (s, item)));
    // Loads that come from the plan are held against it once they are led down.
    let waits = led && ret.is_some_and(|(_, r)| r.loads.is_empty());
    let load = ret.filter(|_| !waits).zip(called.as_ref()).and_then(|((_, r), called)| find(t, r, called));
    if let (Some((seen, r)), Some(load)) = (ret, load) {
        on_the_wall(t, seen, r, load, length);
        in_the_leaf(t, seen, load, width, build_ups.item(&r.build_up));
    }
    if let (Some((seen, _)), Some(load)) = (ret, load)
        && load.dead <= Force::ZERO
        && load.imposed <= Force::ZERO
    {
        t.fault(Kind::Contradiction, format_args!("the load {} brings nothing to bear", quoted(&load.what)))
            .at(t.place("load"), "dead and imposed are 0")
            .and(seen.table.place("loads"), "its loads")
            .allowed("a load of more than 0 kN, dead or imposed")
            .help("give the load of the beam's end");
    }
    if let (Some((seen, r)), Some(level)) = (ret, level)
        && level > r.height
    {
        t.fault(Kind::Contradiction, format_args!("it bears above the head of {}", r.mark))
            .at(t.place("level"), "underside of the beam above the foot")
            .and(seen.table.place("height"), "height of the return")
            .allowed("at most the height of the return")
            .help("correct one of the two, or take `level` out: it then bears at the head");
    }
    let (_, r) = ret?;
    let load = if waits { called? } else { load?.what.clone() };
    Some(Bearing {
        mark: mark?,
        beam: beam?,
        on: on?,
        load,
        length: length?,
        width: width?,
        level: if t.has("level") { level? } else { r.height },
        padstone: padstone?,
    })
}

/// Holds bearings of loads that were led down against them; `places` are those of `load` by mark.
pub fn of_led_loads(reader: &Reader, b: &Building, places: &[(String, Span)]) {
    for bearing in &b.bearings {
        let Some(r) = b.returns.iter().find(|r| r.mark == bearing.on) else { continue };
        let place =
            places.iter().find(|(mark, _)| *mark == bearing.mark).map_or(0..0, |(_, place)| place.clone());
        let names: Vec<String> = r.loads.iter().map(|l| quoted(&l.what)).collect();
        let Some(load) = r.loads.iter().find(|l| l.what == bearing.load) else {
            reader
                .fault(
                    Kind::UnknownName,
                    format!("bearing {}: {} has no load {}", bearing.mark, r.mark, quoted(&bearing.load)),
                )
                .at(place, "not led down to that return")
                .allowed(format!("a load that the take-down brings to {}: {}", r.mark, one_of(&names)))
                .help("name one of these, or give the loads of the return by hand");
            continue;
        };
        let half = bearing.length / 2.0;
        if load.at - half < -HAIR || load.at + half > r.length + HAIR {
            reader
                .fault(
                    Kind::Contradiction,
                    format!("bearing {}: it hangs over an end of {}", bearing.mark, r.mark),
                )
                .at(place, format!("led down to {:.0} mm from the junction end", load.at.base()))
                .allowed(format!("a bearing between the ends of the return, {:.0} mm long", r.length.base()))
                .help("correct the bearing length here, or the beam on the plan");
        }
    }
}

/// The load of the return that is called so; one that is not there is an error with those that are.
fn find<'r>(t: &Table<'_>, r: &'r Return, called: &str) -> Option<&'r Load> {
    let names: Vec<&str> = r.loads.iter().map(|l| l.what.as_str()).collect();
    let quoted_names: Vec<String> = names.iter().map(|n| quoted(n)).collect();
    let same: Vec<&Load> = r.loads.iter().filter(|l| l.what == called).collect();
    match same.as_slice() {
        [one] => Some(one),
        [] => {
            let allowed = if names.is_empty() {
                format!("the `what` of a load of {}, but it has none", r.mark)
            } else {
                format!("the `what` of a load of {}: {}", r.mark, one_of(&quoted_names))
            };
            let help = match nearest(called, names.iter().copied()) {
                Some(near) => format!("write {}", quoted(near)),
                None => "add the load under [[returns.loads]], or name one that is there".to_owned(),
            };
            t.fault(Kind::UnknownName, format_args!("{} has no load {}", r.mark, quoted(called)))
                .at(t.place("load"), "not on that return")
                .allowed(allowed)
                .help(help);
            None
        }
        _ => {
            t.fault(Kind::Contradiction, format_args!("{} has two loads {}", r.mark, quoted(called)))
                .at(t.place("load"), "which of them?")
                .allowed("a load that no other of the return is called as")
                .help("give the loads of that return different names");
            None
        }
    }
}

/// The bearing is centred on the load and must not hang over an end of the return.
fn on_the_wall(t: &Table<'_>, seen: &Seen<'_, Return>, r: &Return, load: &Load, length: Option<Length>) {
    // A load beyond the end has its own diagnostic.
    let Some(length) = length.filter(|_| load.at <= r.length) else { return };
    let (from, to) = (load.at - length / 2.0, load.at + length / 2.0);
    let end = if from < -HAIR {
        "the junction end"
    } else if to > r.length + HAIR {
        "the free end"
    } else {
        return;
    };
    t.fault(Kind::Contradiction, format_args!("it hangs over {end} of {}", r.mark))
        .at(
            t.place("bearing_length"),
            format!(
                "centred on the load at {:.0} mm: from {:.0} to {:.0} mm",
                load.at.base(),
                from.base(),
                to.base()
            ),
        )
        .and(seen.table.place("length"), "length of the return")
        .allowed("a bearing that stays between 0 mm at the junction end and the length of the return")
        .help(
            "correct the bearing length, or the place `at` of the load: its middle is the bearing's middle",
        );
}

fn in_the_leaf(
    t: &Table<'_>,
    seen: &Seen<'_, Return>,
    load: &Load,
    width: Option<Length>,
    wall: Option<&BuildUp>,
) {
    let leaf = wall.and_then(|w| w.leaves.get(load.leaf));
    let (Some(width), Some(leaf)) = (width, leaf) else { return };
    if width > leaf.thickness + HAIR {
        t.fault(Kind::Contradiction, "the bearing is wider than the leaf that it stands on")
            .at(t.place("bearing_width"), "across the wall")
            .and(seen.table.place("build_up"), format!("that leaf is {:.1} mm thick", leaf.thickness.base()))
            .allowed("at most the thickness of the leaf")
            .help("give what bears on this leaf; a beam on two leaves is two bearings");
    }
}

/// Holds bearings against each other: a load bears once, and no two bearings lie on the same masonry.
pub fn together(bearings: &Names<'_, Bearing>, returns: &Names<'_, Return>) {
    let all: Vec<_> = bearings.iter().filter_map(|s| Some((s, s.item.as_ref()?))).collect();
    let load = |b: &Bearing| returns.item(&b.on)?.loads.iter().find(|l| l.what == b.load);
    for (i, (seen, b)) in all.iter().enumerate() {
        let here = || all[..i].iter().filter(|(_, o)| o.on == b.on);
        if let Some((first, _)) = here().find(|(_, o)| o.load == b.load) {
            seen.table
                .fault(Kind::Contradiction, format_args!("{} of {} bears already", quoted(&b.load), b.on))
                .at(seen.table.place("load"), "again")
                .and(first.table.place("load"), "first")
                .allowed("one bearing for each load")
                .help("take one out, or give the return a load for each");
            continue;
        }
        let meets = |o: &Bearing| match (load(b), load(o)) {
            (Some(x), Some(y)) => {
                x.leaf == y.leaf && (x.at - y.at).abs() + HAIR < (b.length + o.length) / 2.0
            }
            _ => false,
        };
        if let Some((first, other)) = here().find(|(_, o)| meets(o)) {
            seen.table
                .fault(Kind::Contradiction, format_args!("it lies where {} bears already", other.mark))
                .at(seen.table.place("bearing_length"), "centred on its load")
                .and(first.table.place("bearing_length"), "centred on the other")
                .allowed("bearings beside each other, on one leaf")
                .help("correct a length or the place of a load");
        }
    }
}

/// Reads one padstone of the list.
pub fn padstone(t: &Table<'_>) -> Option<Padstone> {
    let name = t.need("name").line();
    let length = t.need("length").quantity(&STONE_LENGTH);
    let width = t.need("width").quantity(&STONE_WIDTH);
    let height = t.need("height").quantity(&STONE_HEIGHT);
    let strength: Option<Stress> = t.need("strength").quantity(&CONCRETE);
    t.finish();
    Some(Padstone { name: name?, length: length?, width: width?, height: height?, strength: strength? })
}

/// Holds padstones against each other: a name stands once.
pub fn named_once(tables: &[Table<'_>]) {
    let name = |t: &Table<'_>| t.peek("name").map(one_line).filter(|n| !n.is_empty());
    for (i, t) in tables.iter().enumerate() {
        let Some(here) = name(t) else { continue };
        if let Some(first) = tables[..i].iter().find(|o| name(o).as_ref() == Some(&here)) {
            t.fault(Kind::Contradiction, format_args!("two padstones are called {}", quoted(&here)))
                .at(t.place("name"), "here again")
                .and(first.place("name"), "first")
                .allowed("each name once")
                .help("give one of them another name");
        }
    }
}
