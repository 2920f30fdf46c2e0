use super::*;

const REACH: f64 = 150.0;

fn place(along: Axis, at: f64, from: f64, to: f64) -> Place {
    Place { along, at, from, to }
}

fn wall(storey: usize, place: Place, weight: f64) -> Wall {
    Wall { storey, place, thickness: 100.0, weight, openings: Vec::new() }
}

/// Two walls along y, 4 m apart and 3 m long, a floor of 2 + 3 kN/m² spanning x between them.
fn table() -> Model {
    let y = |at| place(Axis::Y, at, 0.0, 3000.0);
    Model {
        storeys: 1,
        walls: vec![wall(0, y(0.0), 5.0), wall(0, y(4000.0), 5.0)],
        floors: vec![Floor {
            storey: 0,
            x: (0.0, 4000.0),
            y: (0.0, 3000.0),
            spans: Axis::X,
            load: [2e-3, 3e-3, 0.0],
        }],
        reach: REACH,
        ..Model::default()
    }
}

fn near(a: Triple, b: Triple) {
    for i in 0..3 {
        assert!((a[i] - b[i]).abs() < 1e-6, "{a:?} is not {b:?}");
    }
}

#[test]
fn a_floor_halves_its_load() {
    let d = lead_down(&table()).expect("a path");
    // 2 kN/m² on 2 m by 3 m is 12 kN; the wall weighs 5 N/mm on 3 m.
    near(d.walls[0].head.total(), [12e3, 18e3, 0.0]);
    near(d.walls[1].foot.total(), [27e3, 18e3, 0.0]);
    near(d.applied, d.ground);
}

/// A beam takes the place of a wall in mid-span: by hand, 4 kN/m and 6 kN/m on 3 m, so 6 and 9 kN to each
/// end, with its own 0.3 kN/m on 3.2 m; the walls across it get points.
#[test]
fn a_beam_takes_the_middle_of_a_floor() {
    let mut m = table();
    m.floors[0].x = (0.0, 8000.0);
    m.walls[1].place.at = 8000.0;
    m.walls.push(wall(0, place(Axis::X, 0.0, 0.0, 8000.0), 5.0));
    m.walls.push(wall(0, place(Axis::X, 3000.0, 0.0, 8000.0), 5.0));
    m.beams.push(Beam {
        storey: 0,
        place: place(Axis::Y, 4000.0, -50.0, 3050.0),
        weight: 0.3,
        bearing: 100.0,
    });
    let d = lead_down(&m).expect("a path");
    let own = 0.3 * 3100.0 / 2.0;
    near(d.beams[0].reactions[0], [12e3 + own, 18e3, 0.0]);
    near(d.beams[0].reactions[1], [12e3 + own, 18e3, 0.0]);
    assert_eq!(d.beams[0].under, [Some(Support::Wall(2)), Some(Support::Wall(3))]);
    assert_eq!(d.walls[2].head.points[0].at, 4000.0);
    near(d.applied, d.ground);
}

/// By hand: 6 kN/m on a wall 3 m long with a 1 m hole from 1.5 m: its load 6 kN goes 3 and 3 to the sides; the
/// wall over it weighs 2 N/mm.
#[test]
fn over_an_opening_the_load_goes_to_its_sides() {
    let mut m = table();
    m.walls[0].openings.push(Opening { from: 1500.0, to: 2500.0, over: 2.0, under: 1.0 });
    let d = lead_down(&m).expect("a path");
    let [left, right] = d.walls[0].piers[..] else { panic!("two piers") };
    near(left.head, [4.0 * 1500.0 + 2e3, 6.0 * 1500.0 + 3e3, 0.0]);
    near(right.head, [4.0 * 500.0 + 2e3, 6.0 * 500.0 + 3e3, 0.0]);
    near(left.foot, [left.head[0] + 5.0 * 1500.0 + 1e3, left.head[1], 0.0]);
    assert!((left.moment[0] - 2e3 * 750.0).abs() < 1e-6, "the side by the hole is pressed harder");
    near(d.applied, d.ground);
}

#[test]
fn a_wall_above_stands_on_the_wall_and_the_beam_below() {
    let mut m = table();
    m.storeys = 2;
    m.walls.push(wall(1, place(Axis::Y, 0.0, 0.0, 3000.0), 4.0));
    m.walls[0].place.to = 1000.0;
    m.walls.push(wall(0, place(Axis::Y, 0.0, 2800.0, 3000.0), 5.0));
    m.beams.push(Beam { storey: 0, place: place(Axis::Y, 0.0, 900.0, 2900.0), weight: 0.0, bearing: 100.0 });
    let d = lead_down(&m).expect("a path");
    // 4 N/mm of wall and 4 N/mm of floor on 2 m of beam.
    near(d.beams[0].loads.total(), [16e3, 12e3, 0.0]);
    near(d.beams[0].reactions[0], [8e3, 6e3, 0.0]);
    near(d.walls[0].head.total(), [8e3 + 8.0 * 900.0, 6e3 + 6.0 * 900.0, 0.0]);
    near(d.applied, d.ground);
}

#[test]
fn what_floats_is_named() {
    let mut m = table();
    m.walls[1].place.to = 2000.0;
    assert_eq!(lead_down(&m), Err(Trouble::FloorFloats { floor: 0, from: 2000.0, to: 3000.0 }));
    let mut m = table();
    m.storeys = 2;
    m.walls.push(wall(1, place(Axis::Y, 0.0, 0.0, 3500.0), 4.0));
    assert_eq!(lead_down(&m), Err(Trouble::WallFloats { wall: 2, from: 3000.0, to: 3500.0 }));
    let mut m = table();
    m.beams.push(Beam { storey: 0, place: place(Axis::X, 1500.0, 0.0, 3500.0), weight: 0.1, bearing: 100.0 });
    assert_eq!(lead_down(&m), Err(Trouble::BeamFloats { beam: 0, end: 1 }));
    let mut m = table();
    m.walls[0].openings.push(Opening { from: 0.0, to: 900.0, over: 1.0, under: 0.0 });
    assert_eq!(lead_down(&m), Err(Trouble::NoJamb { wall: 0, opening: 0 }));
}

#[test]
fn beams_carry_beams_but_not_in_a_ring() {
    let mut m = table();
    m.beams.push(Beam {
        storey: 0,
        place: place(Axis::X, 1500.0, -50.0, 4050.0),
        weight: 0.1,
        bearing: 100.0,
    });
    m.walls.push(wall(0, place(Axis::X, 0.0, 0.0, 4000.0), 1.0));
    m.beams.push(Beam {
        storey: 0,
        place: place(Axis::Y, 2000.0, -50.0, 1550.0),
        weight: 0.1,
        bearing: 100.0,
    });
    let d = lead_down(&m).expect("a path");
    assert_eq!(d.beams[1].under, [Some(Support::Wall(2)), Some(Support::Beam(0))]);
    near(d.applied, d.ground);
}

/// A house of `bays` rooms in a row and `storeys` storeys, from a list of numbers: lengths, loads, openings.
fn house(bays: usize, storeys: usize, dice: &mut impl FnMut() -> f64) -> Model {
    let mut m = Model { storeys, reach: REACH, ..Model::default() };
    let depth = 3000.0 + 4000.0 * dice();
    let mut xs = vec![0.0];
    for _ in 0..bays {
        xs.push(xs[xs.len() - 1] + 2500.0 + 2500.0 * dice());
    }
    let end = xs[bays];
    for storey in 0..storeys {
        for (i, &x) in xs.iter().enumerate() {
            let mut w = wall(storey, place(Axis::Y, x, 0.0, depth), 3.0 + 4.0 * dice());
            if dice() < 0.6 {
                let from = 400.0 + 800.0 * dice();
                let to = from + 600.0 + 900.0 * dice();
                w.openings.push(Opening { from, to, over: 2.0 * dice(), under: dice() });
            }
            // A wall inside gives way to a beam at the lowest storey.
            let inside = i > 0 && i < bays && storey == 0 && dice() < 0.5;
            if inside {
                let nib = 600.0 + 500.0 * dice();
                let (first, last) = (place(Axis::Y, x, 0.0, nib), place(Axis::Y, x, depth - nib, depth));
                m.walls.push(wall(storey, first, 4.0));
                m.walls.push(wall(storey, last, 4.0));
                m.beams.push(Beam {
                    storey,
                    place: place(Axis::Y, x, nib - 100.0, depth - nib + 100.0),
                    weight: 0.4,
                    bearing: 100.0,
                });
            } else {
                m.walls.push(w);
            }
        }
        for y in [0.0, depth] {
            m.walls.push(wall(storey, place(Axis::X, y, 0.0, end), 5.0));
        }
        let along = if dice() < 0.7 { Axis::X } else { Axis::Y };
        let load = [1e-3 * dice(), 2e-3 * dice(), if storey + 1 == storeys { 1e-3 * dice() } else { 0.0 }];
        m.floors.push(Floor { storey, x: (0.0, end), y: (0.0, depth), spans: along, load });
    }
    m
}

/// Numbers from 0 to 1, always the same.
fn dice(seed: u64) -> impl FnMut() -> f64 {
    let mut state = seed.wrapping_mul(0x9E37_79B9_7F4A_7C15) | 1;
    move || {
        state ^= state << 13;
        state ^= state >> 7;
        state ^= state << 17;
        (state >> 11) as f64 / (1_u64 << 53) as f64
    }
}

fn same(a: Triple, b: Triple, scale: f64) -> bool {
    (0..3).all(|i| (a[i] - b[i]).abs() <= 1e-9 * scale)
}

#[test]
fn all_that_goes_in_comes_out() {
    for seed in 1..400 {
        let mut dice = dice(seed);
        let m = house(1 + (seed % 4) as usize, 1 + (seed % 3) as usize, &mut dice);
        let d = lead_down(&m).unwrap_or_else(|t| panic!("house {seed}: {t:?}"));
        assert!(
            same(d.applied, d.ground, d.applied[0]),
            "house {seed}: {:?} in, {:?} out",
            d.applied,
            d.ground
        );
        for (w, on) in d.walls.iter().enumerate() {
            let piers = on.piers.iter().fold([0.0; 3], |sum, p| load::add(sum, p.foot));
            let sills: f64 = m.walls[w].openings.iter().map(|o| o.under * (o.to - o.from)).sum();
            let foot = load::add(piers, [sills, 0.0, 0.0]);
            assert!(
                same(foot, on.foot.total(), d.applied[0]),
                "house {seed}, wall {w}: piers lose something"
            );
        }
    }
}

/// A house turned on its side, and one mirrored, carry the same loads in the same walls.
#[test]
fn turned_and_mirrored_houses_carry_the_same() {
    for seed in 1..100 {
        let mut numbers = dice(seed);
        let m = house(1 + (seed % 4) as usize, 1 + (seed % 3) as usize, &mut numbers);
        let d = lead_down(&m).expect("a path");
        for changed in [turned(&m), mirrored(&m)] {
            let c = lead_down(&changed).expect("a path");
            for (w, (a, b)) in d.walls.iter().zip(&c.walls).enumerate() {
                assert!(same(a.head.total(), b.head.total(), d.applied[0]), "house {seed}, wall {w}");
                assert!(same(a.foot.total(), b.foot.total(), d.applied[0]), "house {seed}, wall {w}");
            }
        }
    }
}

fn turned(m: &Model) -> Model {
    let mut out = m.clone();
    let turn = |p: &mut Place| p.along = p.along.across();
    out.walls.iter_mut().for_each(|w| turn(&mut w.place));
    out.beams.iter_mut().for_each(|b| turn(&mut b.place));
    for f in &mut out.floors {
        (f.x, f.y, f.spans) = (f.y, f.x, f.spans.across());
    }
    out
}

/// Mirrored in y.
fn mirrored(m: &Model) -> Model {
    let mut out = m.clone();
    let flip = |p: &mut Place| match p.along {
        Axis::Y => (p.from, p.to) = (-p.to, -p.from),
        Axis::X => p.at = -p.at,
    };
    for w in &mut out.walls {
        flip(&mut w.place);
        if w.place.along == Axis::Y {
            for o in &mut w.openings {
                (o.from, o.to) = (-o.to, -o.from);
            }
            w.openings.reverse();
        }
    }
    out.beams.iter_mut().for_each(|b| flip(&mut b.place));
    out.floors.iter_mut().for_each(|f| f.y = (-f.y.1, -f.y.0));
    out
}

/// A wall inside moved by 1 mm changes what any wall carries by a thousandth of a room's load at most.
#[test]
fn a_wall_moved_by_a_millimetre_changes_nothing_by_a_jump() {
    for seed in 1..100 {
        let mut numbers = dice(seed);
        let m = house(3, 1 + (seed % 3) as usize, &mut numbers);
        let x =
            m.walls.iter().filter(|w| w.place.along == Axis::Y).map(|w| w.place.at).nth(1).expect("a wall");
        let mut moved = m.clone();
        let shift = |p: &mut Place| {
            if p.along == Axis::Y && p.at == x {
                p.at += 1.0;
            }
        };
        moved.walls.iter_mut().for_each(|w| shift(&mut w.place));
        moved.beams.iter_mut().for_each(|b| shift(&mut b.place));
        let (a, b) = (lead_down(&m).expect("a path"), lead_down(&moved).expect("a path"));
        for (one, other) in a.walls.iter().zip(&b.walls) {
            for i in 0..3 {
                let change = (one.foot.total()[i] - other.foot.total()[i]).abs();
                assert!(change <= 0.002 * a.applied[i] + 1e-9, "house {seed}: {change} N");
            }
        }
    }
}

/// A floor comes to its end walls from within, to a wall under it from both sides as its spans are; a beam
/// across comes from the side on which it lies, what stands above from none.
#[test]
fn floors_and_beams_come_from_their_sides() {
    let mut m = table();
    // Spans of 1 m and 3 m: half of each on the middle wall.
    m.walls.push(wall(0, place(Axis::Y, 1000.0, 0.0, 3000.0), 5.0));
    m.walls.push(wall(0, place(Axis::X, 3000.0, 0.0, 4000.0), 5.0));
    m.storeys = 2;
    m.walls.push(wall(1, place(Axis::Y, 1000.0, 0.0, 3000.0), 7.0));
    m.beams.push(Beam {
        storey: 0,
        place: place(Axis::Y, 2500.0, 1000.0, 3050.0),
        weight: 2.0,
        bearing: 100.0,
    });
    m.walls.push(wall(0, place(Axis::X, 1000.0, 2000.0, 3000.0), 5.0));
    let d = lead_down(&m).expect("a path");
    let sides = |i: usize| d.walls[i].piers[0].sides;
    let none = [0.0; 3];
    // Before the beam: 3 m of floor in y, whose middle third the beam takes from y = 1 m on.
    near(sides(0)[0], none);
    near(sides(0)[1], [2e-3 * 500.0 * 3000.0, 3e-3 * 500.0 * 3000.0, 0.0]);
    near(sides(1)[1], none);
    near(sides(2)[0], [2e-3 * 500.0 * 3000.0, 3e-3 * 500.0 * 3000.0, 0.0]);
    assert!(sides(2)[1][0] > sides(2)[0][0], "the longer span brings more");
    // The beam's far end lies on the wall at y = 3 m and comes from below it; its near end from above.
    let end = d.beams[0].reactions;
    near(sides(3)[0], end[1]);
    near(sides(3)[1], none);
    near(sides(5)[0], none);
    near(sides(5)[1], end[0]);
    // The wall above is in the load at the head, and comes from no side.
    let from_floors = sides(2)[0][0] + sides(2)[1][0];
    assert!((d.walls[2].piers[0].head[0] - from_floors - 7.0 * 3000.0).abs() < 1e-6);
}

/// What goes to the sides of an opening keeps the side from which it came, and its moment goes down with it.
#[test]
fn jambs_keep_the_side_of_their_load() {
    let mut m = table();
    m.walls[0].openings.push(Opening { from: 1000.0, to: 2000.0, over: 1.0, under: 0.0 });
    let d = lead_down(&m).expect("a path");
    for (n, pier) in d.walls[0].piers.iter().enumerate() {
        // 1 m of its own and half of the opening, all from the upper side.
        near(pier.sides[1], [2e-3 * 2000.0 * 1500.0, 3e-3 * 2000.0 * 1500.0, 0.0]);
        near(pier.sides[0], [0.0; 3]);
        near(pier.head, pier.sides[1]);
        // At the foot 500 N of wall over the opening stand on the jamb, half a metre off the middle.
        let towards = if n == 0 { 1.0 } else { -1.0 };
        near(
            [pier.foot_moment[0] - pier.moment[0], pier.foot_moment[1] - pier.moment[1], 0.0],
            [towards * 500.0 * 500.0, 0.0, 0.0],
        );
    }
}
