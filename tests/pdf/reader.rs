//! Reading a finished PDF back: its text sheet by sheet, its fonts, links, bookmarks and metadata.

use std::collections::HashMap;

use hayro_cmap::{BfString, CMap};
use hayro_syntax::Pdf;
use hayro_syntax::content::UntypedIter;
use hayro_syntax::object::{Array, Dict, MaybeRef, Name, Object, ObjectIdentifier, Stream};
use hayro_syntax::page::{Page, Resources};

/// A PDF that has been read.
pub struct Read {
    pdf: Pdf,
}

/// A link on a sheet: the sheet it leads to, counted from 0.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Leads {
    /// Where it stands.
    pub from: usize,
    /// Where it leads.
    pub to: usize,
}

impl Read {
    pub fn new(bytes: &[u8]) -> Self {
        Self { pdf: Pdf::new(bytes.to_vec()).expect("a sound PDF") }
    }

    pub fn sheets(&self) -> usize {
        self.pdf.pages().len()
    }

    /// The text of every sheet in the order in which it prints, without white space.
    pub fn texts(&self) -> Vec<String> {
        let text = |page: &Page<'_>| {
            let mut out = String::new();
            show(page.operations(), page.resources(), &mut HashMap::new(), &mut out);
            squeeze(&out)
        };
        self.pdf.pages().iter().map(text).collect()
    }

    fn catalogue(&self) -> Dict<'_> {
        self.pdf.xref().get(self.pdf.xref().root_id()).expect("a catalogue")
    }

    /// The names of the fonts, each with whether its file is embedded and its signs have their Unicode values.
    pub fn fonts(&self) -> Vec<(String, bool)> {
        let dicts = self.pdf.objects().into_iter().filter_map(Object::into_dict);
        dicts
            .filter(|d| d.get::<Name<'_>>("Type").is_some_and(|t| t.as_str() == "Font"))
            .filter(|d| d.get::<Name<'_>>("Subtype").is_some_and(|t| t.as_str() == "Type0"))
            .map(|font| {
                let name =
                    font.get::<Name<'_>>("BaseFont").map(|n| n.as_str().to_owned()).unwrap_or_default();
                let inner =
                    font.get::<Array<'_>>("DescendantFonts").and_then(|a| a.iter::<Dict<'_>>().next());
                let about = inner.and_then(|inner| inner.get::<Dict<'_>>("FontDescriptor"));
                let file = about.is_some_and(|about| {
                    ["FontFile", "FontFile2", "FontFile3"]
                        .iter()
                        .any(|key| about.get::<Stream<'_>>(key).is_some())
                });
                (name, file && font.get::<Stream<'_>>("ToUnicode").is_some())
            })
            .collect()
    }

    /// Other fonts than those of [`Read::fonts`] and their parts: none may be.
    pub fn foreign_fonts(&self) -> usize {
        let dicts = self.pdf.objects().into_iter().filter_map(Object::into_dict);
        let own = ["Type0", "CIDFontType0", "CIDFontType2"];
        dicts
            .filter(|d| d.get::<Name<'_>>("Type").is_some_and(|t| t.as_str() == "Font"))
            .filter(|d| d.get::<Name<'_>>("Subtype").is_none_or(|t| !own.contains(&t.as_str())))
            .count()
    }

    /// The XMP metadata.
    pub fn metadata(&self) -> String {
        let stream: Stream<'_> = self.catalogue().get("Metadata").expect("metadata");
        String::from_utf8(stream.decoded().expect("readable metadata").into_owned()).expect("UTF-8")
    }

    /// The language of the document.
    pub fn language(&self) -> String {
        let language = self.catalogue().get::<hayro_syntax::object::String<'_>>("Lang").expect("a language");
        String::from_utf8_lossy(language.as_bytes()).into_owned()
    }

    /// Whether the document is tagged and shows its title instead of its file name.
    pub fn tagged_and_titled(&self) -> (bool, bool) {
        let part = |key: &str, inner: &str| self.catalogue().get::<Dict<'_>>(key)?.get::<bool>(inner);
        (
            part("MarkInfo", "Marked") == Some(true)
                && self.catalogue().get::<Dict<'_>>("StructTreeRoot").is_some(),
            part("ViewerPreferences", "DisplayDocTitle") == Some(true),
        )
    }

    /// The words of every bookmark, with the sheet it leads to.
    pub fn bookmarks(&self) -> Vec<(String, usize)> {
        let mut out = Vec::new();
        let first = self.catalogue().get::<Dict<'_>>("Outlines").and_then(|all| all.get::<Dict<'_>>("First"));
        self.follow(first, &mut out);
        out
    }

    fn follow<'a>(&'a self, first: Option<Dict<'a>>, out: &mut Vec<(String, usize)>) {
        let mut next = first;
        while let Some(item) = next {
            let title: hayro_syntax::object::String<'_> = item.get("Title").expect("a bookmark has words");
            out.push((words(title.as_bytes()), self.target(&item).expect("a bookmark leads to a sheet")));
            self.follow(item.get::<Dict<'_>>("First"), out);
            next = item.get::<Dict<'_>>("Next");
        }
    }

    /// Every link inside the document, sheet by sheet in the order of the sheet.
    ///
    /// # Panics
    /// Where a link leads nowhere.
    pub fn links(&self) -> Vec<Leads> {
        let mut out = Vec::new();
        for (from, page) in self.pdf.pages().iter().enumerate() {
            let Some(notes) = page.raw().get::<Array<'_>>("Annots") else { continue };
            for note in notes.iter::<Dict<'_>>() {
                let to = self
                    .target(&note)
                    .unwrap_or_else(|| panic!("a link on sheet {} leads nowhere", from + 1));
                out.push(Leads { from, to });
            }
        }
        out
    }

    /// The sheet that a link or a bookmark leads to.
    fn target(&self, of: &Dict<'_>) -> Option<usize> {
        let place =
            of.get::<Object<'_>>("Dest").or_else(|| of.get::<Dict<'_>>("A")?.get::<Object<'_>>("D"))?;
        let place = match place {
            Object::String(name) => self.named(name.as_bytes())?,
            Object::Array(array) => array,
            _ => return None,
        };
        let page = place.raw_iter().next().and_then(|first| MaybeRef::as_obj_ref(&first))?;
        self.pdf.pages().iter().position(|p| p.raw().obj_id() == Some(page.into()))
    }

    /// A named destination, from the tree of names.
    fn named(&self, name: &[u8]) -> Option<Array<'_>> {
        fn search<'a>(node: &Dict<'a>, name: &[u8]) -> Option<Array<'a>> {
            if let Some(pairs) = node.get::<Array<'_>>("Names") {
                let all: Vec<Object<'a>> = pairs.iter::<Object<'a>>().collect();
                let hit = all
                    .chunks(2)
                    .find(|pair| matches!(&pair[0], Object::String(s) if s.as_bytes() == name))?;
                return match &hit[1] {
                    Object::Array(array) => Some(array.clone()),
                    Object::Dict(dict) => dict.get("D"),
                    _ => None,
                };
            }
            node.get::<Array<'_>>("Kids")?.iter::<Dict<'a>>().find_map(|kid| search(&kid, name))
        }
        search(&self.catalogue().get::<Dict<'_>>("Names")?.get("Dests")?, name)
    }

    /// The files that travel inside, by name.
    pub fn attachments(&self) -> Vec<(String, Vec<u8>)> {
        let dicts = self.pdf.objects().into_iter().filter_map(Object::into_dict);
        dicts
            .filter(|d| d.get::<Name<'_>>("Type").is_some_and(|t| t.as_str() == "Filespec"))
            .filter_map(|file| {
                let name = file.get::<hayro_syntax::object::String<'_>>("UF")?;
                let stream = file.get::<Dict<'_>>("EF")?.get::<Stream<'_>>("F")?;
                Some((words(name.as_bytes()), stream.decoded().ok()?.into_owned()))
            })
            .collect()
    }

    /// The JPEG files inside, as they stand.
    pub fn photographs(&self) -> Vec<Vec<u8>> {
        let streams = self.pdf.objects().into_iter().filter_map(Object::into_stream);
        let jpeg =
            |s: &Stream<'_>| s.dict().get::<Name<'_>>("Filter").is_some_and(|f| f.as_str() == "DCTDecode");
        streams.filter(jpeg).map(|s| s.raw_data().into_owned()).collect()
    }
}

/// Text without white space: a PDF has places, not blanks.
pub fn squeeze(text: &str) -> String {
    text.chars().filter(|c| !c.is_whitespace() && *c != '\u{ad}').collect()
}

/// A text string of a PDF: UTF-16 with its mark, or one byte a letter.
fn words(bytes: &[u8]) -> String {
    match bytes {
        [0xFE, 0xFF, rest @ ..] => {
            let units: Vec<u16> =
                rest.chunks(2).map(|c| u16::from_be_bytes([c[0], *c.get(1).unwrap_or(&0)])).collect();
            String::from_utf16_lossy(&units)
        }
        other => other.iter().map(|b| char::from(*b)).collect(),
    }
}

type Maps = HashMap<Option<ObjectIdentifier>, Option<CMap>>;

/// Follows a content stream and writes down what it shows.
fn show(mut content: UntypedIter<'_>, resources: &Resources<'_>, maps: &mut Maps, out: &mut String) {
    let mut font: Option<ObjectIdentifier> = None;
    while let Some(step) = content.next() {
        let operands: Vec<Object<'_>> = step.operands().cloned().collect();
        match (&**step.operator, operands.as_slice()) {
            (b"Tf", [Object::Name(name), _]) => {
                let dict = resources.get_font(name).expect("a font that a sheet names is there");
                font = dict.obj_id();
                maps.entry(font).or_insert_with(|| {
                    let stream = dict.get::<Stream<'_>>("ToUnicode")?;
                    CMap::parse(&stream.decoded().ok()?, |_| None)
                });
            }
            (b"Tj" | b"'", [Object::String(text)]) => signs(text.as_bytes(), maps.get(&font), out),
            (b"TJ", [Object::Array(parts)]) => {
                for part in parts.iter::<Object<'_>>() {
                    if let Object::String(text) = part {
                        signs(text.as_bytes(), maps.get(&font), out);
                    }
                }
            }
            (b"Do", [Object::Name(name)]) => {
                let Some(form) = resources.get_x_object(name) else { continue };
                if form.dict().get::<Name<'_>>("Subtype").is_some_and(|s| s.as_str() == "Form") {
                    let own = form.dict().get::<Dict<'_>>("Resources").unwrap_or_default();
                    let own = Resources::from_parent(own, resources.clone());
                    let data = form.decoded().expect("a readable form");
                    show(UntypedIter::new(&data), &own, maps, out);
                }
            }
            _ => {}
        }
    }
}

fn signs(codes: &[u8], map: Option<&Option<CMap>>, out: &mut String) {
    let map = map.and_then(Option::as_ref).expect("the font says what its signs are");
    for pair in codes.chunks(2) {
        let code = pair.iter().fold(0, |sum, b| sum << 8 | u32::from(*b));
        match map.lookup_bf_string(code) {
            Some(BfString::Char(c)) => out.push(c),
            Some(BfString::String(s)) => out.push_str(&s),
            None => out.push('\u{fffd}'),
        }
    }
}
