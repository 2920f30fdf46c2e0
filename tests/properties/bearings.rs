//! Bearings: monotone, mirrored, the smallest padstone, searches that keep their word, sheets without faults.

use perpend::building::{Building, Padstone};
use perpend::checks::bearings::choose::{Uses, try_all, uses};
use perpend::checks::bearings::remedy::{bearing_needed, grown, load_taken};
use perpend::checks::bearings::seat::{Beam, Seat};
use perpend::checks::bearings::site::{self, Site};
use perpend::checks::bearings::{check, work};
use perpend::quantity::{Force, Length, Stress};
use perpend::standards::annex::Annex;
use perpend::trace::Sheet;
use proptest::prelude::*;

use super::super::examples::job::{BLOCK_140, PLAIN_RETURN, with_return};

const BEARING: &str = r#"
[[bearings]]
mark = "B1-R1"
beam = "B1"
on = "R1"
load = "beam"
bearing_length = "100 mm"
bearing_width = "100 mm"
"#;

const LOAD: &str = "[[returns.loads]]\nwhat = \"beam\"\ndead = \"1 kN\"\nimposed = \"1 kN\"\nat = \"600 mm\"\n\n[returns.junction]";

static ANNEX: Annex = Annex::UK;

#[derive(Clone, Debug)]
struct Case {
    l: f64,
    h: f64,
    level: f64,
    /// Bearing length and width over what there is room for, place over the room.
    b: f64,
    w: f64,
    at: f64,
    e: f64,
    kn: (f64, f64),
    other: Option<(f64, f64)>,
    stones: Vec<(f64, f64, f64, f64)>,
}

fn any_case() -> impl Strategy<Value = Case> {
    let stone = (100.0..900.0_f64, 60.0..160.0_f64, 50.0..300.0_f64, 10.0..40.0_f64);
    (
        (300.0..2500.0_f64, 2000.0..3000.0_f64, 0.6..1.0_f64),
        (0.05..1.0_f64, 0.3..1.0_f64, 0.0..1.0_f64, -34.0..34.0_f64),
        (1.0..60.0_f64, 0.0..30.0_f64),
        prop::option::of((1.0..20.0_f64, 0.0..1.0_f64)),
        prop::collection::vec(stone, 0..6),
    )
        .prop_map(|((l, h, level), (b, w, at, e), kn, other, stones)| Case {
            l,
            h,
            level: level * h,
            b: (b * l).min(600.0),
            w: w * 140.0,
            at,
            e,
            kn,
            other,
            stones,
        })
}

fn base() -> Building {
    let text = with_return(BLOCK_140, &(PLAIN_RETURN.replace("[returns.junction]", LOAD) + BEARING));
    perpend::job::read("properties.toml", &text).unwrap_or_else(|e| panic!("{e:?}"))
}

fn building(c: &Case) -> Building {
    let mut b = base();
    let r = &mut b.returns[0];
    (r.length, r.height) = (Length::new(c.l), Length::new(c.h));
    let load = &mut r.loads[0];
    (load.dead, load.imposed) = (Force::new(c.kn.0 * 1e3), Force::new(c.kn.1 * 1e3));
    load.at = Length::new(c.b / 2.0 + c.at * (c.l - c.b));
    load.eccentricity = Length::new(c.e);
    if let Some((kn, at)) = c.other {
        let mut other = r.loads[0].clone();
        other.what = "other".to_owned();
        (other.dead, other.imposed) = (Force::new(kn * 1e3), Force::ZERO);
        other.at = Length::new(at * c.l);
        r.loads.push(other);
    }
    let bearing = &mut b.bearings[0];
    (bearing.length, bearing.width, bearing.level) =
        (Length::new(c.b), Length::new(c.w), Length::new(c.level));
    b.padstones = c
        .stones
        .iter()
        .enumerate()
        .map(|(n, &(l, w, h, f))| Padstone {
            name: format!("P{n}"),
            length: Length::new(l),
            width: Length::new(w),
            height: Length::new(h),
            strength: Stress::new(f),
        })
        .collect();
    b
}

fn site(b: &Building) -> Option<Site<'_>> {
    site::of(&mut Sheet::silent(), b, &b.bearings[0], &ANNEX).ok()
}

/// Resistance under the load.
fn resistance(site: &Site<'_>, seat: &Seat) -> f64 {
    let mut s = Sheet::silent();
    work::all(&mut s, site, seat).expect("inside t/4");
    s.verdicts[0].resistance.value.value
}

fn same(a: Option<f64>, b: Option<f64>) -> bool {
    match (a, b) {
        (Some(a), Some(b)) => (a - b).abs() <= 1e-9 * b.abs(),
        (a, b) => a.is_none() && b.is_none(),
    }
}

proptest! {
    /// A bearing that grows about the same load never loses resistance; nor does one that grows from its edge.
    #[test]
    fn a_longer_bearing_never_resists_less(c in any_case(), more in 1.0..2.0_f64) {
        let b = building(&c);
        let Some(site) = site(&b) else { return Ok(()) };
        let beam = Beam::of(&site);
        let now = resistance(&site, &Seat::bare(beam));
        let room = 2.0 * beam.x_c.base().min(c.l - beam.x_c.base());
        let about = Beam { l_b: Length::new((c.b * more).min(room)), ..beam };
        prop_assert!(resistance(&site, &Seat::bare(about)) >= now * (1.0 - 1e-12));
        if let Some(longer) = grown(&site, Length::new(c.b * more), beam.w_b) {
            prop_assert!(resistance(&site, &Seat::bare(longer)) >= now * (1.0 - 1e-12));
        }
    }

    /// Towards an end the resistance never rises.
    #[test]
    fn nearer_to_the_end_never_resists_more(c in any_case(), step in 0.0..1.0_f64) {
        let b = building(&c);
        let Some(site) = site(&b) else { return Ok(()) };
        let beam = Beam::of(&site);
        let (half, x) = (c.b / 2.0, beam.x_c.base());
        let near = if x > c.l / 2.0 { x + step * (c.l - half - x) } else { x - step * (x - half) };
        let moved = Beam { x_c: Length::new(near), ..beam };
        prop_assert!(resistance(&site, &Seat::bare(moved)) <= resistance(&site, &Seat::bare(beam)) * (1.0 + 1e-12));
    }

    /// Mirrored along the return and across the leaf the result is the same, with padstones too.
    #[test]
    fn mirrored_bearings_are_alike(c in any_case()) {
        let b = building(&c);
        let mut m = b.clone();
        for load in &mut m.returns[0].loads {
            load.at = Length::new(c.l) - load.at;
            load.eccentricity = -load.eccentricity;
        }
        let (Some(one), Some(other)) = (site(&b), site(&m)) else { return Ok(()) };
        let alike = |a: Uses, b: Uses| same(a.bearing, b.bearing) && same(a.padstone, b.padstone) && same(a.middle, b.middle);
        let bare = |s: &Site<'_>| uses(s, &Seat::bare(Beam::of(s)));
        prop_assert!(alike(bare(&one), bare(&other)));
        for (a, b) in try_all(&one, &b.padstones).iter().zip(try_all(&other, &m.padstones)) {
            prop_assert_eq!(&a.stone.name, &b.stone.name);
            match (a.uses, b.uses) {
                (Some(x), Some(y)) => prop_assert!(alike(x, y), "{:?} {:?}", x, y),
                (x, y) => prop_assert!(x.is_none() && y.is_none()),
            }
        }
    }

    /// Of the padstones that work the one taken is the smallest; and its sheet holds.
    #[test]
    fn the_smallest_that_works_is_taken(c in any_case()) {
        let b = building(&c);
        let mut s = Sheet::recorder();
        let all = check(&mut s, &b, &[&b.bearings[0]], &ANNEX);
        let Some(checked) = all.into_iter().next().flatten() else { return Ok(()) };
        prop_assert!(s.faults.is_empty(), "{:?}", s.faults);
        let volume = |p: &Padstone| (p.length * p.width * p.height).base();
        let tried = try_all(&checked.site, &b.padstones);
        let least = tried.iter().filter(|t| t.works()).map(|t| volume(t.stone)).fold(f64::INFINITY, f64::min);
        match checked.stone {
            Some(stone) => {
                prop_assert!(volume(stone) <= least && s.holds());
                prop_assert!(stone.length.base() <= c.l && stone.width.base() <= 140.0);
            }
            None => {
                prop_assert!(least.is_infinite());
                let alone = uses(&checked.site, &checked.seat);
                prop_assert_eq!(alone.works(), s.holds());
            }
        }
    }

    /// What is pressed lies on the padstone and on the wall, centred on the load.
    #[test]
    fn what_is_pressed_lies_on_the_wall(c in any_case()) {
        let b = building(&c);
        let Some(site) = site(&b) else { return Ok(()) };
        for t in try_all(&site, &b.padstones) {
            let Ok(seat) = &t.seat else { continue };
            let Ok(found) = work::all(&mut Sheet::silent(), &site, seat) else { continue };
            let p = found.pressed;
            let (x, x_p) = (site.load.at.base(), p.x_p.expect("a padstone").base());
            let (half, stone) = (p.l_A.base() / 2.0, t.stone.length.base() / 2.0);
            prop_assert!(x_p - stone >= -1e-9 && x_p + stone <= c.l + 1e-9, "hangs over the end");
            prop_assert!(x - half >= x_p - stone - 1e-9 && x + half <= x_p + stone + 1e-9);
            prop_assert!(half >= c.b / 2.0 - 1e-9, "less than the bearing itself");
            prop_assert!(c.e.abs() + p.w_A.base() / 2.0 <= 70.0 + 1e-9 && p.w_A > Length::ZERO);
            prop_assert!(found.x_J.base() >= -1e-9 && found.x_F.base() <= c.l + 1e-9);
        }
    }

    /// What the search returns passes, and a little less does not. Where it finds none, none passes over more than the
    /// step that it takes and the millimetre to which it rounds: lengths between two that fail are not promised.
    #[test]
    fn searches_keep_their_word(c in any_case()) {
        let b = building(&c);
        let Some(site) = site(&b) else { return Ok(()) };
        let passes = |mm: f64| grown(&site, Length::new(mm), Length::new(c.w)).is_some_and(|beam| uses(&site, &Seat::bare(beam)).works());
        match bearing_needed(&site, Length::new(c.w)) {
            Some(beam) => {
                prop_assert!(passes(beam.l_b.base()));
                prop_assert!(beam.l_b.base() - 1.5 < c.b || !passes(beam.l_b.base() - 1.5));
            }
            None => {
                let step = (c.l - c.b) / 400.0;
                let mut run = 0.0;
                let mut longest = 0.0_f64;
                for i in 0..400 {
                    run = if passes(c.b + step * f64::from(i)) { run + step } else { 0.0 };
                    longest = longest.max(run);
                }
                prop_assert!(longest <= (c.l - c.b) / 120.0 + 1.0 + step, "{} mm long pass", longest);
            }
        }
        let n = site.N_Edc.base();
        if let Some(most) = load_taken(&site) {
            prop_assert!(most.base() <= n);
            let alone = uses(&site, &Seat::bare(Beam::of(&site)));
            prop_assert!(!alone.works() || most.base() >= n - 100.0 - 1e-3 * n);
        }
    }
}
