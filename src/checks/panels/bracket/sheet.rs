//! The bracket on the sheet: leaf by leaf, then the wall, and whether it decides or stands beside the hand route.

use super::found::{Effort, Found, leaf as find};
use super::reactions;
use crate::building::{Frame, PanelRoute, Sharing, Span};
use crate::checks::panels::form::{Form, LeafOutcome, State};
use crate::checks::panels::model::PanelModel;
use crate::checks::panels::strength::Strength;
use crate::checks::panels::{opened, sharing};
use crate::quantity::functions::min;
use crate::quantity::print::show;
use crate::quantity::{Force, Num, Stress};
use crate::solve::plate::{Trouble, elastic as first_crack};
use crate::standards::masonry::Edge;
use crate::trace::{Outside, Sheet, Unshown};
use crate::{calc, found, given, verify};

/// Both bounds, of a leaf or of the wall.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Bounds {
    /// Safe side.
    pub low: Stress,
    /// Weakest crack pattern; none in a search.
    pub high: Option<Stress>,
}

const CLAUSE: &str = "limit analysis";

/// A leaf by limit analysis where that decides: its safe side is the pressure it can take, and of a single leaf the
/// verdict.
///
/// # Errors
/// [`Outside`] where no strength across the bed joints is known, a piece is held by nothing, or the solver does not
/// converge.
pub fn leaf(
    s: &mut Sheet,
    state: State<'_>,
    span: &Span,
    strength: &Strength,
) -> Result<LeafOutcome, Outside> {
    let id = format!("{}-{}", state.form.id(), state.phase);
    let found = of(state, span, strength, &id)?;
    let bounds = write(s, state, &found, strength);
    let W_Ed = state.W_Ed;
    let w_Rd = if state.m.leaves.len() == 1 {
        given!(s, "pressure that the wall can take, the safe side", "above", w_Rd = bounds.low);
        if state.judged {
            verify!(s, &id, "6.3.1, by limit analysis", "wind on the panel as a whole", W_Ed <= w_Rd);
        }
        w_Rd
    } else {
        given!(s, "pressure that the leaf can take, the safe side", "above", w_leaf = bounds.low);
        w_leaf
    };
    let label = "limit analysis".to_owned();
    Ok(LeafOutcome { label, w_Rd, bounds: Some(bounds), ..Default::default() })
}

/// What was found of a leaf.
fn of(state: State<'_>, span: &Span, strength: &Strength, id: &str) -> Result<Found, Outside> {
    let found = find(state.m, span, strength, state.m.effort).ok_or_else(|| {
        let words = "no flexural strength across the bed joints is known: limit analysis needs one";
        Outside::new(id, "3.6.3", words)
    })?;
    match found.as_ref() {
        Ok(found) => Ok(found.clone()),
        Err(trouble) => Err(Outside::new(id, "limit analysis", words(trouble))),
    }
}

fn words(trouble: &Trouble) -> String {
    match trouble {
        Trouble::Floating(x, y) => format!(
            "a piece of the wall is held by nothing: the one {x:.0} mm from the left end and {y:.0} mm above the foot"
        ),
        Trouble::NotSolved(how) => format!("the limit analysis found no answer ({how})"),
    }
}

/// Both bounds of one leaf.
fn write(s: &mut Sheet, state: State<'_>, f: &Found, strength: &Strength) -> Bounds {
    let from = state.m.strength_from();
    if let Some((across, _)) = strength.across {
        given!(s, "resistance per unit height, across the bed joints", &from, M_Rd2 = across);
        let _ = M_Rd2;
    }
    let (top, foot) = (Force::new(f.pier.0), Force::new(f.pier.1));
    given!(s, "resistance along a bed joint of a pier, at the top", "6.3.1(4), own height", M_Rt = top);
    given!(s, "resistance along a bed joint of a pier, at the foot", "6.3.1(4), own height", M_Rb = foot);
    let _ = (M_Rt, M_Rb);
    let words = format!("greatest pressure with moments in balance, {} triangles", f.low.triangles);
    found!(s, CLAUSE, &words, w_mf = Stress::new(f.low.field));
    given!(
        s,
        "part of it that counts, by a coarser mesh beside it",
        "own study",
        k_mf = Num::new(f.low.lowered)
    );
    calc!(s, CLAUSE, "safe side", w_s = k_mf * w_mf);
    let Some(high) = &f.high else { return Bounds { low: w_s, high: None } };
    let words = format!("pressure of the weakest crack pattern, {} lines", high.lines);
    found!(s, CLAUSE, &words, w_u = Stress::new(high.pressure));
    calc!(s, "bracket", "its width", delta_w = (w_u - w_s) / w_s);
    if delta_w < Num::new(-0.01) {
        s.fault("bracket".to_owned(), format!("upper side {w_u:?} below safe side {w_s:?}"));
    }
    if let Some(aside) = &f.aside {
        if let Some(first) = &aside.first {
            found!(
                s,
                "elastic plate",
                "pressure at the first crack, moments averaged over 250 mm",
                w_cr = Stress::new(first.pressure)
            );
            let _ = w_cr;
        }
        if let Some(cracked) = aside.cracked {
            found!(
                s,
                CLAUSE,
                "with the bed joints cracked: weight alone, coarser grid",
                w_dry = Stress::new(cracked)
            );
            let _ = w_dry;
        }
        if let Some(solid) = aside.solid.filter(|_| !state.m.after.openings.is_empty()) {
            found!(s, CLAUSE, "without the openings, coarser grid", w_sol = Stress::new(solid));
            calc!(s, "limit analysis", "part that the openings leave", k_op = w_s / w_sol);
            let _ = k_op;
        }
    }
    Bounds { low: w_s, high: Some(w_u) }
}

/// The bracket of the wall from those of its leaves, as [`sharing`] adds what they take; none where they share by
/// stiffness, since each then stands against its own part.
pub fn of_wall(s: &mut Sheet, m: &PanelModel, leaves: &[Bounds]) -> Option<Bounds> {
    let [outer, inner] = leaves else { return leaves.first().copied() };
    if m.sharing == Sharing::Stiffness {
        return None;
    }
    let tied = sharing::counted(&mut Sheet::silent(), m.ties, "before");
    given!(s, "safe side, outer leaf", "above", w_s_o = outer.low);
    given!(s, "safe side, inner leaf", "above", w_s_i = inner.low);
    let low = if tied {
        calc!(s, "6.3.1(6)", "safe side of both leaves", w_S = w_s_o + w_s_i);
        w_S
    } else {
        calc!(s, "6.3.1(6), 6.5", "safe side: the weaker leaf", w_S = min(w_s_o, w_s_i));
        w_S
    };
    let high = outer.high.zip(inner.high).map(|(o, i)| {
        given!(s, "weakest pattern, outer leaf", "above", w_u_o = o);
        given!(s, "weakest pattern, inner leaf", "above", w_u_i = i);
        if tied {
            calc!(s, "6.3.1(6)", "weakest pattern of both leaves", w_U = w_u_o + w_u_i);
            w_U
        } else {
            calc!(s, "6.3.1(6), 6.5", "weakest pattern: the weaker leaf", w_U = min(w_u_o, w_u_i));
            w_U
        }
    });
    Some(Bounds { low, high })
}

/// The bracket beside the hand route, which decides: on the sheet, for information, unless the weakest crack pattern
/// takes less than the wind.
pub fn beside(
    s: &mut Sheet,
    state: State<'_>,
    span: &Span,
    strengths: &[Strength],
    by_hand: Option<Stress>,
) -> Option<Bounds> {
    let id = format!("limit-{}", state.phase);
    s.heading(2, "The panel as a whole, by limit analysis");
    let all: Result<Vec<Found>, Outside> =
        strengths.iter().map(|strength| of(state, span, strength, &id)).collect();
    let all = match all {
        Ok(all) => all,
        Err(outside) => {
            s.note(format!("For information, and without a result: {} [{}].", outside.words, outside.clause));
            return None;
        }
    };
    s.note(
        "For information: the hand route decides. The safe side is the greatest pressure at which moments balance the \
         wind everywhere and break the wall nowhere; the upper side is the weakest pattern of cracks between the nodes \
         of a grid. The true value of the theory lies between the two.",
    );
    remarks(s, state, span, &all);
    let leaves = s.columns(&state.m.leaf_names(), |s, i| write(s, state, &all[i], &strengths[i]));
    let wall = of_wall(s, state.m, &leaves)?;
    against(s, state, wall, by_hand);
    reactions::table(s, state, span, &all);
    Some(wall)
}

/// What the bracket says of the hand route.
fn against(s: &mut Sheet, state: State<'_>, wall: Bounds, by_hand: Option<Stress>) {
    let W_Ed = state.W_Ed;
    let single = state.m.leaves.len() == 1;
    if single {
        given!(s, "safe side of the wall", "above", w_S = wall.low);
        calc!(s, "for information", "use by the safe side", r_S = W_Ed / w_S);
        let _ = r_S;
    } else {
        let w_S = wall.low;
        calc!(s, "for information", "use by the safe side", r_S = W_Ed / w_S);
        let _ = r_S;
    }
    let (Some(high), Some(hand)) = (wall.high, by_hand) else { return };
    let print = |w: Stress| show("w_Rd", w.dynamic()).to_string();
    if hand > high {
        s.note(format!(
            "By hand the panel takes {}, more than the weakest crack pattern, {}: the coefficients of Annex E rest on \
             straight cracks, and leave out fans at the corners of continuous edges.",
            print(hand),
            print(high)
        ));
    }
    if W_Ed > high && W_Ed <= hand {
        s.unshown(Unshown {
            id: format!("pattern-{}", state.phase),
            clause: "limit analysis".to_owned(),
            words: "weakest crack pattern".to_owned(),
            finding: format!(
                "A crack pattern breaks the panel at {}, less than the wind: the hand route is not to be relied on here.",
                print(high)
            ),
            ratio: Some(W_Ed.base() / high.base()),
            hold: None,
        });
    }
}

/// What is taken for granted, and what the theory leaves out.
pub fn remarks(s: &mut Sheet, state: State<'_>, span: &Span, all: &[Found]) {
    let dpc = match span.base.dpc {
        true => {
            "The base turns at its damp-proof course against the moment of the weight on it alone, sigma Z of 6.3.1(4) \
             without flexural strength; by hand it is a simple support."
        }
        false => "No edge is held against turning by weight alone.",
    };
    s.note(format!(
        "Bed joints are pressed by the dead load at their own height, at most a fifth of the design strength; over and \
         under an opening by the masonry above the joint alone. {dpc}"
    ));
    if span.openings.iter().any(|o| o.frame == Frame::Unknown) {
        let of = |i: usize| match all.len() {
            1 => format!("\"{}\"", all[i].frame.word()),
            _ => format!("\"{}\" for the {}", all[i].frame.word(), state.m.leaf_name(i)),
        };
        let worst: Vec<String> = (0..all.len()).map(of).collect();
        s.note(format!(
            "How frames pass their wind on is not known: jambs, all round, head and sill were tried; the worst counts, {}.",
            worst.join(", ")
        ));
    }
    if [&span.top, &span.base, &span.left, &span.right].iter().any(|e| e.kind == Edge::Continuous) {
        s.note("Cracks may fan out at the corners of continuous edges here; those of Annex E do not.");
    }
    if let Some(first) = all.iter().filter_map(|f| f.aside.as_ref()?.first).next() {
        s.note(format!(
            "First cracks, bed joints without strength and the wall without its openings are information: they say how \
             brittle the panel is, and what the openings take. The first crack, by elastic bending with Poisson's ratio \
             {}, opens about {:.0} mm from the left end and {:.0} mm above the foot{}.",
            first_crack::POISSON,
            first.at.0,
            first.at.1,
            if all.len() > 1 { " of the outer leaf" } else { "" }
        ));
    }
    if all.iter().any(|f| f.refined) {
        s.note("The bracket was wider than 10 % at first: both grids were refined once.");
    }
    s.note(
        "The theory lets every crack keep its moment while others open, which masonry does only in part. Research reports \
         its results above those of tests on some walls with openings (from memory, to be checked (L)); so the lower \
         value is safe as against the theory, not as against every wall.",
    );
}

/// What opens the working where limit analysis decides.
pub fn decides(s: &mut Sheet, state: State<'_>, span: &Span, strengths: &[Strength]) {
    s.note(
        "The job has the panel judged as a whole by limit analysis. The safe side decides: the greatest pressure at which \
         moments balance the wind everywhere and break the wall nowhere. The weakest pattern of cracks between the nodes \
         of a grid stands beside it; the true value of the theory lies between the two.",
    );
    let all: Vec<Found> = strengths.iter().filter_map(|x| of(state, span, x, "limit").ok()).collect();
    if all.len() == strengths.len() {
        remarks(s, state, span, &all);
    }
}

/// The hand route beside limit analysis that decides, for information, and what comes to the edges. Yields the
/// pressure that the wall takes by hand, where there is one.
pub fn hand_beside(s: &mut Sheet, state: State<'_>, span: &Span, strengths: &[Strength]) -> Option<Stress> {
    let all: Result<Vec<Found>, Outside> = strengths.iter().map(|x| of(state, span, x, "limit")).collect();
    if let Ok(all) = all {
        reactions::table(s, state, span, &all);
    }
    if state.m.effort == Effort::Search {
        return None;
    }
    s.heading(2, "By hand, for information");
    let id = format!("hand-{}", state.phase);
    let form = match Form::of(PanelRoute::Flexure, state.edges, &id) {
        Ok(form) => form,
        Err(outside) => {
            s.note(format!("By hand: outside the method, {} [{}].", outside.words, outside.clause));
            return None;
        }
    };
    let by_hand = State { form, judged: false, beside: true, ..state };
    let leaves = s.columns(&state.m.leaf_names(), |s, i| match span.openings.as_slice() {
        [] => super::super::form::leaf(s, by_hand, span, &strengths[i]),
        some => opened::leaf(s, by_hand, &strengths[i], some, state.m.leaf_name(i)),
    });
    let mut takes = Vec::new();
    for leaf in leaves {
        match leaf {
            Ok(leaf) => takes.push(Bounds { low: leaf.w_Rd, high: None }),
            Err(outside) => {
                s.note(format!("By hand: outside the method, {} [{}].", outside.words, outside.clause));
                return None;
            }
        }
    }
    let wall = of_wall(&mut Sheet::silent(), state.m, &takes)?.low;
    let print = |w: Stress| show("w_Rd", w.dynamic()).to_string();
    let verdict = if state.W_Ed <= wall { "no less than" } else { "less than" };
    s.note(format!(
        "By hand the wall takes {}, {verdict} the wind, {}. The job has limit analysis decide.",
        print(wall),
        print(state.W_Ed)
    ));
    Some(wall)
}

/// Whether a bracket belongs beside the hand route of this state.
pub fn wanted(state: State<'_>, span: &Span) -> bool {
    let effort = state.m.effort;
    let shown = if state.phase == "before" { effort == Effort::Read } else { effort != Effort::Search };
    shown && !span.openings.is_empty()
}
