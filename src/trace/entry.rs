//! What can stand on a sheet.

use super::columns::Columns;
use super::expr::Expr;
use super::parse::Op;
use crate::quantity::Dyn;

/// A symbol with its value.
#[derive(Clone, Debug, PartialEq)]
pub struct Value {
    /// Name as in the code, `f_vk0`.
    pub name: String,
    /// Value.
    pub value: Dyn,
}

/// One computed step.
#[derive(Clone, Debug, PartialEq)]
pub struct Step {
    /// What the result is, in words; may be empty.
    pub words: String,
    /// Clause and equation.
    pub clause: String,
    /// The result.
    pub result: Value,
    /// The formula.
    pub formula: Expr,
    /// The symbols of the formula as they stood.
    pub symbols: Vec<Value>,
}

/// A relation with its symbols as they stood.
#[derive(Clone, Debug, PartialEq)]
pub struct Relation {
    /// Left side.
    pub left: Expr,
    /// The sign between.
    pub op: Op,
    /// Right side.
    pub right: Expr,
    /// Symbols as they stood.
    pub symbols: Vec<Value>,
    /// Whether it holds.
    pub holds: bool,
}

/// Demand against resistance.
#[derive(Clone, Debug, PartialEq)]
pub struct Verdict {
    /// Which check, unique on its sheet.
    pub id: String,
    /// Check in words.
    pub words: String,
    /// Clause.
    pub clause: String,
    /// Demand.
    pub demand: Value,
    /// Resistance.
    pub resistance: Value,
    /// Demand over resistance, unrounded; infinite where nothing resists.
    pub ratio: f64,
    /// Demand does not exceed resistance, compared unrounded.
    pub holds: bool,
    /// The case that governs: combination and direction; may be empty.
    pub case: String,
}

/// A limit of application was left: neither adequate nor not adequate.
#[derive(Clone, Debug, PartialEq)]
pub struct Outside {
    /// Which check.
    pub id: String,
    /// The clause whose range was left.
    pub clause: String,
    /// Which limit.
    pub words: String,
}

impl Outside {
    /// The limit `words` of `clause` was left in check `id`.
    pub fn new(id: &str, clause: &str, words: impl Into<String>) -> Self {
        Self { id: id.to_owned(), clause: clause.to_owned(), words: words.into() }
    }
}

/// Something that no verdict shows and that must not be silent in the results: a hold point asks for other
/// proof, or nothing can.
#[derive(Clone, Debug, PartialEq)]
pub struct Unshown {
    /// Unique on its sheet.
    pub id: String,
    /// Clause or source.
    pub clause: String,
    /// What is not shown.
    pub words: String,
    /// What was found of it.
    pub finding: String,
    /// Its use, where there is one.
    pub ratio: Option<f64>,
    /// Mark of the hold point; without one it is a failure.
    pub hold: Option<String>,
}

/// A column of a table.
#[derive(Clone, Debug, PartialEq)]
pub struct Column {
    /// Heading; `symbol` where it is one.
    pub head: String,
    /// The heading is a symbol's name.
    pub symbol: bool,
    /// Numbers, aligned on the decimal point.
    pub numeric: bool,
}

impl Column {
    /// A column of words.
    pub fn words(head: &str) -> Self {
        Self { head: head.to_owned(), symbol: false, numeric: false }
    }

    /// A column of numbers under words.
    pub fn numbers(head: &str) -> Self {
        Self { head: head.to_owned(), symbol: false, numeric: true }
    }
}

/// A table of ready text.
#[derive(Clone, Debug, PartialEq, Default)]
pub struct Table {
    /// Caption.
    pub caption: String,
    /// Columns.
    pub columns: Vec<Column>,
    /// Rows.
    pub rows: Vec<Vec<String>>,
    /// Rows that count, set in the heavier weight.
    pub strong: Vec<usize>,
}

/// One entry of a sheet, in the order written.
#[derive(Clone, Debug, PartialEq)]
pub enum Entry {
    /// A heading; level 1 or 2.
    Heading(u8, String),
    /// An input.
    Given {
        /// Symbol and value.
        value: Value,
        /// What it is.
        words: String,
        /// Where it comes from.
        source: String,
    },
    /// A table value.
    Lookup {
        /// Symbol and value.
        value: Value,
        /// What it is.
        words: String,
        /// Table and clause.
        clause: String,
        /// What the table was entered with.
        rows: Vec<(String, String)>,
        /// Source and confidence of the figure.
        source: String,
    },
    /// The result of a search.
    Found {
        /// Symbol and value.
        value: Value,
        /// What was sought.
        words: String,
        /// Clause.
        clause: String,
    },
    /// A computed step.
    Step(Step),
    /// A branch.
    Decide {
        /// The condition.
        relation: Relation,
        /// What follows from it.
        words: String,
        /// Clause.
        clause: String,
    },
    /// A limit of application.
    Require {
        /// The condition.
        relation: Relation,
        /// The limit in words.
        words: String,
        /// Clause.
        clause: String,
    },
    /// A verdict.
    Verify(Verdict),
    /// A check that left its range.
    Outside(Outside),
    /// What no verdict shows.
    Unshown(Unshown),
    /// A rule printed beside the calculation, never instead of it.
    Rule {
        /// Which.
        id: String,
        /// In words.
        words: String,
        /// Source of the rule.
        clause: String,
        /// What was found.
        finding: String,
        /// Whether the rule is met.
        met: bool,
    },
    /// A remark.
    Note(String),
    /// A table.
    Table(Table),
    /// The same work on several things.
    Columns(Columns),
    /// A place for the drawings of these names, side by side.
    Drawings(Vec<String>),
}

impl Entry {
    /// Its symbol with the value, where it brings one.
    pub const fn value(&self) -> Option<&Value> {
        match self {
            Self::Given { value, .. } | Self::Lookup { value, .. } | Self::Found { value, .. } => Some(value),
            Self::Step(step) => Some(&step.result),
            _ => None,
        }
    }

    /// Its condition, where it is one.
    pub const fn relation(&self) -> Option<&Relation> {
        match self {
            Self::Decide { relation, .. } | Self::Require { relation, .. } => Some(relation),
            _ => None,
        }
    }

    /// Its clause, or where an input comes from.
    pub fn source(&self) -> Option<&str> {
        match self {
            Self::Given { source, .. } => Some(source),
            Self::Lookup { clause, .. }
            | Self::Found { clause, .. }
            | Self::Decide { clause, .. }
            | Self::Require { clause, .. }
            | Self::Rule { clause, .. } => Some(clause),
            Self::Step(step) => Some(&step.clause),
            Self::Verify(v) => Some(&v.clause),
            Self::Outside(o) => Some(&o.clause),
            Self::Unshown(u) => Some(&u.clause),
            _ => None,
        }
    }

    /// What it says of itself.
    pub fn words(&self) -> Option<&str> {
        match self {
            Self::Given { words, .. }
            | Self::Lookup { words, .. }
            | Self::Found { words, .. }
            | Self::Decide { words, .. }
            | Self::Require { words, .. }
            | Self::Rule { words, .. } => Some(words),
            Self::Step(step) => Some(&step.words),
            Self::Verify(v) => Some(&v.words),
            Self::Outside(o) => Some(&o.words),
            Self::Unshown(u) => Some(&u.words),
            _ => None,
        }
    }

    /// This entry, or those that stand in its columns.
    pub fn flat(&self) -> Vec<&Self> {
        match self {
            Self::Columns(c) => c.rows.iter().flat_map(super::columns::Row::entries).collect(),
            other => vec![other],
        }
    }
}
