//! The sheet: every pier in a table, and the one of highest use among those that count worked in full.

use super::model::PierModel;
use super::{Used, matrix, place, work};
use crate::building::Building;
use crate::checks::returns::model::At;
use crate::checks::{Job, Section};
use crate::quantity::{Num, print};
use crate::standards::en1996::concentrated;
use crate::trace::{Column, Outside, Sheet, Table};
use crate::{given, verify};

/// The sheet of the lengths of wall between openings, where the plan has floors.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    if job.piers.is_empty() {
        return Vec::new();
    }
    let b = job.building;
    let mut s = Sheet::recorder();
    words(&mut s, job);
    s.heading(1, "Every length of wall");
    s.table(|| table(job));
    let judged: Vec<&Used> = job.piers.iter().filter(|u| u.counts()).collect();
    if judged.is_empty() {
        s.note(
            "No length carries more after the removal than before it and no beam ends on one: all figures of this sheet \
             are information, and there is no verdict.",
        );
    }
    let over = super::as_it_stands(job);
    if !over.is_empty() {
        s.note(format!(
            "By this calculation these lengths are used above 1 as the house stands; the removal adds nothing to their \
             load and leaves them as they are: {}.",
            over.join("; ")
        ));
    }
    for u in &judged {
        for outside in u.after.outside() {
            let words = format!("{}: {}", place(b, u), outside.words);
            s.leave(Outside::new(&outside.id, &outside.clause, words));
        }
    }
    // A limit that one leaves hides no failure of another. Of equals the first.
    let inside = judged.iter().flat_map(|u| u.after.worked.iter().flatten().map(move |w| (*u, w)));
    // By what it carries: how slender it is says itself.
    let inside: Vec<_> = inside.filter(|(_, w)| w.used.is_ok()).map(|(u, w)| (u, w, w.by_load)).collect();
    let worst = inside.iter().copied().reduce(|a, b| if b.2 > a.2 { b } else { a });
    if let Some((u, w, _)) = worst {
        s.heading(1, format!("The one of highest use that is judged: {}", place(b, u)));
        s.of = named(b, u);
        if let Err(outside) = record(&mut s, job, &w.model) {
            s.leave(outside);
        }
        s.of.clear();
    }
    others(&mut s, b, &judged, worst.map(|w| w.0));
    vec![Section::plain("piers", "Lengths of wall between openings", s)]
}

/// A judged length in few words, for the results.
fn named(b: &Building, u: &Used) -> String {
    format!("{}, {}", u.wall, b.storeys[u.storey].mark)
}

/// The largest use of every other length that is judged, each a verdict of its own.
fn others(s: &mut Sheet, b: &Building, judged: &[&Used], worst: Option<&Used>) {
    let rest: Vec<(&Used, f64, String)> = judged
        .iter()
        .filter(|u| worst.is_none_or(|w| !std::ptr::eq(**u, w)))
        .filter_map(|u| {
            let worked = u.after.worked.iter().flatten().filter_map(|w| w.used.as_ref().ok());
            let (ratio, words) = worked.reduce(|a, b| if b.0 > a.0 { b } else { a })?;
            Some((*u, *ratio, words.clone()))
        })
        .collect();
    if rest.is_empty() {
        return;
    }
    s.heading(1, "The other lengths that are judged");
    for (u, ratio, words) in rest {
        s.case = format!("{}, {words}", place(b, u));
        given!(s, "largest use of a length of wall", "table above, worked silently", eta_w = Num::new(ratio));
        given!(s, "limit of a use", "EN 1990 6.4.2", eta_1 = Num::new(1.0));
        s.of = named(b, u);
        verify!(s, "pier-other", "6.1.2", "largest use", eta_w <= eta_1);
        s.of.clear();
    }
    s.case.clear();
}

fn words(s: &mut Sheet, job: &Job<'_>) {
    let b = job.building;
    s.note(
        "Vertical resistance of the loaded leaf at head, middle and foot under all combinations, 6.1.2 with Annex G. \
         Loads are those of the take-down, with what goes to the sides of openings and the ends of beams. Along the \
         wall they press a block centred on them. Head and foot are taken to be held across by floors and roof, vertical \
         edges by nothing. What stands on a wall from above is taken to stand in its middle.",
    );
    s.note(
        "A floor, a roof or the end of a beam across bears over the thickness of the leaf and acts at one third of its \
         bearing from the loaded face, t/6 off the middle; where they come from both sides each has half of it, t/3 off \
         the middle, and the difference counts (BS 5628-1 clause 31, from memory, M; EN 1996-1-1 Annex C works a frame \
         instead). A beam in the line of its wall stands in the middle. Half of the moment at the head is left at \
         mid-height, none at the foot.",
    );
    s.note(
        "Wind presses across lengths that have on one side neither floor nor roof over it, nor a neighbour: the net \
         pressure on panels, and half of that on an opening beside it. It is carried in bays: floor and ceiling hold them, and walls \
         that meet the length and are a fifth of its height long there (5.5.1.2(5)), tied or bonded; openings leave them free. \
         Both ways where Annex E and its limits of size allow it, else between floor and ceiling. Two leaves \
         with ties enough share it by strength as panels do (6.3.1(6)), the other leaf up to what it resists; without, \
         the loaded leaf takes all. Either of two routes is enough: the wind as an eccentricity in Annex G; or \
         flexure with precompression (6.3.1(4)), with Annex G for the vertical load alone and the pressed edge within \
         the design strength beside it. The outer leaf and the ties are on the sheets of panels.",
    );
    let returns: Vec<&str> = b
        .returns
        .iter()
        .filter(|r| b.plan.iter().any(|w| w.mark == r.mark))
        .map(|r| r.mark.as_str())
        .collect();
    if !returns.is_empty() {
        s.note(format!("Returns have sheets of their own and are left out here: {}.", returns.join(", ")));
    }
    if job.piers.iter().any(|u| !u.beams.is_empty()) {
        s.note(
            "Under the end of a beam mid-height is worked also on the stretch over which its load has spread at 60° from \
             a point (6.1.3(5)), with every point load whose own spread meets it. The bearing itself, and a padstone, \
             are not on this sheet: 6.1.3 is checked only for ends that the job lists under bearings.",
        );
    }
}

fn table(job: &Job<'_>) -> Table {
    let b = job.building;
    let kn = |f: crate::quantity::Force| print::show("N", f.dynamic()).value;
    let mut strong = Vec::new();
    let mut rows = Vec::new();
    for (i, u) in job.piers.iter().enumerate() {
        let judged = match (u.beams.as_slice(), u.grows()) {
            ([], true) => "judged: load grows".to_owned(),
            ([], false) => "information".to_owned(),
            (beams, _) => format!("judged: end of {}", beams.join(", ")),
        };
        let (before, after) = (u.before.used(), u.after.used());
        if u.counts() || after.0 > 1.0 {
            strong.push(i);
        }
        rows.push(vec![
            u.wall.clone(),
            b.storeys[u.storey].mark.clone(),
            format!("{:.2} to {:.2}", u.from / 1e3, u.to / 1e3),
            format!("{:.2}", (u.to - u.from) / 1e3),
            if u.windy { "yes" } else { "no" }.to_owned(),
            kn(u.before.N_Ed),
            kn(u.after.N_Ed),
            print::ratio(before.0),
            print::ratio(after.0),
            after.1,
            judged,
        ]);
    }
    Table {
        caption: "Design load at the foot of each length, pressing with imposed load leading, and its largest use, before \
                  the removal (b) and after it (a); heavy: judged, or used above 1. H helping; W pressing, wind leads; Q pressing, \
                  imposed leads; G gravity alone"
            .to_owned(),
        columns: vec![
            Column::words("wall"),
            Column::words("storey"),
            Column::words("from, to, m"),
            Column::numbers("l, m"),
            Column::words("wind"),
            Column::numbers("b: N, kN"),
            Column::numbers("a: N, kN"),
            Column::numbers("b: use"),
            Column::numbers("a: use"),
            Column::words("governed by"),
            Column::words("which is"),
        ],
        rows,
        strong,
    }
}

/// A pier with all its verdicts.
pub(super) fn record(s: &mut Sheet, job: &Job<'_>, p: &PierModel) -> Result<(), Outside> {
    let annex = &job.annex;
    if let Some(under) = &p.under {
        stretch(s, p, under);
    }
    let ready = work::prepare(s, p, annex)?;
    let worst = matrix::run(p, annex)?;
    let (middle, ends): (Vec<_>, Vec<_>) = worst.sections.into_iter().partition(|x| x.0 == At::Middle);
    if !ends.is_empty() {
        s.heading(2, "Head and foot");
        let heads: Vec<String> =
            ends.iter().map(|(at, c, ..)| format!("{}, {}", at.words(), matrix::short(*c))).collect();
        s.columns(&heads, |s, i| {
            let (at, c, ..) = ends[i];
            c.name().clone_into(&mut s.case);
            matrix::section(s, p, annex, ready, c, at);
        });
    }
    for (at, c, ..) in middle {
        s.heading(2, format!("Mid-height: {}", c.name()));
        c.name().clone_into(&mut s.case);
        matrix::section(s, p, annex, ready, c, at);
    }
    s.case.clear();
    Ok(())
}

/// Over which stretch the end of a beam is spread.
fn stretch(s: &mut Sheet, p: &PierModel, under: &super::model::Under) {
    s.note(format!(
        "Governed at mid-height under the end of {}: the loads below are those of the stretch over which it has spread. The \
         junction end is where the length begins.",
        under.beam
    ));
    given!(s, "length of the pier", "plan", l = under.l);
    given!(s, "beam's end from where the pier begins", "take-down", x_c = under.x_c);
    given!(s, "length pressed, a point", "safe side", l_A = crate::quantity::Length::ZERO);
    given!(s, "clear height", "job file", h_c = p.m.h);
    let c_60 = concentrated::spread(s);
    let _ = concentrated::effective_length(s, l, x_c, l_A, h_c, c_60);
}
