//! Drawings as SVG, for looking at them while working on them. Not part of the pack.

use ttf_parser::OutlineBuilder;

use super::drawing::{Anchor, Drawing, Item, Label, Style};
use super::pen::{Ink, Pen};
use super::text::{POINT, SUB_DROP, SUB_SIZE, face};

/// Writes a drawing to the folder named by `PERPEND_PREVIEW`, if it is set.
pub fn show(drawing: &Drawing, suffix: &str) {
    if let Ok(folder) = std::env::var("PERPEND_PREVIEW") {
        let path = format!("{folder}/{}{suffix}.svg", drawing.name);
        std::fs::write(path, svg(drawing)).expect("the preview folder can be written");
    }
}

/// The drawing as SVG with the glyphs of the embedded faces as outlines.
pub fn svg(drawing: &Drawing) -> String {
    let (w, h) = (drawing.width, drawing.height);
    let mut out = format!(
        "<svg xmlns='http://www.w3.org/2000/svg' width='{w}mm' height='{}mm' viewBox='0 0 {w} {}'>\n<rect width='{w}' height='{}' fill='white'/><rect width='{w}' height='{h}' fill='none' stroke='#ccc' stroke-width='.1'/>\n",
        h + 5.0,
        h + 5.0,
        h + 5.0
    );
    for item in &drawing.items {
        out += &match item {
            Item::Stroke { pen, path } => format!(
                "<path d='{}' fill='none' stroke='black' stroke-width='{}' stroke-linejoin='round' {}/>\n",
                path.0.to_svg(),
                pen.width(),
                match pen {
                    Pen::Removed => "stroke-dasharray='2 1'",
                    Pen::Axis => "stroke-dasharray='4 .8 .4 .8'",
                    _ => "",
                }
            ),
            Item::Fill { ink, path } => format!(
                "<path d='{}' fill='{}'/>\n",
                path.0.to_svg(),
                match ink {
                    Ink::Arrow => "black",
                    Ink::Stress => "#d4d4d4",
                    _ => "white",
                }
            ),
            Item::Label(label) => text(label),
        };
    }
    let mut caption = Label {
        x: 1.0,
        y: h + 3.6,
        anchor: Anchor::Start,
        size: 8.0,
        rotate: 0.0,
        runs: super::text::Text::plain(&format!("{}  {}", drawing.caption, drawing.scale)).0,
        width: 0.0,
        height: 0.0,
        ascent: 0.0,
        role: super::drawing::Role::Note,
    };
    caption.width = 1.0;
    out + &text(&caption) + "</svg>\n"
}

fn text(label: &Label) -> String {
    let shift = match label.anchor {
        Anchor::Start => 0.0,
        Anchor::Middle => -label.width / 2.0,
        Anchor::End => -label.width,
    };
    let em = label.size * POINT;
    let mut outline = Outline::default();
    let mut x = shift;
    for run in &label.runs {
        let (size, drop) = match run.style {
            Style::Sub => (em * SUB_SIZE, em * SUB_DROP),
            _ => (em, 0.0),
        };
        let face = face(run.style);
        let unit = size / f64::from(face.units_per_em());
        for c in run.text.chars() {
            let glyph = face.glyph_index(c).unwrap_or_default();
            (outline.x, outline.y, outline.unit) = (x, drop, unit);
            face.outline_glyph(glyph, &mut outline);
            x += unit * f64::from(face.glyph_hor_advance(glyph).unwrap_or(0));
        }
    }
    format!(
        "<path transform='translate({} {}) rotate({})' d='{}'/>\n",
        label.x, label.y, label.rotate, outline.d
    )
}

#[derive(Default)]
struct Outline {
    d: String,
    x: f64,
    y: f64,
    unit: f64,
}

impl Outline {
    fn put(&mut self, command: &str, points: &[(f32, f32)]) {
        self.d += command;
        for (x, y) in points {
            let (x, y) = (self.x + self.unit * f64::from(*x), self.y - self.unit * f64::from(*y));
            self.d += &format!("{x:.3} {y:.3} ");
        }
    }
}

impl OutlineBuilder for Outline {
    fn move_to(&mut self, x: f32, y: f32) {
        self.put("M", &[(x, y)]);
    }
    fn line_to(&mut self, x: f32, y: f32) {
        self.put("L", &[(x, y)]);
    }
    fn quad_to(&mut self, x1: f32, y1: f32, x: f32, y: f32) {
        self.put("Q", &[(x1, y1), (x, y)]);
    }
    fn curve_to(&mut self, x1: f32, y1: f32, x2: f32, y2: f32, x: f32, y: f32) {
        self.put("C", &[(x1, y1), (x2, y2), (x, y)]);
    }
    fn close(&mut self) {
        self.d += "Z";
    }
}
