//! The three locks, each broken on purpose: what is printed is what ran, from what stands there.

use perpend::quantity::{Dim, Dyn, Force, Length, Num, Stress};
use perpend::trace::{Entry, Outside, Sheet, text};
use perpend::{calc, decide, found, given, require, verify};

fn mm(x: f64) -> Length {
    Length::new(x)
}

const LENGTH: Dim = Dim { force: 0, length: 1, time: 0 };

fn length(x: f64) -> Dyn {
    Dyn { value: x, dim: LENGTH }
}

/// The one fault of a sheet, as `step: what`.
fn fault(s: &Sheet) -> String {
    assert_eq!(s.faults.len(), 1, "{:?}", s.faults);
    format!("{}: {}", s.faults[0].step, s.faults[0].what)
}

/// Lock 1: the tokens that ran are the tokens that are printed, and the value is theirs.
#[test]
fn what_ran_is_what_is_printed() {
    let mut s = Sheet::recorder();
    given!(s, "length", "job file", l = mm(600.0));
    given!(s, "thickness", "job file", t = mm(100.0));
    calc!(s, "geometry", "area", A = l * t);
    assert_eq!(A.base(), 600.0 * 100.0);
    let Some(Entry::Step(step)) = s.entries.last() else { panic!("a step") };
    assert_eq!(text::step(step), "area: A = l t = 600 mm × 100 mm = 60\u{2009}000 mm²");
    assert!(s.faults.is_empty());
}

/// Lock 2: a result that the printed formula does not give is a fault, by one bit too.
#[test]
fn a_result_that_the_formula_does_not_give_is_a_fault() {
    let l = length(600.0);
    for (value, broken) in [(300.0, false), (300.0_f64.next_up(), true), (301.0, true)] {
        let mut s = Sheet::recorder();
        s.given("l", "length", "job file", l);
        s.step("x", "", "geometry", "l / 2.0", length(value), &[("l", l)]);
        assert_eq!(!s.faults.is_empty(), broken, "{value}");
        if broken {
            assert!(fault(&s).starts_with("x = l / 2.0: printed formula gives"), "{}", fault(&s));
        }
    }
}

/// Lock 2 holds dimensions too: the right number of the wrong kind is a fault.
#[test]
fn a_result_of_another_dimension_is_a_fault() {
    let l = length(600.0);
    let mut s = Sheet::recorder();
    s.given("l", "length", "job file", l);
    s.step("x", "", "geometry", "l / 2.0", Dyn::number(300.0), &[("l", l)]);
    assert!(fault(&s).contains("printed formula gives"), "{}", fault(&s));
}

/// What cannot be read or worked out is a fault, never silence.
#[test]
fn what_cannot_be_evaluated_is_a_fault() {
    let l = length(600.0);
    for (tokens, what) in [
        ("l + 2.0", "the printed formula cannot be evaluated"),
        ("ln(l)", "the printed formula cannot be evaluated"),
        ("sqrt(l)", "the printed formula cannot be evaluated"),
        ("mpa(l)", "the printed formula cannot be evaluated"),
        ("sinh(l)", "the formula cannot be read"),
        ("min(l)", "the formula cannot be read"),
        ("l %% 2", "the formula cannot be read"),
        ("(l", "the formula cannot be read"),
        ("", "the formula cannot be read"),
    ] {
        let mut s = Sheet::recorder();
        s.given("l", "length", "job file", l);
        s.step("x", "", "geometry", tokens, l, &[("l", l)]);
        assert_eq!(fault(&s), format!("x = {tokens}: {what}"));
    }
}

/// Lock 3: a symbol of a formula must stand on this sheet.
#[test]
fn a_symbol_that_does_not_stand_is_a_fault() {
    let mut s = Sheet::recorder();
    given!(s, "length", "job file", l = mm(600.0));
    let t = mm(100.0);
    calc!(s, "geometry", "area", A = l * t);
    let _ = A;
    let whats: Vec<&str> = s.faults.iter().map(|f| f.what.as_str()).collect();
    assert_eq!(whats, ["t does not stand on this sheet", "the printed formula cannot be evaluated"]);
}

/// Lock 3: it must stand there with exactly the value that was used.
#[test]
fn a_symbol_that_stands_with_another_value_is_a_fault() {
    let mut s = Sheet::recorder();
    given!(s, "length", "job file", l = mm(600.0));
    let l = mm(l.base().next_up());
    calc!(s, "geometry", "half", x = l / 2.0);
    let _ = x;
    assert!(s.faults[0].what.starts_with("l stands as"), "{:?}", s.faults);
    assert!(s.faults[0].what.contains("but was used as"), "{:?}", s.faults);
    // The same number as a bare one is another value.
    let mut s = Sheet::recorder();
    s.given("l", "length", "job file", length(600.0));
    s.step("x", "", "geometry", "2.0 * l", length(1200.0), &[("l", Dyn::number(600.0))]);
    assert!(fault(&s).contains("but was used as"), "{}", fault(&s));
}

/// A later value of a symbol stands; the earlier is gone.
#[test]
fn the_last_value_stands() {
    let mut s = Sheet::recorder();
    given!(s, "length", "job file", l = mm(600.0));
    let first = l;
    given!(s, "length", "measured again", l = mm(590.0));
    calc!(s, "geometry", "half", x = l / 2.0);
    assert!(s.faults.is_empty());
    assert_eq!(x.base(), 295.0);
    let l = first;
    calc!(s, "geometry", "half", x = l / 2.0);
    let _ = x;
    assert!(!s.faults.is_empty());
}

/// A branch decided otherwise than its relation says is a fault; so is one between unlike things.
#[test]
fn a_relation_decided_otherwise_is_a_fault() {
    let (e, l) = (length(120.0), length(600.0));
    for (tokens, holds) in [("e <= l / 6.0", false), ("e < l / 6.0", true), ("e > l", true), ("e >= l", true)]
    {
        for decide in [true, false] {
            let mut s = Sheet::recorder();
            s.given("e", "eccentricity", "above", e);
            s.given("l", "length", "job file", l);
            let told = if tokens.starts_with("e <=") { !holds } else { holds };
            if decide {
                s.decide("so", "6.2(2)", tokens, told, &[("e", e), ("l", l)]);
            } else {
                s.require("so", "6.2(2)", tokens, told, &[("e", e), ("l", l)]);
            }
            // 120 <= 100 is false, 120 < 100 is false, 120 > 600 is false: told to hold, each is a fault.
            assert!(fault(&s).contains("decided was true"), "{tokens}: {}", fault(&s));
        }
    }
    let mut s = Sheet::recorder();
    s.given("e", "eccentricity", "above", e);
    s.decide("so", "6.2(2)", "e <= 6.0", true, &[("e", e)]);
    assert!(fault(&s).contains("printed relation gives None"), "{}", fault(&s));
    let mut s = Sheet::recorder();
    s.decide("so", "6.2(2)", "e == 6.0", true, &[]);
    assert_eq!(fault(&s), "e == 6.0: the relation cannot be read");
}

/// The macros decide by the tokens that they print, and a limit that is left leaves the function.
#[test]
fn relations_of_the_macros_hold() {
    fn within(s: &mut Sheet, lambda: f64) -> Result<bool, Outside> {
        given!(s, "slenderness", "above", lambda_h = Num::new(lambda));
        require!(s, "slenderness", "5.5.1.4(2)", "slenderness of 27", lambda_h <= 27.0);
        Ok(decide!(s, "5.5.1.4(2)", "slender", "stocky", lambda_h > 20.0))
    }
    let mut s = Sheet::recorder();
    assert_eq!(within(&mut s, 25.0), Ok(true));
    assert_eq!(within(&mut s, 15.0), Ok(false));
    assert_eq!(within(&mut s, 27.0), Ok(true));
    let left = within(&mut s, 27.1).expect_err("outside");
    assert_eq!(left, Outside::new("slenderness", "5.5.1.4(2)", "slenderness of 27"));
    assert!(s.faults.is_empty(), "{:?}", s.faults);
    assert!(text::sheet(&s).contains("λ_h ≤ 27: 27.1 > 27; slenderness of 27"));
}

/// A verdict names two symbols that stand, of one dimension.
#[test]
fn a_verdict_stands_on_the_sheet() {
    let mut s = Sheet::recorder();
    given!(s, "shear", "statics", V_Ed = Force::new(10e3));
    let V_Rd = Force::new(12e3);
    verify!(s, "shear", "6.2(1)", "shear", V_Ed <= V_Rd);
    assert_eq!(fault(&s), "V_Ed <= V_Rd: V_Rd does not stand on this sheet");

    let mut s = Sheet::recorder();
    let (force, stress) = (Force::new(10e3).dynamic(), Stress::new(12e3).dynamic());
    s.given("V_Ed", "shear", "statics", force);
    s.given("f", "strength", "statics", stress);
    s.verify("shear", "shear", "6.2", ("V_Ed", force), ("f", stress), true);
    assert_eq!(fault(&s), "V_Ed <= f: demand and resistance differ in dimension");
}

/// The result of a search stands like any other value; what is computed again from it is under the locks.
#[test]
fn a_found_value_stands() {
    let mut s = Sheet::recorder();
    found!(s, "first principles", "neutral axis", c = mm(321.0));
    calc!(s, "geometry", "half", x = c / 2.0);
    assert_eq!(x.base(), 160.5);
    assert!(s.faults.is_empty());
}

/// A fault reaches the caller as an internal error that names sheet and step, through the same list that
/// the checks of a job fill.
#[test]
fn faults_of_any_section_are_listed() {
    use perpend::checks::{Results, Section, outcome::Outcome};
    let mut broken = Sheet::recorder();
    broken.fault("x = y".to_owned(), "y does not stand on this sheet".to_owned());
    let sections = vec![Section::plain("a", "A", Sheet::recorder()), Section::plain("b", "B", broken)];
    let results = Results { sections, holds: Vec::new(), outcome: Outcome::Adequate, remarks: Vec::new() };
    let listed: Vec<(&str, &str)> = results.faults().map(|(id, f)| (id, f.step.as_str())).collect();
    assert_eq!(listed, [("b", "x = y")]);
}
