//! Everything that is wrong with a job file, as data.

use std::ops::Range;

/// What sort of mistake a diagnostic is about.
#[derive(Clone, Copy, Debug, PartialEq, Eq, serde::Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Kind {
    /// The text is not TOML.
    Syntax,
    /// Something that must be there is not.
    Missing,
    /// An entry that nobody reads.
    UnknownEntry,
    /// A number where a text belongs, and the like.
    WrongType,
    /// A quantity without a unit, with an unknown one, or with a unit of another dimension.
    Unit,
    /// A value outside its limits, or a word that is not one of the choices.
    NotAllowed,
    /// A name that nothing else in the file has.
    UnknownName,
    /// Two entries that cannot both be true.
    Contradiction,
}

/// A second place that a diagnostic is about.
#[derive(Clone, Debug, PartialEq)]
pub struct Place {
    /// Bytes of the job file.
    pub span: Range<usize>,
    /// What stands there.
    pub label: String,
}

/// One thing to put right.
#[derive(Clone, Debug, PartialEq)]
pub struct Diagnostic {
    /// What sort of mistake.
    pub kind: Kind,
    /// One sentence with what was found.
    pub message: String,
    /// Bytes of the job file, within one line once it stands in a [`Report`].
    pub span: Range<usize>,
    /// Words beside the caret.
    pub label: String,
    /// Other places it is about; a contradiction has at least one.
    pub others: Vec<Place>,
    /// What is allowed there.
    pub allowed: String,
    /// What to do.
    pub help: String,
}

/// Every diagnostic of one job file, in the order of the file.
#[derive(Clone, Debug)]
pub struct Report {
    pub(super) name: String,
    pub(super) text: String,
    pub(super) diagnostics: Vec<Diagnostic>,
}

/// A diagnostic for machines: places as line and column, both from 1.
#[derive(Clone, Debug, PartialEq, serde::Serialize)]
pub struct Record {
    /// Name of the job file.
    pub file: String,
    /// Line.
    pub line: usize,
    /// Column, in characters.
    pub column: usize,
    /// What sort of mistake.
    pub kind: Kind,
    /// What was found.
    pub message: String,
    /// What is allowed.
    pub allowed: String,
    /// What to do.
    pub help: String,
    /// Other places.
    pub others: Vec<Note>,
}

/// Another place of a [`Record`].
#[derive(Clone, Debug, PartialEq, serde::Serialize)]
pub struct Note {
    /// Line.
    pub line: usize,
    /// Column, in characters.
    pub column: usize,
    /// What stands there.
    pub label: String,
}

impl Report {
    /// A report on the file `name` with the given text. Every span is brought inside the text, onto
    /// whole characters and into one line, so that a caret can stand under it.
    pub fn new(name: &str, text: &str, mut diagnostics: Vec<Diagnostic>) -> Self {
        for d in &mut diagnostics {
            d.span = within_line(text, &d.span);
            for place in &mut d.others {
                place.span = within_line(text, &place.span);
            }
        }
        diagnostics.sort_by_key(|d| (d.span.start, d.span.end));
        diagnostics.dedup();
        Self { name: name.to_owned(), text: text.to_owned(), diagnostics }
    }

    /// The diagnostics, in the order of the file.
    pub fn diagnostics(&self) -> &[Diagnostic] {
        &self.diagnostics
    }

    /// The diagnostics with line and column, for machines.
    pub fn records(&self) -> Vec<Record> {
        self.diagnostics.iter().map(|d| self.record(d)).collect()
    }

    /// Line and column of a byte, both from 1, the column in characters.
    pub fn position(&self, byte: usize) -> (usize, usize) {
        let before = &self.text[..floor(&self.text, byte)];
        let line = before.matches('\n').count() + 1;
        let start = before.rfind('\n').map_or(0, |i| i + 1);
        (line, before[start..].chars().count() + 1)
    }

    fn record(&self, d: &Diagnostic) -> Record {
        let (line, column) = self.position(d.span.start);
        let others = d
            .others
            .iter()
            .map(|place| {
                let (line, column) = self.position(place.span.start);
                Note { line, column, label: place.label.clone() }
            })
            .collect();
        Record {
            file: self.name.clone(),
            line,
            column,
            kind: d.kind,
            message: d.message.clone(),
            allowed: d.allowed.clone(),
            help: d.help.clone(),
            others,
        }
    }
}

fn floor(text: &str, byte: usize) -> usize {
    let mut at = byte.min(text.len());
    while !text.is_char_boundary(at) {
        at -= 1;
    }
    at
}

/// A caret under a line break would stand under nothing, and a span over two lines would draw a
/// bracket round both: the first line's part of the span is kept.
fn within_line(text: &str, span: &Range<usize>) -> Range<usize> {
    let start = floor(text, span.start);
    let end = floor(text, span.end.max(start));
    let line_end = text[start..].find(['\n', '\r']).map_or(text.len(), |i| start + i);
    start..end.min(line_end)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn at(span: Range<usize>) -> Diagnostic {
        Diagnostic {
            kind: Kind::Syntax,
            message: "m".into(),
            span,
            label: String::new(),
            others: vec![Place { span: 0..1, label: "first".into() }],
            allowed: "a".into(),
            help: "h".into(),
        }
    }

    #[test]
    fn spans_are_brought_into_one_line_and_onto_characters() {
        let text = "é = 1\r\nb = 2\n";
        let report = Report::new("x.toml", text, vec![at(8..99), at(1..3), at(500..600)]);
        let spans: Vec<_> = report.diagnostics().iter().map(|d| d.span.clone()).collect();
        assert_eq!(spans, [0..3, 8..13, 14..14]);
    }

    #[test]
    fn records_count_lines_and_characters_from_one() {
        let report = Report::new("x.toml", "é = 1\nbé = 2\n", vec![at(10..11)]);
        let record = &report.records()[0];
        assert_eq!((record.line, record.column), (2, 3));
        assert_eq!((record.others[0].line, record.others[0].column), (1, 1));
        let json = serde_json::to_string(record).expect("records are plain data");
        assert!(json.contains(r#""kind":"syntax""#), "{json}");
    }
}
