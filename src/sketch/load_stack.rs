//! The way of the loads down the line of the wall that comes out: storey on storey, looked at on its face.

use kurbo::{Point, Rect, Vec2};

use super::board::{Board, Words, corners};
use super::dimension::{self, mm};
use super::drawing::{Drawing, Role};
use super::hatch::Material;
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::scale::{Frame, Scale, fit};
use super::text::Text;
use super::text::list;

/// What the drawing shows. Places along the wall and heights in mm, the lowest floor at 0.
#[derive(Clone, Debug)]
pub struct LoadStack {
    /// Which wall: `cross wall`.
    pub title: String,
    /// Storeys, lowest first.
    pub storeys: Vec<StackStorey>,
}

/// One storey of the line.
#[derive(Clone, Debug)]
pub struct StackStorey {
    /// Its name.
    pub name: String,
    /// From its floor to the next.
    pub height: f64,
    /// Walls that stand in it.
    pub walls: Vec<StackWall>,
    /// Stretches taken out.
    pub removed: Vec<(f64, f64)>,
    /// Beams at its head: ends and mark.
    pub beams: Vec<(f64, f64, String)>,
    /// Loads of floors and roofs at its head, dead and imposed: where, and what is written there.
    pub loads: Vec<(f64, f64, String)>,
}

/// A wall of the line.
#[derive(Clone, Debug)]
pub struct StackWall {
    /// Where it begins.
    pub from: f64,
    /// Where it ends.
    pub to: f64,
    /// Its material.
    pub material: Material,
    /// Its mark; may be empty.
    pub mark: String,
    /// Written under its foot where it stands on the ground: `41.5 + 19.7 kN`.
    pub foot: String,
}

/// Height of the arrows of a load, and of the words over them, mm on paper.
const ARROWS: f64 = 6.0;
/// Depth of a beam as drawn, mm on paper.
const BEAM: f64 = 2.0;

/// Draws the way of the loads.
pub fn load_stack(view: &LoadStack, frame: Frame) -> Drawing {
    fit(frame, 20.0, |scale| draw(view, scale))
}

fn draw(view: &LoadStack, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let at = |x: f64, z: f64| Point::new(scale.paper(x), -scale.paper(z));
    let ends = view.storeys.iter().flat_map(|s| s.walls.iter().flat_map(|w| [w.from, w.to]));
    let (left, right) = ends.fold((f64::INFINITY, f64::NEG_INFINITY), |(a, b), x| (a.min(x), b.max(x)));
    let mut base = 0.0;
    let mut levels = vec![0.0];
    // Room over each storey for what it carries: the line is drawn apart there.
    let mut lift = 0.0;
    for (k, storey) in view.storeys.iter().enumerate() {
        let shift = Vec2::new(0.0, -lift);
        let (low, high) = (base, base + storey.height);
        for wall in &storey.walls {
            let ring: Vec<Point> =
                corners(Rect::from_points(at(wall.from, low), at(wall.to, high))).map(|p| p + shift).to_vec();
            board.hatch(wall.material, &ring);
            board.stroke(Pen::Outline, super::board::polygon(&ring));
            if !wall.mark.is_empty() {
                let middle = ring[0].midpoint(ring[2]);
                board.note(
                    Note::new(Role::Mark, middle, Text::mark(&wall.mark))
                        .spot(Spot::new(middle, 0.0, 0.0))
                        .rank(1),
                );
            }
            if k == 0 {
                let foot = at((wall.from + wall.to) / 2.0, low) + shift;
                load::arrow(&mut board, foot, foot + Vec2::new(0.0, ARROWS + 1.0));
                board.note(Note::new(Role::Load, foot, Text::plain(&wall.foot)).spot(Spot::new(
                    foot + Vec2::new(0.0, ARROWS + 2.0),
                    0.0,
                    1.0,
                )));
            }
        }
        for &(from, to) in &storey.removed {
            board.rect(Pen::Removed, Rect::from_points(at(from, low) + shift, at(to, high) + shift));
        }
        for (from, to, mark) in &storey.beams {
            let top = at(*from, high) + shift;
            let foot = at(*to, high) + shift + Vec2::new(0.0, BEAM);
            board.rect(Pen::Cut, Rect::from_points(top, foot));
            let middle = top.midpoint(foot);
            board.note(Note::new(Role::Mark, middle, Text::mark(mark)).spot(Spot::new(
                (middle.x, foot.y + 1.0),
                0.0,
                1.0,
            )));
        }
        let mut above = 0.0;
        for (from, to, words) in &storey.loads {
            let (a, b) = (
                at(*from, high) + shift - Vec2::new(0.0, above),
                at(*to, high) + shift - Vec2::new(0.0, above),
            );
            load::comb(&mut board, a, b, Vec2::new(0.0, ARROWS));
            let over = a.midpoint(b) - Vec2::new(0.0, ARROWS + 1.0);
            board.note(Note::new(Role::Load, over, Text::plain(words)).spot(Spot::new(over, 0.0, -1.0)));
            above += ARROWS + 6.0;
        }
        lift += above;
        let name = at(left, (low + high) / 2.0) + shift - Vec2::new(10.0, 0.0);
        board.note(Note::new(Role::Note, name, Text::plain(&storey.name)).spot(Spot::new(name, -1.0, 0.0)));
        let ys = ((at(0.0, low) + shift).y, (at(0.0, high) + shift).y);
        let inside = at(right, 0.0).x;
        dimension::up(&mut board, ys, inside + 9.0, inside + 2.0, mm(storey.height));
        base = high;
        levels.push(base);
    }
    let (a, b) = (at(left, 0.0) - Vec2::new(3.0, 0.0), at(right, 0.0) + Vec2::new(3.0, 0.0));
    board.line(Pen::Beyond, a, b);
    board.finish(Words {
        name: "load-stack".to_owned(),
        caption: format!(
            "Loads down the line of the {}, dead + imposed, unfactored; dashed: removed; storeys drawn apart where loads \
             come in",
            view.title
        ),
        scale: scale.text(),
        alt: alt(view),
    })
}

fn alt(view: &LoadStack) -> String {
    let mut alt = format!("Elevation along the line of the {}, from the ground up. ", view.title);
    for storey in &view.storeys {
        let walls: Vec<String> = storey
            .walls
            .iter()
            .map(|w| {
                let foot =
                    if w.foot.is_empty() { String::new() } else { format!(", {} at its foot", w.foot) };
                format!(
                    "{} {} mm long{foot}",
                    if w.mark.is_empty() { "wall" } else { &w.mark },
                    mm(w.to - w.from)
                )
            })
            .collect();
        alt += &format!("Storey {}, {} mm high: {}. ", storey.name, mm(storey.height), list(&walls));
        for (_, _, words) in &storey.loads {
            alt += &format!("Load at its head: {words}. ");
        }
        for (from, to, mark) in &storey.beams {
            alt += &format!("Beam {mark}, {} mm long. ", mm(to - from));
        }
    }
    alt.trim_end().to_owned()
}
