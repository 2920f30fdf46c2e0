//! Lengths by rule: printed beside the calculation, never instead of it.

use crate::quantity::Length;
use crate::quantity::print::show;
use crate::standards::tables::approved_document_a as ada;
use crate::trace::Sheet;

/// Approved Document A, 2C: length against a sixth of the overall height of the supported wall, and
/// the distance to the nearest opening.
pub fn by_rule(s: &mut Sheet, l: Length, supported: Length, opening: Option<Length>) {
    let mm = |x: Length| show("l", x.dynamic()).to_string();
    let needed = supported * ada::BUTTRESS_LENGTH;
    s.rule(
        "length-by-rule",
        "Approved Document A, 2013, 2C",
        "length against 1/6 of the overall height of the supported wall",
        format!("{} against {} / 6 = {}", mm(l), mm(supported), mm(needed)),
        l >= needed,
    );
    if let Some(distance) = opening {
        let least = Length::new(ada::BUTTRESS_TO_OPENING);
        s.rule(
            "opening-by-rule",
            "Approved Document A, 2013, 2C",
            "distance from the return to the nearest opening",
            format!("{} against {}", mm(distance), mm(least)),
            distance >= least,
        );
    }
    let corner = Length::new(ada::CORNER);
    s.rule(
        "corner-by-rule",
        "Approved Document A, 2013, 2C",
        "length of a corner return, where this return stands at a corner",
        format!("{} against {}", mm(l), mm(corner)),
        l >= corner,
    );
}
