//! What stands is not printed again.

use std::collections::HashMap;

use perpend::quantity::{Dyn, Length};
use perpend::trace::{Entry, Sheet};
use perpend::{calc, decide, given};

#[test]
fn a_value_that_stands_is_not_given_again() {
    let mut s = Sheet::recorder();
    let e = Length::new(50.0);
    for _ in 0..3 {
        given!(s, "length", "job file", l = Length::new(600.0));
        given!(s, "eccentricity", "job file", e = e);
        decide!(s, "6.2(2)", "whole", "part", e <= l / 6.0);
        calc!(s, "6.2(2)", "compressed length", l_c = 3.0 * (l / 2.0 - e));
        s.note("Once.");
        let _ = l_c;
    }
    assert_eq!(s.entries.len(), 5, "{:#?}", s.entries);
    given!(s, "length", "job file", l = Length::new(610.0));
    calc!(s, "6.2(2)", "compressed length", l_c = 3.0 * (l / 2.0 - e));
    let _ = l_c;
    assert_eq!(s.entries.len(), 7, "another length is printed, and what follows from it");
    assert!(s.faults.is_empty(), "{:?}", s.faults);
}

/// On the sheets of the demo jobs no value is given while it stands.
#[test]
fn no_demo_sheet_gives_the_same_twice() {
    for (name, text) in crate::jobs::demos() {
        let (_, results) = perpend::check(&name, &text).unwrap_or_else(|e| panic!("{name}: {e}"));
        for section in &results.sections {
            let mut standing: HashMap<&str, Dyn> = HashMap::new();
            for entry in &section.sheet.entries {
                let (value, given) = match entry {
                    Entry::Given { value, .. } => (value, true),
                    Entry::Lookup { value, .. } | Entry::Found { value, .. } => (value, false),
                    Entry::Step(step) => (&step.result, false),
                    _ => continue,
                };
                let before = standing.insert(&value.name, value.value);
                let again = given && before.is_some_and(|b| b.same(value.value));
                assert!(!again, "{name}, sheet {}: {} is given while it stands", section.id, value.name);
            }
        }
    }
}
