//! `[[panels]]`: outer walls across their plane, before and after the removal.

use super::edges;
use super::entry::{Entry, quoted};
use super::ground::{DRAWN, HEIGHT};
use super::limits::{Limits, Odd};
use super::openings;
use super::plan::plan_length;
use super::reader::Table;
use super::returns::{Around, MARK, against_storey};
use super::words::ARCHES;
use crate::building::found::{self, FoundPanel, FoundSpan};
use crate::building::{Arching, Edge, Panel, PanelRoute, PlanWall, Sharing, Span, Storey, line_of};
use crate::error::Kind;
use crate::quantity::{Length, LineLoad};
use crate::standards::masonry;

pub(super) const LENGTH: Limits = Limits::new(0.3, 20.0, "m")
    .odd(&[Odd::Below(0.6, "a strip more than a panel"), Odd::Above(15.0, "long for one panel")]);
pub(super) const DEAD: Limits =
    Limits::new(0.0, 500.0, "kN/m").odd(&[Odd::Above(150.0, "much for a wall of a house")]);
pub(super) const PRESSURE: Limits = Limits::new(0.05, 10.0, "kN/m2")
    .odd(&[Odd::Above(2.0, "more than UK sites of two or three storeys give, mostly a slip of the point")]);
pub(super) const WALL_AT: Limits = Limits::new(0.0, 20.0, "m");

/// Reads one panel.
pub fn read<'a>(t: &Table<'a>, around: &Around<'_, 'a>) -> Option<Panel> {
    let mark = t.need("mark").mark(MARK);
    let on = if t.has("on") { around.plan.refer(&t.need("on")) } else { None };
    let found = on.as_ref().and_then(|on| shown(t, around, on));
    let wall_on = on.as_ref().and_then(|w| around.plan.item(w));
    let title = match found {
        Some(f) if !t.has("title") => Some(found::title_of_panel(f)),
        _ => t.need("title").line(),
    };
    let build_up = match (found, wall_on) {
        (Some(_), Some(wall)) if !t.has("build_up") => Some(wall.build_up.clone()),
        _ => around.build_ups.refer(&t.need("build_up")),
    };
    let storey = match found {
        Some(_) if !t.has("storey") => Some(around.found_in.to_owned()),
        _ => around.storeys.refer(&t.need("storey")),
    };
    let of_storey = storey.as_ref().and_then(|s| around.storeys.item(s));
    let height = match (found, of_storey) {
        (Some(_), Some(seen)) if !t.has("height") => Some(seen.clear_height),
        _ => t.need("height").quantity(&HEIGHT),
    };
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
    let drawn = found.zip(of_storey);
    let before_table = side(t, "before", found.is_some());
    let before = read_side(before_table.as_ref(), around, wall_on, drawn.map(|(f, s)| (&f.before, s)));
    let after_table = side(t, "after", found.is_some());
    let wall_at = after_table.as_ref().and_then(|a| a.may("wall_at").quantity(&WALL_AT));
    let wall_at = wall_at.or(found.map(|f| f.wall_at));
    let after = read_side(after_table.as_ref(), around, wall_on, drawn.map(|(f, s)| (&f.after, s)));
    let mut before = before.map(|r| r.span);
    let edges_taken = after.as_ref().is_some_and(|r| r.taken);
    let mut after = after.map(|r| r.span);
    if t.has("openings") {
        let given = openings::read(t);
        if let (Some(after), Some(given)) = (&mut after, given) {
            after.openings = given;
            if let Some(before) = &mut before {
                before.openings = openings::before(after, before, wall_at);
            }
        }
    }
    if let (Some(after), Some(height)) = (&after, height) {
        openings::fit(t, &after.openings, after.length, height);
    }
    if let Some(height) = height {
        for (own, span) in [(&before_table, &before), (&after_table, &after)] {
            if let (Some(own), Some(span)) = (own, span) {
                edges::fit(own, span, height);
            }
        }
    }
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
    // Edges that come from the plan are told in the table of the panel itself.
    let (bt, at) = (before_table.as_ref().unwrap_or(t), after_table.as_ref().unwrap_or(t));
    for (table, span) in [(bt, &before), (at, &after)] {
        if let (Some(span), Some(route)) = (span, route) {
            stands(table, span, route, t);
        }
    }
    if let (Some(before), Some(after)) = (&before, &after) {
        compare(t, (bt, before), (at, after), edges_taken);
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
        lift_above: LineLoad::ZERO,
        wind,
        route: route?,
        sharing: sharing?,
        before: before?,
        after: after?,
        edges_taken,
        wall_at,
        arching,
    })
}

/// `before` or `after`; it may be left out where the plan shows the panel.
fn side<'a>(t: &Table<'a>, key: &'static str, shown: bool) -> Option<Table<'a>> {
    let entry = if shown { t.may(key) } else { t.need(key) };
    if shown && entry.value.is_none() { None } else { entry.table(&format!("{}, {key}", t.name)) }
}

/// A side of the panel as read.
struct ReadSide {
    span: Span,
    /// Whether an edge comes from the plan.
    taken: bool,
}

fn read_side<'a>(
    own: Option<&Table<'a>>,
    around: &Around<'_, 'a>,
    on: Option<&PlanWall>,
    shown: Option<(&FoundSpan, &Storey)>,
) -> Option<ReadSide> {
    let Some(own) = own else {
        let (span, storey) = shown?;
        return Some(ReadSide { span: found::span(span, storey), taken: true });
    };
    let mut ends = None;
    let length = match (on, shown) {
        (Some(wall), _) if around.led && own.has("between") => {
            if own.has("length") {
                own.clash("its length is given twice", "length", "between")
                    .allowed("`length`, or `between` with the two walls of the plan that hold its ends")
                    .help("take one of the two out");
            }
            ends = between(own, around, wall);
            ends.map(|(a, z)| z - a)
        }
        (_, Some((span, _))) if !own.has("length") => {
            ends = Some(span.range);
            Some(span.length())
        }
        _ => own.need("length").quantity(&LENGTH),
    };
    let drawn = shown.map(|(span, storey)| found::span(span, storey));
    let mut taken = false;
    let mut edge = |key: &'static str, drawn: Option<Edge>| match drawn {
        Some(drawn) if !own.has(key) => {
            taken = true;
            Some(drawn)
        }
        _ => edges::read(own, key),
    };
    let top = edge("top", drawn.as_ref().map(|d| d.top.clone()));
    let base = edge("base", drawn.as_ref().map(|d| d.base.clone()));
    let left = edge("left", drawn.as_ref().map(|d| d.left.clone()));
    let right = edge("right", drawn.as_ref().map(|d| d.right.clone()));
    own.finish();
    let openings = shown.map_or_else(Vec::new, |(span, _)| span.openings.clone());
    let span = Span { length: length?, ends, top: top?, base: base?, left: left?, right: right?, openings };
    Some(ReadSide { span, taken })
}

/// The panel of the plan that this one is: the one between the walls named, or the only one of its wall.
fn shown<'r, 'a>(t: &Table<'a>, around: &Around<'r, 'a>, on: &str) -> Option<&'r FoundPanel> {
    let all: Vec<&'r FoundPanel> = around.found.panels.iter().filter(|p| p.on == on).collect();
    let by_hand = t.has("before") && t.has("after");
    if !t.has("between") {
        return match all.as_slice() {
            [only] => Some(only),
            [] => None,
            _ if by_hand => None,
            _ => {
                t.fault(Kind::Missing, "the plan shows several panels on its wall")
                    .at(t.place("on"), "which of them?")
                    .allowed(pairs(&all))
                    .help("add `between` with the two walls that hold the ends of this one");
                // Read on as one of them: what it leaves out is no other slip.
                all.first().copied()
            }
        };
    }
    let entry = t.need("between");
    let items = entry.list("the two walls that hold its ends")?;
    let marks: Vec<String> = items.iter().filter_map(|e| around.plan.refer(e)).collect();
    if marks.len() != items.len() {
        return all.first().copied();
    }
    let is_it = |p: &&&FoundPanel| {
        let held: Vec<&String> = p.after.held.iter().flatten().collect();
        held.len() == marks.len() && held.iter().all(|m| marks.contains(m))
    };
    let hit = all.iter().find(is_it).copied();
    if hit.is_none() {
        entry
            .fault(Kind::Contradiction, format_args!("the plan shows no such panel on {}", quoted(on)))
            .at(entry.place(), "between these")
            .allowed(if all.is_empty() {
                "an outer wall that the wall that comes out held".to_owned()
            } else {
                pairs(&all)
            })
            .help("name one of these, or give the panel by hand in [panels.before] and [panels.after]");
    }
    hit.or_else(|| all.first().copied())
}

/// What holds the ends of each, as it is written.
fn pairs(all: &[&FoundPanel]) -> String {
    let pair = |p: &&FoundPanel| {
        let held: Vec<String> = p.after.held.iter().flatten().map(|m| quoted(m)).collect();
        format!("[{}]", held.join(", "))
    };
    all.iter().map(pair).collect::<Vec<_>>().join(" or ")
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
    let vertical = table.need("spans").pick(ARCHES);
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

fn compare(t: &Table<'_>, (bt, before): (&Table<'_>, &Span), (at, after): (&Table<'_>, &Span), taken: bool) {
    if after.length < before.length {
        t.fault(Kind::Contradiction, "it is shorter after a support came out")
            .at(at.place("length"), "after")
            .and(bt.place("length"), "before")
            .allowed("at least the length before")
            .help("correct one of the two");
    }
    let kinds = |s: &Span| [s.top.kind, s.base.kind, s.left.kind, s.right.kind];
    if !taken && after.length == before.length && kinds(before) == kinds(after) {
        t.warn("length and edges are the same before and after, so the removed wall did not hold it");
    }
}
