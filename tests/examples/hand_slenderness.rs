//! Effective height and flange by hand: 5.5.1.2(11), 5.5.3 (from memory, check against the standard).

use perpend::quantity::{Length, Num};
use perpend::standards::en1996::flange::{Side, left, right};
use perpend::standards::en1996::slenderness::{Stiffened, effective_height, effective_thickness_cavity};
use perpend::trace::Sheet;

fn mm(x: f64) -> Length {
    Length::new(x)
}

#[test]
fn effective_heights() {
    use Stiffened::{None as Neither, One, Two};
    // h 2400 mm, rho_2 as given, t 100 mm unless it matters.
    for (stiffened, l, rho_2, rho) in [
        // Not stiffened: rho_2.
        (Neither, 900.0, 1.0, 1.0),
        (Neither, 900.0, 0.75, 0.75),
        // One edge, h <= 3.5 l: rho_2/(1 + (rho_2 h/(3 l))²). 2400/2700: 1/(1 + 0.7901) = 0.5586.
        (One, 900.0, 1.0, 0.558_620_689_655),
        // rho_2 0.75: 0.75/(1 + (1800/2700)²) = 0.75/1.4444 = 0.5192.
        (One, 900.0, 0.75, 0.519_230_769_231),
        // One edge, h > 3.5 l: 1.5 l/h, at least 0.3. 1.5 x 600/2400 = 0.375; 1.5 x 300/2400 = 0.1875 -> 0.3.
        (One, 600.0, 1.0, 0.375),
        (One, 300.0, 1.0, 0.3),
        // At 15 t the edge no longer counts; just below it does: 1/(1 + (2400/4497)²).
        (One, 1500.0, 1.0, 1.0),
        (One, 1499.0, 1.0, 0.778_316_668_404),
        // Two edges, h <= 1.15 l: rho_2/(1 + (rho_2 h/l)²). l 2500: 1/(1 + 0.9216) = 0.5204.
        (Two, 2500.0, 1.0, 0.520_399_666_944),
        // h > 1.15 l: 0.5 l/h. l 1200: 0.25.
        (Two, 1200.0, 1.0, 0.25),
        (Two, 2000.0, 1.0, 0.416_666_666_667),
        // At 30 t no longer.
        (Two, 3000.0, 1.0, 1.0),
        (Two, 2999.0, 1.0, 1.0 / (1.0 + (2400.0_f64 / 2999.0).powi(2))),
    ] {
        let h_ef =
            effective_height(&mut Sheet::silent(), stiffened, mm(2400.0), mm(l), mm(100.0), Num::new(rho_2));
        let hand = rho * 2400.0;
        assert!((h_ef.base() - hand).abs() < 0.5, "{stiffened:?} {l} {rho_2}: {} {hand}", h_ef.base());
    }
    // 5.5.1.3(3) with k_tef 1: (90³ + 140³)^(1/3) = 151.4 mm.
    let t_ef = effective_thickness_cavity(&mut Sheet::silent(), Num::new(1.0), mm(90.0), mm(140.0));
    assert!((t_ef.base() - 151.4).abs() < 0.05, "{}", t_ef.base());
}

/// Each of the five limits of a flange rules once, on either side: h_tot/5, half the distance to the next wall,
/// the end, h/2, 6 t.
#[test]
fn flanges() {
    for (h_tot, h, t_f, to_end, to_next, hand) in [
        (2500.0, 2400.0, 100.0, 9e3, Some(9e3), 500.0),
        (2500.0, 2400.0, 100.0, 9e3, None, 500.0),
        (9e3, 2400.0, 100.0, 9e3, Some(900.0), 450.0),
        (9e3, 2400.0, 100.0, 333.0, Some(9e3), 333.0),
        (9e3, 2400.0, 100.0, 333.0, None, 333.0),
        (9e3, 1000.0, 100.0, 9e3, Some(9e3), 500.0),
        (9e3, 1000.0, 100.0, 9e3, None, 500.0),
        (9e3, 2400.0, 100.0, 9e3, Some(9e3), 600.0),
        (9e3, 2400.0, 100.0, 9e3, None, 600.0),
    ] {
        let side = Side { to_end: mm(to_end), to_next: to_next.map(mm) };
        let s = &mut Sheet::silent();
        assert_eq!(left(s, side, mm(h_tot), mm(h), mm(t_f)).base(), hand);
        assert_eq!(right(s, side, mm(h_tot), mm(h), mm(t_f)).base(), hand);
    }
}
