//! Outcomes in the only words there are, and the hold points that make one conditional.

use super::{Section, links};
use crate::building::{Building, Proof};
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
    /// What kind of thing it asks for.
    pub about: About,
}

/// What a hold point asks for, for those who say it in other words.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum About {
    /// What the job file says, with its own words for the client where it has some.
    Given(Option<String>),
    /// A link of the load path that is assumed, by its name.
    Link(String),
    /// A junction that is counted on and was not seen.
    Junction,
    /// A footing that nobody saw.
    Footing,
    /// A floor and how it holds the outer walls.
    Floor,
    /// The class for disproportionate collapse.
    Class,
    /// The building as a whole.
    House,
    /// Ends of beams that are not worked.
    BeamEnds,
    /// A panel: its ties, its supports against an arch.
    Panel,
    /// What was taken from the plan.
    Plan,
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
/// counted on but not seen, one for every footing that nobody saw, one for every floor edge without
/// straps that were seen, one for the class.
pub fn holds(b: &Building) -> Vec<Hold> {
    let floors = links::floors(b);
    let given = b
        .hold_points
        .iter()
        .map(|h| (h.text.clone(), h.of.clone(), h.closed.clone(), About::Given(h.plain.clone())));
    let assumed = links::links(b).into_iter().filter(|l| l.proof == Proof::Assumed).map(|l| {
        let text = links::hold_text(&l);
        let of = if l.link == "footing" { with_footings(b, l.of) } else { l.of };
        // A floor edge stands in the way of everything behind it, not of its panel alone.
        let of = floors.iter().find(|f| f.0 == text).map_or(of, |f| f.1.clone());
        (text, of, None, About::Link(l.link))
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
        (text, vec![r.mark.clone()], None, About::Junction)
    });
    let buried =
        b.footings().filter(|(r, f)| f.proof == Proof::Assumed && !told("footing", [&r.mark, &f.mark]));
    let footings =
        buried.map(|(r, f)| (links::dig(r, f), vec![r.mark.clone(), f.mark.clone()], None, About::Footing));
    let floor = floors.iter().map(|(text, of)| (text.clone(), of.clone(), None, About::Floor));
    let class = links::class(b).into_iter().map(|text| (text, Vec::new(), None, About::Class));
    let mut all: Vec<Hold> = Vec::new();
    for (text, of, closed, about) in
        given.chain(assumed).chain(junctions).chain(footings).chain(floor).chain(class)
    {
        // A link and the floor edge that it is about may ask for the same.
        if !all.iter().any(|h| h.text == text && h.of == of && h.closed == closed) {
            all.push(Hold { mark: format!("H{}", all.len() + 1), text, of, closed, about });
        }
    }
    all
}

/// Adds hold points found by the checks, each with the mark it concerns, numbered on.
pub fn add(holds: &mut Vec<Hold>, found: Vec<(String, String)>, about: &About) {
    for (mark, text) in found {
        // Without a mark it concerns the whole job.
        let of = if mark.is_empty() { Vec::new() } else { vec![mark] };
        holds.push(Hold {
            mark: format!("H{}", holds.len() + 1),
            text,
            of,
            closed: None,
            about: about.clone(),
        });
    }
}

/// The outcome of one sheet; hold points that concern `mark` or the whole job make it conditional. A sheet of
/// several things has their marks with commas between.
pub fn of_sheet(sheet: &Sheet, mark: &str, holds: &[Hold]) -> Outcome {
    judge(holds_all(sheet), sheet.outside.is_empty(), open(mark, holds).len())
}

/// Marks of the open hold points that concern `mark` or the whole job.
pub fn open<'a>(mark: &str, holds: &'a [Hold]) -> Vec<&'a str> {
    let concerns = |h: &Hold| h.of.is_empty() || h.of.iter().any(|m| mark.split(", ").any(|own| own == m));
    holds.iter().filter(|h| h.closed.is_none() && concerns(h)).map(|h| h.mark.as_str()).collect()
}

/// The outcome of the job: what fails fails the job, what is outside leaves it outside.
pub fn of_job(sections: &[Section], holds: &[Hold]) -> Outcome {
    let hold = sections.iter().all(|s| holds_all(&s.sheet));
    let inside = sections.iter().all(|s| s.sheet.outside.is_empty());
    judge(hold, inside, holds.iter().filter(|h| h.closed.is_none()).count())
}

/// Whether nothing on a sheet fails.
pub fn holds_all(sheet: &Sheet) -> bool {
    sheet.verdicts.iter().all(|v| v.holds) && sheet.unshown.iter().all(|u| u.hold.is_some())
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
