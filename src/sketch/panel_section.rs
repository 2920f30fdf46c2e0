//! A vertical section through a panel: leaves, cavity, ties, floors, dpc, wind, precompression.

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
use super::view::{Action, Layer, Ruler, Side, Wind, hatch_key, layer_words, thickness};

/// What the section through a panel shows. The outside is on the left.
#[derive(Clone, Debug)]
pub struct PanelSection {
    /// Mark of the panel.
    pub mark: String,
    /// Height between the supports, mm; the base is at 0.
    pub height: f64,
    /// Layers from the outside to the inside.
    pub layers: Vec<Layer>,
    /// Floors and roofs that meet the wall.
    pub floors: Vec<Floor>,
    /// Level of the damp-proof course, mm.
    pub dpc: Option<f64>,
    /// Vertical spacing at which wall ties are drawn, mm, and how many there are, in words; none where there are no
    /// ties.
    pub ties: Option<(f64, String)>,
    /// Wind pressure with its direction.
    pub wind: Option<(Wind, Action)>,
    /// Load on top of a leaf: its index in `layers`, and the value.
    pub precompression: Option<(usize, Action)>,
}

/// A floor or roof that meets the wall from the inside.
#[derive(Clone, Debug)]
pub struct Floor {
    /// Level of its upper face, mm.
    pub level: f64,
    /// Depth, mm.
    pub depth: f64,
    /// Whether it is concrete, which is hatched; timber is shown in outline.
    pub concrete: bool,
    /// What it is and how it is held: `timber floor, strapped`.
    pub words: String,
}

/// Paper distances, mm: the wall past the highest and lowest level, the length of floor shown.
const PAST: f64 = 6.0;
const FLOOR: f64 = 20.0;

/// Draws the section through a panel.
pub fn panel_section(view: &PanelSection, frame: Frame) -> Drawing {
    fit(frame, 10.0, |scale| draw(view, scale))
}

fn draw(view: &PanelSection, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let ruler = Ruler::new(scale, Side::Left);
    let reach = floor_reach(view);
    let tops = view.floors.iter().map(|floor| floor.level);
    let bottoms = view.floors.iter().map(|floor| floor.level - floor.depth);
    let high = tops.fold(view.height, f64::max);
    let low = bottoms.chain(view.dpc).fold(0.0, f64::min);
    leaves(&mut board, view, ruler, (low, high));
    floors(&mut board, view, ruler);
    ties(&mut board, view, ruler);
    dpc(&mut board, view, ruler);
    actions(&mut board, view, ruler, high);

    let foot = ruler.by(0.0, low, 0.0, -PAST).y;
    let mut x = 0.0;
    let mut xs = vec![0.0];
    for layer in &view.layers {
        x += layer.thickness();
        xs.push(ruler.at(x, 0.0).x);
    }
    let texts: Vec<Text> = view.layers.iter().map(|layer| mm(layer.thickness()).into()).collect();
    dimension::chain_across(&mut board, &xs, foot + 8.0, foot + 1.5, &texts);
    let inside = ruler.at(thickness(&view.layers), 0.0).x;
    let ys = (ruler.at(0.0, 0.0).y, ruler.at(0.0, view.height).y);
    dimension::up(&mut board, ys, inside + reach + 8.0, inside + reach, mm(view.height));
    board.finish(Words {
        name: format!("{}-wall-section", view.mark),
        caption: format!("{} vertical section, outside on the left{}", view.mark, hatch_key(&view.layers)),
        scale: scale.text(),
        alt: alt(view),
    })
}

fn leaves(board: &mut Board, view: &PanelSection, ruler: Ruler, (low, high): (f64, f64)) {
    let corner = |x, top: bool| match top {
        true => ruler.by(x, high, 0.0, PAST),
        false => ruler.by(x, low, 0.0, -PAST),
    };
    let mut x = 0.0;
    for layer in &view.layers {
        let next = x + layer.thickness();
        if let Layer::Leaf { material, .. } = layer {
            let ring = corners(Rect::from_points(corner(x, false), corner(next, true)));
            board.hatch(*material, &ring);
            board.line(Pen::Cut, corner(x, false), corner(x, true));
            board.line(Pen::Cut, corner(next, false), corner(next, true));
        }
        x = next;
    }
    let over = Vec2::new(1.5, 0.0);
    for top in [true, false] {
        load::break_line(board, Pen::Beyond, corner(0.0, top) - over, corner(x, top) + over);
    }
}

fn floors(board: &mut Board, view: &PanelSection, ruler: Ruler) {
    let face = thickness(&view.layers);
    for floor in &view.floors {
        let from = ruler.at(face, floor.level);
        let to = ruler.by(face, floor.level - floor.depth, floor_reach(view), 0.0);
        let area = Rect::from_points(from, to);
        let ring = corners(area);
        let pen = if floor.concrete { Pen::Cut } else { Pen::Outline };
        if floor.concrete {
            board.hatch(Material::Concrete, &ring);
        }
        board.line(pen, ring[0], ring[1]);
        board.line(pen, ring[3], ring[2]);
        let over = Vec2::new(0.0, 1.2);
        load::break_line(board, Pen::Beyond, ring[1] - over, ring[2] + over);
        let below = floor.level <= 0.5 * view.height;
        let (y, down) = if below { (area.y0 - 1.0, -1.0) } else { (area.y1 + 1.0, 1.0) };
        let words = Text::plain(&floor.words);
        board.note(
            Note::new(Role::Note, Point::new(area.x1 - 6.0, area.center().y), words)
                .spot(match floor.concrete {
                    true => Spot::new((area.x0 + 2.0, y), 1.0, down),
                    false => Spot::new((area.x0 + 2.0, area.center().y), 1.0, 0.0),
                })
                .spot(Spot::new((area.x0 + 2.0, y), 1.0, down))
                .spot(Spot::new((area.x0 + 2.0, 2.0 * area.center().y - y), 1.0, -down)),
        );
    }
}

/// Length of floor shown, mm on paper: room for the words on it.
fn floor_reach(view: &PanelSection) -> f64 {
    let words = view.floors.iter().map(|floor| Text::plain(&floor.words).extent(8.0).width + 6.0);
    words.fold(FLOOR, f64::max)
}

fn ties(board: &mut Board, view: &PanelSection, ruler: Ruler) {
    let Some((spacing, words)) = view.ties.as_ref().filter(|ties| ties.0 > 0.0) else {
        return;
    };
    let mut x = 0.0;
    for layer in &view.layers {
        let next = x + layer.thickness();
        if matches!(layer, Layer::Cavity { .. }) {
            let spacing = *spacing;
            let mut y = spacing / 2.0;
            let mut first = None;
            while y < view.height {
                // A tie reaches 50 mm into each leaf.
                board.line(Pen::Outline, ruler.at(x - 50.0, y), ruler.at(next + 50.0, y));
                first.get_or_insert(y);
                y += spacing;
            }
            let Some(first) = first else { return };
            let at = ruler.at(next, first + spacing * ((view.height * 0.6 / spacing).floor()));
            let inside = ruler.at(thickness(&view.layers), 0.0).x;
            board.note(
                Note::new(Role::Note, at, Text::plain(words))
                    .spot(Spot::new((inside + 4.0, at.y), 1.0, 0.0).led()),
            );
        }
        x = next;
    }
}

fn dpc(board: &mut Board, view: &PanelSection, ruler: Ruler) {
    let Some(level) = view.dpc else { return };
    let mut x = 0.0;
    for layer in &view.layers {
        let next = x + layer.thickness();
        if matches!(layer, Layer::Leaf { .. }) {
            board.line(Pen::Support, ruler.by(x, level, -0.8, 0.0), ruler.by(next, level, 0.8, 0.0));
        }
        x = next;
    }
    let at = ruler.by(0.0, level, -0.8, 0.0);
    board.note(
        Note::new(Role::Note, at, Text::plain("dpc"))
            .spot(Spot::new(at - Vec2::new(1.0, 0.0), -1.0, 0.0))
            .spot(Spot::new(at - Vec2::new(1.0, 0.0), -1.0, 1.0))
            .rank(1),
    );
}

fn actions(board: &mut Board, view: &PanelSection, ruler: Ruler, high: f64) {
    if let Some((wind, action)) = &view.wind {
        let (gap, depth) = (1.5, 8.0);
        let toward = *wind == Wind::Toward;
        let inset = if toward { gap } else { gap + depth };
        let push = Vec2::new(if toward { depth } else { -depth }, 0.0);
        let side = |y| ruler.by(0.0, y, -inset, 0.0);
        load::comb(board, side(0.0), side(view.height), push);
        let back = ruler.by(0.0, 0.5 * view.height, -(gap + depth), 0.0);
        let beside = back - Vec2::new(1.5, 0.0);
        let note = Note::new(Role::Load, back, action.text()).words(&action.words);
        let level = Spot::new(beside, -1.0, 0.0);
        // Along the comb where it is long enough: beside it the label takes the width of the sheet.
        let along = action.text().extent(8.0).width < ruler.at(0.0, 0.0).y - ruler.at(0.0, view.height).y;
        board.note(if along { note.spot(Spot::upwards(beside, -1.0, 0.0)) } else { note.spot(level) });
    }
    if let Some((index, action)) = &view.precompression
        && let Some(layer) = view.layers.get(*index)
    {
        let before = thickness(&view.layers[..*index]);
        let middle = before + layer.thickness() / 2.0;
        let tip = ruler.by(middle, high, 0.0, PAST + 2.0);
        let tail = tip - Vec2::new(0.0, 9.0);
        load::arrow(board, tail, tip);
        board.note(Note::new(Role::Load, tail, action.text()).words(&action.words).spot(Spot::new(
            tail + Vec2::new(1.5, 0.0),
            1.0,
            1.0,
        )));
    }
}

fn alt(view: &PanelSection) -> String {
    let mut alt = format!(
        "Vertical section through panel {}, {} mm between its supports, from the outside: {}. ",
        view.mark,
        mm(view.height),
        layer_words(&view.layers)
    );
    if let Some((_, words)) = &view.ties {
        alt += &format!("Wall ties, {words}. ");
    }
    let floors: Vec<String> =
        view.floors.iter().map(|floor| format!("{} at {} mm", floor.words, mm(floor.level))).collect();
    if !floors.is_empty() {
        alt += &format!("Floors: {}. ", list(&floors));
    }
    if let Some(level) = view.dpc {
        alt += &format!("A dpc lies at {} mm. ", mm(level));
    }
    if let Some((wind, action)) = &view.wind {
        let word = if *wind == Wind::Toward { "presses on" } else { "draws at" };
        alt += &format!("The wind {word} the outer face: {}. ", action.spoken());
    }
    if let Some((_, action)) = &view.precompression {
        alt += &format!("Load on the loaded leaf from above: {}.", action.spoken());
    }
    alt.trim_end().to_owned()
}
