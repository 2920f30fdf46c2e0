//! What must hold for any length of wall, and the limits of the method.

use super::around::{Around, Lines};
use super::model::PierModel;
use super::{Used, bays, matrix, outer, sheet, work};
use crate::building::{Building, Side, line_of, take_down};
use crate::checks::{Job, Results, whole};
use crate::quantity::{Force, Length, Stress};
use crate::solve::descent::{Axis, Place};
use crate::standards::annex::Annex;
use crate::standards::en1990::Combination;
use crate::standards::masonry::Edge;
use crate::trace::Sheet;

const HOUSES: [&str; 4] = [
    include_str!("../../../jobs/through-room.toml"),
    include_str!("../../../jobs/semi.toml"),
    include_str!("../../../jobs/end-terrace.toml"),
    include_str!("../../../jobs/bungalow.toml"),
];

fn read(text: &str) -> Building {
    crate::job::read("house.toml", text).unwrap_or_else(|r| panic!("{}", r.render(false)))
}

fn run(text: &str) -> Results {
    crate::checks::run(&whole::complete(read(text)))
}

fn house() -> Building {
    read(HOUSES[0])
}

fn piers(b: &Building) -> Vec<Used> {
    Job::new(b).piers
}

fn find<'a>(all: &'a [Used], wall: &str, storey: usize, from: f64) -> &'a Used {
    all.iter().find(|u| u.wall == wall && u.storey == storey && u.from == from).expect("it is there")
}

fn model(u: &Used) -> PierModel {
    u.after.worked.as_ref().expect("within the tables")[0].model.clone()
}

/// The largest use of the sections of a pier.
fn used(p: &PierModel) -> f64 {
    matrix::run(p, &Annex::UK).expect("within the method").largest().0
}

/// Every pier of every house, in both states, recorded: no lock breaks.
#[test]
fn every_length_keeps_the_locks() {
    let mut texts: Vec<String> = HOUSES.iter().map(|h| (*h).to_owned()).collect();
    // A roof that lifts, and one that lifts all there is.
    for uplift in ["0.3 kN/m2", "4.0 kN/m2"] {
        let lifted = format!("imposed = \"0.6 kN/m2\"\nuplift = \"{uplift}\"");
        texts.push(HOUSES[0].replacen("imposed = \"0.6 kN/m2\"", &lifted, 1));
    }
    for text in texts {
        let b = read(&text);
        let job = Job::new(&b);
        for u in &job.piers {
            for w in [&u.before, &u.after].into_iter().flat_map(|s| s.worked.iter().flatten()) {
                let mut s = Sheet::recorder();
                sheet::record(&mut s, &job, &w.model).expect("within the method");
                for c in Combination::ALL {
                    let mut s = Sheet::recorder();
                    let ready = work::prepare(&mut s, &w.model, &job.annex).expect("within the method");
                    for &at in work::sections(&w.model) {
                        matrix::section(&mut s, &w.model, &job.annex, ready, c, at);
                    }
                    assert!(s.faults.is_empty(), "{} {:?}", u.wall, s.faults);
                }
                assert!(s.faults.is_empty(), "{} {:?}", u.wall, s.faults);
                let worst = s.verdicts.iter().map(|v| v.ratio).fold(0.0, f64::max);
                assert_eq!(worst, w.used.as_ref().expect("within the method").0, "{}", u.wall);
            }
        }
    }
}

#[test]
fn more_wind_uses_no_length_less() {
    let calm = piers(&house());
    for speed in ["22.5", "25.0", "29.0"] {
        let text = HOUSES[0].replacen("v_map = \"21.0 m/s\"", &format!("v_map = \"{speed} m/s\""), 1);
        let windy = piers(&read(&text));
        for (a, b) in calm.iter().zip(&windy) {
            assert!(b.after.used().0 >= a.after.used().0, "{} {}", a.wall, a.from);
            if !a.windy {
                assert_eq!(b.after.used(), a.after.used(), "{}: no wind across it", a.wall);
            }
        }
        let outer = |all: &[Used]| find(all, "rear wall", 0, 0.0).after.used().0;
        assert!(outer(&windy) > outer(&calm));
    }
}

/// Where no wind presses, more load is more use, and at twice the resistance it fails.
#[test]
fn more_load_uses_an_inner_length_more() {
    let b = house();
    let p = model(find(&piers(&b), "spine wall", 0, 4700.0));
    assert!(p.wind.is_none());
    let mut last = 0.0;
    for k in [1.0, 1.5, 2.0, 4.0, 8.0] {
        let mut more = p.clone();
        more.m.at_head.G = p.m.at_head.G * k;
        more.m.at_head.S_G = p.m.at_head.S_G * k;
        let now = used(&more);
        assert!(now > last, "{k}: {now} after {last}");
        last = now;
    }
    assert!(last > 1.0);
}

/// More dead load holds a windy length better as long as it does not crush; much more crushes it.
#[test]
fn a_windy_length_wants_some_load_but_not_too_much() {
    let b = house();
    let p = model(find(&piers(&b), "front wall", 1, 3100.0));
    let with = |k: f64| {
        let mut m = p.clone();
        m.m.at_head.G = p.m.at_head.G * k;
        m.m.at_head.S_G = p.m.at_head.S_G * k;
        used(&m)
    };
    assert!(with(1.5) < with(1.0) && with(0.5) > with(1.0));
    assert!(with(60.0) > 1.0, "{}", with(60.0));
}

/// The block centred on N: a load wholly at one end of the length leaves no length pressed.
#[test]
fn a_load_at_an_end_of_the_length_is_not_carried() {
    let b = house();
    let mut p = model(find(&piers(&b), "spine wall", 0, 4700.0));
    let base = used(&p);
    let moved = |off: f64| {
        let mut m = p.clone();
        m.m.at_head.S_G = p.m.at_head.G * (p.m.l * off);
        m.m.at_head.S_Q = p.m.at_head.Q * (p.m.l * off);
        m
    };
    // Head and foot have moments of their own: that of the head grows alone here.
    assert!(used(&moved(0.4)) > base);
    p = moved(0.5);
    assert_eq!(used(&p), f64::INFINITY);
}

/// Wind presses outer walls; a neighbour shelters the wall that it adjoins, inner walls have none.
#[test]
fn wind_presses_outer_walls_alone() {
    let mut b = house();
    let windy = |b: &Building| {
        let mut out: Vec<String> = piers(b).iter().filter(|u| u.windy).map(|u| u.wall.clone()).collect();
        out.dedup();
        out.sort();
        out.dedup();
        out
    };
    assert_eq!(windy(&b), ["flank wall", "front wall", "rear wall"]);
    b.neighbours = vec![Side::Left, Side::Down];
    assert_eq!(windy(&b), ["flank wall", "front wall"]);
    b.neighbours.clear();
    assert_eq!(windy(&b), ["flank wall", "front wall", "party wall", "rear wall"]);
}

/// Under the roof of a lower storey's addition a wall is inside; above that roof it is in the wind.
#[test]
fn an_addition_shelters_its_own_storey() {
    let mut b = house();
    let mut addition = b.floors[0].clone();
    addition.storey = b.storeys[0].mark.clone();
    addition.from = (Length::new(1000.0), Length::new(-3000.0));
    addition.to = (Length::new(4000.0), Length::ZERO);
    b.floors.push(addition);
    let around = Around::new(&b);
    let at = |from: f64, to: f64| Place { along: Axis::X, at: 0.0, from, to };
    assert!(!outer::in_the_wind(&b, &around, 0, at(1500.0, 3500.0), 267.5), "inside");
    assert!(outer::in_the_wind(&b, &around, 1, at(1500.0, 3500.0), 267.5), "above its roof");
    assert!(outer::in_the_wind(&b, &around, 0, at(0.0, 3400.0), 267.5), "in part beside it");
}

/// Bays add up to their length; walls that meet it hold it, openings do not; the wall that comes out holds it before.
#[test]
fn bays_lie_between_walls_that_meet_and_openings() {
    assert!(HOUSES[0].contains(DOORS));
    // Farther from the wall that comes out, which would hold their jamb.
    let b = read(&HOUSES[0].replacen(DOORS, "from = \"3.4 m\", width = \"1.2 m\"", 1));
    let down = take_down(&b).expect("floors").expect("a path");
    let h = Length::new(2400.0);
    let of = |state: &crate::building::State| {
        let i = state.walls.iter().position(|s| s.storey == 0 && b.plan[s.wall].mark == "rear wall");
        bays::of(state, &Lines::new(state), i.expect("it stands"), 0, h)
    };
    let (before, after) = (of(&down.on_leaf_before), of(&down.on_leaf));
    let lengths = |bays: &[bays::Bay]| bays.iter().map(|x| x.l.base()).collect::<Vec<_>>();
    assert_eq!(lengths(&before), [2700.0, 700.0]);
    assert_eq!(lengths(&after), [3400.0]);
    let edges = |x: &bays::Bay| (x.edges.left, x.edges.right);
    assert_eq!(edges(&before[0]), (Edge::Simple, Edge::Simple));
    assert_eq!(edges(&before[1]), (Edge::Simple, Edge::Free));
    assert_eq!(edges(&after[0]), (Edge::Simple, Edge::Free));
    // The window of 1.2 m beside it: half of it.
    assert_eq!(after[0].l_w.base(), 4000.0);
    assert_eq!(before[0].l_w.base(), 2700.0);
}

/// What carries a beam's end is judged though nothing else changed; what neither grows nor carries one is not.
#[test]
fn lengths_under_a_beam_are_judged() {
    let all = piers(&house());
    let judged: Vec<&str> = all.iter().filter(|u| u.counts()).map(|u| u.wall.as_str()).collect();
    assert_eq!(judged, ["rear wall", "spine wall"]);
    for text in &HOUSES[1..] {
        assert!(piers(&read(text)).iter().all(|u| !u.counts()), "beams end on returns there");
    }
}

/// A judged length that crushes fails the job; one that leaves the method leaves it outside, and hides no failure.
#[test]
fn a_judged_length_decides() {
    let results = run(HOUSES[0]);
    assert_eq!(results.outcome.kind(), "conditional");
    let f_k = "[materials.\"grey block\"]\nf_k = { value = \"1.0 N/mm2\", reason = \"Weak.\" }";
    let weak = HOUSES[0].replacen("[materials.\"grey block\"]", f_k, 1);
    let results = run(&weak);
    let s = &results.sections.iter().find(|s| s.id == "piers").expect("its sheet").sheet;
    let middle = s.verdicts.iter().find(|v| v.id == "pier-middle").expect("its verdict");
    assert!(!middle.holds && middle.ratio > 1.0);
    assert_eq!(results.outcome.kind(), "not-adequate");
    // A 75 mm leaf 2.4 m high is more slender than 27.
    let leaf = |t: &str| {
        format!(
            "[build_ups.\"block wall\"]\n\n[[build_ups.\"block wall\".leaves]]\nmaterial = \"grey block\"\n\
             thickness = \"{t} mm\""
        )
    };
    let thin = HOUSES[0].replacen(&leaf("100"), &leaf("75"), 1);
    let results = run(&thin);
    let s = &results.sections.iter().find(|s| s.id == "piers").expect("its sheet").sheet;
    assert!(
        !s.outside.is_empty() && s.outside.iter().all(|o| o.words.starts_with("spine wall")),
        "{:?}",
        s.outside
    );
    assert!(s.verdicts.iter().any(|v| v.id == "pier-middle"), "the rear wall is worked all the same");
    assert_eq!(results.outcome.kind(), "outside");
}

/// Where nothing presses from above, the wind leaves flexure alone, and a roof that lifts takes from it.
#[test]
fn uplift_is_taken_off() {
    let b = house();
    let mut p = model(find(&piers(&b), "front wall", 1, 3100.0));
    p.m.at_head.U = Force::ZERO;
    let lifted = |k: f64| {
        let mut m = p.clone();
        m.m.at_head.U = p.m.at_head.G * k;
        used(&m)
    };
    assert!(lifted(0.6) > used(&p));
    assert!(lifted(2.0) > 1.0, "more lifts than stands there");
    assert!(p.m.at_head.G > Force::ZERO && p.wind.as_ref().is_some_and(|w| w.q_panel > Stress::ZERO));
}

/// The garden doors in the rear wall of the first house.
const DOORS: &str = "from = \"2.9 m\", width = \"2.0 m\"";

/// A beam that ends over a window stands on both its sides, and both are judged.
#[test]
fn a_beam_over_an_opening_is_for_its_sides() {
    assert!(HOUSES[0].contains(DOORS));
    let text = HOUSES[0].replacen(DOORS, "from = \"2.0 m\", width = \"1.2 m\"", 1);
    let all = piers(&read(&text));
    for from in [0.0, 3200.0] {
        let u = find(&all, "rear wall", 0, from);
        assert!(
            u.counts() && u.grows() && u.beams == ["B1 over the opening beside it"],
            "{from}: {:?}",
            u.beams
        );
    }
}

/// The house seen in a mirror is used alike, length by length.
#[test]
fn a_mirrored_house_is_used_alike() {
    for text in HOUSES {
        let mut b = read(text);
        // A mirror turns the compass, and the direction factor with it.
        if let Some(site) = &mut b.wind.site {
            site.sectors.truncate(1);
            site.sectors[0].bearings.clear();
        }
        let flip = |(x, y): (Length, Length)| (Length::new(9000.0) - x, y);
        let mut m = b.clone();
        for w in &mut m.plan {
            (w.from, w.to) = (flip(w.from), flip(w.to));
        }
        for f in &mut m.floors {
            (f.from, f.to) = (flip(f.from), flip(f.to));
        }
        for beam in &mut m.beams {
            (beam.from, beam.to) = (flip(beam.from), flip(beam.to));
        }
        for p in &mut m.panels {
            let on = p.on.as_ref().and_then(|on| m.plan.iter().find(|w| w.mark == *on)).and_then(line_of);
            if on.is_some_and(|place| place.along == Axis::X) {
                let turn = |x: Length| Length::new(9000.0) - x;
                p.after.ends = p.after.ends.map(|(from, to)| (turn(to), turn(from)));
            }
        }
        for side in &mut m.neighbours {
            *side = match *side {
                Side::Left => Side::Right,
                Side::Right => Side::Left,
                other => other,
            };
        }
        let sorted = |b: &Building| {
            let mut out: Vec<(String, usize, f64, f64)> = piers(b)
                .iter()
                .map(|u| (u.wall.clone(), u.storey, u.to - u.from, u.after.used().0))
                .collect();
            out.sort_by(|a, b| a.partial_cmp(b).expect("numbers"));
            out
        };
        for (a, z) in sorted(&b).iter().zip(sorted(&m)) {
            assert!((a.2 - z.2).abs() < 1e-6 && (a.3 - z.3).abs() < 1e-9 * a.3, "{a:?} {z:?}");
        }
    }
}
