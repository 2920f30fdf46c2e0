//! All pressures side by side.

use super::velocity::{Onto, shown};
use super::{Derived, Wind};
use crate::building::{Building, Site};
use crate::quantity::{Stress, print};
use crate::trace::{Column, Sheet, Table};

/// What the site gives, in one table; a panel with a pressure of its own stands beside it.
pub fn pressures(s: &mut Sheet, b: &Building, site: &Site, d: &Derived) {
    let turned = site.sectors.iter().any(|x| !x.bearings.is_empty());
    s.table(|| {
        let from = |o: &Onto| o.bearing.map_or_else(|| "any".to_owned(), |b| format!("{b}°"));
        let speed = |o: &Onto| format!("{:.1}", o.v_b.base() / 1e3);
        let rows = d.onto.iter().map(|o| vec![o.side.word().to_owned(), from(o), speed(o), shown(o.q_p)]);
        Table {
            caption: if turned {
                "Wind onto each side of the plan".to_owned()
            } else {
                "Wind onto each side of the plan, the same from all directions".to_owned()
            },
            columns: vec![
                Column::words("onto the side"),
                Column::words("from"),
                Column::numbers("basic velocity, m/s"),
                Column::numbers("peak pressure, kN/m²"),
            ],
            rows: rows.collect(),
            strong: vec![],
        }
    });
    s.table(|| places(b, d));
}

/// Pressures of the whole building, the returns and the panels, with what the job states for one of them.
fn places(b: &Building, d: &Derived) -> Table {
    let row = |mark: &str,
               which: &str,
               [inward, outward]: [Option<Stress>; 2],
               of_site: Stress,
               own: Option<Stress>| {
        let some = |q: Option<Stress>| q.map_or_else(String::new, shown);
        let own = own.map_or_else(String::new, |q| {
            format!("{} ({})", shown(q), print::significant(q.base() / of_site.base()))
        });
        vec![mark.to_owned(), which.to_owned(), some(inward), some(outward), shown(of_site), own]
    };
    let mut rows = Vec::new();
    for (which, on) in ["wind along x", "wind along y"].into_iter().zip(&d.along) {
        for (strip, q) in &on.strips {
            let which = format!("{which}, up to {:.2} m", strip.to.base() / 1e3);
            rows.push(row("whole building", &which, [None, None], *q, None));
        }
        rows.push(row("whole building", which, [None, None], on.top, None));
    }
    let wind = Wind { worst: d.worst(), derived: Some(d.clone()) };
    for r in &b.returns {
        let own = r.wind.as_ref().map(|c| c.value);
        rows.push(row(&r.mark, "return", [None, None], wind.site_at(b, r).overall, own));
    }
    for p in &d.panels {
        let place = p.place.map_or_else(
            || "place not given: the corner zone".to_owned(),
            |x| format!("on {}, zone {}", x.side.word(), p.zone),
        );
        let own = b.panels.iter().find(|x| x.mark == p.mark).and_then(|x| x.wind.as_ref()).map(|c| c.value);
        rows.push(row(&p.mark, &place, [Some(p.inward), Some(p.outward)], p.worst, own));
    }
    let any = rows.iter().any(|row| !row[5].is_empty());
    let mut columns = vec![
        Column::words("where"),
        Column::words("which"),
        Column::numbers("inward"),
        Column::numbers("outward"),
        Column::numbers(if any { "of the site" } else { "used" }),
        Column::words("stated, taken"),
    ];
    if !any {
        columns.pop();
        rows.iter_mut().for_each(|row| drop(row.pop()));
    }
    let beside = if any { "; in brackets the stated one over that of the site" } else { "" };
    Table { caption: format!("Net characteristic pressures, kN/m²{beside}"), columns, rows, strong: vec![] }
}
