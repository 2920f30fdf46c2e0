//! `sign`: a pack signed with a key of one's own.

use std::ffi::OsString;
use std::io::{BufRead as _, IsTerminal as _, Write as _};
use std::path::{Path, PathBuf};

use super::flags::As;
use super::{ADEQUATE, FAILED, complain, internal};
use crate::archive::sign::{self, Fault, Moment, Passphrase, Refused, Role, Signer};
use crate::error::{Error, Trouble};
use crate::{files, many};

/// The flags of `sign`.
pub struct Asked {
    pub pack: PathBuf,
    pub key: PathBuf,
    pub certificate: Option<PathBuf>,
    pub role: As,
    pub into: Option<PathBuf>,
    pub date: Option<String>,
}

/// Signs a pack into a new file. Yields the exit code.
pub fn sign(asked: &Asked) -> u8 {
    match internal(many::guarded(|| signed(asked))) {
        Ok(said) => {
            let _ = writeln!(anstream::stdout(), "{said}");
            ADEQUATE
        }
        Err(e) => {
            complain(&e);
            FAILED
        }
    }
}

fn signed(asked: &Asked) -> Result<String, Error> {
    let refused = |r: Refused| {
        let path = match r.fault {
            Fault::Pack => &asked.pack,
            Fault::Key => &asked.key,
            Fault::Certificate => asked.certificate.as_ref().unwrap_or(&asked.key),
        };
        Error::File { path: files::name(path), trouble: Trouble::Content(r.what), help: r.help.to_owned() }
    };
    let at = moment(asked.date.as_deref())?;
    let role = match asked.role {
        As::Made => Role::Made,
        As::Checked => Role::Checked,
    };
    let pack = files::read_pack(&asked.pack)?;
    let place = place(&asked.pack, asked.into.as_deref(), role);
    // Nobody should type a passphrase for a file that cannot be written.
    files::free(&place)?;
    let key = files::read_key(&asked.key)?;
    let certificate = asked.certificate.as_deref().map(files::read_key).transpose()?;
    let mut ask = || ask(&files::name(&asked.key));
    let signer = Signer::open(&key, certificate.as_deref().map(Vec::as_slice), &mut ask).map_err(refused)?;
    let bytes = sign::sign(&pack, &signer, role, at).map_err(refused)?;
    if let Some(into) = &asked.into {
        files::folder(into)?;
    }
    files::write_new(&place, &bytes)?;
    Ok(format!("{}: {} {}, {}", place.display(), role.words(), signer.name(), at.words()))
}

fn moment(date: Option<&str>) -> Result<Moment, Error> {
    let Some(date) = date else { return Ok(Moment::now()) };
    Moment::read(date).ok_or_else(|| Error::File {
        path: "--date".to_owned(),
        trouble: Trouble::Content(format!("{date} is no date")),
        help: "Write 2026-12-02, or 2026-12-02T14:05:00Z.".to_owned(),
    })
}

/// `2419 Calculations (A).pdf` becomes `2419 Calculations (A) signed.pdf`, and that `… signed, checked.pdf`.
fn place(pack: &Path, into: Option<&Path>, role: Role) -> PathBuf {
    let ends =
        |word: &str| pack.file_stem().is_some_and(|s| s.to_string_lossy().ends_with(&format!(" {word}")));
    let between = if Role::ALL.iter().any(|r| ends(r.ending())) { ", " } else { " " };
    let mut name: OsString = pack.file_stem().unwrap_or_default().to_owned();
    name.push(format!("{between}{}.pdf", role.ending()));
    into.or(pack.parent()).unwrap_or(Path::new("")).join(name)
}

/// The passphrase of a key: typed unseen on a terminal, else a line of standard input.
fn ask(key: &str) -> Result<Passphrase, Refused> {
    let nothing = || {
        Refused::key("its passphrase could not be read", "Type it when it is asked for; nothing was written.")
    };
    if std::io::stdin().is_terminal() {
        return rpassword::prompt_password(format!("Passphrase of {key}: "))
            .map(Passphrase::new)
            .map_err(|_| nothing());
    }
    let mut line = Passphrase::default();
    std::io::stdin().lock().read_line(&mut line).map_err(|_| nothing())?;
    let length = line.trim_end_matches(['\r', '\n']).len();
    line.truncate(length);
    Ok(line)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_signed_pack_has_a_name_of_its_own() {
        let name = |pack: &str, role| place(Path::new(pack), None, role).display().to_string();
        assert_eq!(name("a/2419 Calculations (A).pdf", Role::Made), "a/2419 Calculations (A) signed.pdf");
        assert_eq!(
            name("2419 Calculations (A) signed.pdf", Role::Checked),
            "2419 Calculations (A) signed, checked.pdf"
        );
        assert_eq!(name("x checked.pdf", Role::Made), "x checked, signed.pdf");
        let into = place(Path::new("a/x.pdf"), Some(Path::new("b")), Role::Made);
        assert_eq!(into, Path::new("b/x signed.pdf"));
    }
}
