//! The check of a panel: before as information, after as the verdict, and both side by side.

use super::bracket::{Bounds, Effort};
use super::form::{Form, LeafOutcome, State, leaf};
use super::model::{PanelModel, edges};
use super::strength::{self, Strength};
use super::{bracket, opened, remedy, sharing};
use crate::building::{PanelRoute, Span};
use crate::quantity::print::{self, show};
use crate::quantity::{Length, Num, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1996::lateral::{arching, size};
use crate::standards::tables::annex_e::Edge;
use crate::trace::{Column, Outside, Sheet, Table};
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
    s.table(|| held(m));
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
        s.table(|| side_by_side(m, before.as_ref(), after.as_ref()));
        for o in left {
            s.note(format!("Before the removal: outside the method, {} [{}].", o.words, o.clause));
        }
        let holds = s.verdicts[v..].iter().all(|v| v.holds) && s.outside.len() == o;
        let limit = m.route == PanelRoute::LimitAnalysis || !m.after.openings.is_empty();
        if holds && limit && m.effort == Effort::Read {
            s.heading(1, "How far it may move");
            s.table(|| moves(m, annex));
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

/// How the edges are held before and after, and why.
fn held(m: &PanelModel) -> Table {
    let (b, a) = (&m.before, &m.after);
    let row = |name: &str, b: &crate::building::Edge, a: &crate::building::Edge| {
        let why = if b.reason == a.reason { "the same".to_owned() } else { a.reason.clone() };
        vec![name.to_owned(), how(b), b.reason.clone(), how(a), why]
    };
    Table {
        caption: "Edges, seen from outside".to_owned(),
        columns: ["edge", "before", "why", "after", "why"].map(Column::words).to_vec(),
        rows: vec![
            row("top", &b.top, &a.top),
            row("base", &b.base, &a.base),
            row("left", &b.left, &a.left),
            row("right", &b.right, &a.right),
        ],
        strong: Vec::new(),
    }
}

/// How far each thing may move before the panel fails, the others as they are.
fn moves(m: &PanelModel, annex: &Annex) -> Table {
    let caption = "Up to where the panel passes by the route that decides, one thing at a time; rounded down";
    let coarse = "; by limit analysis on a coarse grid, lowered for it by 2.5 % and more";
    let limit = m.route == PanelRoute::LimitAnalysis;
    Table {
        caption: format!("{caption}{}", if limit { coarse } else { "" }),
        columns: ["", "as it is", "passes up to"].map(Column::words).to_vec(),
        rows: remedy::margins(m, annex).into_iter().map(Vec::from).collect(),
        strong: Vec::new(),
    }
}

/// How an edge is held, with its stretch where that is not all of it.
fn how(e: &crate::building::Edge) -> String {
    let mm = |l: Length| show("l", l.dynamic()).to_string();
    match e.stretch {
        None => e.kind.to_string(),
        Some((from, to)) => format!("{} from {} to {}, else free", e.kind, mm(from), mm(to)),
    }
}

/// Before and after in two columns.
fn side_by_side(m: &PanelModel, before: Option<&Outcome>, after: Option<&Outcome>) -> Table {
    let cell = |o: Option<&Outcome>, f: &dyn Fn(&Outcome) -> Option<String>| {
        o.map_or_else(|| "outside the method".to_owned(), |o| f(o).unwrap_or_else(|| "–".to_owned()))
    };
    let mut rows = Vec::new();
    let mut row = |name: String, f: &dyn Fn(&Outcome) -> Option<String>| {
        let cells = [cell(before, f), cell(after, f)];
        if cells.iter().any(|c| c != "–") {
            let [b, a] = cells;
            rows.push(vec![name, b, a]);
        }
    };
    row("length".to_owned(), &|o| Some(show("l", o.l.dynamic()).to_string()));
    for i in 0..m.leaves.len() {
        let of = if m.leaves.len() == 1 { String::new() } else { format!(", {}", m.leaf_name(i)) };
        let force = |name: &'static str, x: crate::quantity::Force| show(name, x.dynamic()).to_string();
        // Both leaves have the same edges, so the same case.
        if i == 0 {
            row("case of Annex E, or how worked".to_owned(), &|o| o.leaves.get(i).map(|x| x.label.clone()));
        }
        row(format!("coefficient{of}"), &|o| o.leaves.get(i)?.alpha_2.map(|x| print::significant(x.base())));
        row(format!("moment, parallel{of}"), &|o| o.leaves.get(i)?.parallel.map(|x| force("M_Ed1", x.0)));
        row(format!("resistance, parallel{of}"), &|o| o.leaves.get(i)?.parallel.map(|x| force("M_Rd1", x.1)));
        row(format!("moment, across{of}"), &|o| o.leaves.get(i)?.across.map(|x| force("M_Ed2", x.0)));
        row(format!("resistance, across{of}"), &|o| o.leaves.get(i)?.across.map(|x| force("M_Rd2", x.1)));
        if m.leaves.len() > 1 {
            row(format!("pressure it can take{of}"), &|o| {
                o.leaves.get(i).map(|x| show("w_Rd", x.w_Rd.dynamic()).to_string())
            });
        }
    }
    row("design pressure".to_owned(), &|o| Some(show("W_Ed", o.W_Ed.dynamic()).to_string()));
    row("pressure the panel can take".to_owned(), &|o| Some(show("w_Rd", o.w_Rd.dynamic()).to_string()));
    let deciding = m.route == PanelRoute::LimitAnalysis;
    let low = if deciding { "limit analysis, safe side (decides)" } else { "limit analysis, safe side" };
    let pressure = |w: Stress| show("w_Rd", w.dynamic()).to_string();
    row(low.to_owned(), &|o| o.bounds.map(|b| pressure(b.low)));
    row("limit analysis, weakest crack pattern".to_owned(), &|o| o.bounds?.high.map(pressure));
    row("by hand".to_owned(), &|o| o.hand.map(pressure));
    row("use".to_owned(), &|o| Some(print::ratio(o.ratio)));
    let strong = vec![rows.len() - 1];
    Table {
        caption: "Before and after, side by side; after decides".to_owned(),
        columns: vec![Column::words(""), Column::numbers("before"), Column::numbers("after")],
        rows,
        strong,
    }
}
