//! What a finished sheet prints, with its place: runs of text, and the marks drawn over them.

use typst::layout::{Abs, Frame, FrameItem, Point, Size, Transform};
use typst::text::{FontFlags, TextItem};
use typst::visualize::{self, Curve, CurveItem, Geometry, Shape};
use typst_layout::Page;

use crate::quantity::colour::{CONTRAST, Colour};

/// Type smaller than this is not for reading, points: common practice, no published source.
const LEAST: f64 = 5.0;

/// The text and the marks of one sheet, each in the order in which they print.
#[derive(Default)]
pub(super) struct Sheet {
    pub(super) inks: Vec<Ink>,
    pub(super) marks: Vec<Mark>,
    size: Size,
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
    /// Its colour; nothing for a gradient or a pattern.
    paint: Option<Paint>,
    /// How much larger or smaller it prints than its size says.
    scale: f64,
    /// Whether its middle lies in a part of a group that is cut off.
    clipped: bool,
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
    /// The colour of its area; nothing for a picture, a gradient or a pattern.
    paint: Option<Paint>,
    stroked: bool,
    order: usize,
}

/// A colour and how far it covers, 0 to 1.
#[derive(Clone, Copy)]
struct Paint {
    colour: Colour,
    covers: f64,
}

impl Paint {
    fn of(paint: &visualize::Paint) -> Option<Self> {
        let visualize::Paint::Solid(colour) = paint else { return None };
        let [r, g, b, covers] = colour.to_vec4_u8();
        Some(Self { colour: Colour { rgb: [r, g, b] }, covers: f64::from(covers) / 255.0 })
    }

    /// What is seen of it on a ground.
    fn on(self, ground: Colour) -> Colour {
        let mix = |i: usize| {
            let (own, under) = (f64::from(self.colour.rgb[i]), f64::from(ground.rgb[i]));
            (under + (own - under) * self.covers).round() as u8
        };
        Colour { rgb: [mix(0), mix(1), mix(2)] }
    }
}

/// Boxes outside which nothing prints: those of the groups around, as corners.
type Clips = Vec<(Point, Point)>;

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
    /// Everything that a page prints.
    pub(super) fn of(page: &Page) -> Self {
        let mut sheet = Self { size: page.frame.size(), ..Self::default() };
        if let Some(ground) = page.fill_or_transparent() {
            let paths = vec![rectangle(sheet.size)];
            let paint = Paint::of(&ground);
            sheet.marks.push(Mark { paths, filled: true, paint, stroked: false, order: 0 });
        }
        sheet.walk(&page.frame, Transform::identity(), &Clips::new());
        sheet
    }

    /// The text that a reader sees: on the sheet, large enough, in contrast with its ground, and with nothing over it.
    pub(super) fn legible(&self) -> impl Iterator<Item = &Ink> {
        self.inks.iter().filter(|ink| {
            let at = ink.centre();
            let on_sheet =
                Abs::zero() < at.x && at.x < self.size.x && Abs::zero() < at.y && at.y < self.size.y;
            let large = ink.size.to_pt() * ink.scale >= LEAST;
            let under = |mark: &&Mark| mark.filled && mark.covers(at);
            let covered = self.marks.iter().filter(under).any(|mark| mark.order > ink.order);
            on_sheet && large && !ink.clipped && !covered && self.contrast(ink) >= CONTRAST
        })
    }

    /// Contrast of text with the areas that print before it where it stands; 1 where one of the two is no plain colour.
    fn contrast(&self, ink: &Ink) -> f64 {
        let at = ink.centre();
        let below = self.marks.iter().filter(|mark| mark.filled && mark.order < ink.order && mark.covers(at));
        let mut ground = Some(Colour::PAPER);
        for mark in below {
            ground = match (mark.paint, ground) {
                (Some(paint), Some(ground)) => Some(paint.on(ground)),
                // A whole coat hides what lay below, whatever that was.
                (Some(paint), None) if paint.covers == 1.0 => Some(paint.colour),
                _ => None,
            };
        }
        match (ink.paint, ground) {
            (Some(paint), Some(ground)) => paint.on(ground).contrast_on(ground),
            _ => 1.0,
        }
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

    fn walk(&mut self, frame: &Frame, outer: Transform, clips: &Clips) {
        for (at, item) in frame.items() {
            let here = outer.pre_concat(Transform::translate(at.x, at.y));
            let order = self.inks.len() + self.marks.len();
            match item {
                FrameItem::Group(group) => {
                    let inner = here.pre_concat(group.transform);
                    // Behind a clip without corners nothing is seen.
                    let own =
                        group.clip.as_ref().map(|clip| bounds(&outline(clip), inner).unwrap_or_default());
                    self.walk(&group.frame, inner, &clips.iter().copied().chain(own).collect());
                }
                FrameItem::Text(text) => self.inks.extend(ink(text, here, clips, order)),
                FrameItem::Shape(shape, _) => self.marks.push(mark(shape, here, order)),
                FrameItem::Image(_, size, _) => self.marks.push(picture(*size, here, order)),
                _ => {}
            }
        }
    }
}

/// The ink of one run of text; none for spaces.
fn ink(item: &TextItem, place: Transform, clips: &Clips, order: usize) -> Option<Ink> {
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
    let centre = Point::new((min.x + max.x) / 2.0, (min.y + max.y) / 2.0);
    let inside =
        |(a, z): &(Point, Point)| a.x < centre.x && centre.x < z.x && a.y < centre.y && centre.y < z.y;
    Some(Ink {
        text: item.text.to_string(),
        min,
        max,
        missing,
        size: item.size,
        mathematics,
        paint: Paint::of(&item.fill),
        scale: (place.sx.get() * place.sy.get() - place.kx.get() * place.ky.get()).abs().sqrt(),
        clipped: !clips.iter().all(inside),
        order,
    })
}

fn mark(shape: &Shape, place: Transform, order: usize) -> Mark {
    let mut paths: Vec<Vec<Point>> = vec![vec![Point::zero()]];
    match &shape.geometry {
        Geometry::Line(end) => paths[0].push(*end),
        Geometry::Rect(size) => paths = vec![rectangle(*size)],
        Geometry::Curve(curve) => paths = outline(curve),
    }
    for point in paths.iter_mut().flatten() {
        *point = point.transform(place);
    }
    Mark {
        paths,
        filled: shape.fill.is_some(),
        paint: shape.fill.as_ref().and_then(Paint::of),
        stroked: shape.stroke.is_some(),
        order,
    }
}

/// A picture as the area that it covers.
fn picture(size: Size, place: Transform, order: usize) -> Mark {
    let path = rectangle(size).into_iter().map(|corner| corner.transform(place)).collect();
    Mark { paths: vec![path], filled: true, paint: None, stroked: false, order }
}

fn rectangle(size: Size) -> Vec<Point> {
    vec![Point::zero(), Point::with_x(size.x), size.to_point(), Point::with_y(size.y), Point::zero()]
}

fn outline(curve: &Curve) -> Vec<Vec<Point>> {
    let mut paths = Vec::new();
    for item in &curve.0 {
        corners(item, &mut paths);
    }
    paths
}

/// The box of paths where they come to stand; none without corners.
fn bounds(paths: &[Vec<Point>], place: Transform) -> Option<(Point, Point)> {
    let all = || paths.iter().flatten().map(|corner| corner.transform(place));
    Some((all().reduce(Point::min)?, all().reduce(Point::max)?))
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
