//! Invented inputs for the tests.

use super::hatch::Material;
use super::*;

pub fn cavity_wall() -> Vec<Layer> {
    vec![
        Layer::Leaf { thickness: 100.0, material: Material::Block },
        Layer::Cavity { width: 75.0 },
        Layer::Leaf { thickness: 102.5, material: Material::Brick },
    ]
}

pub fn elevation() -> ReturnElevation {
    ReturnElevation {
        mark: "R1".into(),
        length: 640.0,
        height: 2400.0,
        words: "100 mm block".into(),
        wall: Side::Left,
        wall_layers: cavity_wall(),
        junction: "bonded".into(),
        prop: None,
        dpc: true,
        removed: Some(3600.0),
        loads: vec![
            PlacedLoad { x: 320.0, action: Action::new("N_1", "8.4 kN", "floor over") },
            PlacedLoad { x: 590.0, action: Action::new("N_2", "36.2 kN", "beam B1") },
        ],
        head_forces: vec![Action::new("H_Ed", "2.95 kN", ""), Action::new("H_nu", "0.29 kN", "tilt")],
        head_moment: Some(Action::new("M_head", "1.10 kNm", "")),
        line_load: Some(Action::new("w_Ed", "1.95 kN/m", "")),
        tributary: Some(2600.0),
        through_floor: false,
        wind: Wind::Toward,
    }
}

pub fn section() -> ReturnSection {
    ReturnSection {
        mark: "R1".into(),
        length: 640.0,
        layers: vec![Layer::Leaf { thickness: 100.0, material: Material::Block }],
        loaded: 0,
        wall: Side::Left,
        wall_layers: cavity_wall(),
        bonded: true,
        flange: Some(Flange { width: 600.0, thickness: 100.0 }),
        stress: Some(Stress {
            toe: Toe::Free,
            compressed: 391.5,
            middle: 190.0,
            resultant: 509.5,
            force: Action::new("N_Ed", "40.1 kN", "helping"),
            at_toe: Action::new("sigma", "2.05 N/mm²", "at the toe"),
            at_heel: None,
        }),
    }
}

pub fn solid_section() -> ReturnSection {
    ReturnSection {
        mark: "R2".into(),
        length: 900.0,
        layers: vec![
            Layer::Leaf { thickness: 100.0, material: Material::Block },
            Layer::Cavity { width: 50.0 },
            Layer::Leaf { thickness: 102.5, material: Material::Brick },
        ],
        loaded: 0,
        wall: Side::Right,
        wall_layers: vec![Layer::Leaf { thickness: 215.0, material: Material::Brick }],
        bonded: false,
        flange: None,
        stress: Some(Stress {
            toe: Toe::Wall,
            compressed: 900.0,
            middle: 450.0,
            resultant: 380.0,
            force: Action::new("N_Ed", "61.0 kN", "pressing, wind leads"),
            at_toe: Action::new("sigma_toe", "0.99 N/mm²", ""),
            at_heel: Some((0.363, Action::new("", "0.36 N/mm²", ""))),
        }),
    }
}

pub fn actions(propped: bool) -> ReturnActions {
    let h = 2400.0;
    let samples = |f: &dyn Fn(f64) -> f64| {
        let heights = (0..=24).map(|i| h * f64::from(i) / 24.0);
        heights.map(|z| (z, f(z))).collect()
    };
    // kN/mm and kN, so that the values are in kNmm and kN: only their proportions are drawn.
    let (w, head) = (0.00195, 2.9);
    let m = |z: f64| match propped {
        true => w * z * (h - z) / 2.0,
        false => w * (h - z).powi(2) / 2.0 + head * (h - z),
    };
    let v = |z: f64| match propped {
        true => w * (h / 2.0 - z),
        false => w * (h - z) + head,
    };
    let (m_values, v_values) = if propped {
        (vec![(1200.0, "1.40 kNm".into())], vec![(0.0, "2.34 kN".into()), (2400.0, "−2.34 kN".into())])
    } else {
        (
            vec![(0.0, "12.6 kNm".into()), (2400.0, "0".into())],
            vec![(0.0, "7.58 kN".into()), (2400.0, "2.90 kN".into())],
        )
    };
    ReturnActions {
        mark: if propped { "R2" } else { "R1" }.into(),
        height: h,
        propped,
        case: "helping".into(),
        curves: vec![
            Curve {
                symbol: "M_Ed".into(),
                words: "bending moment".into(),
                samples: samples(&m),
                values: m_values,
            },
            Curve { symbol: "V_Ed".into(), words: "shear".into(), samples: samples(&v), values: v_values },
        ],
    }
}

pub fn footing() -> FootingSketch {
    FootingSketch {
        mark: "F1".into(),
        of: "R1".into(),
        length: 890.0,
        beyond_junction: 0.0,
        beyond_free_end: 150.0,
        thickness: 150.0,
        words: "450 mm wide, seen".into(),
        resultant: 74.0,
        force: Action::new("N_F", "44.2 kN", ""),
        after: Some(Pressure {
            pressed: 1040.0,
            free: true,
            at_edge: Action::new("", "134.7 kN/m²", ""),
            rest: 0.402,
            at_rest: Some(Action::new("", "54.2 kN/m²", "")),
        }),
        before: Some((0.46, Action::new("", "62.1 kN/m²", "before"))),
        case: "G + Q".into(),
    }
}

pub fn edge(support: Support, why: &str) -> Edge {
    Edge { support, why: why.into(), held: None }
}

pub fn panels() -> [PanelElevation; 2] {
    let face = PanelFace {
        mark: "P1".into(),
        state: "before".into(),
        length: 5200.0,
        height: 2400.0,
        left: edge(Support::Continuous, "bonded corner"),
        right: edge(Support::Simple, "butted to W4"),
        top: edge(Support::Free, "floor not strapped"),
        base: edge(Support::Simple, "dpc"),
        openings: vec![Opening {
            x: 3400.0,
            y: 900.0,
            width: 1200.0,
            height: 1050.0,
            words: "window".into(),
            bearing: None,
        }],
    };
    let before = PanelElevation {
        face,
        walls: vec![WallBehind { x: 2600.0, thickness: 100.0, words: "W2".into(), removed: false }],
        values: vec![Action::new("W_Ed", "0.90 kN/m²", "")],
    };
    let mut after = before.clone();
    after.face.state = "after".into();
    after.face.top = edge(Support::Simple, "straps at 2 m");
    after.walls = vec![
        WallBehind { x: 2600.0, thickness: 100.0, words: "R1".into(), removed: false },
        WallBehind { x: 900.0, thickness: 100.0, words: "W3".into(), removed: true },
    ];
    [before, after]
}

pub fn wall_section() -> PanelSection {
    let mut layers = cavity_wall();
    layers.reverse();
    PanelSection {
        mark: "P1".into(),
        height: 2400.0,
        layers,
        floors: vec![
            Floor { level: 0.0, depth: 150.0, concrete: true, words: "ground slab".into() },
            Floor { level: 2625.0, depth: 225.0, concrete: false, words: "timber floor, strapped".into() },
        ],
        dpc: Some(-75.0),
        ties: Some((450.0, "4.94 ties per m²".to_owned())),
        wind: Some((Wind::Toward, Action::new("W_Ed", "0.90 kN/m²", "corner zone"))),
        precompression: Some((2, Action::new("N_G", "12.4 kN/m", "dead load, helping"))),
    }
}

pub fn wall(name: &str, from: (f64, f64), to: (f64, f64), thickness: f64, fate: Fate) -> PlanWall {
    PlanWall { name: name.into(), from, to, thickness, fate, openings: Vec::new() }
}

/// Two storeys over a beam on two lengths of wall.
pub fn stack() -> LoadStack {
    let wall = |from, to, mark: &str, foot: &str| StackWall {
        from,
        to,
        material: Material::Brick,
        mark: mark.into(),
        foot: foot.into(),
    };
    LoadStack {
        title: "cross wall".into(),
        storeys: vec![
            StackStorey {
                name: "ground".into(),
                height: 2700.0,
                walls: vec![
                    wall(0.0, 900.0, "R1", "41.5 + 19.7 kN"),
                    wall(3800.0, 5000.0, "R2", "48.8 + 22.3 kN"),
                ],
                removed: vec![(900.0, 3800.0)],
                beams: vec![(800.0, 3900.0, "B1".into())],
                loads: vec![
                    (0.0, 5000.0, "F1 1.36 + 2.55 kN/m".into()),
                    (0.0, 5000.0, "F2 1.84 + 3.45 kN/m".into()),
                ],
            },
            StackStorey {
                name: "first".into(),
                height: 2400.0,
                walls: vec![wall(0.0, 5000.0, "W2", "")],
                removed: vec![],
                beams: vec![],
                loads: vec![(0.0, 5000.0, "RF 4.6 + 2.4 kN/m".into())],
            },
        ],
    }
}

pub fn plans() -> [KeyPlan; 2] {
    let after = plan();
    let before = KeyPlan {
        name: "key-plan-before".into(),
        when: When::Before,
        marks: vec![],
        panels: after.panels[..1].to_vec(),
        beams: vec![],
        spans: vec![
            span("F1", (0.0, 2000.0), (4000.0, 2000.0)),
            span("F1", (4000.0, 2000.0), (8200.0, 2000.0)),
        ],
        ..after.clone()
    };
    [before, after]
}

fn span(mark: &str, from: (f64, f64), to: (f64, f64)) -> PlanMark {
    PlanMark { mark: mark.into(), from, to }
}

pub fn plan() -> KeyPlan {
    KeyPlan {
        name: "key-plan-after".into(),
        title: "ground floor".into(),
        when: When::After,
        walls: vec![
            wall("W1", (0.0, 0.0), (8200.0, 0.0), 277.5, Fate::Stays),
            wall("W2", (8200.0, 0.0), (8200.0, 7000.0), 277.5, Fate::Stays),
            wall("W3", (0.0, 7000.0), (8200.0, 7000.0), 277.5, Fate::Stays),
            wall("W4", (0.0, 0.0), (0.0, 7000.0), 277.5, Fate::Stays),
            wall("R1", (4000.0, 0.0), (4000.0, 780.0), 100.0, Fate::Stays),
            wall("R2", (4000.0, 6300.0), (4000.0, 7000.0), 100.0, Fate::Stays),
            wall("W5", (4000.0, 780.0), (4000.0, 6300.0), 100.0, Fate::Removed),
            wall("W6", (4000.0, 3500.0), (8200.0, 3500.0), 100.0, Fate::Removed),
            wall("W7", (0.0, 4200.0), (4000.0, 4200.0), 215.0, Fate::Added),
        ],
        marks: vec![
            PlanMark { mark: "R1".into(), from: (4000.0, 140.0), to: (4000.0, 780.0) },
            PlanMark { mark: "R2".into(), from: (4000.0, 6300.0), to: (4000.0, 6860.0) },
        ],
        panels: vec![
            PlanMark { mark: "P1".into(), from: (0.0, 0.0), to: (4000.0, 0.0) },
            PlanMark { mark: "P2".into(), from: (8200.0, 0.0), to: (8200.0, 7000.0) },
        ],
        beams: vec![PlanMark { mark: "B1".into(), from: (4000.0, 600.0), to: (4000.0, 6450.0) }],
        spans: vec![
            span("F1", (0.0, 2000.0), (8200.0, 2000.0)),
            span("F2", (2000.0, 3500.0), (2000.0, 7000.0)),
        ],
        north: 20.0,
        winds: vec![PlanWind::Upwards, PlanWind::Downwards],
    }
}

pub fn stability() -> StabilityPlan {
    let plan = plan();
    let share = |wall, before: Option<&str>, after: Option<&str>| Share {
        wall,
        before: before.map(Into::into),
        after: after.map(Into::into),
    };
    StabilityPlan {
        name: "stability-y".into(),
        title: plan.title,
        walls: plan.walls,
        shares: vec![
            share(1, Some("26 %"), Some("48 %")),
            share(3, Some("25 %"), Some("50 %")),
            share(6, Some("49 %"), None),
            share(4, None, Some("2 %")),
        ],
        wind: PlanWind::Upwards,
    }
}

pub fn links() -> Chain {
    let branch = |of: &str, known, beside: &str| Branch { of: of.into(), known, beside: beside.into() };
    let link = |name: &str, branches| ChainLink { name: name.into(), branches };
    Chain {
        links: vec![
            link("wind face", vec![branch("", Known::Calculated, "wind sheet")]),
            link("panel", vec![branch("", Known::Calculated, "sheets P1, P2")]),
            link("floor edge", vec![branch("E1, P1, P2", Known::Assumed, "hold point H3")]),
            link("diaphragm", vec![branch("", Known::Rule, "")]),
            link("bracing wall", vec![branch("", Known::Rule, "")]),
            link(
                "junction",
                vec![branch("R1", Known::Assumed, "hold point H4"), branch("R2", Known::Seen, "")],
            ),
            link("dpc", vec![branch("R1", Known::Calculated, "sheet R1"), branch("R2", Known::Seen, "")]),
            link("footing", vec![branch("", Known::Assumed, "hold point H5")]),
        ],
    }
}

pub fn bearing(stone: bool) -> BearingElevation {
    BearingElevation {
        mark: "B1-R1".into(),
        on: "R1".into(),
        beam: "B1".into(),
        length: 890.0,
        height: 2400.0,
        level: 2400.0,
        place: 790.0,
        bearing: 150.0,
        stone: stone.then(|| Stone { name: "PS 300".into(), place: 740.0, length: 300.0, height: 140.0 }),
        a_1: if stone { 0.0 } else { 25.0 },
        pressed: if stone { 200.0 } else { 150.0 },
        spread: if stone { (38.0, 890.0) } else { (22.0, 890.0) },
        force: Action::new("N_Edc", "37.8 kN", ""),
    }
}

pub fn across(stone: bool) -> BearingSection {
    BearingSection {
        mark: "B1-R1".into(),
        beam: "B1".into(),
        thickness: 140.0,
        material: Material::Block,
        bearing: 90.0,
        stone: stone.then_some((120.0, 140.0, 10.0)),
        eccentricity: 12.0,
        force: Action::new("N_Edc", "37.8 kN", ""),
    }
}
