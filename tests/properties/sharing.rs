//! The storey's sharing: shares add up, and a wall more is never a load more on another.

use perpend::building::{Along, BracingWall, Building, Ends, ShareBy, Stands};
use perpend::checks::stability::{Share, share};
use perpend::quantity::{Length, Stress};
use perpend::solve::torsion::{self, Bracing, Push};
use perpend::standards::annex::Annex;
use perpend::trace::Sheet;
use perpend::wind::Pressures;
use proptest::prelude::*;

fn wall(n: usize, along: Along, at: f64, other: f64, length: f64) -> BracingWall {
    BracingWall {
        mark: format!("W{n}"),
        along,
        at: Length::new(at),
        other_at: Some(Length::new(other)),
        length: Length::new(length),
        height: Length::new(2500.0),
        build_up: "wall".to_owned(),
        stands: Stands::Both,
        ends: Ends::Cantilever,
    }
}

fn shares(mut b: Building, share_by: ShareBy, walls: Vec<BracingWall>) -> Vec<Share> {
    let mut st = b.stability.take().expect("a storey");
    st.share_by = share_by;
    st.walls = walls;
    st.wind_along = Along::Y;
    let wind = Pressures { overall: Stress::new(0.5e-3), panel: Stress::new(0.6e-3) };
    share(&mut Sheet::silent(), &b, &st, wind, &Annex::UK).expect("braced").shares
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    /// By width the shares add up to 1 and the widths to the front (8 m); a wall added raises no other's share.
    #[test]
    fn shares_by_width_add_up(places in prop::collection::vec(0.0..8000.0_f64, 1..6), more in 0.0..8000.0_f64) {
        let walls: Vec<BracingWall> =
            places.iter().enumerate().map(|(n, &at)| wall(n, Along::Y, at, 0.0, 5000.0)).collect();
        let before = shares(super::base(), ShareBy::Width, walls.clone());
        let sum: f64 = before.iter().filter_map(|s| s.after).sum();
        prop_assert!((sum - 1.0).abs() < 1e-12, "{}", sum);
        let widths: f64 = before.iter().filter_map(|s| s.width_after).map(|w| w.base()).sum();
        prop_assert!((widths - 8000.0).abs() < 1e-9, "{}", widths);
        prop_assert!(before.iter().all(|s| s.after.is_some_and(|a| a >= -1e-12)));
        let mut added = walls;
        added.push(wall(99, Along::Y, more, 0.0, 5000.0));
        for (one, two) in before.iter().zip(shares(super::base(), ShareBy::Width, added)) {
            prop_assert!(two.after.unwrap() <= one.after.unwrap() + 1e-12, "{:?} {:?}", one, two);
        }
    }

    /// A wall that stands only before or only after has a share only then; the others take the rest.
    #[test]
    fn walls_count_while_they_stand(at in 500.0..7500.0_f64, stands_before in any::<bool>()) {
        let mut middle = wall(1, Along::Y, at, 0.0, 3000.0);
        middle.stands = if stands_before { Stands::Before } else { Stands::After };
        let walls = vec![wall(0, Along::Y, 0.0, 0.0, 6000.0), middle, wall(2, Along::Y, 8000.0, 0.0, 6000.0)];
        let found = shares(super::base(), ShareBy::Width, walls);
        prop_assert_eq!(found[1].before.is_some(), stands_before);
        prop_assert_eq!(found[1].after.is_some(), !stands_before);
        for of in [|s: &Share| s.before, |s: &Share| s.after] {
            let sum: f64 = found.iter().filter_map(of).sum();
            prop_assert!((sum - 1.0).abs() < 1e-12);
        }
        // Half the distance between neighbours: the outer walls by hand.
        let with = if stands_before { found[0].before } else { found[0].after };
        let without = if stands_before { found[0].after } else { found[0].before };
        prop_assert!((with.unwrap() - at / 2.0 / 8000.0).abs() < 1e-12);
        prop_assert!((without.unwrap() - 0.5).abs() < 1e-12);
    }

    /// By stiffness the direct parts add up to the push, and the torsional parts to nothing along the wind.
    #[test]
    fn direct_parts_add_up(
        walls in prop::collection::vec((any::<bool>(), 0.0..10.0_f64, 0.0..10.0_f64, 0.1..5.0_f64), 1..6),
        middle in 0.0..10.0_f64,
    ) {
        let mut plan: Vec<Bracing> = walls
            .iter()
            .map(|&(x, a, b, rigidity)| Bracing {
                along: if x { torsion::Along::X } else { torsion::Along::Y },
                x: a,
                y: b,
                rigidity,
            })
            .collect();
        plan.push(Bracing { along: torsion::Along::Y, x: 0.0, y: 5.0, rigidity: 1.0 });
        plan.push(Bracing { along: torsion::Along::Y, x: 10.0, y: 5.0, rigidity: 1.0 });
        let found = torsion::share(&plan, Push { f_x: 0.0, f_y: 1.0, x: middle, y: 0.0 }).expect("braced");
        let along = |of: fn(&torsion::Share) -> f64| {
            let ys = plan.iter().zip(&found.walls).filter(|(w, _)| w.along == torsion::Along::Y);
            ys.map(|(_, s)| of(s)).sum::<f64>()
        };
        prop_assert!((along(|s| s.direct) - 1.0).abs() < 1e-9);
        prop_assert!(along(|s| s.torsion).abs() < 1e-9);
        // Statics: the walls' forces hold the push and its moment about the origin.
        let moment: f64 = plan
            .iter()
            .zip(&found.walls)
            .map(|(w, s)| if w.along == torsion::Along::Y { s.total() * w.x } else { -s.total() * w.y })
            .sum();
        prop_assert!((moment - middle).abs() < 1e-9 * middle.max(1.0), "{} {}", moment, middle);
        for s in &found.walls {
            prop_assert!(s.without_relief().abs() >= s.direct.abs() - 1e-12, "relief is not counted");
        }
    }

    /// The mirrored plan has the mirrored shares.
    #[test]
    fn the_mirrored_plan_has_the_mirrored_shares(
        walls in prop::collection::vec((0.0..8000.0_f64, 0.0..9000.0_f64, 600.0..6000.0_f64), 1..4),
        cross in (0.0..8000.0_f64, 600.0..6000.0_f64),
    ) {
        let plan = |mirror: bool| {
            let x = |at: f64| if mirror { 8000.0 - at } else { at };
            let mut plan: Vec<BracingWall> = walls
                .iter()
                .enumerate()
                .map(|(n, &(at, other, l))| wall(n, Along::Y, x(at), other, l))
                .collect();
            plan.push(wall(90, Along::Y, x(0.0), 4000.0, 5000.0));
            plan.push(wall(91, Along::Y, x(8000.0), 4000.0, 4000.0));
            plan.push(wall(92, Along::X, 0.0, x(cross.0), cross.1));
            plan.push(wall(93, Along::X, 9000.0, x(4000.0), 5000.0));
            plan
        };
        for share_by in [ShareBy::Width, ShareBy::Stiffness] {
            let one = shares(super::base(), share_by, plan(false));
            let other = shares(super::base(), share_by, plan(true));
            // Walls at one place share its width in the order of the sort, which the mirror turns round.
            for (a, b) in one.iter().zip(&other) {
                let (x, y) = (a.after.unwrap(), b.after.unwrap());
                prop_assert!((x - y).abs() < 1e-9, "{}: {} mirrored {}", a.mark, x, y);
            }
            let sum: f64 = one.iter().filter_map(|s| s.after).sum();
            prop_assert!(sum >= 1.0 - 1e-9, "never less than the whole: {}", sum);
        }
    }
}
