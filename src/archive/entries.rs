//! Lines of a job file or practice file that changed, each named by the table in which it stands.

use super::compare::{Change, lines_named};
use crate::job::tables::of_lines;

/// Tables of a practice file that only say whose pack it is and how it looks.
const LOOKS: [&str; 2] = ["practice", "style"];

/// Lines that changed, in order, as `returns R2, line 250`; the number is that of the text in which the line stands, of
/// the later one where it stands in both.
pub fn changed(was: &str, now: &str) -> Vec<Change> {
    let (old, new) = (of_lines(was), of_lines(now));
    lines_named(was, now, |later, n| {
        let table = if later { new.get(n) } else { old.get(n) };
        match table.and_then(Option::as_deref) {
            None | Some("") => format!("line {}", n + 1),
            Some(table) => format!("{table}, line {}", n + 1),
        }
    })
}

/// The same of practice files. Of one that only one side has, the entries that reach into the calculation.
pub fn practice(was: &str, now: &str) -> Vec<Change> {
    let all = changed(was, now);
    if was.is_empty() == now.is_empty() {
        return all;
    }
    let count = |text: &str| (!text.is_empty()).then(|| format!("{} lines", text.lines().count()));
    let whole = Change { what: "the whole file".to_owned(), was: count(was), now: count(now) };
    // Every line of the one file is a change, in order.
    let tables = of_lines(if was.is_empty() { now } else { was });
    let reaches = |table: &Option<String>| table.as_ref().is_some_and(|t| !LOOKS.contains(&t.as_str()));
    let told = all.into_iter().zip(&tables).filter(|(_, table)| reaches(table)).map(|(change, _)| change);
    [whole].into_iter().chain(told).collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    const TEXT: &str =
        "[[returns]]\nlength = 5\nmark = \"R1\"\n\n[[returns.loads]]\nname = \"beam\"\nd = { e = 3 }\n";

    #[test]
    fn a_changed_line_says_whose_it_is() {
        let now = TEXT.replace("d = { e = 3 }", "d = { e = 4 }").replace("length = 5\n", "");
        let said: Vec<String> = changed(TEXT, &now).into_iter().map(|c| c.what).collect();
        assert_eq!(said, ["returns R1, line 2", "returns R1 loads beam, line 6"]);
    }

    #[test]
    fn of_a_new_practice_file_what_is_calculated_with_is_told() {
        let file = "# Ours.\n[practice]\nname = \"A\"\n[basis]\nhelping_factor = 0.85\n[style]\naccent = \"#123456\"\n";
        let said = |list: Vec<Change>| list.into_iter().map(|c| (c.what, c.was, c.now)).collect::<Vec<_>>();
        let whole = "the whole file".to_owned();
        let line = |what: &str, text: &str| (what.to_owned(), None, Some(text.to_owned()));
        let wanted = vec![
            (whole.clone(), None, Some("7 lines".to_owned())),
            line("basis, line 4", "[basis]"),
            line("basis, line 5", "helping_factor = 0.85"),
        ];
        assert_eq!(said(practice("", file)), wanted);
        let gone: Vec<_> = wanted.into_iter().map(|(what, was, now)| (what, now, was)).collect();
        assert_eq!(said(practice(file, "")), gone);
        assert_eq!(said(practice(file, &file.replace("\"A\"", "\"B\""))).len(), 1);
        assert_eq!(said(practice("", "")), []);
        // A factor by a dotted key, or in a line, stands under no head and is told all the same.
        let short = "basis.helping_factor = 0.85\n# Ours.\nbasis.gamma_M = { value = 3.2 }\n";
        let lines: Vec<String> = practice("", short).into_iter().map(|c| c.what).collect();
        assert_eq!(lines, ["the whole file", "line 1", "line 3"]);
    }
}
