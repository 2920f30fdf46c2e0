//! Where a beam bears on a return: the masonry under it, a padstone, and the wall at mid-height below.
//!
//! * [`mod@site`]: the wall, the load and the other loads there
//! * [`seat`]: what of the masonry is pressed: by the beam itself, or through a padstone
//! * [`work`]: one seat worked: 6.1.3 under it, the concrete, mid-height
//! * [`choose`]: the smallest padstone of the list that works, and the table of those tried
//! * [`remedy`]: what would make it pass

pub mod choose;
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

/// Checks a bearing on a sheet. The load that presses most decides: imposed load leading.
pub fn check<'a>(
    s: &mut Sheet,
    b: &'a Building,
    bearing: &'a Bearing,
    annex: &'a Annex,
) -> Option<Checked<'a>> {
    s.heading(1, "The load and the wall");
    s.case = Combination::PressingImposed.name().to_owned();
    let site = match site::of(s, b, bearing, annex) {
        Ok(site) => site,
        Err(outside) => {
            s.leave(outside);
            return None;
        }
    };
    remarks(s, &site);
    neighbours(s, b, bearing);
    let bare = Seat::bare(Beam::of(&site));
    let tried = choose::try_all(&site, site.stones);
    let first = tried.iter().find(|t| t.works()).filter(|_| bearing.padstone);
    let alone = choose::uses(&site, &bare);
    s.heading(1, "What lies under the beam");
    if !b.padstones.is_empty() && (bearing.padstone || !alone.works()) {
        s.table(|| choose::table(&alone, &tried, first));
    }
    s.note(decision(bearing, b, &alone, first));
    let (seat, stone) = match first {
        Some(Tried { stone, seat: Ok(seat), .. }) => (seat.clone(), Some(*stone)),
        _ => (bare, None),
    };
    let found = match work::all(s, &site, &seat) {
        Ok(found) => Some(found),
        Err(outside) => {
            s.leave(outside);
            None
        }
    };
    if s.verdicts.iter().any(|v| !v.holds) {
        s.heading(1, "What would make it pass");
        s.table(|| remedy::table(&site));
        s.note(
            "A bearing that grows keeps the edge that is nearer to an end of the return; the load then moves to its \
             middle, and the sheet of the return has to be worked again with that place.",
        );
    }
    s.case.clear();
    Some(Checked { site, seat, stone, found })
}

/// What the reader must know before the numbers.
fn remarks(s: &mut Sheet, site: &Site<'_>) {
    let mark = &site.ret.mark;
    s.note("Clause 6.1.3, its figures and paragraph numbers are from memory, check against the standard.");
    s.note(
        "Pressing with imposed load leading (1.35 G + 1.5 Q) decides: no other combination brings more vertical load. \
         The moment of the wind in the plane of the return is on its own sheet.",
    );
    s.note(format!(
        "The design strength is the wall's, as on the sheet of {mark}: the reduction for a small plan area (6.1.2.1(3)) goes with the \
         plan area of the wall, not with the area loaded, and 6.1.3 does not take it back. It is kept here."
    ));
    s.note(format!(
        "Both ends of {mark} count as ends of the wall, the junction too, bonded or not: nothing spreads into the wall \
         met."
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
