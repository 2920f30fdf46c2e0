//! The smallest padstone of the list that works, and the table of those tried.

use super::seat::{Beam, Seat};
use super::site::Site;
use super::work;
use crate::building::Padstone;
use crate::quantity::print;
use crate::trace::{Column, Sheet, Table};

/// The use of every check of a seat, on a silent sheet; none where a check was left or does not apply.
#[derive(Clone, Copy, Debug)]
pub struct Uses {
    /// Masonry under it.
    pub bearing: Option<f64>,
    /// Concrete.
    pub padstone: Option<f64>,
    /// Mid-height below.
    pub middle: Option<f64>,
    holds: bool,
}

impl Uses {
    /// Whether every check holds and no limit was left.
    pub const fn works(&self) -> bool {
        self.holds
    }

    /// `0.84 under the beam, 0.31 at mid-height`.
    pub fn words(&self) -> String {
        match (self.bearing, self.middle) {
            (Some(b), Some(m)) => {
                format!("use {} under the beam, {} at mid-height below", print::ratio(b), print::ratio(m))
            }
            (Some(b), None) => {
                format!("use {} under the beam, mid-height outside the method", print::ratio(b))
            }
            _ => "outside the method".to_owned(),
        }
    }
}

/// Works a seat silently.
pub fn uses(site: &Site<'_>, seat: &Seat) -> Uses {
    let mut s = Sheet::silent();
    let left = work::all(&mut s, site, seat).is_err();
    let of = |id: &str| s.verdicts.iter().find(|v| v.id == id).map(|v| v.ratio);
    Uses { bearing: of("bearing"), padstone: of("padstone"), middle: of("middle"), holds: !left && s.holds() }
}

/// A padstone that was tried.
pub struct Tried<'a> {
    /// The padstone.
    pub stone: &'a Padstone,
    /// The seat, or why it cannot lie there.
    pub seat: Result<Seat, &'static str>,
    /// Its uses, where it can lie there.
    pub uses: Option<Uses>,
}

impl Tried<'_> {
    /// Whether it works.
    pub fn works(&self) -> bool {
        self.uses.is_some_and(|u| u.works())
    }

    fn finding(&self) -> &'static str {
        match (&self.seat, self.uses) {
            (Err(why), _) => why,
            (_, Some(u)) if u.works() => "works",
            (_, Some(Uses { bearing: Some(_), middle: Some(_), .. })) => "not adequate",
            _ => "outside the method",
        }
    }
}

/// Every padstone of the list, the smallest by volume first; of equal ones the shorter, then the order
/// of the list.
pub fn try_all<'a>(site: &Site<'_>, list: &'a [Padstone]) -> Vec<Tried<'a>> {
    let mut sorted: Vec<&Padstone> = list.iter().collect();
    let size = |p: &Padstone| (p.length * p.width * p.height, p.length);
    sorted.sort_by(|a, b| size(a).partial_cmp(&size(b)).unwrap_or(std::cmp::Ordering::Equal));
    sorted
        .into_iter()
        .map(|stone| {
            let seat = Seat::on(site, Beam::of(site), stone);
            let uses = seat.as_ref().ok().map(|seat| uses(site, seat));
            Tried { stone, seat, uses }
        })
        .collect()
}

/// The table of those tried, the beam alone first.
pub fn table(alone: &Uses, tried: &[Tried<'_>], chosen: Option<&Tried<'_>>) -> Table {
    let cell = |x: Option<f64>| x.map_or_else(|| "–".to_owned(), print::ratio);
    let alone_row = vec![
        "none: the beam on the masonry".to_owned(),
        String::new(),
        String::new(),
        cell(alone.bearing),
        "–".to_owned(),
        cell(alone.middle),
        if alone.works() {
            "enough"
        } else if alone.bearing.is_none() {
            "outside the method"
        } else {
            "not adequate"
        }
        .to_owned(),
    ];
    let mm = |l: crate::quantity::Length| print::show("l", l.dynamic()).value;
    let row = |t: &Tried<'_>| {
        let p = t.stone;
        vec![
            p.name.clone(),
            format!("{} × {} × {}", mm(p.length), mm(p.width), mm(p.height)),
            print::significant((p.length * p.width * p.height).base() / 1e6),
            cell(t.uses.and_then(|u| u.bearing)),
            cell(t.uses.and_then(|u| u.padstone)),
            cell(t.uses.and_then(|u| u.middle)),
            t.finding().to_owned(),
        ]
    };
    let mut rows = vec![alone_row];
    rows.extend(tried.iter().map(row));
    let strong = tried.iter().position(|t| chosen.is_some_and(|c| std::ptr::eq(c, t))).map(|i| i + 1);
    Table {
        caption: "Padstones tried, smallest first: use of the masonry under it, of its concrete, and of the wall at \
                  mid-height below"
            .to_owned(),
        columns: vec![
            Column::words("padstone"),
            Column::words("length × width × height, mm"),
            Column::numbers("litres"),
            Column::numbers("under it"),
            Column::numbers("concrete"),
            Column::numbers("mid-height"),
            Column::words("finding"),
        ],
        rows,
        strong: strong.into_iter().collect(),
    }
}
