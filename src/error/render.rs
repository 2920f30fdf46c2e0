//! A report as text: each diagnostic with its line, a caret, what is allowed and what to do.

use std::ops::Range;

use annotate_snippets::{AnnotationKind, Group, Level, Renderer, Snippet};

use super::report::{Diagnostic, Report};

/// Faults of the TOML itself that are shown where there is nothing else.
const SYNTAX_SHOWN: usize = 10;

impl Report {
    /// The report as text, with terminal colours where `colour` is set.
    pub fn render(&self, colour: bool) -> String {
        let renderer = if colour { Renderer::styled() } else { Renderer::plain() };
        let mut out = String::new();
        // A file that is no TOML at all has a fault on every line: the first of them say it.
        let many = self.diagnostics.len() > SYNTAX_SHOWN
            && self.diagnostics.iter().all(|d| d.kind == super::Kind::Syntax);
        let shown = if many { SYNTAX_SHOWN } else { self.diagnostics.len() };
        for d in &self.diagnostics[..shown] {
            out.push_str(&renderer.render(&[self.group(d)]));
            out.push_str("\n\n");
        }
        if many {
            out.push_str(&format!(
                "and {} more of the kind: is this a job file?\n",
                self.diagnostics.len() - shown
            ));
        }
        out.push_str(&match self.diagnostics.len() {
            1 => format!("{}: one thing to put right\n", self.name),
            n => format!("{}: {n} things to put right\n", self.name),
        });
        out
    }

    fn group<'a>(&'a self, d: &'a Diagnostic) -> Group<'a> {
        let lines = self.lines(d);
        let moved = |span: &Range<usize>| span.start - lines.start..span.end - lines.start;
        let caret = AnnotationKind::Primary.span(moved(&d.span)).label(d.label.as_str());
        let others = d
            .others
            .iter()
            .map(|place| AnnotationKind::Context.span(moved(&place.span)).label(place.label.as_str()));
        let snippet = Snippet::source(&self.text[lines.clone()])
            .line_start(self.position(lines.start).0)
            .path(self.name.as_str())
            .annotation(caret)
            .annotations(others);
        Level::ERROR
            .primary_title(d.message.as_str())
            .element(snippet)
            .element(Level::NOTE.with_name("allowed").message(d.allowed.as_str()))
            .element(Level::HELP.message(d.help.as_str()))
    }

    /// The whole lines that a diagnostic is about: a long file with many faults is not laid out anew
    /// for each of them.
    fn lines(&self, d: &Diagnostic) -> Range<usize> {
        let spans = || std::iter::once(&d.span).chain(d.others.iter().map(|place| &place.span));
        let first = spans().map(|s| s.start).min().unwrap_or(0);
        let last = spans().map(|s| s.end).max().unwrap_or(0);
        let start = self.text[..first].rfind('\n').map_or(0, |i| i + 1);
        let end = self.text[last..].find('\n').map_or(self.text.len(), |i| last + i + 1);
        start..end
    }
}
