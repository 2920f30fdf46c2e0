//! Photographs in a pack: turned upright, in print size, and nothing of where or with what they were taken; what is
//! pointed at in them.

use image::codecs::jpeg::JpegEncoder;

use super::reader::{Read, squeeze};
use crate::jobs;

const PLACE: &[u8] = b"51 deg 4 min N, 1 deg 18 min W";

/// A JPEG as a telephone writes it: turned on its side, with the place where it was taken in an EXIF block.
fn taken_outside() -> Vec<u8> {
    let picture =
        image::RgbImage::from_fn(2400, 1200, |x, y| image::Rgb([(x % 251) as u8, (y % 241) as u8, 90]));
    let mut plain = Vec::new();
    JpegEncoder::new_with_quality(&mut plain, 90).encode_image(&picture).expect("encodes");
    // One directory of two entries: orientation 6, and the pointer to the GPS directory, which holds the place as
    // its area information (tag 28). TIFF, big-endian.
    let mut exif = b"Exif\0\0MM\0\x2a\0\0\0\x08".to_vec();
    exif.extend(b"\0\x02\x01\x12\0\x03\0\0\0\x01\0\x06\0\0\x88\x25\0\x04\0\0\0\x01\0\0\0\x26\0\0\0\0");
    exif.extend(b"\0\x01\0\x1c\0\x07");
    exif.extend(u32::try_from(PLACE.len()).expect("short").to_be_bytes());
    exif.extend(b"\0\0\0\x38\0\0\0\0");
    exif.extend(PLACE);
    let mut out = vec![0xFF, 0xD8, 0xFF, 0xE1];
    out.extend(u16::try_from(exif.len() + 2).expect("short").to_be_bytes());
    out.extend(exif);
    out.extend(&plain[2..]);
    out
}

fn holds(bytes: &[u8], part: &[u8]) -> bool {
    bytes.windows(part.len()).any(|w| w == part)
}

#[test]
fn a_photograph_leaves_its_place_behind() {
    let folder = tempfile::tempdir().expect("a folder");
    let taken = taken_outside();
    assert!(holds(&taken, PLACE) && holds(&taken, b"Exif"));
    std::fs::write(folder.path().join("nib.jpg"), &taken).expect("a photograph");
    let text = format!(
        "{}\n[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib from the kitchen\"\nmark = \"R1\"\n",
        jobs::START
    );
    let made = perpend::sheet("job.toml", &text, folder.path()).expect("a pack");

    assert!(!holds(&made.typeset.pdf, PLACE) && !holds(&made.typeset.pdf, b"Exif"));
    let read = Read::new(&made.typeset.pdf);
    let inside = read.photographs();
    assert_eq!(inside.len(), 1);
    assert!(!holds(&inside[0], PLACE) && !holds(&inside[0], b"Exif"));
    let back = image::load_from_memory(&inside[0]).expect("a JPEG");
    assert_eq!((back.width(), back.height()), (945, 1890), "upright, and no larger than print needs");
    assert!(read.texts().iter().any(|t| t.contains(&squeeze("Nib from the kitchen"))));
}

#[test]
fn a_photograph_that_cannot_be_used_is_named_and_nothing_is_made() {
    let folder = tempfile::tempdir().expect("a folder");
    let text = format!("{}\n[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\n", jobs::START);
    let missing =
        perpend::sheet("job.toml", &text, folder.path()).err().expect("it is not there").to_string();
    assert!(missing.contains("nib.jpg") && missing.contains("help:"), "{missing}");
    let taken = taken_outside();
    std::fs::write(folder.path().join("nib.jpg"), &taken[..taken.len() / 2]).expect("half a photograph");
    let half = perpend::sheet("job.toml", &text, folder.path()).err().expect("it breaks off").to_string();
    assert!(half.contains("nib.jpg") && half.contains("broken"), "{half}");
}

/// A picture half black and half white, `w` by `h` pixels.
fn picture(w: u32, h: u32) -> Vec<u8> {
    let picture =
        image::RgbImage::from_fn(w, h, |x, _| image::Rgb(if x < w / 2 { [0; 3] } else { [255; 3] }));
    let mut out = Vec::new();
    JpegEncoder::new_with_quality(&mut out, 90).encode_image(&picture).expect("encodes");
    out
}

/// The marks of a picture as the job file has them.
fn marks(all: &[(&str, u32, u32)]) -> String {
    let one = |(of, x, y): &(&str, u32, u32)| format!("{{ of = \"{of}\", at = [\"{x} %\", \"{y} %\"] }}");
    format!("marks = [{}]\n", all.iter().map(one).collect::<Vec<_>>().join(", "))
}

/// In corners, at edges, and as close to each other as a job may have them; in a broad, a tall and a flat picture.
#[test]
fn marks_stand_in_the_picture_and_their_labels_beside_each_other() {
    const CORNERS: [(&str, u32, u32); 5] =
        [("R1", 0, 0), ("R2", 100, 0), ("P1", 0, 100), ("P2", 100, 100), ("B1-R1", 50, 50)];
    const CROWD: [(&str, u32, u32); 12] = [
        ("B1-R1", 50, 50),
        ("B1-R2", 55, 50),
        ("R1", 60, 50),
        ("R2", 50, 57),
        ("P1", 55, 57),
        ("P2", 60, 57),
        ("F1", 50, 64),
        ("F2", 55, 64),
        ("B1-R1", 60, 64),
        ("B1-R2", 65, 64),
        ("B1-R1", 65, 57),
        ("B1-R2", 65, 50),
    ];
    let folder = tempfile::tempdir().expect("a folder");
    let mut text = jobs::START.to_owned();
    let sizes = [("broad", 1200, 900), ("tall", 700, 1400), ("long", 1800, 500), ("flat", 1800, 60)];
    for (name, w, h) in sizes {
        std::fs::write(folder.path().join(format!("{name}.jpg")), picture(w, h)).expect("a photograph");
        for of in [&CORNERS[..], &CROWD[..]] {
            text += &format!(
                "\n[[photographs]]\nfile = \"{name}.jpg\"\ncaption = \"The {name} one\"\nmark = \"R1\"\n{}",
                marks(of)
            );
        }
    }
    let (building, results) = perpend::draw("job.toml", &text).unwrap_or_else(|e| panic!("{e}"));
    let digest = perpend::digest(&text);
    let data = perpend::report::pack(&building, &results, &text, &digest);
    assert_eq!(
        data.photographs[0].alt,
        "The broad one. Marked: R1 at the left, near the top; R2 at the right, near the top; P1 at the left, near the \
         foot; P2 at the right, near the foot; B1-R1 in the middle."
    );
    let files = perpend::photographs(&building, folder.path()).unwrap_or_else(|e| panic!("{e}"));
    let flaws = perpend::pack::inspect(&data, &files, None).unwrap_or_else(|e| panic!("{e}"));
    let flaws: Vec<String> = flaws.iter().map(ToString::to_string).collect();
    assert!(flaws.is_empty(), "{}", flaws.join("\n"));

    // A PDF/A-3a that is PDF/UA-1 too, or it would not have been made.
    let from = perpend::Source { text: &text, folder: folder.path(), house: None };
    let made = perpend::set(&building, &results, &from).unwrap_or_else(|e| panic!("{e}"));
    let read = Read::new(&made.pdf);
    let texts = read.texts();
    let own = |t: &&String| t.contains(&squeeze("Marked: R1 at the left, near the top"));
    let from = texts.iter().position(|t| own(&t)).expect("the sheet of the first photographs");
    // The contents name it too.
    let title = squeeze("The job file as read");
    let job_file = texts.iter().rposition(|t| t.contains(&title)).expect("its sheets");
    let words: String = texts[from..job_file].concat();
    for n in 1..=8 {
        assert!(words.contains(&squeeze(&format!("Photograph {n}"))), "photograph {n}");
    }
    // Of four pictures four times each in the words; of the three that are not too flat for a label as often in those.
    assert_eq!(words.matches("B1-R1").count(), 4 * 4 + 3 * 4);
    // Their labels lead to the sheets of the parts, and those sheets back.
    let sheet = |title: &str| texts.iter().position(|t| t.contains(&squeeze(title))).expect("a sheet");
    let (r1, links) = (sheet("Seen on photograph 1, photograph 2"), read.links());
    assert!(links.iter().any(|l| l.from >= from && l.to == r1), "from a label to R1");
    assert!(links.iter().any(|l| l.from == r1 && l.to == from), "from R1 to its photograph");
}
