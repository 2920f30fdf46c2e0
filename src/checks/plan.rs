//! The key plan before and after: walls, what comes out, and where every mark is.

use super::{Job, Section, named, place, spans};
use crate::building::{Along, At, Building, PlanOpening, PlanWall, Return, stands_in};
use crate::quantity::Length;
use crate::sketch::text::list;
use crate::sketch::{
    self, Drawing, Fate, Frame, Gap, KeyPlan, PlanMark, PlanWind, When, key_plan, key_plans,
};
use crate::trace::Sheet;

/// Frame on the sheet of two plans side by side, and of one that stands alone, mm.
const ROW: Frame = Frame::new(170.0, 150.0);
const ALONE: Frame = Frame::new(170.0, 108.0);

/// The key plan, where the job gives walls as lines.
pub fn sections(job: &Job<'_>) -> Vec<Section> {
    let b = job.building;
    if b.plan.is_empty() {
        return Vec::new();
    }
    let views = || [When::Before, When::After].map(|when| view(job, when));
    let plans = job.drawings(|| key_plans(&views(), ROW, ALONE));
    let mut sheet = Sheet::recorder();
    named(&mut sheet, &plans);
    let mut section = Section::plain("plan", "Key plan", sheet);
    section.drawings.extend(plans);
    vec![section]
}

/// Frame of the plan for the client, mm; it is set larger there.
const CLIENT: Frame = Frame::new(100.0, 58.0);

/// The walls of the storey after the removal with the marks of what must stay, and nothing else: for the client.
/// `None` without walls on a plan.
pub fn what_stays(b: &Building) -> Option<Drawing> {
    if b.plan.is_empty() {
        return None;
    }
    let storey = &b.removed.storey;
    let marks: Vec<PlanMark> = b
        .returns
        .iter()
        .filter_map(|r| place::of_return(b, r).map(|(from, to)| PlanMark { mark: r.mark.clone(), from, to }))
        .collect();
    let mut walls = walls(b, storey, When::After);
    walls.iter_mut().for_each(|wall| wall.name.clear());
    let view = KeyPlan {
        name: "what-stays".to_owned(),
        title: storey.clone(),
        when: When::After,
        walls,
        marks,
        panels: Vec::new(),
        beams: Vec::new(),
        spans: Vec::new(),
        north: b.north,
        winds: Vec::new(),
    };
    let named: Vec<&str> = view.marks.iter().map(|m| m.mark.as_str()).collect();
    let stay = if named.is_empty() { String::new() } else { format!("{} must stay. ", list(&named)) };
    let caption = format!("The house seen from above. {stay}Broken lines show the {}.", b.removed.wall);
    // Read out before the caption, so it does not say the same again.
    let marked = match named.as_slice() {
        [] => String::new(),
        [_] => format!(" {} is marked on it.", list(&named)),
        _ => format!(" {} are marked on it.", list(&named)),
    };
    let alt = format!("A plan of the walls.{marked} The {} is drawn with broken lines.", b.removed.wall);
    Some(Drawing { alt, caption, ..key_plan(&view, CLIENT) })
}

/// One of the two plans. Returns, beams and panels as they are afterwards have their marks on the plan after.
fn view(job: &Job<'_>, when: When) -> KeyPlan {
    let b = job.building;
    let after = when == When::After;
    let walls = walls(b, &b.removed.storey, when);
    let marks = b.returns.iter().filter_map(|r| {
        place::of_return(b, r).filter(|_| after).map(|(from, to)| PlanMark { mark: r.mark.clone(), from, to })
    });
    let place = if after { place::of_panel } else { place::of_panel_before };
    let panels = b
        .panels
        .iter()
        .filter_map(|p| place(b, p).map(|(from, to)| PlanMark { mark: p.mark.clone(), from, to }));
    let winds = match b.stability.as_ref().map(|s| s.wind_along) {
        Some(Along::X) => vec![PlanWind::Rightwards, PlanWind::Leftwards],
        Some(Along::Y) => vec![PlanWind::Upwards, PlanWind::Downwards],
        None => Vec::new(),
    };
    KeyPlan {
        name: format!("key-plan-{}", when.word()),
        title: b.removed.storey.clone(),
        when,
        walls,
        marks: marks.collect(),
        panels: panels.collect(),
        beams: if after { beams(b) } else { Vec::new() },
        spans: job.down.as_ref().map_or_else(Vec::new, |down| spans::of(b, down, &b.removed.storey, after)),
        north: b.north,
        winds,
    }
}

/// The walls of a storey with the returns among them. On the plan before a return has no name: it is part of
/// the wall as it stands.
fn walls(b: &Building, storey: &str, when: When) -> Vec<sketch::PlanWall> {
    let here = b.plan.iter().filter(|w| stands_in(b, w, storey));
    let mut walls: Vec<sketch::PlanWall> = here.map(|w| wall(b, w, storey)).collect();
    for r in &b.returns {
        match walls.iter_mut().find(|w| w.name == r.mark) {
            Some(wall) if when == When::Before => wall.name.clear(),
            Some(_) => {}
            None => walls.extend(return_wall(b, r).map(|w| sketch::PlanWall { name: String::new(), ..w })),
        }
    }
    walls
}

/// A return as a wall of the plan; nothing where the job does not say where it lies.
pub(super) fn return_wall(b: &Building, r: &Return) -> Option<sketch::PlanWall> {
    let (from, to) = place::of_return(b, r).filter(|(from, to)| from != to)?;
    Some(sketch::PlanWall {
        name: r.mark.clone(),
        from,
        to,
        thickness: thickness(b, &r.build_up),
        fate: Fate::Stays,
        openings: Vec::new(),
    })
}

fn point(at: At) -> (f64, f64) {
    (at.0.base(), at.1.base())
}

fn beams(b: &Building) -> Vec<PlanMark> {
    let here = b.beams.iter().filter(|beam| beam.storey == b.removed.storey);
    here.map(|beam| PlanMark { mark: beam.mark.clone(), from: point(beam.from), to: point(beam.to) })
        .collect()
}

fn thickness(b: &Building, build_up: &str) -> f64 {
    b.build_up(build_up).map_or(100.0, |u| u.thickness().base())
}

/// A plan wall as drawings see it, with its openings in a storey.
pub(super) fn wall(b: &Building, w: &PlanWall, storey: &str) -> sketch::PlanWall {
    let gap = |o: &PlanOpening| Gap {
        from: o.from.base(),
        to: (o.from + o.width).base(),
        window: o.sill > Length::ZERO,
    };
    let mut openings: Vec<Gap> = w.openings.iter().filter(|o| o.storey == storey).map(gap).collect();
    openings.sort_by(|a, b| a.from.total_cmp(&b.from));
    sketch::PlanWall {
        name: w.mark.clone(),
        from: (w.from.0.base(), w.from.1.base()),
        to: (w.to.0.base(), w.to.1.base()),
        thickness: thickness(b, &w.build_up),
        fate: if w.removed { Fate::Removed } else { Fate::Stays },
        openings,
    }
}
