//! Digits: ratios rounded up, three significant digits, thin spaces, a true minus sign.

use perpend::quantity::print::{literal, ratio, show, significant};
use perpend::quantity::{Area, Force, Inertia, Length, LineLoad, Moment, Num, Stress, Volume};
use perpend::trace::{Sheet, text};
use perpend::{given, verify};
use proptest::prelude::*;

#[test]
fn ratios_are_rounded_up() {
    for (x, printed) in [
        (1.000_000_1, "1.01"),
        (1.0_f64.next_up(), "1.01"),
        (1.004, "1.01"),
        (1.01, "1.01"),
        (1.0, "1.00"),
        (0.999, "1.00"),
        (0.991, "1.00"),
        (0.99, "0.99"),
        (0.29, "0.29"),
        (0.57, "0.57"),
        (0.0, "0.00"),
        (-0.2, "0.00"),
        (1e-5, "0.01"),
        (98.999, "99.00"),
        (99.5, "> 99"),
        (f64::INFINITY, "∞"),
        (f64::NAN, "∞"),
    ] {
        assert_eq!(ratio(x), printed, "{x}");
    }
}

/// 0.999 prints as 1.00 and is adequate; 1.004 prints as 1.01 and is not.
#[test]
fn the_word_follows_the_comparison() {
    let line = |demand: f64| {
        let mut s = Sheet::recorder();
        given!(s, "", "", V_Ed = Force::new(demand));
        given!(s, "", "", V_Rd = Force::new(1000.0));
        verify!(s, "shear", "6.2", "shear", V_Ed <= V_Rd);
        text::sheet(&s)
    };
    assert!(line(999.0).contains("use 1.00: adequate"));
    assert!(line(1000.0).contains("use 1.00: adequate"));
    assert!(line(1000.0001).contains("> V_Rd = 1 kN: use 1.01: NOT ADEQUATE"), "{}", line(1000.0001));
    assert!(line(1004.0).contains("use 1.01: NOT ADEQUATE"));
}

#[test]
fn three_digits_and_thin_spaces() {
    for (x, printed) in [
        (0.0, "0"),
        (0.181_49, "0.181"),
        (0.1815, "0.181"),
        (11.58, "11.6"),
        (640.0, "640"),
        (2.5, "2.5"),
        (-12.345, "−12.3"),
        (1234.0, "1234"),
        (12_345.0, "12\u{2009}345"),
        (-1_234_567.0, "−1\u{2009}234\u{2009}567"),
        (0.000_123_4, "0.000123"),
        (9.996, "10.0"),
        (99.96, "100"),
        (0.099_96, "0.100"),
        (f64::NAN, "undefined"),
    ] {
        assert_eq!(significant(x), printed, "{x}");
    }
    assert_eq!(literal(0.065), "0.065");
    assert_eq!(literal(2.0), "2");
    assert_eq!(literal(-0.3), "−0.3");
}

#[test]
fn units_follow_the_symbol() {
    for (symbol, value, printed) in [
        ("l", Length::new(640.0).dynamic(), "640 mm"),
        ("t", Length::new(102.5).dynamic(), "102.5 mm"),
        ("e", Length::new(5.5556).dynamic(), "5.56 mm"),
        ("h_tot", Length::new(12_400.0).dynamic(), "12.4 m"),
        ("N_Ed", Force::new(41_900.0).dynamic(), "41.9 kN"),
        ("M_Ed", Moment::new(4.7e6).dynamic(), "4.7 kNm"),
        ("M_Rd1", Force::new(430.0).dynamic(), "0.43 kNm/m"),
        ("f_k", Stress::new(3.5).dynamic(), "3.5 N/mm²"),
        ("q_net", Stress::new(0.5e-3).dynamic(), "0.5 kN/m²"),
        ("w_Ed", LineLoad::new(0.72).dynamic(), "0.72 kN/m"),
        ("A", Area::new(64_000.0).dynamic(), "64\u{2009}000 mm²"),
        ("A", Area::new(240_000.0).dynamic(), "240 × 10³ mm²"),
        ("A_p", Area::new(11.27e6).dynamic(), "11.3 m²"),
        ("L_u", Length::new(210_125.0).dynamic(), "210.125 m"),
        ("Z", Volume::new(6e6).dynamic(), "6 × 10⁶ mm³"),
        ("I", Inertia::new(1.8e9).dynamic(), "1800 × 10⁶ mm⁴"),
        ("Phi_m", Num::new(0.7321).dynamic(), "0.732"),
    ] {
        assert_eq!(show(symbol, value).to_string(), printed, "{symbol}");
    }
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    /// A printed ratio is never below the ratio, never more than a hundredth above it, and above 1.00 exactly
    /// where the ratio is above 1.
    #[test]
    fn a_printed_ratio_never_flatters(x in 0.0..90.0_f64) {
        let printed: f64 = ratio(x).parse().unwrap();
        prop_assert!(printed >= x - 1e-9 && printed <= x + 0.01 + 1e-9, "{x} {printed}");
        prop_assert_eq!(printed > 1.0, x > 1.0);
    }

    /// Three significant digits are within half of the last of them.
    #[test]
    fn digits_are_close(x in 1e-4..1e5_f64) {
        let text = significant(x);
        let back: f64 = text.replace('\u{2009}', "").parse().unwrap();
        prop_assert!((back - x).abs() <= 0.005_000_1 * x, "{x} {text}");
        let digits = text.trim_start_matches(['0', '.']).chars().filter(char::is_ascii_digit).count();
        prop_assert!(digits <= 3 || x >= 999.5, "{x} {text}");
    }
}
