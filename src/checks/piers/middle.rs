//! Mid-height of a pier: by Annex G with the wind as an eccentricity, or by flexure with precompression.

use super::across::{self, Blown};
use super::model::PierModel;
use super::work::{self, Pressed, Ready};
use crate::checks::returns::model::At;
use crate::checks::returns::vertical::Slender;
use crate::quantity::functions::sq;
use crate::quantity::{Force, Length, Moment, Num, print};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
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
    /// What the wind does to the loaded leaf.
    wind: Option<Blown>,
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
    let wind = across::wind(s, p, annex, ready, c);
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
        let with = wind.filter(|_| r == Route::AnnexG).map(|w| w.M_l);
        let Phi_m = reduced(s, p, annex, ready, here, with);
        calc!(s, "6.1.2.1(2) eq. 6.2", "vertical resistance", N_Rd = Phi_m * t * l_c * f_d);
        judge(s, decides, "pier-middle", clause, words, ("N_Ed", N_Ed, "N_Rd", N_Rd), |s| {
            verify!(s, "pier-middle", clause, words, N_Ed <= N_Rd);
        });
    }
    if let (Route::Flexure, Some(Blown { M_l, M_r })) = (r, wind) {
        let l = p.m.l;
        given!(s, "moment of the wind on the loaded leaf", "above", M_l);
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
