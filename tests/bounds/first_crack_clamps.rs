//! The first crack along continuous feet whose strength or wall changes along them: each place by its own run of wall.
//! Lengths and pressure of 1.

use perpend::solve::plate::elastic::{POISSON, field, first_crack};
use perpend::solve::plate::{Carry, Held, Opening, Plate, Stretch};

use super::first_crack::{near, plain};

/// Wider than any panel here, so that means are taken over a whole run of wall.
const WIDE: f64 = 10.0;

/// Statics: the foot of a cantilever brings h²/2; half of its bed joints bear 0.2, the others 0.5, and the weaker ones
/// count.
#[test]
fn the_weakest_bed_joint_of_a_foot_counts() {
    let m_V = |x: f64, _: f64| if x < 1.0 { 0.2 } else { 0.5 };
    let crack = first_crack(&plain((2.0, 1.5), "FFCF", 9.0, 9.0, &m_V), 0.125, WIDE).expect("it is held");
    near(crack.pressure, 0.2 / (1.5 * 1.5 / 2.0), 1e-7);
}

/// Statics: an opening of 0.8 from base to top between cantilevers of 0.6 and 1.8, its wind half to each jamb. The narrow
/// one has the wind of 1.0 on a foot of 0.6 and cracks first; the wall beyond the opening does not help it.
#[test]
fn a_foot_ends_at_an_opening() {
    let window = Opening { x: (0.6, 1.4), y: (0.0, 1.5), carry: Carry::Jambs };
    let cut = Plate { openings: vec![window], ..plain((3.2, 1.5), "FFCF", 0.3, 9.0, &|_, _| 9.0) };
    let crack = first_crack(&cut, 0.1, WIDE).expect("it is held");
    near(crack.pressure, 0.3 / (1.0 / 0.6 * 1.5 * 1.5 / 2.0), 1e-7);
    assert!(crack.at.0 <= 0.6 && crack.at.1 == 0.0, "{crack:?}");
}

/// A foot of two strengths: the weak part is judged by the moments on it alone, which are those of the triangles on it.
#[test]
fn a_foot_is_judged_by_stretches() {
    let (split, weak) = (0.75, 0.01);
    let mut plate = plain((4.0, 2.0), "SSSS", 9.0, 9.0, &|_, _| 9.0);
    let stretch = |from, to, m| Stretch { from, to, held: Held::Continuous(m) };
    plate.edges[2] = vec![stretch(0.0, split, weak), stretch(split, 4.0, 9.0)];
    let mut moment = 0.0;
    for triangle in field(&plate, 0.125, POISSON).expect("it is held") {
        let foot: Vec<f64> = triangle.corners.iter().filter(|c| c[1] == 0.0).map(|c| c[0]).collect();
        if let [a, b] = foot[..]
            && a.max(b) < split + 1e-9
        {
            moment += (a - b).abs() * triangle.moments[0].y;
        }
    }
    let crack = first_crack(&plate, 0.125, WIDE).expect("it is held");
    near(crack.pressure, weak * split / moment.abs(), 1e-7);
    assert!(crack.bed_joint && crack.at.0 <= split, "{crack:?}");
}
