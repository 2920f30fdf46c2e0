//! The floor in its plane: it brings the wind of the front to the bracing walls.

use super::stability::Storey;
use super::{Job, Section};
use crate::building::{Diaphragm, DiaphragmProof};
use crate::quantity::functions::sq;
use crate::quantity::print::{show, significant};
use crate::quantity::{Length, Num};
use crate::standards::annex::Annex;
use crate::trace::{Outside, Sheet};
use crate::{calc, given, verify};

/// Greatest span over depth of a timber floor that is taken to carry wind in its plane by its proportions.
/// Common practice, no published source.
pub const SPAN_OVER_DEPTH: f64 = 2.0;

/// Whether the floor is within the proportions of the rule.
pub fn stout(d: &Diaphragm) -> bool {
    d.span <= d.depth * SPAN_OVER_DEPTH
}

/// How the floor is known, for the chain.
pub fn words(d: &Diaphragm) -> String {
    let size = format!("{} span, {} deep", metres(d.span), metres(d.depth));
    let openings = d.openings.trim_end_matches('.');
    match d.proof {
        DiaphragmProof::ShearFlow => format!("Shear flow, {size}. Openings: {openings}."),
        DiaphragmProof::Rule => format!(
            "Span over depth at most {SPAN_OVER_DEPTH}, common practice, no published source; {size}. Openings: \
             {openings}."
        ),
    }
}

/// What is to be closed where the proportions do not prove the floor.
pub fn hold_text(d: &Diaphragm) -> String {
    format!(
        "Before the wall comes down, show by calculation that the floor above the storey {} carries the wind in its \
         plane: its span of {} is more than {SPAN_OVER_DEPTH} times its depth of {}.",
        d.storey,
        metres(d.span),
        metres(d.depth)
    )
}

fn metres(l: Length) -> String {
    format!("{} m", significant(l.base() / 1e3))
}

/// The sheet of the diaphragm, where the job gives one.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let Some(d) = &job.building.diaphragm else { return Vec::new() };
    let mut s = Sheet::recorder();
    match &job.storey {
        Some(Ok(storey)) => check(&mut s, d, storey, &job.annex),
        Some(Err(outside)) => s.leave(outside.clone()),
        None => s.leave(Outside::new("diaphragm", "job file", "the storey's wind is not given")),
    }
    let title =
        if d.span_before.is_some() { "Wind in its plane, before and after" } else { "Wind in its plane" };
    vec![Section { mark: "Floor".to_owned(), ..Section::plain("diaphragm", title, s) }]
}

/// Shear flow and chord force under uniform wind on the span, before and after.
///
/// Simple statics; EN 1990 eq. 6.10. Verdict id: `shear-flow`, where a resistance is stated. The rule on
/// proportions stands beside it.
pub fn check(s: &mut Sheet, d: &Diaphragm, storey: &Storey, annex: &Annex) {
    given!(s, "wind force of the storey", "stability sheet", F_k = storey.F_k);
    given!(s, "tilt of the storey as a force", "stability sheet", H_s = storey.H_s);
    given!(s, "length of the wind face", "stability sheet", L_f = storey.L_f);
    given!(s, "factor on wind", "EN 1990 NA.A1.2", gamma_W = Num::new(annex.gamma_Q));
    calc!(s, "EN 1990 eq. 6.10", "wind and tilt on the floor", w_Ed = (gamma_W * F_k + H_s) / L_f);
    given!(s, "depth of the floor along the wind", "job file", b = d.depth);
    let spans: Vec<(&str, Length)> =
        d.span_before.map(|l| ("before", l)).into_iter().chain([("after", d.span)]).collect();
    let heads: Vec<String> = spans.iter().map(|(head, _)| (*head).to_owned()).collect();
    s.columns(&heads, |s, i| {
        let (head, span) = spans[i];
        given!(s, "span between bracing walls", "job file", l = span);
        calc!(s, "statics", "reaction on a bracing wall", V_Ed = w_Ed * l / 2.0);
        calc!(s, "statics", "shear flow at the support", v_Ed = V_Ed / b);
        calc!(s, "statics", "moment in the plane", M_Ed = w_Ed * sq(l) / 8.0);
        calc!(s, "statics", "chord force, for information", F_c = M_Ed / b);
        calc!(s, "statics", "span over depth", r_lb = l / b);
        let _ = (F_c, r_lb);
        // Before is information.
        if let Some(resistance) = d.resistance.as_ref().filter(|_| head == "after") {
            let source = format!("stated: {}", resistance.reason);
            given!(s, "design resistance per depth", &source, v_Rd = resistance.value);
            verify!(s, "shear-flow", "statics", "shear flow in the floor", v_Ed <= v_Rd);
        }
    });
    s.rule(
        "proportions",
        "common practice, no published source",
        "span over depth of a timber floor",
        format!("{} / {} against {SPAN_OVER_DEPTH}", show_mm(d.span), show_mm(d.depth)),
        stout(d),
    );
    s.note(format!(
        "Openings: {}. They are not taken off: the depth given is to be solid where the floor meets the bracing walls.",
        d.openings.trim_end_matches('.')
    ));
    s.note(
        "The wind is that of the whole storey over its front, what comes from above included, and spread evenly: the \
         floor is a beam on two bracing walls. How it is fixed to them, and the joints of its chords, are not \
         calculated.",
    );
    if d.proof == DiaphragmProof::Rule {
        s.note("No resistance is stated: the proportions are all that speaks for this floor.");
    }
}

fn show_mm(l: Length) -> String {
    show("l", l.dynamic()).to_string()
}
