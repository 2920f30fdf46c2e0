//! The job file: TOML text in, a building out, or everything that is wrong with the text.
//!
//! What the user typed stays a tree of TOML values with their places (`reader`, `entry`); what
//! the checks work with is the [`Building`]. Between them one function per part of the file reads
//! its fields, holds them against each other and names both places where they contradict.
//!
//! * [`read`]: the whole file
//! * `limits`: what a number may be, declared beside each field
//! * `names`: marks and names, and references to them
//! * `identity basis wind sectors materials plan ground returns bearing footing bearings panels floors closing`: the parts, in
//!   the file's order
//! * [`practice`]: the practice file, read the same way
//! * [`schema`]: the same for editors
//! * [`start`]: the job to start from

mod basis;
mod bearing;
mod bearings;
mod closing;
mod date;
mod edges;
mod entry;
mod figure;
mod floors;
mod footing;
mod ground;
mod identity;
mod limits;
mod materials;
mod names;
mod openings;
mod panels;
mod paths;
mod photographs;
mod plan;
pub mod practice;
mod reader;
mod returns;
mod schema;
mod sectors;
pub mod start;
mod syntax;
pub mod tables;
mod wind;
mod words;

#[cfg(test)]
mod tests;

use toml::de::DeTable;

pub use date::in_words as date_in_words;
pub use schema::schema;

use crate::building::found::{self, Found};
use crate::building::{Basis, Building, Led, PlanWall, Practice};
use crate::error::{Kind, Report};
use names::Names;
use reader::{Reader, Table};
use returns::Around;

/// The building that a job file describes. Values that are possible but odd are sentences in its
/// `warnings`.
///
/// # Errors
/// A [`Report`] with every diagnostic of the file: faults of the TOML, or else faults of its entries.
pub fn read(name: &str, text: &str) -> Result<Building, Report> {
    read_for(name, text, None)
}

/// As [`read`], for a practice: what it has in every pack stands where the job says nothing.
///
/// # Errors
/// As [`read`].
pub fn read_for(name: &str, text: &str, practice: Option<&Practice>) -> Result<Building, Report> {
    let reader = Reader::default();
    let (tree, errors) = DeTable::parse_recoverable(text);
    // A tree that was mended by guessing would give faults that are not there.
    let building = if errors.is_empty() {
        let root = Table::new(&reader, "job file".to_owned(), tree.get_ref(), 0..0);
        whole(&root, practice)
    } else {
        syntax::record(&reader, text, &errors);
        None
    };
    let (diagnostics, warnings) = reader.into_parts();
    match building {
        Some(building) if diagnostics.is_empty() => {
            let of_practice =
                practice.iter().flat_map(|p| &p.warnings).map(|w| format!("practice file: {w}"));
            let warnings = warnings.into_iter().chain(of_practice).collect();
            Ok(Building { warnings, practice: practice.cloned(), ..building })
        }
        _ => Err(Report::new(name, text, diagnostics)),
    }
}

fn whole(root: &Table<'_>, practice: Option<&Practice>) -> Option<Building> {
    let reader = root.reader;
    let job_table = root.need("job").table("job");
    let identity = job_table.as_ref().and_then(identity::identity);
    let signature_table = root.need("signatures").table("signatures");
    let signatures = signature_table.as_ref().and_then(identity::signatures);
    let revision_tables = root.need("revisions").tables("revision", "letter");
    let revisions = identity::revisions(&revision_tables);
    let house = practice.and_then(|p| p.basis.clone()).unwrap_or_else(Basis::usual);
    let basis = basis::basis(root.may("basis").table("basis").as_ref(), &house);

    let materials =
        materials::by_name("material", root.need("materials").named("material"), materials::material);
    let build_ups = materials::by_name("build-up", root.need("build_ups").named("build-up"), |name, t| {
        materials::build_up(name, t, &materials)
    });
    let storeys = Names::marked("storey", root.need("storeys").tables("storey", "mark"), ground::storey);
    ground::stacked(&storeys);
    let wind = root.need("wind").table("wind").and_then(|t| wind::wind(&t, &storeys, root.has("plan")));

    let plan_table = root.may("plan").table("plan");
    let north = plan_table.as_ref().map_or(Some(0.0), plan::north);
    let neighbours = plan_table.as_ref().map_or(Some(Vec::new()), plan::neighbours);
    let area_loads =
        materials::by_name("area load", root.may("area_loads").named("area load"), plan::area_load);
    let walls: Names<'_, PlanWall> = match &plan_table {
        Some(t) => Names::marked("wall", t.need("walls").tables("plan wall", "mark"), |w| {
            plan::wall(w, &build_ups, &storeys)
        }),
        None => Names::new("wall"),
    };
    let (floors, beams) = match &plan_table {
        Some(t) => (
            Names::marked("floor", t.may("floors").tables("plan floor", "mark"), |f| {
                plan::floor(f, &area_loads, &storeys)
            }),
            Names::marked("beam", t.may("beams").tables("plan beam", "mark"), |b| plan::beam(b, &storeys)),
        ),
        None => (Names::new("floor"), Names::new("beam")),
    };
    if !floors.is_empty() {
        plan::along(&walls);
    }
    let marks_of_plan = plan::Marks::new(&walls, &floors, &beams);
    if let Some(t) = &plan_table {
        t.finish();
    }

    let removed_table = root.need("removed").table("removed wall");
    let removed = removed_table.as_ref().and_then(|t| ground::removed(t, &walls, &build_ups, &storeys));
    let bracing = Names::marked("bracing wall", root.may("bracing").tables("bracing wall", "mark"), |t| {
        ground::bracing_wall(t, &build_ups)
    });
    let stability_table = root.may("stability").table("stability");
    let stability = stability_table
        .as_ref()
        .and_then(|t| ground::stability(t, &storeys, &bracing, removed_table.as_ref()));

    let led = !floors.is_empty();
    let found = match &removed {
        Some(removed) if led => {
            let around = found::Around {
                walls: walls.iter().filter_map(|s| s.item.as_ref()).collect(),
                storeys: storeys.iter().filter_map(|s| s.item.as_ref()).collect(),
                floors: floors.iter().filter_map(|s| s.item.as_ref()).collect(),
                build_ups: build_ups.iter().filter_map(|s| s.item.as_ref()).collect(),
                neighbours: neighbours.as_deref().unwrap_or_default(),
                storey: &removed.storey,
            };
            // Half a plan is no plan that does not close.
            if walls.iter().all(|s| s.item.is_some()) {
                plan::closes(&walls, &around);
            }
            found::find(&around)
        }
        _ => Found::default(),
    };
    let (returns, panels) = {
        let around = Around {
            found: &found,
            found_in: removed.as_ref().map_or("", |r| r.storey.as_str()),
            build_ups: &build_ups,
            storeys: &storeys,
            plan: &walls,
            led,
            bracing: &bracing,
            stability: stability_table.as_ref().zip(stability.as_ref()),
        };
        let returns = Names::marked("return", root.may("returns").tables("return", "mark"), |t| {
            returns::read(t, &around)
        });
        let panels =
            Names::marked("panel", root.may("panels").tables("panel", "mark"), |t| panels::read(t, &around));
        for panel in panels.iter() {
            returns.refuse_twice(reader, &panel.name, &panel.place);
        }
        returns::together(&returns, &around);
        (returns, panels)
    };
    let footings = returns::footings(&returns);
    for (i, (mark, place)) in footings.iter().enumerate() {
        returns.refuse_twice(reader, mark, place);
        panels.refuse_twice(reader, mark, place);
        bracing.refuse_twice(reader, mark, place);
        returns::footing_twice(reader, &footings[..i], mark, place);
    }
    something_to_check(root, !floors.is_empty());

    let floor_edges =
        Names::marked("floor edge", root.may("floor_edges").tables("floor edge", "mark"), |t| {
            floors::edge(t, &panels, &storeys, stability_table.as_ref().zip(stability.as_ref()))
        });
    for edge in floor_edges.iter() {
        returns.refuse_twice(reader, &edge.name, &edge.place);
        panels.refuse_twice(reader, &edge.name, &edge.place);
    }
    floors::one_each(&floor_edges);
    let diaphragm_table = root.may("diaphragm").table("diaphragm");
    let diaphragm = diaphragm_table.as_ref().and_then(|t| {
        floors::diaphragm(
            t,
            &storeys,
            stability_table.as_ref(),
            stability.as_ref(),
            &bracing,
            !floors.is_empty(),
        )
    });
    let collapse = root.may("collapse").table("collapse").and_then(|t| floors::collapse(&t));

    let bearings = Names::marked("bearing", root.may("bearings").tables("bearing", "mark"), |t| {
        bearings::bearing(t, &returns, &build_ups, !floors.is_empty())
    });
    for bearing in bearings.iter() {
        returns.refuse_twice(reader, &bearing.name, &bearing.place);
        panels.refuse_twice(reader, &bearing.name, &bearing.place);
    }
    bearings::together(&bearings, &returns);
    let stone_tables = root.may("padstones").tables("padstone", "name");
    let padstones = all(&stone_tables, bearings::padstone).map(|own| match practice {
        Some(practice) if own.is_empty() => practice.padstones.clone(),
        _ => own,
    });
    bearings::named_once(&stone_tables);
    if bearings.is_empty() && !stone_tables.is_empty() && !root.has("bearings") {
        reader.warn("padstones: there are no [[bearings]] that could use them");
    }

    let marks: Vec<&str> = (returns.list().into_iter())
        .chain(footings.iter().map(|(mark, _)| mark.as_str()))
        .chain(bearings.list())
        .chain(panels.list())
        .chain(floor_edges.list())
        .chain(bracing.list())
        .collect();
    let link_tables = root.need("links").tables("link", "link");
    let links: Vec<_> = link_tables.iter().map(|t| closing::link(t, &marks)).collect();
    closing::chain(reader, &link_tables, &links, (!floor_edges.is_empty(), diaphragm_table.is_some()));
    floors::against_links(&floor_edges, &link_tables, &links);
    let assumptions = all(&root.may("assumptions").tables("assumption", ""), closing::assumption);
    let hold_points =
        all(&root.may("hold_points").tables("hold point", ""), |t| closing::hold_point(t, &marks));
    let photographs =
        all(&root.may("photographs").tables("photograph", "file"), |t| photographs::read(t, &marks));
    let responsible = match root.may("responsible").table("responsible") {
        Some(t) => closing::responsible(&t),
        None => Some(Vec::new()),
    };
    if !root.has("responsible") {
        reader.warn("responsible: nobody is named for temporary support and the order of work");
    }
    root.finish();

    if let (Some(job), Some(identity), Some(signed), Some(signatures), Some(issued), Some(revision)) = (
        &job_table,
        &identity,
        &signature_table,
        &signatures,
        revision_tables.last(),
        revisions.as_ref().and_then(|r| r.last()),
    ) {
        identity::dates((job, identity), (signed, signatures), (issued, revision));
    }

    let of_loads: Vec<_> = bearings.iter().map(|b| (b.name.clone(), b.table.place("load"))).collect();
    let led_panels: Vec<String> =
        panels.iter().filter(|p| !p.table.has("dead_above")).map(|p| p.name.clone()).collect();
    let led_junctions = returns.iter().filter(|r| r.table.peek_under("junction", "dead").is_none());
    let led_junctions: Vec<String> = led_junctions.map(|r| r.name.clone()).collect();
    let bracing = bracing.into_items()?;
    let mut building = Building {
        identity: identity?,
        signatures: signatures?,
        revisions: revisions?,
        basis: basis?,
        wind: wind?,
        materials: materials.into_items()?,
        build_ups: build_ups.into_items()?,
        storeys: storeys.into_items()?,
        plan: walls.into_items()?,
        area_loads: area_loads.into_items()?,
        floors: floors.into_items()?,
        beams: beams.into_items()?,
        neighbours: neighbours?,
        north: north?,
        removed: removed?,
        stability: stability.map(|s| crate::building::Stability { walls: bracing, ..s }),
        returns: returns.into_items()?,
        bearings: bearings.into_items()?,
        padstones: padstones?,
        panels: panels.into_items()?,
        floor_edges: floor_edges.into_items()?,
        diaphragm,
        collapse,
        links: links.into_iter().collect::<Option<_>>()?,
        assumptions: assumptions?,
        hold_points: hold_points?,
        photographs: photographs?,
        responsible: responsible?,
        practice: None,
        found: Found::default(),
        warnings: Vec::new(),
    };
    found::complete(&mut building, found);
    // What the wind lifts is part of what the plan leads down.
    let wind = crate::wind::place::odd(&building).into_iter().chain(crate::wind::routes::odd(&building));
    for words in wind.chain(crate::wind::stated_low(&building)) {
        reader.warn(words);
    }
    let unknown = crate::wind::roof::lift(&mut building);
    for name in unknown {
        reader.warn(format!(
            "area load {name}: its roof is taken not to lift: give `roof` in [wind.site], or `uplift` with the load"
        ));
    }
    if let Some(down) = plan::to_the_ground(reader, &building, &marks_of_plan) {
        let led = Led { panels: led_panels, junctions: led_junctions };
        crate::building::take_loads(&mut building, &down, &led);
    }
    if !building.floors.is_empty() {
        bearings::of_led_loads(reader, &building, &of_loads);
    }
    Some(building)
}

/// Reads every table; nothing where one of them has faults, but all of them are read.
fn all<'a, T>(tables: &[Table<'a>], read: impl Fn(&Table<'a>) -> Option<T>) -> Option<Vec<T>> {
    tables.iter().map(read).collect::<Vec<_>>().into_iter().collect()
}

/// A job without returns and panels checks nothing; a return is never judged alone.
fn something_to_check(root: &Table<'_>, led: bool) {
    let returns = root.has("returns");
    if !led && !returns && !root.has("panels") {
        root.fault(Kind::Missing, "there is nothing to check")
            .at(root.head(), "has no [[returns]] and no [[panels]]")
            .allowed("at least one return or panel")
            .help("add [[returns]] for what stays and braces, [[panels]] for the outer walls it held");
    }
    let stability = root.has("stability");
    let bracing = root.has("bracing");
    // With floors on the plan the storey comes from it.
    if led && !stability && !bracing {
        return;
    }
    if returns && !(stability && bracing) {
        let lacking = if stability { "[[bracing]]" } else { "[stability]" };
        root.fault(Kind::Missing, format_args!("there are returns, but no {lacking}"))
            .at(root.place("returns"), "a return is never judged alone")
            .allowed("[[returns]] with [stability] and [[bracing]], which share the whole storey's wind")
            .help(format!("add {lacking}: every wall along the wind, before and after"));
    } else if bracing != stability {
        let (there, lacking) =
            if bracing { ("bracing", "[stability]") } else { ("stability", "[[bracing]]") };
        root.fault(Kind::Missing, format_args!("there is `{there}`, but no {lacking}"))
            .at(root.place(there), "only one of the two")
            .allowed("[stability] and [[bracing]] together, or neither")
            .help(format!("add {lacking}"));
    }
}
