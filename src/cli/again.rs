//! Packs made before: `recheck` and `compare`.

use std::io::Write as _;
use std::path::{Path, PathBuf};

use super::flags::Whose;
use super::{ADEQUATE, FAILED, NOT_PLAINLY_ADEQUATE, complain, internal};
use crate::archive::compare::{self, Altered, Change, Differences};
use crate::archive::sign::{Signature, signatures};
use crate::archive::{Held, Rechecked, entries, held};
use crate::error::{Error, Trouble};
use crate::report::record::{self, Record};
use crate::{digest, draw_for, files, many, recheck};

/// Works the jobs inside packs again. Yields the exit code.
pub fn recheck_all(paths: &[PathBuf], working: bool) -> u8 {
    let mut worst = ADEQUATE;
    let work = |file: &PathBuf| {
        let bytes = files::read_pack(file)?;
        let signed = signatures(&bytes);
        let found = recheck(&files::name(file), inside(file, bytes)?)?;
        Ok((found, signed))
    };
    let take = |file: &PathBuf, result| match internal::<(Rechecked, Vec<Signature>)>(result) {
        Ok((found, signed)) => {
            let holds = found.stands() && signed.iter().all(Signature::holds);
            worst = worst.max(if holds { ADEQUATE } else { NOT_PLAINLY_ADEQUATE });
            print(&told(file, &found, &signed, working));
        }
        Err(e) => {
            worst = FAILED;
            complain(&e);
        }
    };
    many::in_order(paths, work, take, || {});
    worst
}

/// The files inside a pack.
fn pack(file: &Path) -> Result<Held, Error> {
    inside(file, files::read_pack(file)?)
}

fn inside(file: &Path, bytes: Vec<u8>) -> Result<Held, Error> {
    held(bytes).map_err(|unfit| Error::File {
        path: files::name(file),
        trouble: Trouble::Content(unfit.to_string()),
        help: unfit.help().to_owned(),
    })
}

fn told(file: &Path, found: &Rechecked, signed: &[Signature], working: bool) -> Vec<String> {
    let (was, now) = (&found.was, &found.now);
    let verdict = match (found.stands(), signed.iter().all(Signature::holds)) {
        (true, true) => "every printed result stands",
        (true, false) => "every printed result stands, and a signature does NOT",
        (false, _) => "NOT everything stands",
    };
    let mut out = vec![
        format!("{}: {verdict}", files::name(file)),
        format!(
            "  made by {} {}, worked again by {} {}: {}",
            was.program, was.version, now.program, now.version, now.outcome
        ),
    ];
    match found.same_job {
        true => out.push(format!(
            "  job file {}, which the foot of every sheet must show",
            grouped(&was.job_digest)
        )),
        false => out.push(format!(
            "  The job file inside is not the one from which the pack was made: its digest is {}, the pack says {}.",
            grouped(&now.job_digest),
            grouped(&was.job_digest)
        )),
    }
    if !found.same_practice {
        out.push(
            "  The practice file inside is not the one by which the pack was made, or one of the two is missing."
                .to_owned(),
        );
    }
    out.extend(signed.iter().map(|s| format!("  {}", s.words())));
    out.push(match signed.is_empty() {
        true => "  no digital signature".to_owned(),
        false => "  Whether a certificate is to be trusted is for your PDF program to say.".to_owned(),
    });
    out.extend(differences(&found.differences, working));
    out
}

/// Four groups of four digits, as at the foot of the sheets.
fn grouped(digest: &str) -> String {
    crate::report::grouped(&digest.chars().take(16).collect::<String>())
}

/// Two job files or packs held against each other.
struct Side {
    job: String,
    practice: String,
    record: Record,
}

/// Says what changed from one job file or pack to another. Yields the exit code.
pub fn compare_two((old, new): (&Path, &Path), working: bool, whose: &Whose) -> u8 {
    let paths = [old.to_owned(), new.to_owned()];
    let mut sides: Vec<Side> = Vec::new();
    let take = |_: &PathBuf, result| match internal::<Side>(result) {
        Ok(side) => sides.push(side),
        Err(e) => complain(&e),
    };
    many::in_order(&paths, |file: &PathBuf| side(file, whose), take, || {});
    let [was, now] = sides.as_slice() else { return FAILED };
    let inputs = entries::changed(&was.job, &now.job);
    let house = entries::practice(&was.practice, &now.practice);
    let changed = compare::records(&was.record, &now.record);
    if inputs.is_empty() && house.is_empty() && changed.is_empty() {
        print(&["alike: the same job, the same results".to_owned()]);
        return ADEQUATE;
    }
    let mut out = Vec::new();
    out.push(match inputs.len() {
        0 => "Inputs: the same".to_owned(),
        n => format!("Inputs: {n} {} of the job file", lines_word(n)),
    });
    out.extend(inputs.iter().flat_map(one));
    if !house.is_empty() {
        out.push("Practice file".to_owned());
        out.extend(house.iter().flat_map(one));
    }
    out.push(if changed.is_empty() { "Results: the same" } else { "Results" }.to_owned());
    out.extend(differences(&changed, working));
    print(&out);
    NOT_PLAINLY_ADEQUATE
}

fn side(file: &Path, whose: &Whose) -> Result<Side, Error> {
    if files::is_pdf(file) {
        let Held { job, practice, record } = pack(file)?;
        return Ok(Side { job, practice: practice.unwrap_or_default(), record });
    }
    let job = files::read(file)?;
    let practice = whose.practice(file)?;
    let (building, results) = draw_for(&files::name(file), &job, practice.as_ref())?;
    let record = record::of_job(&building, &results, &digest(&job));
    Ok(Side { job, practice: practice.map_or_else(String::new, |p| p.text), record })
}

const fn lines_word(n: usize) -> &'static str {
    if n == 1 { "line" } else { "lines" }
}

/// Results in full; of the working how many lines changed, or each of them.
fn differences(all: &Differences, working: bool) -> Vec<String> {
    let mut out: Vec<String> = all.results.iter().flat_map(one).collect();
    for Altered { title, changes, .. } in &all.sheets {
        out.push(format!("  sheet {title}: {} {} of working", changes.len(), lines_word(changes.len())));
        if working {
            out.extend(changes.iter().flat_map(one));
        }
    }
    if !working && !all.sheets.is_empty() {
        out.push("  --working prints these lines".to_owned());
    }
    out
}

fn one(c: &Change) -> Vec<String> {
    let side = |name: &str, text: &Option<String>| {
        let text = match text.as_deref().map(str::trim_start) {
            None => "not there",
            Some("") => "an empty line",
            Some(text) => text,
        };
        format!("      {name} {text}")
    };
    vec![format!("    {}", c.what), side("was", &c.was), side("now", &c.now)]
}

fn print(lines: &[String]) {
    let mut out = anstream::stdout().lock();
    for line in lines {
        let _ = writeln!(out, "{line}");
    }
}
