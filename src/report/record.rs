//! What a pack prints, as data: it travels inside the PDF, and a later run is held against it.

use serde::{Deserialize, Serialize};

use super::{PROGRAM, schedule};
use crate::building::Building;
use crate::checks::Results;
use crate::trace::text;

/// The form of a record; a later form that older programs cannot read has a higher number.
pub const FORMAT: u32 = 1;

/// What a pack prints.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Record {
    /// Name of the program that made it.
    pub program: String,
    /// Its version.
    pub version: String,
    /// Form of this record, [`FORMAT`].
    pub format: u32,
    /// SHA-256 of the job file, in hexadecimal.
    pub job_digest: String,
    /// SHA-256 of the practice file; empty where there is none.
    #[serde(default, skip_serializing_if = "String::is_empty")]
    pub practice_digest: String,
    /// Number of the job.
    pub number: String,
    /// Title of the job.
    pub title: String,
    /// Letter of the revision; empty where there is none.
    pub revision: String,
    /// What it is issued for: `for building control`.
    pub status: String,
    /// Whether it went out with that status: then nothing may stand in its place.
    pub issued: bool,
    /// The outcome of the whole job in words.
    pub outcome: String,
    /// The results schedule.
    pub results: Vec<Row>,
    /// Hold points.
    pub hold_points: Vec<Hold>,
    /// Every sheet, line by line.
    pub sheets: Vec<Sheet>,
}

/// One line of the results schedule, as printed.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Row {
    /// Which result it is, the same from run to run.
    pub id: String,
    /// Mark of the thing checked; may be empty.
    pub mark: String,
    /// The check in words.
    pub check: String,
    /// What is asked, with its unit; empty where there is no number.
    pub demand: String,
    /// What is there, with its unit.
    pub resistance: String,
    /// The use.
    pub ratio: String,
    /// The verdict in words.
    pub verdict: String,
}

/// A hold point, as printed.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Hold {
    /// Its mark.
    pub mark: String,
    /// What must be done or seen.
    pub text: String,
    /// How it was closed; empty while it is open.
    pub closed: String,
}

/// A sheet as text.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Sheet {
    /// Which sheet it is, the same from run to run.
    pub id: String,
    /// Its title.
    pub title: String,
    /// Its working, line by line.
    pub lines: Vec<String>,
}

/// The record of a job that was checked and drawn; `digest` is the SHA-256 of its file.
pub fn of_job(b: &Building, results: &Results, digest: &str) -> Record {
    let row = |s: super::data::Scheduled| Row {
        id: s.anchor,
        mark: s.mark,
        check: s.check,
        demand: s.demand,
        resistance: s.resistance,
        ratio: s.ratio,
        verdict: s.verdict,
    };
    let sheet = |s: &crate::checks::Section| Sheet {
        id: s.id.clone(),
        title: s.title.clone(),
        lines: text::sheet(&s.sheet).lines().filter(|l| !l.trim().is_empty()).map(str::to_owned).collect(),
    };
    Record {
        program: PROGRAM.0.to_owned(),
        version: PROGRAM.1.to_owned(),
        format: FORMAT,
        job_digest: digest.to_owned(),
        practice_digest: b.practice.as_ref().map_or(String::new(), |p| p.digest.clone()),
        number: b.identity.number.clone(),
        title: b.identity.title.clone(),
        revision: b.revisions.last().map_or(String::new(), |r| r.letter.clone()),
        status: b.identity.status.word().to_owned(),
        issued: b.identity.status.issued(),
        outcome: results.outcome.words(),
        results: results.sections.iter().flat_map(schedule).map(row).collect(),
        hold_points: results
            .holds
            .iter()
            .map(|h| Hold {
                mark: h.mark.clone(),
                text: h.text.clone(),
                closed: h.closed.clone().unwrap_or_default(),
            })
            .collect(),
        sheets: results.sections.iter().map(sheet).collect(),
    }
}
