//! What changed between two runs: results, hold points, lines of the sheets, and lines of the job file.

use similar::{DiffTag, TextDiff};

use crate::report::record::{Record, Row, Sheet};

/// One difference: what, as it was, as it is; either may be missing.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Change {
    /// What changed.
    pub what: String,
    /// As it was; `None` where it was not there.
    pub was: Option<String>,
    /// As it is; `None` where it is no longer there.
    pub now: Option<String>,
}

/// Everything in which two records differ.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct Differences {
    /// Outcome, results and hold points.
    pub results: Vec<Change>,
    /// Sheets with lines of working that changed.
    pub sheets: Vec<Altered>,
}

/// A sheet that changed.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Altered {
    /// Which sheet it is, the same from run to run.
    pub id: String,
    /// Its title; the earlier one where it changed.
    pub title: String,
    /// Its lines that changed.
    pub changes: Vec<Change>,
}

impl Differences {
    /// Whether there is none.
    pub fn is_empty(&self) -> bool {
        self.results.is_empty() && self.sheets.is_empty()
    }
}

/// What differs between an earlier record and a later one. Program, version and digest are not compared.
pub fn records(was: &Record, now: &Record) -> Differences {
    let mut results = Vec::new();
    let mut head = |what: &str, was: &str, now: &str| {
        if was != now {
            results.push(change(what, Some(was), Some(now)));
        }
    };
    head("job number", &was.number, &now.number);
    head("title", &was.title, &now.title);
    head("revision", &was.revision, &now.revision);
    head("status", &was.status, &now.status);
    head("outcome", &was.outcome, &now.outcome);
    results.extend(paired(&was.results, &now.results, |r| r.id.clone(), name, printed));
    let hold = |h: &crate::report::record::Hold| match h.closed.as_str() {
        "" => format!("open: {}", h.text),
        closed => format!("closed ({closed}): {}", h.text),
    };
    results.extend(paired(
        &was.hold_points,
        &now.hold_points,
        |h| h.mark.clone(),
        |h| format!("hold point {}", h.mark),
        hold,
    ));
    Differences { results, sheets: sheets(&was.sheets, &now.sheets) }
}

/// Lines of a text that changed, in order, as `line 12`. Of a run of lines put in place of another, each is held against
/// the one at its place where both begin with the same word.
fn lines(was: &str, now: &str) -> Vec<Change> {
    lines_named(was, now, |_, n| format!("line {}", n + 1))
}

/// The same; `name` names line `n`, counted from nought, of the later text or of the earlier one.
pub(super) fn lines_named(was: &str, now: &str, name: impl Fn(bool, usize) -> String) -> Vec<Change> {
    let diff = TextDiff::from_lines(was, now);
    let line = |text: &str| text.trim_end().to_owned();
    let mut out = Vec::new();
    for op in diff.ops().iter().filter(|op| op.tag() != DiffTag::Equal) {
        let (old, new) = (op.old_range(), op.new_range());
        for n in 0..old.len().max(new.len()) {
            let was = diff.old_slices().get(old.start + n).filter(|_| n < old.len()).map(|s| line(s));
            let now = diff.new_slices().get(new.start + n).filter(|_| n < new.len()).map(|s| line(s));
            match (was, now) {
                (Some(was), Some(now)) if alike(&was, &now) => {
                    out.push(Change { what: name(true, new.start + n), was: Some(was), now: Some(now) });
                }
                (was, now) => {
                    out.extend(was.map(|w| Change {
                        what: name(false, old.start + n),
                        was: Some(w),
                        now: None,
                    }));
                    out.extend(now.map(|w| Change {
                        what: name(true, new.start + n),
                        was: None,
                        now: Some(w),
                    }));
                }
            }
        }
    }
    out
}

/// Whether two lines say the same thing of different values: they share their first word.
fn alike(a: &str, b: &str) -> bool {
    a.split_whitespace().next() == b.split_whitespace().next()
}

fn change(what: &str, was: Option<&str>, now: Option<&str>) -> Change {
    Change { what: what.to_owned(), was: was.map(str::to_owned), now: now.map(str::to_owned) }
}

/// Items of both lists by their keys: changed, gone, and new.
fn paired<T>(
    was: &[T],
    now: &[T],
    key: impl Fn(&T) -> String,
    name: impl Fn(&T) -> String,
    print: impl Fn(&T) -> String,
) -> Vec<Change> {
    let mut out = Vec::new();
    for old in was {
        let new = now.iter().find(|n| key(n) == key(old)).map(&print);
        if new.as_ref() != Some(&print(old)) {
            out.push(Change { what: name(old), was: Some(print(old)), now: new });
        }
    }
    let fresh = now.iter().filter(|n| !was.iter().any(|w| key(w) == key(n)));
    out.extend(fresh.map(|n| Change { what: name(n), was: None, now: Some(print(n)) }));
    out
}

fn name(r: &Row) -> String {
    if r.mark.is_empty() { r.check.clone() } else { format!("{} {}", r.mark, r.check) }
}

/// `18.3 kN of 23.6 kN, 0.78, adequate`.
fn printed(r: &Row) -> String {
    let amounts = match (r.demand.as_str(), r.resistance.as_str()) {
        ("", "") => String::new(),
        (demand, resistance) => format!("{demand} of {resistance}"),
    };
    [amounts, r.ratio.clone(), r.verdict.clone()]
        .into_iter()
        .filter(|part| !part.is_empty())
        .collect::<Vec<_>>()
        .join(", ")
}

fn sheets(was: &[Sheet], now: &[Sheet]) -> Vec<Altered> {
    let text = |s: &Sheet| s.lines.iter().map(|l| format!("{l}\n")).collect::<String>();
    let mut out = Vec::new();
    for old in was {
        let changes = match now.iter().find(|n| n.id == old.id) {
            None => vec![change("the sheet", Some(&old.title), None)],
            Some(new) if new == old => continue,
            Some(new) if new.lines == old.lines => vec![change("title", Some(&old.title), Some(&new.title))],
            Some(new) => lines(&text(old), &text(new)),
        };
        out.push(Altered { id: old.id.clone(), title: old.title.clone(), changes });
    }
    let fresh = now.iter().filter(|n| !was.iter().any(|w| w.id == n.id));
    out.extend(fresh.map(|n| Altered {
        id: n.id.clone(),
        title: n.title.clone(),
        changes: vec![change("the sheet", None, Some(&n.title))],
    }));
    out
}

#[cfg(test)]
mod tests {
    use super::{Change, lines};

    fn change(what: &str, was: Option<&str>, now: Option<&str>) -> Change {
        super::change(what, was, now)
    }

    #[test]
    fn a_line_that_changed_in_place_is_one_change() {
        let was = "length = \"900 mm\"\nmark = \"R1\"\nold = 1\nlast = 2\n";
        let now = "length = \"950 mm\"\nmark = \"R1\"\nlast = 2\nnew = 3\n";
        let wanted = [
            change("line 1", Some("length = \"900 mm\""), Some("length = \"950 mm\"")),
            change("line 3", Some("old = 1"), None),
            change("line 4", None, Some("new = 3")),
        ];
        assert_eq!(lines(was, now), wanted);
        assert_eq!(lines(was, was), []);
    }

    #[test]
    fn lines_that_say_other_things_are_not_paired() {
        let wanted = [change("line 1", Some("a = 1"), None), change("line 1", None, Some("b = 1"))];
        assert_eq!(lines("a = 1\n", "b = 1\n"), wanted);
    }
}
