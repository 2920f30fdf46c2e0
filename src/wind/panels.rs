//! Net pressures on each panel by its place and size, under wind onto every side.

use super::inside::{self, Lies, lies};
use super::place::{self, OnSide};
use super::velocity::Onto;
use super::walls::out;
use crate::building::{Building, Panel, Side, Site};
use crate::quantity::functions::{max, square_metres};
use crate::quantity::{Length, Num, Stress};
use crate::standards::en1991_1_4 as wind;
use crate::standards::tables::walls::{Zone, c_pe};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, lookup};

/// Net pressures on one panel.
#[derive(Clone, Debug, PartialEq)]
pub struct Net {
    /// Mark of the panel.
    pub mark: String,
    /// Where it lies; none where the plan does not say, and the worst place is taken.
    pub place: Option<OnSide>,
    /// Zone with the highest suction that it reaches.
    pub zone: Zone,
    /// Inward at the most.
    pub inward: Stress,
    /// Outward at the most.
    pub outward: Stress,
    /// The greater of the two.
    pub worst: Stress,
}

/// One wind on a panel: what it is called, and what it needs.
#[derive(Clone, Copy)]
struct Case {
    onto: Onto,
    zone: Zone,
    r_hd: Num,
}

/// Every panel of the job; one of the worst place of 1 m² where there is none.
///
/// # Errors
/// [`Outside`] of Table 7.1.
pub fn all(s: &mut Sheet, b: &Building, site: &Site, onto: &[Onto; 4]) -> Result<Vec<Net>, Outside> {
    s.heading(1, "Net pressure on each panel");
    s.note(
        "Inward: the wind square onto the panel, with suction inside. Outward: the wind along it or from behind, with \
         pressure inside. A panel takes the highest coefficient of any zone that it reaches; where the plan does not say \
         where it lies, that of the corner.",
    );
    if let Some(d) = &site.dominant {
        s.note(format!(
            "An opening dominates on the {} side: {} It counts shut and open, open in the full wind with full factors; \
             7.2.9(3) would let that be an accidental situation.",
            d.side.word(),
            d.words
        ));
    }
    if b.panels.is_empty() {
        let net = one(s, site, onto, ("any panel", crate::quantity::Area::new(1e6)), None)?;
        return Ok(vec![net]);
    }
    let heads: Vec<String> = b.panels.iter().map(|p| p.mark.clone()).collect();
    let found = s.columns(&heads, |s, i| {
        let p: &Panel = &b.panels[i];
        one(s, site, onto, (&p.mark, p.height * p.after.length), place::of(b, site, p))
    });
    found.into_iter().collect()
}

fn one(
    s: &mut Sheet,
    site: &Site,
    onto: &[Onto; 4],
    (mark, area): (&str, crate::quantity::Area),
    place: Option<OnSide>,
) -> Result<Net, Outside> {
    given!(s, "area of the panel", "job file", A_p = area);
    let m2 = square_metres(A_p).base();
    given!(s, "height of the building", "job file", h = site.height);
    let c_sd = wind::size_and_dynamics(&mut Sheet::silent(), h)?;
    given!(s, "size and dynamic factor", "above", c_sd);
    let cases: Vec<Case> = onto.iter().flat_map(|o| cases(site, h, *o, place)).collect();
    // The greatest of each sense, silently; then that one on the sheet.
    let inward = greatest(&cases, |c| inward(&mut Sheet::silent(), site, *c, m2, c_sd))?;
    let outward = greatest(&cases, |c| outward(&mut Sheet::silent(), site, *c, m2, c_sd))?;
    let q_in = match inward {
        Some(c) => self::inward(s, site, c, m2, c_sd)?,
        None => {
            given!(s, "net pressure inward", "no wind meets it square", q_in = Stress::ZERO);
            q_in
        }
    };
    let (q_out, zone) = match outward {
        Some(c) => (self::outward(s, site, c, m2, c_sd)?, c.zone),
        None => {
            given!(s, "net pressure outward", "no wind goes along it", q_out = Stress::ZERO);
            (q_out, Zone::E)
        }
    };
    calc!(s, "5.2(3)", "net pressure on the panel", q_panel = max(q_in, q_out));
    Ok(Net { mark: mark.to_owned(), place, zone, inward: q_in, outward: q_out, worst: q_panel })
}

/// Winds onto one side as a panel feels them: of a panel without a place every one, in the worst zone.
fn cases(site: &Site, h: Length, onto: Onto, place: Option<OnSide>) -> Vec<Case> {
    let along = matches!(onto.side, Side::Left | Side::Right);
    let (d, b) = if along { site.size } else { (site.size.1, site.size.0) };
    let r_hd = Num::new((h / d).base());
    let case = |zone| Case { onto, zone, r_hd };
    let Some(p) = place else { return vec![case(Zone::D), case(Zone::A)] };
    match lies(p.side, onto.side) {
        Lies::Windward => vec![case(Zone::D)],
        Lies::Leeward => vec![case(Zone::E)],
        Lies::Aside => {
            // The windward corner is the one towards the side that the wind meets.
            let low = matches!(onto.side, Side::Left | Side::Down);
            let from = if low { p.from_corners[0] } else { p.from_corners[1] };
            vec![case(place::zone(from, h, b, d))]
        }
    }
}

/// The case of the greatest pressure above nought.
fn greatest(cases: &[Case], of: impl Fn(&Case) -> Result<Stress, Outside>) -> Result<Option<Case>, Outside> {
    let mut best: Option<(Stress, Case)> = None;
    for c in cases {
        let q = of(c)?;
        if q > best.map_or(Stress::ZERO, |b| b.0) {
            best = Some((q, *c));
        }
    }
    Ok(best.map(|b| b.1))
}

/// Net inward: windward pressure less the suction inside.
fn inward(s: &mut Sheet, site: &Site, c: Case, m2: f64, c_sd: Num) -> Result<Stress, Outside> {
    if c.zone != Zone::D {
        return Ok(Stress::ZERO);
    }
    let side = format!("wind onto the {} side, above", c.onto.side.word());
    given!(s, "peak pressure, inward", &side, q_p = c.onto.q_p);
    let look = c_pe(Zone::D, c.r_hd.base(), m2).map_err(out)?;
    lookup!(s, "Table 7.1", "windward wall", c_D = look, Num::new(1.0));
    let c_si = inside::of(s, site, c.onto.side, c.r_hd.base())?.suction;
    calc!(s, "5.2, 7.2.9", "net pressure inward", q_in = c_sd * q_p * (c_D - c_si));
    Ok(q_in)
}

/// Net outward: the pressure inside and the suction outside.
fn outward(s: &mut Sheet, site: &Site, c: Case, m2: f64, c_sd: Num) -> Result<Stress, Outside> {
    if c.zone == Zone::D {
        return Ok(Stress::ZERO);
    }
    let side = format!("wind onto the {} side, above", c.onto.side.word());
    given!(s, "peak pressure, outward", &side, q_o = c.onto.q_p);
    let look = c_pe(c.zone, c.r_hd.base(), m2).map_err(out)?;
    lookup!(s, "Table 7.1", "suction of its zone", c_z = look, Num::new(1.0));
    let c_pi = inside::of(s, site, c.onto.side, c.r_hd.base())?.pressure;
    calc!(s, "5.2, 7.2.9", "net pressure outward", q_out = c_sd * q_o * (c_pi - c_z));
    Ok(q_out)
}
