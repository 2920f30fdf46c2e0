//! One pack in a process of its own: what `sheet` of several files starts, and what that hands back.
//!
//! On standard output: the length of the header (eight bytes, little end first), the header as JSON, one PDF
//! after the other. What goes wrong is worded on standard error.

use std::io::{IsTerminal as _, Write as _};
use std::path::Path;
use std::process::{Command, Stdio};

use super::flags::Only;
use super::made::{Made, Stopped};
use super::{FAILED, How, complain};
use crate::error::Error;
use crate::many;

/// Sets one job and writes the pack to standard output. Yields the exit code.
pub fn hand_back(file: &Path, how: How<'_>) -> u8 {
    let made = match many::guarded(|| Made::here(file, how)) {
        Ok(Ok(made)) => made,
        Ok(Err(e)) => {
            complain(&e);
            return FAILED;
        }
        Err(panic) => {
            complain(&Error::Internal { step: panic });
            return FAILED;
        }
    };
    let header = serde_json::to_vec(&made).unwrap_or_default();
    let mut out = std::io::stdout().lock();
    let written = out
        .write_all(&(header.len() as u64).to_le_bytes())
        .and_then(|()| out.write_all(&header))
        .and_then(|()| made.documents.iter().try_for_each(|d| out.write_all(&d.pdf)))
        .and_then(|()| out.flush());
    if written.is_ok() { made.code } else { FAILED }
}

/// Has another process set `file`. Where none can be started this one does it.
pub fn ask(file: &Path, how: How<'_>) -> Result<Made, Stopped> {
    let Ok(program) = std::env::current_exe() else { return Ok(Made::here(file, how)?) };
    let mut command = Command::new(program);
    command.arg("set").arg(file).stdin(Stdio::null());
    if let Some(practice) = &how.1.practice {
        command.arg("--practice").arg(practice);
    }
    match how.0 {
        Some(Only::Pack) => drop(command.args(["--only", "pack"])),
        Some(Only::Summary) => drop(command.args(["--only", "summary"])),
        None => {}
    }
    // The cores are shared out by jobs; pieces of a job stay on its core.
    command.env("RAYON_NUM_THREADS", "1");
    if std::io::stderr().is_terminal() && std::env::var_os("NO_COLOR").is_none() {
        command.env("CLICOLOR_FORCE", "1");
    }
    let Ok(answer) = command.output() else { return Ok(Made::here(file, how)?) };
    let words = String::from_utf8_lossy(&answer.stderr).into_owned();
    match unpack(&answer.stdout) {
        Some(made) if answer.status.code() == Some(i32::from(made.code)) => Ok(made),
        _ if !words.trim().is_empty() => Err(Stopped::There(words)),
        _ => Err(Stopped::Here(Error::Internal {
            step: format!("setting {}: {}", file.display(), answer.status),
        })),
    }
}

fn unpack(bytes: &[u8]) -> Option<Made> {
    let (length, rest) = bytes.split_at_checked(8)?;
    let length = usize::try_from(u64::from_le_bytes(length.try_into().ok()?)).ok()?;
    let (header, mut rest) = rest.split_at_checked(length)?;
    let mut made: Made = serde_json::from_slice(header).ok()?;
    for document in &mut made.documents {
        let (pdf, after) = rest.split_at_checked(document.size)?;
        document.pdf = pdf.to_vec();
        rest = after;
    }
    rest.is_empty().then_some(made)
}

#[cfg(test)]
mod tests {
    use super::unpack;

    #[test]
    fn half_an_answer_is_no_pack() {
        let header = br#"{"documents":[{"file_name":"1 Calculations (A).pdf","said":"3 sheets","size":4},
            {"file_name":"1 Summary (A).pdf","said":"1 page","size":5}],"pack":"","digests":{"job":"","practice":""},"code":0,"remarks":[],"times":""}"#;
        let mut whole = (header.len() as u64).to_le_bytes().to_vec();
        whole.extend(header);
        whole.extend(b"%PDF%PDF2");
        let made = unpack(&whole).expect("a pack");
        let pdfs: Vec<&[u8]> = made.documents.iter().map(|d| d.pdf.as_slice()).collect();
        assert_eq!(pdfs, [b"%PDF".as_slice(), b"%PDF2".as_slice()]);
        assert!(unpack(&whole[..whole.len() - 1]).is_none(), "a byte is missing");
        assert!(unpack(&whole[..40]).is_none() && unpack(b"").is_none());
    }
}
