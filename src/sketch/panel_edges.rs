//! The edges of a panel looked at on its face: bands that show how each is held, their words and dimensions.
//!
//! Edges after the key of EN 1996-1-1 Annex E (from memory, check against the standard): free edge
//! a thin line, simply supported edge single hatching, continuous edge crossed hatching. The
//! caption says so in words. Where an opening reaches an edge there is nothing to hold and no band.

use kurbo::{Point, Rect, Vec2};

use super::board::{Board, corners};
use super::dimension::{self, mm};
use super::drawing::Role;
use super::hatch::diagonals;
use super::note::{Note, Spot};
use super::panel_opening::Opening;
use super::pen::Pen;
use super::text::Text;
use super::text::list;
use super::view::Ruler;

/// Support of one edge and why it counts as such.
#[derive(Clone, Debug)]
pub struct Edge {
    /// How it is held.
    pub support: Support,
    /// Reason, short: `bonded to R1`; may be empty.
    pub why: String,
    /// From where to where it is held, mm along the edge from the left or from the base; the rest is free. All of it
    /// where there is none.
    pub held: Option<(f64, f64)>,
}

/// How an edge is held.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Support {
    /// Not held.
    Free,
    /// Held, free to turn.
    Simple,
    /// Held and continuous.
    Continuous,
}

impl Support {
    fn word(self) -> &'static str {
        match self {
            Support::Free => "free",
            Support::Simple => "simple",
            Support::Continuous => "continuous",
        }
    }
}

/// Width of the band that shows a support, and between its hatch lines, mm on paper.
pub(super) const BAND: f64 = 2.8;
const BAND_HATCH: f64 = 1.1;

/// Lengths (mm) nearer to each other than this are one.
const SAME: f64 = 0.5;

/// From a band to the first dimension line: with words between, and more where they take two lines, or without, mm
/// on paper.
const BESIDE_WORDS: f64 = 8.5;
const SECOND_LINE: f64 = 3.5;
const CLOSE: f64 = 5.2;

/// A panel looked at on its face: its size, how it is held, its openings.
#[derive(Clone, Debug)]
pub struct PanelFace {
    /// Mark of the panel.
    pub mark: String,
    /// `before` or `after`, or empty where there is one state only.
    pub state: String,
    /// Length between the supports, mm.
    pub length: f64,
    /// Height between the supports, mm.
    pub height: f64,
    /// Left edge.
    pub left: Edge,
    /// Right edge.
    pub right: Edge,
    /// Top edge.
    pub top: Edge,
    /// Base.
    pub base: Edge,
    /// Openings.
    pub openings: Vec<Opening>,
}

/// The outline of a panel.
pub(super) struct Edges<'a> {
    pub face: &'a PanelFace,
    /// Whether edges have their words even without a reason.
    pub worded: bool,
}

/// One edge with its place.
struct Side<'a> {
    edge: &'a Edge,
    /// Its length, mm.
    length: f64,
    /// Full-size place of its start, and its direction.
    start: (f64, f64),
    upright: bool,
    /// Away from the panel, on paper.
    out: Vec2,
}

impl Edge {
    /// The stretch that is held (mm along the edge) where it is not the whole edge of `length` mm.
    fn part(&self, length: f64) -> Option<(f64, f64)> {
        let (a, b) = self.held.filter(|_| self.support != Support::Free)?;
        let (from, to) = (a.min(b).clamp(0.0, length), a.max(b).clamp(0.0, length));
        (from > SAME || to < length - SAME).then_some((from, to))
    }

    fn words(&self) -> String {
        let support = self.support.word();
        if self.why.is_empty() { support.to_owned() } else { format!("{support}: {}", self.why) }
    }

    /// Whether its words are longer than the edge, mm on paper.
    fn in_two_lines(&self, length: f64) -> bool {
        !self.why.is_empty() && Text::plain(&self.words()).extent(8.0).width + 2.0 > length
    }
}

impl Side<'_> {
    /// The place on paper, mm along the edge.
    fn at(&self, ruler: Ruler, along: f64) -> Point {
        let (x, y) = self.start;
        if self.upright { ruler.at(x, y + along) } else { ruler.at(x + along, y) }
    }

    /// A stretch (mm along the edge) on paper: from the left, or from above.
    fn on_paper(&self, ruler: Ruler, (from, to): (f64, f64)) -> (Point, Point) {
        let ends = (self.at(ruler, from), self.at(ruler, to));
        if self.upright { (ends.1, ends.0) } else { ends }
    }

    /// The stretch that is held.
    fn held(&self) -> (f64, f64) {
        self.edge.part(self.length).unwrap_or((0.0, self.length))
    }

    /// Places along the edge where the stretch that is held begins and ends; none where it is the whole edge.
    fn places(&self) -> Vec<f64> {
        let Some((from, to)) = self.edge.part(self.length) else { return Vec::new() };
        let mut places = vec![0.0, from, to, self.length];
        places.dedup_by(|a, b| (*a - *b).abs() < SAME);
        places
    }

    /// The pieces with a band, in turn: held, and not the sill or side of an opening.
    fn banded(&self, openings: &[Opening]) -> Vec<(f64, f64)> {
        if self.edge.support == Support::Free {
            return Vec::new();
        }
        let across = if self.upright { self.start.0 } else { self.start.1 };
        let mut gaps: Vec<(f64, f64)> = openings
            .iter()
            .filter_map(|o| {
                let (x, y) = ((o.x, o.x + o.width), (o.y, o.y + o.height));
                let (along, beside) = if self.upright { (y, x) } else { (x, y) };
                ((beside.0 - across).abs() < SAME || (beside.1 - across).abs() < SAME).then_some(along)
            })
            .collect();
        gaps.sort_by(|a, b| a.0.total_cmp(&b.0));
        let (mut from, to) = self.held();
        let mut pieces = Vec::new();
        for gap in gaps {
            pieces.push((from, gap.0.min(to)));
            from = from.max(gap.1);
        }
        pieces.push((from, to));
        pieces.retain(|(a, b)| b - a > SAME);
        pieces
    }
}

impl<'a> Edges<'a> {
    fn sides(&self) -> [Side<'a>; 4] {
        let (l, h) = (self.face.length, self.face.height);
        let level = |edge, y, out| Side { edge, length: l, start: (0.0, y), upright: false, out };
        let upright = |edge, x, out| Side { edge, length: h, start: (x, 0.0), upright: true, out };
        [
            level(&self.face.top, h, Vec2::new(0.0, -1.0)),
            level(&self.face.base, 0.0, Vec2::new(0.0, 1.0)),
            upright(&self.face.left, 0.0, Vec2::new(-1.0, 0.0)),
            upright(&self.face.right, l, Vec2::new(1.0, 0.0)),
        ]
    }

    /// Bands and outlines of the edges, and their reasons.
    pub fn draw(&self, board: &mut Board, ruler: Ruler) {
        for side in self.sides() {
            let banded = side.banded(&self.face.openings);
            if banded != [(0.0, side.length)] {
                let (from, to) = side.on_paper(ruler, (0.0, side.length));
                board.line(Pen::Beyond, from, to);
            }
            for piece in banded {
                band(board, side.edge.support, side.on_paper(ruler, piece), side.out);
            }
            if self.has_words(side.edge) {
                words(board, &side, ruler);
            }
        }
    }

    fn has_words(&self, edge: &Edge) -> bool {
        self.worded || !edge.why.is_empty()
    }

    /// Length and height, chains of the stretches that are held, and a chain of places along the base.
    pub fn dimensions(&self, board: &mut Board, ruler: Ruler, stations: &[f64]) {
        for side in self.sides() {
            let band = side.at(ruler, 0.0) + side.out * BAND;
            let step = side.out * (dimension::ROW + 1.0);
            let mut line = band + side.out * self.first_line(&side, ruler);
            let places = side.places();
            let is_base = side.out.y > 0.0;
            for chain in [if is_base { stations } else { &[] }, places.as_slice()] {
                if chain.len() > 2 {
                    let texts: Vec<Text> = steps(chain).into_iter().map(Text::from).collect();
                    let on: Vec<Point> = chain.iter().map(|place| side.at(ruler, *place)).collect();
                    if side.upright {
                        let ys: Vec<f64> = on.iter().map(|p| p.y).collect();
                        dimension::chain_up(board, &ys, line.x, band.x, &texts);
                    } else {
                        let xs: Vec<f64> = on.iter().map(|p| p.x).collect();
                        dimension::chain_across(board, &xs, line.y, band.y, &texts);
                    }
                    line += step;
                }
            }
            let (from, to) = (side.at(ruler, 0.0), side.at(ruler, side.length));
            if is_base {
                dimension::across(board, (from.x, to.x), line.y, band.y, mm(self.face.length));
            } else if side.out.x < 0.0 {
                dimension::up(board, (from.y, to.y), line.x, band.x, mm(self.face.height));
            }
        }
    }

    /// From the band of an edge to its first dimension line, mm on paper.
    fn first_line(&self, side: &Side<'_>, ruler: Ruler) -> f64 {
        let (from, to) = side.on_paper(ruler, side.held());
        match self.has_words(side.edge) {
            false => CLOSE,
            true if side.upright && side.edge.in_two_lines((to - from).hypot()) => BESIDE_WORDS + SECOND_LINE,
            true => BESIDE_WORDS,
        }
    }

    /// The key in words, for what is there.
    pub fn key(&self) -> Vec<String> {
        let sides = self.sides();
        let has = |support| sides.iter().any(|side| side.edge.support == support);
        let parts = sides.iter().any(|side| side.edge.part(side.length).is_some());
        [
            (has(Support::Free) || parts, "thin line: free edge"),
            (has(Support::Simple), "single hatching: simply supported"),
            (has(Support::Continuous), "crossed hatching: continuous"),
        ]
        .into_iter()
        .filter(|(there, _)| *there)
        .map(|(_, words)| words.to_owned())
        .collect()
    }

    /// `Left edge simple; right edge continuous: bonded, from 0 to 900 mm above the base only
    /// (along it 900 and 1500 mm); top free; base simple. `
    pub fn spoken(&self) -> String {
        let [top, base, left, right] = self.sides().map(|side| {
            let origin = if side.upright { "above the base" } else { "from the left edge" };
            let part = side.edge.part(side.length);
            let part = part.map_or(String::new(), |(from, to)| {
                let along = list(&steps(&side.places()));
                format!(", from {} to {} mm {origin} only (along it {along} mm)", mm(from), mm(to))
            });
            side.edge.words() + &part
        });
        format!("Left edge {left}; right edge {right}; top {top}; base {base}. ")
    }
}

/// Outline and hatched band of a held stretch.
fn band(board: &mut Board, support: Support, (from, to): (Point, Point), out: Vec2) {
    let area = Rect::from_points(from, to + out * BAND);
    let ring = corners(area);
    board.line(Pen::Outline, from, to);
    board.hatching(diagonals(&ring, BAND_HATCH, 0.0, true), &ring);
    board.line(Pen::Beyond, from + out * BAND, to + out * BAND);
    if support == Support::Continuous {
        board.hatching(diagonals(&ring, BAND_HATCH, 0.0, false), &ring);
    }
}

/// How an edge is held and why, beside the band.
fn words(board: &mut Board, side: &Side<'_>, ruler: Ruler) {
    let (edge, out) = (side.edge, side.out);
    let (from, to) = side.on_paper(ruler, side.held());
    let target = from.midpoint(to) + out * (BAND / 2.0);
    let mut note = Note::new(Role::Note, target, Text::plain(&edge.words()));
    if side.upright && edge.in_two_lines((to - from).hypot()) {
        note.lines = vec![Text::plain(&format!("{}:", edge.support.word())), Text::plain(&edge.why)];
    }
    for share in [0.5, 0.4, 0.6, 0.3, 0.7, 0.2, 0.8, 0.1, 0.9] {
        let beside = from.lerp(to, share) + out * (BAND + 1.2);
        note = match side.upright {
            false => note.spot(Spot::new(beside, 0.0, out.y)),
            true => note.spot(Spot::upwards(beside, out.x, 0.0)),
        };
    }
    board.note(note);
}

/// Distances between neighbours, as they are printed.
pub(super) fn steps(places: &[f64]) -> Vec<String> {
    places.windows(2).map(|pair| mm(pair[1] - pair[0])).collect()
}
