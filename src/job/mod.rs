//! The job file: TOML text in, a building out, or everything that is wrong with the text.
//!
//! What the user typed stays a tree of TOML values with their places (`reader`, `entry`); what
//! the checks work with is the [`Building`]. Between them one function per part of the file reads
//! its fields, holds them against each other and names both places where they contradict.
//!
//! * [`read`]: the whole file
//! * `limits`: what a number may be, declared beside each field
//! * `names`: marks and names, and references to them
//! * `identity basis materials ground returns bearing footing panels closing`: the parts, in the file's order
//! * [`start`]: the job to start from

mod basis;
mod bearing;
mod closing;
mod date;
mod entry;
mod figure;
mod footing;
mod ground;
mod identity;
mod limits;
mod materials;
mod names;
mod panels;
mod reader;
mod returns;
pub mod start;
mod syntax;
mod words;

#[cfg(test)]
mod tests;

use toml::de::DeTable;

pub use date::in_words as date_in_words;

use crate::building::{Building, PlanWall};
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
    let reader = Reader::default();
    let (tree, errors) = DeTable::parse_recoverable(text);
    // A tree that was mended by guessing would give faults that are not there.
    let building = if errors.is_empty() {
        let root = Table::new(&reader, "job file".to_owned(), tree.get_ref(), 0..0);
        whole(&root)
    } else {
        syntax::record(&reader, text, &errors);
        None
    };
    let (diagnostics, warnings) = reader.into_parts();
    match building {
        Some(building) if diagnostics.is_empty() => Ok(Building { warnings, ..building }),
        _ => Err(Report::new(name, text, diagnostics)),
    }
}

fn whole(root: &Table<'_>) -> Option<Building> {
    let reader = root.reader;
    let job_table = root.need("job").table("job");
    let identity = job_table.as_ref().and_then(identity::identity);
    let signature_table = root.need("signatures").table("signatures");
    let signatures = signature_table.as_ref().and_then(identity::signatures);
    let revision_tables = root.need("revisions").tables("revision", "letter");
    let revisions = identity::revisions(&revision_tables);
    let basis = basis::basis(root.may("basis").table("basis").as_ref());
    let wind = root.need("wind").table("wind").and_then(|t| basis::wind(&t));

    let materials =
        materials::by_name("material", root.need("materials").named("material"), materials::material);
    let build_ups = materials::by_name("build-up", root.need("build_ups").named("build-up"), |name, t| {
        materials::build_up(name, t, &materials)
    });
    let storeys = Names::marked("storey", root.need("storeys").tables("storey", "mark"), ground::storey);
    ground::stacked(&storeys);

    let plan_table = root.may("plan").table("plan");
    let north = plan_table.as_ref().map_or(Some(0.0), ground::north);
    let plan: Names<'_, PlanWall> = match &plan_table {
        Some(t) => Names::marked("wall", t.need("walls").tables("plan wall", "mark"), |w| {
            ground::plan_wall(w, &build_ups)
        }),
        None => Names::new("wall"),
    };
    if let Some(t) = &plan_table {
        t.finish();
    }

    let removed_table = root.need("removed").table("removed wall");
    let removed = removed_table.as_ref().and_then(|t| ground::removed(t, &plan, &build_ups, &storeys));
    let bracing = Names::marked("bracing wall", root.may("bracing").tables("bracing wall", "mark"), |t| {
        ground::bracing_wall(t, &build_ups)
    });
    let stability_table = root.may("stability").table("stability");
    let stability = stability_table
        .as_ref()
        .and_then(|t| ground::stability(t, &storeys, &bracing, removed_table.as_ref()));

    let (returns, panels) = {
        let around = Around {
            build_ups: &build_ups,
            storeys: &storeys,
            plan: &plan,
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
    something_to_check(root);

    let marks: Vec<&str> = returns
        .list()
        .into_iter()
        .chain(footings.iter().map(|(mark, _)| mark.as_str()))
        .chain(panels.list())
        .chain(bracing.list())
        .collect();
    let link_tables = root.need("links").tables("link", "link");
    let links: Vec<_> = link_tables.iter().map(|t| closing::link(t, &marks)).collect();
    closing::chain(reader, &link_tables, &links);
    let assumptions = all(&root.may("assumptions").tables("assumption", ""), closing::assumption);
    let hold_points =
        all(&root.may("hold_points").tables("hold point", ""), |t| closing::hold_point(t, &marks));
    let photographs =
        all(&root.may("photographs").tables("photograph", "file"), |t| closing::photograph(t, &marks));
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

    let bracing = bracing.into_items()?;
    Some(Building {
        identity: identity?,
        signatures: signatures?,
        revisions: revisions?,
        basis: basis?,
        wind: wind?,
        materials: materials.into_items()?,
        build_ups: build_ups.into_items()?,
        storeys: storeys.into_items()?,
        plan: plan.into_items()?,
        north: north?,
        removed: removed?,
        stability: stability.map(|s| crate::building::Stability { walls: bracing, ..s }),
        returns: returns.into_items()?,
        panels: panels.into_items()?,
        links: links.into_iter().collect::<Option<_>>()?,
        assumptions: assumptions?,
        hold_points: hold_points?,
        photographs: photographs?,
        responsible: responsible?,
        warnings: Vec::new(),
    })
}

/// Reads every table; nothing where one of them has faults, but all of them are read.
fn all<'a, T>(tables: &[Table<'a>], read: impl Fn(&Table<'a>) -> Option<T>) -> Option<Vec<T>> {
    tables.iter().map(read).collect::<Vec<_>>().into_iter().collect()
}

/// A job without returns and panels checks nothing; a return is never judged alone.
fn something_to_check(root: &Table<'_>) {
    let returns = root.has("returns");
    if !returns && !root.has("panels") {
        root.fault(Kind::Missing, "there is nothing to check")
            .at(root.head(), "has no [[returns]] and no [[panels]]")
            .allowed("at least one return or panel")
            .help("add [[returns]] for what stays and braces, [[panels]] for the outer walls it held");
    }
    let stability = root.has("stability");
    let bracing = root.has("bracing");
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
