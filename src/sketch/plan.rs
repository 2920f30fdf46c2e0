//! Walls in plan, shared by the key plan and the stability plan: outlines that run into each
//! other at junctions, hatching (crossed where a wall is new), what goes, north and wind.

use kurbo::{Line, Point, Vec2};

use super::board::{Board, polygon};
use super::drawing::Role;
use super::hatch::{self, Material};
use super::load;
use super::note::{Note, Spot};
use super::pen::{Ink, Pen};
use super::rings::{Rings, outside};
use super::scale::Scale;
use super::text::Text;

/// A wall in plan, given by its centre line.
#[derive(Clone, Debug)]
pub struct PlanWall {
    /// Its name; may be empty.
    pub name: String,
    /// Start of its centre line, mm, x to the right, y up.
    pub from: (f64, f64),
    /// End of its centre line, mm.
    pub to: (f64, f64),
    /// Thickness, mm.
    pub thickness: f64,
    /// What happens to it.
    pub fate: Fate,
    /// Doors and windows, in order along it.
    pub openings: Vec<Gap>,
}

/// A door or window in a wall on plan.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Gap {
    /// From the start of the centre line, mm.
    pub from: f64,
    /// Where it ends, mm.
    pub to: f64,
    /// Wall stands under it.
    pub window: bool,
}

/// What happens to a wall.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Fate {
    /// It stays.
    Stays,
    /// It is taken out.
    Removed,
    /// It is new.
    Added,
}

/// Which of two plans a drawing is.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum When {
    /// As the walls stand: what will come out stands, what is new does not.
    Before,
    /// What came out is dashed, what is new is there.
    After,
}

impl When {
    /// Whether a wall is solid on this plan.
    pub fn shows(self, fate: Fate) -> bool {
        fate != if self == When::Before { Fate::Added } else { Fate::Removed }
    }

    /// The word for captions.
    pub fn word(self) -> &'static str {
        if self == When::Before { "before" } else { "after" }
    }
}

/// Walls thinner than this on paper (mm) are not hatched: the lines would run together.
const HATCHED: f64 = 1.3;
/// Distance between the crossed hatch lines of a new wall, mm on paper.
const CROSSED: f64 = 1.1;

impl PlanWall {
    /// The four corners on the paper.
    pub fn ring(&self, scale: Scale) -> [Point; 4] {
        let (from, to) = (paper(scale, self.from), paper(scale, self.to));
        let side = (to - from).normalize().turn_90() * scale.paper(self.thickness / 2.0);
        [from + side, to + side, to - side, from - side]
    }

    /// A stretch of it from `from` to `to` along its centre line, mm, without openings.
    fn stretch(&self, from: f64, to: f64) -> Self {
        let at = |s: f64| {
            let share = s / self.length();
            (self.from.0 + share * (self.to.0 - self.from.0), self.from.1 + share * (self.to.1 - self.from.1))
        };
        Self { from: at(from), to: at(to), openings: Vec::new(), ..self.clone() }
    }

    /// What stands of it between its openings.
    fn pieces(&self) -> Vec<Self> {
        if self.openings.is_empty() {
            return vec![self.clone()];
        }
        let begins = std::iter::once(0.0).chain(self.openings.iter().map(|o| o.to));
        let ends = self.openings.iter().map(|o| o.from).chain([self.length()]);
        begins.zip(ends).filter(|(a, b)| b - a > 1.0).map(|(a, b)| self.stretch(a, b)).collect()
    }

    /// The middle of its centre line on the paper.
    pub fn middle(&self, scale: Scale) -> Point {
        paper(scale, self.from).midpoint(paper(scale, self.to))
    }

    /// Length of the centre line, mm.
    pub fn length(&self) -> f64 {
        (self.to.0 - self.from.0).hypot(self.to.1 - self.from.1)
    }
}

/// A place on the plan on the paper.
pub fn paper(scale: Scale, (x, y): (f64, f64)) -> Point {
    Point::new(scale.paper(x), -scale.paper(y))
}

/// Draws walls: what stands in one body, what went dashed; on the plan before, short lines across what
/// comes out show where it is cut.
pub fn walls(board: &mut Board, walls: &[PlanWall], scale: Scale, when: When) {
    let pieces: Vec<PlanWall> = walls.iter().flat_map(PlanWall::pieces).collect();
    let standing = Rings::new(pieces.iter().filter(|w| when.shows(w.fate)), scale);
    let removed = |w: &&PlanWall| when == When::After && w.fate == Fate::Removed;
    let removed = Rings::new(pieces.iter().filter(removed), scale);
    for (index, (fate, ring)) in standing.all.iter().enumerate() {
        // Where two walls share ground, the later one leaves it to the earlier.
        let thick = (ring[0] - ring[3]).hypot();
        let added = *fate == Fate::Added;
        if added || thick >= HATCHED {
            let mut lines = hatch::masonry(Material::Brick, ring);
            if added {
                lines = hatch::diagonals(ring, CROSSED, 0.0, true);
                lines.extend(hatch::diagonals(ring, CROSSED, 0.0, false));
            }
            let earlier = standing.touching(ring, |other| other < index);
            let lines = lines.into_iter().flat_map(|line| outside(line, &earlier)).collect();
            board.hatching(lines, ring);
        }
    }
    outlines(board, Pen::Cut, &standing, None);
    outlines(board, Pen::Removed, &removed, Some(&standing));
    for wall in walls.iter().filter(|w| when.shows(w.fate)) {
        windows(board, wall, scale);
    }
    if when == When::Before {
        for wall in walls.iter().filter(|wall| wall.fate == Fate::Removed) {
            cuts(board, wall, scale);
        }
    }
}

/// Thin lines along the faces of the wall under a window.
fn windows(board: &mut Board, wall: &PlanWall, scale: Scale) {
    for gap in wall.openings.iter().filter(|o| o.window) {
        let [a, b, c, d] = wall.stretch(gap.from, gap.to).ring(scale);
        board.line(Pen::Beyond, a, b);
        board.line(Pen::Beyond, d, c);
    }
}

/// How far the line of a cut runs beyond the faces of the wall, mm on paper.
const BEYOND_FACE: f64 = 1.2;

/// Lines across the two ends of a wall that comes out.
fn cuts(board: &mut Board, wall: &PlanWall, scale: Scale) {
    let [a, b, c, d] = wall.ring(scale);
    for (one, other) in [(a, d), (b, c)] {
        let out = (one - other).normalize() * BEYOND_FACE;
        board.line(Pen::Beyond, one + out, other - out);
    }
}

/// Outlines without the pieces that lie inside another wall, or inside what stands.
fn outlines(board: &mut Board, pen: Pen, rings: &Rings, solid: Option<&Rings>) {
    for (index, (_, ring)) in rings.all.iter().enumerate() {
        let mut others = solid.map_or_else(Vec::new, |solid| solid.touching(ring, |_| true));
        others.extend(rings.touching(ring, |other| other != index));
        for side in 0..4 {
            let line = Line::new(ring[side], ring[(side + 1) % 4]);
            for piece in outside(line, &others) {
                board.line(pen, piece.p0, piece.p1);
            }
        }
    }
}

/// How much further off a wall its label may stand, clear of the lines across the wall, mm on paper.
const FURTHER: f64 = 1.5;

/// A label for a wall: beside its middle, or further along it, or a line of text further off.
pub fn wall_note(wall: &PlanWall, scale: Scale, note: Note) -> Note {
    let (from, to) = (paper(scale, wall.from), paper(scale, wall.to));
    let near = scale.paper(wall.thickness / 2.0) + 1.0;
    let upright = (to - from).x.abs() < (to - from).y.abs();
    let mut note = Note { target: wall.middle(scale), ..note };
    let shares = [0.5, 0.35, 0.65, 0.2, 0.8];
    for (half, share) in [near, near + FURTHER].into_iter().flat_map(|off| shares.map(|share| (off, share))) {
        let at = from.lerp(to, share);
        let (a, b) = match upright {
            true => (Spot::new((at.x + half, at.y), 1.0, 0.0), Spot::new((at.x - half, at.y), -1.0, 0.0)),
            false => (Spot::new((at.x, at.y - half), 0.0, -1.0), Spot::new((at.x, at.y + half), 0.0, 1.0)),
        };
        note = note.spot(a).spot(b);
    }
    note
}

/// North point: a circle whose needle points `degrees` clockwise from the top of the sheet.
pub fn north(board: &mut Board, centre: Point, degrees: f64) {
    let radius = 4.0;
    let up = Vec2::from_angle((degrees - 90.0).to_radians());
    let side = up.turn_90();
    load::circle(board, Pen::Beyond, centre, radius);
    let (tip, foot) = (centre + up * radius, centre - up * radius);
    board.fill(Ink::Arrow, polygon(&[tip, centre + side * 1.1, centre - side * 1.1]));
    board.stroke(Pen::Beyond, polygon(&[foot, centre + side * 1.1, centre - side * 1.1]));
    let beyond = tip + up * 2.4;
    board.note(Note::new(Role::Note, beyond, Text::plain("N")).spot(Spot::new(beyond, 0.0, 0.0)).rank(0));
}

/// Length of a wind arrow, mm on paper.
pub const WIND: f64 = 9.0;

/// A wind arrow that blows `along` at `tip`, with its words behind it.
pub fn wind(board: &mut Board, tip: Point, along: Vec2, words: &str) {
    let tail = tip - along * WIND;
    load::open_arrow(board, tail, tip);
    let middle = tail.midpoint(tip);
    let (x, y) = (along.x.abs() * 2.0, along.y.abs() * 2.0);
    let note = Note::new(Role::Load, middle, Text::plain(words))
        .spot(Spot::new(tail - along * 1.5, -along.x.round(), -along.y.round()))
        .spot(Spot::new((middle.x, middle.y - 3.0 - y), 0.0, -1.0).cost(1.0))
        .spot(Spot::new((middle.x + 3.0 + x, middle.y), 1.0, 0.0).cost(1.0));
    board.note(note.rank(1));
}

/// Width and height that walls cover, full size, mm.
pub fn size(walls: &[PlanWall]) -> (f64, f64) {
    let extent = extent(walls, Scale(1.0));
    (extent.width(), extent.height())
}

/// Extent of walls on the paper.
pub fn extent(walls: &[PlanWall], scale: Scale) -> kurbo::Rect {
    let points = walls.iter().flat_map(|wall| wall.ring(scale));
    points.map(|p| kurbo::Rect::from_points(p, p)).reduce(|a, b| a.union(b)).unwrap_or(kurbo::Rect::ZERO)
}
