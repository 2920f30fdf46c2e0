//! What the plan shows of the removal: the returns that stay, and the panels that lose a support.
//!
//! Geometry alone, in the storey of the wall that comes out. Lines may miss each other by [`REACH`];
//! spans run between the lines of the plan, distances along the wall met from the faces of the return.

mod closes;
mod complete;
mod panels;
mod returns;
mod storey;

#[cfg(test)]
mod tests;

use super::{Along, BuildUp, PanelOpening, PlanFloor, PlanWall, Side, Storey};
use crate::quantity::Length;
pub use closes::{OpenEnd, open_ends};
pub use complete::{MU_USUAL, complete, junction, restraint, span, title_of_panel, title_of_return, treated};
use storey::Floor;

/// What lines on the plan may miss each other by, mm.
pub const REACH: f64 = 150.0;

/// A wall counts as a support of another where it is at least this part of the clear height long before
/// its first opening: EN 1996-1-1 5.5.1.2(6), stiffening walls.
pub const STIFFENS: f64 = 0.2;

/// Everything found.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Found {
    /// Pieces in the line of the wall that comes out.
    pub returns: Vec<FoundReturn>,
    /// Lengths of outer wall that it held.
    pub panels: Vec<FoundPanel>,
    /// Marks of returns and panels that no entry of the job file gave.
    pub added: Vec<String>,
}

/// A piece of wall that stays in the line of the wall that comes out, and meets another.
#[derive(Clone, Debug, PartialEq)]
pub struct FoundReturn {
    /// Mark of its wall on the plan.
    pub mark: String,
    /// The wall that it meets, by mark.
    pub meets: String,
    /// From the line of the wall met to its free end or its first opening.
    pub length: Length,
    /// Half the distances to the supports on either side.
    pub tributary: Length,
    /// From its nearer face to the nearest opening of the wall met.
    pub nearest_opening: Option<Length>,
    /// Along the wall met to its end or an opening, towards lesser and towards greater x or y.
    pub to_end: [Length; 2],
    /// Clear distance to the next support on each of these sides.
    pub to_next: [Option<Length>; 2],
    /// Thickness of the loaded leaf of the wall met.
    pub thickness: Length,
    /// Height of the wall met over all storeys in which it stands.
    pub supported: Length,
    /// Height of wind face that the floor over the storey collects.
    pub strip: Length,
    /// Long enough to hold the edge of a panel.
    pub holds: bool,
}

/// A length of outer wall that the wall that comes out held at one end, or in between.
#[derive(Clone, Debug, PartialEq)]
pub struct FoundPanel {
    /// The wall on the plan, by mark.
    pub on: String,
    /// As it spans with the wall.
    pub before: FoundSpan,
    /// As it spans without it.
    pub after: FoundSpan,
    /// From its left end to where the wall met it.
    pub wall_at: Length,
}

/// From support to support along a wall.
#[derive(Clone, Debug, PartialEq)]
pub struct FoundSpan {
    /// Where it begins and ends, in x or y of the plan.
    pub range: (Length, Length),
    /// What holds its left and its right end, seen from outside; nothing where that end is free.
    pub held: [Option<String>; 2],
    /// Doors and windows in it, from its left end.
    pub openings: Vec<PanelOpening>,
}

impl FoundSpan {
    /// Its length.
    pub fn length(&self) -> Length {
        self.range.1 - self.range.0
    }
}

impl Found {
    /// The return that is the plan wall `mark`.
    pub fn of_return(&self, mark: &str) -> Option<&FoundReturn> {
        self.returns.iter().find(|r| r.mark == mark)
    }

    /// Panels on the wall `on`.
    pub fn on<'f>(&'f self, on: &'f str) -> impl Iterator<Item = &'f FoundPanel> {
        self.panels.iter().filter(move |p| p.on == on)
    }
}

/// What there is to look at: the job file may be half read.
pub struct Around<'a> {
    /// Walls of the plan.
    pub walls: Vec<&'a PlanWall>,
    /// Storeys, lowest first.
    pub storeys: Vec<&'a Storey>,
    /// Floors and roofs.
    pub floors: Vec<&'a PlanFloor>,
    /// Build-ups.
    pub build_ups: Vec<&'a BuildUp>,
    /// Sides on which a neighbour adjoins.
    pub neighbours: &'a [Side],
    /// Storey of the wall that comes out, by mark.
    pub storey: &'a str,
}

/// Finds what stays and what loses a support; nothing where no wall comes out or it lies along neither x nor y.
pub fn find(around: &Around<'_>) -> Found {
    let Some(floor) = Floor::of(around) else { return Found::default() };
    let returns = returns::of(&floor);
    let panels = panels::of(&floor, &returns);
    Found { returns, panels, added: Vec::new() }
}

/// The side of the building on which a plan wall faces the outside at `s`, in the storey of the wall that comes
/// out: none for a wall inside, along a neighbour, or askew.
pub fn facing(b: &super::Building, mark: &str, s: Length) -> Option<Side> {
    let around = Around {
        walls: b.plan.iter().collect(),
        storeys: b.storeys.iter().collect(),
        floors: b.floors.iter().collect(),
        build_ups: b.build_ups.iter().collect(),
        neighbours: &b.neighbours,
        storey: &b.removed.storey,
    };
    let floor = Floor::of(&around)?;
    let line = floor.lines.iter().find(|l| l.wall.mark == mark)?;
    let outside = floor.outside(line, s.base())?;
    Some(storey::side(line.along, outside))
}

/// Whether a plan wall stands in the storey marked `storey`, the wall that comes out in `removed` alone.
pub fn stands(wall: &PlanWall, storey: &str, removed: &str) -> bool {
    if wall.storeys.is_empty() {
        !wall.removed || storey == removed
    } else {
        wall.storeys.iter().any(|s| s == storey)
    }
}

/// The other direction.
const fn across(along: Along) -> Along {
    match along {
        Along::X => Along::Y,
        Along::Y => Along::X,
    }
}
