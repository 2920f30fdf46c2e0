//! The floor in its plane by hand, through a whole job.

use perpend::building::{Building, Link, Proof};
use perpend::checks::{Job, Section, diaphragm, links, outcome};
use perpend::trace::Entry;

use super::job::{BLOCK_140, PLAIN_RETURN, with_return};

/// The job with a floor; `lines` are those of `[diaphragm]` after its storey and openings.
pub fn job(lines: &str) -> Building {
    let text = format!(
        "{}\n[diaphragm]\nstorey = \"ground\"\nopenings = \"None.\"\n{lines}\n[collapse]\nclass = \"1\"\nreason = \"A house.\"\n",
        with_return(BLOCK_140, PLAIN_RETURN)
    );
    perpend::job::read("hand.toml", &text).unwrap_or_else(|e| panic!("{}", e.render(false)))
}

pub const FLOW: &str = "span = \"8 m\"\nspan_before = \"5 m\"\ndepth = \"4 m\"\nproof = \"shear flow\"\n\
                        resistance = { value = \"2.5 kN/m\", reason = \"Stated.\" }\n";

/// The sheet of the floor.
pub fn sheet(b: &Building) -> Section {
    let mut all = diaphragm::sections(&Job::new(b));
    assert_eq!(all.len(), 1);
    let section = all.remove(0);
    assert!(section.sheet.faults.is_empty(), "{:?}", section.sheet.faults);
    section
}

/// The results of the step `name`, before and after or after alone.
fn results(section: &Section, name: &str) -> Vec<f64> {
    let steps = |e: &Entry| match e {
        Entry::Columns(c) => c
            .rows
            .iter()
            .flat_map(|r| r.entries())
            .filter_map(|e| match e {
                Entry::Step(step) if step.result.name == name => Some(step.result.value.value),
                _ => None,
            })
            .collect(),
        Entry::Step(step) if step.result.name == name => vec![step.result.value.value],
        _ => Vec::new(),
    };
    section.sheet.entries.iter().flat_map(steps).collect()
}

fn close(got: &[f64], hand: &[f64]) {
    assert_eq!(got.len(), hand.len(), "{got:?}, by hand {hand:?}");
    for (g, h) in got.iter().zip(hand) {
        assert!((g - h).abs() <= 1e-9 * h.abs(), "{got:?}, by hand {hand:?}");
    }
}

/// The storey has 0.60 x 8 x 2.6 + 5 = 17.48 kN, design 26.22 kN; tilt 1/(100 √6.25) = 0.004 of 1.35 x 200 + 1.5 x 80
/// = 390 kN: 1.56 kN. Over 8 m: (26.22 + 1.56)/8 = 3.4725 kN/m.
///
/// Before, on 5 m: V = 8.68125 kN, over 4 m 2.1703 kN/m, M = 10.8516 kNm, chord 2.7129 kN, span over depth 1.25. After,
/// on 8 m: V = 13.89 kN, 3.4725 kN/m against 2.5: 1.389, not adequate; M = 27.78 kNm, chord 6.945 kN, span over depth
/// exactly 2, within the rule.
#[test]
fn a_floor_on_eight_metres() {
    let section = sheet(&job(FLOW));
    close(&results(&section, "w_Ed"), &[3.4725]);
    close(&results(&section, "V_Ed"), &[8681.25, 13_890.0]);
    close(&results(&section, "v_Ed"), &[2.170_312_5, 3.4725]);
    close(&results(&section, "M_Ed"), &[10_851_562.5, 27_780_000.0]);
    close(&results(&section, "F_c"), &[2_712.890_625, 6945.0]);
    close(&results(&section, "r_lb"), &[1.25, 2.0]);
    let [verdict] = section.sheet.verdicts.as_slice() else { panic!("{:?}", section.sheet.verdicts) };
    assert_eq!((verdict.id.as_str(), verdict.holds), ("shear-flow", false));
    assert!((verdict.ratio - 1.389).abs() < 1e-9, "{}", verdict.ratio);
    let rule = section.sheet.entries.iter().find_map(|e| match e {
        Entry::Rule { met, .. } => Some(*met),
        _ => None,
    });
    assert_eq!(rule, Some(true));
}

/// The span before is information and may be left out: on 5 m the floor takes 2.1703 of 2.5 kN/m, 0.868125.
#[test]
fn a_floor_on_five_metres() {
    let b = job(&FLOW.replace("span_before = \"5 m\"\n", "").replace("\"8 m\"", "\"5 m\""));
    let section = sheet(&b);
    close(&results(&section, "V_Ed"), &[8681.25]);
    let verdict = &section.sheet.verdicts[0];
    assert!(verdict.holds && (verdict.ratio - 0.868_125).abs() < 1e-9, "{}", verdict.ratio);
}

/// By rule nothing is verified. Within the proportions the link is by rule; beyond them (5 m on 2 m) it is assumed, and
/// a hold point asks for a calculation. Shear flow is calculated.
#[test]
fn how_the_floor_is_known() {
    let known = |lines: &str| {
        let mut b = job(lines);
        b.links.push(Link {
            link: "diaphragm".to_owned(),
            proof: Proof::Calculated,
            words: String::new(),
            of: Vec::new(),
        });
        let link = links::links(&b).into_iter().find(|l| l.link == "diaphragm").expect("a link");
        let asked = outcome::holds(&b)
            .iter()
            .filter(|h| h.text.contains("show by calculation that the floor"))
            .count();
        (sheet(&b).sheet.verdicts.len(), link.proof.word(), asked)
    };
    assert_eq!(known(FLOW), (1, "calculated", 0));
    assert_eq!(known("span = \"5 m\"\ndepth = \"2.5 m\"\nproof = \"by rule\"\n"), (0, "by rule", 0));
    assert_eq!(known("span = \"5 m\"\ndepth = \"2 m\"\nproof = \"by rule\"\n"), (0, "assumed", 1));
}

/// Without `[diaphragm]` a link that claims a calculation and names none is assumed.
#[test]
fn a_floor_is_calculated_only_where_its_check_is() {
    let mut b = job(FLOW);
    b.diaphragm = None;
    b.links.push(Link {
        link: "diaphragm".to_owned(),
        proof: Proof::Calculated,
        words: String::new(),
        of: Vec::new(),
    });
    let link = links::links(&b).into_iter().find(|l| l.link == "diaphragm").expect("a link");
    assert_eq!(link.proof, Proof::Assumed);
}
