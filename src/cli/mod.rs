//! The command line: flags in, files and lines out, an exit code back. The only folder that knows clap.

mod again;
mod child;
mod teach;
mod watch;

use std::io::Write as _;
use std::path::{Path, PathBuf};
use std::time::{Duration, Instant};

use anstyle::{Effects, Style};
use clap::{CommandFactory as _, Parser, Subcommand};

use crate::archive;
use crate::checks::outcome::Outcome;
use crate::error::{Error, Trouble};
use crate::report::record::Record;
use crate::report::{lines, machine, plain};
use crate::{check, digest, draw, file_name, files, job, many, pack, sheet, summarise};

/// Everything of every job is adequate.
pub const ADEQUATE: u8 = 0;
/// Something is not adequate, outside the method, or conditional.
pub const NOT_PLAINLY_ADEQUATE: u8 = 1;
/// A file could not be read or used, or a flag was wrong.
pub const FAILED: u8 = 2;

/// Calculation packs for masonry that stays when a load-bearing wall comes out.
///
/// Reads job files (TOML), checks the returns and panels that stay and the beams' bearings that
/// the job gives, and typesets a calculation pack as PDF.
#[derive(Parser)]
#[command(name = "perpend", version, arg_required_else_help = true, after_help = EXAMPLES)]
struct Flags {
    #[command(subcommand)]
    command: Command,
}

const EXAMPLES: &str = "\
Examples:
  perpend start rear-opening.toml        write a commented job to begin from
  perpend check rear-opening.toml        print the results
  perpend sheet rear-opening.toml        write the pack, '2419 Calculations (A).pdf'
  perpend check --json jobs/*.toml       results of several jobs, for other programs

Exit codes: 0 adequate; 1 not adequate, outside the method, or conditional on hold points; 2 error.
A pack is worth nothing unsigned: read it, check it, sign it.";

const START_EXAMPLES: &str = "\
Examples:
  perpend start rear-opening.toml      every entry, each with a remark
  perpend start --plan kitchen.toml    walls, floors and beams as a plan; loads and spans found on it";

const CHECK_EXAMPLES: &str = "\
Examples:
  perpend check rear-opening.toml
  perpend check --json rear-opening.toml    the results for other programs";

const SHEET_EXAMPLES: &str = "\
Examples:
  perpend sheet rear-opening.toml           the pack beside the job file
  perpend sheet --into packs jobs/*.toml    all packs in one folder; a job that cannot be used holds up no other

A draft that is there already is replaced as soon as the new one is whole. A pack that was issued (its status is
neither preliminary nor for comment) is never replaced by one of a changed job: give that the next revision.";

const WATCH_EXAMPLES: &str = "\
Example:
  perpend watch rear-opening.toml      beside an editor and a PDF reader that follows its file

A file that has an error is told as `check` tells it; the documents of before stay. Ctrl-C ends.";

const COMPLETIONS_EXAMPLES: &str = "\
Examples:
  perpend completions bash > ~/.local/share/bash-completion/completions/perpend
  perpend completions zsh > ~/.zfunc/_perpend";

const RECHECK_EXAMPLES: &str = "\
Examples:
  perpend recheck '2419 Calculations (A).pdf'
  perpend recheck --working packs/*.pdf

A pack carries its job file and all that it prints as data; the job is worked again from there. What stands on paper
is the same while the digest at the foot of its sheets is the one that this command prints.

Exit codes: 0 everything stands; 1 something does not; 2 a file is no pack, or cannot be worked.";

const COMPARE_EXAMPLES: &str = "\
Examples:
  perpend compare '2419 Calculations (A).pdf' rear-opening.toml    since revision A was issued
  perpend compare rear-opening.toml rear-opening-2.toml

Exit codes: 0 alike; 1 something changed; 2 error.";

#[derive(Subcommand)]
enum Command {
    /// Write a commented job file that is already a complete invented job
    #[command(after_help = START_EXAMPLES)]
    Start {
        /// Where to write it; an existing file is left alone
        file: PathBuf,
        /// A shorter job, worked from a plan of its walls, floors and beams, in place of one with every entry by hand
        #[arg(long)]
        plan: bool,
    },
    /// Check jobs and print the results
    #[command(after_help = CHECK_EXAMPLES)]
    Check {
        /// Job files
        #[arg(required = true)]
        files: Vec<PathBuf>,
        /// Print the results as JSON, one array entry a file
        #[arg(long)]
        json: bool,
    },
    /// Check jobs and write their packs and a summary for the client as PDF
    #[command(after_help = SHEET_EXAMPLES)]
    Sheet {
        /// Job files
        #[arg(required = true)]
        files: Vec<PathBuf>,
        /// Folder for the packs, made where it is not there; beside each job file without it
        #[arg(long, value_name = "FOLDER")]
        into: Option<PathBuf>,
        /// Write only one of the two: the pack, or the summary for the client
        #[arg(long, value_name = "WHICH")]
        only: Option<Only>,
        /// Say where the time went
        #[arg(long)]
        times: bool,
    },
    /// Check and set a job again whenever its file is saved, and tell in one line what that changed
    #[command(after_help = WATCH_EXAMPLES)]
    Watch {
        /// Job file
        file: PathBuf,
        /// Folder for the documents; beside the job file without it
        #[arg(long, value_name = "FOLDER")]
        into: Option<PathBuf>,
        /// Write only one of the two: the pack, or the summary for the client
        #[arg(long, value_name = "WHICH")]
        only: Option<Only>,
    },
    /// Work the jobs inside packs again and say whether every printed result still stands
    #[command(after_help = RECHECK_EXAMPLES)]
    Recheck {
        /// Packs, as `sheet` wrote them
        #[arg(required = true)]
        packs: Vec<PathBuf>,
        /// Print every line of working that changed, not only how many did
        #[arg(long)]
        working: bool,
    },
    /// Say what changed between two job files or packs
    #[command(after_help = COMPARE_EXAMPLES)]
    Compare {
        /// The earlier one, a job file or a pack
        old: PathBuf,
        /// The later one
        new: PathBuf,
        /// Print every line of working that changed, not only how many did
        #[arg(long)]
        working: bool,
    },
    /// List every check with its clause
    Checks,
    /// Print completions for a shell
    #[command(after_help = COMPLETIONS_EXAMPLES)]
    Completions {
        /// The shell
        shell: clap_complete::Shell,
    },
    /// Print the manual in the format of `man`
    #[command(after_help = "Example:\n  perpend manual > perpend.1 && man ./perpend.1")]
    Manual,
    /// Set one job and hand the pack back on standard output; `sheet` of several files starts these
    #[command(hide = true)]
    Set {
        /// Job file
        file: PathBuf,
        /// Only one of the two
        #[arg(long)]
        only: Option<Only>,
    },
}

/// One of the two documents.
#[derive(Clone, Copy, Debug, PartialEq, Eq, clap::ValueEnum)]
enum Only {
    /// The calculation pack
    Pack,
    /// The summary for the client
    Summary,
}

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
        Command::Start { file, plan } => start(&file, plan),
        Command::Check { files, json } => check_all(&files, json),
        Command::Sheet { files, into, only, times } => sheet_all(&files, into.as_deref(), only, times),
        Command::Watch { file, into, only } => {
            if let Some(Err(e)) = into.as_deref().map(files::folder) {
                complain(&e);
                return FAILED;
            }
            watch::watch(&file, into.as_deref(), only)
        }
        Command::Recheck { packs, working } => again::recheck_all(&packs, working),
        Command::Compare { old, new, working } => again::compare_two(&old, &new, working),
        Command::Checks => teach::checks(),
        Command::Completions { shell } => teach::completions(shell),
        Command::Manual => teach::manual(),
        Command::Set { file, only } => child::hand_back(&file, only),
    }
}

fn start(file: &Path, plan: bool) -> u8 {
    let text = if plan { job::start::FROM_PLAN } else { job::start::TEMPLATE };
    match files::write_new(file, text.as_bytes()) {
        Ok(()) => {
            let _ = writeln!(
                anstream::stdout(),
                "{file} written: a complete invented job. Edit it, then run\n  perpend check {file}",
                file = file.display()
            );
            ADEQUATE
        }
        Err(e) => {
            complain(&e);
            FAILED
        }
    }
}

fn code(outcome: Outcome) -> u8 {
    if outcome == Outcome::Adequate { ADEQUATE } else { NOT_PLAINLY_ADEQUATE }
}

fn internal<T>(result: Result<Result<T, Error>, String>) -> Result<T, Error> {
    result.unwrap_or_else(|panic| Err(Error::Internal { step: panic }))
}

/// What `check` says of one job.
enum Said {
    Lines(Vec<lines::Line>),
    Record(serde_json::Value),
}

fn check_all(paths: &[PathBuf], json: bool) -> u8 {
    let mut worst = ADEQUATE;
    let mut records = Vec::new();
    let work = |file: &PathBuf| -> Result<(Outcome, Said), Error> {
        let name = files::name(file);
        let (building, results) = check(&name, &files::read(file)?)?;
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

fn sheet_all(paths: &[PathBuf], into: Option<&Path>, only: Option<Only>, times: bool) -> u8 {
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
        let made = if paths.len() > 1 { child::ask(file, only)? } else { Made::here(file, only)? };
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

/// A pack that is set, and what is said of it.
#[derive(serde::Serialize, serde::Deserialize)]
struct Made {
    documents: Vec<Document>,
    /// The file name of its pack, whether it was set or not.
    pack: String,
    /// SHA-256 of the job file.
    digest: String,
    /// The exit code it asks for.
    code: u8,
    /// What its author should see.
    remarks: Vec<String>,
    times: String,
}

/// One PDF of it.
#[derive(serde::Serialize, serde::Deserialize)]
struct Document {
    file_name: String,
    /// What is said of it: pages and outcome.
    said: String,
    /// Bytes of the PDF.
    size: usize,
    #[serde(skip)]
    pdf: Vec<u8>,
}

impl Document {
    fn new(file_name: String, said: String, pdf: Vec<u8>) -> Self {
        Self { file_name, said, size: pdf.len(), pdf }
    }
}

impl Made {
    /// Sets a job in this process.
    fn here(file: &Path, only: Option<Only>) -> Result<Self, Error> {
        let begin = Instant::now();
        let text = files::read(file)?;
        let folder = file.parent().unwrap_or(Path::new(""));
        let mut documents = Vec::new();
        let mut setting = pack::Times::default();
        let (building, results) = match only {
            Some(Only::Summary) => draw(&files::name(file), &text)?,
            Some(Only::Pack) | None => {
                let made = sheet(&files::name(file), &text, folder)?;
                let said = format!("{} sheets: {}", made.typeset.pages, made.results.outcome.words());
                setting = made.typeset.times;
                documents.push(Document::new(made.file_name, said, made.typeset.pdf));
                (made.building, made.results)
            }
        };
        let mut remarks = Vec::new();
        if only != Some(Only::Pack) {
            let made = summarise(&building, &results, &text)?;
            let pages = made.typeset.pages;
            let said = format!("{pages} {} for the client", if pages == 1 { "page" } else { "pages" });
            remarks.extend(made.hard.iter().map(|(words, why)| hard(words, why)));
            setting += made.typeset.times;
            documents.push(Document::new(made.file_name, said, made.typeset.pdf));
        }
        let spent = Spent { all: begin.elapsed(), setting };
        let (pack, digest) = (file_name(&building), digest(&text));
        Ok(Self { documents, pack, digest, code: code(results.outcome), remarks, times: spent.to_string() })
    }

    /// Writes each document beside its place, so that it only has to be moved there.
    fn staged(mut self, file: &Path, into: Option<&Path>) -> Result<(Self, Vec<files::Staged>), Error> {
        let folder = into.or(file.parent()).unwrap_or(Path::new(""));
        if let Some(issued) = archive::issued_at(&folder.join(&self.pack), &self.digest) {
            return Err(stays(&folder.join(&self.pack), &issued));
        }
        let one = |d: &mut Document| {
            let pdf = std::mem::take(&mut d.pdf);
            files::Staged::new(folder.join(&d.file_name), &pdf)
        };
        let staged = self.documents.iter_mut().map(one).collect::<Result<Vec<_>, Error>>()?;
        Ok((self, staged))
    }
}

/// An issued pack is never overwritten.
fn stays(path: &Path, issued: &Record) -> Error {
    Error::File {
        path: files::name(path),
        trouble: Trouble::Content(format!(
            "it is revision {} as issued, {}, and the job file has changed since",
            issued.revision, issued.status
        )),
        help:
            "Add the next letter under [[revisions]]; `perpend compare` says what changed since this issue."
                .to_owned(),
    }
}

/// Moves what is written to its place. Yields where it stands.
fn place(staged: Vec<files::Staged>) -> Result<Vec<PathBuf>, Error> {
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
    }
}

/// Why a pack was not set.
enum Stopped {
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
    fn complain(&self) {
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

/// Colours are for a terminal; anstream takes them away elsewhere and under NO_COLOR.
fn complain(error: &Error) {
    let text = match error {
        Error::Job(report) => report.render(true),
        other => other.to_string(),
    };
    let _ = writeln!(anstream::stderr(), "{}", text.trim_end());
}

/// A progress bar on a terminal, for several jobs that take longer than half a second.
struct Progress {
    bar: indicatif::ProgressBar,
    begin: Instant,
}

impl Progress {
    fn new(jobs: usize) -> Self {
        let bar = indicatif::ProgressBar::with_draw_target(
            Some(jobs as u64),
            indicatif::ProgressDrawTarget::hidden(),
        );
        bar.set_style(
            indicatif::ProgressStyle::with_template("{pos} of {len} packs  {wide_bar}")
                .unwrap_or_else(|_| indicatif::ProgressStyle::default_bar()),
        );
        Self { bar, begin: Instant::now() }
    }

    /// Called now and then: shows the bar once it has lasted long enough.
    fn tick(&self) {
        let several = self.bar.length().is_some_and(|jobs| jobs > 1);
        if self.bar.is_hidden() && several && self.begin.elapsed() > Duration::from_millis(500) {
            self.bar.set_draw_target(indicatif::ProgressDrawTarget::stderr());
        }
        self.bar.tick();
    }

    fn one_more(&self) {
        self.bar.inc(1);
        self.tick();
    }

    fn aside(&self, say: impl FnOnce()) {
        self.bar.suspend(say);
    }

    fn end(&self) {
        self.bar.finish_and_clear();
    }
}

/// The command, for tests of its help.
pub fn command() -> clap::Command {
    Flags::command()
}
