//! A return with a panel on either side, through a whole job: the widths of front that both bring, in plain numbers.

use perpend::building::Building;
use perpend::checks::{self, Section};

use super::job::{BLOCK_140, PLAIN_RETURN, with_return};

const FREE: &str = "{ edge = \"free\", reason = \"Movement joint.\" }";
const WALL: &str = "{ edge = \"simple\", reason = \"Wall.\" }";
const R1: &str = "{ edge = \"simple\", reason = \"R1, butted and strapped.\" }";
const R1_FIXED: &str = "{ edge = \"continuous\", reason = \"Bonded to R1.\" }";
const WALL_FIXED: &str = "{ edge = \"continuous\", reason = \"Bonded to the wall.\" }";

fn panel(mark: &str, route: &str, length: &str, [floors, left, right]: [&str; 3]) -> String {
    let edges = format!("top = {floors}\nbase = {floors}\nleft = {left}\nright = {right}\n");
    format!(
        "\n[[panels]]\nmark = \"{mark}\"\ntitle = \"Front wall\"\nbuild_up = \"wall\"\nstorey = \"ground\"\n\
         height = \"2.5 m\"\ndead_above = \"8 kN/m\"\nroute = \"{route}\"\n\
         [panels.before]\nlength = \"2.0 m\"\n{edges}[panels.after]\nlength = \"{length}\"\n{edges}"
    )
}

/// P1, 4.0 m between its ends alone and judged by limit analysis, beside P2, 3.0 m and by hand; R1 counts `tributary`.
fn job(tributary: &str, first: [&str; 2], second: [&str; 2]) -> Building {
    let lines =
        PLAIN_RETURN.replace("tributary_width = \"0.1 m\"", &format!("tributary_width = \"{tributary}\""));
    let text = format!(
        "{}{}{}",
        with_return(BLOCK_140, &lines),
        panel("P1", "limit analysis", "4.0 m", [FREE, first[0], first[1]]),
        panel("P2", "flexure", "3.0 m", [WALL, second[0], second[1]])
    );
    perpend::job::read("hand.toml", &text).unwrap_or_else(|e| panic!("{}", e.render(false)))
}

fn first_panel(b: &Building) -> Section {
    let all = checks::results(b).sections;
    let found = all.into_iter().find(|s| s.id == "P1").expect("a section");
    assert!(found.sheet.faults.is_empty(), "{:?}", found.sheet.faults);
    found
}

/// The width that both bring together, metres: from the ratio of the row where R1 counts next to nothing, 0.1 m.
fn together(first: [&str; 2], second: [&str; 2]) -> f64 {
    let s = first_panel(&job("0.1 m", first, second));
    let row = s.sheet.unshown.iter().find(|u| u.id == "brings-R1").expect("a row");
    0.1 * row.ratio.expect("a ratio")
}

/// A strip of length l, continuous at one end with the moment m of the wall, simple at the other: at collapse the simple
/// end gives R with R²/(2 w) = m, and w l²/2 - R l = m about the continuous one, so R = w l / (1 + sqrt 2). Of 4.0 m:
/// 1.657 m of front to the simple end, 2.343 m to the continuous one.
fn ends() -> (f64, f64) {
    let simple = 4.0 / (1.0 + 2.0_f64.sqrt());
    (simple, 4.0 - simple)
}

fn near(found: f64, by_hand: f64) {
    assert!((found / by_hand - 1.0).abs() < 5e-3, "{found} m, by hand {by_hand} m");
}

/// P2 has no reactions: half of its 3.0 m, 1.5 m, and all of it where its other end is free.
#[test]
fn both_neighbours_of_a_return_bring_their_part() {
    let (simple, continuous) = ends();
    near(together([WALL_FIXED, R1], [R1, WALL]), simple + 1.5);
    near(together([WALL_FIXED, R1], [R1, FREE]), simple + 3.0);
    near(together([R1_FIXED, WALL], [WALL, R1]), continuous + 1.5);
    near(together([R1_FIXED, WALL], [WALL, WALL]), continuous);
}

/// 1.657 + 1.5 = 3.157 m against 3.1 and 3.2 m; either panel alone brings much less.
#[test]
fn the_sum_is_held_against_the_width_of_the_return() {
    let of = |tributary| first_panel(&job(tributary, [WALL_FIXED, R1], [R1, WALL]));
    let row = |s: &Section| s.sheet.unshown.iter().find(|u| u.id == "brings-R1").cloned();
    let short = row(&of("3.1 m")).expect("a row");
    near(3.1 * short.ratio.expect("a ratio"), ends().0 + 1.5);
    assert!(short.finding.contains("P2, not worked so, counts with 1500 mm"), "{}", short.finding);
    let wide = of("3.2 m");
    assert!(row(&wide).is_none(), "{:?}", wide.sheet.unshown);
    assert!(format!("{:?}", wide.sheet.entries).contains("To R1 by limit analysis: P1 brings"));
}
