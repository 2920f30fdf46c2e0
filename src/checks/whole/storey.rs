//! The storey of the removed wall from the plan, where the job does not give it.

use super::{levels, lines};
use crate::building::{
    Along, BracingWall, Building, FloorKind, ShareBy, Stability, Stands, TakeDown, line_of, take_down,
};
use crate::quantity::Length;
use crate::solve::descent::Axis;
use crate::standards::annex::Annex;
use crate::trace::Sheet;
use crate::wind;

/// The building with the storey's stability of its plan, where floors stand on the plan and the job
/// gives none; the wind blows along the wall that comes out.
pub fn complete(b: Building) -> Building {
    if b.stability.is_some() {
        return b;
    }
    match from_plan(&b) {
        Some(stability) => Building { stability: Some(stability), ..b },
        None => b,
    }
}

fn from_plan(b: &Building) -> Option<Stability> {
    let down = take_down(b)?.ok()?;
    let wind = wind::pressures(&mut Sheet::silent(), b, &Annex::UK).ok()?;
    let gone = line_of(b.plan.iter().find(|w| w.removed)?)?;
    let along = if gone.along == Axis::X { Along::X } else { Along::Y };
    let k = b.storeys.iter().position(|s| s.mark == b.removed.storey)?;
    let level = levels::of(b, &down, along, &wind).into_iter().nth(k)?;
    let concrete = b.storeys[k].floor_above == FloorKind::Concrete;
    let mut walls = bracing(b, &down, along, k);
    if concrete {
        walls.extend(bracing(b, &down, if along == Along::X { Along::Y } else { Along::X }, k));
    }
    Some(Stability {
        storey: b.removed.storey.clone(),
        wind_along: along,
        front: (level.begin, level.begin + level.front),
        strip_height: level.strip,
        share_by: if concrete { ShareBy::Stiffness } else { ShareBy::Width },
        // With the part of the roof, where it comes at this level.
        force_above: level.F_above - level.F_k + level.F_roof,
        dead: level.dead,
        imposed: level.imposed,
        walls,
        from_plan: true,
    })
}

/// Lines of walls of the storey, each with the mark of its wall, or of the one that comes out.
fn bracing(b: &Building, down: &TakeDown, along: Along, k: usize) -> Vec<BracingWall> {
    let before = lines::gather(&down.before, along, k, &|_| true);
    let after = lines::gather(&down.after, along, k, &|wall| lines::counts_after(b, wall));
    let same = |a: &lines::Line, z: &lines::Line| (a.at - z.at).abs() <= lines::LINE;
    let mark = |state: &crate::building::State, line: &lines::Line| {
        let marks = || line.walls.iter().map(|&i| &b.plan[state.walls[i].wall]);
        marks().find(|w| w.removed).or_else(|| marks().next()).map_or_else(String::new, |w| w.mark.clone())
    };
    let one = |state: &crate::building::State, line: &lines::Line, stands: Stands| {
        let wall = lines::bracing(b, state, line, 0, along);
        BracingWall { mark: mark(state, line), stands, length: Length::new(line.length), ..wall }
    };
    let mut out = Vec::new();
    for line in &before {
        let stays = after.iter().find(|l| same(l, line));
        match stays {
            Some(l) if (l.length - line.length).abs() < 1.0 => {
                out.push(one(&down.before, line, Stands::Both))
            }
            _ => out.push(one(&down.before, line, Stands::Before)),
        }
    }
    for line in &after {
        let whole = before.iter().any(|l| same(l, line) && (l.length - line.length).abs() < 1.0);
        if !whole {
            out.push(one(&down.after, line, Stands::After));
        }
    }
    out
}
