//! Size limits of panels under lateral load.
//!
//! BS EN 1996-1-1:2005+A1:2012, Annex F gives them as curves, which are not held here; only its
//! 30 t between floors is. The area limits of BS 5628-1:2005, 36.3, stand in and are named as such:
//! printed in IStructE, Manual for the design of plain masonry in building structures, 2nd ed.,
//! 2005, and in C. Arya, Design of Structural Elements, Fig. 5.26. Thickness is the effective
//! thickness t_ef, mm.

use std::fmt;

use crate::standards::source::{Confidence, Looked, Source};

const BS_5628: Source = Source::named(
    "IStructE, Manual for the design of plain masonry in building structures, 2nd ed., 2005",
    Confidence::High,
);

/// EN 1996-1-1 Annex F: a wall held at top and base only is at most this many t_ef high. From
/// memory (H).
pub const ANNEX_F_TOP_AND_BASE: f64 = 30.0;
/// BS 5628-1 36.3: no side of a panel is longer than this many t_ef (H).
pub const SIDE: f64 = 50.0;
/// BS 5628-1 36.3: a wall held at top and base only is at most this many t_ef high (H).
pub const TOP_AND_BASE: f64 = 40.0;

/// How a panel is held, as BS 5628-1 36.3 tells panels apart.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Support {
    /// Three edges held, two or more of them continuous.
    ThreeEdgesTwoContinuous,
    /// Three edges held, otherwise.
    ThreeEdges,
    /// Four edges held, three or more of them continuous.
    FourEdgesThreeContinuous,
    /// Four edges held, otherwise.
    FourEdges,
}

impl fmt::Display for Support {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(match self {
            Self::ThreeEdgesTwoContinuous => "three edges held, two or more continuous",
            Self::ThreeEdges => "three edges held",
            Self::FourEdgesThreeContinuous => "four edges held, three or more continuous",
            Self::FourEdges => "four edges held",
        })
    }
}

/// Greatest area of a panel over t_ef², no unit: `h l <= value t_ef^2`.
///
/// BS 5628-1:2005, 36.3 (not EN 1996-1-1).
pub fn area_over_t_ef_squared(support: Support) -> Looked<f64> {
    let value = match support {
        Support::ThreeEdgesTwoContinuous => 1500.0,
        Support::ThreeEdges => 1350.0,
        Support::FourEdgesThreeContinuous => 2250.0,
        Support::FourEdges => 2025.0,
    };
    Looked::new(value, "BS 5628-1, 36.3", BS_5628).row("panel", support)
}

/// The kind of support of a panel; `None` with fewer than three edges held.
pub fn support(edges: super::annex_e::Edges) -> Option<Support> {
    use super::annex_e::Edge;
    let all = [edges.top, edges.base, edges.left, edges.right];
    let held = all.iter().filter(|e| **e != Edge::Free).count();
    let continuous = all.iter().filter(|e| **e == Edge::Continuous).count();
    match (held, continuous) {
        (4, 3..) => Some(Support::FourEdgesThreeContinuous),
        (4, _) => Some(Support::FourEdges),
        (3, 2..) => Some(Support::ThreeEdgesTwoContinuous),
        (3, _) => Some(Support::ThreeEdges),
        _ => None,
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::standards::tables::annex_e::Case;

    #[test]
    fn cases_of_annex_e_find_their_limit() {
        for (case, expected) in [
            (Case::A, Support::ThreeEdges),
            (Case::B, Support::ThreeEdges),
            (Case::C, Support::ThreeEdgesTwoContinuous),
            (Case::E, Support::FourEdges),
            (Case::G, Support::FourEdges),
            (Case::H, Support::FourEdgesThreeContinuous),
            (Case::I, Support::FourEdgesThreeContinuous),
            (Case::J, Support::ThreeEdges),
            (Case::L, Support::ThreeEdgesTwoContinuous),
        ] {
            assert_eq!(support(case.edges()), Some(expected), "{case}");
        }
    }
}
