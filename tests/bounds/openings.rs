//! What openings do that one would not guess, and panels that they cut to pieces.

use perpend::solve::plate::{Carry, Held, Opening, Stretch, Trouble};

use super::random::Panel;

/// A panel of 3.0 x 2.6 m with one opening in the middle of its length, whole edges left, right, base, top.
fn panel(held: [Held; 4], width: f64, y: (f64, f64)) -> Panel {
    let (l, h) = (3.0, 2.6);
    let lengths = [h, h, l, l].into_iter().zip(held);
    let mut edges = lengths.map(|(to, held)| vec![Stretch { from: 0.0, to, held }]);
    let edges = [(); 4].map(|()| edges.next().expect("four edges"));
    let x = ((l - width) / 2.0, (l + width) / 2.0);
    let openings = vec![Opening { x, y, carry: Carry::Jambs }];
    Panel { l, h, openings, edges, m_H: 1.0, m_V: 0.35, weight: 0.0 }
}

/// Stronger than the wall, so the wall decides.
const FIXED: Held = Held::Continuous(9.0);

/// Two cantilevers of length a, each with its own wind and half of the opening's at its end:
/// `q a^2 / 2 + q (l - 2 a) a / 2 = m_H`, so `q = 2 m_H / (a (l - a))`: the shorter they are, the more they carry.
#[test]
fn cantilevers_beside_an_opening_of_full_height() {
    // There is neither head nor sill, so the wind on such an opening goes to the jambs whatever its frame.
    for (width, carry) in
        [(0.6, Carry::Jambs), (1.2, Carry::AllRound), (1.8, Carry::Jambs), (2.4, Carry::HeadAndSill)]
    {
        let mut panel = panel([FIXED, FIXED, Held::Free, Held::Free], width, (0.0, 2.6));
        panel.openings[0].carry = carry;
        let a: f64 = (3.0 - width) / 2.0;
        let exact = 2.0 / (a * (3.0 - a));
        let (low, high) = (panel.safe(16.0).expect("it is held"), panel.upper(8.0).expect("it is held"));
        for found in [low.pressure, high.pressure] {
            assert!((found / exact - 1.0).abs() < 1e-4, "{carry:?} {width}: {found} for {exact}");
        }
    }
}

/// A panel that spans from side to side on continuous edges carries more with the wider window: the jambs take the wind
/// of the opening, and the wider it is, the nearer they stand to the sides. So a wider opening is no safe stand-in for a
/// narrower one.
#[test]
fn a_wider_window_can_carry_more() {
    let held = [FIXED, FIXED, Held::Simple, Held::Simple];
    let (narrow, wide) = (panel(held, 1.2, (0.9, 2.1)), panel(held, 1.8, (0.9, 2.1)));
    let bracket = |panel: &Panel| {
        let (low, high) = (panel.safe(24.0).expect("it is held"), panel.upper(12.0).expect("it is held"));
        (low.pressure, high.pressure)
    };
    let (narrow, wide) = (bracket(&narrow), bracket(&wide));
    assert!(narrow.0 <= narrow.1 && wide.0 <= wide.1, "{narrow:?} {wide:?}");
    // Proved where the brackets lie apart; the safe side may lie half a per cent high on this mesh.
    assert!(0.995 * wide.0 > narrow.1, "{narrow:?} {wide:?}");
}

/// Where both say that a piece is not held.
fn floating(panel: &Panel) -> [(f64, f64); 2] {
    match (panel.safe(12.0), panel.upper(8.0)) {
        (Err(Trouble::Floating(x, y)), Err(Trouble::Floating(a, b))) => [(x, y), (a, b)],
        (low, high) => panic!("{low:?} {high:?}"),
    }
}

/// An opening from base to top leaves two pieces. The right one hangs on a hinge along its side, or on nothing.
#[test]
fn a_piece_cut_off_is_named_by_a_point_in_it() {
    for right in [Held::Free, Held::Simple] {
        let cut = panel([FIXED, right, Held::Free, Held::Free], 0.8, (0.0, 2.6));
        for (panel, at) in [(cut.clone(), (1.9, 3.0)), (cut.mirrored(), (0.0, 1.1))] {
            for (x, y) in floating(&panel) {
                assert!(at.0 < x && x < at.1 && 0.0 < y && y < 2.6, "{right:?}: {x} {y}");
            }
        }
    }
}

/// A piece with an opening of its own: the point lies in the wall, not in the window.
#[test]
fn the_point_lies_in_the_wall() {
    let mut panel = panel([FIXED, Held::Free, Held::Free, Held::Free], 0.4, (0.0, 2.6));
    let window = (2.0, 2.7);
    panel.openings.push(Opening { x: window, y: (0.4, 2.2), carry: Carry::AllRound });
    for (x, y) in floating(&panel) {
        assert!(1.7 < x && x < 3.0 && 0.0 < y && y < 2.6, "{x} {y}");
        assert!(!(window.0 < x && x < window.1 && 0.4 < y && y < 2.2), "{x} {y} lies in the window");
    }
    // Held along its base and its top it stands.
    for edge in &mut panel.edges[2..] {
        *edge = vec![
            Stretch { from: 0.0, to: 2.5, held: Held::Free },
            Stretch { from: 2.5, to: 3.0, held: Held::Simple },
        ];
    }
    assert!(panel.safe(12.0).is_ok() && panel.upper(8.0).is_ok());
}
