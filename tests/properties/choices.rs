//! Every choice that a return offers, in every mix: no sheet contradicts itself, and each has its drawings.

use perpend::error::Error;

use crate::jobs;

/// The demo job with R1 of these words: head, path, base, junction, leaves, loads, restraint.
fn job(choice: [bool; 8]) -> String {
    let [propped, sideways, dpc, bonded, each, uneven, above, held] = choice;
    let (_, text) =
        jobs::demos().into_iter().find(|(n, _)| n.contains("rear-opening")).expect("the demo job");
    let from = text.find("[[returns]]").expect("R1");
    let to = from + text[from + 5..].find("[[returns]]").expect("R2") + 5;
    let mut r = text[from..to].to_owned();
    let mut swap = |a: &str, b: &str| {
        assert!(r.contains(a), "{a}");
        r = r.replace(a, b);
    };
    if !propped {
        swap("head = \"propped\"", "head = \"free\"");
        swap("propped_by =", "# propped_by =");
    }
    if !sideways {
        swap("path = \"sideways\"", "strip_height = \"2.65 m\"\npath = \"both\"");
    }
    if !dpc {
        swap("base = \"dpc\"", "base_reason = \"Seen through the floor.\"\nbase = \"bonded\"");
        swap("mu = 0.4", "# mu = 0.4");
    }
    if !bonded {
        swap("bonded = true", "bonded = false");
    }
    if each {
        swap("build_up = \"inner wall\"", "acts = \"each leaf\"\nbuild_up = \"outer cavity wall\"");
    }
    if uneven {
        swap("eccentricity = \"0 mm\"", "uplift = \"6 kN\"\neccentricity = \"15 mm\"");
    }
    if above {
        swap(
            "supported_wall_height",
            "from_above = { force = \"0.7 kN\", moment = \"0.9 kNm\" }\nsupported_wall_height",
        );
    }
    if !held {
        swap("restraint = \"timber floor\"", "restraint = \"none\"");
    }
    format!("{}{r}{}", &text[..from], &text[to..])
}

#[test]
fn every_mix_of_choices_gives_a_sound_sheet() {
    let mut read = 0;
    for n in 0..256_u32 {
        let choice: [bool; 8] = std::array::from_fn(|k| n >> k & 1 == 1);
        let text = job(choice);
        match perpend::draw("choices", &text) {
            Ok((_, results)) => {
                read += 1;
                let sheet = results.sections.iter().find(|s| s.id == "R1").expect("the sheet of R1");
                assert!(!sheet.sheet.verdicts.is_empty(), "{choice:?} judges nothing");
                assert!(sheet.drawings.len() >= 2, "{choice:?} is not drawn");
            }
            // A mix that the job file refuses is refused with words; a fault of the tool is not allowed.
            Err(Error::Job(report)) => assert!(!report.diagnostics().is_empty()),
            Err(other) => panic!("{choice:?}: {other}"),
        }
    }
    assert!(read > 200, "only {read} of 256 mixes could be read");
}
