//! Rules that hold for every drawing.

use kurbo::Shape;

use super::ground::crosses;
use super::pen::Pen;
use super::preview::show;
use super::samples::*;
use super::*;

/// Frame of a whole page width.
pub const FRAME: Frame = Frame::new(165.0, 175.0);

/// Asserts what every drawing owes: labels apart and inside, every value spoken, valid data.
pub fn sound(drawing: &Drawing) {
    let valid = |c: char| c.is_ascii_alphanumeric() || c == '-';
    assert!(drawing.name.chars().all(valid), "{}", drawing.name);
    assert!(drawing.labels().all(|label| label.size >= 7.5));
    let areas: Vec<_> = drawing.labels().map(|label| (label.plain(), label.area())).collect();
    for (index, (text, area)) in areas.iter().enumerate() {
        assert!(
            area.x0 >= 0.0 && area.y0 >= 0.0 && area.x1 <= drawing.width && area.y1 <= drawing.height,
            "{text:?} leaves the frame of {}",
            drawing.name
        );
        for (other, area_other) in &areas[index + 1..] {
            let common = area.intersect(*area_other);
            assert!(
                common.width() <= 0.2 || common.height() <= 0.2,
                "{text:?} overlaps {other:?} in {}",
                drawing.name
            );
        }
        for value in numbers(text) {
            assert!(drawing.alt.contains(&value), "{value} of {text:?} is not spoken: {}", drawing.alt);
        }
    }
    let lines = crossings(drawing, |pen| pen.keeps_labels_off() && pen != Pen::Leader);
    assert!(lines.is_empty(), "{lines:?} in {}", drawing.name);
    serde_json::to_string(drawing).expect("a drawing serialises");
}

/// Asserts what a drawing with room owes besides: no leader runs through a label.
fn tidy(drawing: &Drawing) {
    sound(drawing);
    let lines = crossings(drawing, |pen| pen == Pen::Leader);
    assert!(lines.is_empty(), "{lines:?} in {}", drawing.name);
}

/// Labels crossed by lines of the chosen pens.
fn crossings(drawing: &Drawing, chosen: impl Fn(Pen) -> bool) -> Vec<String> {
    let strokes = drawing.items.iter().filter_map(|item| match item {
        Item::Stroke { pen, path } if chosen(*pen) => Some(path),
        _ => None,
    });
    let lines: Vec<_> =
        strokes.flat_map(|path| path.0.segments().filter_map(|segment| segment.as_line())).collect();
    let crossed = |label: &&drawing::Label| lines.iter().any(|line| crosses(*line, label.area().inset(-0.1)));
    drawing.labels().filter(crossed).map(|label| label.plain()).collect()
}

fn numbers(text: &str) -> Vec<String> {
    text.split(|c: char| !(c.is_ascii_digit() || c == '.'))
        .map(|part| part.trim_matches('.').to_owned())
        .filter(|part| !part.is_empty())
        .collect()
}

#[test]
fn elevation_of_a_return() {
    let drawing = return_elevation(&elevation(), FRAME);
    show(&drawing, "-cantilever");
    tidy(&drawing);
    let mut view = elevation();
    view.wall = Side::Right;
    view.wind = Wind::Away;
    view.prop = Some("W3 and W4".into());
    view.dpc = false;
    view.head_moment = None;
    view.wall_layers = vec![Layer::Leaf { thickness: 215.0, material: hatch::Material::Brick }];
    for (x, n) in [(100.0, 3), (150.0, 4), (200.0, 5)] {
        let action = Action::new(&format!("N_{n}"), "4.2 kN", "joists");
        view.loads.push(PlacedLoad { x, action });
    }
    let drawing = return_elevation(&view, FRAME);
    show(&drawing, "-propped");
    tidy(&drawing);
}

#[test]
fn hand_cases_are_sound() {
    let mut drawings = vec![
        return_section(&section(), FRAME),
        return_section(&solid_section(), FRAME),
        return_actions(&actions(false), FRAME),
        return_actions(&actions(true), FRAME),
        panel_section(&wall_section(), FRAME),
        footing_sketch(&footing(), FRAME),
        load_stack(&stack(), FRAME),
        chain(&links()),
        bearing_elevation(&bearing(true), FRAME),
        bearing_elevation(&bearing(false), FRAME),
        bearing_section(&across(true), FRAME),
        bearing_section(&across(false), FRAME),
    ];
    let [before, after] = panels();
    drawings.extend(panel_pair(&before, &after, Frame::new(165.0, 110.0)));
    drawings.extend(key_plans(&plans(), FRAME, Frame::new(165.0, 110.0)));
    drawings.extend(stability_plans(&stability(), FRAME, Frame::new(165.0, 110.0)));
    for drawing in &drawings {
        show(drawing, "");
    }
    for drawing in &drawings {
        tidy(drawing);
    }
}

/// Inputs that crowd a drawing.
#[test]
fn awkward_cases_are_sound() {
    let mut short = elevation();
    short.mark = "R3".into();
    short.length = 215.0;
    short.height = 3550.0;
    short.loads = [10.0, 30.0, 100.0, 102.0, 180.0, 215.0]
        .iter()
        .enumerate()
        .map(|(i, x)| PlacedLoad {
            x: *x,
            action: Action::new(&format!("N_{}", i + 1), "12.4 kN", "new beam B1"),
        })
        .collect();
    let mut long = elevation();
    long.mark = "R4".into();
    (long.length, long.height, long.removed, long.line_load) = (2400.0, 1800.0, Some(500.0), None);
    let mut flanged = section();
    flanged.mark = "R3".into();
    flanged.length = 300.0;
    flanged.stress = flanged.stress.map(|stress| Stress {
        toe: Toe::Wall,
        compressed: 150.0,
        middle: 60.0,
        resultant: -50.0,
        ..stress
    });
    let mut tall = section();
    tall.mark = "R4".into();
    (tall.length, tall.flange, tall.wall) =
        (2400.0, Some(Flange { width: 1200.0, thickness: 100.0 }), Side::Right);
    let mut lifting = footing();
    (lifting.mark, lifting.length, lifting.beyond_free_end) = ("F3".into(), 500.0, 0.0);
    (lifting.thickness, lifting.resultant) = (600.0, -190.0);
    lifting.before = Some((1.7, Action::new("", "88 kN/m²", "before")));
    lifting.after =
        lifting.after.map(|a| Pressure { pressed: 180.0, free: false, rest: 0.0, at_rest: None, ..a });
    let mut gone = footing();
    (gone.mark, gone.after, gone.beyond_junction) = ("F4".into(), None, 75.0);
    let [mut narrow, mut wide] = panels();
    (narrow.face.mark, narrow.face.length, narrow.face.height) = ("P2".into(), 800.0, 4000.0);
    narrow.face.openings.clear();
    narrow.walls[0].x = 400.0;
    (wide.face.mark, wide.face.length) = ("P3".into(), 9000.0);
    let mut crowded = plans();
    for view in &mut crowded {
        view.name = format!("crowded-{}", view.name);
        for i in 0..6 {
            let y = 900.0 + 450.0 * f64::from(i);
            let fate = if i % 2 == 0 { Fate::Stays } else { Fate::Removed };
            view.walls.push(wall(&format!("W{}", 8 + i), (4000.0, y), (8200.0, y), 100.0, fate));
        }
    }
    let mut drawings = vec![
        return_elevation(&short, FRAME),
        return_elevation(&long, FRAME),
        return_section(&flanged, FRAME),
        return_section(&tall, FRAME),
        footing_sketch(&lifting, FRAME),
        footing_sketch(&gone, FRAME),
        panel_elevation(&narrow, Frame::new(80.0, 110.0)),
        panel_elevation(&wide, FRAME),
    ];
    drawings.extend(key_plans(&crowded, FRAME, FRAME));
    for drawing in &drawings {
        show(drawing, "-awkward");
        tidy(drawing);
    }
}

/// Frames of half a page width, beside one another or beside text.
#[test]
fn small_frames_are_kept() {
    let row = Frame::new(172.0, 80.0);
    let [before, after] = panels();
    let pair = panel_pair(&before, &after, row);
    let column = Frame::new(105.0, 110.0);
    let mut drawings = pair.to_vec();
    assert!(pair[0].width + pair[1].width <= row.width && pair.iter().all(|d| d.height <= row.height));
    drawings.push(return_elevation(&elevation(), column));
    drawings.push(return_section(&section(), column));
    drawings.push(return_actions(&actions(true), column));
    drawings.push(panel_section(&wall_section(), column));
    drawings.push(bearing_elevation(&bearing(true), column));
    drawings.push(bearing_section(&across(true), column));
    drawings.push(footing_sketch(&footing(), column));
    drawings.extend(key_plans(&plans(), column, column));
    drawings.push(load_stack(&stack(), column));
    for drawing in &drawings {
        show(drawing, "-small");
        tidy(drawing);
        assert!(drawing.width <= column.width, "{} is {} wide", drawing.name, drawing.width);
    }
}

/// Names that nobody could read are left out, and the drawing says so; what comes out keeps its name.
#[test]
fn a_long_row_of_houses_is_drawn_without_the_names_of_what_stays() {
    let mut row = plans();
    for view in &mut row {
        view.walls.truncate(7);
        for i in 0..16 {
            let x = 8200.0 + 2000.0 * f64::from(i);
            for (k, y) in [0.0, 7000.0].into_iter().enumerate() {
                view.walls.push(wall(&format!("H{i}-{k}"), (x, y), (x + 2000.0, y), 215.0, Fate::Stays));
            }
            view.walls.push(wall(
                &format!("H{i}"),
                (x + 2000.0, 0.0),
                (x + 2000.0, 7000.0),
                215.0,
                Fate::Stays,
            ));
        }
    }
    assert!(row[0].walls.len() < 60);
    for drawing in key_plans(&row, FRAME, FRAME) {
        show(&drawing, "-row");
        sound(&drawing);
        assert!(drawing.caption.contains("walls that stay are not named"), "{}", drawing.caption);
        let names: Vec<String> = drawing.labels().map(|l| l.plain()).collect();
        assert!(names.iter().any(|n| n.starts_with("W5 ")), "{names:?}");
        assert!(!names.iter().any(|n| n.starts_with('H') || n == "W1"), "{names:?}");
    }
}
