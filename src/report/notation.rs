//! The list of symbols: every symbol that stands on a sheet, with what it means.

use crate::checks::Section;
use crate::pack::data::Notation;
use crate::trace::{Entry, math, symbol};

/// Symbols used, in alphabetical order, those that the glossary knows.
pub fn used(sections: &[Section]) -> Vec<Notation> {
    let mut names = names(sections);
    names.sort_by_key(|n| (n.to_lowercase(), n.clone()));
    names.dedup();
    names
        .into_iter()
        .filter_map(|n| {
            symbol::meaning(&n)
                .map(|words| Notation { symbol: math::symbol(&n).json(), words: words.to_owned() })
        })
        .collect()
}

/// Names of all symbols that stand on the sheets.
pub fn names(sections: &[Section]) -> Vec<String> {
    let of_entry = |e: &Entry| match e {
        Entry::Given { value, .. } | Entry::Lookup { value, .. } | Entry::Found { value, .. } => {
            Some(value.name.clone())
        }
        Entry::Step(step) => Some(step.result.name.clone()),
        _ => None,
    };
    sections.iter().flat_map(|s| s.sheet.entries.iter().filter_map(of_entry)).collect()
}
