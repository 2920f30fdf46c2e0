//! Compiling the templates and writing the PDF.

use std::time::Instant;

use typst::diag::{SourceDiagnostic, Warned};
use typst::foundations::Smart;
use typst::{World as _, WorldExt};
use typst_layout::PagedDocument;
use typst_pdf::{PdfOptions, PdfStandard, PdfStandards};

use super::look::Look;
use super::world::{Kind, World};
use super::{PackError, Times, Typeset, audit, said};

/// How the typesetter begins its word that places were still moving when it gave up.
const UNSETTLED: &str = "document did not converge";

/// The sheets of a pack laid out, with the typesetter's warnings.
pub(super) fn compile(world: &World) -> Result<(PagedDocument, Vec<String>), PackError> {
    let Warned { output, warnings } = typst::compile::<PagedDocument>(world);
    let document = output.map_err(|errors| PackError::Template(lines(world, &errors)))?;
    if warnings.iter().any(|w| w.message.starts_with(UNSETTLED)) {
        return Err(PackError::Unsettled);
    }
    Ok((document, lines(world, &warnings)))
}

/// The PDF from JSON text: compile, then write.
pub(super) fn typeset(
    kind: Kind,
    json: Vec<u8>,
    files: &[(String, Vec<u8>)],
    ident: &str,
    look: Option<&Look>,
) -> Result<Typeset, PackError> {
    let start = Instant::now();
    let must = if look.is_some_and(Look::own_templates) { said::required(kind, &json) } else { Vec::new() };
    let world = World::new(kind, json, files, look);
    let fonts = start.elapsed();

    let start = Instant::now();
    let (document, mut warnings) = compile(&world)?;
    let compile = start.elapsed();
    said::all(&must, &document)?;
    // Our own sheets are looked over by tests; those in another face or by other templates here.
    if look.is_some_and(|h| h.own_templates() || !h.fonts.is_empty()) {
        warnings.extend(audit::told(&audit::audit(&document)));
    }

    let start = Instant::now();
    let pdf = typst_pdf::pdf(&document, &options(ident)?)
        .map_err(|errors| PackError::Export(lines(&world, &errors)))?;
    let export = start.elapsed();

    let times = Times { fonts, compile, export };
    Ok(Typeset { pdf, pages: document.pages().len(), warnings, times })
}

/// PDF/A-3a keeps the pack readable for decades and lets the job file travel inside it;
/// PDF/UA-1 makes it readable aloud. Both together cost a few milliseconds. No time stamp is
/// written: the document's date comes from the data.
fn options(ident: &str) -> Result<PdfOptions, PackError> {
    let standards = PdfStandards::new(&[PdfStandard::A_3a, PdfStandard::Ua_1])
        .map_err(|error| PackError::Export(vec![error.message().to_string()]))?;
    Ok(PdfOptions {
        ident: Smart::Custom(ident.to_owned()),
        creator: Smart::Custom(Some("Perpend".to_owned())),
        timestamp: None,
        standards,
        ..PdfOptions::default()
    })
}

/// Drops results of earlier packs that were not used in the last `age` packs. A process that
/// sets many packs calls this after each, with 2, or its memory grows by 20 MB a pack.
pub fn evict(age: usize) {
    comemo::evict(age);
}

/// Diagnostics as lines: where, what, and what might help.
fn lines(world: &World, diagnostics: &[SourceDiagnostic]) -> Vec<String> {
    diagnostics.iter().map(|item| line(world, item)).collect()
}

fn line(world: &World, item: &SourceDiagnostic) -> String {
    let mut text = item.message.to_string();
    let place = item.span.id().and_then(|id| {
        let start = world.range(item.span)?.start;
        let row = world.source(id).ok()?.lines().byte_to_line(start)? + 1;
        Some(format!("{}:{row}", id.get().vpath().get_without_slash()))
    });
    if let Some(place) = place {
        text = format!("{place}: {text}");
    }
    for hint in &item.hints {
        text.push_str(&format!(" ({})", hint.v));
    }
    text
}
