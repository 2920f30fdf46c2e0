//! Panels at collapse: every crack at its place, words for all of it, and soundness for any view.

use kurbo::{Line, Point, Rect, Shape};
use proptest::prelude::*;

use super::pen::Pen;
use super::preview::show;
use super::samples::{edge, panels};
use super::tests::sound;
use super::*;

const ROW: Frame = Frame::new(168.0, 80.0);

fn crack(from: (f64, f64), to: (f64, f64), kind: CrackKind) -> Crack {
    Crack { from, to, kind }
}

/// Cells of a grid that lie in no opening, with the share that `shape` gives to their middles.
fn cells(
    size: (f64, f64),
    parts: (usize, usize),
    openings: &[Opening],
    shape: impl Fn(f64, f64) -> f64,
) -> Vec<Cell> {
    let places = |length: f64, parts: usize, ends: Vec<f64>| {
        let mut places: Vec<f64> = (0..=parts).map(|n| length * n as f64 / parts as f64).collect();
        places.extend(ends);
        places.sort_by(f64::total_cmp);
        places.dedup_by(|a, b| (*a - *b).abs() < 1.0);
        places
    };
    let xs = places(size.0, parts.0, openings.iter().flat_map(|o| [o.x, o.x + o.width]).collect());
    let ys = places(size.1, parts.1, openings.iter().flat_map(|o| [o.y, o.y + o.height]).collect());
    let mut cells = Vec::new();
    for x in xs.windows(2) {
        for y in ys.windows(2) {
            let middle = ((x[0] + x[1]) / 2.0, (y[0] + y[1]) / 2.0);
            if !openings.iter().any(|o| o.holds(middle.0, middle.1)) {
                cells.push(Cell { x: (x[0], x[1]), y: (y[0], y[1]), share: shape(middle.0, middle.1) });
            }
        }
    }
    cells
}

/// A roof on four simple supports, and after the removal a longer panel on three with a window, held on its right over
/// the height of a return only.
fn pair() -> [PanelCracks; 2] {
    use CrackKind::{Hinge, Hogging, Sagging};
    let simple = || edge(Support::Simple, "");
    let (l, h) = (3600.0, 2400.0);
    let before = PanelCracks {
        face: PanelFace {
            mark: "P1".into(),
            state: "before".into(),
            length: l,
            height: h,
            left: simple(),
            right: simple(),
            top: simple(),
            base: simple(),
            openings: vec![],
        },
        cracks: vec![
            crack((0.0, 0.0), (1400.0, 1200.0), Sagging),
            crack((0.0, h), (1400.0, 1200.0), Sagging),
            crack((1400.0, 1200.0), (2200.0, 1200.0), Sagging),
            crack((2200.0, 1200.0), (l, 0.0), Sagging),
            crack((2200.0, 1200.0), (l, h), Sagging),
            crack((0.0, 0.0), (l, 0.0), Hinge),
            crack((0.0, h), (l, h), Hinge),
            crack((0.0, 0.0), (0.0, h), Hinge),
            crack((l, 0.0), (l, h), Hinge),
        ],
        deflection: cells((l, h), (18, 12), &[], |x, y| {
            (x.min(l - x) / 1400.0).min(y.min(h - y) / 1200.0).min(1.0)
        }),
        takes: Action::new("w", "2.31 kN/m²", "takes"),
        wind: Action::new("", "0.993 kN/m²", "wind"),
        values: vec![],
    };
    let l = 5200.0;
    let window = Opening {
        x: 3100.0,
        y: 900.0,
        width: 1200.0,
        height: 1050.0,
        words: "window".into(),
        bearing: Some(150.0),
    };
    let after = PanelCracks {
        face: PanelFace {
            state: "after".into(),
            length: l,
            left: edge(Support::Continuous, ""),
            right: Edge { held: Some((0.0, 1300.0)), ..edge(Support::Continuous, "bonded to R1") },
            top: edge(Support::Free, ""),
            openings: vec![window.clone()],
            ..before.face.clone()
        },
        cracks: vec![
            crack((0.0, 0.0), (2300.0, 1400.0), Sagging),
            crack((2300.0, 1400.0), (2300.0, h), Sagging),
            crack((2300.0, 1400.0), (3100.0, 1200.0), Sagging),
            crack((4300.0, 1100.0), (l, 1300.0), Hogging),
            crack((4300.0, 900.0), (4500.0, 800.0), Hogging),
            crack((0.0, 0.0), (0.0, h), Hinge),
            crack((0.0, 0.0), (l, 0.0), Hinge),
        ],
        deflection: cells((l, h), (26, 12), std::slice::from_ref(&window), |x, y| {
            (x / 2300.0).min(y / h).min(1.0)
        }),
        takes: Action::new("w", "0.88 kN/m²", "takes"),
        values: vec![Action::new("gamma_M", "2.7", "")],
        ..before.clone()
    };
    [before, after]
}

/// The straight strokes of a pen.
fn lines(drawing: &Drawing, pen: Pen) -> Vec<Line> {
    drawing.strokes(pen).flat_map(|path| path.segments().filter_map(|s| s.as_line())).collect()
}

/// From the panel's millimetres to the drawing's, by its dimension lines.
fn ruler(drawing: &Drawing, size: (f64, f64)) -> impl Fn((f64, f64)) -> Point {
    let scale: f64 = drawing.scale.trim_start_matches("1:").parse().expect("a scale is 1:n");
    let long = |full: f64| move |line: &&Line| (line.length() - full / scale).abs() < 1e-6;
    let all = lines(drawing, Pen::Dimension);
    let level = all.iter().filter(|l| l.p0.y == l.p1.y).find(long(size.0)).expect("the length");
    let upright = all.iter().filter(|l| l.p0.x == l.p1.x).find(long(size.1)).expect("the height");
    let (x, y) = (level.p0.x.min(level.p1.x), upright.p0.y.max(upright.p1.y));
    move |at| Point::new(x + at.0 / scale, y - at.1 / scale)
}

/// Asserts that each crack is drawn with its pen from end to end, and nothing but the cracks.
fn all_drawn(view: &PanelCracks, drawing: &Drawing) {
    let at = ruler(drawing, (view.face.length, view.face.height));
    let of = |kind: CrackKind| {
        let these = view.cracks.iter().filter(move |c| c.kind == kind);
        these.map(|c| Line::new(at(c.from), at(c.to))).collect::<Vec<_>>()
    };
    let same = |a: Point, b: Point| (a - b).hypot() < 1e-6;
    let solid = lines(drawing, Pen::Sagging);
    let wanted = of(CrackKind::Sagging);
    assert_eq!(solid.len(), wanted.len());
    assert!(solid.iter().zip(&wanted).all(|(a, b)| same(a.p0, b.p0) && same(a.p1, b.p1)));

    let mut dashes = lines(drawing, Pen::Hogging).into_iter();
    for line in of(CrackKind::Hogging) {
        let mut own = vec![dashes.next().expect("a first dash")];
        while !same(own[own.len() - 1].p1, line.p1) {
            own.push(dashes.next().expect("a dash that ends with the crack"));
        }
        assert!(same(own[0].p0, line.p0) && own.len() > 1, "{own:?}");
        let ink: f64 = own.iter().map(|dash| dash.length()).sum();
        assert!(ink < 0.8 * line.length(), "{ink} of {}", line.length());
        let run = line.p1 - line.p0;
        assert!(own.iter().all(|dash| (dash.p0 - line.p0).cross(run).abs() < 1e-6 * run.hypot()));
    }
    assert_eq!(dashes.next(), None);

    let mut rings = drawing.strokes(Pen::Hinge).map(|path| path.bounding_box().center());
    for line in of(CrackKind::Hinge) {
        let count = (line.length() / 3.2).round().max(1.0);
        for step in 0..count as usize {
            let centre = rings.next().expect("a ring");
            assert!((centre - line.eval((step as f64 + 0.5) / count)).hypot() < 1e-3, "{centre:?}");
        }
    }
    assert_eq!(rings.next(), None);
}

trait Along {
    fn eval(&self, share: f64) -> Point;
}

impl Along for Line {
    fn eval(&self, share: f64) -> Point {
        self.p0.lerp(self.p1, share)
    }
}

#[test]
fn every_crack_is_drawn_at_its_place() {
    let views = pair();
    for (view, drawing) in views.iter().zip(cracks_pair(&views[0], &views[1], ROW)) {
        show(&drawing, "");
        sound(&drawing);
        all_drawn(view, &drawing);
    }
}

#[test]
fn the_pattern_is_told_in_words() {
    let [before, after] = pair();
    let [before, after] = cracks_pair(&before, &after, ROW);
    assert_eq!(
        before.alt,
        "Crack pattern of panel P1 at collapse before the removal, 3600 mm long and 2400 mm high. Left edge simple; \
         right edge simple; top simple; base simple. 5 cracks open on the face away from the wind; between them they \
         reach the left edge, the right edge, the top and the base. No crack opens on the face towards the wind. \
         It turns along the base, the left edge, the right edge and the top. The panel moves furthest near 1700 mm \
         from the left edge and 1100 mm above the base. Results: takes w = 2.31 kN/m²; wind 0.993 kN/m²."
    );
    assert_eq!(
        after.alt,
        "Crack pattern of panel P1 at collapse after the removal, 5200 mm long and 2400 mm high. Left edge \
         continuous; right edge continuous: bonded to R1, from 0 to 1300 mm above the base only (along it 1300 and \
         1100 mm); top free; base simple. window 1200 mm wide and 1050 mm high, 3100 mm from the left edge and 900 mm \
         above the base, under a lintel that bears 150 mm each side. 3 cracks open on the face away from the wind; \
         between them they reach the left edge, the top, the base and an opening. 2 cracks open on the face towards \
         the wind; between them they reach the right edge and an opening. It turns along the base and the left edge. \
         The panel moves furthest near 2500 mm from the left edge and 2300 mm above the base. Results: takes w = 0.88 \
         kN/m²; wind 0.993 kN/m²; gammaM = 2.7."
    );
    assert_eq!(
        before.caption,
        "P1 at collapse, before. Heavy line: crack on the face away from the wind; rings: hinge at a support; closer \
         level lines: moves further; single hatching: simply supported"
    );
    assert!(
        after.caption.contains("heavy dashes: crack on the face towards the wind; rings"),
        "{}",
        after.caption
    );
    assert!(after.caption.ends_with("crossed hatching: continuous"), "{}", after.caption);
}

#[test]
fn cracks_that_would_be_too_small_beside_each_other_stand_one_above_the_other() {
    let [mut before, mut after] = pair();
    (before.face.length, after.face.length) = (6800.0, 9000.0);
    (before.cracks, after.cracks) = (vec![], vec![]);
    let drawings = cracks_pair(&before, &after, ROW);
    assert!(drawings.iter().all(|d| d.scale == "1:100" && ROW.holds(d)));
    assert!(drawings[0].width + drawings[1].width > ROW.width);
}

/// Bands of an elevation, and a lintel.
#[test]
fn an_edge_held_in_part_has_its_band_there_alone() {
    let [_, mut view] = panels();
    view.face.right.held = Some((600.0, 1800.0));
    view.face.openings[0].bearing = Some(150.0);
    let drawing = panel_elevation(&view, ROW);
    show(&drawing, "-part");
    sound(&drawing);
    let at = ruler(&drawing, (view.face.length, view.face.height));
    let (low, high) = (at((view.face.length, 600.0)), at((view.face.length, 1800.0)));
    // Crossed hatching beside the right edge fills the stretch and no more.
    let beside = drawing.strokes(Pen::Hatch).map(|path| path.bounding_box()).filter(|b| b.x0 > low.x - 1e-6);
    let band = beside.reduce(|a, b| a.union(b)).expect("a band");
    assert!((band.y1 - low.y).abs() < 0.05 && (band.y0 - high.y).abs() < 0.05, "{band:?}");
    let texts: Vec<String> = drawing.labels().map(|l| l.plain()).collect();
    assert_eq!(
        texts.iter().filter(|t| *t == "600").count(),
        3,
        "two beside the edge, one along the base: {texts:?}"
    );
    assert!(drawing.caption.starts_with("P1 elevation, after. Thin line: free edge"), "{}", drawing.caption);
    assert!(drawing.alt.contains("from 600 to 1800 mm above the base only (along it 600, 1200 and 600 mm)"));
    // The lintel reaches 150 mm past both jambs, one course high.
    let lintel = Rect::from_points(at((3250.0, 1950.0)), at((4750.0, 2015.0)));
    let drawn = |path: &kurbo::BezPath| {
        let b = path.bounding_box();
        (b.origin() - lintel.origin()).hypot() < 1e-6 && (b.width() - lintel.width()).abs() < 1e-6
    };
    assert!(drawing.strokes(Pen::Beyond).any(drawn));
}

#[test]
fn a_door_interrupts_the_band_below_it() {
    let [mut view, _] = pair();
    view.face.openings =
        vec![Opening { x: 0.0, y: 0.0, width: 900.0, height: 2100.0, words: "door".into(), bearing: None }];
    let drawing = panel_cracks(&view, ROW);
    let at = ruler(&drawing, (view.face.length, view.face.height));
    let base = lines(&drawing, Pen::Outline)
        .into_iter()
        .find(|l| l.p0.y == l.p1.y && (l.p0.y - at((0.0, 0.0)).y).abs() < 1e-6);
    let base = base.expect("the base is held");
    assert!((base.p0.x - at((900.0, 0.0)).x).abs() < 1e-6 && (base.p1.x - at((3600.0, 0.0)).x).abs() < 1e-6);
}

fn any_edge() -> impl Strategy<Value = Edge> {
    let support = prop_oneof![Just(Support::Free), Just(Support::Simple), Just(Support::Continuous)];
    (support, any::<bool>(), prop::option::of((0.0..1.0_f64, 0.0..1.0_f64))).prop_map(
        |(support, why, held)| Edge {
            held: held.map(|(a, b)| ((3000.0 * a.min(b)).round(), (3000.0 * a.max(b)).round() + 200.0)),
            ..edge(support, if why { "bonded to return R1" } else { "" })
        },
    )
}

prop_compose! {
    fn any_cracks()(
        length in 800..9000_i32, height in 1800..4000_i32, edges in [any_edge(), any_edge(), any_edge(), any_edge()],
        opening in prop::option::of((0.0..0.5_f64, 0.2..0.5_f64, 0.0..0.4_f64, any::<bool>())),
        cracks in prop::collection::vec((0.0..=1.0_f64, 0.0..=1.0_f64, 0.0..=1.0_f64, 0.0..=1.0_f64, 0..3_usize), 0..15),
        parts in (1..24_usize, 1..16_usize), bend in 0.2..3.0_f64, more in 0..3_usize,
    ) -> PanelCracks {
        let (l, h) = (f64::from(length), f64::from(height));
        let [left, right, top, base] = edges;
        let openings: Vec<Opening> = opening.into_iter().map(|(x, width, y, lintel)| Opening {
            x: (x * l).round(), y: (y * h).round(), width: (width * l).round(), height: (0.5 * h).round(), words: "window".into(),
            bearing: lintel.then_some(150.0),
        }).collect();
        const KINDS: [CrackKind; 3] = [CrackKind::Sagging, CrackKind::Hogging, CrackKind::Hinge];
        let at = |x: f64, y: f64| ((x * l).round(), (y * h).round());
        let cracks = cracks.into_iter().map(|(a, b, c, d, kind)| crack(at(a, b), at(c, d), KINDS[kind]));
        let shape = |x: f64, y: f64| (bend * (x / l).min(1.0 - x / l) * (y / h)).min(1.0);
        let [sample, _] = pair();
        let deflection = cells((l, h), parts, &openings, shape);
        PanelCracks {
            face: PanelFace { length: l, height: h, left, right, top, base, openings, ..sample.face }, cracks: cracks.filter(|c| c.from != c.to).collect(),
            deflection,
            values: vec![Action::new("W_Ed", "0.90 kN/m²", ""); more], ..sample
        }
    }
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 48, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn any_panel_at_collapse_is_sound_and_true(view in any_cracks(), other in any_cracks()) {
        let frame = Frame::new(168.0, 110.0);
        let drawings = cracks_pair(&other, &view, frame);
        prop_assert_eq!(&drawings[0].scale, &drawings[1].scale);
        for (view, drawing) in [&other, &view].into_iter().zip(&drawings) {
            sound(drawing);
            prop_assert!(frame.holds(drawing), "{} x {}", drawing.width, drawing.height);
            all_drawn(view, drawing);
            let whole = Rect::new(0.0, 0.0, drawing.width, drawing.height);
            for item in &drawing.items {
                if let Item::Stroke { path, .. } | Item::Fill { path, .. } = item {
                    prop_assert!(whole.contains_rect(path.0.bounding_box()), "{item:?}");
                }
            }
        }
        let json = |drawings: &[Drawing]| serde_json::to_string(drawings).expect("serialises");
        prop_assert_eq!(json(&drawings), json(&cracks_pair(&other, &view, frame)));
    }
}
