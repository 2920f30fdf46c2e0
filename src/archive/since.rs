//! What a new issue says of an earlier one: a list for the pack, and marks on its results and sheets.

use super::Held;
use super::compare::{self, Change};
use super::entries;
use crate::building::Revision;
use crate::job::date_in_words;
use crate::pack::data;
use crate::report::record::Record;

/// The pack's data with what changed since `was`, the pack of the issue `of`. `now` is the record of the job as it is;
/// `practice` its practice file, empty where it has none.
pub fn mark(pack: &mut data::Pack, of: &Revision, was: &Held, now: &Record, practice: &str) {
    let changed = compare::records(&was.record, now);
    let plain = |c: &Change| data::Change {
        what: c.what.clone(),
        was: c.was.as_deref().unwrap_or_default().trim().to_owned(),
        now: c.now.as_deref().unwrap_or_default().trim().to_owned(),
    };
    // An empty line more or less says nothing.
    let said = |c: &data::Change| !(c.was.is_empty() && c.now.is_empty());
    let all = |list: &[Change]| list.iter().map(plain).filter(said).collect::<Vec<_>>();
    for section in &mut pack.sections {
        section.changed = changed.sheets.iter().any(|s| s.id == section.id);
    }
    for row in &mut pack.schedule {
        row.changed = !was.record.results.iter().any(|r| {
            (&r.id, &r.demand, &r.resistance, &r.ratio, &r.verdict)
                == (&row.anchor, &row.demand, &row.resistance, &row.ratio, &row.verdict)
        });
    }
    pack.changes = Some(data::Changes {
        since: of.letter.clone(),
        date: date_in_words(&of.date),
        inputs: all(&entries::changed(&was.job, &pack.inputs)),
        practice: all(&entries::practice(was.practice.as_deref().unwrap_or_default(), practice)),
        results: all(&changed.results),
        sheets: changed.sheets.iter().map(|s| (s.id.clone(), s.title.clone(), s.changes.len())).collect(),
    });
}
