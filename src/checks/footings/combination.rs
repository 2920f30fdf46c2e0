//! Characteristic loads together: EN 1990 6.5.3, every load whole.

use super::stands::Stands;
use crate::checks::returns::actions::Direction;
use crate::quantity::{Force, LineLoad, Moment, Num};
use crate::trace::Sheet;

/// Which loads act together; dead load always does.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Combination {
    /// Imposed load.
    pub imposed: bool,
    /// Wind.
    pub wind: bool,
    /// Roof uplift.
    pub uplift: bool,
}

/// A combination and which way wind and tilt push.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Case {
    /// Which loads.
    pub combination: Combination,
    /// Which way.
    pub direction: Direction,
}

impl Combination {
    /// Those that must be tried. The largest pressure is a convex function of the loads, so it lies where
    /// each of them is whole or absent; dead load alone lies between the two directions of G + W.
    pub fn all(st: &Stands) -> Vec<Self> {
        let of = |imposed, wind, uplift| Self { imposed, wind, uplift };
        let l = st.whole.lateral;
        let pushed =
            l.w_k > LineLoad::ZERO || !st.whole.propped && l.H_k > Force::ZERO || l.M_k > Moment::ZERO;
        let mut out = if pushed {
            vec![of(true, false, false), of(false, true, false), of(true, true, false)]
        } else {
            // A held head passes everything on: no wind comes down to this footing.
            vec![of(false, false, false), of(true, false, false)]
        };
        if st.loads.U > Force::ZERO {
            out.extend([of(false, pushed, true), of(true, pushed, true)]);
        }
        out
    }

    /// Its name: `G + Q + W`.
    pub fn name(self) -> String {
        let mut name = "G".to_owned();
        for (there, part) in [(self.imposed, " + Q"), (self.wind, " + W"), (self.uplift, " − U")] {
            if there {
                name.push_str(part);
            }
        }
        name
    }

    /// 1 where the load is there, else nil.
    pub fn counts(there: bool) -> Num {
        Num::new(f64::from(u8::from(there)))
    }
}

impl Case {
    /// Its name, as printed beside a result.
    pub fn name(self, st: &Stands) -> String {
        match self.push(st) {
            Some(push) => format!("{}, {push} {}", self.combination.name(), self.direction.words()),
            None => self.combination.name(),
        }
    }

    /// What pushes; a head that is held passes the tilt on.
    pub fn push(self, st: &Stands<'_>) -> Option<&'static str> {
        match (self.combination.wind, st.whole.propped) {
            (true, true) => Some("wind"),
            (true, false) => Some("wind and tilt"),
            (false, false) => Some("tilt"),
            (false, true) => None,
        }
    }

    /// Of both directions the one that presses harder; the first where they press alike.
    pub fn worse(combination: Combination, st: &Stands) -> Self {
        let of = |direction| Self { combination, direction };
        let pressed = |case| super::pressure::of(&mut Sheet::silent(), st, case, "").p_max;
        let [a, b] = Direction::BOTH.map(of);
        if pressed(b) > pressed(a) { b } else { a }
    }
}
