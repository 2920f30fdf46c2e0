//! Lengths of wall between openings, from the take-down to what the check needs.

use super::bays::{self, Bay};
use super::{Seen, outer};
use crate::building::{FloorKind, Restraint, State, Storey};
use crate::checks::Job;
use crate::checks::masonry::{self, Masonry};
use crate::checks::panels::PanelModel;
use crate::checks::returns::build::restraint;
use crate::checks::returns::model::{Lateral, Model, Vertical};
use crate::quantity::{Force, Length, Moment, Num, PerArea, Q, Stress};
use crate::solve::descent::{From, OnWall, Pier, Place, Triple, Wall, add, times};
use crate::standards::en1996::concentrated;
use crate::standards::en1996::slenderness::Stiffened;
use crate::trace::{Outside, Sheet};

/// Loads that floors and beams bring to the head from one side across the wall.
#[derive(Clone, Copy, Debug, Default)]
pub struct FromSide {
    /// Dead.
    pub G: Force,
    /// Imposed.
    pub Q: Force,
    /// Roof uplift.
    pub U: Force,
}

impl FromSide {
    const fn of(t: Triple) -> Self {
        Self { G: Force::new(t[0]), Q: Force::new(t[1]), U: Force::new(t[2]) }
    }

    fn any(self) -> bool {
        self.G > Force::ZERO || self.Q > Force::ZERO
    }
}

/// Wind across.
#[derive(Clone, Debug)]
pub struct Wind {
    /// Net characteristic pressure on panels.
    pub q_panel: Stress,
    /// The bay that carries it, the worst of the pier.
    pub bay: Bay,
    /// The leaves as a panel has them.
    pub panel: PanelModel,
}

/// The leaf that carries no floors.
#[derive(Clone, Debug)]
pub struct OtherLeaf {
    /// Actual thickness.
    pub t: Length,
    /// Strengths.
    pub masonry: Masonry,
    /// It is the outer one.
    pub outer: bool,
}

/// The stretch at mid-height over which the end of a beam is spread.
#[derive(Clone, Debug)]
pub struct Under {
    /// Mark of the beam.
    pub beam: String,
    /// Length of the pier.
    pub l: Length,
    /// Place of the load from where the pier begins.
    pub x_c: Length,
}

/// A length of wall between openings, or what of it stands under the end of a beam.
#[derive(Clone, Debug)]
pub struct PierModel {
    /// Length, thickness, height, strengths, loads at the head with their first moments along, and own weight.
    pub m: Model,
    /// Wall over the openings beside it.
    pub over: Force,
    /// Load at the foot, with its first moments along, which are those at mid-height too.
    pub at_foot: Vertical,
    /// What comes to the head from the lower and the upper side across.
    pub sides: [FromSide; 2],
    /// Wind across; none on inner walls.
    pub wind: Option<Wind>,
    /// The other leaf of a cavity wall.
    pub other: Option<OtherLeaf>,
    /// Wall ties.
    pub ties: Option<PerArea>,
    /// Under the end of a beam, at mid-height alone.
    pub under: Option<Under>,
}

impl PierModel {
    /// Whether floors or beams come to its head from both sides.
    pub fn both_sides(&self) -> bool {
        self.sides.iter().all(|s| s.any())
    }

    /// Whether they come from one side at least.
    pub fn from_aside(&self) -> bool {
        self.sides.iter().any(|s| s.any())
    }
}

/// The pier `n` of wall `i` in a state of the loaded leaf, and a model for every end of a beam on it.
///
/// # Errors
/// [`Outside`] where a table of strengths does not reach.
pub fn of(
    job: &Job<'_>,
    leaf: &State,
    i: usize,
    n: usize,
    seen: Seen<'_>,
) -> Result<Vec<PierModel>, Outside> {
    let b = job.building;
    let (stack, wall, on) = (&leaf.walls[i], &leaf.model.walls[i], &leaf.down.walls[i]);
    let storey = &b.storeys[stack.storey];
    let pier = on.piers[n];
    let whole = one(job, leaf, i, &pier, seen, n)?;
    let mut out = vec![whole];
    let ends = on.head.points.iter().filter(|p| pier.from <= p.at && p.at <= pier.to);
    for end in ends {
        let From::Beam(beam, _) = end.by else { continue };
        let (stretch, under) = beneath(storey, wall, on, &pier, end.at, b.beams[beam].mark.clone());
        let mut m = one(job, leaf, i, &stretch, seen, n)?;
        m.under = Some(under);
        out.push(m);
    }
    Ok(out)
}

/// What stands at mid-height under a beam's end at `at`: the load of its end, spread at 60°, with all that is
/// spread over that stretch and every point load whose own spread meets it, whole.
fn beneath(storey: &Storey, wall: &Wall, on: &OnWall, pier: &Pier, at: f64, beam: String) -> (Pier, Under) {
    let h = storey.clear_height;
    let (l, x_c) = (Length::new(pier.to - pier.from), Length::new(at - pier.from));
    let s = &mut Sheet::silent();
    let c_60 = concentrated::spread(s);
    let (r_J, r_F, _) = concentrated::effective_length(s, l, x_c, Length::ZERO, h, c_60);
    let reach = (c_60 * h / 2.0).base();
    let mut out = Pier { from: at - r_J.base(), to: at + r_F.base(), ..Pier::default() };
    let mut put = |load: Triple, low: Option<f64>, at_head: bool| {
        out.foot = add(out.foot, load);
        if at_head {
            out.head = add(out.head, load);
        }
        if let (true, Some(low)) = (at_head, low) {
            out.sides = [add(out.sides[0], times(load, low)), add(out.sides[1], times(load, 1.0 - low))];
        }
    };
    let (from, to) = (at - r_J.base(), at + r_F.base());
    for line in on.head.lines_within(from, to) {
        put(times(line.load, line.to - line.from), line.low, true);
    }
    // At the foot the jambs are among the points: those of the head, and the wall over openings.
    let meets = |x: f64| pier.from <= x && x <= pier.to && x + reach > from && x - reach < to;
    for p in on.foot.points.iter().filter(|p| meets(p.at)) {
        put(p.load, p.low, p.by != From::Own);
    }
    put([wall.weight * (to - from), 0.0, 0.0], None, false);
    (out, Under { beam, l, x_c })
}

fn one(
    job: &Job<'_>,
    leaf: &State,
    i: usize,
    pier: &Pier,
    seen: Seen<'_>,
    n: usize,
) -> Result<PierModel, Outside> {
    let b = job.building;
    let (stack, wall) = (&leaf.walls[i], &leaf.model.walls[i]);
    let storey = &b.storeys[stack.storey];
    let missing = || Outside::new("pier", "job file", "the build-up or a material is not given");
    let build_up = b.build_up(&b.plan[stack.wall].build_up).ok_or_else(missing)?;
    let strengths = |k: usize| {
        let this = &build_up.leaves[k];
        let material = b.material(&this.material).ok_or_else(missing)?;
        masonry::derive(&mut Sheet::silent(), b, &job.annex, material, build_up, this.thickness)
    };
    let (loaded, this) = build_up.loaded();
    let other = match build_up.leaves.iter().enumerate().find(|(k, _)| *k != loaded) {
        Some((k, o)) => Some(OtherLeaf { t: o.thickness, masonry: strengths(k)?, outer: k == 0 }),
        None => None,
    };
    let (t, l) = (this.thickness, Length::new(pier.to - pier.from));
    let own = Force::new(wall.weight * (pier.to - pier.from));
    let at_head = vertical(pier.head, pier.moment, l);
    let at_foot = vertical(pier.foot, pier.foot_moment, l);
    let sides = pier.sides.map(FromSide::of);
    // The lever does not matter here, only whether the load lies far off the middle.
    let lever = t / 3.0;
    let across = |of: fn(&FromSide) -> Force| (of(&sides[1]) - of(&sides[0])) * lever;
    let turned = Vertical { T_G: across(|x| x.G), T_Q: across(|x| x.Q), ..at_head };
    let held_by =
        if storey.floor_above == FloorKind::Concrete { Restraint::Concrete } else { Restraint::Timber };
    let m = Model {
        leaf: String::new(),
        l,
        t,
        h: storey.clear_height,
        t_other: other.as_ref().map(|o| o.t),
        rho_2: restraint(held_by, &turned, t),
        stiffened: Stiffened::None,
        masonry: strengths(loaded)?,
        at_head,
        own,
        flange: None,
        lateral: Lateral::default(),
        propped: true,
        dpc: stack.storey == 0,
        mu: Num::new(0.0),
        helping: b.basis.helping_factor.value,
    };
    let place = Place { from: pier.from, to: pier.to, ..wall.place };
    let mut p = PierModel {
        over: clean(at_foot.G - at_head.G - own, at_foot.G),
        m,
        at_foot,
        sides,
        wind: None,
        other,
        ties: build_up.ties,
        under: None,
    };
    if outer::in_the_wind(b, seen.around, stack.storey, place, wall.thickness) {
        let bays = bays::of(leaf, seen.lines, i, n, storey.clear_height);
        p.wind = bays::worst(&p, bays, seen.q_panel, build_up, &job.annex);
    }
    Ok(p)
}

/// What is left of sums and differences, without the dust of their last bits.
fn clean<const F: i8, const L: i8, const T: i8>(x: Q<F, L, T>, of: Q<F, L, T>) -> Q<F, L, T> {
    if x.base().abs() <= 1e-9 * of.base().abs() { Q::ZERO } else { x }
}

fn vertical(load: Triple, moment: Triple, l: Length) -> Vertical {
    let f = Force::new;
    let m = |moment: f64| clean(Moment::new(moment), f(load.iter().map(|x| x.abs()).sum()) * l);
    Vertical {
        G: f(load[0]),
        Q: f(load[1]),
        U: f(load[2]),
        S_G: m(moment[0]),
        S_Q: m(moment[1]),
        S_U: m(moment[2]),
        ..Vertical::default()
    }
}
