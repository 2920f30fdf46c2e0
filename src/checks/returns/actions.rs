//! Design actions on a section of a return, for one combination and one direction of the wind.

use super::model::{At, Flange, Model, Vertical};
use super::statics;
pub use super::statics::design::Along as Design;
use crate::quantity::functions::{abs, metres, sqrt};
use crate::quantity::{Force, Length, Moment, Num};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::trace::Sheet;
use crate::{calc, given};

/// Which way the wind pushes the head.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Direction {
    /// Towards the free end of the return.
    ToFree,
    /// Towards the junction.
    ToJunction,
}

impl Direction {
    /// Both.
    pub const BOTH: [Self; 2] = [Self::ToFree, Self::ToJunction];

    /// In words.
    pub const fn words(self) -> &'static str {
        match self {
            Self::ToFree => "towards the free end",
            Self::ToJunction => "towards the junction",
        }
    }
}

/// One case: every check runs under every case, the worst is printed.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Case {
    /// Combination.
    pub combination: Combination,
    /// Direction.
    pub direction: Direction,
}

impl Case {
    /// All cases in the order printed.
    pub fn all() -> Vec<Self> {
        Combination::ALL
            .into_iter()
            .flat_map(|combination| Direction::BOTH.map(|direction| Self { combination, direction }))
            .collect()
    }

    /// Its name, as printed beside a result.
    pub fn name(self) -> String {
        format!("{}, {} {}", self.combination.name(), self.push(), self.direction.words())
    }

    /// What pushes: wind, or the tilt alone.
    pub const fn push(self) -> &'static str {
        if matches!(self.combination, Combination::Gravity) { "tilt" } else { "wind" }
    }
}

/// Which edge of the section is pressed hardest.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Toe {
    /// The free end.
    Free,
    /// The junction end, or the outer face of the flange.
    Junction,
}

/// Design actions on one section.
#[derive(Clone, Copy, Debug)]
pub struct Actions {
    /// Where.
    pub at: At,
    /// Vertical force.
    pub N_Ed: Force,
    /// Moment in plane, about mid-length of the web; its size.
    pub M_Ed: Moment,
    /// Shear in plane.
    pub V_Ed: Force,
    /// Pressed edge.
    pub toe: Toe,
    /// N acts between mid-length and the junction, or beyond it: M turns towards the junction.
    pub back: bool,
    /// Flange that acts, with its thickness; foot only.
    pub flange: Option<Flange>,
    /// Factor on dead load in this case.
    pub gamma_G: Num,
    /// Factor on roof uplift in this case.
    pub gamma_U: Num,
}

/// Partial factors of the case, noted on the sheet.
pub fn factors(s: &mut Sheet, case: Case, annex: &Annex, helping: f64) -> (Num, Num, Num) {
    let f = case.combination.factors(annex, helping);
    let source = case.combination.clause();
    given!(s, "factor on dead load", source, gamma_G = Num::new(f.gamma_G));
    given!(s, "factor on imposed load", source, gamma_Q = Num::new(f.gamma_Q));
    given!(s, "factor on wind", source, gamma_W = Num::new(f.gamma_W));
    (gamma_G, gamma_Q, gamma_W)
}

/// Actions at a section. `l`, `h` and the loads of the model stand on the sheet or are noted here.
pub fn at(s: &mut Sheet, m: &Model, annex: &Annex, case: Case, at: At) -> Actions {
    let (gamma_G, gamma_Q, gamma_W) = factors(s, case, annex, m.helping);
    let Vertical { G, Q, U, S_G, S_Q, S_U, .. } = m.vertical(at);
    let source = "load table of this sheet";
    given!(s, "dead load, own weight included", source, G);
    given!(s, "imposed load", source, Q);
    given!(s, "first moment of the dead load", source, S_G);
    given!(s, "first moment of the imposed load", source, S_Q);
    let (N_Ed, M_N) = if U == Force::ZERO {
        calc!(s, "EN 1990 6.4.3.2", "vertical force", N_Ed = gamma_G * G + gamma_Q * Q);
        calc!(s, "statics", "moment of the vertical loads", M_N = gamma_G * S_G + gamma_Q * S_Q);
        (N_Ed, M_N)
    } else {
        let f = case.combination.factors(annex, m.helping);
        given!(s, "factor on roof uplift", case.combination.clause(), gamma_U = Num::new(f.gamma_U));
        given!(s, "roof uplift", source, U);
        given!(s, "first moment of the uplift", source, S_U);
        calc!(s, "EN 1990 6.4.3.2", "vertical force", N_Ed = gamma_G * G + gamma_Q * Q - gamma_U * U);
        calc!(
            s,
            "statics",
            "moment of the vertical loads",
            M_N = gamma_G * S_G + gamma_Q * S_Q - gamma_U * S_U
        );
        (N_Ed, M_N)
    };
    let gamma_U = Num::new(case.combination.factors(annex, m.helping).gamma_U);
    let H_nu = tilt(s, m, annex);
    let (M_W, V_Ed) = statics::design::at(s, m, gamma_W, H_nu, at);
    let flange = m.flange.filter(|_| at == At::Foot);
    // Positive presses the free end.
    let signed = if case.direction == Direction::ToFree { M_N + M_W } else { M_N - M_W };
    let M_Ed = if case.direction == Direction::ToFree {
        calc!(s, "statics", "moment in plane about mid-length", M_Ed = abs(M_N + M_W));
        M_Ed
    } else {
        calc!(s, "statics", "moment in plane about mid-length", M_Ed = abs(M_N - M_W));
        M_Ed
    };
    let back = signed < Moment::ZERO;
    Actions { at, N_Ed, M_Ed, V_Ed, toe: toe(m, flange, N_Ed, signed), back, flange, gamma_G, gamma_U }
}

/// The edge on whose side of the section's centroid the resultant acts.
fn toe(m: &Model, flange: Option<Flange>, N_Ed: Force, signed: Moment) -> Toe {
    let centroid = match flange {
        None => Length::ZERO,
        // From mid-length of the web towards the flange.
        Some(Flange { b_f, t_f, .. }) => -((b_f * t_f) * ((m.l + t_f) / 2.0) / (b_f * t_f + m.l * m.t)),
    };
    if N_Ed > Force::ZERO && signed / N_Ed < centroid || N_Ed <= Force::ZERO && signed < Moment::ZERO {
        Toe::Junction
    } else {
        Toe::Free
    }
}

/// Wind and tilt at design value; `gamma_W` stands on the sheet.
pub fn design(s: &mut Sheet, m: &Model, annex: &Annex, gamma_W: Num) -> Design {
    let H_nu = tilt(s, m, annex);
    statics::design::along(s, m, gamma_W, H_nu)
}

/// The tilt of the building as a force at the head: 5.3(2), always with the pressing factors.
pub fn tilt(s: &mut Sheet, m: &Model, annex: &Annex) -> Force {
    let (G_nu, Q_nu, nu) = leaning(s, m);
    given!(s, "pressing factor on dead load", "EN 1990 NA.A1.2(B)", gamma_Gp = Num::new(annex.gamma_G_sup));
    given!(s, "pressing factor on imposed load", "EN 1990 NA.A1.2(B)", gamma_Qp = Num::new(annex.gamma_Q));
    calc!(s, "5.3(2)", "tilt as a force, pressing factors", H_nu = nu * (gamma_Gp * G_nu + gamma_Qp * Q_nu));
    H_nu
}

/// The tilt of a structure of height `h_tot`, which stands on the sheet: 5.3(2).
pub fn radians(s: &mut Sheet, h_tot: Length) -> Num {
    calc!(s, "5.3(2)", "tilt, in radians", nu = 1.0 / (100.0 * sqrt(metres(h_tot))));
    nu
}

/// The same under characteristic loads, as the ground feels it.
pub fn tilt_characteristic(s: &mut Sheet, m: &Model) -> Force {
    let (G_nu, Q_nu, nu) = leaning(s, m);
    calc!(s, "5.3(2)", "tilt as a force, no factors", H_t = nu * (G_nu + Q_nu));
    H_t
}

/// What leans on the return, dead and imposed, and the tilt of the building in radians.
fn leaning(s: &mut Sheet, m: &Model) -> (Force, Force, Num) {
    let (G_nu, Q_nu, h_tot) = (m.lateral.G_nu, m.lateral.Q_nu, m.lateral.h_nu);
    given!(s, "dead load that leans on this return", "loads and stability of the storey", G_nu);
    given!(s, "imposed load that leans on it", "loads and stability of the storey", Q_nu);
    given!(s, "height of the structure, in m in the next line", "job file", h_tot);
    let nu = radians(s, h_tot);
    (G_nu, Q_nu, nu)
}
