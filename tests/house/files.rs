//! The files of a practice: logo, faces and templates, good and bad.

use std::path::Path;

use perpend::house::open;
use tempfile::TempDir;

use super::{STYLES, house, practice};

/// A folder with a practice file of these lines, and files beside it.
fn folder(lines: &str, files: &[(&str, &[u8])]) -> TempDir {
    let dir = tempfile::tempdir().expect("a folder");
    let put = |name: &str, bytes: &[u8]| {
        let path = dir.path().join(name);
        std::fs::create_dir_all(path.parent().expect("a folder")).expect("a folder");
        std::fs::write(path, bytes).expect("a file");
    };
    put("practice.toml", practice(lines).as_bytes());
    files.iter().for_each(|(name, bytes)| put(name, bytes));
    dir
}

fn refused(lines: &str, files: &[(&str, &[u8])]) -> String {
    let dir = folder(lines, files);
    match open(&dir.path().join("practice.toml")) {
        Ok(_) => panic!("taken: {lines}"),
        Err(e) => e.to_string(),
    }
}

const SVG: &str = "[style]\nlogo = \"logo.svg\"\nlogo_words = \"A mark\"";
const PNG: &str = "[style]\nlogo = \"logo.png\"\nlogo_words = \"A mark\"";
const FACE: &str = "[style]\ntext_face = \"Perpend Sparse\"\nfonts = \"f\"";

fn svg(inside: &str, size: &str) -> String {
    format!("<svg xmlns=\"http://www.w3.org/2000/svg\" {size}>{inside}</svg>")
}

#[test]
fn both_demo_styles_can_be_used() {
    let [leaf, board] = STYLES.map(house);
    assert!(!leaf.look.own_templates() && board.look.own_templates());
}

#[test]
fn a_logo_that_cannot_be_read_is_refused() {
    let square = "width=\"10\" height=\"10\"";
    for (lines, bytes, found) in [
        (SVG, b"<svg".to_vec(), "does not read as an SVG"),
        (SVG, svg("<text>AB</text>", square).into_bytes(), "letters that are not outlines"),
        (SVG, svg("<image href=\"/etc/passwd\"/>", square).into_bytes(), "holds a picture"),
        (
            SVG,
            svg("<path d=\"M0 0h1v1z\"/>", "width=\"100\" height=\"10\"").into_bytes(),
            "10.0 times as wide as high",
        ),
        (SVG, vec![0xFF, 0xFE, 0x00], "not UTF-8"),
        (PNG, b"\x89PNG\r\n\x1a\nbroken".to_vec(), "does not read as a PNG"),
        (PNG, svg("", square).into_bytes(), "does not read as a PNG"),
    ] {
        let name = if lines == SVG { "logo.svg" } else { "logo.png" };
        let text = refused(lines, &[(name, &bytes)]);
        assert!(
            text.contains(found) && text.contains(name) && text.contains("help: "),
            "{found} is not in\n{text}"
        );
    }
    let text = refused(PNG, &[]);
    assert!(text.contains("cannot be read") && text.contains("check `logo`"), "{text}");
}

#[test]
fn a_face_without_a_glyph_is_refused() {
    let (regular, bold): (&[u8], &[u8]) =
        (include_bytes!("../data/sparse-regular.ttf"), include_bytes!("../data/sparse-bold.ttf"));
    let text = refused(FACE, &[("f/r.ttf", regular), ("f/b.ttf", bold)]);
    assert!(text.contains("has no glyph for 0123456789.,"), "{text}");
    let text = refused(FACE, &[("f/r.ttf", regular)]);
    assert!(text.contains("not both a regular face and a semibold or bold one"), "{text}");
    let text = refused(FACE, &[("f/readme.txt", b"no face")]);
    assert!(text.contains("there is no face in the folder"), "{text}");
    let text = refused(FACE, &[("f/r.ttf", b"not a face")]);
    assert!(text.contains("f/r.ttf") && text.contains("does not read as a face"), "{text}");
    let plex: &[u8] = include_bytes!("../../jobs/practice/fonts/IBMPlexSans-Regular.ttf");
    let text = refused(FACE, &[("f/p.ttf", plex)]);
    assert!(text.contains("only IBM Plex Sans"), "{text}");
}

/// What the practice has printed of itself is looked at too.
#[test]
fn a_name_that_no_face_can_print_is_refused() {
    let text = refused("contact = \"電話 1\"", &[]);
    assert!(text.contains("no face has a glyph for 電"), "{text}");
}

#[test]
fn templates_are_looked_for_and_must_replace_something() {
    let own = "[style]\ntemplates = \"t\"";
    assert!(refused(own, &[]).contains("cannot be read"));
    let text = refused(own, &[("t/parts/mine.typ", b"#let x = 1")]);
    assert!(text.contains("none of its files takes the place of a template"), "{text}");
    let text = refused(own, &[("t/parts/front.typ", &[0xFF])]);
    assert!(text.contains("t/parts/front.typ") && text.contains("not UTF-8"), "{text}");
}

/// Hidden files and links stay outside: a link could lead anywhere on the disk.
#[cfg(unix)]
#[test]
fn links_in_a_folder_are_not_followed() {
    let dir = folder("[style]\ntemplates = \"t\"", &[("t/parts/.front.typ", b"#let x = 1")]);
    std::os::unix::fs::symlink(Path::new("/etc/passwd"), dir.path().join("t/pack.typ")).expect("a link");
    let text =
        open(&dir.path().join("practice.toml")).map(|_| ()).expect_err("no template is there").to_string();
    assert!(text.contains("none of its files takes the place of a template"), "{text}");
}
