//! Commands and flags, with the help that teaches them.

use std::path::{Path, PathBuf};

use clap::{Parser, Subcommand};

use crate::building::Practice;
use crate::error::Error;
use crate::house::{self, House};

/// Calculation packs for masonry that stays when a load-bearing wall comes out.
///
/// Reads job files (TOML), checks the returns and panels that stay and the beams' bearings that
/// the job gives, and typesets a calculation pack as PDF.
#[derive(Parser)]
#[command(name = "perpend", version, arg_required_else_help = true, after_help = EXAMPLES)]
pub(super) struct Flags {
    #[command(subcommand)]
    pub(super) command: Command,
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
  perpend start --plan kitchen.toml    walls, floors and beams as a plan; it finds the rest
  perpend start --practice practice.toml    the house style, beside the jobs that it is for";

const CHECK_EXAMPLES: &str = "\
Examples:
  perpend check rear-opening.toml
  perpend check --json rear-opening.toml    the results for other programs";

const SHEET_EXAMPLES: &str = "\
Examples:
  perpend sheet rear-opening.toml           the pack beside the job file
  perpend sheet --into packs jobs/*.toml    all packs in one folder; a faulty job holds up no other
  perpend sheet --practice style.toml a.toml    in the house style of that practice file

A draft that is there already is replaced as soon as the new one is whole. A pack that was issued
(its status is neither preliminary nor for comment) is never replaced by one of a changed job: give
that the next revision.";

const WATCH_EXAMPLES: &str = "\
Example:
  perpend watch rear-opening.toml      beside an editor and a PDF reader that follows its file

A file that has an error is told as `check` tells it; the documents of before stay. Ctrl-C ends.";

const COMPLETIONS_EXAMPLES: &str = "\
Examples:
  perpend completions bash > ~/.local/share/bash-completion/completions/perpend
  perpend completions zsh > ~/.zfunc/_perpend";

const SCHEMA_EXAMPLES: &str = "\
Example:
  perpend schema > perpend-job.schema.json

An editor that knows TOML schemas takes it from the first line of a job,
'#:schema ./perpend-job.schema.json', or from its settings. It sees single entries: contradictions,
sums, references and the limits of quantities are seen by `check`.";

const RECHECK_EXAMPLES: &str = "\
Examples:
  perpend recheck '2419 Calculations (A).pdf'
  perpend recheck --working packs/*.pdf

A pack carries its job file and all that it prints as data; the job is worked again from there. What
stands on paper is the same while the digest at the foot of its sheets is the one that this command
prints. Of each digital signature it says whether the bytes are those that were signed, with the key
of its certificate; trust in a certificate is for your PDF program to tell.

Exit codes: 0 everything stands; 1 something does not; 2 a file is no pack, or cannot be worked.";

const SIGN_EXAMPLES: &str = "\
Examples:
  perpend sign '2419 Calculations (A).pdf' --key hollin.p12
  perpend sign '2419 Calculations (A).pdf' --key key.pem --certificate hollin.pem
  perpend sign '2419 Calculations (A) signed.pdf' --key varley.p12 --as checked

Writes a new file beside the pack, '2419 Calculations (A) signed.pdf'. The pack stays as it is, and
is the beginning of the new file byte for byte. A passphrase is asked for on the terminal, or read
as one line from standard input where that is none. Keys are RSA of 2048 bits or more, P-256 or
P-384. The time of signing is that of this computer's clock, and nobody vouches for it. Whether a
certificate is trusted is for the reader's PDF program to say.";

const COMPARE_EXAMPLES: &str = "\
Examples:
  perpend compare '2419 Calculations (A).pdf' rear-opening.toml    since revision A was issued
  perpend compare rear-opening.toml rear-opening-2.toml

Exit codes: 0 alike; 1 something changed; 2 error.";

#[derive(Subcommand)]
pub(super) enum Command {
    /// Write a commented job file that is already a complete invented job
    #[command(after_help = START_EXAMPLES)]
    Start {
        /// Where to write it; an existing file is left alone
        file: PathBuf,
        /// A shorter job, worked from a plan of its walls, floors and beams, in place of one with every entry by hand
        #[arg(long)]
        plan: bool,
        /// A practice file in place of a job: whose packs they are and how they look
        #[arg(long, conflicts_with = "plan")]
        practice: bool,
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
        #[command(flatten)]
        whose: Whose,
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
        #[command(flatten)]
        whose: Whose,
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
        #[command(flatten)]
        whose: Whose,
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
    /// Sign a pack with your own X.509 key, in the box of its sign-off
    #[command(after_help = SIGN_EXAMPLES)]
    Sign {
        /// The pack, as `sheet` or `sign` wrote it
        pack: PathBuf,
        /// File with the private key: PEM, or PKCS#12 with its certificate
        #[arg(long, value_name = "FILE")]
        key: PathBuf,
        /// File with the certificate, where the key's file does not hold it
        #[arg(long, value_name = "FILE")]
        certificate: Option<PathBuf>,
        /// As what you sign
        #[arg(long = "as", value_name = "ROLE", default_value = "made")]
        role: As,
        /// Folder for the signed pack, made where it is not there; beside the pack without it
        #[arg(long, value_name = "FOLDER")]
        into: Option<PathBuf>,
        /// Date of signing in place of the clock's, 2026-12-02 or 2026-12-02T14:05:00Z: for tests, and to write the same
        /// bytes again
        #[arg(long, value_name = "DATE")]
        date: Option<String>,
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
        #[command(flatten)]
        whose: Whose,
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
    /// Print the JSON Schema of a job file, with which editors complete and check it
    #[command(after_help = SCHEMA_EXAMPLES)]
    Schema,
    /// Set one job and hand the pack back on standard output; `sheet` of several files starts these
    #[command(hide = true)]
    Set {
        /// Job file
        file: PathBuf,
        /// Only one of the two
        #[arg(long)]
        only: Option<Only>,
        #[command(flatten)]
        whose: Whose,
    },
}

/// Whose packs they are.
#[derive(clap::Args, Clone, Debug, Default)]
pub(super) struct Whose {
    /// Practice file: name, logo, colour, type, standing notes, padstones and factors of the practice. Without it
    /// practice.toml beside the job file, else the file that PERPEND_PRACTICE names
    #[arg(long, value_name = "FILE")]
    pub(super) practice: Option<PathBuf>,
}

impl Whose {
    /// The practice file of a job, where it has one.
    pub(super) fn of(&self, job: &Path) -> Option<PathBuf> {
        let usual = std::env::var_os("PERPEND_PRACTICE").filter(|p| !p.is_empty()).map(PathBuf::from);
        house::find(self.practice.as_deref(), job, usual)
    }

    /// That practice, without the files that it names.
    pub(super) fn practice(&self, job: &Path) -> Result<Option<Practice>, Error> {
        self.of(job).map(|file| house::read(&file)).transpose()
    }

    /// That practice, ready to set packs.
    pub(super) fn house(&self, job: &Path) -> Result<Option<House>, Error> {
        self.of(job).map(|file| house::open(&file)).transpose()
    }
}

/// One of the two documents.
#[derive(Clone, Copy, Debug, PartialEq, Eq, clap::ValueEnum)]
pub(super) enum Only {
    /// The calculation pack
    Pack,
    /// The summary for the client
    Summary,
}

/// As what somebody signs.
#[derive(Clone, Copy, Debug, PartialEq, Eq, clap::ValueEnum)]
pub(super) enum As {
    /// Who made the calculations
    Made,
    /// Who checked them
    Checked,
}
