//! Orographic location factor s: A.3(3), its polynomials and their ranges.

use super::super::sensible;
use super::Slope;
use crate::quantity::functions::{cube, exp, log10, max, metres, pow, sq};
use crate::quantity::{Length, Num};
use crate::trace::{Outside, Sheet};
use crate::{calc, decide, given};

/// Orographic location factor s: A.3(3).
pub(super) fn location(
    sheet: &mut Sheet,
    slope: Slope,
    X: Length,
    L_u: Length,
    L_e: Length,
    z: Length,
) -> Result<Num, Outside> {
    let clause = "A.3(3)";
    calc!(sheet, clause, "height over effective length", r_z = z / L_e);
    if !decide!(sheet, clause, "within the height of the effect", "above it: none", r_z <= 2.0) {
        return Ok(none(sheet));
    }
    if decide!(sheet, clause, "upwind of the crest", "downwind of the crest", metres(X) <= 0.0) {
        calc!(sheet, clause, "distance over length of the slope", x_u = X / L_u);
        if !decide!(sheet, clause, "within the reach of the slope", "before it: none", x_u >= -1.5) {
            return Ok(none(sheet));
        }
        let A_s = at_crest(sheet, r_z);
        calc!(sheet, "A.3(3)", "coefficient B", B_s = 0.3542 * sq(r_z) - 1.0577 * r_z + 2.6456);
        calc!(sheet, "A.3(3)", "location factor", s = A_s * exp(B_s * x_u));
        return Ok(s);
    }
    if slope.ground.falls_again() {
        sensible(clause, "a downwind slope whose length is a number", slope.downwind.is_finite())?;
        given!(sheet, "length of the downwind slope", "job file", L_d = slope.downwind);
        sensible(clause, "a downwind slope with a length", L_d > Length::ZERO)?;
        calc!(sheet, clause, "distance over length of the slope", x_d = X / L_d);
        if !decide!(sheet, clause, "within the reach of the slope", "beyond it: none", x_d <= 2.0) {
            return Ok(none(sheet));
        }
        let A_s = at_crest(sheet, r_z);
        calc!(sheet, "A.3(3)", "coefficient B", B_s = -0.3056 * sq(r_z) + 1.0212 * r_z - 1.7637);
        calc!(sheet, "A.3(3)", "location factor", s = A_s * exp(B_s * x_d));
        return Ok(s);
    }
    calc!(sheet, clause, "distance over effective length", x_e = X / L_e);
    if !decide!(sheet, clause, "within the reach of the cliff", "beyond it: none", x_e <= 3.5) {
        return Ok(none(sheet));
    }
    given!(sheet, "where the formula begins", clause, x_min = Num::new(0.1));
    calc!(sheet, clause, "distance at which the formula is read", x_f = max(x_e, x_min));
    let s_f = behind_cliff(sheet, r_z, x_f);
    if decide!(sheet, clause, "by the formula", "between the crest and the formula", x_e >= x_min) {
        given!(sheet, "least location factor", "a cliff does not slow the wind", s_min = Num::new(0.0));
        calc!(sheet, clause, "location factor", s = max(s_f, s_min));
        return Ok(s);
    }
    let A_s = at_crest(sheet, r_z);
    calc!(sheet, clause, "location factor, between", s = A_s + (s_f - A_s) * x_e / x_min);
    Ok(s)
}

/// A, which is s at the crest: A.3(3).
fn at_crest(sheet: &mut Sheet, r_z: Num) -> Num {
    calc!(
        sheet,
        "A.3(3)",
        "coefficient A",
        A_s = 0.1552 * pow(r_z, 4.0) - 0.8575 * cube(r_z) + 1.8133 * sq(r_z) - 1.9115 * r_z + 1.0124
    );
    A_s
}

/// s downwind of cliffs and escarpments at the distance `x_f` over L_e, logarithms to base 10.
fn behind_cliff(sheet: &mut Sheet, r_z: Num, x_f: Num) -> Num {
    let clause = "A.3(3)";
    given!(sheet, "least height of the formula over the effective length", clause, r_1 = Num::new(0.1));
    calc!(sheet, clause, "logarithm of the height", k_z = log10(max(r_z, r_1)));
    calc!(
        sheet,
        clause,
        "coefficient A",
        A_k = -1.3420 * cube(k_z) - 0.8222 * sq(k_z) + 0.4609 * k_z - 0.0791
    );
    calc!(
        sheet,
        clause,
        "coefficient B",
        B_k = -1.0196 * cube(k_z) - 0.8910 * sq(k_z) + 0.5343 * k_z - 0.1156
    );
    calc!(sheet, clause, "C", C_k = 0.8030 * cube(k_z) + 0.4236 * sq(k_z) - 0.5738 * k_z + 0.1606);
    calc!(sheet, clause, "by the formula", s_f = A_k * sq(log10(x_f)) + B_k * log10(x_f) + C_k);
    s_f
}

fn none(sheet: &mut Sheet) -> Num {
    given!(sheet, "location factor: no effect here", "A.3(3)", s = Num::new(0.0));
    s
}
