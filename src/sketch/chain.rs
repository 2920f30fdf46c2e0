//! The one chain from the wind face to the ground: a node for each link, drawn by how it is known.

use kurbo::{Point, Rect, Vec2};

use super::board::{Board, Words};
use super::drawing::{Drawing, Role};
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::text::Text;

/// What the chain shows: its links from the wind to the ground.
#[derive(Clone, Debug)]
pub struct Chain {
    /// Links in order.
    pub links: Vec<ChainLink>,
}

/// One link: one branch, or several side by side where it differs by mark.
#[derive(Clone, Debug)]
pub struct ChainLink {
    /// Its name: `floor edge`.
    pub name: String,
    /// At least one.
    pub branches: Vec<Branch>,
}

/// One way through a link.
#[derive(Clone, Debug)]
pub struct Branch {
    /// What it is of: `R1, R2`; empty for all.
    pub of: String,
    /// How it is known.
    pub known: Known,
    /// What stands beside it: `sheet R1`, `hold point H3`; may be empty.
    pub beside: String,
}

/// How a link is known.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Known {
    /// On a sheet: full lines.
    Calculated,
    /// By a rule: chain-dashed lines.
    Rule,
    /// By a person: two thin lines.
    Seen,
    /// Not known: heavy dashes, and a break in the link.
    Assumed,
    /// Calculated, and it does not hold: as broken.
    Fails,
    /// Left outside the method by what calculates it: as broken.
    Outside,
}

impl Known {
    const ALL: [Self; 6] =
        [Self::Calculated, Self::Rule, Self::Seen, Self::Assumed, Self::Fails, Self::Outside];

    /// In words.
    pub const fn words(self) -> &'static str {
        match self {
            Self::Calculated => "calculated",
            Self::Rule => "by rule",
            Self::Seen => "seen",
            Self::Assumed => "assumed",
            Self::Fails => "not adequate",
            Self::Outside => "outside the method",
        }
    }
}

/// Type size, pt, and the pitch of its lines, mm.
const SIZE: f64 = 8.0;
const PITCH: f64 = 3.6;
/// Width that names of links take on the left, and width for the nodes, mm.
const NAMES: f64 = 26.0;
const NODES: f64 = 112.0;
/// Room round the words of a node, between two nodes, and between two rows, mm.
const PAD: Vec2 = Vec2::new(2.4, 1.6);
const APART: f64 = 5.0;
const ROW: f64 = 8.0;
/// From a row down to the line that joins its branches, mm.
const BUS: f64 = 2.4;
/// Branches side by side; more are drawn together by how they are known.
const ABREAST: usize = 3;

/// Draws the chain. It is not to scale.
pub fn chain(view: &Chain) -> Drawing {
    let mut board = Board::default();
    let centre = NAMES + NODES / 2.0;
    let top = Point::new(centre, 0.0);
    load::arrow(&mut board, top - Vec2::new(0.0, 7.0), top);
    board.note(Note::new(Role::Load, top, Text::plain("wind")).spot(Spot::new(
        top + Vec2::new(2.0, -4.0),
        1.0,
        0.0,
    )));
    let rows = rows(view, centre);
    // Where the branches of the row above end, and what they are of.
    let mut above = vec![(centre, String::new())];
    let mut y = 0.0;
    for (link, nodes) in view.links.iter().zip(&rows) {
        join(&mut board, &above, nodes, y);
        y += ROW;
        let height = nodes.iter().map(|n| n.height).fold(0.0, f64::max);
        for node in nodes {
            draw(&mut board, node, y, height);
        }
        let middle = Point::new(0.0, y + height / 2.0);
        board.note(Note::new(Role::Mark, middle, Text::mark(&link.name)).spot(Spot::new(middle, 1.0, 0.0)));
        above = nodes.iter().map(|n| (n.x, n.of.clone())).collect();
        y += height;
    }
    close(&mut board, &above, centre, y);
    key(&mut board, view, y + ROW + 7.0);
    board.finish(Words {
        name: "chain".to_owned(),
        caption: "The chain from the wind face to the ground".to_owned(),
        scale: "not to scale".to_owned(),
        alt: alt(view),
    })
}

/// A node ready to draw.
struct Node {
    of: String,
    x: f64,
    width: f64,
    height: f64,
    known: Known,
    lines: Vec<String>,
}

/// The nodes of every link, side by side about the middle; rows of as many branches stand in line.
fn rows(view: &Chain, centre: f64) -> Vec<Vec<Node>> {
    let mut rows: Vec<Vec<Node>> = view.links.iter().map(row).collect();
    let widest = |rows: &[Vec<Node>], n: usize| {
        let alike = rows.iter().filter(|r| r.len() == n).flatten();
        alike.map(|node| node.width).fold(0.0, f64::max)
    };
    for i in 0..rows.len() {
        let n = rows[i].len();
        let pitch = widest(&rows, n) + APART;
        for (k, node) in rows[i].iter_mut().enumerate() {
            node.x = centre + (k as f64 - (n as f64 - 1.0) / 2.0) * pitch;
        }
    }
    rows
}

/// The nodes of a link, not yet in their places.
fn row(link: &ChainLink) -> Vec<Node> {
    let branches = together(&link.branches);
    let several = branches.len() > 1;
    let share = (NODES + APART) / branches.len().max(1) as f64 - APART;
    let node = |b: &Branch| {
        let lines = lines(b, several, share - 2.0 * PAD.x);
        let width = lines.iter().map(|l| width(l)).fold(0.0, f64::max) + 2.0 * PAD.x;
        let height = PITCH * lines.len() as f64 + 2.0 * PAD.y - 0.4;
        Node { of: b.of.clone(), x: 0.0, width: width.max(18.0), height, known: b.known, lines }
    };
    branches.iter().map(node).collect()
}

/// Few branches as they are; many drawn together by how they are known.
fn together(branches: &[Branch]) -> Vec<Branch> {
    if branches.len() <= ABREAST {
        return branches.to_vec();
    }
    let join = |parts: Vec<&str>| {
        let mut out: Vec<&str> = Vec::new();
        for part in parts.into_iter().filter(|p| !p.is_empty()) {
            if !out.contains(&part) {
                out.push(part);
            }
        }
        out.join(", ")
    };
    let of = |known: Known| {
        let same: Vec<&Branch> = branches.iter().filter(|b| b.known == known).collect();
        (!same.is_empty()).then(|| Branch {
            of: join(same.iter().map(|b| b.of.as_str()).collect()),
            known,
            beside: join(same.iter().map(|b| b.beside.as_str()).collect()),
        })
    };
    Known::ALL.into_iter().filter_map(of).collect()
}

/// The words of a node, in lines no wider than `most` where words allow it.
fn lines(b: &Branch, several: bool, most: f64) -> Vec<String> {
    let first =
        if b.of.is_empty() { b.known.words().to_owned() } else { format!("{}: {}", b.of, b.known.words()) };
    if b.beside.is_empty() {
        return wrapped(&first, most);
    }
    let one = format!("{first}, {}", b.beside);
    if !several && width(&one) <= most {
        return vec![one];
    }
    wrapped(&first, most).into_iter().chain(wrapped(&b.beside, most)).collect()
}

fn wrapped(text: &str, most: f64) -> Vec<String> {
    let mut out: Vec<String> = Vec::new();
    for word in text.split(' ') {
        match out.last_mut() {
            Some(line) if width(&format!("{line} {word}")) <= most => {
                line.push(' ');
                line.push_str(word);
            }
            _ => out.push(word.to_owned()),
        }
    }
    out
}

fn width(text: &str) -> f64 {
    Text::plain(text).extent(SIZE).width
}

/// Joins the row above, which ends at `y`, with the nodes below: each link in the manner of its proof. Branches
/// of the same things run straight on; others meet on the way.
fn join(board: &mut Board, above: &[(f64, String)], nodes: &[Node], y: f64) {
    let bus = y + BUS;
    let alike = above.len() == nodes.len() && above.iter().zip(nodes).all(|(a, n)| a.1 == n.of);
    for (x, _) in above {
        board.line(Pen::Outline, Point::new(*x, y), Point::new(*x, bus));
    }
    if !alike {
        let xs: Vec<f64> = above.iter().map(|a| a.0).chain(nodes.iter().map(|n| n.x)).collect();
        across(board, &xs, bus);
    }
    for node in nodes {
        limb(board, node.known, Point::new(node.x, bus), Point::new(node.x, y + ROW));
    }
}

/// The line on which branches meet.
fn across(board: &mut Board, xs: &[f64], y: f64) {
    let low = xs.iter().copied().fold(f64::INFINITY, f64::min);
    let high = xs.iter().copied().fold(f64::NEG_INFINITY, f64::max);
    if high - low > 0.01 {
        board.line(Pen::Outline, Point::new(low, y), Point::new(high, y));
    }
}

/// A piece of the chain in the manner of its proof.
fn limb(board: &mut Board, known: Known, from: Point, to: Point) {
    let side = (to - from).normalize().turn_90();
    match known {
        Known::Calculated => board.line(Pen::Support, from, to),
        Known::Rule => board.line(Pen::Axis, from, to),
        Known::Seen => {
            for way in [-0.45, 0.45] {
                board.line(Pen::Beyond, from + side * way, to + side * way);
            }
        }
        Known::Fails | Known::Outside => {
            // Broken, and crossed out.
            let (a, b) = (from.lerp(to, 0.3), from.lerp(to, 0.7));
            board.line(Pen::Open, from, a);
            board.line(Pen::Open, b, to);
            let (along, middle) = ((to - from).normalize() * 1.3, from.midpoint(to));
            for way in [1.0, -1.0] {
                let arm = side * (1.5 * way) + along;
                board.line(Pen::Support, middle - arm, middle + arm);
            }
        }
        Known::Assumed => {
            // Broken: two strokes across a gap.
            let (a, b) = (from.lerp(to, 0.36), from.lerp(to, 0.64));
            board.line(Pen::Open, from, a);
            board.line(Pen::Open, b, to);
            let slant = side * 1.5 + (to - from).normalize() * 0.5;
            board.line(Pen::Outline, a - slant, a + slant);
            board.line(Pen::Outline, b - slant, b + slant);
        }
    }
}

/// A node with its words; the line that goes on from a low node reaches the end of its row.
fn draw(board: &mut Board, node: &Node, y: f64, row: f64) {
    let area = Rect::new(node.x - node.width / 2.0, y, node.x + node.width / 2.0, y + node.height);
    frame(board, node.known, area);
    if row - node.height > 0.01 {
        board.line(Pen::Outline, Point::new(node.x, area.y1), Point::new(node.x, y + row));
    }
    let centre = area.center();
    let mut lines = node.lines.iter();
    let first = lines.next().map_or("", String::as_str);
    let note = lines.fold(Note::new(Role::Note, centre, Text::plain(first)), |n, l| n.line(Text::plain(l)));
    board.note(note.spot(Spot::new(centre, 0.0, 0.0)).rank(0));
}

fn frame(board: &mut Board, known: Known, area: Rect) {
    match known {
        Known::Calculated => board.rect(Pen::Support, area),
        Known::Rule => board.rect(Pen::Axis, area),
        Known::Seen => {
            board.rect(Pen::Beyond, area);
            board.rect(Pen::Beyond, area.inset(-0.8));
        }
        Known::Assumed | Known::Fails | Known::Outside => board.rect(Pen::Open, area),
    }
}

/// From the last row to the ground.
fn close(board: &mut Board, above: &[(f64, String)], centre: f64, y: f64) {
    let bus = y + BUS;
    let mut xs = vec![centre];
    for (x, _) in above {
        board.line(Pen::Outline, Point::new(*x, y), Point::new(*x, bus));
        xs.push(*x);
    }
    across(board, &xs, bus);
    let foot = Point::new(centre, y + ROW);
    board.line(Pen::Outline, Point::new(centre, bus), foot);
    let half = Vec2::new(9.0, 0.0);
    load::ground(board, foot - half, foot + half, Vec2::new(0.0, 1.0));
    let beside = foot + half + Vec2::new(2.0, 0.0);
    board.note(Note::new(Role::Note, foot, Text::plain("ground")).spot(Spot::new(beside, 1.0, 0.0)));
}

/// What the lines stand for; what fails says so in its node.
fn key(board: &mut Board, view: &Chain, y: f64) {
    let broken = |k: &Known| matches!(k, Known::Fails | Known::Outside);
    let there = |k: &Known| view.links.iter().flat_map(|l| &l.branches).any(|b| b.known == *k);
    let known: Vec<Known> = Known::ALL.into_iter().filter(|k| !broken(k) || there(k)).collect();
    let step = (NAMES + NODES) / known.len() as f64;
    for (n, known) in known.into_iter().enumerate() {
        let from = Point::new(n as f64 * step, y);
        let to = from + Vec2::new(8.0, 0.0);
        limb(board, known, from, to);
        board.note(Note::new(Role::Note, to, Text::plain(known.words())).spot(Spot::new(
            to + Vec2::new(1.5, 0.0),
            1.0,
            0.0,
        )));
    }
}

fn alt(view: &Chain) -> String {
    let branch = |b: &Branch| {
        let of = if b.of.is_empty() { String::new() } else { format!("{} ", b.of) };
        let beside = if b.beside.is_empty() { String::new() } else { format!(" ({})", b.beside) };
        format!("{of}{}{beside}", b.known.words())
    };
    let links: Vec<String> = view
        .links
        .iter()
        .map(|l| format!("{}: {}", l.name, l.branches.iter().map(branch).collect::<Vec<_>>().join("; ")))
        .collect();
    format!("The links from the wind to the ground, in order. {}.", links.join(". "))
}
