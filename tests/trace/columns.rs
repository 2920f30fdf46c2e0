//! The same work on several things stands in columns, each with all locks.

use perpend::quantity::{Force, Length, Stress};
use perpend::trace::{Columns, Entry, Sheet, text};
use perpend::{calc, decide, given, verify};

/// Stress of a load on 100 mm by so many millimetres, halved where the length is short.
fn press(s: &mut Sheet, load: f64, length: f64) -> Stress {
    given!(s, "load", "load table", N = Force::new(load));
    given!(s, "length", "job file", l = Length::new(length));
    given!(s, "thickness", "job file", t = Length::new(100.0));
    let long = decide!(s, "rule", "long", "short", l >= 3.0 * t);
    if long {
        calc!(s, "statics", "stress", sigma = N / (t * l));
        sigma
    } else {
        calc!(s, "statics", "stress, short", sigma = N / (t * l) / 2.0);
        sigma
    }
}

fn columns(s: &Sheet) -> &Columns {
    match s.entries.last() {
        Some(Entry::Columns(c)) => c,
        other => panic!("columns, not {other:?}"),
    }
}

fn two(loads: [f64; 2], lengths: [f64; 2]) -> (Sheet, Vec<Stress>) {
    let mut s = Sheet::recorder();
    let heads = ["left".to_owned(), "right".to_owned()];
    let found = s.columns(&heads, |s, i| press(s, loads[i], lengths[i]));
    (s, found)
}

#[test]
fn the_same_steps_share_their_rows() {
    let (s, found) = two([30e3, 60e3], [600.0, 400.0]);
    assert!(s.faults.is_empty(), "{:?}", s.faults);
    assert_eq!(found, [Stress::new(0.5), Stress::new(1.5)]);
    let c = columns(&s);
    assert_eq!(c.rows.len(), 5);
    assert!(c.rows.iter().all(|row| row.entries().count() == 2));
    let printed = text::sheet(&s);
    assert!(printed.contains("Columns: left | right"), "{printed}");
    assert!(printed.contains("= 30 kN / (100 mm × 600 mm) = 0.5 N/mm² | 1.5 N/mm²"), "{printed}");
}

#[test]
fn where_one_goes_another_way_its_row_is_its_own() {
    let (s, _) = two([30e3, 60e3], [600.0, 200.0]);
    assert!(s.faults.is_empty(), "{:?}", s.faults);
    let c = columns(&s);
    let alone: Vec<[bool; 2]> = c.rows.iter().map(|r| [r.cells[0].is_some(), r.cells[1].is_some()]).collect();
    assert_eq!(alone, [[true, true], [true, true], [true, true], [true, true], [true, false], [false, true]]);
    let branch = &c.rows[3];
    assert_eq!(branch.words(), "long; else short", "both ways are said");
    assert_eq!(c.rows[5].lead().map(|(i, _)| i), Some(1));
}

/// What stood before stands in every column and is not given again; what came to stand inside does not
/// stand after it.
#[test]
fn columns_begin_and_end_with_what_stood_before() {
    let mut s = Sheet::recorder();
    given!(s, "thickness", "job file", t = Length::new(100.0));
    let _ = t;
    let heads = ["left".to_owned(), "right".to_owned()];
    s.columns(&heads, |s, i| press(s, 30e3, [600.0, 400.0][i]));
    assert_eq!(columns(&s).rows.len(), 4, "t is not given again");
    assert!(s.standing("t").is_some() && s.standing("l").is_none() && s.standing("sigma").is_none());
}

#[test]
fn locks_hold_in_every_column() {
    let mut s = Sheet::recorder();
    let heads = ["left".to_owned(), "right".to_owned()];
    s.columns(&heads, |s, i| {
        let l = Length::new(600.0);
        if i == 0 {
            given!(s, "length", "job file", l);
        }
        // The second column uses what stands in the first alone.
        calc!(s, "statics", "half", x = l / 2.0);
        x
    });
    assert!(!s.faults.is_empty());
    assert!(s.faults[0].what.contains("does not stand"), "{:?}", s.faults);
}

#[test]
fn verdicts_of_columns_are_verdicts_of_the_sheet() {
    let mut s = Sheet::recorder();
    let heads = ["left".to_owned(), "right".to_owned()];
    s.columns(&heads, |s, i| {
        s.case = heads[i].clone();
        given!(s, "stress", "above", sigma = Stress::new([0.5, 1.5][i]));
        given!(s, "strength", "above", f_d = Stress::new(1.0));
        verify!(s, "press", "6.1", "pressed", sigma <= f_d)
    });
    let found: Vec<(&str, bool, &str)> =
        s.verdicts.iter().map(|v| (v.id.as_str(), v.holds, v.case.as_str())).collect();
    assert_eq!(found, [("press", true, "left"), ("press-2", false, "right")]);
    assert!(!s.holds());
}

#[test]
fn one_alone_or_in_silence_is_just_done() {
    let mut s = Sheet::recorder();
    let found = s.columns(&["only".to_owned()], |s, _| press(s, 30e3, 600.0));
    assert_eq!(found, [Stress::new(0.5)]);
    assert_eq!(s.entries.len(), 5, "plain entries");
    let mut silent = Sheet::silent();
    let heads = ["left".to_owned(), "right".to_owned()];
    assert_eq!(silent.columns(&heads, |s, i| press(s, 30e3, [600.0, 300.0][i])).len(), 2);
    assert!(silent.entries.is_empty());
}
