//! The storey's wind, every bracing wall's share of it, before and after the removal.

use super::plan;
use std::collections::HashMap;

use crate::building::{Along, BracingWall, Building, Ends, ShareBy, Stability, Stands, stands_in};
use crate::quantity::functions::{metres, sqrt};
use crate::quantity::{Force, Length, print};
use crate::sketch::{self, Drawing, Frame, PlanWind, StabilityPlan, stability_plans};
use crate::solve::torsion::{self, Bracing, Push};
use crate::standards::annex::Annex;
use crate::trace::{Column, Outside, Sheet, Table};
use crate::wind::{Pressures, Wind};
use crate::{calc, given};

/// As many shares as can be read on a plan.
const MANY: usize = 40;
/// Frame on the sheet of two plans side by side, and of one that stands alone, mm.
const ROW: Frame = Frame::new(170.0, 120.0);
const ALONE: Frame = Frame::new(170.0, 80.0);

/// What one wall takes.
#[derive(Clone, Debug, PartialEq)]
pub struct Share {
    /// Mark of the wall.
    pub mark: String,
    /// Part of the storey's wind before the removal; none where it does not stand then.
    pub before: Option<f64>,
    /// After.
    pub after: Option<f64>,
    /// Tributary width before (flexible floor).
    pub width_before: Option<Length>,
    /// Tributary width after.
    pub width_after: Option<Length>,
}

/// The storey's force and how it is shared.
#[derive(Clone, Debug)]
pub struct Storey {
    /// Characteristic wind force at the head of the storey.
    pub F_k: Force,
    /// Tilt of the storey as a design force.
    pub H_s: Force,
    /// Length of the wind face.
    pub L_f: Length,
    /// Shares, in the order of the job.
    pub shares: Vec<Share>,
    /// Dead load of the level, for the tilt.
    pub dead: Force,
    /// Imposed load of the level.
    pub imposed: Force,
}

impl Storey {
    /// The share of the wall `mark` after the removal.
    pub fn after(&self, mark: &str) -> Option<f64> {
        self.shares.iter().find(|s| s.mark == mark).and_then(|s| s.after)
    }
}

/// Wind on the face that the storey collects.
pub fn pressures(b: &Building, wind: &Wind, st: &Stability) -> Pressures {
    let storey = b.storeys.iter().position(|s| s.mark == st.storey);
    storey.map_or_else(|| wind.along(st.wind_along), |k| wind.level(b, st.wind_along, k))
}

/// Shares the storey's wind on the sheet.
///
/// # Errors
/// [`Outside`] where nothing braces the storey in that direction.
pub fn share(
    s: &mut Sheet,
    b: &Building,
    st: &Stability,
    wind: Pressures,
    annex: &Annex,
) -> Result<Storey, Outside> {
    let h_tot = b.storey(&st.storey).map_or(st.strip_height, |x| x.total_height);
    let (begin, end) = st.front;
    let from = if st.from_plan { "plan of this job" } else { "job file" };
    given!(s, "net overall pressure", "wind sheet", q_net = wind.overall);
    given!(s, "length of the wind face", from, L_f = end - begin);
    given!(s, "height of wind face that this level collects", from, h_s = st.strip_height);
    given!(s, "characteristic wind on everything above", from, F_a = st.force_above);
    calc!(s, "EN 1991-1-4 5.3", "characteristic wind force of the storey", F_k = q_net * L_f * h_s + F_a);
    given!(s, "factor on wind", "EN 1990 NA.A1.2", gamma_W = annex.gamma_Q);
    calc!(s, "EN 1990 eq. 6.10", "design wind force of the storey", F_Ed = gamma_W * F_k);
    given!(s, "dead load of the level, for the tilt", from, G_s = st.dead);
    given!(s, "imposed load of the level", from, Q_s = st.imposed);
    given!(s, "height of the structure, in m in the next line", "job file", h_tot);
    calc!(s, "5.3(2)", "tilt, in radians", nu = 1.0 / (100.0 * sqrt(metres(h_tot))));
    given!(s, "pressing factor on dead load", "EN 1990 NA.A1.2(B)", gamma_Gp = annex.gamma_G_sup);
    given!(s, "pressing factor on imposed load", "EN 1990 NA.A1.2(B)", gamma_Qp = annex.gamma_Q);
    calc!(
        s,
        "5.3(2)",
        "tilt of the storey as a force, pressing factors",
        H_s = nu * (gamma_Gp * G_s + gamma_Qp * Q_s)
    );
    let before = shares(b, st, Stands::Before)?;
    let after = shares(b, st, Stands::After)?;
    // The first of each mark, as a search through the list would find it.
    let by_mark = |rows: Vec<Row>| {
        let mut found: HashMap<String, (f64, Option<Length>)> = HashMap::new();
        rows.into_iter().for_each(|(mark, share, width)| {
            found.entry(mark).or_insert((share, width));
        });
        found
    };
    let (before, after) = (by_mark(before), by_mark(after));
    let list: Vec<Share> = st
        .walls
        .iter()
        .filter(|w| w.along == st.wind_along)
        .map(|w| {
            let (b, a) = (before.get(&w.mark), after.get(&w.mark));
            Share {
                mark: w.mark.clone(),
                before: b.map(|x| x.0),
                after: a.map(|x| x.0),
                width_before: b.and_then(|x| x.1),
                width_after: a.and_then(|x| x.1),
            }
        })
        .collect();
    s.table(|| table(st, &list, F_Ed + H_s));
    note(s, st);
    Ok(Storey { F_k, H_s, L_f, shares: list, dead: st.dead, imposed: st.imposed })
}

fn note(s: &mut Sheet, st: &Stability) {
    match st.share_by {
        ShareBy::Width => s.note(
            "A timber floor is taken as flexible: each wall takes the wind of half the distance to its neighbours. \
             The shares add up to the front.",
        ),
        ShareBy::Stiffness => s.note(
            "A concrete floor is taken as rigid in its plane: walls take the wind by their stiffness, torsion \
             included; relief by torsion is not counted. E is taken as equal in all walls.",
        ),
    }
}

type Row = (String, f64, Option<Length>);

fn shares(b: &Building, st: &Stability, when: Stands) -> Result<Vec<Row>, Outside> {
    let standing = |w: &&BracingWall| w.stands == Stands::Both || w.stands == when;
    let walls: Vec<&BracingWall> = st.walls.iter().filter(standing).collect();
    match st.share_by {
        ShareBy::Width => by_width(st, &walls),
        ShareBy::Stiffness => by_stiffness(b, st, &walls),
    }
}

/// Half the distance to each neighbour; the outermost walls reach to the ends of the front.
fn by_width(st: &Stability, walls: &[&BracingWall]) -> Result<Vec<Row>, Outside> {
    let mut along: Vec<&BracingWall> = walls.iter().copied().filter(|w| w.along == st.wind_along).collect();
    along.sort_by(|a, b| a.at.base().total_cmp(&b.at.base()));
    if along.is_empty() {
        return Err(unbraced("no wall braces the storey along the wind"));
    }
    let (from, to) = st.front;
    let edge = |i: usize| {
        if i == 0 {
            from
        } else if i == along.len() {
            to
        } else {
            (along[i - 1].at + along[i].at) / 2.0
        }
    };
    let front = to - from;
    Ok(along
        .iter()
        .enumerate()
        .map(|(i, w)| {
            let width = edge(i + 1) - edge(i);
            (w.mark.clone(), (width / front).base(), Some(width))
        })
        .collect())
}

fn by_stiffness(b: &Building, st: &Stability, walls: &[&BracingWall]) -> Result<Vec<Row>, Outside> {
    let plan: Vec<Bracing> = walls
        .iter()
        .map(|w| {
            let r = (w.height / w.length).base();
            let k = match w.ends {
                Ends::Cantilever => torsion::cantilever_rigidity(r),
                Ends::Fixed => torsion::fixed_rigidity(r),
            };
            let other = w.other_at.unwrap_or(Length::ZERO).base();
            let (along, x, y) = match w.along {
                Along::X => (torsion::Along::X, other, w.at.base()),
                Along::Y => (torsion::Along::Y, w.at.base(), other),
            };
            Bracing { along, x, y, rigidity: k * thickness(b, &w.build_up).base() }
        })
        .collect();
    let middle = ((st.front.0 + st.front.1) / 2.0).base();
    let push = match st.wind_along {
        Along::X => Push { f_x: 1.0, f_y: 0.0, x: 0.0, y: middle },
        Along::Y => Push { f_x: 0.0, f_y: 1.0, x: middle, y: 0.0 },
    };
    let shares =
        torsion::share(&plan, push).map_err(|_| unbraced("the bracing walls cannot hold the storey"))?;
    Ok(walls
        .iter()
        .zip(shares.walls)
        .filter(|(w, _)| w.along == st.wind_along)
        .map(|(w, x)| (w.mark.clone(), x.without_relief().abs(), None))
        .collect())
}

/// Thickness that counts for stiffness: the loaded leaf.
fn thickness(b: &Building, build_up: &str) -> Length {
    b.build_up(build_up).map_or(Length::ZERO, |u| u.loaded().1.thickness)
}

fn unbraced(words: &str) -> Outside {
    Outside::new("storey", "method, bracing", words)
}

fn table(st: &Stability, list: &[Share], force: Force) -> Table {
    let percent = |x: Option<f64>| x.map_or("–".to_owned(), |p| format!("{:.0} %", p * 100.0));
    let width = |x: Option<Length>| x.map_or("–".to_owned(), |w| print::show("b", w.dynamic()).value);
    let kn = |x: Option<f64>| x.map_or("–".to_owned(), |p| print::show("F", (force * p).dynamic()).value);
    let flexible = st.share_by == ShareBy::Width;
    let mut columns = vec![Column::words("wall"), Column::numbers("before"), Column::numbers("kN")];
    if flexible {
        columns.push(Column::numbers("width, mm"));
    }
    columns.extend([Column::numbers("after"), Column::numbers("kN")]);
    if flexible {
        columns.push(Column::numbers("width, mm"));
    }
    let rows = list
        .iter()
        .map(|x| {
            let mut row = vec![x.mark.clone(), percent(x.before), kn(x.before)];
            if flexible {
                row.push(width(x.width_before));
            }
            row.extend([percent(x.after), kn(x.after)]);
            if flexible {
                row.push(width(x.width_after));
            }
            row
        })
        .collect();
    Table {
        caption: "Shares of the storey's design force, tilt included, before and after the removal"
            .to_owned(),
        columns,
        rows,
        strong: vec![],
    }
}

/// The stability sheet, where the job gives the bracing walls.
pub fn sections(job: &super::Job<'_>) -> Vec<super::Section> {
    let (Some(st), Ok(wind)) = (&job.building.stability, &job.wind) else { return Vec::new() };
    let mut s = Sheet::recorder();
    s.note(format!("The wall removed braced: {}.", job.building.removed.braced.trim_end_matches('.')));
    let mut drawings = Vec::new();
    match share(&mut s, job.building, st, pressures(job.building, wind, st), &job.annex) {
        Ok(storey) => {
            drawings = job.drawings(|| drawn(job.building, st, &storey).into_iter().flatten());
            super::named(&mut s, &drawings);
        }
        Err(outside) => s.leave(outside),
    }
    let section = super::Section::plain("stability", "The storey's wind and its walls", s);
    vec![super::Section { drawings, ..section }]
}

/// The plans with each bracing wall's share; none where the plan shows no bracing wall.
fn drawn(b: &Building, st: &Stability, storey: &Storey) -> Option<[Drawing; 2]> {
    let here: Vec<&crate::building::PlanWall> =
        b.plan.iter().filter(|w| stands_in(b, w, &st.storey)).collect();
    let mut walls: Vec<sketch::PlanWall> = here.iter().map(|w| plan::wall(b, w, &st.storey)).collect();
    // A return that is no line of the plan is drawn where its mark lies.
    let others = b.returns.iter().filter(|r| r.storey == st.storey && !here.iter().any(|w| w.mark == r.mark));
    walls.extend(others.filter_map(|r| plan::return_wall(b, r)));
    let mut marks: HashMap<&str, usize> = HashMap::new();
    for (n, wall) in walls.iter().enumerate() {
        marks.entry(wall.name.as_str()).or_insert(n);
    }
    let percent = |x: Option<f64>| x.map(|p| format!("{:.0} %", p * 100.0));
    let mut shares = Vec::new();
    // Of very many walls those are drawn whose share changes: the table has them all.
    let many = storey.shares.len() > MANY;
    let changed = |x: &Share| x.before.zip(x.after).is_none_or(|(b, a)| (b - a).abs() > 0.005);
    for x in storey.shares.iter().filter(|x| !many || changed(x)) {
        if let Some(&wall) = marks.get(x.mark.as_str()) {
            shares.push(sketch::Share { wall, before: percent(x.before), after: percent(x.after) });
        }
    }
    if shares.is_empty() {
        return None;
    }
    let wind = match st.wind_along {
        Along::X => PlanWind::Rightwards,
        Along::Y => PlanWind::Upwards,
    };
    let view =
        StabilityPlan { name: "stability-plan".to_owned(), title: st.storey.clone(), walls, shares, wind };
    Some(stability_plans(&view, ROW, ALONE))
}
