//! Views of any valid job.

use proptest::prelude::*;

use super::super::hatch::Material;
use super::super::samples::*;
use super::super::*;

pub(super) fn layers() -> impl Strategy<Value = Vec<Layer>> {
    let leaf = |thickness, material| Layer::Leaf { thickness, material };
    prop_oneof![
        Just(cavity_wall()),
        Just(vec![leaf(100.0, Material::Block)]),
        Just(vec![leaf(215.0, Material::Brick)]),
        Just(vec![leaf(102.5, Material::Brick), Layer::Cavity { width: 50.0 }, leaf(102.5, Material::Brick)]),
    ]
}

fn maybe<T: std::fmt::Debug + Clone>(value: T) -> impl Strategy<Value = Option<T>> {
    prop_oneof![Just(None), Just(Some(value))]
}

prop_compose! {
    pub(super) fn any_elevation()(
        length in 200..2400_i32, height in 1800..3600_i32, wall_layers in layers(), left: bool, dpc: bool,
        shares in proptest::collection::vec(0.0..=1.0_f64, 1..=6), words: bool, toward: bool,
        prop in maybe("W3, W4 and W7".to_owned()), removed in proptest::option::of(200.0..6000.0_f64),
        forces in 0..=2_usize, moment in maybe(Action::new("M_head", "11.10 kNm", "storey above")),
        line in maybe(Action::new("w_Ed", "12.95 kN/m", "")), tributary in maybe(2612.5),
    ) -> ReturnElevation {
        let length = f64::from(length);
        let loads = shares.iter().enumerate().map(|(i, share)| PlacedLoad {
            x: (share * length).round(),
            action: Action::new(&format!("N_{}", i + 1), &format!("{}.4 kN", 7 * i + 2), if words { "new beam B1" } else { "" }),
        }).collect();
        let all = elevation().head_forces;
        ReturnElevation {
            length, height: f64::from(height), wall: if left { Side::Left } else { Side::Right }, wall_layers, prop, dpc,
            removed, loads, head_forces: all[..forces].to_vec(), head_moment: moment, through_floor: line.is_none(), line_load: line, tributary,
            wind: if toward { Wind::Toward } else { Wind::Away }, ..elevation()
        }
    }
}

prop_compose! {
    pub(super) fn any_section()(
        length in 200..2400_i32, layers in layers(), wall_layers in layers(), left: bool, bonded: bool,
        flange in proptest::option::of(0.3..1.0_f64), share in 0.05..=1.0_f64, at_wall: bool, two: bool,
    ) -> ReturnSection {
        let length = f64::from(length);
        let leaf = wall_layers[0].thickness();
        let flange = flange.filter(|_| bonded).map(|f| Flange { width: (f * 12.0 * leaf).round(), thickness: leaf });
        let total = length + flange.map_or(0.0, |f| f.thickness);
        let compressed = (share * total).round().max(1.0);
        let (start, sense) = if at_wall { (length - total, 1.0) } else { (length, -1.0) };
        let base = section();
        let stress = base.stress.map(|stress| Stress {
            toe: if at_wall { Toe::Wall } else { Toe::Free },
            compressed, middle: length / 2.0, resultant: start + sense * compressed / 3.0,
            at_heel: (compressed == total).then(|| (0.3, Action::new("", "0.61 N/mm²", ""))),
            ..stress
        });
        ReturnSection {
            length, layers, loaded: 0, wall: if left { Side::Left } else { Side::Right }, wall_layers, bonded, flange,
            stress: if two { stress } else { None }, ..solid_section()
        }
    }
}

prop_compose! {
    pub(super) fn any_footing()(
        length in 200..2500_i32, thickness in 60..900_i32, beyond in (0..300_i32, 0..300_i32), place in -0.49..0.49_f64,
        before in proptest::option::of(0.1..3.0_f64), gone: bool, long: bool,
    ) -> FootingSketch {
        let (length, thickness) = (f64::from(length), f64::from(thickness));
        let (junction, free) = (f64::from(beyond.0), f64::from(beyond.1));
        let whole = length + junction + free;
        let e = place.abs();
        let lifts = e > 1.0 / 6.0;
        let base = footing();
        let after = base.after.filter(|_| !gone).map(|a| Pressure {
            pressed: if lifts { (3.0 * (0.5 - e) * whole).round() } else { whole }, free: place >= 0.0,
            rest: if lifts { 0.0 } else { (1.0 - 6.0 * e) / (1.0 + 6.0 * e) }, at_rest: a.at_rest.clone().filter(|_| !lifts), ..a
        });
        FootingSketch {
            length, thickness, beyond_junction: junction, beyond_free_end: free, resultant: (place * whole).round(), after,
            before: before.map(|b| (b, Action::new("", "62.1 kN/m²", "before"))),
            words: if long { "1200 mm wide, assumed" } else { "450 mm wide, seen" }.into(), ..base
        }
    }
}

pub(super) fn any_edge() -> impl Strategy<Value = Edge> {
    prop_oneof![
        Just(edge(Support::Free, "")),
        Just(edge(Support::Free, "opening")),
        Just(edge(Support::Simple, "strapped floor")),
        Just(edge(Support::Continuous, "bonded to return R1")),
    ]
}

prop_compose! {
    pub(super) fn any_panel()(
        length in 800..9000_i32, height in 2000..4000_i32, edges in [any_edge(), any_edge(), any_edge(), any_edge()],
        opening in proptest::option::of((0.0..0.5_f64, 0.2..0.5_f64)), walls in proptest::collection::vec((0.0..1.0_f64, any::<bool>()), 0..3),
    ) -> PanelElevation {
        let (length, height) = (f64::from(length), f64::from(height));
        let [left, right, top, base] = edges;
        let face = PanelFace {
            mark: "P1".into(), state: "after".into(), length, height, left, right, top, base,
            openings: opening.map(|(x, w)| Opening {
                x: (x * length).round(), y: (0.3 * height).round(), width: (w * length).round(), height: (0.4 * height).round(), words: "window".into(), bearing: None,
            }).into_iter().collect(),
        };
        PanelElevation {
            face,
            walls: walls.into_iter().enumerate().map(|(i, (x, removed))| WallBehind {
                x: (x * length).round(), thickness: 100.0, words: format!("W{i}"), removed,
            }).collect(),
            values: vec![Action::new("W_Ed", "0.90 kN/m²", "")],
        }
    }
}

prop_compose! {
    pub(super) fn any_plan()(
        w in 4000..12000_i32, d in 4000..11000_i32, inner in proptest::collection::vec((0.05..0.95_f64, any::<bool>(), 0..3_usize, 0.1..1.0_f64), 0..=10),
        north in 0.0..360.0_f64, bay in 0.05..0.95_f64,
    ) -> [KeyPlan; 2] {
        let (w, d) = (f64::from(w), f64::from(d));
        let mut walls = vec![
            wall("W1", (0.0, 0.0), (w, 0.0), 302.5, Fate::Stays), wall("W2", (w, 0.0), (w, d), 302.5, Fate::Stays),
            wall("W3", (0.0, d), (w, d), 302.5, Fate::Stays), wall("W4", (0.0, 0.0), (0.0, d), 302.5, Fate::Stays),
        ];
        let panels = vec![PlanMark { mark: "P1".into(), from: (0.0, 0.0), to: (w, 0.0) }];
        let mut marks = Vec::new();
        for (i, (at, upright, fate, reach)) in inner.into_iter().enumerate() {
            let fate = [Fate::Stays, Fate::Removed, Fate::Added][fate];
            let (from, to) = if upright { ((at * w, 0.0), (at * w, reach * d)) } else { ((0.0, at * d), (reach * w, at * d)) };
            walls.push(wall(&format!("W{}", i + 5), from, to, 100.0, fate));
            if fate == Fate::Stays {
                marks.push(PlanMark { mark: format!("R{i}"), from, to });
            }
        }
        let span = |y: f64, from: f64, to: f64| PlanMark { mark: "F1".into(), from: (from * w, y * d), to: (to * w, y * d) };
        let after = KeyPlan {
            name: "key-plan-after".into(), title: "ground floor".into(), when: When::After, walls, marks, panels, beams: vec![],
            spans: vec![span(bay, 0.0, 1.0)], north: north.round(), winds: vec![PlanWind::Upwards, PlanWind::Leftwards],
        };
        let spans = vec![span(bay, 0.0, bay), span(bay, bay, 1.0)];
        [KeyPlan { name: "key-plan-before".into(), when: When::Before, marks: vec![], spans, ..after.clone() }, after]
    }
}

prop_compose! {
    pub(super) fn any_chain()(
        rows in proptest::collection::vec(proptest::collection::vec((0..4_usize, any::<bool>(), 0..4_usize), 1..7), 1..9),
    ) -> Chain {
        const NAMES: [&str; 8] = ["wind face", "panel", "floor edge", "diaphragm", "bracing wall", "junction", "dpc", "footing"];
        const KNOWN: [Known; 4] = [Known::Calculated, Known::Rule, Known::Seen, Known::Assumed];
        const OF: [&str; 4] = ["", "R1", "NIB-NORTH-12, R2", "R1, R2, R3, party wall, flank wall of the house"];
        let branch = |(known, beside, of): (usize, bool, usize)| Branch {
            of: OF[of].into(),
            known: KNOWN[known],
            beside: if beside { "sheets R1, R2, NIB-NORTH-12".into() } else { String::new() },
        };
        Chain {
            links: rows.into_iter().zip(NAMES).map(|(row, name)| ChainLink {
                name: name.into(), branches: row.into_iter().map(branch).collect(),
            }).collect(),
        }
    }
}

prop_compose! {
    pub(super) fn any_bearing()(
        length in 300..2600_i32, height in 1800..3200_i32, sunk in 0..300_i32, b in 0.1..0.6_f64, at in 0.0..=1.0_f64,
        stone in proptest::option::of((0.0..=1.0_f64, 65..300_i32)), wide in 0.0..=1.0_f64,
    ) -> BearingElevation {
        let (length, height) = (f64::from(length), f64::from(height));
        let level = height - f64::from(sunk);
        let bearing = (b * length).clamp(60.0, 300.0).round();
        let place = (bearing / 2.0 + at * (length - bearing)).round().clamp(bearing / 2.0, length - bearing / 2.0);
        let stone = stone.map(|(grow, high)| {
            let long = (bearing + grow * (length - bearing)).floor();
            let middle = place.clamp(long / 2.0, length - long / 2.0);
            Stone { name: "PS 300".into(), place: middle, length: long, height: f64::from(high) }
        });
        let off = |x: f64, long: f64| (x - long / 2.0).min(length - x - long / 2.0).max(0.0);
        let a_1 = stone.as_ref().map_or(off(place, bearing), |s| off(s.place, s.length));
        let room = stone.as_ref().map_or(bearing, |s| s.length - 2.0 * (place - s.place).abs());
        let pressed = bearing + wide * (room - bearing).max(0.0);
        let run = pressed / 2.0 + (level - stone.as_ref().map_or(0.0, |s| s.height)) / 2.0 / 3.0_f64.sqrt();
        let spread = ((place - run).max(0.0).round(), (place + run).min(length).round());
        BearingElevation { length, height, level, place, bearing, a_1, pressed, spread, stone, ..super::samples::bearing(false) }
    }
}

fn zone(out: PlanWind, ends: (f64, f64), name: &str, presses: bool, part: f64) -> WallZone {
    WallZone { piece: Piece { out, ends }, name: name.into(), presses, part, value: format!("{part:.3}") }
}

pub(super) fn wind_plan(size: (f64, f64), a: f64, parts: [f64; 4], panel: (f64, f64)) -> WindPlan {
    let (w, h) = size;
    let (cut, aside) = (a * w, [PlanWind::Downwards, PlanWind::Upwards]);
    let mut zones = vec![
        zone(PlanWind::Leftwards, (0.0, h), "D", true, parts[0]),
        zone(PlanWind::Rightwards, (0.0, h), "E", false, parts[1]),
    ];
    for out in aside {
        zones.push(zone(out, (0.0, cut), "A", false, parts[2]));
        zones.push(zone(out, (cut, w), "B", false, parts[3]));
    }
    WindPlan {
        name: "wind-x".into(),
        words: "wind along x, onto left".into(),
        size,
        between: vec![((w / 2.0, 0.0), (w / 2.0, h))],
        wind: PlanWind::Rightwards,
        overall: ("q_net".into(), "0.812 kN/m²".into()),
        zones,
        panels: vec![WindPanel {
            mark: "P1".into(),
            piece: Piece { out: PlanWind::Downwards, ends: (panel.0 * w / 2.0, w / 2.0 + panel.1 * w / 2.0) },
            value: "0.955 kN/m²".into(),
        }],
        remark: String::new(),
    }
}

pub(super) fn wind_elevation_view(depth: f64, storeys: &[f64], roof: f64) -> WindElevation {
    let mut levels = Vec::new();
    let mut foot = 0.0;
    for (n, height) in storeys.iter().enumerate() {
        let head = foot + height;
        let over = storeys.get(n + 1).map_or(roof / 2.0, |next| next / 2.0);
        levels.push(WindLevel {
            height: head,
            strip: (foot + height / 2.0, head + over),
            force: Action::new("F_k", "12.9 kN", ""),
            roof: (n + 1 == storeys.len()).then(|| Action::new("", "8.88 kN", "of it from the roof")),
        });
        foot = head;
    }
    WindElevation {
        name: "forces-x".into(),
        words: "wind along x".into(),
        front: "8.30 m".into(),
        depth,
        roof: vec![(0.0, foot), (0.5, foot + roof), (1.0, foot)],
        pressure: Action::new("q_net", "0.648 kN/m²", "overall pressure"),
        levels,
        foot: Action::new("", "26.5 kN", "at the foot"),
    }
}
