//! One error for the whole tool: what is wrong, where, and what to do.
//!
//! * [`Error`]: the public error, with its three kinds
//! * [`Report`] and [`Diagnostic`]: everything that is wrong with a job file, as data
//! * `render`: the same as text with lines and carets

mod render;
mod report;

pub use report::{Diagnostic, Kind, Note, Place, Record, Report};

/// What stops the tool.
#[derive(Debug)]
pub enum Error {
    /// The job file cannot be used as it stands.
    Job(Report),
    /// A file cannot be read or written.
    File {
        /// The path as it was given.
        path: String,
        /// What happened.
        trouble: Trouble,
        /// What to do about it, a whole sentence.
        help: String,
    },
    /// A fault of the tool itself, never of the job.
    Internal {
        /// The step that went wrong.
        step: String,
    },
}

/// What can happen to a file.
#[derive(Debug)]
pub enum Trouble {
    /// It could not be read.
    Read(std::io::Error),
    /// It could not be written.
    Write(std::io::Error),
    /// It is there, but it is not what it should be; the sentence says what.
    Content(String),
}

/// A result with the tool's own error.
pub type Result<T> = std::result::Result<T, Error>;

impl std::fmt::Display for Error {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        match self {
            Self::Job(report) => f.write_str(&report.render(false)),
            Self::File { path, trouble, help } => {
                match trouble {
                    Trouble::Read(why) => writeln!(f, "error: {path} cannot be read: {why}")?,
                    Trouble::Write(why) => writeln!(f, "error: {path} cannot be written: {why}")?,
                    Trouble::Content(what) => writeln!(f, "error: {path}: {what}")?,
                }
                write!(f, "  help: {help}")
            }
            Self::Internal { step } => {
                writeln!(f, "error: the tool contradicts itself at: {step}")?;
                write!(f, "  help: this is a fault of the tool, not of the job; nothing was written")
            }
        }
    }
}

impl std::error::Error for Error {
    fn source(&self) -> Option<&(dyn std::error::Error + 'static)> {
        match self {
            Self::File { trouble: Trouble::Read(why) | Trouble::Write(why), .. } => Some(why),
            _ => None,
        }
    }
}

impl From<Report> for Error {
    fn from(report: Report) -> Self {
        Self::Job(report)
    }
}

#[cfg(test)]
mod tests {
    use super::{Error, Trouble};

    #[test]
    fn every_kind_says_what_to_do() {
        let missing = std::io::Error::from(std::io::ErrorKind::NotFound);
        let file = Error::File {
            path: "rear.toml".into(),
            trouble: Trouble::Read(missing),
            help: "Check the spelling of the path.".into(),
        };
        let text = file.to_string();
        assert!(text.starts_with("error: rear.toml cannot be read: "), "{text}");
        assert!(text.ends_with("help: Check the spelling of the path."), "{text}");
        assert!(std::error::Error::source(&file).is_some());
        let internal = Error::Internal { step: "6.2(2) V_Rd".into() }.to_string();
        assert!(internal.contains("6.2(2) V_Rd") && internal.contains("nothing was written"), "{internal}");
    }
}
