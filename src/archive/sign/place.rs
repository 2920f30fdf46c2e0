//! Where a pack is signed: the figures that `templates/parts/back.typ` sets above the rules of the sign-off.

use hayro_syntax::Pdf;
use hayro_syntax::object::{Array, Dict, Name, Object, ObjectIdentifier, String as Text};

use super::Role;
use crate::archive::pdf::words;

/// A room to sign in.
pub struct Place {
    /// The figure that is the room, and what it stands in.
    pub figure: ObjectIdentifier,
    /// The part of the structure that holds the figure.
    pub parent: ObjectIdentifier,
    /// Its page.
    pub page: ObjectIdentifier,
    /// Left, foot, right and top, points.
    pub rect: [f32; 4],
}

/// The words of the figure, which the template sets.
fn told(role: Role) -> String {
    format!("Room for the signature: {}", role.words())
}

/// The room of a role; `None` where the pack has none, or more than one.
pub fn find(pdf: &Pdf, role: Role) -> Option<Place> {
    let wanted = told(role);
    let is_room = |d: &Dict<'_>| {
        d.get::<Name<'_>>("S").is_some_and(|s| s.as_str() == "Figure")
            && d.get::<Text<'_>>("Alt").is_some_and(|alt| words(alt.as_bytes()) == wanted)
    };
    let mut found = pdf.objects().into_iter().filter_map(Object::into_dict).filter(is_room);
    let (Some(figure), None) = (found.next(), found.next()) else { return None };
    let attributes = figure.get::<Array<'_>>("A")?;
    let rect = attributes.iter::<Dict<'_>>().find_map(|a| {
        let corners: Vec<f32> = a.get::<Array<'_>>("BBox")?.iter::<f32>().collect();
        <[f32; 4]>::try_from(corners).ok()
    })?;
    let parent = figure.get_ref("P").map(ObjectIdentifier::from)?;
    Some(Place { figure: figure.obj_id()?, parent, page: page(pdf, figure)?, rect })
}

/// So far up is looked for a neighbour: a cell, a row, a grid, a block.
const UP: u32 = 6;

/// The page of a figure. A figure of lines alone has no content that names a page; it stands on that of its nearest
/// neighbour, because the sign-off's rows are never broken.
fn page(pdf: &Pdf, figure: Dict<'_>) -> Option<ObjectIdentifier> {
    let mut part = figure;
    for _ in 0..UP {
        if let Some(page) = named(&part, UP) {
            return Some(page);
        }
        part = pdf.xref().get::<Dict<'_>>(ObjectIdentifier::from(part.get_ref("P")?))?;
    }
    None
}

/// The page that a part of the structure names, or else the first of the parts inside it.
fn named(part: &Dict<'_>, depth: u32) -> Option<ObjectIdentifier> {
    let own = part.get_ref("Pg").map(ObjectIdentifier::from);
    let inside = || {
        let kids = depth.checked_sub(1).and_then(|_| part.get::<Array<'_>>("K"))?;
        kids.iter::<Dict<'_>>().find_map(|kid| named(&kid, depth - 1))
    };
    own.or_else(inside)
}
