//! What stands in the box: lines of small print drawn as outlines.
//!
//! Outlines and no text: the faces inside a pack hold only the letters that its sheets have, and PDF/A wants every letter
//! embedded. What they say stands as text in the signature itself.

use std::fmt::Write as _;

use ttf_parser::{Face, GlyphId, OutlineBuilder};

use crate::sketch::text::upright;

/// Size of the letters, points.
const SIZE: f32 = 6.6;
/// From line to line, points.
const PITCH: f32 = 7.9;
/// The lowest line above the rule, points.
const ABOVE: f32 = 3.4;

/// The drawing of lines, the last just above the foot of the box, as a PDF's content stream. A line wider than `width`
/// points is cut, and an ellipsis says so.
pub fn content(lines: &[String], width: f32) -> Vec<u8> {
    let face = upright();
    let scale = SIZE / f32::from(face.units_per_em());
    let mut pen = Pen { out: String::new(), scale, x: 0.0, y: 0.0, at: (0.0, 0.0) };
    for (up, line) in lines.iter().rev().enumerate() {
        pen.x = 0.0;
        pen.y = ABOVE + PITCH * up as f32;
        for glyph in fitting(face, line, width / scale) {
            face.outline_glyph(glyph, &mut pen);
            pen.x += scale * advance(face, glyph);
        }
    }
    if !pen.out.is_empty() {
        pen.out.push_str("f\n");
    }
    pen.out.into_bytes()
}

fn advance(face: &Face<'_>, glyph: GlyphId) -> f32 {
    f32::from(face.glyph_hor_advance(glyph).unwrap_or(0))
}

/// The glyphs of a line, as many as fit into `room` font units.
fn fitting(face: &Face<'_>, line: &str, room: f32) -> Vec<GlyphId> {
    let glyph = |c: char| face.glyph_index(c).or_else(|| face.glyph_index('?')).unwrap_or(GlyphId(0));
    let mut all: Vec<GlyphId> = line.chars().map(glyph).collect();
    let wide = |all: &[GlyphId]| all.iter().map(|g| advance(face, *g)).sum::<f32>() > room;
    if wide(&all) {
        all.push(glyph('…'));
        while wide(&all) && all.len() > 1 {
            all.remove(all.len() - 2);
        }
    }
    all
}

/// Writes outlines as path operators.
struct Pen {
    out: String,
    scale: f32,
    x: f32,
    y: f32,
    /// Where the pen stands, font units.
    at: (f32, f32),
}

impl Pen {
    fn write(&mut self, points: &[(f32, f32)], operator: &str) {
        for (x, y) in points {
            let (x, y) = (self.x + self.scale * x, self.y + self.scale * y);
            let _ = write!(self.out, "{x:.2} {y:.2} ");
        }
        self.out.push_str(operator);
        self.out.push('\n');
        if let Some(last) = points.last() {
            self.at = *last;
        }
    }
}

impl OutlineBuilder for Pen {
    fn move_to(&mut self, x: f32, y: f32) {
        self.write(&[(x, y)], "m");
    }

    fn line_to(&mut self, x: f32, y: f32) {
        self.write(&[(x, y)], "l");
    }

    // A PDF has cubic curves alone: the same curve raised by a degree.
    fn quad_to(&mut self, x1: f32, y1: f32, x: f32, y: f32) {
        let third = |from: f32, to: f32| from + (to - from) * 2.0 / 3.0;
        let (x0, y0) = self.at;
        let first = (third(x0, x1), third(y0, y1));
        let second = (third(x, x1), third(y, y1));
        self.write(&[first, second, (x, y)], "c");
    }

    fn curve_to(&mut self, x1: f32, y1: f32, x2: f32, y2: f32, x: f32, y: f32) {
        self.write(&[(x1, y1), (x2, y2), (x, y)], "c");
    }

    fn close(&mut self) {
        self.out.push_str("h\n");
    }
}

#[cfg(test)]
mod tests {
    use super::content;

    /// The largest number before an operator: how far ink goes.
    fn reach(content: &[u8]) -> (f32, f32) {
        let text = String::from_utf8(content.to_vec()).expect("operators are text");
        let numbers = |line: &str| line.split(' ').filter_map(|w| w.parse::<f32>().ok()).collect::<Vec<_>>();
        let points: Vec<_> = text
            .lines()
            .flat_map(|l| numbers(l).chunks(2).map(|p| (p[0], p[1])).collect::<Vec<_>>())
            .collect();
        points.iter().fold((0.0, 0.0), |(x, y): (f32, f32), p| (x.max(p.0), y.max(p.1)))
    }

    #[test]
    fn lines_stay_in_their_box() {
        let long = "certificate CN=A name that goes on and on, ".repeat(9);
        let three = [long.clone(), long.clone(), long];
        let (x, y) = reach(&content(&three, 250.0));
        assert!(x > 200.0 && x <= 250.0, "{x}");
        assert!(y > 20.0 && y <= super::ABOVE + 3.0 * super::PITCH, "{y}");
        let (short, _) = reach(&content(&["R. Hollin".to_owned()], 250.0));
        assert!(short > 20.0 && short < 40.0, "{short}");
        assert!(content(&[], 250.0).is_empty());
        // A letter without a glyph still leaves its mark.
        assert!(!content(&["\u{E123}".to_owned()], 250.0).is_empty());
    }
}
