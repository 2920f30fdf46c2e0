//! What the drawings of a bearing show.

use super::bearings::Checked;
use super::shapes::leaf_material;
use crate::building::Building;
use crate::quantity::{Length, print};
use crate::sketch::{
    Action, BearingElevation, BearingSection, Drawing, Frame, Stone, bearing_elevation, bearing_section,
};

/// Frames on the sheet, mm: side by side.
const ELEVATION: Frame = Frame::new(106.0, 108.0);
const SECTION: Frame = Frame::new(60.0, 52.0);

/// Elevation and section; none where a limit was left before the geometry was known.
pub fn drawings(b: &Building, c: &Checked<'_>) -> Vec<Drawing> {
    let (site, Some(found)) = (&c.site, c.found) else { return Vec::new() };
    let Some(leaf) = b.build_up(&site.ret.build_up).map(|u| &u.leaves[site.load.leaf]) else {
        return Vec::new();
    };
    let (bearing, p) = (site.bearing, found.pressed);
    // What was worked out is drawn to the millimetre, so that its label is exact.
    let whole = |l: Length| l.base().round();
    let force = Action::new("N_Edc", &print::show("N", site.N_Edc.dynamic()).to_string(), "");
    let stone = c.stone.zip(p.x_p).map(|(stone, x_p)| Stone {
        name: stone.name.clone(),
        place: x_p.base(),
        length: stone.length.base(),
        height: stone.height.base(),
    });
    let elevation = BearingElevation {
        mark: bearing.mark.clone(),
        on: site.ret.mark.clone(),
        beam: bearing.beam.clone(),
        length: site.model.l.base(),
        height: site.model.h.base(),
        level: bearing.level.base(),
        place: site.load.at.base(),
        bearing: bearing.length.base(),
        stone,
        a_1: p.a_1.base(),
        pressed: p.l_A.base(),
        spread: (whole(found.x_J), whole(found.x_F)),
        force: force.clone(),
    };
    let e = site.load.eccentricity;
    let section = BearingSection {
        mark: bearing.mark.clone(),
        beam: bearing.beam.clone(),
        thickness: site.model.t.base(),
        material: leaf_material(b, leaf),
        bearing: bearing.width.base(),
        stone: c.stone.map(|stone| {
            // It lies as near to the load as the leaf allows.
            let room = (site.model.t - stone.width).base() / 2.0;
            (stone.width.base(), stone.height.base(), e.base().clamp(-room, room))
        }),
        eccentricity: e.base(),
        force,
    };
    let mut out = vec![bearing_elevation(&elevation, ELEVATION), bearing_section(&section, SECTION)];
    for (drawing, kind) in out.iter_mut().zip(["elevation", "section"]) {
        drawing.name = format!("{}-{kind}", bearing.mark);
    }
    out
}
