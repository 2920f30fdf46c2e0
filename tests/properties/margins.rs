//! What a margin says holds at its end and no longer a little beyond; the use grows steadily with the wind.

use perpend::building::Building;
use perpend::checks::returns::build::{Change, Inputs};
use perpend::checks::returns::{margins, remedy};
use perpend::checks::{self, Job, outcome};
use perpend::quantity::{Force, Length};

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

/// The table of the front sheets has a row for every return and panel, and moves no fallen thing.
#[test]
fn every_return_and_panel_has_its_margin() {
    for (name, text) in jobs::demos() {
        let b: Building = checks::whole::complete(perpend::job::read(&name, &text).expect("a valid job"));
        let results = checks::run(&b);
        let sheet = &results.sections.iter().find(|s| s.id == "margins").expect("a sheet of margins").sheet;
        let text = perpend::trace::text::sheet(sheet);
        for mark in b.returns.iter().map(|r| &r.mark).chain(b.panels.iter().map(|p| &p.mark)) {
            let line = text.lines().find(|l| l.trim_start().starts_with(&format!("{mark} "))).expect("a row");
            let fails = results.sections.iter().any(|s| s.mark == *mark && !outcome::holds_all(&s.sheet));
            assert_eq!(line.contains("does not pass") || line.contains("outside"), fails, "{name}: {line}");
        }
    }
}
