//! The analyses of one leaf, and of several at once.
//!
//! An analysis takes a third of a second, and the same leaf comes up again: on the sheet of a floor edge, in a search,
//! in the next revision of a running program. What was found is kept by every number it depends on, so that it is the
//! same whether it was worked or remembered.

use std::collections::HashMap;
use std::sync::{Arc, LazyLock, Mutex, PoisonError};

use rayon::prelude::*;

use super::wall::Wall;
use crate::building::{Frame, PanelRoute, Span};
use crate::checks::panels::model::PanelModel;
use crate::checks::panels::strength::{self, Strength};
use crate::solve::plate::elastic::{FirstCrack, PATCH, first_crack};
use crate::solve::plate::safe::{Safe, counts, safe};
use crate::solve::plate::upper::{Crack, Upper, pattern, upper};
use crate::solve::plate::{Plate, Trouble};
use crate::standards::annex::Annex;
use crate::trace::Sheet;

/// How much is worked.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Effort {
    /// The safe side alone on a coarse mesh, lowered by more; for searches.
    Search,
    /// Both bounds.
    #[default]
    Decide,
    /// Both bounds, the crack picture, and what is printed as information.
    Read,
}

/// What is worked of one leaf.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
struct Asked {
    effort: Effort,
    /// What is printed as information: of the panel as it will be.
    aside: bool,
}

/// Steps along the longer side: grids of the moment field, in a search, in earnest, and where the bracket is wide. With
/// each goes a coarser one, which shows what the grid is worth.
const SEARCHED: (f64, f64) = (12.0, 16.0);
const FIELD: (f64, f64) = (16.0, 32.0);
const REFINED: (f64, f64) = (32.0, 48.0);
/// The same of the crack pattern; there is none in a search.
const PATTERN: (f64, f64) = (16.0, 20.0);
/// What a field on the grid of a search is lowered by at least; see `safe::LOWERED` for that of the usual grid.
const COARSE: f64 = 0.975;
/// Width of the bracket, part of the safe side, from which both grids are refined once.
pub const WIDE: f64 = 0.10;
/// Frames that are tried where nobody knows how they pass their wind on.
const TRIED: [Frame; 3] = [Frame::Jambs, Frame::AllRound, Frame::HeadAndSill];
/// A kind of frame within so much of the worst on the coarse grid is worked on the fine one too.
const CLOSE: f64 = 1.03;
/// So many cells along the longer side show how far the wall moves.
const CELLS: f64 = 40.0;
/// The keeping place is emptied when it holds so many.
const KEPT: usize = 2000;

/// The safe side.
#[derive(Clone, Debug)]
pub struct Low {
    /// Greatest pressure of the moment field, N/mm²; not lowered for its mesh.
    pub field: f64,
    /// What it is lowered by.
    pub lowered: f64,
    /// Triangles of its mesh.
    pub triangles: usize,
    /// Left, right, base, top: what the stretches of each give at that pressure, N per mm of wall held.
    pub reactions: [Vec<f64>; 4],
    /// How much wall each of these stretches holds, mm.
    pub lengths: [Vec<f64>; 4],
}

impl Low {
    /// The value that is counted, N/mm².
    pub fn pressure(&self) -> f64 {
        self.field * self.lowered
    }
}

/// The weakest crack pattern.
#[derive(Clone, Debug)]
pub struct High {
    /// Its pressure, N/mm².
    pub pressure: f64,
    /// How many lines might crack.
    pub lines: usize,
}

/// How far a cell of the wall moves.
#[derive(Clone, Copy, Debug)]
pub struct Cell {
    /// From where to where, mm.
    pub x: (f64, f64),
    /// From where to where, mm.
    pub y: (f64, f64),
    /// Part of the largest.
    pub share: f64,
}

/// The picture.
#[derive(Clone, Debug, Default)]
pub struct Picture {
    /// Few long cracks.
    pub cracks: Vec<Crack>,
    /// How far the wall moves.
    pub cells: Vec<Cell>,
}

/// What is printed beside the bounds.
#[derive(Clone, Debug)]
pub struct Aside {
    /// With bed joints that have only the strength of the weight on them, N/mm², on the grid of a search.
    pub cracked: Option<f64>,
    /// The same wall without openings, N/mm², on the grid of a search.
    pub solid: Option<f64>,
    /// The first crack of the leaf while it is elastic.
    pub first: Option<FirstCrack>,
}

/// What was found of one leaf.
#[derive(Clone, Debug)]
pub struct Found {
    /// The frame that is worst where some are unknown.
    pub frame: Frame,
    /// Moment per length at which a bed joint of a pier opens, at the top and at the foot, N.
    pub pier: (f64, f64),
    /// The safe side.
    pub low: Low,
    /// The weakest pattern; none in a search.
    pub high: Option<High>,
    /// Whether the grids were refined because the bracket was wide.
    pub refined: bool,
    /// The picture, where it is wanted.
    pub picture: Option<Picture>,
    /// Information, where it is wanted.
    pub aside: Option<Aside>,
}

impl Found {
    /// `(upper - safe) / safe`.
    pub fn width(&self) -> Option<f64> {
        let low = self.low.pressure();
        self.high.as_ref().map(|high| (high.pressure - low) / low)
    }
}

type Kept = HashMap<(Vec<u64>, Asked), Arc<Result<Found, Trouble>>>;
static KEPT_HERE: LazyLock<Mutex<Kept>> = LazyLock::new(Mutex::default);

/// What is found of leaf `i` of a span; none where it has no strength across the bed joints.
pub fn leaf(
    m: &PanelModel,
    span: &Span,
    strength: &Strength,
    effort: Effort,
) -> Option<Arc<Result<Found, Trouble>>> {
    let unknown = span.openings.iter().any(|o| o.frame == Frame::Unknown);
    let tried: &[Frame] = if unknown { &TRIED } else { &TRIED[..1] };
    let walls: Vec<(Frame, Wall)> =
        tried.iter().map(|&f| Some((f, Wall::new(span, m.h, strength, f)?))).collect::<Option<_>>()?;
    let same = |a: &Span, b: &Span| std::ptr::eq(a, b) || a.length == b.length;
    let asked = Asked { effort, aside: effort == Effort::Read && same(span, &m.after) };
    let key = (walls.iter().flat_map(|(_, w)| w.key()).collect::<Vec<u64>>(), asked);
    let kept = || KEPT_HERE.lock().unwrap_or_else(PoisonError::into_inner);
    if let Some(found) = kept().get(&key) {
        return Some(Arc::clone(found));
    }
    let found = Arc::new(work(&walls, asked));
    let mut all = kept();
    if all.len() >= KEPT {
        all.clear();
    }
    all.insert(key, Arc::clone(&found));
    Some(found)
}

/// What is found of every leaf of a span, outer first; none where one of them has no answer. The leaves are those of
/// the sheet: where that was written, all of it is remembered.
pub fn leaves(m: &PanelModel, annex: &Annex, span: &Span) -> Option<Vec<Found>> {
    let of_leaf = |i: usize| strength::of_leaf(&mut Sheet::silent(), m, annex, i);
    let strengths = (0..m.leaves.len()).map(of_leaf);
    strengths.map(|x| leaf(m, span, &x, m.effort)?.as_ref().as_ref().ok().cloned()).collect()
}

/// Whether limit analysis is worked for a span, beside the hand route or deciding.
pub fn worked(m: &PanelModel, span: &Span) -> bool {
    match m.route {
        PanelRoute::LimitAnalysis => true,
        PanelRoute::Arching => false,
        PanelRoute::Flexure | PanelRoute::OneWay => m.effort != Effort::Search && !span.openings.is_empty(),
    }
}

/// Works leaves of several spans on all cores, so that they are at hand when their sheet is written.
pub fn prepare(m: &PanelModel, spans: &[&Span], strengths: &[Strength], effort: Effort) {
    let all: Vec<(&Span, &Strength)> =
        spans.iter().flat_map(|span| strengths.iter().map(move |strength| (*span, strength))).collect();
    all.par_iter().for_each(|(span, strength)| {
        let _ = leaf(m, span, strength, effort);
    });
}

fn work(walls: &[(Frame, Wall)], asked: Asked) -> Result<Found, Trouble> {
    let pier = walls.first().map_or((0.0, 0.0), |(_, w)| w.pier());
    if asked.effort == Effort::Search {
        let tried = walls.par_iter().map(|(_, w)| searched(w)).collect::<Vec<_>>();
        let (frame, low) = worst(walls.iter().zip(tried))?;
        return Ok(Found { frame, pier, low, high: None, refined: false, picture: None, aside: None });
    }
    let near: Vec<&(Frame, Wall)> = match walls {
        [only] => vec![only],
        _ => {
            let all = walls.par_iter().map(|(_, w)| field(w, FIELD.0)).collect::<Vec<_>>();
            let least = all.iter().flatten().map(|l| l.field).fold(f64::INFINITY, f64::min);
            let counts = |low: &Result<Low, Trouble>| low.as_ref().map_or(true, |l| l.field <= CLOSE * least);
            walls.iter().zip(&all).filter(|(_, low)| counts(low)).map(|(w, _)| w).collect()
        }
    };
    let fine: Vec<_> = near.par_iter().map(|(_, w)| counted(w, FIELD)).collect();
    let (frame, mut low) = worst(near.iter().copied().zip(fine))?;
    let Some((_, wall)) = near.iter().find(|(f, _)| *f == frame) else {
        return Err(Trouble::NotSolved("no frame was tried".to_owned()));
    };
    let (mut high, aside) =
        rayon::join(|| wall.with(|p| mechanism(p, PATTERN.0)), || asked.aside.then(|| beside(wall)));
    let refined = high.as_ref().is_ok_and(|h| h.pressure > (1.0 + WIDE) * low.pressure());
    if refined {
        (low, high) = finer(wall, low, high);
    }
    let upper = high?;
    let picture = match asked.effort {
        Effort::Read => Some(Picture {
            cracks: wall.with(|p| pattern(p, longer(p) / PATTERN.0))?,
            cells: wall.with(|p| cells(p, &upper)),
        }),
        _ => None,
    };
    let high = Some(High { pressure: upper.pressure, lines: upper.potential });
    Ok(Found { frame, pier, low, high, refined, picture, aside })
}

/// Both bounds on finer grids. Each is a bound by itself, so the better one of either side counts.
fn finer(wall: &Wall, low: Low, high: Result<Upper, Trouble>) -> (Low, Result<Upper, Trouble>) {
    let (finer, weaker) = rayon::join(|| counted(wall, REFINED), || wall.with(|p| mechanism(p, PATTERN.1)));
    let low = finer.ok().filter(|finer| finer.pressure() > low.pressure()).unwrap_or(low);
    let high = match (high, weaker) {
        (Ok(first), Ok(weaker)) if weaker.pressure < first.pressure => Ok(weaker),
        (first, _) => first,
    };
    (low, high)
}

/// The least of several.
fn worst<'w>(
    all: impl Iterator<Item = (&'w (Frame, Wall), Result<Low, Trouble>)>,
) -> Result<(Frame, Low), Trouble> {
    let mut least: Option<(Frame, Low)> = None;
    for ((frame, _), low) in all {
        let low = low?;
        if least.as_ref().is_none_or(|(_, so_far)| low.pressure() < so_far.pressure()) {
            least = Some((*frame, low));
        }
    }
    least.ok_or_else(|| Trouble::NotSolved("no frame was tried".to_owned()))
}

fn longer(plate: &Plate<'_>) -> f64 {
    plate.l.max(plate.h)
}

/// The field on one grid; nothing is taken off it.
fn field(wall: &Wall, parts: f64) -> Result<Low, Trouble> {
    let Safe { pressure, reactions, lengths, triangles, .. } = wall.with(|p| safe(p, longer(p) / parts))?;
    Ok(Low { field: pressure, lowered: 1.0, triangles, reactions, lengths })
}

/// The field on the finer of two grids, and what counts of it.
fn counted(wall: &Wall, parts: (f64, f64)) -> Result<Low, Trouble> {
    let (coarse, fine) = rayon::join(|| field(wall, parts.0), || field(wall, parts.1));
    let (coarse, fine) = (coarse?, fine?);
    Ok(Low { lowered: counts(coarse.field, fine.field, parts), ..fine })
}

fn searched(wall: &Wall) -> Result<Low, Trouble> {
    let low = counted(wall, SEARCHED)?;
    Ok(Low { lowered: low.lowered.min(COARSE), ..low })
}

fn mechanism(plate: &Plate<'_>, parts: f64) -> Result<Upper, Trouble> {
    upper(plate, longer(plate) / parts)
}

fn beside(wall: &Wall) -> Aside {
    let taken = |w: &Wall| searched(w).ok().map(|low| low.pressure());
    let first = || wall.with(|p| first_crack(p, longer(p) / FIELD.1, PATCH)).ok();
    let (cracked, (solid, first)) =
        rayon::join(|| taken(&wall.cracked()), || (taken(&wall.solid()), first()));
    Aside { cracked, solid, first }
}

/// Cells of the solid with how far each moves.
fn cells(plate: &Plate<'_>, upper: &Upper) -> Vec<Cell> {
    let step = longer(plate) / CELLS;
    let cuts = |length: f64, sides: &mut dyn Iterator<Item = f64>| {
        let many = (length / step).ceil().max(1.0);
        let mut all: Vec<f64> = (0..=many as usize).map(|i| length * i as f64 / many).chain(sides).collect();
        all.sort_by(f64::total_cmp);
        all.dedup_by(|a, b| (*a - *b).abs() < 1.0);
        all
    };
    let xs = cuts(plate.l, &mut plate.openings.iter().flat_map(|o| [o.x.0, o.x.1]));
    let ys = cuts(plate.h, &mut plate.openings.iter().flat_map(|o| [o.y.0, o.y.1]));
    let mut all = Vec::new();
    for x in xs.windows(2) {
        for y in ys.windows(2) {
            let (mx, my) = ((x[0] + x[1]) / 2.0, (y[0] + y[1]) / 2.0);
            let open = plate.openings.iter().any(|o| o.x.0 < mx && mx < o.x.1 && o.y.0 < my && my < o.y.1);
            if !open {
                all.push(Cell { x: (x[0], x[1]), y: (y[0], y[1]), share: 0.0 });
            }
        }
    }
    let middles: Vec<(f64, f64)> =
        all.iter().map(|c| ((c.x.0 + c.x.1) / 2.0, (c.y.0 + c.y.1) / 2.0)).collect();
    let moves = upper.deflection(&middles);
    let most = moves.iter().fold(0.0_f64, |a, b| a.max(b.abs()));
    for (cell, moved) in all.iter_mut().zip(moves) {
        cell.share = if most > 0.0 { (moved / most).clamp(0.0, 1.0) } else { 0.0 };
    }
    all
}
