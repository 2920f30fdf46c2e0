//! Where a beam bears on a return: the masonry under it, a padstone, and the wall at mid-height below.
//!
//! * [`mod@site`]: the wall, the load and the other loads there
//! * [`seat`]: what of the masonry is pressed: by the beam itself, or through a padstone
//! * [`work`]: one seat worked: 6.1.3 under it, the concrete, mid-height
//! * [`choose`]: the smallest padstone of the list that works, and the table of those tried
//! * [`remedy`]: what would make it pass; [`margins`]: how far its assumptions may move

pub mod choose;
pub mod margins;
pub mod remedy;
pub mod seat;
pub mod site;
pub mod work;

use crate::building::{Bearing, Building, Padstone};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::trace::Sheet;
use choose::Tried;
use seat::{Beam, Seat};
use site::Site;

/// A checked bearing, for the sketches.
pub struct Checked<'a> {
    /// The wall and the loads.
    pub site: Site<'a>,
    /// The seat that was worked.
    pub seat: Seat,
    /// The padstone under the beam, where one was chosen.
    pub stone: Option<&'a Padstone>,
    /// What of the masonry is pressed, and how far it spreads; none where a limit was left before.
    pub found: Option<work::Found>,
}

/// Checks the bearings of one beam on a sheet, a column each; one alone without columns. The load that
/// presses most decides: imposed load leading.
///
/// Yields what each found; none where a limit was left before its seat was known.
pub fn check<'a>(
    s: &mut Sheet,
    b: &'a Building,
    bearings: &[&'a Bearing],
    annex: &'a Annex,
) -> Vec<Option<Checked<'a>>> {
    let mut chosen: Vec<Option<Checked<'a>>> =
        bearings.iter().map(|x| choose(s, b, x, annex, bearings.len() > 1)).collect();
    if chosen.iter().flatten().any(|c| c.stone.is_some()) {
        s.note(work::RULE);
    }
    s.heading(1, "Load, masonry, padstone, and the wall below");
    let marks: Vec<String> = bearings.iter().map(|x| x.mark.clone()).collect();
    let found = s.columns(&marks, |s, i| {
        s.case = Combination::PressingImposed.name().to_owned();
        if marks.len() > 1 {
            s.of.clone_from(&marks[i]);
        }
        let worked = site::of(s, b, bearings[i], annex).and_then(|site| match &chosen[i] {
            Some(c) => work::all(s, &site, &c.seat).map(Some),
            None => Ok(None),
        });
        s.of.clear();
        s.case.clear();
        worked.map_err(|outside| s.leave(outside)).ok().flatten()
    });
    for (c, found) in chosen.iter_mut().zip(found) {
        let Some(c) = c else { continue };
        c.found = found;
        if found.is_some() && !choose::uses(&c.site, &c.seat).works() {
            s.heading(1, format!("What would make {} pass", c.site.bearing.mark));
            s.table(|| remedy::table(&c.site));
            s.note(
                "A bearing that grows keeps the edge that is nearer to an end of the return; the load then moves to its \
                 middle, and the sheet of the return has to be worked again with that place.",
            );
        }
    }
    chosen
}

/// What lies under one end: the padstones tried, and what was decided. None where a limit is left.
fn choose<'a>(
    s: &mut Sheet,
    b: &'a Building,
    bearing: &'a Bearing,
    annex: &'a Annex,
    several: bool,
) -> Option<Checked<'a>> {
    let site = site::of(&mut Sheet::silent(), b, bearing, annex).ok()?;
    let bare = Seat::bare(Beam::of(&site));
    let tried = choose::try_all(&site, site.stones);
    let first = tried.iter().find(|t| t.works()).filter(|_| bearing.padstone);
    let alone = choose::uses(&site, &bare);
    s.heading(
        1,
        if several {
            format!("What lies under {}", bearing.mark)
        } else {
            "What lies under the beam".to_owned()
        },
    );
    neighbours(s, b, bearing);
    if !b.padstones.is_empty() && (bearing.padstone || !alone.works()) {
        s.table(|| choose::table(&alone, &tried, first));
    }
    s.note(decision(bearing, b, &alone, first));
    let (seat, stone) = match first {
        Some(Tried { stone, seat: Ok(seat), .. }) => (seat.clone(), Some(*stone)),
        _ => (bare, None),
    };
    Some(Checked { site, seat, stone, found: None })
}

/// What the reader must know before the numbers.
pub fn remarks(s: &mut Sheet, bearings: &[&Bearing]) {
    let mut returns: Vec<&str> = bearings.iter().map(|x| x.on.as_str()).collect();
    returns.dedup();
    let returns = returns.join(", ");
    s.note(format!(
        "Clause 6.1.3, its figures and paragraph numbers are from memory, check against the standard (M). Pressing with \
         imposed load leading (1.35 G + 1.5 Q) decides: no other combination brings more vertical load; the moment of the \
         wind in plane is on the sheet of each return. The design strength is the wall's, as there: the reduction for a \
         small plan area (6.1.2.1(3)) goes with the plan area of the wall, not with the area loaded, and 6.1.3 does not \
         take it back. Both ends of {returns} count as ends of the wall, the junction too, bonded or not: nothing spreads \
         into the wall met."
    ));
}

/// Other bearings of the same return: whether padstones fit beside each other is not worked out.
fn neighbours(s: &mut Sheet, b: &Building, bearing: &Bearing) {
    let others: Vec<&str> = b
        .bearings
        .iter()
        .filter(|o| o.on == bearing.on && o.mark != bearing.mark)
        .map(|o| o.mark.as_str())
        .collect();
    if !others.is_empty() {
        s.note(format!(
            "On the same return: {}. Its load counts at mid-height; whether padstones fit beside each other is to be \
             seen on the sketches.",
            others.join(", ")
        ));
    }
}

/// What was decided, and why.
fn decision(bearing: &Bearing, b: &Building, alone: &choose::Uses, first: Option<&Tried<'_>>) -> String {
    let beam = &bearing.beam;
    let alone_words = alone.words();
    match (first, bearing.padstone, b.padstones.is_empty()) {
        (Some(t), ..) => format!(
            "{beam} bears on a padstone, the smallest of the list that works: {}. Directly on the masonry: {alone_words}.",
            t.stone.name
        ),
        (None, true, false) => {
            let rest = if alone.works() {
                "none is needed, and the beam bears directly on the masonry"
            } else {
                "the beam is worked directly on the masonry"
            };
            format!("No padstone of the list works: {rest} ({alone_words}).")
        }
        (None, true, true) => {
            format!("The job has no list of padstones: {beam} bears directly on the masonry ({alone_words}).")
        }
        (None, false, _) => {
            format!(
                "By the job file {beam} bears directly on the masonry, without a padstone ({alone_words})."
            )
        }
    }
}
