//! From a building to the model of a panel.

use super::model::model;
use super::tests::{masonry, run, span};
use crate::building::*;
use crate::quantity::{Length, LineLoad, PerArea, Stress};
use crate::standards::masonry::Edge::{Continuous as C, Simple as S};

fn cause<T>(value: T) -> Cause<T> {
    Cause { value, reason: "test".to_owned() }
}

/// An invented house with one cavity wall: 102.5 mm outside, 100 mm loaded inside.
fn house() -> Building {
    let text = String::new;
    let leaf = |t: f64, loaded| Leaf {
        material: "any".to_owned(),
        thickness: Length::new(t),
        chase: Length::ZERO,
        loaded,
    };
    let made = Person { name: text(), letters: text(), qualification: None, contact: None, date: text() };
    Building {
        identity: Identity {
            number: text(),
            title: text(),
            address: Vec::new(),
            client: text(),
            authority: text(),
            status: Status::Preliminary,
            visited: None,
            building: text(),
            work: text(),
        },
        signatures: Signatures { made, checked: None },
        revisions: Vec::new(),
        basis: Basis {
            execution_class: 2,
            unit_category: 2,
            gamma_m_compression: None,
            gamma_m_flexure: None,
            gamma_m_shear: None,
            helping_factor: cause(0.9),
        },
        wind: Wind { route: WindRoute::Stated, stated: None, site: None },
        materials: Vec::new(),
        build_ups: vec![BuildUp {
            name: "outer wall".to_owned(),
            leaves: vec![leaf(102.5, false), leaf(100.0, true)],
            cavity: Some(Length::new(75.0)),
            ties: Some(PerArea::new(2.5e-6)),
            tie_strength: None,
            collar_joint: false,
        }],
        storeys: Vec::new(),
        area_loads: Vec::new(),
        neighbours: Vec::new(),
        floors: Vec::new(),
        beams: Vec::new(),
        plan: Vec::new(),
        north: 0.0,
        removed: Removed {
            wall: text(),
            build_up: text(),
            length: Length::ZERO,
            storey: text(),
            carried: text(),
            braced: text(),
        },
        stability: None,
        returns: Vec::new(),
        floor_edges: Vec::new(),
        diaphragm: None,
        collapse: None,
        panels: Vec::new(),
        links: Vec::new(),
        assumptions: Vec::new(),
        hold_points: Vec::new(),
        photographs: Vec::new(),
        bearings: Vec::new(),
        padstones: Vec::new(),
        responsible: Vec::new(),
        found: Found::default(),
        practice: None,
        warnings: Vec::new(),
    }
}

fn panel() -> Panel {
    Panel {
        mark: "P1".to_owned(),
        title: String::new(),
        build_up: "outer wall".to_owned(),
        storey: String::new(),
        height: Length::new(2400.0),
        on: None,
        dead_above: LineLoad::new(8.5),
        lift_above: LineLoad::ZERO,
        wind: None,
        route: PanelRoute::Flexure,
        sharing: Sharing::Strength,
        before: span(2400.0, [S, S, C, C]),
        after: span(3600.0, [S, S, C, S]),
        edges_taken: false,
        wall_at: None,
        arching: None,
    }
}

#[test]
fn the_loaded_leaf_alone_has_the_load_above() {
    let (b, p) = (house(), panel());
    let leaves = [masonry(5.0, 0.4, Some(1.1)), masonry(3.5, 0.25, Some(0.45))];
    let m = model(&b, &p, &leaves, Stress::new(0.5e-3), "site").expect("a build-up of two leaves");
    assert_eq!((m.loaded(), m.leaf_name(0), m.leaf_name(1)), (1, "outer leaf", "inner leaf"));
    assert_eq!(m.leaves[0].G_above, LineLoad::ZERO);
    assert_eq!(m.leaves[1].G_above, LineLoad::new(8.5));
    assert_eq!((m.leaves[0].t, m.leaves[1].t), (Length::new(102.5), Length::new(100.0)));
    assert_eq!((m.q_net, m.q_source.as_str()), (Stress::new(0.5e-3), "site"));
    assert!(run(&m).outside.is_empty());
}

#[test]
fn a_pressure_of_the_panel_itself_comes_first_with_its_reason() {
    let (b, mut p) = (house(), panel());
    p.wind = Some(cause(Stress::new(0.7e-3)));
    let leaves = [masonry(5.0, 0.4, Some(1.1)), masonry(3.5, 0.25, Some(0.45))];
    let m = model(&b, &p, &leaves, Stress::new(0.5e-3), "site").expect("a build-up of two leaves");
    assert_eq!((m.q_net, m.q_source.as_str()), (Stress::new(0.7e-3), "stated: test"));
    assert!(model(&b, &p, &leaves[..1], Stress::ZERO, "site").is_none(), "one strength for two leaves");
    p.build_up = "unknown".to_owned();
    assert!(model(&b, &p, &leaves, Stress::ZERO, "site").is_none());
}
