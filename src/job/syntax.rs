//! Faults of the TOML itself, in the words of the job file.
//!
//! The parser goes on after a fault, so one slip may be reported twice on a line; the first is kept.

use toml::de::Error;

use super::reader::Reader;
use crate::error::Kind;

/// What the parser says, what is allowed there, and what to do.
const FAULTS: &[(&str, &str, &str)] = &[
    (
        "string values must be quoted",
        "a text, a quantity or a mark in double quotes; a number, a date, true or false without",
        "put a text or a quantity in double quotes, for example \"900 mm\"",
    ),
    (
        "duplicate key",
        "each entry and each [table] once; a list of tables has [[double brackets]]",
        "take one of them out, or write [[double brackets]] where several belong",
    ),
    ("invalid basic string", "a text that ends with a double quote on its own line", "close the double quote"),
    ("invalid date", "a date that exists, year-month-day", "check the year, month and day"),
    ("unclosed table", "[name] or [[name]]", "close the bracket"),
    ("unclosed array", "a list in square brackets, its items apart by commas", "close the square bracket"),
    (
        "missing comma",
        "items apart by commas",
        "put a comma between the items, and close the bracket behind the last",
    ),
    ("unclosed inline table", "{ value = ..., reason = \"...\" }", "close the curly bracket"),
    ("key with no value", "name = value, a [table], or a remark behind a #", "write name = value"),
    ("missing escaped value", "a backslash only as \\\\ or before \" n t", "write / in a path in place of \\"),
    ("unexpected leading zero", "a number without zeros in front", "take the zero out, or put a text in quotes"),
];

/// Records each fault of the TOML, the first of each line.
pub fn record(reader: &Reader, text: &str, errors: &[Error]) {
    let mut seen: Vec<usize> = Vec::new();
    let mut errors: Vec<&Error> = errors.iter().collect();
    errors.sort_by_key(|e| e.span().map_or(text.len(), |s| s.start));
    for error in errors {
        let span = error.span().unwrap_or(text.len()..text.len());
        let line = text.bytes().take(span.start).filter(|b| *b == b'\n').count();
        if seen.contains(&line) {
            continue;
        }
        seen.push(line);
        let (_, allowed, help) = FAULTS
            .iter()
            .find(|(said, ..)| error.message().starts_with(said))
            .copied()
            .unwrap_or(("", "TOML: name = value lines under [table] heads", "compare the line with the start job"));
        reader
            .fault(Kind::Syntax, format!("this is not TOML: {}", error.message()))
            .at(span, "cannot be read from here")
            .allowed(allowed)
            .help(format!("{help}; the rest of the file is judged once its TOML can be read"));
    }
}
