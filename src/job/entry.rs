//! One entry of a table, read as what it should be. Every method records what is wrong and then
//! yields nothing; an entry that may be left out yields nothing without a word. Figures are read in
//! `figure`, dates in `date`.

use toml::de::DeValue;

use super::limits::{nearest, one_of};
use super::reader::{Fault, Reader, Span, Table};
use crate::building::Cause;
use crate::error::Kind;

/// An entry, present or not.
pub struct Entry<'a> {
    pub(super) reader: &'a Reader,
    pub(super) value: Option<(&'a DeValue<'a>, Span)>,
    /// What its table is called.
    pub(super) whose: String,
    pub(super) key: String,
    /// Where its table's head stands.
    pub(super) table: Span,
    /// What stands before its key in a head: `signatures` of `[signatures.made]`.
    pub(super) path: String,
    pub(super) needed: bool,
}

/// Longest text that a title block or a table cell holds, in characters.
pub(super) const LINE: usize = 120;
/// Longest free text, in characters.
pub(super) const PROSE: usize = 2000;

impl<'a> Entry<'a> {
    /// A text in one line.
    pub fn line(&self) -> Option<String> {
        self.written("a text in double quotes, one line", LINE)
    }

    /// A text of some sentences; line breaks in it count as spaces.
    pub fn text(&self) -> Option<String> {
        self.written("a text in double quotes", PROSE)
    }

    /// A mark or number that goes into a file name: letters, digits, `-` and `_`.
    pub fn mark(&self, longest: usize) -> Option<String> {
        let text = self.line()?;
        let allowed = format!("letters, digits, - and _, a letter or digit first, at most {longest} of them");
        let fits = text.chars().all(|c| c.is_ascii_alphanumeric() || c == '-' || c == '_');
        if fits && text.starts_with(|c: char| c.is_ascii_alphanumeric()) && text.len() <= longest {
            return Some(text);
        }
        self.fault(Kind::NotAllowed, format_args!("{} cannot be part of a file name", quoted(&text)))
            .at(self.place(), "not allowed here")
            .allowed(allowed)
            .help("leave out spaces, points and strokes");
        None
    }

    /// One of a few whole numbers.
    pub fn whole(&self, choices: &[u8]) -> Option<u8> {
        let words: Vec<String> = choices.iter().map(u8::to_string).collect();
        let allowed = one_of(&words);
        let DeValue::Integer(i) = self.present(&allowed)? else {
            self.wrong_type(&allowed, "write a whole number without quotes");
            return None;
        };
        let found = u8::from_str_radix(i.as_str(), i.radix()).ok().filter(|x| choices.contains(x));
        if found.is_none() {
            self.fault(Kind::NotAllowed, format_args!("`{}` is {}", self.key, self.shown()))
                .at(self.place(), "not one of the choices")
                .allowed(&allowed)
                .help(format!("write {allowed}"));
        }
        found
    }

    /// `true` or `false`.
    pub fn flag(&self) -> Option<bool> {
        match self.present("true or false")? {
            DeValue::Boolean(yes) => Some(*yes),
            _ => {
                self.wrong_type("true or false", "write true or false without quotes");
                None
            }
        }
    }

    /// One of `words`, turned into what it stands for.
    pub fn choice<T>(&self, words: &[&str], from_word: impl Fn(&str) -> Option<T>) -> Option<T> {
        let allowed = one_of(&words.iter().map(|w| format!("\"{w}\"")).collect::<Vec<_>>());
        let DeValue::String(text) = self.present(&allowed)? else {
            self.wrong_type(&allowed, "write one of these words in double quotes");
            return None;
        };
        let found = from_word(text);
        if found.is_none() {
            let help = match nearest(text, words.iter().copied()) {
                Some(near) => format!("write \"{near}\""),
                None => "write one of these words".to_owned(),
            };
            self.fault(Kind::NotAllowed, format_args!("`{}` is {}", self.key, quoted(text)))
                .at(self.place(), "not one of the choices")
                .allowed(&allowed)
                .help(help);
        }
        found
    }

    /// One of the words of a table of words.
    pub fn pick<T: Copy>(&self, table: &[(&str, T)]) -> Option<T> {
        let words: Vec<&str> = table.iter().map(|(word, _)| *word).collect();
        self.choice(&words, |word| table.iter().find(|(w, _)| *w == word).map(|(_, value)| *value))
    }

    /// A value that departs from a rule: `{ value = ..., reason = "..." }`.
    pub fn cause<T>(&self, read: impl FnOnce(&Entry<'a>) -> Option<T>) -> Option<Cause<T>> {
        let wanted = "{ value = ..., reason = \"...\" }";
        let DeValue::Table(map) = self.present(wanted)? else {
            self.fault(
                Kind::Missing,
                format_args!(
                    "`{}` is {}, which departs from the rule without a reason",
                    self.key,
                    self.shown()
                ),
            )
            .at(self.place(), "no reason")
            .allowed(wanted)
            .help(format!(
                "write {} = {{ value = {}, reason = \"...\" }}",
                self.key,
                self.source()
            ));
            return None;
        };
        let name = format!("{}, `{}`", self.whose, self.key);
        let table = Table::new(self.reader, name, map, self.place());
        let value = read(&table.need("value"));
        let reason = table.need("reason").text();
        table.finish();
        Some(Cause { value: value?, reason: reason? })
    }

    /// A table.
    pub fn table(&self, name: &str) -> Option<Table<'a>> {
        let head = self.head();
        match self.present(&format!("a table, [{head}]"))? {
            DeValue::Table(map) => {
                Some(Table::new(self.reader, name.to_owned(), map, self.place()).under(head))
            }
            _ => {
                self.wrong_type(
                    &format!("a table, [{head}]"),
                    &format!("write [{head}] on a line of its own"),
                );
                None
            }
        }
    }

    /// Tables under one head, `[[returns]]`, each called `what` and its mark.
    pub fn tables(&self, what: &str, mark: &str) -> Vec<Table<'a>> {
        let head = format!("[[{}]]", self.head());
        let number =
            if self.needed { "at least one table" } else { "any number of tables, each under its own" };
        let wanted = format!("{number} {head}");
        let Some(value) = self.present(&wanted) else { return Vec::new() };
        let items = match value {
            DeValue::Array(items) => items,
            DeValue::Table(_) => {
                self.fault(Kind::WrongType, format_args!("`{}` has single brackets", self.key))
                    .at(self.place(), "one table where a list of tables belongs")
                    .allowed(&wanted)
                    .help(format!("write {head} above each"));
                return Vec::new();
            }
            _ => {
                self.wrong_type(&wanted, &format!("write {head} above each"));
                return Vec::new();
            }
        };
        if self.needed && items.is_empty() {
            self.wrong_type(&wanted, &format!("add one {head}"));
        }
        let mut tables = Vec::new();
        for (i, item) in items.iter().enumerate() {
            let DeValue::Table(map) = item.get_ref() else {
                self.item(i, item).wrong_type(&wanted, &format!("write {head} above each"));
                continue;
            };
            let mut table = Table::new(self.reader, String::new(), map, item.span()).under(self.head());
            table.name = match table.peek(mark).map(str::trim).filter(|m| !m.is_empty()) {
                Some(mark) => format!("{what} {}", short(mark)),
                None => format!("{what} number {}", i + 1),
            };
            tables.push(table);
        }
        tables
    }

    /// Tables by name, `[materials."red brick"]`, in the order of the file.
    pub fn named(&self, what: &str) -> Vec<(String, Span, Table<'a>)> {
        let Some(parent) = self.table(&self.key) else { return Vec::new() };
        let mut tables = Vec::new();
        for (name, key_place, entry) in parent.entries() {
            if name.is_empty()
                || one_line(&name) != name
                || name.chars().any(hidden)
                || name.chars().count() > LINE
            {
                parent
                    .fault(Kind::NotAllowed, format_args!("{} is no name for a {what}", quoted(&name)))
                    .at(key_place.clone(), "name")
                    .allowed(format!("a text of 1 to {LINE} characters, blanks only between words"))
                    .help("give it the name that the survey notes use");
            }
            if let Some(table) = entry.table(&format!("{what} \"{}\"", short(&name))) {
                tables.push((name, key_place, table));
            }
        }
        tables
    }

    /// The items of a list.
    pub fn list(&self, wanted: &str) -> Option<Vec<Entry<'a>>> {
        match self.present(wanted)? {
            DeValue::Array(items) => Some(items.iter().enumerate().map(|(i, v)| self.item(i, v)).collect()),
            _ => {
                self.wrong_type(wanted, "write a list in square brackets");
                None
            }
        }
    }

    /// Where its value stands; its table's head where it is not there.
    pub fn place(&self) -> Span {
        self.value.as_ref().map_or_else(|| self.table.clone(), |(_, span)| span.clone())
    }

    /// Starts a diagnostic about this entry's table.
    pub fn fault(&self, kind: Kind, words: impl std::fmt::Display) -> Fault<'a> {
        self.reader.fault(kind, format!("{}: {words}", self.whose))
    }

    /// The value, or the record that it is missing.
    pub fn present(&self, wanted: &str) -> Option<&'a DeValue<'a>> {
        if let Some((value, _)) = &self.value {
            return Some(value);
        }
        if self.needed {
            self.fault(Kind::Missing, format_args!("`{}` is missing", self.key))
                .at(self.table.clone(), format!("has no `{}`", self.key))
                .allowed(wanted)
                .lacks(&self.key)
                .help(self.how_to_add(wanted));
        }
        None
    }

    /// Records that the value is of another kind than it should be.
    pub fn wrong_type(&self, wanted: &str, help: &str) {
        self.fault(Kind::WrongType, format_args!("`{}` is {}", self.key, self.shown()))
            .at(self.place(), "of the wrong kind")
            .allowed(wanted)
            .help(help);
    }

    fn how_to_add(&self, wanted: &str) -> String {
        let head = wanted.find('[').zip(wanted.rfind(']')).filter(|_| wanted.contains("table"));
        match head {
            Some((from, to)) => format!("add {} and what belongs under it", &wanted[from..=to]),
            None if wanted.starts_with("a date") => format!("add {} = 2026-10-14", self.key),
            None if wanted.contains("quotes") || wanted.contains("with its unit") => {
                format!("add {} = \"...\"", self.key)
            }
            None if wanted.starts_with('"') => format!("add {} = \"...\"", self.key),
            None => format!("add {} = ...", self.key),
        }
    }

    /// The head under which its own table stands.
    fn head(&self) -> String {
        let plain = |c: char| c.is_ascii_alphanumeric() || c == '_' || c == '-';
        let key = if self.key.chars().all(plain) { self.key.clone() } else { quoted(&self.key) };
        if self.path.is_empty() { key } else { format!("{}.{key}", self.path) }
    }

    fn item(&self, i: usize, value: &'a toml::Spanned<DeValue<'a>>) -> Entry<'a> {
        Entry {
            reader: self.reader,
            value: Some((value.get_ref(), value.span())),
            whose: self.whose.clone(),
            key: format!("{}, item {}", self.key, i + 1),
            table: self.table.clone(),
            path: self.path.clone(),
            needed: true,
        }
    }

    fn written(&self, wanted: &str, longest: usize) -> Option<String> {
        let DeValue::String(raw) = self.present(wanted)? else {
            self.wrong_type(wanted, "write it in double quotes");
            return None;
        };
        let text = one_line(raw);
        let wrong = if text.is_empty() {
            let help = if self.needed {
                "write what belongs here"
            } else {
                "write what belongs here, or take it out"
            };
            Some(("is empty".to_owned(), help))
        } else if text.chars().any(hidden) {
            Some(("has characters that cannot be seen".to_owned(), "type it again instead of pasting it"))
        } else if longest == LINE && raw.trim().contains('\n') {
            Some(("runs over two lines".to_owned(), "write it in one line"))
        } else if text.chars().count() > longest {
            let found = format!("is {} characters long", text.chars().count());
            Some((found, "shorten it: it would not fit its place on the page"))
        } else {
            None
        };
        let Some((found, help)) = wrong else { return Some(text) };
        self.fault(Kind::NotAllowed, format_args!("`{}` {found}", self.key))
            .at(self.place(), "this text")
            .allowed(format!("{wanted}, 1 to {longest} characters"))
            .help(help);
        None
    }

    /// The value as a message names it.
    pub(super) fn shown(&self) -> String {
        match self.value.as_ref().map(|(v, _)| *v) {
            None => "missing".to_owned(),
            Some(DeValue::String(s)) => format!("the text {}", quoted(s)),
            Some(DeValue::Integer(i)) => format!("the number {}", short(&i.to_string())),
            Some(DeValue::Float(x)) => format!("the number {}", short(x.as_str())),
            Some(DeValue::Boolean(b)) => b.to_string(),
            Some(DeValue::Datetime(d)) => format!("the date or time {d}"),
            Some(DeValue::Array(_)) => "a list".to_owned(),
            Some(DeValue::Table(_)) => "a table".to_owned(),
        }
    }

    /// The value as it would be typed again.
    pub(super) fn source(&self) -> String {
        match self.value.as_ref().map(|(v, _)| *v) {
            Some(DeValue::String(s)) => quoted(s),
            Some(DeValue::Integer(i)) => short(&i.to_string()),
            Some(DeValue::Float(x)) => short(x.as_str()),
            Some(DeValue::Boolean(b)) => b.to_string(),
            _ => "...".to_owned(),
        }
    }
}

/// Characters that a page cannot show or that turn the reading order.
fn hidden(c: char) -> bool {
    c.is_control()
        || matches!(c, '\u{200B}'..='\u{200F}' | '\u{202A}'..='\u{202E}' | '\u{2060}'..='\u{2069}' | '\u{FEFF}')
}

/// A text with single blanks for every run of blanks and line breaks.
pub fn one_line(text: &str) -> String {
    text.split_whitespace().collect::<Vec<_>>().join(" ")
}

/// A text in double quotes, short enough for a message.
pub fn quoted(text: &str) -> String {
    format!("\"{}\"", short(text))
}

pub fn short(text: &str) -> String {
    let mut out: String = text.chars().map(|c| if hidden(c) { '\u{FFFD}' } else { c }).take(60).collect();
    if text.chars().nth(60).is_some() {
        out.push('…');
    }
    out
}
