//! A hill, ridge, cliff or escarpment along the wind, with the site on it.

use kurbo::{Point, Rect, Vec2};

use super::board::{Board, Words};
use super::dimension;
use super::drawing::{Drawing, Role};
use super::load;
use super::note::{Note, Spot};
use super::pen::{Ink, Pen};
use super::scale::{Frame, Scale, fit_site};
use super::text::Text;
use super::view::Action;

/// What the drawing shows. Lengths in mm; the wind comes from the left and the crest is the origin.
#[derive(Clone, Debug)]
pub struct GroundProfile {
    /// `hill`.
    pub form: String,
    /// Height of the feature.
    pub height: f64,
    /// Length of the slope upwind.
    pub upwind: f64,
    /// Length of the slope downwind; none where the ground stays up.
    pub downwind: Option<f64>,
    /// From the crest to the site, downwind positive.
    pub site: f64,
    /// Orography factor and location factor, as printed.
    pub factors: [Action; 2],
}

/// Draws the ground at the largest scale that fits.
pub fn ground_profile(view: &GroundProfile, frame: Frame) -> Drawing {
    fit_site(frame, |scale| draw(view, scale))
}

/// Level of the ground, mm over its foot.
fn level(view: &GroundProfile, x: f64) -> f64 {
    let down = |length: f64| (1.0 - x.abs() / length).max(0.0) * view.height;
    if x < 0.0 { down(view.upwind) } else { view.downwind.map_or(view.height, down) }
}

fn draw(view: &GroundProfile, scale: Scale) -> Drawing {
    let mut board = Board::default();
    let at = |x: f64| Point::new(scale.paper(x), -scale.paper(level(view, x)));
    let run = view.upwind + view.downwind.unwrap_or(view.upwind);
    let left = (-view.upwind).min(view.site) - 0.1 * run;
    let right = view.downwind.unwrap_or(0.3 * run).max(view.site) + 0.1 * run;
    let mut places = vec![left, -view.upwind, 0.0];
    places.extend(view.downwind);
    places.push(right);
    for pair in places.windows(2) {
        load::ground(&mut board, at(pair[0]), at(pair[1]), Vec2::new(0.0, 1.0));
    }
    site(&mut board, view, at(view.site));
    let tail = at(left) + Vec2::new(0.0, -9.0);
    load::open_arrow(&mut board, tail, tail + Vec2::new(9.0, 0.0));
    dimensions(&mut board, view, scale, (at(left), at(right)));
    board.finish(Words {
        name: "ground-profile".to_owned(),
        caption: format!(
            "The {} along the wind, lengths in m; slopes drawn straight, house drawn larger than it is",
            view.form
        ),
        scale: scale.text(),
        alt: alt(view),
    })
}

/// The house, and what the ground does to its wind.
fn site(board: &mut Board, view: &GroundProfile, foot: Point) {
    let house = Rect::new(foot.x - 1.2, foot.y - 2.4, foot.x + 1.2, foot.y);
    board.fill(Ink::Arrow, super::board::polygon(&super::board::corners(house)));
    let mut note = Note::new(Role::Mark, Point::new(foot.x, foot.y - 2.4), Text::mark("site"));
    note.lines.extend(view.factors.iter().map(Action::text));
    for up in [4.0, 8.0, 13.0] {
        for across in [0.0, 1.0, -1.0] {
            let at = Point::new(foot.x + across * 3.0, foot.y - 2.4 - up);
            note = note.spot(Spot::new(at, across, -1.0).cost(up / 20.0).led());
        }
    }
    board.note(note);
}

fn dimensions(board: &mut Board, view: &GroundProfile, scale: Scale, (left, right): (Point, Point)) {
    let low = left.y.max(right.y).max(0.0);
    let x = |full: f64| scale.paper(full);
    let row = low + 7.0;
    let mut places = vec![x(-view.upwind), 0.0];
    let mut texts = vec![Text::value("L_u", &metres(view.upwind))];
    if let Some(downwind) = view.downwind {
        places.push(x(downwind));
        texts.push(Text::value("L_d", &metres(downwind)));
    }
    dimension::chain_across(board, &places, row, low, &texts);
    if view.site.abs() >= 500.0 {
        let text = Text::value("X", &metres(view.site));
        dimension::across(board, (x(view.site), 0.0), row + dimension::ROW + 1.5, low, text);
    }
    let edge = right.x + 6.0;
    board.line(Pen::Axis, Point::new(0.0, -x(view.height)), Point::new(edge, -x(view.height)));
    dimension::up(board, (0.0, -x(view.height)), edge, edge, Text::value("H", &metres(view.height)));
}

/// A length in m, to a tenth.
fn metres(full: f64) -> String {
    let tenths = (full / 100.0).round() / 10.0;
    format!("{tenths}").replace('-', "−")
}

fn alt(view: &GroundProfile) -> String {
    let down = view.downwind.map_or_else(
        || "the ground stays up beyond the crest".to_owned(),
        |d| format!("{} m of slope downwind", metres(d)),
    );
    let [c_o, s] = &view.factors;
    format!(
        "A {} of {} m with {} m of slope upwind and {down}; the site {} m from the crest, upwind negative. {} {}, {} {}.",
        view.form,
        metres(view.height),
        metres(view.upwind),
        metres(view.site),
        c_o.words,
        c_o.value,
        s.words,
        s.value
    )
}
