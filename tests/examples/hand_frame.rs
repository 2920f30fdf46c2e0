//! What a frame in place of a return would have to do, by hand, through a whole job.

use perpend::checks::{Section, run};
use perpend::trace::Entry;

use super::job::{BLOCK_140, PLAIN_RETURN, with_return};

/// A return of 600 mm that takes 4 m of wind face and carries a beam of 20 and 10 kN; `above` is its line of `from_above`.
fn short(above: &str) -> Section {
    let lines = PLAIN_RETURN
        .replace("length = \"1200 mm\"", "length = \"600 mm\"")
        .replace("tributary_width = \"0.1 m\"", &format!("tributary_width = \"4 m\"{above}"))
        .replace(
            "[returns.junction]",
            "[[returns.loads]]\nwhat = \"beam\"\ndead = \"20 kN\"\nimposed = \"10 kN\"\nat = \"300 mm\"\n\n[returns.junction]",
        );
    section(&lines)
}

fn section(lines: &str) -> Section {
    let b = perpend::job::read("hand.toml", &with_return(BLOCK_140, lines))
        .unwrap_or_else(|e| panic!("{}", e.render(false)));
    let results = run(&b);
    assert_eq!(results.faults().count(), 0);
    results.sections.into_iter().find(|s| s.id == "R1").expect("the return's sheet")
}

fn close(section: &Section, hand: &[(&str, f64)]) {
    for (symbol, hand) in hand {
        let got = section.sheet.standing(symbol).unwrap_or_else(|| panic!("{symbol} does not stand")).value;
        assert!((got - hand).abs() <= 1e-9 * hand.abs(), "{symbol} = {got}, by hand {hand}");
    }
}

/// 0.60 kN/m² on 4 m: 2.4 kN/m over 2.5 m, 6 kN. Half of the storey leans on it: 100 and 40 kN; tilt 0.004: V_k = 6 +
/// 0.004 x 140 = 6.56 kN, V_d = 9 + 0.004 (135 + 60) = 9.78 kN. About the feet 9.78 x 2.5 = 24.45 kNm; legs 2 m apart,
/// the length of the wall removed: 12.225 kN up and down. Beam: 1.35 x 20 + 1.5 x 10 = 42 kN. Sway 2500/500 = 5 mm, so
/// 6560/5 = 1312 N/mm. The return: E t/(4 r³ + 3 r) with r = 25/6 and E = 1000 f_k.
#[test]
fn a_short_return_fails_and_its_frame_is_told() {
    let section = short("");
    assert!(!section.sheet.holds());
    close(
        &section,
        &[
            ("W_k", 6000.0),
            ("V_k", 6560.0),
            ("V_d", 9780.0),
            ("l_F", 2000.0),
            ("M_F", 24.45e6),
            ("R_F", 12_225.0),
            ("N_F", 42_000.0),
            ("u_F", 5.0),
            ("K_F", 1312.0),
        ],
    );
    let f_k = section.sheet.standing("f_k").expect("stands").value;
    let r: f64 = 25.0 / 6.0;
    let K_m = 1000.0 * f_k * 140.0 / (4.0 * r.powi(3) + 3.0 * r);
    close(&section, &[("K_m", K_m), ("r_K", 1312.0 / (1312.0 + K_m))]);
}

/// 1 kN and 2 kNm from above: W_k = 7 kN, V_d = 10.5 + 0.78 = 11.28 kN, M = 11.28 x 2.5 + 1.5 x 2 = 31.2 kNm.
#[test]
fn what_comes_from_above_turns_the_frame_too() {
    let section = short("\nfrom_above = { force = \"1 kN\", moment = \"2 kNm\" }");
    close(&section, &[("W_k", 7000.0), ("V_d", 11_280.0), ("M_F", 31.2e6), ("R_F", 15_600.0)]);
}

/// A return that passes needs no frame, and its sheet has none.
#[test]
fn no_frame_where_the_return_is_adequate() {
    let beam = "[[returns.loads]]\nwhat = \"beam\"\ndead = \"20 kN\"\nimposed = \"10 kN\"\nat = \"600 mm\"\n\n[returns.junction]";
    let section = section(&PLAIN_RETURN.replace("[returns.junction]", beam));
    assert!(section.sheet.holds(), "{:?}", section.sheet.verdicts);
    let frame = |e: &Entry| matches!(e, Entry::Heading(_, words) if words.contains("frame"));
    assert!(!section.sheet.entries.iter().any(frame));
    assert!(section.sheet.standing("K_F").is_none());
}
