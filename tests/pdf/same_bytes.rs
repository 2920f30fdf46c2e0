//! The same job gives the same bytes, whoever sets it, where and when.

use std::path::Path;
use std::process::Command;

use crate::jobs;

/// The pack of `jobs::START`, set in `folder` by the command with these variables.
fn pack(folder: &Path, variables: &[(&str, &str)]) -> Vec<u8> {
    std::fs::create_dir_all(folder).expect("a folder");
    std::fs::write(folder.join("job.toml"), jobs::START).expect("a job");
    let mut command = Command::new(env!("CARGO_BIN_EXE_perpend"));
    let out = command
        .args(["sheet", "job.toml"])
        .current_dir(folder)
        .envs(variables.iter().copied())
        .output()
        .expect("the command runs");
    assert!(out.stderr.is_empty(), "{}", String::from_utf8_lossy(&out.stderr));
    std::fs::read(folder.join("2419 Calculations (A).pdf")).expect("a pack")
}

#[test]
fn the_same_job_gives_the_same_bytes() {
    let place = tempfile::tempdir().expect("a folder");
    let first = pack(&place.path().join("one"), &[("TZ", "Europe/London"), ("LANG", "en_GB.UTF-8")]);
    let second = pack(&place.path().join("one"), &[("TZ", "Europe/London"), ("LANG", "en_GB.UTF-8")]);
    assert!(first == second, "the same call twice");
    let elsewhere = place.path().join("another folder").join("ü");
    let other = pack(
        &elsewhere,
        &[("TZ", "Pacific/Auckland"), ("LANG", "C"), ("LC_ALL", "C"), ("RAYON_NUM_THREADS", "1")],
    );
    assert!(first == other, "another folder, time zone, language and number of threads");
    let inside = perpend::sheet("job.toml", jobs::START, &elsewhere).expect("a pack").typeset.pdf;
    assert!(first == inside, "in a process that has set other packs");
}
