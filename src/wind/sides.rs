//! The bearing that governs onto each side of the building.

use super::SIDES;
use super::velocity::{Onto, Shared, peak};
use crate::building::{Building, Sector, Side, Site};
use crate::quantity::Stress;
use crate::standards::annex::Annex;
use crate::trace::{Outside, Sheet};

/// Farthest that the wind may come off the square of a side: 7.2.1(2) with the wind normal to it, +-45 degrees.
const OFF: f64 = 45.0;

/// Onto each side the worst of the bearings within 45 degrees of its square.
pub fn by_sector(
    s: &mut Sheet,
    b: &Building,
    site: &Site,
    shared: Shared,
    charts: bool,
    annex: &Annex,
) -> Result<[Onto; 4], Outside> {
    let mut chosen = Vec::new();
    for side in SIDES {
        let square = bearing_of(b, side);
        let mut worst: Option<(&Sector, u16, Stress)> = None;
        for sector in &site.sectors {
            for &bearing in &sector.bearings {
                if off(f64::from(bearing), square) > OFF {
                    continue;
                }
                let mut silent = Sheet::silent();
                let (_, q) = peak(&mut silent, shared, (sector, Some(bearing)), charts, annex)?;
                if worst.is_none_or(|w| q > w.2) {
                    worst = Some((sector, bearing, q));
                }
            }
        }
        let missing = || Outside::new("wind", "UK NA Table NA.1", "a bearing for every side");
        let (sector, bearing, _) = worst.ok_or_else(missing)?;
        chosen.push((side, sector, bearing));
    }
    let heads: Vec<String> = chosen
        .iter()
        .map(|(side, _, bearing)| format!("onto the {} side, from {bearing}°", side.word()))
        .collect();
    s.note(
        "Onto each side the bearing within 45° of its square that gives the greatest pressure (UK Table NA.1, in steps of \
         30°); north is that of the plan.",
    );
    let found = s.columns(&heads, |s, i| {
        let (side, sector, bearing) = chosen[i];
        peak(s, shared, (sector, Some(bearing)), charts, annex).map(|(v_b, q_p)| Onto {
            side,
            bearing: Some(bearing),
            v_b,
            q_p,
        })
    });
    let all: Vec<Onto> = found.into_iter().collect::<Result<_, _>>()?;
    all.try_into().map_err(|_| Outside::new("wind", "job file", "four sides"))
}

/// Where the wind square onto a side comes from, degrees from north.
pub fn bearing_of(b: &Building, side: Side) -> f64 {
    let turn = match side {
        Side::Up => 0.0,
        Side::Right => 90.0,
        Side::Down => 180.0,
        Side::Left => 270.0,
    };
    // North lies `north` degrees clockwise from the top of the page.
    (turn - b.north).rem_euclid(360.0)
}

/// Between two bearings, degrees.
fn off(a: f64, z: f64) -> f64 {
    let d = (a - z).rem_euclid(360.0);
    d.min(360.0 - d)
}
