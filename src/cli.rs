//! The command line: flags in, files and lines out, an exit code back. The only file that knows clap.

use std::io::{IsTerminal as _, Write as _};
use std::path::{Path, PathBuf};
use std::time::{Duration, Instant};

use anstyle::{Effects, Style};
use clap::{CommandFactory as _, Parser, Subcommand};

use crate::checks::outcome::Outcome;
use crate::error::{Error, Trouble};
use crate::report::{lines, machine};
use crate::{check, job, pack, sheet};

/// Everything of every job is adequate.
pub const ADEQUATE: u8 = 0;
/// Something is not adequate, outside the method, or conditional.
pub const NOT_PLAINLY_ADEQUATE: u8 = 1;
/// A file could not be read or used, or a flag was wrong.
pub const FAILED: u8 = 2;

/// Calculation packs for masonry that stays when a load-bearing wall comes out.
///
/// Reads job files (TOML), checks returns, panels and bearings of what stays, and typesets a
/// calculation pack as PDF.
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

#[derive(Subcommand)]
enum Command {
    /// Write a commented job file that is already a complete invented job
    Start {
        /// Where to write it; an existing file is left alone
        file: PathBuf,
    },
    /// Check jobs and print the results
    Check {
        /// Job files
        #[arg(required = true)]
        files: Vec<PathBuf>,
        /// Print the results as JSON, one array entry a file
        #[arg(long)]
        json: bool,
    },
    /// Check jobs and write their packs as PDF
    Sheet {
        /// Job files
        #[arg(required = true)]
        files: Vec<PathBuf>,
        /// Folder for the packs; beside each job file without it
        #[arg(long, value_name = "FOLDER")]
        into: Option<PathBuf>,
        /// Say where the time went
        #[arg(long)]
        times: bool,
    },
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
    match flags.command {
        Command::Start { file } => done(start(&file)),
        Command::Check { files, json } => check_all(&files, json),
        Command::Sheet { files, into, times } => sheet_all(&files, into.as_deref(), times),
    }
}

fn done(result: Result<(), Error>) -> u8 {
    match result {
        Ok(()) => ADEQUATE,
        Err(e) => {
            complain(&e);
            FAILED
        }
    }
}

fn start(file: &Path) -> Result<(), Error> {
    if file.exists() {
        return Err(Error::File {
            path: file.display().to_string(),
            trouble: Trouble::Content("a file of this name is there already; it was left alone".to_owned()),
            help: "Give another name, or move the file away first.".to_owned(),
        });
    }
    write_whole(file, job::start::TEMPLATE.as_bytes())?;
    let _ = writeln!(
        anstream::stdout(),
        "{} written: a complete invented job. Edit it, then run",
        file.display()
    );
    let _ = writeln!(anstream::stdout(), "  perpend check {}", file.display());
    Ok(())
}

fn read(file: &Path) -> Result<String, Error> {
    let trouble = |trouble, help: &str| Error::File {
        path: file.display().to_string(),
        trouble,
        help: help.to_owned(),
    };
    let bytes = std::fs::read(file).map_err(|e| {
        trouble(
            Trouble::Read(e),
            "Check the spelling of the path; 'perpend start' writes a job to begin from.",
        )
    })?;
    String::from_utf8(bytes).map_err(|_| {
        trouble(
            Trouble::Content("it is not UTF-8 text".to_owned()),
            "Save the job file as UTF-8 in a text editor.",
        )
    })
}

fn name(file: &Path) -> String {
    file.display().to_string()
}

fn code(outcome: Outcome) -> u8 {
    if outcome == Outcome::Adequate { ADEQUATE } else { NOT_PLAINLY_ADEQUATE }
}

fn check_all(files: &[PathBuf], json: bool) -> u8 {
    let mut worst = ADEQUATE;
    let mut records = Vec::new();
    for (n, file) in files.iter().enumerate() {
        match read(file).and_then(|text| check(&name(file), &text)) {
            Ok((building, results)) => {
                worst = worst.max(code(results.outcome));
                if json {
                    records.push(machine::of_job(&name(file), &building, &results));
                } else {
                    if n > 0 {
                        let _ = writeln!(anstream::stdout());
                    }
                    print_lines(&lines::of_job(&building, &results));
                }
            }
            Err(e) => {
                worst = FAILED;
                match &e {
                    Error::Job(report) if json => records.push(machine::of_report(&name(file), report)),
                    other if json => records.push(machine::of_error(&name(file), other)),
                    other => complain(other),
                }
            }
        }
    }
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

fn sheet_all(files: &[PathBuf], into: Option<&Path>, times: bool) -> u8 {
    let bar = Progress::new(files.len());
    let mut worst = ADEQUATE;
    for file in files {
        bar.on(file);
        let result = one_sheet(file, into, times, &bar);
        pack::evict(2);
        worst = worst.max(match result {
            Ok(outcome) => code(outcome),
            Err(e) => {
                bar.aside(|| complain(&e));
                FAILED
            }
        });
    }
    bar.end();
    worst
}

fn one_sheet(file: &Path, into: Option<&Path>, times: bool, bar: &Progress) -> Result<Outcome, Error> {
    let begin = Instant::now();
    let text = read(file)?;
    let beside = file.parent().unwrap_or(Path::new(""));
    let made = sheet(&name(file), &text, beside)?;
    let folder = into.unwrap_or(beside);
    let path = folder.join(&made.file_name);
    write_whole(&path, &made.typeset.pdf)?;
    bar.aside(|| {
        let t = &made.typeset;
        let mut out = anstream::stdout();
        let _ = writeln!(out, "{}: {} sheets: {}", path.display(), t.pages, made.results.outcome.words());
        if times {
            let all = begin.elapsed();
            let rest = all.saturating_sub(t.times.fonts + t.times.compile + t.times.export);
            let ms = |d: Duration| d.as_secs_f64() * 1e3;
            let _ = writeln!(
                out,
                "  job, checks, drawings, writing {:.1} ms; fonts {:.1} ms; layout {:.1} ms; PDF {:.1} ms",
                ms(rest),
                ms(t.times.fonts),
                ms(t.times.compile),
                ms(t.times.export)
            );
        }
    });
    Ok(made.results.outcome)
}

/// Writes a file whole or not at all: beside its place first, then moved there.
fn write_whole(path: &Path, bytes: &[u8]) -> Result<(), Error> {
    let folder = path.parent().filter(|p| !p.as_os_str().is_empty()).unwrap_or(Path::new("."));
    let write = || -> std::io::Result<()> {
        let mut file = tempfile::NamedTempFile::new_in(folder)?;
        file.write_all(bytes)?;
        file.as_file().sync_all()?;
        readable(&file)?;
        file.persist(path).map_err(|e| e.error)?;
        Ok(())
    };
    write().map_err(|e| Error::File {
        path: path.display().to_string(),
        trouble: Trouble::Write(e),
        help: "Check that the folder is there and may be written to; nothing was changed.".to_owned(),
    })
}

/// A temporary file is for its owner alone; a pack is for everyone who may read the folder.
#[cfg(unix)]
fn readable(file: &tempfile::NamedTempFile) -> std::io::Result<()> {
    use std::os::unix::fs::PermissionsExt as _;
    file.as_file().set_permissions(std::fs::Permissions::from_mode(0o644))
}

#[cfg(not(unix))]
fn readable(_: &tempfile::NamedTempFile) -> std::io::Result<()> {
    Ok(())
}

fn complain(error: &Error) {
    let colour = std::io::stderr().is_terminal() && std::env::var_os("NO_COLOR").is_none();
    let text = match error {
        Error::Job(report) => report.render(colour),
        other => other.to_string(),
    };
    let _ = writeln!(anstream::stderr(), "{}", text.trim_end());
}

/// A progress bar that shows only where the command lasts longer than half a second.
struct Progress {
    bar: indicatif::ProgressBar,
    begin: Instant,
}

impl Progress {
    fn new(jobs: usize) -> Self {
        let bar = indicatif::ProgressBar::with_draw_target(
            Some(jobs as u64),
            if jobs > 1 {
                indicatif::ProgressDrawTarget::stderr()
            } else {
                indicatif::ProgressDrawTarget::hidden()
            },
        );
        bar.set_style(
            indicatif::ProgressStyle::with_template("{pos} of {len} packs  {wide_bar}  {msg}")
                .unwrap_or_else(|_| indicatif::ProgressStyle::default_bar()),
        );
        Self { bar, begin: Instant::now() }
    }

    fn on(&self, file: &Path) {
        if self.begin.elapsed() > Duration::from_millis(500) {
            self.bar.set_message(name(file));
            self.bar.tick();
        }
        self.bar.inc(1);
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
