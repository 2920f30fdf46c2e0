//! The routes of one site side by side: stated, by terrain category, by the charts as read.

use super::velocity::shown;
use super::{Derived, by_route};
use crate::building::{Building, Site, WindRoute};
use crate::quantity::functions::max;
use crate::quantity::{Stress, print};
use crate::standards::annex::Annex;
use crate::trace::{Column, Sheet, Table};

/// What one route gives: along x, along y, and on every panel.
struct Route {
    route: WindRoute,
    pressures: Vec<Stress>,
}

const fn words(route: WindRoute) -> &'static str {
    match route {
        WindRoute::Stated => "stated",
        WindRoute::Terrain => "terrain",
        WindRoute::Charts => "charts",
    }
}

/// Whether the site says what the charts, or else the terrain route, needs in every sector.
pub fn described(site: &Site, charts: bool) -> bool {
    let here = |x: &crate::building::Sector| if charts { x.readings.is_some() } else { x.category.is_some() };
    site.sectors.iter().all(here)
}

/// Every route that the job describes and that stays within the method. `known` is what the site gives by the route that
/// is on the sheet, and whether that is by the charts.
fn all(b: &Building, annex: &Annex, known: Option<(&Derived, bool)>) -> Vec<Route> {
    let mut out = Vec::new();
    if let Some(st) = &b.wind.stated {
        let panels = std::iter::repeat_n(st.panel, b.panels.len());
        let pressures = [st.overall, st.overall].into_iter().chain(panels).collect();
        out.push(Route { route: WindRoute::Stated, pressures });
    }
    let Some(site) = &b.wind.site else { return out };
    for (charts, route) in [(false, WindRoute::Terrain), (true, WindRoute::Charts)] {
        if !described(site, charts) {
            continue;
        }
        let own = match known {
            Some((d, by_charts)) if by_charts == charts => Some(d.clone()),
            _ => by_route(&mut Sheet::silent(), b, site, charts, annex).ok(),
        };
        let Some(d) = own else { continue };
        let panels = b
            .panels
            .iter()
            .map(|p| d.panels.iter().find(|n| n.mark == p.mark).map_or(Stress::ZERO, |n| n.worst));
        let pressures = [d.along[0].top, d.along[1].top].into_iter().chain(panels).collect();
        out.push(Route { route, pressures });
    }
    out
}

/// The table of all routes, where there is more than one, and what a lower one that decides means.
pub fn beside(s: &mut Sheet, b: &Building, annex: &Annex, known: Option<(&Derived, bool)>) {
    if !s.recording() {
        return;
    }
    let all = all(b, annex, known);
    if all.len() < 2 {
        return;
    }
    s.heading(1, "The routes side by side");
    s.table(|| table(b, &all));
    if let Some(text) = lower(b, &all) {
        s.note(text);
    }
}

fn table(b: &Building, all: &[Route]) -> Table {
    let names = ["overall, wind along x".to_owned(), "overall, wind along y".to_owned()].into_iter();
    let names = names.chain(b.panels.iter().map(|p| format!("panel {}", p.mark)));
    let decides = all.iter().find(|r| r.route == b.wind.route);
    let row = |(n, name): (usize, String)| {
        let mut row = vec![name];
        row.extend(all.iter().map(|r| shown(r.pressures[n])));
        let greatest = all.iter().map(|r| r.pressures[n]).fold(Stress::ZERO, max);
        let part = decides.filter(|_| greatest > Stress::ZERO);
        row.push(
            part.map_or_else(String::new, |r| print::significant(r.pressures[n].base() / greatest.base())),
        );
        row
    };
    let mut columns = vec![Column::words("pressure")];
    columns.extend(all.iter().map(|r| {
        let decides = if r.route == b.wind.route { ", decides" } else { "" };
        Column::numbers(&format!("{}{decides}", words(r.route)))
    }));
    columns.push(Column::numbers("deciding / greatest"));
    Table {
        caption: "Net characteristic pressures by every route that this job describes, kN/m²".to_owned(),
        columns,
        rows: names.enumerate().map(row).collect(),
        strong: vec![],
    }
}

/// A sentence where the route that decides gives less than another.
fn lower(b: &Building, all: &[Route]) -> Option<String> {
    let own = all.iter().find(|r| r.route == b.wind.route)?;
    let times = |other: &Route| {
        let each = other.pressures.iter().zip(&own.pressures).map(|(o, d)| o.base() / d.base());
        each.filter(|x| x.is_finite()).fold(0.0, f64::max)
    };
    // The charts are the annex's own: nothing stands over them. A statement stands over nothing.
    let over = |other: WindRoute| match own.route {
        WindRoute::Stated => other != WindRoute::Stated,
        WindRoute::Terrain => other == WindRoute::Charts,
        WindRoute::Charts => false,
    };
    let others = all.iter().filter(|r| over(r.route));
    let (other, most) = others.map(|r| (r, times(r))).max_by(|a, z| a.1.total_cmp(&z.1))?;
    if most <= 1.005 {
        return None;
    }
    let rule = if own.route == WindRoute::Stated {
        "The person who states the pressure answers for the difference."
    } else {
        "In the UK the National Annex has the charts in place of the terrain categories: let them decide, or say why not."
    };
    Some(format!(
        "The route that decides, {}, gives less than {}, which gives up to {} times as much. {rule}",
        words(own.route),
        words(other.route),
        print::ratio(most)
    ))
}

/// The same sentence for a job as it is read.
pub fn odd(b: &Building) -> Option<String> {
    let all = all(b, &Annex::UK, None);
    lower(b, &all).map(|text| format!("wind: {text}"))
}
