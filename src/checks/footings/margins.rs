//! How far the assumptions of a footing may move before it fails: its own check with one thing changed.

use super::combination::Combination;
use super::sheet::check;
use super::stands::Stands;
use crate::building::{Footing, Return};
use crate::checks::margins::reach::{Reach, Step, Tried, reach};
use crate::checks::returns::build::{Change, Inputs};
use crate::checks::returns::remedy::MOST_WIND;
use crate::quantity::{Force, Length, Stress};
use crate::trace::Sheet;

/// As many times a load is tried.
pub const MOST: f64 = 5.0;
/// Narrower footings and shorter returns are not tried, mm.
pub const LEAST: f64 = 100.0;
/// Ground that is allowed less than this is not tried, kN/m²: the least that a job may give.
pub const SOFTEST: f64 = 20.0;
/// A wall further off the middle of its footing is not tried, mm.
pub const OFF: f64 = 1000.0;
/// Steps of a search.
const STEPS: u32 = 60;

/// What the check says of a footing under a return with a change.
pub fn tried(i: &Inputs<'_>, ret: &Return, footing: &Footing, change: Change) -> Tried {
    let Ok(st) = Stands::with(&Inputs { ret, ..*i }, ret, footing, change) else { return Tried::Outside };
    let mut s = Sheet::silent();
    check(&mut s, &st);
    if s.verdicts.iter().any(|v| !v.holds) {
        Tried::Fails
    } else if s.outside.is_empty() {
        Tried::Passes
    } else {
        Tried::Outside
    }
}

fn footing_as(i: &Inputs<'_>, f: &Footing, change: impl Fn(&mut Footing)) -> Tried {
    let mut other = f.clone();
    change(&mut other);
    tried(i, i.ret, &other, Change::NONE)
}

/// The greatest net overall pressure, kN/m²; `None` where no wind comes down to it.
pub fn wind(i: &Inputs<'_>, f: &Footing) -> Option<Reach> {
    let st = Stands::of(i, i.ret, f).ok()?;
    if !Combination::all(&st).iter().any(|c| c.wind || c.uplift) {
        return None;
    }
    let now = i.wind.overall.base() * 1e3;
    let at = |q: f64| tried(i, i.ret, f, Change { wind: q / now, ..Change::NONE });
    reach(at, now, now * MOST_WIND, 2 * STEPS, Step::Digits)
}

/// The shortest return on it, loads in proportion, mm.
pub fn length(i: &Inputs<'_>, f: &Footing) -> Option<Reach> {
    let now = i.ret.length.base();
    let at = |mm: f64| tried(i, i.ret, f, Change { length: Some(Length::new(mm)), ..Change::NONE });
    reach(at, now, LEAST.min(now), STEPS, Step::Even(1.0))
}

/// The narrowest footing, mm.
pub fn width(i: &Inputs<'_>, f: &Footing) -> Option<Reach> {
    let now = f.width.base();
    let at = |mm: f64| footing_as(i, f, |f| f.width = Length::new(mm));
    reach(at, now, LEAST.min(now), STEPS, Step::Even(1.0))
}

/// The least pressure that the ground is allowed, kN/m².
pub fn allowable(i: &Inputs<'_>, f: &Footing) -> Option<Reach> {
    let now = f.allowable.value.base() * 1e3;
    let at = |q: f64| footing_as(i, f, |f| f.allowable.value = Stress::new(q / 1e3));
    reach(at, now, SOFTEST.min(now), STEPS, Step::Digits)
}

/// How much further the wall may stand off the middle of its footing, either way, mm.
pub fn off_the_middle(i: &Inputs<'_>, f: &Footing) -> Option<Reach> {
    let now = f.offset.base();
    let at = |mm: f64| {
        let of = |way: f64| footing_as(i, f, |f| f.offset = Length::new(now + way * mm));
        let both = [of(1.0), of(-1.0)];
        [Tried::Fails, Tried::Outside].into_iter().find(|x| both.contains(x)).unwrap_or(Tried::Passes)
    };
    reach(at, 0.0, OFF, 10 * STEPS, Step::Even(1.0))
}

/// All dead load at the head, kN, that the job gives.
pub fn dead_now(ret: &Return) -> f64 {
    ret.loads.iter().map(|l| l.dead).sum::<Force>().base() / 1e3
}

/// All imposed load at the head, kN.
pub fn imposed_now(ret: &Return) -> f64 {
    ret.loads.iter().map(|l| l.imposed).sum::<Force>().base() / 1e3
}

/// The least and the greatest dead load at the head of the return, all of it in proportion, kN; `None` where there is none.
pub fn dead(i: &Inputs<'_>, f: &Footing) -> Option<(Reach, Reach)> {
    let now = dead_now(i.ret);
    let at = |kn: f64| {
        let mut other = i.ret.clone();
        other.loads.iter_mut().for_each(|l| l.dead = l.dead * (kn / now));
        tried(i, &other, f, Change::NONE)
    };
    let to = |end: f64| reach(at, now, end, STEPS, Step::Digits);
    if now > 0.0 { to(0.0).zip(to(now * MOST)) } else { None }
}

/// The greatest imposed load at the head of the return, all of it in proportion, kN; `None` where there is none.
pub fn imposed(i: &Inputs<'_>, f: &Footing) -> Option<Reach> {
    let now = imposed_now(i.ret);
    let at = |kn: f64| {
        let mut other = i.ret.clone();
        other.loads.iter_mut().for_each(|l| l.imposed = l.imposed * (kn / now));
        tried(i, &other, f, Change::NONE)
    };
    if now > 0.0 { reach(at, now, now * MOST, STEPS, Step::Digits) } else { None }
}
