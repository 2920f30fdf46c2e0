//! `[[panels]]`: outer walls across their plane, before and after the removal.

use super::entry::Entry;
use super::ground::{DRAWN, HEIGHT};
use super::limits::{Limits, Odd};
use super::plan::plan_length;
use super::reader::Table;
use super::returns::{Around, MARK, against_storey};
use super::words::EDGES;
use crate::building::{Arching, Edge, Panel, PanelRoute, PlanWall, Sharing, Span, line_of};
use crate::error::Kind;
use crate::quantity::{Length, LineLoad};
use crate::standards::masonry;

const LENGTH: Limits = Limits::new(0.3, 20.0, "m")
    .odd(&[Odd::Below(0.6, "a strip more than a panel"), Odd::Above(15.0, "long for one panel")]);
const DEAD: Limits = Limits::new(0.0, 500.0, "kN/m").odd(&[Odd::Above(150.0, "much for a wall of a house")]);
const PRESSURE: Limits = Limits::new(0.05, 10.0, "kN/m2")
    .odd(&[Odd::Above(2.0, "more than UK sites of two or three storeys give, mostly a slip of the point")]);
const WALL_AT: Limits = Limits::new(0.0, 20.0, "m");

/// Reads one panel.
pub fn read<'a>(t: &Table<'a>, around: &Around<'_, 'a>) -> Option<Panel> {
    let mark = t.need("mark").mark(MARK);
    let title = t.need("title").line();
    let build_up = around.build_ups.refer(&t.need("build_up"));
    let storey = around.storeys.refer(&t.need("storey"));
    let height = t.need("height").quantity(&HEIGHT);
    let on = if t.has("on") { around.plan.refer(&t.need("on")) } else { None };
    // With floors on the plan the load on a panel of a plan wall is led down to it.
    let led = around.led && t.has("on") && !t.has("dead_above");
    let dead_above = if led { Some(LineLoad::ZERO) } else { t.need("dead_above").quantity(&DEAD) };
    let wind = t.may("wind").cause(|e| e.quantity(&PRESSURE));
    let route = t.may("route");
    let route = match &route.value {
        Some(_) => route.choice(PanelRoute::WORDS, PanelRoute::from_word),
        None => Some(PanelRoute::Flexure),
    };
    let sharing = t.may("sharing");
    let sharing = match &sharing.value {
        Some(_) => sharing.choice(Sharing::WORDS, Sharing::from_word),
        None => Some(Sharing::Strength),
    };
    let before_table = t.need("before").table(&format!("{}, before", t.name));
    let wall_on = on.as_ref().and_then(|w| around.plan.item(w));
    let before = before_table.as_ref().and_then(|b| span(b, around, wall_on));
    let after_table = t.need("after").table(&format!("{}, after", t.name));
    let wall_at = after_table.as_ref().and_then(|a| a.may("wall_at").quantity(&WALL_AT));
    let after = after_table.as_ref().and_then(|a| span(a, around, wall_on));
    let arching = arching(t, route);

    if let Some(seen) = storey.as_ref().and_then(|s| around.storeys.get(s)) {
        against_storey(t, height, seen.item.as_ref(), &seen.table);
    }
    let wall = build_up.as_ref().and_then(|b| around.build_ups.item(b));
    if t.has("sharing") && wall.is_some_and(|w| w.leaves.len() == 1) {
        t.clash("two leaves are to share the wind, but the build-up has one leaf", "sharing", "build_up")
            .allowed("`sharing` with two leaves")
            .help("take `sharing` out, or correct the build-up");
    }
    for (table, span) in [(&before_table, &before), (&after_table, &after)] {
        if let (Some(table), Some(span), Some(route)) = (table, span, route) {
            stands(table, span, route, t);
        }
    }
    if let (Some(bt), Some(at), Some(before), Some(after)) = (&before_table, &after_table, &before, &after) {
        compare(t, (bt, before), (at, after));
        if after.length >= before.length && wall_at.is_some_and(|place| place > after.length) {
            at.clash("the removed wall met it beyond its end", "wall_at", "length")
                .allowed("0 m at the left end to the length after the removal")
                .help("correct one of the two");
        }
        let on_plan = on.as_ref().and_then(|o| around.plan.get(o));
        if let Some(seen) = on_plan
            && let Some(line) = &seen.item
            && after.length > plan_length(line) + DRAWN
        {
            at.fault(Kind::Contradiction, "the panel is longer than the wall that it is part of")
                .at(at.place("length"), "length of the panel")
                .and(seen.table.place("to"), format!("the wall is {:.0} mm long", plan_length(line).base()))
                .allowed("at most the length of the plan wall")
                .help("correct one of the two, or take `on` out");
        }
    }
    Some(Panel {
        mark: mark?,
        title: title?,
        build_up: build_up?,
        storey: storey?,
        height: height?,
        on,
        dead_above: dead_above?,
        wind,
        route: route?,
        sharing: sharing?,
        before: before?,
        after: after?,
        wall_at,
        arching,
    })
}

fn span<'a>(t: &Table<'a>, around: &Around<'_, 'a>, on: Option<&PlanWall>) -> Option<Span> {
    let place = match on {
        Some(wall) if around.led && t.has("between") => {
            if t.has("length") {
                t.clash("its length is given twice", "length", "between")
                    .allowed("`length`, or `between` with the two walls of the plan that hold its ends")
                    .help("take one of the two out");
            }
            between(t, around, wall).map(|(from, to)| (to - from, Some((from, to))))
        }
        _ => t.need("length").quantity(&LENGTH).map(|length| (length, None)),
    };
    let [top, base, left, right] = ["top", "base", "left", "right"].map(|key| edge(t, key));
    t.finish();
    let (length, ends) = place?;
    Some(Span { length, ends, top: top?, base: base?, left: left?, right: right? })
}

/// The lines of two plan walls that meet the wall of the panel, smaller first.
fn between<'a>(t: &Table<'a>, around: &Around<'_, 'a>, on: &PlanWall) -> Option<(Length, Length)> {
    let entry = t.need("between");
    let wanted = "the two walls of the plan that hold its ends: [\"party wall\", \"R1\"]";
    let items = entry.list(wanted)?;
    let [a, z] = items.as_slice() else {
        entry.wrong_type(wanted, "name two walls");
        return None;
    };
    let along = line_of(on)?;
    let place = |e: &Entry<'a>| {
        let mark = around.plan.refer(e)?;
        let line = around.plan.item(&mark).and_then(line_of)?;
        if line.along == along.along {
            e.fault(Kind::Contradiction, format_args!("\"{mark}\" runs along the panel, not across it"))
                .at(e.place(), "no end of it")
                .allowed("walls across the panel")
                .help("name the walls that hold its left and right end");
            return None;
        }
        Some(line.at)
    };
    let (a, z) = (place(a), place(z));
    let (a, z) = (a?, z?);
    let length = Length::new((a - z).abs());
    if !LENGTH.allow(length.base()) {
        entry
            .fault(Kind::Contradiction, format_args!("the panel would be {:.0} mm long", length.base()))
            .at(entry.place(), "between these")
            .allowed(LENGTH.words())
            .help("name two walls apart from each other");
        return None;
    }
    Some((Length::new(a.min(z)), Length::new(a.max(z))))
}

fn edge(t: &Table<'_>, key: &'static str) -> Option<Edge> {
    let entry = t.need(key);
    let wanted = "{ edge = \"simple\", reason = \"...\" }";
    if let Some(toml::de::DeValue::String(_)) = entry.present(wanted) {
        t.fault(Kind::Missing, format_args!("`{key}` says how the edge is held, but not why"))
            .at(entry.place(), "no reason")
            .allowed(wanted)
            .help(format!("write {key} = {{ edge = \"...\", reason = \"...\" }}"));
        return None;
    }
    let table = entry.table(&format!("{}, {key}", t.name))?;
    let kind = table.need("edge").pick(EDGES);
    let reason = table.need("reason").text();
    table.finish();
    Some(Edge { kind: kind?, reason: reason? })
}

fn arching(t: &Table<'_>, route: Option<PanelRoute>) -> Option<Arching> {
    let given = t.has("arching");
    if route == Some(PanelRoute::Arching) && !given {
        t.fault(Kind::Contradiction, "the route is arching, but there is no [panels.arching]")
            .at(t.place("route"), "arching against what?")
            .and(t.head(), "has no `arching`")
            .allowed("\"arching\" with the abutments and the reason why they hold")
            .help("add [panels.arching] with `abutment` and `spans`, or name another route");
    }
    if !given {
        return None;
    }
    if route.is_some_and(|r| r != PanelRoute::Arching) {
        t.fault(Kind::Contradiction, "abutments are given, but the route is not arching")
            .at(t.place("arching"), "abutments")
            .and(t.place("route"), "route")
            .allowed("[panels.arching] with route = \"arching\"")
            .help("write route = \"arching\", or take [panels.arching] out");
    }
    let table = t.need("arching").table(&format!("{}, arching", t.name))?;
    let abutment = table.need("abutment").text();
    let vertical = table.need("spans").pick(&[("vertically", true), ("horizontally", false)]);
    table.finish();
    Some(Arching { abutment: abutment?, vertical: vertical? })
}

/// A panel held along one simple edge or none falls over; a one-way span needs two opposite edges.
fn stands(t: &Table<'_>, span: &Span, route: PanelRoute, panel: &Table<'_>) {
    let held = |edge: &Edge| edge.kind != masonry::Edge::Free;
    let upright = held(&span.top) && held(&span.base);
    let across = held(&span.left) && held(&span.right);
    if route == PanelRoute::OneWay && !upright && !across {
        t.fault(Kind::Contradiction, "it spans one way, but no two opposite edges are held")
            .at(t.place("top"), "edges")
            .and(panel.place("route"), "one way")
            .allowed("top and base held, or left and right held")
            .help("correct the edges, or name another route");
    }
    let edges = [("top", &span.top), ("base", &span.base), ("left", &span.left), ("right", &span.right)];
    let firm: Vec<_> = edges.iter().filter(|(_, e)| held(e)).collect();
    let falls = match firm.as_slice() {
        [] => true,
        [(_, only)] => only.kind == masonry::Edge::Simple,
        _ => false,
    };
    if falls {
        t.fault(Kind::Contradiction, "with these edges it falls over")
            .at(t.place("base"), "base")
            .and(t.place("top"), "top")
            .and(t.place("left"), "left")
            .and(t.place("right"), "right")
            .allowed("two edges held, or one held against turning")
            .help("say which edges hold it, each with its reason");
    }
}

fn compare(t: &Table<'_>, (bt, before): (&Table<'_>, &Span), (at, after): (&Table<'_>, &Span)) {
    if after.length < before.length {
        t.fault(Kind::Contradiction, "it is shorter after a support came out")
            .at(at.place("length"), "after")
            .and(bt.place("length"), "before")
            .allowed("at least the length before")
            .help("correct one of the two");
    }
    let kinds = |s: &Span| [s.top.kind, s.base.kind, s.left.kind, s.right.kind];
    if after.length == before.length && kinds(before) == kinds(after) {
        t.warn("length and edges are the same before and after, so the removed wall did not hold it");
    }
}
