//! What would make a bearing pass, by search on the same check on silent sheets.

use super::choose::{try_all, uses};
use super::seat::{Beam, Seat};
use super::site::Site;
use crate::quantity::functions::min;
use crate::quantity::{Force, Length, print};
use crate::solve::root;
use crate::trace::{Column, Table};

/// The beam's end with another length and width of bearing, the edge nearer to an end of the return in
/// its place; none where it would hang over the other end.
pub fn grown(site: &Site<'_>, length: Length, width: Length) -> Option<Beam> {
    let now = Beam::of(site);
    let l = site.model.l;
    let (before, behind) = (now.x_c - now.l_b / 2.0, l - now.x_c - now.l_b / 2.0);
    let x_c = if behind <= before { l - behind - length / 2.0 } else { before + length / 2.0 };
    let stays = x_c - length / 2.0 >= Length::ZERO && x_c + length / 2.0 <= l + Length::new(1e-9);
    stays.then_some(Beam { x_c, l_b: length, w_b: width })
}

/// The least length of bearing at a width that passes directly on the masonry, to the millimetre,
/// rounded up; `None` where none that stays on the return does.
pub fn bearing_needed(site: &Site<'_>, width: Length) -> Option<Beam> {
    let passes = |mm: f64| {
        grown(site, Length::new(mm), width).is_some_and(|beam| uses(site, &Seat::bare(beam)).works())
    };
    let (from, to) = (site.bearing.length.base(), site.model.l.base());
    root::least(passes, from, to, 120, 0.25)
        .map(f64::ceil)
        .filter(|&mm| passes(mm))
        .and_then(|mm| grown(site, Length::new(mm), width))
}

/// The largest design load that the beam's end as it is passes with, rounded down to 0.1 kN.
pub fn load_taken(site: &Site<'_>) -> Option<Force> {
    let seat = Seat::bare(Beam::of(site));
    let passes = |share: f64| {
        let lighter = Site {
            model: site.model.clone(),
            others: site.others.clone(),
            slender: site.slender.clone(),
            N_Edc: site.N_Edc * share,
            ..*site
        };
        uses(&lighter, &seat).works()
    };
    // At nothing at all the eccentricity has no meaning.
    let share = root::greatest(passes, 1e-3, 1.0, 100, 1e-4)?;
    Some(Force::new((site.N_Edc.base() * share / 100.0).floor() * 100.0))
}

/// A table of what would make it pass; the words say when nothing in reach does.
pub fn table(site: &Site<'_>) -> Table {
    let mm = |l: Length| print::show("l", l.dynamic()).value;
    let size = |b: Beam| {
        let pressed = b.l_b * min(b.w_b, site.model.t - 2.0 * site.e_c);
        format!("{} × {} mm, {} pressed", mm(b.l_b), mm(b.w_b), print::show("A", pressed.dynamic()))
    };
    let now = Beam::of(site);
    let none = || "none that stays on the return".to_owned();
    let mut rows = vec![vec![
        "bearing directly on the masonry, this width".to_owned(),
        size(now),
        bearing_needed(site, now.w_b).map_or_else(none, size),
    ]];
    if now.w_b < site.model.t {
        rows.push(vec![
            "the same, as wide as the leaf".to_owned(),
            size(now),
            bearing_needed(site, site.model.t).map_or_else(none, size),
        ]);
    }
    rows.push(vec![
        "design load, at most".to_owned(),
        print::show("N", site.N_Edc.dynamic()).to_string(),
        load_taken(site)
            .map_or_else(|| "none passes".to_owned(), |n| print::show("N", n.dynamic()).to_string()),
    ]);
    if !site.bearing.padstone {
        let stones = site.stones;
        let works = try_all(site, stones).into_iter().find(|t| t.works()).map(|t| t.stone.name.clone());
        rows.push(vec![
            "padstone of the list".to_owned(),
            "none, by the job file".to_owned(),
            works.unwrap_or_else(|| "none of the list works".to_owned()),
        ]);
    }
    Table {
        caption: "What would make it pass, each change alone, found by search on the same checks".to_owned(),
        columns: vec![Column::words("change"), Column::words("now"), Column::words("needed")],
        rows,
        strong: Vec::new(),
    }
}
