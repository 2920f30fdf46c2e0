//! What the project holds itself to: arrows between modules, fences around crates, short files, coverage
//! files, and a meaning for every symbol.

mod arrows;
mod catalogue;
mod files;
mod glossary;

use std::path::{Path, PathBuf};

/// The root of the repository.
fn root() -> &'static Path {
    Path::new(env!("CARGO_MANIFEST_DIR"))
}

/// Every Rust file below `src`, with its path from there and its text, in order.
fn sources() -> Vec<(String, String)> {
    let src = root().join("src");
    let mut files = Vec::new();
    walk(&src, &mut files);
    files.sort();
    files
        .into_iter()
        .filter(|p| p.extension().is_some_and(|e| e == "rs"))
        .map(|p| {
            let name = p.strip_prefix(&src).expect("below src").to_string_lossy().replace('\\', "/");
            let text = std::fs::read_to_string(&p).expect("a source file");
            (name, text)
        })
        .collect()
}

fn walk(folder: &Path, out: &mut Vec<PathBuf>) {
    for entry in std::fs::read_dir(folder).expect("a folder") {
        let path = entry.expect("an entry").path();
        if path.is_dir() { walk(&path, out) } else { out.push(path) }
    }
}
