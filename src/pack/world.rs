//! The closed world in which the templates run: every file is in the program or in memory.

use std::collections::HashMap;
use std::path::PathBuf;
use std::sync::OnceLock;

use typst::diag::{FileError, FileResult};
use typst::foundations::{Bytes, Datetime, Duration};
use typst::syntax::{FileId, RootedPath, Source, VirtualPath, VirtualRoot};
use typst::text::{Font, FontBook};
use typst::utils::LazyHash;
use typst::{Library, LibraryExt};

use super::look::{Look, Style};

/// What is set: each from a main template of its own.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Kind {
    /// The calculation pack.
    Pack,
    /// The summary for the client.
    Client,
}

impl Kind {
    const fn main(self) -> &'static str {
        match self {
            Self::Pack => "/templates/pack.typ",
            Self::Client => "/templates/client.typ",
        }
    }
}

/// The templates by their virtual paths.
pub(super) const TEMPLATES: &[(&str, &str)] = &[
    ("/templates/client.typ", include_str!("../../templates/client.typ")),
    ("/templates/pack.typ", include_str!("../../templates/pack.typ")),
    ("/templates/parts/back.typ", include_str!("../../templates/parts/back.typ")),
    ("/templates/parts/photographs.typ", include_str!("../../templates/parts/photographs.typ")),
    ("/templates/parts/source.typ", include_str!("../../templates/parts/source.typ")),
    ("/templates/parts/columns.typ", include_str!("../../templates/parts/columns.typ")),
    ("/templates/parts/blocks.typ", include_str!("../../templates/parts/blocks.typ")),
    ("/templates/parts/date.typ", include_str!("../../templates/parts/date.typ")),
    ("/templates/parts/drawing.typ", include_str!("../../templates/parts/drawing.typ")),
    ("/templates/parts/front.typ", include_str!("../../templates/parts/front.typ")),
    ("/templates/parts/furniture.typ", include_str!("../../templates/parts/furniture.typ")),
    ("/templates/parts/math.typ", include_str!("../../templates/parts/math.typ")),
    ("/templates/parts/row.typ", include_str!("../../templates/parts/row.typ")),
    ("/templates/parts/scale.typ", include_str!("../../templates/parts/scale.typ")),
    ("/templates/parts/schedule.typ", include_str!("../../templates/parts/schedule.typ")),
    ("/templates/parts/section.typ", include_str!("../../templates/parts/section.typ")),
    ("/templates/parts/style.typ", include_str!("../../templates/parts/style.typ")),
    ("/templates/parts/table.typ", include_str!("../../templates/parts/table.typ")),
];

/// The faces of `fonts/`: text upright, italic and semibold, mathematics, listing.
const FONTS: &[&[u8]] = &[
    include_bytes!("../../fonts/STIXTwoText-Regular.ttf"),
    include_bytes!("../../fonts/STIXTwoText-Italic.ttf"),
    include_bytes!("../../fonts/STIXTwoText-SemiBold.ttf"),
    include_bytes!("../../fonts/STIXTwoMath-Regular.ttf"),
    include_bytes!("../../fonts/IBMPlexMono-Regular.ttf"),
];

const DATA: &str = "/data.json";
/// What the templates read of the practice.
const STYLE: &str = "/house.json";

/// What never changes between packs, made once in a process.
struct Fixed {
    library: LazyHash<Library>,
    book: LazyHash<FontBook>,
    fonts: Vec<Font>,
    sources: HashMap<FileId, Source>,
}

fn fixed() -> &'static Fixed {
    static FIXED: OnceLock<Fixed> = OnceLock::new();
    FIXED.get_or_init(|| {
        let fonts: Vec<Font> = FONTS.iter().flat_map(|data| Font::iter(Bytes::new(*data))).collect();
        let source = |(path, text): &(&str, &str)| {
            let id = id_of(path).expect("the templates have plain paths");
            (id, Source::new(id, (*text).to_owned()))
        };
        Fixed {
            library: LazyHash::new(Library::builder().build()),
            book: LazyHash::new(FontBook::from_fonts(&fonts)),
            fonts,
            sources: TEMPLATES.iter().map(source).collect(),
        }
    })
}

/// The typesetter's name for a virtual path. Names are kept for the life of the process and
/// there are 65,535 of them, so paths must not vary from pack to pack.
fn id_of(path: &str) -> Option<FileId> {
    let path = VirtualPath::new(path).ok()?;
    Some(RootedPath::new(VirtualRoot::Project, path).intern())
}

/// The faces that are in the program.
pub(super) fn own_faces() -> &'static [Font] {
    &fixed().fonts
}

/// One pack's files: templates and fonts from the program, data and photographs from memory, and what a practice has
/// in place of ours.
pub(super) struct World {
    main: FileId,
    files: HashMap<FileId, Bytes>,
    /// Templates of the practice.
    sources: HashMap<FileId, Source>,
    /// Faces of the practice, behind ours in the book that names them all.
    faces: Option<(LazyHash<FontBook>, Vec<Font>)>,
}

impl World {
    /// The world of one pack. A file whose path is not a plain virtual path is left out, and
    /// a template that asks for it says that it was not found.
    pub(super) fn new(kind: Kind, json: Vec<u8>, files: &[(String, Vec<u8>)], look: Option<&Look>) -> Self {
        fixed();
        let mut world = Self {
            main: id_of(kind.main()).expect("a main template has a plain path"),
            files: HashMap::new(),
            sources: HashMap::new(),
            faces: None,
        };
        for (path, bytes) in files {
            world.hold(path, bytes.clone());
        }
        let style = look.map_or_else(Style::default, |h| h.style.clone());
        world.hold(STYLE, serde_json::to_vec(&style).unwrap_or_default());
        world.hold(DATA, json);
        if let Some(look) = look {
            world.furnish(look);
        }
        world
    }

    fn hold(&mut self, path: &str, bytes: Vec<u8>) {
        if let Some(id) = id_of(path) {
            self.files.insert(id, Bytes::new(bytes));
        }
    }

    fn furnish(&mut self, look: &Look) {
        if let (Some(mark), Some(bytes)) = (&look.style.logo, &look.logo) {
            self.hold(&mark.path, bytes.clone());
        }
        for (path, bytes) in &look.templates {
            let path = format!("/templates/{path}");
            let source = std::str::from_utf8(bytes).ok().filter(|_| path.ends_with(".typ")).zip(id_of(&path));
            match source {
                Some((text, id)) => drop(self.sources.insert(id, Source::new(id, text.to_owned()))),
                None => self.hold(&path, bytes.clone()),
            }
        }
        if !look.fonts.is_empty() {
            let book = FontBook::from_fonts(own_faces().iter().chain(&look.fonts));
            self.faces = Some((LazyHash::new(book), look.fonts.clone()));
        }
    }
}

impl typst::World for World {
    fn library(&self) -> &LazyHash<Library> {
        &fixed().library
    }

    fn book(&self) -> &LazyHash<FontBook> {
        self.faces.as_ref().map_or(&fixed().book, |(book, _)| book)
    }

    fn main(&self) -> FileId {
        self.main
    }

    fn source(&self, id: FileId) -> FileResult<Source> {
        self.sources.get(&id).or_else(|| fixed().sources.get(&id)).cloned().ok_or_else(|| missing(id))
    }

    fn file(&self, id: FileId) -> FileResult<Bytes> {
        self.files.get(&id).cloned().ok_or_else(|| missing(id))
    }

    fn font(&self, index: usize) -> Option<Font> {
        let behind = || self.faces.as_ref()?.1.get(index.checked_sub(own_faces().len())?);
        own_faces().get(index).or_else(behind).cloned()
    }

    /// No clock: a pack's dates come from its data alone.
    fn today(&self, _offset: Option<Duration>) -> Option<Datetime> {
        None
    }
}

fn missing(id: FileId) -> FileError {
    FileError::NotFound(PathBuf::from(id.get().vpath().get_with_slash()))
}
