//! `[job]`, `[signatures]` and `[[revisions]]`: who, where, what for.

use super::date::in_words;
use super::paths::inside;
use super::reader::Table;
use crate::building::{Identity, Person, Revision, Signatures, Status};
use crate::error::Kind;

/// Most characters of a job number.
pub(super) const NUMBER: usize = 24;
/// Most characters of a revision letter.
pub(super) const LETTER: usize = 4;
/// Most lines of an address.
pub(super) const ADDRESS: usize = 6;

/// Reads `[job]`.
pub fn identity(t: &Table<'_>) -> Option<Identity> {
    let number = t.need("number").mark(NUMBER);
    let title = t.need("title").line();
    let address = address(t);
    let client = t.need("client").line();
    let authority = t.need("authority").line();
    let status = t.need("status").choice(Status::WORDS, Status::from_word);
    let visited = t.may("visited").date();
    let building = t.need("building").text();
    let work = t.need("work").text();
    t.finish();
    Some(Identity {
        number: number?,
        title: title?,
        address: address?,
        client: client?,
        authority: authority?,
        status: status?,
        visited,
        building: building?,
        work: work?,
    })
}

fn address(t: &Table<'_>) -> Option<Vec<String>> {
    let wanted = format!("1 to {ADDRESS} lines: [\"7 Tansy Rise\", \"Ambleford\"]");
    let entry = t.need("address");
    let lines = entry.list(&wanted)?;
    if lines.is_empty() || lines.len() > ADDRESS {
        t.fault(Kind::NotAllowed, format_args!("`address` has {} lines", lines.len()))
            .at(entry.place(), "address")
            .allowed(&wanted)
            .help("write what an envelope would say");
        return None;
    }
    lines.iter().map(|line| line.line()).collect::<Vec<_>>().into_iter().collect()
}

/// Reads `[signatures]`.
pub fn signatures(t: &Table<'_>) -> Option<Signatures> {
    let made_table = t.need("made").table("signature of who made it");
    let checked_table = t.may("checked").table("signature of who checked it");
    let made = made_table.as_ref().and_then(person);
    let checked = checked_table.as_ref().and_then(person);
    t.finish();
    if let (Some(mt), Some(ct), Some(m), Some(c)) = (&made_table, &checked_table, &made, &checked) {
        if m.letters == c.letters || m.name == c.name {
            ct.fault(Kind::Contradiction, format_args!("{} made it and cannot be the second person", m.name))
                .at(ct.place("name"), "checked by")
                .and(mt.place("name"), "made by")
                .allowed("a second person, or no [signatures.checked] at all")
                .help("take [signatures.checked] out: the pack then says that it is self-checked");
        }
        if c.date < m.date {
            ct.fault(
                Kind::Contradiction,
                format_args!(
                    "it was checked on {}, before it was made on {}",
                    in_words(&c.date),
                    in_words(&m.date)
                ),
            )
            .at(ct.place("date"), "checked")
            .and(mt.place("date"), "made")
            .allowed("the day it was made, or later")
            .help("correct one of the dates; what changed after the check must be checked again");
        }
    }
    Some(Signatures { made: made?, checked })
}

fn person(t: &Table<'_>) -> Option<Person> {
    let name = t.need("name").line();
    let letters = t.need("letters").mark(LETTER);
    let qualification = t.may("qualification").line();
    let contact = t.may("contact").line();
    let date = t.need("date").date();
    t.finish();
    Some(Person { name: name?, letters: letters?, qualification, contact, date: date? })
}

/// Reads `[[revisions]]`, oldest first.
pub fn revisions(tables: &[Table<'_>]) -> Option<Vec<Revision>> {
    let all: Vec<Option<Revision>> = tables.iter().map(revision).collect();
    for (i, t) in tables.iter().enumerate() {
        let Some(now) = &all[i] else { continue };
        let earlier = || tables[..i].iter().zip(&all).filter_map(|(t, r)| Some((t, r.as_ref()?)));
        if let Some((first, _)) = earlier().find(|(_, r)| r.letter == now.letter) {
            t.fault(Kind::Contradiction, "this letter stands on an earlier issue")
                .at(t.place("letter"), "again")
                .and(first.place("letter"), "first")
                .allowed("each letter once")
                .help("give this issue the next letter");
        }
        if let Some((before, then)) = earlier().last().filter(|(_, r)| now.date < r.date) {
            let (now, then) = (in_words(&now.date), in_words(&then.date));
            t.fault(Kind::Contradiction, format_args!("{now} is before {then}, the date of the issue above"))
                .at(t.place("date"), "earlier")
                .and(before.place("date"), "later")
                .allowed("issues in order, the oldest first")
                .help("correct the date, or put the issues in order");
        }
    }
    if let Some(last) = tables.last().filter(|t| t.has("pack")) {
        last.fault(Kind::Contradiction, "the current issue has no earlier pack: it is what is being made")
            .at(last.place("pack"), "on the last of the issues")
            .allowed("`pack` on an earlier issue: what was sent then")
            .help("add the next issue below, or take `pack` out");
    }
    all.into_iter().collect()
}

fn revision(t: &Table<'_>) -> Option<Revision> {
    let letter = t.need("letter").mark(LETTER);
    let date = t.need("date").date();
    let note = t.need("note").line();
    let pack = t.may("pack").line().filter(|path| inside(t, "pack", path, "pack"));
    t.finish();
    Some(Revision { letter: letter?, date: date?, note: note?, pack })
}

/// Holds the dates of visit, signature and current issue against each other.
pub fn dates(
    (job, identity): (&Table<'_>, &Identity),
    (signed, signatures): (&Table<'_>, &Signatures),
    (issued, revision): (&Table<'_>, &Revision),
) {
    let made = &signatures.made.date;
    if *made > revision.date
        && let Some(signature) = signed.may("made").table("")
    {
        let (on, made) = (in_words(&revision.date), in_words(made));
        issued
            .fault(Kind::Contradiction, format_args!("it was issued on {on}, before it was made on {made}"))
            .at(issued.place("date"), "issued")
            .and(signature.place("date"), "made")
            .allowed("the day it was made, or later")
            .help("correct one of the dates");
    }
    if let Some(visited) = &identity.visited
        && visited > made
    {
        let (visited, made) = (in_words(visited), in_words(made));
        job.warn(format_args!("the visit on {visited} was after the calculation was made on {made}"));
    }
}
