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

/// Reads `[basis]`; without it, existing work of class 2 with units of category II.
pub fn basis(t: Option<&Table<'_>>) -> Option<Basis> {
    let usual = || Cause { value: HELPING_USUAL, reason: String::new() };
    let Some(t) = t else {
        return Some(Basis {
            execution_class: 2,
            unit_category: 2,
            gamma_m_compression: None,
            gamma_m_flexure: None,
            gamma_m_shear: None,
            helping_factor: usual(),
        });
    };
    let execution_class =
        if t.has("execution_class") { t.need("execution_class").whole(CLASSES) } else { Some(2) };
    let unit_category =
        if t.has("unit_category") { t.need("unit_category").pick(CATEGORIES) } else { Some(2) };
    let one = t.may("gamma_M").cause(|e| e.number(&GAMMA));
    let each = ["gamma_M_compression", "gamma_M_flexure", "gamma_M_shear"];
    for key in each {
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
    let [gamma_m_compression, gamma_m_flexure, gamma_m_shear] =
        each.map(|key| t.may(key).cause(|e| e.number(&GAMMA)).or_else(|| one.clone()));
    let helping_factor = t.may("helping_factor").factor(HELPING_USUAL, &HELPING);
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
