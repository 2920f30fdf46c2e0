//! Identities worked by hand that no published source gives (grade D): they hold the tool against first
//! principles, not against anyone's authority.

use perpend::quantity::{Length, Num, Stress};
use perpend::standards::annex::Annex;
use perpend::standards::en1996::section::{Section, block_area, triangle};
use perpend::standards::en1996::shear::{compressed_length, design_strength};
use perpend::trace::Sheet;

fn close(got: f64, hand: f64, digits: i32) {
    assert!((got - hand).abs() <= 0.5 * 10f64.powi(-digits) + 1e-9, "{got}, by hand {hand}");
}

/// Cracked section: 102.5 by 1000 mm, 20 kN and 6 kNm, f_vk0 = 0.15 N/mm², gamma_M = 2.5. Derived, not
/// published: linear section without tension. e = 300, l_c = 600 mm, edge stress 0.650, sigma_d over l_c 0.325,
/// f_vk 0.280 N/mm², V_Rd 6.89 kN; the uniform block is 400 mm long.
#[test]
fn cracked_section() {
    let mut s = Sheet::silent();
    let (t, l, n, m) = (102.5, 1000.0, 20e3, 6e6);
    let e = m / n;
    close(e, 300.0, 3);
    let l_c = compressed_length(&mut s, Length::new(l), Length::new(e)).base();
    close(l_c, 600.0, 6);
    let sec = Section { b_1: Length::new(t), d_1: Length::new(l), b_2: Length::new(t), L_s: Length::new(l) };
    let block = block_area(&mut s, sec, Length::new(l / 2.0 - e)).base() / t;
    close(block, 400.0, 6);
    let tri =
        triangle(&mut s, sec, perpend::quantity::Force::new(n), Length::new(l / 2.0 - e)).expect("stands");
    close(tri.sigma_toe.base(), 0.650407, 6);
    let sigma_d = n / (t * l_c);
    close(sigma_d, 0.325203, 6);
    let f_vd = design_strength(
        &mut s,
        &Annex::UK,
        true,
        Stress::new(0.15),
        Stress::new(sigma_d),
        Stress::new(20.0),
        Num::new(2.5),
    );
    close(f_vd.base() * 2.5, 0.280081, 6);
    close(f_vd.base() * t * l_c / 1e3, 6.89, 2);
}

/// First decompression: the same section under 20 kN and 3.3333333 kNm, e = l/6 (to the digits given). Derived, not
/// published: the cracked and the uncracked formula meet; edge stresses 0.390 and 0.
#[test]
fn first_decompression() {
    let mut s = Sheet::silent();
    let (t, l, n, m) = (102.5, 1000.0, 20e3, 3.333_333_3e6);
    let e = m / n;
    let l_c = compressed_length(&mut s, Length::new(l), Length::new(e)).base();
    close(l_c, 1000.0, 6);
    let (area, z) = (t * l, t * l * l / 6.0);
    close(n / area + m / z, 0.390244, 6);
    close(n / area - m / z, 0.0, 6);
    let past = compressed_length(&mut s, Length::new(l), Length::new(l / 6.0 + 1e-9)).base();
    close(past, l_c, 6);
    let sec = Section { b_1: Length::new(t), d_1: Length::new(l), b_2: Length::new(t), L_s: Length::new(l) };
    let tri =
        triangle(&mut s, sec, perpend::quantity::Force::new(n), Length::new(l / 2.0 - e)).expect("stands");
    close(tri.sigma_toe.base(), 0.390244, 6);
}

/// Perpends not filled: 0.5 f_vk0 + 0.4 sigma_d, at most 0.045 f_b (3.6.2(4) eq. 3.6, from memory, check against the
/// standard); filled: at most 0.065 f_b (eq. 3.5).
#[test]
fn limits_of_the_shear_strength() {
    let f_vd = |filled, sigma: f64, f_b: f64| {
        let (f_vk0, one) = (Stress::new(0.2), Num::new(1.0));
        design_strength(
            &mut Sheet::silent(),
            &Annex::UK,
            filled,
            f_vk0,
            Stress::new(sigma),
            Stress::new(f_b),
            one,
        )
        .base()
    };
    close(f_vd(true, 0.5, 10.0), 0.4, 9);
    close(f_vd(true, 2.0, 10.0), 0.65, 9);
    close(f_vd(false, 0.5, 10.0), 0.3, 9);
    close(f_vd(false, 2.0, 10.0), 0.45, 9);
}
