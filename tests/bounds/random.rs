//! Panels drawn at random from a seed, and what may be done to a panel. Lengths in m, moments near 1 unless said.

use perpend::solve::plate::safe::{Safe, safe};
use perpend::solve::plate::upper::{Upper, upper};
use perpend::solve::plate::{Carry, Held, Opening, Plate, Stretch, Trouble};

/// Numbers between 0 and 1 from a seed: a linear congruence, the same on every machine.
pub struct Dice(u64);

impl Dice {
    /// The first rolls of neighbouring seeds are alike, so they are left out.
    pub fn new(seed: u64) -> Self {
        let mut dice = Self(seed);
        for _ in 0..4 {
            dice.roll();
        }
        dice
    }

    pub fn roll(&mut self) -> f64 {
        self.0 = self.0.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
        f64::from(u32::try_from(self.0 >> 33).unwrap_or(0)) / f64::from(1_u32 << 31)
    }

    pub fn between(&mut self, low: f64, high: f64) -> f64 {
        low + (high - low) * self.roll()
    }

    /// A length in whole decimetres.
    fn length(&mut self, low: f64, high: f64) -> f64 {
        (self.between(low, high.max(low)) * 10.0).round() / 10.0
    }

    pub fn of<T: Copy>(&mut self, all: &[T]) -> T {
        let n = (self.roll() * all.len() as f64) as usize;
        all[n.min(all.len() - 1)]
    }
}

/// A panel that owns its strengths.
#[derive(Clone, Debug)]
pub struct Panel {
    pub l: f64,
    pub h: f64,
    pub openings: Vec<Opening>,
    pub edges: [Vec<Stretch>; 4],
    pub m_H: f64,
    /// Of the bed joint at the top.
    pub m_V: f64,
    /// What the weight of the wall adds at the foot, as a part of `m_V`.
    pub weight: f64,
}

impl Panel {
    /// Panel number `seed`: one to three openings, edges whole or in stretches. It may have a piece that nothing holds.
    pub fn random(seed: u64) -> Self {
        let mut dice = Dice::new(seed);
        let (l, h) = (dice.length(1.6, 6.0), dice.length(2.0, 3.2));
        let (m_V, weight) = (dice.between(0.06, 1.1), dice.of(&[0.0, 0.3, 1.0]));
        let openings = openings(&mut dice, l, h);
        let edges = [h, h, l, l].map(|to| edge(&mut dice, to));
        Self { l, h, openings, edges, m_H: 1.0, m_V, weight }
    }

    /// Runs `f` on the panel as the analyses see it.
    fn seen<T>(&self, f: impl FnOnce(&Plate<'_>) -> T) -> T {
        let (h, m_V, weight) = (self.h, self.m_V, self.weight);
        let m_V = move |_: f64, y: f64| m_V * (1.0 + weight * (h - y) / h);
        let (openings, edges) = (self.openings.clone(), self.edges.clone());
        f(&Plate { l: self.l, h, openings, edges, m_H: self.m_H, m_V: &m_V })
    }

    /// The safe side at a spacing of the longer side over `parts`.
    pub fn safe(&self, parts: f64) -> Result<Safe, Trouble> {
        self.seen(|plate| safe(plate, self.l.max(self.h) / parts))
    }

    /// The upper side at a spacing of the longer side over `parts`.
    pub fn upper(&self, parts: f64) -> Result<Upper, Trouble> {
        self.seen(|plate| upper(plate, self.l.max(self.h) / parts))
    }

    /// Left and right exchanged.
    pub fn mirrored(&self) -> Self {
        let mut other = self.clone();
        for o in &mut other.openings {
            o.x = (self.l - o.x.1, self.l - o.x.0);
        }
        other.edges.swap(0, 1);
        for edge in &mut other.edges[2..] {
            *edge = reversed(edge, self.l);
        }
        other
    }

    /// A quarter turn against the clock, x to y and y to h - x. The bed joints must be alike over the height.
    pub fn turned(&self) -> Self {
        assert_eq!(self.weight, 0.0, "a turned panel would be stronger on one side");
        let [left, right, base, top] = self.edges.clone();
        let turn = |o: &Opening| Opening {
            x: (self.h - o.y.1, self.h - o.y.0),
            y: o.x,
            carry: match o.carry {
                Carry::Jambs => Carry::HeadAndSill,
                Carry::HeadAndSill => Carry::Jambs,
                other => other,
            },
        };
        Self {
            l: self.h,
            h: self.l,
            openings: self.openings.iter().map(turn).collect(),
            edges: [top, base, reversed(&left, self.h), reversed(&right, self.h)],
            m_H: self.m_V,
            m_V: self.m_H,
            weight: 0.0,
        }
    }

    /// All lengths `by` times as long.
    pub fn larger(&self, by: f64) -> Self {
        let mut other = self.clone();
        (other.l, other.h) = (self.l * by, self.h * by);
        for o in &mut other.openings {
            (o.x, o.y) = ((o.x.0 * by, o.x.1 * by), (o.y.0 * by, o.y.1 * by));
        }
        for stretch in other.edges.iter_mut().flatten() {
            (stretch.from, stretch.to) = (stretch.from * by, stretch.to * by);
        }
        other
    }

    /// All moments `by` times as large.
    pub fn stronger(&self, by: f64) -> Self {
        let mut other = self.clone();
        (other.m_H, other.m_V) = (self.m_H * by, self.m_V * by);
        for stretch in other.edges.iter_mut().flatten() {
            if let Held::Continuous(moment) = &mut stretch.held {
                *moment *= by;
            }
        }
        other
    }
}

fn reversed(edge: &[Stretch], length: f64) -> Vec<Stretch> {
    edge.iter().rev().map(|s| Stretch { from: length - s.to, to: length - s.from, ..*s }).collect()
}

/// Openings side by side; now and then two, one above the other, in the first place.
fn openings(dice: &mut Dice, l: f64, h: f64) -> Vec<Opening> {
    let places = dice.of(&[1, 2, 3]).min((l / 0.9) as usize);
    let pitch = l / places as f64;
    let stacked = places < 3 && dice.roll() < 0.2;
    let mut all = Vec::new();
    for place in 0..places {
        let begins = pitch * place as f64;
        let width = dice.length(0.4, pitch - 0.5);
        let from = dice.length(begins + 0.2, begins + pitch - 0.2 - width);
        let carry = dice.of(&[Carry::Jambs, Carry::AllRound, Carry::HeadAndSill]);
        let mut opening = |y| all.push(Opening { x: (from, from + width), y, carry });
        if stacked && place == 0 {
            opening((0.3, 0.8));
            opening((1.2, h - 0.3));
            continue;
        }
        let kind = dice.roll();
        let head = if kind > 0.9 { h } else { dice.length(1.3, h - 0.2) };
        let sill = if !(0.3..=0.95).contains(&kind) { 0.0 } else { dice.length(0.3, 0.9) };
        opening((sill, head));
    }
    all
}

/// An edge of length `to`, whole or in two or three stretches.
fn edge(dice: &mut Dice, to: f64) -> Vec<Stretch> {
    let mut cuts = vec![0.0, to];
    if dice.roll() < 0.35 {
        cuts.extend((0..dice.of(&[1, 2])).map(|_| dice.length(0.2, to - 0.2)));
    }
    cuts.sort_by(f64::total_cmp);
    cuts.dedup();
    let weak = Held::Continuous(dice.between(0.1, 0.9));
    let kinds = [Held::Free, Held::Free, Held::Simple, Held::Simple, weak, Held::Continuous(9.0)];
    cuts.windows(2).map(|c| Stretch { from: c[0], to: c[1], held: dice.of(&kinds) }).collect()
}

/// `f` of every seed, worked on two threads, in the order of the seeds.
pub fn each<T: Send>(seeds: impl IntoIterator<Item = u64>, f: impl Fn(u64) -> T + Sync) -> Vec<(u64, T)> {
    let seeds: Vec<u64> = seeds.into_iter().collect();
    let every_other = |first| seeds.iter().skip(first).step_by(2).map(|&s| (s, f(s))).collect::<Vec<_>>();
    let mut all = std::thread::scope(|scope| {
        let other = scope.spawn(|| every_other(1));
        let mut all = every_other(0);
        all.extend(other.join().expect("the other half"));
        all
    });
    all.sort_by_key(|(seed, _)| *seed);
    all
}
