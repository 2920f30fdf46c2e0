//! The storey of the wall that comes out, as lines along x and y.

use super::{Around, REACH, STIFFENS, across, stands};
use crate::building::{Along, BuildUp, PlanOpening, PlanWall, Side, Storey};
use crate::quantity::Length;

/// A wall of the storey, with its openings there; mm of the plan.
pub struct Line<'a> {
    /// The wall.
    pub wall: &'a PlanWall,
    /// Direction of its length.
    pub along: Along,
    /// Place across.
    pub at: f64,
    /// Where it begins; less than `to`.
    pub from: f64,
    /// Where it ends.
    pub to: f64,
    /// Its openings in this storey, from and to, in order.
    pub openings: Vec<(f64, f64)>,
    /// Its thickness.
    pub thickness: f64,
}

/// The storey.
pub struct Floor<'a> {
    /// What it was made from.
    pub around: &'a Around<'a>,
    /// Place of the storey.
    pub number: usize,
    /// Walls that stand in it before the removal.
    pub lines: Vec<Line<'a>>,
    /// The wall that comes out, by its place in `lines`.
    pub gone: usize,
}

/// A support on a line: where it is and which wall.
#[derive(Clone, Debug, PartialEq)]
pub struct Support {
    /// Place along the line held.
    pub at: f64,
    /// Half its thickness.
    pub half: f64,
    /// The wall, by mark.
    pub mark: String,
}

impl<'a> Floor<'a> {
    /// The storey, where a wall comes out of it along x or y.
    pub fn of(around: &'a Around<'a>) -> Option<Self> {
        let number = around.storeys.iter().position(|s| s.mark == around.storey)?;
        let lines = lines(around, around.storey);
        let gone = lines.iter().position(|l| l.wall.removed)?;
        Some(Self { around, number, lines, gone })
    }

    /// The storey itself.
    pub fn storey(&self) -> &'a Storey {
        self.around.storeys[self.number]
    }

    /// The wall that comes out.
    pub fn gone(&self) -> &Line<'a> {
        &self.lines[self.gone]
    }

    /// The build-up of a line.
    pub fn build_up(&self, line: &Line<'_>) -> Option<&'a BuildUp> {
        self.around.build_ups.iter().copied().find(|b| b.name == line.wall.build_up)
    }

    /// Walls across that end in or run through the point of `line`'s row at `s`.
    pub fn meets(&self, along: Along, at: f64, s: f64) -> Option<&Line<'a>> {
        let near = |l: &&Line<'a>| {
            l.along == across(along)
                && (l.at - s).abs() <= REACH
                && l.from - REACH <= at
                && at <= l.to + REACH
        };
        self.lines.iter().filter(near).min_by(|a, b| (a.at - s).abs().total_cmp(&(b.at - s).abs()))
    }

    /// How far a row of touching walls along `line` runs, and their openings.
    pub fn row(&self, line: &Line<'_>) -> Row {
        let mut row = Row { from: line.from, to: line.to, openings: line.openings.clone() };
        let same: Vec<&Line<'_>> = (self.lines.iter())
            .filter(|l| {
                l.along == line.along && (l.at - line.at).abs() <= REACH && l.wall.mark != line.wall.mark
            })
            .collect();
        let mut taken = vec![false; same.len()];
        // Pieces are few: look again until none touches.
        while let Some(i) = (0..same.len())
            .find(|&i| !taken[i] && same[i].from <= row.to + REACH && same[i].to >= row.from - REACH)
        {
            taken[i] = true;
            row.from = row.from.min(same[i].from);
            row.to = row.to.max(same[i].to);
            row.openings.extend(&same[i].openings);
        }
        row.openings.sort_by(|a, b| a.0.total_cmp(&b.0));
        row
    }

    /// Doors and windows of the walls in the line of `line`, with where each begins and ends along it.
    pub fn doors(&self, line: &Line<'_>) -> Vec<(f64, f64, &'a PlanOpening)> {
        let same = |l: &&Line<'a>| l.along == line.along && (l.at - line.at).abs() <= REACH;
        let storey = self.around.storey;
        let mut all: Vec<_> =
            self.lines.iter().filter(same).flat_map(|l| doors(l.wall, l.along, storey)).collect();
        all.sort_by(|a, b| a.0.total_cmp(&b.0));
        all
    }

    /// Walls that hold the row of `line` and stay, in order, those in the line of the wall that comes out left out.
    pub fn supports(&self, line: &Line<'_>) -> Vec<Support> {
        let row = self.row(line);
        let gone = self.gone();
        let least = STIFFENS * self.storey().clear_height.base();
        let holds = |l: &&Line<'_>| {
            l.along == across(line.along)
                && (l.at - gone.at).abs() > REACH
                && row.from - REACH <= l.at
                && l.at <= row.to + REACH
                && l.from - REACH <= line.at
                && line.at <= l.to + REACH
                && solid(l, line.at) >= least
        };
        let support = |l: &Line<'_>| Support { at: l.at, half: l.thickness / 2.0, mark: l.wall.mark.clone() };
        let mut all: Vec<Support> = self.lines.iter().filter(holds).map(support).collect();
        all.sort_by(|a, b| a.at.total_cmp(&b.at));
        all.dedup_by(|b, a| (b.at - a.at).abs() <= REACH);
        all
    }

    /// The side of `line` on which the outside lies at `s`, as the sign of the direction across: nothing
    /// for a wall with rooms on both sides, or with a neighbour beyond.
    pub fn outside(&self, line: &Line<'_>, s: f64) -> Option<f64> {
        let covered = |at: f64| {
            let point = if line.along == Along::X { (s, at) } else { (at, s) };
            covered(self.around, self.around.storey, point)
        };
        let step = line.thickness / 2.0 + REACH;
        let side = match (covered(line.at - step), covered(line.at + step)) {
            (true, true) => return None,
            (false, true) => -1.0,
            (true, false) => 1.0,
            // No floor on either side: outside is away from the rest of the house.
            (false, false) => {
                let middle = self.middle(across(line.along));
                if line.at < middle { -1.0 } else { 1.0 }
            }
        };
        (!self.around.neighbours.contains(&self::side(line.along, side))).then_some(side)
    }

    /// The middle of all walls in the direction `along`.
    fn middle(&self, along: Along) -> f64 {
        let ends =
            self.lines.iter().flat_map(|l| if l.along == along { [l.from, l.to] } else { [l.at, l.at] });
        let (low, high) = ends.fold((f64::INFINITY, f64::NEG_INFINITY), |(a, z), e| (a.min(e), z.max(e)));
        (low + high) / 2.0
    }
}

/// Walls of the storey marked `storey` before the removal that lie along x or y.
pub fn lines<'a>(around: &Around<'a>, storey: &str) -> Vec<Line<'a>> {
    let here = around.walls.iter().filter(|w| stands(w, storey, around.storey));
    here.filter_map(|w| line(around, w, storey)).collect()
}

/// Whether a floor or roof over the storey marked `storey` lies over a point, mm.
pub fn covered(around: &Around<'_>, storey: &str, (p, q): (f64, f64)) -> bool {
    around.floors.iter().filter(|f| f.storey == storey).any(|f| {
        let range = |a: Length, z: Length| (a.base().min(z.base()), a.base().max(z.base()));
        let (x, y) = (range(f.from.0, f.to.0), range(f.from.1, f.to.1));
        x.0 < p && p < x.1 && y.0 < q && q < y.1
    })
}

/// The side on which a wall along `along` faces, `outside` being the sign of the direction across.
pub const fn side(along: Along, outside: f64) -> Side {
    match (along, outside < 0.0) {
        (Along::X, true) => Side::Down,
        (Along::X, false) => Side::Up,
        (Along::Y, true) => Side::Left,
        (Along::Y, false) => Side::Right,
    }
}

/// Walls in one line that touch.
pub struct Row {
    /// Where it begins.
    pub from: f64,
    /// Where it ends.
    pub to: f64,
    /// Openings in order.
    pub openings: Vec<(f64, f64)>,
}

/// The longer length of `l` without opening on either side of `at`; a wall that runs through counts with either.
fn solid(l: &Line<'_>, at: f64) -> f64 {
    let at = at.clamp(l.from, l.to);
    if l.openings.iter().any(|o| o.0 < at && at < o.1) {
        return 0.0;
    }
    let low = l.openings.iter().map(|o| o.1).filter(|&e| e <= at).fold(l.from, f64::max);
    let high = l.openings.iter().map(|o| o.0).filter(|&e| e >= at).fold(l.to, f64::min);
    (at - low).max(high - at)
}

/// Openings of a wall along x or y in a storey, with where each begins and ends along it, mm of the plan.
fn doors<'a>(
    wall: &'a PlanWall,
    along: Along,
    storey: &str,
) -> impl Iterator<Item = (f64, f64, &'a PlanOpening)> {
    let of = |at: crate::building::At| if along == Along::X { at.0.base() } else { at.1.base() };
    let (start, end) = (of(wall.from), of(wall.to));
    let ahead = if end > start { 1.0 } else { -1.0 };
    wall.openings.iter().filter(move |o| o.storey == storey).map(move |o| {
        let (p, q) = (start + ahead * o.from.base(), start + ahead * (o.from + o.width).base());
        (p.min(q), p.max(q), o)
    })
}

fn line<'a>(around: &Around<'_>, wall: &'a PlanWall, storey: &str) -> Option<Line<'a>> {
    let (a, z) = ((wall.from.0.base(), wall.from.1.base()), (wall.to.0.base(), wall.to.1.base()));
    let (along, at, start, end) = if a.1 == z.1 {
        (Along::X, a.1, a.0, z.0)
    } else if a.0 == z.0 {
        (Along::Y, a.0, a.1, z.1)
    } else {
        return None;
    };
    let mut openings: Vec<(f64, f64)> = doors(wall, along, storey).map(|(a, z, _)| (a, z)).collect();
    openings.sort_by(|a, b| a.0.total_cmp(&b.0));
    let thickness =
        around.build_ups.iter().find(|b| b.name == wall.build_up).map_or(100.0, |b| b.thickness().base());
    Some(Line { wall, along, at, from: start.min(end), to: start.max(end), openings, thickness })
}
