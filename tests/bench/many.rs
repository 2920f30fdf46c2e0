//! Many different jobs in one process.

use std::path::Path;

use perpend::{many, pack};

use super::jobs;

/// A hundred different jobs to a hundred packs in memory.
#[divan::bench(sample_count = 1, sample_size = 1)]
fn hundred_different() {
    let texts: Vec<String> = (0..100).map(jobs::varied).collect();
    let work = |text: &String| {
        let made = perpend::sheet("job.toml", text, Path::new("")).expect("a pack");
        pack::evict(1);
        made.typeset.pdf.len()
    };
    let mut bytes = 0;
    many::in_order(&texts, work, |_, size| bytes += size.expect("a pack"), || {});
    assert!(bytes > 0);
}

/// A hundred different jobs checked.
#[divan::bench(sample_count = 5, sample_size = 1)]
fn hundred_checked() {
    let texts: Vec<String> = (0..100).map(jobs::varied).collect();
    let work = |text: &String| perpend::check("job.toml", text).is_ok();
    many::in_order(&texts, work, |_, sound| assert!(sound == Ok(true)), || {});
}
