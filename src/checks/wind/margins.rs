//! How far the wind may grow: at which basic velocity each return and panel reaches 1.00.

use crate::checks::returns::build::{Change, Inputs};
use crate::checks::returns::remedy as of_return;
use crate::checks::{Job, panel_sheet, panels};
use crate::quantity::print;
use crate::trace::{Column, Sheet, Table};
use crate::wind::Derived;

/// Times that the pressure is tried up to, the step of the search, and how close it comes.
const MOST: f64 = 10.0;
const STEP: f64 = 1.08;
const CLOSE: f64 = 1e-3;

/// Writes the table of what the wind may grow to; nothing where there is nothing to grow.
pub fn table(s: &mut Sheet, job: &Job<'_>, derived: Option<&Derived>) {
    if !s.recording() {
        return;
    }
    let mut found: Vec<Found> = Vec::new();
    let wind = job.wind.as_ref();
    for ret in &job.building.returns {
        let Ok(wind) = wind else { continue };
        let inputs = Inputs::new(job, ret, wind);
        let passes = |times: f64| of_return::passes(&inputs, Change { wind: times, ..Change::NONE });
        let of_site = inputs.wind.overall / wind.site_at(job.building, ret).overall;
        found.push(Found { mark: ret.mark.clone(), margin: margin(passes), of_site: of_site.base() });
    }
    for p in &job.building.panels {
        let Ok(m) = panel_sheet::model(job, p) else { continue };
        let of_site = wind.map_or(1.0, |w| (m.q_net / w.of_panel(p)).base());
        let margin = margin(|times| panels::remedy::passes(&blown(&m, times), &job.annex));
        found.push(Found { mark: p.mark.clone(), margin, of_site });
    }
    if found.is_empty() {
        return;
    }
    let site = job.building.wind.site.as_ref().zip(derived);
    s.heading(1, "How far the wind may grow");
    s.table(|| shown(&found, site.map(|(site, d)| (site.v_map.base(), fastest(d)))));
    s.note(
        "Found by search on the same checks with every pressure of the wind and the roof's uplift grown alike; the pressure \
         grows with the square of the velocity. Returns and panels alone: footings, straps and the whole building have their \
         own ratios. Where a return or panel states a pressure of its own, the velocities are those at which this site \
         would have that pressure. Rounded down.",
    );
}

/// The panel under stronger wind.
fn blown(m: &panels::PanelModel, times: f64) -> panels::PanelModel {
    let mut blown = panels::PanelModel { q_net: m.q_net * times, ..m.clone() };
    for leaf in &mut blown.leaves {
        leaf.U_above = leaf.U_above * times;
    }
    blown
}

/// The greatest basic velocity of any side, mm/s.
fn fastest(d: &Derived) -> f64 {
    d.onto.iter().map(|o| o.v_b.base()).fold(0.0, f64::max)
}

/// How many times the pressure may be what it is.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Margin {
    /// It passes up to this, and no farther.
    Times(f64),
    /// It passes as far as it was tried.
    Beyond,
    /// It does not pass without wind.
    Never,
}

/// How far the wind may grow at one return or panel.
struct Found {
    mark: String,
    margin: Margin,
    /// Its pressure over what the site gives there: not 1 where it is stated.
    of_site: f64,
}

/// From what is there upwards while it passes, or downwards until it does.
pub fn margin(passes: impl Fn(f64) -> bool) -> Margin {
    let (mut works, mut fails) = if passes(1.0) {
        let mut up = 1.0;
        loop {
            if up >= MOST {
                return Margin::Beyond;
            }
            let next = f64::min(up * STEP, MOST);
            if !passes(next) {
                break (up, next);
            }
            up = next;
        }
    } else {
        let mut down = 1.0;
        loop {
            let next = if down < 0.05 { 0.0 } else { down / STEP };
            if passes(next) {
                break (next, down);
            }
            if next == 0.0 {
                return Margin::Never;
            }
            down = next;
        }
    };
    while fails - works > CLOSE {
        let middle = f64::midpoint(works, fails);
        if passes(middle) {
            works = middle;
        } else {
            fails = middle;
        }
    }
    Margin::Times(works)
}

/// Of the site, where there is one, map value and basic velocity, mm/s.
fn shown(found: &[Found], site: Option<(f64, f64)>) -> Table {
    let down = |x: f64, step: f64| (x / step + 1e-9).floor() * step;
    let speed = |mm_s: f64| format!("{:.1}", down(mm_s / 1e3, 0.1));
    let as_it_is = |mm_s: f64| format!("{:.1}", mm_s / 1e3);
    let row = |Found { mark, margin, of_site }: &Found| {
        let only = |text: String| vec![mark.clone(), text, String::new(), String::new()];
        let mut row = match margin {
            Margin::Times(times) => {
                let faster = (times * of_site).sqrt();
                let (v_map, v_b) = site.unwrap_or_default();
                vec![
                    mark.clone(),
                    format!("{:.2}", down(*times, 0.01)),
                    speed(v_map * faster),
                    speed(v_b * faster),
                ]
            }
            Margin::Beyond => only(format!("more than {}", print::significant(MOST))),
            Margin::Never => only("fails without wind".to_owned()),
        };
        if site.is_none() {
            row.truncate(2);
        }
        row
    };
    let mut columns = vec![Column::words("where"), Column::numbers("pressure, times")];
    if site.is_some() {
        columns.extend([Column::numbers("map value, m/s"), Column::numbers("basic velocity, m/s")]);
    }
    let mut rows: Vec<Vec<String>> = found.iter().map(row).collect();
    if let Some((v_map, v_b)) = site {
        rows.insert(0, vec!["as it is".to_owned(), "1".to_owned(), as_it_is(v_map), as_it_is(v_b)]);
    }
    Table { caption: "Wind at which each reaches 1.00: the pressure over what it is now, and the velocities of the worst side".to_owned(), columns, rows, strong: vec![] }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_limit_is_found_from_both_sides() {
        for limit in [0.02, 0.3, 0.999, 1.0, 1.3, 4.0, 9.9] {
            let Margin::Times(x) = margin(|times| times <= limit) else { panic!("{limit}") };
            assert!(x <= limit && limit - x < 2.0 * CLOSE, "{x} of {limit}");
        }
        // A pressure that is stated at a quarter of the site's stands for half of its velocity.
        let found = Found { mark: "P1".to_owned(), margin: Margin::Times(1.0), of_site: 0.25 };
        assert_eq!(shown(&[found], Some((20e3, 24e3))).rows[1][1..], ["1.00", "10.0", "12.0"]);
        assert_eq!(margin(|_| true), Margin::Beyond);
        assert_eq!(margin(|_| false), Margin::Never);
    }
}
