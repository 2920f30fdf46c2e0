//! The files that travel inside a PDF.

use hayro_syntax::Pdf;
use hayro_syntax::object::{Dict, Name, Object, Stream, String as Text};

/// Attached files by their names, with what they hold; `None` where the bytes are no PDF.
pub fn attached(bytes: Vec<u8>) -> Option<Vec<(String, Vec<u8>)>> {
    let pdf = Pdf::new(bytes).ok()?;
    let one = |file: Dict<'_>| {
        let name = file.get::<Text<'_>>("UF").or_else(|| file.get::<Text<'_>>("F"))?;
        let stream = file.get::<Dict<'_>>("EF")?.get::<Stream<'_>>("F")?;
        Some((words(name.as_bytes()), stream.decoded().ok()?.into_owned()))
    };
    let is_file = |d: &Dict<'_>| d.get::<Name<'_>>("Type").is_some_and(|t| t.as_str() == "Filespec");
    Some(pdf.objects().into_iter().filter_map(Object::into_dict).filter(is_file).filter_map(one).collect())
}

/// A text string of a PDF in letters: UTF-16 with its mark, or one byte a letter.
pub fn words(bytes: &[u8]) -> String {
    match bytes {
        [0xFE, 0xFF, rest @ ..] => {
            let unit = |c: &[u8]| u16::from_be_bytes([c[0], c.get(1).copied().unwrap_or(0)]);
            String::from_utf16_lossy(&rest.chunks(2).map(unit).collect::<Vec<_>>())
        }
        other => other.iter().map(|b| char::from(*b)).collect(),
    }
}
