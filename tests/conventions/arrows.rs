//! A module uses only modules above it, and some things live in one module alone.

use super::sources;

/// The modules, each of which may use those before it. [`perpend`]'s crate doc says the same.
const ORDER: [&str; 17] = [
    "error",
    "files",
    "quantity",
    "solve",
    "trace",
    "standards",
    "building",
    "wind",
    "job",
    "sketch",
    "checks",
    "pack",
    "house",
    "report",
    "archive",
    "many",
    "cli",
];

/// Macros stand at the root of the crate and belong to `trace`.
const MACROS: [&str; 8] = ["calc", "decide", "found", "given", "lookup", "require", "symbols", "verify"];

/// `lib.rs` is the pipeline: above nothing but the command line.
const PIPELINE: [&str; 12] = [
    "check",
    "check_for",
    "digest",
    "draw",
    "draw_for",
    "file_name",
    "recheck",
    "set",
    "sheet",
    "Sheeted",
    "Source",
    "summarise",
];

fn place(module: &str) -> Option<usize> {
    ORDER.iter().position(|m| *m == module)
}

/// The module that a source file belongs to; none for `lib.rs` and `main.rs`.
fn module(file: &str) -> Option<&str> {
    let first = file.split('/').next().unwrap_or("");
    let name = first.strip_suffix(".rs").unwrap_or(first);
    (!matches!(name, "lib" | "main")).then_some(name)
}

/// The text without its line comments.
fn code(text: &str) -> String {
    text.lines().map(|l| l.split("//").next().unwrap_or("")).collect::<Vec<_>>().join("\n")
}

/// The first name after every `crate::`, with groups taken apart: `crate::{a, b::{c, d}}` names a and b.
fn named(code: &str) -> Vec<String> {
    let word = |t: &str| -> String {
        t.trim_start().chars().take_while(|c| c.is_alphanumeric() || *c == '_').collect()
    };
    let mut out = Vec::new();
    for (at, _) in code.match_indices("crate::") {
        let rest = &code[at + "crate::".len()..];
        let Some(group) = rest.strip_prefix('{') else {
            out.push(word(rest));
            continue;
        };
        let (mut depth, mut from) = (0, 0);
        for (i, c) in group.char_indices() {
            match c {
                '{' => depth += 1,
                '}' if depth > 0 => depth -= 1,
                ',' | '}' if depth == 0 => {
                    out.push(word(&group[from..i]));
                    from = i + 1;
                    if c == '}' {
                        break;
                    }
                }
                _ => {}
            }
        }
    }
    out.retain(|n| !n.is_empty());
    out
}

#[test]
fn groups_are_taken_apart() {
    let text =
        "use crate::{calc, given};\nuse crate::quantity::{Num, print};\nuse crate::{\n  a::{b, c},\n  d,\n};";
    assert_eq!(named(text), ["calc", "given", "quantity", "a", "d"]);
    assert_eq!(module("checks/returns/run.rs"), Some("checks"));
    assert_eq!(module("cli.rs"), Some("cli"));
    assert_eq!(module("lib.rs"), None);
    assert_eq!(code("let a = 1; // crate::pack\n"), "let a = 1; ");
}

/// Every arrow that is wrong, as `file: module`.
fn wrong(files: &[(String, String)]) -> Vec<String> {
    let mut out = Vec::new();
    for (file, text) in files {
        let Some(own) = module(file) else { continue };
        let Some(here) = place(own) else {
            out.push(format!("{file}: module {own} has no place in the order"));
            continue;
        };
        for name in named(&code(text)) {
            let target = if MACROS.contains(&name.as_str()) { "trace" } else { name.as_str() };
            match place(target) {
                Some(there) if there <= here => {}
                None if PIPELINE.contains(&name.as_str()) && own == "cli" => {}
                _ => out.push(format!("{file}: crate::{name}")),
            }
        }
    }
    out
}

#[test]
fn every_arrow_points_up() {
    let files = sources();
    assert!(files.len() > 100, "{}", files.len());
    let wrong = wrong(&files);
    assert!(wrong.is_empty(), "wrong arrows:\n{}", wrong.join("\n"));
}

/// The test sees a wrong arrow: the check on the check.
#[test]
fn a_wrong_arrow_is_seen() {
    let file = |name: &str, text: &str| vec![(name.to_owned(), text.to_owned())];
    assert_eq!(
        wrong(&file("standards/en1996/x.rs", "use crate::building::Load;")),
        ["standards/en1996/x.rs: crate::building"]
    );
    assert_eq!(wrong(&file("quantity/x.rs", "crate::calc!(s)")), ["quantity/x.rs: crate::calc"]);
    assert_eq!(wrong(&file("pack/x.rs", "use crate::{report};")), ["pack/x.rs: crate::report"]);
    assert_eq!(wrong(&file("checks/x.rs", "use crate::check;")), ["checks/x.rs: crate::check"]);
    assert_eq!(wrong(&file("new/x.rs", "")), ["new/x.rs: module new has no place in the order"]);
    assert!(wrong(&file("cli.rs", "use crate::{check, pack};")).is_empty());
}

/// The order that the crate doc prints is the order that holds.
#[test]
fn the_crate_doc_says_the_order() {
    let files = sources();
    let lib = &files.iter().find(|f| f.0 == "lib.rs").expect("lib.rs").1;
    assert!(lib.contains(&format!("`{}`", ORDER.join(" "))), "lib.rs says another order than {ORDER:?}");
    for module in ORDER {
        assert!(lib.contains(&format!("pub mod {module};")), "{module} is no module");
    }
    assert_eq!(lib.matches("pub mod ").count(), ORDER.len());
}

/// Files whose code names one of `names`, save those that `may` allows.
fn outside_fence(names: &[&str], may: impl Fn(&str) -> bool) -> Vec<String> {
    sources()
        .into_iter()
        .filter(|(file, text)| {
            let code = code(text);
            !may(file) && names.iter().any(|n| code.contains(n))
        })
        .map(|(file, _)| file)
        .collect()
}

#[test]
fn fences_hold() {
    let none: [&str; 0] = [];
    assert_eq!(outside_fence(&["typst::", "typst_", "use typst"], |f| f.starts_with("pack/")), none);
    assert_eq!(outside_fence(&["clap::", "use clap"], |f| f.starts_with("cli/")), none);
    assert_eq!(
        outside_fence(&[" toml::", "(toml::", "<toml::", "use toml"], |f| f.starts_with("job/")),
        none
    );
    // Each fence has something inside it, or it guards nothing.
    assert!(!outside_fence(&["typst::"], |_| false).is_empty());
    assert!(!outside_fence(&["clap::"], |_| false).is_empty());
    assert!(!outside_fence(&["toml::"], |f| !f.starts_with("job/")).is_empty());
}

#[test]
fn clauses_never_see_the_building_and_paper_never_sees_checks() {
    for (file, text) in sources() {
        let names = named(&code(&text));
        let sees = |module: &str| names.iter().any(|n| n == module);
        if file.starts_with("standards/") {
            assert!(!sees("building") && !sees("job"), "{file} sees the building");
        }
        if file.starts_with("pack/") {
            assert!(!sees("checks") && !sees("building") && !sees("job"), "{file} sees checks or building");
        }
    }
}
