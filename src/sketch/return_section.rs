//! A plan section through a return: leaves, counted flange, resultant, compressed length, stress.

use kurbo::Rect;

use super::board::{Board, Words, corners};
use super::dimension::{self, mm};
use super::drawing::{Drawing, Role, Style};
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::scale::{Frame, Scale, fit};
use super::text::Text;
use super::view::{Action, Layer, Ruler, Side, hatch_key, layer_words, thickness};

/// What the section of a return shows. Places `x` run from the inner face of the outer wall
/// towards the free end.
#[derive(Clone, Debug)]
pub struct ReturnSection {
    /// Mark of the return.
    pub mark: String,
    /// Length from the inner face of the outer wall to the free end, mm.
    pub length: f64,
    /// Layers of the return, from the lower edge of the drawing upwards.
    pub layers: Vec<Layer>,
    /// Index in `layers` of the leaf that carries the load and is checked; the whole thickness
    /// where there is no such layer.
    pub loaded: usize,
    /// Side on which the outer wall stands.
    pub wall: Side,
    /// Layers of the outer wall, from the inside.
    pub wall_layers: Vec<Layer>,
    /// Whether the junction is bonded; a butt joint is drawn as a line.
    pub bonded: bool,
    /// Flange counted at the junction, centred on the loaded leaf.
    pub flange: Option<Flange>,
    /// Resultant and stress, where the section is checked.
    pub stress: Option<Stress>,
}

/// Counted part of the outer wall's inner leaf.
#[derive(Clone, Copy, Debug)]
pub struct Flange {
    /// Counted width `b_f`, mm.
    pub width: f64,
    /// Thickness `t_f` from the inner face, mm.
    pub thickness: f64,
}

/// The compressed part of the section.
#[derive(Clone, Debug)]
pub struct Stress {
    /// End with the greatest stress.
    pub toe: Toe,
    /// Compressed length `l_c` from the toe, mm.
    pub compressed: f64,
    /// Place from which the eccentricity is measured, mid-length, mm.
    pub middle: f64,
    /// Place of the resultant, mm.
    pub resultant: f64,
    /// Resultant force and combination.
    pub force: Action,
    /// Stress at the toe.
    pub at_toe: Action,
    /// Stress at the other end as a share of the toe's, and its value; none where it lifts.
    pub at_heel: Option<(f64, Action)>,
}

/// Which end of the return is pressed hardest.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Toe {
    /// The end at the outer wall.
    Wall,
    /// The free end.
    Free,
}

/// Draws the section of a return.
pub fn return_section(view: &ReturnSection, frame: Frame) -> Drawing {
    fit(frame, 5.0, |scale| draw(view, scale))
}

/// The section on the paper.
pub(super) struct Section<'a> {
    pub view: &'a ReturnSection,
    pub ruler: Ruler,
    /// Bands of the return's layers: lower and upper edge, mm, loaded leaf centred on 0.
    pub bands: Vec<(f64, f64)>,
    /// How far the outer wall is drawn to each side, mm.
    pub reach: f64,
}

fn draw(view: &ReturnSection, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let section = Section::new(view, scale);
    section.compressed_area(&mut board);
    section.outer_wall(&mut board);
    section.leaves(&mut board);
    section.dimensions(&mut board);
    if let Some(stress) = &view.stress {
        section.resultant(&mut board, stress);
        section.diagram(&mut board, stress);
    }
    let all = [&view.layers[..], &view.wall_layers[..]].concat();
    board.finish(Words {
        name: format!("{}-section", view.mark),
        caption: format!("{} section in plan at the base{}", view.mark, hatch_key(&all)),
        scale: scale.text(),
        alt: alt(view),
    })
}

impl<'a> Section<'a> {
    fn new(view: &'a ReturnSection, scale: Scale) -> Self {
        let mut edges = Vec::new();
        let mut y = 0.0;
        for layer in &view.layers {
            edges.push((y, y + layer.thickness()));
            y += layer.thickness();
        }
        let (low, high) = edges.get(view.loaded).copied().unwrap_or((0.0, y));
        let zero = (low + high) / 2.0;
        let bands: Vec<_> = edges.iter().map(|(a, b)| (a - zero, b - zero)).collect();
        let body = bands.iter().flat_map(|(a, b)| [a.abs(), b.abs()]).fold(0.0, f64::max);
        let flange = view.flange.map_or(0.0, |flange| flange.width / 2.0);
        let reach = body.max(flange) + 6.0 * scale.0;
        Self { view, ruler: Ruler::new(scale, view.wall), bands, reach }
    }

    /// Where the counted section starts: outer face of the flange, or the junction.
    pub fn start(&self) -> f64 {
        -self.view.flange.map_or(0.0, |flange| flange.thickness)
    }

    pub fn area(&self, x: (f64, f64), y: (f64, f64)) -> Rect {
        Rect::from_points(self.ruler.at(x.0, y.0), self.ruler.at(x.1, y.1))
    }

    /// From where to where the section is compressed, mm.
    pub fn pressed(&self, stress: &Stress) -> (f64, f64) {
        match stress.toe {
            Toe::Wall => (self.start(), self.start() + stress.compressed),
            Toe::Free => (self.view.length - stress.compressed, self.view.length),
        }
    }

    fn outer_wall(&self, board: &mut Board) {
        let mut x = 0.0;
        let reach = self.reach;
        let at = |x, y| self.ruler.at(x, y);
        for (index, layer) in self.view.wall_layers.iter().enumerate() {
            let next = x - layer.thickness();
            if let Layer::Leaf { material, .. } = layer {
                board.hatch(*material, &corners(self.area((x, next), (-reach, reach))));
                board.line(Pen::Cut, at(next, -reach), at(next, reach));
                if index == 0 && self.view.bonded {
                    self.inner_face(board);
                } else {
                    board.line(Pen::Cut, at(x, -reach), at(x, reach));
                }
            }
            x = next;
        }
        for y in [-reach, reach] {
            let over = self.ruler.right() * 1.5;
            load::break_line(board, Pen::Beyond, at(x, y) - over, at(0.0, y) + over);
        }
        if let Some(flange) = self.view.flange {
            for y in [-flange.width / 2.0, flange.width / 2.0] {
                board.line(Pen::Axis, at(-flange.thickness, y), at(0.0, y));
            }
        }
    }

    /// The inner face of the outer wall, open where leaves are bonded in.
    fn inner_face(&self, board: &mut Board) {
        let mut y = -self.reach;
        for (layer, (low, high)) in self.view.layers.iter().zip(&self.bands) {
            if let Layer::Leaf { .. } = layer {
                if *low > y {
                    board.line(Pen::Cut, self.ruler.at(0.0, y), self.ruler.at(0.0, *low));
                }
                y = *high;
            }
        }
        board.line(Pen::Cut, self.ruler.at(0.0, y), self.ruler.at(0.0, self.reach));
    }

    fn leaves(&self, board: &mut Board) {
        let l = self.view.length;
        for (layer, (low, high)) in self.view.layers.iter().zip(&self.bands) {
            if let Layer::Leaf { material, .. } = layer {
                board.hatch(*material, &corners(self.area((0.0, l), (*low, *high))));
                let at = |x, y| self.ruler.at(x, y);
                board.polyline(Pen::Cut, &[at(0.0, *low), at(l, *low), at(l, *high), at(0.0, *high)]);
            }
        }
    }

    /// Upper and lower edge of all layers of the return on the paper.
    pub fn edges(&self) -> (f64, f64) {
        let (low, high) = self.whole();
        (self.ruler.at(0.0, high).y, self.ruler.at(0.0, low).y)
    }

    /// Lower and upper edge of all layers of the return, mm.
    pub fn whole(&self) -> (f64, f64) {
        let low = self.bands.first().map_or(0.0, |band| band.0);
        (low, self.bands.last().map_or(0.0, |band| band.1))
    }

    fn dimensions(&self, board: &mut Board) {
        let view = self.view;
        let (top, _) = self.edges();
        let x = |x| self.ruler.at(x, 0.0).x;
        let row = top - if view.stress.is_some() { 16.0 } else { 6.0 };
        dimension::across(board, (x(0.0), x(view.length)), row, top, mm(view.length));
        let ys: Vec<f64> = std::iter::once(self.whole().0)
            .chain(self.bands.iter().map(|band| band.1))
            .map(|y| self.ruler.at(0.0, y).y)
            .collect();
        let texts: Vec<Text> = view.layers.iter().map(|layer| mm(layer.thickness()).into()).collect();
        let free = x(view.length);
        dimension::chain_up(board, &ys, free + self.ruler.hand * 8.0, free, &texts);

        let wall = thickness(&view.wall_layers);
        let crown = self.ruler.at(0.0, self.reach).y;
        let mut xs = vec![x(-wall)];
        let mut texts = Vec::new();
        let mut edge = wall;
        for layer in view.wall_layers.iter().rev() {
            edge -= layer.thickness();
            xs.push(x(-edge));
            texts.push(mm(layer.thickness()).into());
        }
        dimension::chain_across(board, &xs, crown - 7.0, crown - 1.0, &texts);
        if let Some(flange) = view.flange {
            let half = flange.width / 2.0;
            let y = |y| self.ruler.at(0.0, y).y;
            let level = x(-wall) - self.ruler.hand * 8.0;
            dimension::up(board, (y(-half), y(half)), level, x(-wall), mm(flange.width));
            let at = self.ruler.at(-flange.thickness / 2.0, half);
            let text = Text::plain("counted flange ").and("b", Style::Italic).and("f", Style::Sub);
            board.note(Note::new(Role::Note, at, text).spot(
                Spot::new(self.ruler.at(0.0, half) + self.ruler.right() * 5.0, self.ruler.hand, 0.0).led(),
            ));
        }
    }
}

fn alt(view: &ReturnSection) -> String {
    let mut alt = format!(
        "Plan section of return {}, {} mm long: {}. The outer wall is {}; the junction is {}. ",
        view.mark,
        mm(view.length),
        layer_words(&view.layers),
        layer_words(&view.wall_layers),
        if view.bonded { "bonded" } else { "a butt joint" },
    );
    if let Some(flange) = view.flange {
        alt += &format!(
            "A flange {} mm wide and {} mm thick is counted. ",
            mm(flange.width),
            mm(flange.thickness)
        );
    }
    if let Some(stress) = &view.stress {
        alt += &format!(
            "The resultant {} stands {} mm from mid-length, towards the {}. {} mm of the length are compressed, from the {}; stress there {}",
            stress.force.spoken(),
            mm((stress.resultant - stress.middle).abs()),
            if stress.resultant < stress.middle { "outer wall" } else { "free end" },
            mm(stress.compressed),
            if stress.toe == Toe::Wall { "outer wall" } else { "free end" },
            stress.at_toe.spoken(),
        );
        alt += &match &stress.at_heel {
            Some((_, action)) => format!(", at the other end {}.", action.spoken()),
            None => "; the rest lifts and is left out.".to_owned(),
        };
    }
    alt.trim_end().to_owned()
}
