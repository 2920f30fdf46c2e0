//! A beam's bearing cut across the wall: leaf, padstone, the end of the beam, the load off the middle.

use kurbo::{Point, Rect, Vec2};

use super::board::{Board, Words, corners};
use super::dimension::{self, ROW, mm};
use super::drawing::{Drawing, Role};
use super::hatch::Material;
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::scale::{Frame, Scale, fit};
use super::text::Text;
use super::view::{Action, Layer, Ruler, Side, hatch_key};

/// What the section across a bearing shows.
#[derive(Clone, Debug)]
pub struct BearingSection {
    /// Mark of the bearing.
    pub mark: String,
    /// Mark of the beam.
    pub beam: String,
    /// Thickness of the leaf, mm.
    pub thickness: f64,
    /// What the leaf is built of.
    pub material: Material,
    /// Width of the bearing, mm.
    pub bearing: f64,
    /// Width and height of the padstone and how far its middle is off the middle of the leaf, mm.
    pub stone: Option<(f64, f64, f64)>,
    /// Load off the middle of the leaf, towards the right, mm.
    pub eccentricity: f64,
    /// The design load.
    pub force: Action,
}

/// Depth of the beam and height of masonry shown; for the picture only.
const BEAM: f64 = 120.0;
const BELOW: f64 = 200.0;

/// Draws the section across a bearing.
pub fn bearing_section(view: &BearingSection, frame: Frame) -> Drawing {
    fit(frame, 10.0, |scale| draw(view, scale))
}

fn draw(view: &BearingSection, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let ruler = Ruler::new(scale, Side::Left);
    let half = view.thickness / 2.0;
    let under = view.stone.map_or(0.0, |(_, height, _)| height);
    // The underside of the beam is at 0.
    let wall = Rect::from_points(ruler.at(-half, -under - BELOW), ruler.at(half, -under));
    board.hatch(view.material, &corners(wall));
    for x in [wall.x0, wall.x1] {
        board.line(Pen::Cut, Point::new(x, wall.y0), Point::new(x, wall.y1));
    }
    board.line(Pen::Cut, Point::new(wall.x0, wall.y0), Point::new(wall.x1, wall.y0));
    let over = Vec2::new(1.5, 0.0);
    let (left, right) = (Point::new(wall.x0, wall.y1), Point::new(wall.x1, wall.y1));
    load::break_line(&mut board, Pen::Beyond, left - over, right + over);
    if let Some((width, height, off)) = view.stone {
        let area = Rect::from_points(ruler.at(off - width / 2.0, -height), ruler.at(off + width / 2.0, 0.0));
        board.hatch(Material::Concrete, &corners(area));
        board.rect(Pen::Cut, area);
        board.note(
            Note::new(Role::Note, Point::new(area.x0, area.center().y), Text::plain("padstone"))
                .spot(Spot::new((wall.x0.min(area.x0) - 4.0, area.center().y), -1.0, 0.0).led()),
        );
    }
    let e = view.eccentricity;
    let beam =
        Rect::from_points(ruler.at(e - view.bearing / 2.0, 0.0), ruler.at(e + view.bearing / 2.0, BEAM));
    board.rect(Pen::Outline, beam);
    board.note(
        Note::new(Role::Mark, Point::new(beam.x0, beam.center().y), Text::mark(&view.beam)).spot(Spot::new(
            (beam.x0 - 2.0, beam.center().y),
            -1.0,
            0.0,
        )),
    );
    let axis = ruler.at(0.0, 0.0).x;
    board.line(Pen::Axis, Point::new(axis, wall.y1 + 2.0), Point::new(axis, beam.y0 - 2.0));
    let tip = Point::new(ruler.at(e, 0.0).x, beam.y0);
    let tail = tip - Vec2::new(0.0, 9.0);
    load::arrow(&mut board, tail, tip);
    board.note(
        Note::new(Role::Load, tail, view.force.text())
            .spot(Spot::new(tail + Vec2::new(1.5, 0.0), 1.0, 1.0))
            .spot(Spot::new(tail + Vec2::new(-1.5, 0.0), -1.0, 1.0)),
    );
    let row = |n: f64| wall.y1 + 3.0 + n * ROW;
    let start = wall.y1 + 1.5;
    dimension::across(&mut board, (wall.x0, wall.x1), row(1.0), start, Text::value("t", &mm(view.thickness)));
    if e.abs() > 0.05 {
        let xs = if e > 0.0 { (axis, tip.x) } else { (tip.x, axis) };
        dimension::across(&mut board, xs, row(2.2), start, Text::value("e_c", &mm(e.abs())));
    }
    if (view.bearing - view.thickness).abs() > 0.05 {
        let text = Text::value("w_b", &mm(view.bearing));
        dimension::across(&mut board, (beam.x0, beam.x1), beam.y0 - 13.0, beam.y0, text);
    }
    let layer = Layer::Leaf { thickness: view.thickness, material: view.material };
    let stone = if view.stone.is_some() { "; strewn strokes: concrete" } else { "" };
    board.finish(Words {
        name: format!("{}-section", view.mark),
        caption: format!("{} across the wall{}{stone}", view.mark, hatch_key(&[layer])),
        scale: scale.text(),
        alt: alt(view),
    })
}

fn alt(view: &BearingSection) -> String {
    let mut alt = format!(
        "Section across the bearing of beam {}: a leaf of {}, {} mm thick; the bearing is {} mm wide. ",
        view.beam,
        view.material.word(),
        mm(view.thickness),
        mm(view.bearing)
    );
    if let Some((width, height, _)) = view.stone {
        alt += &format!("The padstone is {} mm wide and {} mm high. ", mm(width), mm(height));
    }
    alt += &if view.eccentricity.abs() > 0.05 {
        format!("The load stands {} mm off the middle of the leaf. ", mm(view.eccentricity.abs()))
    } else {
        "The load stands in the middle of the leaf. ".to_owned()
    };
    alt + &format!("Design load {}.", view.force.spoken())
}
