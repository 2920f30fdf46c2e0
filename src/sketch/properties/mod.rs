//! Rules that hold for any valid input: labels apart and inside, lengths true, mirrors alike.

mod views;

use kurbo::{BezPath, Shape};
use proptest::prelude::*;

use super::pen::{Ink, Pen};
use super::samples::*;
use super::tests::{FRAME, sound};
use super::*;
use views::*;

/// `n` of a drawing's scale `1:n`.
fn scale_of(drawing: &Drawing) -> f64 {
    drawing.scale.trim_start_matches("1:").parse().expect("a scale is 1:n")
}

/// Lengths of all straight pieces drawn with a pen.
fn lengths(drawing: &Drawing, pen: Pen) -> Vec<f64> {
    drawing
        .strokes(pen)
        .flat_map(|path| path.segments().map(|s| s.as_line().map_or(0.0, |l| l.length())))
        .collect()
}

/// Whether a pen drew a straight line of `full` mm at the drawing's scale.
fn has_length(drawing: &Drawing, pen: Pen, full: f64) -> bool {
    let paper = full / scale_of(drawing);
    lengths(drawing, pen).iter().any(|length| (length - paper).abs() < 1e-6)
}

/// Points of all strokes of a pen, sorted, mirrored on the drawing's centre where asked.
fn points(drawing: &Drawing, pen: Pen, mirrored: bool) -> Vec<(i64, i64)> {
    let bounds: Vec<&BezPath> = drawing.strokes(Pen::Outline).chain(drawing.strokes(Pen::Cut)).collect();
    let extent =
        bounds.iter().map(|p| p.bounding_box()).reduce(|a, b| a.union(b)).expect("something is drawn");
    let mut points: Vec<(i64, i64)> = drawing
        .strokes(pen)
        .flat_map(|path| path.segments().flat_map(|s| s.as_line().map(|l| [l.p0, l.p1])).flatten())
        .map(|p| {
            let x = if mirrored { extent.x1 - p.x } else { p.x - extent.x0 };
            ((x * 100.0).round() as i64, ((p.y - extent.y0) * 100.0).round() as i64)
        })
        .collect();
    points.sort_unstable();
    points
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 48, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn any_footing_is_sound_and_true(view in any_footing()) {
        let drawing = footing_sketch(&view, FRAME);
        sound(&drawing);
        prop_assert!(has_length(&drawing, Pen::Outline, view.length + view.beyond_junction + view.beyond_free_end));
        prop_assert!(has_length(&drawing, Pen::Outline, view.thickness));
    }

    #[test]
    fn any_return_elevation_is_sound_and_true(view in any_elevation()) {
        let drawing = return_elevation(&view, FRAME);
        sound(&drawing);
        let json = |drawing: &Drawing| serde_json::to_string(drawing).expect("serialises");
        prop_assert_eq!(json(&drawing), json(&return_elevation(&view, FRAME)));
        prop_assert!(FRAME.holds(&drawing), "{} x {}", drawing.width, drawing.height);
        prop_assert!(has_length(&drawing, Pen::Outline, view.length));
        prop_assert!(has_length(&drawing, Pen::Outline, view.height));
        prop_assert!(has_length(&drawing, Pen::Dimension, view.height));
    }

    #[test]
    fn a_mirrored_return_has_mirrored_strokes(view in any_elevation()) {
        let other = if view.wall == Side::Left { Side::Right } else { Side::Left };
        let mirror = ReturnElevation { wall: other, ..view.clone() };
        let (a, b) = (return_elevation(&view, FRAME), return_elevation(&mirror, FRAME));
        prop_assume!(a.scale == b.scale);
        for pen in [Pen::Cut, Pen::Removed, Pen::Load] {
            let (a, b) = (points(&a, pen, false), points(&b, pen, true));
            prop_assert_eq!(a.len(), b.len());
            // Rounding to a hundredth may differ by one.
            for p in &a {
                prop_assert!(b.iter().any(|q| (p.0 - q.0).abs() <= 1 && (p.1 - q.1).abs() <= 1), "{p:?} of {pen:?}");
            }
        }
    }

    #[test]
    fn any_return_section_is_sound_and_true(view in any_section()) {
        let drawing = return_section(&view, FRAME);
        sound(&drawing);
        prop_assert!(FRAME.holds(&drawing), "{} x {}", drawing.width, drawing.height);
        prop_assert!(has_length(&drawing, Pen::Cut, view.length));
        if let Some(stress) = &view.stress {
            prop_assert!(has_length(&drawing, Pen::Dimension, stress.compressed));
            // Shaded leaf and flange together are as long as the compressed length.
            let shaded = drawing.items.iter().filter_map(|item| match item {
                Item::Fill { ink: Ink::Stress, path } => Some(path.0.bounding_box()),
                _ => None,
            });
            let all: Vec<_> = shaded.collect();
            let plan = all[..all.len() - 1].iter().copied().reduce(|a, b| a.union(b)).expect("something is shaded");
            prop_assert!((plan.width() * scale_of(&drawing) - stress.compressed).abs() < 1e-6);
            let diagram = all[all.len() - 1];
            prop_assert!((diagram.width() * scale_of(&drawing) - stress.compressed).abs() < 1e-6);
        }
    }

    #[test]
    fn any_panel_is_sound_and_true(view in any_panel(), other in any_panel()) {
        let frame = Frame::new(165.0, 130.0);
        let face = PanelFace { length: view.face.length, height: view.face.height, openings: vec![], ..other.face.clone() };
        let other = PanelElevation { face, walls: vec![], ..other };
        let pair = panel_pair(&other, &view, frame);
        prop_assert_eq!(&pair[0].scale, &pair[1].scale);
        for drawing in &pair {
            sound(drawing);
            prop_assert!(frame.holds(drawing), "{} x {}", drawing.width, drawing.height);
            prop_assert!(has_length(drawing, Pen::Dimension, view.face.length));
            prop_assert!(has_length(drawing, Pen::Dimension, view.face.height));
        }
    }

    #[test]
    fn any_key_plan_is_sound_and_true(views in any_plan()) {
        let (row, alone) = (Frame::new(170.0, 150.0), Frame::new(170.0, 130.0));
        let pair = key_plans(&views, row, alone);
        prop_assert_eq!(&pair[0].scale, &pair[1].scale);
        let wide: f64 = pair.iter().map(|d| d.width).sum();
        let in_row = wide + scale::APART <= row.width && pair.iter().all(|d| d.height <= row.height);
        prop_assert!(in_row || pair.iter().all(|d| alone.holds(d)), "{} and {} wide", pair[0].width, pair[1].width);
        pair.iter().for_each(sound);
        let walls = &views[0].walls;
        prop_assert!(has_length(&pair[0], Pen::Dimension, walls[0].to.0 + 302.5));
        // What comes out is dashed on one of the two only, and where it is new it is not there before.
        let gone = walls.iter().any(|w| w.fate == Fate::Removed);
        prop_assert_eq!(pair[0].strokes(Pen::Removed).count(), 0);
        prop_assert!(gone || pair[1].strokes(Pen::Removed).count() == 0);
        let named = |d: &Drawing, name: &str| d.labels().any(|l| l.plain().split(' ').next() == Some(name));
        for w in walls.iter().filter(|w| !views[1].marks.iter().any(|m| m.from == w.from && m.to == w.to)) {
            prop_assert_eq!(named(&pair[0], &w.name), w.fate != Fate::Added, "{} before", w.name);
            prop_assert!(named(&pair[1], &w.name), "{} after", w.name);
        }
        let shares = (0..walls.len()).map(|wall| Share { wall, before: Some("12 %".into()), after: Some("18 %".into()) });
        let plan = StabilityPlan { name: "stability".into(), title: "ground floor".into(), shares: shares.collect(), walls: walls.clone(), wind: PlanWind::Rightwards };
        stability_plans(&plan, row, alone).iter().for_each(sound);
    }

    #[test]
    fn any_panel_section_is_sound(layers in layers(), height in 2000..4000_i32, ties in 225..900_i32, top in 150..400_i32) {
        let height = f64::from(height);
        let mut view = wall_section();
        view.precompression = view.precompression.map(|(_, action)| (layers.len() - 1, action));
        (view.layers, view.height, view.ties) = (layers, height, Some((f64::from(ties), "2.5 ties per m²".to_owned())));
        view.floors[1] = Floor { level: height + f64::from(top), depth: f64::from(top), concrete: false, words: "timber floor".into() };
        let drawing = panel_section(&view, FRAME);
        sound(&drawing);
        prop_assert!(has_length(&drawing, Pen::Dimension, height));
    }

    #[test]
    fn any_chain_is_sound(view in any_chain()) {
        let drawing = chain(&view);
        sound(&drawing);
        // Every link is named, every branch is told by its proof, and none in the key alone.
        let texts: Vec<String> = drawing.labels().map(|l| l.plain()).collect();
        prop_assert!(view.links.iter().all(|l| texts.contains(&l.name)));
        let assumed = view.links.iter().flat_map(|l| &l.branches).any(|b| b.known == Known::Assumed);
        let heavy = drawing.strokes(Pen::Open).count();
        prop_assert_eq!(heavy > 2, assumed);
        prop_assert!(drawing.width <= 160.0, "{}", drawing.width);
    }

    #[test]
    fn any_diagram_is_sound(propped: bool, factor in 0.1..10.0_f64, turn: bool) {
        let mut view = actions(propped);
        for curve in &mut view.curves {
            for sample in &mut curve.samples {
                sample.1 *= if turn { -factor } else { factor };
            }
        }
        sound(&return_actions(&view, Frame::new(120.0, 120.0)));
    }

    #[test]
    fn any_bearing_is_sound_and_true(view in any_bearing(), e in -30..=30_i32, width in 40..=140_i32) {
        let drawing = bearing_elevation(&view, FRAME);
        sound(&drawing);
        prop_assert!(FRAME.holds(&drawing), "{} x {}", drawing.width, drawing.height);
        prop_assert!(has_length(&drawing, Pen::Dimension, view.spread.1 - view.spread.0));
        prop_assert!(has_length(&drawing, Pen::Outline, view.length));
        let across = BearingSection { eccentricity: f64::from(e), bearing: f64::from(width), ..across(view.stone.is_some()) };
        sound(&bearing_section(&across, FRAME));
    }
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(40))]

    #[test]
    fn wind_on_any_plan_is_sound(
        w in 5000.0..40_000.0_f64, h in 4000.0..20_000.0_f64, a in 0.1..0.9_f64,
        parts in prop::array::uniform4(0.05..1.0_f64), from in 0.0..0.9_f64, to in 0.1..1.0_f64,
    ) {
        let views = [wind_plan((w, h), a, parts, (from, to)), wind_plan((w, h), 1.0 - a, parts, (to / 2.0, to))];
        let drawings = wind_plans(&views, Frame::new(170.0, 110.0), Frame::new(170.0, 90.0));
        drawings.iter().for_each(sound);
        prop_assert!(has_length(&drawings[0], Pen::Cut, w / 2.0 + to * w / 2.0 - from * w / 2.0));
    }

    #[test]
    fn wind_on_any_house_is_sound(
        depth in 4000.0..20_000.0_f64, storeys in prop::collection::vec(2200.0..3600.0_f64, 1..4), roof in 0.0..4000.0_f64,
    ) {
        let view = wind_elevation_view(depth, &storeys, roof);
        let frame = Frame::new(170.0, 62.0);
        wind_elevations(&[view.clone(), view.clone()], Frame::new(170.0, 110.0), frame).iter().for_each(sound);
        sound(&wind_elevation(&view, frame));
    }

    #[test]
    fn any_ground_is_sound(
        height in 5.0..200.0_f64, up in 40.0..2000.0_f64, down in 40.0..2000.0_f64, at in -1.4..1.4_f64, falls in any::<bool>(),
    ) {
        let view = GroundProfile {
            form: if falls { "hill" } else { "cliff" }.into(),
            height: height * 1e3,
            upwind: up * 1e3,
            downwind: falls.then_some(down * 1e3),
            site: at * up * 1e3,
            factors: [Action::new("c_o", "1.15", "orography factor"), Action::new("phi", "0.162", "upwind slope")],
        };
        sound(&ground_profile(&view, Frame::new(150.0, 60.0)));
    }
}
