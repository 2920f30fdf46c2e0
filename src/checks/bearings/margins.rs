//! How far the assumptions of a bearing may move before it fails: its own check on a building that differs in one thing.

use super::remedy::grown;
use super::seat::{Beam, Seat};
use super::{choose, site, work};
use crate::building::{Bearing, Building, Cause, Load, Padstone};
use crate::checks::margins::reach::{Reach, Step, Tried, reach};
use crate::checks::masonry;
use crate::quantity::{Force, Length};
use crate::standards::annex::Annex;
use crate::trace::Sheet;

/// As many times a load or a material factor are tried.
pub const MOST: f64 = 5.0;
/// Shorter bearings are not tried, mm: the least that a job may give.
pub const SHORTEST: f64 = 20.0;
/// Steps of a search.
const STEPS: u32 = 60;

/// A bearing whose seat stays as its sheet has it.
pub struct Held<'a> {
    building: &'a Building,
    bearing: &'a Bearing,
    stone: Option<&'a Padstone>,
    annex: &'a Annex,
}

impl<'a> Held<'a> {
    /// A bearing with the padstone that its sheet chose; `None` where a limit is left before that.
    pub fn of(building: &'a Building, bearing: &'a Bearing, annex: &'a Annex) -> Option<Self> {
        let chosen = choose(&mut Sheet::silent(), building, bearing, annex, false)?;
        Some(Self { building, bearing, stone: chosen.stone, annex })
    }

    /// The padstone, where there is one.
    pub const fn stone(&self) -> Option<&'a Padstone> {
        self.stone
    }

    /// What the check says of another building with this seat; a padstone that no longer fits fails.
    pub fn tried(&self, b: &Building) -> Tried {
        let Some(bearing) = b.bearings.iter().find(|x| x.mark == self.bearing.mark) else {
            return Tried::Outside;
        };
        let mut s = Sheet::silent();
        let Ok(site) = site::of(&mut s, b, bearing, self.annex) else { return Tried::Outside };
        let beam = Beam::of(&site);
        let seat = match self.stone.map(|stone| Seat::on(&site, beam, stone)) {
            Some(Ok(seat)) => seat,
            Some(Err(_)) => return Tried::Fails,
            None => Seat::bare(beam),
        };
        let left = work::all(&mut s, &site, &seat).is_err();
        if s.verdicts.iter().any(|v| !v.holds) {
            Tried::Fails
        } else if left || !s.outside.is_empty() {
            Tried::Outside
        } else {
            Tried::Passes
        }
    }

    /// The load that it carries.
    pub fn load(&self) -> Option<&'a Load> {
        self.building
            .returns
            .iter()
            .find(|r| r.mark == self.bearing.on)
            .and_then(|r| of_load(&r.loads, self.bearing))
    }

    fn with(&self, change: impl Fn(&mut Load)) -> Tried {
        self.tried(&self.loaded(change))
    }

    fn loaded(&self, change: impl Fn(&mut Load)) -> Building {
        let mut b = self.building.clone();
        let of = |l: &&mut Load| l.what == self.bearing.load;
        let ret = b.returns.iter_mut().find(|r| r.mark == self.bearing.on);
        if let Some(load) = ret.and_then(|r| r.loads.iter_mut().find(of)) {
            change(load);
        }
        b
    }

    /// The greatest dead load of the beam's end, kN.
    pub fn dead(&self) -> Option<Reach> {
        let now = self.load()?.dead.base() / 1e3;
        let end = far(now.max(1.0));
        reach(|kn| self.with(|l| l.dead = Force::new(kn * 1e3)), now, end, STEPS, Step::Digits)
    }

    /// The greatest imposed load of the beam's end, kN.
    pub fn imposed(&self) -> Option<Reach> {
        let now = self.load()?.imposed.base() / 1e3;
        let end = far(now.max(1.0));
        reach(|kn| self.with(|l| l.imposed = Force::new(kn * 1e3)), now, end, STEPS, Step::Digits)
    }

    /// The greatest eccentricity across the wall, by size, mm.
    pub fn off_the_middle(&self) -> Option<Reach> {
        let now = self.load()?.eccentricity.base();
        let way = if now < 0.0 { -1.0 } else { 1.0 };
        let at = |mm: f64| self.with(|l| l.eccentricity = Length::new(way * mm));
        reach(at, now.abs(), now.abs() + 200.0, STEPS, Step::Even(1.0))
    }

    /// The shortest bearing, mm; its edge that is nearer to an end of the return keeps its place, and the load moves to
    /// the middle of what is left.
    pub fn shortest(&self) -> Option<Reach> {
        let site = site::of(&mut Sheet::silent(), self.building, self.bearing, self.annex).ok()?;
        let at = |mm: f64| {
            let Some(beam) = grown(&site, Length::new(mm), self.bearing.width) else { return Tried::Fails };
            let mut b = self.loaded(|l| l.at = beam.x_c);
            if let Some(own) = b.bearings.iter_mut().find(|x| x.mark == self.bearing.mark) {
                own.length = beam.l_b;
            }
            self.tried(&b)
        };
        let now = self.bearing.length.base();
        reach(at, now, SHORTEST.min(now), STEPS, Step::Even(1.0))
    }

    /// The greatest material factor of compression.
    pub fn factor(&self) -> Option<Reach> {
        let now = masonry::factors(&mut Sheet::silent(), self.building)[0].0.base();
        let at = |value: f64| {
            let mut b = self.building.clone();
            b.basis.gamma_m_compression = Some(Cause { value, reason: "tried".to_owned() });
            self.tried(&b)
        };
        reach(at, now, now * MOST, STEPS, Step::Even(0.01))
    }
}

fn of_load<'l>(loads: &'l [Load], bearing: &Bearing) -> Option<&'l Load> {
    loads.iter().find(|l| l.what == bearing.load)
}

/// The end of a search, as it would be printed.
fn far(now: f64) -> f64 {
    let step = Step::Digits.at(now * MOST);
    (now * MOST / step).floor() * step
}
