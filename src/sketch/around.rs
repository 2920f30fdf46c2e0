//! What stands around a plan: overall dimensions, wind arrows, north.

use kurbo::{Point, Vec2};

use super::board::Board;
use super::dimension::{self, mm};
use super::plan::{self, PlanWall};
use super::scale::Scale;

/// A wind arrow at an edge of the plan.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum PlanWind {
    /// Blows to the right, from the left edge.
    Rightwards,
    /// Blows to the left.
    Leftwards,
    /// Blows up the sheet.
    Upwards,
    /// Blows down the sheet.
    Downwards,
}

impl PlanWind {
    /// Its direction on the paper.
    pub fn along(self) -> Vec2 {
        match self {
            PlanWind::Rightwards => Vec2::new(1.0, 0.0),
            PlanWind::Leftwards => Vec2::new(-1.0, 0.0),
            PlanWind::Upwards => Vec2::new(0.0, -1.0),
            PlanWind::Downwards => Vec2::new(0.0, 1.0),
        }
    }

    /// Where it comes from, in words.
    pub fn words(self) -> &'static str {
        match self {
            PlanWind::Rightwards => "from the left",
            PlanWind::Leftwards => "from the right",
            PlanWind::Upwards => "from below",
            PlanWind::Downwards => "from above",
        }
    }
}

/// What stands around a plan.
pub struct Around<'a> {
    /// Wind arrows.
    pub winds: &'a [PlanWind],
    /// North, degrees clockwise from the top of the sheet.
    pub north: Option<f64>,
    /// Overall dimensions.
    pub dimensions: bool,
    /// How much farther out than usual everything stands, mm on paper.
    pub clear: f64,
}

/// Overall dimensions, wind arrows and north point around a plan.
pub fn surroundings(board: &mut Board, walls: &[PlanWall], around: &Around<'_>, scale: Scale) {
    let extent = plan::extent(walls, scale);
    let clear = around.clear;
    if around.dimensions {
        let (w, h) = (extent.width() * scale.0, extent.height() * scale.0);
        let out = 11.0 + clear;
        dimension::across(board, (extent.x0, extent.x1), extent.y1 + out, extent.y1, mm(w));
        dimension::up(board, (extent.y1, extent.y0), extent.x0 - out, extent.x0, mm(h));
    }
    let c = extent.center();
    // Wind from the sides is drawn over the ends of the plan: beside them it would take the plan's room.
    let over = extent.y0 - 7.0 - clear;
    let second = if extent.width() < 40.0 { over - 6.0 } else { over };
    for wind in around.winds {
        let tip = match wind {
            PlanWind::Rightwards => Point::new(extent.x0 + plan::WIND, over),
            PlanWind::Leftwards => Point::new(extent.x1 - plan::WIND, second),
            PlanWind::Upwards => Point::new(c.x, extent.y1 + 5.0 + clear),
            PlanWind::Downwards => Point::new(c.x, extent.y0 - 5.0 - clear),
        };
        plan::wind(board, tip, wind.along(), "wind");
    }
    if let Some(north) = around.north {
        plan::north(board, Point::new(extent.x1 - 4.0, extent.y0 - 10.5 - clear), north);
    }
}
