//! Every symbol that stands on a sheet has a meaning in the list of symbols.

use std::collections::BTreeSet;

use perpend::report::notation::names;
use perpend::trace::glossary::GLOSSARY;

use super::sources;
use crate::jobs::demos;

/// Symbols on the sheets of the demo jobs.
fn shown() -> BTreeSet<String> {
    let mut out = BTreeSet::new();
    for (name, text) in demos() {
        let (_, results) = perpend::check(&name, &text).unwrap_or_else(|e| panic!("{name}: {e}"));
        out.extend(names(&results.sections));
    }
    out
}

/// Symbols that any macro of the checks and clauses binds, whether or not a demo job comes by.
fn written() -> BTreeSet<String> {
    let mut out = BTreeSet::new();
    for (file, text) in sources() {
        let code_of_checks = ["checks/", "standards/", "wind/"].iter().any(|m| file.starts_with(m));
        if !code_of_checks || file.contains("test") || file.contains("properties") {
            continue;
        }
        let code = text.split("#[cfg(test)]\nmod tests {").next().unwrap_or("");
        for opening in ["calc!(", "given!(", "lookup!(", "found!("] {
            for (at, _) in code.match_indices(opening) {
                out.extend(bound(&code[at + opening.len()..]));
            }
        }
        out.extend(given_names(code));
    }
    out
}

/// Names that a macro of statics is given for what it binds, after the `=>` of its call.
fn given_names(code: &str) -> Vec<String> {
    let calls = code.match_indices("\nstatics! {").filter_map(|(at, _)| code[at..].split('}').next());
    let lists = calls.filter_map(|call| call.split_once("=>")).map(|(_, names)| names);
    let names = lists.flat_map(|list| list.split(|c: char| !(c.is_alphanumeric() || c == '_')));
    names.filter(|n| !n.is_empty()).map(str::to_owned).collect()
}

/// The name that a macro call binds: the word before the first ` = ` outside quotes, or the last word of a
/// call that has none.
fn bound(call: &str) -> Option<String> {
    // A name with a `$` is that of a macro's own call.
    let word = |t: &str| {
        let last = t.trim_end().rsplit(|c: char| !(c.is_alphanumeric() || c == '_' || c == '$')).next();
        last.filter(|n| !n.starts_with('$')).map(str::to_owned)
    };
    let mut quoted = false;
    for (i, c) in call.char_indices() {
        match c {
            '"' if !call[..i].ends_with('\\') => quoted = !quoted,
            ';' if !quoted => {
                let end = call[..i].rfind(')')?;
                return word(call[..end].trim_end().trim_end_matches(',')).filter(|n| !n.is_empty());
            }
            '=' if !quoted && call[..i].ends_with(' ') && call[i + 1..].starts_with([' ', '\n']) => {
                return word(&call[..i]).filter(|n| !n.is_empty());
            }
            _ => {}
        }
    }
    None
}

#[test]
fn every_symbol_has_a_meaning() {
    let known: BTreeSet<String> = GLOSSARY.iter().map(|g| g.0.to_owned()).collect();
    let missing: Vec<String> = shown().difference(&known).cloned().collect();
    assert!(missing.is_empty(), "on sheets without a meaning: {missing:?}");
    let missing: Vec<String> = written().difference(&known).cloned().collect();
    assert!(missing.is_empty(), "in the code without a meaning: {missing:?}");
}

#[test]
fn nothing_is_explained_that_is_never_written() {
    let mut used = shown();
    used.extend(written());
    let idle: Vec<&str> = GLOSSARY.iter().map(|g| g.0).filter(|n| !used.contains(*n)).collect();
    assert!(idle.is_empty(), "{idle:?}");
}

#[test]
fn the_glossary_is_in_order() {
    for pair in GLOSSARY.windows(2) {
        let key = |n: &str| (n.to_lowercase(), n.to_owned());
        assert!(key(pair[0].0) < key(pair[1].0), "{} before {}", pair[0].0, pair[1].0);
    }
    for (name, words) in GLOSSARY {
        assert!(!words.is_empty() && words.len() <= 90 && !words.ends_with('.'), "{name}: {words}");
        assert!(!words.starts_with(char::is_uppercase) || words.starts_with("Annex"), "{name}: {words}");
    }
}
