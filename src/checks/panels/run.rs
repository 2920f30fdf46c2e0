//! The check of a panel: before as information, after as the verdict, and both side by side.

use super::bracket::{Bounds, Effort};
use super::form::{Form, LeafOutcome, State, leaf};
use super::model::{PanelModel, edges};
use super::strength::{self, Strength};
use super::{bracket, opened, remedy, sharing, tables};
use crate::building::{PanelRoute, Span};
use crate::quantity::{Length, Num, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1996::lateral::{arching, size};
use crate::standards::tables::annex_e::Edge;
use crate::trace::{Outside, Sheet};
use crate::{calc, given, verify};

/// What a panel does in one state.
#[derive(Clone, Debug)]
pub struct Outcome {
    /// Length.
    pub l: Length,
    /// One for each leaf.
    pub leaves: Vec<LeafOutcome>,
    /// Design pressure.
    pub W_Ed: Stress,
    /// Pressure that the wall can take.
    pub w_Rd: Stress,
    /// Largest use in bending or arching.
    pub ratio: f64,
    /// By limit analysis, where that was worked.
    pub bounds: Option<Bounds>,
    /// By hand, where limit analysis decides.
    pub hand: Option<Stress>,
}

/// Checks a panel on the sheet: strengths, before (information), after (verdicts), both side by side, and
/// what would make it pass where it does not.
///
/// BS EN 1996-1-1 5.5.5, 6.3.1, 6.3.2, 6.5, Annexes E and F. Verdict ids: `flexure-after` and
/// `flexure-parallel-after` (or `vertical-`, `horizontal-`, `cantilever-`, `arching-after`), `ties`. A
/// limit that is left is noted as outside under `size` or the check's id.
pub fn check(s: &mut Sheet, m: &PanelModel, annex: &Annex) {
    s.table(|| tables::held(m));
    let W_Ed = wind(s, m, annex);
    let strengths = strengths(s, m, annex);
    at_hand(m, &strengths);
    // Before is information: worked silently by the same code, printed in the table side by side.
    let before = s.recording().then(|| {
        let mut quiet = Sheet::silent();
        let worked = state(&mut quiet, m, annex, &m.before, W_Ed, &strengths, "before");
        (worked, quiet.outside)
    });
    s.heading(1, "After the removal");
    let (v, o) = (s.verdicts.len(), s.outside.len());
    let after = state(s, m, annex, &m.after, W_Ed, &strengths, "after");
    if let Some((before, left)) = before {
        s.heading(1, "Before and after");
        s.table(|| tables::side_by_side(m, before.as_ref(), after.as_ref()));
        for o in left {
            s.note(format!("Before the removal: outside the method, {} [{}].", o.words, o.clause));
        }
        let holds = s.verdicts[v..].iter().all(|v| v.holds) && s.outside.len() == o;
        let limit = m.route == PanelRoute::LimitAnalysis || !m.after.openings.is_empty();
        if holds && limit && m.effort == Effort::Read {
            s.heading(1, "How far it may move");
            s.table(|| tables::moves(m, annex));
        }
        if s.verdicts[v..].iter().any(|v| !v.holds) && s.outside.len() == o {
            s.heading(1, "What would make it pass");
            for r in remedy::remedies(m, annex) {
                s.note(r.sentence);
            }
        }
    }
}

/// Has the limit analyses that the sheet will ask for worked on all cores.
fn at_hand(m: &PanelModel, strengths: &[Strength]) {
    let all = [&m.after, &m.before];
    let spans = if m.effort == Effort::Read { &all[..] } else { &all[..1] };
    let wanted: Vec<&Span> = spans.iter().filter(|span| bracket::found::worked(m, span)).copied().collect();
    bracket::prepare(m, &wanted, strengths, m.effort);
}

/// What the panel takes by hand in one state, whichever route decides; none where the hand route has no answer.
pub fn by_hand(m: &PanelModel, annex: &Annex, span: &Span) -> Option<Stress> {
    let route = if m.route == PanelRoute::LimitAnalysis { PanelRoute::Flexure } else { m.route };
    let m = PanelModel { route, effort: Effort::Search, ..m.clone() };
    let mut s = Sheet::silent();
    let W_Ed = wind(&mut s, &m, annex);
    let strengths = strengths(&mut s, &m, annex);
    state(&mut s, &m, annex, span, W_Ed, &strengths, "after").map(|o| o.w_Rd)
}

/// What must be closed before the wall comes down for this panel's result to hold, as sentences.
pub fn hold_points(m: &PanelModel) -> Vec<String> {
    let mut out = Vec::new();
    let enough = m.ties.is_some_and(sharing::enough);
    if m.leaves.len() == 2 && enough && m.tie_strength.is_none() {
        out.push(format!(
            "Before the wall comes down, open the cavity of {} in two places and confirm wall ties of at least 2.5 \
             per m², sound, bedded in both leaves and of a type made for that cavity: the tie check is by rule.",
            m.mark
        ));
    }
    if let (PanelRoute::Arching, Some(a)) = (m.route, &m.arching) {
        out.push(format!(
            "Before the wall comes down, confirm that {} is built tight between supports that resist the arch \
             thrust ({}), and that a damp-proof course can pass it.",
            m.mark,
            a.abutment.trim_end_matches('.')
        ));
        if !a.vertical {
            out.push(format!(
                "Before the wall comes down, confirm that the units of {} are as strong along the wall as from bed \
                 to bed: the arch presses them along the wall.",
                m.mark
            ));
        }
    }
    out
}

/// Strengths of the leaves: worked here, or quoted from the sheet where the same leaves stand already.
fn strengths(s: &mut Sheet, m: &PanelModel, annex: &Annex) -> Vec<Strength> {
    let of = |s: &mut Sheet| s.columns(&m.leaf_names(), |s, i| strength::of_leaf(s, m, annex, i));
    match &m.strengths_on {
        None => {
            s.heading(2, if m.leaves.len() == 1 { "Strength of the leaf" } else { "Strength of the leaves" });
            of(s)
        }
        Some(mark) => {
            s.note(format!(
                "The leaves resist what they resist in {mark}: the same wall, height and load. They are worked on its \
                 sheet."
            ));
            of(&mut Sheet::silent())
        }
    }
}

/// Design pressure, with what is taken for granted.
fn wind(s: &mut Sheet, m: &PanelModel, annex: &Annex) -> Stress {
    s.heading(1, "Wind on the panel");
    given!(s, "net pressure on the panel, characteristic", &m.q_source, q_net = m.q_net);
    given!(s, "factor on wind", "EN 1990 NA.A1.2", gamma_W = Num::new(annex.gamma_Q));
    calc!(s, "EN 1990 6.4.3.2", "design pressure", W_Ed = gamma_W * q_net);
    s.note(
        "The section is the same both ways, so one direction of the wind covers the other. Helping decides: it \
         presses least. A dead load that the job gives must already be net of the roof's uplift.",
    );
    if m.after.openings.is_empty() {
        s.note("The panel has no openings.");
    }
    W_Ed
}

/// One state of the panel. `W_Ed` stands on the sheet. `None` where it is outside the method.
fn state(
    s: &mut Sheet,
    m: &PanelModel,
    annex: &Annex,
    span: &Span,
    W_Ed: Stress,
    strengths: &[Strength],
    phase: &'static str,
) -> Option<Outcome> {
    given!(s, "length between supports", "job file", l = span.length);
    given!(s, "clear height", "job file", h = m.h);
    if m.route != PanelRoute::Arching {
        sizes(s, m, annex, span, phase);
    } else if phase == "after" {
        s.note("Size limits of panels in bending do not apply to an arch; its own slenderness is checked.");
    }
    let worked = if m.route == PanelRoute::Arching && !span.openings.is_empty() {
        Err(Outside::new(
            &format!("arching-{phase}"),
            "6.3.2",
            "an arch in a wall with openings is not worked",
        ))
    } else if m.route == PanelRoute::Arching {
        arch(s, m, annex, W_Ed, l, strengths, phase)
    } else {
        bend(s, m, annex, span, W_Ed, strengths, phase)
    };
    worked.map_err(|o| s.leave(o)).ok()
}

/// Size limits; before, they are tried without printing them twice.
fn sizes(s: &mut Sheet, m: &PanelModel, annex: &Annex, span: &Span, phase: &str) {
    let (h, l) = (m.h, span.length);
    let one_way = m.route == PanelRoute::OneWay;
    let mut quiet = Sheet::silent();
    let tried = if phase == "before" { &mut quiet } else { &mut *s };
    let t_ef = strength::effective_thickness(tried, m, annex);
    let id = if phase == "before" { "size-before" } else { "size" };
    if let Err(o) = size::limits(tried, id, edges(span), one_way, h, l, t_ef) {
        s.leave(o);
    }
}

/// Bending, one way or both.
fn bend(
    s: &mut Sheet,
    m: &PanelModel,
    annex: &Annex,
    span: &Span,
    W_Ed: Stress,
    strengths: &[Strength],
    phase: &'static str,
) -> Result<Outcome, Outside> {
    let edges = edges(span);
    let form = Form::of(m.route, edges, &format!("flexure-{phase}"))?;
    let l = span.length;
    if phase == "after" {
        remarks(s, span, form);
    }
    let state = State { m, edges, form, l, W_Ed, phase, judged: true, beside: false };
    let first = s.verdicts.len();
    let openings = &span.openings;
    let by_hand = form != Form::Limit && !openings.is_empty();
    if by_hand && phase == "after" {
        opened_remarks(s);
    }
    if form == Form::Limit && phase == "after" {
        bracket::sheet::decides(s, state, span, strengths);
    }
    let leaves = s.columns(&m.leaf_names(), |s, i| {
        if by_hand {
            opened::leaf(s, state, &strengths[i], openings, m.leaf_name(i))
        } else {
            leaf(s, state, span, &strengths[i])
        }
    });
    let leaves = match leaves.into_iter().collect::<Result<Vec<LeafOutcome>, Outside>>() {
        Ok(leaves) => leaves,
        Err(outside) => {
            // What the hand route cannot work is shown by the other all the same.
            if bracket::sheet::wanted(state, span) && by_hand {
                bracket::sheet::beside(s, state, span, strengths, None);
            }
            return Err(outside);
        }
    };
    let (w_Rd, ratio) = if leaves.len() == 1 {
        (leaves[0].w_Rd, s.verdicts[first..].iter().map(|v| v.ratio).fold(0.0, f64::max))
    } else {
        sharing::cavity(s, state, annex, strengths, &leaves)
    };
    let mut hand = None;
    let bounds = if form == Form::Limit {
        let all: Option<Vec<Bounds>> = leaves.iter().map(|l| l.bounds).collect();
        hand = bracket::sheet::hand_beside(s, state, span, strengths);
        all.and_then(|all| bracket::sheet::of_wall(&mut Sheet::silent(), m, &all))
    } else if bracket::sheet::wanted(state, span) {
        bracket::sheet::beside(s, state, span, strengths, Some(w_Rd))
    } else {
        None
    };
    Ok(Outcome { l, leaves, W_Ed, w_Rd, ratio, bounds, hand })
}

/// How openings are worked by hand, and what of it is not the code's.
fn opened_remarks(s: &mut Sheet) {
    s.note(
        "Openings by hand: the wall is taken in piers, and half of the wind on the breadth of an opening goes to the jamb of \
         each pier beside it. An end pier whose outer edge is held spans both ways, that load on its free edge, by the yield \
         lines of Annex E; any other spans between top and base, each load with a part of its strength. The wall over and \
         under an opening spans between the jambs. No clause has it: equilibrium, with Annex E for what the pieces take. \
         Dead load that goes to the piers from over the openings is not counted as help.",
    );
}

/// What the way of spanning leaves out.
fn remarks(s: &mut Sheet, span: &Span, form: Form) {
    let continuous =
        [&span.top, &span.base, &span.left, &span.right].iter().any(|e| e.kind == Edge::Continuous);
    if form == Form::Plate && continuous {
        s.note(
            "Straight yield-line patterns, and with them the cells of Annex E, miss the fans at the corners of \
             continuous edges. Limit analysis with fans gives a coefficient 1 to 22 % higher, most for a free top \
             with three continuous edges: against that theory the coefficient is not on the safe side. The \
             standard's table is used as it stands, and its own pattern for what the table lacks.",
        );
    }
    match form {
        Form::Plate if span.base.kind == Edge::Continuous => s.note(
            "The base is taken as continuous: no damp-proof course may cross it, for a base at a damp-proof \
             course is a simple support (5.5.5).",
        ),
        Form::Vertical | Form::Horizontal if continuous => s.note(
            "Edges said to be continuous are used as simple ones: a span one way is judged by W h²/8 (or W l²/8), \
             on the safe side.",
        ),
        Form::Cantilever => s.note(
            "Precompression is taken at mid-height, on the safe side for a moment at the foot. No damp-proof \
             course may cross the foot.",
        ),
        _ => {}
    }
}

/// Arching of the loaded leaf between its abutments; the other leaf is left out.
fn arch(
    s: &mut Sheet,
    m: &PanelModel,
    annex: &Annex,
    W_Ed: Stress,
    l: Length,
    strengths: &[Strength],
    phase: &'static str,
) -> Result<Outcome, Outside> {
    let id = format!("arching-{phase}");
    let Some(a) = &m.arching else {
        return Err(Outside::new(&id, "6.3.2(1)", "no abutment is named that resists the arch thrust"));
    };
    let i = m.loaded();
    let strength = &strengths[i];
    let above = m.leaf_from(i);
    s.note(format!(
        "Assumed, and a hold point: the arch thrust is resisted: {}.",
        a.abutment.trim_end_matches('.')
    ));
    given!(s, "actual thickness", &above, t = strength.t);
    given!(s, "design compressive strength", &above, f_d = strength.f_d);
    given!(s, "stress from dead load that helps", &above, sigma_v = strength.sigma_v);
    if !a.vertical {
        s.note("The thrust runs along the wall: the compressive strength is taken to be the same that way, a hold point.");
    }
    let distance = if a.vertical { m.h } else { l };
    given!(s, "distance between the abutments", "job file", l_a = distance);
    let arch = arching::resistance(s, &id, f_d, t, l_a, sigma_v)?;
    let q_lat_d = arch.q_lat_d;
    let ratio = verify!(s, &id, "6.3.2(5)", "wind on the arch", W_Ed <= q_lat_d);
    if m.leaves.len() == 2 {
        s.note("The other leaf is left out: the ties pass the whole wind to the arching leaf.");
        if sharing::counted(s, m.ties, phase) {
            if phase == "after" {
                calc!(s, "6.5", "pressure that the ties pass", W_t = 1.0 * W_Ed);
                sharing::ties(s, annex, m.ties, m.tie_strength.as_ref(), W_t);
            }
        } else {
            return Err(Outside::new(&id, "6.5", "wall ties too few to pass the wind to the arching leaf"));
        }
    }
    let leaves = vec![LeafOutcome { label: "arching".to_owned(), w_Rd: q_lat_d, ..Default::default() }];
    Ok(Outcome { l, leaves, W_Ed, w_Rd: q_lat_d, ratio, bounds: None, hand: None })
}
