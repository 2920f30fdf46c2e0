//! One seat worked: the masonry under it, the concrete of the padstone, the wall at mid-height below.

use super::seat::{Pressed, Seat};
use super::site::{Other, Site};
use crate::quantity::functions::{MM, abs, max, min};
use crate::quantity::{Force, Length, LineLoad, Num, print};
use crate::standards::en1992;
use crate::standards::en1996::{concentrated, reduction};
use crate::trace::{Column, Outside, Sheet, Table};
use crate::{calc, given, require, verify};

/// How a padstone is taken.
pub const RULE: &str = "A padstone lies with its middle under the load, or as near as the ends of the return and the faces of the leaf \
    allow. The load spreads in it at 60° to the horizontal, so the bearing length and twice its height over tan 60° count, at most \
    its own length; of one that cannot be centred under the load only the part centred on the load counts, twice the distance to its \
    nearer end. It is not taken as a spreader beam (6.1.3(7)). It lies on a full bed of mortar; its bending and splitting are not \
    calculated.";

/// What was found on the way, for the sketches.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Found {
    /// What presses the masonry.
    pub pressed: Pressed,
    /// Where the spread begins at mid-height, from the junction end.
    pub x_J: Length,
    /// Where it ends.
    pub x_F: Length,
    /// Its length.
    pub l_efm: Length,
}

/// Works a seat: three verdicts, or two without a padstone.
///
/// # Errors
/// [`Outside`] where the load stands too far off the middle of the wall, 6.1.3(4).
pub fn all(s: &mut Sheet, site: &Site<'_>, seat: &Seat) -> Result<Found, Outside> {
    let (l, t, e_c, N_Edc, f_d) = (site.model.l, site.model.t, site.e_c, site.N_Edc, site.f_d);
    require!(s, "bearing", "6.1.3(4)", "the load at most t/4 off the middle of the wall", e_c <= t / 4.0);
    let stone = seat.stone.is_some();
    let given_x = seat.beam.x_c;
    given!(s, "from the junction end", "as above", x_c = given_x);
    let c_60 = concentrated::spread(s);
    let p = seat.pressed(s, site, c_60);
    let Pressed { l_A, w_A, a_1, h_c, .. } = p;
    calc!(s, "6.1.3(2)", "area pressed", A_b = l_A * w_A);
    let (r_J, r_F, l_efm) = concentrated::effective_length(s, l, x_c, l_A, h_c, c_60);
    let (x_J, x_F) = (x_c - r_J, x_c + r_F);
    calc!(s, "6.1.3(2)", "effective area", A_ef = l_efm * t);
    let beta = concentrated::enhancement(s, site.group_1, a_1, h_c, A_b, A_ef);
    let N_Rdc = concentrated::resistance(s, beta, A_b, f_d);
    let words = if stone { "masonry under the padstone" } else { "masonry under the beam" };
    verify!(s, "bearing", "6.1.3(1) eq. 6.9", words, N_Edc <= N_Rdc);
    if let (Some(stone), Some(A_0)) = (seat.stone, p.A_0) {
        given!(s, "cylinder strength of the concrete", "list of padstones", f_ck = stone.f_ck);
        let f_cd = en1992::plain_strength(s, site.annex, f_ck);
        calc!(s, "EN 1992-1-1 12.6.1", "resistance, without enhancement", N_Rdp = f_cd * A_0);
        verify!(s, "padstone", "EN 1992-1-1 12.6.1", "concrete of the padstone", N_Edc <= N_Rdp);
    }
    if let Err(outside) = middle(s, site, h_c, x_J, x_F, l_efm, c_60) {
        s.leave(outside);
    }
    Ok(Found { pressed: p, x_J, x_F, l_efm })
}

/// 6.1.3(5): the requirements of 6.1.2.1 at mid-height of the wall below, with the other loads there.
fn middle(
    s: &mut Sheet,
    site: &Site<'_>,
    h_c: Length,
    x_J: Length,
    x_F: Length,
    l_efm: Length,
    c_60: Num,
) -> Result<(), Outside> {
    let m = &site.model;
    let slender = site.slender.clone()?;
    let (t, h, f_k, f_d, e_c) = (m.t, m.h, m.masonry.f_k, site.f_d, site.e_c);
    let (N_Edc, gamma_G) = (site.N_Edc, site.gamma_G);
    s.note(
        "A length cut at an end of the wall is taken as evenly pressed, as the clause takes it; the load off the \
         middle of the return is on the sheet of the return.",
    );
    let others = others(site, h_c, x_J, x_F, c_60);
    let source = if site.others.is_empty() {
        "no other load on this leaf".to_owned()
    } else {
        s.table(|| table(&site.bearing.mark, &others));
        "table above: those whose spread meets this one".to_owned()
    };
    let counted = || others.iter().filter(|o| o.counted);
    given!(s, "other loads there, per length", &source, n_o = counted().map(|o| o.n).sum::<LineLoad>());
    given!(
        s,
        "their moment across, per length",
        &source,
        m_o = counted().map(|o| o.n * o.load.e).sum::<Force>()
    );
    given!(s, "weight of the masonry", "job file", g_m = m.masonry.density);
    calc!(s, "statics", "own weight above mid-height", g_w = g_m * t * (h - h_c / 2.0));
    calc!(s, "6.1.3(5)", "vertical force there", N_Em = N_Edc + (n_o + gamma_G * g_w) * l_efm);
    let from = format!("sheet of {}", site.ret.mark);
    given!(s, "effective height", &from, h_ef = slender.h_ef);
    given!(s, "effective thickness", &from, t_ef = slender.t_ef);
    given!(s, "initial eccentricity", &from, e_init = slender.e_init);
    calc!(
        s,
        "6.1.2.2(1)",
        "eccentricity of these loads",
        e_h = (N_Edc * e_c + m_o * l_efm) / (N_Edc + n_o * l_efm)
    );
    let Phi_m = reduction::in_middle(s, site.annex, t, slender.t_ef, h_ef, e_init, e_h, f_k);
    let _ = t_ef;
    calc!(s, "6.1.2.1(2) eq. 6.2", "resistance there", N_Rdm = Phi_m * f_d * t * l_efm);
    verify!(s, "middle", "6.1.3(5), 6.1.2.1(1)", "wall at mid-height below", N_Em <= N_Rdm);
    Ok(())
}

/// Another load at mid-height: spread as a point load from the level of the masonry under the bearing.
struct Spread<'a> {
    load: &'a Other,
    from: Length,
    to: Length,
    n: LineLoad,
    counted: bool,
}

/// A load whose spread meets that of the beam counts over the whole of it, at its full intensity: safe.
fn others<'a>(site: &'a Site<'_>, h_c: Length, x_J: Length, x_F: Length, c_60: Num) -> Vec<Spread<'a>> {
    let run = c_60 * h_c / 2.0;
    site.others
        .iter()
        .map(|load| {
            let (from, to) = (max(load.at - run, 0.0 * MM), min(load.at + run, site.model.l));
            Spread { load, from, to, n: load.N / (to - from), counted: from < x_F && to > x_J }
        })
        .collect()
}

fn table(mark: &str, others: &[Spread<'_>]) -> Table {
    let shown = |name: &str, v: crate::quantity::Dyn| print::show(name, v).value;
    Table {
        caption: format!(
            "Other loads at mid-height below {mark}, design values, each spread at 60° from its place; those whose spread \
             meets that of the beam count over its whole length"
        ),
        columns: vec![
            Column::words("load"),
            Column::numbers("N, kN"),
            Column::numbers("from, mm"),
            Column::numbers("to, mm"),
            Column::numbers("per length, kN/m"),
            Column::numbers("off the middle, mm"),
            Column::words("counted"),
        ],
        rows: others
            .iter()
            .map(|o| {
                vec![
                    o.load.what.clone(),
                    shown("N", o.load.N.dynamic()),
                    shown("x", o.from.dynamic()),
                    shown("x", o.to.dynamic()),
                    shown("n", o.n.dynamic()),
                    shown("e", abs(o.load.e).dynamic()),
                    if o.counted { "yes" } else { "no" }.to_owned(),
                ]
            })
            .collect(),
        strong: Vec::new(),
    }
}
