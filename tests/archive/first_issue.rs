//! The first issue of a demo job, kept as it was sent: what it prints must still be what its job yields.

use std::path::Path;

use perpend::archive::held;
use perpend::{digest, draw, recheck};

use crate::jobs;
use crate::pdf::reader::Read;

const SENT: &[u8] = include_bytes!("../../jobs/issued/2466 Calculations (A).pdf");

/// Words may get better from version to version; every figure and verdict of the schedule must stand. Where one changes for
/// a good reason, the pack stays as it is, and this test says by name which results no longer do.
#[test]
fn the_pack_of_the_first_issue_rechecks() {
    let inside = held(SENT.to_vec()).expect("a pack");
    assert_eq!((inside.record.number.as_str(), inside.record.revision.as_str()), ("2466", "A"));
    let found = recheck("first issue", inside).expect("a valid job");
    assert!(found.same_job && found.same_practice);
    let figures = |r: &perpend::report::record::Row| {
        (r.id.clone(), r.demand.clone(), r.resistance.clone(), r.ratio.clone(), r.verdict.clone())
    };
    let of = |rows: &[perpend::report::record::Row]| rows.iter().map(figures).collect::<Vec<_>>();
    assert_eq!(of(&found.was.results), of(&found.now.results));
    assert!(found.was.results.len() > 10);
    assert_eq!(found.was.outcome, found.now.outcome);
    // The paper and the job inside belong together: the digest stands at the foot of every sheet.
    let foot: String = digest(&held(SENT.to_vec()).expect("a pack").job).chars().take(16).collect();
    let pages = Read::new(SENT).texts();
    assert!(pages.iter().all(|page| page.contains(&foot)), "a sheet without {foot}");
}

/// The job as it is today names that pack, and its own lists what changed since.
#[test]
fn the_second_issue_of_the_demo_job_lists_what_changed() {
    let text = jobs::demos().into_iter().find(|(name, _)| name == "concrete-hall").expect("the demo job").1;
    let (b, results) = draw("concrete-hall", &text).expect("a valid job");
    assert_eq!(b.revisions[0].pack.as_deref(), Some("issued/2466 Calculations (A).pdf"));
    let folder = Path::new("jobs");
    let made =
        perpend::set(&b, &results, &perpend::Source { text: &text, folder, house: None }).expect("a pack");
    let pages = Read::new(&made.pdf).texts().concat();
    for words in ["ChangessincerevisionAof2October2026", "length=\"1250mm\"", "length=\"1200mm\""] {
        assert!(pages.contains(words), "{words} is not in the pack");
    }
}
