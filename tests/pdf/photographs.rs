//! Photographs in a pack: turned upright, in print size, and nothing of where or with what they were taken.

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
