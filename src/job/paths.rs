//! Paths to files beside the job file or the practice file.

use super::entry::quoted;
use super::limits::one_of;
use super::reader::Table;
use crate::error::Kind;

/// Whether the path under `key` leads to a thing beside the job or practice file, or below; records what is wrong with it.
pub fn inside(t: &Table<'_>, key: &'static str, path: &str, thing: &str) -> bool {
    let (what, help) = if path.contains('\\') {
        ("has a backslash", "write / between folders".to_owned())
    } else if path.starts_with('/') || path.contains(':') {
        ("does not begin beside this file", format!("put the {thing} beside this file and write folder/name"))
    } else if path.split('/').any(|part| matches!(part, ".." | "." | "")) {
        (
            "leaves its folder or has an empty part",
            format!("put the {thing} beside this file and write folder/name"),
        )
    } else {
        return true;
    };
    t.fault(Kind::NotAllowed, format_args!("the path {} {what}", quoted(path)))
        .at(t.place(key), "path")
        .allowed("a path beside this file, with / between folders")
        .help(help);
    false
}

/// Whether the path under `key` has one of the endings; records where it does not.
pub fn ends(t: &Table<'_>, key: &'static str, path: &str, endings: &[&str]) -> bool {
    let lower = path.to_lowercase();
    if endings.iter().any(|ending| lower.ends_with(ending)) {
        return true;
    }
    t.fault(
        Kind::NotAllowed,
        format_args!("the path {} is not an image that the pack can hold", quoted(path)),
    )
    .at(t.place(key), "path")
    .allowed(format!("a file that ends in {}", one_of(endings)))
    .help(format!("save it as {}", one_of(endings)));
    false
}
