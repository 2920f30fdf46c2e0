//! Lines beside the walls of a plan that show from where to where each panel runs.

use kurbo::Point;

use super::board::Board;
use super::drawing::Role;
use super::key_plan::{KeyPlan, PlanMark};
use super::note::{Note, Spot};
use super::pen::Pen;
use super::plan::{self, paper};
use super::scale::Scale;
use super::text::Text;

/// Distance between the lines of panels that run beside each other, mm on paper.
pub const ROW: f64 = 4.4;

/// For each panel, how many rows farther out than the first its line runs, clear of the panels before it.
pub fn rows(panels: &[PlanMark]) -> Vec<usize> {
    let mut rows: Vec<usize> = Vec::new();
    for (n, panel) in panels.iter().enumerate() {
        let taken: Vec<usize> =
            (0..n).filter(|i| run_together(&panels[*i], panel)).map(|i| rows[i]).collect();
        rows.push((0..).find(|row| !taken.contains(row)).unwrap_or(0));
    }
    rows
}

/// Whether two stretches lie on one line and share some of it.
fn run_together(a: &PlanMark, b: &PlanMark) -> bool {
    let (from, to) = (Point::from(a.from), Point::from(a.to));
    let along = (to - from).normalize();
    let off = |p: (f64, f64)| along.cross(Point::from(p) - from).abs();
    let on = |p: (f64, f64)| along.dot(Point::from(p) - from);
    let (start, end) = (on(b.from).min(on(b.to)), on(b.from).max(on(b.to)));
    off(b.from) < 1.0 && off(b.to) < 1.0 && start < (to - from).hypot() - 1.0 && end > 1.0
}

/// Distance of a panel's line from the thickest wall's face, mm on paper.
const STRETCH: f64 = 2.2;

/// The line that shows how far a panel runs, on the side away from the middle of the plan.
pub fn stretch(board: &mut Board, view: &KeyPlan, panel: &PlanMark, row: usize, scale: Scale) {
    let (from, to) = (paper(scale, panel.from), paper(scale, panel.to));
    let along = (to - from).normalize();
    let side = along.turn_90();
    let centre = plan::extent(&view.walls, scale).center();
    let out = if (from.midpoint(to) - centre).dot(side) < 0.0 { -side } else { side };
    let half = view.walls.iter().map(|wall| wall.thickness / 2.0).fold(0.0, f64::max);
    let shift = out * (scale.paper(half) + STRETCH + ROW * row as f64);
    board.line(Pen::Leader, from + shift, to + shift);
    for end in [from, to] {
        board.line(Pen::Leader, end + shift - out, end + shift + out);
    }
    let mut note = Note::new(Role::Mark, from.midpoint(to) + shift, Text::mark(&panel.mark));
    for share in [0.5, 0.4, 0.6, 0.3, 0.7] {
        for sign in [1.0, -1.0] {
            let at = from.lerp(to, share) + shift + out * sign;
            note = note.spot(Spot::new(at, (out.x * sign).round(), (out.y * sign).round()));
        }
    }
    board.note(note.rank(1));
}
