//! Label placement: every label has candidate spots with a cost; no two labels overlap, no label
//! stands on a line, and leaders stay off labels.
//!
//! Greedy in order of rank, each label at its cheapest free spot. A label that finds none moves to
//! the front and everything starts again; what still finds none goes wherever it covers nothing,
//! if need be below the drawing, where there is always room, and its leader may cross others. Then labels move to cheaper spots while there are any.
//! No chance is involved: the same notes give the same places.

use kurbo::{Line, Rect, Vec2};

use super::ground::{Ground, crosses, meet, shortened};
use super::note::{Block, Note, Spot};

/// Clear space between two labels, mm.
const BETWEEN: f64 = 0.6;
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

/// Decides the place of every note; the answer is in the order of the notes.
pub fn place(notes: &[Note], ground: &Ground, bounds: Rect) -> Vec<Block> {
    let mut choices: Vec<_> = notes.iter().map(|note| candidates(note, ground, bounds, false)).collect();
    let mut order: Vec<usize> = (0..notes.len()).collect();
    order.sort_by_key(|index| notes[*index].rank);

    let mut best = greedy(&choices, &order);
    let mut worst = notes.len();
    for _ in 0..3 * notes.len() {
        let Some(stuck) = order.iter().position(|index| best[*index].is_none()) else {
            break;
        };
        let index = order.remove(stuck);
        choices[index] = candidates(&notes[index], ground, bounds, true);
        order.insert(0, index);
        best = greedy(&choices, &order);
        let open = best.iter().filter(|pick| pick.is_none()).count();
        if open > worst {
            // Going round in circles: leave the rest to the place below the drawing.
            break;
        }
        worst = open.max(1);
    }
    improve(&choices, &mut best);

    let chosen = |index: usize| best[index].map(|pick| choices[index][pick].clone());
    let mut blocks: Vec<Option<Block>> = (0..notes.len()).map(chosen).collect();
    for index in 0..notes.len() {
        if blocks[index].is_none() {
            blocks[index] = Some(last_resort(&notes[index], ground, &blocks, bounds));
        }
    }
    blocks.into_iter().flatten().collect()
}

/// Each note in turn at its cheapest spot that is still free.
fn greedy(candidates: &[Vec<Block>], order: &[usize]) -> Vec<Option<usize>> {
    let mut placed: Vec<Option<usize>> = vec![None; candidates.len()];
    for &index in order {
        placed[index] = cheapest(candidates, &placed, index);
    }
    placed
}

/// Lets notes move to cheaper spots that have become free.
fn improve(candidates: &[Vec<Block>], placed: &mut [Option<usize>]) {
    for _ in 0..4 {
        let before = placed.to_vec();
        for index in 0..placed.len() {
            placed[index] = cheapest(candidates, placed, index).or(placed[index]);
        }
        if placed == before {
            return;
        }
    }
}

fn cheapest(candidates: &[Vec<Block>], placed: &[Option<usize>], index: usize) -> Option<usize> {
    candidates[index].iter().position(|block| {
        placed.iter().enumerate().all(|(other, pick)| match pick {
            Some(pick) if other != index => !clash(block, &candidates[other][*pick]),
            _ => true,
        })
    })
}

/// A place for a note that found none: wherever it covers nothing, or below everything, on the
/// leader that crosses least.
fn last_resort(note: &Note, ground: &Ground, blocks: &[Option<Block>], bounds: Rect) -> Block {
    let placed = || blocks.iter().flatten();
    let size = (note.width(), note.height());
    let foot = placed().fold(bounds.y1, |foot, block| foot.max(block.area.y1));
    let steps = (bounds.width() / 4.0).ceil() as usize;
    let below =
        (0..=steps).map(|step| Spot::new((bounds.x0 + 4.0 * step as f64, foot + 2.0), 1.0, 1.0).led());
    let near = candidates(note, ground, bounds, true)
        .into_iter()
        .filter(|block| placed().all(|other| !apart(block.area).overlaps(apart(other.area))));
    let crossed = |block: &Block| {
        let through = |leader: Option<Line>, area: Rect| leader.is_some_and(|l| crosses(l, area));
        let labels = placed().filter(|other| {
            through(block.leader, apart(other.area)) || through(other.leader, apart(block.area))
        });
        let both = |other: &&Block| matches!((block.leader, other.leader), (Some(a), Some(b)) if meet(a, b));
        10 * labels.count() + placed().filter(both).count()
    };
    near.chain(below.map(|spot| note.block(&spot, size)))
        .min_by_key(crossed)
        .expect("the places below everything are not empty")
}

/// An area with half the clear space between two labels around it.
fn apart(area: Rect) -> Rect {
    area.inflate(BETWEEN / 2.0, BETWEEN / 2.0)
}

fn clash(a: &Block, b: &Block) -> bool {
    let (area_a, area_b) = (apart(a.area), apart(b.area));
    area_a.overlaps(area_b)
        || a.leader.is_some_and(|leader| crosses(leader, area_b))
        || b.leader.is_some_and(|leader| crosses(leader, area_a))
        || matches!((a.leader, b.leader), (Some(x), Some(y)) if meet(x, y))
}

/// The places this note may take, cheapest first, those on lines left out. Places on leaders
/// all around are added where `far` asks for them or no near spot is cheaper.
fn candidates(note: &Note, ground: &Ground, bounds: Rect, far: bool) -> Vec<Block> {
    let size = (note.width(), note.height());
    let weigh = |spot: Spot| {
        let mut block = note.block(&spot, size);
        if ground.blocks(block.area) {
            return None;
        }
        if ground.hatched(block.area) {
            block.cost += MASK_COST;
        }
        if let Some(leader) = block.leader {
            // The last bit of a leader may touch what it points at.
            block.cost += CROSSING_COST * ground.crossed_by(shortened(leader, 0.6)) as f64;
        }
        let grown = bounds.union(block.area);
        let growth = grown.width() - bounds.width() + grown.height() - bounds.height();
        block.cost += GROWTH_COST * growth;
        Some(block)
    };
    let mut blocks: Vec<Block> = note.spots.iter().copied().filter_map(weigh).collect();
    if far || blocks.iter().all(|block| block.cost > LEADER_COST.0) {
        blocks.extend(rings(note).filter_map(weigh));
    }
    blocks.sort_by(|a, b| a.cost.total_cmp(&b.cost));
    blocks
}

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
    use kurbo::{BezPath, Shape};

    use super::*;
    use crate::sketch::drawing::Role;
    use crate::sketch::text::Text;

    fn note(x: f64) -> Note {
        Note::new(Role::Load, (x, 0.0), Text::plain("N = 12.4 kN")).around(1.0)
    }

    #[test]
    fn a_note_alone_takes_its_first_spot_without_leader() {
        let block = place(&[note(0.0)], &Ground::default(), Rect::new(-30.0, -30.0, 30.0, 30.0)).remove(0);
        assert!((block.area.x0 - 1.0).abs() < 1e-9);
        assert_eq!(block.leader, None);
    }

    #[test]
    fn fifty_notes_on_one_point_all_stand_apart() {
        let notes: Vec<Note> = (0..50).map(|_| note(0.0)).collect();
        let mut ground = Ground::default();
        let wall: BezPath = Rect::new(-20.0, -6.0, 20.0, 6.0).to_path(0.1);
        ground.bar(&wall, 0.25);
        let bounds = Rect::new(-20.0, -6.0, 20.0, 6.0);
        let blocks = place(&notes, &ground, bounds);
        for (index, block) in blocks.iter().enumerate() {
            assert!(!ground.blocks(block.area));
            for other in &blocks[index + 1..] {
                assert!(!block.area.overlaps(other.area));
            }
        }
        let again = place(&notes, &ground, bounds);
        assert!(blocks.iter().zip(&again).all(|(a, b)| a.area == b.area));
    }
}
