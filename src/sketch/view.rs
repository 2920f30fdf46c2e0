//! What several drawings are told in the same words: sides, layers of a wall, actions.

use kurbo::{Point, Vec2};

use super::hatch::Material;
use super::scale::Scale;
use super::text::Text;

/// Left or right on the drawing.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Side {
    /// On the left.
    Left,
    /// On the right.
    Right,
}

/// One layer of a wall.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Layer {
    /// A leaf of masonry.
    Leaf {
        /// Actual thickness, mm.
        thickness: f64,
        /// What it is built of.
        material: Material,
    },
    /// A cavity.
    Cavity {
        /// Width, mm.
        width: f64,
    },
}

/// An action with its value as it is printed: `N_1`, `42.0 kN`, `beam B1`.
#[derive(Clone, Debug, PartialEq)]
pub struct Action {
    /// Symbol, as a name: `N_Ed`; may be empty.
    pub symbol: String,
    /// Number and unit.
    pub value: String,
    /// What it comes from; may be empty.
    pub words: String,
}

/// How the wind blows on the outer wall.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Wind {
    /// Onto its outer face.
    Toward,
    /// Off its outer face: suction.
    Away,
}

impl Layer {
    /// Thickness or width, mm.
    pub fn thickness(&self) -> f64 {
        match self {
            Layer::Leaf { thickness, .. } => *thickness,
            Layer::Cavity { width } => *width,
        }
    }
}

/// Thickness of all layers together, mm.
pub fn thickness(layers: &[Layer]) -> f64 {
    layers.iter().map(Layer::thickness).sum()
}

/// `100 mm block, 75 mm cavity, 102.5 mm brick`.
pub fn layer_words(layers: &[Layer]) -> String {
    let words: Vec<String> = layers
        .iter()
        .map(|layer| match layer {
            Layer::Leaf { thickness, material } => {
                format!("{} mm {}", super::dimension::mm(*thickness), material.word())
            }
            Layer::Cavity { width } => format!("{} mm cavity", super::dimension::mm(*width)),
        })
        .collect();
    words.join(", ")
}

/// What the hatching stands for: `; single hatching: brick, paired: block`.
pub(super) fn hatch_key(layers: &[Layer]) -> String {
    let has =
        |wanted| layers.iter().any(|l| matches!(l, Layer::Leaf { material, .. } if *material == wanted));
    let kinds = [
        (Material::Brick, "single hatching: brick"),
        (Material::Block, "paired hatching: block"),
        (Material::Concrete, "strewn strokes: concrete"),
    ];
    kinds.iter().filter(|(kind, _)| has(*kind)).map(|(_, words)| format!("; {words}")).collect()
}

impl Action {
    /// An action of symbol, value and origin.
    pub fn new(symbol: &str, value: &str, words: &str) -> Self {
        Self { symbol: symbol.into(), value: value.into(), words: words.into() }
    }

    /// `N_1 = 42.0 kN`.
    pub(super) fn text(&self) -> Text {
        Text::value(&self.symbol, &self.value)
    }

    /// Words for the spoken text: `N_1 = 42.0 kN (beam B1)`.
    pub(super) fn spoken(&self) -> String {
        let value = match self.symbol.is_empty() {
            true => self.value.clone(),
            false => format!("{} = {}", self.symbol.replace('_', ""), self.value),
        };
        if self.words.is_empty() { value } else { format!("{value} ({})", self.words) }
    }
}

/// From full size to paper: x to the right (or left, mirrored), y up.
#[derive(Clone, Copy)]
pub(super) struct Ruler {
    pub scale: Scale,
    /// 1, or -1 where the drawing is mirrored.
    pub hand: f64,
}

impl Ruler {
    pub fn new(scale: Scale, wall: Side) -> Self {
        Self { scale, hand: if wall == Side::Left { 1.0 } else { -1.0 } }
    }

    /// A full-size place on the paper.
    pub fn at(&self, x: f64, y: f64) -> Point {
        Point::new(self.hand * self.scale.paper(x), -self.scale.paper(y))
    }

    /// A full-size place, moved by paper millimetres, to the free side and up.
    pub fn by(&self, x: f64, y: f64, dx: f64, dy: f64) -> Point {
        self.at(x, y) + Vec2::new(self.hand * dx, -dy)
    }

    /// Paper direction that is to the right on an unmirrored drawing.
    pub fn right(&self) -> Vec2 {
        Vec2::new(self.hand, 0.0)
    }
}
