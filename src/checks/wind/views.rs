//! The drawings of the wind sheet: zones and panels on the plan, and the ground; the forces at the levels are in `forces`.

use super::forces;
use crate::building::{Along, Building, Orography, Side, Site};
use crate::checks::{Job, named};
use crate::quantity::{Stress, print};
use crate::sketch::scale::APART;
use crate::sketch::{
    Action, Drawing, Frame, GroundProfile, Piece, PlanWind, WallZone, WindPanel, WindPlan, ground_profile,
    wind_plans,
};
use crate::standards::en1991_1_4::{self as standard, Ground};
use crate::standards::tables::walls::{Zone, c_pe, side_zones};
use crate::trace::{Outside, Sheet};
use crate::wind::place::{self, OnSide};
use crate::wind::velocity::{Onto, shown};
use crate::wind::walls::out;
use crate::wind::{Derived, Wind};

/// Frames on the sheet: two drawings side by side, one that stands alone, the ground, mm.
pub const ROW: Frame = Frame::new(170.0, 110.0);
const ALONE: Frame = Frame::new(170.0, 90.0);
const GROUND: Frame = Frame::new(150.0, 60.0);

/// Drawings, named on the sheet.
pub fn drawings(s: &mut Sheet, job: &Job<'_>, wind: &Wind, derived: Option<&Derived>) -> Vec<Drawing> {
    if !job.drawn {
        return Vec::new();
    }
    let b = job.building;
    let mut all: Vec<Vec<Drawing>> = Vec::new();
    if let (Some(site), Some(d)) = (&b.wind.site, derived) {
        all.extend(plans(b, site, d).ok().map(|pair| pair.to_vec()));
        all.extend(ground(site).map(|d| vec![d]));
    }
    all.push(forces::elevations(job, wind));
    for row in &all {
        // One above the other they need not stay on one page.
        let width: f64 = row.iter().map(|d| d.width + APART).sum::<f64>() - APART;
        let abreast = if width <= ROW.width { row.len() } else { 1 };
        row.chunks(abreast.max(1)).for_each(|some| named(s, some));
    }
    all.into_iter().flatten().collect()
}

/// The wind from the worse sense of each direction.
fn plans(b: &Building, site: &Site, d: &Derived) -> Result<[Drawing; 2], Outside> {
    let worse = |i: usize| if d.onto[2 * i + 1].q_p > d.onto[2 * i].q_p { 2 * i + 1 } else { 2 * i };
    let views = [plan(b, site, d, (Along::X, worse(0)))?, plan(b, site, d, (Along::Y, worse(1)))?];
    Ok(wind_plans(&views, ROW, ALONE))
}

/// Outward from a side.
const fn outward(side: Side) -> PlanWind {
    match side {
        Side::Left => PlanWind::Leftwards,
        Side::Right => PlanWind::Rightwards,
        Side::Down => PlanWind::Downwards,
        Side::Up => PlanWind::Upwards,
    }
}

fn plan(b: &Building, site: &Site, d: &Derived, (along, n): (Along, usize)) -> Result<WindPlan, Outside> {
    let drawn = !b.plan.is_empty();
    let [x, y] = if drawn {
        place::outline(b, site).map(|(low, high)| (low.base(), high.base()))
    } else {
        [(0.0, site.size.0.base()), (0.0, site.size.1.base())]
    };
    let size = (x.1 - x.0, y.1 - y.0);
    let onto = d.onto[n];
    let panels = d.panels.iter().filter_map(|p| {
        let OnSide { side, from_corners: [low, high] } = p.place?;
        let whole = if matches!(side, Side::Left | Side::Right) { size.1 } else { size.0 };
        let stated = b.panels.iter().find(|x| x.mark == p.mark).and_then(|x| x.wind.as_ref());
        let piece = Piece { out: outward(side), ends: (low.base(), whole - high.base()) };
        Some(WindPanel { mark: p.mark.clone(), piece, value: kn_m2(stated.map_or(p.worst, |c| c.value)) })
    });
    let from = onto.bearing.map_or_else(String::new, |b| format!(", from {b}°"));
    let word = if along == Along::X { "x" } else { "y" };
    Ok(WindPlan {
        name: format!("wind-{word}"),
        words: format!("wind along {word}, onto the {} side{from}", onto.side.word()),
        size,
        between: if drawn { party_lines(b, [x, y]) } else { Vec::new() },
        wind: match onto.side {
            Side::Left => PlanWind::Rightwards,
            Side::Right => PlanWind::Leftwards,
            Side::Down => PlanWind::Upwards,
            Side::Up => PlanWind::Downwards,
        },
        overall: ("q_net".to_owned(), kn_m2(d.along[along as usize].top)),
        zones: zones(site, &onto, size)?,
        panels: panels.collect(),
        remark:
            match [Side::Left, Side::Right, Side::Down, Side::Up].map(|side| b.neighbours.contains(&side)) {
                [true, true, ..] | [.., true, true] => {
                    "; where the row ends is not known, and it is drawn as if it ended here"
                }
                _ => "",
            }
            .to_owned(),
    })
}

/// Where the house ends and its neighbours begin.
fn party_lines(b: &Building, [x, y]: [(f64, f64); 2]) -> Vec<((f64, f64), (f64, f64))> {
    let [own_x, own_y] = place::extent(b).map(|(low, high)| (low.base(), high.base()));
    let (w, h) = (x.1 - x.0, y.1 - y.0);
    let apart = |a: f64, z: f64| (a - z).abs() > 1.0;
    let mut lines = Vec::new();
    for (at, edge) in [(own_x.0, x.0), (own_x.1, x.1)] {
        if apart(at, edge) {
            lines.push(((at - x.0, 0.0), (at - x.0, h)));
        }
    }
    for (at, edge) in [(own_y.0, y.0), (own_y.1, y.1)] {
        if apart(at, edge) {
            lines.push(((0.0, at - y.0), (w, at - y.0)));
        }
    }
    lines
}

/// Zones of the four walls under wind onto a side, with their pressures for 10 m² and more.
fn zones(site: &Site, onto: &Onto, size: (f64, f64)) -> Result<Vec<WallZone>, Outside> {
    let across = matches!(onto.side, Side::Left | Side::Right);
    let (d, b) = if across { site.size } else { (site.size.1, site.size.0) };
    let (long, wide) = if across { size } else { (size.1, size.0) };
    let r_hd = (site.height / d).base();
    let parts = side_zones(site.height.base(), b.base(), d.base()).map_err(out)?.value;
    // Only where the ends of a row are unknown the drawing is shorter than the building.
    let steps = [(Zone::A, parts.a), (Zone::B, parts.b), (Zone::C, parts.c)];
    let (aside, opposite) = match onto.side {
        Side::Left => ([Side::Down, Side::Up], Side::Right),
        Side::Right => ([Side::Down, Side::Up], Side::Left),
        Side::Down => ([Side::Left, Side::Right], Side::Up),
        Side::Up => ([Side::Left, Side::Right], Side::Down),
    };
    let mut pieces = vec![(Zone::D, onto.side, (0.0, wide)), (Zone::E, opposite, (0.0, wide))];
    let mut from = 0.0;
    for (zone, length) in steps {
        let to = f64::min(from + length, long);
        if to - from > 1.0 {
            let low = matches!(onto.side, Side::Left | Side::Down);
            let ends = if low { (from, to) } else { (long - to, long - from) };
            pieces.extend(aside.map(|side| (zone, side, ends)));
        }
        from = to;
    }
    let mut all = Vec::new();
    for (zone, side, ends) in pieces {
        let q = onto.q_p * c_pe(zone, r_hd, 10.0).map_err(out)?.value;
        all.push((zone, Piece { out: outward(side), ends }, q));
    }
    let greatest = all.iter().map(|(.., q)| q.base().abs()).fold(f64::MIN_POSITIVE, f64::max);
    let drawn = |(zone, piece, q): (Zone, Piece, Stress)| WallZone {
        piece,
        name: zone.to_string(),
        presses: q > Stress::ZERO,
        part: q.base().abs() / greatest,
        value: shown(q),
    };
    Ok(all.into_iter().map(drawn).collect())
}

/// The ground, where a hill counts.
fn ground(site: &Site) -> Option<Drawing> {
    let Orography::Feature(f) = &site.orography else { return None };
    let c_o = standard::orography(&mut Sheet::silent(), f.slope(), site.height).ok()?;
    let phi = (f.height / f.upwind).base();
    let view = GroundProfile {
        form: match f.form {
            Ground::Hill => "hill",
            Ground::Ridge => "ridge",
            Ground::Cliff => "cliff",
            Ground::Escarpment => "escarpment",
        }
        .to_owned(),
        height: f.height.base(),
        upwind: f.upwind.base(),
        downwind: f.form.falls_again().then(|| f.downwind.base()),
        site: f.from_crest.base(),
        factors: [
            Action::new("c_o", &print::significant(c_o.base()), "orography factor"),
            Action::new("phi", &print::significant(phi), "upwind slope"),
        ],
    };
    Some(ground_profile(&view, GROUND))
}

/// A pressure with its unit.
pub fn kn_m2(q: Stress) -> String {
    format!("{} kN/m²", shown(q))
}
