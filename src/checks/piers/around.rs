//! What lies around a length of wall, found by place: the cost of a plan grows with its walls, not with their square.

use rstar::primitives::{GeomWithData, Rectangle};
use rstar::{AABB, RTree};

use crate::building::{Along, Building, State};
use crate::checks::whole::levels;
use crate::solve::descent::{Axis, Place};

/// A rectangle on plan, mm, with the place of its thing in a list.
type Area = GeomWithData<Rectangle<[f64; 2]>, usize>;

/// Floors over the plan and where it ends.
pub struct Around {
    /// Floors and roofs, each with the place of its storey.
    floors: RTree<Area>,
    /// From where to where the building reaches across wind along x and along y, mm.
    fronts: [(f64, f64); 2],
}

impl Around {
    /// Of a building.
    pub fn new(b: &Building) -> Self {
        let floor = |f: &crate::building::PlanFloor| {
            let storey = b.storeys.iter().position(|s| s.mark == f.storey)?;
            let corner = |at: crate::building::At| [at.0.base(), at.1.base()];
            Some(Area::new(Rectangle::from_corners(corner(f.from), corner(f.to)), storey))
        };
        let front = |along| {
            let (low, high) = levels::front(b, along);
            (low.base(), high.base())
        };
        Self {
            floors: RTree::bulk_load(b.floors.iter().filter_map(floor).collect()),
            fronts: [front(Along::X), front(Along::Y)],
        }
    }

    /// Whether a floor or roof over storey `k`, or over one above it, lies over a point.
    pub fn covered(&self, k: usize, x: f64, y: f64) -> bool {
        self.floors.locate_all_at_point([x, y]).any(|area| area.data >= k)
    }

    /// From where to where the building reaches across wind along an axis of the plan, mm.
    pub const fn front(&self, along: Along) -> (f64, f64) {
        self.fronts[along as usize]
    }
}

/// Lines of the walls that stand in one state.
pub struct Lines(RTree<Area>);

impl Lines {
    /// Of a state.
    pub fn new(state: &State) -> Self {
        let line = |(i, w): (usize, &crate::solve::descent::Wall)| Area::new(rectangle(w.place, 0.0), i);
        Self(RTree::bulk_load(state.model.walls.iter().enumerate().map(line).collect()))
    }

    /// Walls that come within `near` of a stretch, in their order in the state.
    pub fn near(&self, stretch: Place, near: f64) -> Vec<usize> {
        let reach = rectangle(stretch, near);
        let reach = AABB::from_corners(reach.lower(), reach.upper());
        let mut out: Vec<usize> =
            self.0.locate_in_envelope_intersecting(reach).map(|area| area.data).collect();
        out.sort_unstable();
        out
    }
}

/// A stretch with `near` around it.
fn rectangle(p: Place, near: f64) -> Rectangle<[f64; 2]> {
    let (low, high) = ([p.from - near, p.at - near], [p.to + near, p.at + near]);
    let turn = |[along, across]: [f64; 2]| if p.along == Axis::X { [along, across] } else { [across, along] };
    Rectangle::from_corners(turn(low), turn(high))
}
