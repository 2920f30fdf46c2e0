//! One pack in a process of its own: what `sheet` of several files starts, and what that hands back.
//!
//! On standard output: the length of the header (eight bytes, little end first), the header as JSON, the
//! PDF. What goes wrong is worded on standard error.

use std::io::{IsTerminal as _, Write as _};
use std::path::Path;
use std::process::{Command, Stdio};

use super::{FAILED, Made, Stopped, complain};
use crate::error::Error;
use crate::many;

/// Sets one job and writes the pack to standard output. Yields the exit code.
pub fn hand_back(file: &Path) -> u8 {
    let made = match many::guarded(|| Made::here(file)) {
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
        .and_then(|()| out.write_all(&made.pdf))
        .and_then(|()| out.flush());
    if written.is_ok() { made.code } else { FAILED }
}

/// Has another process set `file`. Where none can be started this one does it.
pub fn ask(file: &Path) -> Result<Made, Stopped> {
    let Ok(program) = std::env::current_exe() else { return Ok(Made::here(file)?) };
    let mut command = Command::new(program);
    command.arg("set").arg(file).stdin(Stdio::null());
    // The cores are shared out by jobs; pieces of a job stay on its core.
    command.env("RAYON_NUM_THREADS", "1");
    if std::io::stderr().is_terminal() && std::env::var_os("NO_COLOR").is_none() {
        command.env("CLICOLOR_FORCE", "1");
    }
    let Ok(answer) = command.output() else { return Ok(Made::here(file)?) };
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
    let (header, pdf) = rest.split_at_checked(length)?;
    let mut made: Made = serde_json::from_slice(header).ok()?;
    made.pdf = pdf.to_vec();
    Some(made)
}

#[cfg(test)]
mod tests {
    use super::unpack;

    #[test]
    fn half_an_answer_is_no_pack() {
        let header =
            br#"{"file_name":"1 Calculations (A).pdf","pages":3,"outcome":"adequate","code":0,"times":""}"#;
        let mut whole = (header.len() as u64).to_le_bytes().to_vec();
        whole.extend(header);
        whole.extend(b"%PDF");
        let made = unpack(&whole).expect("a pack");
        assert_eq!((made.pages, made.pdf.as_slice()), (3, b"%PDF".as_slice()));
        assert!(unpack(&whole[..40]).is_none() && unpack(b"").is_none());
    }
}
