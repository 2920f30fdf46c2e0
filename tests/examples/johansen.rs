//! K. W. Johansen, Yield-line Formulae for Slabs, 1972 (formulas from memory).

use perpend::standards::tables::annex_e::{Edge, Edges};
use perpend::standards::tables::annex_e_theory::theory;

const SIMPLE: Edges = Edges::new(Edge::Simple, Edge::Simple, Edge::Simple, Edge::Simple);

/// Square, simply supported, the same strength both ways: collapse at 24 m/l², exact.
#[test]
fn simply_supported_square() {
    let found = theory(SIMPLE, 1.0, 1.0).unwrap();
    assert!((1.0 / found.alpha - 24.0).abs() < 1e-9);
}

/// Rectangle of sides a and b, simply supported: `m = (q a²/24) (sqrt(3 + (a/b)²) - a/b)²`. Annex E
/// follows Johansen's approximate formula, which asks for up to 1.1 % more moment at these shapes.
#[test]
fn simply_supported_rectangles() {
    for (b, collapse) in [(1.5, 16.9692), (2.0, 14.1407)] {
        let ratio: f64 = 1.0 / b;
        let exact = ((3.0 + ratio.powi(2)).sqrt() - ratio).powi(2) / 24.0;
        assert!((1.0 / exact - collapse).abs() < 0.0001);
        let alpha = theory(SIMPLE, 1.0, b).unwrap().alpha;
        assert!(alpha >= exact && alpha <= 1.011 * exact, "{b}: {alpha} {exact}");
    }
}

/// The affinity theorem: a panel with strength mu across its height is the panel of equal strengths
/// stretched by 1/sqrt(mu) in height.
#[test]
fn affinity() {
    use Edge::{Continuous as C, Free as F, Simple as S};
    for edges in [
        SIMPLE,
        Edges::new(F, S, C, S),
        Edges::new(F, C, C, C),
        Edges::new(S, C, C, F),
        Edges::new(C, S, S, F),
    ] {
        for (mu, h) in [(0.35, 0.65), (0.1, 1.4), (0.8, 0.3)] {
            let (one, other) =
                (theory(edges, mu, h).unwrap(), theory(edges, 1.0, h / f64::sqrt(mu)).unwrap());
            assert!((one.alpha / other.alpha - 1.0).abs() < 1e-12, "{edges:?} {mu} {h}");
        }
    }
}
