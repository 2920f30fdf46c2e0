//! The walls of the whole building under wind from one side: zones with their pressures, panels with theirs.

use kurbo::{Point, Rect, Vec2};

use super::around::PlanWind;
use super::board::{Board, Words};
use super::drawing::{Drawing, Role, Style};
use super::load;
use super::note::{Note, Spot};
use super::pen::Pen;
use super::plan;
use super::scale::{Frame, Scale, fit_pair};
use super::text::{Text, capital};

/// What the drawing shows. Lengths in mm, x to the right, y up, from the lower left corner of the building.
#[derive(Clone, Debug)]
pub struct WindPlan {
    /// Identifier of the drawing: `wind-x`.
    pub name: String,
    /// The wind in words: `wind along x, onto left`.
    pub words: String,
    /// The whole building.
    pub size: (f64, f64),
    /// Lines between the house and its neighbours: from and to.
    pub between: Vec<((f64, f64), (f64, f64))>,
    /// Where the wind blows to.
    pub wind: PlanWind,
    /// Overall pressure: `q_net`, `0.65 kN/m²`.
    pub overall: (String, String),
    /// Zones of the walls.
    pub zones: Vec<WallZone>,
    /// Panels on the outside.
    pub panels: Vec<WindPanel>,
    /// What else the caption says; may be empty.
    pub remark: String,
}

/// A piece of a side.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Piece {
    /// Outward from the building; one of four.
    pub out: PlanWind,
    /// Ends along the side, mm.
    pub ends: (f64, f64),
}

/// A zone of a wall.
#[derive(Clone, Debug)]
pub struct WallZone {
    /// Where it is.
    pub piece: Piece,
    /// `A`.
    pub name: String,
    /// Whether it presses; else it sucks.
    pub presses: bool,
    /// The pressure outside as a part of the greatest.
    pub part: f64,
    /// As printed: `−1.03`.
    pub value: String,
}

/// A panel.
#[derive(Clone, Debug)]
pub struct WindPanel {
    /// Its mark.
    pub mark: String,
    /// Where it is.
    pub piece: Piece,
    /// Net pressure that it takes: `1.22 kN/m²`.
    pub value: String,
}

/// Paper distances, mm: from the wall to the pressures; greatest depth of a pressure, and the least.
const OFF: f64 = 1.2;
const DEEP: f64 = 9.0;
const SHALLOW: f64 = 4.5;

/// Draws two winds at one scale, in `row` beside each other or each `alone`.
pub fn wind_plans(views: &[WindPlan; 2], row: Frame, alone: Frame) -> [Drawing; 2] {
    fit_pair((row, alone), views[0].size, 50.0, |scale| views.each_ref().map(|view| draw(view, scale)))
}

fn draw(view: &WindPlan, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let at = |p| plan::paper(scale, p);
    let (low, high) = (at((0.0, 0.0)), at(view.size));
    let house = Rect::from_points(low, high);
    board.rect(Pen::Outline, house);
    for (from, to) in &view.between {
        board.line(Pen::Axis, at(*from), at(*to));
    }
    for zone in &view.zones {
        pressure(&mut board, view, zone, scale);
    }
    for panel in &view.panels {
        thick(&mut board, view, panel, scale);
    }
    wind(&mut board, view, house);
    board.finish(Words {
        name: view.name.clone(),
        caption: format!(
            "{}: pressure outside by zone, kN/m², arrows onto the wall where it presses{}{}{}",
            capital(&view.words),
            if view.panels.is_empty() {
                ""
            } else {
                "; thick: the panels with the net pressure that they take"
            },
            if view.between.is_empty() { "" } else { "; chain lines: where the neighbours begin" },
            view.remark
        ),
        scale: scale.text(),
        alt: alt(view),
    })
}

/// Ends of a piece on paper, and the way out.
fn line(view: &WindPlan, piece: Piece, scale: Scale) -> (Point, Point, Vec2) {
    let (from, to) = piece.ends;
    let (a, z) = match piece.out {
        PlanWind::Leftwards => ((0.0, from), (0.0, to)),
        PlanWind::Rightwards => ((view.size.0, from), (view.size.0, to)),
        PlanWind::Downwards => ((from, 0.0), (to, 0.0)),
        PlanWind::Upwards => ((from, view.size.1), (to, view.size.1)),
    };
    (plan::paper(scale, a), plan::paper(scale, z), piece.out.along())
}

/// The arrows of a zone and its words.
fn pressure(board: &mut Board, view: &WindPlan, zone: &WallZone, scale: Scale) {
    let (a, z, out) = line(view, zone.piece, scale);
    let deep = SHALLOW + (DEEP - SHALLOW) * zone.part;
    let (near, far) = (out * OFF, out * (OFF + deep));
    if zone.presses {
        load::comb(board, a + near, z + near, out * -deep);
    } else {
        board.line(Pen::Load, a + near, z + near);
        load::comb(board, a + far, z + far, out * deep);
    }
    let words = Text::mark(&zone.name).and(&format!(" {}", zone.value), Style::Plain);
    let middle = a.midpoint(z);
    let mut note = Note::new(Role::Load, middle + far, words).rank(1);
    if zone.presses {
        // Behind the wall there is room; before it the wind's own arrow stands.
        for along in [0.5, 0.3, 0.7] {
            note = note.spot(Spot::new(a.lerp(z, along) - out * 1.6, -out.x, -out.y));
        }
    }
    for further in [1.2, 5.0, 9.0, 13.0] {
        for along in [0.5, 0.3, 0.7, 0.1, 0.9] {
            let spot = Spot::new(a.lerp(z, along) + far + out * further, out.x, out.y);
            note = note.spot(if further > 2.0 { spot.led().cost(further / 10.0) } else { spot });
        }
    }
    board.note(note);
}

/// A panel as a thick line inside its side.
fn thick(board: &mut Board, view: &WindPlan, panel: &WindPanel, scale: Scale) {
    let (a, z, out) = line(view, panel.piece, scale);
    let inside = out * -0.9;
    board.line(Pen::Cut, a + inside, z + inside);
    let words = Text::mark(&panel.mark).and(&format!(" {}", panel.value), Style::Plain);
    let mut note = Note::new(Role::Mark, a.midpoint(z) + inside, words).rank(1);
    for deeper in [2.2, 5.0, 8.0, 12.0, 16.0] {
        for along in [0.5, 0.25, 0.75, 0.0, 1.0] {
            let spot = Spot::new(a.lerp(z, along) - out * deeper, -out.x, -out.y).cost(deeper / 20.0);
            note = note.spot(if deeper > 3.0 { spot.led() } else { spot });
        }
    }
    board.note(note);
}

/// The wind, over the plan's upper left or beside its lower edge, with the overall pressure.
fn wind(board: &mut Board, view: &WindPlan, house: Rect) {
    let (symbol, value) = &view.overall;
    let clear = OFF + DEEP + 7.0;
    let along = view.wind.along();
    let c = house.center();
    let tip = match view.wind {
        PlanWind::Rightwards => Point::new(house.x0 - clear, c.y),
        PlanWind::Leftwards => Point::new(house.x1 + clear, c.y),
        PlanWind::Upwards => Point::new(c.x, house.y1 + clear),
        PlanWind::Downwards => Point::new(c.x, house.y0 - clear),
    };
    let tail = tip - along * 9.0;
    load::open_arrow(board, tail, tip);
    let side = along.turn_90();
    let mut note = Note::new(Role::Load, tail, Text::value(symbol, value));
    for away in [4.0, -4.0] {
        for back in [4.5, 0.0, 9.0] {
            let at = tail + along * back + side * away;
            // Beside the arrow: across it where it points up or down, over or under it where it points sideways.
            let to = side * f64::signum(away);
            note = note.spot(Spot::new(at, to.x, to.y));
        }
    }
    board.note(note);
}

fn alt(view: &WindPlan) -> String {
    let mut alt = format!("Plan of the whole building, {}; {} on the whole. ", view.words, view.overall.1);
    for zone in &view.zones {
        let acts = if zone.presses { "presses" } else { "sucks" };
        alt += &format!("Zone {} on the {} {acts}: {}. ", zone.name, side(zone.piece.out), zone.value);
    }
    for panel in &view.panels {
        alt += &format!("Panel {} on the {} takes {}. ", panel.mark, side(panel.piece.out), panel.value);
    }
    alt.trim_end().to_owned()
}

/// The side that faces a way.
fn side(out: PlanWind) -> &'static str {
    match out {
        PlanWind::Rightwards => "right",
        PlanWind::Leftwards => "left",
        PlanWind::Upwards => "upper side",
        PlanWind::Downwards => "lower side",
    }
}
