//! What a panel with openings passes on to the returns that hold its ends.
//!
//! A return is checked for the wind on a strip of front, its tributary width, under the pressure on the building as a
//! whole; a panel for the higher pressure on itself. What they share is the width: that which a panel brings is its
//! reaction over its own pressure and height, and both neighbours of a return bring some.

use super::Job;
use super::panel_sheet::{model, named, names};
use super::panels::PanelModel;
use super::panels::bracket::reactions::{self, Reaction};
use crate::building::{Panel, Path, Return};
use crate::quantity::print::show;
use crate::quantity::{Length, LineLoad};
use crate::standards::masonry::Edge;
use crate::trace::{Sheet, Unshown};

/// The width of front whose wind a panel brings to one of its ends.
struct Share {
    mark: String,
    width: Length,
    /// Its reaction, averaged over the height held, where limit analysis has it.
    reaction: Option<LineLoad>,
}

/// What limit analysis brings to the returns that hold the ends of panel `p`, with what its neighbour brings there, against
/// the width that the sheets of the returns count: a note, or a row of the results where it is more.
pub fn to_returns(job: &Job<'_>, p: &Panel, m: &PanelModel, s: &mut Sheet) {
    let Some(all) = reactions::of(m, &job.annex) else { return };
    for r in named(job, p).filter(|r| r.path != Path::UpAndDown) {
        let own = shares(job, p, m, Some(&all), r);
        if own.is_empty() {
            continue;
        }
        let others = job.building.panels.iter().filter(|o| o.mark != p.mark);
        let beside = others.filter_map(|o| Some((o, model(job, o).ok()?)));
        let beside =
            beside.flat_map(|(o, n)| shares(job, o, &n, reactions::of(&n, &job.annex).as_deref(), r));
        let shares: Vec<Share> = own.into_iter().chain(beside).collect();
        say(s, r, &shares);
    }
}

/// What panel `p` brings to the ends that `r` holds: by its reactions, or half of its length where there are none, all
/// of it where its other end is free.
fn shares(
    job: &Job<'_>,
    p: &Panel,
    m: &PanelModel,
    reactions: Option<&[Reaction]>,
    r: &Return,
) -> Vec<Share> {
    let ends = [("left", &p.after.left, &p.after.right), ("right", &p.after.right, &p.after.left)];
    let W_Ed = m.q_net * job.annex.gamma_Q;
    let one = |(side, edge, other): (&str, &crate::building::Edge, &crate::building::Edge)| {
        if !names(edge, &r.mark) {
            return None;
        }
        let reaction = reactions.and_then(|all| all.iter().find(|x| x.edge == side));
        let width = match reaction {
            Some(x) => Length::new(x.total / (W_Ed.base() * m.h.base())),
            None if other.kind == Edge::Free => p.after.length,
            None => p.after.length / 2.0,
        };
        let reaction = reaction.map(|x| LineLoad::new(x.total / x.length));
        Some(Share { mark: p.mark.clone(), width, reaction })
    };
    ends.into_iter().filter_map(one).collect()
}

fn say(s: &mut Sheet, r: &Return, shares: &[Share]) {
    let metres = |l: Length| show("b", l.dynamic()).to_string();
    let (brings, counts) = (shares.iter().fold(Length::ZERO, |sum, x| sum + x.width), r.tributary_width);
    let each: Vec<String> = shares
        .iter()
        .map(|x| match x.reaction {
            Some(w) => format!(
                "{} brings {} of design wind, that of {} of front",
                x.mark,
                show("w_Ed", w.dynamic()),
                metres(x.width)
            ),
            None => format!("{}, not worked so, counts with {}", x.mark, metres(x.width)),
        })
        .collect();
    let each = each.join("; ");
    if brings <= counts {
        s.note(format!(
            "To {} by limit analysis: {each}. Together {}; the sheet of {} counts {}.",
            r.mark,
            metres(brings),
            r.mark,
            metres(counts)
        ));
    } else {
        s.unshown(Unshown {
            id: format!("brings-{}", r.mark),
            clause: "limit analysis".to_owned(),
            words: format!("wind passed on to {}", r.mark),
            finding: format!(
                "By limit analysis: {each}. Together {}, more than the {} of front that the sheet of {} counts.",
                metres(brings),
                metres(counts),
                r.mark
            ),
            ratio: Some(brings.base() / counts.base()),
            hold: None,
        });
    }
}
