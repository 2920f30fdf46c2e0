//! Lines of text and how much paper they take, measured with the embedded faces.

use std::borrow::Borrow;
use std::sync::OnceLock;

use ttf_parser::Face;

use super::drawing::{Run, Style};

const REGULAR: &[u8] = include_bytes!("../../fonts/STIXTwoText-Regular.ttf");
const ITALIC: &[u8] = include_bytes!("../../fonts/STIXTwoText-Italic.ttf");
const SEMIBOLD: &[u8] = include_bytes!("../../fonts/STIXTwoText-SemiBold.ttf");

/// Millimetres in a typographic point.
pub const POINT: f64 = 25.4 / 72.0;
/// Size of a subscript, relative to its line.
pub const SUB_SIZE: f64 = 0.7;
/// How far a subscript is lowered, em of its line.
pub const SUB_DROP: f64 = 0.15;

/// Greek letters that a symbol may be based on.
const GREEK: [(&str, &str); 13] = [
    ("alpha", "α"),
    ("beta", "β"),
    ("gamma", "γ"),
    ("eta", "η"),
    ("lambda", "λ"),
    ("mu", "μ"),
    ("nu", "ν"),
    ("rho", "ρ"),
    ("sigma", "σ"),
    ("tau", "τ"),
    ("phi", "φ"),
    ("psi", "ψ"),
    ("Phi", "Φ"),
];

/// One line of text as runs.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Text(pub Vec<Run>);

/// Paper a line of text takes, mm.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Extent {
    /// Advance width.
    pub width: f64,
    /// Ink above the baseline, at least a capital's height.
    pub ascent: f64,
    /// Ink below the baseline.
    pub descent: f64,
}

/// A sentence's list: `a, b and c`.
pub fn list<S: Borrow<str>>(items: &[S]) -> String {
    match items {
        [] => String::new(),
        [one] => one.borrow().to_owned(),
        [first @ .., last] => format!("{} and {}", first.join(", "), last.borrow()),
    }
}

/// A sentence's first letter large, `_` as a space.
pub fn capital(text: &str) -> String {
    let text = text.replace('_', " ");
    let mut letters = text.chars();
    letters.next().map(|c| c.to_uppercase().collect::<String>() + letters.as_str()).unwrap_or_default()
}

impl Text {
    /// Upright words.
    pub fn plain(text: &str) -> Self {
        Self::default().and(text, Style::Plain)
    }

    /// The mark of an element, semibold.
    pub fn mark(text: &str) -> Self {
        Self::default().and(text, Style::Bold)
    }

    /// A symbol by its name: `N_Ed` is an italic N with an upright subscript, `sigma_d` a sigma.
    pub fn symbol(name: &str) -> Self {
        let (base, sub) = name.split_once('_').unwrap_or((name, ""));
        let base = GREEK.iter().find(|(word, _)| *word == base).map_or(base, |(_, letter)| letter);
        let text = Self::default().and(base, Style::Italic);
        if sub.is_empty() { text } else { text.and(sub, Style::Sub) }
    }

    /// `symbol = value`; the value alone where there is no symbol.
    pub fn value(symbol: &str, value: &str) -> Self {
        if symbol.is_empty() {
            return Self::plain(value);
        }
        Self::symbol(symbol).and(&format!(" = {value}"), Style::Plain)
    }

    /// The same line with a further run.
    pub fn and(mut self, text: &str, style: Style) -> Self {
        self.0.push(Run { text: text.to_owned(), style });
        self
    }

    /// The paper this line takes at `size` pt.
    pub fn extent(&self, size: f64) -> Extent {
        let em = size * POINT;
        let mut extent = Extent { width: 0.0, ascent: cap_height() * em, descent: 0.0 };
        for run in &self.0 {
            let (size, drop) = match run.style {
                Style::Sub => (em * SUB_SIZE, em * SUB_DROP),
                _ => (em, 0.0),
            };
            let face = face(run.style);
            let unit = size / f64::from(face.units_per_em());
            for sign in run.text.chars().map(|c| sign(run.style, c)) {
                extent.width += unit * f64::from(sign.advance);
                if let Some((foot, top)) = sign.ink {
                    extent.ascent = extent.ascent.max(unit * f64::from(top) - drop);
                    extent.descent = extent.descent.max(drop - unit * f64::from(foot));
                }
            }
        }
        extent
    }
}

impl From<String> for Text {
    fn from(words: String) -> Self {
        Self::plain(&words)
    }
}

/// A sign of a face, in units of the face.
#[derive(Clone, Copy)]
struct Sign {
    advance: u16,
    /// Foot and top of its ink; none for a blank.
    ink: Option<(i16, i16)>,
}

/// How many signs are kept once measured: up to the end of Greek. A face gives the box of a sign only by running
/// through its whole outline, and labels are measured over and over while they look for their place.
const KEPT: usize = 0x400;

fn sign(style: Style, c: char) -> Sign {
    type Signs = [OnceLock<Sign>; KEPT];
    static SIGNS: [Signs; 3] = [const { [const { OnceLock::new() }; KEPT] }; 3];
    let measured = || {
        let face = face(style);
        let glyph = face.glyph_index(c).unwrap_or_default();
        Sign {
            advance: face.glyph_hor_advance(glyph).unwrap_or(0),
            ink: face.glyph_bounding_box(glyph).map(|ink| (ink.y_min, ink.y_max)),
        }
    };
    match SIGNS[index(style)].get(c as usize) {
        Some(kept) => *kept.get_or_init(measured),
        None => measured(),
    }
}

const fn index(style: Style) -> usize {
    match style {
        Style::Plain | Style::Sub => 0,
        Style::Italic => 1,
        Style::Bold => 2,
    }
}

/// The embedded face of a style.
pub(super) fn face(style: Style) -> &'static Face<'static> {
    static FACES: OnceLock<[Face<'static>; 3]> = OnceLock::new();
    let faces = FACES.get_or_init(|| {
        [REGULAR, ITALIC, SEMIBOLD].map(|data| Face::parse(data, 0).expect("embedded fonts parse"))
    });
    &faces[index(style)]
}

/// The upright face, for whoever draws letters as outlines.
pub fn upright() -> &'static Face<'static> {
    face(Style::Plain)
}

/// Height of a capital, em.
fn cap_height() -> f64 {
    let face = face(Style::Plain);
    f64::from(face.capital_height().unwrap_or(700)) / f64::from(face.units_per_em())
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_character_of_the_vocabulary_has_a_glyph() {
        let needed = "0123456789.,:;()=+-−×·/%²³°–αβγηλμνρστψΦABCDEFGHIJKLMNOPQRSTUVWXYZ abcdefghijklmnopqrstuvwxyz\u{202f}\u{a0}";
        for c in needed.chars() {
            for style in [Style::Plain, Style::Bold] {
                assert!(face(style).glyph_index(c).is_some(), "no glyph for {c:?} in {style:?}");
            }
        }
    }

    #[test]
    fn a_symbol_is_an_italic_base_and_an_upright_subscript() {
        let text = Text::symbol("sigma_d");
        assert_eq!(text.0[0], Run { text: "σ".into(), style: Style::Italic });
        assert_eq!(text.0[1], Run { text: "d".into(), style: Style::Sub });
        assert_eq!(Text::symbol("H").0.len(), 1);
    }

    #[test]
    fn width_is_additive_and_proportional_to_the_size() {
        let at = |text: &str, size| Text::plain(text).extent(size).width;
        assert!((at("wall", 8.0) + at("12", 8.0) - at("wall12", 8.0)).abs() < 1e-9);
        assert!((at("wall", 16.0) - 2.0 * at("wall", 8.0)).abs() < 1e-9);
        let sub = Text::default().and("Ed", Style::Sub).extent(8.0);
        assert!((sub.width - SUB_SIZE * at("Ed", 8.0)).abs() < 1e-9);
        assert!(sub.descent > 0.0);
    }
}
