//! Overturning, the compressed length and the toe, in the plane of the return.

use super::actions::{Actions, Toe};
use super::model::{At, Flange, Model};
use crate::quantity::functions::{KN, square_metres};
use crate::quantity::{Area, Force, Length, Num, Stress};
use crate::standards::en1996::section::{self, Section};
use crate::standards::en1996::shear;
use crate::trace::{Outside, Sheet};
use crate::{calc, decide, given, require, verify};

/// What the section carries where, for shear and the junction.
#[derive(Clone, Copy, Debug)]
pub struct Stressed {
    /// Compressed length of the web.
    pub l_c: Length,
    /// Vertical force in the web.
    pub N_web: Force,
    /// Vertical force in the flange; zero without one.
    pub N_flange: Force,
    /// Triangular edge stress at the toe; none where nothing stands.
    pub sigma_toe: Option<Stress>,
    /// Distance of the resultant from the pressed edge.
    pub a: Length,
    /// Area of the uniform block.
    pub A_c: Area,
    /// From the toe to where the straight line of stress reaches nought, which may lie beyond a flanged section.
    pub c: Length,
}

/// Overturning about the edge that M turns towards: 0.9 G against 1.5 W, e < l/2. First principles.
///
/// With a flange that need not be the pressed edge: N may stand between mid-length and the centroid.
pub fn overturning(s: &mut Sheet, m: &Model, a: &Actions, id: &str) {
    let (l, N_Ed, M_Ed) = (m.l, a.N_Ed, a.M_Ed);
    match (a.flange, a.back) {
        (Some(Flange { t_f, .. }), true) => {
            calc!(
                s,
                "EN 1990 6.4.2",
                "moment that N can balance about the outer face of the flange",
                M_st = N_Ed * (l / 2.0 + t_f)
            );
            verify!(s, id, "EN 1990 6.4.2, first principles", "overturning", M_Ed <= M_st);
        }
        _ => {
            calc!(s, "EN 1990 6.4.2", "moment that N can balance about the edge", M_st = N_Ed * l / 2.0);
            verify!(s, id, "EN 1990 6.4.2, first principles", "overturning", M_Ed <= M_st);
        }
    }
}

/// Stresses of the section, no tension taken: 6.2(2) for a plain return, first principles with a flange.
pub fn stresses(s: &mut Sheet, m: &Model, a: &Actions) -> Stressed {
    let (l, t, N_Ed, M_Ed) = (m.l, m.t, a.N_Ed, a.M_Ed);
    if N_Ed <= Force::ZERO {
        decide!(s, "6.2", "", "nothing presses the section", N_Ed > 0.0 * KN);
        given!(s, "area that is pressed", "nothing presses the section", A_c = Area::ZERO);
        return Stressed {
            l_c: Length::ZERO,
            N_web: Force::ZERO,
            N_flange: Force::ZERO,
            sigma_toe: None,
            a: Length::ZERO,
            A_c,
            c: Length::ZERO,
        };
    }
    calc!(s, "statics", "eccentricity in plane", e = M_Ed / N_Ed);
    match a.flange {
        None => plain(s, l, t, N_Ed, e),
        Some(Flange { b_f, t_f, .. }) => flanged(s, a, (l, t, b_f, t_f), N_Ed, e),
    }
}

fn plain(s: &mut Sheet, l: Length, t: Length, N_Ed: Force, e: Length) -> Stressed {
    let l_c = shear::compressed_length(s, l, e);
    let sigma_toe = if l_c <= Length::ZERO {
        None
    } else if e <= l / 6.0 {
        calc!(
            s,
            "first principles",
            "triangular edge stress at the toe, for information",
            sigma_toe = N_Ed / (t * l) * (1.0 + 6.0 * e / l)
        );
        Some(sigma_toe)
    } else {
        calc!(
            s,
            "first principles",
            "triangular edge stress at the toe, for information",
            sigma_toe = 2.0 * N_Ed / (t * l_c)
        );
        Some(sigma_toe)
    };
    calc!(s, "first principles", "area of the uniform stress block centred on N", A_c = t * (l - 2.0 * e));
    Stressed { l_c, N_web: N_Ed, N_flange: Force::ZERO, sigma_toe, a: l / 2.0 - e, A_c, c: l_c }
}

fn flanged(
    s: &mut Sheet,
    acting: &Actions,
    (l, t, b_f, t_f): (Length, Length, Length, Length),
    N_Ed: Force,
    e: Length,
) -> Stressed {
    let free = acting.toe == Toe::Free;
    let sec = if free {
        Section { b_1: t, d_1: l, b_2: b_f, L_s: l + t_f }
    } else {
        Section { b_1: b_f, d_1: t_f, b_2: t, L_s: l + t_f }
    };
    let from = if free {
        "section read from the free end"
    } else {
        "section read from the outer face of the flange"
    };
    given!(s, "width at the toe", from, b_1 = sec.b_1);
    given!(s, "depth of that width", from, d_1 = sec.d_1);
    given!(s, "width beyond", from, b_2 = sec.b_2);
    calc!(s, "geometry", "whole depth", L_s = l + t_f);
    let sec = Section { L_s, ..sec };
    let x = if free && acting.back {
        // N stands beyond mid-length, seen from the free end, and still short of the centroid.
        calc!(s, "geometry", "distance of N from the toe", a = l / 2.0 + e);
        a
    } else if free {
        calc!(s, "geometry", "distance of N from the toe", a = l / 2.0 - e);
        a
    } else {
        calc!(s, "geometry", "distance of N from the toe", a = l / 2.0 + t_f - e);
        a
    };
    let A_c = section::block_area(s, sec, x);
    match section::triangle(s, sec, N_Ed, x) {
        None => Stressed {
            l_c: Length::ZERO,
            N_web: Force::ZERO,
            N_flange: Force::ZERO,
            sigma_toe: None,
            a: x,
            A_c,
            c: Length::ZERO,
        },
        Some(block) => {
            let compressed = if block.c < L_s { block.c } else { L_s };
            let (web, N_web, N_flange) = if free {
                (if compressed < l { compressed } else { l }, block.N_1, block.N_2)
            } else {
                (if compressed > t_f { compressed - t_f } else { Length::ZERO }, block.N_2, block.N_1)
            };
            given!(s, "compressed length of the web", "from the neutral axis above", l_c = web);
            Stressed { l_c, N_web, N_flange, sigma_toe: Some(block.sigma_toe), a: x, A_c, c: block.c }
        }
    }
}

/// Design compressive strength with the small-area factor of 6.1.2.1(3). `f_k` and `gamma_Mc` are
/// noted here; below 0.04 m² the wall is outside the clause (8.1.3).
///
/// # Errors
/// [`Outside`] below the least plan area.
pub fn compressive_strength(s: &mut Sheet, m: &Model, id: &str) -> Result<Stress, Outside> {
    let (l, t, f_k) = (m.l, m.t, m.masonry.f_k);
    given!(
        s,
        "material factor, compression",
        m.masonry.gamma_c_source.as_str(),
        gamma_Mc = m.masonry.gamma_c
    );
    calc!(s, "geometry", "plan area", A = l * t);
    require!(s, id, "8.1.3", "plan area of at least 0.04 m²", square_metres(A) >= 0.04);
    let small = decide!(
        s,
        "6.1.2.1(3)",
        "small plan area: the strength is reduced",
        "no reduction for a small plan area",
        square_metres(A) < 0.1
    );
    if small {
        calc!(
            s,
            "6.1.2.1(3), 2.4.3(1)",
            "design compressive strength, area in m²",
            f_d = f_k / gamma_Mc * (0.7 + 3.0 * square_metres(A))
        );
        Ok(f_d)
    } else {
        calc!(s, "2.4.3(1)", "design compressive strength", f_d = f_k / gamma_Mc);
        Ok(f_d)
    }
}

/// The toe: N against the uniform block centred on it, with the least reduction across the wall.
/// First principles, not a formula of the code.
pub fn toe(s: &mut Sheet, a: &Actions, st: &Stressed, Phi: Num, f_d: Stress, id: &str) {
    let (N_Ed, A_c) = (a.N_Ed, st.A_c);
    given!(s, "least reduction across the wall: head, middle, foot", "vertical resistance, this sheet", Phi);
    calc!(
        s,
        "6.1.2.1(2) with first principles",
        "resistance of the compressed block",
        N_Rdt = Phi * f_d * A_c
    );
    let words = if a.at == At::Middle { "toe at mid-height" } else { "toe" };
    verify!(s, id, "first principles, not a formula of the code", words, N_Ed <= N_Rdt);
}
