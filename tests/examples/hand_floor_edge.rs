//! Straps at a floor edge by hand, through a whole job.

use perpend::building::Building;
use perpend::checks::{Job, Section, floor_edge, links, outcome};
use perpend::quantity::{Length, LineLoad};

use super::job::{BLOCK_140, PLAIN_RETURN, with_return};

/// A panel of 140 mm block, 2.5 m high, with 8 kN/m on top.
const PANEL: &str = r#"
[[panels]]
mark = "P1"
title = "Front wall"
build_up = "wall"
storey = "ground"
height = "2.5 m"
dead_above = "8 kN/m"
[panels.before]
length = "3 m"
top = { edge = "simple", reason = "Floor." }
base = { edge = "simple", reason = "Damp-proof course." }
left = { edge = "simple", reason = "Wall." }
right = { edge = "simple", reason = "Wall." }
[panels.after]
length = "4 m"
top = { edge = "simple", reason = "Floor." }
base = { edge = "simple", reason = "Damp-proof course." }
left = { edge = "simple", reason = "Wall." }
right = { edge = "simple", reason = "Wall." }
"#;

const STRAPS: &str = r#"
straps = "seen"
words = "AM, 1 March 2026."
spacing = "1.2 m"
strength = { value = "8 kN", reason = "Declared." }
"#;

/// The job with one floor edge; `straps` are its last lines.
pub fn job(straps: &str) -> Building {
    let edge = "[[floor_edges]]\nmark = \"E1\"\npanel = \"P1\"\nstrip_height = \"2.6 m\"\njoists = \"along the wall\"\n";
    let class = "\n[collapse]\nclass = \"1\"\nreason = \"A house.\"\n";
    let text = format!("{}{PANEL}{edge}{straps}{class}", with_return(BLOCK_140, PLAIN_RETURN));
    perpend::job::read("hand.toml", &text).unwrap_or_else(|e| panic!("{}", e.render(false)))
}

/// The sheet of the floor edges.
pub fn sheet(b: &Building) -> Section {
    let mut all = floor_edge::sections(&Job::new(b));
    assert_eq!(all.len(), 1);
    let section = all.remove(0);
    assert!(section.sheet.faults.is_empty(), "{:?}", section.sheet.faults);
    section
}

fn stands(section: &Section, symbol: &str, hand: f64) {
    let got = section.sheet.standing(symbol).unwrap_or_else(|| panic!("{symbol} does not stand")).value;
    assert!((got - hand).abs() <= 1e-9 * hand.abs(), "{symbol} = {got}, by hand {hand}");
}

/// 0.70 kN/m² net on 2.6 m of wind face: 1.5 x 0.70 x 2.6 = 2.73 kN/m. A strap each 1.2 m: 3.276 kN. The wall is
/// pressed by 0.9 x 8 / 140 = 0.0514 N/mm², less than 0.4: factor 3.0, 8 / 3 = 2.667 kN. Use 3.276 / 2.667 = 1.2285,
/// not adequate; straps at 2.667 / 2.73 = 0.9768 m would do.
#[test]
fn straps_in_a_wall_with_little_load() {
    let b = job(STRAPS);
    let section = sheet(&b);
    stands(&section, "n_s", 2.73);
    stands(&section, "F_s", 3276.0);
    stands(&section, "sigma_v", 0.9 * 8.0 / 140.0);
    stands(&section, "gamma_Ms", 3.0);
    stands(&section, "F_Rd", 8000.0 / 3.0);
    stands(&section, "s_max", 8000.0 / 3.0 / 2.73);
    let verdict = &section.sheet.verdicts[0];
    assert_eq!((verdict.id.as_str(), verdict.holds), ("strap", false));
    assert!((verdict.ratio - 1.2285).abs() < 1e-9, "{}", verdict.ratio);
}

/// The same under 70 kN/m: 0.9 x 70 / 140 = 0.45 N/mm², so 1.5 counts: 8 / 1.5 = 5.333 kN, use 0.61425, and straps at
/// 1.9536 m would do.
#[test]
fn straps_in_a_wall_well_pressed() {
    let mut b = job(STRAPS);
    b.panels[0].dead_above = LineLoad::new(70.0);
    let section = sheet(&b);
    stands(&section, "gamma_Ms", 1.5);
    stands(&section, "s_max", 8000.0 / 1.5 / 2.73);
    let verdict = &section.sheet.verdicts[0];
    assert!(verdict.holds && (verdict.ratio - 0.61425).abs() < 1e-9, "{}", verdict.ratio);
}

/// At the spacing that would do the use is 1 and holds; a millimetre more does not.
#[test]
fn the_spacing_that_would_do_is_the_last_that_does() {
    let mut b = job(STRAPS);
    let most = sheet(&b).sheet.standing("s_max").expect("stands").value;
    let mut holds = |mm: f64| {
        if let Some(strap) = &mut b.floor_edges[0].strap {
            strap.spacing = Length::new(mm);
        }
        sheet(&b).sheet.verdicts[0].holds
    };
    assert!(holds(most - 1e-6) && !holds(most + 1.0));
}

/// Nothing said of straps: no verdict, no rule met, a hold point for the whole job, and a link that is assumed though
/// the job claims a calculation. To be fitted: a verdict and a hold point. Seen: a verdict alone.
#[test]
fn straps_are_there_only_where_they_were_seen() {
    let known = |straps: &str| {
        let mut b = job(straps);
        b.links.push(perpend::building::Link {
            link: "floor edge".to_owned(),
            proof: perpend::building::Proof::Calculated,
            words: String::new(),
            of: Vec::new(),
        });
        let holds = outcome::holds(&b);
        let held = holds
            .into_iter()
            .filter(|h| h.text.contains("E1") && h.of.is_empty())
            .map(|h| h.text)
            .collect::<Vec<_>>();
        let link = links::links(&b).into_iter().find(|l| l.link == "floor edge").expect("a link");
        (sheet(&b).sheet.verdicts.len(), held, link.proof.word())
    };
    let (verdicts, held, proof) = known("");
    assert_eq!((verdicts, held.len(), proof), (0, 1, "assumed"));
    assert!(held[0].starts_with("Before the wall comes down, "), "{}", held[0]);
    assert!(held[0].contains("restraint straps") && held[0].contains("at P1"), "{}", held[0]);
    assert!(held[0].contains("none is known to be there"), "{}", held[0]);
    let (verdicts, held, proof) = known(&STRAPS.replace("\"seen\"", "\"to be fitted\""));
    assert_eq!((verdicts, held.len(), proof), (1, 1, "assumed"));
    assert!(held[0].contains("fit and see restraint straps of 8 kN at 1200 mm or closer"), "{}", held[0]);
    let (verdicts, held, proof) = known(STRAPS);
    assert_eq!((verdicts, held.len(), proof), (1, 0, "calculated"));
}

/// A link that claims a calculation without a floor edge is assumed, and so is that of a panel without one.
#[test]
fn a_floor_edge_is_calculated_only_where_its_check_is() {
    let mut b = job(STRAPS);
    b.links.push(perpend::building::Link {
        link: "floor edge".to_owned(),
        proof: perpend::building::Proof::Calculated,
        words: String::new(),
        of: Vec::new(),
    });
    let mut other = b.panels[0].clone();
    other.mark = "P2".to_owned();
    b.panels.push(other);
    let proofs = |b: &Building| {
        let all = links::links(b).into_iter().filter(|l| l.link == "floor edge");
        all.map(|l| (l.of.join(" "), l.proof.word())).collect::<Vec<_>>()
    };
    let said = |v: &[(&str, &'static str)]| v.iter().map(|(a, b)| ((*a).to_owned(), *b)).collect::<Vec<_>>();
    assert_eq!(proofs(&b), said(&[("E1 P1", "calculated"), ("P2", "assumed")]));
    // On the same wall one edge speaks for both.
    for p in &mut b.panels {
        p.on = Some("front wall".to_owned());
    }
    assert_eq!(proofs(&b), said(&[("E1 P1 P2", "calculated")]));
    b.floor_edges.clear();
    assert_eq!(proofs(&b), said(&[("", "assumed")]));
}
