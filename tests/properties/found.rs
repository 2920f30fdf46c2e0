//! What the plan shows and the job leaves out stays neither unworked nor unsaid.

use perpend::building::{Building, Head};
use perpend::checks::{self, Results};

const JOB: &str = include_str!("../../jobs/semi.toml");

fn read(text: &str) -> Building {
    perpend::job::read("semi.toml", text).unwrap_or_else(|r| panic!("{}", r.render(false)))
}

fn changed(from: &str, to: &str) -> Results {
    assert!(JOB.contains(from), "the job has changed");
    checks::run(&read(&JOB.replacen(from, to, 1)))
}

fn hold<'r>(results: &'r Results, words: &str) -> Option<&'r checks::outcome::Hold> {
    results.holds.iter().find(|h| h.text.contains(words))
}

fn table_text(results: &Results) -> String {
    let section = results.sections.iter().find(|s| s.id == "found").expect("the sheet is there");
    perpend::trace::text::sheet(&section.sheet)
}

#[test]
fn a_window_of_a_panel_is_a_hold_point() {
    let all = checks::run(&read(JOB));
    let found = hold(&all, "with its opening").expect("a hold point");
    assert!(found.text.contains("rear wall from R1 to flank wall, 3.20 m long"), "{}", found.text);
    assert_eq!(found.of, ["rear wall"]);
    // Without the window the length is worked as a panel of its own, its edges to be seen.
    let window = "    { storey = \"ground\", from = \"4.0 m\", width = \"1.6 m\", sill = \"0.9 m\", height = \"1.2 m\" },\n";
    let solid = changed(window, "");
    assert!(hold(&solid, "with its opening").is_none());
    assert!(hold(&solid, "see what holds the edges of P2").is_some());
    assert!(solid.sections.iter().any(|s| s.id == "P2" && s.sheet.verdicts.len() > 1));
}

/// A panel given over a window is worked as a plain wall, and says so.
#[test]
fn a_panel_given_over_a_window_is_a_hold_point() {
    let results = changed(
        "between = [\"party wall\", \"R1\"]\n\n[panels.before]\n",
        "between = [\"R1\", \"flank wall\"]\n\n[panels.before]\n",
    );
    let found = hold(&results, "worked here as a wall without openings").expect("a hold point");
    assert_eq!(found.of, ["P1"]);
}

#[test]
fn a_return_that_nobody_speaks_of_is_a_free_cantilever() {
    let (a, z) =
        (JOB.find("# What stays in the line").unwrap_or(0), JOB.find("# Outer walls that it").unwrap_or(0));
    let text = format!("{}{}", &JOB[..a], &JOB[z..]).replace("for = [\"R1\", \"R2\"]", "");
    let b = read(&text);
    assert_eq!(b.found.added, ["R1", "R2"]);
    assert!(b.returns.iter().all(|r| r.head == Head::Free && !r.junction.bonded && r.footing.is_none()));
    let results = checks::run(&b);
    let fails = |id: &str| {
        let s = results.sections.iter().find(|s| s.id == id).expect("its sheet");
        s.sheet.verdicts.iter().any(|v| !v.holds)
    };
    assert!(fails("R1") && fails("R2"), "0.9 m of block carries no house");
    assert!(table_text(&results).contains("the job file does not speak of it"));
}

#[test]
fn a_figure_by_hand_stands_beside_that_of_the_plan() {
    let plain = table_text(&checks::run(&read(JOB)));
    assert!(!plain.contains("the job file is used"), "{plain}");
    let results = changed("mark = \"R1\"\nhead", "mark = \"R1\"\ntributary_width = \"2.60 m\"\nhead");
    let text = table_text(&results);
    assert!(text.contains("the job file is used") && text.contains("tributary width"), "{text}");
    assert!(text.contains("2.60") && text.contains("3.20"), "{text}");
}

/// A nib shorter than a fifth of the height makes one panel of two.
#[test]
fn a_nib_too_short_to_hold_makes_one_long_panel() {
    let text = JOB
        .replacen(
            "from = [\"3.2 m\", \"0.9 m\"], to = [\"3.2 m\", \"2.7 m\"], removed",
            "from = [\"3.2 m\", \"0.4 m\"], to = [\"3.2 m\", \"2.7 m\"], removed",
            1,
        )
        .replacen("to = [\"3.2 m\", \"0.9 m\"], storeys", "to = [\"3.2 m\", \"0.4 m\"], storeys", 1)
        .replacen("from = [\"3.2 m\", \"0.75 m\"]", "from = [\"3.2 m\", \"0.25 m\"]", 1)
        .replacen(
            "between = [\"party wall\", \"R1\"]\n\n[panels.before]\n",
            "between = [\"party wall\", \"flank wall\"]\n\n[panels.before]\n",
            1,
        );
    let b = read(&text);
    assert_eq!(b.found.panels.len(), 1);
    let p = b.panel("P1").expect("the panel");
    assert_eq!((p.before.length.base(), p.after.length.base()), (3200.0, 6400.0));
}
