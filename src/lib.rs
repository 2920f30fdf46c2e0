//! Perpend: calculation packs for masonry that stays when a load-bearing wall comes out.
//!
//! A job file becomes a building, the building is checked on sheets, the sheets and their drawings
//! become a pack:
//!
//! ```text
//! job (TOML) -> building -> checks + trace -> sketches -> pack (typst) -> PDF
//! ```
//!
//! [`check`] goes as far as the results, [`sheet`] to the PDF. Modules use only modules above them in
//! this order: `error quantity solve trace standards building wind job sketch checks pack report archive files many cli`.
#![recursion_limit = "512"]
#![allow(non_snake_case, reason = "symbols are written as the standards write them: N_Ed, gamma_M")]

pub mod archive;
pub mod building;
pub mod checks;
pub mod cli;
pub mod error;
pub mod files;
pub mod job;
pub mod many;
pub mod pack;
pub mod quantity;
pub mod report;
pub mod sketch;
pub mod solve;
pub mod standards;
pub mod trace;
pub mod wind;

use std::path::Path;

use sha2::{Digest, Sha256};

use archive::{Held, Rechecked};
use building::Building;
use checks::Results;
use error::{Error, Trouble};
use pack::{Typeset, photograph};

/// The building of a job file and what its checks found, without drawings. `name` is the file's name for diagnostics.
///
/// # Errors
/// [`Error::Job`] with every diagnostic of the file; [`Error::Internal`] where a sheet would print
/// something that it did not compute.
pub fn check(name: &str, text: &str) -> Result<(Building, Results), Error> {
    work(name, text, checks::results)
}

/// As [`check`], with the drawings of every sheet.
///
/// # Errors
/// As [`check`].
pub fn draw(name: &str, text: &str) -> Result<(Building, Results), Error> {
    work(name, text, checks::run)
}

fn work(name: &str, text: &str, run: fn(&Building) -> Results) -> Result<(Building, Results), Error> {
    let building = checks::whole::complete(job::read(name, text)?);
    let results = run(&building);
    if let Some((sheet, fault)) = results.faults().next() {
        return Err(Error::Internal { step: format!("sheet {sheet}: {}: {}", fault.step, fault.what) });
    }
    Ok((building, results))
}

/// A job file carried through to its pack.
pub struct Sheeted {
    /// The building.
    pub building: Building,
    /// What its checks found.
    pub results: Results,
    /// The PDF.
    pub typeset: Typeset,
    /// The file name that the pack wants.
    pub file_name: String,
}

/// Works the job inside a pack again and holds the outcome against what the pack prints.
///
/// # Errors
/// As [`check`], where the attached job file cannot be used.
pub fn recheck(name: &str, held: Held) -> Result<Rechecked, Error> {
    let (building, results) = draw(name, &held.job)?;
    let digest = digest(&held.job);
    let now = report::record::of_job(&building, &results, &digest);
    Ok(Rechecked::new(held.record, now, &digest))
}

/// A summary for the client.
pub struct Summarised {
    /// The PDF.
    pub typeset: Typeset,
    /// The file name that it wants.
    pub file_name: String,
    /// Sentences that are hard to read, with why.
    pub hard: Vec<(String, report::plain::Hard)>,
}

/// Sets the summary for the client of a job that was checked; `text` is its job file.
///
/// # Errors
/// [`Error::Internal`] where it cannot be set.
pub fn summarise(building: &Building, results: &Results, text: &str) -> Result<Summarised, Error> {
    let digest = digest(text);
    let data = report::client::of_job(building, results, &digest);
    let words = data.parts.iter().flat_map(|p| p.lines.iter().chain(&p.steps));
    let hard = words.flat_map(|line| report::plain::hard(line)).collect();
    let typeset = pack::typeset_client(&data, &format!("{digest}-summary"))
        .map_err(|e| Error::Internal { step: e.to_string() })?;
    Ok(Summarised { typeset, file_name: named(building, "Summary"), hard })
}

/// Checks a job file and sets its pack. Photographs are looked for beside the job file, in `folder`.
///
/// # Errors
/// As [`check`]; [`Error::File`] for a photograph that cannot be used; [`Error::Internal`] where the
/// pack cannot be set.
pub fn sheet(name: &str, text: &str, folder: &Path) -> Result<Sheeted, Error> {
    let (building, results) = draw(name, text)?;
    let typeset = set(&building, &results, text, folder)?;
    let file_name = file_name(&building);
    Ok(Sheeted { building, results, typeset, file_name })
}

/// Sets the pack of a job that was checked and drawn; `text` is its job file.
///
/// # Errors
/// As [`sheet`], where photographs or the pack are at fault.
pub fn set(building: &Building, results: &Results, text: &str, folder: &Path) -> Result<Typeset, Error> {
    let digest = digest(text);
    let data = report::pack(building, results, text, &digest);
    let files = photographs(building, folder)?;
    pack::typeset(data, &files, &digest).map_err(|e| Error::Internal { step: e.to_string() })
}

/// The photographs of a job, each with the name by which its pack calls it, turned upright and scaled to print.
/// `folder` is where the job file lies.
///
/// # Errors
/// [`Error`] where a file cannot be read or is no picture.
pub fn photographs(building: &Building, folder: &Path) -> Result<Vec<(String, Vec<u8>)>, Error> {
    let taken_in = |(n, p): (usize, &building::Photograph)| {
        let path = folder.join(&p.file);
        let shown = path.display().to_string();
        let bytes = std::fs::read(&path).map_err(|why| Error::File {
            path: shown.clone(),
            trouble: Trouble::Read(why),
            help: "Photographs are looked for beside the job file: check the name under [[photographs]]."
                .to_owned(),
        })?;
        let jpeg = photograph::take_in(&bytes).map_err(|why| Error::File {
            path: shown,
            trouble: Trouble::Content(why.to_string()),
            help: "Give a JPEG or PNG that an image viewer opens, of 80 megapixels or less.".to_owned(),
        })?;
        Ok((report::photographs::path(n), jpeg))
    };
    building.photographs.iter().enumerate().map(taken_in).collect()
}

/// SHA-256 of a job file's text, in hexadecimal.
pub fn digest(text: &str) -> String {
    Sha256::digest(text.as_bytes()).iter().map(|b| format!("{b:02x}")).collect()
}

/// `2419 Calculations (A).pdf`: letters, digits, space, - _ ( ) and one full stop only.
pub fn file_name(b: &Building) -> String {
    named(b, "Calculations")
}

fn named(b: &Building, what: &str) -> String {
    let letter = b.revisions.last().map_or("-", |r| r.letter.as_str());
    let clean = |text: &str| -> String {
        text.chars().map(|c| if c.is_ascii_alphanumeric() || "-_".contains(c) { c } else { '-' }).collect()
    };
    format!("{} {what} ({}).pdf", clean(&b.identity.number), clean(letter))
}
