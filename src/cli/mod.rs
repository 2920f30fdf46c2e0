//! The command line: flags in, files and lines out, an exit code back. The only folder that knows clap.

mod again;
mod child;
mod flags;
mod made;
mod progress;
mod sign;
mod teach;
mod watch;

use std::io::Write as _;
use std::path::{Path, PathBuf};

use anstyle::{Effects, Style};
use clap::{CommandFactory as _, Parser as _};

use flags::{Command, Flags, Only, Whose};
use made::{Made, Stopped, code, place};
use progress::Progress;

use crate::checks::outcome::Outcome;
use crate::error::Error;
use crate::report::{lines, machine};
use crate::{check_for, files, job, many};

/// Everything of every job is adequate.
pub const ADEQUATE: u8 = 0;
/// Something is not adequate, outside the method, or conditional.
pub const NOT_PLAINLY_ADEQUATE: u8 = 1;
/// A file could not be read or used, or a flag was wrong.
pub const FAILED: u8 = 2;

/// Which documents, and in whose style.
type How<'a> = (Option<Only>, &'a Whose);

/// Runs the tool with the process's arguments and yields its exit code.
pub fn run() -> u8 {
    let flags = match Flags::try_parse() {
        Ok(flags) => flags,
        Err(e) => {
            let _ = e.print();
            return if e.use_stderr() { FAILED } else { ADEQUATE };
        }
    };
    many::hush();
    match flags.command {
        Command::Start { file, plan, practice } => {
            let text = match (plan, practice) {
                (true, _) => job::start::FROM_PLAN,
                (_, true) => job::start::PRACTICE,
                _ => job::start::TEMPLATE,
            };
            start(&file, text, practice)
        }
        Command::Check { files, json, whose } => check_all(&files, json, &whose),
        Command::Sheet { files, into, only, times, whose } => {
            sheet_all(&files, into.as_deref(), (only, &whose), times)
        }
        Command::Watch { file, into, only, whose } => {
            if let Some(Err(e)) = into.as_deref().map(files::folder) {
                complain(&e);
                return FAILED;
            }
            watch::watch(&file, into.as_deref(), (only, &whose))
        }
        Command::Recheck { packs, working } => again::recheck_all(&packs, working),
        Command::Sign { pack, key, certificate, role, into, date } => {
            sign::sign(&sign::Asked { pack, key, certificate, role, into, date })
        }
        Command::Compare { old, new, working, whose } => again::compare_two((&old, &new), working, &whose),
        Command::Checks => teach::checks(),
        Command::Completions { shell } => teach::completions(shell),
        Command::Manual => teach::manual(),
        Command::Schema => teach::schema(),
        Command::Set { file, only, whose } => child::hand_back(&file, (only, &whose)),
    }
}

fn start(file: &Path, text: &str, practice: bool) -> u8 {
    match files::write_new(file, text.as_bytes()) {
        Ok(()) => {
            let file = file.display();
            let next = match practice {
                true => format!(
                    "a complete invented practice. Edit it, then run\n  perpend sheet --practice {file} job.toml"
                ),
                false => format!("a complete invented job. Edit it, then run\n  perpend check {file}"),
            };
            let _ = writeln!(anstream::stdout(), "{file} written: {next}");
            ADEQUATE
        }
        Err(e) => {
            complain(&e);
            FAILED
        }
    }
}

fn internal<T>(result: Result<Result<T, Error>, String>) -> Result<T, Error> {
    result.unwrap_or_else(|panic| Err(Error::Internal { step: panic }))
}

/// What `check` says of one job.
enum Said {
    Lines(Vec<lines::Line>),
    Record(serde_json::Value),
}

fn check_all(paths: &[PathBuf], json: bool, whose: &Whose) -> u8 {
    let mut worst = ADEQUATE;
    let mut records = Vec::new();
    let work = |file: &PathBuf| -> Result<(Outcome, Said), Error> {
        let name = files::name(file);
        let (building, results) = check_for(&name, &files::read(file)?, whose.practice(file)?.as_ref())?;
        let said = if json {
            Said::Record(machine::of_job(&name, &building, &results))
        } else {
            Said::Lines(lines::of_job(&building, &results))
        };
        Ok((results.outcome, said))
    };
    let mut first = true;
    let take = |file: &PathBuf, result| match internal(result) {
        Ok((outcome, said)) => {
            worst = worst.max(code(outcome));
            match said {
                Said::Record(record) => records.push(record),
                Said::Lines(lines) => {
                    if !std::mem::take(&mut first) {
                        let _ = writeln!(anstream::stdout());
                    }
                    print_lines(&lines);
                }
            }
        }
        Err(e) => {
            worst = FAILED;
            match &e {
                Error::Job(report) if json => records.push(machine::of_report(&files::name(file), report)),
                other if json => records.push(machine::of_error(&files::name(file), other)),
                other => complain(other),
            }
        }
    };
    many::in_order(paths, work, take, || {});
    if json {
        let text = serde_json::to_string_pretty(&records).unwrap_or_default();
        let _ = writeln!(anstream::stdout(), "{text}");
    }
    worst
}

/// Stressed lines are bold on a terminal; anstream takes the style away elsewhere and under NO_COLOR.
fn print_lines(all: &[lines::Line]) {
    let bold = Style::new().effects(Effects::BOLD);
    let mut out = anstream::stdout().lock();
    for line in all {
        let _ = if line.stress {
            writeln!(out, "{bold}{}{bold:#}", line.text)
        } else {
            writeln!(out, "{}", line.text)
        };
    }
}

fn sheet_all(paths: &[PathBuf], into: Option<&Path>, how: How<'_>, times: bool) -> u8 {
    if let Some(Err(e)) = into.map(files::folder) {
        complain(&e);
        return FAILED;
    }
    let progress = Progress::new(paths.len());
    let mut worst = ADEQUATE;
    let mut taken = files::Taken::default();
    let work = |file: &PathBuf| {
        // Several packs in one process would share the typesetter's memory of work done, which makes
        // each slower and all together larger: each of several has a process of its own.
        let made = if paths.len() > 1 { child::ask(file, how)? } else { Made::here(file, how)? };
        made.staged(file, into).map_err(Stopped::from)
    };
    let take = |file: &PathBuf, result: Result<Result<(Made, Vec<files::Staged>), Stopped>, String>| {
        let ended = result.unwrap_or_else(|panic| Err(Error::Internal { step: panic }.into()));
        let placed = ended.and_then(|(made, staged)| {
            staged.iter().try_for_each(|one| taken.take(&one.path, file))?;
            Ok((place(staged)?, made))
        });
        progress.aside(|| match placed {
            Ok((paths, made)) => {
                worst = worst.max(made.code);
                let mut out = anstream::stdout();
                for (path, document) in paths.iter().zip(&made.documents) {
                    let _ = writeln!(out, "{}: {}", path.display(), document.said);
                }
                for remark in &made.remarks {
                    let _ = writeln!(out, "  {remark}");
                }
                if times {
                    let _ = writeln!(out, "  {}", made.times);
                }
            }
            Err(stopped) => {
                worst = FAILED;
                stopped.complain();
            }
        });
        progress.one_more();
    };
    many::in_order(paths, work, take, || progress.tick());
    progress.end();
    worst
}

/// Colours are for a terminal; anstream takes them away elsewhere and under NO_COLOR.
fn complain(error: &Error) {
    let text = match error {
        Error::Job(report) => report.render(true),
        other => other.to_string(),
    };
    let _ = writeln!(anstream::stderr(), "{}", text.trim_end());
}

/// The command, for tests of its help.
pub fn command() -> clap::Command {
    Flags::command()
}
