//! The packs, read back from their PDF.

mod photographs;
pub mod reader;
mod same_bytes;
mod variations;

use std::sync::OnceLock;

use perpend::Sheeted;
use perpend::report;
use reader::{Read, squeeze};

use crate::jobs;

/// A demo job with its pack, set once for all tests.
struct Demo {
    name: String,
    text: String,
    made: Sheeted,
    read: Read,
}

fn demos() -> &'static [Demo] {
    static ALL: OnceLock<Vec<Demo>> = OnceLock::new();
    ALL.get_or_init(|| {
        let set = |(name, text): (String, String)| {
            let made =
                perpend::sheet(&name, &text, &jobs::folder()).unwrap_or_else(|e| panic!("{name}: {e}"));
            let read = Read::new(&made.typeset.pdf);
            Demo { name, text, made, read }
        };
        jobs::demos().into_iter().map(set).collect()
    })
}

fn data(demo: &Demo) -> perpend::pack::data::Pack {
    let digest = perpend::digest(&demo.text);
    report::pack(&demo.made.building, &demo.made.results, &demo.text, &digest)
}

#[test]
fn the_typesetter_complains_of_nothing() {
    for demo in demos() {
        assert_eq!(demo.made.typeset.warnings, Vec::<String>::new(), "{}", demo.name);
    }
}

#[test]
fn there_are_as_many_sheets_as_counted() {
    for demo in demos() {
        assert_eq!(demo.read.sheets(), demo.made.typeset.pages, "{}", demo.name);
    }
}

#[test]
fn the_front_sheet_says_what_was_found() {
    for demo in demos() {
        let front = &demo.read.texts()[0];
        let pack = data(demo);
        let (number, title) = (&pack.job.number, &pack.job.title);
        let outcome = demo.made.results.outcome.words();
        for words in [number, title, &outcome, &pack.outcome.sentence] {
            assert!(front.contains(&squeeze(words)), "{}: {words:?} is not in {front}", demo.name);
        }
        for warning in &pack.warnings {
            assert!(front.contains(&squeeze(warning)), "{}: {warning:?} is not in {front}", demo.name);
        }
    }
}

#[test]
fn every_sheet_says_what_it_is() {
    for demo in demos() {
        let texts = demo.read.texts();
        let pack = data(demo);
        let version = format!("{} {}", report::PROGRAM.0, report::PROGRAM.1);
        for (n, sheet) in texts.iter().enumerate() {
            let count = format!("sheet {} of {}", n + 1, texts.len());
            for words in
                [&pack.job.number, &pack.job.title, "not valid unless signed", &version, &pack.digest, &count]
            {
                assert!(
                    sheet.contains(&squeeze(words)),
                    "{} sheet {}: no {words:?} in {sheet}",
                    demo.name,
                    n + 1
                );
            }
            assert!(
                !sheet.contains('\u{fffd}'),
                "{} sheet {}: a sign without its meaning: {sheet}",
                demo.name,
                n + 1
            );
        }
    }
}

/// What the results say stands in the PDF: every check with its ratio and verdict on the sheet that works it out.
#[test]
fn every_result_is_printed_where_it_is_worked_out() {
    for demo in demos() {
        let texts = demo.read.texts();
        for section in &demo.made.results.sections {
            for row in report::schedule(section) {
                // On its own sheet its title stands over it.
                let own = row.check.strip_prefix(&format!("{}: ", section.title)).unwrap_or(&row.check);
                let (check, ratio) = (squeeze(own), squeeze(&row.ratio));
                let there = texts.iter().filter(|t| t.contains(&check) && t.contains(&ratio)).count();
                // Once on the results, once on its own sheet.
                assert!(there >= 2, "{}: {check} {ratio} is on {there} sheets", demo.name);
            }
        }
    }
}

#[test]
fn every_font_is_embedded_and_readable() {
    for demo in demos() {
        let fonts = demo.read.fonts();
        assert!(fonts.len() >= 3, "{}: {fonts:?}", demo.name);
        for (font, whole) in fonts {
            assert!(whole, "{}: {font} is not whole", demo.name);
        }
        assert_eq!(demo.read.foreign_fonts(), 0, "{}", demo.name);
    }
}

/// Each row of the results that is worked out on a sheet links there, in the order of the rows.
#[test]
fn every_result_links_to_its_working() {
    for demo in demos() {
        let (texts, links) = (demo.read.texts(), demo.read.links());
        let first =
            texts.iter().position(|t| t.contains("checkdemandresistance")).expect("a sheet of results");
        let last =
            texts.iter().rposition(|t| t.contains("checkdemandresistance")).expect("a sheet of results");
        let rows: Vec<_> = data(demo).schedule.into_iter().filter(|row| !row.anchor.is_empty()).collect();
        let from_results: Vec<usize> =
            links.iter().filter(|l| (first..=last).contains(&l.from)).map(|l| l.to).collect();
        assert_eq!(from_results.len(), rows.len(), "{}", demo.name);
        for (row, to) in rows.iter().zip(from_results) {
            assert!(to > last, "{}: {} leads back to sheet {}", demo.name, row.anchor, to + 1);
            // In columns the words that checks begin with alike stand once: their last word tells.
            let tail = row.check.rsplit(' ').next().unwrap_or_default();
            assert!(
                texts[to].contains(&squeeze(&row.check)) || texts[to].contains(&squeeze(tail)),
                "{}: {} leads to sheet {}, which does not have it",
                demo.name,
                row.anchor,
                to + 1
            );
        }
    }
}

#[test]
fn every_section_has_a_bookmark() {
    for demo in demos() {
        let (marks, texts) = (demo.read.bookmarks(), demo.read.texts());
        for section in &demo.made.results.sections {
            let title = squeeze(&format!("{}{}", section.mark, section.title));
            let found = marks.iter().find(|(words, _)| squeeze(words) == title);
            let (_, sheet) =
                found.unwrap_or_else(|| panic!("{}: {title} has no bookmark in {marks:?}", demo.name));
            assert!(texts[*sheet].contains(&title), "{}: {title} leads to sheet {}", demo.name, sheet + 1);
        }
    }
}

#[test]
fn the_file_says_that_it_keeps_and_can_be_read_aloud() {
    for demo in demos() {
        let xmp = squeeze(&demo.read.metadata());
        for part in [
            "<pdfaid:part>3</pdfaid:part>",
            "<pdfaid:conformance>A</pdfaid:conformance>",
            "<pdfuaid:part>1</pdfuaid:part>",
            &squeeze(&data(demo).job.title),
        ] {
            assert!(xmp.contains(part), "{}: {part} is not in {xmp}", demo.name);
        }
        assert!(demo.read.language().starts_with("en"), "{}: {}", demo.name, demo.read.language());
        assert_eq!(demo.read.tagged_and_titled(), (true, true), "{}", demo.name);
    }
}

#[test]
fn the_job_file_travels_inside() {
    for demo in demos() {
        let all = demo.read.attachments();
        let job = all.iter().find(|(name, _)| name.ends_with("job.toml"));
        let (_, bytes) = job
            .unwrap_or_else(|| panic!("{}: {:?}", demo.name, all.iter().map(|(n, _)| n).collect::<Vec<_>>()));
        assert!(bytes == demo.text.as_bytes(), "{}: the job file inside is another", demo.name);
    }
}

/// Lays out what the typesetter's own command line needs to set the start job from the same data, and a hundred
/// different jobs: the yardsticks for speed.
///
/// ```text
/// cargo test --test main yardstick -- --ignored
/// typst compile --ignore-system-fonts --font-path fonts --root target/yardstick \
///     --pdf-standard a-3a,ua-1 target/yardstick/templates/pack.typ target/yardstick/pack.pdf
/// perpend sheet --into target/yardstick/packs target/yardstick/hundred/*.toml
/// ls target/yardstick/hundred/*.toml | xargs -P2 -n1 perpend sheet --into target/yardstick/packs
/// ```
#[test]
#[ignore = "writes target/yardstick"]
fn yardstick() {
    let root = std::path::Path::new(env!("CARGO_MANIFEST_DIR"));
    let demo = demos().iter().find(|demo| demo.text == jobs::START).expect("the start job is a demo job");
    let folder = root.join("target/yardstick");
    std::fs::create_dir_all(folder.join("templates/parts")).expect("a folder");
    for part in ["templates", "templates/parts"] {
        for entry in std::fs::read_dir(root.join(part)).expect("templates") {
            let path = entry.expect("an entry").path();
            if path.extension().is_some_and(|e| e == "typ") {
                let name = path.file_name().expect("a name");
                std::fs::copy(&path, folder.join(part).join(name)).expect("a copy");
            }
        }
    }
    std::fs::write(folder.join("data.json"), serde_json::to_vec(&data(demo)).expect("JSON")).expect("a file");

    let hundred = folder.join("hundred");
    std::fs::create_dir_all(&hundred).expect("a folder");
    for n in 0..100 {
        std::fs::write(hundred.join(format!("{n:02}.toml")), jobs::varied(n)).expect("a file");
    }
}
