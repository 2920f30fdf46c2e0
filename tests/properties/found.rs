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
fn a_window_of_a_panel_is_worked_with_it() {
    let b = read(JOB);
    let all = checks::run(&b);
    assert!(hold(&all, "with its opening").is_none());
    // Seen from outside the rear wall runs as the plan does: 4.0 m from the party wall is 0.8 m from R1.
    let p2 = b.panel("P2").expect("added from the plan");
    let of =
        |o: &perpend::building::PanelOpening| [o.at, o.width, o.sill, o.height].map(|l| l.base().round());
    assert_eq!(p2.after.openings.iter().map(of).collect::<Vec<_>>(), [[800.0, 1600.0, 900.0, 1200.0]]);
    let used = |r: &Results| {
        let s = r.sections.iter().find(|s| s.id == "P2").expect("its sheet");
        s.sheet.verdicts.iter().find(|v| v.id == "flexure-after").expect("a verdict").ratio
    };
    // Without the window the same length takes much more; its edges are to be seen either way.
    let window = "    { storey = \"ground\", from = \"4.0 m\", width = \"1.6 m\", sill = \"0.9 m\", height = \"1.2 m\" },\n";
    let solid = changed(window, "");
    assert!(used(&solid) < 0.7 * used(&all), "{} {}", used(&solid), used(&all));
    for r in [&all, &solid] {
        assert!(hold(r, "see what holds the edges of P2").is_some());
    }
}

/// Openings that a panel is given take the place of those on the plan; fewer of them are a hold point.
#[test]
fn openings_by_hand_take_the_place_of_the_plans() {
    let given = |openings: &str| {
        let text = JOB.replacen(
            "between = [\"party wall\", \"R1\"]\n\n[panels.before]\n",
            &format!("between = [\"R1\", \"flank wall\"]\nopenings = [{openings}]\n\n[panels.before]\n"),
            1,
        );
        let b = read(&text);
        let n = b.panel("P1").expect("it").after.openings.len();
        (n, hold(&checks::run(&b), "worked here as a wall without openings").is_some())
    };
    assert_eq!(
        given("{ at = \"0.9 m\", width = \"1.4 m\", height = \"2.1 m\", frame = \"jambs\" }"),
        (1, false)
    );
    assert_eq!(given(""), (0, true));
}

#[test]
fn a_return_that_nobody_speaks_of_is_a_free_cantilever() {
    let (a, z) =
        (JOB.find("# What stays in the line").unwrap_or(0), JOB.find("# Outer walls that it").unwrap_or(0));
    let text = format!("{}{}", &JOB[..a], &JOB[z..]).replace("for = [\"R1\", \"R2\"]", "");
    let b = read(&text);
    assert_eq!(b.found.added, ["R1", "R2", "P2"]);
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
