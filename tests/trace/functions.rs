//! Every function and unit of `quantity::functions` has its twin in `trace::expr`, and both agree to the bit.

use perpend::quantity::functions::{
    KG_M3, KN, M_S, MM, MPA, abs, cbrt, cube, exp, ln, log10, max, metres, min, mpa, pow, sq, sqrt,
    square_metres,
};
use perpend::quantity::{Area, Length, Num, Stress};
use perpend::trace::Sheet;
use perpend::trace::expr::{Fun, UNIT_CONSTS};
use perpend::{calc, given};
use proptest::prelude::*;

const QUANTITY: &str = include_str!("../../src/quantity/functions.rs");
const EXPR: &str = include_str!("../../src/trace/expr.rs");

/// Name and number of arguments of each `pub fn` that stands at the left margin.
fn declared() -> Vec<(String, usize)> {
    let mut out = Vec::new();
    for rest in QUANTITY.split("\npub fn ").skip(1) {
        let name: String = rest.chars().take_while(|c| c.is_ascii_alphanumeric() || *c == '_').collect();
        let open = rest.find('(').expect("arguments");
        let close = open + rest[open..].find(')').expect("their end");
        out.push((name, rest[open..close].matches(':').count()));
    }
    out
}

#[test]
fn every_function_has_its_twin() {
    let declared = declared();
    assert!(declared.len() >= 14, "{declared:?}");
    for (name, arguments) in &declared {
        let (fun, arity) = Fun::find(name).unwrap_or_else(|| panic!("trace::expr lacks `{name}`"));
        assert_eq!(arity, *arguments, "{name}");
        assert_eq!(fun.name(), name);
    }
    // And the other way round: nothing is evaluated that the checks cannot call.
    let list = &EXPR[EXPR.find("const FUNCTIONS").expect("the list")..];
    let list = &list[..list.find("];").expect("its end")];
    let twins: Vec<&str> = list.split("(\"").skip(1).filter_map(|x| x.split('"').next()).collect();
    let mut names: Vec<&str> = declared.iter().map(|d| d.0.as_str()).collect();
    let mut there = twins.clone();
    names.sort_unstable();
    there.sort_unstable();
    assert_eq!(there, names);
}

#[test]
fn every_unit_has_its_twin() {
    let declared: Vec<&str> =
        QUANTITY.split("\npub const ").skip(1).filter_map(|x| x.split(':').next()).collect();
    let twins: Vec<&str> = UNIT_CONSTS.iter().map(|u| u.name).collect();
    assert_eq!(twins, declared);
    for unit in UNIT_CONSTS {
        let printed = perpend::quantity::unit::find(unit.printed);
        assert!(printed.is_some(), "{} prints as {}, which is no unit", unit.name, unit.printed);
    }
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    /// The locks hold for every function on any values: the evaluated twin gives the last bit.
    #[test]
    fn twins_agree_to_the_bit(a in 1e-6..1e6_f64, b in 1e-6..1e6_f64, y in -3.0..3.0_f64) {
        let mut s = Sheet::recorder();
        given!(s, "", "", p = Length::new(a));
        given!(s, "", "", q = Length::new(-b));
        given!(s, "", "", f = Stress::new(b));
        given!(s, "", "", A = Area::new(a));
        given!(s, "", "", r = Num::new(a));
        given!(s, "", "", n = Num::new(y));
        calc!(s, "", v_1 = min(p, q));
        calc!(s, "", v_2 = max(p, v_1));
        calc!(s, "", v_3 = abs(q) + v_2);
        calc!(s, "", w = sq(p) + sq(v_3) - p * q);
        calc!(s, "", v_4 = sqrt(w) + sqrt(A));
        calc!(s, "", v_5 = cbrt(cube(v_4) + cube(p)));
        calc!(s, "", m_1 = exp(n) + ln(r) * log10(r) - sqrt(r));
        calc!(s, "", m_2 = pow(r, 0.7) * pow(mpa(f), n) + m_1 / 3.0);
        calc!(s, "", m_3 = metres(v_5) + square_metres(w) * -m_2 + (1.0 - m_2) / (2.0 + sq(m_2)));
        calc!(s, "", g = mpa(f) * MPA + KN / (MM * MM) - 2.0 * f);
        calc!(s, "", u = 0.5 * (1.2 * KG_M3) * sq(3.0 * M_S) + g);
        let _ = (m_3, u);
        prop_assert!(s.faults.is_empty(), "{:?}", s.faults);
    }
}
