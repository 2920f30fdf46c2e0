//! A return: a short length of wall that takes wind in its plane.
//!
//! * [`build`]: geometry and loads of one return, on the sheet; [`lateral`]: how the wind reaches it
//! * [`mod@check`]: the checks in order; [`matrix`]: every check under every case; [`run`]: the worst, recorded
//! * [`statics`]: moment and shear of wind and tilt, once for design and once for characteristic values
//! * [`actions`], [`in_plane`], [`sliding`], [`flexure`], [`vertical`]: the checks
//! * [`rules`]: lengths by rule, as information
//! * [`margins`]: how far its assumptions may move; [`remedy`]: what would make it pass; [`frame`]: what a steel frame in its place would have to do

pub mod actions;
pub mod build;
pub mod check;
pub mod flexure;
pub mod frame;
pub mod in_plane;
pub mod lateral;
pub mod margins;
pub mod matrix;
pub mod model;
pub mod remedy;
pub mod rules;
pub mod run;
pub mod sliding;
pub mod statics;
pub mod vertical;

use crate::building::{BaseJoint, Head, Proof};
use crate::quantity::Moment;
use crate::trace::Sheet;
use build::{Change, Inputs};
use model::Model;

/// A checked return: its models and the ratios of every case, for sketches and margins.
pub struct Checked {
    /// One a leaf that acts.
    pub models: Vec<(Model, Option<matrix::Matrix>)>,
}

/// Checks a return on a sheet.
pub fn check(s: &mut Sheet, i: &Inputs<'_>) -> Checked {
    let r = i.ret;
    s.drawings(&[&format!("{}-elevation", r.mark), &format!("{}-section", r.mark)]);
    s.heading(1, "Geometry, loads and wind");
    let mut out = Vec::new();
    let acting = match build::acting(i) {
        Ok(acting) => acting,
        Err(outside) => {
            s.leave(outside);
            return Checked { models: out };
        }
    };
    remarks(s, i);
    let several = acting.len() > 1;
    for a in acting {
        if several {
            let name = if a.leaf == 0 { "outer leaf" } else { "inner leaf" };
            s.heading(1, format!("The {name}"));
            s.of = name.to_owned();
        }
        let m = match build::one(s, i, a, Change::NONE) {
            Ok(m) => m,
            Err(outside) => {
                s.leave(outside);
                continue;
            }
        };
        if m.propped {
            s.heading(1, "What the head leans on");
            lateral::head_reaction(s, &m, i.annex);
            held_by(s, i);
        }
        s.heading(1, "Strength and slenderness");
        let matrix = run::prepare(s, &m, i.annex).map(|ready| {
            let matrix = matrix::Matrix::run(&m, i.annex, ready);
            let mu_source = if r.mu.reason.is_empty() {
                "default, common practice, no published source".to_owned()
            } else {
                format!("stated: {}", r.mu.reason)
            };
            // The actions along the height, once, for the leaf that is drawn.
            let along = format!("{}-actions", r.mark);
            let acts = m.sheared() || m.lateral.M_k != Moment::ZERO;
            let first = out.iter().all(|(m, _): &(Model, _)| !m.sheared() && m.lateral.M_k == Moment::ZERO);
            let drawing = (acts && first).then_some(along.as_str());
            run::record(s, &m, i.annex, ready, &matrix, &mu_source, drawing);
            matrix
        });
        out.push((m, matrix));
    }
    s.of.clear();
    s.heading(1, "By rule, for information");
    rules::by_rule(s, r.length, r.supported_wall_height, r.nearest_opening);
    if !s.holds() {
        s.heading(1, "What would make it pass");
        s.table(|| remedy::table(i));
        other_paths(s, i);
        let models: Vec<&Model> = out.iter().map(|(m, _)| m).collect();
        frame::demands(s, i, &models);
    }
    Checked { models: out }
}

/// What the reader must know before the numbers.
fn remarks(s: &mut Sheet, i: &Inputs<'_>) {
    let r = i.ret;
    if r.base == BaseJoint::Bonded {
        s.note(format!("No damp-proof course crosses the foot: {}.", r.base_reason.trim_end_matches('.')));
    }
    if r.junction.bonded {
        let word = if r.junction.proof == Proof::Assumed { "assumed to be bonded" } else { "bonded" };
        let words = r.junction.words.trim_end_matches('.');
        s.note(format!("The junction with {} is {word}: {words}.", r.junction.to));
        s.note(
            "Where the flange is longer on one side it bends the return across its plane as well; that is left out. \
             The flange is taken to be of the same masonry, and the least reduction across the wall found for the \
             return is used for it too.",
        );
    }
}

/// Who holds the head, and where that is checked.
fn held_by(s: &mut Sheet, i: &Inputs<'_>) {
    let Head::Propped(walls) = &i.ret.head else { return };
    let (here, elsewhere): (Vec<&String>, Vec<&String>) =
        walls.iter().partition(|w| i.building.returns.iter().any(|r| r.mark == **w));
    let join = |v: &[&String]| v.iter().map(|w| w.as_str()).collect::<Vec<_>>().join(", ");
    if !here.is_empty() {
        s.note(format!(
            "The head is held in plane by {}: the reaction is added to their load, in equal parts.",
            join(&here)
        ));
    }
    if !elsewhere.is_empty() && !i.building.floors.is_empty() {
        s.note(format!(
            "The head is held in plane by {}: the reaction is part of the storey's wind, which the sheet of the whole \
             building gives to these walls.",
            join(&elsewhere)
        ));
    } else if !elsewhere.is_empty() {
        s.note(format!(
            "The head is held in plane by {}, which this pack does not check: the reaction is to be carried there as \
             well, and the chain sheet says how that is known.",
            join(&elsewhere)
        ));
    }
}

/// The other ways in which the load could be carried.
fn other_paths(s: &mut Sheet, i: &Inputs<'_>) {
    let r = i.ret;
    s.note(
        "Another load path may carry what this return cannot: the floor as a diaphragm, its edge strapped to the wall, \
         bringing the wind to longer walls; a flange, where the junction is shown to be bonded; or a frame.",
    );
    if matches!(r.head, Head::Free) {
        s.note("A short nib alone seldom works as a cantilever: its head held by named walls changes the answer.");
    }
}
