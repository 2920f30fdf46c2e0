//! From the building to the quantities of one return: geometry, loads, wind. All of it on the sheet.

use super::model::{Flange, Lateral, Model, Vertical};
use crate::building::{Acts, BaseJoint, BuildUp, Building, Head, Load, Path, Restraint, Return};
use crate::checks::masonry::{self, Masonry};
use crate::checks::stability::Storey;
use crate::checks::wind::Pressures;
use crate::quantity::{Force, Length, LineLoad, Num, print};
use crate::standards::annex::Annex;
use crate::standards::en1996::flange::{self, Side};
use crate::standards::en1996::slenderness::Stiffened;
use crate::trace::{Column, Outside, Sheet, Table};
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
    /// Factor on the wind.
    pub wind: f64,
}

impl Change {
    /// The return as it is.
    pub const NONE: Self = Self { length: None, dead: Force::ZERO, wind: 1.0 };
}

/// The models of a return, one a leaf that acts.
///
/// # Errors
/// [`Outside`] where a table of strengths does not reach.
pub fn models(s: &mut Sheet, i: &Inputs<'_>, change: Change) -> Result<Vec<Model>, Outside> {
    let r = i.ret;
    let Some(build_up) = i.building.build_up(&r.build_up) else {
        return Err(Outside::new("build-up", "job file", "the build-up is not given"));
    };
    let (loaded, _) = build_up.loaded();
    let acting: Vec<usize> = match r.acts {
        Acts::Loaded => vec![loaded],
        Acts::Each => (0..build_up.leaves.len()).collect(),
    };
    let total: Length = acting.iter().map(|&k| build_up.leaves[k].thickness).sum();
    let mut out = Vec::new();
    for &k in &acting {
        let share = (build_up.leaves[k].thickness / total).base();
        if acting.len() > 1 {
            s.heading(1, format!("{} leaf", if k == 0 { "Outer" } else { "Inner" }));
        }
        let mut m = leaf(s, i, build_up, k, share, change)?;
        if acting.len() > 1 {
            m.leaf = if k == 0 { "outer-".to_owned() } else { "inner-".to_owned() };
        }
        out.push(m);
    }
    Ok(out)
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
    let flange = flange(s, i, h, t);
    let loads: Vec<&Load> = r.loads.iter().filter(|x| x.leaf == k).collect();
    let stretch = l / r.length;
    let mut at_head = Vertical::default();
    for x in &loads {
        let from_middle = x.at * stretch.base() - l / 2.0;
        at_head = at_head.with_dead(x.dead, from_middle);
        at_head.Q = at_head.Q + x.imposed;
        at_head.U = at_head.U + x.uplift;
        at_head.S_Q = at_head.S_Q + x.imposed * from_middle;
        at_head.S_U = at_head.S_U + x.uplift * from_middle;
        at_head.T_G = at_head.T_G + x.dead * x.eccentricity;
        at_head.T_Q = at_head.T_Q + x.imposed * x.eccentricity;
    }
    let at_head = at_head.with_dead(change.dead, Length::ZERO);
    let stiffened = if stiffened(s, i, h, t) { Stiffened::One } else { Stiffened::None };
    let m = Model {
        leaf: String::new(),
        l,
        t,
        h,
        t_other: build_up.leaves.iter().enumerate().find(|(n, _)| *n != k).map(|(_, o)| o.thickness),
        rho_2: restraint(r, &at_head, t),
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
    let lateral = lateral(s, i, &m, share, change.wind);
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
fn flange(s: &mut Sheet, i: &Inputs<'_>, h: Length, t: Length) -> Option<Flange> {
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
    Some(Flange { b_f, t_f, G_f })
}

/// rho_2: 1.0 under timber floors, 0.75 under concrete unless the load is far off centre.
fn restraint(r: &Return, v: &Vertical, t: Length) -> Option<Num> {
    match r.restraint {
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

/// How the wind reaches the return: method, sideways and up and down.
fn lateral(s: &mut Sheet, i: &Inputs<'_>, m: &Model, share: f64, wind: f64) -> Lateral {
    let r = i.ret;
    let part = i.storey.and_then(|st| st.after(&r.mark).map(|p| (st, p)));
    given!(s, "net overall pressure, characteristic", "wind sheet", q_net = i.wind.overall * wind);
    given!(s, "tributary width of the wind face", "job file", b_t = r.tributary_width);
    let w_k = if r.path == Path::UpAndDown {
        given!(
            s,
            "line load over the height: the wall spans up and down",
            "load path of this job",
            w_k = LineLoad::ZERO
        );
        w_k
    } else {
        calc!(s, "statics", "line load over the height: the wall spans sideways", w_k = q_net * b_t);
        w_k
    };
    given!(s, "wind from the storeys above", "job file", F_a = r.from_above.force * wind);
    let H_k = head_force(s, r, part, q_net, b_t, F_a, wind);
    given!(s, "moment from the storeys above", "job file", M_k = r.from_above.moment * wind);
    let received = received(i, wind);
    let H_k = if received.force > Force::ZERO {
        given!(s, "force at the head of its own", "above", H_o = H_k);
        given!(
            s,
            "reaction of the heads that this wall holds",
            received.words.as_str(),
            R_k = received.force
        );
        calc!(s, "statics", "force at the head with these reactions", H_k = H_o + R_k);
        H_k
    } else {
        H_k
    };
    let (w_k, H_k, M_k) = if share < 1.0 {
        given!(
            s,
            "share of this leaf, by thickness",
            "thickness over the sum of the leaves that act",
            k_l = Num::new(share)
        );
        given!(s, "line load on the whole return", "above", w_a = w_k);
        given!(s, "head force on the whole return", "above", H_a = H_k);
        given!(s, "head moment on the whole return", "above", M_a = M_k);
        calc!(s, "statics", "line load on this leaf", w_k = k_l * w_a);
        calc!(s, "statics", "head force on this leaf", H_k = k_l * H_a);
        calc!(s, "statics", "head moment on this leaf", M_k = k_l * M_a);
        (w_k, H_k, M_k)
    } else {
        (w_k, H_k, M_k)
    };
    let h_nu = i.building.storey(&r.storey).map_or(m.h, |x| x.total_height);
    let (G_nu, Q_nu) = match part {
        Some((st, p)) => ((st.dead * p + received.dead) * share, (st.imposed * p + received.imposed) * share),
        None => {
            let foot = m.vertical(super::model::At::Foot);
            (foot.G, foot.Q)
        }
    };
    Lateral { w_k, H_k, M_k, G_nu, Q_nu, h_nu }
}

/// What the heads of other returns, held by this one, add to it.
#[derive(Default)]
struct Received {
    force: Force,
    dead: Force,
    imposed: Force,
    words: String,
}

/// Reactions of the returns that name this one as what holds their head, at characteristic value. A
/// head held by several walls leans on each of them alike.
fn received(i: &Inputs<'_>, wind: f64) -> Received {
    let mut out = Received::default();
    if matches!(i.ret.head, Head::Propped(_)) {
        // A head that is held passes its force on; it holds nobody.
        return out;
    }
    for other in &i.building.returns {
        let Head::Propped(walls) = &other.head else { continue };
        if !walls.contains(&i.ret.mark) {
            continue;
        }
        if let Some(r) = reaction(&Inputs { ret: other, ..*i }, wind) {
            let part = 1.0 / walls.len() as f64;
            out.force = out.force + r.force * part;
            out.dead = out.dead + r.dead * part;
            out.imposed = out.imposed + r.imposed * part;
            out.words = if out.words.is_empty() {
                other.mark.clone()
            } else {
                format!("{}, {}", out.words, other.mark)
            };
        }
    }
    out
}

/// The head reaction of a return whose head is held, at characteristic value, and what leans on it.
fn reaction(i: &Inputs<'_>, wind: f64) -> Option<Received> {
    let change = Change { wind, ..Change::NONE };
    let all = models(&mut Sheet::silent(), i, change).ok()?;
    let mut out = Received { words: i.ret.mark.clone(), ..Received::default() };
    for m in all {
        let l = m.lateral;
        out.force = out.force + l.H_k + l.w_k * m.h / 2.0;
        out.dead = out.dead + l.G_nu;
        out.imposed = out.imposed + l.Q_nu;
    }
    Some(out)
}

/// The design reaction at a head that is held: wind and tilt, for the walls named.
pub fn head_reaction(s: &mut Sheet, m: &Model, annex: &Annex) -> Force {
    let h = m.h;
    given!(s, "factor on wind", "EN 1990 Table NA.A1.2", gamma_W = Num::new(annex.gamma_Q));
    let d = super::actions::design(s, m, annex, gamma_W);
    let (H_Ed, w_Ed) = (d.H_Ed, d.w_Ed);
    if w_Ed > LineLoad::ZERO {
        calc!(
            s,
            "statics, head held",
            "reaction at the head, on the walls that hold it",
            R_Ed = H_Ed + w_Ed * h / 2.0
        );
        R_Ed
    } else {
        calc!(s, "statics, head held", "reaction at the head, on the walls that hold it", R_Ed = H_Ed);
        R_Ed
    }
}

fn head_force(
    s: &mut Sheet,
    r: &Return,
    part: Option<(&Storey, f64)>,
    q_net: crate::quantity::Stress,
    b_t: Length,
    F_a: Force,
    wind: f64,
) -> Force {
    if r.path == Path::Sideways {
        calc!(s, "statics", "force at the head", H_k = F_a);
        return H_k;
    }
    if let Some((storey, p)) = part.filter(|(st, _)| st.shares.iter().all(|x| x.width_after.is_none())) {
        given!(s, "wind force of the storey", "stability sheet", F_k = storey.F_k * wind);
        given!(s, "share of this wall after the removal", "stability sheet", k_w = Num::new(p));
        calc!(s, "statics", "force at the head, brought by the floor", H_k = k_w * F_k + F_a);
        return H_k;
    }
    given!(
        s,
        "height of wind face that the floor collects",
        "job file",
        h_s = r.strip_height.unwrap_or(r.height)
    );
    calc!(s, "statics", "force at the head, brought by the floor", H_k = q_net * b_t * h_s + F_a);
    H_k
}
