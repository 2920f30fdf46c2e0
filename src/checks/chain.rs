//! The chain from the wind face to the ground: every link with how it is known, drawn and in words.

use super::{Job, Section, links, named};
use crate::building::{Building, CollapseClass, Link, Proof};
use crate::sketch::{self, Branch, Chain, ChainLink, Known};
use crate::trace::{Column, Sheet, Table};

/// The chain sheet.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let mut s = Sheet::recorder();
    let links = links::links(job.building);
    let drawings = job.drawings(|| [sketch::chain(&view(job, &links))]);
    named(&mut s, &drawings);
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
    s.heading(1, "Disproportionate collapse");
    s.note(class(job.building));
    let section = Section::plain("chain", "The chain from wind to ground", s);
    vec![Section { drawings, ..section }]
}

/// The consequence class, and what it asks of this job.
fn class(b: &Building) -> String {
    let Some(c) = &b.collapse else {
        return "The class of the building (Approved Document A, A3) is not stated: a hold point.".to_owned();
    };
    let reason = c.reason.trim_end_matches('.');
    let asks = match c.class {
        CollapseClass::One => {
            "It asks for no measure beyond sound construction; the removal must not take away what held walls and floors \
             together."
        }
        CollapseClass::TwoA => {
            "It asks that floors and roof be anchored to the walls or tied across the building. That is not checked here: \
             a hold point."
        }
    };
    format!(
        "Class {} (Approved Document A, A3): {reason}. {asks} From memory, check against the document (M).",
        c.class.word()
    )
}

fn view(job: &Job<'_>, all: &[Link]) -> Chain {
    let b = job.building;
    let marks: Vec<&String> = b
        .floor_edges
        .iter()
        .map(|e| &e.mark)
        .chain(b.returns.iter().map(|r| &r.mark))
        .chain(b.panels.iter().map(|p| &p.mark))
        .collect();
    // Branches stand in the order of the job's things, so that one thing stays in one line.
    let place = |l: &Link| marks.iter().position(|m| l.of.first() == Some(*m)).unwrap_or(marks.len());
    let of = |name: &str| {
        let mut links: Vec<&Link> = all.iter().filter(|l| l.link == name).collect();
        links.sort_by_key(|l| place(l));
        links.into_iter().map(|l| branch(job, l)).collect::<Vec<_>>()
    };
    Chain {
        links: links::LINKS
            .iter()
            .map(|(name, _)| ChainLink { name: (*name).to_owned(), branches: of(name) })
            .collect(),
    }
}

fn branch(job: &Job<'_>, l: &Link) -> Branch {
    let (known, beside) = match l.proof {
        Proof::Calculated => (Known::Calculated, sheets(job.building, l)),
        Proof::Rule => (Known::Rule, String::new()),
        Proof::Seen => (Known::Seen, String::new()),
        Proof::Assumed => (Known::Assumed, hold(job, l)),
    };
    Branch { of: l.of.join(", "), known, beside }
}

/// The hold point that an assumed link became.
fn hold(job: &Job<'_>, l: &Link) -> String {
    let text = links::hold_text(l);
    let found = job.holds.iter().find(|h| h.text == text);
    found.map_or_else(|| "hold point".to_owned(), |h| format!("hold point {}", h.mark))
}

/// Where a link is calculated: the sheets of this pack about it, or what its words name.
fn sheets(b: &Building, l: &Link) -> String {
    let named = |marks: Vec<&str>| {
        let of: Vec<&str> =
            marks.into_iter().filter(|m| l.of.is_empty() || l.of.iter().any(|o| o == m)).collect();
        match of.as_slice() {
            [] => "see the table".to_owned(),
            [one] => format!("sheet {one}"),
            several => format!("sheets {}", several.join(", ")),
        }
    };
    let returns = || b.returns.iter().map(|r| r.mark.as_str()).collect();
    match l.link.as_str() {
        "wind face" if !b.panels.is_empty() => "wind sheet".to_owned(),
        "panel" => named(b.panels.iter().map(|p| p.mark.as_str()).collect()),
        "floor edge" => named(b.floor_edges.iter().map(|e| e.mark.as_str()).collect()),
        "diaphragm" if b.diaphragm.is_some() => "sheet Floor".to_owned(),
        "bracing wall" | "junction" | "dpc" => named(returns()),
        _ => "see the table".to_owned(),
    }
}
