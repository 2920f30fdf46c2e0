//! What a finished sheet prints, with its place: runs of text, and the marks drawn over them.

use typst::layout::{Abs, Frame, FrameItem, Point, Transform};
use typst::text::{FontFlags, TextItem};
use typst::visualize::{CurveItem, Geometry, Shape};

/// The text and the marks of one sheet, each in the order in which they print.
#[derive(Default)]
pub(super) struct Sheet {
    pub(super) inks: Vec<Ink>,
    pub(super) marks: Vec<Mark>,
}

/// A run of text with the box of its ink, in points from the sheet's top left corner.
pub(super) struct Ink {
    pub(super) text: String,
    pub(super) min: Point,
    pub(super) max: Point,
    pub(super) missing: bool,
    /// The size of the type, and whether the face is the one for mathematics.
    pub(super) size: Abs,
    pub(super) mathematics: bool,
    order: usize,
}

impl Ink {
    pub(super) fn holds(&self, point: Point) -> bool {
        self.min.x < point.x && point.x < self.max.x && self.min.y < point.y && point.y < self.max.y
    }

    pub(super) fn centre(&self) -> Point {
        Point::new((self.min.x + self.max.x) / 2.0, (self.min.y + self.max.y) / 2.0)
    }
}

/// A drawn shape as the corners that its lines run through.
pub(super) struct Mark {
    paths: Vec<Vec<Point>>,
    filled: bool,
    stroked: bool,
    order: usize,
}

impl Mark {
    /// Whether a line of the mark runs through the ink by more than `slack`.
    fn strikes(&self, ink: &Ink, slack: Abs) -> bool {
        let through = |ends: &[Point]| crosses(ends[0], ends[1], ink, slack);
        self.stroked && self.paths.iter().any(|path| path.windows(2).any(through))
    }

    /// Even-odd rule over the corners.
    fn covers(&self, point: Point) -> bool {
        let crossings = |path: &Vec<Point>| {
            let next = path.iter().cycle().skip(1);
            path.iter()
                .zip(next)
                .filter(|(a, b)| {
                    (a.y > point.y) != (b.y > point.y)
                        && point.x < a.x + (b.x - a.x) * ((point.y - a.y) / (b.y - a.y))
                })
                .count()
        };
        self.paths.iter().map(crossings).sum::<usize>() % 2 == 1
    }
}

/// Whether the line from `a` to `b` enters the ink's box, drawn in by `slack`: the stretch of
/// the line inside the box, as parts of its length, is not empty.
fn crosses(a: Point, b: Point, ink: &Ink, slack: Abs) -> bool {
    let (mut enter, mut leave) = (0.0_f64, 1.0_f64);
    let sides =
        [(a.x, b.x, ink.min.x + slack, ink.max.x - slack), (a.y, b.y, ink.min.y + slack, ink.max.y - slack)];
    for (from, to, low, high) in sides {
        if low >= high {
            return false;
        }
        let run = to - from;
        if run.to_pt().abs() < 1e-9 {
            if from <= low || from >= high {
                return false;
            }
            continue;
        }
        let (first, second) = ((low - from) / run, (high - from) / run);
        enter = enter.max(first.min(second));
        leave = leave.min(first.max(second));
    }
    enter < leave
}

impl Sheet {
    /// Everything that a page's frame prints.
    pub(super) fn of(frame: &Frame) -> Self {
        let mut sheet = Self::default();
        sheet.walk(frame, Transform::identity());
        sheet
    }

    /// Whether the text cannot be read for what is drawn: a line through it, or an area printed
    /// over its middle. A line that printed earlier is harmless where an area printed between
    /// the two clears the ground.
    pub(super) fn spoils(&self, ink: &Ink, slack: Abs) -> bool {
        let areas = || self.marks.iter().filter(|mark| mark.filled && mark.covers(ink.centre()));
        let covered = areas().any(|area| area.order > ink.order);
        let cleared = |line: &Mark| areas().any(|area| line.order < area.order && area.order < ink.order);
        covered || self.marks.iter().any(|mark| mark.strikes(ink, slack) && !cleared(mark))
    }

    fn walk(&mut self, frame: &Frame, outer: Transform) {
        for (at, item) in frame.items() {
            let here = outer.pre_concat(Transform::translate(at.x, at.y));
            let order = self.inks.len() + self.marks.len();
            match item {
                FrameItem::Group(group) => self.walk(&group.frame, here.pre_concat(group.transform)),
                FrameItem::Text(text) => self.inks.extend(ink(text, here, order)),
                FrameItem::Shape(shape, _) => self.marks.push(mark(shape, here, order)),
                _ => {}
            }
        }
    }
}

/// The ink of one run of text; none for spaces.
fn ink(item: &TextItem, place: Transform, order: usize) -> Option<Ink> {
    let bounds = item.bbox();
    if !bounds.min.x.to_pt().is_finite() || item.text.trim().is_empty() {
        return None;
    }
    // Turned labels: the box of the turned corners.
    let corners = [
        bounds.min,
        bounds.max,
        Point::new(bounds.min.x, bounds.max.y),
        Point::new(bounds.max.x, bounds.min.y),
    ]
    .map(|corner| corner.transform(place));
    let min = corners.iter().copied().reduce(Point::min)?;
    let max = corners.iter().copied().reduce(Point::max)?;
    let missing = item.glyphs.iter().any(|glyph| glyph.id == 0);
    let mathematics = item.font.info().flags.contains(FontFlags::MATH);
    Some(Ink { text: item.text.to_string(), min, max, missing, size: item.size, mathematics, order })
}

fn mark(shape: &Shape, place: Transform, order: usize) -> Mark {
    let mut paths: Vec<Vec<Point>> = vec![vec![Point::zero()]];
    match &shape.geometry {
        Geometry::Line(end) => paths[0].push(*end),
        Geometry::Rect(size) => {
            paths[0].extend([Point::with_x(size.x), size.to_point(), Point::with_y(size.y), Point::zero()])
        }
        Geometry::Curve(curve) => {
            paths.clear();
            for item in &curve.0 {
                corners(item, &mut paths);
            }
        }
    }
    for point in paths.iter_mut().flatten() {
        *point = point.transform(place);
    }
    Mark { paths, filled: shape.fill.is_some(), stroked: shape.stroke.is_some(), order }
}

/// One item of a curve as corners; a bend becomes eight short lines.
fn corners(item: &CurveItem, paths: &mut Vec<Vec<Point>>) {
    if let CurveItem::Move(start) = item {
        paths.push(vec![*start]);
        return;
    }
    if paths.is_empty() {
        paths.push(vec![Point::zero()]);
    }
    let Some(path) = paths.last_mut() else { return };
    let from = path.last().copied().unwrap_or_default();
    match item {
        CurveItem::Move(_) => {}
        CurveItem::Line(end) => path.push(*end),
        CurveItem::Cubic(first, second, end) => path.extend((1..=8).map(|step| {
            let t = f64::from(step) / 8.0;
            let u = 1.0 - t;
            from * (u * u * u) + *first * (3.0 * u * u * t) + *second * (3.0 * u * t * t) + *end * (t * t * t)
        })),
        CurveItem::Close => path.push(path[0]),
    }
}
