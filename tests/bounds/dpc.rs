//! A base that its own weight holds against turning: beside a strip by hand, and between a simple and a fixed base.

use perpend::solve::plate::elastic::first_crack;
use perpend::solve::plate::safe::safe;
use perpend::solve::plate::upper::{upper, usual_spacing};
use perpend::solve::plate::{Carry, Held, Opening, Plate, Stretch, Trouble};

const L: f64 = 4000.0;
const H: f64 = 2600.0;
const M_H: f64 = 2000.0;
const M_V: f64 = 700.0;

/// From below and from above, N/mm², and at the first crack.
fn three(base: Held, sides: Held, openings: &[Opening]) -> Result<[f64; 3], Trouble> {
    let edge = |to: f64, held: Held| vec![Stretch { from: 0.0, to, held }];
    let plate = Plate {
        l: L,
        h: H,
        openings: openings.to_vec(),
        edges: [edge(H, sides), edge(H, sides), edge(L, base), edge(L, Held::Simple)],
        m_H: M_H,
        m_V: &|_, _| M_V,
    };
    let low = safe(&plate, 125.0)?.pressure;
    Ok([low, upper(&plate, usual_spacing(&plate))?.pressure, first_crack(&plate, 125.0, 250.0)?.pressure])
}

/// Sides free: a strip from base to top with `M` at its foot. Where the moment in the span is greatest its shear is nought,
/// so the upper part, of height x, has `w x²/2 = m_V` and the lower `w (H - x)²/2 = m_V + M`:
/// `w = 2 (sqrt(m_V) + sqrt(m_V + M))² / H²`.
#[test]
fn a_strip_by_hand() {
    for weight in [0.0, 150.0, 400.0, 700.0] {
        let by_hand = 2.0 * (M_V.sqrt() + (M_V + weight).sqrt()).powi(2) / (H * H);
        let [low, high, _] = three(Held::Weight(weight), Held::Free, &[]).expect("held");
        assert!((low / by_hand - 1.0).abs() < 4e-3, "{weight} N: {low} from below, {by_hand} by hand");
        // The crack of the span lies on a line of the grid.
        assert!(
            high >= by_hand * (1.0 - 1e-6) && high < by_hand * 1.01,
            "{weight} N: {high}, {by_hand} by hand"
        );
    }
}

/// A window and simple sides: more weight never takes less, without any it is a simple base, and with as much as the wall
/// itself bears it is a fixed one.
#[test]
fn between_a_simple_and_a_fixed_base() {
    let window = [Opening { x: (1400.0, 2600.0), y: (900.0, 2100.0), carry: Carry::Jambs }];
    let of = |base: Held| three(base, Held::Simple, &window).expect("held");
    let (simple, fixed) = (of(Held::Simple), of(Held::Continuous(M_V)));
    let with: Vec<[f64; 3]> = [0.0, 100.0, 300.0, M_V].iter().map(|m| of(Held::Weight(*m))).collect();
    for bound in 0..2 {
        assert!((with[0][bound] / simple[bound] - 1.0).abs() < 1e-5, "{with:?} {simple:?}");
        assert!((with[3][bound] / fixed[bound] - 1.0).abs() < 1e-5, "{with:?} {fixed:?}");
        assert!(with.windows(2).all(|pair| pair[0][bound] <= pair[1][bound] * (1.0 + 1e-6)), "{with:?}");
        assert!(with[2][bound] > 1.01 * simple[bound], "the weight helps: {with:?}");
    }
    // Until the first crack the joint is a hinge, whatever lies on it.
    assert!(with.iter().all(|w| w[2] == simple[2]), "{with:?} {simple:?}");
}

/// Weight on one edge holds a piece: a wall on its base alone, a cantilever.
#[test]
fn a_base_alone_holds_as_much_as_lies_on_it() {
    let edge = |to: f64, held: Held| vec![Stretch { from: 0.0, to, held }];
    let wall = |base: Held| Plate {
        l: L,
        h: H,
        openings: Vec::new(),
        edges: [edge(H, Held::Free), edge(H, Held::Free), edge(L, base), edge(L, Held::Free)],
        m_H: M_H,
        m_V: &|_, _| M_V,
    };
    let [low, high] = {
        let plate = wall(Held::Weight(300.0));
        [safe(&plate, 125.0).expect("held").pressure, upper(&plate, 160.0).expect("held").pressure]
    };
    // w H²/2 = 300 N.
    let by_hand = 2.0 * 300.0 / (H * H);
    assert!(
        (low / by_hand - 1.0).abs() < 1e-3 && (high / by_hand - 1.0).abs() < 1e-3,
        "{low} {high} {by_hand}"
    );
    let none = wall(Held::Weight(0.0));
    assert!(matches!(safe(&none, 125.0), Err(Trouble::Floating(..))));
    assert!(matches!(upper(&none, 160.0), Err(Trouble::Floating(..))));
}
