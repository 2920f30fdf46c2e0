//! One expression, three renderings: plain text, nested arrays for the page, words for readers that speak.

use perpend::calc;
use perpend::given;
use perpend::quantity::functions::{MPA, abs, cbrt, cube, exp, max, min, mpa, pow, sq, sqrt};
use perpend::quantity::{Force, Length, Moment, Num, Stress};
use perpend::trace::{Entry, Sheet, Step, math, spoken, text};

fn last(s: &Sheet) -> &Step {
    assert!(s.faults.is_empty(), "{:?}", s.faults);
    match s.entries.last() {
        Some(Entry::Step(step)) => step,
        other => panic!("a step, not {other:?}"),
    }
}

fn three(s: &Sheet) -> (String, String, String) {
    let step = last(s);
    (text::step(step), math::formula(step).json().to_string(), spoken::step(step))
}

/// `V_Rd = f_vd t l_c`, the formula that the language was made for.
#[test]
fn a_product() {
    let mut s = Sheet::recorder();
    given!(s, "", "", f_vd = Stress::new(0.181));
    given!(s, "", "", t = Length::new(100.0));
    given!(s, "", "", l_c = Length::new(640.0));
    calc!(s, "6.2(2) eq. 6.13", V_Rd = f_vd * t * l_c);
    let _ = V_Rd;
    let (plain, page, speech) = three(&s);
    assert_eq!(plain, "V_Rd = f_vd t l_c = 0.181 N/mm² × 100 mm × 640 mm = 11.6 kN");
    assert_eq!(page, r#"["times",["sym","f","vd"],["sym","t",""],["sym","l","c"]]"#);
    assert_eq!(
        speech,
        "V sub Rd equals f sub vd times t times l sub c, that is 0.181 newtons per square millimetre times 100 \
         millimetres times 640 millimetres, equals 11.6 kilonewtons"
    );
    let values = math::substitution(last(&s)).expect("values").json().to_string();
    assert_eq!(values, r#"["times",["val","0.181","N/mm²"],["val","100","mm"],["val","640","mm"]]"#);
}

/// A least value, a sum, a number in front.
#[test]
fn a_least_value() {
    let mut s = Sheet::recorder();
    given!(s, "", "", f_vk0 = Stress::new(0.15));
    given!(s, "", "", sigma_d = Stress::new(0.3));
    given!(s, "", "", f_b = Stress::new(10.0));
    calc!(s, "3.6.2(3)", f_vk = min(f_vk0 + 0.4 * sigma_d, 0.065 * f_b));
    let _ = f_vk;
    let (plain, page, speech) = three(&s);
    assert_eq!(
        plain,
        "f_vk = min(f_vk0 + 0.4 σ_d; 0.065 f_b) = min(0.15 N/mm² + 0.4 × 0.3 N/mm²; 0.065 × 10 N/mm²) = 0.27 N/mm²"
    );
    assert_eq!(
        page,
        concat!(
            r#"["call","min",[["plus",["sym","f","vk0"],["times",["num","0.4"],["sym","sigma","d"]]],"#,
            r#"["times",["num","0.065"],["sym","f","b"]]]]"#
        )
    );
    assert!(speech.starts_with(
        "f sub vk equals the least of f sub vk0 plus 0.4 times sigma sub d, and 0.065 times f sub b, that is"
    ));
}

/// Fractions, brackets and signs: a difference below a line keeps its meaning in every rendering.
#[test]
fn a_fraction() {
    let mut s = Sheet::recorder();
    given!(s, "", "", M_Ed = Moment::new(-5e6));
    given!(s, "", "", N_Ed = Force::new(40e3));
    given!(s, "", "", l = Length::new(600.0));
    calc!(s, "statics", "eccentricity", e = abs(M_Ed / N_Ed));
    calc!(s, "statics", "part", r = (l / 2.0 - e) / (l - 2.0 * e));
    let _ = r;
    let (plain, page, speech) = three(&s);
    assert_eq!(
        plain,
        "part: r = (l / 2 − e) / (l − 2 e) = (600 mm / 2 − 125 mm) / (600 mm − 2 × 125 mm) = 0.5"
    );
    assert_eq!(
        page,
        concat!(
            r#"["frac",["minus",["frac",["sym","l",""],["num","2"]],["sym","e",""]],"#,
            r#"["minus",["sym","l",""],["times",["num","2"],["sym","e",""]]]]"#
        )
    );
    assert!(speech.starts_with("r equals l over 2 minus e over l minus 2 times e, that is"), "{speech}");
    let Some(Entry::Step(first)) = s.entries.iter().find(|e| matches!(e, Entry::Step(_))) else {
        panic!("e")
    };
    assert_eq!(text::step(first), "eccentricity: e = |M_Ed / N_Ed| = |−5 kNm / 40 kN| = 125 mm");
}

/// Powers, roots, empirical numbers and a unit at the end.
#[test]
fn powers_and_roots() {
    let mut s = Sheet::recorder();
    given!(s, "", "", K = Num::new(0.75));
    given!(s, "", "", f_b = Stress::new(10.0));
    calc!(s, "3.6.1.2", f_k = K * pow(mpa(f_b), 0.7) * MPA);
    let _ = f_k;
    let (plain, page, speech) = three(&s);
    assert_eq!(plain, "f_k = K f_b^0.7 = 0.75 × 10^0.7 N/mm² = 3.76 N/mm²");
    assert_eq!(page, r#"["times",["sym","K",""],["power",["sym","f","b"],["num","0.7"]]]"#);
    assert!(speech.starts_with(
        "f sub k equals K times f sub b to the power 0.7, that is 0.75 times 10 to the power 0.7"
    ));

    given!(s, "", "", t_1 = Length::new(100.0));
    given!(s, "", "", t_2 = Length::new(100.0));
    calc!(s, "5.5.1.3(3)", t_ef = cbrt(cube(t_1) + cube(t_2)));
    let _ = t_ef;
    let (plain, page, speech) = three(&s);
    assert_eq!(plain, "t_ef = ∛(t_1^3 + t_2^3) = ∛((100 mm)^3 + (100 mm)^3) = 126 mm");
    assert_eq!(
        page,
        r#"["cbrt",["plus",["power",["sym","t","1"],["num","3"]],["power",["sym","t","2"],["num","3"]]]]"#
    );
    assert!(speech.starts_with("t sub ef equals the cube root of t sub 1 cubed plus t sub 2 cubed, that is"));

    given!(s, "", "", u = Num::new(0.5));
    calc!(s, "Annex G", Phi_m = max(exp(-(sq(u) / 2.0)), sqrt(u) / 9.0));
    let _ = Phi_m;
    let (plain, page, _) = three(&s);
    assert_eq!(plain, "Φ_m = max(exp(−u^2 / 2); √(u) / 9) = max(exp(−0.5^2 / 2); √(0.5) / 9) = 0.882");
    assert_eq!(
        page,
        concat!(
            r#"["call","max",[["call","exp",[["neg",["frac",["power",["sym","u",""],["num","2"]],["num","2"]]]]],"#,
            r#"["frac",["sqrt",["sym","u",""]],["num","9"]]]]"#
        )
    );
}

/// A step that only names another value is not substituted: that would say the same twice.
#[test]
fn a_plain_name_is_not_substituted() {
    let mut s = Sheet::recorder();
    given!(s, "", "", t = Length::new(102.5));
    calc!(s, "5.5.1.3(1)", "effective thickness", t_ef = t);
    let _ = t_ef;
    let (plain, _, speech) = three(&s);
    assert_eq!(plain, "effective thickness: t_ef = t = 102.5 mm");
    assert_eq!(speech, "t sub ef equals t, equals 102.5 millimetres");
}

/// Subscripts: the first underscore parts them, later ones become commas.
#[test]
fn names_become_symbols() {
    let node = math::symbol("f_xd1_app");
    assert_eq!(text::node(&node), "f_xd1,app");
    assert_eq!(spoken::speak(&node), "f sub xd1 app");
    assert_eq!(node.json().to_string(), r#"["sym","f","xd1,app"]"#);
    assert_eq!(text::node(&math::symbol("gamma_M")), "γ_M");
}
