//! Dictionaries of a PDF as they are written: an entry is replaced or added, and every other byte stays.

use std::ops::Range;

/// Arrays and dictionaries inside each other are read so far: more than any pack has.
const DEEPEST: u32 = 32;

/// One entry: its key without the slash, and where its value stands.
struct Entry {
    key: Vec<u8>,
    value: Range<usize>,
}

/// The value of `key` in a dictionary, as it is written.
pub fn value<'a>(dict: &'a [u8], key: &str) -> Option<&'a [u8]> {
    entries(dict)?.into_iter().find(|e| e.key == key.as_bytes()).map(|e| &dict[e.value])
}

/// The dictionary with `value` under `key`, in place of what stood there; `None` where it is no dictionary.
pub fn with(dict: &[u8], key: &str, value: impl AsRef<[u8]>) -> Option<Vec<u8>> {
    let found = entries(dict)?.into_iter().find(|e| e.key == key.as_bytes());
    let (place, head) = match found {
        Some(entry) => (entry.value, String::new()),
        None => {
            let end = dict.iter().rposition(|b| *b == b'>')?.checked_sub(1)?;
            (end..end, format!("/{key}"))
        }
    };
    Some([&dict[..place.start], head.as_bytes(), b" ", value.as_ref(), &dict[place.end..]].concat())
}

/// An array with one thing more: at its end, or behind the thing written as `after`.
pub fn pushed(array: &[u8], after: Option<&str>, item: &str) -> Option<Vec<u8>> {
    let inner = array.strip_prefix(b"[")?.strip_suffix(b"]")?;
    let at = match after {
        None => inner.len(),
        Some(after) => ends_of(inner, after.as_bytes())?,
    };
    Some([b"[", &inner[..at], b" ", item.as_bytes(), b" ", &inner[at..], b"]"].concat())
}

/// Where the whole word `wanted` ends in a text.
fn ends_of(text: &[u8], wanted: &[u8]) -> Option<usize> {
    let whole = |at: &usize| {
        let before = at.checked_sub(1).and_then(|n| text.get(n));
        before.is_none_or(|b| !b.is_ascii_digit())
    };
    let at = (0..text.len()).find(|at| text[*at..].starts_with(wanted) && whole(at))?;
    Some(at + wanted.len())
}

fn entries(dict: &[u8]) -> Option<Vec<Entry>> {
    let mut at = blank(dict, 0);
    if !dict[at..].starts_with(b"<<") {
        return None;
    }
    at = blank(dict, at + 2);
    let mut out = Vec::new();
    while !dict[at..].starts_with(b">>") {
        let key = at..object(dict, at)?;
        let key = dict[key.clone()].strip_prefix(b"/").map(<[u8]>::to_vec)?;
        at += key.len() + 1;
        let start = at;
        let mut end = object(dict, blank(dict, at))?;
        // A reference is three words: numbers and R go on until the next key.
        loop {
            let next = blank(dict, end);
            match dict.get(next)? {
                b'/' => break,
                b'>' => break,
                _ => end = object(dict, next)?,
            }
        }
        out.push(Entry { key, value: start..end });
        at = blank(dict, end);
    }
    Some(out)
}

/// The end of the white space that begins at `at`.
fn blank(bytes: &[u8], mut at: usize) -> usize {
    while let Some(b) = bytes.get(at) {
        match b {
            0 | b'\t' | b'\n' | 0x0C | b'\r' | b' ' => at += 1,
            b'%' => at += bytes[at..].iter().take_while(|b| !matches!(b, b'\r' | b'\n')).count(),
            _ => break,
        }
    }
    at
}

/// The end of the object, or the word, that begins at `at`.
pub fn object(bytes: &[u8], at: usize) -> Option<usize> {
    within(bytes, at, DEEPEST)
}

fn within(bytes: &[u8], at: usize, depth: u32) -> Option<usize> {
    match bytes.get(at)? {
        b'(' => text(bytes, at),
        b'<' if bytes.get(at + 1) == Some(&b'<') => nested(bytes, at + 2, b">>", depth.checked_sub(1)?),
        b'<' => Some(at + bytes[at..].iter().position(|b| *b == b'>')? + 1),
        b'[' => nested(bytes, at + 1, b"]", depth.checked_sub(1)?),
        _ => {
            let word =
                |b: &&u8| !matches!(b, 0..=b' ' | b'(' | b')' | b'<' | b'>' | b'[' | b']' | b'/' | b'%');
            let length = bytes[at + 1..].iter().take_while(word).count();
            Some(at + 1 + length)
        }
    }
}

/// The end of a dictionary or an array whose first object follows at `at`.
fn nested(bytes: &[u8], mut at: usize, end: &[u8], depth: u32) -> Option<usize> {
    loop {
        at = blank(bytes, at);
        let rest = bytes.get(at..)?;
        if rest.starts_with(end) {
            return Some(at + end.len());
        }
        if rest.is_empty() {
            return None;
        }
        at = within(bytes, at, depth)?;
    }
}

/// The end of a text in round brackets.
fn text(bytes: &[u8], at: usize) -> Option<usize> {
    let (mut depth, mut n) = (0_u32, at);
    loop {
        match bytes.get(n)? {
            b'\\' => n += 1,
            b'(' => depth += 1,
            b')' => depth -= 1,
            _ => {}
        }
        n += 1;
        if depth == 0 {
            return Some(n);
        }
    }
}

/// A text for people as a PDF writes it: letters of ASCII as they are, others as UTF-16.
pub fn words(text: &str) -> String {
    if text.bytes().all(|b| (b' '..0x7F).contains(&b)) {
        let escaped = text.replace('\\', "\\\\").replace('(', "\\(").replace(')', "\\)");
        return format!("({escaped})");
    }
    let units: String = text.encode_utf16().map(|unit| format!("{unit:04X}")).collect();
    format!("<FEFF{units}>")
}

#[cfg(test)]
mod tests {
    use super::*;

    const DICT: &[u8] =
        b"<</Type/Page/T(a \\) (b) /K 1)/P 12 0 R/A[<</O/Layout>>]/K[1 2 21 0 R 2 1 0 R]/M<</N null>>>>";

    #[test]
    fn values_are_found_as_they_are_written() {
        let value = |key: &str| value(DICT, key).map(|v| String::from_utf8_lossy(v).trim().to_owned());
        assert_eq!(value("Type").as_deref(), Some("/Page"));
        assert_eq!(value("T").as_deref(), Some("(a \\) (b) /K 1)"));
        assert_eq!(value("P").as_deref(), Some("12 0 R"));
        assert_eq!(value("K").as_deref(), Some("[1 2 21 0 R 2 1 0 R]"));
        assert_eq!(value("M").as_deref(), Some("<</N null>>"));
        assert_eq!(value("N"), None, "a key of a dictionary inside");
        assert_eq!(super::value(b"[1 2]", "N"), None);
        assert_eq!(super::value(b"<</K (open", "K"), None);
    }

    #[test]
    fn one_entry_changes_and_no_other() {
        let changed = with(DICT, "P", "7 0 R").expect("a dictionary");
        assert_eq!(changed, String::from_utf8_lossy(DICT).replace("/P 12 0 R", "/P 7 0 R").into_bytes());
        let added = with(DICT, "V", "9 0 R").expect("a dictionary");
        assert!(added.ends_with(b"/M<</N null>>/V 9 0 R>>"), "{}", String::from_utf8_lossy(&added));
        assert_eq!(value(&added, "V"), Some(b" 9 0 R".as_slice()));
    }

    #[test]
    fn a_thing_is_put_behind_another() {
        assert_eq!(
            pushed(b"[21 0 R 1 0 R]", Some("1 0 R"), "5 0 R"),
            Some(b"[21 0 R 1 0 R 5 0 R ]".to_vec())
        );
        assert_eq!(pushed(b"[]", None, "5 0 R"), Some(b"[ 5 0 R ]".to_vec()));
        assert_eq!(pushed(b"[21 0 R]", Some("1 0 R"), "5 0 R"), None, "the end of another number");
    }

    #[test]
    fn texts_are_escaped_or_written_wide() {
        assert_eq!(words("a (b) \\"), "(a \\(b\\) \\\\)");
        assert_eq!(words("é"), "<FEFF00E9>");
    }
}
