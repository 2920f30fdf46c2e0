//! The finished drawing as data: every position decided, nothing left to the page but pens and type.
//!
//! Coordinates are millimetres on paper, x to the right, y **down**, origin at the top left corner
//! of the frame. The page maps pen names to line widths and sets the labels; it moves nothing.

use kurbo::{BezPath, PathEl, Rect};
use serde::ser::{Serialize, SerializeSeq, Serializer};

use super::pen::{Ink, Pen};

/// One annotated drawing, ready to be set on a page.
#[derive(Clone, Debug, serde::Serialize)]
pub struct Drawing {
    /// Identifier of letters, digits and `-`, such as `R1-elevation`.
    pub name: String,
    /// Printed under the drawing.
    pub caption: String,
    /// `1:20`, or `not to scale`.
    pub scale: String,
    /// Spoken text, made from the data that made the strokes.
    pub alt: String,
    /// Width of the frame, mm on paper.
    #[serde(serialize_with = "rounded")]
    pub width: f64,
    /// Height of the frame, mm on paper.
    #[serde(serialize_with = "rounded")]
    pub height: f64,
    /// What is drawn, in drawing order.
    pub items: Vec<Item>,
}

/// One mark on the paper.
#[derive(Clone, Debug, serde::Serialize)]
#[serde(tag = "kind", rename_all = "kebab-case")]
pub enum Item {
    /// A line, open or closed.
    Stroke {
        /// Its pen.
        pen: Pen,
        /// Its course.
        path: Path,
    },
    /// A filled area.
    Fill {
        /// Its ink.
        ink: Ink,
        /// Its outline, closed.
        path: Path,
    },
    /// One line of text.
    Label(Label),
}

/// One line of text at a decided place.
#[derive(Clone, Debug, serde::Serialize)]
pub struct Label {
    /// Horizontal place of the anchor, mm.
    #[serde(serialize_with = "rounded")]
    pub x: f64,
    /// Height of the baseline at the anchor, mm.
    #[serde(serialize_with = "rounded")]
    pub y: f64,
    /// Which end of the baseline `(x, y)` is.
    pub anchor: Anchor,
    /// Type size, pt.
    pub size: f64,
    /// 0, or -90 for text that reads upwards.
    pub rotate: f64,
    /// The text in runs of one style.
    pub runs: Vec<Run>,
    /// Advance width of the unrotated line, mm.
    #[serde(serialize_with = "rounded")]
    pub width: f64,
    /// Height of the unrotated line's ink above and below the baseline, mm.
    #[serde(serialize_with = "rounded")]
    pub height: f64,
    /// The part of `height` above the baseline, mm.
    #[serde(skip)]
    pub ascent: f64,
    /// What the label is for.
    pub role: Role,
}

/// Which end of the baseline a label hangs on.
#[derive(Clone, Copy, Debug, PartialEq, Eq, serde::Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Anchor {
    /// The left end of the line of text.
    Start,
    /// Its middle.
    Middle,
    /// Its right end.
    End,
}

/// What a label is for; the page may give each its own weight.
#[derive(Clone, Copy, Debug, PartialEq, Eq, serde::Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Role {
    /// A measured length.
    Dimension,
    /// An action and its value.
    Load,
    /// The mark of an element: R1, P2.
    Mark,
    /// Words.
    Note,
}

/// Text of one style within a line.
#[derive(Clone, Debug, PartialEq, Eq, serde::Serialize)]
pub struct Run {
    /// The characters.
    pub text: String,
    /// How they are set.
    pub style: Style,
}

/// How a run is set.
#[derive(Clone, Copy, Debug, PartialEq, Eq, serde::Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Style {
    /// Upright.
    Plain,
    /// Italic: a variable.
    Italic,
    /// Upright subscript.
    Sub,
    /// Semibold: a mark.
    Bold,
}

/// A path that serialises as `["M",x,y] ["L",x,y] ["C",x1,y1,x2,y2,x,y] ["Z"]`.
#[derive(Clone, Debug, PartialEq)]
pub struct Path(pub BezPath);

impl Label {
    /// The area the label covers on the paper, rotation included.
    pub fn area(&self) -> Rect {
        let shift = match self.anchor {
            Anchor::Start => 0.0,
            Anchor::Middle => -self.width / 2.0,
            Anchor::End => -self.width,
        };
        let descent = self.height - self.ascent;
        if self.rotate == 0.0 {
            let x = self.x + shift;
            Rect::new(x, self.y - self.ascent, x + self.width, self.y + descent)
        } else {
            // Turned anticlockwise: the line runs upwards, its head looks left.
            let y = self.y - shift;
            Rect::new(self.x - self.ascent, y - self.width, self.x + descent, y)
        }
    }

    /// The text without its styles; a subscript follows its base directly.
    pub fn plain(&self) -> String {
        self.runs.iter().map(|run| run.text.as_str()).collect()
    }
}

impl Drawing {
    /// The labels, in drawing order.
    pub fn labels(&self) -> impl Iterator<Item = &Label> {
        self.items.iter().filter_map(|item| match item {
            Item::Label(label) => Some(label),
            _ => None,
        })
    }

    /// The strokes of one pen, in drawing order.
    pub fn strokes(&self, wanted: Pen) -> impl Iterator<Item = &BezPath> {
        self.items.iter().filter_map(move |item| match item {
            Item::Stroke { pen, path } if *pen == wanted => Some(&path.0),
            _ => None,
        })
    }
}

/// A thousandth of a millimetre is finer than any printer.
fn round(value: f64) -> f64 {
    let rounded = (value * 1000.0).round() / 1000.0;
    if rounded == 0.0 { 0.0 } else { rounded }
}

fn rounded<S: Serializer>(value: &f64, serializer: S) -> Result<S::Ok, S::Error> {
    serializer.serialize_f64(round(*value))
}

impl Serialize for Path {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        let mut segments = serializer.serialize_seq(None)?;
        for element in self.0.elements() {
            match *element {
                PathEl::MoveTo(p) => segments.serialize_element(&("M", round(p.x), round(p.y)))?,
                PathEl::LineTo(p) => segments.serialize_element(&("L", round(p.x), round(p.y)))?,
                PathEl::QuadTo(..) => {
                    return Err(serde::ser::Error::custom("a sketch has no quadratic curves"));
                }
                PathEl::CurveTo(a, b, p) => segments.serialize_element(&(
                    "C",
                    round(a.x),
                    round(a.y),
                    round(b.x),
                    round(b.y),
                    round(p.x),
                    round(p.y),
                ))?,
                PathEl::ClosePath => segments.serialize_element(&("Z",))?,
            }
        }
        segments.end()
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn items_serialise_in_the_form_the_page_reads() {
        let path = BezPath::from_svg("M0 0 L10.00049 0 C1 2 3 4 5 6 Z").expect("valid path");
        let stroke = Item::Stroke { pen: Pen::Cut, path: Path(path) };
        assert_eq!(
            serde_json::to_string(&stroke).expect("serialises"),
            r#"{"kind":"stroke","pen":"cut","path":[["M",0.0,0.0],["L",10.0,0.0],["C",1.0,2.0,3.0,4.0,5.0,6.0],["Z"]]}"#
        );
        let label = Item::Label(Label {
            x: 1.0,
            y: 2.0,
            anchor: Anchor::Start,
            size: 8.0,
            rotate: -90.0,
            runs: vec![
                Run { text: "N".into(), style: Style::Italic },
                Run { text: "Ed".into(), style: Style::Sub },
            ],
            width: 5.0,
            height: 2.0,
            ascent: 1.5,
            role: Role::Load,
        });
        assert_eq!(
            serde_json::to_string(&label).expect("serialises"),
            r#"{"kind":"label","x":1.0,"y":2.0,"anchor":"start","size":8.0,"rotate":-90.0,"runs":[{"text":"N","style":"italic"},{"text":"Ed","style":"sub"}],"width":5.0,"height":2.0,"role":"load"}"#
        );
    }

    #[test]
    fn a_turned_label_covers_paper_upwards_from_its_anchor() {
        let label = |rotate, anchor| Label {
            x: 10.0,
            y: 20.0,
            anchor,
            size: 8.0,
            rotate,
            runs: vec![],
            width: 6.0,
            height: 3.0,
            ascent: 2.0,
            role: Role::Note,
        };
        assert_eq!(label(0.0, Anchor::End).area(), Rect::new(4.0, 18.0, 10.0, 21.0));
        assert_eq!(label(-90.0, Anchor::Start).area(), Rect::new(8.0, 14.0, 11.0, 20.0));
        assert_eq!(label(-90.0, Anchor::Middle).area(), Rect::new(8.0, 17.0, 11.0, 23.0));
    }
}
