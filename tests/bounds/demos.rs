//! The demo panels with openings, by hand and by both bounds.

use perpend::checks;

use crate::jobs::demos;

/// By hand never above the weakest crack pattern, and the wall never said to take more than it; the two bounds within
/// 15 % of each other.
#[test]
fn by_hand_no_demo_panel_takes_more_than_its_weakest_crack_pattern() {
    let mut seen = Vec::new();
    for (name, text) in demos().into_iter().filter(|(_, text)| text.contains("openings")) {
        let building = perpend::job::read(&name, &text).unwrap_or_else(|e| panic!("{}", e.render(false)));
        for section in checks::results(&building).sections {
            let value = |symbol: &str| section.sheet.standing(symbol).map(|v| v.value);
            let (Some(low), Some(high), Some(takes)) = (value("w_S"), value("w_U"), value("w_Rd")) else {
                continue;
            };
            assert!(low <= high && high <= 1.15 * low, "{name} {}: {low} to {high}", section.id);
            assert!(takes <= high, "{name} {}: {takes} against {high}", section.id);
            assert!(
                section.sheet.unshown.iter().all(|u| !u.id.starts_with("pattern")),
                "{name} {}",
                section.id
            );
            seen.push(format!("{name} {}", section.id));
        }
    }
    assert!(seen.len() >= 2, "{seen:?}");
}

/// What the terminal says and what the pack says is one outcome: the two work limit analysis to different depths.
#[test]
fn results_and_pack_have_one_outcome() {
    for (name, text) in demos().into_iter().filter(|(_, text)| text.contains("openings")) {
        let building = perpend::job::read(&name, &text).unwrap_or_else(|e| panic!("{}", e.render(false)));
        let (quick, whole) = (checks::results(&building), checks::run(&building));
        assert_eq!(format!("{:?}", quick.outcome), format!("{:?}", whole.outcome), "{name}");
        let verdicts = |all: &checks::Results| {
            let sheets = all
                .sections
                .iter()
                // What is searched for the pack alone judges nothing.
                .filter(|s| s.id != "margins")
                .map(|s| (s.id.clone(), s.sheet.verdicts.clone(), s.sheet.unshown.clone()));
            sheets.collect::<Vec<_>>()
        };
        assert_eq!(verdicts(&quick), verdicts(&whole), "{name}");
    }
}
