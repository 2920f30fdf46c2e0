//! The actions on a return's elevation: vertical loads at their places, wind from the side.

use kurbo::{Point, Vec2};

use super::board::Board;
use super::dimension::{self, mm};
use super::drawing::{Role, Style};
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::return_elevation::{PlacedLoad, ReturnElevation, WALL_PAST};
use super::text::Text;
use super::view::{Ruler, Wind, thickness};

/// Paper distances, mm: the comb off the wall and its depth, the shortest load arrow and how much
/// longer each further one is.
const COMB: (f64, f64) = (1.2, 8.0);
const LOAD_ARROW: f64 = 8.0;
const LOAD_STEP: f64 = 4.0;

/// Vertical loads with a chain of dimensions, or with their places in words where it is crowded.
pub(super) fn vertical_loads(board: &mut Board, view: &ReturnElevation, ruler: Ruler) {
    let mut loads: Vec<&PlacedLoad> = view.loads.iter().collect();
    loads.sort_by(|a, b| a.x.total_cmp(&b.x));
    let mut places = vec![0.0];
    for load in &loads {
        if load.x - places[places.len() - 1] > 0.5 {
            places.push(load.x);
        }
    }
    let texts: Vec<Text> = places.windows(2).map(|pair| mm(pair[1] - pair[0]).into()).collect();
    let paper: Vec<f64> = places.iter().map(|x| ruler.at(*x, 0.0).x).collect();
    let chained = !texts.is_empty() && dimension::fits(&paper, &texts);
    if chained {
        let head = ruler.at(0.0, view.height).y;
        dimension::chain_across(board, &paper, head + 7.0, head, &texts);
    }

    // Labels stand on the free side of their arrows; an arrow is longer than every arrow that
    // its label passes over.
    let label = |load: &PlacedLoad| {
        let text = load.action.text();
        let mut tail = String::new();
        if !load.action.words.is_empty() {
            tail = format!(", {}", load.action.words);
        }
        if !chained {
            tail.push_str(&format!(", at {}", mm(load.x)));
        }
        text.and(&tail, Style::Plain)
    };
    let mut steps = vec![0_usize; loads.len()];
    for index in (0..loads.len()).rev() {
        let from = ruler.scale.paper(loads[index].x);
        let reach = from + 1.0 + label(loads[index]).extent(8.0).width + 2.0;
        let passed = (index + 1..loads.len()).filter(|j| ruler.scale.paper(loads[*j].x) < reach);
        steps[index] = passed.map(|j| steps[j] + 1).max().unwrap_or(0);
    }
    for (load, step) in loads.iter().zip(steps) {
        let tip = ruler.at(load.x, view.height);
        let tail = tip - Vec2::new(0.0, LOAD_ARROW + LOAD_STEP * step as f64);
        load::arrow(board, tail, tip);
        let beside = tail + Vec2::new(ruler.hand * 1.0, -0.3);
        board.note(
            Note::new(Role::Load, tail, label(load))
                .spot(Spot::new(beside, ruler.hand, 1.0))
                .spot(Spot::new(tail - Vec2::new(0.0, 0.8), 0.0, -1.0))
                .rank(1),
        );
    }
}

/// Wind, line load, head forces and head moment, all on the outer side.
pub(super) fn sideways(board: &mut Board, view: &ReturnElevation, ruler: Ruler) {
    let (h, face) = (view.height, -thickness(&view.wall_layers));
    let toward = view.wind == Wind::Toward;
    let right = ruler.right();
    let mut clear = 2.0;
    if let Some(line_load) = &view.line_load {
        let (gap, depth) = COMB;
        let inset = if toward { gap } else { gap + depth };
        let push = right * if toward { depth } else { -depth };
        let side = |y| ruler.by(face, y, -inset, 0.0);
        load::comb(board, side(0.0), side(h), push);
        clear = gap + depth;
        let back = ruler.by(face, 0.3 * h, -(gap + depth), 0.0);
        let mut note = Note::new(Role::Load, back, line_load.text()).words(&line_load.words);
        if let Some(front) = view.tributary {
            note = note.words(&format!("from {} of front", mm(front)));
        }
        board.note(note.spot(Spot::new(back - right * 1.5, -ruler.hand, 0.0)));
    } else if let Some(front) = view.tributary {
        let at = ruler.by(face, 0.3 * h, -clear, 0.0);
        let text = Text::plain(&format!("takes {} of front", mm(front)));
        board.note(Note::new(Role::Note, at, text).spot(Spot::new(at, -ruler.hand, 0.0)));
    }

    // Forces at head level stand one behind the other on their common line.
    let mut from = ruler.by(face, h, -clear - 0.8, 0.0);
    if view.line_load.is_some() && !view.head_forces.is_empty() {
        board.line(Pen::Dimension, ruler.by(face, h, -0.6, 0.0), from);
    }
    for action in &view.head_forces {
        let length = (action.text().extent(8.0).width + 1.0).max(11.0);
        let out = from - right * length;
        let (tail, tip) = if toward { (out, from) } else { (from, out) };
        load::arrow(board, tail, tip);
        let middle = tail.midpoint(tip);
        board.note(
            Note::new(Role::Load, middle, action.text())
                .spot(Spot::new(middle - Vec2::new(0.0, 1.3), 0.0, -1.0))
                .rank(1),
        );
        if !action.words.is_empty() {
            board.note(Note::new(Role::Note, middle, Text::plain(&action.words)).spot(Spot::new(
                middle + Vec2::new(0.0, 1.3),
                0.0,
                1.0,
            )));
        }
        from = out - right * 2.0;
    }
    head_moment(board, view, ruler, toward);
    if view.through_floor {
        return;
    }

    let reach = ruler.by(face, 0.62 * h, -clear - 5.0, 0.0);
    let out = reach - right * 12.0;
    let (tail, tip) = if toward { (out, reach) } else { (reach, out) };
    load::open_arrow(board, tail, tip);
    let middle = tail.midpoint(tip);
    board.note(Note::new(Role::Note, middle, Text::plain("wind")).spot(Spot::new(
        middle - Vec2::new(0.0, 3.0),
        0.0,
        -1.0,
    )));
}

fn head_moment(board: &mut Board, view: &ReturnElevation, ruler: Ruler, toward: bool) {
    let Some(action) = &view.head_moment else {
        return;
    };
    let radius = 3.5;
    // On the face if the return is wide enough, else over the outer wall.
    let inside = ruler.scale.paper(view.length) > 4.0 * radius;
    let centre: Point = match inside {
        true => ruler.by(view.length / 2.0, view.height, 0.0, -16.0),
        false => ruler.by(-thickness(&view.wall_layers), view.height, -4.0, WALL_PAST + 8.0),
    };
    load::moment(board, centre, radius, toward == (ruler.hand > 0.0));
    let mut note = Note::new(Role::Load, centre, action.text()).words(&action.words);
    for (across, down) in [(1.0, 0.0), (-1.0, 0.0), (0.0, -1.0), (0.0, 1.0)] {
        let off = Vec2::new(across, down) * (radius + 1.5);
        note = note.spot(Spot::new(centre + off, across, down));
    }
    board.note(note);
}
