//! A pack from job file to PDF, stage by stage.

use std::path::Path;

use divan::{Bencher, black_box};
use perpend::pack::{self, Times};
use perpend::{digest, draw, report};

use super::jobs::START;

fn cold() -> perpend::Sheeted {
    pack::evict(0);
    perpend::sheet("job.toml", black_box(START), Path::new("")).expect("a pack")
}

/// Everything, nothing remembered from the pack before but fonts and templates.
#[divan::bench(sample_count = 10, sample_size = 1)]
fn whole() -> perpend::Sheeted {
    cold()
}

/// Results to the pack's data as JSON.
#[divan::bench(sample_count = 20)]
fn data(bencher: Bencher<'_, '_>) {
    let (building, results) = draw("job.toml", START).expect("a valid job");
    let digest = digest(START);
    bencher.bench(|| {
        serde_json::to_vec(&report::pack(black_box(&building), &results, START, &digest)).expect("JSON")
    });
}

/// The stages inside the typesetter are timed where they run; one line a stage.
#[divan::bench(sample_count = 1, sample_size = 1)]
fn stages() {
    let mut all: Vec<Times> = (0..9).map(|_| cold().typeset.times).collect();
    let mut median = |of: fn(&Times) -> std::time::Duration| {
        all.sort_by_key(of);
        of(&all[4])
    };
    let (fonts, compile, export) = (median(|t| t.fonts), median(|t| t.compile), median(|t| t.export));
    println!("\n   stages, median of 9: world {fonts:?}, layout {compile:?}, PDF {export:?}");
}

/// The same pack again after one figure changed, in a process that runs on.
#[divan::bench(sample_count = 10, sample_size = 1)]
fn one_figure_changed(bencher: Bencher<'_, '_>) {
    let mut dead = 180;
    bencher
        .with_inputs(|| {
            dead += 1;
            START.replacen("dead = \"18 kN\"", &format!("dead = \"{}.{} kN\"", dead / 10, dead % 10), 1)
        })
        .bench_local_values(|text| {
            let made = perpend::sheet("job.toml", &text, Path::new("")).expect("a pack");
            pack::evict(2);
            made
        });
}
