//! The drawings of the forces at the levels.

use super::views::{ROW, kn_m2};
use crate::building::{Along, Building, RoofForm, storey_height};
use crate::checks::Job;
use crate::checks::whole::{Direction, levels::Level};
use crate::quantity::{Force, Length, print};
use crate::sketch::{Action, Drawing, Frame, WindElevation, WindLevel, wind_elevation, wind_elevations};
use crate::wind::{Wind, place};

/// Frames on the sheet of a drawing beside others and of one that stands alone, mm.
const ONE: Frame = Frame::new(120.0, 62.0);
const LOW: Frame = Frame::new(170.0, 62.0);

/// The forces at the levels, for every direction in which the wind reaches the house.
pub fn elevations(job: &Job<'_>, wind: &Wind) -> Vec<Drawing> {
    let views: Vec<WindElevation> = if job.whole.is_empty() {
        storey(job, wind).into_iter().collect()
    } else {
        job.whole.iter().map(|d| levels(job, wind, d)).collect()
    };
    match <[WindElevation; 2]>::try_from(views) {
        Ok(pair) => wind_elevations(&pair, ROW, LOW).to_vec(),
        Err(views) => views.iter().map(|view| wind_elevation(view, ONE)).collect(),
    }
}

/// Height of the head of storey `k` over the lowest floor, mm.
fn head(b: &Building, k: usize) -> f64 {
    (0..=k).map(|n| storey_height(b, n).base()).sum()
}

fn levels(job: &Job<'_>, wind: &Wind, d: &Direction) -> WindElevation {
    let b = job.building;
    let level = |l: &Level| {
        let foot = head(b, l.storey) - storey_height(b, l.storey).base() / 2.0;
        WindLevel {
            height: head(b, l.storey),
            strip: (foot, foot + l.strip.base()),
            force: force("F_k", l.F_k, ""),
            roof: (l.F_roof > Force::ZERO).then(|| force("", l.F_roof, "of it from the roof")),
        }
    };
    let total = d.levels.first().map_or(Force::ZERO, |l| l.F_above);
    let front = d.levels.first().map_or(Length::ZERO, |l| l.front);
    view(b, wind, d.along, d.levels.iter().map(level).collect(), (total, front))
}

/// Without floors on the plan: the one storey that is shared.
fn storey(job: &Job<'_>, wind: &Wind) -> Option<WindElevation> {
    let b = job.building;
    let st = b.stability.as_ref()?;
    let shared = job.sharing()?;
    let k = b.storeys.iter().position(|s| s.mark == st.storey)?;
    let foot = head(b, k) - storey_height(b, k).base() / 2.0;
    let level = WindLevel {
        height: head(b, k),
        strip: (foot, foot + st.strip_height.base()),
        force: force("F_k", shared.F_k, ""),
        roof: (st.force_above > Force::ZERO).then(|| force("", st.force_above, "of it from above")),
    };
    Some(view(b, wind, st.wind_along, vec![level], (shared.F_k, shared.L_f)))
}

fn view(
    b: &Building,
    wind: &Wind,
    along: Along,
    levels: Vec<WindLevel>,
    (total, front): (Force, Length),
) -> WindElevation {
    let word = if along == Along::X { "x" } else { "y" };
    let top = levels.last().map_or(0.0, |l| l.strip.1);
    let top = b.wind.site.as_ref().map_or(top, |s| s.height.base().max(top));
    let own = place::extent(b)[along as usize];
    let own = (own.1 - own.0).base();
    let size = b.wind.site.as_ref().map(|s| if along == Along::X { s.size.0 } else { s.size.1 });
    // Without a plan and a site the depth is not known: drawn as deep as it is high.
    let depth = if own > 0.0 { own } else { size.map_or(top, |s| s.base()) };
    WindElevation {
        name: format!("forces-{word}"),
        words: format!("wind along {word}"),
        front: format!("{:.2} m", front.base() / 1e3),
        depth,
        roof: roof(b, along, top),
        pressure: Action::new("q_net", &kn_m2(wind.along(along).overall), "overall pressure"),
        levels,
        foot: force("", total, "at the foot"),
    }
}

/// Outline of the roof as it is seen across the wind; an upright face where it is not given.
fn roof(b: &Building, along: Along, top: f64) -> Vec<(f64, f64)> {
    let Some(roof) = b.wind.site.as_ref().and_then(|s| s.roof.as_ref()) else {
        return vec![(0.0, top), (1.0, top)];
    };
    let eaves = roof.eaves.base();
    match roof.form {
        RoofForm::Flat => vec![(0.0, eaves), (1.0, eaves)],
        RoofForm::Duopitch if along != roof.ridge => vec![(0.0, eaves), (0.5, top), (1.0, eaves)],
        RoofForm::Monopitch if along != roof.ridge => vec![(0.0, eaves), (1.0, top)],
        _ => vec![(0.0, eaves), (0.0, top), (1.0, top), (1.0, eaves)],
    }
}

fn force(symbol: &str, f: Force, words: &str) -> Action {
    Action::new(symbol, &print::show("F", f.dynamic()).to_string(), words)
}
