//! What stands on a footing: the return's own loads at its foot, without what a flange brings, and what
//! pushes it.

use crate::building::{Acts, Building, Footing, Return, storey_height};
use crate::checks::returns::build::{self, Acting, Change, Inputs};
use crate::checks::returns::model::{At, Model, Vertical};
use crate::quantity::{Force, Length, Moment};
use crate::trace::{Outside, Sheet};

/// What a footing carries, characteristic.
pub struct Stands<'a> {
    /// Mark of the return.
    pub mark: &'a str,
    /// The footing.
    pub footing: &'a Footing,
    /// The return as one: every leaf's loads, the whole wind, no flange.
    pub whole: Model,
    /// Its vertical loads at the foot. The moments across the wall are about the middle of the footing.
    pub loads: Vertical,
    /// Moment of the uplift about the middle of the footing, across the wall.
    pub T_U: Moment,
    /// A flange is counted on the return's sheet.
    pub flanged: bool,
    /// The wall in the depth of the floor is among the loads, as in the take-down that gives those before.
    pub deep: bool,
}

impl<'a> Stands<'a> {
    /// From the models of the return. A leaf that does not act in plane presses the ground all the same.
    ///
    /// # Errors
    /// [`Outside`] where a table of strengths does not reach.
    pub fn of(i: &Inputs<'_>, ret: &'a Return, footing: &'a Footing) -> Result<Self, Outside> {
        Self::with(i, ret, footing, Change::NONE)
    }

    /// The same with a change to try; dead load added comes once a leaf.
    ///
    /// # Errors
    /// [`Outside`] where a table of strengths does not reach.
    pub fn with(
        i: &Inputs<'_>,
        ret: &'a Return,
        footing: &'a Footing,
        change: Change,
    ) -> Result<Self, Outside> {
        let mut s = Sheet::silent();
        let acting = build::acting(i)?;
        let mut leaves = Vec::new();
        for a in &acting {
            leaves.push((a.leaf, build::one(&mut s, i, *a, change)?));
        }
        let build_up = i.building.build_up(&ret.build_up);
        let count = build_up.map_or(1, |b| b.leaves.len());
        let idle = (0..count).filter(|k| ret.acts == Acts::Loaded && !acting.iter().any(|a| a.leaf == *k));
        for leaf in idle {
            leaves.push((leaf, build::one(&mut s, i, Acting { leaf, share: 0.0 }, change)?));
        }
        let place = |k| footing.offset + build_up.map_or(Length::ZERO, |b| b.place_of(k));
        let flanged = leaves.iter().any(|(_, m)| m.flange.is_some());
        let mut whole = leaves[0].1.clone();
        whole.flange = None;
        (whole.own, whole.at_head) = (Force::ZERO, Vertical::default());
        let mut across = Across::default();
        let more = in_the_floor(i.building, ret, footing);
        for (n, (k, m)) in leaves.iter().enumerate() {
            let m = &Model { own: m.own * (1.0 + more), ..m.clone() };
            let plain = Model { flange: None, ..m.clone() }.vertical(At::Foot);
            across.add(&plain, place(*k), m.rho_2.is_none());
            whole.own = whole.own + m.own;
            add(&mut whole.at_head, &m.at_head);
            if n > 0 {
                let (l, o) = (&mut whole.lateral, m.lateral);
                (l.w_k, l.H_k, l.M_k) = (l.w_k + o.w_k, l.H_k + o.H_k, l.M_k + o.M_k);
                (l.G_nu, l.Q_nu) = (l.G_nu + o.G_nu, l.Q_nu + o.Q_nu);
            }
        }
        let foot = whole.vertical(At::Foot);
        let [T_G, T_Q, T_U] = across.sums();
        let loads = Vertical { T_G, T_Q, ..foot };
        Ok(Self { mark: &ret.mark, footing, loads, T_U, flanged, deep: more > 0.0, whole })
    }

    /// Whether the loads press off the middle of the footing, across the wall.
    pub fn off_middle(&self) -> bool {
        [self.loads.T_G, self.loads.T_Q, self.T_U].iter().any(|t| *t != Moment::ZERO)
    }

    /// Whether wind or tilt reaches the foot at all.
    pub fn pushed(&self) -> bool {
        self.whole.sheared() || self.whole.lateral.M_k > Moment::ZERO
    }
}

/// How much heavier the wall is up to the floor above than over its clear height, where the take-down counts it so.
fn in_the_floor(b: &Building, r: &Return, f: &Footing) -> f64 {
    let led = f.before.is_some_and(|before| before.led);
    let storey = b.storeys.iter().position(|s| s.mark == r.storey).filter(|_| led);
    storey.map_or(0.0, |k| (storey_height(b, k) / r.height).base() - 1.0).max(0.0)
}

/// Moments across the wall: of the leaves' places, and of loads off the middle of a leaf whose head
/// nothing holds. The two may turn either way to each other, so they are added by size.
#[derive(Default)]
struct Across {
    place: [Moment; 3],
    head: [Moment; 3],
}

impl Across {
    fn add(&mut self, v: &Vertical, y: Length, head_free: bool) {
        let [g, q, u] = &mut self.place;
        (*g, *q, *u) = (*g + v.G * y, *q + v.Q * y, *u + v.U * y);
        if head_free {
            let [g, q, _] = &mut self.head;
            (*g, *q) = (*g + v.T_G, *q + v.T_Q);
        }
    }

    fn sums(&self) -> [Moment; 3] {
        let turn = if self.place[0] < Moment::ZERO { -1.0 } else { 1.0 };
        std::array::from_fn(|k| self.place[k] + self.head[k].abs() * turn)
    }
}

fn add(to: &mut Vertical, v: &Vertical) {
    (to.G, to.Q, to.U) = (to.G + v.G, to.Q + v.Q, to.U + v.U);
    (to.S_G, to.S_Q, to.S_U) = (to.S_G + v.S_G, to.S_Q + v.S_Q, to.S_U + v.S_U);
}
