//! Where returns and panels lie on the plan, as far as the job says: for the key plan only.

use kurbo::{Point, Vec2};

use crate::building::{Building, Panel, PlanWall, Return};
use crate::quantity::Length;

/// A stretch of the plan, mm.
type Stretch = ((f64, f64), (f64, f64));

fn point((x, y): (Length, Length)) -> Point {
    Point::new(x.base(), y.base())
}

fn stretch(a: Point, b: Point) -> Stretch {
    ((a.x, a.y), (b.x, b.y))
}

/// The removed wall, where the plan has it.
fn removed(b: &Building) -> Option<&PlanWall> {
    b.plan.iter().find(|w| w.removed)
}

/// A return, centred on its position and along the line of the removed wall; a point where that line
/// is not known; nothing where it has no position.
pub fn of_return(b: &Building, r: &Return) -> Option<Stretch> {
    if let Some(wall) = b.plan.iter().find(|w| w.mark == r.mark) {
        return Some(stretch(point(wall.from), point(wall.to)));
    }
    let middle = point(r.position?);
    let Some(wall) = removed(b) else { return Some(stretch(middle, middle)) };
    let along = (point(wall.to) - point(wall.from)).normalize();
    let half = along * (r.length.base() / 2.0);
    Some(stretch(middle - half, middle + half))
}

/// A panel on its wall: from where the removed wall met it, or the whole wall where that is not said.
/// Left and right are seen from outside.
pub fn of_panel(b: &Building, p: &Panel) -> Option<Stretch> {
    let wall = b.plan.iter().find(|w| Some(&w.mark) == p.on.as_ref())?;
    let (from, to) = (point(wall.from), point(wall.to));
    let whole = Some(stretch(from, to));
    let (Some(gone), Some(at)) = (removed(b), p.wall_at) else { return whole };
    let axis = (to - from).normalize();
    let met = from + axis * (point(gone.from) - from).dot(axis);
    // Looking at the wall from outside, the building lies ahead and right is a quarter turn clockwise.
    let ahead = centre(b) - met;
    let right = Vec2::new(ahead.y, -ahead.x);
    let right = if axis.dot(right) >= 0.0 { axis } else { -axis };
    let start = met - right * at.base();
    Some(stretch(start, start + right * p.after.length.base()))
}

/// The middle of everything on the plan.
fn centre(b: &Building) -> Point {
    let ends: Vec<Point> = b.plan.iter().flat_map(|w| [point(w.from), point(w.to)]).collect();
    let sum = ends.iter().fold(Vec2::ZERO, |s, p| s + p.to_vec2());
    (sum / ends.len().max(1) as f64).to_point()
}
