//! The drawing board: strokes and fills as they are drawn, labels as wishes until [`Board::finish`].
//!
//! Board coordinates are paper millimetres with y down and an origin of the drawing's own choice;
//! finishing moves everything into the frame.

use kurbo::{Affine, BezPath, Line, PathEl, Point, Rect, Shape, Vec2};

use super::drawing::{Anchor, Drawing, Item, Label, Path};
use super::ground::Ground;
use super::hatch::{self, Material};
use super::note::{Block, Note};
use super::pen::{Ink, Pen};
use super::place;

/// White border around everything drawn, mm.
const BORDER: f64 = 1.0;
/// Clear strip of a mask around the text it carries, mm.
const MASK_MARGIN: f64 = 0.35;

/// A drawing in the making.
#[derive(Default)]
pub struct Board {
    items: Vec<Item>,
    notes: Vec<Note>,
    ground: Ground,
    /// Paper that the drawing takes even where nothing is drawn.
    kept: Option<Rect>,
}

/// The words that go with a finished drawing.
pub struct Words {
    /// See [`Drawing::name`].
    pub name: String,
    /// See [`Drawing::caption`].
    pub caption: String,
    /// See [`Drawing::scale`].
    pub scale: String,
    /// See [`Drawing::alt`].
    pub alt: String,
}

impl Board {
    /// Draws a path.
    pub fn stroke(&mut self, pen: Pen, path: BezPath) {
        if pen.keeps_labels_off() {
            self.ground.bar(&path, pen.width() / 2.0);
        }
        self.items.push(Item::Stroke { pen, path: Path(path) });
    }

    /// Draws a straight line.
    pub fn line(&mut self, pen: Pen, from: Point, to: Point) {
        self.stroke(pen, Line::new(from, to).to_path(0.1));
    }

    /// Draws a line through points.
    pub fn polyline(&mut self, pen: Pen, points: &[Point]) {
        self.stroke(pen, polyline(points));
    }

    /// Draws the four sides of a rectangle.
    pub fn rect(&mut self, pen: Pen, rect: Rect) {
        self.stroke(pen, rect.abs().to_path(0.1));
    }

    /// Fills a closed area. Black areas keep labels off, white and grey ones do not.
    pub fn fill(&mut self, ink: Ink, path: BezPath) {
        if ink == Ink::Arrow {
            self.ground.bar(&path, 0.0);
        }
        self.items.push(Item::Fill { ink, path: Path(path) });
    }

    /// Keeps labels off an area without drawing anything.
    pub fn reserve(&mut self, area: Rect) {
        let [a, b, c, d] = corners(area);
        self.ground.bar(&polygon(&[a, c, b, d]), 0.0);
    }

    /// Takes paper for the drawing even where nothing is drawn, so that drawings side by side hang from one line.
    pub fn keep(&mut self, area: Rect) {
        self.kept = Some(self.kept.map_or(area, |kept| kept.union(area)));
    }

    /// Hatches a closed polygon as cut masonry.
    pub fn hatch(&mut self, material: Material, ring: &[Point]) {
        self.hatching(hatch::masonry(material, ring), ring);
    }

    /// Puts hatch lines that fill `ring`; labels standing on them get a mask.
    pub fn hatching(&mut self, lines: Vec<Line>, ring: &[Point]) {
        self.hatching_over(Pen::Hatch, lines, [ring]);
    }

    /// Puts hatch lines that fill several areas, each a closed ring.
    pub fn hatching_over<R: AsRef<[Point]>>(
        &mut self,
        pen: Pen,
        lines: Vec<Line>,
        rings: impl IntoIterator<Item = R>,
    ) {
        let mut path = BezPath::new();
        for line in lines {
            path.move_to(line.p0);
            path.line_to(line.p1);
        }
        if !path.elements().is_empty() {
            rings.into_iter().for_each(|ring| self.ground.hatch(ring.as_ref()));
            self.items.push(Item::Stroke { pen, path: Path(path) });
        }
    }

    /// Wishes for a label; its place is decided at the end, together with all others.
    pub fn note(&mut self, note: Note) {
        self.notes.push(note);
    }

    /// What has been drawn so far, labels not counted.
    pub fn bounds(&self) -> Rect {
        let boxes = self.items.iter().map(|item| match item {
            Item::Stroke { pen, path } => {
                let half = pen.width() / 2.0;
                path.0.bounding_box().inflate(half, half)
            }
            Item::Fill { path, .. } => path.0.bounding_box(),
            Item::Label(label) => label.area(),
        });
        boxes.chain(self.kept).reduce(|a, b| a.union(b)).unwrap_or(Rect::ZERO)
    }

    /// Places the labels, moves everything into the frame and hands over the drawing.
    pub fn finish(mut self, words: Words) -> Drawing {
        let blocks = place::place(&self.notes, &self.ground, self.bounds());
        let mut masks = Vec::new();
        let mut labels = Vec::new();
        for (note, block) in self.notes.iter().zip(&blocks) {
            if let Some(leader) = block.leader {
                let path = Path(leader.to_path(0.1));
                self.items.push(Item::Stroke { pen: Pen::Leader, path });
            }
            if self.ground.hatched(block.area) {
                let area = block.area.inflate(MASK_MARGIN, MASK_MARGIN);
                masks.push(Item::Fill { ink: Ink::Mask, path: Path(area.to_path(0.1)) });
            }
            labels.extend(lines(note, block).map(Item::Label));
        }
        self.items.extend(masks);
        self.items.extend(labels);

        let bounds = self.bounds().inflate(BORDER, BORDER);
        let shift = Vec2::new(-bounds.x0, -bounds.y0);
        for item in &mut self.items {
            match item {
                Item::Stroke { path, .. } | Item::Fill { path, .. } => {
                    path.0.apply_affine(Affine::translate(shift));
                }
                Item::Label(label) => {
                    label.x += shift.x;
                    label.y += shift.y;
                }
            }
        }
        Drawing {
            name: identifier(&words.name),
            caption: words.caption,
            scale: words.scale,
            alt: words.alt,
            width: bounds.width(),
            height: bounds.height(),
            items: self.items,
        }
    }
}

/// A name of letters, digits and `-`.
fn identifier(name: &str) -> String {
    name.chars().map(|c| if c.is_ascii_alphanumeric() { c } else { '-' }).collect()
}

/// The lines of a placed note.
fn lines<'a>(note: &'a Note, block: &'a Block) -> impl Iterator<Item = Label> + 'a {
    note.lines.iter().enumerate().map(move |(index, text)| {
        let extent = text.extent(note.size);
        // Distance of this baseline from the head of the block.
        let down = note.first_ascent() + index as f64 * note.pitch();
        let (anchor, along) = match block.align {
            a if a > 0.0 => (Anchor::Start, 0.0),
            a if a < 0.0 => (Anchor::End, note.width()),
            _ => (Anchor::Middle, note.width() / 2.0),
        };
        let (x, y) = match block.rotate {
            false => (block.area.x0 + along, block.area.y0 + down),
            true => (block.area.x0 + down, block.area.y1 - along),
        };
        Label {
            x,
            y,
            anchor,
            size: note.size,
            rotate: if block.rotate { -90.0 } else { 0.0 },
            runs: text.0.clone(),
            width: extent.width,
            height: extent.ascent + extent.descent,
            ascent: extent.ascent,
            role: note.role,
        }
    })
}

/// An open path through points.
pub fn polyline(points: &[Point]) -> BezPath {
    let mut elements = Vec::with_capacity(points.len());
    for (index, point) in points.iter().enumerate() {
        elements.push(if index == 0 { PathEl::MoveTo(*point) } else { PathEl::LineTo(*point) });
    }
    BezPath::from_vec(elements)
}

/// A closed path through points.
pub fn polygon(points: &[Point]) -> BezPath {
    let mut path = polyline(points);
    path.close_path();
    path
}

/// The corners of a rectangle, in turn.
pub fn corners(rect: Rect) -> [Point; 4] {
    let r = rect.abs();
    [(r.x0, r.y0), (r.x1, r.y0), (r.x1, r.y1), (r.x0, r.y1)].map(Point::from)
}
