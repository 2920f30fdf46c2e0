//! `[[links]]`, `[[assumptions]]`, `[[hold_points]]` and `[responsible]`.

use super::ground::marks;
use super::reader::{Reader, Table};
use super::words::LINKS;
use crate::building::{Assumption, HoldPoint, Link, Proof};
use crate::error::Kind;

/// Reads one link of the chain to the ground.
pub fn link(t: &Table<'_>, names: &[&str]) -> Option<Link> {
    let link = t.need("link").choice(LINKS, |word| LINKS.contains(&word).then(|| word.to_owned()));
    let proof = t.need("proof").choice(Proof::WORDS, Proof::from_word);
    let words = match proof {
        Some(Proof::Calculated) if !t.has("words") => Some(String::new()),
        _ => t.need("words").text(),
    };
    let of = marks(&t.may("for"), names);
    t.finish();
    Some(Link { link: link?, proof: proof?, words: words?, of: of? })
}

/// Holds the links against each other: one proof for one thing, and no link without a word. Floor edge and
/// diaphragm speak for themselves where `told` says that they have tables of their own.
pub fn chain(reader: &Reader, tables: &[Table<'_>], links: &[Option<Link>], told: (bool, bool)) {
    let given: Vec<_> = tables.iter().zip(links).filter_map(|(t, l)| Some((t, l.as_ref()?))).collect();
    for (i, (t, link)) in given.iter().enumerate() {
        let same = |other: &Link| {
            let shared = link.of.iter().any(|m| other.of.contains(m));
            other.link == link.link && (shared || (link.of.is_empty() && other.of.is_empty()))
        };
        if let Some((first, _)) = given[..i].iter().find(|(_, other)| same(other)) {
            t.fault(Kind::Contradiction, format_args!("the link \"{}\" has two proofs", link.link))
                .at(t.place("link"), "again")
                .and(first.place("link"), "first")
                .allowed("one proof for each link, or one for each mark under `for`")
                .help("take one out, or say with `for` which marks each is about");
        }
    }
    let told = |word: &str| (word == "floor edge" && told.0) || (word == "diaphragm" && told.1);
    let silent: Vec<&str> = LINKS
        .iter()
        .copied()
        .filter(|word| !told(word) && !given.iter().any(|(_, link)| link.link == *word))
        .collect();
    if !silent.is_empty() && given.len() == tables.len() {
        reader.warn(format!("links: nothing is said about {}", silent.join(", ")));
    }
}

/// Reads one assumption.
pub fn assumption(t: &Table<'_>) -> Option<Assumption> {
    let text = t.need("text").text();
    let source = t.may("source").text();
    t.finish();
    Some(Assumption { text: text?, source: source.unwrap_or_default() })
}

/// Reads one hold point.
pub fn hold_point(t: &Table<'_>, names: &[&str]) -> Option<HoldPoint> {
    let text = t.need("text").text();
    let plain = t.may("plain").line();
    let of = marks(&t.may("for"), names);
    let closed = t.may("closed").line();
    t.finish();
    Some(HoldPoint { text: text?, plain, of: of?, closed })
}

/// Reads `[responsible]`: a task and who has it, in the order given; `_` in a task counts as a blank.
pub fn responsible(t: &Table<'_>) -> Option<Vec<(String, String)>> {
    let all: Vec<_> =
        t.entries().into_iter().map(|(task, _, who)| Some((task.replace('_', " "), who.line()?))).collect();
    all.into_iter().collect()
}
