//! The practice file: TOML text in, a [`Practice`] out, or everything that is wrong with the text. It is read like a job file.

use toml::de::DeTable;

use super::limits::Limits;
use super::reader::{Reader, Table};
use super::{all, basis, bearings, paths, syntax};
use crate::building::{Basis, Cause, Logo, Practice};
use crate::error::{Kind, Report};
use crate::files::digest;
use crate::quantity::Length;
use crate::quantity::colour::{CONTRAST, Colour};

const LOGO: Limits = Limits::new(5.0, 25.0, "mm");
/// Height of a logo without a word: a quarter of the head of a letter; common practice, no published source.
const LOGO_HEIGHT: Length = Length::new(12.0);
/// Most standing notes, and lines of an address.
const NOTES: usize = 12;
const ADDRESS: usize = 6;

/// The practice that a practice file describes.
///
/// # Errors
/// A [`Report`] with every diagnostic of the file.
pub fn read(name: &str, text: &str) -> Result<Practice, Report> {
    let reader = Reader::default();
    let (tree, errors) = DeTable::parse_recoverable(text);
    let practice = if errors.is_empty() {
        whole(&Table::new(&reader, "practice file".to_owned(), tree.get_ref(), 0..0))
    } else {
        syntax::record(&reader, text, &errors);
        None
    };
    let (diagnostics, warnings) = reader.into_parts();
    match practice {
        Some(practice) if diagnostics.is_empty() => {
            Ok(Practice { warnings, text: text.to_owned(), digest: digest(text), ..practice })
        }
        _ => Err(Report::new(name, text, diagnostics)),
    }
}

fn whole(root: &Table<'_>) -> Option<Practice> {
    let who = root.need("practice").table("practice").and_then(|t| who(&t));
    let style = match root.may("style").table("style") {
        Some(t) => style(&t),
        None => Some(Style::default()),
    };
    let basis_table = root.may("basis").table("basis");
    let basis = basis_table.as_ref().map(|t| basis::basis(Some(t), &Basis::usual()));
    let stone_tables = root.may("padstones").tables("padstone", "name");
    let padstones = all(&stone_tables, bearings::padstone);
    bearings::named_once(&stone_tables);
    root.finish();
    let (name, address, contact, notes) = who?;
    let style = style?;
    Some(Practice {
        basis: match basis {
            Some(basis) => Some(of_the_house(basis?)),
            None => None,
        },
        name,
        address,
        contact,
        notes,
        accent: style.accent,
        logo: style.logo,
        face: style.face,
        fonts: style.fonts,
        templates: style.templates,
        padstones: padstones?,
        text: String::new(),
        digest: String::new(),
        warnings: Vec::new(),
    })
}

/// The reasons say whose the factors are: they stand in the packs of every job that gives none.
fn of_the_house(basis: Basis) -> Basis {
    let told = |cause: Cause<f64>| match cause.reason.is_empty() {
        true => cause,
        false => Cause { reason: format!("By the practice's file: {}", cause.reason), ..cause },
    };
    Basis {
        gamma_m_compression: basis.gamma_m_compression.map(told),
        gamma_m_flexure: basis.gamma_m_flexure.map(told),
        gamma_m_shear: basis.gamma_m_shear.map(told),
        helping_factor: told(basis.helping_factor),
        ..basis
    }
}

type Who = (String, Vec<String>, Option<String>, Vec<String>);

fn who(t: &Table<'_>) -> Option<Who> {
    let name = t.need("name").line();
    let address = texts(t, "address", ADDRESS, "lines", |e| e.line());
    let contact = t.may("contact").line();
    let notes = texts(t, "standing_notes", NOTES, "sentences", |e| e.text());
    t.finish();
    Some((name?, address?, contact, notes?))
}

fn texts(
    t: &Table<'_>,
    key: &'static str,
    most: usize,
    what: &str,
    read: impl Fn(&super::entry::Entry<'_>) -> Option<String>,
) -> Option<Vec<String>> {
    if !t.has(key) {
        return Some(Vec::new());
    }
    let wanted = format!("at most {most} {what} in a list: [\"...\", \"...\"]");
    let entry = t.need(key);
    let items = entry.list(&wanted)?;
    if items.len() > most {
        t.fault(Kind::NotAllowed, format_args!("`{key}` has {} {what}", items.len()))
            .at(entry.place(), "too many")
            .allowed(wanted)
            .help("keep those that every pack needs");
        return None;
    }
    items.iter().map(read).collect::<Vec<_>>().into_iter().collect()
}

#[derive(Default)]
struct Style {
    accent: Option<Colour>,
    logo: Option<Logo>,
    face: Option<String>,
    fonts: Option<String>,
    templates: Option<String>,
}

fn style(t: &Table<'_>) -> Option<Style> {
    let accent = if t.has("accent") { Some(accent(t)) } else { None };
    let logo = if t.has("logo") { Some(logo(t)) } else { None };
    if logo.is_none() {
        for key in ["logo_words", "logo_height"] {
            if t.has(key) {
                t.fault(Kind::Missing, format_args!("there is `{key}`, but no `logo`"))
                    .at(t.place(key), "of what logo?")
                    .allowed("`logo` with what is said of it, or neither")
                    .help("add logo = \"logo.svg\", or take this one out");
            }
        }
    }
    let face = t.may("text_face").line();
    let fonts = t.may("fonts").line().filter(|path| paths::inside(t, "fonts", path, "folder"));
    for (one, other) in [("text_face", "fonts"), ("fonts", "text_face")] {
        if t.has(one) && !t.has(other) {
            t.fault(Kind::Missing, format_args!("there is `{one}`, but no `{other}`"))
                .at(t.place(one), "only one of the two")
                .allowed("`text_face`, the name of a family, and `fonts`, the folder that holds it")
                .help(format!("add `{other}`"));
        }
    }
    let templates = t.may("templates").line().filter(|path| paths::inside(t, "templates", path, "folder"));
    t.finish();
    Some(Style {
        accent: accent.map_or(Some(None), |a| a.map(Some))?,
        logo: logo.map_or(Some(None), |l| l.map(Some))?,
        face,
        fonts,
        templates,
    })
}

fn accent(t: &Table<'_>) -> Option<Colour> {
    const WANTED: &str = "a colour in double quotes, as \"#1f3d52\"";
    let entry = t.need("accent");
    let text = entry.line()?;
    let Some(accent) = Colour::from_hex(&text) else {
        entry
            .fault(Kind::NotAllowed, format_args!("{} is no colour", super::entry::quoted(&text)))
            .at(entry.place(), "not a colour")
            .allowed(WANTED)
            .help("write a # and six hexadecimal digits: two each for red, green and blue");
        return None;
    };
    if accent.contrast() < CONTRAST {
        // Rounded down: a contrast just under the limit must not print as the limit.
        let contrast = (accent.contrast() * 10.0).floor() / 10.0;
        entry
            .fault(
                Kind::NotAllowed,
                format_args!("the contrast of {} with white is {contrast:.1} to 1", accent.hex()),
            )
            .at(entry.place(), "too pale to be read on paper")
            .allowed(format!("a contrast of {CONTRAST} to 1 or more (WCAG 2.1, 1.4.3)"))
            .help("take a darker shade of it");
        return None;
    }
    Some(accent)
}

fn logo(t: &Table<'_>) -> Option<Logo> {
    let file = t.need("logo").line().filter(|path| {
        paths::inside(t, "logo", path, "file") && paths::ends(t, "logo", path, &[".svg", ".png"])
    });
    let words = t.need("logo_words").line();
    let height: Option<Length> =
        if t.has("logo_height") { t.need("logo_height").quantity(&LOGO) } else { Some(LOGO_HEIGHT) };
    Some(Logo { file: file?, words: words?, height: height? })
}
