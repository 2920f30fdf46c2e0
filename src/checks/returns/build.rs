//! From the building to the quantities of one return: geometry, loads, wind. All of it on the sheet.

use super::lateral;
use super::model::{Flange, Lateral, Model, Vertical};
use crate::building::{Acts, BaseJoint, BuildUp, Building, Head, LED, Load, Restraint, Return};
use crate::checks::Job;
use crate::checks::masonry::{self, Masonry};
use crate::checks::stability::Storey;
use crate::quantity::{Force, Length, LineLoad, Num, print};
use crate::standards::annex::Annex;
use crate::standards::en1996::flange::{self, Side};
use crate::standards::en1996::slenderness::Stiffened;
use crate::trace::{Column, Outside, Sheet, Table};
use crate::wind::{Pressures, Wind};
use crate::{calc, decide, given};

/// What a return is checked with.
#[derive(Clone, Copy)]
pub struct Inputs<'a> {
    /// The building.
    pub building: &'a Building,
    /// The return.
    pub ret: &'a Return,
    /// Wind on the site.
    pub wind: Pressures,
    /// The storey's sharing, where the job gives it.
    pub storey: Option<&'a Storey>,
    /// National values.
    pub annex: &'a Annex,
}

/// A change to try: what would make a return pass, or how far an assumption may move.
#[derive(Clone, Copy, Debug)]
pub struct Change {
    /// Another length; loads keep their place in proportion.
    pub length: Option<Length>,
    /// Dead load added at mid-length.
    pub dead: Force,
    /// Factor on the wind, roof uplift with it.
    pub wind: f64,
}

impl Change {
    /// The return as it is.
    pub const NONE: Self = Self { length: None, dead: Force::ZERO, wind: 1.0 };
}

/// A leaf that acts in the plane of the return, with its share of the wind by thickness.
#[derive(Clone, Copy, Debug)]
pub struct Acting {
    /// Its place in the build-up.
    pub leaf: usize,
    /// Its share; 1 where it acts alone.
    pub share: f64,
}

impl<'a> Inputs<'a> {
    /// Of a return of a job under its wind.
    pub fn new(job: &'a Job<'a>, ret: &'a Return, wind: &Wind) -> Self {
        Self {
            building: job.building,
            ret,
            wind: wind.of_return(job.building, ret),
            storey: job.sharing(),
            annex: &job.annex,
        }
    }
}

/// The leaves that act, outer first.
///
/// # Errors
/// [`Outside`] where the build-up is unknown, which no valid building has.
pub fn acting(i: &Inputs<'_>) -> Result<Vec<Acting>, Outside> {
    let build_up = build_up(i)?;
    let leaves: Vec<usize> = match i.ret.acts {
        Acts::Loaded => vec![build_up.loaded().0],
        Acts::Each => (0..build_up.leaves.len()).collect(),
    };
    let total: Length = leaves.iter().map(|&k| build_up.leaves[k].thickness).sum();
    Ok(leaves
        .into_iter()
        .map(|leaf| Acting { leaf, share: (build_up.leaves[leaf].thickness / total).base() })
        .collect())
}

fn build_up<'a>(i: &Inputs<'a>) -> Result<&'a BuildUp, Outside> {
    let missing = || Outside::new("build-up", "job file", "the build-up is not given");
    i.building.build_up(&i.ret.build_up).ok_or_else(missing)
}

/// The models of a return, one a leaf that acts. For silent sheets: on a sheet that records each leaf
/// is built and checked before the next, with [`one`], since their symbols are the same.
///
/// # Errors
/// [`Outside`] where a table of strengths does not reach.
pub fn models(s: &mut Sheet, i: &Inputs<'_>, change: Change) -> Result<Vec<Model>, Outside> {
    acting(i)?.into_iter().map(|a| one(s, i, a, change)).collect()
}

/// The model of one leaf.
///
/// # Errors
/// [`Outside`] where a table of strengths does not reach.
pub fn one(s: &mut Sheet, i: &Inputs<'_>, a: Acting, change: Change) -> Result<Model, Outside> {
    let mut m = leaf(s, i, build_up(i)?, a.leaf, a.share, change)?;
    if a.share < 1.0 {
        m.leaf = if a.leaf == 0 { "outer-".to_owned() } else { "inner-".to_owned() };
    }
    Ok(m)
}

fn leaf(
    s: &mut Sheet,
    i: &Inputs<'_>,
    build_up: &BuildUp,
    k: usize,
    share: f64,
    change: Change,
) -> Result<Model, Outside> {
    let r = i.ret;
    let this = &build_up.leaves[k];
    given!(s, "length of the return", "job file", l = change.length.unwrap_or(r.length));
    given!(s, "actual thickness of the leaf", "job file", t = this.thickness);
    given!(s, "clear height", "job file", h = r.height);
    let masonry = strengths(s, i, build_up, k)?;
    given!(s, "weight of the masonry", "job file", g_m = masonry.density);
    calc!(s, "statics", "own weight of the leaf", G_w = g_m * l * t * h);
    // The wall met presses the loaded leaf alone; counted with both it would be there twice.
    let flange = if this.loaded { flange(s, i, h, t, change.wind) } else { None };
    let loads: Vec<&Load> = r.loads.iter().filter(|x| x.leaf == k).collect();
    let stretch = l / r.length;
    let mut at_head = Vertical::default();
    for x in &loads {
        let from_middle = x.at * stretch.base() - l / 2.0;
        at_head = at_head.with_dead(x.dead, from_middle);
        at_head.Q = at_head.Q + x.imposed;
        // A stronger wind lifts more.
        at_head.U = at_head.U + x.uplift * change.wind;
        at_head.S_Q = at_head.S_Q + x.imposed * from_middle;
        at_head.S_U = at_head.S_U + x.uplift * change.wind * from_middle;
        at_head.T_G = at_head.T_G + x.dead * x.eccentricity;
        at_head.T_Q = at_head.T_Q + x.imposed * x.eccentricity;
    }
    let at_head = at_head.with_dead(change.dead, Length::ZERO);
    let junction = stiffened(s, i, h, t);
    if let Some(words) = &r.far_end {
        s.note(format!("The other vertical edge is stiffened as well: {}.", words.trim_end_matches('.')));
    }
    let stiffened = match (junction, r.far_end.is_some()) {
        (true, true) => Stiffened::Two,
        (true, false) | (false, true) => Stiffened::One,
        (false, false) => Stiffened::None,
    };
    let m = Model {
        leaf: String::new(),
        l,
        t,
        h,
        t_other: build_up.leaves.iter().enumerate().find(|(n, _)| *n != k).map(|(_, o)| o.thickness),
        rho_2: restraint(r.restraint, &at_head, t),
        stiffened,
        masonry,
        at_head,
        own: G_w,
        flange,
        lateral: Lateral::default(),
        propped: matches!(r.head, Head::Propped(_)),
        dpc: r.base == BaseJoint::Dpc,
        mu: r.mu.value,
        helping: i.building.basis.helping_factor.value,
    };
    s.table(|| load_table(&m, &loads, stretch));
    let lateral = lateral::of(s, i, &m, share, change.wind);
    Ok(Model { lateral, ..m })
}

/// Strengths quoted from the materials sheet: derived silently, noted as inputs here.
fn strengths(s: &mut Sheet, i: &Inputs<'_>, build_up: &BuildUp, k: usize) -> Result<Masonry, Outside> {
    let this = &build_up.leaves[k];
    let Some(material) = i.building.material(&this.material) else {
        return Err(Outside::new("material", "job file", "the material is not given"));
    };
    let found =
        masonry::derive(&mut Sheet::silent(), i.building, i.annex, material, build_up, this.thickness)?;
    let source = format!("materials sheet, {}", found.name);
    given!(s, "normalised unit strength", &source, f_b = found.f_b);
    given!(s, "characteristic compressive strength", &source, f_k = found.f_k);
    let _ = (f_b, f_k);
    Ok(found)
}

/// Whether the wall met stiffens the edge of the return: bonded, and long and thick enough, 5.5.1.2(5).
fn stiffened(s: &mut Sheet, i: &Inputs<'_>, h: Length, t: Length) -> bool {
    let j = &i.ret.junction;
    if !j.bonded {
        return false;
    }
    given!(s, "thickness of the wall met", "job file", t_f = j.thickness);
    given!(s, "length of the wall met, both sides", "job file", L_w = j.left + j.right);
    let long = decide!(s, "5.5.1.2(5)", "long enough to stiffen", "too short to stiffen", L_w >= h / 5.0);
    let thick = decide!(s, "5.5.1.2(5)", "thick enough to stiffen", "too thin to stiffen", t_f >= 0.3 * t);
    long && thick
}

/// The flange that may be counted, where the junction is bonded: 5.5.3.
fn flange(s: &mut Sheet, i: &Inputs<'_>, h: Length, t: Length, wind: f64) -> Option<Flange> {
    let j = &i.ret.junction;
    if !j.bonded {
        return None;
    }
    let h_tot = i.building.storey(&i.ret.storey).map_or(h, |x| x.total_height);
    given!(s, "thickness of the wall met", "job file", t_f = j.thickness);
    given!(s, "height to the top of the structure", "job file", h_tot);
    let b_L = flange::left(s, Side { to_end: j.left, to_next: j.next_wall_left }, h_tot, h, t_f);
    let b_R = flange::right(s, Side { to_end: j.right, to_next: j.next_wall_right }, h_tot, h, t_f);
    calc!(s, "5.5.3", "width of the flange that counts", b_f = b_L + t + b_R);
    given!(s, "dead load in the wall met at the foot, per length", "job file", g_f = j.dead);
    calc!(s, "statics", "dead load that the flange brings", G_f = g_f * b_f);
    let lifts = j.uplift * wind;
    if lifts > LineLoad::ZERO {
        given!(s, "roof uplift in the wall met, per length", LED, u_f = lifts);
        calc!(s, "statics", "uplift on the flange", U_f = u_f * b_f);
        return Some(Flange { b_f, t_f, G_f, U_f });
    }
    Some(Flange { b_f, t_f, G_f, U_f: Force::ZERO })
}

/// rho_2: 1.0 under timber floors, 0.75 under concrete unless the load is far off centre.
pub fn restraint(held_by: Restraint, v: &Vertical, t: Length) -> Option<Num> {
    match held_by {
        Restraint::None => None,
        Restraint::Timber => Some(Num::new(1.0)),
        Restraint::Concrete => {
            let (n, m) = (v.G + v.Q, (v.T_G + v.T_Q).abs());
            let far = n > Force::ZERO && m / n > t * 0.25;
            Some(Num::new(if far { 1.0 } else { 0.75 }))
        }
    }
}

fn load_table(m: &Model, loads: &[&Load], stretch: Num) -> Table {
    let kn = |f: Force| print::show("G", f.dynamic()).value;
    let mut rows: Vec<Vec<String>> = loads
        .iter()
        .map(|x| {
            let from = x.at * stretch.base() - m.l / 2.0;
            vec![
                x.what.clone(),
                kn(x.dead),
                kn(x.imposed),
                print::show("x", from.dynamic()).value,
                print::show("S", (x.dead * from).dynamic()).value,
                print::show("S", (x.imposed * from).dynamic()).value,
                x.source.clone(),
            ]
        })
        .collect();
    let nought = || "0".to_owned();
    let own = |what: &str, g: Force, x: Length| {
        let moment = print::show("S", (g * x).dynamic()).value;
        vec![
            what.to_owned(),
            kn(g),
            nought(),
            print::show("x", x.dynamic()).value,
            moment,
            nought(),
            "above".to_owned(),
        ]
    };
    rows.push(own("own weight, whole height", m.own, Length::ZERO));
    if let Some(f) = m.flange {
        rows.push(own("flange, at the foot", f.G_f, -((m.l + f.t_f) / 2.0)));
    }
    let v = m.vertical(super::model::At::Foot);
    rows.push(vec![
        "sum at the foot".into(),
        kn(v.G),
        kn(v.Q),
        String::new(),
        print::show("S", v.S_G.dynamic()).value,
        print::show("S", v.S_Q.dynamic()).value,
        String::new(),
    ]);
    Table {
        caption: "Unfactored vertical loads; x from mid-length, positive towards the free end".to_owned(),
        columns: vec![
            Column::words("load"),
            Column::numbers("G, kN"),
            Column::numbers("Q, kN"),
            Column::numbers("x, mm"),
            Column::numbers("G x, kNm"),
            Column::numbers("Q x, kNm"),
            Column::words("from"),
        ],
        strong: vec![rows.len() - 1],
        rows,
    }
}
