//! The places that a note may take, cheapest first, each weighed only when it is asked for: most notes stand at
//! one of the first, and a place on a leader is dear to weigh.

use std::cmp::Ordering;
use std::collections::BinaryHeap;

use kurbo::{Rect, Vec2};

use super::ground::{Ground, shortened};
use super::note::{Block, Note, Spot};

/// Distances tried for labels on leaders, mm.
const RINGS: [f64; 12] = [3.5, 5.0, 7.0, 10.0, 13.0, 17.0, 22.0, 28.0, 35.0, 45.0, 60.0, 80.0];
/// Directions tried on each ring.
const DIRECTIONS: usize = 16;
/// Cost of having a leader at all, and per millimetre of it.
const LEADER_COST: (f64, f64) = (6.0, 0.4);
/// Cost of a leader that crosses a line.
const CROSSING_COST: f64 = 2.0;
/// Cost of a label that needs a mask.
const MASK_COST: f64 = 9.0;
/// Cost per millimetre by which a label makes the drawing larger.
const GROWTH_COST: f64 = 0.5;

/// The places of one note, those on lines left out.
pub struct Choices<'a> {
    ground: &'a Ground,
    bounds: Rect,
    /// Cheapest first, as far as they were asked for.
    sorted: Vec<Block>,
    waiting: BinaryHeap<Waiting>,
}

/// A place that was not asked for yet.
struct Waiting {
    /// What it costs; at least, until it is weighed.
    cost: f64,
    /// Of equals the first comes first.
    order: usize,
    block: Block,
    weighed: bool,
}

impl<'a> Choices<'a> {
    /// Places on leaders all around are added where `far` asks for them or no near spot is cheaper.
    pub fn new(note: &Note, ground: &'a Ground, bounds: Rect, far: bool) -> Self {
        let mut out = Self { ground, bounds, sorted: Vec::new(), waiting: BinaryHeap::new() };
        let size = (note.width(), note.height());
        for (order, spot) in note.spots.iter().enumerate() {
            if let Some(block) = out.weigh(note.block(spot, size)) {
                out.waiting.push(Waiting { cost: block.cost, order, block, weighed: true });
            }
        }
        if far || out.waiting.iter().all(|one| one.cost > LEADER_COST.0) {
            let near = note.spots.len();
            for (order, spot) in rings(note).enumerate() {
                let block = note.block(&spot, size);
                let cost = block.cost + out.growth(&block);
                out.waiting.push(Waiting { cost, order: near + order, block, weighed: false });
            }
        }
        out
    }

    /// Place number `n`, the cheapest being number 0; nothing where there are fewer.
    pub fn get(&mut self, n: usize) -> Option<&Block> {
        while self.sorted.len() <= n {
            let mut first = self.waiting.pop()?;
            if first.weighed {
                self.sorted.push(first.block);
            } else if let Some(block) = self.weigh(first.block) {
                // What it costs more may put it behind others.
                (first.cost, first.block, first.weighed) = (block.cost, block, true);
                self.waiting.push(first);
            }
        }
        self.sorted.get(n)
    }

    /// The place with what it costs on this ground; nothing where it would stand on a line.
    fn weigh(&self, mut block: Block) -> Option<Block> {
        if self.ground.blocks(block.area) {
            return None;
        }
        if self.ground.hatched(block.area) {
            block.cost += MASK_COST;
        }
        if let Some(leader) = block.leader {
            // The last bit of a leader may touch what it points at.
            block.cost += CROSSING_COST * self.ground.crossed_by(shortened(leader, 0.6)) as f64;
        }
        block.cost += self.growth(&block);
        Some(block)
    }

    fn growth(&self, block: &Block) -> f64 {
        let (bounds, grown) = (self.bounds, self.bounds.union(block.area));
        GROWTH_COST * (grown.width() - bounds.width() + grown.height() - bounds.height())
    }
}

impl Ord for Waiting {
    /// The greatest is the one to come first.
    fn cmp(&self, other: &Self) -> Ordering {
        other.cost.total_cmp(&self.cost).then(other.order.cmp(&self.order))
    }
}

impl PartialOrd for Waiting {
    fn partial_cmp(&self, other: &Self) -> Option<Ordering> {
        Some(self.cmp(other))
    }
}

impl PartialEq for Waiting {
    fn eq(&self, other: &Self) -> bool {
        self.cmp(other) == Ordering::Equal
    }
}

impl Eq for Waiting {}

/// Spots on leaders, in growing rings.
fn rings(note: &Note) -> impl Iterator<Item = Spot> + '_ {
    RINGS.iter().flat_map(move |ring| {
        // From one step above the right, so that oblique leaders come first.
        (1..=DIRECTIONS).map(move |step| {
            let angle = std::f64::consts::TAU * step as f64 / DIRECTIONS as f64;
            let toward = Vec2::new(angle.cos(), -angle.sin());
            let sign = |v: f64| if v.abs() < 0.3 { 0.0 } else { v.signum() };
            let spot = Spot::new(note.target + toward * *ring, sign(toward.x), sign(toward.y));
            spot.led().cost(LEADER_COST.0 + LEADER_COST.1 * ring)
        })
    })
}

#[cfg(test)]
mod tests {
    use kurbo::Shape;

    use super::*;
    use crate::sketch::drawing::Role;
    use crate::sketch::text::Text;

    #[test]
    fn asked_one_by_one_the_places_come_as_if_all_were_weighed_and_sorted() {
        let mut ground = Ground::default();
        for i in 0..12 {
            let x = f64::from(i) * 5.0 - 30.0;
            ground.bar(&Rect::new(x, -20.0, x + 2.0, 15.0 + x / 4.0).to_path(0.1), 0.25);
        }
        ground.hatch(&[(-40.0, 0.0), (40.0, 0.0), (40.0, 30.0), (-40.0, 30.0)].map(kurbo::Point::from));
        let bounds = Rect::new(-30.0, -20.0, 30.0, 20.0);
        let note = Note::new(Role::Load, (3.0, 2.0), Text::plain("N = 12.4 kN")).around(1.0);
        let mut choices = Choices::new(&note, &ground, bounds, true);
        let mut lazily = Vec::new();
        while let Some(block) = choices.get(lazily.len()) {
            lazily.push((block.cost, block.area));
        }
        let size = (note.width(), note.height());
        let all = note.spots.iter().copied().chain(rings(&note));
        let mut eager: Vec<(f64, Rect)> =
            all.filter_map(|spot| choices.weigh(note.block(&spot, size))).map(|b| (b.cost, b.area)).collect();
        eager.sort_by(|a, b| a.0.total_cmp(&b.0));
        assert!(lazily.len() > 50);
        assert_eq!(lazily, eager);
    }
}
