//! Label placement: every label has candidate spots with a cost; no two labels overlap, no label
//! stands on a line, and leaders stay off labels.
//!
//! Greedy in order of rank, each label at its cheapest free spot. A label that finds none moves to
//! the front and everything starts again; what still finds none goes below the drawing on a
//! leader, where there is always room. Then labels move to cheaper spots while there are any.
//! No chance is involved: the same notes give the same places.

use kurbo::{BezPath, Line, PathEl, Point, Rect, Vec2};

use super::drawing::Role;
use super::text::{POINT, Text};

/// Clear space between two labels, mm.
const BETWEEN: f64 = 0.6;
/// Clear space between a label and the edge of a line, mm.
const OFF_LINE: f64 = 0.3;
/// Distances tried for labels on leaders, mm.
const RINGS: [f64; 9] = [3.5, 5.0, 7.0, 10.0, 13.0, 17.0, 22.0, 28.0, 35.0];
/// Directions tried on each ring.
const DIRECTIONS: usize = 16;
/// Cost of having a leader at all, and per millimetre of it.
const LEADER_COST: (f64, f64) = (6.0, 0.4);
/// Cost of a leader that crosses a line.
const CROSSING_COST: f64 = 2.0;
/// Cost of a label that needs a mask.
const MASK_COST: f64 = 9.0;
/// Cost per millimetre by which a label makes the drawing larger.
const GROWTH_COST: f64 = 0.25;

/// A label that waits for its place.
#[derive(Clone, Debug)]
pub struct Note {
    /// The lines of text, set one below the other.
    pub lines: Vec<Text>,
    /// Type size, pt.
    pub size: f64,
    /// What the label is for.
    pub role: Role,
    /// What a leader points at.
    pub target: Point,
    /// Where it may stand.
    pub spots: Vec<Spot>,
    /// Placed earlier the lower it is.
    pub rank: u8,
}

/// A place where a label may stand.
#[derive(Clone, Copy, Debug)]
pub struct Spot {
    /// The point that the block of text hangs on.
    pub at: Point,
    /// -1: the block ends at the point's left; 0: centred on it; 1: starts at its right.
    pub across: f64,
    /// -1: the block stands above the point; 0: centred on it; 1: hangs below.
    pub down: f64,
    /// Reads upwards.
    pub rotate: bool,
    /// Whether a leader joins it to the target.
    pub leader: bool,
    /// How much it is disliked.
    pub cost: f64,
}

/// A label's decided place.
#[derive(Clone, Debug)]
pub struct Block {
    /// The paper it covers.
    pub area: Rect,
    /// How its lines are aligned: as [`Spot::across`].
    pub align: f64,
    /// Reads upwards.
    pub rotate: bool,
    /// Its leader.
    pub leader: Option<Line>,
    cost: f64,
}

/// What labels must keep off, and what they had better keep off.
#[derive(Default)]
pub struct Ground {
    /// Pieces of line with half their width.
    bars: Vec<(Line, f64)>,
    /// Hatched areas, as closed rings.
    pub soft: Vec<Vec<Point>>,
}

impl Ground {
    /// Adds a path that labels must keep off.
    pub fn bar(&mut self, path: &BezPath, half_width: f64) {
        let (mut start, mut last) = (Point::ZERO, Point::ZERO);
        kurbo::flatten(path, 0.05, |element| match element {
            PathEl::MoveTo(p) => (start, last) = (p, p),
            PathEl::LineTo(p) => {
                self.bars.push((Line::new(last, p), half_width));
                last = p;
            }
            PathEl::ClosePath => {
                self.bars.push((Line::new(last, start), half_width));
                last = start;
            }
            _ => {}
        });
    }

    fn blocks(&self, area: Rect) -> bool {
        self.bars.iter().any(|(line, half)| {
            let reach = half + OFF_LINE;
            crosses(*line, area.inflate(reach, reach))
        })
    }

    /// Whether any hatching lies under an area.
    pub fn hatched(&self, area: Rect) -> bool {
        self.soft.iter().any(|ring| {
            let sides = ring.iter().zip(ring.iter().cycle().skip(1));
            let crossed = sides.clone().any(|(a, b)| crosses(Line::new(*a, *b), area));
            crossed || kurbo::Shape::contains(&super::board::polygon(ring), area.center())
        })
    }

    fn crossed_by(&self, leader: Line) -> usize {
        self.bars
            .iter()
            .filter(|(line, _)| meet(leader, *line))
            .count()
    }
}

impl Spot {
    /// A spot beside, above or below a point, in the direction given by signs.
    pub fn new(at: impl Into<Point>, across: f64, down: f64) -> Self {
        Self {
            at: at.into(),
            across,
            down,
            rotate: false,
            leader: false,
            cost: 0.0,
        }
    }

    /// Text that reads upwards.
    pub fn upwards(at: impl Into<Point>, across: f64, down: f64) -> Self {
        Self {
            rotate: true,
            ..Self::new(at, across, down)
        }
    }

    /// The same spot, liked less.
    pub fn cost(self, cost: f64) -> Self {
        Self { cost, ..self }
    }

    /// The same spot with a leader to the target.
    pub fn led(self) -> Self {
        Self {
            leader: true,
            ..self
        }
    }
}

impl Note {
    /// Words at 8 pt that name `target`.
    pub fn new(role: Role, target: impl Into<Point>, text: Text) -> Self {
        let target = target.into();
        Self {
            lines: vec![text],
            size: 8.0,
            role,
            target,
            spots: Vec::new(),
            rank: 2,
        }
    }

    /// A further line below.
    pub fn line(mut self, text: Text) -> Self {
        self.lines.push(text);
        self
    }

    /// A further line of words below, unless they are empty.
    pub fn words(self, text: &str) -> Self {
        if text.is_empty() {
            self
        } else {
            self.line(Text::plain(text))
        }
    }

    /// A spot, each further one liked a little less.
    pub fn spot(mut self, spot: Spot) -> Self {
        let later = 0.2 * self.spots.len() as f64;
        self.spots.push(spot.cost(spot.cost + later));
        self
    }

    /// Spots right, left, above and below the target at a distance.
    pub fn around(self, gap: f64) -> Self {
        let t = self.target;
        self.spot(Spot::new((t.x + gap, t.y), 1.0, 0.0))
            .spot(Spot::new((t.x - gap, t.y), -1.0, 0.0))
            .spot(Spot::new((t.x, t.y - gap), 0.0, -1.0))
            .spot(Spot::new((t.x, t.y + gap), 0.0, 1.0))
    }

    /// Placed before notes of higher rank.
    pub fn rank(mut self, rank: u8) -> Self {
        self.rank = rank;
        self
    }

    /// Distance between two baselines, mm.
    pub(super) fn pitch(&self) -> f64 {
        1.25 * self.size * POINT
    }

    /// Width of the longest line, mm.
    pub(super) fn width(&self) -> f64 {
        self.lines
            .iter()
            .map(|line| line.extent(self.size).width)
            .fold(0.0, f64::max)
    }

    /// Ink of the first line above its baseline, mm.
    pub(super) fn first_ascent(&self) -> f64 {
        self.lines[0].extent(self.size).ascent
    }

    fn height(&self) -> f64 {
        let last = self
            .lines
            .last()
            .map_or(0.0, |line| line.extent(self.size).descent);
        self.first_ascent() + self.pitch() * (self.lines.len() - 1) as f64 + last
    }

    fn block(&self, spot: &Spot, size: (f64, f64)) -> Block {
        let (w, h) = if spot.rotate { (size.1, size.0) } else { size };
        let x0 = spot.at.x + (spot.across - 1.0) / 2.0 * w;
        let y0 = spot.at.y + (spot.down - 1.0) / 2.0 * h;
        let area = Rect::new(x0, y0, x0 + w, y0 + h);
        let leader = spot
            .leader
            .then(|| Line::new(nearest_handle(area, self.target), self.target));
        let align = if spot.rotate { 0.0 } else { spot.across };
        Block {
            area,
            align,
            rotate: spot.rotate,
            leader,
            cost: spot.cost,
        }
    }

    /// The places this note may take, cheapest first, those on lines left out. Places on leaders
    /// all around are added where `far` asks for them or no near spot is cheaper.
    fn candidates(&self, ground: &Ground, bounds: Rect, far: bool) -> Vec<Block> {
        let size = (self.width(), self.height());
        let weigh = |spot: Spot| {
            let mut block = self.block(&spot, size);
            if ground.blocks(block.area) {
                return None;
            }
            if ground.hatched(block.area) {
                block.cost += MASK_COST;
            }
            if let Some(leader) = block.leader {
                // The last bit of a leader may touch what it points at.
                block.cost += CROSSING_COST * ground.crossed_by(shortened(leader, 0.6)) as f64;
            }
            let grown = bounds.union(block.area);
            let growth = grown.width() - bounds.width() + grown.height() - bounds.height();
            block.cost += GROWTH_COST * growth;
            Some(block)
        };
        let mut blocks: Vec<Block> = self.spots.iter().copied().filter_map(weigh).collect();
        if far || blocks.iter().all(|block| block.cost > LEADER_COST.0) {
            blocks.extend(self.rings().filter_map(weigh));
        }
        blocks.sort_by(|a, b| a.cost.total_cmp(&b.cost));
        blocks
    }

    /// Spots on leaders, in growing rings.
    fn rings(&self) -> impl Iterator<Item = Spot> + '_ {
        RINGS.iter().flat_map(move |ring| {
            // From one step above the right, so that oblique leaders come first.
            (1..=DIRECTIONS).map(move |step| {
                let angle = std::f64::consts::TAU * step as f64 / DIRECTIONS as f64;
                let toward = Vec2::new(angle.cos(), -angle.sin());
                let sign = |v: f64| if v.abs() < 0.3 { 0.0 } else { v.signum() };
                let spot = Spot::new(self.target + toward * *ring, sign(toward.x), sign(toward.y));
                spot.led().cost(LEADER_COST.0 + LEADER_COST.1 * ring)
            })
        })
    }
}

/// Decides the place of every note; the answer is in the order of the notes.
pub fn place(notes: &[Note], ground: &Ground, bounds: Rect) -> Vec<Block> {
    let mut candidates: Vec<_> = notes
        .iter()
        .map(|note| note.candidates(ground, bounds, false))
        .collect();
    let mut order: Vec<usize> = (0..notes.len()).collect();
    order.sort_by_key(|index| notes[*index].rank);

    let mut best = greedy(&candidates, &order);
    let mut worst = notes.len();
    for _ in 0..3 * notes.len() {
        let Some(stuck) = order.iter().position(|index| best[*index].is_none()) else {
            break;
        };
        let index = order.remove(stuck);
        candidates[index] = notes[index].candidates(ground, bounds, true);
        order.insert(0, index);
        best = greedy(&candidates, &order);
        let open = best.iter().filter(|pick| pick.is_none()).count();
        if open > worst {
            // Going round in circles: leave the rest to the place below the drawing.
            break;
        }
        worst = open.max(1);
    }
    improve(&candidates, &mut best);

    let chosen = |index: usize| best[index].map(|pick| candidates[index][pick].clone());
    let mut blocks: Vec<Option<Block>> = (0..notes.len()).map(chosen).collect();
    for index in 0..notes.len() {
        if blocks[index].is_none() {
            let below = below_everything(&notes[index], &blocks, bounds);
            blocks[index] = Some(below);
        }
    }
    blocks.into_iter().flatten().collect()
}

/// Each note in turn at its cheapest spot that is still free.
fn greedy(candidates: &[Vec<Block>], order: &[usize]) -> Vec<Option<usize>> {
    let mut placed: Vec<Option<usize>> = vec![None; candidates.len()];
    for &index in order {
        placed[index] = cheapest(candidates, &placed, index);
    }
    placed
}

/// Lets notes move to cheaper spots that have become free.
fn improve(candidates: &[Vec<Block>], placed: &mut [Option<usize>]) {
    for _ in 0..4 {
        let before = placed.to_vec();
        for index in 0..placed.len() {
            placed[index] = cheapest(candidates, placed, index).or(placed[index]);
        }
        if placed == before {
            return;
        }
    }
}

fn cheapest(candidates: &[Vec<Block>], placed: &[Option<usize>], index: usize) -> Option<usize> {
    candidates[index].iter().position(|block| {
        placed.iter().enumerate().all(|(other, pick)| match pick {
            Some(pick) if other != index => !clash(block, &candidates[other][*pick]),
            _ => true,
        })
    })
}

/// Below all drawn and placed things, on the leader that crosses fewest labels.
fn below_everything(note: &Note, blocks: &[Option<Block>], bounds: Rect) -> Block {
    let all = blocks
        .iter()
        .flatten()
        .fold(bounds, |sum, block| sum.union(block.area));
    let steps = (bounds.width() / 5.0).ceil() as usize;
    let size = (note.width(), note.height());
    (0..=steps)
        .map(|step| {
            let at = (bounds.x0 + 5.0 * step as f64, all.y1 + 2.0);
            note.block(&Spot::new(at, 1.0, 1.0).led(), size)
        })
        .min_by_key(|block| {
            blocks
                .iter()
                .flatten()
                .filter(|other| clash(block, other))
                .count()
        })
        .expect("there is at least one step")
}

fn clash(a: &Block, b: &Block) -> bool {
    let gap = BETWEEN / 2.0;
    let (area_a, area_b) = (a.area.inflate(gap, gap), b.area.inflate(gap, gap));
    area_a.overlaps(area_b)
        || a.leader.is_some_and(|leader| crosses(leader, area_b))
        || b.leader.is_some_and(|leader| crosses(leader, area_a))
        || matches!((a.leader, b.leader), (Some(x), Some(y)) if meet(x, y))
}

/// Where a leader meets the text: the middle of its nearer end, or the middle of its nearer side.
fn nearest_handle(area: Rect, target: Point) -> Point {
    let c = area.center();
    let gap = 0.4;
    if target.x < area.x0 {
        Point::new(area.x0 - gap, c.y)
    } else if target.x > area.x1 {
        Point::new(area.x1 + gap, c.y)
    } else if target.y < area.y0 {
        Point::new(target.x.clamp(area.x0, area.x1), area.y0 - gap)
    } else {
        Point::new(target.x.clamp(area.x0, area.x1), area.y1 + gap)
    }
}

/// Whether any part of a segment lies in a rectangle.
pub fn crosses(line: Line, area: Rect) -> bool {
    let bounds = Rect::from_points(line.p0, line.p1);
    if bounds.x1 < area.x0 || bounds.x0 > area.x1 || bounds.y1 < area.y0 || bounds.y0 > area.y1 {
        return false;
    }
    let (p, d) = (line.p0, line.p1 - line.p0);
    let (mut enter, mut leave) = (0.0_f64, 1.0_f64);
    for (start, step, low, high) in [(p.x, d.x, area.x0, area.x1), (p.y, d.y, area.y0, area.y1)] {
        if step.abs() < 1e-12 {
            if start < low || start > high {
                return false;
            }
        } else {
            let (a, b) = ((low - start) / step, (high - start) / step);
            enter = enter.max(a.min(b));
            leave = leave.min(a.max(b));
        }
    }
    enter <= leave
}

/// Whether two segments meet.
fn meet(a: Line, b: Line) -> bool {
    let (u, v, w) = (a.p1 - a.p0, b.p1 - b.p0, b.p0 - a.p0);
    let det = u.cross(v);
    if det.abs() < 1e-12 {
        return false;
    }
    let (s, t) = (w.cross(v) / det, w.cross(u) / det);
    (0.0..=1.0).contains(&s) && (0.0..=1.0).contains(&t)
}

/// A segment without its last `gap` millimetres.
fn shortened(line: Line, gap: f64) -> Line {
    let run = line.p1 - line.p0;
    let length = run.hypot();
    if length <= gap {
        line
    } else {
        Line::new(line.p0, line.p1 - run * (gap / length))
    }
}
