//! `[wind]`: stated figures, and the site that the other two routes need.

use toml::de::DeValue;

use super::entry::Entry;
use super::limits::{Limits, Odd};
use super::names::Names;
use super::reader::Table;
use super::sectors::{round, sector};
use super::words::{GROUND, ROOFS};
use crate::building::{
    Along, Dominant, Feature, Orography, Roof, RoofForm, Sector, Side, Site, StatedWind, Storey, Town, Wind,
    WindRoute,
};
use crate::error::Kind;
use crate::quantity::{Area, Length};

/// Net pressures; 5 kN/m2 is typed in place of 0.5 more often than it is meant.
pub const PRESSURE: Limits = Limits::new(0.05, 10.0, "kN/m2").odd(&[
    Odd::Below(0.25, "less than even a sheltered site gives, mostly a slip of the point"),
    Odd::Above(2.0, "more than UK sites of two or three storeys give, mostly a slip of the point"),
]);
pub(super) const MAP_SPEED: Limits = Limits::new(15.0, 45.0, "m/s").odd(&[
    Odd::Below(21.0, "below the lowest line of the UK wind map"),
    Odd::Above(31.0, "above the highest line of the UK wind map"),
]);
pub(super) const ALTITUDE: Limits =
    Limits::new(-10.0, 1350.0, "m").odd(&[Odd::Above(500.0, "higher than almost every house in the UK")]);
pub(super) const REFERENCE_HEIGHT: Limits =
    Limits::new(2.0, 60.0, "m").odd(&[Odd::Above(20.0, "tall for a masonry house")]);
pub(super) const SIDE: Limits =
    Limits::new(2.0, 200.0, "m").odd(&[Odd::Above(60.0, "long for a masonry house")]);
pub(super) const SEASON: Limits = Limits::new(0.6, 1.0, "");
pub(super) const PROBABILITY: Limits =
    Limits::new(0.001, 0.5, "").odd(&[Odd::Above(0.02, "a wind weaker than that of 50 years")]);
pub(super) const OROGRAPHY: Limits = Limits::new(1.0, 2.5, "");
/// Height of a hill or cliff, and the lengths of its slopes.
pub(super) const HILL: Limits = Limits::new(1.0, 1500.0, "m");
pub(super) const SLOPE: Limits = Limits::new(1.0, 20_000.0, "m");
pub(super) const FROM_CREST: Limits = Limits::new(-20_000.0, 20_000.0, "m");
pub(super) const BUILDINGS: Limits = Limits::new(2.0, 200.0, "m");
pub(super) const APART: Limits = Limits::new(0.0, 2000.0, "m");
pub(super) const OPENINGS: Limits = Limits::new(0.0, 1000.0, "m2");
pub(super) const PITCH: Limits = Limits::new(5.0, 75.0, "");

/// Usual yearly probability of a stronger wind: 4.2(2)P note 4.
pub(super) const P_USUAL: f64 = 0.02;

/// Reads `[wind]`.
pub fn wind(t: &Table<'_>, storeys: &Names<'_, Storey>, turned: bool) -> Option<Wind> {
    let route = t.need("route").choice(WindRoute::WORDS, WindRoute::from_word);
    let stated = t.may("stated").table("stated wind").and_then(|t| stated(&t));
    let site = t.may("site").table("site of the wind").and_then(|t| site(&t, storeys));
    let tables = t.may("sectors").tables("wind sector", "");
    let sectors: Vec<Option<Sector>> = tables.iter().map(sector).collect();
    let key = if route == Some(WindRoute::Stated) { "stated" } else { "site" };
    if route.is_some() && !t.has(key) {
        t.fault(
            Kind::Contradiction,
            format_args!(
                "the route is \"{}\", but there is no [wind.{key}]",
                route.map_or("", WindRoute::word)
            ),
        )
        .at(t.place("route"), "route")
        .and(t.head(), format!("nothing under it is called `{key}`"))
        .allowed("the route of a table that is there")
        .help(format!("add [wind.{key}], or name another route"));
    }
    if t.has("site") && !t.has("sectors") {
        t.fault(Kind::Missing, "the site says nothing of what lies around it")
            .at(t.place("site"), "site")
            .allowed("[[wind.sectors]], one with bearings = \"any\" or one for each group of bearings")
            .help("add [[wind.sectors]] with `bearings` and `category`, or with the readings of the charts");
    }
    round(t, &tables, &sectors, route, turned);
    t.finish();
    let sectors: Vec<Sector> = sectors.into_iter().collect::<Option<_>>()?;
    let site = site.map(|site| Site { sectors, ..site });
    Some(Wind { route: route?, stated, site })
}

fn stated(t: &Table<'_>) -> Option<StatedWind> {
    let overall = t.need("overall").quantity(&PRESSURE);
    let panel = t.need("panel").quantity(&PRESSURE);
    let reason = t.need("reason").text();
    t.finish();
    Some(StatedWind { overall: overall?, panel: panel?, reason: reason? })
}

fn site(t: &Table<'_>, storeys: &Names<'_, Storey>) -> Option<Site> {
    let v_map = t.need("v_map").quantity(&MAP_SPEED);
    let altitude = t.need("altitude").quantity(&ALTITUDE);
    // The lowest storey says how high the building is.
    let drawn = storeys.iter().next().and_then(|s| s.item.as_ref()).map(|s| s.total_height);
    let height: Option<Length> = match drawn {
        Some(drawn) if !t.has("height") => Some(drawn),
        _ => t.need("height").quantity(&REFERENCE_HEIGHT),
    };
    let along_x = t.need("along_x").quantity(&SIDE);
    let along_y = t.need("along_y").quantity(&SIDE);
    let c_season = t.may("c_season").factor(1.0, &SEASON);
    let p = t.may("probability").factor(P_USUAL, &PROBABILITY);
    let orography = orography(t);
    let town = if t.has("town") { town(&t.need("town")).map(Some) } else { Some(None) };
    let lack_of_correlation = t.may("lack_of_correlation").flag().unwrap_or(false);
    let dominant = t.has("dominant_opening");
    let dominant = if dominant { opening(&t.need("dominant_opening")).map(Some) } else { Some(None) };
    let roof = if t.has("roof") { roof(&t.need("roof"), height).map(Some) } else { Some(None) };
    t.finish();
    Some(Site {
        v_map: v_map?,
        altitude: altitude?,
        height: height?,
        size: (along_x?, along_y?),
        c_season: c_season?,
        p: p?,
        orography: orography?,
        town: town?,
        lack_of_correlation,
        dominant: dominant?,
        roof: roof?,
        sectors: Vec::new(),
    })
}

/// Level ground needs a reason as much as a hill needs its size.
fn orography(t: &Table<'_>) -> Option<Orography> {
    match (t.has("orography"), t.has("c_o")) {
        (true, true) => {
            t.clash("`orography` and `c_o` both speak of the ground", "c_o", "orography")
                .allowed("one of the two")
                .help("keep `orography` for level ground or for a hill, or `c_o` with its reason");
            None
        }
        (false, true) => t.may("c_o").cause(|e| e.number(&OROGRAPHY)).map(Orography::Stated),
        _ => {
            let entry = t.need("orography");
            match &entry.value {
                Some((DeValue::Table(_), _)) => feature(&entry).map(Orography::Feature),
                _ => entry.text().map(Orography::None),
            }
        }
    }
}

fn feature(entry: &Entry<'_>) -> Option<Feature> {
    let t = entry.table("orography")?;
    let form = t.need("form").pick(GROUND);
    let height = t.need("height").quantity(&HILL);
    let upwind = t.need("upwind").quantity(&SLOPE);
    let falls = form.is_none_or(crate::standards::en1991_1_4::Ground::falls_again);
    let downwind = if falls { t.need("downwind").quantity(&SLOPE) } else { Some(Length::ZERO) };
    let from_crest = t.need("from_crest").quantity(&FROM_CREST);
    let words = t.need("words").text();
    t.finish();
    Some(Feature {
        form: form?,
        height: height?,
        upwind: upwind?,
        downwind: downwind?,
        from_crest: from_crest?,
        words: words?,
    })
}

fn town(entry: &Entry<'_>) -> Option<Town> {
    let t = entry.table("town")?;
    let buildings = t.need("buildings").quantity(&BUILDINGS);
    let apart = t.need("apart").quantity(&APART);
    let words = t.need("words").text();
    t.finish();
    Some(Town { buildings: buildings?, apart: apart?, words: words? })
}

fn opening(entry: &Entry<'_>) -> Option<Dominant> {
    let t = entry.table("dominant opening")?;
    let side = t.need("side").choice(Side::WORDS, Side::from_word);
    let area: Option<Area> = t.need("area").quantity(&OPENINGS);
    let others: Option<Area> = t.need("others").quantity(&OPENINGS);
    let words = t.need("words").text();
    if let (Some(area), Some(others)) = (area, others)
        && area < others * 2.0
    {
        t.clash("the opening does not dominate", "area", "others")
            .allowed("at least twice the openings of all other faces: EN 1991-1-4 7.2.9(4)")
            .help("take `dominant_opening` out: the usual internal pressure holds");
    }
    t.finish();
    Some(Dominant { side: side?, area: area?, others: others?, words: words? })
}

fn roof(entry: &Entry<'_>, height: Option<Length>) -> Option<Roof> {
    let t = entry.table("roof")?;
    let form = t.need("form").pick(ROOFS);
    let pitch = match form {
        Some(RoofForm::Flat) => Some(0.0),
        _ => t.need("pitch").number(&PITCH),
    };
    let ridge = match form {
        Some(RoofForm::Flat) => Some(Along::X),
        _ => t.need("ridge").choice(Along::WORDS, Along::from_word),
    };
    let eaves: Option<Length> = t.need("eaves").quantity(&REFERENCE_HEIGHT);
    if let (Some(eaves), Some(height)) = (eaves, height)
        && eaves > height
    {
        t.fault(Kind::Contradiction, "the eaves are higher than the building")
            .at(t.place("eaves"), "eaves")
            .allowed(format!("at most the height of the building, {:.2} m", height.base() / 1e3))
            .help("correct the eaves, or the height");
    }
    t.finish();
    Some(Roof { form: form?, pitch: pitch?, ridge: ridge?, eaves: eaves? })
}
