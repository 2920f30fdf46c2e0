//! What an opening brings to the strips of wall at its jambs, and to the wall over and under it.
//!
//! All is for a pressure of 1: loads along the height come out as lengths, moments as areas. The wind on the
//! breadth of an opening, and on the wall over and under it, ends up on the two jambs, half each.

use crate::building::{Frame, PanelOpening};
use crate::quantity::functions::sq;
use crate::quantity::{Area, Force, Length, Num, Stress};
use crate::trace::Sheet;
use crate::{calc, decide, given};

/// Load per length that head or sill bring to the wall over or under the opening, for a pressure of 1.
fn line_load(s: &mut Sheet, o: &PanelOpening, frame: Frame) -> Length {
    let door = o.sill == Length::ZERO;
    given!(s, "width of the opening", "job file", b_o = o.width);
    given!(s, "its height", "job file", h_o = o.height);
    match (frame, door) {
        (Frame::Jambs | Frame::Unknown, _) => {
            given!(s, "line load at head and sill", "the frame spans between its jambs", g_o = Length::ZERO);
            g_o
        }
        (Frame::AllRound, false) => {
            calc!(
                s,
                "statics, per pressure of 1",
                "line load all round",
                g_o = b_o * h_o / (2.0 * (b_o + h_o))
            );
            g_o
        }
        (Frame::AllRound, true) => {
            calc!(
                s,
                "statics, per pressure of 1",
                "line load all round",
                g_o = b_o * h_o / (b_o + 2.0 * h_o)
            );
            g_o
        }
        (Frame::HeadAndSill, false) => {
            calc!(s, "statics, per pressure of 1", "line load at head and sill", g_o = h_o / 2.0);
            g_o
        }
        (Frame::HeadAndSill, true) => {
            calc!(
                s,
                "statics, per pressure of 1",
                "line load at the head, a door has no sill",
                g_o = 1.0 * h_o
            );
            g_o
        }
    }
}

/// Pressure that the wall over or under an opening takes as a strip between the jambs; none where no wall is there.
///
/// Statics with 6.3.1: `8 M_Rd2 d / ((d + g) b²)`. `h` and `M_Rd2` stand on the sheet.
pub fn spandrels(s: &mut Sheet, o: &PanelOpening, frame: Frame, h: Length, M_Rd2: Force) -> Vec<Stress> {
    let over = h - o.sill - o.height;
    let depths = [("over", over), ("under", o.sill)];
    let mut out = Vec::new();
    for (side, depth) in depths.into_iter().filter(|d| d.1 > Length::ZERO) {
        let g_o = line_load(s, o, frame);
        given!(s, "width of the opening", "job file", b_o = o.width);
        given!(s, &format!("depth of the wall {side} it"), "job file", d_o = depth);
        calc!(
            s,
            "statics, 6.3.1",
            "pressure that it takes between the jambs",
            w_sp = 8.0 * M_Rd2 * d_o / ((d_o + g_o) * sq(b_o))
        );
        out.push(w_sp);
    }
    out
}

/// Largest moment, for a pressure of 1 and half the width of the opening taken off, in a strip that spans between
/// top and base under what comes to the jamb. `h` stands on the sheet.
pub fn moment(s: &mut Sheet, o: &PanelOpening, frame: Frame, h: Length) -> Area {
    if matches!(frame, Frame::Jambs | Frame::Unknown) {
        calc!(s, "statics, per pressure of 1", "moment of an even load over the height", A_j = sq(h) / 8.0);
        return A_j;
    }
    let g_o = line_load(s, o, frame);
    given!(s, "width of the opening", "job file", b_o = o.width);
    given!(s, "its height", "job file", h_o = o.height);
    given!(s, "height of its sill", "job file", s_o = o.sill);
    let over = h - o.sill - o.height;
    given!(s, "depth of the wall over it", "job file", d_o = over);
    let nil = Length::ZERO;
    let P_s = if o.sill > nil {
        calc!(s, "statics", "from the wall under it, over its depth", P_s = s_o + g_o);
        P_s
    } else {
        given!(s, "from under it: a door", "statics", P_s = nil);
        P_s
    };
    let P_h = if over > nil {
        calc!(s, "statics", "from the wall over it, over its depth", P_h = d_o + g_o);
        P_h
    } else {
        given!(s, "from over it: the floor takes it", "statics", P_h = nil);
        P_h
    };
    let r_o = share(s, o, frame);
    calc!(s, "statics", "from the frame at the jamb, over its height", P_j = r_o * h_o);
    calc!(
        s,
        "statics",
        "reaction at the base",
        R_s = (P_s * (h - s_o / 2.0) + P_j * (h - s_o - h_o / 2.0) + P_h * d_o / 2.0) / h
    );
    calc!(s, "statics", "reaction at the top", R_h = P_s + P_j + P_h - R_s);
    if P_s > nil
        && decide!(s, "statics", "the moment is largest under the sill", "not under the sill", R_s <= P_s)
    {
        calc!(s, "statics", "largest moment", A_j = sq(R_s) * s_o / (2.0 * P_s));
        return A_j;
    }
    if P_h > nil
        && decide!(s, "statics", "the moment is largest over the head", "not over the head", R_h <= P_h)
    {
        calc!(s, "statics", "largest moment", A_j = sq(R_h) * d_o / (2.0 * P_h));
        return A_j;
    }
    if r_o.base() <= 0.0 {
        // The load stops at the sill and goes on at the head: the moment between does not change.
        calc!(s, "statics", "moment at the sill, the same up to the head", A_j = R_s * s_o - P_s * s_o / 2.0);
        return A_j;
    }
    calc!(s, "statics", "from the sill to where the shear is nil", x_o = (R_s - P_s) / r_o);
    calc!(
        s,
        "statics",
        "largest moment",
        A_j = R_s * (s_o + x_o) - P_s * (s_o / 2.0 + x_o) - r_o * sq(x_o) / 2.0
    );
    A_j
}

/// Load per height of the jamb that the frame brings, over half the width of the opening.
fn share(s: &mut Sheet, o: &PanelOpening, frame: Frame) -> Num {
    given!(s, "width of the opening", "job file", b_o = o.width);
    given!(s, "its height", "job file", h_o = o.height);
    if frame == Frame::HeadAndSill {
        given!(s, "from the frame at the jamb", "it spans between head and sill", r_o = Num::new(0.0));
        return r_o;
    }
    if o.sill == Length::ZERO {
        calc!(s, "statics", "part of its wind at a jamb", r_o = 2.0 * h_o / (b_o + 2.0 * h_o));
        return r_o;
    }
    calc!(s, "statics", "part of its wind at a jamb", r_o = h_o / (b_o + h_o));
    r_o
}
