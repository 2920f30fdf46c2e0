//! What a margin says holds at its end and no longer a little beyond; the use grows steadily with the wind.

use perpend::building::{Building, PanelRoute};
use perpend::checks::panels::remedy as panel;
use perpend::checks::returns::build::{Change, Inputs};
use perpend::checks::returns::{margins, remedy};
use perpend::checks::{self, Job, outcome};
use perpend::quantity::{Force, Length, LineLoad};
use perpend::standards::annex::Annex;

use crate::jobs;

/// Every return of the demo jobs that passes, with its mark.
fn each(check: impl Fn(&str, &Inputs<'_>)) {
    let mut seen = 0;
    for (name, text) in jobs::demos() {
        let b = checks::whole::complete(perpend::job::read(&name, &text).expect("a valid job"));
        let job = Job { drawn: false, ..Job::new(&b) };
        let Ok(wind) = &job.wind else { continue };
        for r in &b.returns {
            let i = Inputs::new(&job, r, wind);
            if remedy::passes(&i, Change::NONE) {
                seen += 1;
                check(&format!("{name} {}", r.mark), &i);
            }
        }
    }
    assert!(seen >= 8, "{seen} returns pass");
}

#[test]
fn at_the_end_of_a_margin_it_passes_and_beyond_it_fails() {
    each(|name, i| {
        let wind = |factor: f64| remedy::passes(i, Change { wind: factor, ..Change::NONE });
        let (q, end) = margins::most_wind(i).expect("it passes");
        let factor = q.base() / i.wind.overall.base();
        assert!(factor >= 1.0 - 1e-2 && wind(factor), "{name}: {factor}");
        assert!(end || !wind(factor * 1.02 + 1e-2), "{name}: {factor}");

        let length = |l: f64| remedy::passes(i, Change { length: Some(Length::new(l)), ..Change::NONE });
        let l = margins::shortest(i).expect("it passes").base();
        assert!(l <= i.ret.length.base() && length(l), "{name}: {l} mm");
        assert!(l <= 101.0 || !length(l - 2.0), "{name}: {l} mm");

        let dead = |n: f64| remedy::passes(i, Change { dead: Force::new(-n), ..Change::NONE });
        let (spare, all) = margins::dead_spare(i).expect("it passes");
        assert!(dead(spare.base()), "{name}: {spare:?}");
        assert!(
            spare.base() + 200.0 >= all.base() || !dead(spare.base() + 200.0),
            "{name}: {spare:?} of {all:?}"
        );
    });
}

/// The largest use is that which decides: at most 1 exactly where the return passes; and no less in more wind.
#[test]
fn the_course_agrees_with_the_checks() {
    each(|name, i| {
        let course = margins::course(i).expect("inside every clause");
        assert!(course.here <= 1.0, "{name}: {}", course.here);
        for (l, used) in &course.by_length {
            let passes = remedy::passes(i, Change { length: Some(Length::new(*l)), ..Change::NONE });
            assert_eq!(used.is_some_and(|u| u <= 1.0), passes, "{name}: {l} mm, {used:?}");
        }
        let q = i.wind.overall.base();
        for (p, used) in &course.by_wind {
            let passes = remedy::passes(i, Change { wind: p / q, ..Change::NONE });
            assert_eq!(used.is_some_and(|u| u <= 1.0), passes, "{name}: {p} N/mm², {used:?}");
        }
        let used: Vec<f64> = course.by_wind.iter().filter_map(|p| p.1).collect();
        assert!(used.windows(2).all(|pair| pair[0] <= pair[1] + 1e-9), "{name}: {used:?}");
    });
}

/// The table of the front sheets has a row for every return, panel and footing, and moves no fallen thing.
#[test]
fn everything_with_a_mark_has_its_margin() {
    for (name, text) in jobs::demos() {
        let b: Building = checks::whole::complete(perpend::job::read(&name, &text).expect("a valid job"));
        let results = checks::run(&b);
        let sheet = &results.sections.iter().find(|s| s.id == "margins").expect("a sheet of margins").sheet;
        let text = perpend::trace::text::sheet(sheet);
        let marks = b.returns.iter().map(|r| &r.mark).chain(b.panels.iter().map(|p| &p.mark));
        // A sheet of bearings has several marks: those rows are held to their checks elsewhere.
        for mark in marks.chain(b.footings().map(|(_, f)| &f.mark)) {
            let line = text.lines().find(|l| l.trim_start().starts_with(&format!("{mark} "))).expect("a row");
            let fails = results.sections.iter().any(|s| s.mark == *mark && !outcome::holds_all(&s.sheet));
            assert_eq!(line.contains("does not pass") || line.contains("outside"), fails, "{name}: {line}");
        }
    }
}

/// Panels by hand: at the end of the margin they pass, with a fiftieth less they do not.
#[test]
fn the_dead_load_of_a_panel_may_fall_so_far() {
    let (mut seen, mut needed) = (0, 0);
    for (name, text) in jobs::demos() {
        let b = checks::whole::complete(perpend::job::read(&name, &text).expect("a valid job"));
        for p in b.panels.iter().filter(|p| p.route != PanelRoute::LimitAnalysis) {
            let Ok(m) = checks::panel_sheet::model(&Job { drawn: false, ..Job::new(&b) }, p) else {
                continue;
            };
            let with = |g: f64| {
                let mut other = m.clone();
                let i = other.loaded();
                other.leaves[i].G_above = LineLoad::new(g);
                panel::passes(&other, &Annex::UK)
            };
            let given = m.leaves[m.loaded()].G_above.base();
            let Some(g) = panel::dead_down_to(&m, &Annex::UK).map(|g| g.base()).filter(|_| given > 0.0)
            else {
                continue;
            };
            seen += 1;
            assert!(g <= given && with(g), "{name} {}: {g}", p.mark);
            if g > 0.0 {
                needed += 1;
                assert!(!with(g * 0.98 - 0.03), "{name} {}: {g}", p.mark);
            }
        }
    }
    assert!(seen >= 6 && needed >= 2, "{seen} panels with a load, {needed} that need some of it");
}

/// `text` after `mark`, to the end of the next line that begins with `what`.
fn row<'t>(table: &'t str, mark: &str, what: &str) -> &'t str {
    let from = table.find(&format!("\n    {mark} ")).unwrap_or_else(|| panic!("no {mark}"));
    table[from..].lines().find(|l| l.contains(what)).unwrap_or_else(|| panic!("no {what}"))
}

/// Whether a sheet of the job passes.
fn passes(text: &str, mark: &str) -> bool {
    let (_, results) = perpend::check("job.toml", text).unwrap_or_else(|e| panic!("{e}"));
    outcome::holds_all(&results.sections.iter().find(|s| s.mark == mark).expect("a sheet").sheet)
}

/// Material factors and mortar as the table says, put into the job file itself and the whole job checked.
#[test]
fn materials_hold_as_far_as_the_table_says_in_the_job_file_itself() {
    let (_, results) = perpend::draw("job.toml", jobs::START).expect("a valid job");
    let sheet = &results.sections.iter().find(|s| s.id == "margins").expect("margins").sheet;
    let table = perpend::trace::text::sheet(sheet);
    // P1 takes factors beyond those that a job may state.
    for mark in ["R1", "R2", "P2"] {
        let factors = row(&table, mark, "material factors");
        let up_to = factors.split("up to ").nth(1).expect("a margin").trim();
        let values: Vec<f64> = up_to.split(", ").map(|v| v.trim().parse().expect("a factor")).collect();
        let with = |more: f64| {
            let stated = |name: &str, v: f64| {
                format!("gamma_M_{name} = {{ value = {:.4}, reason = \"Tried.\" }}\n", v * more)
            };
            let [c, f, v] = values[..] else { panic!("{factors}") };
            let lines = stated("compression", c) + &stated("flexure", f) + &stated("shear", v);
            jobs::START.replacen("execution_class = 2", &format!("{lines}execution_class = 2"), 1)
        };
        assert!(passes(&with(1.0), mark), "{factors}");
        assert!(!passes(&with(1.01), mark), "{factors}");

        let mortar = row(&table, mark, "class of mortar");
        assert!(mortar.ends_with("down to M2"), "{mortar}");
        assert!(passes(&jobs::START.replace("mortar = \"M4\"", "mortar = \"M2\""), mark), "{mortar}");
    }
}
