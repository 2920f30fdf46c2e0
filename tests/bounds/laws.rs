//! Laws that hold for every panel, on panels drawn at random: mirrors, quarter turns, scale, and more strength or
//! support never carries less. Both sides, each on one mesh.

use perpend::solve::plate::{Carry, Held};

use super::random::{Panel, each};

/// The solvers end within a millionth of their optimum; both panels of a comparison may be off, and a little more.
const SOLVED: f64 = 5e-6;

/// The pressure does not settle every reaction where several fields carry it; the solver then ends in their midst, and a
/// mirror leads it there by another way: 0.014 % of the largest reaction at most on these panels.
const LEFT_OPEN: f64 = 1e-3;

/// Panels from `first` on that both analyses take, as many as asked for.
fn held(first: u64, wanted: usize, fits: impl Fn(&Panel) -> bool) -> Vec<Panel> {
    let drawn = (first..).map(Panel::random).filter(|panel| fits(panel));
    drawn.filter(|panel| panel.safe(4.0).is_ok()).take(wanted).collect()
}

/// Safe and upper side, coarse.
fn both(panel: &Panel) -> [f64; 2] {
    [panel.safe(8.0).expect("it is held").pressure, panel.upper(6.0).expect("it is held").pressure]
}

/// `f` on each panel, on two threads.
fn on_each(panels: &[Panel], f: impl Fn(&Panel) + Sync) {
    each(0..=panels.len() as u64 - 1, |n| f(&panels[n as usize]));
}

fn alike(found: [f64; 2], wanted: [f64; 2], of: &Panel) {
    for (found, wanted) in found.into_iter().zip(wanted) {
        assert!((found / wanted - 1.0).abs() < SOLVED, "{found} for {wanted}: {of:?}");
    }
}

#[test]
fn mirrored_panels_carry_the_same() {
    on_each(&held(1001, 20, |_| true), |panel| {
        let mirrored = panel.mirrored();
        alike(both(&mirrored), both(panel), panel);
        // Left for right, and base and top from the other end.
        let (one, other) = (panel.safe(8.0).expect("it is held"), mirrored.safe(8.0).expect("it is held"));
        let [left, right, mut base, mut top] = other.reactions;
        base.reverse();
        top.reverse();
        let largest = one.reactions.iter().flatten().fold(0.0_f64, |a, r| a.max(r.abs()));
        for (reaction, mirror) in
            one.reactions.iter().flatten().zip([right, left, base, top].iter().flatten())
        {
            assert!((reaction - mirror).abs() < LEFT_OPEN * largest, "{reaction} and {mirror}: {panel:?}");
        }
    });
}

/// A quarter turn exchanges the strengths, and jambs with head and sill. An opening from base to top would lie from
/// side to side, which no wall has.
#[test]
fn turned_panels_carry_the_same() {
    let fits = |p: &Panel| p.weight == 0.0 && p.openings.iter().all(|o| o.y != (0.0, p.h));
    // Strips, beams that the safe side adds where bed joints are weak, lie level whichever way the panel does.
    on_each(&held(2001, 20, |p| fits(p) && p.m_V > 0.1), |panel| {
        alike(both(&panel.turned()), both(panel), panel)
    });
}

#[test]
fn twice_the_strength_and_twice_the_size() {
    on_each(&held(3001, 10, |_| true), |panel| {
        let plain = both(panel);
        alike(both(&panel.stronger(2.0)), plain.map(|p| 2.0 * p), panel);
        alike(both(&panel.larger(2.0)), plain.map(|p| p / 4.0), panel);
        // N and mm, as a sheet has them.
        alike(both(&panel.larger(1000.0).stronger(1000.0)), plain.map(|p| p / 1000.0), panel);
    });
}

/// Held the next better way, if there is one.
fn raised(held: Held) -> Option<Held> {
    match held {
        Held::Free => Some(Held::Simple),
        Held::Simple => Some(Held::Weight(0.3)),
        Held::Weight(_) => Some(Held::Continuous(0.6)),
        Held::Continuous(m) if m < 1.0 => Some(Held::Continuous(9.0)),
        Held::Continuous(_) => None,
    }
}

/// On one mesh whatever was in equilibrium, or a pattern, before, is so after. That no wind on openings carries no less
/// is no law (wind on one part can hold another), but holds on these panels.
#[test]
fn nothing_better_carries_less() {
    on_each(&held(4001, 20, |_| true), |panel| {
        let plain = both(panel);
        let no_less = |better: &Panel, what: &str| {
            for (found, plain) in both(better).into_iter().zip(plain) {
                assert!(found > plain * (1.0 - SOLVED), "{what}: {found} after {plain}: {panel:?}");
            }
        };
        for edge in 0..4 {
            let mut better = panel.clone();
            let mut changed = false;
            for stretch in &mut better.edges[edge] {
                let next = raised(stretch.held);
                changed |= next.is_some();
                stretch.held = next.unwrap_or(stretch.held);
            }
            if changed {
                no_less(&better, &format!("edge {edge} raised"));
            }
        }
        no_less(&Panel { m_H: 1.2 * panel.m_H, ..panel.clone() }, "m_H raised");
        no_less(&Panel { m_V: 1.2 * panel.m_V, ..panel.clone() }, "m_V raised");
        let mut still = panel.clone();
        still.openings.iter_mut().for_each(|o| o.carry = Carry::Nowhere);
        no_less(&still, "no wind on the openings");
    });
}
