//! Rows of a sparse matrix, collected one by one.

use clarabel::algebra::CscMatrix;

/// Rows `sum of terms + slack = right`.
#[derive(Default)]
pub struct Rows {
    terms: Vec<(usize, usize, f64)>,
    right: Vec<f64>,
}

impl Rows {
    /// Adds a row: column and factor of each term. A column named twice counts twice.
    pub fn push(&mut self, terms: &[(usize, f64)], right: f64) {
        let row = self.right.len();
        self.terms.extend(terms.iter().map(|&(column, factor)| (row, column, factor)));
        self.right.push(right);
    }

    /// How many rows there are.
    pub fn len(&self) -> usize {
        self.right.len()
    }
}

/// The matrix of all rows, one block below the other, and its right side.
pub fn stacked(blocks: [Rows; 3], columns: usize) -> (CscMatrix<f64>, Vec<f64>) {
    let (mut i, mut j, mut v, mut right) = (Vec::new(), Vec::new(), Vec::new(), Vec::new());
    for block in blocks {
        let above = right.len();
        for (row, column, factor) in block.terms {
            i.push(above + row);
            j.push(column);
            v.push(factor);
        }
        right.extend(block.right);
    }
    (CscMatrix::new_from_triplets(right.len(), columns, i, j, v), right)
}
