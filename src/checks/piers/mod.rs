//! Vertical resistance of every length of wall between openings, before the removal and after it.
//!
//! * [`around`]: what lies around a length, found by place
//! * [`mod@outer`]: which walls the wind presses across
//! * [`bays`]: between what a length carries it sideways; [`across`]: what the loaded leaf has of it, as a panel
//! * [`model`]: from the take-down to what the check needs
//! * [`work`]: head and foot, 6.1.2; [`middle`]: mid-height, Annex G or flexure with precompression
//! * [`matrix`]: every section under every combination

pub mod across;
pub mod around;
pub mod bays;
pub mod matrix;
pub mod middle;
pub mod model;
pub mod outer;
mod sheet;
#[cfg(test)]
mod tests;
pub mod work;

pub use sheet::sections;

use std::collections::HashMap;

use super::Job;
use crate::building::{Building, State, TakeDown};
use crate::quantity::{Force, Stress};
use crate::solve::descent::{From, Place, Triple};
use crate::standards::en1990::Combination;
use crate::standards::tables::annex_e::Edges;
use crate::trace::Outside;
use around::{Around, Lines};
use model::PierModel;

/// By how much a load has to grow for its pier to be judged: less is the dust of the sums.
const GROWTH: f64 = 1.001;

/// What was worked of a pier: the whole of it, or what stands under the end of a beam.
#[derive(Clone, Debug)]
pub struct Worked {
    /// What is checked.
    pub model: PierModel,
    /// Largest use and what governs it, or the limit that was left.
    pub used: Result<(f64, String), Outside>,
    /// Largest use of what it carries, slenderness left out.
    pub by_load: f64,
}

/// What one pier is used in one state.
#[derive(Clone, Debug)]
pub struct InState {
    /// Design load at the foot, pressing with imposed load leading.
    pub N_Ed: Force,
    /// All that was worked, or why nothing could be.
    pub worked: Result<Vec<Worked>, Outside>,
}

impl InState {
    /// The largest use and what governs it; outside the method it has no end.
    pub fn used(&self) -> (f64, String) {
        let left = |o: &Outside| (f64::INFINITY, format!("outside the method, {}", o.clause));
        let all = match &self.worked {
            Ok(all) => all,
            Err(outside) => return left(outside),
        };
        let of = |w: &Worked| {
            let (ratio, words) = w.used.clone().unwrap_or_else(|o| left(&o));
            match &w.model.under {
                Some(under) => (ratio, format!("under {}, {words}", under.beam)),
                None => (ratio, words),
            }
        };
        all.iter().map(of).fold((0.0, String::new()), |most, x| if x.0 > most.0 { x } else { most })
    }

    /// Every limit that was left.
    pub fn outside(&self) -> Vec<&Outside> {
        match &self.worked {
            Ok(all) => all.iter().filter_map(|w| w.used.as_ref().err()).collect(),
            Err(outside) => vec![outside],
        }
    }
}

/// A length of wall with what it is used, before the removal and after it.
#[derive(Clone, Debug)]
pub struct Used {
    /// Mark of the plan wall.
    pub wall: String,
    /// Place of the storey.
    pub storey: usize,
    /// Where it begins along the wall, mm.
    pub from: f64,
    /// Where it ends.
    pub to: f64,
    /// Wind presses across it.
    pub windy: bool,
    /// Ends of beams on it, or over an opening beside it, after the removal, by the mark of the beam.
    pub beams: Vec<String>,
    /// Before the removal.
    pub before: InState,
    /// After it.
    pub after: InState,
}

impl Used {
    /// Whether its load grows by the removal.
    pub fn grows(&self) -> bool {
        self.after.N_Ed > self.before.N_Ed * GROWTH
    }

    /// Whether it is judged: its load grows, or a beam ends on it.
    pub fn counts(&self) -> bool {
        self.grows() || !self.beams.is_empty()
    }
}

/// Every pier of every wall that stays, lowest storey first; none where the plan has no floors or the wind is
/// not known.
pub fn of(job: &Job<'_>) -> Vec<Used> {
    let b = job.building;
    let (Some(down), Ok(wind)) = (&job.down, &job.wind) else { return Vec::new() };
    let sight = Sight {
        around: Around::new(b),
        before: Lines::new(&down.on_leaf_before),
        after: Lines::new(&down.on_leaf),
        q_panel: wind.worst.panel,
    };
    let first: HashMap<(usize, usize), usize> =
        down.on_leaf_before.walls.iter().enumerate().map(|(i, s)| ((s.wall, s.storey), i)).collect();
    let mut known = Known::new();
    let mut out = Vec::new();
    for k in 0..b.storeys.len() {
        for (i, stack) in down.on_leaf.walls.iter().enumerate().filter(|(_, s)| s.storey == k) {
            if has_a_sheet(b, stack.wall, k) {
                continue;
            }
            let Some(&before) = first.get(&(stack.wall, stack.storey)) else { continue };
            for n in 0..down.on_leaf.down.walls[i].piers.len() {
                out.push(used(job, down, (before, i), n, (&sight, &mut known)));
            }
        }
    }
    out
}

/// What the piers of a job see of the rest of it.
struct Sight {
    around: Around,
    before: Lines,
    after: Lines,
    q_panel: Stress,
}

/// What a pier sees in one state.
#[derive(Clone, Copy)]
pub struct Seen<'a> {
    /// Floors and the ends of the plan.
    pub around: &'a Around,
    /// Walls of the state.
    pub lines: &'a Lines,
    /// Net pressure on panels.
    pub q_panel: Stress,
}

impl Sight {
    const fn at(&self, after: bool) -> Seen<'_> {
        let lines = if after { &self.after } else { &self.before };
        Seen { around: &self.around, lines, q_panel: self.q_panel }
    }
}

/// Whether a plan wall is a return of that storey, which has a sheet of its own.
fn has_a_sheet(b: &Building, wall: usize, storey: usize) -> bool {
    b.returns.iter().any(|r| r.mark == b.plan[wall].mark && r.storey == b.storeys[storey].mark)
}

fn used(
    job: &Job<'_>,
    down: &TakeDown,
    (i, j): (usize, usize),
    n: usize,
    (sight, known): (&Sight, &mut Known),
) -> Used {
    let b = job.building;
    let (stack, on) = (&down.on_leaf.walls[j], &down.on_leaf.down.walls[j]);
    let pier = on.piers[n];
    // A beam that ends over an opening stands on its sides.
    let openings = &down.on_leaf.model.walls[j].openings;
    let from = n.checked_sub(1).and_then(|k| openings.get(k)).map_or(pier.from, |o| o.from);
    let to = openings.get(n).map_or(pier.to, |o| o.to);
    let ends = on.head.points.iter().filter(|p| from <= p.at && p.at <= to);
    let beams = ends.filter_map(|p| match p.by {
        From::Beam(beam, _) if pier.from <= p.at && p.at <= pier.to => Some(b.beams[beam].mark.clone()),
        From::Beam(beam, _) if from < p.at && p.at < to => {
            Some(format!("{} over the opening beside it", b.beams[beam].mark))
        }
        _ => None,
    });
    let after = state(job, &down.on_leaf, j, n, (sight.at(true), &mut *known));
    Used {
        wall: b.plan[stack.wall].mark.clone(),
        storey: stack.storey,
        from: pier.from,
        to: pier.to,
        windy: after.worked.as_ref().is_ok_and(|all| all.iter().any(|w| w.model.wind.is_some())),
        beams: beams.collect(),
        before: state(job, &down.on_leaf_before, i, n, (sight.at(false), known)),
        after,
    }
}

/// Design load of three.
fn design(job: &Job<'_>, t: Triple) -> Force {
    let f = Combination::PressingImposed.factors(&job.annex, job.building.basis.helping_factor.value);
    Force::new(f.gamma_G * t[0] + f.gamma_Q * t[1])
}

/// What was worked of piers that are alike to the last bit: before and after, and from house to house, many are.
type Known = HashMap<Like, Result<Vec<Worked>, Outside>>;

/// All that the working of a pier follows from; its materials are those of its build-up.
#[derive(PartialEq, Eq, Hash)]
struct Like {
    build_up: String,
    storey: usize,
    windy: bool,
    bays: Vec<(Edges, [u64; 2])>,
    figures: Vec<u64>,
}

impl Like {
    /// None for a pier on which a beam ends: what stands under it follows from more.
    fn new(job: &Job<'_>, leaf: &State, seen: Seen<'_>, i: usize, n: usize) -> Option<Self> {
        let b = job.building;
        let (stack, wall, on) = (&leaf.walls[i], &leaf.model.walls[i], &leaf.down.walls[i]);
        let pier = on.piers[n];
        let beams = |p: &crate::solve::descent::Point| matches!(p.by, From::Beam(..));
        if on.head.points.iter().any(|p| beams(p) && pier.from <= p.at && p.at <= pier.to) {
            return None;
        }
        let place = Place { from: pier.from, to: pier.to, ..wall.place };
        let windy = outer::in_the_wind(b, seen.around, stack.storey, place, wall.thickness);
        let h = b.storeys[stack.storey].clear_height;
        let bays = if windy { bays::of(leaf, seen.lines, i, n, h) } else { Vec::new() };
        let loads = [pier.head, pier.moment, pier.foot, pier.foot_moment, pier.sides[0], pier.sides[1]];
        let figures = [pier.to - pier.from, wall.weight].into_iter().chain(loads.into_iter().flatten());
        Some(Self {
            build_up: b.plan[stack.wall].build_up.clone(),
            storey: stack.storey,
            windy,
            bays: bays.iter().map(|x| (x.edges, [x.l, x.l_w].map(|l| l.base().to_bits()))).collect(),
            figures: figures.map(f64::to_bits).collect(),
        })
    }
}

/// One pier in one state.
fn state(job: &Job<'_>, leaf: &State, i: usize, n: usize, (seen, known): (Seen<'_>, &mut Known)) -> InState {
    let N_Ed = design(job, leaf.down.walls[i].piers[n].foot);
    let work = || {
        model::of(job, leaf, i, n, seen).map(|models| {
            let work = |model: PierModel| {
                let worst = matrix::run(&model, &job.annex);
                let by_load = worst.as_ref().map_or(0.0, matrix::Worst::by_load);
                Worked { model, used: worst.map(|worst| worst.largest()), by_load }
            };
            models.into_iter().map(work).collect()
        })
    };
    let worked = match Like::new(job, leaf, seen, i, n) {
        Some(like) => known.entry(like).or_insert_with(work).clone(),
        None => work(),
    };
    InState { N_Ed, worked }
}

/// Lengths that are used above 1 although the removal adds nothing to them, in words.
pub fn as_it_stands(job: &Job<'_>) -> Vec<String> {
    let over = job.piers.iter().filter(|u| !u.counts() && u.after.used().0 > 1.0);
    over.map(|u| place(job.building, u)).collect()
}

/// Hold points: the bearings of beams that end on these lengths.
pub fn holds(job: &Job<'_>) -> Vec<(String, String)> {
    let mut out = Vec::new();
    let ends: Vec<String> = job
        .piers
        .iter()
        .filter(|u| !u.beams.is_empty())
        .map(|u| format!("{} on {}", u.beams.join(", "), place(job.building, u)))
        .collect();
    if !ends.is_empty() {
        let text = format!(
            "Before the wall comes down, size the bearings and padstones of the ends of {} by 6.1.3, and a lintel \
             that one stands on: this pack works bearings on returns alone.",
            ends.join("; ")
        );
        out.push((String::new(), text));
    }
    out
}

/// Where a pier is, in words.
pub fn place(b: &Building, u: &Used) -> String {
    format!("{}, {}, from {:.2} to {:.2} m", u.wall, b.storeys[u.storey].mark, u.from / 1e3, u.to / 1e3)
}
