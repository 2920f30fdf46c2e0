//! How far each assumption of a return may move before it fails, by search on its own checks on silent sheets.

use super::build::{Change, Inputs, models};
use super::matrix::Matrix;
use super::remedy;
use super::run::prepare;
use crate::checks::margins::reach::Step;
use crate::quantity::{Force, Length, Stress};
use crate::solve::root;
use crate::trace::Sheet;

/// The largest use of a return with `change` over every check and case; `None` outside a clause.
pub fn largest(i: &Inputs<'_>, change: Change) -> Option<f64> {
    let mut s = Sheet::silent();
    let all = models(&mut s, i, change).ok()?;
    let mut most: f64 = 0.0;
    for m in &all {
        let mut s = Sheet::silent();
        let ready = prepare(&mut s, m, i.annex)?;
        if !s.outside.is_empty() {
            return None;
        }
        let of_sheet = s.verdicts.iter().map(|v| v.ratio);
        let matrix = Matrix::run(m, i.annex, ready);
        let of_cases = matrix.ratios.iter().flatten().copied().filter(|r| !r.is_nan());
        most = of_sheet.chain(of_cases).fold(most, f64::max);
    }
    Some(most)
}

/// Shorter lengths are not tried, mm.
const SHORTEST: f64 = 100.0;

/// The shortest length down to which it passes without a gap, to the millimetre, rounded up.
pub fn shortest(i: &Inputs<'_>) -> Option<Length> {
    let own = i.ret.length.base();
    let at = |less: f64| remedy::passes(i, Change { length: Some(Length::new(own - less)), ..Change::NONE });
    root::greatest(at, 0.0, (own - SHORTEST).max(0.0), 160, 0.2).map(|less| Length::new((own - less).ceil()))
}

/// The greatest net overall pressure up to which it passes, and whether that is merely the end of the search.
pub fn most_wind(i: &Inputs<'_>) -> Option<(Stress, bool)> {
    let end = i.wind.overall.base() * remedy::MOST_WIND;
    remedy::wind_taken(i).map(|q| (q, q.base() + 1e-5 >= end))
}

/// The dead load that may be missing at mid-length, to 0.1 kN or three digits, rounded down, and all that the job gives at its head.
pub fn dead_spare(i: &Inputs<'_>) -> Option<(Force, Force)> {
    let all: Force = i.ret.loads.iter().fold(Force::ZERO, |sum, x| sum + x.dead);
    let at = |n: f64| remedy::passes(i, Change { dead: Force::new(-n), ..Change::NONE });
    let spare = root::greatest(at, 0.0, all.base(), 160, 10.0)?;
    // Printing rounds to three digits: what is rounded down to them first cannot be printed larger than it is.
    let step = Step::Digits.at(spare).max(100.0);
    Some((Force::new((spare / step).floor() * step), all))
}

/// Use against length and against pressure, for a plot.
#[derive(Clone, Debug, PartialEq)]
pub struct Course {
    /// Length, mm, and use; none where a clause does not reach.
    pub by_length: Vec<(f64, Option<f64>)>,
    /// Net overall pressure, N/mm², and use.
    pub by_wind: Vec<(f64, Option<f64>)>,
    /// The use as it is.
    pub here: f64,
}

/// Steps of a course.
const STEPS: u32 = 32;

/// The largest use from six tenths of the length to fourteen, and from no wind to one and a half times the wind.
pub fn course(i: &Inputs<'_>) -> Option<Course> {
    let here = largest(i, Change::NONE)?;
    let (l, q) = (i.ret.length.base(), i.wind.overall.base());
    let part = |from: f64, to: f64, n: u32| from + (to - from) * f64::from(n) / f64::from(STEPS);
    let by_length = (0..=STEPS).map(|n| {
        // Even centimetres read better along an axis.
        let l = (l * part(0.6, 1.4, n) / 10.0).round() * 10.0;
        (l, largest(i, Change { length: Some(Length::new(l)), ..Change::NONE }))
    });
    let by_wind = (0..=STEPS).map(|n| {
        let factor = part(0.0, 1.5, n);
        (q * factor, largest(i, Change { wind: factor, ..Change::NONE }))
    });
    Some(Course { by_length: by_length.collect(), by_wind: by_wind.collect(), here })
}
