//! Every length of wall between openings, as a cantilever of its storey.

use std::collections::HashMap;

use super::levels::Level;
use super::lines;
use crate::building::{
    Acts, Along, BaseJoint, Building, Cause, Flange, FloorKind, FromAbove, Head, Load, Path, Proof,
    Restraint, Return, State, TakeDown,
};
use crate::checks::Job;
use crate::checks::returns::{self, build::Inputs, check::Check};
use crate::checks::stability::{Share, Storey};
use crate::quantity::{Force, Length, LineLoad, Num};
use crate::solve::descent::Pier;
use crate::trace::Sheet;
use crate::wind::Pressures;

/// One length of wall with what it is used, before the removal and after it.
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
    /// Its share of the storey's wind before.
    pub share_before: Option<f64>,
    /// After.
    pub share_after: Option<f64>,
    /// Largest use before and what governs; none where it does not stand or count.
    pub before: Option<(f64, String)>,
    /// After.
    pub after: Option<(f64, String)>,
}

/// Every pier along the wind.
pub fn of(job: &Job<'_>, down: &TakeDown, along: Along, levels: &[Level], wind: Pressures) -> Vec<Used> {
    let b = job.building;
    // The pier stands alone: nothing of the job's own returns leans on it.
    let alone = Building { returns: Vec::new(), ..b.clone() };
    let mut out = All::default();
    let mut known: HashMap<Like, (f64, String)> = HashMap::new();
    for level in levels {
        for after in [false, true] {
            let (state, leaf) =
                if after { (&down.after, &down.on_leaf) } else { (&down.before, &down.on_leaf_before) };
            let counted = |wall: usize| !after || lines::counts_after(b, wall);
            for line in lines::of(b, state, along, level, &counted, (wind, &job.annex)) {
                for whole in together(b, leaf, &line.walls) {
                    let Whole { i, name, pier } = whole;
                    let share = line.share * (pier.to - pier.from) / line.length;
                    // Before and after, and from house to house, many are used alike.
                    let like = Like::new(b, leaf, i, &pier, level, share);
                    let used = known
                        .entry(like)
                        .or_insert_with(|| worked(job, &alone, leaf, i, &pier, level, share, wind))
                        .clone();
                    out.note(name, level, &pier, (after, share, used));
                }
            }
        }
    }
    out.list
}

/// A length of wall that nothing interrupts: one plan wall or several that go on in each other.
struct Whole {
    /// The first of its walls, in the state.
    i: usize,
    /// Their marks.
    name: String,
    /// All of it.
    pier: Pier,
}

/// Piers of a line in order, those of one build-up that touch as one: a wall that is drawn in pieces,
/// one of which comes out, stands as a whole before.
fn together(b: &Building, state: &State, walls: &[usize]) -> Vec<Whole> {
    let mut all: Vec<(usize, Pier)> =
        walls.iter().flat_map(|&i| state.down.walls[i].piers.iter().map(move |p| (i, *p))).collect();
    all.sort_by(|a, b| a.1.from.total_cmp(&b.1.from));
    let wall = |i: usize| &b.plan[state.walls[i].wall];
    let mut out: Vec<Whole> = Vec::new();
    for (i, pier) in all {
        match out.last_mut() {
            Some(last)
                if (pier.from - last.pier.to).abs() < 1.0 && wall(last.i).build_up == wall(i).build_up =>
            {
                last.pier = joined(last.pier, pier);
                last.name = format!("{}, {}", last.name, wall(i).mark);
            }
            _ => out.push(Whole { i, name: wall(i).mark.clone(), pier }),
        }
    }
    out
}

/// Two lengths of wall as one.
fn joined(a: Pier, z: Pier) -> Pier {
    let middle = |p: Pier| (p.from + p.to) / 2.0;
    let mut out = Pier { to: z.to, ..a };
    let centre = middle(out);
    for k in 0..3 {
        out.head[k] = a.head[k] + z.head[k];
        out.foot[k] = a.foot[k] + z.foot[k];
        out.moment[k] =
            a.moment[k] + a.head[k] * (middle(a) - centre) + z.moment[k] + z.head[k] * (middle(z) - centre);
        out.foot_moment[k] = a.foot_moment[k]
            + a.foot[k] * (middle(a) - centre)
            + z.foot_moment[k]
            + z.foot[k] * (middle(z) - centre);
        out.sides[0][k] = a.sides[0][k] + z.sides[0][k];
        out.sides[1][k] = a.sides[1][k] + z.sides[1][k];
    }
    out
}

/// All that the use of a pier follows from, to the last bit; wind and level are those of its storey.
#[derive(PartialEq, Eq, Hash)]
struct Like {
    build_up: String,
    storey: usize,
    figures: [u64; 8],
}

impl Like {
    fn new(b: &Building, leaf: &State, i: usize, pier: &Pier, level: &Level, share: f64) -> Self {
        let ([g, q, u], [m, n, o]) = (pier.head, pier.moment);
        let figures = [pier.to - pier.from, share, g, q, u, m, n, o];
        Self {
            build_up: b.plan[leaf.walls[i].wall].build_up.clone(),
            storey: level.storey,
            figures: figures.map(f64::to_bits),
        }
    }
}

/// Piers in the order in which they were found.
#[derive(Default)]
struct All {
    list: Vec<Used>,
    /// By mark, storey and the bits of where they begin and end.
    places: HashMap<(String, usize, u64, u64), usize>,
}

impl All {
    /// Notes what one state finds of a pier beside what the other found of the same.
    fn note(
        &mut self,
        wall: String,
        level: &Level,
        pier: &Pier,
        (after, share, used): (bool, f64, (f64, String)),
    ) {
        let (from, to, storey) = (pier.from, pier.to, level.storey);
        // Nought is the same with either sign.
        let bits = |x: f64| (x + 0.0).to_bits();
        let next = self.list.len();
        let n = *self.places.entry((wall.clone(), storey, bits(from), bits(to))).or_insert(next);
        if n == next {
            self.list.push(Used {
                wall,
                storey,
                from,
                to,
                share_before: None,
                share_after: None,
                before: None,
                after: None,
            });
        }
        let at = &mut self.list[n];
        if after {
            (at.share_after, at.after) = (Some(share), Some(used));
        } else {
            (at.share_before, at.before) = (Some(share), Some(used));
        }
    }
}

/// The largest use of a pier by the checks of a return.
fn worked(
    job: &Job<'_>,
    alone: &Building,
    leaf: &State,
    i: usize,
    pier: &Pier,
    level: &Level,
    share: f64,
    wind: Pressures,
) -> (f64, String) {
    let r = as_return(alone, leaf, i, pier, level, share);
    let storey = Storey {
        F_k: level.F_above,
        H_s: Force::ZERO,
        L_f: level.front,
        shares: vec![Share {
            mark: r.mark.clone(),
            before: None,
            after: Some(share),
            width_before: None,
            width_after: Some(level.front * share),
        }],
        dead: level.dead,
        imposed: level.imposed,
    };
    let inputs = Inputs { building: alone, ret: &r, wind, storey: Some(&storey), annex: &job.annex };
    let mut s = Sheet::silent();
    returns::check(&mut s, &inputs);
    if let Some(o) = s.outside.first() {
        return (f64::INFINITY, format!("outside the method: {}", o.words));
    }
    // Floor and roof bring their force along the whole head: shear is judged at the foot.
    let at_foot = s.verdicts.iter().filter(|v| v.id != Check::ShearHead.id());
    let worst = at_foot.max_by(|a, b| a.ratio.total_cmp(&b.ratio));
    worst.map_or((0.0, String::new()), |v| (v.ratio, v.words.clone()))
}

/// The pier as a return: head free, wind and moment of the levels above at its head, loads of the take-down.
fn as_return(b: &Building, leaf: &State, i: usize, pier: &Pier, level: &Level, share: f64) -> Return {
    let stack = &leaf.walls[i];
    let (wall, storey) = (&b.plan[stack.wall], &b.storeys[stack.storey]);
    let length = pier.to - pier.from;
    let place = |k: usize| {
        let off = if pier.head[k].abs() > 0.0 { pier.moment[k] / pier.head[k] } else { 0.0 };
        Length::new((length / 2.0 + off).clamp(0.0, length))
    };
    let leaf_number = b.build_up(&wall.build_up).map_or(0, |u| u.loaded().0);
    let load = |k: usize, what: &str| {
        let of = |j: usize| Force::new(if j == k { pier.head[j] } else { 0.0 });
        Load {
            what: what.to_owned(),
            dead: of(0),
            imposed: of(1),
            uplift: of(2),
            at: place(k),
            eccentricity: Length::ZERO,
            leaf: leaf_number,
            source: crate::building::LED.to_owned(),
        }
    };
    Return {
        mark: wall.mark.clone(),
        title: wall.mark.clone(),
        build_up: wall.build_up.clone(),
        storey: storey.mark.clone(),
        length: Length::new(length),
        height: storey.clear_height,
        position: None,
        // A damp-proof course lies under the lowest storey alone.
        base: if level.storey == 0 { BaseJoint::Dpc } else { BaseJoint::Bonded },
        base_reason: String::new(),
        mu: Cause { value: Num::new(0.4), reason: String::new() },
        head: Head::Free,
        path: Path::Sideways,
        tributary_width: Length::ZERO,
        strip_height: None,
        wind: None,
        from_above: FromAbove { force: level.F_above * share, moment: level.M_above * share },
        restraint: if storey.floor_above == FloorKind::Concrete {
            Restraint::Concrete
        } else {
            Restraint::Timber
        },
        supported_wall_height: storey.total_height,
        nearest_opening: None,
        far_end: None,
        footing: None,
        acts: Acts::Loaded,
        loads: vec![load(0, "dead load"), load(1, "imposed load"), load(2, "uplift")],
        junction: Flange {
            to: String::new(),
            bonded: false,
            proof: Proof::Assumed,
            words: String::new(),
            thickness: Length::new(100.0),
            left: Length::ZERO,
            right: Length::ZERO,
            next_wall_left: None,
            next_wall_right: None,
            dead: LineLoad::ZERO,
            uplift: LineLoad::ZERO,
        },
    }
}
