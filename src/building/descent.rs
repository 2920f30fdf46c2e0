//! The plan led down to the ground: what every wall carries, before the removal and after it.

use super::found::{REACH, stands};
use super::{Along, Before, Building, FloorKind, Load, PlanWall, heights};
use crate::quantity::{Force, Length, LineLoad};
use crate::solve::descent::{self, Axis, Descent, Floor, From, Model, Opening, Place, Support, Wall};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;

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

/// A load that does not reach the ground, with what it is of.
#[derive(Clone, Debug, PartialEq)]
pub struct Trouble {
    /// Mark of the floor, wall or beam.
    pub mark: String,
    /// What is wrong, in words.
    pub what: String,
    /// Whether it is so with the wall out.
    pub after: bool,
    /// A small sketch: the supports in order along the line looked at.
    pub sketch: String,
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
        let (walls, model) = model(b, after, leaf);
        match descent::lead_down(&model) {
            Ok(down) => Ok(State { walls, model, down }),
            Err(trouble) => Err(named(b, &walls, &model, trouble, after)),
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
}

impl TakeDown {
    /// Loads at the head of the return marked `mark`, a wall of the plan, after the removal: one entry for
    /// everything that brings some, its place from the junction end.
    pub fn on_return(&self, b: &Building, mark: &str, storey: usize) -> Vec<Load> {
        let Some((wall, on)) = self.on_leaf.wall(b, mark, storey) else { return Vec::new() };
        let Place { along, at, from, to } = wall.place;
        let end = |s: f64| match along {
            Axis::X => (s, at),
            Axis::Y => (at, s),
        };
        // The junction lies at the end nearer to the wall met.
        let met = b.returns.iter().find(|r| r.mark == mark).map(|r| r.junction.to.as_str());
        let met = met.and_then(|to| b.plan.iter().find(|w| w.mark == to));
        let first = met.is_none_or(|m| away(m, end(from)) <= away(m, end(to)));
        // A return begins at the face of the wall that it meets; what stands within that wall stands at its face.
        let face = met.and_then(|m| b.build_up(&m.build_up)).map_or(0.0, |u| u.thickness().base() / 2.0);
        let place = |s: f64| ((if first { s - from } else { to - s }) - face).max(0.0);
        let leaf = b
            .plan
            .iter()
            .find(|w| w.mark == mark)
            .and_then(|w| b.build_up(&w.build_up))
            .map_or(0, |u| u.loaded().0);
        // Of a wall with openings the return is the length at the junction, and carries what that carries.
        if let [lowest, .., highest] = on.piers.as_slice() {
            let pier = if first { lowest } else { highest };
            let middle = (pier.from + pier.to) / 2.0;
            // Dead, imposed and uplift may stand in different places.
            let one = |i: usize, what: &str| {
                let only = |k: usize| Force::new(if i == k { pier.head[k] } else { 0.0 });
                Load {
                    what: format!("{what} of all above"),
                    dead: only(0),
                    imposed: only(1),
                    uplift: only(2),
                    at: Length::new(place(middle + pier.moment[i] / pier.head[i])),
                    eccentricity: Length::ZERO,
                    leaf,
                    source: LED.to_owned(),
                }
            };
            let parts = [(0, "dead load"), (1, "imposed load"), (2, "uplift")];
            return parts
                .into_iter()
                .filter(|p| pier.head[p.0] > 0.0)
                .map(|(i, what)| one(i, what))
                .collect();
        }
        let mut by: Vec<From> = Vec::new();
        let all = on.head.lines.iter().map(|l| l.by).chain(on.head.points.iter().map(|p| p.by));
        for one in all {
            if !by.contains(&one) {
                by.push(one);
            }
        }
        let mut out = Vec::new();
        for one in by {
            let part = descent::Loads {
                lines: on.head.lines.iter().filter(|l| l.by == one).copied().collect(),
                points: on.head.points.iter().filter(|p| p.by == one).copied().collect(),
            };
            let (total, moment) = (part.total(), part.moment(from));
            let size = total.iter().sum::<f64>();
            if size <= 0.0 {
                continue;
            }
            // The place of all three together: they come along the same lines.
            let centre = from + moment.iter().sum::<f64>() / size;
            out.push(Load {
                what: self.on_leaf.name(b, one),
                dead: Force::new(total[0]),
                imposed: Force::new(total[1]),
                uplift: Force::new(total[2]),
                at: Length::new(place(centre)),
                eccentricity: Length::ZERO,
                leaf,
                source: LED.to_owned(),
            });
        }
        out
    }
}

impl State {
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

/// What the job file leaves to the take-down, by mark; what the plan added is left to it as well.
#[derive(Clone, Debug, Default)]
pub struct Led {
    /// Panels without a dead load above them.
    pub panels: Vec<String>,
    /// Returns without the dead load of the wall that they meet.
    pub junctions: Vec<String>,
}

/// Takes the loads that the job does not give from the plan as it was led down: on returns without loads that are
/// walls of the plan, on panels the least dead load over the length of their wall, and at junctions the least over
/// the wall met with its own weight.
pub fn take_loads(b: &mut Building, down: &TakeDown, led: &Led) {
    let number = |b: &Building, mark: &str| b.storeys.iter().position(|s| s.mark == mark);
    for i in 0..b.returns.len() {
        let r = &b.returns[i];
        let Some(storey) = number(b, &r.storey).filter(|_| r.loads.is_empty()) else { continue };
        let loads = down.on_return(b, &r.mark.clone(), storey);
        b.returns[i].loads = loads;
    }
    for i in 0..b.returns.len() {
        let r = &b.returns[i];
        // A footing lies under the lowest storey.
        if number(b, &r.storey) != Some(0) || r.footing.as_ref().is_none_or(|f| f.before.is_some()) {
            continue;
        }
        let Some((wall, on)) = down.before.wall(b, &r.mark, 0) else { continue };
        let (length, foot) = (wall.place.to - wall.place.from, on.foot.total());
        let per = |x: f64| LineLoad::new(x / length);
        if let Some(f) = &mut b.returns[i].footing {
            f.before = Some(Before { led: true, dead: per(foot[0]), imposed: per(foot[1]) });
        }
    }
    let left_out =
        |b: &Building, mark: &String, list: &[String]| list.contains(mark) || b.found.added.contains(mark);
    for i in 0..b.returns.len() {
        let r = &b.returns[i];
        let Some(storey) = number(b, &r.storey).filter(|_| left_out(b, &r.mark, &led.junctions)) else {
            continue;
        };
        if let Some((wall, on)) = down.on_leaf.wall(b, &r.junction.to, storey) {
            let (dead, lift) = least_dead(wall, on, over_helping(b));
            b.returns[i].junction.dead = LineLoad::new(dead + wall.weight);
            b.returns[i].junction.uplift = LineLoad::new(lift);
        }
    }
    for i in 0..b.panels.len() {
        let p = &b.panels[i];
        let (Some(on), Some(storey)) = (&p.on, number(b, &p.storey)) else { continue };
        if left_out(b, &p.mark, &led.panels)
            && let Some((wall, on)) = down.on_leaf.wall(b, on, storey)
        {
            let (dead, lift) = least_dead(wall, on, over_helping(b));
            b.panels[i].dead_above = LineLoad::new(dead);
            b.panels[i].lift_above = LineLoad::new(lift);
        }
    }
}

/// How much dead load that helps one unit of uplift undoes: EN 1990 6.4.3.2.
fn over_helping(b: &Building) -> f64 {
    let helping = b.basis.helping_factor.value;
    Combination::Helping.factors(&Annex::UK, helping).gamma_U / helping
}

/// Dead load and uplift per length at the head of a wall where the least is left of the one, each unit of the other
/// undoing `undoes` of it; point loads left out: what helps a panel must be there over all of it.
fn least_dead(wall: &Wall, on: &descent::OnWall, undoes: f64) -> (f64, f64) {
    let Place { from, to, .. } = wall.place;
    let mut cuts = vec![from, to];
    cuts.extend(on.head.lines.iter().flat_map(|l| [l.from, l.to]).filter(|c| from < *c && *c < to));
    cuts.sort_by(f64::total_cmp);
    cuts.dedup();
    let over = |a: f64, z: f64| {
        let covers = |l: &&descent::Line| l.from <= a && z <= l.to;
        on.head.lines.iter().filter(covers).fold((0.0, 0.0), |(g, u), l| (g + l.load[0], u + l.load[2]))
    };
    let left = |(g, u): &(f64, f64)| g - undoes * u;
    let pieces = cuts.windows(2).map(|c| over(c[0], c[1]));
    pieces.min_by(|a, z| left(a).total_cmp(&left(z))).unwrap_or_default()
}

fn model(b: &Building, after: bool, leaf: bool) -> (Vec<Stack>, Model) {
    let number = |mark: &str| b.storeys.iter().position(|s| s.mark == mark);
    let mut m = Model { storeys: b.storeys.len(), reach: REACH, ..Model::default() };
    let mut stacks = Vec::new();
    for (i, wall) in b.plan.iter().enumerate() {
        if wall.removed && after {
            continue;
        }
        for (k, storey) in b.storeys.iter().enumerate() {
            if let (true, Some(one)) = (stands_in(b, wall, &storey.mark), led(b, wall, k, leaf)) {
                m.walls.push(one);
                stacks.push(Stack { wall: i, storey: k });
            }
        }
    }
    for f in &b.floors {
        let Some(load) = b.area_loads.iter().find(|a| a.name == f.load) else { continue };
        let range = |a: Length, b: Length| (a.base().min(b.base()), a.base().max(b.base()));
        m.floors.push(Floor {
            storey: number(&f.storey).unwrap_or(0),
            x: range(f.from.0, f.to.0),
            y: range(f.from.1, f.to.1),
            spans: axis(f.spans),
            load: [load.dead.base(), load.imposed.base(), load.uplift.base()],
        });
    }
    if after {
        for beam in &b.beams {
            if let Some(place) = line(beam.from, beam.to) {
                m.beams.push(descent::Beam {
                    storey: number(&beam.storey).unwrap_or(0),
                    place,
                    weight: beam.weight.base(),
                    bearing: beam.bearing.base(),
                });
            }
        }
    }
    (stacks, m)
}

/// A plan wall in storey `k`, of its loaded leaf alone with `leaf`; nothing where it lies neither along x nor along y.
fn led(b: &Building, wall: &PlanWall, k: usize, leaf: bool) -> Option<Wall> {
    let place = line(wall.from, wall.to)?;
    let build_up = b.build_up(&wall.build_up)?;
    let leaves = build_up.leaves.iter().filter(|l| l.loaded || !leaf);
    let per_area: f64 =
        leaves.filter_map(|l| Some(b.material(&l.material)?.density.base() * l.thickness.base())).sum();
    let thickness = build_up.thickness().base();
    let height = storey_height(b, k).base();
    let backwards = start(wall.from, wall.to) != place.from;
    let mut openings: Vec<Opening> = wall
        .openings
        .iter()
        .filter(|o| o.storey == b.storeys[k].mark)
        .map(|o| {
            let (a, z) = (o.from.base(), (o.from + o.width).base());
            let (from, to) =
                if backwards { (place.to - z, place.to - a) } else { (place.from + a, place.from + z) };
            let over = (height - (o.sill + o.height).base()).max(0.0);
            Opening { from, to, over: per_area * over, under: per_area * o.sill.base() }
        })
        .collect();
    openings.sort_by(|a, b| a.from.total_cmp(&b.from));
    Some(Wall { storey: k, place, thickness, weight: per_area * height, openings })
}

/// Height of wall from one floor to the next; the clear height under the roof.
pub fn storey_height(b: &Building, k: usize) -> Length {
    heights::storey_height(&b.storeys, k)
}

const fn axis(along: Along) -> Axis {
    match along {
        Along::X => Axis::X,
        Along::Y => Axis::Y,
    }
}

fn start(from: (Length, Length), to: (Length, Length)) -> f64 {
    if from.1 == to.1 { from.0.base() } else { from.1.base() }
}

/// Where a plan wall lies, if it lies along x or y.
pub fn line_of(wall: &PlanWall) -> Option<Place> {
    line(wall.from, wall.to)
}

/// A line along x or y.
fn line(from: (Length, Length), to: (Length, Length)) -> Option<Place> {
    let (a, z) = ((from.0.base(), from.1.base()), (to.0.base(), to.1.base()));
    if a.1 == z.1 {
        Some(Place { along: Axis::X, at: a.1, from: a.0.min(z.0), to: a.0.max(z.0) })
    } else if a.0 == z.0 {
        Some(Place { along: Axis::Y, at: a.0, from: a.1.min(z.1), to: a.1.max(z.1) })
    } else {
        None
    }
}

/// How far a point lies from a plan wall.
fn away(wall: &PlanWall, p: (f64, f64)) -> f64 {
    let (a, z) = ((wall.from.0.base(), wall.from.1.base()), (wall.to.0.base(), wall.to.1.base()));
    let (dx, dy) = (z.0 - a.0, z.1 - a.1);
    let share = (((p.0 - a.0) * dx + (p.1 - a.1) * dy) / (dx * dx + dy * dy)).clamp(0.0, 1.0);
    (p.0 - a.0 - share * dx).hypot(p.1 - a.1 - share * dy)
}

fn named(b: &Building, walls: &[Stack], m: &Model, trouble: descent::Trouble, after: bool) -> Trouble {
    let metres = |x: f64| format!("{:.2} m", x / 1000.0);
    let wall = |i: usize| &b.plan[walls[i].wall].mark;
    let (mark, what, sketch) = match trouble {
        descent::Trouble::FloorFloats { floor, from, to } => {
            let f = &m.floors[floor];
            let across = if f.spans == Axis::X { "y" } else { "x" };
            let what = format!(
                "the floor has no support at an edge over {across} = {} to {}",
                metres(from),
                metres(to)
            );
            (b.floors[floor].mark.clone(), what, strip(b, walls, m, floor, (from + to) / 2.0))
        }
        descent::Trouble::WallFloats { wall: w, from, to } => (
            wall(w).clone(),
            format!(
                "in storey \"{}\" nothing stands under it from {} to {} of the plan",
                b.storeys[walls[w].storey].mark,
                metres(from),
                metres(to)
            ),
            String::new(),
        ),
        descent::Trouble::BeamFloats { beam, end } => {
            let at = if end == 0 { b.beams[beam].from } else { b.beams[beam].to };
            (
                b.beams[beam].mark.clone(),
                format!(
                    "the end near ({}, {}) has no bearing: no wall and no beam is under it",
                    metres(at.0.base()),
                    metres(at.1.base())
                ),
                String::new(),
            )
        }
        descent::Trouble::NoJamb { wall: w, opening } => (
            wall(w).clone(),
            format!("opening {} leaves no wall beside it to carry what is over it", opening + 1),
            String::new(),
        ),
        descent::Trouble::Ring { beam } => {
            (b.beams[beam].mark.clone(), "beams carry each other in a ring".to_owned(), String::new())
        }
    };
    Trouble { mark, what, after, sketch }
}

/// The supports of a floor in order along its span, at one place across it:
/// `0.00 |party wall ---- 3.20 |kitchen wall ---- 6.40 nothing`.
fn strip(b: &Building, walls: &[Stack], m: &Model, floor: usize, across: f64) -> String {
    let f = &m.floors[floor];
    let (span, along) = if f.spans == Axis::X { (f.x, Axis::Y) } else { (f.y, Axis::X) };
    let covers = |p: Place| {
        p.along == along
            && p.from <= across
            && across <= p.to
            && span.0 - m.reach <= p.at
            && p.at <= span.1 + m.reach
    };
    let mut found: Vec<(f64, String)> = Vec::new();
    for (i, w) in m.walls.iter().enumerate().filter(|(_, w)| w.storey == f.storey && covers(w.place)) {
        found.push((w.place.at, b.plan[walls[i].wall].mark.clone()));
    }
    for (i, beam) in m.beams.iter().enumerate().filter(|(_, x)| x.storey == f.storey && covers(x.place)) {
        found.push((beam.place.at, b.beams[i].mark.clone()));
    }
    for edge in [span.0, span.1] {
        if !found.iter().any(|(at, _)| (at - edge).abs() <= m.reach) {
            found.push((edge, "nothing".to_owned()));
        }
    }
    found.sort_by(|a, b| a.0.total_cmp(&b.0));
    let parts: Vec<String> = found.iter().map(|(at, name)| format!("{:.2} |{name}", at / 1000.0)).collect();
    parts.join(" ------ ")
}
