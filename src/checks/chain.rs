//! The chain from the wind face to the ground: every link with how it is known.

use super::{Job, Section, outcome};
use crate::building::Proof;
use crate::trace::{Column, Sheet, Table};

/// The chain sheet.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let mut s = Sheet::recorder();
    let links = outcome::links(job.building);
    let strong =
        links.iter().enumerate().filter(|(_, l)| l.proof == Proof::Assumed).map(|(i, _)| i).collect();
    s.table(|| Table {
        caption: "Each link of the load path, from the wind face to the ground, and how it is known"
            .to_owned(),
        columns: vec![
            Column::words("link"),
            Column::words("for"),
            Column::words("proof"),
            Column::words("how it is known, or what is to be done"),
        ],
        rows: links
            .iter()
            .map(|l| {
                let of = if l.of.is_empty() { "all".to_owned() } else { l.of.join(", ") };
                vec![l.link.clone(), of, l.proof.word().to_owned(), l.words.clone()]
            })
            .collect(),
        strong,
    });
    s.note("A link that is assumed makes the whole result conditional: each stands among the hold points.");
    vec![Section::plain("chain", "The chain from wind to ground", s)]
}
