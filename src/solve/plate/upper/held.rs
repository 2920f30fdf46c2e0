//! Pieces of the panel that nothing holds.

use super::lines::{Kind, Line};
use super::nodes::Grid;
use crate::solve::plate::Trouble;

/// What holds a piece.
#[derive(Clone, Default)]
struct Support {
    /// A support that brings a moment.
    fixed: bool,
    /// Grid lines with supports that bring none: whether upright, and which.
    hinges: Vec<(bool, usize)>,
}

impl Support {
    /// A piece on hinges along one line alone swings freely.
    fn enough(&self) -> bool {
        self.fixed || self.hinges.iter().any(|hinge| *hinge != self.hinges[0])
    }
}

/// Names the first piece that can move without cracking anything.
pub fn check(grid: &Grid, lines: &[Line]) -> Result<(), Trouble> {
    let (pieces, first) = pieces(grid);
    let (columns, rows) = grid.cells();
    let mut supports = vec![Support::default(); first.len()];
    for line in lines.iter().filter(|line| line.kind == Kind::Hinge) {
        let ((i, j), (k, _)) = (grid.at[line.a], grid.at[line.b]);
        // The cell beside a hinge: the last column or row where the hinge lies on the far edge.
        let cell = i.min(columns - 1) * rows + j.min(rows - 1);
        if let Some(support) = pieces[cell].and_then(|piece| supports.get_mut(piece)) {
            support.fixed |= line.cost > 0.0;
            support.hinges.push(if i == k { (true, i) } else { (false, j) });
        }
    }
    match supports.iter().zip(first).find(|(support, _)| !support.enough()) {
        Some((_, (column, row))) => {
            let (x, y) = grid.middle(column, row);
            Err(Trouble::Floating(x, y))
        }
        None => Ok(()),
    }
}

/// The piece of each cell (none for voids), and one cell of each piece.
fn pieces(grid: &Grid) -> (Vec<Option<usize>>, Vec<(usize, usize)>) {
    let (columns, rows) = grid.cells();
    let mut pieces = vec![None; columns * rows];
    let mut first = Vec::new();
    for start in (0..columns).flat_map(|column| (0..rows).map(move |row| (column, row))) {
        let mut waiting = vec![start];
        let before = first.len();
        while let Some((column, row)) = waiting.pop() {
            let cell = column * rows + row;
            if !grid.is_solid((column, row), (0, 0)) || pieces[cell].is_some() {
                continue;
            }
            if first.len() == before {
                first.push(start);
            }
            pieces[cell] = Some(before);
            let left = column.checked_sub(1).map(|column| (column, row));
            let below = row.checked_sub(1).map(|row| (column, row));
            let right = (column + 1 < columns).then_some((column + 1, row));
            let above = (row + 1 < rows).then_some((column, row + 1));
            waiting.extend([left, below, right, above].into_iter().flatten());
        }
    }
    (pieces, first)
}
