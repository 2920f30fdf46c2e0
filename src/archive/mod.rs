//! Packs that were made before: read back, worked again, held against each other.
//!
//! * [`pdf`]: the files that travel inside a pack
//! * [`compare`]: what changed between two records or two job files
//! * [`entries`]: lines of a job file named by their tables
//! * [`since`]: the same on the sheets of a new issue
//! * [`sign`]: packs signed with an engineer's own key, and the signatures of a pack
//!
//! A pack carries its job file and a [`Record`] of all that it prints. Working the job again and comparing the two
//! records tells whether every figure still stands. What is read are the attached files: whether the paper says the same
//! is told by the digest at the foot of its sheets, and whether anybody changed the file by a signature.

pub mod compare;
pub mod entries;
pub mod pdf;
pub mod sign;
pub mod since;

use std::fmt;
use std::path::Path;

use crate::report::PROGRAM;
use crate::report::record::{FORMAT, Record};
use compare::Differences;

/// The job file inside a pack.
pub const JOB: &str = "job.toml";
/// The practice file inside a pack.
pub const PRACTICE: &str = "practice.toml";
/// The record inside a pack.
pub const RECORD: &str = "results.json";

/// What travels inside a pack.
#[derive(Clone, Debug)]
pub struct Held {
    /// The job file.
    pub job: String,
    /// The practice file, where the pack was made by one.
    pub practice: Option<String>,
    /// What was printed.
    pub record: Record,
}

/// Why a file is no pack that can be worked again. The words are whole sentences.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Unfit {
    /// It does not read as a PDF.
    Broken,
    /// It is a PDF without the attached file of that name.
    Without(&'static str),
    /// An attached file is there, but is not what this program writes; what is wrong with it.
    Foreign(String),
    /// A later form of the record: which, and the version of the program that wrote it.
    Later(u32, String),
}

impl fmt::Display for Unfit {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::Broken => f.write_str("it does not read as a PDF, or not to its end"),
            Self::Without(file) => write!(f, "it is a PDF, but no file {file} is attached to it"),
            Self::Foreign(what) => write!(f, "its attached files are not those of a pack: {what}"),
            Self::Later(form, version) => write!(
                f,
                "its record has form {form}, written by {} {version}; this is version {}, which knows form {FORMAT}",
                PROGRAM.0, PROGRAM.1
            ),
        }
    }
}

impl Unfit {
    /// What to do about it.
    pub const fn help(&self) -> &'static str {
        match self {
            Self::Broken => "Take a whole copy of the pack, as `perpend sheet` wrote it.",
            Self::Without(_) | Self::Foreign(_) => {
                "Name a pack that `perpend sheet` wrote and no other program saved again, which may drop attached files."
            }
            Self::Later(..) => "Use the version that made the pack, or a later one.",
        }
    }
}

/// A pack worked again.
#[derive(Clone, Debug)]
pub struct Rechecked {
    /// What the pack carries.
    pub was: Record,
    /// What the same job file yields now.
    pub now: Record,
    /// Whether the job file is the one from which the pack was made, by its digest.
    pub same_job: bool,
    /// Whether the practice file is, or there was and is none.
    pub same_practice: bool,
    /// What changed.
    pub differences: Differences,
}

impl Rechecked {
    /// What a pack carries held against what the files inside it yield now.
    pub fn new(was: Record, now: Record) -> Self {
        let differences = compare::records(&was, &now);
        let same_job = now.job_digest == was.job_digest;
        let same_practice = now.practice_digest == was.practice_digest;
        Self { same_job, same_practice, was, now, differences }
    }

    /// Whether every printed figure stands.
    pub fn stands(&self) -> bool {
        self.same_job && self.same_practice && self.differences.is_empty()
    }
}

/// The digests of a job file and of the practice file by which it was worked; the second is empty where there is none.
#[derive(Clone, Debug, PartialEq, Eq, serde::Serialize, serde::Deserialize)]
#[allow(missing_docs, reason = "the fields are their names")]
pub struct Digests {
    pub job: String,
    pub practice: String,
}

/// The issued or signed pack at `path` that is not the one about to be written: it must stay. `pdf` is the new pack; where only the
/// summary is written there is none, and job, practice and program must be the same.
pub fn issued_at(path: &Path, digests: &Digests, pdf: Option<&[u8]>) -> Option<Record> {
    let bytes = std::fs::read(path).ok()?;
    if pdf == Some(bytes.as_slice()) {
        return None;
    }
    let signed = !sign::signatures(&bytes).is_empty();
    let record = held(bytes).ok()?.record;
    let alike = record.job_digest == digests.job && record.practice_digest == digests.practice;
    let same = pdf.is_none() && alike && record.version == PROGRAM.1;
    ((record.issued || signed) && !same).then_some(record)
}

/// What travels inside a pack, `bytes` its file.
///
/// # Errors
/// [`Unfit`] where the file is no pack of this program, or of a later version.
pub fn held(bytes: Vec<u8>) -> Result<Held, Unfit> {
    let mut files = pdf::attached(bytes).ok_or(Unfit::Broken)?;
    let mut may = |name: &'static str| {
        let at = files.iter().position(|(n, _)| n == name)?;
        let text = String::from_utf8(files.swap_remove(at).1);
        Some(text.map_err(|_| Unfit::Foreign(format!("{name} is not UTF-8 text"))))
    };
    let practice = may(PRACTICE).transpose()?;
    let mut take = |name: &'static str| may(name).unwrap_or(Err(Unfit::Without(name)));
    let (job, text) = (take(JOB)?, take(RECORD)?);
    // The form first: a later one may not read as a whole.
    let json: serde_json::Value =
        serde_json::from_str(&text).map_err(|why| Unfit::Foreign(format!("{RECORD} is not JSON ({why})")))?;
    let word = |key: &str| json.get(key).and_then(serde_json::Value::as_str).unwrap_or_default().to_owned();
    if word("program") != PROGRAM.0 {
        return Err(Unfit::Foreign(format!("{RECORD} is not of {}", PROGRAM.0)));
    }
    match json.get("format").and_then(serde_json::Value::as_u64) {
        Some(form) if form > u64::from(FORMAT) => {
            return Err(Unfit::Later(u32::try_from(form).unwrap_or(u32::MAX), word("version")));
        }
        Some(1) => {}
        _ => return Err(Unfit::Foreign(format!("{RECORD} has no known form"))),
    }
    let record = serde_json::from_value(json).map_err(|why| Unfit::Foreign(format!("{RECORD}: {why}")))?;
    Ok(Held { job, practice, record })
}
