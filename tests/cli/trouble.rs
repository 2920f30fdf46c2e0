//! What goes wrong is said, and leaves nothing half done.

use super::{PACK, Place, SUMMARY, expected};
use crate::jobs;

/// The command refuses `file` with these words, and leaves nothing new.
fn refuses(place: &Place, args: &[&str], words: &[&str]) {
    let before = place.list();
    let ran = place.run(args);
    assert_eq!(ran.code, 2, "{args:?}: {}", ran.err);
    for part in words.iter().chain(&["help:"]) {
        assert!(ran.err.contains(part), "{args:?}: {part} is not in {}", ran.err);
    }
    assert!(!ran.err.contains("panicked"), "{}", ran.err);
    assert_eq!(place.list(), before, "{args:?}");
}

#[test]
fn files_that_cannot_be_read() {
    let place = Place::with(&[("folder/in.toml", "")]);
    place.put("latin.toml", b"[job]\ntitle = \"caf\xe9\"\n");
    place.put("zip.toml", b"PK\x03\x04\x00\x00\xff\xfe");
    for command in ["check", "sheet"] {
        refuses(&place, &[command, "missing.toml"], &["missing.toml", "cannot be read"]);
        refuses(&place, &[command, "folder"], &["folder", "it is a folder"]);
        refuses(&place, &[command, "latin.toml"], &["latin.toml", "UTF-8"]);
        refuses(&place, &[command, "zip.toml"], &["zip.toml", "UTF-8"]);
    }
}

#[test]
fn every_error_of_a_job_is_reported_and_nothing_written() {
    let text = jobs::START
        .replacen("dead = \"18 kN\"", "dead = \"18 kNm\"", 1)
        .replacen("base = \"dpc\"", "base = \"dcp\"", 1)
        .replacen("unit_category = \"II\"", "unit_category = \"IV\"", 1)
        .replacen("to = \"rear wall\"", "to = \"reer wall\"", 1);
    let place = Place::with(&[("job.toml", &text)]);
    refuses(&place, &["sheet", "job.toml"], &["18 kNm", "dcp", "IV", "reer wall", "job.toml:"]);
}

#[test]
fn a_pack_is_replaced_whole_or_not_at_all() {
    let place = Place::with(&[("job.toml", jobs::START)]);
    place.put(PACK, b"the pack of yesterday");
    assert_eq!(place.run(&["sheet", "job.toml"]).code, expected(jobs::START));
    let pack = place.get(PACK);
    assert!(pack.starts_with(b"%PDF-") && pack.trim_ascii_end().ends_with(b"%%EOF"));
    assert_eq!(place.list(), [PACK, SUMMARY, "job.toml"]);

    // A job that cannot be used leaves the pack of before.
    place.put("job.toml", b"[job]\n");
    refuses(&place, &["sheet", "job.toml"], &["job.toml"]);
    assert!(place.get(PACK) == pack);
}

#[test]
fn a_place_that_cannot_be_written_to() {
    let place = Place::with(&[("job.toml", jobs::START), ("a file", "")]);
    refuses(&place, &["sheet", "job.toml", "--into", "a file"], &["a file", "not a folder"]);
    refuses(&place, &["sheet", "job.toml", "--into", "a file/packs"], &["a file/packs", "cannot be written"]);
    refuses(&place, &["start", "no such folder/job.toml"], &["no such folder", "cannot be written"]);
    // A folder stands where the pack would.
    place.put(&format!("{PACK}/in the way"), b"");
    refuses(&place, &["sheet", "job.toml"], &[PACK, "cannot be written", "nothing was changed"]);
}

/// The root folder of processes takes no files, whoever asks.
#[cfg(target_os = "linux")]
#[test]
fn a_folder_that_takes_no_files() {
    let place = Place::with(&[("job.toml", jobs::START)]);
    refuses(
        &place,
        &["sheet", "job.toml", "--into", "/proc/self"],
        &["/proc/self", "cannot be written", "nothing was changed"],
    );
}

#[test]
fn photographs_are_looked_for_beside_the_job() {
    let text = format!("{}\n[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\n", jobs::START);
    let place = Place::with(&[("house/job.toml", &text)]);
    refuses(&place, &["sheet", "house/job.toml"], &["house/nib.jpg", "cannot be read"]);
    place.put("house/nib.jpg", b"GIF89a");
    refuses(&place, &["sheet", "house/job.toml"], &["house/nib.jpg", "neither a JPEG nor a PNG"]);
}
