//! The links of the load path and how each is known: as given, or as the checks of this pack show it.

use super::diaphragm;
use crate::building::{
    Building, CollapseClass, DiaphragmProof, FloorEdge, Footing, Head, Link, Path, Proof, Return, Stands,
    StrapsKnown,
};

/// The links of the load path, in order, each with what is to be seen where nothing is said of it.
pub const LINKS: [(&str, &str); 8] = [
    ("wind face", "the outer walls be shown to carry the wind between their supports"),
    ("panel", "the outer wall panels be shown to be sound and held as drawn"),
    (
        "floor edge",
        "the fixing of floor or roof to the walls be opened up and shown to carry the wind, straps included",
    ),
    ("diaphragm", "the floor or roof be shown to carry the wind in its plane to the bracing walls"),
    ("bracing wall", "the walls that take the wind now be shown to carry it"),
    ("junction", "the junction between return and outer wall be opened up and seen"),
    ("dpc", "the joint at the foot be seen"),
    ("footing", "the footing below the return be exposed and its width and depth be recorded"),
];

/// The links of the job with those that nothing is said of, which are assumed unless a check of this pack
/// speaks for them.
pub fn links(b: &Building) -> Vec<Link> {
    let mut out = Vec::new();
    for (name, words) in LINKS {
        let given: Vec<&Link> = b.links.iter().filter(|l| l.link == name).collect();
        if given.is_empty() {
            out.extend(checked(b, name, &[]).unwrap_or_else(|| {
                vec![Link {
                    link: name.to_owned(),
                    proof: Proof::Assumed,
                    words: format!("{words} (nothing is said of this link in the job file)"),
                    of: Vec::new(),
                }]
            }));
        }
        let untold = if name == "footing" { untold(b, &given) } else { Vec::new() };
        out.extend(given.into_iter().flat_map(|l| proven(b, l)));
        if !untold.is_empty() {
            let told =
                Link { link: name.to_owned(), proof: Proof::Calculated, words: String::new(), of: untold };
            out.extend(under(b, &told));
        }
    }
    out
}

/// Returns with a footing of which no link speaks, where links speak of others by name.
fn untold(b: &Building, given: &[&Link]) -> Vec<String> {
    if given.iter().any(|l| l.of.is_empty()) {
        return Vec::new();
    }
    let told = |mark: &String| given.iter().any(|l| l.of.contains(mark));
    b.footings().filter(|(r, f)| !told(&r.mark) && !told(&f.mark)).map(|(r, _)| r.mark.clone()).collect()
}

/// Marks of the walls outside this pack that hold the heads of returns.
fn held_elsewhere(b: &Building) -> Vec<String> {
    let mut out: Vec<String> = Vec::new();
    for r in &b.returns {
        let Head::Propped(walls) = &r.head else { continue };
        let elsewhere = walls.iter().filter(|w| !b.returns.iter().any(|o| o.mark == **w));
        out.extend(elsewhere.filter(|w| !out.contains(w)).cloned().collect::<Vec<_>>());
    }
    out
}

/// Whether walls that are no returns of this pack share the wind after the removal.
fn shares_elsewhere(b: &Building) -> bool {
    let walls = b.stability.iter().flat_map(|st| &st.walls);
    walls.filter(|w| w.stands != Stands::Before).any(|w| !b.returns.iter().any(|r| r.mark == w.mark))
}

/// The footings that a link is about: those that this pack calculates, and the rest, which is assumed
/// where the link claims a calculation.
fn under(b: &Building, link: &Link) -> Vec<Link> {
    if link.proof != Proof::Calculated || !link.words.trim().is_empty() {
        return vec![link.clone()];
    }
    let about: Vec<String> = if link.of.is_empty() {
        b.returns.iter().map(|r| r.mark.clone()).chain(held_elsewhere(b)).collect()
    } else {
        link.of.clone()
    };
    let (here, rest): (Vec<String>, Vec<String>) =
        about.into_iter().partition(|m| b.footings().any(|(r, f)| r.mark == *m || f.mark == *m));
    // Calculated for a footing that nobody saw: what the figures rest on is assumed.
    let unseen =
        |m: &String| b.footings().find(|(r, f)| f.proof == Proof::Assumed && (r.mark == *m || f.mark == *m));
    let mut out = Vec::new();
    let seen: Vec<String> = here.iter().filter(|m| unseen(m).is_none()).cloned().collect();
    if !seen.is_empty() {
        out.push(Link { of: seen, ..link.clone() });
    }
    for m in here {
        if let Some((r, f)) = unseen(&m) {
            out.push(Link { proof: Proof::Assumed, words: dig(r, f), of: vec![m], ..link.clone() });
        }
    }
    if !rest.is_empty() || out.is_empty() {
        out.push(unnamed(link, rest));
    }
    out
}

/// What is to be closed where nobody saw a footing.
pub fn dig(r: &Return, f: &Footing) -> String {
    format!(
        "Before the wall comes down: dig down to the footing under {}, measure its width, its thickness and how far it \
         runs, and see the ground. {}.",
        r.mark,
        f.words.trim_end_matches('.')
    )
}

/// Whether wind in its plane reaches the foot of a return: where its head is held and the wall spans up and
/// down the floor takes all of it.
pub fn sheared(r: &Return) -> bool {
    !matches!(r.head, Head::Propped(_)) || r.path != Path::UpAndDown
}

/// The joint at the foot, where it is said to be calculated: on the sheets of returns that wind reaches there.
fn joint(b: &Building, link: &Link) -> Vec<Link> {
    let about = |r: &&Return| link.of.is_empty() || link.of.contains(&r.mark);
    let (here, rest): (Vec<&Return>, Vec<&Return>) = b.returns.iter().filter(about).partition(|r| sheared(r));
    let of = |all: Vec<&Return>| all.into_iter().map(|r| r.mark.clone()).collect::<Vec<_>>();
    let mut out = Vec::new();
    if !here.is_empty() {
        out.push(Link { of: of(here), ..link.clone() });
    }
    if !rest.is_empty() {
        let words = "Statics: no wind in their plane reaches the foot, since the floor takes it at the head. The joint \
                     under the walls that hold the head belongs to the link bracing wall.";
        out.push(Link { of: of(rest), words: words.to_owned(), ..link.clone() });
    }
    if out.is_empty() { vec![unnamed(link, link.of.clone())] } else { out }
}

/// A link as it is given, unless it claims a calculation that nobody can name: then it is assumed.
fn proven(b: &Building, link: &Link) -> Vec<Link> {
    if link.link == "footing" {
        return under(b, link);
    }
    if link.link == "dpc" && link.proof == Proof::Calculated && link.words.trim().is_empty() {
        return joint(b, link);
    }
    let here = match link.link.as_str() {
        "wind face" | "panel" => !b.panels.is_empty(),
        "bracing wall" => {
            let own = |m: &String| b.returns.iter().any(|r| r.mark == *m);
            let alone = !b.returns.is_empty() && held_elsewhere(b).is_empty() && !shares_elsewhere(b);
            !b.floors.is_empty() || alone || !link.of.is_empty() && link.of.iter().all(own)
        }
        "junction" => !b.returns.is_empty(),
        // Floors say below how far they are calculated.
        _ => false,
    };
    if link.proof != Proof::Calculated || here || !link.words.trim().is_empty() {
        return vec![link.clone()];
    }
    checked(b, &link.link, &link.of).unwrap_or_else(|| vec![unnamed(link, link.of.clone())])
}

/// A link that is said to be calculated where no calculation is named.
fn unnamed(link: &Link, of: Vec<String>) -> Link {
    Link {
        link: link.link.clone(),
        proof: Proof::Assumed,
        words: format!(
            "show the calculation of the {}: it is said to be calculated, but not in this pack",
            link.link
        ),
        of,
    }
}

/// What the checks of this pack say of a link, for the marks `of` or for all; nothing where none is about it.
fn checked(b: &Building, link: &str, of: &[String]) -> Option<Vec<Link>> {
    match link {
        "floor edge" if !b.floor_edges.is_empty() => Some(edges(b, of)),
        "diaphragm" => b.diaphragm.as_ref().map(|d| {
            let (proof, words) = match (d.proof, diaphragm::stout(d)) {
                (DiaphragmProof::ShearFlow, _) => (Proof::Calculated, diaphragm::words(d)),
                (DiaphragmProof::Rule, true) => (Proof::Rule, diaphragm::words(d)),
                (DiaphragmProof::Rule, false) => (Proof::Assumed, diaphragm::hold_text(d)),
            };
            vec![Link { link: link.to_owned(), proof, words, of: of.to_vec() }]
        }),
        _ => None,
    }
}

/// A link for every floor edge that concerns `of`, and one for the panels that no floor edge holds.
fn edges(b: &Building, of: &[String]) -> Vec<Link> {
    let asked = |marks: &[String]| of.is_empty() || marks.iter().any(|m| of.contains(m));
    let link = |proof, words: String, of| Link { link: "floor edge".to_owned(), proof, words, of };
    let mut out: Vec<Link> = b
        .floor_edges
        .iter()
        .map(|e| (e, concerned(b, e)))
        .filter(|(_, marks)| asked(marks))
        .map(|(e, marks)| match e.known {
            StrapsKnown::Seen => {
                link(Proof::Calculated, format!("Straps seen: {}", e.words.trim_end_matches('.')), marks)
            }
            StrapsKnown::None | StrapsKnown::ToBeFitted => link(Proof::Assumed, edge_text(b, e), marks),
        })
        .collect();
    let held = |mark: &String| b.floor_edges.iter().any(|e| concerned(b, e).contains(mark));
    let panels = b.panels.iter().filter(|p| p.after.top.kind != crate::standards::masonry::Edge::Free);
    let bare: Vec<String> =
        panels.map(|p| p.mark.clone()).filter(|m| asked(std::slice::from_ref(m)) && !held(m)).collect();
    if !bare.is_empty() {
        let words = format!("{} (no floor edge of the job file is about this panel)", LINKS[2].1);
        out.push(link(Proof::Assumed, words, bare));
    }
    if out.is_empty() {
        out.push(unnamed(&link(Proof::Assumed, String::new(), Vec::new()), of.to_vec()));
    }
    out
}

/// What a floor edge concerns: itself, its panel, and panels of the same plan wall and storey that have no edge of their own.
pub fn concerned(b: &Building, e: &FloorEdge) -> Vec<String> {
    let own = b.panel(&e.panel);
    let beside = b.panels.iter().filter(|p| {
        own.is_some_and(|o| p.mark != o.mark && p.on.is_some() && p.on == o.on && p.storey == o.storey)
            && !b.floor_edges.iter().any(|other| other.panel == p.mark)
    });
    [e.mark.clone(), e.panel.clone()].into_iter().chain(beside.map(|p| p.mark.clone())).collect()
}

/// What is to be closed at a floor edge whose straps were not seen.
pub fn edge_text(b: &Building, e: &FloorEdge) -> String {
    let panels = concerned(b, e)[1..].join(", ");
    let told = |words: &str| {
        let words = words.trim_end_matches('.');
        if words.is_empty() { String::new() } else { format!(" {words}.") }
    };
    match (&e.strap, e.known) {
        (Some(s), StrapsKnown::ToBeFitted) => {
            let show =
                |name: &str, v: crate::quantity::Dyn| crate::quantity::print::show(name, v).to_string();
            format!(
                "Before the wall comes down, fit and see restraint straps of {} at {} or closer along the floor edge \
                 {} at {panels}.{}",
                show("F", s.strength.value.dynamic()),
                show("s", s.spacing.dynamic()),
                e.mark,
                told(&e.words)
            )
        }
        _ if !e.words.trim().is_empty() => format!(
            "Before the wall comes down, fit restraint straps that hold the wall to the floor along {} at {panels}, for \
             the force on its sheet: none is there.{}",
            e.mark,
            told(&e.words)
        ),
        _ => format!(
            "Before the wall comes down, open up the floor edge {} and show restraint straps that hold the wall to the \
             floor at {panels} for the force on its sheet, or fit them: none is known to be there.{}",
            e.mark,
            told(&e.words)
        ),
    }
}

/// Hold points of floor edges and of a floor whose proportions prove nothing. They concern the whole job: what
/// the floor does not hold or carry reaches no wall behind it.
pub fn floors(b: &Building) -> Vec<(String, Vec<String>)> {
    let unseen = b.floor_edges.iter().filter(|e| e.known != StrapsKnown::Seen);
    let edges = unseen.map(|e| (edge_text(b, e), Vec::new()));
    let slender = b
        .diaphragm
        .iter()
        .filter(|d| d.proof == DiaphragmProof::Rule && !diaphragm::stout(d))
        .map(|d| (diaphragm::hold_text(d), Vec::new()));
    edges.chain(slender).collect()
}

/// What is to be closed about the building's class for disproportionate collapse.
pub fn class(b: &Building) -> Option<String> {
    match b.collapse.as_ref().map(|c| c.class) {
        Some(CollapseClass::One) => None,
        Some(CollapseClass::TwoA) => Some(
            "Before the wall comes down, show that floors and roof are anchored to the walls or tied across the building \
             as class 2A asks (Approved Document A, A3): this pack does not check it."
                .to_owned(),
        ),
        None => Some(
            "Before the wall comes down, state the class of the building for disproportionate collapse, with the reason \
             (Approved Document A, A3): it is not stated."
                .to_owned(),
        ),
    }
}

/// The hold point that an assumed link becomes.
pub fn hold_text(link: &Link) -> String {
    let words = link.words.trim_end_matches('.');
    if words.to_lowercase().starts_with("before the wall comes down") {
        format!("{words}.")
    } else {
        format!("Before the wall comes down ({}): {words}.", link.link)
    }
}
