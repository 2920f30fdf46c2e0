//! Rebuilds a job whenever its file is saved, and tells in one line what that changed.

use std::io::Write as _;
use std::path::Path;
use std::thread;
use std::time::{Duration, Instant, SystemTime};

use super::made::{Made, folder_of, place};
use super::{FAILED, How, complain};
use crate::archive::compare::{self, Change, Differences};
use crate::error::Error;
use crate::report::record::{self, Record};
use crate::{Source, digest, draw_for, files};

/// How often the file is looked at.
const LOOK: Duration = Duration::from_millis(150);
/// So many results are told by name.
const TOLD: usize = 3;

/// What tells one saving of a file from the next.
#[derive(PartialEq, Eq)]
struct Saved(Option<(SystemTime, u64)>);

impl Saved {
    fn of(file: &Path) -> Self {
        Self(std::fs::metadata(file).and_then(|m| Ok((m.modified()?, m.len()))).ok())
    }
}

/// Watches until the process is ended. Yields only where the file is not there to begin with.
pub fn watch(file: &Path, into: Option<&Path>, how: How<'_>) -> u8 {
    if let Err(e) = files::read(file) {
        complain(&e);
        return FAILED;
    }
    let mut before: Option<Record> = None;
    let mut seen: Option<[Saved; 2]> = None;
    loop {
        let now = [Saved::of(file), how.1.of(file).map_or(Saved(None), |p| Saved::of(&p))];
        if seen.as_ref() == Some(&now) || now[0].0.is_none() {
            thread::sleep(LOOK);
            continue;
        }
        seen = Some(now);
        match once(file, into, how, before.as_ref()) {
            Ok(record) => before = Some(record),
            Err(e) => complain(&e),
        }
        // What earlier rounds laid out and this one did not use is let go.
        crate::pack::evict(3);
    }
}

/// One round: the results at once, then the documents.
fn once(
    file: &Path,
    into: Option<&Path>,
    (only, whose): How<'_>,
    before: Option<&Record>,
) -> Result<Record, Error> {
    let begin = Instant::now();
    let text = files::read(file)?;
    let house = whose.house(file)?;
    let (building, results) = draw_for(&files::name(file), &text, house.as_ref().map(|h| &h.practice))?;
    let record = record::of_job(&building, &results, &digest(&text));
    say(&match before {
        None => format!("{}; watching {}, Ctrl-C ends", record.outcome, file.display()),
        Some(before) => format!("{}; {}", record.outcome, told(&compare::records(before, &record))),
    });
    let from = Source { text: &text, folder: folder_of(file), house: house.as_ref() };
    let made = Made::of(&from, (&building, &results), only, begin)?;
    let (made, staged) = made.staged(file, into)?;
    for (path, document) in place(staged)?.iter().zip(&made.documents) {
        say(&format!("  {}: {}", path.display(), document.said));
    }
    Ok(record)
}

/// `R1 sliding at the dpc 0.90 to 0.93; 2 more results; 41 lines of working`.
fn told(changed: &Differences) -> String {
    if changed.is_empty() {
        return "nothing that is printed changed".to_owned();
    }
    let mut parts: Vec<String> = changed.results.iter().take(TOLD).map(one).collect();
    let more = changed.results.len().saturating_sub(TOLD);
    if more > 0 {
        parts.push(format!("{more} more {}", if more == 1 { "result" } else { "results" }));
    }
    let lines: usize = changed.sheets.iter().map(|s| s.changes.len()).sum();
    parts.push(format!("{lines} {} of working", if lines == 1 { "line" } else { "lines" }));
    parts.join("; ")
}

fn one(c: &Change) -> String {
    match (&c.was, &c.now) {
        (Some(was), Some(now)) => format!("{}: {was} is now {now}", c.what),
        (None, Some(now)) => format!("{} is new: {now}", c.what),
        (_, None) => format!("{} is gone", c.what),
    }
}

fn say(line: &str) {
    let mut out = anstream::stdout();
    let _ = writeln!(out, "{line}");
    let _ = out.flush();
}

#[cfg(test)]
mod tests {
    use super::{Change, Differences, told};
    use crate::archive::compare::Altered;

    #[test]
    fn one_line_tells_what_changed() {
        let change = |n: usize| Change {
            what: format!("R{n} sliding"),
            was: Some("0.90".to_owned()),
            now: Some("0.93".to_owned()),
        };
        let changed = Differences {
            results: (1..=5).map(change).collect(),
            sheets: vec![Altered { id: String::new(), title: String::new(), changes: vec![change(1)] }],
        };
        let line = told(&changed);
        assert_eq!(
            line,
            "R1 sliding: 0.90 is now 0.93; R2 sliding: 0.90 is now 0.93; R3 sliding: 0.90 is now 0.93; 2 more results; \
             1 line of working"
        );
        assert_eq!(told(&Differences::default()), "nothing that is printed changed");
    }
}
