//! A panel as the limit analyses see it: a plate in bending with openings, in N and mm.
//!
//! * [`safe`]: a pressure that moments in equilibrium carry, a second-order cone programme
//! * [`upper`]: the pressure of the weakest crack pattern, by discontinuity layout optimisation
//! * [`elastic`]: the pressure at the first crack, elastic; information, never a verdict
//!
//! x runs to the right and y up, from the lower left corner, the panel seen from outside. A bed joint cracks
//! where the moment `m_V` per length of joint is reached, a vertical crack where `m_H` per height is reached.

pub mod elastic;
pub mod safe;
pub mod upper;

/// How the frame of an opening passes its wind on.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Carry {
    /// To the two jambs, half each, evenly over their height.
    Jambs,
    /// All round, evenly over the whole edge of the opening.
    AllRound,
    /// To head and sill, half each, evenly over their width; a door, which has no sill, to its head alone.
    HeadAndSill,
    /// Nowhere: the wind on it is left out. For studies only.
    Nowhere,
}

/// A window or door.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Opening {
    /// From where to where along x, mm.
    pub x: (f64, f64),
    /// From where to where along y, mm; a door begins at 0 (or below every free part of the base).
    pub y: (f64, f64),
    /// How it passes its wind on.
    pub carry: Carry,
}

/// How a stretch of an edge is held.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Held {
    /// Not at all.
    Free,
    /// Against moving, not against turning.
    Simple,
    /// Against both; the moment per length that it can bring, N (N mm/mm).
    Continuous(f64),
    /// Against moving, and against turning as far as the weight on the joint brings a moment per length, N; once that is
    /// overcome the joint is open. While the wall is uncracked it counts as [`Held::Simple`].
    Weight(f64),
}

/// A stretch of one edge.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Stretch {
    /// From where along the edge (x for base and top, y for left and right), mm.
    pub from: f64,
    /// To where, mm.
    pub to: f64,
    /// How it is held.
    pub held: Held,
}

/// The panel.
pub struct Plate<'a> {
    /// Length, mm.
    pub l: f64,
    /// Height, mm.
    pub h: f64,
    /// Windows and doors; none touch or overlap, all lie inside (a door touches the base, a door up to the top the top).
    pub openings: Vec<Opening>,
    /// Left, right, base, top: stretches in order that cover the whole edge.
    pub edges: [Vec<Stretch>; 4],
    /// Moment per height at which a vertical crack opens, N.
    pub m_H: f64,
    /// Moment per length at which the bed joint at (x, y) opens, N; between grid points it is linear in y and never rises with y.
    pub m_V: &'a (dyn Fn(f64, f64) -> f64 + Sync),
}

/// Why there is no number.
#[derive(Clone, Debug, PartialEq)]
pub enum Trouble {
    /// A piece of the panel is not held: where it lies (a point in it), mm.
    Floating(f64, f64),
    /// The solver did not converge; its own word for how it ended.
    NotSolved(String),
}
