//! Wind on the site: stated with a reason, or by terrain; the sheet shows both where both are given.

use crate::building::{Building, StatedWind, TerrainWind, WindRoute};
use crate::quantity::functions::{max, square_metres};
use crate::quantity::{Area, Length, Num, Stress, print};
use crate::standards::annex::Annex;
use crate::standards::en1991_1_4 as wind;
use crate::standards::tables::walls::{Zone, c_pe, lack_of_correlation};
use crate::standards::tables::wind::roughness;
use crate::trace::{Column, Outside, Sheet, Table};
use crate::{calc, given, lookup};

/// Net characteristic pressures that the checks take.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Pressures {
    /// Overall, windward and leeward together: returns and storeys.
    pub overall: Stress,
    /// Net on a panel, the worst place and sign.
    pub panel: Stress,
}

/// Works out the pressures by the job's route; the other route stands beside it where it was given.
///
/// # Errors
/// [`Outside`] where the site leaves the range of EN 1991-1-4 clause 7.
pub fn pressures(s: &mut Sheet, b: &Building, annex: &Annex) -> Result<Pressures, Outside> {
    let stated = b.wind.stated.as_ref();
    let terrain = match &b.wind.terrain {
        Some(t) => {
            s.heading(1, "By terrain category");
            Some(by_terrain(s, t, smallest_panel(b), annex)?)
        }
        None => None,
    };
    let chosen = match (b.wind.route, stated, terrain) {
        (WindRoute::Stated, Some(st), _) => by_statement(s, st),
        (_, _, Some(t)) => t,
        (_, Some(st), None) => by_statement(s, st),
        (_, None, None) => return Err(Outside::new("wind", "EN 1991-1-4", "no wind is given")),
    };
    if let (WindRoute::Stated, Some(t)) = (b.wind.route, terrain) {
        s.table(|| beside(chosen, t));
        if t.overall > chosen.overall || t.panel > chosen.panel {
            s.note(
                "The stated pressure is lower than the one by terrain category. The person who states it answers \
                 for the difference.",
            );
        }
    }
    Ok(chosen)
}

fn by_statement(s: &mut Sheet, st: &StatedWind) -> Pressures {
    s.heading(1, "Stated");
    let source = format!("stated: {}", st.reason);
    given!(s, "net overall pressure, for returns and storeys", &source, q_net = st.overall);
    let overall = q_net;
    given!(s, "net pressure on a panel", &source, q_panel = st.panel);
    s.note("A stated pressure is an assumption: confirm it against the site.");
    Pressures { overall, panel: q_panel }
}

fn by_terrain(s: &mut Sheet, t: &TerrainWind, area: Area, annex: &Annex) -> Result<Pressures, Outside> {
    let source = "job file";
    let because = |c: &crate::building::Cause<f64>| {
        if c.reason.is_empty() { "default, safe side".to_owned() } else { format!("stated: {}", c.reason) }
    };
    given!(s, "map value of the basic wind velocity", "read from UK Figure NA.1, job file", v_map = t.v_map);
    given!(s, "altitude", source, A = t.altitude);
    given!(s, "reference height", source, z = t.height);
    given!(s, "direction factor", &because(&t.c_dir), c_dir = Num::new(t.c_dir.value));
    given!(s, "season factor", &because(&t.c_season), c_season = Num::new(t.c_season.value));
    given!(s, "probability factor", &because(&t.c_prob), c_prob = Num::new(t.c_prob.value));
    given!(s, "orography factor", &because(&t.c_o), c_o = Num::new(t.c_o.value));
    let v_b = wind::basic_velocity(s, v_map, A, z, c_dir, c_season, c_prob);
    let rough = roughness(t.category);
    let table = format!("Table 4.1, category {}", t.category);
    given!(s, "roughness length", &table, z_0 = Length::new(rough.value.z_0 * 1e3));
    given!(s, "least height", &table, z_min = Length::new(rough.value.z_min * 1e3));
    given!(
        s,
        "density of air",
        "UK NA.2.18, from memory, check against the standard (H)",
        rho = wind::air(annex.rho_air)
    );
    let q_p = wind::peak_pressure(s, v_b, z, z_0, z_min, c_o, rho);
    s.note(
        "This route is the text of the EN with a terrain category; the UK National Annex reads q_p from charts \
         instead. Size and dynamic factor are taken as 1.0.",
    );
    walls(s, t, area, q_p)
}

fn walls(s: &mut Sheet, t: &TerrainWind, area: Area, q_p: Stress) -> Result<Pressures, Outside> {
    let out =
        |e: crate::standards::source::OutOfTable| Outside::new("wind", "EN 1991-1-4 7.2.2", e.to_string());
    given!(s, "height of the building", "job file", h = t.height);
    given!(s, "depth along the wind", "job file", d = t.depth);
    calc!(s, "7.2.2(1)", "height over depth", r_hd = h / d);
    given!(s, "smallest panel", "job file", A_p = area);
    let m2 = square_metres(A_p).base();
    let at = |zone| c_pe(zone, r_hd.base(), m2).map_err(out);
    let table = "Table 7.1";
    let one = Num::new(1.0);
    lookup!(s, table, "windward wall", c_D = at(Zone::D)?, one);
    lookup!(s, table, "leeward wall", c_E = c_pe(Zone::E, r_hd.base(), 10.0).map_err(out)?, one);
    lookup!(s, table, "side wall at the corner", c_A = at(Zone::A)?, one);
    lookup!(s, table, "side wall beyond the corner", c_B = at(Zone::B)?, one);
    given!(s, "internal pressure", "7.2.9(6)", c_pi = Num::new(0.2));
    given!(s, "internal suction", "7.2.9(6)", c_si = Num::new(-0.3));
    let k = lack_of_correlation(r_hd.base()).map_err(out)?;
    if t.lack_of_correlation {
        lookup!(s, "7.2.2(3)", "lack of correlation of windward and leeward", k_c = k, one);
        calc!(s, "7.2.2, 5.3", "net overall pressure", q_net = q_p * k_c * (c_D - c_E));
        return Ok(net(s, q_p, q_net, c_D, c_A, c_B, c_pi, c_si));
    }
    calc!(s, "7.2.2, 5.3", "net overall pressure", q_net = q_p * (c_D - c_E));
    Ok(net(s, q_p, q_net, c_D, c_A, c_B, c_pi, c_si))
}

fn net(
    s: &mut Sheet,
    q_p: Stress,
    q_net: Stress,
    c_D: Num,
    c_A: Num,
    c_B: Num,
    c_pi: Num,
    c_si: Num,
) -> Pressures {
    calc!(s, "5.2, 7.2.9", "net pressure inward", q_in = q_p * (c_D - c_si));
    calc!(s, "5.2, 7.2.9", "net suction beyond the corner zone", q_mid = q_p * (c_pi - c_B));
    calc!(s, "5.2, 7.2.9", "net suction in the corner zone", q_cor = q_p * (c_pi - c_A));
    calc!(s, "5.2", "net pressure on a panel: the worst of these", q_panel = max(q_in, max(q_mid, q_cor)));
    s.table(|| {
        let show = |name: &str, q: Stress| print::show(name, q.dynamic()).value;
        Table {
            caption: "Net characteristic pressures, kN/m²".to_owned(),
            columns: vec![Column::words("where"), Column::words("sign"), Column::numbers("kN/m²")],
            rows: vec![
                vec!["whole building".into(), "along the wind".into(), show("q", q_net)],
                vec!["panel, any place".into(), "inward".into(), show("q", q_in)],
                vec!["panel in the middle".into(), "outward".into(), show("q", q_mid)],
                vec!["panel at the corner".into(), "outward".into(), show("q", q_cor)],
            ],
            strong: vec![],
        }
    });
    Pressures { overall: q_net, panel: q_panel }
}

fn beside(chosen: Pressures, terrain: Pressures) -> Table {
    let show = |q: Stress| print::show("q", q.dynamic()).value;
    let row = |name: &str, a: Stress, b: Stress| {
        vec![name.to_owned(), show(a), show(b), print::significant(a.base() / b.base())]
    };
    Table {
        caption: "Stated pressure beside the one by terrain category, kN/m²".to_owned(),
        columns: vec![
            Column::words("pressure"),
            Column::numbers("stated, used"),
            Column::numbers("by terrain"),
            Column::numbers("stated / terrain"),
        ],
        rows: vec![
            row("overall", chosen.overall, terrain.overall),
            row("panel", chosen.panel, terrain.panel),
        ],
        strong: vec![],
    }
}

/// Plan area of the smallest panel after the removal; 1 m² where there is none (the safe side).
fn smallest_panel(b: &Building) -> Area {
    b.panels
        .iter()
        .map(|p| p.height * p.after.length)
        .reduce(|a, c| if c < a { c } else { a })
        .unwrap_or(Area::new(1e6))
}

/// The wind sheet.
pub fn sections(job: &super::Job<'_>) -> Vec<super::Section> {
    let mut s = Sheet::recorder();
    if let Err(outside) = pressures(&mut s, job.building, &job.annex) {
        s.leave(outside);
    }
    vec![super::Section::plain("wind", "Wind", s)]
}
