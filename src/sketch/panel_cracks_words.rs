//! Caption and spoken text of a panel at collapse, and the lines that tell its results.

use super::dimension::mm;
use super::drawing::Style;
use super::panel_cracks::{Cell, CrackKind, PanelCracks};
use super::panel_edges::Edges;
use super::text::list;
use super::text::{Text, capital};
use super::view::Action;

/// An end nearer to an edge or to the side of an opening reaches it, mm.
const REACHED: f64 = 1.0;

/// `takes w = 1.06 kN/m²`.
pub(super) fn led_by(action: &Action) -> Text {
    let mut text = action.text();
    if !action.words.is_empty() {
        text.0.splice(0..0, Text::default().and(&format!("{} ", action.words), Style::Plain).0);
    }
    text
}

fn led_by_spoken(action: &Action) -> String {
    let value = Action { words: String::new(), ..action.clone() }.spoken();
    if action.words.is_empty() { value } else { format!("{} {value}", action.words) }
}

/// What it shows, and the key in words, for what is there.
pub(super) fn caption(view: &PanelCracks, edges: &Edges<'_>, moves: bool) -> String {
    let state = if view.face.state.is_empty() { String::new() } else { format!(", {}", view.face.state) };
    let has = |kind| view.cracks.iter().any(|crack| crack.kind == kind);
    let kinds = [
        (has(CrackKind::Sagging), "heavy line: crack on the face away from the wind"),
        (has(CrackKind::Hogging), "heavy dashes: crack on the face towards the wind"),
        (has(CrackKind::Hinge), "rings: hinge at a support"),
        (moves, "closer level lines: moves further"),
    ];
    let kinds = kinds.into_iter().filter(|(there, _)| *there).map(|(_, words)| words.to_owned());
    let key: Vec<String> = kinds.chain(edges.key()).collect();
    format!("{} at collapse{state}. {}", view.face.mark, capital(&key.join("; ")))
}

/// The drawing in words.
pub(super) fn alt(view: &PanelCracks, edges: &Edges<'_>) -> String {
    let state =
        if view.face.state.is_empty() { String::new() } else { format!(" {} the removal", view.face.state) };
    let mut alt = format!(
        "Crack pattern of panel {} at collapse{state}, {} mm long and {} mm high. ",
        view.face.mark,
        mm(view.face.length),
        mm(view.face.height)
    );
    alt += &edges.spoken();
    for opening in &view.face.openings {
        alt += &opening.spoken();
    }
    alt += &cracks(view, CrackKind::Sagging, "away from");
    alt += &cracks(view, CrackKind::Hogging, "towards");
    alt += &hinges(view);
    if let Some(cell) = furthest(view) {
        let middle = |(from, to): (f64, f64)| mm(((from + to) / 2.0).round());
        let (x, y) = (middle(cell.x), middle(cell.y));
        alt +=
            &format!("The panel moves furthest near {x} mm from the left edge and {y} mm above the base. ");
    }
    let all: Vec<String> =
        [&view.takes, &view.wind].into_iter().chain(&view.values).map(led_by_spoken).collect();
    alt + &format!("Results: {}.", all.join("; "))
}

/// `4 cracks open on the face away from the wind; between them they reach the left edge, the base and an opening. `
fn cracks(view: &PanelCracks, kind: CrackKind, face: &str) -> String {
    let ends: Vec<(f64, f64)> =
        view.cracks.iter().filter(|c| c.kind == kind).flat_map(|c| [c.from, c.to]).collect();
    let (count, open, them) = match ends.len() / 2 {
        0 => return format!("No crack opens on the face {face} the wind. "),
        1 => ("1 crack".to_owned(), "opens", "it reaches"),
        n => (format!("{n} cracks"), "open", "between them they reach"),
    };
    let reached = reached(view, &ends);
    let reached = if reached.is_empty() { "no edge".to_owned() } else { list(&reached) };
    format!("{count} {open} on the face {face} the wind; {them} {reached}. ")
}

/// `It turns along the left edge and the base. `
fn hinges(view: &PanelCracks) -> String {
    let mut along: Vec<String> = Vec::new();
    for hinge in view.cracks.iter().filter(|c| c.kind == CrackKind::Hinge) {
        let ((x0, y0), (x1, y1)) = (hinge.from, hinge.to);
        // Both ends of an edge lie on its neighbours too; the middle lies on it alone.
        let names = reached(view, &[((x0 + x1) / 2.0, (y0 + y1) / 2.0)]);
        along.push(names.into_iter().next().unwrap_or_else(|| "a line inside the panel".to_owned()));
    }
    along.sort();
    along.dedup();
    if along.is_empty() { String::new() } else { format!("It turns along {}. ", list(&along)) }
}

/// The edges on which points lie, and whether one lies on an opening.
fn reached(view: &PanelCracks, points: &[(f64, f64)]) -> Vec<String> {
    let on = |at: &dyn Fn((f64, f64)) -> f64| points.iter().any(|p| at(*p).abs() < REACHED);
    let opening = points.iter().any(|p| view.face.openings.iter().any(|o| o.edge_holds(*p, REACHED)));
    [
        (on(&|p| p.0), "the left edge"),
        (on(&|p| p.0 - view.face.length), "the right edge"),
        (on(&|p| p.1 - view.face.height), "the top"),
        (on(&|p| p.1), "the base"),
        (opening, "an opening"),
    ]
    .into_iter()
    .filter(|(there, _)| *there)
    .map(|(_, name)| name.to_owned())
    .collect()
}

/// The cell that moves furthest; of those that do within half a per cent, the one nearest to the middle of the panel.
fn furthest(view: &PanelCracks) -> Option<&Cell> {
    let largest = view.deflection.iter().map(|cell| cell.share).fold(0.0, f64::max);
    let off = |cell: &&Cell| {
        let (x, y) = (cell.x.0 + cell.x.1 - view.face.length, cell.y.0 + cell.y.1 - view.face.height);
        x.hypot(y)
    };
    let far = view.deflection.iter().filter(|cell| cell.share > 0.0 && cell.share >= 0.995 * largest);
    far.min_by(|a, b| off(a).total_cmp(&off(b)))
}
