//! Where returns and panels lie on the plan, as far as the job says: for the key plan only.

use kurbo::{Point, Vec2};

use crate::building::{Building, Edge, Panel, PlanWall, Return};
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

/// A return along the line of the removed wall: from the cut outwards where its position lies beyond an end of
/// that wall, else centred on its position; a point where that line is not known; nothing where it has no
/// position.
pub fn of_return(b: &Building, r: &Return) -> Option<Stretch> {
    if let Some(wall) = b.plan.iter().find(|w| w.mark == r.mark) {
        return Some(stretch(point(wall.from), point(wall.to)));
    }
    let at = point(r.position?);
    let Some(wall) = removed(b) else { return Some(stretch(at, at)) };
    let length = r.length.base();
    let (from, to) = (point(wall.from), point(wall.to));
    let along = (to - from).normalize();
    for (cut, out) in [(from, -along), (to, along)] {
        let (on, off) = ((at - cut).dot(out), (at - cut).cross(out).abs());
        if off <= MISS && (0.0..=length).contains(&on) {
            return Some(stretch(cut, cut + out * length));
        }
    }
    let half = along * (length / 2.0);
    Some(stretch(at - half, at + half))
}

/// How far the lengths of panels and of their walls may differ, mm: one is clear, the other from line to line.
const CLEAR: f64 = 500.0;
/// How far lines that are given apart from each other may miss, mm: a return and the wall it is left of, a panel and
/// the end that the removed wall held.
const MISS: f64 = 150.0;

/// A panel after the removal: between the walls that hold it; else from where the removed wall met it; else in
/// the middle of its wall where it is about as long. Nothing where that leaves its place open. Left and right
/// are seen from outside.
pub fn of_panel(b: &Building, p: &Panel) -> Option<Stretch> {
    let on = On::of(b, p)?;
    if let Some(ends) = p.after.ends {
        return Some(on.between(ends));
    }
    let length = p.after.length.base();
    let whole = (on.to - on.from).hypot();
    if let (Some(met), Some(at)) = (on.met, p.wall_at) {
        let left = met - on.right * at.base();
        return Some(stretch(left, left + on.right * length));
    }
    let spare = whole - length;
    (spare <= CLEAR).then(|| {
        let left = if on.right.dot(on.to - on.from) > 0.0 { on.from } else { on.to };
        stretch(left + on.right * (spare / 2.0), left + on.right * (spare / 2.0 + length))
    })
}

/// A panel before the removal: between the walls that held it; else the part of the panel after it on one
/// side of the removed wall. Nothing where the job leaves open which side that was.
pub fn of_panel_before(b: &Building, p: &Panel) -> Option<Stretch> {
    let on = On::of(b, p)?;
    if let Some(ends) = p.before.ends {
        return Some(on.between(ends));
    }
    let (before, after) = (p.before.length.base(), p.after.length.base());
    let (start, end) = of_panel(b, p)?;
    if before >= after {
        return Some((start, end));
    }
    let (start, end) = (point_of(start), point_of(end));
    let (left, right) = if on.right.dot(end - start) > 0.0 { (start, end) } else { (end, start) };
    let at = p.wall_at?.base();
    let [of_left, of_right] = [(at - before).abs() <= MISS, (after - at - before).abs() <= MISS];
    // Where both sides are as long, the end that stayed as it was tells which of them it is.
    let stayed = |x: &Edge, y: &Edge| x.kind == y.kind && x.reason == y.reason;
    let [same_left, same_right] =
        [stayed(&p.before.left, &p.after.left), stayed(&p.before.right, &p.after.right)];
    match (of_left && (!of_right || same_left), of_right && (!of_left || same_right)) {
        (true, false) => Some(stretch(left, left + on.right * before)),
        (false, true) => Some(stretch(right - on.right * before, right)),
        _ => None,
    }
}

/// The plan wall that a panel is part of.
struct On {
    from: Point,
    to: Point,
    /// Along the wall, to the right as seen from outside.
    right: Vec2,
    /// Where the removed wall met its line.
    met: Option<Point>,
}

impl On {
    fn of(b: &Building, p: &Panel) -> Option<Self> {
        let wall = b.plan.iter().find(|w| Some(&w.mark) == p.on.as_ref())?;
        let (from, to) = (point(wall.from), point(wall.to));
        let axis = (to - from).normalize();
        let met = removed(b).map(|gone| from + axis * (point(gone.from) - from).dot(axis));
        // Looking at the wall from outside, the building lies ahead and right is a quarter turn clockwise.
        let ahead = centre(b) - met.unwrap_or(from.midpoint(to));
        let right = if axis.dot(Vec2::new(ahead.y, -ahead.x)) >= 0.0 { axis } else { -axis };
        Some(Self { from, to, right, met })
    }

    /// Between two places along x, or along y where the wall runs so.
    fn between(&self, (a, z): (Length, Length)) -> Stretch {
        let (a, z) = (a.base(), z.base());
        match (self.to - self.from).x.abs() >= (self.to - self.from).y.abs() {
            true => ((a, self.from.y), (z, self.from.y)),
            false => ((self.from.x, a), (self.from.x, z)),
        }
    }
}

fn point_of((x, y): (f64, f64)) -> Point {
    Point::new(x, y)
}

/// The middle of everything on the plan.
fn centre(b: &Building) -> Point {
    let ends: Vec<Point> = b.plan.iter().flat_map(|w| [point(w.from), point(w.to)]).collect();
    let sum = ends.iter().fold(Vec2::ZERO, |s, p| s + p.to_vec2());
    (sum / ends.len().max(1) as f64).to_point()
}

#[cfg(test)]
mod tests {
    use super::*;

    const DEMO: &str = include_str!("../../jobs/rear-opening.toml");

    fn read(text: &str) -> Building {
        crate::job::read("job.toml", text).unwrap_or_else(|e| panic!("{}", e.render(false)))
    }

    /// Start and end along x, in whole mm.
    fn along(stretch: Option<Stretch>) -> Option<(i64, i64)> {
        stretch.map(|(a, z)| (a.0.round() as i64, z.0.round() as i64))
    }

    #[test]
    fn a_return_begins_where_the_wall_is_cut() {
        let b = read(DEMO);
        let [r1, r2] = [0, 1].map(|i| of_return(&b, &b.returns[i]).expect("it has a position"));
        assert_eq!((r1.0.1.round(), r1.1.1.round()), (1029.0, 139.0));
        assert_eq!((r2.0.1.round(), r2.1.1.round()), (2760.0, 3550.0));
    }

    #[test]
    fn a_panel_before_lies_on_the_side_whose_end_stayed() {
        let b = read(DEMO);
        let whole = |i: usize| along(of_panel(&b, &b.panels[i]));
        // P1 keeps its length. P2 was half as long: its left end stayed, the right one is another.
        assert_eq!(whole(0), Some((100, 3200)));
        assert_eq!(along(of_panel_before(&b, &b.panels[0])), whole(0));
        assert_eq!(whole(1), Some((100, 6300)));
        assert_eq!(along(of_panel_before(&b, &b.panels[1])), Some((100, 3200)));
        let (head, tail) = DEMO.rsplit_once("[panels.before]").expect("P2 is the last panel");
        let right = tail.replacen("\"Party wall, toothed.\"", "\"Kitchen wall.\"", 1).replacen(
            "\"continuous\", reason = \"Kitchen wall, bonded; the wall runs on.\"",
            "\"simple\", reason = \"Flank wall, bonded.\"",
            1,
        );
        let other = read(&format!("{head}[panels.before]{right}"));
        assert_eq!(along(of_panel_before(&other, &other.panels[1])), Some((3200, 6300)));
    }

    #[test]
    fn a_panel_whose_place_before_is_open_is_not_drawn() {
        let (head, tail) = DEMO.rsplit_once("[panels.before]").expect("P2 is the last panel");
        // Neither end is as it was, or it is as long as neither side.
        for (old, new) in [("Party wall, toothed.", "Another wall."), ("3.10 m", "2.60 m")] {
            let b = read(&format!("{head}[panels.before]{}", tail.replacen(old, new, 1)));
            assert_eq!(of_panel_before(&b, &b.panels[1]), None, "{new}");
        }
    }

    #[test]
    fn walls_that_hold_a_panel_give_its_place() {
        let b = read(include_str!("../../jobs/semi.toml"));
        assert_eq!(along(of_panel_before(&b, &b.panels[0])), Some((0, 3200)));
        assert_eq!(along(of_panel(&b, &b.panels[0])), Some((0, 3200)));
    }
}
