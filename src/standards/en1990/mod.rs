//! EN 1990 with the UK National Annex: combinations of actions.

use crate::standards::annex::Annex;

/// A strength combination. Every check runs under every one and the worst is printed, named.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Combination {
    /// Dead load helps, imposed load is absent, wind leads (set A).
    Helping,
    /// Dead and imposed load press, wind leads (set B, eq. 6.10).
    PressingWind,
    /// Dead and imposed load press, imposed load leads.
    PressingImposed,
    /// Dead and imposed load, and the tilt only.
    Gravity,
}

/// Partial factors of a combination.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Factors {
    /// On dead load.
    pub gamma_G: f64,
    /// On imposed load.
    pub gamma_Q: f64,
    /// On wind.
    pub gamma_W: f64,
    /// On roof uplift, taken off the dead load.
    pub gamma_U: f64,
}

impl Combination {
    /// All, in the order printed.
    pub const ALL: [Self; 4] = [Self::Helping, Self::PressingWind, Self::PressingImposed, Self::Gravity];

    /// Its name.
    pub const fn name(self) -> &'static str {
        match self {
            Self::Helping => "helping",
            Self::PressingWind => "pressing, wind leads",
            Self::PressingImposed => "pressing, imposed leads",
            Self::Gravity => "gravity alone",
        }
    }

    /// Where its factors come from.
    pub const fn clause(self) -> &'static str {
        match self {
            Self::Helping => "EN 1990 NA.A1.2(A)",
            _ => "EN 1990 NA.A1.2(B)",
        }
    }

    /// Its partial factors; `helping` multiplies dead load in [`Combination::Helping`].
    ///
    /// EN 1990 Tables NA.A1.1, NA.A1.2(A) and (B); from memory, check against the standard.
    pub const fn factors(self, annex: &Annex, helping: f64) -> Factors {
        let Annex { gamma_G_sup, gamma_Q, psi_0_imposed, psi_0_wind, .. } = *annex;
        match self {
            Self::Helping => Factors { gamma_G: helping, gamma_Q: 0.0, gamma_W: gamma_Q, gamma_U: gamma_Q },
            Self::PressingWind => Factors {
                gamma_G: gamma_G_sup,
                gamma_Q: gamma_Q * psi_0_imposed,
                gamma_W: gamma_Q,
                gamma_U: 0.0,
            },
            Self::PressingImposed => {
                Factors { gamma_G: gamma_G_sup, gamma_Q, gamma_W: gamma_Q * psi_0_wind, gamma_U: 0.0 }
            }
            Self::Gravity => Factors { gamma_G: gamma_G_sup, gamma_Q, gamma_W: 0.0, gamma_U: 0.0 },
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    /// EN 1990 with UK NA as summarised in the method: from memory, check against the standard.
    #[test]
    fn factors_are_those_of_the_national_annex() {
        let of = |c: Combination| {
            let f = c.factors(&Annex::UK, 0.9);
            [f.gamma_G, f.gamma_Q, f.gamma_W, f.gamma_U]
        };
        let close = |a: [f64; 4], b: [f64; 4]| a.iter().zip(b).all(|(x, y)| (x - y).abs() < 1e-12);
        assert!(close(of(Combination::Helping), [0.9, 0.0, 1.5, 1.5]));
        assert!(close(of(Combination::PressingWind), [1.35, 1.05, 1.5, 0.0]));
        assert!(close(of(Combination::PressingImposed), [1.35, 1.5, 0.75, 0.0]));
        assert!(close(of(Combination::Gravity), [1.35, 1.5, 0.0, 0.0]));
    }
}
