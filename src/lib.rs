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
//! this order: `error files quantity solve trace standards building wind job sketch checks pack house report archive many cli`.
#![recursion_limit = "512"]
#![allow(non_snake_case, reason = "symbols are written as the standards write them: N_Ed, gamma_M")]

pub mod archive;
pub mod building;
pub mod checks;
pub mod cli;
pub mod error;
pub mod files;
pub mod house;
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

use archive::{Held, Rechecked};
use building::{Building, Practice, Revision};
use checks::Results;
use error::{Error, Trouble};
pub use files::digest;
use house::House;
use pack::{PackError, Typeset, photograph};

/// The building of a job file and what its checks found, without drawings. `name` is the file's name for diagnostics.
///
/// # Errors
/// [`Error::Job`] with every diagnostic of the file; [`Error::Internal`] where a sheet would print
/// something that it did not compute.
pub fn check(name: &str, text: &str) -> Result<(Building, Results), Error> {
    check_for(name, text, None)
}

/// As [`check`], for a practice that has factors or padstones of its own.
///
/// # Errors
/// As [`check`].
pub fn check_for(name: &str, text: &str, practice: Option<&Practice>) -> Result<(Building, Results), Error> {
    work(name, text, practice, checks::results)
}

/// As [`check`], with the drawings of every sheet.
///
/// # Errors
/// As [`check`].
pub fn draw(name: &str, text: &str) -> Result<(Building, Results), Error> {
    draw_for(name, text, None)
}

/// As [`check_for`], with the drawings of every sheet.
///
/// # Errors
/// As [`check`].
pub fn draw_for(name: &str, text: &str, practice: Option<&Practice>) -> Result<(Building, Results), Error> {
    work(name, text, practice, checks::run)
}

fn work(
    name: &str,
    text: &str,
    practice: Option<&Practice>,
    run: fn(&Building) -> Results,
) -> Result<(Building, Results), Error> {
    let building = checks::whole::complete(job::read_for(name, text, practice)?);
    let results = run(&building);
    if let Some((sheet, fault)) = results.faults().next() {
        return Err(Error::Internal { step: format!("sheet {sheet}: {}: {}", fault.step, fault.what) });
    }
    Ok((building, results))
}

/// What a pack is set from besides its checks.
#[derive(Clone, Copy)]
pub struct Source<'a> {
    /// The job file.
    pub text: &'a str,
    /// Where it lies: photographs are looked for there.
    pub folder: &'a Path,
    /// In whose style; the practice must be the one for which the job was checked.
    pub house: Option<&'a House>,
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
/// As [`check`], where the attached job file, or the practice file beside it, cannot be used.
pub fn recheck(name: &str, held: Held) -> Result<Rechecked, Error> {
    let practice = held
        .practice
        .as_ref()
        .map(|text| job::practice::read(&format!("{name}, {}", archive::PRACTICE), text));
    let practice = practice.transpose()?;
    let (building, results) = draw_for(&format!("{name}, {}", archive::JOB), &held.job, practice.as_ref())?;
    let now = report::record::of_job(&building, &results, &digest(&held.job));
    Ok(Rechecked::new(held.record, now))
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

/// Sets the summary for the client of a job that was checked.
///
/// # Errors
/// [`Error::Internal`] where it cannot be set; [`Error::File`] where that is for templates of the practice.
pub fn summarise(building: &Building, results: &Results, from: &Source<'_>) -> Result<Summarised, Error> {
    let digest = digest(from.text);
    let data = report::client::of_job(building, results, &digest);
    let words = data.parts.iter().flat_map(|p| p.lines.iter().chain(&p.steps));
    let hard = words.flat_map(|line| report::plain::hard(line)).collect();
    let typeset = pack::typeset_client(&data, &format!("{digest}-summary"), from.house.map(|h| &h.look))
        .map_err(|why| unset(&why, from.house))?;
    Ok(Summarised { typeset, file_name: named(building, "Summary"), hard })
}

/// Checks a job file and sets its pack. Photographs are looked for beside the job file, in `folder`.
///
/// # Errors
/// As [`check`]; [`Error::File`] for a photograph that cannot be used; [`Error::Internal`] where the
/// pack cannot be set.
pub fn sheet(name: &str, text: &str, folder: &Path) -> Result<Sheeted, Error> {
    let (building, results) = draw(name, text)?;
    let typeset = set(&building, &results, &Source { text, folder, house: None })?;
    let file_name = file_name(&building);
    Ok(Sheeted { building, results, typeset, file_name })
}

/// Sets the pack of a job that was checked and drawn.
///
/// # Errors
/// As [`sheet`], where photographs or the pack are at fault; [`Error::File`] for templates of the practice.
pub fn set(building: &Building, results: &Results, from: &Source<'_>) -> Result<Typeset, Error> {
    let digest = digest(from.text);
    let mut data = report::pack(building, results, from.text, &digest);
    if let Some((revision, held)) = earlier(building, from.folder)? {
        let now = report::record::of_job(building, results, &digest);
        let practice = building.practice.as_ref().map_or("", |p| p.text.as_str());
        archive::since::mark(&mut data, revision, &held, &now, practice);
    }
    let files = photographs(building, from.folder)?;
    pack::typeset(data, &files, &digest, from.house.map(|h| &h.look)).map_err(|why| unset(&why, from.house))
}

/// The latest issue before the current one whose pack is at hand, with what travels inside it.
fn earlier<'b>(b: &'b Building, folder: &Path) -> Result<Option<(&'b Revision, Held)>, Error> {
    let before = b.revisions.len().saturating_sub(1);
    let named = b.revisions[..before].iter().rev().find_map(|r| Some((r, folder.join(r.pack.as_ref()?))));
    let Some((revision, path)) = named else { return Ok(None) };
    let unfit = |what: String, help: &str| Error::File {
        path: files::name(&path),
        trouble: Trouble::Content(what),
        help: help.to_owned(),
    };
    let held = archive::held(files::read_pack(&path)?).map_err(|why| unfit(why.to_string(), why.help()))?;
    let (number, letter) = (&held.record.number, &held.record.revision);
    if *number != b.identity.number || *letter != revision.letter {
        return Err(unfit(
            format!("it is the pack of job {number}, revision {letter}"),
            "Under [[revisions]] name the pack of this job with that letter, or take `pack` out.",
        ));
    }
    Ok(Some((revision, held)))
}

/// Templates of a practice are its own; everything else that goes wrong in setting is the program's fault.
fn unset(why: &PackError, house: Option<&House>) -> Error {
    match house.filter(|h| h.look.own_templates()) {
        Some(house) => Error::File {
            path: house.practice.templates.clone().unwrap_or_default(),
            trouble: Trouble::Content(why.to_string()),
            help: "Mend the templates of the practice, or take `templates` out of its file: the pack is then set by ours."
                .to_owned(),
        },
        None => Error::Internal { step: why.to_string() },
    }
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
