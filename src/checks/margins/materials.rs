//! Material factors and mortar: each tried on a building that differs in them alone.

use super::{Row, row};
use crate::building::{Building, Cause};
use crate::checks::{Job, masonry};
use crate::quantity::Num;
use crate::solve::root;
use crate::standards::masonry::Mortar;
use crate::trace::Sheet;

/// Classes of mortar from strong to weak; what a lime mortar bears is no class.
const CLASSES: [Mortar; 4] = [Mortar::M12, Mortar::M6, Mortar::M4, Mortar::M2];

/// A job with another building of the same loads, wind and shares; what a return or a panel does not ask for is left out.
fn like<'a>(job: &Job<'_>, building: &'a Building) -> Job<'a> {
    Job {
        building,
        annex: job.annex,
        wind: job.wind.clone(),
        down: None,
        storey: job.storey.clone(),
        whole: Vec::new(),
        piers: Vec::new(),
        holds: Vec::new(),
        failing: Vec::new(),
        outside: Vec::new(),
        drawn: false,
    }
}

/// Material factors and mortar, each tried on a building that differs in them alone.
pub(super) fn materials(
    job: &Job<'_>,
    build_up: &str,
    tried: (f64, u32, f64),
    passes: &dyn Fn(&Job<'_>) -> bool,
) -> Vec<Row> {
    let b = job.building;
    let mut out = Vec::new();
    let now = masonry::factors(&mut Sheet::silent(), b);
    let at = |factor: f64| passes(&like(job, &with_factor(b, &now, factor)));
    let print = |factor: f64| printed(&now, factor);
    let (end, steps, precision) = tried;
    if let Some(factor) = root::greatest(at, 1.0, end, steps, precision) {
        let more = if factor >= end { ", more not tried" } else { "" };
        out.push(row(
            "material factors of compression, flexure, shear",
            print(1.0),
            format!("up to {}{more}", print(factor)),
        ));
    }
    out.extend(mortar(b, build_up, &|b| worked_again(b, passes)));
    out
}

/// Mortar changes stiffness, and with it shares of the wind: the whole job is worked again.
pub(super) fn worked_again(b: &Building, passes: &dyn Fn(&Job<'_>) -> bool) -> bool {
    passes(&Job { drawn: false, ..Job::new(b) })
}

/// All three material factors times `factor`, as they are printed.
fn printed(now: &[(Num, String); 3], factor: f64) -> String {
    // Rounded down, save what is a hundredth already.
    let one = |n: usize| format!("{:.2}", (now[n].0.base() * factor * 100.0 + 1e-6).floor() / 100.0);
    format!("{}, {}, {}", one(0), one(1), one(2))
}

/// All three material factors as they are.
pub(super) fn factors(b: &Building) -> String {
    printed(&masonry::factors(&mut Sheet::silent(), b), 1.0)
}

/// The building with all material factors times `factor`.
fn with_factor(b: &Building, now: &[(Num, String); 3], factor: f64) -> Building {
    let mut other = b.clone();
    let stated = |n: usize| Some(Cause { value: now[n].0.base() * factor, reason: "tried".to_owned() });
    other.basis.gamma_m_compression = stated(0);
    other.basis.gamma_m_flexure = stated(1);
    other.basis.gamma_m_shear = stated(2);
    other
}

/// The weakest class of mortar down to which it passes, of all leaves of a wall together.
pub(super) fn mortar(b: &Building, build_up: &str, passes: &dyn Fn(&Building) -> bool) -> Option<Row> {
    let wall = b.build_up(build_up)?;
    let of_wall = |name: &str| wall.leaves.iter().any(|leaf| leaf.material == name);
    let own = b.materials.iter().filter(|m| of_wall(&m.name));
    let classes: Vec<usize> =
        own.clone().map(|m| CLASSES.iter().position(|c| *c == m.mortar)).collect::<Option<Vec<_>>>()?;
    // A stated strength does not ask the mortar.
    if own.clone().any(|m| m.f_k.is_some() || m.f_vk0.is_some() || m.f_xk1.is_some()) {
        return Some(row(
            "class of mortar",
            "strengths are stated".to_owned(),
            "not by its class".to_owned(),
        ));
    }
    let weakest = *classes.iter().max()?;
    let with = |class: Mortar| {
        let mut other = b.clone();
        for m in other.materials.iter_mut().filter(|m| of_wall(&m.name)) {
            let at = CLASSES.iter().position(|c| *c == m.mortar);
            let to = CLASSES.iter().position(|c| *c == class);
            if at < to {
                m.mortar = class;
            }
        }
        other
    };
    let reached = CLASSES[weakest + 1..]
        .iter()
        .take_while(|class| {
            let other = with(**class);
            passes(&other)
        })
        .last();
    let to = match (reached, weakest + 1 == CLASSES.len()) {
        (Some(class), _) => format!("down to {class}"),
        (None, true) => "no weaker class is known".to_owned(),
        (None, false) => format!("not with {}", CLASSES[weakest + 1]),
    };
    Some(row("class of mortar", CLASSES[weakest].to_string(), to))
}
