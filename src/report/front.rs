//! The words of the front sheets: outcome, summary, assumptions, cautions.

use crate::building::{Building, Cause, Frame, Head, Path, ShareBy, WindRoute};
use crate::checks::Results;
use crate::checks::links::sheared;
use crate::checks::outcome::{Outcome, holds_all};
use crate::pack::data::{Assumption, Summary};
use crate::sketch::text::{capital, list};
use crate::standards::{en1991_1_4, en1992, en1996};

/// One plain sentence on the outcome.
pub fn sentence(results: &Results) -> String {
    let failing: Vec<&str> = results
        .sections
        .iter()
        .filter(|s| !holds_all(&s.sheet))
        .map(|s| if s.mark.is_empty() { s.title.as_str() } else { s.mark.as_str() })
        .collect();
    let outside: Vec<&str> = results
        .sections
        .iter()
        .filter(|s| !s.sheet.outside.is_empty())
        .map(|s| if s.mark.is_empty() { s.title.as_str() } else { s.mark.as_str() })
        .collect();
    match results.outcome {
        Outcome::NotAdequate => format!(
            "What is to stay is not enough as it stands: {} {} not pass every check. The wall may not come out on \
             the strength of this pack.",
            list(&failing),
            does(&failing)
        ),
        Outcome::Outside => format!(
            "No check fails, but {} {} the range of a clause: this pack does not decide it, and the wall may not \
             come out on its strength.",
            list(&outside),
            if outside.len() == 1 { "leaves" } else { "leave" }
        ),
        Outcome::Conditional(_) => {
            let waiting = unshown(results);
            let passes = if waiting.is_empty() {
                "Every check passes.".to_owned()
            } else {
                format!(
                    "No verdict fails, but this calculation does not show all that it needs to: {} of the results below \
                     {} no verdict and {} on {}.",
                    waiting.len(),
                    if waiting.len() == 1 { "has" } else { "have" },
                    if waiting.len() == 1 { "rests" } else { "rest" },
                    list(&distinct(&waiting))
                )
            };
            format!(
                "{passes} The wall may come out only when each open hold point below is closed and signed."
            )
        }
        Outcome::Adequate => {
            "Every check passes, and every link of the load path is calculated, held by a named rule, \
                              or was seen."
                .to_owned()
        }
    }
}

/// The hold points on which results without a verdict rest, one for each.
fn unshown(results: &Results) -> Vec<&str> {
    let all = results.sections.iter().flat_map(|s| &s.sheet.unshown);
    all.filter_map(|u| u.hold.as_deref()).collect()
}

pub fn distinct<'a>(items: &[&'a str]) -> Vec<&'a str> {
    let mut out: Vec<&str> = Vec::new();
    for item in items {
        if !out.contains(item) {
            out.push(item);
        }
    }
    out
}

const fn does(items: &[&str]) -> &'static str {
    if items.len() == 1 { "does" } else { "do" }
}

/// The design summary.
pub fn summary(b: &Building, results: &Results) -> Vec<Summary> {
    vec![
        entry("The job", job(b)),
        entry("Codes and edition", codes(b)),
        entry("Basis", basis(b)),
        entry("Load path and stability", [stability(b), results.remarks.clone()].concat()),
        entry("Who is responsible for what", responsible(b)),
    ]
}

fn entry(title: &str, lines: Vec<String>) -> Summary {
    Summary { title: title.to_owned(), lines }
}

fn job(b: &Building) -> Vec<String> {
    vec![
        b.identity.building.clone(),
        b.identity.work.clone(),
        format!("{} carried: {}.", capital(&b.removed.wall), lower(&b.removed.carried)),
        format!("It braced: {}.", lower(&b.removed.braced)),
    ]
}

fn codes(b: &Building) -> Vec<String> {
    let mut out = vec![
        "BS EN 1990:2002+A1:2005 with UK National Annex".to_owned(),
        en1991_1_4::EDITION.to_owned(),
        en1996::EDITION.to_owned(),
        "Approved Document A, 2013 edition, for rules printed beside the calculation".to_owned(),
        "BS EN 772-1, BS EN 845-1, BS EN 998-2, BS EN 1991-1-1 and BS 5628-1 where a sheet names them".to_owned(),
        "Figures of the standards were entered from memory and recalculated where possible; each carries its \
         confidence (H, M, L). Check them against the purchased standard."
            .to_owned(),
    ];
    if b.bearings.iter().any(|x| x.padstone) && !b.padstones.is_empty() {
        out.insert(2, en1992::EDITION.to_owned());
    }
    out
}

fn basis(b: &Building) -> Vec<String> {
    let factor = |name: &str, stated: &Option<Cause<f64>>| match stated {
        Some(c) => format!("Material factor, {name}: {} stated, {}", c.value, lower(&c.reason)),
        None => format!("Material factor, {name}: UK NA Table NA.1"),
    };
    let helping = &b.basis.helping_factor;
    vec![
        format!(
            "Execution class {}, units of category {}",
            b.basis.execution_class,
            if b.basis.unit_category == 1 { "I" } else { "II" }
        ),
        factor("compression", &b.basis.gamma_m_compression),
        factor("flexure", &b.basis.gamma_m_flexure),
        factor("shear", &b.basis.gamma_m_shear),
        if helping.reason.is_empty() {
            format!("Only dead load helps, and it is taken {} times (EN 1990, set A)", helping.value)
        } else {
            format!(
                "Only dead load helps, and it is taken {} times: {}",
                helping.value,
                lower(&helping.reason)
            )
        },
        "Every check runs under four combinations and both directions of the wind; the worst is worked"
            .to_owned(),
    ]
}

fn stability(b: &Building) -> Vec<String> {
    let mut out = vec![match b.wind.route {
        WindRoute::Stated => "Wind: net pressure stated with a reason, see the wind sheet".to_owned(),
        WindRoute::Terrain => {
            "Wind: EN 1991-1-4 clause 4 with a terrain category, see the wind sheet".to_owned()
        }
        WindRoute::Charts => {
            "Wind: EN 1991-1-4 and the charts of the UK National Annex as read, see the wind sheet".to_owned()
        }
    }];
    if let Some(st) = &b.stability {
        out.push(match st.share_by {
            ShareBy::Width => "A timber floor shares the storey's wind by tributary width".to_owned(),
            ShareBy::Stiffness => {
                "A concrete floor shares the storey's wind by stiffness, with torsion".to_owned()
            }
        });
    }
    out.push(collapse(b));
    for r in &b.returns {
        let path = match r.path {
            Path::Sideways => "the wall spans sideways onto it",
            Path::UpAndDown => "the wall spans up and down, and the floor brings the wind to its head",
            Path::Both => "the wall spans sideways onto it and the floor brings wind to its head",
        };
        let head = match &r.head {
            Head::Free => "it stands as a cantilever".to_owned(),
            Head::Propped(walls) => {
                let names: Vec<&str> = walls.iter().map(String::as_str).collect();
                format!("its head is held by {}", list(&names))
            }
        };
        out.push(format!("{}: {path}; {head}", r.mark));
    }
    out
}

/// The class for disproportionate collapse, as stated or not.
fn collapse(b: &Building) -> String {
    match &b.collapse {
        Some(c) => format!(
            "Disproportionate collapse (Approved Document A, A3): class {}, {}",
            c.class.word(),
            lower(&c.reason)
        ),
        None => "Disproportionate collapse (Approved Document A, A3): class not stated".to_owned(),
    }
}

fn responsible(b: &Building) -> Vec<String> {
    let mut out: Vec<String> =
        b.responsible.iter().map(|(task, who)| format!("{}: {who}", capital(task))).collect();
    if out.is_empty() {
        out.push(
            "Nobody is named for temporary support and the order of work: name them before work starts"
                .to_owned(),
        );
    }
    out.push(format!("This calculation: {}", b.signatures.made.name));
    out
}

/// The register of assumptions: those of the job, then those that the tool makes.
pub fn assumptions(b: &Building) -> Vec<Assumption> {
    let mut all: Vec<(String, String)> =
        b.assumptions.iter().map(|a| (a.text.clone(), a.source.clone())).collect();
    if let (WindRoute::Stated, Some(st)) = (b.wind.route, &b.wind.stated) {
        all.push((
            "The wind is the pressure stated. Confirm it against the site.".to_owned(),
            st.reason.clone(),
        ));
    }
    let helping = &b.basis.helping_factor;
    all.push((
        format!("Only dead load helps, taken {} times; imposed load never helps.", helping.value),
        if helping.reason.is_empty() { "EN 1990 NA.A1.2(A)".to_owned() } else { helping.reason.clone() },
    ));
    for (name, c) in [
        ("compression", &b.basis.gamma_m_compression),
        ("flexure", &b.basis.gamma_m_flexure),
        ("shear", &b.basis.gamma_m_shear),
    ] {
        if let Some(c) = c {
            all.push((format!("The material factor in {name} is {}.", c.value), c.reason.clone()));
        }
    }
    for m in &b.materials {
        for (name, stated) in
            [("f_b", &m.f_b), ("f_k", &m.f_k), ("f_vk0", &m.f_vk0), ("f_xk1", &m.f_xk1), ("f_xk2", &m.f_xk2)]
        {
            if let Some(c) = stated {
                let value = crate::quantity::print::show("f", c.value.dynamic());
                all.push((format!("{name} of {} is {value}, stated.", m.name), c.reason.clone()));
            }
        }
    }
    for r in &b.returns {
        if r.base == crate::building::BaseJoint::Dpc && sheared(r) {
            let source =
                if r.mu.reason.is_empty() { "common practice, no published source" } else { &r.mu.reason };
            all.push((
                format!("Friction at the damp-proof course of {} is {}.", r.mark, r.mu.value.base()),
                source.to_owned(),
            ));
        }
    }
    if b.bearings.iter().any(|x| x.padstone) && !b.padstones.is_empty() {
        all.push((
            "Padstones lie where the sketches show them, on a full bed of mortar no weaker than the wall's."
                .to_owned(),
            "method of this pack".to_owned(),
        ));
    }
    for p in &b.panels {
        for (n, o) in p.after.openings.iter().enumerate().filter(|(_, o)| o.frame != Frame::Unknown) {
            let to = match o.frame {
                Frame::Jambs => "its jambs",
                Frame::AllRound => "the wall all round",
                _ => "head and sill",
            };
            all.push((
                format!("The frame of opening {} of {} passes its wind on to {to}.", n + 1, p.mark),
                "job file".to_owned(),
            ));
        }
    }
    if !b.floors.is_empty() {
        all.push((
            "Lengths of wall between openings are held across at head and foot by floors and roof, and outer walls \
             sideways by the walls that meet them on the plan."
                .to_owned(),
            "sheet of lengths of wall between openings".to_owned(),
        ));
    }
    all.push((
        "Plaster and render carry nothing; chases are taken off the thickness; wall ties carry no shear in the plane \
         of a return."
            .to_owned(),
        "method of this pack".to_owned(),
    ));
    all.into_iter()
        .enumerate()
        .map(|(n, (text, source))| Assumption { mark: format!("A{}", n + 1), text, source })
        .collect()
}

/// The cautions, written for this job.
pub fn cautions(b: &Building) -> Vec<String> {
    let place = b.identity.address.first().map_or("the address named", String::as_str);
    let bonded: Vec<&str> = b.returns.iter().filter(|r| r.junction.bonded).map(|r| r.mark.as_str()).collect();
    let seen = match &b.identity.visited {
        Some(date) => format!("What was not seen on {} is not known.", crate::job::date_in_words(date)),
        None => "The building was not visited. Everything about it is taken from others.".to_owned(),
    };
    let mut out = vec![
        format!("This calculation is for {place} only, as described here, and for no other building."),
        "Local codes and the judgement of a licensed engineer come first. This pack is worth nothing unsigned.".to_owned(),
        "Temporary support comes before any masonry is cut. It is designed by the person named on the front sheets, \
         for the unfactored loads of this pack, and stays until the permanent work carries."
            .to_owned(),
    ];
    let butted = if bonded.is_empty() {
        String::new()
    } else {
        format!("the junction of {} is found butted, since it is counted as bonded, if ", list(&bonded))
    };
    out.push(format!(
        "Stop and call the engineer if {butted}the mortar is soft, if a leaf is chased or cracked, or if a size differs \
         from the sketch."
    ));
    out.push(seen);
    let bearings: Vec<&str> = b.bearings.iter().map(|x| x.mark.as_str()).collect();
    let beam = if bearings.is_empty() {
        "the steel or concrete beam, its bearing and padstone".to_owned()
    } else {
        format!(
            "the steel or concrete beam itself, bearings other than {}, bending and splitting of padstones",
            list(&bearings)
        )
    };
    let straps = if b.floor_edges.is_empty() { "straps at the edges of floors, " } else { "" };
    // The lengths of wall below are on a sheet where the plan has floors.
    let footed: Vec<&str> = b.footings().map(|(_, f)| f.mark.as_str()).collect();
    let below = if footed.is_empty() {
        "the footing below".to_owned()
    } else {
        format!("footings other than {}, settlement of the ground", list(&footed))
    };
    let ground = if b.floors.is_empty() { format!("the wall below, {below}") } else { below };
    out.push(format!(
        "Not covered: {beam}, {straps}{ground}, movement and fire. They need calculations of their own."
    ));
    out.push(
        "The resistance of a compressed end by a uniform block, friction at the foot, and flexure in plane are first \
         principles, not formulas of the code. The sheets say so where they stand."
            .to_owned(),
    );
    out
}

/// The text without its full stop, beginning small unless it begins with a name in capitals.
fn lower(text: &str) -> String {
    let text = text.trim_end_matches('.');
    let mut letters = text.chars();
    match (letters.next(), letters.next()) {
        (Some(first), Some(second)) if second.is_lowercase() || second == ' ' => {
            first.to_lowercase().collect::<String>() + &text[first.len_utf8()..]
        }
        _ => text.to_owned(),
    }
}
