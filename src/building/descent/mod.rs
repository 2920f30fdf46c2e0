//! The plan led down to the ground: what every wall carries, before the removal and after it.

mod loads;
mod model;
mod on_return;
mod trouble;

use super::found::stands;
use super::{Building, FloorKind, PlanWall};
use crate::solve::descent::{self, Descent, From, Model, Support, Wall};

pub use loads::{Led, take_loads};
pub use model::{line_of, storey_height};
pub use trouble::Trouble;

/// Source of a load that comes from the plan.
pub const LED: &str = "load take-down of this pack";

/// Walls of the plan storey by storey, in the order of the model's walls.
#[derive(Clone, Debug, PartialEq)]
pub struct Stack {
    /// Place in the building's plan.
    pub wall: usize,
    /// Place in the building's storeys.
    pub storey: usize,
}

/// What stands and what it carries, in one state.
#[derive(Clone, Debug)]
pub struct State {
    /// What the model's walls are.
    pub walls: Vec<Stack>,
    /// What stands.
    pub model: Model,
    /// What arrives where.
    pub down: Descent,
}

/// Both states.
#[derive(Clone, Debug)]
pub struct TakeDown {
    /// With the wall that comes out.
    pub before: State,
    /// With the beams in its place.
    pub after: State,
    /// Before, with no more of each wall's weight than its loaded leaf's: what that leaf carries.
    pub on_leaf_before: State,
    /// The same after.
    pub on_leaf: State,
}

/// Leads the plan down; nothing where it has no floors.
///
/// # Errors
/// [`Trouble`] where a load does not reach the ground, before the removal or after it.
pub fn take_down(b: &Building) -> Option<Result<TakeDown, Trouble>> {
    if b.floors.is_empty() {
        return None;
    }
    let state = |after: bool, leaf: bool| {
        let (walls, model) = model::model(b, after, leaf);
        match descent::lead_down(&model) {
            Ok(down) => Ok(State { walls, model, down }),
            Err(trouble) => Err(trouble::named(b, &walls, &model, trouble, after)),
        }
    };
    let all = || {
        Ok(TakeDown {
            before: state(false, false)?,
            after: state(true, false)?,
            on_leaf_before: state(false, true)?,
            on_leaf: state(true, true)?,
        })
    };
    Some(all())
}

impl State {
    /// The wall marked `mark` in storey number `storey`, with what it carries.
    pub fn wall(&self, b: &Building, mark: &str, storey: usize) -> Option<(&Wall, &descent::OnWall)> {
        let i = self.walls.iter().position(|s| s.storey == storey && b.plan[s.wall].mark == mark)?;
        Some((&self.model.walls[i], &self.down.walls[i]))
    }

    /// Plan wall number `wall` in storey number `storey`, with what it carries.
    pub fn of_plan(&self, wall: usize, storey: usize) -> Option<(&Wall, &descent::OnWall)> {
        // Walls stand in the order of the plan, each from storey to storey.
        let i = self.walls.binary_search_by_key(&(wall, storey), |s| (s.wall, s.storey)).ok()?;
        Some((&self.model.walls[i], &self.down.walls[i]))
    }

    /// What brings a load, by its mark.
    pub fn name(&self, b: &Building, by: From) -> String {
        match by {
            From::Floor(i) => {
                let floor = &b.floors[i];
                let roof = b.storey(&floor.storey).is_some_and(|s| s.floor_above == FloorKind::Roof);
                let word = if roof { "roof" } else { "floor" };
                if floor.mark == word { word.to_owned() } else { format!("{word} {}", floor.mark) }
            }
            From::Wall(i) => format!("{} above", b.plan[self.walls[i].wall].mark),
            From::Beam(i, _) => format!("beam {}", b.beams[i].mark),
            From::Own => "own weight".to_owned(),
        }
    }

    /// What is under the end of a beam, by its mark.
    pub fn under(&self, b: &Building, support: Support) -> String {
        match support {
            Support::Wall(i) => b.plan[self.walls[i].wall].mark.clone(),
            Support::Beam(i) => format!("beam {}", b.beams[i].mark),
        }
    }
}

/// Whether a plan wall stands in the storey marked `storey`.
pub fn stands_in(b: &Building, wall: &PlanWall, storey: &str) -> bool {
    stands(wall, storey, &b.removed.storey)
}
