//! The wall under a bearing, the load on it, and what else stands at mid-height there.

use crate::building::{Bearing, Building, LED, Load, Padstone, Return};
use crate::checks::returns::build::{self, Acting, Change, Inputs};
use crate::checks::returns::in_plane::compressive_strength;
use crate::checks::returns::model::Model;
use crate::checks::returns::vertical::{self, Slender};
use crate::quantity::functions::abs;
use crate::quantity::{Force, Length, Num, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::trace::{Outside, Sheet};
use crate::wind::Pressures;
use crate::{calc, given};

/// What does not change with the seat.
pub struct Site<'a> {
    /// The bearing.
    pub bearing: &'a Bearing,
    /// The return that it stands on.
    pub ret: &'a Return,
    /// The load.
    pub load: &'a Load,
    /// The leaf that carries it.
    pub model: Model,
    /// Units of Group 1.
    pub group_1: bool,
    /// Design strength of the wall.
    pub f_d: Stress,
    /// Design load.
    pub N_Edc: Force,
    /// Its eccentricity across the wall, its size.
    pub e_c: Length,
    /// Factor on dead load.
    pub gamma_G: Num,
    /// The other loads of the leaf, design value.
    pub others: Vec<Other>,
    /// Slenderness of the return, or why there is none.
    pub slender: Result<Slender, Outside>,
    /// Padstones to choose from.
    pub stones: &'a [Padstone],
    /// National values.
    pub annex: &'a Annex,
}

/// Another load on the same leaf.
#[derive(Clone, Debug)]
pub struct Other {
    /// What brings it.
    pub what: String,
    /// Design value.
    pub N: Force,
    /// Place from the junction end.
    pub at: Length,
    /// Eccentricity across the wall, its size.
    pub e: Length,
}

/// Reads the site from the building and puts it on the sheet.
///
/// # Errors
/// [`Outside`] where a strength is out of its table or the plan area is too small.
pub fn of<'a>(
    s: &mut Sheet,
    b: &'a Building,
    bearing: &'a Bearing,
    annex: &'a Annex,
) -> Result<Site<'a>, Outside> {
    let missing = || Outside::new("bearing", "job file", "the return or its load is not given");
    let ret = b.returns.iter().find(|r| r.mark == bearing.on).ok_or_else(missing)?;
    let load = ret.loads.iter().find(|l| l.what == bearing.load).ok_or_else(missing)?;
    // The wind adds no vertical load; without it the leaf can be read on its own.
    let wind = Pressures { overall: Stress::ZERO, panel: Stress::ZERO };
    let inputs = Inputs { building: b, ret, wind, storey: None, annex };
    let acting = Acting { leaf: load.leaf, share: 1.0 };
    let m = build::one(&mut Sheet::silent(), &inputs, acting, Change::NONE)?;
    let factors = Combination::PressingImposed.factors(annex, m.helping);

    let from = if load.source == LED { LED } else { "job file" };
    let on = format!("{}, {from}", load.what);
    given!(s, "dead load of the beam's end", &on, G_c = load.dead);
    given!(s, "imposed load", &on, Q_c = load.imposed);
    let clause = Combination::PressingImposed.clause();
    given!(s, "factor on dead load", clause, gamma_G = Num::new(factors.gamma_G));
    given!(s, "factor on imposed load", clause, gamma_Q = Num::new(factors.gamma_Q));
    calc!(s, "EN 1990 6.4.3.2 eq. 6.10", "design load", N_Edc = gamma_G * G_c + gamma_Q * Q_c);
    given!(s, "from the junction end", &on, x_c = load.at);
    given!(s, "eccentricity across the wall", &on, e_c = abs(load.eccentricity));

    let from = format!("sheet of {}", ret.mark);
    let (l, t, h) = (m.l, m.t, m.h);
    given!(s, "length of the return", &from, l);
    given!(s, "actual thickness", &from, t);
    given!(s, "clear height", &from, h);
    let f_k = m.masonry.f_k;
    given!(s, "characteristic compressive strength", &from, f_k);
    let _ = (h, x_c);
    let f_d = compressive_strength(s, &m, "area")?;
    let others = ret
        .loads
        .iter()
        .filter(|o| o.leaf == load.leaf && o.what != load.what)
        .map(|o| Other {
            what: o.what.clone(),
            N: gamma_G * o.dead + gamma_Q * o.imposed,
            at: o.at,
            e: abs(o.eccentricity),
        })
        .collect();
    let material = b.build_up(&ret.build_up).map(|u| &u.leaves[load.leaf].material);
    let group_1 = material.and_then(|name| b.material(name)).is_some_and(|x| x.group == 1);
    let slender = vertical::slenderness(&mut Sheet::silent(), &m, annex, "middle");
    Ok(Site {
        bearing,
        ret,
        load,
        model: m,
        group_1,
        f_d,
        N_Edc,
        e_c,
        gamma_G,
        others,
        slender,
        stones: &b.padstones,
        annex,
    })
}
