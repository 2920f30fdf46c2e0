//! The documents of one job: set, written beside their places, and what is said of them.

use std::io::Write as _;
use std::path::{Path, PathBuf};
use std::time::{Duration, Instant};

use super::flags::Only;
use super::{ADEQUATE, How, NOT_PLAINLY_ADEQUATE, complain};
use crate::archive::{self, Digests};
use crate::building::Building;
use crate::checks::Results;
use crate::checks::outcome::Outcome;
use crate::error::{Error, Trouble};
use crate::report::plain;
use crate::report::record::Record;
use crate::{Source, digest, draw_for, file_name, files, pack, set, summarise};

/// A pack that is set, and what is said of it.
#[derive(serde::Serialize, serde::Deserialize)]
pub(super) struct Made {
    pub(super) documents: Vec<Document>,
    /// The file name of its pack, whether it was set or not.
    pack: String,
    digests: Digests,
    /// The exit code it asks for.
    pub(super) code: u8,
    /// What its author should see.
    pub(super) remarks: Vec<String>,
    pub(super) times: String,
}

/// One PDF of it.
#[derive(serde::Serialize, serde::Deserialize)]
pub(super) struct Document {
    pub(super) file_name: String,
    /// What is said of it: pages and outcome.
    pub(super) said: String,
    /// Bytes of the PDF.
    pub(super) size: usize,
    #[serde(skip)]
    pub(super) pdf: Vec<u8>,
}

impl Document {
    fn new(file_name: String, said: String, pdf: Vec<u8>) -> Self {
        Self { file_name, said, size: pdf.len(), pdf }
    }
}

impl Made {
    /// Reads a job and sets it in this process.
    pub(super) fn here(file: &Path, (only, whose): How<'_>) -> Result<Self, Error> {
        let begin = Instant::now();
        let text = files::read(file)?;
        let house = whose.house(file)?;
        let (building, results) = draw_for(&files::name(file), &text, house.as_ref().map(|h| &h.practice))?;
        let from = Source { text: &text, folder: folder_of(file), house: house.as_ref() };
        Self::of(&from, (&building, &results), only, begin)
    }

    /// Sets a job that was checked and drawn since `begin`.
    pub(super) fn of(
        from: &Source<'_>,
        (building, results): (&Building, &Results),
        only: Option<Only>,
        begin: Instant,
    ) -> Result<Self, Error> {
        let (mut documents, mut remarks) = (Vec::new(), Vec::new());
        let mut setting = pack::Times::default();
        let name = file_name(building);
        if only != Some(Only::Summary) {
            let made = set(building, results, from)?;
            let said = format!("{} sheets: {}", made.pages, results.outcome.words());
            remarks.extend(made.warnings.iter().map(|w| format!("note: the pack: {w}")));
            setting += made.times;
            documents.push(Document::new(name.clone(), said, made.pdf));
        }
        if only != Some(Only::Pack) {
            let made = summarise(building, results, from)?;
            let pages = made.typeset.pages;
            let said = format!("{pages} {} for the client", if pages == 1 { "page" } else { "pages" });
            remarks.extend(made.typeset.warnings.iter().map(|w| format!("note: the summary: {w}")));
            remarks.extend(made.hard.iter().map(|(words, why)| hard(words, why)));
            setting += made.typeset.times;
            documents.push(Document::new(made.file_name, said, made.typeset.pdf));
        }
        remarks.extend(unlisted(building));
        let spent = Spent { all: begin.elapsed(), setting };
        Ok(Self {
            documents,
            pack: name,
            digests: Digests {
                job: digest(from.text),
                practice: building.practice.as_ref().map_or_else(String::new, |p| p.digest.clone()),
            },
            code: code(results.outcome),
            remarks,
            times: spent.to_string(),
        })
    }

    /// Writes each document beside its place, so that it only has to be moved there.
    pub(super) fn staged(
        mut self,
        file: &Path,
        into: Option<&Path>,
    ) -> Result<(Self, Vec<files::Staged>), Error> {
        let folder = into.or(file.parent()).unwrap_or(Path::new(""));
        let pack = folder.join(&self.pack);
        let set = self.documents.iter().find(|d| d.file_name == self.pack);
        if let Some(issued) = archive::issued_at(&pack, &self.digests, set.map(|d| d.pdf.as_slice())) {
            return Err(stays(&pack, &issued, &self.digests));
        }
        let one = |d: &mut Document| {
            let pdf = std::mem::take(&mut d.pdf);
            files::Staged::new(folder.join(&d.file_name), &pdf)
        };
        let staged = self.documents.iter_mut().map(one).collect::<Result<Vec<_>, Error>>()?;
        Ok((self, staged))
    }
}

/// Where a file lies.
pub(super) fn folder_of(file: &Path) -> &Path {
    file.parent().unwrap_or(Path::new(""))
}

/// An earlier issue of which no pack is named: nothing can be listed against it.
fn unlisted(b: &Building) -> Option<String> {
    let earlier = &b.revisions[..b.revisions.len().saturating_sub(1)];
    let last = earlier.last().filter(|_| earlier.iter().all(|r| r.pack.is_none()))?;
    Some(format!(
        "note: what changed since revision {letter} is not listed: name its pack, `pack = \"...\"`, with that issue under [[revisions]]",
        letter = last.letter
    ))
}

/// An issued pack is never overwritten, nor a signed one.
fn stays(path: &Path, issued: &Record, now: &Digests) -> Error {
    let why = match issued.job_digest == now.job {
        true if issued.practice_digest != now.practice => "the practice file is another",
        true => "this version of the program, or a photograph, makes another pack of the same job file",
        false => "the job file has changed since",
    };
    // A draft stays only where somebody has signed it.
    let what = if issued.issued { "as issued" } else { "as signed" };
    Error::File {
        path: files::name(path),
        trouble: Trouble::Content(format!(
            "it is revision {} {what}, {}, and {why}",
            issued.revision, issued.status
        )),
        help:
            "Add the next letter under [[revisions]]; `perpend compare` says what changed since this issue."
                .to_owned(),
    }
}

/// Moves what is written to its place. Yields where it stands.
pub(super) fn place(staged: Vec<files::Staged>) -> Result<Vec<PathBuf>, Error> {
    staged.into_iter().map(files::Staged::place).collect()
}

/// What the author of a job can do about a sentence that the client will find hard.
fn hard(words: &str, why: &plain::Hard) -> String {
    match why {
        plain::Hard::Long(n) => {
            format!("note: a sentence of the summary has {n} words, {} is plain: \"{words}\"", plain::WORDS)
        }
        plain::Hard::Sign(sign) => {
            format!(
                "note: a sentence of the summary has the sign {sign}, which the client may not know: \"{words}\""
            )
        }
        plain::Hard::Unit(unit) => {
            format!(
                "note: a sentence of the summary has the unit {unit}, which the client may not know: \"{words}\""
            )
        }
    }
}

/// The exit code of an outcome.
pub(super) fn code(outcome: Outcome) -> u8 {
    if outcome == Outcome::Adequate { ADEQUATE } else { NOT_PLAINLY_ADEQUATE }
}

/// Why a pack was not set.
pub(super) enum Stopped {
    /// An error of this process.
    Here(Error),
    /// What another process said, worded already.
    There(String),
}

impl From<Error> for Stopped {
    fn from(error: Error) -> Self {
        Self::Here(error)
    }
}

impl Stopped {
    pub(super) fn complain(&self) {
        match self {
            Self::Here(error) => complain(error),
            Self::There(words) => {
                let _ = writeln!(anstream::stderr(), "{}", words.trim_end());
            }
        }
    }
}

/// Where the time of one pack went.
struct Spent {
    all: Duration,
    setting: pack::Times,
}

impl std::fmt::Display for Spent {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        let pack::Times { fonts, compile, export } = self.setting;
        let ms = |d: Duration| d.as_secs_f64() * 1e3;
        let rest = self.all.saturating_sub(fonts + compile + export);
        write!(f, "job, checks, drawings, writing {:.1} ms; ", ms(rest))?;
        write!(f, "fonts {:.1} ms; layout {:.1} ms; PDF {:.1} ms", ms(fonts), ms(compile), ms(export))
    }
}
