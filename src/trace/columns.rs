//! The same work on several things, side by side: a row for each step, a column for each thing.
//!
//! Every column is recorded by itself, with all locks, from the symbols that stood before the first;
//! only then are equal steps laid in one row. So a formula is printed once, and its values follow
//! each other down a column as they would on a sheet of its own.

use super::Sheet;
use super::entry::{Entry, Relation, Value};

/// Columns of work.
#[derive(Clone, Debug, PartialEq)]
pub struct Columns {
    /// What each column is of.
    pub heads: Vec<String>,
    /// Rows in the order of the work.
    pub rows: Vec<Row>,
}

/// The same entry in every column that has it.
#[derive(Clone, Debug, PartialEq)]
pub struct Row {
    /// One for each column; none where the work of that column went another way.
    pub cells: Vec<Option<Entry>>,
}

impl Row {
    /// The first column that has this row, with its entry.
    pub fn lead(&self) -> Option<(usize, &Entry)> {
        self.cells.iter().enumerate().find_map(|(i, cell)| Some((i, cell.as_ref()?)))
    }

    /// Its entries.
    pub fn entries(&self) -> impl Iterator<Item = &Entry> {
        self.cells.iter().flatten()
    }

    /// Where its values come from: each source once.
    pub fn sources(&self) -> String {
        together(&distinct(self.entries().filter_map(Entry::source)))
    }

    /// Its words; of a branch that goes both ways, those of both.
    pub fn words(&self) -> String {
        let words = distinct(self.entries().filter_map(Entry::words));
        if self.entries().any(|e| e.relation().is_some()) { words.join("; else ") } else { together(&words) }
    }

    /// What a cell of a relation says: whether a limit is kept; of a branch whether it went the way of the
    /// first column, and nothing where all went one way, which the words say.
    pub fn way(&self, entry: &Entry, relation: &Relation) -> &'static str {
        let word = |yes: bool| if yes { "yes" } else { "no" };
        if !matches!(entry, Entry::Decide { .. }) {
            return word(relation.holds);
        }
        let mut ways = self.entries().filter_map(Entry::relation).map(|r| r.holds);
        let first = ways.next().unwrap_or(relation.holds);
        if ways.all(|way| way == first) { "" } else { word(relation.holds == first) }
    }

    /// What a table was entered with, for each column; empty where it says the same as one before.
    pub fn entered(&self) -> Vec<String> {
        let mut said: Vec<String> = Vec::new();
        let of = |cell: &Option<Entry>| match cell {
            Some(Entry::Lookup { rows, source, .. }) => {
                let rows: Vec<String> = rows.iter().map(|(k, v)| format!("{k} {v}")).collect();
                rows.into_iter()
                    .chain((!source.is_empty()).then(|| source.clone()))
                    .collect::<Vec<_>>()
                    .join("; ")
            }
            _ => String::new(),
        };
        self.cells
            .iter()
            .map(of)
            .map(|text| {
                if said.contains(&text) {
                    return String::new();
                }
                said.push(text.clone());
                text
            })
            .collect()
    }
}

impl Columns {
    /// Lays columns side by side.
    fn merge(heads: &[String], columns: Vec<Vec<Entry>>) -> Self {
        let n = heads.len();
        let mut rows: Vec<Row> = Vec::new();
        for (i, column) in columns.into_iter().enumerate() {
            rows = join(rows, column, i, n);
        }
        Self { heads: heads.to_vec(), rows }
    }
}

impl Sheet {
    /// Records the same work for each of `heads`, laid in columns; alone or silently it is just done.
    ///
    /// Symbols that come to stand inside do not stand after it: what follows gives them again, by the
    /// name of the thing they are of.
    pub fn columns<T>(&mut self, heads: &[String], mut work: impl FnMut(&mut Self, usize) -> T) -> Vec<T> {
        if !self.recording() || heads.len() < 2 {
            return (0..heads.len()).map(|i| work(self, i)).collect();
        }
        let above = std::mem::take(&mut self.entries);
        let start = self.memory();
        let mut columns = Vec::new();
        let mut out = Vec::new();
        for i in 0..heads.len() {
            self.remember(start.clone());
            out.push(work(self, i));
            columns.push(std::mem::take(&mut self.entries));
        }
        self.remember(start);
        self.entries = above;
        self.entries.push(Entry::Columns(Columns::merge(heads, columns)));
        out
    }
}

/// Texts as one, the words that all begin with said once: `at the head; middle`.
fn together(texts: &[&str]) -> String {
    let words: Vec<Vec<&str>> = texts.iter().map(|text| text.split(' ').collect()).collect();
    let same = |n: usize| words.iter().all(|w| n + 1 < w.len() && w[n] == words[0][n]);
    let alike = (0..).take_while(|&n| words.len() > 1 && same(n)).count();
    let rest = words.iter().skip(1).map(|w| w[alike..].join(" "));
    texts.first().map(|first| (*first).to_owned()).into_iter().chain(rest).collect::<Vec<_>>().join("; ")
}

fn distinct<'a>(texts: impl Iterator<Item = &'a str>) -> Vec<&'a str> {
    let mut out = Vec::new();
    for text in texts {
        if !text.is_empty() && !out.contains(&text) {
            out.push(text);
        }
    }
    out
}

/// Rows so far with one more column: equal entries share a row, by the longest common run of both.
fn join(rows: Vec<Row>, column: Vec<Entry>, i: usize, n: usize) -> Vec<Row> {
    let (m, k) = (rows.len(), column.len());
    let shared = |row: &Row, entry: &Entry| row.entries().any(|e| same(e, entry));
    let alike: Vec<Vec<bool>> =
        rows.iter().map(|row| column.iter().map(|entry| shared(row, entry)).collect()).collect();
    // longest[a][b]: how many rows from a on can be shared with entries from b on.
    let mut longest = vec![vec![0_usize; k + 1]; m + 1];
    for a in (0..m).rev() {
        for b in (0..k).rev() {
            longest[a][b] = if alike[a][b] {
                longest[a + 1][b + 1] + 1
            } else {
                longest[a + 1][b].max(longest[a][b + 1])
            };
        }
    }
    let (mut rows, mut column) = (rows.into_iter(), column.into_iter());
    let (mut a, mut b) = (0, 0);
    let mut out = Vec::new();
    while a < m || b < k {
        let both = a < m && b < k && alike[a][b];
        // Where the two part, what the earlier columns do comes first.
        let row_first = a < m && (b == k || longest[a + 1][b] >= longest[a][b + 1]);
        let mut row = if both || row_first { rows.next() } else { None }
            .unwrap_or_else(|| Row { cells: vec![None; n] });
        a += usize::from(both || row_first);
        if both || !row_first {
            row.cells[i] = column.next();
            b += 1;
        }
        out.push(row);
    }
    out
}

/// Whether two entries are the same step of the work, whatever their values.
fn same(one: &Entry, other: &Entry) -> bool {
    let named = |a: &Value, b: &Value| a.name == b.name;
    let relation = |a: &Relation, b: &Relation| a.left == b.left && a.op == b.op && a.right == b.right;
    match (one, other) {
        (Entry::Given { value: a, words: x, .. }, Entry::Given { value: b, words: y, .. })
        | (Entry::Lookup { value: a, words: x, .. }, Entry::Lookup { value: b, words: y, .. })
        | (Entry::Found { value: a, words: x, .. }, Entry::Found { value: b, words: y, .. }) => {
            named(a, b) && x == y
        }
        (Entry::Step(a), Entry::Step(b)) => {
            named(&a.result, &b.result) && a.formula == b.formula && a.words == b.words
        }
        (Entry::Decide { relation: a, .. }, Entry::Decide { relation: b, .. })
        | (Entry::Require { relation: a, .. }, Entry::Require { relation: b, .. }) => relation(a, b),
        (Entry::Verify(a), Entry::Verify(b)) => {
            named(&a.demand, &b.demand) && named(&a.resistance, &b.resistance) && a.clause == b.clause
        }
        (a, b) => a == b,
    }
}
