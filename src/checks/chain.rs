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
    let fails = |l: &Link| l.proof == Proof::Calculated && calculated(job, l).0 != Known::Calculated;
    let open = |l: &Link| l.proof == Proof::Assumed || fails(l) || !unshown(job, l).is_empty();
    let strong: Vec<usize> = links.iter().enumerate().filter(|(_, l)| open(l)).map(|(i, _)| i).collect();
    let proof =
        |l: &Link| if fails(l) { calculated(job, l).0.words().to_owned() } else { l.proof.word().to_owned() };
    let words = |l: &Link| match (fails(l), unshown(job, l)) {
        (true, _) => join(&calculated(job, l).1, &l.words),
        (false, hold) if !hold.is_empty() => join(&hold, &l.words),
        _ => l.words.clone(),
    };
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
                vec![l.link.clone(), of, proof(l), words(l)]
            })
            .collect(),
        strong,
    });
    if links.iter().any(|l| l.proof == Proof::Assumed) {
        s.note(
            "A link that is assumed makes the whole result conditional: each stands among the hold points.",
        );
    }
    let fallen: Vec<&str> = job
        .building
        .returns
        .iter()
        .map(|r| r.mark.as_str())
        .filter(|m| job.failing.iter().any(|f| f == m))
        .collect();
    if !fallen.is_empty() {
        s.note(format!(
            "Not adequate on sheets of their own: {}. What leans on them has no support, whatever this chain says of it.",
            fallen.join(", ")
        ));
    }
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
        Proof::Calculated => calculated(job, l),
        Proof::Rule => (Known::Rule, unshown(job, l)),
        Proof::Seen if butted(job.building, l) => (Known::Seen, "butted, not counted".to_owned()),
        Proof::Seen => (Known::Seen, unshown(job, l)),
        Proof::Assumed => (Known::Assumed, hold(job, l)),
    };
    Branch { of: l.of.join(", "), known, beside }
}

/// A link on sheets of this pack holds where what stands on them does.
fn calculated(job: &Job<'_>, l: &Link) -> (Known, String) {
    let about = marks(job.building, l);
    for (known, list) in [(Known::Fails, &job.failing), (Known::Outside, &job.outside)] {
        let broken: Vec<&str> = about.iter().copied().filter(|m| list.iter().any(|f| f == m)).collect();
        if !broken.is_empty() {
            return (known, format!("see {}", broken.join(", ")));
        }
    }
    (Known::Calculated, join(&sheets(job.building, l), &unshown(job, l)))
}

fn join(a: &str, b: &str) -> String {
    if b.trim().is_empty() { a.to_owned() } else { format!("{a}; {b}") }
}

/// The hold points of walls that the sheet of the whole building does not show to carry what the removal adds.
fn unshown(job: &Job<'_>, l: &Link) -> String {
    // The joint at the foot of those walls is part of what they do not carry alone.
    if l.link != "bracing wall" && l.link != "dpc" || l.proof == Proof::Assumed {
        return String::new();
    }
    let holds: Vec<String> =
        super::whole::holds(job).into_iter().filter_map(|(_, text)| job.hold_of(&text)).collect();
    if holds.is_empty() {
        String::new()
    } else {
        format!("not by calculation: hold point {}", holds.join(", "))
    }
}

/// Whether a link speaks of junctions that were seen not to be bonded.
fn butted(b: &Building, l: &Link) -> bool {
    let mut about = b.returns.iter().filter(|r| l.of.is_empty() || l.of.contains(&r.mark)).peekable();
    l.link == "junction" && about.peek().is_some() && about.all(|r| !r.junction.bonded)
}

/// The hold point that an assumed link became.
fn hold(job: &Job<'_>, l: &Link) -> String {
    let text = links::hold_text(l);
    let found = job.holds.iter().find(|h| h.text == text);
    found.map_or_else(|| "hold point".to_owned(), |h| format!("hold point {}", h.mark))
}

/// Where a link is calculated: the sheets of this pack about it, or what its words name.
fn sheets(b: &Building, l: &Link) -> String {
    match (l.link.as_str(), marks(b, l).as_slice()) {
        ("wind face", _) if !b.panels.is_empty() => "wind sheet".to_owned(),
        ("bracing wall", _) if !b.floors.is_empty() => "sheet of the whole building".to_owned(),
        // Where the words name another calculation, or say that no force comes here.
        ("bracing wall" | "junction" | "dpc", _) if !l.words.trim().is_empty() => "see the table".to_owned(),
        (_, []) => "see the table".to_owned(),
        (_, [one]) => format!("sheet {one}"),
        (_, several) => format!("sheets {}", several.join(", ")),
    }
}

/// Marks of the sheets of this pack that a link is about.
fn marks<'a>(b: &'a Building, l: &Link) -> Vec<&'a str> {
    let all: Vec<&str> = match l.link.as_str() {
        "panel" => b.panels.iter().map(|p| p.mark.as_str()).collect(),
        "floor edge" => b.floor_edges.iter().map(|e| e.mark.as_str()).collect(),
        "diaphragm" => b.diaphragm.iter().map(|_| "Floor").collect(),
        "footing" => b.footings().map(|(_, f)| f.mark.as_str()).collect(),
        "bracing wall" | "junction" | "dpc" => b.returns.iter().map(|r| r.mark.as_str()).collect(),
        _ => Vec::new(),
    };
    let about = |m: &str| {
        let over = b.footings().find(|(_, f)| f.mark == m).map(|(r, _)| r.mark.as_str());
        l.of.is_empty() || l.of.iter().any(|o| o == m || over == Some(o)) || m == "Floor"
    };
    all.into_iter().filter(|m| about(m)).collect()
}
