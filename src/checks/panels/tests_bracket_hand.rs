//! Limit analysis on a panel's sheet beside plain numbers: what bed joints bear, what comes to edges and ties, and that
//! what is remembered is what would be worked.

use super::bracket::found::{self, Found, Low};
use super::bracket::wall::Wall;
use super::bracket::{Effort, reactions};
use super::model::PanelModel;
use super::strength;
use super::tests::{cavity, run, single, span};
use super::tests_bracket::{HELD, by_limit, value, window, with_window};
use crate::building::{Cause, Frame, PanelOpening, Sharing};
use crate::quantity::print::show;
use crate::quantity::{Force, Length, LineLoad, Stress, Weight};
use crate::solve::plate::Held;
use crate::solve::plate::safe::{LOWERED, counts, safe};
use crate::solve::plate::upper::upper;
use crate::standards::annex::Annex;
use crate::standards::masonry::Edge::{self, Continuous as C, Free as F, Simple as S};
use crate::trace::Sheet;

fn near(found: f64, by_hand: f64) {
    assert!((found / by_hand - 1.0).abs() < 1e-9, "{found}, by hand {by_hand}");
}

/// A panel as a search works it: one leaf of 102.5 mm, 4.0 x 2.4 m, `g` kN/m on top, a window.
fn searched(g: f64) -> PanelModel {
    let m = by_limit(with_window(single(4000.0, HELD, 0.3, g), Frame::Jambs));
    PanelModel { effort: Effort::Search, ..m }
}

/// 6.3.1(3) and (4) by hand. f_xd1 = 0.4/2.7, Z = 102.5²/6; helping dead load at the top 0.9 x 8.5/102.5, at the foot
/// 0.9 x 20e-6 x 2400 more.
#[test]
fn what_a_bed_joint_bears_at_the_top_and_at_the_foot() {
    let s = run(&searched(8.5));
    let (z, f, top, own) = (102.5 * 102.5 / 6.0, 0.4 / 2.7, 0.9 * 8.5 / 102.5, 0.9 * 20e-6 * 2400.0);
    near(value(&s, "M_Rt"), (f + top) * z);
    near(value(&s, "M_Rb"), (f + top + own) * z);
}

/// Under 50 kN/m: what helps ends at 0.2 f_d, with f_k = 2 N/mm² at 0.2 x 2/3; with 5 N/mm² the joint would bear more
/// than a vertical crack, 1.1/2.7 Z, and counts with no more.
#[test]
fn a_heavy_load_helps_no_more_than_it_may() {
    let z = 102.5 * 102.5 / 6.0;
    let mut m = searched(50.0);
    near(value(&run(&m), "M_Rt"), 1.1 / 2.7 * z);
    m.leaves[0].masonry.f_k = Stress::new(2.0);
    near(value(&run(&m), "M_Rt"), (0.4 / 2.7 + 0.2 * 2.0 / 3.0) * z);
}

/// What the analyses take of a brick leaf on a dpc under 8.5 kN/m with a window from 1.4 to 2.6 m, its top continuous. At
/// the base the weight alone: beside the window 0.9 x (8.5/102.5 + 20e-6 x 2400), under it the wall up to the sill, 0.9 x
/// 20e-6 x 900. At the top the flexural strength with the load on it, over the window without.
#[test]
fn what_holds_top_and_base_by_plain_numbers() {
    let mut m = searched(8.5);
    m.after.base.dpc = true;
    m.after.top.kind = C;
    let strength = strength::of_leaf(&mut Sheet::silent(), &m, &Annex::UK, 0);
    let wall = Wall::new(&m.after, m.h, &strength, Frame::Jambs).expect("a strength");
    let edges = wall.with(|p| p.edges.clone());
    let z = 102.5 * 102.5 / 6.0;
    let (load, f) = (0.9 * 8.5 / 102.5, 0.4 / 2.7);
    let (pier, sill) = ((load + 0.9 * 20e-6 * 2400.0) * z, 0.9 * 20e-6 * 900.0 * z);
    let (beside, over) = ((f + load) * z, f * z);
    assert_eq!(edges[2].len(), 3);
    for (stretch, by_hand) in edges[2].iter().zip([pier, sill, pier]) {
        let Held::Weight(moment) = stretch.held else { panic!("{stretch:?}") };
        near(moment, by_hand);
    }
    for (stretch, by_hand) in edges[3].iter().zip([beside, over, beside]) {
        let Held::Continuous(moment) = stretch.held else { panic!("{stretch:?}") };
        near(moment, by_hand);
    }
    assert_eq!((edges[2][1].from, edges[2][1].to, edges[3][1].from), (1400.0, 2600.0, 1400.0));
}

/// Each of these changes one number that the analysis depends on, and the answer with it; none gets what is remembered
/// of another.
#[test]
fn no_panel_gets_the_answer_of_another() {
    type Change = fn(&mut PanelModel);
    let changes: [(&str, Change); 14] = [
        ("nothing", |_| ()),
        ("length", |m| m.after.length = Length::new(4100.0)),
        ("height", |m| m.h = Length::new(2500.0)),
        ("load on top", |m| m.leaves[0].G_above = LineLoad::new(9.0)),
        ("own weight", |m| m.leaves[0].masonry.density = Weight::new(15e-6)),
        ("strength of bed joints", |m| m.leaves[0].masonry.f_xk1 = Stress::new(0.3)),
        ("strength across", |m| m.leaves[0].masonry.f_xk2 = Some(Stress::new(1.0))),
        ("most that helps", |m| m.leaves[0].masonry.f_k = Stress::new(0.9)),
        ("place of the window", |m| m.after.openings[0].at = Length::new(1000.0)),
        ("sill", |m| m.after.openings[0].sill = Length::new(300.0)),
        ("frame", |m| m.after.openings[0].frame = Frame::HeadAndSill),
        ("an edge", |m| m.after.left.kind = C),
        ("a dpc", |m| m.after.base.dpc = true),
        ("a stretch", |m| m.after.left.stretch = Some((Length::ZERO, Length::new(1000.0)))),
    ];
    let mut all: Vec<(&str, f64)> = Vec::new();
    for (what, change) in changes {
        let mut m = searched(5.0);
        change(&mut m);
        let takes = value(&run(&m), "w_Rd");
        for (other, so_far) in &all {
            assert!((takes / so_far - 1.0).abs() > 1e-6, "{what} as {other}: {takes}");
        }
        all.push((what, takes));
    }
}

/// What stands beside the bracket is what a search finds of the same wall without its window, and of one whose bed
/// joints have no strength of their own.
#[test]
fn what_is_printed_beside_is_a_search_of_that_wall() {
    let s = run(&PanelModel { effort: Effort::Read, ..searched(8.0) });
    let mut solid = searched(8.0);
    solid.after.openings.clear();
    near(value(&s, "w_sol"), value(&run(&solid), "w_Rd"));
    let mut dry = searched(8.0);
    dry.leaves[0].masonry.f_xk1 = Stress::ZERO;
    near(value(&s, "w_dry"), value(&run(&dry), "w_Rd"));
    near(value(&s, "k_op"), value(&s, "w_s") / value(&s, "w_sol"));
}

/// Weak bed joints, 5.7 x 2.8 m, and a window that leaves a pier of 0.2 m.
fn beside_a_wide_window(edges: [Edge; 4]) -> PanelModel {
    let mut m = by_limit(single(5700.0, edges, 0.3, 0.0));
    m.h = Length::new(2800.0);
    m.leaves[0].masonry.f_xk1 = Stress::new(0.09);
    m.after.openings = vec![PanelOpening {
        sill: Length::new(400.0),
        height: Length::new(1900.0),
        ..window(200.0, 5100.0, Frame::Jambs)
    }];
    m
}

/// Finer grids where the bracket is wide: of either side the better one counts, worked here by the analyses alone.
#[test]
fn the_better_of_two_grids_counts_on_either_side() {
    let m = beside_a_wide_window([S, C, S, S]);
    let strength = strength::of_leaf(&mut Sheet::silent(), &m, &Annex::UK, 0);
    let found = found::leaf(&m, &m.after, &strength, Effort::Decide).expect("a strength");
    let found = found.as_ref().as_ref().expect("held");
    let wall = Wall::new(&m.after, m.h, &strength, Frame::Jambs).expect("a strength");
    let field = |parts: f64| wall.with(|p| safe(p, 5700.0 / parts)).expect("held").pressure;
    let low = |few: f64, many: f64| {
        let (coarse, fine) = (field(few), field(many));
        counts(coarse, fine, (few, many)) * fine
    };
    let high = |parts: f64| wall.with(|p| upper(p, 5700.0 / parts)).expect("held").pressure;
    assert!(found.refined, "not wide: find another panel for this test");
    near(found.low.pressure(), low(16.0, 32.0).max(low(32.0, 48.0)));
    near(found.high.as_ref().expect("worked").pressure, high(16.0).min(high(20.0)));
}

/// What a field counts with is what a coarser grid beside it shows, in a search a fortieth less at least, and on most
/// panels a hundredth.
#[test]
fn a_field_counts_with_what_two_grids_show() {
    let m = PanelModel { effort: Effort::Search, ..beside_a_wide_window([S, C, S, S]) };
    let strength = strength::of_leaf(&mut Sheet::silent(), &m, &Annex::UK, 0);
    let wall = Wall::new(&m.after, m.h, &strength, Frame::Jambs).expect("a strength");
    let [coarse, fine] = [12.0, 16.0].map(|n| wall.with(|p| safe(p, 5700.0 / n)).expect("held").pressure);
    let s = run(&m);
    let part = counts(coarse, fine, (12.0, 16.0)).min(0.975);
    near(value(&s, "k_mf"), part);
    near(value(&s, "w_Rd"), part * fine);
    let s = run(&PanelModel { effort: Effort::Decide, ..searched(0.0) });
    near(value(&s, "w_Rd"), LOWERED * value(&s, "w_mf"));
}

fn leaf_with(field: f64, reactions: [Vec<f64>; 4], lengths: [Vec<f64>; 4]) -> Found {
    let low = Low { field, lowered: 0.99, triangles: 1, reactions, lengths };
    Found {
        frame: Frame::Jambs,
        pier: (0.0, 0.0),
        low,
        high: None,
        refined: false,
        picture: None,
        aside: None,
    }
}

/// Two leaves of 3 and 1 kN/m² under 2 kN/m²: half of either field. The base, free over 1 m, gets (4 + 2)/2 = 3 N/mm on
/// 1 m and (6 + 4)/2 = 5 N/mm on 2 m, so 13 kN; the left side (2 + 0)/2 on 2.4 m, 2.4 kN; the right (8 + 2)/2, 12 kN.
#[test]
fn what_edges_get_by_plain_numbers() {
    let span = span(4000.0, [F, S, S, S]);
    let lengths = || [vec![2400.0], vec![2400.0], vec![1000.0, 0.0, 2000.0], vec![0.0]];
    let outer = leaf_with(3e-3, [vec![2.0], vec![8.0], vec![4.0, 0.0, 6.0], vec![0.0]], lengths());
    let inner = leaf_with(1e-3, [vec![0.0], vec![2.0], vec![2.0, 0.0, 4.0], vec![0.0]], lengths());
    let all = reactions::at_design(&span, 2400.0, Stress::new(2e-3), &[outer, inner]);
    let got: Vec<_> = all.iter().map(|r| (r.edge, r.length, r.most, r.total)).collect();
    let by_hand =
        [("left", 2400.0, 1.0, 2400.0), ("right", 2400.0, 5.0, 12_000.0), ("base", 3000.0, 5.0, 13_000.0)];
    assert_eq!(got, by_hand);
}

/// Ties of a cavity wall of 4.0 x 2.4 m, 9.6 m², with windows of 1.2 and 0.6 x 1.2 m, 2.16 m²: shared by stiffness the
/// outer leaf has 5 x 102.5³ of 5 x 102.5³ + 3.5 x 100³, 0.6061, of 1.5 x 0.3 = 0.45 kN/m²; its ties stand on 7.44 m² and
/// pass 0.2727 x 9.6/7.44 = 0.3519 kN/m². Without windows they pass 0.2727.
#[test]
fn ties_beside_openings_pass_the_wind_of_the_openings_too() {
    let outer = 5.0 * 102.5_f64.powi(3) / (5.0 * 102.5_f64.powi(3) + 3.5 * 1e6) * 0.45e-3;
    let mut m = cavity(4000.0, HELD, 0.3);
    m.sharing = Sharing::Stiffness;
    m.tie_strength = Some(Cause { value: Force::new(1000.0), reason: "declared".to_owned() });
    let passes = |m: &PanelModel| {
        let s = run(m);
        let ties = s.verdicts.iter().find(|v| v.id == "ties").expect("a verdict");
        ties.demand.value.value
    };
    near(passes(&m), outer);
    m.after.openings = vec![window(400.0, 1200.0, Frame::Jambs), window(2400.0, 600.0, Frame::Jambs)];
    near(passes(&m), outer * 9.6 / 7.44);
    // The inner leaf has the larger part where it is the stiffer one: E t³ with f_k 10, 10 of 15.384.
    m.leaves[1].masonry.f_k = Stress::new(10.0);
    let part = 10.0 * 1e6 / (5.0 * 102.5_f64.powi(3) + 10.0 * 1e6);
    near(passes(&m), part * 0.45e-3 * 9.6 / 7.44);
}

/// Leaves that share by stiffness stand each against its own part: their bounds are not added up.
#[test]
fn leaves_that_share_by_stiffness_have_no_bracket_together() {
    let mut m = with_window(cavity(4000.0, HELD, 0.3), Frame::Jambs);
    m.sharing = Sharing::Stiffness;
    let s = run(&m);
    assert!(s.standing("w_S").is_none() && s.standing("w_U").is_none());
    m.sharing = Sharing::Strength;
    assert!(run(&m).standing("w_S").is_some());
}

/// What the sheet of limit analysis says of the hand route: what that takes by itself, and whether it is enough.
#[test]
fn the_hand_route_beside_limit_analysis_says_what_it_takes() {
    let mut m = with_window(single(4000.0, HELD, 0.3, 0.0), Frame::Jambs);
    let hand = value(&run(&m), "w_Rd");
    for (part, words) in [(0.9, "no less than"), (1.1, "less than")] {
        m.q_net = Stress::new(part * hand / Annex::UK.gamma_Q);
        let s = run(&by_limit(m.clone()));
        let said =
            format!("By hand the wall takes {}, {words} the wind", show("w_Rd", Stress::new(hand).dynamic()));
        assert!(s.entries.iter().any(|e| format!("{e:?}").contains(&said)), "{said}");
    }
}
