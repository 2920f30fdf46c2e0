//! `sign`, and what `recheck` says of signatures, as a person runs them.

use std::io::Write as _;
use std::process::Stdio;

use super::{PACK, Place, Ran};
use crate::jobs;
use crate::signing::keys;

const DATE: &str = "--date=2026-12-02T12:00:00Z";

/// The name of a pack with more behind it.
fn named(more: &str) -> String {
    PACK.replace(".pdf", &format!("{more}.pdf"))
}

/// Runs the command with one line on standard input.
fn typed(place: &Place, line: &str, args: &[&str]) -> Ran {
    let mut command = place.command(args);
    command.stdin(Stdio::piped()).stdout(Stdio::piped()).stderr(Stdio::piped());
    let mut child = command.spawn().expect("the command starts");
    // A command that asks for nothing has ended before the line is written.
    let _ = child.stdin.take().expect("an input").write_all(format!("{line}\n").as_bytes());
    child.wait_with_output().expect("it ends").into()
}

fn with_pack() -> Place {
    let place = Place::with(&[("job.toml", jobs::START)]);
    assert_eq!(place.run(&["sheet", "job.toml"]).err, "");
    place.put("hollin.p12", &keys::pkcs12("R. Hollin", 7));
    place.put("varley.pem", keys::locked_pem("T. Varley", 8).as_bytes());
    place
}

#[test]
fn maker_and_checker_sign_and_both_signatures_are_told() {
    let place = with_pack();
    let pack = place.get(PACK);
    let ran = typed(&place, keys::PASSPHRASE, &["sign", PACK, "--key", "hollin.p12", DATE]);
    assert_eq!((ran.code, ran.err.as_str()), (0, ""));
    let wanted = format!("{}: made by R. Hollin, 2 December 2026, 12:00 UTC\n", named(" signed"));
    assert_eq!(ran.out, wanted);
    assert!(place.get(PACK) == pack && place.get(&named(" signed")).starts_with(&pack));

    let checked =
        ["sign", &named(" signed"), "--key", "varley.pem", "--as", "checked", DATE, "--into", "out"];
    let ran = typed(&place, keys::PASSPHRASE, &checked);
    assert_eq!((ran.code, ran.err.as_str()), (0, ""));
    let both = format!("out/{}", named(" signed, checked"));
    let ran = place.run(&["recheck", &both, PACK]);
    assert_eq!(ran.code, 0, "{}{}", ran.out, ran.err);
    for words in [
        "every printed result stands",
        "  digital signature, made by CN=R. Hollin,O=Test keys,C=GB (issued by CN=Test issuer,O=Test keys,C=GB), \
         on 2 December 2026, 12:00 UTC by its own claim: whole, and nothing but a later signature was added",
        "  digital signature, checked by CN=T. Varley,O=Test keys,C=GB",
        "whole, and covers the whole file",
        "Whether a certificate is to be trusted is for your PDF program to say.",
        "  no digital signature",
    ] {
        assert!(ran.out.contains(words), "{words} is not in {}", ran.out);
    }

    let mut broken = place.get(&both);
    broken[20] ^= 1;
    place.put("broken.pdf", &broken);
    let ran = place.run(&["recheck", "broken.pdf"]);
    assert_eq!(ran.code, 1, "{}", ran.err);
    assert!(ran.out.contains("every printed result stands, and a signature does NOT"), "{}", ran.out);
    assert_eq!(ran.out.matches("BROKEN: the file is not the one that was signed").count(), 2, "{}", ran.out);
}

#[test]
fn where_nothing_is_signed_nothing_is_written() {
    let place = with_pack();
    place.put("note.pdf", b"%PDF-1.7 nothing");
    place.put("other.pem", keys::certificate_pem("T. Varley", 8).as_bytes());
    let left = place.list();
    let tries: [(&str, &[&str], &str); 7] = [
        (
            "another",
            &["sign", PACK, "--key", "hollin.p12", DATE],
            "hollin.p12: the passphrase does not open it",
        ),
        (
            keys::PASSPHRASE,
            &["sign", "note.pdf", "--key", "hollin.p12", DATE],
            "note.pdf: it does not read as a PDF",
        ),
        (
            keys::PASSPHRASE,
            &["sign", PACK, "--key", "job.toml", DATE],
            "job.toml: it is neither a PEM nor a PKCS#12 file",
        ),
        (keys::PASSPHRASE, &["sign", PACK, "--key", "none.pem", DATE], "none.pem cannot be read"),
        (
            keys::PASSPHRASE,
            &["sign", PACK, "--key", "hollin.p12", "--date", "soon"],
            "--date: soon is no date",
        ),
        (
            keys::PASSPHRASE,
            &["sign", PACK, "--key", "hollin.p12", "--date", "2031-01-01"],
            "the certificate is in force from",
        ),
        (keys::PASSPHRASE, &["sign", PACK, "--key", "hollin.p12", "--into", "job.toml", DATE], "job.toml"),
    ];
    for (line, args, words) in tries {
        let ran = typed(&place, line, args);
        assert_eq!((ran.code, ran.out.as_str()), (2, ""), "{args:?}");
        assert!(ran.err.contains(words) && ran.err.contains("help:"), "{words} is not in {}", ran.err);
        assert!(!ran.err.contains(keys::PASSPHRASE), "{}", ran.err);
        assert_eq!(place.list(), left, "{args:?}");
    }
}

/// What is signed stays: by name, and where somebody moved it to the place of the draft.
#[test]
fn a_signed_pack_is_never_overwritten() {
    let place = with_pack();
    let sign = ["sign", PACK, "--key", "hollin.p12", DATE];
    assert_eq!(typed(&place, keys::PASSPHRASE, &sign).code, 0);
    let signed = place.get(&named(" signed"));
    let ran = typed(&place, keys::PASSPHRASE, &sign);
    assert!(ran.code == 2 && ran.err.contains("is there already; it was left alone"), "{}", ran.err);
    let ran = typed(&place, keys::PASSPHRASE, &["sign", &named(" signed"), "--key", "varley.pem", DATE]);
    assert!(ran.code == 2 && ran.err.contains("it is signed already, made by CN=R. Hollin"), "{}", ran.err);
    assert_eq!(
        place.run(&["sheet", "job.toml"]).code,
        place.run(&["check", "job.toml"]).code,
        "the draft is set again"
    );
    place.put(PACK, &signed);
    let ran = place.run(&["sheet", "job.toml"]);
    assert!(ran.code == 2 && ran.err.contains("as signed"), "{}", ran.err);
    assert!(place.get(PACK) == signed);
}
