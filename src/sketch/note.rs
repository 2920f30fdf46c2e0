//! A label that waits for its place, and the spots where it may stand.

use kurbo::{Line, Point, Rect};

use super::drawing::Role;
use super::text::{POINT, Text};

/// A label that waits for its place.
#[derive(Clone, Debug)]
pub struct Note {
    /// The lines of text, set one below the other.
    pub lines: Vec<Text>,
    /// Type size, pt.
    pub size: f64,
    /// What the label is for.
    pub role: Role,
    /// What a leader points at.
    pub target: Point,
    /// Where it may stand.
    pub spots: Vec<Spot>,
    /// Placed earlier the lower it is.
    pub rank: u8,
}

/// A place where a label may stand.
#[derive(Clone, Copy, Debug)]
pub struct Spot {
    /// The point that the block of text hangs on.
    pub at: Point,
    /// -1: the block ends at the point's left; 0: centred on it; 1: starts at its right.
    pub across: f64,
    /// -1: the block stands above the point; 0: centred on it; 1: hangs below.
    pub down: f64,
    /// Reads upwards.
    pub rotate: bool,
    /// Whether a leader joins it to the target.
    pub leader: bool,
    /// How much it is disliked.
    pub cost: f64,
}

/// A label's decided place.
#[derive(Clone, Debug)]
pub struct Block {
    /// The paper it covers.
    pub area: Rect,
    /// How its lines are aligned: as [`Spot::across`].
    pub align: f64,
    /// Reads upwards.
    pub rotate: bool,
    /// Its leader.
    pub leader: Option<Line>,
    /// How much it is disliked.
    pub cost: f64,
}

impl Spot {
    /// A spot beside, above or below a point, in the direction given by signs.
    pub fn new(at: impl Into<Point>, across: f64, down: f64) -> Self {
        Self { at: at.into(), across, down, rotate: false, leader: false, cost: 0.0 }
    }

    /// Text that reads upwards.
    pub fn upwards(at: impl Into<Point>, across: f64, down: f64) -> Self {
        Self { rotate: true, ..Self::new(at, across, down) }
    }

    /// The same spot, liked less.
    pub fn cost(self, cost: f64) -> Self {
        Self { cost, ..self }
    }

    /// The same spot with a leader to the target.
    pub fn led(self) -> Self {
        Self { leader: true, ..self }
    }
}

impl Note {
    /// Words at 8 pt that name `target`.
    pub fn new(role: Role, target: impl Into<Point>, text: Text) -> Self {
        let target = target.into();
        Self { lines: vec![text], size: 8.0, role, target, spots: Vec::new(), rank: 2 }
    }

    /// A further line below.
    pub fn line(mut self, text: Text) -> Self {
        self.lines.push(text);
        self
    }

    /// A further line of words below, unless they are empty.
    pub fn words(self, text: &str) -> Self {
        if text.is_empty() { self } else { self.line(Text::plain(text)) }
    }

    /// A spot, each further one liked a little less.
    pub fn spot(mut self, spot: Spot) -> Self {
        let later = 0.2 * self.spots.len() as f64;
        self.spots.push(spot.cost(spot.cost + later));
        self
    }

    /// Spots right, left, above and below the target at a distance.
    pub fn around(self, gap: f64) -> Self {
        let t = self.target;
        self.spot(Spot::new((t.x + gap, t.y), 1.0, 0.0))
            .spot(Spot::new((t.x - gap, t.y), -1.0, 0.0))
            .spot(Spot::new((t.x, t.y - gap), 0.0, -1.0))
            .spot(Spot::new((t.x, t.y + gap), 0.0, 1.0))
    }

    /// Placed before notes of higher rank.
    pub fn rank(mut self, rank: u8) -> Self {
        self.rank = rank;
        self
    }

    /// Distance between two baselines, mm.
    pub(super) fn pitch(&self) -> f64 {
        1.25 * self.size * POINT
    }

    /// Width of the longest line, mm.
    pub(super) fn width(&self) -> f64 {
        self.lines.iter().map(|line| line.extent(self.size).width).fold(0.0, f64::max)
    }

    /// Ink of the first line above its baseline, mm.
    pub(super) fn first_ascent(&self) -> f64 {
        self.lines[0].extent(self.size).ascent
    }

    /// Height of the block of lines, mm.
    pub(super) fn height(&self) -> f64 {
        let last = self.lines.last().map_or(0.0, |line| line.extent(self.size).descent);
        self.first_ascent() + self.pitch() * (self.lines.len() - 1) as f64 + last
    }

    /// The block of text at a spot; `size` is its width and height before turning.
    pub(super) fn block(&self, spot: &Spot, size: (f64, f64)) -> Block {
        let (w, h) = if spot.rotate { (size.1, size.0) } else { size };
        let x0 = spot.at.x + (spot.across - 1.0) / 2.0 * w;
        let y0 = spot.at.y + (spot.down - 1.0) / 2.0 * h;
        let area = Rect::new(x0, y0, x0 + w, y0 + h);
        let leader = spot.leader.then(|| Line::new(nearest_handle(area, self.target), self.target));
        let align = if spot.rotate { 0.0 } else { spot.across };
        Block { area, align, rotate: spot.rotate, leader, cost: spot.cost }
    }
}

/// Where a leader meets the text: the middle of its nearer end, or the middle of its nearer side.
fn nearest_handle(area: Rect, target: Point) -> Point {
    let c = area.center();
    let gap = 0.4;
    if target.x < area.x0 {
        Point::new(area.x0 - gap, c.y)
    } else if target.x > area.x1 {
        Point::new(area.x1 + gap, c.y)
    } else if target.y < area.y0 {
        Point::new(target.x.clamp(area.x0, area.x1), area.y0 - gap)
    } else {
        Point::new(target.x.clamp(area.x0, area.x1), area.y1 + gap)
    }
}
