//! What lies near a place: things by the squares of a grid that their boxes touch, so that a crowded drawing is
//! not compared with itself piece by piece.

use std::collections::HashMap;
use std::hash::{BuildHasherDefault, Hasher};

use kurbo::{Line, Rect};

/// Side of a square, mm on paper: about a label.
const SIDE: f64 = 8.0;
/// What touches more squares than this is kept apart and always near.
const MANY: i64 = 4096;

/// So few things are compared one by one: that is faster than asking for squares.
const FEW: usize = 160;

/// Things by their place in a list that the caller keeps, numbered from nought as they are added.
#[derive(Default)]
pub struct Grid {
    /// What was added while there were few: number and box.
    few: Vec<(usize, Rect)>,
    count: usize,
    squares: HashMap<u64, Vec<usize>, BuildHasherDefault<Mix>>,
    large: Vec<usize>,
}

impl Grid {
    /// Adds the next thing, which lies within `area`.
    pub fn add(&mut self, area: Rect) {
        self.add_pieces(std::iter::once(area));
    }

    /// Adds the next thing, a line that is `reach` thick to each side.
    pub fn add_line(&mut self, line: Line, reach: f64) {
        self.add_pieces(pieces(line).map(|area| area.inflate(reach, reach)));
    }

    fn add_pieces(&mut self, areas: impl Iterator<Item = Rect>) {
        let n = self.count;
        self.count += 1;
        if self.count <= FEW {
            self.few.extend(areas.map(|area| (n, area)));
            return;
        }
        for (n, area) in std::mem::take(&mut self.few) {
            self.sort_in(n, area);
        }
        areas.for_each(|area| self.sort_in(n, area));
    }

    fn sort_in(&mut self, n: usize, area: Rect) {
        let (x, y) = (range(area.x0, area.x1), range(area.y0, area.y1));
        if (i64::from(x.1 - x.0) + 1) * (i64::from(y.1 - y.0) + 1) > MANY {
            self.large.push(n);
            return;
        }
        for i in x.0..=x.1 {
            for k in y.0..=y.1 {
                self.squares.entry(name(i, k)).or_default().push(n);
            }
        }
    }

    /// Whether any thing that may touch `area` is as asked.
    pub fn any_near(&self, area: Rect, mut asked: impl FnMut(usize) -> bool) -> bool {
        if self.count <= FEW {
            return (0..self.count).any(asked);
        }
        let (x, y) = (range(area.x0, area.x1), range(area.y0, area.y1));
        let mut squares = (x.0..=x.1).flat_map(|i| (y.0..=y.1).map(move |k| name(i, k)));
        self.large.iter().any(|n| asked(*n))
            || squares.any(|at| self.squares.get(&at).is_some_and(|here| here.iter().any(|n| asked(*n))))
    }

    /// Numbers of all things that may touch `area`, each once, in order.
    pub fn near(&self, area: Rect) -> Vec<usize> {
        self.within(std::iter::once(area))
    }

    /// Numbers of all things that a line may touch, each once, in order.
    pub fn along(&self, line: Line) -> Vec<usize> {
        self.within(pieces(line))
    }

    fn within(&self, areas: impl Iterator<Item = Rect>) -> Vec<usize> {
        if self.count <= FEW {
            return (0..self.count).collect();
        }
        let mut all = Vec::new();
        for area in areas {
            self.any_near(area, |n| {
                all.push(n);
                false
            });
        }
        all.sort_unstable();
        all.dedup();
        all
    }
}

/// A square as one number.
fn name(i: i32, k: i32) -> u64 {
    (u64::from(i.cast_unsigned()) << 32) | u64::from(k.cast_unsigned())
}

/// Squares are our own numbers: nobody makes them collide, and they are asked for at every spot of every label.
#[derive(Default)]
struct Mix(u64);

impl Hasher for Mix {
    fn finish(&self) -> u64 {
        self.0
    }

    fn write(&mut self, bytes: &[u8]) {
        bytes.iter().for_each(|byte| self.write_u64(u64::from(*byte)));
    }

    fn write_u64(&mut self, n: u64) {
        // Multiplied by the golden ratio; the high half, which is mixed best, also goes to the low bits.
        let mixed = (self.0 ^ n).wrapping_mul(0x9e37_79b9_7f4a_7c15);
        self.0 = mixed ^ (mixed >> 32);
    }
}

fn range(a: f64, b: f64) -> (i32, i32) {
    let square = |v: f64| (v / SIDE).floor() as i32;
    (square(a.min(b)), square(a.max(b)))
}

/// Boxes of the pieces of a line, none much larger than a square; one box of a line along x or y.
fn pieces(line: Line) -> impl Iterator<Item = Rect> {
    let run = line.p1 - line.p0;
    let count =
        if run.x == 0.0 || run.y == 0.0 { 1 } else { (run.hypot() / SIDE).ceil().clamp(1.0, 512.0) as usize };
    (0..count).map(move |i| {
        let at = |k: usize| line.p0.lerp(line.p1, k as f64 / count as f64);
        // Rounding must not lose a line that runs along the side of a square.
        Rect::from_points(at(i), at(i + 1)).inflate(1e-6, 1e-6)
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn all_that_touches_is_near_and_little_else() {
        let boxes: Vec<Rect> = (0..40)
            .flat_map(|i| (0..40).map(move |k| (f64::from(i) * 7.0 - 90.0, f64::from(k) * 5.0 - 60.0)))
            .map(|(x, y)| Rect::new(x, y, x + 6.0, y + 0.5))
            .collect();
        let asked = Rect::new(-3.0, 8.0, 20.0, 15.0);
        let mut grid = Grid::default();
        for (n, area) in boxes.iter().enumerate() {
            grid.add(*area);
            if [0, FEW - 1, FEW, FEW + 1].contains(&n) || n + 1 == boxes.len() {
                let found = grid.near(asked);
                assert!((0..=n).all(|n| !boxes[n].overlaps(asked) || found.contains(&n)), "{n}: {found:?}");
                assert!(found.windows(2).all(|w| w[0] < w[1]));
            }
        }
        assert!(grid.near(asked).len() < boxes.len() / 10, "{}", grid.near(asked).len());
        assert!(grid.any_near(asked, |n| boxes[n].overlaps(asked)) && !grid.any_near(asked, |_| false));
    }

    #[test]
    fn a_slant_line_finds_what_it_crosses() {
        let mut grid = Grid::default();
        for i in 0..300 {
            grid.add_line(Line::new((f64::from(i), -50.0), (f64::from(i), 50.0)), 0.1);
        }
        let found = grid.along(Line::new((-2.0, -30.0), (30.5, 30.0)));
        assert!((0..=30).all(|n| found.binary_search(&n).is_ok()) && found.len() < 45, "{found:?}");
        // The other way about: slant lines in the grid.
        let mut grid = Grid::default();
        for i in 0..300 {
            grid.add_line(Line::new((f64::from(i), 0.0), (f64::from(i) + 40.0, 40.0)), 0.1);
        }
        let found = grid.near(Rect::new(99.0, 19.0, 101.0, 21.0));
        assert!((78..=82).all(|n| found.contains(&n)) && found.len() < 60, "{found:?}");
    }

    #[test]
    fn what_covers_very_much_is_near_everything() {
        let mut grid = Grid::default();
        grid.add(Rect::new(-1e6, -1e6, 1e6, 1e6));
        for i in 0..FEW {
            grid.add(Rect::new(100.0, 100.0, 101.0 + i as f64, 101.0));
        }
        assert_eq!(grid.near(Rect::new(3.0, 3.0, 4.0, 4.0)), [0]);
    }
}
