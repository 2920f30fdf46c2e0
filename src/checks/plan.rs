//! The key plan: walls, what comes out, and where every mark is.

use super::{Job, Section, place};
use crate::building::{Along, At, Building, PlanWall, stands_in};
use crate::sketch::{self, Fate, Frame, KeyPlan, PlanMark, PlanSpan, PlanWind};
use crate::trace::Sheet;

const FRAME: Frame = Frame::new(160.0, 108.0);

/// The key plan, where the job gives walls as lines.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let b = job.building;
    if b.plan.is_empty() {
        return Vec::new();
    }
    let mut sheet = Sheet::recorder();
    sheet.drawings(&["key-plan"]);
    let mut drawing = sketch::key_plan(&view(b), FRAME);
    drawing.name = "key-plan".to_owned();
    let mut section = Section::plain("plan", "Key plan", sheet);
    section.drawings.push(drawing);
    vec![section]
}

fn view(b: &Building) -> KeyPlan {
    let here = |w: &&PlanWall| stands_in(b, w, &b.removed.storey);
    let mut walls: Vec<sketch::PlanWall> = b.plan.iter().filter(here).map(|w| wall(b, w)).collect();
    let mut marks: Vec<PlanMark> = Vec::new();
    for r in &b.returns {
        if let Some((from, to)) = place::of_return(b, r) {
            marks.push(PlanMark { mark: r.mark.clone(), from, to });
            // A return that is a wall of the plan is drawn already.
            if from != to && !b.plan.iter().any(|w| w.mark == r.mark) {
                walls.push(sketch::PlanWall {
                    name: String::new(),
                    from,
                    to,
                    thickness: thickness(b, &r.build_up),
                    fate: Fate::Stays,
                });
            }
        }
    }
    let panels = b
        .panels
        .iter()
        .filter_map(|p| place::of_panel(b, p).map(|(from, to)| PlanMark { mark: p.mark.clone(), from, to }))
        .collect();
    let winds = match b.stability.as_ref().map(|s| s.wind_along) {
        Some(Along::X) => vec![PlanWind::Rightwards, PlanWind::Leftwards],
        Some(Along::Y) => vec![PlanWind::Upwards, PlanWind::Downwards],
        None => Vec::new(),
    };
    KeyPlan {
        name: "key-plan".to_owned(),
        title: b.removed.storey.clone(),
        walls,
        marks,
        panels,
        beams: beams(b),
        spans: spans(b),
        north: b.north,
        winds,
    }
}

fn point(at: At) -> (f64, f64) {
    (at.0.base(), at.1.base())
}

fn beams(b: &Building) -> Vec<PlanMark> {
    let here = b.beams.iter().filter(|beam| beam.storey == b.removed.storey);
    here.map(|beam| PlanMark { mark: beam.mark.clone(), from: point(beam.from), to: point(beam.to) })
        .collect()
}

fn spans(b: &Building) -> Vec<PlanSpan> {
    let here = b.floors.iter().filter(|f| f.storey == b.removed.storey);
    here.map(|f| {
        let (a, z) = (point(f.from), point(f.to));
        PlanSpan {
            mark: f.mark.clone(),
            from: (a.0.min(z.0), a.1.min(z.1)),
            to: (a.0.max(z.0), a.1.max(z.1)),
            along_x: f.spans == Along::X,
        }
    })
    .collect()
}

pub(super) fn thickness(b: &Building, build_up: &str) -> f64 {
    b.build_up(build_up).map_or(100.0, |u| u.thickness().base())
}

/// A plan wall as drawings see it.
pub(super) fn wall(b: &Building, w: &PlanWall) -> sketch::PlanWall {
    sketch::PlanWall {
        name: w.mark.clone(),
        from: (w.from.0.base(), w.from.1.base()),
        to: (w.to.0.base(), w.to.1.base()),
        thickness: thickness(b, &w.build_up),
        fate: if w.removed { Fate::Removed } else { Fate::Stays },
    }
}
