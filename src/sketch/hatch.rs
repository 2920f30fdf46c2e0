//! Hatching of cut masonry and of supported panel edges, clipped to its area.
//!
//! UK drawing convention, common practice, no published source: brickwork single lines at 45°,
//! blockwork the same lines in pairs, concrete short strokes and dots strewn over the area.

use kurbo::{Line, Point, Rect, Shape, Vec2};

use super::board::polygon;

/// What a cut area is made of.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Material {
    /// Single diagonal lines.
    Brick,
    /// Diagonal lines in pairs.
    Block,
    /// Strewn short strokes.
    Concrete,
}

impl Material {
    /// The word for a label.
    pub fn word(self) -> &'static str {
        match self {
            Material::Brick => "brick",
            Material::Block => "block",
            Material::Concrete => "concrete",
        }
    }
}

/// Distance between hatch lines, and within a pair, mm on paper.
const SPACING: f64 = 1.6;
const PAIR: (f64, f64) = (0.6, 2.6);
/// Cell of the strewn strokes and their length, mm on paper.
const STREWN: (f64, f64) = (1.7, 0.7);

/// The strokes that show `ring`, a closed polygon, as cut `material`.
pub fn masonry(material: Material, ring: &[Point]) -> Vec<Line> {
    match material {
        Material::Brick => diagonals(ring, SPACING, 0.0, true),
        Material::Block => {
            let mut lines = diagonals(ring, PAIR.1, 0.0, true);
            lines.extend(diagonals(ring, PAIR.1, PAIR.0, true));
            lines
        }
        Material::Concrete => strewn(ring),
    }
}

/// Lines at 45° across `ring`, `spacing` apart, rising to the right or falling.
///
/// The lines hang on the centre of the area, so that a drawing hatches alike wherever it stands.
pub fn diagonals(ring: &[Point], spacing: f64, offset: f64, rising: bool) -> Vec<Line> {
    let bounds = polygon(ring).bounding_box();
    let (along, normal) = match rising {
        true => (Vec2::new(1.0, -1.0), Vec2::new(1.0, 1.0)),
        false => (Vec2::new(1.0, 1.0), Vec2::new(1.0, -1.0)),
    };
    let (along, normal) = (along.normalize(), normal.normalize());
    let reach = (bounds.width() + bounds.height()) / 2.0;
    let count = (reach / spacing).ceil() as i32;
    (-count..=count)
        .flat_map(|step| {
            let through = bounds.center() + normal * (spacing * f64::from(step) + offset);
            clip(Line::new(through - along * 2.0 * reach, through + along * 2.0 * reach), ring)
        })
        .collect()
}

/// The pieces of a line that lie inside a polygon, even-odd rule.
pub fn clip(line: Line, ring: &[Point]) -> Vec<Line> {
    let run = line.p1 - line.p0;
    let mut cuts: Vec<f64> = sides(ring)
        .filter_map(|(a, b)| {
            let (from, to) = (run.cross(a - line.p0), run.cross(b - line.p0));
            // A corner belongs to one of its two sides only, or it would count twice.
            if (from <= 0.0) == (to <= 0.0) {
                return None;
            }
            let hit = a + (b - a) * (from / (from - to));
            Some((hit - line.p0).dot(run) / run.hypot2())
        })
        .collect();
    cuts.sort_by(f64::total_cmp);
    cuts.chunks_exact(2)
        .filter(|pair| (pair[1] - pair[0]) * run.hypot() > 0.05)
        .map(|pair| Line::new(line.p0 + run * pair[0], line.p0 + run * pair[1]))
        .collect()
}

/// Short strokes in turned cells, the same every time.
fn strewn(ring: &[Point]) -> Vec<Line> {
    let outline = polygon(ring);
    let bounds: Rect = outline.bounding_box();
    let (cell, length) = STREWN;
    let mut state: u32 = 0x2545_f491;
    let mut next = move || {
        state ^= state << 13;
        state ^= state >> 17;
        state ^= state << 5;
        f64::from(state >> 8) / f64::from(1_u32 << 24)
    };
    let columns = (bounds.width() / cell).ceil() as usize;
    let rows = (bounds.height() / cell).ceil() as usize;
    let mut strokes = Vec::new();
    for row in 0..rows {
        for column in 0..columns {
            let centre = bounds.origin() + Vec2::new(column as f64 + next(), row as f64 + next()) * cell;
            let half = Vec2::from_angle(next() * std::f64::consts::PI) * (length / 2.0);
            let stroke = Line::new(centre - half, centre + half);
            strokes.push(stroke);
        }
    }
    strokes.extend(dots(bounds, cell, &mut next));
    strokes.retain(|stroke| outline.contains(stroke.p0) && outline.contains(stroke.p1));
    strokes
}

/// Dots: strokes hardly longer than the pen is wide.
fn dots(bounds: Rect, cell: f64, next: &mut impl FnMut() -> f64) -> Vec<Line> {
    let count = (bounds.area() / (cell * cell)) as usize;
    (0..count)
        .map(|_| {
            let at = bounds.origin() + Vec2::new(next() * bounds.width(), next() * bounds.height());
            Line::new(at, at + Vec2::new(0.12, 0.12))
        })
        .collect()
}

fn sides(ring: &[Point]) -> impl Iterator<Item = (Point, Point)> + '_ {
    ring.iter().zip(ring.iter().cycle().skip(1)).map(|(a, b)| (*a, *b))
}

#[cfg(test)]
mod tests {
    use super::*;

    fn shape() -> Vec<Point> {
        // An L, so that lines are cut in two.
        [(0.0, 0.0), (30.0, 0.0), (30.0, 8.0), (8.0, 8.0), (8.0, 25.0), (0.0, 25.0)].map(Point::from).to_vec()
    }

    #[test]
    fn hatching_stays_inside_its_area_and_fills_it() {
        let outline = polygon(&shape());
        for material in [Material::Brick, Material::Block, Material::Concrete] {
            let lines = masonry(material, &shape());
            assert!(lines.len() > 15, "{material:?} has {} strokes", lines.len());
            for line in &lines {
                for share in [0.02, 0.5, 0.98] {
                    assert!(outline.contains(line.p0.lerp(line.p1, share)), "{material:?} {line:?}");
                }
            }
        }
    }

    #[test]
    fn materials_differ_and_repeat() {
        let [brick, block, concrete] =
            [Material::Brick, Material::Block, Material::Concrete].map(|m| masonry(m, &shape()));
        assert_ne!(brick.len(), block.len());
        assert_eq!(concrete, masonry(Material::Concrete, &shape()));
        assert!(brick.iter().all(|l| ((l.p1 - l.p0).x + (l.p1 - l.p0).y).abs() < 1e-9));
    }

    #[test]
    fn a_line_is_clipped_to_the_pieces_inside() {
        let pieces = clip(Line::new((-5.0, 20.0), (40.0, 20.0)), &shape());
        assert_eq!(pieces.len(), 1);
        assert!((pieces[0].p0.x).abs() < 1e-9 && (pieces[0].p1.x - 8.0).abs() < 1e-9);
        assert!(clip(Line::new((-5.0, 30.0), (40.0, 30.0)), &shape()).is_empty());
    }
}
