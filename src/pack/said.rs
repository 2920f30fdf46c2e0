//! What must stand on the pages whatever templates set them: a practice may change how a pack looks, not what it says.

use serde_json::Value;
use typst_layout::PagedDocument;

use super::world::Kind;
use super::{PackError, audit};

/// Words that must be found: on every page, anywhere, or one shortly behind the other.
pub(super) enum Must {
    EveryPage(String),
    Somewhere(String),
    Behind(String, String),
}

/// Bytes between a check and its verdict at most: demand, resistance and ratio stand between.
const NEAR: usize = 80;

/// What the data demands. Whole sentences, so that a page may end between two.
pub(super) fn required(kind: Kind, json: &[u8]) -> Vec<Must> {
    let data: Value = serde_json::from_slice(json).unwrap_or_default();
    let text = |path: &str| data.pointer(path).and_then(Value::as_str).unwrap_or_default().to_owned();
    let each = |path: &str, inner: &str| -> Vec<String> {
        let items = data.pointer(path).and_then(Value::as_array).into_iter().flatten();
        items.filter_map(|item| item.pointer(inner).and_then(Value::as_str)).map(str::to_owned).collect()
    };
    let words = match kind {
        Kind::Pack => [
            vec![text("/outcome/words"), text("/outcome/sentence")],
            each("/warnings", ""),
            each("/holds", "/text"),
            each("/assumptions", "/text"),
            each("/schedule", "/check"),
            each("/schedule", "/ratio"),
            each("/cautions", ""),
        ]
        .concat(),
        Kind::Client => {
            let parts = data.pointer("/parts").and_then(Value::as_array).cloned().unwrap_or_default();
            let lines = ["lines", "steps"].iter().flat_map(|key| {
                parts
                    .iter()
                    .filter_map(|p| p.get(*key)?.as_array())
                    .flatten()
                    .filter_map(Value::as_str)
                    .map(str::to_owned)
            });
            std::iter::once(text("/headline")).chain(lines).collect()
        }
    };
    let sentences =
        words.iter().flat_map(|w| w.split_inclusive(". ")).map(|s| Must::Somewhere(s.trim().to_owned()));
    // What does not pass stands with its own words.
    let rows = each("/schedule", "/check").into_iter().zip(each("/schedule", "/verdict"));
    let bad = rows
        .filter(|(_, verdict)| verdict != "adequate")
        .map(|(check, verdict)| Must::Behind(check, verdict));
    std::iter::once(Must::EveryPage(text("/unsigned_text"))).chain(sentences).chain(bad).collect()
}

/// Holds the pages against what must stand on them and be legible there.
///
/// # Errors
/// [`PackError::Unsaid`] with what is not there.
pub(super) fn all(must: &[Must], document: &PagedDocument) -> Result<(), PackError> {
    if must.is_empty() {
        return Ok(());
    }
    let pages: Vec<String> = audit::legible(document).iter().map(|page| letters(page)).collect();
    let whole = pages.concat();
    let lacking = |one: &Must| match one {
        Must::Somewhere(words) => (!whole.contains(&letters(words))).then(|| words.clone()),
        Must::Behind(words, then) => {
            let (first, second) = (letters(words), letters(then));
            let follows = |(at, _): (usize, &str)| {
                whole[at + first.len()..].find(&second).is_some_and(|far| far < NEAR)
            };
            (!whole.match_indices(&first).any(follows)).then(|| format!("{words}: {then}"))
        }
        Must::EveryPage(words) => {
            let page = pages.iter().position(|page| !page.contains(&letters(words)))?;
            Some(format!("{words} (page {})", page + 1))
        }
    };
    let unsaid: Vec<String> = must.iter().filter_map(lacking).collect();
    if unsaid.is_empty() { Ok(()) } else { Err(PackError::Unsaid(unsaid)) }
}

/// The text without what varies in setting: spaces of any width, joiners.
fn letters(text: &str) -> String {
    text.chars()
        .filter(|c| !c.is_whitespace() && !matches!(c, '\u{2060}' | '\u{00ad}' | '\u{200b}'))
        .collect()
}
