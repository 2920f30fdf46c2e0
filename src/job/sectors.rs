//! What lies around a site by direction: `[[wind.sectors]]`.

use toml::de::DeValue;

use super::entry::Entry;
use super::limits::Limits;
use super::reader::Table;
use super::words::{ANY, BEARING, TERRAIN};
use crate::building::{Readings, Sector, WindRoute};
use crate::error::Kind;

pub(super) const DISTANCE: Limits = Limits::new(0.0, 200.0, "km");
/// Factors of the charts: what they show at all.
pub(super) const C_E: Limits = Limits::new(0.5, 5.0, "");
pub(super) const C_ET: Limits = Limits::new(0.4, 1.0, "");

/// Reads one sector.
pub fn sector(t: &Table<'_>) -> Option<Sector> {
    let bearings = bearings(&t.need("bearings"));
    let category = if t.has("category") { t.need("category").pick(TERRAIN).map(Some) } else { Some(None) };
    let readings = if ["c_e", "shore", "read_by", "c_eT", "into_town"].iter().any(|key| t.has(key)) {
        readings(t).map(Some)
    } else {
        Some(None)
    };
    t.finish();
    Some(Sector { bearings: bearings?, category: category?, readings: readings? })
}

/// `"any"`, or a list of multiples of 30 degrees.
fn bearings(entry: &Entry<'_>) -> Option<Vec<u16>> {
    let wanted = "\"any\", or degrees from north in steps of 30: [210, 240, 270]";
    if let DeValue::String(text) = entry.present(wanted)? {
        if text == ANY {
            return Some(Vec::new());
        }
        entry.wrong_type(wanted, "write \"any\" or a list");
        return None;
    }
    let items = entry.list(wanted)?;
    let read = |e: &Entry<'_>| {
        let degrees = e.number(&super::words::TURN)?;
        if degrees.rem_euclid(BEARING) != 0.0 || degrees >= 360.0 {
            e.fault(Kind::NotAllowed, format_args!("{degrees} degrees is no bearing of the table"))
                .at(e.place(), "not a step of 30")
                .allowed("0, 30, 60, ... 330: UK Table NA.1")
                .help("write the nearest of these");
            return None;
        }
        #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss, reason = "0 to 330")]
        Some(degrees as u16)
    };
    items.iter().map(read).collect::<Vec<_>>().into_iter().collect()
}

fn readings(t: &Table<'_>) -> Option<Readings> {
    let c_e = t.need("c_e").number(&C_E);
    let shore = t.need("shore").quantity(&DISTANCE);
    let (c_eT, into_town) = if t.has("c_eT") || t.has("into_town") {
        (t.need("c_eT").number(&C_ET).map(Some), t.need("into_town").quantity(&DISTANCE).map(Some))
    } else {
        (Some(None), Some(None))
    };
    let words = t.need("read_by").text();
    Some(Readings { c_e: c_e?, c_eT: c_eT?, shore: shore?, into_town: into_town?, words: words? })
}

/// Every bearing once, or one sector for any; what the route needs in each.
pub fn round(
    t: &Table<'_>,
    tables: &[Table<'_>],
    all: &[Option<Sector>],
    route: Option<WindRoute>,
    turned: bool,
) {
    let Some(read) = all.iter().map(Option::as_ref).collect::<Option<Vec<&Sector>>>() else { return };
    let any = read.iter().any(|s| s.bearings.is_empty());
    let mut seen: Vec<u16> = read.iter().flat_map(|s| s.bearings.iter().copied()).collect();
    seen.sort_unstable();
    let whole: Vec<u16> = (0..12).map(|n| n * 30).collect();
    if !read.is_empty() && (any && read.len() > 1 || !any && seen != whole) {
        t.fault(Kind::Contradiction, "the sectors do not go round once")
            .at(tables[0].place("bearings"), "bearings")
            .allowed("one sector with bearings = \"any\", or every bearing from 0 to 330 in steps of 30 in one sector")
            .help("add the bearings that are missing, or take out what stands twice");
    }
    if !read.is_empty() && !any && !turned {
        t.fault(Kind::Contradiction, "the sectors have bearings, but the plan does not say where north is")
            .at(tables[0].place("bearings"), "bearings")
            .allowed("bearings with [plan] and its `north`")
            .help("add [plan], or write bearings = \"any\"");
    }
    for (table, sector) in tables.iter().zip(&read) {
        let lacking = match route {
            Some(WindRoute::Terrain) if sector.category.is_none() => "category",
            Some(WindRoute::Charts) if sector.readings.is_none() => "c_e",
            _ => continue,
        };
        table
            .fault(Kind::Missing, format_args!("the route needs `{lacking}`"))
            .at(table.head(), format!("has no `{lacking}`"))
            .and(t.place("route"), "route")
            .allowed("`category` for the terrain route; `c_e`, `shore` and `read_by` for the charts")
            .help(format!("add `{lacking}`, or name another route"));
    }
}
