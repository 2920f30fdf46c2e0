//! Reading and printing units.

use perpend::quantity::Dim;
use perpend::quantity::Dyn;
use perpend::quantity::print::show;
use perpend::quantity::unit::{Misread, UNITS, allowed, find, for_print, read};
use proptest::prelude::*;

const LENGTH: Dim = Dim { force: 0, length: 1, time: 0 };
const STRESS: Dim = Dim { force: 1, length: -2, time: 0 };

#[test]
fn quantities_as_they_are_written() {
    for (text, dim, base) in [
        ("900 mm", LENGTH, 900.0),
        ("2.40 m", LENGTH, 2400.0),
        ("  0.9m ", LENGTH, 900.0),
        ("-25 mm", LENGTH, -25.0),
        ("+25 mm", LENGTH, 25.0),
        ("0.55 kN/m2", STRESS, 0.55e-3),
        ("0.55 kN/m²", STRESS, 0.55e-3),
        ("7.3 N/mm2", STRESS, 7.3),
        ("9 %", Dim::NONE, 0.09),
        ("0.4", Dim::NONE, 0.4),
    ] {
        let found = read(text, dim).unwrap_or_else(|e| panic!("{text}: {e:?}"));
        assert!((found.value - base).abs() <= 1e-12 * base.abs(), "{text}: {found:?}");
        assert_eq!(found.dim, dim);
    }
}

#[test]
fn what_is_misread_says_how() {
    assert_eq!(read("900", LENGTH), Err(Misread::NoUnit));
    assert_eq!(read("mm", LENGTH), Err(Misread::NoNumber));
    assert_eq!(read("", LENGTH), Err(Misread::NoNumber));
    assert_eq!(read("1.2.3 mm", LENGTH), Err(Misread::NoNumber));
    assert!(read("9,5 mm", LENGTH).is_err());
    assert_eq!(read("54 kN", LENGTH), Err(Misread::WrongDimension { found: "kN" }));
    let nearest = |text: &str| match read(text, LENGTH) {
        Err(Misread::UnknownUnit { nearest, .. }) => nearest,
        other => panic!("{other:?}"),
    };
    assert_eq!(nearest("5 mmm"), Some("mm"));
    assert_eq!(nearest("5 furlongs"), None);
    // Nothing that is no finite number: no infinity, no exponent to hide a slip behind.
    for text in ["inf mm", "NaN mm", "1e3 mm", "0x10 mm"] {
        assert!(read(text, LENGTH).is_err(), "{text}");
    }
}

#[test]
fn the_usual_unit_stands_first() {
    assert_eq!(allowed(LENGTH)[0], "mm");
    assert_eq!(allowed(STRESS)[0], "N/mm2");
    for unit in UNITS {
        let found = find(unit.typed).expect("a unit");
        assert!(found.printed == unit.printed && found.factor == unit.factor, "{} stands twice", unit.typed);
    }
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    /// What is written in any unit is read back as the same number of that unit.
    #[test]
    fn units_make_the_round_trip(x in -1e6..1e6_f64, k in 0..UNITS.len()) {
        let unit = &UNITS[k];
        for name in [unit.typed, unit.printed] {
            let found = read(&format!("{x} {name}"), unit.dim).unwrap();
            prop_assert_eq!(found.dim, unit.dim);
            prop_assert!((found.value / unit.factor - x).abs() <= 1e-12 * x.abs(), "{} {}", x, name);
        }
    }

    /// What is printed in a unit that can be typed is read back within the digits printed.
    #[test]
    fn what_is_printed_can_be_read(x in 1.0..1e5_f64, k in 0..UNITS.len()) {
        let value = Dyn { value: x * UNITS[k].factor, dim: UNITS[k].dim };
        let printed = for_print("x", value);
        if find(printed.typed).is_some_and(|u| u.printed == printed.printed) {
            let text = show("x", value).to_string().replace('\u{2009}', "");
            let back = read(&text, value.dim).unwrap();
            prop_assert!((back.value - value.value).abs() <= 0.0051 * value.value, "{} {:?}", text, value);
        }
    }
}
