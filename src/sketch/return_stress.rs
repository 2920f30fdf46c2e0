//! The compressed part of a return's section: shading, resultant, stress diagram.

use kurbo::{Point, Vec2};

use super::board::{Board, corners, polygon};
use super::dimension::{self, mm};
use super::drawing::{Role, Style};
use super::load;
use super::note::{Note, Spot};
use super::pen::{Ink, Pen};
use super::return_section::{Section, Stress, Toe};
use super::text::Text;

/// Height of the stress diagram at the toe, mm on paper.
const DIAGRAM: f64 = 11.0;

impl Section<'_> {
    pub fn compressed_area(&self, board: &mut Board) {
        let Some(stress) = &self.view.stress else {
            return;
        };
        let (from, to) = self.pressed(stress);
        let leaf = self.bands.get(self.view.loaded).copied().unwrap_or(self.whole());
        if to > 0.0 {
            board.fill(Ink::Stress, polygon(&corners(self.area((from.max(0.0), to), leaf))));
        }
        if let Some(flange) = self.view.flange
            && from < 0.0
        {
            let half = flange.width / 2.0;
            let area = self.area((from, to.min(0.0)), (-half, half));
            board.fill(Ink::Stress, polygon(&corners(area)));
        }
    }

    pub fn resultant(&self, board: &mut Board, stress: &Stress) {
        let (top, bottom) = self.edges();
        let (centroid, place) = (self.ruler.at(stress.middle, 0.0), self.ruler.at(stress.resultant, 0.0));
        let e = (stress.resultant - stress.middle).abs();
        let row = top - 9.0;
        board.line(Pen::Axis, Point::new(centroid.x, row - 1.5), Point::new(centroid.x, bottom + 1.2));
        board.line(Pen::Axis, Point::new(place.x, row - 1.5), Point::new(place.x, bottom + 1.2));
        if e > 0.5 {
            dimension::across(board, (centroid.x, place.x), row, row, Text::value("e", &mm(e)));
        }
        // A force into the paper: circle and cross.
        let radius = 1.5;
        board.fill(Ink::Paper, kurbo::Shape::to_path(&kurbo::Circle::new(place, radius), 0.01));
        load::circle(board, Pen::Load, place, radius);
        let (a, b) = (Vec2::new(1.0, 1.0).normalize() * radius, Vec2::new(1.0, -1.0).normalize() * radius);
        board.line(Pen::Load, place - a, place + a);
        board.line(Pen::Load, place - b, place + b);
        let text = match stress.force.words.is_empty() {
            true => stress.force.text(),
            false => stress.force.text().and(&format!(", {}", stress.force.words), Style::Plain),
        };
        let mut note = Note::new(Role::Load, place, text);
        for across in [self.ruler.hand, -self.ruler.hand] {
            note = note
                .spot(Spot::new((place.x + across * 5.0, top - 2.2), across, -1.0).led())
                .spot(Spot::new((place.x + across * 5.0, bottom + 2.4), across, 1.0).led());
        }
        board.note(note);
    }

    pub fn diagram(&self, board: &mut Board, stress: &Stress) {
        let (_, bottom) = self.edges();
        let (from, to) = self.pressed(stress);
        // Under the flange there is no room beside the return: the diagram goes below the wall.
        let base = match from < 0.0 {
            true => self.ruler.at(0.0, -self.reach).y + 5.0,
            false => bottom + 7.0,
        };
        let (toe, heel) = match stress.toe {
            Toe::Wall => (from, to),
            Toe::Free => (to, from),
        };
        let x = |x| self.ruler.at(x, 0.0).x;
        let rest = stress.at_heel.as_ref().map_or(0.0, |(share, _)| DIAGRAM * share);
        let ring = [
            Point::new(x(toe), base),
            Point::new(x(toe), base + DIAGRAM),
            Point::new(x(heel), base + rest),
            Point::new(x(heel), base),
        ];
        board.fill(Ink::Stress, polygon(&ring));
        board.stroke(Pen::Diagram, polygon(&ring));
        let rest = x(from.min(0.0));
        board.line(Pen::Beyond, Point::new(rest, base), Point::new(x(self.view.length), base));
        let out = (x(toe) - x(heel)).signum();
        let tip = Point::new(x(toe), base + DIAGRAM * 0.6);
        board.note(
            Note::new(Role::Load, tip, stress.at_toe.text())
                .words(&stress.at_toe.words)
                .spot(Spot::new((x(toe) + out * 1.5, base + DIAGRAM * 0.55), out, 0.0))
                .spot(Spot::new((x(toe) - out * 1.5, base + 1.0), -out, 1.0).cost(2.0))
                .rank(1),
        );
        if let Some((_, action)) = &stress.at_heel {
            let end = Point::new(x(heel), base + rest / 2.0);
            board.note(
                Note::new(Role::Load, end, action.text())
                    .spot(Spot::new((x(heel) - out * 1.5, base + rest / 2.0), -out, 0.0))
                    .rank(1),
            );
        }
        let row = base + DIAGRAM + 6.0;
        let text = Text::value("l_c", &mm(stress.compressed));
        dimension::across(board, (x(from), x(to)), row, base + DIAGRAM, text);
    }
}
