//! A take-down by hand: the end terrace of the demo jobs, down to the return at the party wall.

use perpend::building::{LED, take_down};

const JOB: &str = include_str!("../../jobs/end-terrace.toml");

fn close(got: f64, hand: f64) {
    assert!((got - hand).abs() < 1e-9 * hand.abs().max(1.0), "{got}, by hand {hand}");
}

/// Each step with its figures; forces in N, lengths in mm, so kN/m is N/mm.
#[test]
fn loads_on_the_return_at_the_party_wall() {
    let b = perpend::job::read("end-terrace.toml", JOB).unwrap_or_else(|r| panic!("{}", r.render(false)));
    // Floors of 3.4 m and 4.6 m span meet on the line of the cross wall: half of each, 1.7 m and 2.3 m.
    let (f1, f2) = (0.8 * 1.7, 0.8 * 2.3);
    // What the wind lifts comes from the wind sheet, by hand in `hand_wind_house`.
    let uplift = b.area_loads.iter().find(|a| a.name == "roof").expect("a roof").uplift.base() * 1e3;
    // The roof has the wall between the bedrooms under its middle, at the same 3.4 m: 1.7 m + 2.3 m.
    let roof = 1.15 * (1.7 + 2.3);
    // Half brick, 102.5 mm of 20 kN/m³, 2.4 m high under the roof.
    let wall = 0.1025 * 20.0 * 2.4;
    // The beam is 3.10 m long from 0.80 m; all on it is even, so each end has half of it.
    let half = 3100.0 / 2.0;
    let beam = [(f1 + f2 + roof + wall + 0.35) * half, (1.5 * 4.0 + 0.6 * 4.0) * half, uplift * 4.0 * half];
    let r1 = &b.returns[0];
    assert_eq!(r1.loads.len(), 4, "two floors, the wall above and the beam");
    let find = |what: &str| r1.loads.iter().find(|l| l.what == what).unwrap_or_else(|| panic!("{what}"));
    let on = find("beam B1");
    close(on.dead.base(), beam[0]);
    close(on.imposed.base(), beam[1]);
    close(on.uplift.base(), beam[2]);
    // Middle of a bearing of 150 mm that begins at 0.80 m, from the face of the wall met, half of 215 mm off its line.
    close(on.at.base(), 875.0 - 107.5);
    // Beside the beam the floors and the wall above stand on the first 0.80 m of the return itself.
    close(find("floor F1").dead.base(), f1 * 800.0);
    close(find("floor F2").imposed.base(), 1.5 * 2.3 * 800.0);
    close(find("bedroom wall above").dead.base(), (roof + wall) * 800.0);
    close(find("bedroom wall above").at.base(), 400.0 - 107.5);
    assert!(r1.loads.iter().all(|l| l.source == LED));
}

/// The rear wall's two openings of the ground storey and the first: what is over them goes to their sides.
#[test]
fn the_rear_wall_beside_its_door() {
    let b = perpend::job::read("end-terrace.toml", JOB).unwrap_or_else(|r| panic!("{}", r.render(false)));
    let down = take_down(&b).expect("floors").expect("a path");
    let (_, on) = down.after.wall(&b, "rear wall", 0).expect("it stands there");
    // Two half-brick leaves: 4.1 kN/m². Upstairs 2.4 m high, a window of 1.2 m by 1.2 m from 1.7 m, sill 0.9 m.
    let per_area = 2.0 * 0.1025 * 20.0;
    let (upstairs, over, sill) = (per_area * 2.4, per_area * 0.3, per_area * 0.9);
    let (roof, floor) = (1.15 * 1.7, 0.8 * 1.7);
    // Upstairs the roof over the window, 1.2 m of it, goes half to each side, with the wall over it.
    let side = (roof + over) * 1200.0 / 2.0;
    // The door below, 1.8 m from 1.1 m, stands under 0.6 m of wall, under the window's left side and under
    // 1.2 m of sill. Its left pier, 1.1 m: roof, upstairs wall and floor on it, and its share of the door.
    let line = roof + upstairs + floor;
    let head = line * 1100.0;
    // On the door: 0.6 m of wall with roof from 1.1 m, the side's point at 1.7 m, the sill from 1.7 to 2.9 m, the
    // side's point at 2.9 m, and the floor over all of it. The point at 2.9 m lies on the right jamb.
    let lever = |at: f64| (at - 1100.0) / 1800.0;
    let door = (roof + upstairs) * 600.0 * (1.0 - lever(1400.0))
        + side * (1.0 - lever(1700.0))
        + sill * 1200.0 * (1.0 - lever(2300.0))
        + floor * 1800.0 * 0.5;
    close(on.piers[0].head[0], head + door);
}

/// A roof that spans onto the flank wall: half of its 5 m presses and lifts the wall's panels.
#[test]
fn a_roof_presses_and_lifts_the_panels_of_its_wall() {
    let roof = JOB.find("mark = \"RF\"").expect("the roof");
    let (before, after) = JOB.split_at(roof);
    let text = format!("{before}{}", after.replacen("spans = \"y\"", "spans = \"x\"", 1));
    let b = perpend::job::read("end-terrace.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
    let uplift = b.area_loads.iter().find(|a| a.name == "roof").expect("a roof").uplift.base() * 1e3;
    assert!(uplift > 0.3, "{uplift}");
    // Upstairs leaf of the flank wall, 102.5 mm of 20 kN/m³, 2.4 m high, and half of the roof.
    let p = b.panels.iter().find(|p| p.mark == "P1").expect("the panel");
    close(p.dead_above.base(), 0.1025 * 20.0 * 2.4 + 1.15 * 2.5);
    close(p.lift_above.base(), uplift * 2.5);
}
