//! A beam's end on the head of a return, looked at on its face: padstone, spread at 60°, lengths.

use kurbo::{Point, Rect, Vec2};

use super::board::{Board, Words, corners, polygon};
use super::dimension::{self, ROW, mm};
use super::drawing::{Drawing, Role};
use super::hatch::Material;
use super::load;
use super::note::{Note, Spot};
use super::pen::{Ink, Pen};
use super::scale::{Frame, Scale, fit};
use super::text::Text;
use super::view::{Action, Ruler, Side};

/// What the elevation of a bearing shows. The junction end is on the left, the beam comes from the right.
#[derive(Clone, Debug)]
pub struct BearingElevation {
    /// Mark of the bearing: `B1-R1`.
    pub mark: String,
    /// Mark of the return.
    pub on: String,
    /// Mark of the beam.
    pub beam: String,
    /// Length of the return, mm.
    pub length: f64,
    /// Height of the return, mm.
    pub height: f64,
    /// Underside of the beam above the foot, mm.
    pub level: f64,
    /// Place of the load from the junction end, mm.
    pub place: f64,
    /// Length of the bearing, centred on the load, mm.
    pub bearing: f64,
    /// The padstone.
    pub stone: Option<Stone>,
    /// From the end of the wall to the nearer edge of bearing or padstone, mm.
    pub a_1: f64,
    /// Length pressed at the top of the masonry, centred on the load, mm.
    pub pressed: f64,
    /// Spread at mid-height below: from, to, mm.
    pub spread: (f64, f64),
    /// The design load.
    pub force: Action,
}

/// A padstone under a beam.
#[derive(Clone, Debug)]
pub struct Stone {
    /// Name in the list.
    pub name: String,
    /// Middle from the junction end, mm.
    pub place: f64,
    /// Length, mm.
    pub length: f64,
    /// Height, mm.
    pub height: f64,
}

/// Depth at which the beam is drawn and how far it is shown past the free end; for the picture only.
const BEAM: (f64, f64) = (180.0, 260.0);
/// The wall past mid-height, mm on paper.
const PAST: f64 = 5.0;

/// Draws the elevation of a bearing.
pub fn bearing_elevation(view: &BearingElevation, frame: Frame) -> Drawing {
    fit(frame, 10.0, |scale| draw(view, scale))
}

impl BearingElevation {
    /// Top of the masonry under beam or padstone.
    fn seat(&self) -> f64 {
        self.level - self.stone.as_ref().map_or(0.0, |s| s.height)
    }
}

fn draw(view: &BearingElevation, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let ruler = Ruler::new(scale, Side::Left);
    let h_c = view.seat();
    let low = h_c / 2.0;
    let foot = ruler.by(0.0, low, 0.0, -PAST).y;
    // The spread below the seat, cut at the ends of the wall.
    let half = view.pressed / 2.0;
    let (x0, x1) = (view.place - half, view.place + half);
    let drop = 3.0_f64.sqrt();
    let mut ring = vec![ruler.at(x0, h_c)];
    if x0 - low / drop < 0.0 {
        ring.push(ruler.at(0.0, h_c - x0 * drop));
    }
    ring.extend([ruler.at(view.spread.0, low), ruler.at(view.spread.1, low)]);
    if x1 + low / drop > view.length {
        ring.push(ruler.at(view.length, h_c - (view.length - x1) * drop));
    }
    ring.push(ruler.at(x1, h_c));
    board.fill(Ink::Stress, polygon(&ring));
    board.polyline(Pen::Diagram, &ring);
    wall(&mut board, view, ruler, foot);
    beam(&mut board, view, ruler);
    // Mid-height, along which the spread is measured.
    board.line(Pen::Axis, ruler.by(0.0, low, -3.0, 0.0), ruler.by(view.length, low, 3.0, 0.0));
    let at = ruler.at(view.place, h_c * 0.8);
    let mut note = Note::new(Role::Note, at, Text::plain("60°"));
    // Beside the longer of the two slopes, or in the middle of the grey.
    for share in [0.5, 0.7, 0.3] {
        let beside = |x: f64, room: f64, sign: f64| {
            let run = room.min(low / drop) * share;
            Spot::new(ruler.by(x - sign * run, h_c - run * drop, sign * 2.0, -1.0), sign, 1.0)
        };
        let (left, right) = (beside(x0, x0, 1.0), beside(x1, view.length - x1, -1.0));
        note = if x0 >= view.length - x1 { note.spot(left).spot(right) } else { note.spot(right).spot(left) };
    }
    board.note(note.spot(Spot::new(at, 0.0, 0.0).cost(0.5)));
    let middle = ruler.at(view.length / 2.0, low);
    let mut note = Note::new(Role::Mark, middle, Text::mark(&view.on));
    for share in [0.55, 0.6, 0.65, 0.7] {
        note = note.spot(Spot::new(ruler.at(view.length / 2.0, share * h_c), 0.0, 0.0));
    }
    board.note(note.rank(1));
    dimensions(&mut board, view, ruler, foot);
    board.finish(Words {
        name: format!("{}-elevation", view.mark),
        caption: format!(
            "{} head of {}, junction end on the left; grey: the load spreading at 60° to mid-height",
            view.mark, view.on
        ),
        scale: scale.text(),
        alt: alt(view),
    })
}

fn wall(board: &mut Board, view: &BearingElevation, ruler: Ruler, foot: f64) {
    let (left, right) = (ruler.at(0.0, view.height), ruler.at(view.length, view.height));
    board.line(Pen::Outline, Point::new(left.x, foot), left);
    board.line(Pen::Outline, left, right);
    board.line(Pen::Outline, right, Point::new(right.x, foot));
    let over = Vec2::new(1.5, 0.0);
    load::break_line(board, Pen::Beyond, Point::new(left.x, foot) - over, Point::new(right.x, foot) + over);
    if let Some(stone) = &view.stone {
        let (a, b) = (stone.place - stone.length / 2.0, stone.place + stone.length / 2.0);
        let area = Rect::from_points(ruler.at(a, view.seat()), ruler.at(b, view.level));
        let ring = corners(area);
        board.fill(Ink::Paper, polygon(&ring));
        board.hatch(Material::Concrete, &ring);
        board.rect(Pen::Cut, area);
        // Within the padstone the load spreads from the bearing.
        for sign in [-1.0, 1.0] {
            let from = view.place + sign * view.bearing / 2.0;
            let to = view.place + sign * view.pressed / 2.0;
            let deep = ((to - from).abs() * 3.0_f64.sqrt()).min(stone.height);
            board.line(Pen::Axis, ruler.at(from, view.level), ruler.at(to, view.level - deep));
        }
        let at = ruler.at(a.max(0.0), view.seat() + stone.height / 2.0);
        board.note(
            Note::new(Role::Note, at, Text::plain("padstone"))
                .words(&stone.name)
                .spot(Spot::new(ruler.by(0.0, view.seat() + stone.height / 2.0, -4.0, 0.0), -1.0, 0.0).led())
                .spot(Spot::new(ruler.by(0.0, view.seat(), -4.0, -2.0), -1.0, 1.0).led()),
        );
    }
}

fn beam(board: &mut Board, view: &BearingElevation, ruler: Ruler) {
    let half = view.bearing / 2.0;
    let (start, end) = (view.place - half, view.length + BEAM.1);
    // The seat is drawn as a heavy line on which the beam stands.
    let (lift, top) = (0.8, view.level + BEAM.0);
    let area = Rect::from_points(ruler.by(start, view.level, 0.0, lift), ruler.at(end, top));
    board.fill(Ink::Paper, polygon(&corners(area)));
    board.line(Pen::Outline, Point::new(area.x0, area.y1), Point::new(area.x0, area.y0));
    board.line(Pen::Outline, Point::new(area.x0, area.y0), Point::new(area.x1, area.y0));
    board.line(Pen::Outline, Point::new(area.x0, area.y1), Point::new(area.x1, area.y1));
    load::break_line(
        board,
        Pen::Beyond,
        Point::new(area.x1, area.y0 - 1.2),
        Point::new(area.x1, area.y1 + 1.2),
    );
    let seat =
        Rect::from_points(ruler.at(start, view.level), ruler.by(view.place + half, view.level, 0.0, lift));
    board.fill(Ink::Arrow, polygon(&corners(seat)));
    board.note(
        Note::new(Role::Mark, Point::new(area.x1 - 4.0, area.center().y), Text::mark(&view.beam))
            .spot(Spot::new((area.x1 - 3.0, area.center().y), -1.0, 0.0))
            .spot(Spot::new((area.x1 + 3.0, area.center().y), 1.0, 0.0)),
    );
    let tip = Point::new(ruler.at(view.place, 0.0).x, area.y0);
    let tail = tip - Vec2::new(0.0, 9.0);
    load::arrow(board, tail, tip);
    board.note(
        Note::new(Role::Load, tail, view.force.text())
            .words(&view.force.words)
            .spot(Spot::new(tail + Vec2::new(1.5, 0.0), 1.0, 1.0))
            .spot(Spot::new(tail + Vec2::new(-1.5, 0.0), -1.0, 1.0))
            .spot(Spot::new(tail - Vec2::new(0.0, 1.0), 0.0, -1.0)),
    );
}

fn dimensions(board: &mut Board, view: &BearingElevation, ruler: Ruler, foot: f64) {
    let x = |full: f64| ruler.at(full, 0.0).x;
    let low = view.seat() / 2.0;
    let (from, to) = view.spread;
    let row = |n: f64| foot + 4.0 + n * (ROW + 1.0);
    let start = foot + 1.5;
    let length = |symbol: &str, full: f64| Text::value(symbol, &mm(full));
    dimension::across(board, (x(from), x(to)), row(2.2), start, length("l_efm", to - from));
    // The nearer end with a_1, the bearing or padstone, and the rest.
    let (a, b) = match &view.stone {
        Some(s) => (s.place - s.length / 2.0, s.place + s.length / 2.0),
        None => (view.place - view.bearing / 2.0, view.place + view.bearing / 2.0),
    };
    let at_free = view.length - b <= a;
    let name = |nearer: bool, full: f64| {
        if nearer { length("a_1", full) } else { Text::plain(&mm(full)) }
    };
    let all = [
        (0.0, a, name(!at_free, a)),
        (a, b, Text::plain(&mm(b - a))),
        (b, view.length, name(at_free, view.length - b)),
    ];
    let pieces: Vec<&(f64, f64, Text)> = all.iter().filter(|(from, to, _)| to - from > 0.05).collect();
    let mut xs = vec![x(pieces[0].0)];
    xs.extend(pieces.iter().map(|p| x(p.1)));
    let texts: Vec<Text> = pieces.iter().map(|p| p.2.clone()).collect();
    dimension::chain_across(board, &xs, row(1.0), start, &texts);
    if view.a_1 < 0.05 {
        // Nothing to measure, which is said beside the end.
        let (end, out) = if at_free { (x(view.length), 1.0) } else { (x(0.0), -1.0) };
        let at = Point::new(end + out * 2.5, row(1.0));
        board.note(
            Note::new(Role::Dimension, at, length("a_1", 0.0))
                .spot(Spot::new(at, out, 0.0))
                .spot(Spot::new(at, out, -1.0))
                .spot(Spot::new((at.x, row(1.6)), out, 0.0)),
        );
    }
    let right = x(view.length);
    let end = x(view.length + BEAM.1);
    let ys = (ruler.at(0.0, low).y, ruler.at(0.0, view.seat()).y);
    let half = Text::symbol("h_c").and(&format!("/2 = {}", mm(low)), super::drawing::Style::Plain);
    dimension::up(board, ys, right + 9.0, right + 3.0, half);
    board.note(
        Note::new(Role::Note, Point::new(end, ys.0), length("h_c", view.seat()))
            .words("above the foot")
            .spot(Spot::new((right + 14.0, ys.1 + 6.0), 1.0, 1.0))
            .spot(Spot::new((right + 14.0, (ys.0 + ys.1) / 2.0), 1.0, 0.0)),
    );
}

fn alt(view: &BearingElevation) -> String {
    let (from, to) = view.spread;
    let mut alt = format!(
        "Elevation of the head of return {}, {} mm long, with the end of beam {}: the bearing is {} mm long, its middle \
         {} mm from the junction end. ",
        view.on,
        mm(view.length),
        view.beam,
        mm(view.bearing),
        mm(view.place),
    );
    let (a, b) = match &view.stone {
        Some(s) => {
            alt += &format!(
                "Under it lies the padstone {}, {} mm long and {} mm high. ",
                s.name,
                mm(s.length),
                mm(s.height)
            );
            (s.place - s.length / 2.0, s.place + s.length / 2.0)
        }
        None => {
            alt += "It bears directly on the masonry. ";
            (view.place - view.bearing / 2.0, view.place + view.bearing / 2.0)
        }
    };
    alt + &format!(
        "From the junction end to it {} mm, it is {} mm long, to the free end {} mm; a1 = {} mm. The masonry below is \
         {} mm high; hc/2 = {} mm down the load spread at 60° stands on lefm = {} mm. Design load {}.",
        mm(a),
        mm(b - a),
        mm(view.length - b),
        mm(view.a_1),
        mm(view.seat()),
        mm(view.seat() / 2.0),
        mm(to - from),
        view.force.spoken()
    )
}
