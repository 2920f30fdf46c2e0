//! The storey's sharing by hand, through a whole job.

use perpend::building::{Along, BracingWall, Ends, ShareBy, Stands};
use perpend::checks::stability::share;
use perpend::quantity::{Length, Stress};
use perpend::standards::annex::Annex;
use perpend::trace::Sheet;
use perpend::wind::Pressures;

use super::job::{BLOCK_140, PLAIN_RETURN, with_return};

fn wall(mark: &str, at: f64, length: f64, stands: Stands, ends: Ends) -> BracingWall {
    BracingWall {
        mark: mark.to_owned(),
        along: Along::Y,
        at: Length::new(at),
        other_at: Some(Length::new(0.0)),
        length: Length::new(length),
        height: Length::new(2500.0),
        build_up: "wall".to_owned(),
        stands,
        ends,
    }
}

fn close(got: Option<f64>, hand: f64) {
    assert!(got.is_some_and(|x| (x - hand).abs() < 1e-9), "{got:?}, by hand {hand}");
}

/// Two walls of one thickness at 0 and 8 m, 5 m and 2.5 m long, 2.5 m high, under a front of 8 m; before the removal a
/// third at 3 m.
///
/// Cantilevers: h/l 0.5 and 1: k = 1/(4 x 0.125 + 1.5) = 0.5 and 1/(4 + 3) = 1/7. Centre at 8 (1/7)/(9/14) = 16/9 m,
/// push at 4 m: arm 20/9. J = 0.5 (16/9)² + (1/7)(56/9)² = 64/9. Direct 7/9 and 2/9; torsion (20/9) k d/J = 5/18 each,
/// against the push at the near wall, with it at the far one. Relief is not counted: 7/9 and 2/9 + 5/18 = 1/2.
#[test]
fn two_walls_of_unequal_stiffness() {
    let mut b = perpend::job::read("hand.toml", &with_return(BLOCK_140, PLAIN_RETURN))
        .unwrap_or_else(|e| panic!("{e:?}"));
    let mut st = b.stability.take().expect("a storey");
    st.share_by = ShareBy::Stiffness;
    st.walls = vec![
        wall("A", 0.0, 5000.0, Stands::Both, Ends::Cantilever),
        wall("B", 8000.0, 2500.0, Stands::Both, Ends::Cantilever),
        wall("C", 3000.0, 5000.0, Stands::Before, Ends::Fixed),
    ];
    let wind = Pressures { overall: Stress::new(0.6e-3), panel: Stress::new(0.7e-3) };
    let mut s = Sheet::recorder();
    let storey = share(&mut s, &b, &st, wind, &Annex::UK).expect("braced");
    assert!(s.faults.is_empty());
    close(storey.shares[0].after, 7.0 / 9.0);
    close(storey.shares[1].after, 0.5);
    assert!(storey.shares[2].after.is_none() && storey.after("C").is_none());
    // Before: C, held at both ends, has k = 1/(0.125 + 1.5) = 8/13. Sum k = 0.5 + 1/7 + 8/13; centre
    // (8/7 + 24/13)/sum; the push at 4 m lies beyond it.
    let (a, far, c) = (0.5_f64, 1.0_f64 / 7.0, 8.0_f64 / 13.0);
    let sum = a + far + c;
    let centre = (8.0 * far + 3.0 * c) / sum;
    let arm = 4.0 - centre;
    let j = a * centre * centre + far * (8.0 - centre).powi(2) + c * (3.0 - centre).powi(2);
    close(storey.shares[0].before, a / sum);
    close(storey.shares[1].before, far / sum + arm * far * (8.0 - centre) / j);
    close(storey.shares[2].before, c / sum + arm * c * (3.0 - centre) / j);
    // Force of the storey: 0.6 x 8 x 2.6 + 5 = 17.48 kN.
    assert!((storey.F_k.base() - 17_480.0).abs() < 1e-6);
}
