//! Pens and inks by name. ISO 128 line widths; the reason for each stands beside it.

/// The pen of a stroke.
#[derive(Clone, Copy, Debug, PartialEq, Eq, serde::Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Pen {
    /// Outline of masonry that the drawing cuts through: the heaviest line, 0.5 mm.
    Cut,
    /// Visible outline, 0.35 mm.
    Outline,
    /// What lies behind, 0.18 mm.
    Beyond,
    /// What is taken out, 0.35 mm dashed.
    Removed,
    /// Dimension and extension lines, 0.18 mm.
    Dimension,
    /// A link that is not known to be there, 0.7 mm dashed: heavier than what is.
    Open,
    /// A crack that opens on the face away from the wind, 0.7 mm: heavier than any outline.
    Sagging,
    /// A dash of a crack that opens on the face towards the wind, 0.7 mm. The drawing lays the dashes out itself, so
    /// that even a short crack has a gap.
    Hogging,
    /// Rings along a support that turns, 0.25 mm.
    Hinge,
    /// Hatching of cut material and of supported edges, 0.13 mm.
    Hatch,
    /// Hatching of what moves, 0.13 mm and grey: cracks run across it.
    Moved,
    /// Shafts of actions, 0.35 mm.
    Load,
    /// Supports, 0.5 mm.
    Support,
    /// Curves of stress, moment and shear, 0.35 mm.
    Diagram,
    /// Centre lines, 0.18 mm chain-dashed.
    Axis,
    /// From a label to what it names, 0.18 mm.
    Leader,
}

impl Pen {
    /// Line width, mm (ISO 128-2 series; which width for which line is common practice).
    pub const fn width(self) -> f64 {
        match self {
            Pen::Open | Pen::Sagging | Pen::Hogging => 0.7,
            Pen::Cut | Pen::Support => 0.5,
            Pen::Outline | Pen::Removed | Pen::Load | Pen::Diagram => 0.35,
            Pen::Hinge => 0.25,
            Pen::Beyond | Pen::Dimension | Pen::Axis | Pen::Leader => 0.18,
            Pen::Hatch | Pen::Moved => 0.13,
        }
    }

    /// Whether a label must keep off a stroke of this pen. Hatching may be masked under a label.
    pub const fn keeps_labels_off(self) -> bool {
        !matches!(self, Pen::Hatch | Pen::Moved)
    }
}

/// The ink of a filled area.
#[derive(Clone, Copy, Debug, PartialEq, Eq, serde::Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Ink {
    /// White, hiding what lies below.
    Paper,
    /// Light grey: masonry in compression.
    Stress,
    /// Black: arrowheads.
    Arrow,
    /// White: an opening.
    Opening,
    /// White, under a label that stands on hatching.
    Mask,
}
