//! The summary for the client: what was asked and found, what must stay, what happens next, in plain English.
//!
//! Its own sentences have 25 words or fewer and no symbols; [`plain::hard`] finds those that have
//! not, the engineer's words from the job file among them.

use super::{PROGRAM, grouped, plain};
use crate::building::{Building, Return};
use crate::checks::outcome::{About, Hold, Outcome};
use crate::checks::{Results, Section, outcome, plan};
use crate::job::date_in_words;
use crate::pack::data::{self, Client, Part};
use crate::sketch::text::{capital, list};

/// The summary of a job; `digest` is the SHA-256 of its file. Nothing in it softens what the pack finds.
pub fn of_job(b: &Building, results: &Results, digest: &str) -> Client {
    let made = &b.signatures.made;
    Client {
        program: data::Program { name: PROGRAM.0.to_owned(), version: PROGRAM.1.to_owned() },
        digest: grouped(&digest.chars().take(16).collect::<String>()),
        number: b.identity.number.clone(),
        title: b.identity.title.clone(),
        address: b.identity.address.clone(),
        client: b.identity.client.clone(),
        author: made.name.clone(),
        date: date_in_words(&made.date),
        revision: b.revisions.last().map_or(String::new(), |r| r.letter.clone()),
        unsigned_text: "not signed".to_owned(),
        may_start: results.outcome == Outcome::Adequate,
        headline: headline(results.outcome).to_owned(),
        parts: vec![
            part("What was asked", asked(b), Vec::new()),
            part("What the wall does today", does(b), Vec::new()),
            part("What we found", found(b, results), Vec::new()),
            Part { drawing: drawing(b), ..part("What must stay", stays(b, results), Vec::new()) },
            part("What must be done or seen first", conditions(results), points(b, results)),
            Part {
                numbered: true,
                ..part("What happens next, and who does it", Vec::new(), steps(b, results))
            },
            part("What this does not cover", Vec::new(), not_covered()),
            part("Whom to call", whom(b), Vec::new()),
        ]
        .into_iter()
        .filter(|p: &Part| !p.lines.is_empty() || !p.steps.is_empty() || p.drawing.is_some())
        .map(|p| Part {
            lines: p.lines.iter().map(|l| plain::spelled(l)).collect(),
            steps: p.steps.iter().map(|s| plain::spelled(s)).collect(),
            ..p
        })
        .collect(),
    }
}

fn part(title: &str, lines: Vec<String>, steps: Vec<String>) -> Part {
    Part { title: title.to_owned(), lines, steps, numbered: false, drawing: None }
}

const fn headline(outcome: Outcome) -> &'static str {
    match outcome {
        Outcome::Adequate => "By our calculations, what stays is enough.",
        Outcome::Conditional(_) => "What stays is enough only once the points below are closed.",
        Outcome::Outside => "We cannot say that what stays is enough. The wall must not come out.",
        Outcome::NotAdequate => "What stays is not enough. The wall must not come out.",
    }
}

/// Words of the job file as a sentence of their own.
fn sentence(words: &str) -> String {
    let words = words.trim();
    let end = if words.ends_with(['.', '!', '?']) { "" } else { "." };
    format!("{}{end}", capital(words))
}

/// A storey as people call it.
fn floor(mark: &str) -> String {
    if mark.ends_with("floor") || mark.ends_with("storey") {
        mark.to_owned()
    } else {
        format!("{mark} floor")
    }
}

fn asked(b: &Building) -> Vec<String> {
    vec![
        format!(
            "You asked whether the {} on the {} can be taken out.",
            b.removed.wall,
            floor(&b.removed.storey)
        ),
        format!("The work: {}", lower(&sentence(&b.identity.work))),
    ]
}

fn does(b: &Building) -> Vec<String> {
    vec![
        "The wall does two jobs today.".to_owned(),
        format!("It carries weight: {}", lower(&sentence(&b.removed.carried))),
        format!("It steadies other walls: {}", lower(&sentence(&b.removed.braced))),
    ]
}

fn found(b: &Building, results: &Results) -> Vec<String> {
    let mut out = Vec::new();
    let which = |chosen: &dyn Fn(&Section) -> bool| -> Vec<String> {
        results.sections.iter().filter(|s| chosen(s)).map(|s| named(b, s)).collect()
    };
    let failing = which(&|s| !outcome::holds_all(&s.sheet));
    let outside = which(&|s| !s.sheet.outside.is_empty());
    if !failing.is_empty() {
        out.push("Some parts do not pass our checks. They are these:".to_owned());
        out.extend(failing.iter().map(|f| format!("Not enough: {f}.")));
    }
    if !outside.is_empty() {
        out.push("Some parts cannot be judged by the method that we use. They are these:".to_owned());
        out.extend(outside.iter().map(|f| format!("Not judged: {f}.")));
    }
    match results.outcome {
        Outcome::Adequate => out.push(
            "We checked the walls that stay against the weight on them and against strong wind. They pass. The wall may come out only after the steps below.".to_owned(),
        ),
        Outcome::Conditional(_) => {
            out.push("We checked the walls that stay against the weight on them and against strong wind.".to_owned());
            out.push("Some of what we rely on has not been seen or shown yet.".to_owned());
            out.push("Until it has, the wall must not come out.".to_owned());
        }
        Outcome::Outside | Outcome::NotAdequate => out.push(
            "Do not let anybody take out the wall on the strength of this paper or of our calculations.".to_owned(),
        ),
    }
    if !b.warnings.is_empty() {
        out.push("The calculations also carry warnings. They stand on their first sheet.".to_owned());
    }
    out
}

/// A thing by its mark and its title, or by its title alone.
fn named(b: &Building, s: &Section) -> String {
    let bearings = b.bearings.iter().filter(|x| s.mark.split(", ").any(|mark| mark == x.mark));
    let (beams, on): (Vec<&str>, Vec<&str>) = bearings.map(|x| (x.beam.as_str(), x.on.as_str())).unzip();
    let title = match beams.first() {
        Some(beam) => format!("where beam {beam} rests on {}", list(&on)),
        None => lower(&s.title),
    };
    if s.mark.is_empty() { title } else { format!("{}, {title}", s.mark) }
}

fn lower(words: &str) -> String {
    let mut all = words.chars();
    let first = all.next().map(|c| c.to_lowercase().to_string()).unwrap_or_default();
    first + all.as_str()
}

/// Words of the trade in titles of returns, and what they mean.
const WORDS_OF_WALLS: [(&str, &str); 3] = [
    ("return", "A return is a short piece of wall that meets another."),
    ("nib", "A nib is a short piece of wall that is left beside an opening."),
    ("pier", "A pier is a short piece of wall that stands by itself."),
];

fn stays(b: &Building, results: &Results) -> Vec<String> {
    if b.returns.is_empty() {
        return vec!["Every wall other than the one named above must stay as it is.".to_owned()];
    }
    let titled = |word: &str| {
        let mut titles = b.returns.iter().map(|r| r.title.to_lowercase());
        titles.any(|t| t.split(|c: char| !c.is_alphanumeric()).any(|w| w.trim_end_matches('s') == word))
    };
    let meant = WORDS_OF_WALLS.iter().filter(|(word, _)| titled(word)).map(|(_, means)| *means);
    let named = "The pieces of wall named here must stay at their full height.";
    let untouched = "Nobody may cut into these pieces, drill them or make grooves in them.";
    let mut out = vec![[named].into_iter().chain(meant).chain([untouched]).collect::<Vec<_>>().join(" ")];
    let failing =
        |r: &&Return| results.sections.iter().any(|s| s.mark == r.mark && !outcome::holds_all(&s.sheet));
    for r in &b.returns {
        let enough = if failing(&r) { " As it stands, it is not enough." } else { "" };
        out.push(format!(
            "{} is the {}. It is {:.0} millimetres long.{enough}",
            r.mark,
            lower(&r.title),
            r.length.base().ceil()
        ));
    }
    out
}

fn conditions(results: &Results) -> Vec<String> {
    let open = results.holds.iter().filter(|h| h.closed.is_none()).count();
    match open {
        0 => Vec::new(),
        1 => vec![
            "One point must be closed before the wall comes down. Your engineer says in writing when it is."
                .to_owned(),
        ],
        n => vec![
            format!("There are {n} points to close before the wall comes down."),
            "Your engineer says in writing when each is closed. The calculations tell what each needs."
                .to_owned(),
        ],
    }
}

fn points(b: &Building, results: &Results) -> Vec<String> {
    let open = results.holds.iter().filter(|h| h.closed.is_none());
    open.map(|h| format!("{}: {}", h.mark, capital(&plainly(b, h)))).collect()
}

/// A hold point for somebody who has the work done.
fn plainly(b: &Building, h: &Hold) -> String {
    let of: Vec<String> = h.of.iter().filter(|m| b.returns.iter().any(|r| r.mark == **m)).cloned().collect();
    let of = list(&of);
    let at = |words: &str| if of.is_empty() { words.to_owned() } else { format!("{words} at {of}") };
    match &h.about {
        About::Given(Some(words)) => sentence(words),
        About::Given(None) => "a point of your engineer, told in the calculations.".to_owned(),
        About::Junction => {
            format!("{} must be opened up, and its bond seen.", at("the joint with the wall it meets"))
        }
        About::Footing => format!("{} must be dug down to and seen.", at("the footing")),
        About::Floor => "how the floor is fixed to the outer walls must be put right or shown.".to_owned(),
        About::Class => "your engineer must show that the house meets the rules against collapse.".to_owned(),
        About::House => "your engineer must show how the house as a whole stands against wind.".to_owned(),
        About::BeamEnds => "what the ends of the new beams rest on must still be worked out.".to_owned(),
        About::Panel => "what the outer wall is made of, and what holds it, must be seen.".to_owned(),
        About::Plan => {
            "what holds the outer walls was taken from the plan. It must be seen on site.".to_owned()
        }
        About::Link(link) => {
            let what = match link.as_str() {
                "wind face" | "panel" => "how the outer wall stands against wind",
                "floor edge" => "how the floor holds the outer wall",
                "diaphragm" => "how stiff the floor is",
                "bracing wall" => "the walls that steady the house",
                "junction" => "how walls are joined where they meet",
                "dpc" => "the damp-proof course",
                _ => "the footing",
            };
            format!("{} must be seen or shown.", at(what))
        }
    }
}

fn steps(b: &Building, results: &Results) -> Vec<String> {
    let name = &b.signatures.made.name;
    let stop = matches!(results.outcome, Outcome::NotAdequate | Outcome::Outside);
    let mut out = Vec::new();
    if stop {
        out.push("You: do not let work on the wall begin.".to_owned());
        out.push(format!(
            "You and {name}: agree on another design. A new pack of calculations follows from it."
        ));
        out.push(format!(
            "{}: must accept the new design before work starts.",
            capital(&b.identity.authority)
        ));
        return out;
    }
    out.push(format!("{name}: reads and signs the calculations. Until then nobody may rely on them."));
    out.push(format!("{}: must accept the design before work starts.", capital(&b.identity.authority)));
    if results.holds.iter().any(|h| h.closed.is_none()) {
        out.push("Your builder: opens up what the points above ask for.".to_owned());
        out.push(format!("{name}: looks at it, and closes each point in writing."));
    }
    out.push("Your builder: has somebody competent design the props, and puts them up first.".to_owned());
    out.push("Your builder: takes out the wall and builds in what the design asks for.".to_owned());
    out.push(format!("Everybody: if anything is not as described here, stop and call {name}."));
    out
}

fn not_covered() -> Vec<String> {
    [
        "The new beam itself. It needs calculations of its own.",
        "Props and other temporary support while the work goes on.",
        "Cracks, damp, decay or other damage that could not be seen.",
        "Fire, escape, drains, wiring, gas and asbestos.",
        "Agreements with neighbours about shared walls.",
        "Any other change to the house, now or later.",
    ]
    .map(str::to_owned)
    .into()
}

fn whom(b: &Building) -> Vec<String> {
    let made = &b.signatures.made;
    vec![
        match &made.contact {
            Some(contact) => format!("Call {}, who made the calculations: {contact}.", made.name),
            None => match b.practice.as_ref().and_then(|p| Some((p, p.contact.as_ref()?))) {
                Some((p, contact)) => {
                    format!("Call {} at {}, who made the calculations: {contact}.", made.name, p.name)
                }
                None => format!("Call {}, who made the calculations.", made.name),
            },
        },
        "This paper explains the calculations. It does not replace them.".to_owned(),
    ]
}

fn drawing(b: &Building) -> Option<data::Ready> {
    let drawing = plan::what_stays(b)?;
    data::ready(&drawing).ok()
}
