//! The house style of a practice: what its file may say, what its files may be, what a pack makes of them.

mod files;
mod packs;
mod reading;

use std::path::Path;

use perpend::house::House;

/// The two styles of the invented practice.
const STYLES: [&str; 2] = ["leaf", "board"];

fn house(style: &str) -> House {
    perpend::house::open(&Path::new("jobs/practice").join(format!("{style}.toml")))
        .unwrap_or_else(|e| panic!("{style}: {e}"))
}

/// A practice file with these lines after its name.
fn practice(lines: &str) -> String {
    format!("[practice]\nname = \"Elder and Ash\"\n{lines}")
}
