//! What the checks of one return need: quantities only, one leaf at a time.

use crate::checks::masonry::Masonry;
use crate::quantity::{Force, Length, LineLoad, Moment, Num};
use crate::standards::en1996::slenderness::Stiffened;

/// Characteristic vertical loads and their first moments about mid-length (positive towards the free
/// end) and, for the loads that have one, across the thickness.
#[derive(Clone, Copy, Debug, Default)]
pub struct Vertical {
    /// Dead.
    pub G: Force,
    /// Imposed.
    pub Q: Force,
    /// Roof uplift.
    pub U: Force,
    /// First moment of the dead load along the return.
    pub S_G: Moment,
    /// Of the imposed load.
    pub S_Q: Moment,
    /// Of the uplift.
    pub S_U: Moment,
    /// Moment of the dead load across the wall at the head.
    pub T_G: Moment,
    /// Of the imposed load.
    pub T_Q: Moment,
}

impl Vertical {
    /// These loads with a dead load added at a place along the return, from its mid-length.
    #[must_use]
    pub fn with_dead(mut self, dead: Force, from_middle: Length) -> Self {
        self.G = self.G + dead;
        self.S_G = self.S_G + dead * from_middle;
        self
    }
}

/// The part of the wall met that acts with the return.
#[derive(Clone, Copy, Debug)]
pub struct Flange {
    /// Width that counts.
    pub b_f: Length,
    /// Thickness.
    pub t_f: Length,
    /// Dead load that this width brings at the foot.
    pub G_f: Force,
    /// Roof uplift on it.
    pub U_f: Force,
}

/// Wind at characteristic value as it reaches this leaf, one direction.
#[derive(Clone, Copy, Debug, Default)]
pub struct Lateral {
    /// Line load over the height.
    pub w_k: LineLoad,
    /// Force at the head.
    pub H_k: Force,
    /// Moment at the head.
    pub M_k: Moment,
    /// Vertical dead load that leans on this return, for the tilt.
    pub G_nu: Force,
    /// Vertical imposed load that leans on this return.
    pub Q_nu: Force,
    /// Height that the tilt is taken over.
    pub h_nu: Length,
}

/// One leaf of a return.
#[derive(Clone, Debug)]
pub struct Model {
    /// Prefix of verdict ids; empty for a single leaf.
    pub leaf: String,
    /// Length.
    pub l: Length,
    /// Thickness, actual.
    pub t: Length,
    /// Clear height.
    pub h: Length,
    /// The other leaf of a cavity wall, for the effective thickness.
    pub t_other: Option<Length>,
    /// Factor for the restraint at head and foot; none where the head is not held across the wall.
    pub rho_2: Option<Num>,
    /// Stiffened vertical edges.
    pub stiffened: Stiffened,
    /// Strengths and material factors.
    pub masonry: Masonry,
    /// Loads at the head.
    pub at_head: Vertical,
    /// Own weight of the leaf.
    pub own: Force,
    /// Flange, where the junction is bonded.
    pub flange: Option<Flange>,
    /// Lateral loads.
    pub lateral: Lateral,
    /// Head held in plane.
    pub propped: bool,
    /// A damp-proof course crosses the foot.
    pub dpc: bool,
    /// Friction at the dpc.
    pub mu: Num,
    /// Factor on dead load that helps.
    pub helping: f64,
}

/// Where along the height a section is taken.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum At {
    /// At the foot.
    Foot,
    /// At mid-height.
    Middle,
    /// At the head.
    Head,
}

impl At {
    /// In words.
    pub const fn words(self) -> &'static str {
        match self {
            Self::Foot => "foot",
            Self::Middle => "mid-height",
            Self::Head => "head",
        }
    }

    /// How much of the own weight is above the section.
    pub const fn share(self) -> f64 {
        match self {
            Self::Foot => 1.0,
            Self::Middle => 0.5,
            Self::Head => 0.0,
        }
    }
}

impl Model {
    /// Whether any shear reaches the return: a head that is held passes its force on.
    pub fn sheared(&self) -> bool {
        !self.propped || self.lateral.w_k > LineLoad::ZERO
    }

    /// Vertical loads at a section: own weight above it, and at the foot what the flange brings.
    pub fn vertical(&self, at: At) -> Vertical {
        let v = self.at_head.with_dead(self.own * at.share(), Length::ZERO);
        match self.flange {
            Some(f) if at == At::Foot => {
                let from_middle = -((self.l + f.t_f) / 2.0);
                let v = v.with_dead(f.G_f, from_middle);
                Vertical { U: v.U + f.U_f, S_U: v.S_U + f.U_f * from_middle, ..v }
            }
            _ => v,
        }
    }
}
