//! A return looked at on its face: where it stands, what holds it, what acts on it.

use kurbo::Vec2;

use super::board::{Board, Words};
use super::dimension::{self, mm};
use super::drawing::{Drawing, Role, Style};
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::return_loads::{sideways, vertical_loads};
use super::scale::{Frame, Scale, fit};
use super::text::Text;
use super::text::list;
use super::view::{Action, Layer, Ruler, Side, Wind, hatch_key, layer_words, thickness};

/// What the elevation of a return shows.
#[derive(Clone, Debug)]
pub struct ReturnElevation {
    /// Mark of the return: `R1`.
    pub mark: String,
    /// Length from the inner face of the outer wall to the free end, mm.
    pub length: f64,
    /// Height from base to head, mm.
    pub height: f64,
    /// What the return is built of, for the label: `100 mm block`.
    pub words: String,
    /// Side on which the outer wall stands.
    pub wall: Side,
    /// Layers of the outer wall, from the inside.
    pub wall_layers: Vec<Layer>,
    /// The junction: `bonded`, `butted, not counted`.
    pub junction: String,
    /// Names of what holds the head (`W3, W4`); none where the head is free.
    pub prop: Option<String>,
    /// Whether a damp-proof course crosses the base.
    pub dpc: bool,
    /// Length of the removed wall beyond the free end, mm; none where nothing was removed there.
    pub removed: Option<f64>,
    /// Vertical loads on the head.
    pub loads: Vec<PlacedLoad>,
    /// Horizontal forces at head level (head force, tilt), the direction is the wind's.
    pub head_forces: Vec<Action>,
    /// Moment at the head, turning as the head forces would.
    pub head_moment: Option<Action>,
    /// Line load over the height, where wind comes sideways.
    pub line_load: Option<Action>,
    /// Front whose wind this return takes, mm.
    pub tributary: Option<f64>,
    /// The floor brings all of its wind to the head: none blows on the wall that it meets.
    pub through_floor: bool,
    /// Direction of the wind.
    pub wind: Wind,
}

/// A vertical load at its place.
#[derive(Clone, Debug)]
pub struct PlacedLoad {
    /// Distance from the inner face of the outer wall, mm.
    pub x: f64,
    /// Its value.
    pub action: Action,
}

/// The outer wall past head and base, mm on paper.
pub(super) const WALL_PAST: f64 = 5.0;
/// Longest piece of removed wall that is drawn, mm on paper.
const REMOVED_SHOWN: f64 = 27.0;

/// Draws the elevation of a return.
pub fn return_elevation(view: &ReturnElevation, frame: Frame) -> Drawing {
    fit(frame, 10.0, |scale| draw(view, scale))
}

fn draw(view: &ReturnElevation, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let ruler = Ruler::new(scale, view.wall);
    outer_wall(&mut board, view, ruler);
    removed_wall(&mut board, view, ruler);
    body(&mut board, view, ruler);
    base_and_head(&mut board, view, ruler);
    vertical_loads(&mut board, view, ruler);
    sideways(&mut board, view, ruler);
    dimensions(&mut board, view, ruler);
    board.finish(Words {
        name: format!("{}-elevation", view.mark),
        caption: format!("{} elevation, looking at its face{}", view.mark, hatch_key(&view.wall_layers)),
        scale: scale.text(),
        alt: alt(view),
    })
}

fn outer_wall(board: &mut Board, view: &ReturnElevation, ruler: Ruler) {
    let mut x = 0.0;
    let corner = |x, top: bool| match top {
        true => ruler.by(x, view.height, 0.0, WALL_PAST),
        false => ruler.by(x, 0.0, 0.0, -WALL_PAST),
    };
    for layer in &view.wall_layers {
        let next = x - layer.thickness();
        if let Layer::Leaf { material, .. } = layer {
            let ring = [corner(x, false), corner(x, true), corner(next, true), corner(next, false)];
            board.hatch(*material, &ring);
            board.line(Pen::Cut, corner(x, false), corner(x, true));
            board.line(Pen::Cut, corner(next, false), corner(next, true));
        }
        x = next;
    }
    for top in [true, false] {
        let over = ruler.right() * 1.5;
        load::break_line(board, Pen::Beyond, corner(x, top) - over, corner(0.0, top) + over);
    }
}

fn removed_wall(board: &mut Board, view: &ReturnElevation, ruler: Ruler) {
    let Some(removed) = view.removed else { return };
    let shown = removed.min(ruler.scale.0 * REMOVED_SHOWN);
    let (near, far) = (view.length, view.length + shown);
    let corner = |x, y| ruler.at(x, y);
    board.polyline(Pen::Removed, &[corner(near, view.height), corner(far, view.height)]);
    board.polyline(Pen::Removed, &[corner(near, 0.0), corner(far, 0.0)]);
    if shown < removed {
        let over = Vec2::new(0.0, 1.5);
        let (from, to) = (corner(far, 0.0) + over, corner(far, view.height) - over);
        load::break_line(board, Pen::Beyond, from, to);
    } else {
        board.line(Pen::Removed, corner(far, 0.0), corner(far, view.height));
    }
    let middle = corner((near + far) / 2.0, view.height / 2.0);
    board.note(
        Note::new(Role::Note, middle, Text::plain("removed"))
            .spot(Spot::new(middle, 0.0, 0.0))
            .spot(Spot::upwards(middle, 0.0, 0.0))
            .spot(Spot::upwards(middle + Vec2::new(0.0, 12.0), 0.0, 0.0)),
    );
}

fn body(board: &mut Board, view: &ReturnElevation, ruler: Ruler) {
    let (l, h) = (view.length, view.height);
    let ring = [ruler.at(0.0, 0.0), ruler.at(l, 0.0), ruler.at(l, h), ruler.at(0.0, h)];
    board.polyline(Pen::Outline, &[ring[0], ring[1], ring[2], ring[3]]);
    let middle = ruler.at(l / 2.0, 0.42 * h);
    let roomy = Text::plain(&view.words).extent(8.0).width + 2.0 < ruler.scale.paper(l);
    let mut note = Note::new(Role::Mark, middle, Text::mark(&view.mark));
    if roomy {
        note = note.words(&view.words);
    } else if !view.words.is_empty() {
        let line = Text::mark(&view.mark).and(&format!("  {}", view.words), Style::Plain);
        note.lines = vec![line];
    }
    for share in [0.42, 0.35, 0.5, 0.25, 0.15, 0.6, 0.7] {
        let at = ruler.at(l / 2.0, share * h);
        note = note.spot(if roomy { Spot::new(at, 0.0, 0.0) } else { Spot::upwards(at, 0.0, 0.0) });
    }
    board.note(note.rank(1));

    // The joint is named on the face, or past the free end of a short return.
    let mut note =
        Note::new(Role::Note, ruler.at(0.0, 0.2 * h), Text::plain(&format!("junction {}", view.junction)));
    for share in [0.2, 0.12, 0.28, 0.06] {
        note = note.spot(Spot::new(ruler.by(0.0, share * h, 4.0, 0.0), ruler.hand, 0.0).led());
    }
    for share in [0.12, 0.2, 0.28] {
        note = note.spot(Spot::new(ruler.by(l, share * h, 3.0, 0.0), ruler.hand, 0.0).led());
    }
    board.note(note);
}

fn base_and_head(board: &mut Board, view: &ReturnElevation, ruler: Ruler) {
    let (l, h) = (view.length, view.height);
    load::ground(board, ruler.at(0.0, 0.0), ruler.at(l, 0.0), Vec2::new(0.0, 1.0));
    let words = if view.dpc { "dpc at the base" } else { "base bonded, no dpc" };
    let foot = ruler.by(l, 0.0, -0.5, 0.0);
    board.note(
        Note::new(Role::Note, foot, Text::plain(words))
            .spot(Spot::new(ruler.by(l, 0.0, 3.5, -2.2), ruler.hand, 1.0).led()),
    );
    if view.dpc {
        // The course runs through the return and through each leaf of the outer wall.
        let mut x = 0.0;
        for layer in &view.wall_layers {
            let next = x - layer.thickness();
            if matches!(layer, Layer::Leaf { .. }) {
                board.line(Pen::Cut, ruler.at(next, 0.0), ruler.at(x, 0.0));
            }
            x = next;
        }
    }
    let corner = ruler.at(l, h);
    let Some(names) = &view.prop else {
        board.note(
            Note::new(Role::Note, corner, Text::plain("head free"))
                .spot(Spot::new(ruler.by(l, h, 1.2, -1.2), ruler.hand, 1.0))
                .spot(Spot::new(ruler.by(l, h, -1.2, -1.2), -ruler.hand, 1.0)),
        );
        return;
    };
    load::restraint(board, corner, ruler.right());
    let beside = ruler.by(l, h, 7.0, -1.2);
    board.note(
        Note::new(Role::Note, ruler.by(l, h, 5.0, -1.5), Text::plain("head held by"))
            .words(names)
            .spot(Spot::new(beside, ruler.hand, 1.0)),
    );
}

fn dimensions(board: &mut Board, view: &ReturnElevation, ruler: Ruler) {
    let (l, h) = (view.length, view.height);
    let outer = thickness(&view.wall_layers);
    let base = ruler.at(0.0, 0.0).y;
    let xs: Vec<f64> = [-outer, 0.0, l].iter().map(|x| ruler.at(*x, 0.0).x).collect();
    dimension::chain_across(board, &xs, base + 12.0, base + WALL_PAST, &[mm(outer).into(), mm(l).into()]);
    let shown = view.removed.map_or(0.0, |r| r.min(ruler.scale.0 * REMOVED_SHOWN));
    let end = ruler.at(l + shown, 0.0).x;
    let at = end + ruler.hand * if view.removed.is_some() { 8.0 } else { 24.0 };
    dimension::up(board, (ruler.at(0.0, 0.0).y, ruler.at(0.0, h).y), at, end, mm(h));
}

fn alt(view: &ReturnElevation) -> String {
    let side = if view.wall == Side::Left { "left" } else { "right" };
    let mut alt = format!(
        "Elevation of return {}, {}, {} mm long and {} mm high. The outer wall stands on the {side}, {} mm thick ({}); junction {}. ",
        view.mark,
        view.words,
        mm(view.length),
        mm(view.height),
        mm(thickness(&view.wall_layers)),
        layer_words(&view.wall_layers),
        view.junction,
    );
    alt += match view.dpc {
        true => "A dpc lies at the base. ",
        false => "The base is bonded, no dpc. ",
    };
    alt += &match &view.prop {
        Some(names) => format!("The head is held by {names}. "),
        None => "The head is free. ".to_owned(),
    };
    if view.removed.is_some() {
        alt += "The wall beyond the free end is removed. ";
    }
    let mut loads: Vec<&PlacedLoad> = view.loads.iter().collect();
    loads.sort_by(|a, b| a.x.total_cmp(&b.x));
    let mut last = 0.0;
    for load in loads {
        let step = load.x - last;
        alt += &format!("Vertical load {} at {} mm from the outer wall", load.action.spoken(), mm(load.x));
        alt += &if step > 0.5 && last > 0.0 {
            format!(", {} mm from the one before. ", mm(step))
        } else {
            ". ".to_owned()
        };
        if step > 0.5 {
            last = load.x;
        }
    }
    if !view.head_forces.is_empty() {
        let forces: Vec<String> = view.head_forces.iter().map(Action::spoken).collect();
        alt += &format!("Horizontal at the head: {}. ", list(&forces));
    }
    if let Some(moment) = &view.head_moment {
        alt += &format!("Moment at the head: {}. ", moment.spoken());
    }
    if let Some(line_load) = &view.line_load {
        alt += &format!("Along the height: {}. ", line_load.spoken());
    }
    if let Some(front) = view.tributary {
        alt += &format!("It takes the wind from {} mm of front. ", mm(front));
    }
    if view.through_floor {
        return alt + "The floor brings the wind to its head.";
    }
    alt += match view.wind {
        Wind::Toward => "The wind blows onto the outer wall.",
        Wind::Away => "The wind draws at the outer wall.",
    };
    alt
}
