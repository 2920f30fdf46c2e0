//! A panel with doors and windows by hand: piers between top and base, strips at the jambs, and the wall over and
//! under each opening as a strip between its jambs.
//!
//! A safe side by the lower-bound theorem of plasticity: every piece of wall carries several loads at once, each with
//! a part of its strength, and Johansen's criterion is convex, so the parts add up to no more than the whole. What an
//! end pier takes both ways is that of Annex E with its inner edge free, with what Annex E itself is worth.

mod pier;
pub mod strip;

use super::form::{LeafOutcome, State};
use super::strength::Strength;
use crate::building::{Frame, PanelOpening};
use crate::quantity::{Length, Stress};
use crate::standards::masonry::Edge;
use crate::trace::{Outside, Sheet};
use crate::{given, verify};

/// Frames that are tried where nobody knows how they pass their wind on.
const TRIED: [Frame; 3] = [Frame::Jambs, Frame::AllRound, Frame::HeadAndSill];

/// Works one leaf of a panel with openings, as [`leaf`](super::form::leaf) does one without.
///
/// # Errors
/// [`Outside`] where top or base are not held, and where no strength across the bed joints is known for the wall
/// over and under the openings.
pub fn leaf(
    s: &mut Sheet,
    state: State<'_>,
    strength: &Strength,
    openings: &[PanelOpening],
    name: &str,
) -> Result<LeafOutcome, Outside> {
    let id = format!("{}-{}", state.form.id(), state.phase);
    let edges = state.edges;
    if edges.top == Edge::Free || edges.base == Edge::Free {
        let words = "openings by hand need top and base held: the piers span between them";
        return Err(Outside::new(&id, "statics", words));
    }
    let as_if = |frame: Frame| {
        let known = |o: &PanelOpening| PanelOpening {
            frame: if o.frame == Frame::Unknown { frame } else { o.frame },
            ..o.clone()
        };
        openings.iter().map(known).collect::<Vec<_>>()
    };
    let unknown = openings.iter().any(|o| o.frame == Frame::Unknown);
    let mut frame = Frame::Jambs;
    if unknown {
        let takes = |frame: Frame| {
            let all = as_if(frame);
            pressures(&mut Sheet::silent(), state, strength, &all)
                .map(|w| least(&w).map_or(0.0, |x| x.1.base()))
        };
        let mut worst = f64::INFINITY;
        for tried in TRIED {
            let w = takes(tried)?;
            if w < worst {
                (worst, frame) = (w, tried);
            }
        }
        s.note(format!(
            "How the frames pass their wind on is not known: jambs, all round, head and sill were tried; \"{}\" is the \
             worst for the {name}, and worked here.",
            frame.word()
        ));
    }
    let all = pressures(s, state, strength, &as_if(frame))?;
    let Some((words, pressure)) = least(&all) else {
        return Err(Outside::new(&id, "statics", "the panel has no pier"));
    };
    let words = format!("pressure that it can take, the least of these: {words}");
    let single = state.m.leaves.len() == 1;
    let w_Rd = if single && !state.beside {
        given!(s, &words, "above", w_Rd = pressure);
        w_Rd
    } else {
        given!(s, &words, "above", w_leaf = pressure);
        w_leaf
    };
    if single && state.judged {
        let W_Ed = state.W_Ed;
        verify!(s, &id, "6.3.1, by piers and strips", "wind on the panel with its openings", W_Ed <= w_Rd);
    }
    let label = match openings.len() {
        1 => "by hand, 1 opening".to_owned(),
        n => format!("by hand, {n} openings"),
    };
    Ok(LeafOutcome { label, mu: strength.across.map(|a| a.1), w_Rd, ..Default::default() })
}

/// What every piece of the wall can take, by its name.
type Pieces = Vec<(String, Stress)>;

/// The first of the least.
fn least(all: &Pieces) -> Option<(&str, Stress)> {
    all.iter().map(|(words, w)| (words.as_str(), *w)).reduce(|a, b| if b.1 < a.1 { b } else { a })
}

/// Pieces from left to right. `h` stands on the sheet.
fn pressures(
    s: &mut Sheet,
    state: State<'_>,
    strength: &Strength,
    openings: &[PanelOpening],
) -> Result<Pieces, Outside> {
    let id = format!("{}-{}", state.form.id(), state.phase);
    let from = state.m.strength_from();
    given!(s, "clear height", "job file", h = state.m.h);
    let mut out = Pieces::new();
    let mut reached = Length::ZERO;
    for n in 0..=openings.len() {
        let (before, after) = (n.checked_sub(1).and_then(|i| openings.get(i)), openings.get(n));
        let end = after.map_or(state.l, |o| o.at);
        let name = match (before.is_some(), after.is_some()) {
            (false, _) => "the pier at the left end".to_owned(),
            (_, false) => "the pier at the right end".to_owned(),
            _ => format!("the pier between openings {n} and {}", n + 1),
        };
        let outer = match (before.is_some(), after.is_some()) {
            (false, _) => Some(state.edges.left),
            (_, false) => Some(state.edges.right),
            _ => None,
        };
        let beside: Vec<&PanelOpening> = before.into_iter().chain(after).collect();
        let one = pier::Pier {
            name: &name,
            width: end - reached,
            outer,
            left_end: before.is_none(),
            beside: &beside,
        };
        out.push((name.clone(), pier::takes(s, state, strength, &one)?));
        if let Some(o) = after {
            let (resistance, _) = strength.across.ok_or_else(|| {
                let words = "no flexural strength across the bed joints is known for the wall over and under openings";
                Outside::new(&id, "3.6.3", words)
            })?;
            given!(s, "resistance per unit height, across the bed joints", &from, M_Rd2 = resistance);
            let words = format!("the wall over or under opening {}", n + 1);
            for w in strip::spandrels(s, o, o.frame, h, M_Rd2) {
                out.push((words.clone(), w));
            }
            reached = o.at + o.width;
        }
    }
    Ok(out)
}
