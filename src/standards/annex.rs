//! National values: everything a National Annex may choose, in one struct that is passed, never global.

use super::tables::{compressive, gamma_m, wind};

/// National values of EN 1990, EN 1991-1-4, EN 1992-1-1 and EN 1996-1-1.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Annex {
    /// Country, as printed.
    pub country: &'static str,
    /// Partial factor on dead load that presses, EN 1990 Table NA.A1.2(B).
    pub gamma_G_sup: f64,
    /// Factor on dead load that helps, EN 1990 Table NA.A1.2(A).
    pub gamma_G_inf: f64,
    /// Partial factor on imposed load and wind.
    pub gamma_Q: f64,
    /// Combination factor of imposed load, category A, Table NA.A1.1.
    pub psi_0_imposed: f64,
    /// Combination factor of wind, Table NA.A1.1.
    pub psi_0_wind: f64,
    /// Density of air, kg/m³, EN 1991-1-4 NA.2.18.
    pub rho_air: f64,
    /// Limit of h_ef/t_ef, 5.5.1.4(2).
    pub slenderness_limit: f64,
    /// Factor of the other leaf in the effective thickness, 5.5.1.3(3).
    pub k_tef: f64,
    /// Material factor on wall ties, Table NA.1.
    pub gamma_M_ties: f64,
    /// Least mortar strength that no longer adds to f_k, N/mm², 3.6.1.2(2).
    pub f_m_limit: f64,
    /// Least unit strength that no longer adds to f_k, N/mm², 3.6.1.2(2).
    pub f_b_limit: f64,
    /// Limit of f_vk over f_b, perpends filled, 3.6.2(3).
    pub shear_limit: f64,
    /// Limit of f_vk over f_b, perpends not filled, 3.6.2(4).
    pub shear_limit_unfilled: f64,
    /// Modulus of elasticity over f_k, 3.7.2(2).
    pub E_over_f_k: f64,
    /// Coefficient of the strength of plain concrete, EN 1992-1-1 12.3.1(1).
    pub alpha_cc_plain: f64,
    /// Material factor on concrete, EN 1992-1-1 2.4.2.4.
    pub gamma_C: f64,
}

impl Annex {
    /// The United Kingdom. All from memory, check against the standard.
    pub const UK: Self = Self {
        country: "United Kingdom",
        gamma_G_sup: 1.35,
        gamma_G_inf: 0.9,
        gamma_Q: 1.5,
        psi_0_imposed: 0.7,
        psi_0_wind: 0.5,
        rho_air: wind::AIR_DENSITY_UK,
        slenderness_limit: 27.0,
        k_tef: 1.0,
        gamma_M_ties: gamma_m::WALL_TIES,
        f_m_limit: compressive::F_M_LIMIT,
        f_b_limit: compressive::F_B_LIMIT,
        shear_limit: 0.065,
        shear_limit_unfilled: 0.045,
        E_over_f_k: 1000.0,
        alpha_cc_plain: 0.6,
        gamma_C: 1.5,
    };
}
