//! Label placement: every label has candidate spots with a cost; no two labels overlap, no label
//! stands on a line, and leaders stay off labels.
//!
//! Greedy in order of rank, each label at its cheapest free spot. A label that finds none moves to
//! the front and everything starts again; what still finds none goes wherever it covers nothing,
//! if need be below the drawing, where there is always room, and its leader may cross others. Then labels move to cheaper spots while there are any.
//! No chance is involved: the same notes give the same places.

use kurbo::{Line, Rect};

use super::choices::Choices;
use super::ground::{Ground, crosses, meet};
use super::note::{Block, Note, Spot};

/// Clear space between two labels, mm.
const BETWEEN: f64 = 0.6;
/// Decides the place of every note; the answer is in the order of the notes.
pub fn place(notes: &[Note], ground: &Ground, bounds: Rect) -> Vec<Block> {
    let mut choices: Vec<_> = notes.iter().map(|note| Choices::new(note, ground, bounds, false)).collect();
    let mut order: Vec<usize> = (0..notes.len()).collect();
    order.sort_by_key(|index| notes[*index].rank);

    let mut best = greedy(&mut choices, &order);
    let mut worst = notes.len();
    for _ in 0..3 * notes.len() {
        let Some(stuck) = order.iter().position(|index| best[*index].is_none()) else {
            break;
        };
        let index = order.remove(stuck);
        choices[index] = Choices::new(&notes[index], ground, bounds, true);
        order.insert(0, index);
        best = greedy(&mut choices, &order);
        let open = best.iter().filter(|pick| pick.is_none()).count();
        if open > worst {
            // Going round in circles: leave the rest to the place below the drawing.
            break;
        }
        worst = open.max(1);
    }
    improve(&mut choices, &mut best);

    let mut blocks: Vec<Option<Block>> = best.into_iter().map(|pick| pick.map(|(_, block)| block)).collect();
    for index in 0..notes.len() {
        if blocks[index].is_none() {
            blocks[index] = Some(last_resort(&notes[index], ground, &blocks, bounds));
        }
    }
    blocks.into_iter().flatten().collect()
}

/// Which of its choices a note has taken, and the place itself.
type Pick = Option<(usize, Block)>;

/// Each note in turn at its cheapest spot that is still free.
fn greedy(choices: &mut [Choices<'_>], order: &[usize]) -> Vec<Pick> {
    let mut placed: Vec<Pick> = vec![None; choices.len()];
    for &index in order {
        placed[index] = cheapest(&mut choices[index], &placed, index);
    }
    placed
}

/// Lets notes move to cheaper spots that have become free.
fn improve(choices: &mut [Choices<'_>], placed: &mut [Pick]) {
    for _ in 0..4 {
        let mut moved = false;
        for index in 0..placed.len() {
            if let Some(pick) = cheapest(&mut choices[index], placed, index) {
                moved |= placed[index].as_ref().map(|(n, _)| *n) != Some(pick.0);
                placed[index] = Some(pick);
            }
        }
        if !moved {
            return;
        }
    }
}

fn cheapest(choices: &mut Choices<'_>, placed: &[Pick], index: usize) -> Pick {
    let mut n = 0;
    loop {
        let block = choices.get(n)?;
        let free = placed.iter().enumerate().all(|(other, pick)| match pick {
            Some((_, there)) if other != index => !clash(block, there),
            _ => true,
        });
        if free {
            return Some((n, block.clone()));
        }
        n += 1;
    }
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
    let mut choices = Choices::new(note, ground, bounds, true);
    let all = (0..).map_while(|n| choices.get(n).cloned());
    let near = all.filter(|block| placed().all(|other| !apart(block.area).overlaps(apart(other.area))));
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
