//! The data file that the templates read: plain text, trees and drawings, no quantity left to
//! work out. Field names here are the names in `/data.json`.
//!
//! Blocks of a sheet and drawings come from other modules and only have to serialise; they
//! are held as ready JSON.

use serde::Serialize;
use serde_json::Value;

/// A piece of ready JSON: a sheet's block, or a formula's tree.
pub type Ready = Value;

/// Ready JSON from anything that serialises.
///
/// # Errors
/// [`super::PackError::Data`] where the value has no JSON form.
pub fn ready(value: &impl Serialize) -> Result<Ready, super::PackError> {
    serde_json::to_value(value).map_err(|error| super::PackError::Data(error.to_string()))
}

/// Everything a summary for the client prints.
#[derive(Debug, Clone, Serialize)]
pub struct Client {
    /// The program that made it.
    pub program: Program,
    /// The first 16 hexadecimal digits of the job file's SHA-256, in groups of four.
    pub digest: String,
    /// Number of the job.
    pub number: String,
    /// Title of the job.
    pub title: String,
    /// Address lines.
    pub address: Vec<String>,
    /// Whom it is for.
    pub client: String,
    /// Who made the calculations.
    pub author: String,
    /// When, in words.
    pub date: String,
    /// Letter of the revision.
    pub revision: String,
    /// The words on every page.
    pub unsigned_text: String,
    /// Whether nothing stands in the way but a signature and its acceptance.
    pub may_start: bool,
    /// The outcome in one or two sentences.
    pub headline: String,
    /// Its parts in order.
    pub parts: Vec<Part>,
}

/// A part of a summary.
#[derive(Debug, Clone, Serialize)]
pub struct Part {
    /// Its title.
    pub title: String,
    /// Paragraphs.
    pub lines: Vec<String>,
    /// Items of a list, below.
    pub steps: Vec<String>,
    /// Whether the items come in turn.
    pub numbered: bool,
    /// A drawing, below.
    pub drawing: Option<Ready>,
}

/// Everything a pack prints.
#[derive(Debug, Clone, Serialize)]
pub struct Pack {
    /// The program that made the pack.
    pub program: Program,
    /// The first 16 hexadecimal digits of the job file's SHA-256, in groups of four.
    pub digest: String,
    /// The whole digest.
    pub digest_full: String,
    /// What the job file says of the job.
    pub job: Job,
    /// Who made the pack.
    pub made: Made,
    /// Who checked it, or the words that say that nobody else did.
    pub checked: Checked,
    /// Whether the file carries a signature.
    pub signed: bool,
    /// The words on every sheet while it does not.
    pub unsigned_text: String,
    /// Revisions, oldest first.
    pub revisions: Vec<Revision>,
    /// What changed since an earlier issue, where its pack is at hand.
    pub changes: Option<Changes>,
    /// What the pack finds.
    pub outcome: FrontOutcome,
    /// The design summary of the front sheet.
    pub summary: Vec<Summary>,
    /// The register of assumptions.
    pub assumptions: Vec<Assumption>,
    /// The hold points.
    pub holds: Vec<Hold>,
    /// Every result of the pack.
    pub schedule: Vec<Scheduled>,
    /// What the reader must see first.
    pub warnings: Vec<String>,
    /// The load path to the ground.
    pub chain: Vec<Link>,
    /// The sections with their working.
    pub sections: Vec<Section>,
    /// Limits and cautions, short sentences.
    pub cautions: Vec<String>,
    /// Photographs; their files are handed to [`super::typeset`].
    pub photographs: Vec<Photograph>,
    /// The whole job file, to be attached.
    pub inputs: String,
    /// The practice that makes the pack, where it has a file.
    pub practice: Option<Practice>,
    /// What the pack prints, as JSON: it travels inside the PDF.
    pub record: String,
    /// The lines of the job file that say something, with their numbers.
    pub listing: Vec<(usize, String)>,
    /// The symbols of the pack.
    pub notation: Vec<Notation>,
}

/// The program's name and version.
#[derive(Debug, Clone, Serialize)]
#[allow(missing_docs, reason = "the fields are their names")]
pub struct Program {
    pub name: String,
    pub version: String,
}

/// The job's own lines.
#[derive(Debug, Clone, Serialize)]
pub struct Job {
    /// Job number, first on every sheet.
    pub number: String,
    /// Title, on every sheet beside the number: one line, 70 letters or so.
    pub title: String,
    /// Address, line by line.
    pub address: Vec<String>,
    /// For whom.
    pub client: String,
    /// To whom it is submitted.
    pub authority: String,
    /// What it is issued for: "for building control".
    pub status: String,
    /// The day of the visit, or "not visited".
    pub visited: String,
    /// The letter of the revision.
    pub revision: String,
}

/// The person who made the pack.
#[derive(Debug, Clone, Serialize)]
pub struct Made {
    /// Name.
    pub name: String,
    /// Initials.
    pub letters: String,
    /// Qualification, as the person states it.
    pub qualification: String,
    /// "20 October 2026": also the date of the PDF, where it reads so.
    pub date: String,
}

/// The person who checked the pack; an empty name prints `text` instead.
#[derive(Debug, Clone, Serialize)]
pub struct Checked {
    /// "self-checked, no second person".
    pub text: String,
    /// Name, or empty.
    pub name: String,
    /// Initials, or empty.
    pub letters: String,
    /// Date, or empty.
    pub date: String,
}

/// What a pack prints of its practice besides its name.
#[derive(Debug, Clone, Serialize)]
pub struct Practice {
    /// The practice file, to be attached.
    pub text: String,
    /// Its SHA-256.
    pub digest: String,
    /// Its standing notes.
    pub notes: Vec<String>,
}

/// A revision of the pack.
#[derive(Debug, Clone, Serialize)]
#[allow(missing_docs, reason = "the fields are their names")]
pub struct Revision {
    pub letter: String,
    pub date: String,
    pub note: String,
}

/// What changed since an earlier issue.
#[derive(Debug, Clone, Serialize)]
pub struct Changes {
    /// Letter of that issue.
    pub since: String,
    /// Its date in words.
    pub date: String,
    /// Lines of the job file.
    pub inputs: Vec<Change>,
    /// Lines of the practice file.
    pub practice: Vec<Change>,
    /// Outcome, results and hold points.
    pub results: Vec<Change>,
    /// Sheets whose working changed: the section's id where it still stands, its title, and how many lines.
    pub sheets: Vec<(String, String, usize)>,
}

/// One thing that changed; an empty text was or is not there.
#[derive(Debug, Clone, Serialize)]
#[allow(missing_docs, reason = "the fields are their names")]
pub struct Change {
    pub what: String,
    pub was: String,
    pub now: String,
}

/// The four outcomes; anything but adequate is set with weight and a heavy rule.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum OutcomeKind {
    /// Every check passes and nothing is open.
    Adequate,
    /// Every check passes once the hold points are closed.
    Conditional,
    /// A check does not pass.
    NotAdequate,
    /// A clause's range was left.
    Outside,
}

/// The outcome on the front sheet.
#[derive(Debug, Clone, Serialize)]
pub struct FrontOutcome {
    /// Which of the four.
    pub kind: OutcomeKind,
    /// The outcome in its fixed words.
    pub words: String,
    /// One plain sentence.
    pub sentence: String,
}

/// The outcome of a section.
#[derive(Debug, Clone, Serialize)]
pub struct SectionOutcome {
    /// Which of the four.
    pub kind: OutcomeKind,
    /// The outcome in its fixed words.
    pub words: String,
}

/// A titled entry of the design summary.
#[derive(Debug, Clone, Serialize)]
#[allow(missing_docs, reason = "the fields are their names")]
pub struct Summary {
    pub title: String,
    pub lines: Vec<String>,
}

/// An assumption with its source.
#[derive(Debug, Clone, Serialize)]
#[allow(missing_docs, reason = "the fields are their names")]
pub struct Assumption {
    pub mark: String,
    pub text: String,
    pub source: String,
}

/// A hold point.
#[derive(Debug, Clone, Serialize)]
pub struct Hold {
    /// "H1".
    pub mark: String,
    /// "Before the wall comes down, ...".
    pub text: String,
    /// Who closed it and when; empty while it is open.
    pub closed: String,
    /// The marks of the parts that wait for it.
    #[serde(rename = "for")]
    pub waiting: Vec<String>,
}

/// A line of the results schedule. Amounts carry their units.
#[derive(Debug, Clone, Serialize)]
pub struct Scheduled {
    /// The part.
    pub mark: String,
    /// The check in words.
    pub check: String,
    /// Demand with its unit, or empty.
    pub demand: String,
    /// Resistance with its unit, or empty.
    pub resistance: String,
    /// The ratio, two decimals rounded up, or empty.
    pub ratio: String,
    /// The ratio for the scale, not above 2.
    pub bar: f64,
    /// The verdict in its fixed words.
    pub verdict: String,
    /// The block where it is worked out, or empty.
    pub anchor: String,
    /// Whether it changed since the issue that [`Changes`] names.
    pub changed: bool,
}

/// A link of the load path.
#[derive(Debug, Clone, Serialize)]
pub struct Link {
    /// The link: "floor edge".
    pub link: String,
    /// "calculated", "by rule", "seen" or "assumed".
    pub proof: String,
    /// Where, by whom, on what.
    pub words: String,
}

/// A section of the pack.
#[derive(Debug, Clone, Serialize)]
pub struct Section {
    /// Letters, digits and '-'.
    pub id: String,
    /// The title.
    pub title: String,
    /// The part's mark, or empty.
    pub mark: String,
    /// What the section finds, where it finds anything.
    pub outcome: Option<SectionOutcome>,
    /// The blocks in the order of the working.
    pub blocks: Vec<Ready>,
    /// Whether it opens a sheet.
    pub new_page: bool,
    /// Whether its working changed since the issue that [`Changes`] names.
    pub changed: bool,
    /// Numbers of the photographs on which its part is seen.
    pub seen: Vec<usize>,
}

/// A photograph.
#[derive(Debug, Clone, Serialize)]
pub struct Photograph {
    /// "/photo/0.jpg": the number only, so that paths do not vary between packs.
    pub path: String,
    /// What it shows.
    pub caption: String,
    /// The part that it shows, or empty.
    pub mark: String,
    /// What its marks show, in words; empty where it has none.
    pub words: String,
    /// What is read aloud: the caption, and what its marks show.
    pub alt: String,
    /// What is pointed at in it.
    pub marks: Vec<Pointed>,
}

/// A part pointed at in a photograph.
#[derive(Debug, Clone, Serialize)]
pub struct Pointed {
    /// Its mark.
    pub of: String,
    /// From the left, as a part of the width.
    pub x: f64,
    /// From the top, as a part of the height.
    pub y: f64,
    /// The id of the section of that part, or empty.
    pub sheet: String,
}

/// A symbol explained.
#[derive(Debug, Clone, Serialize)]
pub struct Notation {
    /// The symbol's tree.
    pub symbol: Ready,
    /// What it stands for.
    pub words: String,
}
