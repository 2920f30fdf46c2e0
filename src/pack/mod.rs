//! The calculation pack: data in, a typeset PDF out.
//!
//! | part | what it holds |
//! |---|---|
//! | [`data`] | the data file that the templates read, field by field |
//! | `world` | templates, fonts and data as the files of a closed world |
//! | `pdf` | compiling the templates and writing the PDF |
//! | [`audit`] | looking over the finished sheets for overlaps, overflow and missing signs |
//! | `ink` | what a finished sheet prints and where |
//! | [`look`] | how the packs of a practice look, and whether its files can be used |
//! | `said` | what must stand on the pages whatever templates set them |
//!
//! The templates in `templates/` hold no engineering: every number arrives as text, formulas
//! arrive as trees, drawings as positions in millimetres on paper. Nothing here reads a disk,
//! a clock or a network, so the same data gives the same bytes anywhere.

pub mod audit;
pub mod data;
mod ink;
pub mod look;
mod pdf;
pub mod photograph;
mod said;
mod world;

use std::fmt;
use std::time::Duration;

use serde::Serialize;

pub use audit::{Finding, Flaw};
pub use look::Look;
pub use pdf::evict;
use world::Kind;

/// A typeset pack.
#[derive(Debug, Clone)]
pub struct Typeset {
    /// The PDF file, PDF/A-3a and PDF/UA-1.
    pub pdf: Vec<u8>,
    /// The number of sheets.
    pub pages: usize,
    /// What the typesetter complained of; empty for a sound pack.
    pub warnings: Vec<String>,
    /// Where the time went.
    pub times: Times,
}

/// The time each stage of typesetting took.
#[derive(Debug, Clone, Copy, Default, PartialEq, Eq)]
pub struct Times {
    /// Turning the data into JSON and opening the world: fonts, templates, library.
    pub fonts: Duration,
    /// Laying out the sheets.
    pub compile: Duration,
    /// Writing the PDF.
    pub export: Duration,
}

impl std::ops::AddAssign for Times {
    fn add_assign(&mut self, more: Self) {
        self.fonts += more.fonts;
        self.compile += more.compile;
        self.export += more.export;
    }
}

/// Why a pack could not be typeset.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum PackError {
    /// The data does not turn into JSON.
    Data(String),
    /// A template stopped: a missing field, an unknown node, a missing photograph.
    Template(Vec<String>),
    /// The PDF could not be written: a sign that no embedded face has, mostly.
    Export(Vec<String>),
    /// Templates of a practice leave out what every pack must say.
    Unsaid(Vec<String>),
    /// A template moves what it asks the place of, so that the numbers of sheets printed in the pack may be wrong.
    Unsettled,
}

impl fmt::Display for PackError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let (what, lines) = match self {
            Self::Data(line) => ("the pack's data cannot be written", std::slice::from_ref(line)),
            Self::Template(lines) => ("the pack cannot be set", lines.as_slice()),
            Self::Export(lines) => ("the PDF cannot be written", lines.as_slice()),
            Self::Unsaid(lines) => ("the templates leave out what every pack must say", lines.as_slice()),
            Self::Unsettled => {
                return f.write_str(
                    "the sheets do not come to rest: a template moves what it asks the place of, and sheet numbers \
                     printed elsewhere would be wrong",
                );
            }
        };
        write!(f, "{what}: {}", lines.join("; "))
    }
}

impl std::error::Error for PackError {}

/// The PDF of a pack from its data.
///
/// `look` is the practice in whose style it is set. `data` serialises to the fields of [`data::Pack`]. `files` are the photographs, each with
/// the path by which the data names it (`/photo/0.jpg`). `ident` fixes the file's identifier:
/// give the digest of the job file, so that the same job gives the same bytes.
///
/// # Errors
/// [`PackError`] where the data does not serialise, a template stops, a sign has no glyph, sheets do not come to rest,
/// or templates of the practice leave out what must be said.
pub fn typeset(
    data: impl Serialize,
    files: &[(String, Vec<u8>)],
    ident: &str,
    look: Option<&Look>,
) -> Result<Typeset, PackError> {
    let json = serde_json::to_vec(&data).map_err(|error| PackError::Data(error.to_string()))?;
    // Its trees are as large as the sheets to come: while those are set, only the text is kept.
    drop(data);
    pdf::typeset(Kind::Pack, json, files, ident, look)
}

/// The PDF of a summary for the client; otherwise as [`typeset`].
///
/// # Errors
/// As [`typeset`].
pub fn typeset_client(data: &data::Client, ident: &str, look: Option<&Look>) -> Result<Typeset, PackError> {
    let json = serde_json::to_vec(data).map_err(|error| PackError::Data(error.to_string()))?;
    pdf::typeset(Kind::Client, json, &[], ident, look)
}

/// The flaws of a summary's pages, as [`inspect`].
///
/// # Errors
/// As [`typeset`].
pub fn inspect_client(data: &data::Client, look: Option<&Look>) -> Result<Vec<Finding>, PackError> {
    let json = serde_json::to_vec(data).map_err(|error| PackError::Data(error.to_string()))?;
    let (document, _) = pdf::compile(&world::World::new(Kind::Client, json, &[], look))?;
    Ok(audit::audit(&document))
}

/// The PDF of a pack from its data as JSON text; otherwise as [`typeset`].
///
/// # Errors
/// As [`typeset`].
pub fn typeset_json(json: &str, files: &[(String, Vec<u8>)], ident: &str) -> Result<Typeset, PackError> {
    pdf::typeset(Kind::Pack, json.as_bytes().to_vec(), files, ident, None)
}

/// The flaws of the finished sheets: text over text, text over the margins, missing signs.
///
/// Takes what [`typeset`] takes; meant for tests and for templates of a practice.
///
/// # Errors
/// As [`typeset`].
pub fn inspect(
    data: &impl Serialize,
    files: &[(String, Vec<u8>)],
    look: Option<&Look>,
) -> Result<Vec<Finding>, PackError> {
    let json = serde_json::to_vec(data).map_err(|error| PackError::Data(error.to_string()))?;
    let world = world::World::new(Kind::Pack, json, files, look);
    let (document, _) = pdf::compile(&world)?;
    Ok(audit::audit(&document))
}

#[cfg(test)]
mod tests;
