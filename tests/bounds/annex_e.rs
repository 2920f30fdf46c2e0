//! All cases of Annex E of EN 1996-1-1 between the two sides, and the straight patterns of its tables beside them.

use perpend::solve::plate::{Held, Stretch};
use perpend::standards::tables::annex_e::{Case, Edge, Edges};
use perpend::standards::tables::annex_e_theory::theory;

use super::random::{Panel, each};

/// A panel of length 1 and strengths 1 and `mu` whose continuous edges bring more than the wall has.
fn panel(edges: Edges, mu: f64, h: f64) -> Panel {
    let whole = |to: f64, edge| {
        let held = match edge {
            Edge::Free => Held::Free,
            Edge::Simple => Held::Simple,
            Edge::Continuous => Held::Continuous(9.0),
        };
        vec![Stretch { from: 0.0, to, held }]
    };
    let edges = [whole(h, edges.left), whole(h, edges.right), whole(1.0, edges.base), whole(1.0, edges.top)];
    Panel { l: 1.0, h, openings: vec![], edges, m_H: 1.0, m_V: mu, weight: 0.0 }
}

/// How wide the brackets are, without and with continuous edges: measured 1.007 and 1.058 at most. Fans in the corners
/// want many nodes.
const WIDTH: [f64; 2] = [1.01, 1.06];

/// How far the straight pattern may lie above the weakest one: Johansen's formula for four held edges is an
/// approximation that asks for up to 1.1 % too much near the square, 1.5 % in the case of E, mu 0.35, h/l 1.75.
const FORMULA: f64 = 1.02;

/// The moment coefficient `m_H / (pressure l^2)` of every case, from the weakest pattern (least) to the moment field.
#[test]
fn every_case_lies_in_its_bracket() {
    let all = each(0..=11, |number| {
        let case = Case::ALL[number as usize];
        let mut found = Vec::new();
        for mu in [1.0, 0.35] {
            for h in [0.5, 1.0, 1.75] {
                let panel = panel(case.edges(), mu, h);
                let straight = theory(case.edges(), mu, h).expect("one free edge at most").alpha;
                let most = 1.0 / panel.safe(24.0).expect("it is held").pressure;
                let least = 1.0 / panel.upper(12.0).expect("it is held").pressure;
                found.push((mu, h, straight, least, most));
            }
        }
        (case, found)
    });
    for (_, (case, found)) in all {
        let Edges { top, base, left, right } = case.edges();
        let clamped = [top, base, left, right].contains(&Edge::Continuous);
        for (mu, h, straight, least, most) in found {
            let at = format!("{case}, mu {mu}, h/l {h}: {straight} straight, {least} to {most}");
            assert!(least <= most, "{at}");
            assert!(most <= WIDTH[usize::from(clamped)] * least, "{at}");
            assert!(straight <= FORMULA * least, "{at}");
            if clamped {
                // Fans in the corners take less energy than straight lines.
                assert!(straight < most, "{at}");
            } else {
                assert!(straight >= 0.98 * least, "{at}");
            }
        }
    }
}
