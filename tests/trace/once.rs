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
            let at = format!("{name}, sheet {}", section.id);
            for entry in &section.sheet.entries {
                let Entry::Columns(columns) = entry else {
                    follow(&at, &mut standing, entry);
                    continue;
                };
                // Each column goes on from what stood before the first.
                for i in 0..columns.heads.len() {
                    let mut standing = standing.clone();
                    for row in &columns.rows {
                        if let Some(entry) = &row.cells[i] {
                            follow(&at, &mut standing, entry);
                        }
                    }
                }
            }
        }
    }
}

/// Notes what an entry lets stand; a given value must not stand already.
fn follow<'a>(at: &str, standing: &mut HashMap<&'a str, Dyn>, entry: &'a Entry) {
    let Some(value) = entry.value() else { return };
    let before = standing.insert(&value.name, value.value);
    let given = matches!(entry, Entry::Given { .. });
    assert!(
        !given || !before.is_some_and(|b| b.same(value.value)),
        "{at}: {} is given while it stands",
        value.name
    );
}
