//! Lengths of wall between openings by hand, every step in plain numbers (N and mm; kN/m is N/mm).
//!
//! Independent arithmetic: nothing here calls a formula of the tool. Strengths are typed again from the tables
//! of EN 1996-1-1 and its UK National Annex, the lever of a floor from BS 5628-1 clause 31 (all from memory,
//! check against the standard).

use perpend::checks::Job;

const THROUGH: &str = include_str!("../../jobs/through-room.toml");
const BUNGALOW: &str = include_str!("../../jobs/bungalow.toml");

fn close(got: f64, hand: f64) {
    assert!((got - hand).abs() < 1e-9 * hand.abs().max(1.0), "{got}, by hand {hand}");
}

/// f_k of the grey block: 7.3 N/mm² mean, 215 mm by 100 mm, delta 1.38; K 0.75; M4.
fn block() -> f64 {
    0.75 * (1.38_f64 * 7.3).powf(0.7) * 4.0_f64.powf(0.3)
}

/// The spine wall under the end of the beam, at mid-height, 1.35 G + 1.5 Q: the one verdict of its sheet.
#[test]
fn the_spine_wall_under_the_end_of_the_beam() {
    // First floor 0.60 + 1.5 kN/m², roof 1.35 + 0.6 kN/m², block 19 kN/m³ 100 mm thick: 1.9 kN/m² of wall.
    let (floor_G, floor_Q, roof_G, roof_Q, wall) = (0.6, 1.5, 1.35, 0.6, 1.9);
    // Beam from 0.03 m to 3.65 m, bearings of 100 mm: middles at 0.08 m and 3.60 m. On it 2.7 m of floor and the
    // bedroom wall, 2.4 m high, from 0.03 m to 3.60 m; the wall's first 30 mm at its end; its own 0.35 kN/m.
    let at = |total: f64, middle: f64| total * (middle - 80.0) / 3520.0;
    let up = wall * 2.4;
    let beam_G = at((2.7 * floor_G + up) * 3570.0, 1815.0) + at(up * 30.0, 30.0) + at(0.35 * 3620.0, 1840.0);
    let beam_Q = at(2.7 * floor_Q * 3570.0, 1815.0);
    // On the spine wall: 5.3 m of floor on its far side, the wall above, and 3.6 m and 5.3 m of roof on that.
    let floor = 5.3 / 2.0;
    let roof = (3.6 + 5.3) / 2.0;
    let line_G = floor * floor_G + roof * roof_G + up;
    let line_Q = floor * floor_Q + roof * roof_Q;
    // At half of 2.4 m the load has spread by 1.2 m / tan 60° to either side. The door from 3.9 m to 4.7 m puts half
    // of what is on it on the jamb at 3.9 m, whose own spread, from 3.207 m, meets it: it counts whole.
    let reach = 1200.0 / 3.0_f64.sqrt();
    let l = 2.0 * reach;
    assert!(3900.0 - reach < 2700.0 + reach, "the jamb's spread meets the beam's");
    let along = l + 800.0 / 2.0;
    let G_h = beam_G + line_G * along;
    let Q_h = beam_Q + line_Q * along;
    // Storey of 2.65 m: half of the wall's weight is above mid-height, and the 0.65 m over half of the door.
    let weight = wall * 2.65 * l / 2.0 + wall * 0.65 * 400.0;
    let N = 1.35 * (G_h + weight) + 1.5 * Q_h;
    // The beam comes from one side, the floor from the other: each t/3 off the middle.
    let (far_G, far_Q) = (floor * floor_G * along, floor * floor_Q * along);
    let T = (1.35 * (far_G - beam_G) + 1.5 * (far_Q - beam_Q)).abs() * 100.0 / 3.0;
    // h_ef = 2.4 m, t = t_ef = 100 mm: slenderness 24, e_init = 2400/450.
    let e = (T / 2.0 / N + 2400.0 / 450.0).max(5.0);
    let u = (24.0 / 1000.0_f64.sqrt() - 0.063) / (0.73 - 1.17 * e / 100.0);
    let phi = (1.0 - 2.0 * e / 100.0) * (-u * u / 2.0).exp();
    let N_Rd = phi * 100.0 * l * block() / 3.0;

    // With a roof that does not lift: lifted, the helping case would decide.
    // So little wind that the rear wall under the other end of the beam does not govern.
    let text = THROUGH
        .replacen("imposed = \"0.6 kN/m2\"", "imposed = \"0.6 kN/m2\"\nuplift = \"0 kN/m2\"", 1)
        .replacen("v_map = \"21.0 m/s\"", "v_map = \"19.0 m/s\"", 1);
    let (_, results) = perpend::check("through-room.toml", &text).unwrap_or_else(|e| panic!("{e}"));
    let sheet = &results.sections.iter().find(|s| s.id == "piers").expect("the sheet of piers").sheet;
    assert!(sheet.faults.is_empty() && sheet.outside.is_empty());
    let v = sheet.verdicts.iter().find(|v| v.id == "pier-middle").expect("its verdict");
    assert_eq!(v.case, "pressing, imposed leads");
    close(v.demand.value.value, N);
    close(v.resistance.value.value, N_Rd);
    close(v.ratio, N / N_Rd);
    assert!(v.holds, "{N} {N_Rd}");
}

/// The back wall of the bungalow between its window and its door: nothing holds it sideways and no roof stands on
/// it, so the wind leaves it by flexure between floor and ceiling alone.
#[test]
fn the_back_wall_between_window_and_door() {
    let b = perpend::job::read("bungalow.toml", BUNGALOW).unwrap_or_else(|r| panic!("{}", r.render(false)));
    let job = Job::new(&b);
    // The worst net pressure of the site on any panel, worked by hand elsewhere.
    let q = job.wind.as_ref().expect("within the method").worst.panel.base();
    // 2.8 m of wall, half of a window of 1.2 m and half of a door of 0.9 m: the pressure times 1.5.
    let W = 1.5 * q * (2800.0 + 600.0 + 450.0) / 2800.0;
    // Dead load that helps, at mid-height: 1.2 m of each leaf. Brick 102.5 mm, 20 kN/m³, f_xk1 0.4 N/mm² (water
    // absorption 7 to 12 %, M4); block 100 mm, 19 kN/m³, f_xk1 0.25 N/mm². gamma_M 2.7. Both leaves weigh on
    // themselves: stress = weight by volume times height.
    let leaf = |t: f64, density: f64, f_xk1: f64, upper: f64| {
        let sigma = 0.9 * density * 1e-6 * upper;
        8.0 * (f_xk1 / 2.7 + sigma) * t * t / 6.0 / (2400.0 * 2400.0)
    };
    let (outer, inner) = (leaf(102.5, 20.0, 0.4, 1200.0), leaf(100.0, 19.0, 0.25, 1200.0));
    assert!(W > outer + inner, "both together do not carry it");
    // The outer leaf keeps what it can take; the rest is on the inner one.
    let used = (W - outer) / inner;

    let pier = job.piers.iter().find(|u| u.wall == "back wall" && u.from == 3200.0).expect("it is there");
    let (ratio, words) = pier.after.used();
    assert_eq!(words, "flexure, H");
    close(ratio, used);
    assert!(!pier.counts(), "the removal adds nothing to it");
    let standing = perpend::checks::piers::as_it_stands(&job);
    assert_eq!(standing, ["back wall, ground, from 3.20 to 6.00 m"], "the sheet names it");
}
