//! How far a panel moves at collapse, as level hairlines: the closer, the further.
//!
//! Three closenesses, each twice the one before, so that lines of the wider one run on into the closer. A line ends
//! where the panel moves by just the share at which it begins; between the middles of cells shares are interpolated.

use std::collections::BTreeMap;

use kurbo::{Line, Rect};

use super::board::{Board, corners};
use super::panel_cracks::Cell;
use super::pen::Pen;
use super::view::Ruler;

/// Between the closest lines, mm on paper.
const CLOSEST: f64 = 0.9;
/// Share of the largest deflection from which every fourth line is drawn, every second, and all.
const FROM: [f64; 3] = [0.125, 0.375, 0.625];
/// Lines shorter than this, and lines nearer to the top or the base, are left out, mm on paper.
const LEAST: (f64, f64) = (0.8, 0.5);

/// The deflected shape.
pub(super) struct Deflection<'a> {
    cells: &'a [Cell],
    /// Shares at the corners of cells, by their place in hundredths of a millimetre.
    corners: BTreeMap<(i64, i64), f64>,
}

fn key(x: f64, y: f64) -> (i64, i64) {
    ((100.0 * x).round() as i64, (100.0 * y).round() as i64)
}

impl<'a> Deflection<'a> {
    /// The share at a corner is the mean of those of the cells that meet there.
    pub fn new(cells: &'a [Cell]) -> Self {
        let mut sums: BTreeMap<(i64, i64), (f64, f64)> = BTreeMap::new();
        for cell in cells {
            for (x, y) in
                [(cell.x.0, cell.y.0), (cell.x.0, cell.y.1), (cell.x.1, cell.y.0), (cell.x.1, cell.y.1)]
            {
                let (sum, count) = sums.entry(key(x, y)).or_default();
                (*sum, *count) = (*sum + cell.share, *count + 1.0);
            }
        }
        Self { cells, corners: sums.into_iter().map(|(at, (sum, count))| (at, sum / count)).collect() }
    }

    /// Whether any of it is drawn.
    pub fn is_seen(&self) -> bool {
        self.corners.values().any(|share| *share >= FROM[0])
    }

    /// The share at a place, mm from the lower left corner; 0 where there is no cell.
    pub fn at(&self, x: f64, y: f64) -> f64 {
        let holds = |c: &&Cell| c.x.0 <= x && x <= c.x.1 && c.y.0 <= y && y <= c.y.1;
        self.cells.iter().find(holds).map_or(0.0, |c| {
            let (left, right) = self.ends(c, y);
            left + (right - left) * (x - c.x.0) / (c.x.1 - c.x.0)
        })
    }

    /// Shares at the left and right side of a cell at a height.
    fn ends(&self, cell: &Cell, y: f64) -> (f64, f64) {
        let up = (y - cell.y.0) / (cell.y.1 - cell.y.0);
        let corner = |x: f64, y: f64| self.corners.get(&key(x, y)).copied().unwrap_or(cell.share);
        let side = |x: f64| {
            let (low, high) = (corner(x, cell.y.0), corner(x, cell.y.1));
            low + up * (high - low)
        };
        (side(cell.x.0), side(cell.x.1))
    }

    /// Draws the hairlines on a panel of a height, mm.
    pub fn draw(&self, board: &mut Board, height: f64, ruler: Ruler) {
        let pitch = CLOSEST * ruler.scale.0;
        let edge = LEAST.1 * ruler.scale.0;
        let mut lines = Vec::new();
        // The lines hang on the middle of the panel, so that it is hatched alike wherever it stands.
        let last = (height / 2.0 / pitch).floor() as i32;
        for step in -last..=last {
            let y = height / 2.0 + f64::from(step) * pitch;
            let class = if step % 4 == 0 { 0 } else { 2 - usize::from(step % 2 == 0) };
            if y > edge && y < height - edge {
                lines.extend(
                    self.runs(y, FROM[class])
                        .into_iter()
                        .map(|(from, to)| Line::new(ruler.at(from, y), ruler.at(to, y))),
                );
            }
        }
        lines.retain(|line| line.length() >= LEAST.0);
        let moved = |c: &&Cell| c.share >= FROM[0];
        let area = |c: &Cell| corners(Rect::from_points(ruler.at(c.x.0, c.y.0), ruler.at(c.x.1, c.y.1)));
        board.hatching_over(Pen::Moved, lines, self.cells.iter().filter(moved).map(area));
    }

    /// Where at a height the share is at least `least`: from where to where along the panel, in turn, mm.
    fn runs(&self, y: f64, least: f64) -> Vec<(f64, f64)> {
        let row = self.cells.iter().filter(|c| c.y.0 <= y && y < c.y.1);
        let mut pieces: Vec<(f64, f64)> = row
            .filter_map(|cell| {
                let (left, right) = self.ends(cell, y);
                let reached = cell.x.0 + (cell.x.1 - cell.x.0) * (least - left) / (right - left);
                match (left >= least, right >= least) {
                    (true, true) => Some(cell.x),
                    (true, false) => Some((cell.x.0, reached)),
                    (false, true) => Some((reached, cell.x.1)),
                    (false, false) => None,
                }
            })
            .collect();
        pieces.sort_by(|a, b| a.0.total_cmp(&b.0));
        let mut runs: Vec<(f64, f64)> = Vec::new();
        for (from, to) in pieces {
            match runs.last_mut() {
                Some(run) if from - run.1 < 0.01 => run.1 = to,
                _ => runs.push((from, to)),
            }
        }
        runs
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    /// A ridge over 8 m: the share grows by 1/4 with every metre up to the middle, and falls again.
    fn ridge() -> Vec<Cell> {
        let share = |x: f64| (x + 0.5).min(7.5 - x) / 4.0;
        let cell = |n: i32| {
            let x = f64::from(n);
            Cell { x: (1e3 * x, 1e3 * (x + 1.0)), y: (0.0, 2400.0), share: share(x) }
        };
        (0..8).map(cell).collect()
    }

    #[test]
    fn lines_end_where_their_share_is_reached() {
        let cells = ridge();
        let shape = Deflection::new(&cells);
        // 3/8 of the largest lies at 1.5 m and 6.5 m, 5/8 at 2.5 m and 5.5 m.
        for (least, (from, to)) in [(0.375, (1500.0, 6500.0)), (0.625, (2500.0, 5500.0))] {
            let runs = shape.runs(1000.0, least);
            assert_eq!(runs.len(), 1, "{runs:?}");
            assert!((runs[0].0 - from).abs() < 1e-9 && (runs[0].1 - to).abs() < 1e-9, "{runs:?}");
        }
        assert!((shape.at(2000.0, 700.0) - 0.5).abs() < 1e-12);
        assert_eq!(shape.at(9000.0, 700.0), 0.0);
    }

    #[test]
    fn a_line_stops_at_an_opening() {
        let mut cells = ridge();
        cells.remove(3);
        let shape = Deflection::new(&cells);
        let runs = shape.runs(1000.0, 0.375);
        assert_eq!(runs.len(), 2, "{runs:?}");
        assert_eq!((runs[0].1, runs[1].0), (3000.0, 4000.0));
    }

    #[test]
    fn what_hardly_moves_is_not_hatched() {
        let cells: Vec<Cell> = ridge().into_iter().map(|c| Cell { share: 0.1, ..c }).collect();
        let shape = Deflection::new(&cells);
        assert!(!shape.is_seen());
        assert!(shape.runs(1000.0, FROM[0]).is_empty());
    }
}
