//! Names that one part of the file gives and another refers to.

use std::collections::HashMap;

use super::entry::{Entry, one_line, quoted};
use super::limits::{nearest, one_of};
use super::reader::{Reader, Span, Table};
use crate::error::Kind;

/// Something read, beside the table that it was read from.
pub struct Seen<'a, T> {
    /// Its mark or name as typed.
    pub name: String,
    /// Where the name stands.
    pub place: Span,
    /// Its table.
    pub table: Table<'a>,
    /// What was read; nothing where the table has faults.
    pub item: Option<T>,
}

/// Things of one sort, by name.
pub struct Names<'a, T> {
    what: &'static str,
    seen: Vec<Seen<'a, T>>,
    /// The first of each name.
    by_name: HashMap<String, usize>,
    /// The same without regard to case.
    by_lower: HashMap<String, usize>,
}

impl<'a, T> Names<'a, T> {
    /// No things yet; `what` is the singular.
    pub fn new(what: &'static str) -> Self {
        Self { what, seen: Vec::new(), by_name: HashMap::new(), by_lower: HashMap::new() }
    }

    /// Reads tables that carry a `mark`, and records marks that stand twice.
    pub fn marked(
        what: &'static str,
        tables: Vec<Table<'a>>,
        mut read: impl FnMut(&Table<'a>) -> Option<T>,
    ) -> Self {
        let mut names = Self::new(what);
        for table in tables {
            let item = read(&table);
            table.finish();
            let name = table.peek("mark").map(one_line).filter(|m| !m.is_empty());
            let Some(name) = name else { continue };
            let place = table.place("mark");
            names.refuse_twice(table.reader, &name, &place);
            names.push(Seen { name, place, table, item });
        }
        names
    }

    /// Adds a thing.
    pub fn push(&mut self, seen: Seen<'a, T>) {
        let n = self.seen.len();
        self.by_name.entry(seen.name.clone()).or_insert(n);
        self.by_lower.entry(seen.name.to_lowercase()).or_insert(n);
        self.seen.push(seen);
    }

    /// Records `name` as a second use of a name that is already here; case does not tell marks apart.
    pub fn refuse_twice(&self, reader: &Reader, name: &str, place: &Span) {
        let Some(first) = self.by_lower.get(&name.to_lowercase()).map(|n| &self.seen[*n]) else {
            return;
        };
        reader
            .fault(Kind::Contradiction, format!("two things have the mark {}", quoted(name)))
            .at(place.clone(), "here again")
            .and(first.place.clone(), format!("a {}", self.what))
            .allowed("each mark once; case does not tell marks apart")
            .help("give one of them another mark");
    }

    /// Everything, in the order of the file.
    pub fn iter(&self) -> impl Iterator<Item = &Seen<'a, T>> {
        self.seen.iter()
    }

    /// Whether there is none.
    pub fn is_empty(&self) -> bool {
        self.seen.is_empty()
    }

    /// The thing of that name.
    pub fn get(&self, name: &str) -> Option<&Seen<'a, T>> {
        self.by_name.get(name).map(|n| &self.seen[*n])
    }

    /// What was read of the thing of that name.
    pub fn item(&self, name: &str) -> Option<&T> {
        self.get(name).and_then(|s| s.item.as_ref())
    }

    /// The name that an entry refers to; one that is not here is recorded with the nearest.
    pub fn refer(&self, entry: &Entry<'a>) -> Option<String> {
        let name = entry.line()?;
        (self.by_name.contains_key(&name) || known(entry, &name, self.what, &self.list())).then_some(name)
    }

    /// The names.
    pub fn list(&self) -> Vec<&str> {
        self.seen.iter().map(|s| s.name.as_str()).collect()
    }

    /// What was read, where all of it could be.
    pub fn into_items(self) -> Option<Vec<T>> {
        self.seen.into_iter().map(|s| s.item).collect()
    }
}

/// Whether `name` is one of `names`; otherwise records it with the nearest spelling.
pub fn known(entry: &Entry<'_>, name: &str, what: &str, names: &[&str]) -> bool {
    if names.contains(&name) {
        return true;
    }
    let quoted_names: Vec<String> = names.iter().map(|n| quoted(n)).collect();
    let allowed = match names {
        [] => format!("the name of a {what}, but this file has none"),
        _ => format!("a {what} of this file: {}", one_of(&quoted_names)),
    };
    let help = match nearest(name, names.iter().copied()) {
        Some(near) => format!("write {}", quoted(near)),
        None => format!("add the {what}, or name one that is there"),
    };
    entry
        .fault(Kind::UnknownName, format_args!("there is no {what} {}", quoted(name)))
        .at(entry.place(), "not in this file")
        .allowed(allowed)
        .help(help);
    false
}
