//! A report as text: each diagnostic with its line, a caret, what is allowed and what to do.

use annotate_snippets::{AnnotationKind, Group, Level, Renderer, Snippet};

use super::report::{Diagnostic, Report};

impl Report {
    /// The report as text, with terminal colours where `colour` is set.
    pub fn render(&self, colour: bool) -> String {
        let renderer = if colour { Renderer::styled() } else { Renderer::plain() };
        let mut out = String::new();
        for d in &self.diagnostics {
            out.push_str(&renderer.render(&[self.group(d)]));
            out.push_str("\n\n");
        }
        out.push_str(&match self.diagnostics.len() {
            1 => format!("{}: one thing to put right\n", self.name),
            n => format!("{}: {n} things to put right\n", self.name),
        });
        out
    }

    fn group<'a>(&'a self, d: &'a Diagnostic) -> Group<'a> {
        let caret = AnnotationKind::Primary.span(d.span.clone()).label(d.label.as_str());
        let others = d
            .others
            .iter()
            .map(|place| AnnotationKind::Context.span(place.span.clone()).label(place.label.as_str()));
        let snippet =
            Snippet::source(self.text.as_str()).path(self.name.as_str()).annotation(caret).annotations(others);
        Level::ERROR
            .primary_title(d.message.as_str())
            .element(snippet)
            .element(Level::NOTE.with_name("allowed").message(d.allowed.as_str()))
            .element(Level::HELP.message(d.help.as_str()))
    }
}
