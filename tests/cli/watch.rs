//! `watch` as a person runs it: save, look, save again.

use std::io::{BufRead as _, BufReader};
use std::process::Stdio;
use std::sync::mpsc::{Receiver, channel};
use std::time::Duration;

use super::{PACK, Place, SUMMARY};
use crate::jobs;

/// Lines of a running process as they come; far longer than any round takes.
fn next(lines: &Receiver<String>) -> String {
    lines.recv_timeout(Duration::from_secs(120)).expect("a line")
}

#[test]
fn every_saving_is_told_and_set() {
    let place = Place::with(&[("house.toml", jobs::START)]);
    let mut running = place
        .command(&["watch", "house.toml"])
        .stdout(Stdio::piped())
        .stderr(Stdio::piped())
        .spawn()
        .expect("it starts");
    let follow = |stream: Box<dyn std::io::Read + Send>| {
        let (send, lines) = channel();
        std::thread::spawn(move || {
            for line in BufReader::new(stream).lines().map_while(Result::ok) {
                let _ = send.send(line);
            }
        });
        lines
    };
    let out = follow(Box::new(running.stdout.take().expect("output")));
    let err = follow(Box::new(running.stderr.take().expect("errors")));
    assert!(next(&out).contains("watching house.toml"));
    assert!(next(&out).contains(PACK) && next(&out).contains(SUMMARY));
    let first = place.get(PACK);

    let save = |text: &str| place.put("house.toml", text.as_bytes());
    save(&jobs::START.replacen("dead = \"18 kN\"", "dead = \"17 kN\"", 1));
    let line = next(&out);
    assert!(
        line.starts_with("adequate; R1 ") && line.contains("is now") && line.contains("lines of working"),
        "{line}"
    );
    assert!(next(&out).contains(PACK) && next(&out).contains(SUMMARY));
    let second = place.get(PACK);
    assert!(first != second);

    // An error leaves what was written; the next saving goes on from there.
    save("[job]\n");
    assert!(next(&err).starts_with("error: "));
    assert!(place.get(PACK) == second);
    save(jobs::START);
    let line = next(&out);
    assert!(line.contains("is now"), "{line}");
    assert!(next(&out).contains(PACK) && next(&out).contains(SUMMARY));
    assert!(place.get(PACK) == first, "the same job, the same bytes");
    running.kill().expect("it runs");
    let _ = running.wait();
}

#[test]
fn a_file_that_is_not_there_is_not_watched() {
    let ran = Place::empty().run(&["watch", "none.toml"]);
    assert_eq!(ran.code, 2);
    assert!(ran.err.contains("none.toml cannot be read"), "{}", ran.err);
}
