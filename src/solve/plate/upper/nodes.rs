//! The grid of nodes, and which of its cells are solid.

use crate::solve::plate::{Opening, Plate, Stretch};

/// A place on the panel, mm.
pub type Point = (f64, f64);

/// Coordinates nearer to each other than this part of the longer side are one.
const SAME: f64 = 1e-9;

/// Grid lines, cells and nodes.
pub struct Grid {
    /// Grid lines along x, mm.
    pub xs: Vec<f64>,
    /// Grid lines along y, mm.
    pub ys: Vec<f64>,
    /// Nodes from left to right and, on one grid line, upwards.
    pub points: Vec<Point>,
    /// Which grid lines each node lies on.
    pub at: Vec<(usize, usize)>,
    /// Cells column by column.
    solid: Vec<bool>,
}

impl Grid {
    /// A grid through every corner that matters, no step longer than `spacing` (mm).
    pub fn new(plate: &Plate<'_>, spacing: f64) -> Self {
        let [left, right, base, top] = &plate.edges;
        let ends = |edges: [&Vec<Stretch>; 2]| -> Vec<f64> {
            edges.into_iter().flatten().flat_map(|s| [s.from, s.to]).collect()
        };
        let same = SAME * plate.l.max(plate.h);
        let across = plate.openings.iter().map(|o| o.x).collect::<Vec<_>>();
        let up = plate.openings.iter().map(|o| o.y).collect::<Vec<_>>();
        let xs = divide(plate.l, &across, &ends([base, top]), spacing, same);
        let ys = divide(plate.h, &up, &ends([left, right]), spacing, same);
        let mut grid = Self { xs, ys, points: Vec::new(), at: Vec::new(), solid: Vec::new() };
        grid.fill(&plate.openings);
        grid.place();
        grid
    }

    /// Columns and rows of cells.
    pub fn cells(&self) -> (usize, usize) {
        (self.xs.len().saturating_sub(1), self.ys.len().saturating_sub(1))
    }

    /// Middle of a cell, mm.
    pub fn middle(&self, column: usize, row: usize) -> Point {
        ((self.xs[column] + self.xs[column + 1]) / 2.0, (self.ys[row] + self.ys[row + 1]) / 2.0)
    }

    /// Whether a cell is part of the wall: the one up and right of a grid point, or `back` columns and rows from it.
    pub fn is_solid(&self, point: (usize, usize), back: (usize, usize)) -> bool {
        let (columns, rows) = self.cells();
        match (point.0.checked_sub(back.0), point.1.checked_sub(back.1)) {
            (Some(column), Some(row)) => column < columns && row < rows && self.solid[column * rows + row],
            _ => false,
        }
    }

    fn fill(&mut self, openings: &[Opening]) {
        let (columns, rows) = self.cells();
        for column in 0..columns {
            for row in 0..rows {
                let (x, y) = self.middle(column, row);
                let void = |o: &Opening| o.x.0 < x && x < o.x.1 && o.y.0 < y && y < o.y.1;
                self.solid.push(!openings.iter().any(void));
            }
        }
    }

    /// Nodes are the grid points that touch the solid.
    fn place(&mut self) {
        for i in 0..self.xs.len() {
            for j in 0..self.ys.len() {
                let around = [(0, 0), (0, 1), (1, 0), (1, 1)];
                if around.into_iter().any(|back| self.is_solid((i, j), back)) {
                    self.points.push((self.xs[i], self.ys[j]));
                    self.at.push((i, j));
                }
            }
        }
    }
}

/// Grid lines from 0 to `length` through the edges of openings and the ends of stretches.
fn divide(length: f64, openings: &[(f64, f64)], ends: &[f64], spacing: f64, same: f64) -> Vec<f64> {
    let mut keys = vec![0.0, length];
    keys.extend(openings.iter().flat_map(|o| [o.0, o.1]));
    keys.extend(ends);
    keys.retain(|key| (0.0..=length).contains(key));
    keys.sort_by(f64::total_cmp);
    keys.dedup_by(|next, kept| *next - *kept < same);
    // Piers crack along their middle, so a whole pier gets an even number of steps.
    let begins = |a: f64| a < same || openings.iter().any(|o| (o.1 - a).abs() < same);
    let stops = |b: f64| b > length - same || openings.iter().any(|o| (o.0 - b).abs() < same);
    let mut grid = vec![0.0];
    for pair in keys.windows(2) {
        let (a, b) = (pair[0], pair[1]);
        let together = if begins(a) && stops(b) { 2 } else { 1 };
        let steps = (((b - a) / spacing - 1e-6).ceil() as usize).max(1).next_multiple_of(together);
        grid.extend((1..steps).map(|k| a + (b - a) * k as f64 / steps as f64));
        grid.push(b);
    }
    grid
}

/// Height of the line from `a` to `b` at `x`, mm; the line is not upright.
pub fn height(a: Point, b: Point, x: f64) -> f64 {
    a.1 + (b.1 - a.1) * (x - a.0) / (b.0 - a.0)
}
