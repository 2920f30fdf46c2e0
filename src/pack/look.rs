//! How the packs of a practice look: its mark, its face and its templates, checked before anything is set.

use std::fmt;
use std::io::Cursor;

use image::{ImageFormat, ImageReader, Limits};
use serde::Serialize;
use typst::foundations::Bytes;
use typst::text::{Font, FontStyle};
use usvg::roxmltree;

use super::world;

/// The files of a practice, read but not yet looked at. Names are relative to the practice file.
#[derive(Debug, Clone, Default)]
pub struct Assets {
    /// Bytes of the logo.
    pub logo: Option<Vec<u8>>,
    /// Faces: name and bytes.
    pub fonts: Vec<(String, Vec<u8>)>,
    /// Templates and what they use: path below the folder of templates, and bytes.
    pub templates: Vec<(String, Vec<u8>)>,
}

/// What a practice wants of its pages. Paths are relative to the practice file.
#[derive(Debug, Clone, Default)]
pub struct Wanted {
    /// Name, as on its letters.
    pub name: String,
    /// Address, line by line.
    pub address: Vec<String>,
    /// How a client reaches it, or empty.
    pub contact: String,
    /// Sentences that stand with the limits of every pack: they must have glyphs.
    pub notes: Vec<String>,
    /// Colour of headings, `#1f3d52`.
    pub accent: Option<String>,
    /// Its mark.
    pub logo: Option<Logo>,
    /// Family of the running text, and the folder that holds it.
    pub face: Option<(String, String)>,
    /// Folder of templates.
    pub templates: Option<String>,
}

/// A mark as it is wanted.
#[derive(Debug, Clone)]
pub struct Logo {
    /// File, SVG or PNG.
    pub file: String,
    /// What it shows, read aloud.
    pub words: String,
    /// Height on a first page, mm.
    pub height: f64,
}

/// The look of a practice's packs: every file of it can be used.
#[derive(Debug, Clone)]
pub struct Look {
    pub(super) style: Style,
    pub(super) logo: Option<Vec<u8>>,
    pub(super) fonts: Vec<Font>,
    pub(super) templates: Vec<(String, Vec<u8>)>,
}

/// What `style.typ` reads.
#[derive(Debug, Clone, PartialEq, Serialize)]
pub(super) struct Style {
    /// Name of the practice, or empty.
    pub(super) name: String,
    /// Address, line by line.
    pub(super) address: Vec<String>,
    /// How a client reaches it, or empty.
    pub(super) contact: String,
    /// Colour of headings.
    pub(super) accent: String,
    /// Family of the running text.
    pub(super) face: String,
    /// Size of that face, in parts of ours, at which as many letters stand in a line.
    pub(super) scale: f64,
    /// Width of a figure in em of the face.
    pub(super) digit: f64,
    /// The mark, where there is one.
    pub(super) logo: Option<Mark>,
}

/// A practice's mark on the pages.
#[derive(Debug, Clone, PartialEq, Serialize)]
pub(super) struct Mark {
    /// Virtual path.
    pub(super) path: String,
    /// What it shows.
    pub(super) words: String,
    /// Height on a first page, mm.
    pub(super) height: f64,
    /// Width over height.
    pub(super) aspect: f64,
}

/// Our own look.
impl Default for Style {
    fn default() -> Self {
        Self {
            name: String::new(),
            address: Vec::new(),
            contact: String::new(),
            accent: ACCENT.to_owned(),
            face: TEXT_FACE.to_owned(),
            scale: 1.0,
            digit: 0.5,
            logo: None,
        }
    }
}

const ACCENT: &str = "#1f3d52";
const TEXT_FACE: &str = "STIX Two Text";

/// Why a file of a practice cannot be used: which, what is wrong, and what to do.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Unusable {
    /// Path as the practice file has it.
    pub file: String,
    /// What is wrong.
    pub what: String,
    /// What to do, a whole sentence.
    pub help: &'static str,
}

impl fmt::Display for Unusable {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "{}: {}", self.file, self.what)
    }
}

impl Look {
    /// What is wanted, with its files.
    ///
    /// # Errors
    /// [`Unusable`] for the first file that cannot be used.
    pub fn new(wanted: &Wanted, assets: Assets) -> Result<Self, Unusable> {
        let mut style = Style {
            name: wanted.name.clone(),
            address: wanted.address.clone(),
            contact: wanted.contact.clone(),
            ..Style::default()
        };
        if let Some(accent) = &wanted.accent {
            style.accent.clone_from(accent);
        }
        if let (Some(logo), Some(bytes)) = (&wanted.logo, &assets.logo) {
            style.logo = Some(mark(logo, bytes)?);
        }
        let mut fonts = Vec::new();
        if let Some((family, folder)) = &wanted.face {
            fonts = faces(&assets.fonts)?;
            let regular = regular(family, folder, &fonts)?;
            let ours = world::own_faces().iter().find(|f| f.info().family == TEXT_FACE);
            style.scale = ours.map_or(1.0, |ours| fitting(run(ours, SAMPLE) / run(regular, SAMPLE)));
            style.digit = (run(regular, FIGURES) / 10.0 * 1000.0).round() / 1000.0;
            style.face.clone_from(family);
        }
        written(wanted, &style.face, &fonts)?;
        let templates = match &wanted.templates {
            Some(folder) => templates(folder, assets.templates)?,
            None => Vec::new(),
        };
        Ok(Self { templates, style, logo: assets.logo, fonts })
    }

    /// Whether its sheets are set by templates of its own.
    pub fn own_templates(&self) -> bool {
        !self.templates.is_empty()
    }
}

fn unusable(file: &str, what: impl Into<String>, help: &'static str) -> Unusable {
    Unusable { file: file.to_owned(), what: what.into(), help }
}

/// Most pixels along a side of a logo, bytes of its file, and width over height either way.
const LOGO_SIDE: u32 = 6000;
const LOGO_BYTES: usize = 2 << 20;
const LOGO_ASPECT: f64 = 6.0;
/// Most nodes of a drawing.
const NODES: u32 = 100_000;

const LOGO_HELP: &str =
    "Give an SVG whose letters are outlines, or a PNG; up to six times as wide as high, 2 MB or less.";

fn mark(logo: &Logo, bytes: &[u8]) -> Result<Mark, Unusable> {
    let refuse = |what: String| unusable(&logo.file, what, LOGO_HELP);
    if bytes.len() > LOGO_BYTES {
        return Err(refuse(format!("the logo has {} MB", bytes.len() >> 20)));
    }
    let svg = logo.file.to_lowercase().ends_with(".svg");
    let (wide, high) = if svg { svg_size(bytes) } else { png_size(bytes) }.map_err(refuse)?;
    let aspect = wide / high;
    if !(1.0 / LOGO_ASPECT..=LOGO_ASPECT).contains(&aspect) {
        return Err(refuse(format!("the logo is {aspect:.1} times as wide as high")));
    }
    Ok(Mark {
        path: format!("/house/logo.{}", if svg { "svg" } else { "png" }),
        words: logo.words.clone(),
        height: logo.height,
        aspect,
    })
}

fn png_size(bytes: &[u8]) -> Result<(f64, f64), String> {
    let broken = |why: &dyn fmt::Display| format!("the logo does not read as a PNG: {why}");
    let mut reader = ImageReader::with_format(Cursor::new(bytes), ImageFormat::Png);
    let mut limits = Limits::default();
    limits.max_image_width = Some(LOGO_SIDE);
    limits.max_image_height = Some(LOGO_SIDE);
    reader.limits(limits);
    let picture = reader.decode().map_err(|why| broken(&why))?;
    Ok((f64::from(picture.width()), f64::from(picture.height())))
}

/// Letters of a drawing would need faces that are not there, and pictures in it may lie in other files.
fn svg_size(bytes: &[u8]) -> Result<(f64, f64), String> {
    let text = std::str::from_utf8(bytes).map_err(|_| "the logo is not UTF-8 text".to_owned())?;
    let broken = |why: &dyn fmt::Display| format!("the logo does not read as an SVG: {why}");
    let how = roxmltree::ParsingOptions { allow_dtd: true, nodes_limit: NODES, ..Default::default() };
    let tree = roxmltree::Document::parse_with_options(text, how).map_err(|why| broken(&why))?;
    for (name, what) in [
        ("text", "letters that are not outlines"),
        ("foreignObject", "foreign content"),
        ("image", "a picture"),
    ] {
        if tree.descendants().any(|node| node.tag_name().name() == name) {
            return Err(format!("the logo holds {what}"));
        }
    }
    let size = usvg::Tree::from_xmltree(&tree, &usvg::Options::default()).map_err(|why| broken(&why))?.size();
    Ok((f64::from(size.width()), f64::from(size.height())))
}

const FONT_HELP: &str = "Put TrueType or OpenType files (.ttf, .otf) that may be embedded into the folder, upright in regular and semibold or bold.";

fn faces(files: &[(String, Vec<u8>)]) -> Result<Vec<Font>, Unusable> {
    let mut fonts = Vec::new();
    for (name, bytes) in files {
        let face = ttf_parser::Face::parse(bytes, 0)
            .map_err(|why| unusable(name, format!("it does not read as a face: {why}"), FONT_HELP))?;
        if face.permissions() == Some(ttf_parser::Permissions::Restricted) {
            return Err(unusable(
                name,
                "its maker does not allow it to be embedded in a document",
                FONT_HELP,
            ));
        }
        fonts.extend(Font::iter(Bytes::new(bytes.clone())));
    }
    Ok(fonts)
}

/// Signs that every pack prints as text. What else a face lacks comes from ours.
const NEEDED: &str =
    "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789 .,:;!?'\"()[]/%&+-=*#_@£°²³·×–’";
/// A sample by which the width of letters is compared.
const SAMPLE: &str = "the wind on the length of wall that stays is taken by its foot; 0.84 of 1.00 kN/m2";
const FIGURES: &str = "0123456789";
/// How far the size of a face may be drawn in or let out.
const SCALE: (f64, f64) = (0.8, 1.1);

fn fitting(scale: f64) -> f64 {
    (scale.clamp(SCALE.0, SCALE.1) * 1000.0).round() / 1000.0
}

/// The upright regular face of the family, which must have a heavier one beside it and every sign that packs need.
fn regular<'f>(family: &str, folder: &str, fonts: &'f [Font]) -> Result<&'f Font, Unusable> {
    let refuse = |what: String| unusable(folder, what, FONT_HELP);
    let same = |font: &&Font| font.info().family.eq_ignore_ascii_case(family);
    let upright: Vec<&'f Font> =
        fonts.iter().filter(same).filter(|f| f.info().variant.style == FontStyle::Normal).collect();
    let mut there: Vec<&str> = fonts.iter().map(|f| f.info().family.as_str()).collect();
    there.sort_unstable();
    there.dedup();
    if upright.is_empty() {
        return Err(refuse(match there.as_slice() {
            [] => "there is no face in the folder".to_owned(),
            there => format!("no upright face of the family {family} is there, only {}", there.join(", ")),
        }));
    }
    let weight = |f: &&&Font| f.info().variant.weight.to_number();
    let regular = upright.iter().min_by_key(|f| weight(f).abs_diff(400)).filter(|f| weight(f) < 600);
    let heavy = upright.iter().any(|f| weight(&f) >= 600);
    let Some(regular) = regular.filter(|_| heavy) else {
        return Err(refuse(format!(
            "the family {family} has not both a regular face and a semibold or bold one; families that are there: {}",
            there.join(", ")
        )));
    };
    for font in &upright {
        let lacking: String = NEEDED.chars().filter(|c| !holds(font, *c)).collect();
        if !lacking.is_empty() {
            return Err(refuse(format!("a face of the family {family} has no glyph for {lacking}")));
        }
    }
    Ok(regular)
}

fn holds(font: &Font, sign: char) -> bool {
    font.info().coverage.contains(u32::from(sign))
}

/// Length of a text in em, at least 1.
fn run(font: &Font, text: &str) -> f64 {
    let Ok(face) = ttf_parser::Face::parse(font.data(), font.index()) else { return 1.0 };
    let glyphs = text.chars().filter_map(|c| face.glyph_index(c));
    let units: f64 = glyphs.filter_map(|g| face.glyph_hor_advance(g)).map(f64::from).sum();
    (units / f64::from(face.units_per_em())).max(1.0)
}

/// What the practice has printed of itself must have glyphs in its face or in ours.
fn written(wanted: &Wanted, family: &str, fonts: &[Font]) -> Result<(), Unusable> {
    let own = fonts.iter().filter(|f| f.info().family.eq_ignore_ascii_case(family));
    let all: Vec<&Font> = own.chain(world::own_faces()).collect();
    let words =
        std::iter::once(&wanted.name).chain(&wanted.address).chain([&wanted.contact]).chain(&wanted.notes);
    for text in words {
        if let Some(sign) = text.chars().find(|c| !c.is_whitespace() && !all.iter().any(|f| holds(f, *c))) {
            return Err(unusable(
                text,
                format!("no face has a glyph for {sign}"),
                "Write it in other letters, or give a text face that holds them.",
            ));
        }
    }
    Ok(())
}

const TEMPLATE_HELP: &str =
    "Copy a file of the program's own templates/ folder under the same name and change that.";

fn templates(folder: &str, files: Vec<(String, Vec<u8>)>) -> Result<Vec<(String, Vec<u8>)>, Unusable> {
    let known =
        |path: &str| world::TEMPLATES.iter().any(|(own, _)| own.strip_prefix("/templates/") == Some(path));
    if !files.iter().any(|(path, _)| known(path)) {
        return Err(unusable(folder, "none of its files takes the place of a template", TEMPLATE_HELP));
    }
    for (path, bytes) in files.iter().filter(|(path, _)| path.ends_with(".typ")) {
        if std::str::from_utf8(bytes).is_err() {
            return Err(unusable(&format!("{folder}/{path}"), "it is not UTF-8 text", TEMPLATE_HELP));
        }
    }
    Ok(files)
}

#[cfg(test)]
mod tests {
    use super::*;

    /// At the size of a wider face as many letters of the sample stand in a line, to a thousandth; its figures are 600
    /// of 1000 units wide (its `hmtx` table).
    #[test]
    fn a_wider_face_is_set_smaller() {
        let files = ["Regular", "Bold"].map(|weight| {
            let path = format!("jobs/practice/fonts/IBMPlexSans-{weight}.ttf");
            (path.clone(), std::fs::read(path).expect("a face"))
        });
        let wanted =
            Wanted { face: Some(("IBM Plex Sans".to_owned(), "fonts".to_owned())), ..Wanted::default() };
        let look = Look::new(&wanted, Assets { fonts: files.into(), ..Assets::default() }).expect("a look");
        let ours = world::own_faces().iter().find(|f| f.info().family == TEXT_FACE).expect("our face");
        let theirs = run(&look.fonts[0], SAMPLE) * look.style.scale;
        assert!((theirs / run(ours, SAMPLE) - 1.0).abs() < 1e-3, "{theirs}");
        assert!(look.style.scale < 1.0);
        assert_eq!(look.style.digit, 0.6);
        // Ours are 495 wide, reckoned as 500: a column is rather too wide than too narrow.
        let own = run(ours, FIGURES) / 10.0;
        assert!(own <= Style::default().digit && own > Style::default().digit - 0.01, "{own}");
    }
}
