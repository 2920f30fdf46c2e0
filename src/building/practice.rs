//! The practice that makes the packs: who it is, how its pages look, what it puts in every pack.

use super::parts::Basis;
use super::things::Padstone;
use crate::quantity::Length;
use crate::quantity::colour::Colour;

/// A practice as its file describes it. Paths are relative to that file.
#[derive(Clone, Debug)]
pub struct Practice {
    /// Name, as on its letters.
    pub name: String,
    /// Address, line by line; may be empty.
    pub address: Vec<String>,
    /// How a client reaches it.
    pub contact: Option<String>,
    /// Sentences that stand with the limits of every pack.
    pub notes: Vec<String>,
    /// Colour of headings.
    pub accent: Option<Colour>,
    /// Its mark.
    pub logo: Option<Logo>,
    /// Family of the running text, in the folder `fonts`.
    pub face: Option<String>,
    /// Folder of faces.
    pub fonts: Option<String>,
    /// Folder of templates that take the place of ours.
    pub templates: Option<String>,
    /// Padstones that it keeps, for jobs that give none.
    pub padstones: Vec<Padstone>,
    /// Factors for jobs that do not state them; `None` where it has none of its own.
    pub basis: Option<Basis>,
    /// The file itself, as it travels inside the packs.
    pub text: String,
    /// SHA-256 of the file, in hexadecimal.
    pub digest: String,
    /// Possible but odd values, as sentences.
    pub warnings: Vec<String>,
}

/// A practice's mark.
#[derive(Clone, Debug, PartialEq)]
pub struct Logo {
    /// File, SVG or PNG.
    pub file: String,
    /// What it shows, read aloud.
    pub words: String,
    /// Height on a first page.
    pub height: Length,
}
