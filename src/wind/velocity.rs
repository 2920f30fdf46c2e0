//! The peak velocity pressure of the wind onto each side of the building.

use super::{SIDES, sides};
use crate::building::{Building, Orography, Sector, Side, Site};
use crate::quantity::{Length, Num, Speed, Stress, print};
use crate::standards::annex::Annex;
use crate::standards::en1991_1_4::{self as wind, Reading};
use crate::standards::tables::wind::{c_dir, roughness};
use crate::trace::{Outside, Sheet};
use crate::{given, lookup};

/// Wind onto one side.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Onto {
    /// The side that it meets.
    pub side: Side,
    /// Where it comes from, degrees from north; none where any direction counts the same.
    pub bearing: Option<u16>,
    /// Basic wind velocity.
    pub v_b: Speed,
    /// Peak velocity pressure at the height of the building.
    pub q_p: Stress,
}

/// What every direction shares.
#[derive(Clone, Copy)]
pub struct Shared {
    v_map: Speed,
    A: Length,
    z: Length,
    c_season: Num,
    c_prob: Num,
    c_o: Num,
    h_dis: Length,
}

/// Peak pressures onto each of [`SIDES`], by the charts or by terrain category.
///
/// # Errors
/// [`Outside`] where a clause does not reach.
pub fn onto(
    s: &mut Sheet,
    b: &Building,
    site: &Site,
    charts: bool,
    annex: &Annex,
) -> Result<[Onto; 4], Outside> {
    s.heading(
        1,
        if charts {
            "Peak pressure by the charts of the UK annex"
        } else {
            "Peak pressure by terrain category"
        },
    );
    let shared = shared(s, site)?;
    given!(
        s,
        "density of air",
        "UK NA.2.18, from memory, check against the standard (H)",
        rho = wind::air(annex.rho_air)
    );
    let _ = rho;
    let any = site.sectors.iter().find(|x| x.bearings.is_empty());
    let out = if let Some(sector) = any {
        let (v_b, q_p) = peak(s, shared, (sector, None), charts, annex)?;
        SIDES.map(|side| Onto { side, bearing: None, v_b, q_p })
    } else {
        sides::by_sector(s, b, site, shared, charts, annex)?
    };
    s.note(if charts {
        "The annex's charts are not held here: the factors were read by the person named, at the distances given. Size and \
         dynamic factor follow."
    } else {
        "This route is the text of the EN with a terrain category; the UK National Annex reads the peak pressure from charts instead."
    });
    Ok(out)
}

fn shared(s: &mut Sheet, site: &Site) -> Result<Shared, Outside> {
    let source = "job file";
    given!(
        s,
        "map value of the basic wind velocity",
        "read from UK Figure NA.1, job file",
        v_map = site.v_map
    );
    given!(s, "altitude", source, A = site.altitude);
    given!(s, "reference height, that of the building", source, z = site.height);
    let because = if site.c_season.reason.is_empty() {
        "default, safe side".to_owned()
    } else {
        format!("stated: {}", site.c_season.reason)
    };
    given!(s, "season factor", &because, c_season = Num::new(site.c_season.value));
    if !site.p.reason.is_empty() {
        s.note(format!("Another return period than 50 years: {}.", site.p.reason.trim_end_matches('.')));
    }
    let c_prob = if site.p.reason.is_empty() {
        given!(
            s,
            "probability factor, for the 50 years of the map",
            "4.2(2)P note 4",
            c_prob = Num::new(1.0)
        );
        c_prob
    } else {
        wind::probability(s, Num::new(site.p.value))?
    };
    let c_o = match &site.orography {
        Orography::None(reason) => {
            given!(s, "orography factor", &format!("stated: {reason}"), c_o = Num::new(1.0));
            c_o
        }
        Orography::Stated(cause) => {
            given!(s, "orography factor", &format!("stated: {}", cause.reason), c_o = Num::new(cause.value));
            c_o
        }
        Orography::Feature(f) => {
            s.note(format!(
                "{} It counts for every direction of the wind, the safe side; altitude is that of its foot.",
                f.words
            ));
            wind::orography(s, f.slope(), z)?
        }
    };
    let h_dis = match &site.town {
        Some(town) => {
            s.note(town.words.clone());
            given!(s, "mean height of the buildings upwind", source, h_ave = town.buildings);
            given!(s, "distance to them", source, x = town.apart);
            given!(s, "height of the building", source, h = site.height);
            wind::displacement(s, h_ave, x, h)?
        }
        None => {
            given!(s, "displacement height", "none taken, safe side", h_dis = Length::ZERO);
            h_dis
        }
    };
    Ok(Shared { v_map, A, z, c_season, c_prob, c_o, h_dis })
}

/// Peak pressure at a height below that of the building, of the wind that governs there; silently.
///
/// # Errors
/// [`Outside`] where a clause does not reach.
pub fn at_height(site: &Site, o: &Onto, z: Length, annex: &Annex) -> Result<Stress, Outside> {
    let mut s = Sheet::silent();
    let lower = Site { height: z, ..site.clone() };
    let shared = shared(&mut s, &lower)?;
    let here = |x: &&Sector| o.bearing.is_none_or(|b| x.bearings.contains(&b));
    let missing = || Outside::new("wind", "UK NA Table NA.1", "a sector for every side");
    let sector = site.sectors.iter().find(here).ok_or_else(missing)?;
    peak(&mut s, shared, (sector, o.bearing), false, annex).map(|(_, q)| q)
}

/// Velocity and peak pressure of one sector; what is shared, and rho, stand on the sheet.
pub fn peak(
    s: &mut Sheet,
    w: Shared,
    (sector, bearing): (&Sector, Option<u16>),
    charts: bool,
    annex: &Annex,
) -> Result<(Speed, Stress), Outside> {
    let Shared { v_map, A, z, c_season, c_prob, c_o, h_dis } = w;
    let rho = wind::air(annex.rho_air);
    let out =
        |e: crate::standards::source::OutOfTable| Outside::new("wind", "UK NA Table NA.1", e.to_string());
    let one = Num::new(1.0);
    let looked = c_dir(bearing.map(f64::from)).map_err(out)?;
    lookup!(s, "UK NA Table NA.1", "direction factor", c_dir = looked, one);
    let v_b = wind::basic_velocity(s, v_map, A, z, c_dir, c_season, c_prob);
    let missing = |what: &str| Outside::new("wind", "job file", format!("{what} of every sector"));
    if charts {
        let read = sector.readings.as_ref().ok_or_else(|| missing("readings of the charts"))?;
        s.note(format!("{}.", read.words.trim_end_matches('.')));
        let z_d = wind::reading_height(s, z, h_dis)?;
        let km = |l: Length| l.base() / 1e6;
        let town = read.c_eT.zip(read.into_town).map(|(c_e_T, into)| wind::Town { c_e_T, into_km: km(into) });
        let reading = Reading { c_e: read.c_e, shore_km: km(read.shore), town };
        let q_p = wind::peak_pressure_read(s, v_b, z, z_d, c_o, rho, reading)?;
        return Ok((v_b, q_p));
    }
    let category = sector.category.ok_or_else(|| missing("the terrain category"))?;
    let rough = roughness(category);
    let table = format!("Table 4.1, category {category}");
    given!(s, "roughness length", &table, z_0 = Length::new(rough.value.z_0 * 1e3));
    given!(s, "least height", &table, z_min = Length::new(rough.value.z_min * 1e3));
    let q_p = if h_dis > Length::ZERO {
        wind::peak_pressure_displaced(s, v_b, z, h_dis, z_0, z_min, c_o, rho)?
    } else {
        wind::peak_pressure(s, v_b, z, z_0, z_min, c_o, rho)
    };
    Ok((v_b, q_p))
}

/// A pressure as it is printed.
pub fn shown(q: Stress) -> String {
    print::show("q", q.dynamic()).value
}
