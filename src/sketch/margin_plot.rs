//! How the use of a return goes with one assumption, and where this job stands.

use kurbo::{Circle, Point, Shape};

use super::board::{Board, Words};
use super::drawing::{Drawing, Role};
use super::load;
use super::note::{Note, Spot};
use super::pen::{Ink, Pen};
use super::text::Text;
use super::text::list;

/// What the plot shows.
#[derive(Clone, Debug)]
pub struct MarginPlot {
    /// Identifier: `R1-by-length`.
    pub name: String,
    /// Mark of the return.
    pub mark: String,
    /// The assumption with its unit: `length, mm`.
    pub assumption: String,
    /// Values and uses, in order; none where the method does not reach.
    pub points: Vec<(f64, Option<f64>)>,
    /// This job.
    pub here: (f64, f64),
    /// This job as it is printed: value and use.
    pub printed: (String, String),
    /// Values to print along the axis, with their places.
    pub ticks: Vec<(f64, String)>,
}

/// Paper of the field, mm; uses from 0 to the top.
const SIZE: (f64, f64) = (58.0, 34.0);
const TOP: f64 = 1.5;
/// Uses printed along the axis, and that from which a use is only said to be large.
const USES: [f64; 4] = [0.0, 0.5, 1.0, 1.5];
const FAR: f64 = 10.0;
/// Length of a tick, mm.
const TICK: f64 = 1.2;

/// Draws the plot.
pub fn margin_plot(view: &MarginPlot) -> Drawing {
    let mut board = Board::default();
    let (low, high) = (view.points.first().map_or(0.0, |p| p.0), view.points.last().map_or(1.0, |p| p.0));
    let x = |value: f64| (value - low) / (high - low).max(f64::MIN_POSITIVE) * SIZE.0;
    let y = |used: f64| -used.min(TOP) / TOP * SIZE.1;
    board.line(Pen::Beyond, Point::new(0.0, y(0.0)), Point::new(SIZE.0, y(0.0)));
    board.line(Pen::Beyond, Point::new(0.0, y(0.0)), Point::new(0.0, y(TOP)));
    for used in USES {
        let at = Point::new(-TICK, y(used));
        board.line(Pen::Beyond, at, Point::new(0.0, y(used)));
        let text = Text::plain(&format!("{used:.1}"));
        board.note(Note::new(Role::Note, at, text).spot(Spot::new((at.x - 0.8, at.y), -1.0, 0.0)).rank(0));
    }
    for (value, text) in &view.ticks {
        let at = Point::new(x(*value), TICK);
        board.line(Pen::Beyond, Point::new(at.x, 0.0), at);
        board.note(
            Note::new(Role::Note, at, Text::plain(text))
                .spot(Spot::new((at.x, at.y + 0.8), 0.0, 1.0))
                .rank(0),
        );
    }
    // What lies above this line does not pass.
    board.line(Pen::Removed, Point::new(0.0, y(1.0)), Point::new(SIZE.0, y(1.0)));
    let mut run: Vec<Point> = Vec::new();
    for (value, used) in view.points.iter().map(|p| (p.0, p.1)).chain([(high, None)]) {
        match used {
            Some(used) if used <= TOP => run.push(Point::new(x(value), y(used))),
            _ => {
                if run.len() > 1 {
                    board.polyline(Pen::Outline, &run);
                }
                run.clear();
            }
        }
    }
    let here = Point::new(x(view.here.0), y(view.here.1));
    board.fill(Ink::Paper, Circle::new(here, 1.1).to_path(0.01));
    load::circle(&mut board, Pen::Outline, here, 1.1);
    let mut note =
        Note::new(Role::Load, here, Text::plain(&format!("{}: {}", view.printed.0, view.printed.1)));
    for (across, down) in [(1.0, 1.0), (-1.0, 1.0), (1.0, -1.0), (-1.0, -1.0), (1.0, 0.0), (-1.0, 0.0)] {
        for gap in [2.0, 4.0, 8.0] {
            note = note.spot(Spot::new((here.x + across * gap * 0.6, here.y + down * gap), across, down));
        }
    }
    board.note(note);
    let title = Note::new(Role::Note, (SIZE.0 / 2.0, 0.0), Text::plain(&view.assumption));
    board.note(title.spot(Spot::new((SIZE.0 / 2.0, 6.2), 0.0, 1.0)).rank(1));
    board.finish(Words {
        name: view.name.clone(),
        caption: format!(
            "{}: largest use against {}; ring: this job; above the broken line it fails",
            view.mark,
            name_of(&view.assumption)
        ),
        scale: String::new(),
        alt: spoken(view),
    })
}

/// The assumption without its unit.
fn name_of(assumption: &str) -> &str {
    assumption.split_once(',').map_or(assumption, |(name, _)| name)
}

fn spoken(view: &MarginPlot) -> String {
    let of = |p: Option<&(f64, Option<f64>)>| match p.and_then(|p| p.1) {
        Some(used) if used > FAR => "more than 10".to_owned(),
        Some(used) => format!("{used:.2}"),
        None => "outside the method".to_owned(),
    };
    let ticks: Vec<&str> = view.ticks.iter().map(|t| t.1.as_str()).collect();
    let (first, last) = (ticks.first().unwrap_or(&""), ticks.last().unwrap_or(&""));
    format!(
        "Largest use of {}, on an axis of {}, against {}, on an axis of {}: {} at {first}, {} at {last}; this job has {} \
         with a use of {}.",
        view.mark,
        list(&USES.map(|u| format!("{u:.1}"))),
        view.assumption,
        list(&ticks.iter().map(|t| (*t).to_owned()).collect::<Vec<_>>()),
        of(view.points.first()),
        of(view.points.last()),
        view.printed.0,
        view.printed.1
    )
}
