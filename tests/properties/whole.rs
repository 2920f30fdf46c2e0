//! The whole building against wind: what must add up, and what may never rise.

use perpend::building::{Along, Building, PlanWall};
use perpend::checks::Job;
use perpend::checks::whole::Direction;
use perpend::quantity::Length;
use perpend::standards::annex::Annex;
use perpend::trace::Sheet;

const JOB: &str = include_str!("../../jobs/end-terrace.toml");

fn house() -> Building {
    perpend::job::read("end-terrace.toml", JOB).unwrap_or_else(|r| panic!("{}", r.render(false)))
}

fn directions(b: &Building) -> Vec<Direction> {
    Job::new(b).whole
}

fn sum(d: &Direction, storey: usize, after: bool) -> f64 {
    let share = |p: &perpend::checks::whole::piers::Used| if after { p.share_after } else { p.share_before };
    d.piers.iter().filter(|p| p.storey == storey).filter_map(share).sum()
}

#[test]
fn shares_of_every_storey_add_up_to_all_of_it() {
    let b = house();
    let all = directions(&b);
    assert_eq!(all.len(), 2, "one neighbour shelters no direction");
    for d in &all {
        for storey in 0..b.storeys.len() {
            for after in [false, true] {
                let sum = sum(d, storey, after);
                assert!((sum - 1.0).abs() < 1e-9, "along {:?}, storey {storey}: {sum}", d.along);
            }
        }
    }
}

/// By hand: faces 0 - 132.5 mm to 8 m + 132.5 mm, storeys of 2.7 m and 2.4 m; at the roof half of 2.4 m and the 2.5 m
/// from ceiling to ridge, as an upright face where the roof is not given; with it half of the gable of 2.4 m, since the
/// wind along x meets no slope.
#[test]
fn wind_of_the_levels_by_hand() {
    let b = house();
    let all = directions(&b);
    let x = all.iter().find(|d| d.along == Along::X).expect("wind along x");
    let front = 8.0 + 2.0 * 0.1325;
    let close = |got: f64, hand: f64| assert!((got - hand).abs() < 1e-9 * hand, "{got}, by hand {hand}");
    let held = |x: &perpend::checks::whole::Direction, q: f64, over: f64| {
        let (floor, roof) = (q * front * (2.7 / 2.0 + 2.4 / 2.0), q * front * (2.4 / 2.0 + over));
        close(x.levels[0].F_k.base(), floor * 1e3);
        close(x.levels[1].F_k.base(), roof * 1e3);
        close(x.levels[0].F_above.base(), (floor + roof) * 1e3);
        close(x.levels[0].M_above.base(), roof * 2.4e6);
        assert_eq!(x.levels[1].M_above.base(), 0.0);
    };
    let q = |b: &Building| {
        let wind = perpend::wind::pressures(&mut Sheet::silent(), b, &Annex::UK).expect("within the method");
        wind.along(Along::X).overall.base() * 1e3
    };
    held(x, q(&b), 2.4 / 2.0);
    let mut bare = b.clone();
    bare.wind.site.as_mut().expect("a site").roof = None;
    let all = directions(&bare);
    held(all.iter().find(|d| d.along == Along::X).expect("wind along x"), q(&bare), 2.5);
}

/// Under timber floors another wall along the wind takes from others and gives to none.
#[test]
fn another_wall_raises_no_share() {
    let b = house();
    let before = directions(&b);
    for y in [1200.0, 2500.0, 5000.0, 6800.0] {
        let mut more = b.clone();
        more.plan.push(PlanWall {
            mark: "new wall".to_owned(),
            build_up: "half brick wall".to_owned(),
            from: (Length::ZERO, Length::new(y)),
            to: (Length::new(5000.0), Length::new(y)),
            removed: false,
            storeys: Vec::new(),
            free_end: false,
            openings: Vec::new(),
        });
        for (old, new) in before.iter().zip(directions(&more)).filter(|(d, _)| d.along == Along::X) {
            for pier in &old.piers {
                let same = |p: &&perpend::checks::whole::piers::Used| {
                    p.wall == pier.wall && p.storey == pier.storey && p.from == pier.from
                };
                let now = new.piers.iter().find(same).expect("it stands still");
                let (was, is) = (pier.share_after.unwrap_or(0.0), now.share_after.unwrap_or(0.0));
                assert!(is <= was + 1e-12, "{} at y = {y}: {was} to {is}", pier.wall);
            }
        }
    }
}

/// A row with neighbours at both ends takes no wind along it.
#[test]
fn neighbours_at_both_ends_shelter_the_row() {
    // A semi, whose panels do not lie at the end of the row.
    let semi = include_str!("../../jobs/semi.toml");
    let text = semi.replacen("neighbours = [\"left\"]", "neighbours = [\"left\", \"right\"]", 1);
    let b = perpend::job::read("row.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
    let along: Vec<Along> = directions(&b).iter().map(|d| d.along).collect();
    assert_eq!(along, [Along::Y]);
}

/// More wind uses no wall less.
#[test]
fn more_wind_never_lowers_a_use() {
    let text = JOB.replacen("v_map = \"21.0 m/s\"", "v_map = \"23.5 m/s\"", 1);
    let harder = perpend::job::read("windy.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
    for (calm, windy) in directions(&house()).iter().zip(directions(&harder)) {
        for (a, b) in calm.piers.iter().zip(&windy.piers) {
            let ratio = |u: &Option<(f64, String)>| u.as_ref().map_or(0.0, |x| x.0);
            assert!(ratio(&b.after) >= ratio(&a.after) - 1e-12, "{}", a.wall);
        }
    }
}

/// Before the removal the wall that is drawn in three pieces stands as one.
#[test]
fn a_wall_in_pieces_is_one_wall_before() {
    let all = directions(&house());
    let x = all.iter().find(|d| d.along == Along::X).expect("wind along x");
    let line: Vec<_> = x.piers.iter().filter(|p| p.storey == 0 && p.wall.contains("cross wall")).collect();
    assert_eq!(line.len(), 1);
    assert_eq!((line[0].wall.as_str(), line[0].from, line[0].to), ("R1, cross wall, R2", 0.0, 5000.0));
    assert!(line[0].before.is_some() && line[0].after.is_none());
}
