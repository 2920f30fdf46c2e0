//! The building from the side under wind from the left: pressure on its strips, and the force at every level.

use kurbo::{Point, Vec2};

use super::board::{Board, Words};
use super::dimension::{self, mm};
use super::drawing::{Drawing, Role, Style};
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::scale::{Frame, Scale, fit, fit_pair};
use super::text::{Text, capital};
use super::view::Action;

/// What the drawing shows. Heights in mm over the ground.
#[derive(Clone, Debug)]
pub struct WindElevation {
    /// Identifier of the drawing: `forces-x`.
    pub name: String,
    /// The wind in words: `wind along x`.
    pub words: String,
    /// Length of the face that the wind meets, as printed: `8.30 m`.
    pub front: String,
    /// Depth of the house along the wind, mm.
    pub depth: f64,
    /// Outline of the roof over the eaves: shares of the depth and heights.
    pub roof: Vec<(f64, f64)>,
    /// Net overall pressure.
    pub pressure: Action,
    /// Levels, lowest first.
    pub levels: Vec<WindLevel>,
    /// What the foot of the lowest storey takes.
    pub foot: Action,
}

/// A level at which the wind's force acts.
#[derive(Clone, Debug)]
pub struct WindLevel {
    /// Its height.
    pub height: f64,
    /// Foot and head of the strip of face that it collects.
    pub strip: (f64, f64),
    /// The force.
    pub force: Action,
    /// Part of the roof in it; none where there is none.
    pub roof: Option<Action>,
}

/// Depth of the pressure on the paper, mm.
const COMB: f64 = 8.0;
/// From the face to the pressure, and from the pressure to the dimensions, mm.
const OFF: f64 = 1.0;

/// Draws two winds at one scale, in `row` beside each other or each `alone`.
pub fn wind_elevations(views: &[WindElevation; 2], row: Frame, alone: Frame) -> [Drawing; 2] {
    let least = (views[0].depth.max(views[1].depth), 0.0);
    fit_pair((row, alone), least, 50.0, |scale| views.each_ref().map(|view| draw(view, scale)))
}

/// Draws one wind.
pub fn wind_elevation(view: &WindElevation, frame: Frame) -> Drawing {
    fit(frame, 50.0, |scale| draw(view, scale))
}

fn draw(view: &WindElevation, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let at = |x: f64, z: f64| Point::new(scale.paper(x), -scale.paper(z));
    let mut outline = vec![at(0.0, 0.0)];
    outline.extend(view.roof.iter().map(|(share, z)| at(share * view.depth, *z)));
    outline.push(at(view.depth, 0.0));
    board.polyline(Pen::Outline, &outline);
    let over = Vec2::new(6.0, 0.0);
    load::ground(&mut board, at(0.0, 0.0) - over, at(view.depth, 0.0) + over, Vec2::new(0.0, 1.0));
    strips(&mut board, view, &at);
    forces(&mut board, view, &at);
    board.finish(Words {
        name: view.name.clone(),
        caption: format!(
            "{}: net pressure on the strip of each level, and its characteristic force over a front of {}; chain lines: \
             limits of the strips",
            capital(&view.words),
            view.front
        ),
        scale: scale.text(),
        alt: alt(view),
    })
}

/// The pressure on the face, with the heights of the strips.
fn strips(board: &mut Board, view: &WindElevation, at: &impl Fn(f64, f64) -> Point) {
    let off = Vec2::new(-OFF, 0.0);
    let mut places = Vec::new();
    for level in &view.levels {
        let (foot, head) = level.strip;
        load::comb(board, at(0.0, foot) + off, at(0.0, head) + off, Vec2::new(COMB, 0.0));
        if foot > 1.0 {
            board.line(Pen::Axis, at(0.0, foot), at(view.depth, foot));
        }
        if places.is_empty() {
            places.push(foot);
        }
        places.push(head);
    }
    let ys: Vec<f64> = places.iter().map(|z| at(0.0, *z).y).collect();
    let texts: Vec<Text> = places.windows(2).map(|p| mm(p[1] - p[0]).into()).collect();
    dimension::chain_up(board, &ys, -OFF - COMB - 5.0, -OFF - COMB, &texts);
    let head = at(0.0, places.last().copied().unwrap_or(0.0)) + Vec2::new(-OFF - COMB, 0.0);
    let mut note = Note::new(Role::Load, head, view.pressure.text());
    for up in [1.5, 4.5, 8.0] {
        for across in [1.0, 0.0, -1.0] {
            note = note.spot(Spot::new(head + Vec2::new(0.0, -up), across, -1.0).cost(up / 10.0));
        }
    }
    board.note(note);
}

/// The forces at the levels, behind the house, and at its foot.
fn forces(board: &mut Board, view: &WindElevation, at: &impl Fn(f64, f64) -> Point) {
    for level in &view.levels {
        let from = at(view.depth, level.height);
        board.line(Pen::Beyond, at(0.0, level.height), from);
        let tail = from + Vec2::new(1.5, 0.0);
        let tip = tail + Vec2::new(11.0, 0.0);
        load::arrow(board, tail, tip);
        let words = level.force.text();
        let mut note = Note::new(Role::Load, tip, words);
        if let Some(roof) = &level.roof {
            note.lines.push(roof.text().and(&format!(" {}", roof.words), Style::Plain));
        }
        for (across, down, x, y) in [(1.0, 0.0, 1.2, 0.0), (1.0, -1.0, -11.0, -1.4), (1.0, 1.0, -11.0, 1.4)] {
            note = note.spot(Spot::new(tip + Vec2::new(x, y), across, down));
        }
        board.note(note);
    }
    let foot = at(view.depth, 0.0);
    let tip = foot + Vec2::new(1.5, 5.0);
    let tail = tip + Vec2::new(11.0, 0.0);
    load::arrow(board, tail, tip);
    let words = view.foot.text().and(&format!(" {}", view.foot.words), Style::Plain);
    let mut note = Note::new(Role::Load, tail, words);
    for (across, x, down, y) in [(1.0, 1.2, 0.0, 0.0), (0.0, -5.5, 1.0, 1.6)] {
        note = note.spot(Spot::new(tail + Vec2::new(x, y), across, down));
    }
    board.note(note);
}

fn alt(view: &WindElevation) -> String {
    let mut alt = format!(
        "The house from the side, {}, from the left, with {} {} on a front of {}. ",
        view.words, view.pressure.value, view.pressure.words, view.front
    );
    for level in &view.levels {
        alt += &format!(
            "At {} mm over the ground a strip of {} mm gives {} {}",
            mm(level.height),
            mm(level.strip.1 - level.strip.0),
            level.force.symbol,
            level.force.value
        );
        alt += &level
            .roof
            .as_ref()
            .map_or_else(|| ". ".to_owned(), |r| format!(", of it {} {}. ", r.value, r.words));
    }
    alt + &format!("The foot takes {} {}.", view.foot.value, view.foot.words)
}
