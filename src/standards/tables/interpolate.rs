//! Linear interpolation between the rows of a table, never beyond its ends.

/// Where a value falls among the rows of a table.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Place {
    /// Index of the row at or below in order.
    pub low: usize,
    /// Index of the next row; equal to `low` where the value meets a row.
    pub high: usize,
    /// Share of the `high` row, 0 to 1.
    pub share: f64,
}

impl Place {
    /// Value between the two rows' entries; exact at a row.
    pub fn of(self, column: impl Fn(usize) -> f64) -> f64 {
        if self.low == self.high {
            column(self.low)
        } else {
            column(self.low) * (1.0 - self.share) + column(self.high) * self.share
        }
    }
}

/// The place of `x` among strictly rising or strictly falling `rows`; `None` outside them.
pub(super) fn place(rows: &[f64], x: f64) -> Option<Place> {
    if let Some(i) = rows.iter().position(|r| *r == x) {
        return Some(Place { low: i, high: i, share: 0.0 });
    }
    let i = rows.windows(2).position(|p| (p[0] < x && x < p[1]) || (p[1] < x && x < p[0]))?;
    Some(Place { low: i, high: i + 1, share: (x - rows[i]) / (rows[i + 1] - rows[i]) })
}

/// A bare number for a printed row: at most four decimals, no trailing zeros.
pub(super) fn number(x: f64) -> String {
    let text = format!("{x:.4}");
    text.trim_end_matches('0').trim_end_matches('.').to_owned()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn rising_and_falling_rows_interpolate_and_the_ends_hold() {
        let rising = place(&[1.0, 2.0, 4.0], 3.0).unwrap();
        assert_eq!(rising.of(|i| [10.0, 20.0, 40.0][i]), 30.0);
        let falling = place(&[4.0, 2.0, 1.0], 3.0).unwrap();
        assert_eq!(falling.of(|i| [40.0, 20.0, 10.0][i]), 30.0);
        assert_eq!(place(&[1.0, 2.0], 2.0).unwrap().of(|i| [5.0, 6.0][i]), 6.0);
        assert_eq!(place(&[1.0, 2.0], 2.1), None);
        assert_eq!(place(&[1.0, 2.0], f64::NAN), None);
    }

    #[test]
    fn numbers_print_without_trailing_zeros() {
        assert_eq!(number(0.25), "0.25");
        assert_eq!(number(100.0), "100");
        assert_eq!(number(1.0 / 3.0), "0.3333");
    }
}
