//! A practice and its files, found and read from disk.

use std::path::{Path, PathBuf};

use crate::building::Practice;
use crate::error::{Error, Trouble};
use crate::files;
use crate::job::practice;
use crate::pack::Look;
use crate::pack::look::{Assets, Logo, Unusable, Wanted};

/// A practice ready to set packs.
#[derive(Clone, Debug)]
pub struct House {
    /// The practice.
    pub practice: Practice,
    /// How its pages look.
    pub look: Look,
}

impl House {
    /// A practice with its files.
    ///
    /// # Errors
    /// [`Unusable`] for the first file that cannot be used.
    pub fn new(practice: Practice, assets: Assets) -> Result<Self, Unusable> {
        let look = Look::new(&wanted(&practice), assets)?;
        Ok(Self { practice, look })
    }
}

fn wanted(p: &Practice) -> Wanted {
    Wanted {
        name: p.name.clone(),
        address: p.address.clone(),
        contact: p.contact.clone().unwrap_or_default(),
        notes: p.notes.clone(),
        accent: p.accent.map(|a| a.hex()),
        logo: p.logo.as_ref().map(|l| Logo {
            file: l.file.clone(),
            words: l.words.clone(),
            height: l.height.base(),
        }),
        face: p.face.clone().zip(p.fonts.clone()),
        templates: p.templates.clone(),
    }
}

/// The name of a practice file beside a job file.
pub const FILE: &str = "practice.toml";

/// Largest logo, face and template, bytes.
const LOGO: u64 = 4 << 20;
const FONT: u64 = 12 << 20;
const TEMPLATE: u64 = 2 << 20;
/// Most files in a folder of faces or templates.
const FILES: usize = 64;

/// The practice file of a job: the one that was named, the one beside the job file, or else the usual one.
pub fn find(named: Option<&Path>, job: &Path, usual: Option<PathBuf>) -> Option<PathBuf> {
    let beside = || Some(job.parent().unwrap_or(Path::new("")).join(FILE)).filter(|p| p.is_file());
    named.map(Path::to_owned).or_else(beside).or(usual)
}

/// Reads a practice file alone, without the files that it names.
///
/// # Errors
/// [`Error::File`] where it cannot be read, [`Error::Job`] with everything that is wrong with it.
pub fn read(file: &Path) -> Result<Practice, Error> {
    Ok(practice::read(&files::name(file), &files::read_practice(file)?)?)
}

/// Reads a practice file and everything that it names.
///
/// # Errors
/// As [`read`]; [`Error::File`] for a logo, a face or a template that cannot be used.
pub fn open(file: &Path) -> Result<House, Error> {
    let practice = read(file)?;
    let folder = file.parent().unwrap_or(Path::new(""));
    let assets = assets(&practice, folder)?;
    House::new(practice, assets).map_err(|Unusable { file: path, what, help }| Error::File {
        path: files::name(&folder.join(path)),
        trouble: Trouble::Content(what),
        help: help.to_owned(),
    })
}

fn assets(practice: &Practice, folder: &Path) -> Result<Assets, Error> {
    let mut out = Assets::default();
    if let Some(logo) = &practice.logo {
        let help = "The logo is looked for beside the practice file: check `logo` under [style].";
        out.logo = Some(files::read_named(&folder.join(&logo.file), LOGO, "logo", help)?);
    }
    if let Some(fonts) = &practice.fonts {
        let help = "The folder of faces is looked for beside the practice file: check `fonts` under [style].";
        let all = files::folder_of(&folder.join(fonts), FILES, FONT, help)?;
        let face = |name: &str| [".ttf", ".otf"].iter().any(|e| name.to_lowercase().ends_with(e));
        out.fonts =
            all.into_iter().filter(|(n, _)| face(n)).map(|(n, b)| (format!("{fonts}/{n}"), b)).collect();
    }
    if let Some(templates) = &practice.templates {
        let help = "The folder of templates is looked for beside the practice file: check `templates` under [style].";
        out.templates = files::folder_of(&folder.join(templates), FILES, TEMPLATE, help)?;
    }
    Ok(out)
}
