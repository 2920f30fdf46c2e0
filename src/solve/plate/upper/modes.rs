//! The ways in which lines can move, and the conditions at nodes that make them fit together.

use super::lines::{Kind, Line};
use super::nodes::Grid;
use super::work::Loads;
use std::collections::BTreeMap;

/// One way in which a line can move, with lengths over the longer side of the panel.
pub struct Mode {
    /// The line's place in the list.
    pub line: usize,
    /// Deflection at the first node and slopes along x and y, the right side less the left.
    pub step: [f64; 3],
    /// Energy for one unit, in the unit of the programme.
    pub cost: f64,
    /// Work of the pressure that counts as 1, for one unit.
    pub work: f64,
    /// Which closing conditions of nodes it enters, and by how much.
    pub closing: Vec<(usize, f64)>,
}

/// What brings the numbers near 1.
pub struct Scale {
    /// The longer side, mm.
    pub size: f64,
    /// A moment per length, N.
    pub moment: f64,
}

/// A square on four simple edges carries this many times its moment over the square of its side.
const SQUARE: f64 = 24.0;

impl Scale {
    /// The pressure that counts as 1, N/mm2.
    pub fn pressure(&self) -> f64 {
        SQUARE * self.moment / self.size.powi(2)
    }
}

/// The largest moment per length of any line, N; 1 for a wall without strength.
pub fn strength(grid: &Grid, lines: &[Line]) -> f64 {
    let strongest = lines.iter().map(|line| line.cost / length(grid, line)).fold(0.0, f64::max);
    if strongest > 0.0 { strongest } else { 1.0 }
}

fn length(grid: &Grid, line: &Line) -> f64 {
    let (p, q) = (grid.points[line.a], grid.points[line.b]);
    (q.0 - p.0).hypot(q.1 - p.1)
}

/// The closing conditions of a node: the slopes along x and y, and the deflection.
pub type Conditions = [Option<usize>; 3];

/// The numbers of the closing conditions of each node, and how many there are in all.
///
/// The slopes close at every node. Lines that only turn have no step at their ends, so the deflection needs to
/// close at nodes of free edges alone. Each piece of the panel has three conditions that follow from the others,
/// since every line leaves one node and enters another. Left in, they cost the solver its last digits. They are
/// the slopes at the first node and the slope along x at the last one, which lies further to the right.
pub fn number(grid: &Grid, lines: &[Line]) -> (Vec<Conditions>, usize) {
    let mut wanted = vec![[true, true, false]; grid.points.len()];
    for line in lines.iter().filter(|line| line.kind == Kind::Free) {
        wanted[line.a][2] = true;
        wanted[line.b][2] = true;
    }
    for (first, last) in pieces(grid, lines) {
        wanted[first] = [false, false, wanted[first][2]];
        wanted[last][0] = false;
    }
    let mut next = 0;
    let mut count = |wanted: bool| {
        wanted.then(|| {
            next += 1;
            next - 1
        })
    };
    let conditions = wanted.into_iter().map(|node| node.map(&mut count)).collect();
    (conditions, next)
}

/// The first and the last node of each piece of the panel that lines hold together.
fn pieces(grid: &Grid, lines: &[Line]) -> Vec<(usize, usize)> {
    // Every node points to an earlier one of its piece, the first to itself.
    let mut earlier = (0..grid.points.len()).collect::<Vec<_>>();
    for line in lines {
        let (a, b) = (first(&earlier, line.a), first(&earlier, line.b));
        earlier[a.max(b)] = a.min(b);
    }
    let mut pieces = BTreeMap::new();
    for node in 0..grid.points.len() {
        pieces.insert(first(&earlier, node), node);
    }
    pieces.into_iter().collect()
}

fn first(earlier: &[usize], mut node: usize) -> usize {
    while earlier[node] != node {
        node = earlier[node];
    }
    node
}

/// The ways in which a line can move.
pub fn modes(
    grid: &Grid,
    nodes: &[Conditions],
    loads: &Loads,
    scale: &Scale,
    (number, line): (usize, &Line),
    joint: f64,
) -> Vec<Mode> {
    let (p, q) = (grid.points[line.a], grid.points[line.b]);
    let along = [(q.0 - p.0) / scale.size, (q.1 - p.1) / scale.size];
    let span = along[0].hypot(along[1]);
    let below = loads.below(p, q);
    let below = [below[0] / scale.size.powi(2), below[1] / scale.size.powi(3), below[2] / scale.size.powi(3)];
    let price = if line.kind == Kind::Crack { 1.0 + joint / (span * scale.size) } else { 1.0 };
    let cost = line.cost * price / (scale.moment * scale.size);
    let steps = match line.kind {
        // Turning about the line itself: the slope is across it. Sagging is positive.
        Kind::Crack | Kind::Hinge => vec![[0.0, -along[1] / span, along[0] / span]],
        Kind::Free => vec![[1.0, 0.0, 0.0], [0.0, 1.0, 0.0], [0.0, 0.0, 1.0]],
    };
    let mode = |step: [f64; 3]| {
        let end = step[0] + step[1] * along[0] + step[2] * along[1];
        // Around a node the way crosses outgoing and incoming lines in opposite senses.
        let mut closing = Vec::with_capacity(6);
        for (node, sign, deflection) in [(line.a, -1.0, step[0]), (line.b, 1.0, end)] {
            for (condition, amount) in nodes[node].into_iter().zip([step[1], step[2], deflection]) {
                closing.extend(condition.map(|number| (number, sign * amount)));
            }
        }
        closing.retain(|entry| entry.1.abs() > 1e-12);
        let work = SQUARE * step.iter().zip(below).map(|(s, b)| s * b).sum::<f64>();
        Mode { line: number, step, cost, work, closing }
    };
    steps.into_iter().map(mode).collect()
}
