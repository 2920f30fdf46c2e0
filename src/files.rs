//! Files in and out: job files read with words for what goes wrong, files written whole or not at all.

use std::collections::HashMap;
use std::io::{Read as _, Write as _};
use std::path::{Path, PathBuf};

use sha2::{Digest as _, Sha256};

use crate::error::{Error, Trouble};

/// Largest job file, bytes: a thousand times a long one.
const LARGEST: u64 = 16 << 20;

/// SHA-256 of a file's text, in hexadecimal.
pub fn digest(text: &str) -> String {
    Sha256::digest(text.as_bytes()).iter().map(|b| format!("{b:02x}")).collect()
}

/// A path as it is shown.
pub fn name(file: &Path) -> String {
    file.display().to_string()
}

fn trouble(file: &Path, trouble: Trouble, help: &str) -> Error {
    Error::File { path: name(file), trouble, help: help.to_owned() }
}

fn content(file: &Path, what: &str, help: &str) -> Error {
    trouble(file, Trouble::Content(what.to_owned()), help)
}

/// Largest pack that is read, bytes.
const LARGEST_PACK: u64 = 512 << 20;

/// Largest file with a key or certificates, bytes.
const LARGEST_KEY: u64 = 1 << 20;

/// The text of a job file.
///
/// # Errors
/// [`Error::File`] where it is not there, a folder, not UTF-8 or too large.
pub fn read(file: &Path) -> Result<String, Error> {
    let helps = [
        "Check the spelling of the path; 'perpend start' writes a job to begin from.",
        "Name the job files in it: folder/*.toml.",
    ];
    text(file, "job file", helps)
}

/// The text of a practice file.
///
/// # Errors
/// As [`read`].
pub fn read_practice(file: &Path) -> Result<String, Error> {
    const HELP: &str =
        "Check the spelling of the path; 'perpend start --practice' writes a practice file to begin from.";
    text(file, "practice file", [HELP, HELP])
}

fn text(file: &Path, kind: &str, helps: [&str; 2]) -> Result<String, Error> {
    String::from_utf8(whole(file, LARGEST, kind, helps)?)
        .map_err(|_| content(file, "it is not UTF-8 text", "Save it as UTF-8 in a text editor."))
}

/// The bytes of a file that a job or a practice names, at most `largest`.
///
/// # Errors
/// [`Error::File`] where it is not there, a folder, or too large.
pub fn read_named(file: &Path, largest: u64, kind: &str, help: &str) -> Result<Vec<u8>, Error> {
    whole(file, largest, kind, [help, help])
}

/// Every file in a folder and below, its path with `/` between folders and its bytes, in the order of the paths.
/// Hidden files are passed over; links are not followed.
///
/// # Errors
/// [`Error::File`] where the folder cannot be read, or holds more than `most` files, or one larger than `largest`.
pub fn folder_of(
    folder: &Path,
    most: usize,
    largest: u64,
    help: &str,
) -> Result<Vec<(String, Vec<u8>)>, Error> {
    let mut out = Vec::new();
    let mut waiting = vec![(folder.to_owned(), String::new())];
    while let Some((here, path)) = waiting.pop() {
        let listed = std::fs::read_dir(&here).and_then(Iterator::collect::<std::io::Result<Vec<_>>>);
        for entry in listed.map_err(|why| trouble(&here, Trouble::Read(why), help))? {
            let Ok(name) = entry.file_name().into_string() else { continue };
            let kind = entry.file_type().map_err(|why| trouble(&entry.path(), Trouble::Read(why), help))?;
            if name.starts_with('.') || kind.is_symlink() {
                continue;
            }
            let path = if path.is_empty() { name } else { format!("{path}/{name}") };
            if kind.is_dir() {
                waiting.push((entry.path(), path));
            } else {
                out.push((path, whole(&entry.path(), largest, "file of a practice", [help, help])?));
            }
            if out.len() + waiting.len() > most {
                return Err(content(folder, &format!("it holds more than {most} files"), help));
            }
        }
    }
    out.sort();
    Ok(out)
}

/// The bytes of a pack.
///
/// # Errors
/// [`Error::File`] where it is not there, a folder, or too large.
pub fn read_pack(file: &Path) -> Result<Vec<u8>, Error> {
    const HELP: &str = "Name a pack that 'perpend sheet' wrote.";
    whole(file, LARGEST_PACK, "pack", [HELP, HELP])
}

/// The bytes of a key or a certificate; they are wiped from memory when they are no longer needed.
///
/// # Errors
/// [`Error::File`] where it is not there, a folder, or too large.
pub fn read_key(file: &Path) -> Result<zeroize::Zeroizing<Vec<u8>>, Error> {
    const HELP: &str = "Name the file with your key or certificate: PEM or PKCS#12.";
    whole(file, LARGEST_KEY, "key", [HELP, HELP]).map(zeroize::Zeroizing::new)
}

/// All bytes of a file of at most `largest`; `helps` says what to do about it, and about a folder of that name.
fn whole(file: &Path, largest: u64, kind: &str, helps: [&str; 2]) -> Result<Vec<u8>, Error> {
    if file.is_dir() {
        return Err(content(file, "it is a folder", helps[1]));
    }
    let mut bytes = Vec::new();
    std::fs::File::open(file)
        .and_then(|open| open.take(largest + 1).read_to_end(&mut bytes))
        .map_err(|why| trouble(file, Trouble::Read(why), helps[0]))?;
    if bytes.len() as u64 > largest {
        return Err(content(file, &format!("it is larger than any {kind}"), helps[0]));
    }
    Ok(bytes)
}

/// Whether a file says that it is a PDF, by its name or by how it begins.
pub fn is_pdf(file: &Path) -> bool {
    let named = file.extension().is_some_and(|e| e.eq_ignore_ascii_case("pdf"));
    let begins = || {
        let mut head = [0; 5];
        std::fs::File::open(file)
            .and_then(|mut open| open.read_exact(&mut head))
            .is_ok_and(|()| &head == b"%PDF-")
    };
    named || begins()
}

/// Makes the folder for packs where it is not there yet.
///
/// # Errors
/// [`Error::File`] where it cannot be made, or is something else than a folder.
pub fn folder(folder: &Path) -> Result<(), Error> {
    const HELP: &str = "Name a folder that is there, or one that may be made there.";
    if folder.exists() && !folder.is_dir() {
        return Err(content(folder, "it is not a folder", HELP));
    }
    std::fs::create_dir_all(folder).map_err(|why| trouble(folder, Trouble::Write(why), HELP))
}

/// Writes a new file whole; one that is there already is left alone.
///
/// # Errors
/// [`Error::File`] where there is one already, or it cannot be written.
pub fn write_new(file: &Path, bytes: &[u8]) -> Result<(), Error> {
    free(file)?;
    Staged::new(file.to_owned(), bytes)?.file.persist_noclobber(file).map_err(|e| match e.error.kind() {
        std::io::ErrorKind::AlreadyExists => there(file),
        _ => unwritten(file, e.error),
    })
}

/// Whether a new file may be written there.
///
/// # Errors
/// [`Error::File`] where there is one already.
pub fn free(file: &Path) -> Result<(), Error> {
    if file.exists() { Err(there(file)) } else { Ok(()) }
}

fn there(file: &Path) -> Error {
    content(
        file,
        "a file of this name is there already; it was left alone",
        "Give another name, or move the file away first.",
    )
}

fn unwritten(path: &Path, why: std::io::Error) -> Error {
    trouble(
        path,
        Trouble::Write(why),
        "Check that the folder is there and may be written to; nothing was changed.",
    )
}

/// A file written whole beside its place. Dropped without being placed, it leaves nothing behind.
pub struct Staged {
    file: tempfile::TempPath,
    /// Its place.
    pub path: PathBuf,
}

impl Staged {
    /// Writes the file beside `path`.
    ///
    /// # Errors
    /// [`Error::File`] where the folder cannot be written to.
    pub fn new(path: PathBuf, bytes: &[u8]) -> Result<Self, Error> {
        let folder = path.parent().filter(|p| !p.as_os_str().is_empty()).unwrap_or(Path::new("."));
        let write = || -> std::io::Result<tempfile::TempPath> {
            let mut file = tempfile::NamedTempFile::new_in(folder)?;
            file.write_all(bytes)?;
            readable(&file)?;
            file.as_file().sync_all()?;
            Ok(file.into_temp_path())
        };
        match write() {
            Ok(file) => Ok(Self { file, path }),
            Err(why) => Err(unwritten(&path, why)),
        }
    }

    /// Moves the file to its place, over what was there.
    ///
    /// # Errors
    /// [`Error::File`] where that cannot be; what was there is unchanged.
    pub fn place(self) -> Result<PathBuf, Error> {
        match self.file.persist(&self.path) {
            Ok(()) => Ok(self.path),
            Err(e) => Err(unwritten(&self.path, e.error)),
        }
    }
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

/// The packs of one call: two jobs of the same number and revision must not replace each other.
#[derive(Default)]
pub struct Taken(HashMap<PathBuf, String>);

impl Taken {
    /// Takes the place of a pack for the job file `of`.
    ///
    /// # Errors
    /// [`Error::File`] where another job file of this call has it already.
    pub fn take(&mut self, path: &Path, of: &Path) -> Result<(), Error> {
        let folder = path.parent().filter(|p| !p.as_os_str().is_empty()).unwrap_or(Path::new("."));
        let folder = std::fs::canonicalize(folder).unwrap_or_else(|_| folder.to_owned());
        let whole = folder.join(path.file_name().unwrap_or_default());
        if let Some(first) = self.0.get(&whole) {
            let what =
                format!("{first} has just been written there: both jobs have this number and revision");
            return Err(content(
                path,
                &what,
                "Give the jobs different numbers, or write them into different folders.",
            ));
        }
        self.0.insert(whole, name(of));
        Ok(())
    }
}
