//! Where a number of a standard comes from, how sure we are of it, and what looking it up yields.
//!
//! A table value is never printed alone: with it go the rows that selected it and its source.

use std::fmt;

/// How sure we are that a number is the standard's own.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Confidence {
    /// Low: an input with a stated reason, never a silent default.
    Low,
    /// Medium: believed right, one digit or the extent of a clause may differ.
    Medium,
    /// High: known well, and checked against a second source or by recalculation where possible.
    High,
}

impl Confidence {
    /// The letter that is printed: H, M or L.
    pub const fn letter(self) -> char {
        match self {
            Self::Low => 'L',
            Self::Medium => 'M',
            Self::High => 'H',
        }
    }
}

/// The origin of a table's numbers.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Source {
    /// Author or standard, title, edition; or the words "from memory, check against the standard".
    pub text: &'static str,
    /// How sure we are.
    pub confidence: Confidence,
}

/// The words printed for a number that nobody has yet compared with the printed standard.
pub const FROM_MEMORY: &str = "from memory, check against the standard";

impl Source {
    /// A number from memory.
    pub const fn memory(confidence: Confidence) -> Self {
        Self { text: FROM_MEMORY, confidence }
    }

    /// A number from a named text.
    pub const fn named(text: &'static str, confidence: Confidence) -> Self {
        Self { text, confidence }
    }

    /// The less sure of two sources: what a value mixed from both may claim.
    pub const fn weaker(self, other: Self) -> Self {
        if (other.confidence as u8) < (self.confidence as u8) { other } else { self }
    }
}

impl fmt::Display for Source {
    /// `from memory, check against the standard (H)`.
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "{} ({})", self.text, self.confidence.letter())
    }
}

/// A value read from a table, with everything a sheet prints beside it.
#[derive(Clone, Debug, PartialEq)]
pub struct Looked<T> {
    /// The value; its unit is documented at the lookup.
    pub value: T,
    /// The table, as a sheet names it.
    pub table: &'static str,
    /// What selected the value: name and entry, in reading order.
    pub rows: Vec<(String, String)>,
    /// Where the numbers come from.
    pub source: Source,
}

impl<T> Looked<T> {
    /// A value of `table` with no rows yet.
    pub const fn new(value: T, table: &'static str, source: Source) -> Self {
        Self { value, table, rows: Vec::new(), source }
    }

    /// The same value with one more row.
    #[must_use]
    pub fn row(mut self, name: &str, entry: impl fmt::Display) -> Self {
        self.rows.push((name.to_owned(), entry.to_string()));
        self
    }
}

/// A table does not reach as far as it was asked to: an outcome of its own, not a failed check.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct OutOfTable {
    /// What was asked for.
    pub what: String,
    /// What the table holds.
    pub allowed: String,
}

impl OutOfTable {
    /// Asked for `what`; the table holds `allowed`.
    pub fn new(what: impl Into<String>, allowed: impl Into<String>) -> Self {
        Self { what: what.into(), allowed: allowed.into() }
    }
}

impl fmt::Display for OutOfTable {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "{} is outside the table: {}", self.what, self.allowed)
    }
}

impl std::error::Error for OutOfTable {}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_source_prints_its_letter_and_mixing_keeps_the_weaker() {
        let sure = Source::memory(Confidence::High);
        let unsure = Source::named("a leaflet", Confidence::Low);
        assert_eq!(sure.to_string(), "from memory, check against the standard (H)");
        assert_eq!(sure.weaker(unsure), unsure);
        assert_eq!(unsure.weaker(sure), unsure);
    }
}
