//! `[basis]`.

use super::limits::{Limits, Odd};
use super::reader::Table;
use super::words::{CATEGORIES, CLASSES};
use crate::building::{Basis, Cause};

pub(super) const GAMMA: Limits = Limits::new(1.0, 5.0, "").odd(&[
    Odd::Below(2.0, "less than UK NA Table NA.1 has for masonry walls"),
    Odd::Above(3.5, "more than the usual factor of 3 on everything"),
]);
pub(super) const HELPING: Limits = Limits::new(0.8, 1.0, "");

/// Usual factor on dead load that helps: EN 1990 Table A1.2(A).
pub(super) const HELPING_USUAL: f64 = 0.9;

impl Basis {
    /// Existing work of class 2 with units of category II, no factor stated.
    pub fn usual() -> Self {
        Self {
            execution_class: 2,
            unit_category: 2,
            gamma_m_compression: None,
            gamma_m_flexure: None,
            gamma_m_shear: None,
            helping_factor: Cause { value: HELPING_USUAL, reason: String::new() },
        }
    }
}

/// Reads `[basis]`; what it does not say is as in `house`.
pub fn basis(t: Option<&Table<'_>>, house: &Basis) -> Option<Basis> {
    let Some(t) = t else { return Some(house.clone()) };
    let execution_class = if t.has("execution_class") {
        t.need("execution_class").whole(CLASSES)
    } else {
        Some(house.execution_class)
    };
    let unit_category = if t.has("unit_category") {
        t.need("unit_category").pick(CATEGORIES)
    } else {
        Some(house.unit_category)
    };
    let one = t.may("gamma_M").cause(|e| e.number(&GAMMA));
    let each = [
        ("gamma_M_compression", &house.gamma_m_compression),
        ("gamma_M_flexure", &house.gamma_m_flexure),
        ("gamma_M_shear", &house.gamma_m_shear),
    ];
    for (key, _) in each {
        if t.has("gamma_M") && t.has(key) {
            t.clash(
                format_args!("`gamma_M` sets every factor, and `{key}` sets one of them"),
                key,
                "gamma_M",
            )
            .allowed("`gamma_M` alone, or any of the three others")
            .help("take one of them out");
        }
    }
    let [gamma_m_compression, gamma_m_flexure, gamma_m_shear] = each.map(|(key, house)| {
        t.may(key).cause(|e| e.number(&GAMMA)).or_else(|| one.clone()).or_else(|| house.clone())
    });
    let helping_factor = if t.has("helping_factor") {
        t.need("helping_factor").factor(HELPING_USUAL, &HELPING)
    } else {
        Some(house.helping_factor.clone())
    };
    t.finish();
    Some(Basis {
        execution_class: execution_class?,
        unit_category: unit_category?,
        gamma_m_compression,
        gamma_m_flexure,
        gamma_m_shear,
        helping_factor: helping_factor?,
    })
}
