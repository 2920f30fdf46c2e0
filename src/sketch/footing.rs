//! A footing along its return: what stands on it, where the resultant is, how the ground is pressed.

use kurbo::{Point, Rect, Vec2};

use super::board::{Board, Words, polygon};
use super::dimension::{self, mm};
use super::drawing::{Drawing, Role, Style};
use super::load;
use super::note::{Note, Spot};
use super::pen::{Ink, Pen};
use super::scale::{Frame, Scale, fit};
use super::text::Text;
use super::view::{Action, Ruler, Side};

/// What the drawing of a footing shows. The junction end is on the left.
#[derive(Clone, Debug)]
pub struct FootingSketch {
    /// Mark of the footing: `F1`.
    pub mark: String,
    /// Mark of the return.
    pub of: String,
    /// Length of the return, mm.
    pub length: f64,
    /// How far the footing counts beyond the junction end, mm.
    pub beyond_junction: f64,
    /// Beyond the free end, mm.
    pub beyond_free_end: f64,
    /// Thickness of the footing, mm.
    pub thickness: f64,
    /// What it is: `450 mm wide, seen`.
    pub words: String,
    /// Place of the resultant from the middle of the footing, positive towards the free end, mm.
    pub resultant: f64,
    /// The resultant.
    pub force: Action,
    /// Pressure after the removal; none where nothing bears.
    pub after: Option<Pressure>,
    /// Pressure before the removal: its share of the largest after it, and its value.
    pub before: Option<(f64, Action)>,
    /// The case shown.
    pub case: String,
}

/// A pressure along the footing.
#[derive(Clone, Debug)]
pub struct Pressure {
    /// Length that presses, mm.
    pub pressed: f64,
    /// Whether the free end is pressed harder.
    pub free: bool,
    /// Value at the edge that is pressed harder.
    pub at_edge: Action,
    /// Share of it at the other end of the pressed length.
    pub rest: f64,
    /// Value there, where it is not nil.
    pub at_rest: Option<Action>,
}

/// Paper distances, mm: wall shown above the footing, from the underside to the diagram, its depth.
const WALL: f64 = 17.0;
const GAP: f64 = 5.0;
const DIAGRAM: f64 = 15.0;

/// Draws a footing.
pub fn footing_sketch(view: &FootingSketch, frame: Frame) -> Drawing {
    fit(frame, 10.0, |scale| draw(view, scale))
}

/// Places on the paper that several parts need.
struct Places<'a> {
    view: &'a FootingSketch,
    /// Ends of the return.
    wall: (f64, f64),
    /// Ends of the footing.
    ends: (f64, f64),
    /// Head of the footing and head of what is shown of the wall.
    head: f64,
    top: f64,
    ruler: Ruler,
}

fn draw(view: &FootingSketch, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let ruler = Ruler::new(scale, Side::Left);
    let x = |x| ruler.at(x, 0.0).x;
    let head = ruler.at(0.0, view.thickness).y;
    let p = Places {
        view,
        wall: (x(0.0), x(view.length)),
        ends: (x(-view.beyond_junction), x(view.length + view.beyond_free_end)),
        head,
        top: head - WALL,
        ruler,
    };
    p.wall(&mut board);
    p.concrete(&mut board);
    p.resultant(&mut board);
    let low = p.diagram(&mut board);
    p.dimensions(&mut board, low);
    board.finish(Words {
        name: format!("{}-footing", view.mark),
        caption: format!("{} along {}; {}{}", view.mark, view.of, view.case, key(view)),
        scale: scale.text(),
        alt: alt(view),
    })
}

fn key(view: &FootingSketch) -> &'static str {
    match (&view.after, &view.before) {
        (Some(_), Some(_)) => "; pressure on the ground after the removal (grey) and before it (dashed)",
        (Some(_), None) => "; pressure on the ground after the removal",
        _ => "",
    }
}

impl Places<'_> {
    fn wall(&self, board: &mut Board) {
        let (a, b) = self.wall;
        board.line(Pen::Outline, Point::new(a, self.top), Point::new(a, self.head));
        board.line(Pen::Outline, Point::new(b, self.top), Point::new(b, self.head));
        let over = Vec2::new(1.5, 0.0);
        load::break_line(board, Pen::Beyond, Point::new(a, self.top) - over, Point::new(b, self.top) + over);
        let mut note = Note::new(Role::Mark, Point::new(a, self.top), Text::mark(&self.view.of)).rank(1);
        for across in [0.2, 0.8, 0.5, 0.1, 0.9, 0.35, 0.65] {
            for down in [0.4, 0.7] {
                let at = Point::new(a + across * (b - a), self.top + down * WALL);
                note = note.spot(Spot::new(at, 0.0, 0.0));
            }
        }
        board.note(note);
        for (end, words, out) in [(a, "junction", -1.0), (b, "free end", 1.0)] {
            let mut note = Note::new(Role::Note, Point::new(end, self.top + 5.0), Text::plain(words));
            for down in [5.0, 9.0, 13.0] {
                note = note.spot(Spot::new((end + out * 1.5, self.top + down), out, 0.0));
            }
            board.note(note);
        }
    }

    fn concrete(&self, board: &mut Board) {
        let (a, b) = self.ends;
        let area = Rect::new(a, self.head, b, 0.0);
        board.rect(Pen::Outline, area);
        load::ground(board, Point::new(a, 0.0), Point::new(b, 0.0), Vec2::new(0.0, 1.0));
        let words = Text::mark(&self.view.mark).and(&format!("  {}", self.view.words), Style::Plain);
        let mut note = Note::new(Role::Mark, area.center(), words);
        for across in [0.5, 0.3, 0.7] {
            note = note.spot(Spot::new((a + across * (b - a), area.center().y), 0.0, 0.0));
        }
        note.target = Point::new(b, area.center().y);
        note = note.spot(Spot::new((b + 1.5, area.center().y), 1.0, 0.0));
        for y in [area.center().y, self.head - 1.0, self.head + 2.0, self.head - 4.5, -0.5] {
            note = note.spot(Spot::new((b + 4.0, y), 1.0, 0.0).led());
        }
        board.note(note);
    }

    fn resultant(&self, board: &mut Board) {
        let view = self.view;
        let middle = f64::midpoint(self.ends.0, self.ends.1);
        if view.after.is_none() {
            let at = Point::new(middle, self.top - 3.0);
            let words = Text::plain("the resultant leaves the footing: nothing bears");
            board.note(Note::new(Role::Note, at, words).spot(Spot::new(at, 0.0, -1.0)).spot(Spot::new(
                at - Vec2::new(0.0, 4.0),
                0.0,
                -1.0,
            )));
            return;
        }
        let place = middle + self.ruler.scale.paper(view.resultant);
        let row = self.top - 5.0;
        board.line(Pen::Axis, Point::new(middle, row - 1.5), Point::new(middle, 1.2));
        let e = view.resultant.abs();
        if e > 0.5 {
            board.line(Pen::Axis, Point::new(place, row - 1.5), Point::new(place, 1.2));
            dimension::across(board, (middle, place), row, row, Text::value("e_F", &mm(e)));
        }
        let tip = Point::new(place, row - 6.0);
        let tail = tip - Vec2::new(0.0, 9.0);
        load::arrow(board, tail, tip);
        let way = if view.resultant < 0.0 { -1.0 } else { 1.0 };
        let mut note = Note::new(Role::Load, tail, view.force.text());
        for across in [way, -way] {
            for down in [3.0, 6.0, 1.0] {
                note = note.spot(Spot::new((place + across * 1.8, tail.y + down), across, 0.0));
            }
        }
        board.note(note);
    }

    /// The pressures; yields the level below everything drawn.
    fn diagram(&self, board: &mut Board) -> f64 {
        let Some(after) = &self.view.after else { return GAP };
        let share = self.view.before.as_ref().map_or(0.0, |(share, _)| *share);
        let deep = DIAGRAM / share.max(1.0);
        let (a, b) = self.ends;
        let (edge, out) = if after.free { (b, 1.0) } else { (a, -1.0) };
        let other = edge - out * self.ruler.scale.paper(after.pressed);
        let ring = [
            Point::new(edge, GAP),
            Point::new(edge, GAP + deep),
            Point::new(other, GAP + deep * after.rest),
            Point::new(other, GAP),
        ];
        board.fill(Ink::Stress, polygon(&ring));
        board.stroke(Pen::Diagram, polygon(&ring));
        // Nothing is written on the diagram.
        let cells = ((b - a) / deep).ceil().max(1.0);
        for n in 0..cells as usize {
            let from = a + (b - a) * n as f64 / cells;
            board.reserve(Rect::new(from, GAP, from + (b - a) / cells, GAP + deep));
        }
        board.line(Pen::Beyond, Point::new(a, GAP), Point::new(b, GAP));
        let mut note = Note::new(Role::Load, ring[1], after.at_edge.text()).rank(1);
        for down in [0.75, 0.95, 0.5, 0.3] {
            note = note.spot(Spot::new((edge + out * 1.5, GAP + deep * down), out, 0.0));
        }
        board.note(note);
        if let Some(rest) = &after.at_rest {
            let far = edge - out * (b - a);
            let mut note = Note::new(Role::Load, ring[2], rest.text()).rank(1);
            for down in [0.5, 0.1, 0.8, 1.1, -0.2] {
                let y = GAP + deep * after.rest * down;
                note = note.spot(Spot::new((far - out * 1.5, y), -out, 0.0));
            }
            board.note(note);
        }
        let low = GAP + deep * share.max(1.0);
        if let Some((_, before)) = &self.view.before {
            let y = GAP + deep * share;
            let ring = [Point::new(a, GAP), Point::new(a, y), Point::new(b, y), Point::new(b, GAP)];
            board.polyline(Pen::Removed, &ring);
            let end = edge - out * (b - a);
            let mut note =
                Note::new(Role::Load, Point::new(end + out, y), before.text()).words(&before.words);
            for level in [y, low - 1.0, low + 3.0, y + 4.0, GAP + 2.0, y - 4.0] {
                note = note.spot(Spot::new((end - out * 5.0, level), -out, 0.0).led());
            }
            for level in [low + 3.0, low + 6.0] {
                note = note.spot(Spot::new((edge + out * 5.0, level), out, 0.0).led().cost(2.0));
            }
            board.note(note);
        }
        if after.pressed + 0.5 < self.view.length + self.view.beyond_junction + self.view.beyond_free_end {
            let row = low + 6.0;
            let text = Text::value("L_p", &mm(after.pressed));
            dimension::across(board, (other, edge), row, low, text);
            return row + 2.0;
        }
        low
    }

    fn dimensions(&self, board: &mut Board, low: f64) {
        let v = self.view;
        let mut xs = vec![self.ends.0];
        let mut texts: Vec<Text> = Vec::new();
        for (part, to) in
            [(v.beyond_junction, self.wall.0), (v.length, self.wall.1), (v.beyond_free_end, self.ends.1)]
        {
            if part > 0.05 {
                xs.push(to);
                texts.push(mm(part).into());
            }
        }
        dimension::chain_across(board, &xs, low + 8.0, low + 1.0, &texts);
        let at = self.ends.0 - 9.0;
        dimension::up(board, (0.0, self.head), at, self.ends.0, mm(v.thickness));
    }
}

fn alt(view: &FootingSketch) -> String {
    let mut alt = format!(
        "Footing {} along return {}, which is {} mm long, junction on the left. The footing is {}, {} mm thick",
        view.mark,
        view.of,
        mm(view.length),
        view.words,
        mm(view.thickness)
    );
    for (beyond, end) in [(view.beyond_junction, "junction"), (view.beyond_free_end, "free end")] {
        if beyond > 0.05 {
            alt += &format!(", counted {} mm beyond the {end}", mm(beyond));
        }
    }
    alt += &format!(". Case: {}. ", view.case);
    let Some(after) = &view.after else {
        return alt + "The resultant leaves the footing: nothing bears.";
    };
    let way = if view.resultant < 0.0 { "junction" } else { "free end" };
    alt += &format!(
        "Resultant {}, {} mm from the middle towards the {way}. ",
        view.force.spoken(),
        mm(view.resultant.abs())
    );
    let edge = if after.free { "free end" } else { "junction end" };
    alt += &format!("Pressure after the removal {} at the {edge}", after.at_edge.spoken());
    alt += &match &after.at_rest {
        Some(rest) => format!(" and {} at the other end. ", rest.spoken()),
        None => format!(", falling to nil over {} mm. ", mm(after.pressed)),
    };
    if let Some((_, before)) = &view.before {
        alt += &format!("Pressure before the removal: {}, even along the footing.", before.spoken());
    }
    alt.trim_end().to_owned()
}
