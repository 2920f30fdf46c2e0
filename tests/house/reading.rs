//! The practice file as text: what is read, and what is said of slips.

use perpend::job::practice::read;
use perpend::job::start;
use perpend::quantity::colour::Colour;

use super::practice;

/// Everything that is said of a practice file with these lines.
fn said(lines: &str) -> String {
    read("practice.toml", &practice(lines)).expect_err("a slip").render(false)
}

#[test]
fn the_file_to_start_from_is_valid_as_it_stands() {
    let p = read("practice.toml", start::PRACTICE).unwrap_or_else(|e| panic!("{}", e.render(false)));
    assert_eq!(
        (p.name.as_str(), p.address.len(), p.notes.len()),
        ("Sallow and Roe, structural engineers", 3, 1)
    );
    assert_eq!(p.accent, Colour::from_hex("#6b2d1f"));
    assert!(p.logo.is_none() && p.fonts.is_none() && p.templates.is_none() && p.basis.is_none());
    assert_eq!(p.digest, perpend::digest(start::PRACTICE));
}

/// Its remarks are true: with their # taken away the optional lines are read as well.
#[test]
fn its_remarks_can_be_put_in_force() {
    let all: String = start::PRACTICE
        .lines()
        .map(|line| match line.strip_prefix("# ") {
            Some(rest) if rest.contains(" = ") || rest.starts_with('[') => format!("{rest}\n"),
            _ => format!("{line}\n"),
        })
        .collect();
    let p = read("practice.toml", &all).unwrap_or_else(|e| panic!("{}", e.render(false)));
    assert!(p.logo.is_some() && p.face.is_some() && p.templates.is_some());
    assert_eq!(p.padstones.len(), 1);
    assert_eq!(p.basis.map(|b| b.helping_factor.value), Some(0.85));
}

#[test]
fn slips_are_told_with_place_allowed_and_help() {
    for (lines, found, help) in [
        (
            "[style]\naccent = \"#dddddd\"",
            "the contrast of #dddddd with white is 1.3 to 1",
            "take a darker shade",
        ),
        // #777777 has 4.478: just too pale, and printed as less than the limit.
        (
            "[style]\naccent = \"#777777\"",
            "the contrast of #777777 with white is 4.4 to 1",
            "take a darker shade",
        ),
        ("[style]\naccent = \"green\"", "\"green\" is no colour", "six hexadecimal digits"),
        ("[style]\nlogo = \"a.svg\"", "`logo_words` is missing", "add logo_words"),
        (
            "[style]\nlogo = \"a.gif\"\nlogo_words = \"A\"",
            "is not an image that the pack can hold",
            "save it as",
        ),
        ("[style]\nlogo = \"../a.svg\"\nlogo_words = \"A\"", "leaves its folder", "beside this file"),
        ("[style]\nlogo_words = \"A\"", "there is `logo_words`, but no `logo`", "add logo ="),
        ("[style]\ntext_face = \"Elder Sans\"", "there is `text_face`, but no `fonts`", "add `fonts`"),
        ("[style]\nfonts = \"f\"", "there is `fonts`, but no `text_face`", "add `text_face`"),
        ("[style]\ntemplates = \"/etc\"", "does not begin beside", "beside this file"),
        ("[style]\ncolour = \"#1f3d52\"", "nobody reads an entry `colour`", "take it out"),
        ("[basis]\nhelping_factor = 0.8", "`helping_factor` is the number 0.8", "reason"),
        (
            "[basis]\ngamma_M = { value = 9.0, reason = \"x\" }",
            "`value` is the number 9.0",
            "check the figure",
        ),
        ("[[padstones]]\nname = \"A\"", "`length` is missing", "add length"),
    ] {
        let text = said(lines);
        assert!(text.contains(found), "{found} is not in\n{text}");
        assert!(text.contains(help), "{help} is not in\n{text}");
        assert!(text.contains("practice.toml:"), "no place in\n{text}");
    }
}
