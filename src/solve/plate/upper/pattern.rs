//! Few long cracks out of many short lines.

use super::Crack;
use super::nodes::Point;

/// Price of a crack in the programme for the drawing, as a length added to it over the height of the panel.
pub const JOINT: f64 = 0.02;

/// Cracks that turn by less than this part of the largest are left out.
const SLIGHT: f64 = 0.02;

/// Neighbours whose rotations differ by less than this part are one crack.
const ALIKE: f64 = 0.1;

/// Adds up lines that lie on each other, drops the slight ones and joins neighbours that turn alike.
///
/// `size` is the longer side of the panel, mm.
pub fn tidy(cracks: &[Crack], size: f64) -> Vec<Crack> {
    let mut rows: Vec<Vec<Crack>> = Vec::new();
    for crack in cracks {
        let row = rows.iter_mut().find(|row| in_line(&row[0], crack, size));
        match row {
            Some(row) => row.push(*crack),
            None => rows.push(vec![*crack]),
        }
    }
    let summed = rows.iter().map(|row| sum(row, size)).collect::<Vec<_>>();
    let largest = summed.iter().flatten().map(|c| c.rotation.abs()).fold(0.0, f64::max);
    let strong = |row: Vec<Crack>| row.into_iter().filter(|c| c.rotation.abs() > SLIGHT * largest).collect();
    let joined = summed.into_iter().map(strong).flat_map(|row: Vec<Crack>| join(row, size));
    joined.map(|c| Crack { rotation: c.rotation / largest, ..c }).collect()
}

/// Whether two cracks lie on one straight line; a hinge and a crack never count as one.
fn in_line(one: &Crack, other: &Crack, size: f64) -> bool {
    one.hinge == other.hinge && [other.from, other.to].iter().all(|&p| distance(one, p) < 1e-6 * size)
}

/// Direction of a crack.
fn direction(c: &Crack) -> Point {
    let (dx, dy) = (c.to.0 - c.from.0, c.to.1 - c.from.1);
    let length = dx.hypot(dy);
    (dx / length, dy / length)
}

/// How far a point lies beside the line of a crack, mm.
fn distance(c: &Crack, p: Point) -> f64 {
    let along = direction(c);
    (along.0 * (p.1 - c.from.1) - along.1 * (p.0 - c.from.0)).abs()
}

/// Cuts the cracks of one line at all their ends and adds up the rotations of what overlaps.
fn sum(row: &[Crack], size: f64) -> Vec<Crack> {
    let along = direction(&row[0]);
    let place = |p: Point| along.0 * p.0 + along.1 * p.1;
    let mut ends = row.iter().flat_map(|c| [c.from, c.to]).collect::<Vec<_>>();
    ends.sort_by(|p, q| place(*p).total_cmp(&place(*q)));
    ends.dedup_by(|next, kept| place(*next) - place(*kept) < 1e-6 * size);
    let piece = |pair: &[Point]| {
        let middle = (place(pair[0]) + place(pair[1])) / 2.0;
        let over = row.iter().filter(|c| place(c.from) < middle && middle < place(c.to));
        Crack { from: pair[0], to: pair[1], rotation: over.map(|c| c.rotation).sum(), hinge: row[0].hinge }
    };
    ends.windows(2).map(piece).collect()
}

/// Joins pieces in order along one line where they meet and turn alike; the longer piece weighs more.
fn join(row: Vec<Crack>, size: f64) -> Vec<Crack> {
    let length = |c: &Crack| (c.to.0 - c.from.0).hypot(c.to.1 - c.from.1);
    let mut joined: Vec<Crack> = Vec::new();
    for piece in row {
        match joined.last_mut() {
            Some(last) if meet(last, &piece, size) && alike(last.rotation, piece.rotation) => {
                let (a, b) = (length(last), length(&piece));
                last.rotation = (last.rotation * a + piece.rotation * b) / (a + b);
                last.to = piece.to;
            }
            _ => joined.push(piece),
        }
    }
    joined
}

fn meet(left: &Crack, right: &Crack, size: f64) -> bool {
    (left.to.0 - right.from.0).hypot(left.to.1 - right.from.1) < 1e-6 * size
}

/// The same sign, and the difference a small part of the larger.
fn alike(a: f64, b: f64) -> bool {
    a * b > 0.0 && (a - b).abs() <= ALIKE * a.abs().max(b.abs())
}
