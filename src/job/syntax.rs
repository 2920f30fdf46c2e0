//! Faults of the TOML itself, in the words of the job file.
//!
//! The parser goes on after a fault, so one slip may be reported twice on a line; the first is kept.

use toml::de::Error;

use super::reader::Reader;
use crate::error::Kind;

/// One sort of fault: how the parser's sentence begins, and what is said in its place.
struct Fault {
    said: &'static str,
    message: &'static str,
    allowed: &'static str,
    help: &'static str,
}

const fn fault(
    said: &'static str,
    message: &'static str,
    allowed: &'static str,
    help: &'static str,
) -> Fault {
    Fault { said, message, allowed, help }
}

const FAULTS: &[Fault] = &[
    fault(
        "string values must be quoted",
        "a value without quotes, or none at all",
        "a text, a quantity or a mark in double quotes; a number, a date, true or false without",
        "put a text or a quantity in double quotes, for example \"900 mm\"",
    ),
    fault(
        "duplicate key",
        "the same name twice",
        "each entry and each [table] once; a list of tables has [[double brackets]]",
        "take one of them out, or write [[double brackets]] where several belong",
    ),
    fault(
        "invalid basic string",
        "a text that does not end, or that has a character it may not have",
        "a text that ends with a double quote on its own line",
        "close the double quote",
    ),
    fault(
        "invalid date",
        "a date that does not exist",
        "a date, year-month-day",
        "check the year, month and day",
    ),
    fault("unclosed table", "a head without its bracket", "[name] or [[name]]", "close the bracket"),
    fault(
        "unclosed array",
        "a list without its bracket",
        "a list in square brackets, its items apart by commas",
        "close the square bracket",
    ),
    fault(
        "missing comma",
        "items without a comma between them",
        "items apart by commas",
        "put a comma between the items, and close the bracket behind the last",
    ),
    fault(
        "unclosed inline table",
        "a value without its curly bracket",
        "{ value = ..., reason = \"...\" }",
        "close the curly bracket",
    ),
    fault(
        "key with no value",
        "a name without a value",
        "name = value, a [table], or a remark behind a #",
        "write name = value",
    ),
    fault(
        "missing escaped value",
        "a backslash that means nothing",
        "a backslash only before \\ \" n t u",
        "write / in a path in place of \\",
    ),
    fault(
        "unexpected leading zero",
        "a number with a zero in front",
        "a number without zeros in front",
        "take the zero out, or put a text in quotes",
    ),
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
        let known = FAULTS.iter().find(|fault| error.message().starts_with(fault.said));
        let (message, allowed, help) = match known {
            Some(fault) => (fault.message, fault.allowed, fault.help),
            None => (
                error.message(),
                "name = value lines under [table] heads",
                "compare the line with the start job",
            ),
        };
        reader
            .fault(Kind::Syntax, format!("this is not TOML: {message}"))
            .at(span, "cannot be read from here")
            .allowed(allowed)
            .help(format!("{help}; the rest of the file is judged once its TOML can be read"));
    }
}
