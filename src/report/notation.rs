//! The list of symbols: every symbol that stands on a sheet, with what it means.

use std::collections::{HashMap, HashSet};

use crate::checks::Section;
use crate::pack::data::Notation;
use crate::trace::{Entry, math, symbol};

/// Symbols that stand on several sheets, in alphabetical order: what stands on one alone is explained
/// there, on its line.
pub fn used(sections: &[Section]) -> Vec<Notation> {
    let mut count: HashMap<String, usize> = HashMap::new();
    for section in sections {
        for name in names(std::slice::from_ref(section)).into_iter().collect::<HashSet<_>>() {
            *count.entry(name).or_default() += 1;
        }
    }
    let mut names: Vec<String> = count.into_iter().filter(|(_, n)| *n > 1).map(|(name, _)| name).collect();
    names.sort_by_key(|n| (n.to_lowercase(), n.clone()));
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
    let of_entry =
        |e: &Entry| e.flat().into_iter().filter_map(|e| Some(e.value()?.name.clone())).collect::<Vec<_>>();
    sections.iter().flat_map(|s| s.sheet.entries.iter().flat_map(of_entry)).collect()
}
