//! The statics of a return in its plane: from wind and tilt to moment and shear at a section.
//!
//! Written once, for two sets of symbols: design and characteristic values never share one.

use super::model::{At, Model};
use crate::quantity::functions::sq;
use crate::quantity::{Force, LineLoad, Moment, Num};
use crate::trace::Sheet;
use crate::{calc, given};

macro_rules! statics {
    (
        $(#[$doc:meta])* $name:ident, $clause:literal:
        $k:ident, $H_nu:ident => $H:ident, $w:ident, $M_h:ident => $M:ident, $V:ident
    ) => {
        $(#[$doc])*
        pub mod $name {
            use super::*;

            /// Lateral actions at the head and along the height.
            #[derive(Clone, Copy, Debug)]
            pub struct Along {
                /// Force at the head, tilt included.
                pub $H: Force,
                /// Line load.
                pub $w: LineLoad,
                /// Moment at the head.
                pub $M_h: Moment,
            }

            /// Wind and tilt; the factor and the tilt stand on the sheet. What is nought is not printed.
            pub fn along(s: &mut Sheet, m: &Model, $k: Num, $H_nu: Force) -> Along {
                let $H = at_head(s, m, $k, $H_nu);
                let ($w, $M_h) = below(s, m, $k);
                Along { $H, $w, $M_h }
            }

            fn at_head(s: &mut Sheet, m: &Model, $k: Num, $H_nu: Force) -> Force {
                let H_k = m.lateral.H_k;
                calc!(s, $clause, "force at the head, tilt included", $H = $k * H_k + $H_nu);
                $H
            }

            fn below(s: &mut Sheet, m: &Model, $k: Num) -> (LineLoad, Moment) {
                let (w_k, M_k) = (m.lateral.w_k, m.lateral.M_k);
                let $w = if w_k == LineLoad::ZERO {
                    LineLoad::ZERO
                } else {
                    calc!(s, $clause, "line load", $w = $k * w_k);
                    $w
                };
                let $M_h = if M_k == Moment::ZERO {
                    Moment::ZERO
                } else {
                    calc!(s, $clause, "moment at the head", $M_h = $k * M_k);
                    $M_h
                };
                ($w, $M_h)
            }

            /// Moment and shear of wind and tilt at the section. The force at a head that is held stays there.
            pub fn at(s: &mut Sheet, m: &Model, $k: Num, $H_nu: Force, at: At) -> (Moment, Force) {
                let $H = if m.propped { Force::ZERO } else { at_head(s, m, $k, $H_nu) };
                let ($w, $M_h) = below(s, m, $k);
                let d = Along { $H, $w, $M_h };
                let $M = if m.propped { held(s, m, d, at) } else { cantilever(s, m, d, at) };
                let $V = shear(s, m, d, at);
                ($M, $V)
            }

            /// Moment of the lateral loads in a cantilever.
            fn cantilever(s: &mut Sheet, m: &Model, d: Along, at: At) -> Moment {
                let h = m.h;
                let Along { $H, $w, $M_h } = d;
                match (at, m.lateral.M_k == Moment::ZERO, m.lateral.w_k == LineLoad::ZERO) {
                    (At::Head, true, _) => {
                        given!(s, "lateral moment at the head", "none from above", $M = Moment::ZERO);
                        $M
                    }
                    (At::Head, false, _) => {
                        calc!(s, "statics", "lateral moment at the head", $M = $M_h);
                        $M
                    }
                    (_, true, true) => {
                        calc!(s, "statics, head free", "moment of the lateral loads", $M = $H * h);
                        $M
                    }
                    (_, false, true) => {
                        calc!(s, "statics, head free", "moment of the lateral loads", $M = $M_h + $H * h);
                        $M
                    }
                    (_, true, false) => {
                        calc!(
                            s,
                            "statics, head free",
                            "moment of the lateral loads",
                            $M = $H * h + $w * sq(h) / 2.0
                        );
                        $M
                    }
                    (_, false, false) => {
                        calc!(
                            s,
                            "statics, head free",
                            "moment of the lateral loads",
                            $M = $M_h + $H * h + $w * sq(h) / 2.0
                        );
                        $M
                    }
                }
            }

            /// Moment of the lateral loads where the head is held.
            fn held(s: &mut Sheet, m: &Model, d: Along, at: At) -> Moment {
                let h = m.h;
                let Along { $w, $M_h, .. } = d;
                match (at == At::Middle && m.lateral.w_k > LineLoad::ZERO, m.lateral.M_k == Moment::ZERO) {
                    (false, true) => {
                        given!(s, "moment of the lateral loads", "head held: none here", $M = Moment::ZERO);
                        $M
                    }
                    (false, false) => {
                        calc!(s, "statics, head held", "moment of the lateral loads", $M = $M_h);
                        $M
                    }
                    (true, true) => {
                        calc!(
                            s,
                            "statics, head held",
                            "moment of the lateral loads",
                            $M = $w * sq(h) / 8.0
                        );
                        $M
                    }
                    (true, false) => {
                        calc!(
                            s,
                            "statics, head held",
                            "moment of the lateral loads",
                            $M = $M_h + $w * sq(h) / 8.0
                        );
                        $M
                    }
                }
            }

            /// Shear at the section; a held head passes its force to the named walls.
            fn shear(s: &mut Sheet, m: &Model, d: Along, at: At) -> Force {
                let h = m.h;
                let Along { $H, $w, .. } = d;
                if m.propped {
                    if !m.sheared() || at == At::Middle {
                        return Force::ZERO;
                    }
                    calc!(
                        s,
                        "statics, head held",
                        "shear; the named walls take the head force",
                        $V = $w * h / 2.0
                    );
                    return $V;
                }
                if at == At::Head || m.lateral.w_k == LineLoad::ZERO {
                    calc!(s, "statics, head free", "shear", $V = $H);
                    return $V;
                }
                calc!(s, "statics, head free", "shear", $V = $H + $w * h);
                $V
            }
        }
    };
}

statics! {
    /// At design value.
    design, "EN 1990 6.4.3.2": gamma_W, H_nu => H_Ed, w_Ed, M_h => M_W, V_Ed
}

statics! {
    /// At characteristic value, for what a footing presses on the ground.
    characteristic, "EN 1990 6.5.3": k_W, H_t => H_F, w_F, M_hF => M_WF, V_F
}
