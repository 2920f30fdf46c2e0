//! What labels must keep off: lines and filled areas, and hatching that a label would hide.

use kurbo::{BezPath, Line, PathEl, Point, Rect, Shape};

use super::board::polygon;
use super::grid::Grid;

/// Clear space between a label and the edge of a line, mm.
const OFF_LINE: f64 = 0.3;

/// What labels must keep off, and what they had better keep off.
#[derive(Default)]
pub struct Ground {
    /// Pieces of line with half their width.
    bars: Vec<(Line, f64)>,
    by_place: Grid,
    /// Hatched areas, as closed rings.
    soft: Vec<Vec<Point>>,
    soft_by_place: Grid,
}

impl Ground {
    /// Adds a path that labels must keep off.
    pub fn bar(&mut self, path: &BezPath, half_width: f64) {
        let (mut start, mut last) = (Point::ZERO, Point::ZERO);
        kurbo::flatten(path, 0.05, |element| match element {
            PathEl::MoveTo(p) => (start, last) = (p, p),
            PathEl::LineTo(p) => {
                self.line(Line::new(last, p), half_width);
                last = p;
            }
            PathEl::ClosePath => {
                self.line(Line::new(last, start), half_width);
                last = start;
            }
            _ => {}
        });
    }

    fn line(&mut self, line: Line, half_width: f64) {
        self.by_place.add_line(line, half_width + OFF_LINE);
        self.bars.push((line, half_width));
    }

    /// Adds a hatched area, a closed ring.
    pub fn hatch(&mut self, ring: &[Point]) {
        self.soft_by_place.add(polygon(ring).bounding_box());
        self.soft.push(ring.to_vec());
    }

    /// Whether a label cannot stand there.
    pub fn blocks(&self, area: Rect) -> bool {
        self.by_place.any_near(area, |n| {
            let (line, half) = self.bars[n];
            let reach = half + OFF_LINE;
            crosses(line, area.inflate(reach, reach))
        })
    }

    /// Whether any hatching lies under an area.
    pub fn hatched(&self, area: Rect) -> bool {
        self.soft_by_place.any_near(area, |n| {
            let ring = &self.soft[n];
            let sides = ring.iter().zip(ring.iter().cycle().skip(1));
            let crossed = sides.clone().any(|(a, b)| crosses(Line::new(*a, *b), area));
            // Even-odd: a ring does not cross itself.
            let centre = area.center();
            let right_of = |(a, b): &(&Point, &Point)| {
                (a.y > centre.y) != (b.y > centre.y)
                    && centre.x < a.x + (b.x - a.x) * ((centre.y - a.y) / (b.y - a.y))
            };
            crossed || sides.filter(right_of).count() % 2 == 1
        })
    }

    /// How many pieces of line a leader runs across.
    pub fn crossed_by(&self, leader: Line) -> usize {
        let near = self.by_place.along(leader);
        near.into_iter().filter(|n| meet(leader, self.bars[*n].0)).count()
    }
}

/// Whether any part of a segment lies in a rectangle.
pub fn crosses(line: Line, area: Rect) -> bool {
    let bounds = Rect::from_points(line.p0, line.p1);
    if bounds.x1 < area.x0 || bounds.x0 > area.x1 || bounds.y1 < area.y0 || bounds.y0 > area.y1 {
        return false;
    }
    let (p, d) = (line.p0, line.p1 - line.p0);
    let (mut enter, mut leave) = (0.0_f64, 1.0_f64);
    for (start, step, low, high) in [(p.x, d.x, area.x0, area.x1), (p.y, d.y, area.y0, area.y1)] {
        if step.abs() < 1e-12 {
            if start < low || start > high {
                return false;
            }
        } else {
            let (a, b) = ((low - start) / step, (high - start) / step);
            enter = enter.max(a.min(b));
            leave = leave.min(a.max(b));
        }
    }
    enter <= leave
}

/// Whether two segments meet.
pub fn meet(a: Line, b: Line) -> bool {
    let (u, v, w) = (a.p1 - a.p0, b.p1 - b.p0, b.p0 - a.p0);
    let det = u.cross(v);
    if det.abs() < 1e-12 {
        return false;
    }
    let (s, t) = (w.cross(v) / det, w.cross(u) / det);
    (0.0..=1.0).contains(&s) && (0.0..=1.0).contains(&t)
}

/// A segment without its last `gap` millimetres.
pub fn shortened(line: Line, gap: f64) -> Line {
    let run = line.p1 - line.p0;
    let length = run.hypot();
    if length <= gap { line } else { Line::new(line.p0, line.p1 - run * (gap / length)) }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_line_crosses_an_area_that_it_touches_inside_only() {
        let area = Rect::new(0.0, 0.0, 10.0, 5.0);
        assert!(crosses(Line::new((-1.0, 2.0), (11.0, 2.0)), area));
        assert!(crosses(Line::new((3.0, 1.0), (4.0, 2.0)), area));
        assert!(!crosses(Line::new((-1.0, 6.0), (11.0, 6.0)), area));
        assert!(!crosses(Line::new((-3.0, 2.0), (2.0, 8.0)), area));
    }

    #[test]
    fn a_label_keeps_off_a_stroke_and_its_width() {
        let mut ground = Ground::default();
        ground.bar(
            &BezPath::from_vec(vec![PathEl::MoveTo((0.0, 0.0).into()), PathEl::LineTo((10.0, 0.0).into())]),
            0.25,
        );
        assert!(ground.blocks(Rect::new(2.0, 0.5, 4.0, 2.0)));
        assert!(!ground.blocks(Rect::new(2.0, 0.6, 4.0, 2.0)));
    }
}
