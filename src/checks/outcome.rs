//! Outcomes in the only words there are, and the hold points that make one conditional.

use super::Section;
use crate::building::{Building, Head, Link, Proof};
use crate::trace::Sheet;

/// The outcome of a sheet or of the job.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Outcome {
    /// Everything holds.
    Adequate,
    /// Everything holds, on conditions.
    Conditional(usize),
    /// A limit of application was left.
    Outside,
    /// Something does not hold.
    NotAdequate,
}

impl Outcome {
    /// In words; no others are used.
    pub fn words(self) -> String {
        match self {
            Self::Adequate => "adequate".to_owned(),
            Self::Conditional(1) => "adequate once 1 hold point is closed".to_owned(),
            Self::Conditional(n) => format!("adequate once {n} hold points are closed"),
            Self::Outside => "outside the method".to_owned(),
            Self::NotAdequate => "not adequate".to_owned(),
        }
    }

    /// A name for templates and machines.
    pub const fn kind(self) -> &'static str {
        match self {
            Self::Adequate => "adequate",
            Self::Conditional(_) => "conditional",
            Self::Outside => "outside",
            Self::NotAdequate => "not-adequate",
        }
    }
}

/// A hold point: something to be closed before the wall comes down.
#[derive(Clone, Debug, PartialEq)]
pub struct Hold {
    /// Its number, `H1`.
    pub mark: String,
    /// What is to be done.
    pub text: String,
    /// What it concerns; empty for the whole job.
    pub of: Vec<String>,
    /// Who closed it and when.
    pub closed: Option<String>,
}

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

/// The links of the job with those that nothing is said of, which are assumed.
pub fn links(b: &Building) -> Vec<Link> {
    let mut out = Vec::new();
    for (name, words) in LINKS {
        let given: Vec<&Link> = b.links.iter().filter(|l| l.link == name).collect();
        if given.is_empty() {
            out.push(Link {
                link: name.to_owned(),
                proof: Proof::Assumed,
                words: format!("{words} (nothing is said of this link in the job file)"),
                of: Vec::new(),
            });
        }
        out.extend(
            given.into_iter().flat_map(|l| if name == "footing" { under(b, l) } else { vec![proven(b, l)] }),
        );
    }
    out
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

/// A link as it is given, unless it claims a calculation that nobody can name: then it is assumed.
fn proven(b: &Building, link: &Link) -> Link {
    let here = match link.link.as_str() {
        "wind face" | "panel" => !b.panels.is_empty(),
        "bracing wall" => !b.returns.is_empty() && held_elsewhere(b).is_empty(),
        "junction" | "dpc" => !b.returns.is_empty(),
        // Floors are not calculated in this pack.
        _ => false,
    };
    if claims_nothing(link) || here { link.clone() } else { unshown(link) }
}

/// Whether a link does without a calculation of this pack: another proof, or one named elsewhere.
fn claims_nothing(link: &Link) -> bool {
    link.proof != Proof::Calculated || !link.words.trim().is_empty()
}

fn unshown(link: &Link) -> Link {
    Link {
        proof: Proof::Assumed,
        words: format!(
            "show the calculation of the {}: it is said to be calculated, but not in this pack",
            link.link
        ),
        ..link.clone()
    }
}

/// The footings that a link is about: those that this pack calculates, and the rest, which is assumed
/// where the link claims a calculation.
fn under(b: &Building, link: &Link) -> Vec<Link> {
    if claims_nothing(link) {
        return vec![link.clone()];
    }
    let about: Vec<String> = if link.of.is_empty() {
        b.returns.iter().map(|r| r.mark.clone()).chain(held_elsewhere(b)).collect()
    } else {
        link.of.clone()
    };
    let (here, rest): (Vec<String>, Vec<String>) =
        about.into_iter().partition(|m| b.footings().any(|(r, f)| r.mark == *m || f.mark == *m));
    let mut out = Vec::new();
    if !here.is_empty() {
        out.push(Link { of: here, ..link.clone() });
    }
    if !rest.is_empty() || out.is_empty() {
        out.push(Link { of: rest, ..unshown(link) });
    }
    out
}

/// Marks with those of the footings under them, and those of the returns above them.
fn with_footings(b: &Building, mut of: Vec<String>) -> Vec<String> {
    for (r, f) in b.footings() {
        let (above, below) = (of.contains(&r.mark), of.contains(&f.mark));
        if above && !below {
            of.push(f.mark.clone());
        } else if below && !above {
            of.push(r.mark.clone());
        }
    }
    of
}

/// Hold points: those given, one for every link that is assumed, one for every junction that is
/// counted on but not seen, one for every footing that nobody saw.
pub fn holds(b: &Building) -> Vec<Hold> {
    let given = b.hold_points.iter().map(|h| (h.text.clone(), h.of.clone(), h.closed.clone()));
    let assumed = links(b).into_iter().filter(|l| l.proof == Proof::Assumed).map(|l| {
        let words = l.words.trim_end_matches('.');
        let begins = words.to_lowercase().starts_with("before the wall comes down");
        let text = if begins {
            format!("{words}.")
        } else {
            format!("Before the wall comes down ({}): {words}.", l.link)
        };
        let of = if l.link == "footing" { with_footings(b, l.of) } else { l.of };
        (text, of, None)
    });
    let told = |link: &str, marks: [&str; 2]| {
        b.links.iter().any(|l| {
            l.link == link
                && l.proof == Proof::Assumed
                && (l.of.is_empty() || l.of.iter().any(|m| marks.contains(&m.as_str())))
        })
    };
    let unseen = b.returns.iter().filter(|r| {
        r.junction.bonded && r.junction.proof == Proof::Assumed && !told("junction", [&r.mark, &r.mark])
    });
    let junctions = unseen.map(|r| {
        let text = format!(
            "Before the wall comes down: open up the junction of {} with {} and show that it is bonded. {}",
            r.mark, r.junction.to, r.junction.words
        );
        (text, vec![r.mark.clone()], None)
    });
    let buried =
        b.footings().filter(|(r, f)| f.proof == Proof::Assumed && !told("footing", [&r.mark, &f.mark]));
    let footings = buried.map(|(r, f)| {
        let text = format!(
            "Before the wall comes down: dig down to the footing under {}, measure its width, its thickness and how \
             far it runs, and see the ground. {}",
            r.mark, f.words
        );
        (text, vec![r.mark.clone(), f.mark.clone()], None)
    });
    given
        .chain(assumed)
        .chain(junctions)
        .chain(footings)
        .enumerate()
        .map(|(n, (text, of, closed))| Hold { mark: format!("H{}", n + 1), text, of, closed })
        .collect()
}

/// Adds hold points found by the checks, each with the mark it concerns, numbered on.
pub fn add(holds: &mut Vec<Hold>, found: Vec<(String, String)>) {
    for (mark, text) in found {
        holds.push(Hold { mark: format!("H{}", holds.len() + 1), text, of: vec![mark], closed: None });
    }
}

/// The outcome of one sheet; hold points that concern `mark` or the whole job make it conditional.
pub fn of_sheet(sheet: &Sheet, mark: &str, holds: &[Hold]) -> Outcome {
    let open = holds
        .iter()
        .filter(|h| h.closed.is_none() && (h.of.is_empty() || h.of.iter().any(|m| m == mark)))
        .count();
    judge(sheet.verdicts.iter().all(|v| v.holds), sheet.outside.is_empty(), open)
}

/// The outcome of the job: what fails fails the job, what is outside leaves it outside.
pub fn of_job(sections: &[Section], holds: &[Hold]) -> Outcome {
    let hold = sections.iter().all(|s| s.sheet.verdicts.iter().all(|v| v.holds));
    let inside = sections.iter().all(|s| s.sheet.outside.is_empty());
    judge(hold, inside, holds.iter().filter(|h| h.closed.is_none()).count())
}

fn judge(hold: bool, inside: bool, open: usize) -> Outcome {
    match (hold, inside, open) {
        (false, ..) => Outcome::NotAdequate,
        (true, false, _) => Outcome::Outside,
        (true, true, 0) => Outcome::Adequate,
        (true, true, n) => Outcome::Conditional(n),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn nothing_softens_a_failure() {
        assert_eq!(judge(false, false, 3), Outcome::NotAdequate);
        assert_eq!(judge(true, false, 3), Outcome::Outside);
        assert_eq!(judge(true, true, 1).words(), "adequate once 1 hold point is closed");
        assert_eq!(judge(true, true, 0), Outcome::Adequate);
    }
}
