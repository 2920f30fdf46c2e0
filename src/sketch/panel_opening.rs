//! A window or door in a panel, with its lintel where that is told.

use kurbo::Rect;

use super::board::{Board, corners, polygon};
use super::dimension::mm;
use super::pen::{Ink, Pen};
use super::view::Ruler;

/// An opening in a panel.
#[derive(Clone, Debug)]
pub struct Opening {
    /// Left side from the panel's left edge, mm.
    pub x: f64,
    /// Sill above the panel's base, mm.
    pub y: f64,
    /// Width, mm.
    pub width: f64,
    /// Height, mm.
    pub height: f64,
    /// What it is: `window`.
    pub words: String,
    /// How far its lintel bears beyond each jamb, mm; no lintel is drawn where that is not told.
    pub bearing: Option<f64>,
}

/// Depth at which a lintel is drawn, mm: one course. For the picture only.
const LINTEL: f64 = 65.0;

impl Opening {
    /// The hole on paper.
    pub(super) fn area(&self, ruler: Ruler) -> Rect {
        Rect::from_points(ruler.at(self.x, self.y), ruler.at(self.x + self.width, self.y + self.height))
    }

    /// Whether a place (mm from the lower left corner) lies in it.
    pub(super) fn holds(&self, x: f64, y: f64) -> bool {
        self.x < x && x < self.x + self.width && self.y < y && y < self.y + self.height
    }

    /// Whether a place (mm) lies on its edge, to within `near` mm.
    pub(super) fn edge_holds(&self, place: (f64, f64), near: f64) -> bool {
        let area = Rect::new(self.x, self.y, self.x + self.width, self.y + self.height);
        area.inflate(near, near).contains(place) && !area.inflate(-near, -near).contains(place)
    }

    /// A blank area, its outline, and the lintel over it as far as it lies in a panel of `size` mm.
    pub(super) fn draw(&self, board: &mut Board, ruler: Ruler, pen: Pen, size: (f64, f64)) {
        if let Some(bearing) = self.bearing {
            let head = self.y + self.height;
            let from = ruler.at((self.x - bearing).max(0.0), head);
            let to = ruler.at((self.x + self.width + bearing).min(size.0), (head + LINTEL).min(size.1));
            blank(board, Pen::Beyond, Rect::from_points(from, to));
        }
        blank(board, pen, self.area(ruler));
    }

    /// `window 1200 mm wide and 1050 mm high, 3400 mm from the left edge and 900 mm above the base. `
    pub(super) fn spoken(&self) -> String {
        let lintel = self.bearing.map_or(String::new(), |bearing| {
            format!(", under a lintel that bears {} mm each side", mm(bearing))
        });
        format!(
            "{} {} mm wide and {} mm high, {} mm from the left edge and {} mm above the base{lintel}. ",
            self.words,
            mm(self.width),
            mm(self.height),
            mm(self.x),
            mm(self.y)
        )
    }
}

fn blank(board: &mut Board, pen: Pen, area: Rect) {
    let ring = corners(area);
    board.fill(Ink::Opening, polygon(&ring));
    board.stroke(pen, polygon(&ring));
}
