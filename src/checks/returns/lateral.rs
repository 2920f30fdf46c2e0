//! How the wind reaches a return: sideways, up and down, from above, and from heads that lean on it.

use super::build::{Change, Inputs, models};
use super::model::{At, Lateral, Model};
use crate::building::{Head, Path, Return};
use crate::checks::stability::Storey;
use crate::quantity::{Force, Length, LineLoad, Num, Stress};
use crate::standards::annex::Annex;
use crate::trace::Sheet;
use crate::{calc, given};

/// How the wind reaches the return: method, sideways and up and down.
pub fn of(s: &mut Sheet, i: &Inputs<'_>, m: &Model, share: f64, wind: f64) -> Lateral {
    let r = i.ret;
    let part = i.storey.and_then(|st| st.after(&r.mark).map(|p| (st, p)));
    let source = r.wind.as_ref().map_or_else(|| "wind sheet".to_owned(), |c| format!("stated: {}", c.reason));
    given!(s, "net overall pressure, characteristic", &source, q_net = i.wind.overall * wind);
    let shown = i.building.found.of_return(&r.mark);
    let from = |as_drawn: bool| if as_drawn { "plan" } else { "job file" };
    let source = from(shown.is_some_and(|f| f.tributary == r.tributary_width));
    given!(s, "tributary width of the wind face", source, b_t = r.tributary_width);
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
    let strip = from(shown.is_some_and(|f| Some(f.strip) == r.strip_height));
    let H_k = head_force(s, r, part, (q_net, b_t, strip), F_a, wind);
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
            let foot = m.vertical(At::Foot);
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
    given!(s, "factor on wind", "EN 1990 NA.A1.2", gamma_W = Num::new(annex.gamma_Q));
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
    (q_net, b_t, source): (Stress, Length, &str),
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
        source,
        h_s = r.strip_height.unwrap_or(r.height)
    );
    calc!(s, "statics", "force at the head, brought by the floor", H_k = q_net * b_t * h_s + F_a);
    H_k
}
