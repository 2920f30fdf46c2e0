//! Outlines of walls in plan: ends run on to the walls that they meet, and what of a line lies outside others.

use std::collections::HashMap;

use kurbo::{Line, Point, Shape, Vec2};

use super::board::polygon;
use super::grid::Grid;
use super::plan::{Fate, PlanWall};
use super::scale::Scale;

/// How far walls that meet end to end run into each other, mm: they are one body, without a line between.
const INTO: f64 = 1.0;

/// Walls on the paper, each with what happens to it.
pub struct Rings {
    /// In the order of the walls.
    pub all: Vec<(Fate, [Point; 4])>,
    by_place: Grid,
}

impl Rings {
    /// Walls with their ends run on to those that they meet.
    pub fn new<'a>(walls: impl Iterator<Item = &'a PlanWall>, scale: Scale) -> Self {
        let walls: Vec<&PlanWall> = walls.collect();
        let ends = Ends::new(&walls);
        let mut rings = Self { all: Vec::new(), by_place: Grid::default() };
        for wall in &walls {
            let ring = ends.to_corners(wall, &walls).ring(scale);
            rings.by_place.add(polygon(&ring).bounding_box());
            rings.all.push((wall.fate, ring));
        }
        rings
    }

    /// The wanted ones of those that may touch `ring`, in order.
    pub fn touching(&self, ring: &[Point; 4], wanted: impl Fn(usize) -> bool) -> Vec<[Point; 4]> {
        let near = self.by_place.near(polygon(ring).bounding_box());
        near.into_iter().filter(|n| wanted(*n)).map(|n| self.all[n].1).collect()
    }
}

/// Ends of walls by their place in squares of a metre.
struct Ends(HashMap<(i64, i64), Vec<usize>>);

impl Ends {
    fn new(walls: &[&PlanWall]) -> Self {
        let mut ends: HashMap<(i64, i64), Vec<usize>> = HashMap::new();
        for (n, wall) in walls.iter().enumerate() {
            for end in [wall.from, wall.to] {
                ends.entry(square(end)).or_default().push(n);
            }
        }
        Self(ends)
    }

    /// Walls that may end within a millimetre of a point.
    fn near(&self, (x, y): (f64, f64)) -> impl Iterator<Item = usize> {
        let mut squares =
            [(-1.0, -1.0), (-1.0, 1.0), (1.0, -1.0), (1.0, 1.0)].map(|(i, k)| square((x + i, y + k)));
        squares.sort_unstable();
        let distinct =
            (0..4).filter(move |i| *i == 0 || squares[*i] != squares[i - 1]).map(move |i| squares[i]);
        distinct.filter_map(|at| self.0.get(&at)).flatten().copied()
    }

    /// The wall with its ends run on to the far faces of walls that it meets at a corner, and into walls that go
    /// on in its line.
    fn to_corners(&self, wall: &PlanWall, walls: &[&PlanWall]) -> PlanWall {
        let along = Vec2::new(wall.to.0 - wall.from.0, wall.to.1 - wall.from.1).normalize();
        let run_on = |end: (f64, f64)| {
            let reach = |n: usize| {
                let other = walls[n];
                let near = |p: (f64, f64)| (p.0 - end.0).hypot(p.1 - end.1) < 1.0;
                let way = Vec2::new(other.to.0 - other.from.0, other.to.1 - other.from.1).normalize();
                let turn = way.cross(along).abs();
                match near(other.from) || near(other.to) {
                    true if turn > 0.99 => other.thickness / 2.0,
                    true if turn < 0.01 && !std::ptr::eq(other, wall) => INTO,
                    _ => 0.0,
                }
            };
            self.near(end).map(reach).fold(0.0, f64::max)
        };
        let (back, ahead) = (along * run_on(wall.from), along * run_on(wall.to));
        PlanWall {
            from: (wall.from.0 - back.x, wall.from.1 - back.y),
            to: (wall.to.0 + ahead.x, wall.to.1 + ahead.y),
            ..wall.clone()
        }
    }
}

fn square((x, y): (f64, f64)) -> (i64, i64) {
    ((x / 1000.0).floor() as i64, (y / 1000.0).floor() as i64)
}

/// The pieces of a line outside all of the given convex rings.
pub fn outside(line: Line, rings: &[[Point; 4]]) -> Vec<Line> {
    let mut pieces = vec![(0.0_f64, 1.0_f64)];
    for ring in rings {
        let Some((enter, leave)) = within(line, ring) else {
            continue;
        };
        pieces = pieces
            .into_iter()
            .flat_map(|(a, b)| [(a, b.min(enter)), (a.max(leave), b)])
            .filter(|(a, b)| (b - a) * line.p0.distance(line.p1) > 0.02)
            .collect();
    }
    pieces.into_iter().map(|(a, b)| Line::new(line.eval_at(a), line.eval_at(b))).collect()
}

/// The part of a line strictly inside a convex ring.
fn within(line: Line, ring: &[Point; 4]) -> Option<(f64, f64)> {
    let centre =
        Point::new(ring.iter().map(|p| p.x).sum::<f64>() / 4.0, ring.iter().map(|p| p.y).sum::<f64>() / 4.0);
    let (mut enter, mut leave) = (0.0_f64, 1.0_f64);
    for side in 0..4 {
        let (a, b) = (ring[side], ring[(side + 1) % 4]);
        let mut normal = (b - a).turn_90().normalize();
        if normal.dot(centre - a) < 0.0 {
            normal = -normal;
        }
        // A line along a face is not inside: both walls show it, one on the other.
        let (from, step) = (normal.dot(line.p0 - a) - 1e-6, normal.dot(line.p1 - line.p0));
        if step.abs() < 1e-12 {
            if from <= 0.0 {
                return None;
            }
        } else {
            let at = -from / step;
            if step > 0.0 { enter = enter.max(at) } else { leave = leave.min(at) }
        }
    }
    (enter < leave).then_some((enter, leave))
}

/// Helper on lines.
trait At {
    /// The point at a share of the length.
    fn eval_at(&self, share: f64) -> Point;
}

impl At for Line {
    fn eval_at(&self, share: f64) -> Point {
        self.p0.lerp(self.p1, share)
    }
}
