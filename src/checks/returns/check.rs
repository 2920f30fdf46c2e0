//! The checks of a return, in the order of its sheet.

use super::model::{At, Model};

/// One check of a return in one case. The order is the order on the sheet.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Check {
    /// Overturning at the foot.
    Overturning,
    /// Toe at the foot.
    Toe,
    /// Shear at the foot.
    Shear,
    /// Sliding at the dpc.
    Sliding,
    /// Shear at a bonded junction.
    Junction,
    /// Shear at the head.
    ShearHead,
    /// Mid-height of a return whose head is held: no tension, or flexure with precompression.
    Middle,
    /// Flexure at a bonded foot, for information.
    Flexure,
    /// Vertical resistance at the head.
    VerticalHead,
    /// In the middle.
    VerticalMiddle,
    /// At the foot.
    VerticalFoot,
}

impl Check {
    /// Every check, in order.
    pub const ALL: [Self; 11] = [
        Self::Overturning,
        Self::Toe,
        Self::Shear,
        Self::Sliding,
        Self::Junction,
        Self::ShearHead,
        Self::Middle,
        Self::Flexure,
        Self::VerticalHead,
        Self::VerticalMiddle,
        Self::VerticalFoot,
    ];

    /// Its id, unique on a sheet.
    pub const fn id(self) -> &'static str {
        match self {
            Self::Overturning => "overturning",
            Self::Toe => "toe",
            Self::Shear => "shear",
            Self::Sliding => "sliding",
            Self::Junction => "junction",
            Self::ShearHead => "shear-head",
            Self::Middle => "middle",
            Self::Flexure => "flexure",
            Self::VerticalHead => "vertical-head",
            Self::VerticalMiddle => "vertical-middle",
            Self::VerticalFoot => "vertical-foot",
        }
    }

    /// Its name in the table of cases.
    pub const fn head(self) -> &'static str {
        match self {
            Self::Overturning => "overturning",
            Self::Toe => "toe",
            Self::Shear => "shear",
            Self::Sliding => "sliding",
            Self::Junction => "junction",
            Self::ShearHead => "shear, head",
            Self::Middle => "mid-height",
            Self::Flexure => "flexure",
            Self::VerticalHead => "vertical, head",
            Self::VerticalMiddle => "vertical, middle",
            Self::VerticalFoot => "vertical, foot",
        }
    }

    /// Whether it applies to this return.
    pub fn applies(self, m: &Model) -> bool {
        match self {
            Self::Shear | Self::ShearHead => m.sheared(),
            Self::Sliding => m.dpc && m.sheared(),
            Self::Junction => m.flange.is_some(),
            Self::Middle => m.propped,
            Self::Flexure => !m.dpc && !m.propped,
            _ => true,
        }
    }

    /// Whether it looks at the whole length pressed evenly, across the wall.
    pub const fn upright(self) -> bool {
        matches!(self, Self::VerticalHead | Self::VerticalMiddle | Self::VerticalFoot)
    }

    /// Whether it needs the reduction across the wall.
    pub const fn reduced(self) -> bool {
        self.upright() || matches!(self, Self::Toe | Self::Middle)
    }

    /// Whether it needs the stresses of the section.
    pub const fn stressed(self) -> bool {
        matches!(self, Self::Toe | Self::Shear | Self::ShearHead | Self::Junction | Self::Middle)
    }

    /// Where along the height it looks.
    pub const fn section(self) -> At {
        match self {
            Self::ShearHead | Self::VerticalHead => At::Head,
            Self::VerticalMiddle | Self::Middle => At::Middle,
            _ => At::Foot,
        }
    }
}
