//! A cursor over the tables of a job file that collects what is wrong instead of stopping.
//!
//! [`Reader`] keeps the diagnostics and warnings, [`Table`] knows which entries were asked for, so
//! that the rest can be named as unknown. One entry is read by `entry`.

use std::cell::RefCell;
use std::ops::Range;

use toml::de::{DeTable, DeValue};

use super::entry::Entry;
use super::limits::nearest;
use crate::error::{Diagnostic, Kind, Place};

/// Bytes of the job file.
pub type Span = Range<usize>;

/// What has been found so far.
#[derive(Default)]
pub struct Reader {
    found: RefCell<Vec<Diagnostic>>,
    missing: RefCell<Vec<Missing>>,
    warnings: RefCell<Vec<String>>,
    /// Which entries were asked for, by the address of their table: what the schema is held against.
    #[cfg(test)]
    pub asked: RefCell<Vec<(usize, &'static str)>>,
}

/// A required entry that is not there; withdrawn where an unknown entry turns out to be it.
struct Missing {
    table: Span,
    key: String,
    diagnostic: Diagnostic,
}

impl Reader {
    /// Starts a diagnostic; [`Fault::help`] records it.
    pub fn fault(&self, kind: Kind, message: impl Into<String>) -> Fault<'_> {
        let diagnostic = Diagnostic {
            kind,
            message: message.into(),
            span: 0..0,
            label: String::new(),
            others: Vec::new(),
            allowed: String::new(),
            help: String::new(),
        };
        Fault { reader: self, diagnostic, missing: None }
    }

    /// Records a value that is possible but odd.
    pub fn warn(&self, sentence: impl Into<String>) {
        self.warnings.borrow_mut().push(sentence.into());
    }

    /// Everything found: the diagnostics, and the warnings.
    pub fn into_parts(self) -> (Vec<Diagnostic>, Vec<String>) {
        let mut found = self.found.into_inner();
        found.extend(self.missing.into_inner().into_iter().map(|m| m.diagnostic));
        (found, self.warnings.into_inner())
    }
}

/// A diagnostic being written.
#[must_use = "a fault is recorded by `help`"]
pub struct Fault<'a> {
    reader: &'a Reader,
    diagnostic: Diagnostic,
    missing: Option<String>,
}

impl Fault<'_> {
    /// Where it is, and the words beside the caret.
    pub fn at(mut self, span: Span, label: impl Into<String>) -> Self {
        self.diagnostic.span = span;
        self.diagnostic.label = label.into();
        self
    }

    /// Another place it is about.
    pub fn and(mut self, span: Span, label: impl Into<String>) -> Self {
        self.diagnostic.others.push(Place { span, label: label.into() });
        self
    }

    /// What is allowed.
    pub fn allowed(mut self, words: impl Into<String>) -> Self {
        self.diagnostic.allowed = words.into();
        self
    }

    /// Marks it as the lack of `key` in the table at its span.
    pub fn lacks(mut self, key: &str) -> Self {
        self.missing = Some(key.to_owned());
        self
    }

    /// What to do; records the diagnostic.
    pub fn help(mut self, words: impl Into<String>) {
        self.diagnostic.help = words.into();
        match self.missing {
            Some(key) => {
                let table = self.diagnostic.span.clone();
                self.reader.missing.borrow_mut().push(Missing { table, key, diagnostic: self.diagnostic });
            }
            None => self.reader.found.borrow_mut().push(self.diagnostic),
        }
    }
}

/// One table of the job file.
pub struct Table<'a> {
    /// Where diagnostics go.
    pub reader: &'a Reader,
    /// What it is called in messages: `return R1`.
    pub name: String,
    span: Span,
    path: String,
    map: &'a DeTable<'a>,
    asked: RefCell<Vec<&'static str>>,
}

impl<'a> Table<'a> {
    /// A table that stands at `span`.
    pub fn new(reader: &'a Reader, name: String, map: &'a DeTable<'a>, span: Span) -> Self {
        Self { reader, name, span, path: String::new(), map, asked: RefCell::default() }
    }

    /// The same table, whose head is `[path]`.
    pub fn under(self, path: String) -> Self {
        Self { path, ..self }
    }

    /// The entry `key`, which must be there.
    pub fn need(&self, key: &'static str) -> Entry<'a> {
        Entry { needed: true, ..self.may(key) }
    }

    /// The entry `key`, which may be left out.
    pub fn may(&self, key: &'static str) -> Entry<'a> {
        self.ask(key);
        Entry {
            reader: self.reader,
            value: self.map.get(key).map(|v| (v.get_ref(), v.span())),
            whose: self.name.clone(),
            key: key.to_owned(),
            table: self.span.clone(),
            path: self.path.clone(),
            needed: false,
        }
    }

    /// Whether the entry `key` is there.
    pub fn has(&self, key: &'static str) -> bool {
        self.ask(key);
        self.map.contains_key(key)
    }

    /// Where the value of `key` stands; the table's head where it is not there.
    pub fn place(&self, key: &str) -> Span {
        self.map.get(key).map_or_else(|| self.span.clone(), |v| v.span())
    }

    /// Where the table's head stands.
    pub fn head(&self) -> Span {
        self.span.clone()
    }

    /// Records a warning about this table.
    pub fn warn(&self, words: impl std::fmt::Display) {
        self.reader.warn(format!("{}: {words}", self.name));
    }

    /// Starts a diagnostic about this table.
    pub fn fault(&self, kind: Kind, words: impl std::fmt::Display) -> Fault<'a> {
        self.reader.fault(kind, format!("{}: {words}", self.name))
    }

    /// Starts a contradiction between two of this table's entries.
    pub fn clash(&self, words: impl std::fmt::Display, one: &str, other: &str) -> Fault<'a> {
        self.fault(Kind::Contradiction, words)
            .at(self.place(one), format!("`{one}`"))
            .and(self.place(other), format!("`{other}`"))
    }

    /// Every entry with its key, in the order of the file, whatever it is called.
    pub fn entries(&self) -> Vec<(String, Span, Entry<'a>)> {
        let mut all: Vec<_> = self.map.iter().collect();
        all.sort_by_key(|(key, _)| key.span().start);
        all.into_iter()
            .map(|(key, value)| {
                let entry = Entry {
                    reader: self.reader,
                    value: Some((value.get_ref(), value.span())),
                    whose: self.name.clone(),
                    key: key.get_ref().to_string(),
                    table: self.span.clone(),
                    path: self.path.clone(),
                    needed: true,
                };
                (key.get_ref().to_string(), key.span(), entry)
            })
            .collect()
    }

    /// The text of `key` where it is one, for naming; nothing is recorded.
    pub fn peek(&self, key: &str) -> Option<&str> {
        self.map.get(key).and_then(|v| v.get_ref().as_str())
    }

    /// The text of `inner` in the table `key`, with its place; nothing is recorded.
    pub fn peek_under(&self, key: &str, inner: &str) -> Option<(String, Span)> {
        let value = self.map.get(key)?.get_ref().get(inner)?;
        Some((value.get_ref().as_str()?.to_owned(), value.span()))
    }

    /// The flag `key` where it is one; nothing is recorded.
    pub fn peek_flag(&self, key: &str) -> Option<bool> {
        self.map.get(key).and_then(|v| v.get_ref().as_bool())
    }

    /// Names every entry that nobody asked for.
    pub fn finish(&self) {
        let asked = self.asked.borrow();
        for (key, value) in self.map {
            if asked.iter().any(|a| a == key.get_ref()) {
                continue;
            }
            let near = nearest(key.get_ref(), asked.iter().copied());
            if let Some(near) = near {
                let mut missing = self.reader.missing.borrow_mut();
                missing.retain(|m| m.table != self.span || m.key != near);
            }
            let help = match near {
                Some(near) if !self.map.contains_key(near) => format!("write `{near}`"),
                Some(near) => format!("`{near}` is already there: take this one out"),
                None if matches!(value.get_ref(), DeValue::Table(_) | DeValue::Array(_)) => {
                    "take it out, or check which table it stands under".to_owned()
                }
                None => "take it out; a remark can stand behind a #".to_owned(),
            };
            self.fault(Kind::UnknownEntry, format_args!("nobody reads an entry `{}`", key.get_ref()))
                .at(key.span(), "unknown entry")
                .allowed(asked.join(", "))
                .help(help);
        }
    }

    fn ask(&self, key: &'static str) {
        #[cfg(test)]
        self.reader.asked.borrow_mut().push((std::ptr::from_ref(self.map).addr(), key));
        let mut asked = self.asked.borrow_mut();
        if !asked.contains(&key) {
            asked.push(key);
        }
    }
}
