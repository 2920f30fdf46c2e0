//! Two leaves: how they share the wind, and whether their ties can pass it.

use super::form::{LeafOutcome, State};
use super::strength::Strength;
use crate::building::{Cause, Sharing};
use crate::quantity::functions::{cube, max, min};
use crate::quantity::{Area, Force, Num, PerArea, Stress, print};
use crate::standards::annex::Annex;
use crate::standards::en1996::lateral::ties as clause;
use crate::trace::Sheet;
use crate::{calc, decide, given, verify};

/// The wall's resistance and the verdicts of a cavity wall. `W_Ed` stands on the sheet.
///
/// 6.3.1(6): in proportion to strength, so that the wall resists the sum of its leaves; or to stiffness, each
/// leaf then judged for its part. Where ties are too few to count, each leaf must take the whole wind alone.
/// Yields the wall's resistance and its use.
pub fn cavity(
    s: &mut Sheet,
    state: State<'_>,
    annex: &Annex,
    strengths: &[Strength],
    leaves: &[LeafOutcome],
) -> (Stress, f64) {
    let State { m, W_Ed, form, phase, .. } = state;
    let id = format!("{}-{phase}", form.id());
    given!(s, "what the outer leaf takes", "above", w_Rd_o = leaves[0].w_Rd);
    given!(s, "what the inner leaf takes", "above", w_Rd_i = leaves[1].w_Rd);
    let tied = counted(s, m.ties, phase);
    if !tied {
        s.note(
            "Without ties enough to count, the wind may stay on either leaf: the weaker leaf decides for the \
             whole of it.",
        );
        calc!(s, "6.3.1(6), 6.5", "pressure that the wall can take", w_Rd = min(w_Rd_o, w_Rd_i));
        let ratio = verify!(s, &id, "6.3.1(6)", "wind on the leaf that is weaker", W_Ed <= w_Rd);
        return (w_Rd, ratio);
    }
    let (w_Rd, ratio, W_o, W_i) = if m.sharing == Sharing::Strength {
        let (w_Rd, W_o, W_i) = by_strength(s, W_Ed, w_Rd_o, w_Rd_i);
        let ratio = verify!(s, &id, "6.3.1(6)", "wind on both leaves together", W_Ed <= w_Rd);
        (w_Rd, ratio, W_o, W_i)
    } else {
        let [outer, inner] = [&m.leaves[0], &m.leaves[1]];
        given!(s, "thickness of the outer leaf", "job file", t_o = strengths[0].t);
        given!(s, "thickness of the inner leaf", "job file", t_i = strengths[1].t);
        given!(s, "compressive strength of the outer leaf", "materials sheet", f_k_o = outer.masonry.f_k);
        given!(s, "compressive strength of the inner leaf", "materials sheet", f_k_i = inner.masonry.f_k);
        calc!(s, "3.7.2(2)", "modulus of elasticity, outer leaf", E_o = 1000.0 * f_k_o);
        calc!(s, "3.7.2(2)", "modulus of elasticity, inner leaf", E_i = 1000.0 * f_k_i);
        calc!(
            s,
            "6.3.1(6)",
            "share of the outer leaf, by stiffness",
            k_o = E_o * cube(t_o) / (E_o * cube(t_o) + E_i * cube(t_i))
        );
        calc!(s, "6.3.1(6)", "part of the outer leaf", W_o = k_o * W_Ed);
        calc!(s, "6.3.1(6)", "part of the inner leaf", W_i = W_Ed - W_o);
        let outer_id = format!("{}-outer-{phase}", form.id());
        let inner_id = format!("{}-inner-{phase}", form.id());
        let a = verify!(s, &outer_id, "6.3.1(6)", "wind on the outer leaf", W_o <= w_Rd_o);
        let b = verify!(s, &inner_id, "6.3.1(6)", "wind on the inner leaf", W_i <= w_Rd_i);
        calc!(
            s,
            "6.3.1(6)",
            "pressure that the wall can take, shared so",
            w_Rd = min(w_Rd_o / k_o, w_Rd_i / (1.0 - k_o))
        );
        (w_Rd, a.max(b), W_o, W_i)
    };
    // Before is information on bending alone.
    if phase == "before" {
        return (w_Rd, ratio);
    }
    let W_t = passed(s, state, W_o, W_i);
    ties(s, annex, m.ties, m.tie_strength.as_ref(), W_t);
    (w_Rd, ratio)
}

/// What the ties pass, either leaf first: there are none in openings, whose wind they pass all the same, all that comes to
/// the edges of the leaf. `W_o` and `W_i` stand on the sheet.
fn passed(s: &mut Sheet, state: State<'_>, W_o: Stress, W_i: Stress) -> Stress {
    let span = &state.m.after;
    if span.openings.is_empty() {
        calc!(s, "6.5", "what the ties pass, either leaf first", W_t = max(W_o, W_i));
        return W_t;
    }
    calc!(s, "6.5", "larger part of a leaf, either first", W_lf = max(W_o, W_i));
    given!(s, "panel with its openings", "job file", A_w = span.length * state.m.h);
    let open = span.openings.iter().fold(Area::ZERO, |sum, o| sum + o.width * o.height);
    given!(s, "openings, where no ties are", "job file", A_os = open);
    calc!(
        s,
        "equilibrium",
        "what the ties pass, on the wall beside the openings",
        W_t = W_lf * (A_w / (A_w - A_os))
    );
    W_t
}

/// Both leaves in proportion to their strength: what they take together, and the part of each, outer first.
/// 6.3.1(6). The arguments stand on the sheet; at least one leaf takes something.
pub fn by_strength(s: &mut Sheet, W_Ed: Stress, w_Rd_o: Stress, w_Rd_i: Stress) -> (Stress, Stress, Stress) {
    calc!(s, "6.3.1(6)", "what both take together", w_Rd = w_Rd_o + w_Rd_i);
    calc!(s, "6.3.1(6)", "part of the outer leaf", W_o = W_Ed * (w_Rd_o / w_Rd));
    calc!(s, "6.3.1(6)", "part of the inner leaf", W_i = W_Ed - W_o);
    (w_Rd, W_o, W_i)
}

/// Least number of ties.
fn least() -> PerArea {
    PerArea::new(clause::LEAST_PER_M2 * 1e-6)
}

/// Whether so many ties count.
pub fn enough(ties: PerArea) -> bool {
    ties >= least()
}

/// Whether the ties are enough in number to let leaves share.
pub fn counted(s: &mut Sheet, ties: Option<PerArea>, phase: &str) -> bool {
    let source = "6.5, 8.5.2.2, UK: from memory, check against the standard (M)";
    let Some(number) = ties else {
        if phase == "after" {
            let words = "wall ties of at least 2.5 per m²";
            s.rule("ties-by-rule", source, words, "none are stated".to_owned(), false);
        }
        return false;
    };
    given!(s, "wall ties", "job file", n_t = number);
    given!(s, "least number of ties", source, n_min = least());
    decide!(s, "6.5", "the ties count", "the ties are too few to count", n_t >= n_min)
}

/// Ties against the pressure `W_t` that they pass: by strength where it is stated, else by rule.
pub fn ties(
    s: &mut Sheet,
    annex: &Annex,
    number: Option<PerArea>,
    strength: Option<&Cause<Force>>,
    W_t: Stress,
) {
    let Some(n_t) = number else { return };
    let Some(stated) = strength else {
        s.rule(
            "ties-by-rule",
            "6.5; Approved Document A 2C",
            "ties by number alone: no strength of a tie is stated, a hold point stands for it",
            format!("{} ties", print::show("n_t", n_t.dynamic())),
            enough(n_t),
        );
        return;
    };
    given!(
        s,
        "characteristic strength of one tie",
        &format!("stated: {}", stated.reason),
        F_k = stated.value
    );
    let source = "UK NA Table NA.1: from memory, check against the standard (L)";
    given!(s, "material factor, wall ties", source, gamma_Mt = Num::new(annex.gamma_M_ties));
    let w_t = clause::transfer(s, n_t, F_k, gamma_Mt);
    verify!(s, "ties", "6.5", "wall ties", W_t <= w_t);
}
