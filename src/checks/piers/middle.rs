//! Mid-height of a pier: by Annex G with the wind as an eccentricity, or by flexure with precompression.

use super::model::PierModel;
use super::work::{self, Pressed, Ready};
use crate::checks::masonry::Masonry;
use crate::checks::panels::sharing;
use crate::checks::returns::model::At;
use crate::checks::returns::vertical::Slender;
use crate::quantity::functions::{max, min, sq};
use crate::quantity::{Force, Length, LineLoad, Moment, Num, Stress, print};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::standards::en1996::lateral::strength as flexure;
use crate::standards::en1996::reduction;
use crate::trace::Sheet;
use crate::{calc, decide, given, verify};

/// What stands on the sheet when the routes part.
#[derive(Clone, Copy)]
struct Here {
    N_Ed: Force,
    l_c: Length,
    /// Moment of the loads at the head.
    T_Ed: Moment,
    /// Wind on the loaded leaf, and the resistance of that leaf per length.
    wind: Option<(Moment, Force)>,
}

/// A route of two, or the only one.
#[derive(Clone, Copy, PartialEq, Eq)]
enum Route {
    /// Annex G, the wind as an eccentricity.
    AnnexG,
    /// Flexure with precompression, and Annex G without the wind.
    Flexure,
}

/// Mid-height in one combination. Where the wind presses, either route is enough by itself; that of the lower
/// use decides, and the other stands beside it for information.
pub fn at_mid_height(s: &mut Sheet, p: &PierModel, annex: &Annex, ready: Ready, c: Combination) {
    let gammas = work::factors(s, p, annex, c);
    let Pressed { N_Ed, l_c } = work::pressed(s, p, gammas, At::Middle);
    let T_Ed = work::moment_at_head(s, p, gammas);
    let gamma_W = c.factors(annex, p.m.helping).gamma_W;
    let blown = p.wind.filter(|_| gamma_W > 0.0);
    let wind = blown.map(|_| wind(s, p, annex, ready, c));
    let here = Here { N_Ed, l_c, T_Ed, wind };
    if wind.is_none() {
        route(s, p, annex, ready, here, Route::AnnexG, true);
        return;
    }
    let of = |r: Route| {
        let mut silent = Sheet::silent();
        route(&mut silent, p, annex, ready, here, r, true);
        silent.verdicts.iter().map(|v| v.ratio).fold(0.0, f64::max)
    };
    if N_Ed <= Force::ZERO {
        // Nothing presses the section, so the wind has no N to lean on.
        route(s, p, annex, ready, here, Route::Flexure, true);
        return;
    }
    let (by_g, by_flexure) = (of(Route::AnnexG), of(Route::Flexure));
    for r in [Route::AnnexG, Route::Flexure] {
        let decides = (r == Route::AnnexG) == (by_g <= by_flexure);
        if s.recording() || decides {
            route(s, p, annex, ready, here, r, decides);
        }
    }
}

/// Wind on the loaded leaf between floor and ceiling: its moment, and what that leaf resists per length.
fn wind(s: &mut Sheet, p: &PierModel, annex: &Annex, ready: Ready, c: Combination) -> (Moment, Force) {
    let (l, h) = (p.m.l, p.m.h);
    let Some(w) = p.wind else { return (Moment::ZERO, Force::ZERO) };
    given!(s, "net pressure on a panel", "wind sheet", q_panel = w.q_panel);
    given!(s, "length of wind face, half of the openings beside", "plan", l_w = w.l_w);
    let f = c.factors(annex, p.m.helping);
    given!(s, "factor on wind", c.clause(), gamma_W = Num::new(f.gamma_W));
    calc!(s, "EN 1990 6.4.3.2", "wind on the pier, design", W_Ed = gamma_W * q_panel * l_w / l);
    let of_pier = resistance(s, p, annex, ready, true);
    let W_l = match &p.other {
        Some(other) if sharing::counted(s, p.ties, "") => {
            let of_other = resistance(s, p, annex, ready, false);
            let (first, second) = if other.outer { (of_other, of_pier) } else { (of_pier, of_other) };
            given!(s, "resistance per length, outer leaf", "above", M_o = max(first, Force::ZERO));
            given!(s, "resistance per length, inner leaf", "above", M_i = max(second, Force::ZERO));
            calc!(s, "statics, 6.3.1", "pressure that the outer leaf can take", w_Rd_o = 8.0 * M_o / sq(h));
            calc!(s, "statics, 6.3.1", "pressure that the inner leaf can take", w_Rd_i = 8.0 * M_i / sq(h));
            if M_o + M_i > Force::ZERO {
                let (_, W_o, W_i) = sharing::by_strength(s, W_Ed, w_Rd_o, w_Rd_i);
                if other.outer {
                    calc!(s, "6.3.1(6)", "on the loaded leaf", W_l = W_Ed - min(W_o, w_Rd_o));
                    W_l
                } else {
                    calc!(s, "6.3.1(6)", "on the loaded leaf", W_l = W_Ed - min(W_i, w_Rd_i));
                    W_l
                }
            } else {
                calc!(s, "6.3.1(6)", "on the loaded leaf: neither resists alone", W_l = 1.0 * W_Ed);
                W_l
            }
        }
        Some(_) => {
            calc!(s, "6.5", "on the loaded leaf: too few ties to share", W_l = 1.0 * W_Ed);
            W_l
        }
        None => {
            calc!(s, "statics", "on the leaf, all of it", W_l = 1.0 * W_Ed);
            W_l
        }
    };
    calc!(s, "statics", "moment at mid-height, held at head and foot", M_l = W_l * l * sq(h) / 8.0);
    (M_l, of_pier)
}

/// Resistance per length of a leaf by flexure with precompression, 6.3.1(4): the loaded one under the dead load
/// that helps, less the uplift; the other under its own weight alone.
fn resistance(s: &mut Sheet, p: &PierModel, annex: &Annex, ready: Ready, loaded: bool) -> Force {
    let (m, h, l) = (&p.m, p.m.h, p.m.l);
    given!(s, "helping factor", "basis of this job", gamma_h = Num::new(m.helping));
    if loaded {
        let (t, f_d) = (m.t, ready.f_d);
        s.heading(2, "The loaded leaf in flexure");
        given!(s, "dead load at the head", work::LED, G_h = m.at_head.G);
        let G_a = if work::lifted(p) {
            given!(s, "roof uplift at the head", work::LED, U_h = m.at_head.U);
            let clause = Combination::Helping.clause();
            let factor = Combination::Helping.factors(annex, m.helping).gamma_U;
            given!(s, "factor on uplift where dead load helps", clause, gamma_u = Num::new(factor));
            calc!(
                s,
                "EN 1990 6.4.3.2",
                "dead load per length, less the uplift over the helping factor",
                G_a = (G_h - gamma_u / gamma_h * U_h) / l
            );
            G_a
        } else {
            calc!(s, "statics", "dead load per length", G_a = G_h / l);
            G_a
        };
        return leaf(s, &m.masonry, gamma_h, G_a, t, h, f_d);
    }
    let Some(other) = &p.other else { return Force::ZERO };
    s.heading(2, "The other leaf in flexure, under its own weight");
    let source = format!("materials sheet, {}", other.masonry.name);
    given!(s, "actual thickness", "job file", t = other.t);
    given!(s, "characteristic compressive strength", &source, f_k = other.masonry.f_k);
    let gamma_source = other.masonry.gamma_c_source.as_str();
    given!(s, "material factor, compression", gamma_source, gamma_Mc = other.masonry.gamma_c);
    calc!(s, "2.4.1", "design compressive strength", f_d = f_k / gamma_Mc);
    given!(s, "dead load on top of the leaf", "this leaf carries no floor", G_a = LineLoad::ZERO);
    leaf(s, &other.masonry, gamma_h, G_a, t, h, f_d)
}

fn leaf(
    s: &mut Sheet,
    masonry: &Masonry,
    gamma_h: Num,
    G_a: LineLoad,
    t: Length,
    h: Length,
    f_d: Stress,
) -> Force {
    given!(s, "weight of the masonry", "materials", rho_m = masonry.density);
    let sigma_d = flexure::precompression(s, gamma_h, G_a, rho_m, t, h, f_d).sigma_d;
    let source = format!("materials sheet, {}", masonry.name);
    given!(s, "flexural strength, failure parallel to the bed joints", &source, f_xk1 = masonry.f_xk1);
    let factor = masonry.gamma_f_source.as_str();
    given!(s, "material factor, flexure", factor, gamma_Mf = masonry.gamma_f);
    flexure::parallel(s, t, f_xk1, gamma_Mf, sigma_d).M_Rd1
}

/// One route; where it does not decide its finding is printed as information.
fn route(s: &mut Sheet, p: &PierModel, annex: &Annex, ready: Ready, here: Here, r: Route, decides: bool) {
    let Here { N_Ed, l_c, T_Ed, wind } = here;
    let title = match (wind.is_some(), r) {
        (false, _) => "No wind across",
        (_, Route::AnnexG) => "The wind as an eccentricity, Annex G",
        (_, Route::Flexure) => "The wind by flexure with precompression, Annex G without it",
    };
    s.heading(2, if decides { title.to_owned() } else { format!("{title}: for information") });
    // The other leaf may have stood here last.
    given!(s, "actual thickness of the loaded leaf", "above", t = p.m.t);
    given!(s, "characteristic compressive strength", "above", f_k = p.m.masonry.f_k);
    given!(s, "design compressive strength", "above", f_d = ready.f_d);
    let _ = f_k;
    let clause = "6.1.2.1(1) eq. 6.1";
    let words = "vertical resistance in the middle";
    if N_Ed > Force::ZERO {
        let with = wind.filter(|_| r == Route::AnnexG).map(|w| w.0);
        let Phi_m = reduced(s, p, annex, ready, here, with);
        calc!(s, "6.1.2.1(2) eq. 6.2", "vertical resistance", N_Rd = Phi_m * t * l_c * f_d);
        judge(s, decides, "pier-middle", clause, words, ("N_Ed", N_Ed, "N_Rd", N_Rd), |s| {
            verify!(s, "pier-middle", clause, words, N_Ed <= N_Rd);
        });
    }
    if let (Route::Flexure, Some((M_l, of_leaf))) = (r, wind) {
        let l = p.m.l;
        given!(s, "resistance per length of the loaded leaf", "above", M_r = of_leaf);
        calc!(s, "statics", "moment at mid-height, half of that at the head added", M_Ed = M_l + T_Ed / 2.0);
        calc!(s, "6.3.1(3) eq. 6.15", "resistance in flexure", M_Rd = M_r * l);
        let (clause, words) = ("6.3.1(2) eq. 6.14", "flexure at mid-height");
        judge(s, decides, "pier-flexure", clause, words, ("M_Ed", M_Ed, "M_Rd", M_Rd), |s| {
            verify!(s, "pier-flexure", clause, words, M_Ed <= M_Rd);
        });
        if N_Ed > Force::ZERO {
            let (clause, words) = ("first principles", "pressed edge at mid-height");
            calc!(
                s,
                "first principles",
                "stress at the pressed edge, uncracked",
                sigma_e = N_Ed / (t * l_c) + 6.0 * M_Ed / (l_c * sq(t))
            );
            judge(s, decides, "pier-edge", clause, words, ("sigma_e", sigma_e, "f_d", f_d), |s| {
                verify!(s, "pier-edge", clause, words, sigma_e <= f_d);
            });
        }
    }
}

/// Phi in the middle, with the wind's moment or without it; nil where the load leaves the section.
fn reduced(
    s: &mut Sheet,
    p: &PierModel,
    annex: &Annex,
    ready: Ready,
    here: Here,
    with: Option<Moment>,
) -> Num {
    let Here { N_Ed, T_Ed, .. } = here;
    let (t, f_k) = (p.m.t, p.m.masonry.f_k);
    let Slender { h_ef, t_ef, e_init } = ready.slender;
    let clause = "6.1.2.2(1) eq. 6.7";
    calc!(s, "6.1.2.2(1) eq. 6.7", "eccentricity of half the moment at the head", e_md = T_Ed / 2.0 / N_Ed);
    let e_hm = match with {
        Some(moment) => {
            given!(s, "moment of the wind on the loaded leaf", "above", M_l = moment);
            calc!(s, "6.1.2.2(1) eq. 6.7", "eccentricity of the wind", e_hm = M_l / N_Ed);
            e_hm
        }
        None => {
            given!(s, "eccentricity of the wind: none here", clause, e_hm = Length::ZERO);
            e_hm
        }
    };
    let e_mk = reduction::middle_under_lateral_load(s, t, e_init, e_md, e_hm);
    let inside = decide!(
        s,
        "6.1.2.2(1)",
        "the load stays within the section",
        "the load leaves the section: nothing resists",
        e_mk < 0.5 * t
    );
    if inside {
        return reduction::annex_g(s, annex, t, t_ef, h_ef, e_mk, f_k);
    }
    given!(s, "reduction in the middle", "the load leaves the section", Phi_m = Num::new(0.0));
    Phi_m
}

fn judge(
    s: &mut Sheet,
    decides: bool,
    id: &str,
    clause: &str,
    words: &str,
    (demand, d, resistance, r): (
        &str,
        impl crate::trace::Traced + Copy,
        &str,
        impl crate::trace::Traced + Copy,
    ),
    verdict: impl FnOnce(&mut Sheet),
) {
    if decides {
        verdict(s);
        return;
    }
    let (d, r) = (d.traced(), r.traced());
    let finding = format!("{} against {}", print::show(demand, d), print::show(resistance, r));
    s.rule(id, clause, &format!("{words}, for information"), finding, d.value <= r.value);
}
