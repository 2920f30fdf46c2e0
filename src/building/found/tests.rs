use super::*;
use crate::building::{BuildUp, FloorKind, Frame, Leaf, PlanOpening};
use crate::quantity::Length;

/// A house of 6 m by 8 m whose cross wall at x = 3 m comes out between y = 1 m and y = 4 m; a nib R1
/// stays at the rear wall, R2 at the spine wall. Each point goes through `turn`.
struct House {
    walls: Vec<PlanWall>,
    storeys: Vec<Storey>,
    floors: Vec<PlanFloor>,
    build_ups: Vec<BuildUp>,
    neighbours: Vec<Side>,
}

type Turn = fn(f64, f64) -> (f64, f64);

const AS_IS: Turn = |x, y| (x, y);
const MIRRORED: Turn = |x, y| (6000.0 - x, y);
const TURNED: Turn = |x, y| (-y, x);

fn at(turn: Turn, x: f64, y: f64) -> (Length, Length) {
    let (x, y) = turn(x * 1e3, y * 1e3);
    (Length::new(x), Length::new(y))
}

fn wall(turn: Turn, mark: &str, from: (f64, f64), to: (f64, f64)) -> PlanWall {
    PlanWall {
        mark: mark.to_owned(),
        build_up: "wall".to_owned(),
        from: at(turn, from.0, from.1),
        to: at(turn, to.0, to.1),
        removed: mark == "gone",
        storeys: Vec::new(),
        free_end: false,
        openings: Vec::new(),
    }
}

fn storey(mark: &str, total: f64, floor_above: FloorKind) -> Storey {
    Storey {
        mark: mark.to_owned(),
        clear_height: Length::new(2400.0),
        floor_above,
        total_height: Length::new(total),
    }
}

fn house(turn: Turn) -> House {
    let leaf =
        Leaf { material: "any".to_owned(), thickness: Length::new(100.0), chase: Length::ZERO, loaded: true };
    let floor = PlanFloor {
        mark: "F1".to_owned(),
        load: "any".to_owned(),
        storey: "ground".to_owned(),
        from: at(turn, 0.0, 0.0),
        to: at(turn, 6.0, 8.0),
        spans: Along::X,
    };
    House {
        walls: vec![
            wall(turn, "rear", (0.0, 0.0), (6.0, 0.0)),
            wall(turn, "front", (0.0, 8.0), (6.0, 8.0)),
            wall(turn, "west", (0.0, 0.0), (0.0, 8.0)),
            wall(turn, "east", (6.0, 0.0), (6.0, 8.0)),
            wall(turn, "spine", (0.0, 5.0), (6.0, 5.0)),
            wall(turn, "R1", (3.0, 0.0), (3.0, 1.0)),
            wall(turn, "gone", (3.0, 1.0), (3.0, 4.0)),
            wall(turn, "R2", (3.0, 4.0), (3.0, 5.0)),
        ],
        storeys: vec![storey("ground", 7000.0, FloorKind::Timber), storey("first", 4400.0, FloorKind::Roof)],
        floors: vec![floor],
        build_ups: vec![BuildUp {
            name: "wall".to_owned(),
            leaves: vec![leaf],
            cavity: None,
            ties: None,
            tie_strength: None,
            collar_joint: false,
        }],
        neighbours: Vec::new(),
    }
}

impl House {
    fn around(&self) -> Around<'_> {
        Around {
            walls: self.walls.iter().collect(),
            storeys: self.storeys.iter().collect(),
            floors: self.floors.iter().collect(),
            build_ups: self.build_ups.iter().collect(),
            neighbours: &self.neighbours,
            storey: "ground",
        }
    }

    fn find(&self) -> Found {
        find(&self.around())
    }

    fn wall(&mut self, mark: &str) -> &mut PlanWall {
        self.walls.iter_mut().find(|w| w.mark == mark).expect("a wall of this house")
    }
}

/// Lengths before and after, and what holds the two ends after, in the order of the plan.
fn spans(found: &Found) -> Vec<(f64, f64, Vec<String>)> {
    let of = |p: &FoundPanel| {
        let held = p.after.held.iter().map(|h| h.clone().unwrap_or_default()).collect();
        (p.before.length().base(), p.after.length().base(), held)
    };
    found.panels.iter().map(of).collect()
}

#[test]
fn two_pieces_stay_and_two_panels_lose_a_wall() {
    let found = house(AS_IS).find();
    let marks: Vec<_> = found.returns.iter().map(|r| (r.mark.as_str(), r.meets.as_str())).collect();
    assert_eq!(marks, [("R1", "rear"), ("R2", "spine")]);
    let r1 = &found.returns[0];
    // From the face of the wall met, half of 100 mm off its line.
    assert_eq!((r1.length.base(), r1.tributary.base()), (950.0, 3000.0));
    // 3 m to either corner, less half the nib and, clear, half the wall there.
    assert_eq!(r1.to_end.map(|l| l.base()), [2950.0, 2950.0]);
    assert_eq!(r1.to_next.map(|l| l.map(|l| l.base())), [Some(2900.0), Some(2900.0)]);
    // 2.60 m of ground storey and 2.40 m of first; half of each for the floor.
    assert_eq!((r1.supported.base(), r1.strip.base()), (5000.0, 2500.0));
    // The spine wall is inside: no panel.
    assert!(found.panels.iter().all(|p| p.on == "rear"));
    let words = |a: &str, z: &str| vec![a.to_owned(), z.to_owned()];
    assert_eq!(spans(&found), [(3000.0, 3000.0, words("west", "R1")), (3000.0, 3000.0, words("R1", "east"))]);
}

#[test]
fn mirrored_and_turned_houses_have_the_same_lengths() {
    let here = house(AS_IS).find();
    for turn in [MIRRORED, TURNED] {
        let there = house(turn).find();
        assert_eq!(here.returns.len(), there.returns.len());
        for (a, z) in here.returns.iter().zip(&there.returns) {
            assert_eq!(
                (&a.mark, a.length, a.tributary, a.supported),
                (&z.mark, z.length, z.tributary, z.supported)
            );
            let sorted = |r: &FoundReturn| {
                let mut ends = r.to_end.map(|l| l.base());
                ends.sort_by(f64::total_cmp);
                ends
            };
            assert_eq!(sorted(a), sorted(z));
        }
        assert_eq!(here.panels.len(), there.panels.len());
    }
    // Seen from outside, mirrored, left and right change.
    let there = house(MIRRORED).find();
    assert_eq!(there.panels[0].after.held, [Some("east".to_owned()), Some("R1".to_owned())]);
    // Turned with the house, they do not.
    let there = house(TURNED).find();
    assert_eq!(there.panels[0].after.held, [Some("west".to_owned()), Some("R1".to_owned())]);
}

#[test]
fn a_nib_shorter_than_a_fifth_of_the_height_holds_nothing() {
    let mut h = house(AS_IS);
    let short = |h: &mut House, y: f64| {
        h.wall("R1").to = at(AS_IS, 3.0, y);
        h.wall("gone").from = at(AS_IS, 3.0, y);
        h.find()
    };
    // Its line begins 50 mm behind the face of the wall met.
    let found = short(&mut h, 0.53);
    assert_eq!(found.panels.len(), 2, "2.40 m / 5 = 0.48 m is enough");
    let found = short(&mut h, 0.52);
    assert_eq!(spans(&found), [(3000.0, 6000.0, vec!["west".to_owned(), "east".to_owned()])]);
    assert_eq!(found.panels[0].wall_at, Length::new(3000.0));
    assert!(!found.returns[0].holds);
    // Without a nib at all it is the same panel.
    h.walls.retain(|w| w.mark != "R1");
    h.wall("gone").from = at(AS_IS, 3.0, 0.0);
    let found = h.find();
    assert_eq!(spans(&found)[0].1, 6000.0);
    assert_eq!(found.returns.len(), 1);
}

#[test]
fn a_short_wall_holds_no_other() {
    let mut h = house(AS_IS);
    h.walls.push(wall(AS_IS, "stub", (4.5, 0.0), (4.5, 0.4)));
    assert_eq!(spans(&h.find())[1].2[1], "east");
    h.wall("stub").to = at(AS_IS, 4.5, 0.6);
    assert_eq!(spans(&h.find())[1].2[1], "stub");
    assert_eq!(h.find().returns[0].tributary, Length::new(1500.0 + 750.0));
    // A door right beside the junction takes its length away.
    let door = PlanOpening {
        storey: "ground".to_owned(),
        from: Length::new(100.0),
        width: Length::new(450.0),
        sill: Length::ZERO,
        height: Length::new(2000.0),
        frame: Frame::Unknown,
        bearing: None,
    };
    h.wall("stub").openings.push(door);
    assert_eq!(spans(&h.find())[1].2[1], "east");
}

#[test]
fn windows_are_counted_and_end_what_is_met() {
    let mut h = house(AS_IS);
    let window = PlanOpening {
        storey: "ground".to_owned(),
        from: Length::new(4000.0),
        width: Length::new(1200.0),
        sill: Length::new(900.0),
        height: Length::new(1200.0),
        frame: Frame::Unknown,
        bearing: None,
    };
    h.wall("rear").openings.push(PlanOpening { storey: "first".to_owned(), ..window.clone() });
    assert_eq!(h.find().returns[0].nearest_opening, None, "a window above is not in this storey");
    h.wall("rear").openings.push(window);
    let found = h.find();
    assert_eq!(found.returns[0].nearest_opening, Some(Length::new(950.0)));
    assert_eq!(found.returns[0].to_end, [Length::new(2950.0), Length::new(950.0)]);
    assert_eq!(found.panels.iter().map(|p| p.after.openings.len()).collect::<Vec<_>>(), [0, 1]);
}

#[test]
fn no_wind_comes_through_a_neighbour() {
    let mut h = house(AS_IS);
    h.neighbours = vec![Side::Down];
    assert!(h.find().panels.is_empty());
    h.neighbours = vec![Side::Up];
    assert_eq!(h.find().panels.len(), 2);
}

#[test]
fn a_return_ends_at_its_first_opening() {
    let mut h = house(AS_IS);
    // The spine side stays 1 m long, with a door from 0.3 m off the cut to 0.8 m.
    h.wall("R2").openings.push(PlanOpening {
        storey: "ground".to_owned(),
        from: Length::new(300.0),
        width: Length::new(300.0),
        sill: Length::ZERO,
        height: Length::new(2000.0),
        frame: Frame::Unknown,
        bearing: None,
    });
    assert_eq!(h.find().returns[1].length, Length::new(350.0));
}

#[test]
fn a_millimetre_more_changes_lengths_by_a_millimetre() {
    let mut h = house(AS_IS);
    let here = h.find();
    for mark in ["R1", "gone", "R2"] {
        let w = h.wall(mark);
        (w.from.0, w.to.0) = (w.from.0 + Length::new(1.0), w.to.0 + Length::new(1.0));
    }
    let there = h.find();
    assert_eq!(here.panels.len(), there.panels.len());
    for (a, z) in here.panels.iter().zip(&there.panels) {
        assert!((a.after.length() - z.after.length()).abs() <= Length::new(1.0 + 1e-9));
    }
    assert_eq!(here.returns[0].tributary, there.returns[0].tributary);
}

#[test]
fn nothing_is_found_where_nothing_comes_out() {
    let mut h = house(AS_IS);
    h.walls.retain(|w| w.mark != "gone");
    assert_eq!(h.find(), Found::default());
}

#[test]
fn an_outer_wall_that_meets_nothing_is_named() {
    let mut h = house(AS_IS);
    assert_eq!(open_ends(&h.around()), []);
    h.wall("rear").to = at(AS_IS, 5.6, 0.0);
    let open = open_ends(&h.around());
    // Its own end, and the corner that it no longer reaches.
    let marks: Vec<_> = open.iter().map(|o| (o.mark.as_str(), o.at)).collect();
    assert_eq!(marks, [("rear", (5600.0, 0.0)), ("east", (6000.0, 0.0))]);
    assert_eq!(open[0].nearest, Some(("east".to_owned(), 400.0)));
    h.wall("rear").free_end = true;
    h.wall("east").free_end = true;
    assert_eq!(open_ends(&h.around()), []);
    // A nib inside ends free and is no fault; within reach is met.
    let mut h = house(AS_IS);
    h.wall("rear").to = at(AS_IS, 5.8, 0.0);
    assert_eq!(open_ends(&h.around()), [], "200 mm: reach and half a wall");
}
