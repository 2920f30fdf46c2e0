//! Walls along the wind in lines, with the share of each line in its storey.

use super::levels::{Level, axis};
use crate::building::{Along, BracingWall, Building, Ends, FloorKind, ShareBy, Stability, Stands, State};
use crate::checks::stability;
use crate::quantity::{Force, Length};
use crate::standards::annex::Annex;
use crate::trace::Sheet;
use crate::wind::Pressures;

/// How far walls of one line may miss each other, mm.
pub const LINE: f64 = 150.0;

/// A line of walls in one storey.
#[derive(Clone, Debug)]
pub struct Line {
    /// Place across.
    pub at: f64,
    /// Walls of the state, by their place in it.
    pub walls: Vec<usize>,
    /// Length of wall between openings, all together.
    pub length: f64,
    /// Share of the storey's wind.
    pub share: f64,
}

/// Lines of one storey in one state, each with its share of the wind; empty where nothing braces.
pub fn of(
    b: &Building,
    state: &State,
    along: Along,
    level: &Level,
    counted: &dyn Fn(usize) -> bool,
    (wind, annex): (Pressures, &Annex),
) -> Vec<Line> {
    let mut lines = gather(state, along, level.storey, counted);
    let crossing = match along {
        Along::X => Along::Y,
        Along::Y => Along::X,
    };
    let mut walls: Vec<BracingWall> =
        lines.iter().enumerate().map(|(i, l)| bracing(b, state, l, i, along)).collect();
    // Under a rigid floor walls across the wind hold it against turning.
    let share_by = if b.storeys[level.storey].floor_above == FloorKind::Concrete {
        let others = gather(state, crossing, level.storey, counted);
        walls.extend(others.iter().enumerate().map(|(i, l)| bracing(b, state, l, lines.len() + i, crossing)));
        ShareBy::Stiffness
    } else {
        ShareBy::Width
    };
    let storey = Stability {
        storey: b.storeys[level.storey].mark.clone(),
        wind_along: along,
        front: (level.begin, level.begin + level.front),
        strip_height: level.strip,
        share_by,
        force_above: Force::ZERO,
        dead: Force::ZERO,
        imposed: Force::ZERO,
        walls,
        from_plan: true,
    };
    let Ok(shared) = stability::share(&mut Sheet::silent(), b, &storey, wind, annex) else {
        return Vec::new();
    };
    // The lines along the wind are the first walls, and shares come in their order.
    for (line, share) in lines.iter_mut().zip(&shared.shares) {
        line.share = share.after.unwrap_or(0.0);
    }
    lines
}

/// Walls of a storey along a direction, those in one line together.
pub fn gather(state: &State, along: Along, storey: usize, counted: &dyn Fn(usize) -> bool) -> Vec<Line> {
    let mut lines: Vec<Line> = Vec::new();
    for (i, (stack, wall)) in state.walls.iter().zip(&state.model.walls).enumerate() {
        if stack.storey != storey || wall.place.along != axis(along) || !counted(stack.wall) {
            continue;
        }
        let length = state.down.walls[i].piers.iter().map(|p| p.to - p.from).sum::<f64>();
        match lines.iter_mut().find(|l| (l.at - wall.place.at).abs() <= LINE) {
            Some(line) => {
                line.walls.push(i);
                line.length += length;
            }
            None => lines.push(Line { at: wall.place.at, walls: vec![i], length, share: 0.0 }),
        }
    }
    lines
}

/// A line as the sharing of a storey sees it; its mark is its number.
pub fn bracing(b: &Building, state: &State, line: &Line, number: usize, along: Along) -> BracingWall {
    let ends = line.walls.iter().map(|&i| state.model.walls[i].place);
    let (from, to) = ends.fold((f64::INFINITY, f64::NEG_INFINITY), |(a, z), p| (a.min(p.from), z.max(p.to)));
    let stack = &state.walls[line.walls[0]];
    BracingWall {
        mark: number.to_string(),
        along,
        at: Length::new(line.at),
        other_at: Some(Length::new((from + to) / 2.0)),
        length: Length::new(line.length),
        height: b.storeys[stack.storey].clear_height,
        build_up: b.plan[stack.wall].build_up.clone(),
        stands: Stands::Both,
        ends: Ends::Cantilever,
    }
}

/// Whether a plan wall counts after the removal: what stays of the wall that comes out does not.
pub fn counts_after(b: &Building, wall: usize) -> bool {
    let mark = &b.plan[wall].mark;
    !b.returns.iter().any(|r| r.mark == *mark)
}
