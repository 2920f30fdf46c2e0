//! Returns held against their storey, against each other and against the bracing walls.

use super::Around;
use crate::building::{BracingWall, FloorKind, Head, Restraint, Return, Stands, Storey};
use crate::error::Kind;
use crate::job::names::{Names, Seen};
use crate::job::reader::Table;
use crate::quantity::Length;

/// Difference of a wall's height from its storey's that passes without a word.
const HEIGHT_DIFFERS: Length = Length::new(300.0);

/// Holds the height of a return or panel against its storey.
pub fn against_storey(
    t: &Table<'_>,
    height: Option<Length>,
    storey: Option<&Storey>,
    storey_table: &Table<'_>,
) {
    let (Some(height), Some(storey)) = (height, storey) else { return };
    if height > storey.total_height {
        t.fault(Kind::Contradiction, "it is higher than the whole structure above its storey's base")
            .at(t.place("height"), "height")
            .and(storey_table.place("total_height"), "total height")
            .allowed("the clear height between its supports")
            .help("correct one of the two");
    } else if (height - storey.clear_height).abs() > HEIGHT_DIFFERS {
        t.warn(format_args!(
            "height is {:.0} mm, but storey \"{}\" is {:.0} mm high",
            height.base(),
            storey.mark,
            storey.clear_height.base()
        ));
    }
}

/// A concrete floor holds a head only where the storey has one above.
pub(super) fn restraint_fits(
    t: &Table<'_>,
    restraint: Option<Restraint>,
    storey: Option<&Storey>,
    storey_table: &Table<'_>,
) {
    let (Some(Restraint::Concrete), Some(storey)) = (restraint, storey) else { return };
    if storey.floor_above != FloorKind::Concrete {
        t.fault(Kind::Contradiction, "a concrete floor is to hold its head, but the storey has none above")
            .at(t.place("restraint"), "what holds head and foot")
            .and(storey_table.place("floor_above"), "what is above")
            .allowed("\"concrete floor\" under a concrete floor")
            .help("write restraint = \"timber floor\" or \"none\", or correct the floor above the storey");
    }
}

/// Holds the returns against each other: a wall that props another must not need a prop itself, and
/// more tributary width than front is said aloud.
pub fn together(returns: &Names<'_, Return>, around: &Around<'_, '_>) {
    for seen in returns.iter() {
        let Some(Return { head: Head::Propped(by), .. }) = &seen.item else { continue };
        for mark in by {
            if let Some(prop) = returns.get(mark)
                && matches!(&prop.item, Some(Return { head: Head::Propped(_), .. }))
            {
                seen.table
                    .fault(Kind::Contradiction, format_args!("\"{mark}\" props it, and needs a prop itself"))
                    .at(seen.table.place("propped_by"), "propped by")
                    .and(prop.table.place("head"), "propped as well")
                    .allowed("walls whose own head is free")
                    .help("name the walls at which the force ends");
            }
        }
    }
    for seen in returns.iter() {
        if let (Some(wall), Some(item)) = (around.bracing.get(&seen.name), &seen.item) {
            same_wall(seen, item, wall);
        }
    }
    let Some((st, stability)) = around.stability else { return };
    for seen in returns.iter().filter(|s| s.item.as_ref().is_some_and(|r| r.storey != stability.storey)) {
        seen.table
            .fault(Kind::Contradiction, "it stands in another storey than the one judged")
            .at(seen.table.place("storey"), "its storey")
            .and(st.place("storey"), "the storey judged")
            .allowed("returns in the storey of the removed wall")
            .help("correct one of the two; what is above comes in as `from_above`");
    }
    let sum: Length = returns.iter().filter_map(|s| s.item.as_ref()).map(|r| r.tributary_width).sum();
    let front = stability.front.1 - stability.front.0;
    if sum > front + Length::new(1.0) {
        st.warn(format_args!(
            "the returns' tributary widths add up to {:.2} m on a front of {:.2} m",
            sum.base() / 1e3,
            front.base() / 1e3
        ));
    }
}

/// A bracing wall with the mark of a return is that return.
fn same_wall(seen: &Seen<'_, Return>, item: &Return, wall: &Seen<'_, BracingWall>) {
    let Some(bracing) = &wall.item else { return };
    if (item.length - bracing.length).abs() > Length::new(1.0) {
        seen.table
            .fault(Kind::Contradiction, "it has another length as a bracing wall")
            .at(seen.table.place("length"), "as a return")
            .and(wall.table.place("length"), "as a bracing wall")
            .allowed("one length for one mark")
            .help("correct one of the two");
    }
    if bracing.stands == Stands::Before {
        seen.table
            .fault(Kind::Contradiction, "a return stays, but the bracing wall of its mark comes out")
            .at(seen.table.place("mark"), "stays")
            .and(wall.table.place("stands"), "stands before only")
            .allowed("a return that stands after the removal")
            .help("write stands = \"after\" for the piece that stays, and give the wall that comes out its own mark");
    }
}
