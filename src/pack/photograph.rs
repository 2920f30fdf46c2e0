//! Photographs taken in: turned upright, brought to print resolution, stripped of everything else.

use std::fmt;
use std::io::Cursor;

use image::codecs::jpeg::JpegEncoder;
use image::imageops::FilterType;
use image::{DynamicImage, ImageDecoder, ImageFormat, ImageReader, Limits};

/// Longest side in print: 160 mm at 300 dots an inch, in pixels.
const LONGEST: u32 = 1890;
/// JPEG quality that shows no blocks on paper; common practice, no published source.
const QUALITY: u8 = 82;
/// Longest side that is opened at all, pixels.
const LARGEST_SIDE: u32 = 20_000;
/// Most pixels that are opened.
const LARGEST_AREA: u64 = 80_000_000;
/// Memory that a decoder may take.
const MEMORY: u64 = 512 * 1024 * 1024;

/// Why a photograph is refused.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Refused {
    /// Neither JPEG nor PNG.
    Kind,
    /// Too many pixels.
    Size(u32, u32),
    /// It breaks off, or holds something that cannot be read.
    Broken(String),
}

impl fmt::Display for Refused {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::Kind => f.write_str("it is neither a JPEG nor a PNG photograph"),
            Self::Size(w, h) => write!(f, "it is {w} by {h} pixels, more than a pack takes in"),
            Self::Broken(why) => write!(f, "it is broken: {why}"),
        }
    }
}

impl std::error::Error for Refused {}

/// The photograph as a JPEG for print: upright by its orientation mark, no side longer than the print
/// needs, without metadata (so without the place where it was taken).
///
/// # Errors
/// [`Refused`] where it is no JPEG or PNG, too large, or broken.
pub fn take_in(bytes: &[u8]) -> Result<Vec<u8>, Refused> {
    let broken = |e: image::ImageError| Refused::Broken(e.to_string());
    let mut reader = ImageReader::new(Cursor::new(bytes))
        .with_guessed_format()
        .map_err(|e| Refused::Broken(e.to_string()))?;
    if !matches!(reader.format(), Some(ImageFormat::Jpeg | ImageFormat::Png)) {
        return Err(Refused::Kind);
    }
    if reader.format() == Some(ImageFormat::Jpeg) && !ends_well(bytes) {
        return Err(Refused::Broken("the file ends before the picture does".to_owned()));
    }
    let mut limits = Limits::default();
    limits.max_image_width = Some(LARGEST_SIDE);
    limits.max_image_height = Some(LARGEST_SIDE);
    limits.max_alloc = Some(MEMORY);
    reader.limits(limits);
    let mut decoder = reader.into_decoder().map_err(broken)?;
    let (w, h) = decoder.dimensions();
    if u64::from(w) * u64::from(h) > LARGEST_AREA {
        return Err(Refused::Size(w, h));
    }
    let turn = decoder.orientation().map_err(broken)?;
    let mut picture = DynamicImage::from_decoder(decoder).map_err(broken)?;
    picture.apply_orientation(turn);
    if picture.width().max(picture.height()) > LONGEST {
        picture = picture.resize(LONGEST, LONGEST, FilterType::Lanczos3);
    }
    let mut out = Vec::new();
    JpegEncoder::new_with_quality(&mut out, QUALITY).encode_image(&picture.to_rgb8()).map_err(broken)?;
    Ok(out)
}

/// A JPEG that was cut short lacks its end mark, and decoders fill in grey without a word.
fn ends_well(bytes: &[u8]) -> bool {
    let tail = &bytes[bytes.len().saturating_sub(4096)..];
    tail.windows(2).any(|w| w == [0xFF, 0xD9])
}

#[cfg(test)]
mod tests {
    use super::*;
    use image::RgbImage;

    /// A picture 3 wide and 2 high, red in its upper left corner.
    fn picture(w: u32, h: u32) -> RgbImage {
        RgbImage::from_fn(w, h, |x, y| {
            if x < w / 2 && y < h / 2 { image::Rgb([250, 10, 10]) } else { image::Rgb([20, 20, 200]) }
        })
    }

    fn jpeg(w: u32, h: u32) -> Vec<u8> {
        let mut out = Vec::new();
        JpegEncoder::new_with_quality(&mut out, 90).encode_image(&picture(w, h)).expect("encodes");
        out
    }

    /// The same JPEG with an EXIF block that says "turned 90 degrees clockwise" and a place name.
    fn with_exif(plain: &[u8]) -> Vec<u8> {
        let mut exif =
            b"Exif\0\0MM\0\x2a\0\0\0\x08\0\x01\x01\x12\0\x03\0\0\0\x01\0\x06\0\0\0\0\0\0SECRET-PLACE"
                .to_vec();
        let length = u16::try_from(exif.len() + 2).expect("short").to_be_bytes();
        let mut out = vec![0xFF, 0xD8, 0xFF, 0xE1];
        out.extend(length);
        out.append(&mut exif);
        out.extend(&plain[2..]);
        out
    }

    #[test]
    fn orientation_is_honoured_and_metadata_stays_behind() {
        let out = take_in(&with_exif(&jpeg(60, 40))).expect("a good photograph");
        let back = image::load_from_memory(&out).expect("a JPEG").to_rgb8();
        assert_eq!(back.dimensions(), (40, 60));
        let corner = back.get_pixel(36, 3);
        assert!(corner[0] > 180 && corner[2] < 90, "red turned to the upper right, found {corner:?}");
        assert!(!out.windows(6).any(|w| w == b"SECRET"));
    }

    #[test]
    fn large_photographs_come_down_to_print_size() {
        let out = take_in(&jpeg(4000, 1000)).expect("a good photograph");
        let back = image::load_from_memory(&out).expect("a JPEG");
        assert_eq!((back.width(), back.height()), (1890, 473));
    }

    #[test]
    fn broken_and_foreign_files_are_refused() {
        let good = jpeg(60, 40);
        assert!(matches!(take_in(&good[..good.len() / 2]), Err(Refused::Broken(_))));
        assert_eq!(take_in(b"GIF89a not a photograph"), Err(Refused::Kind));
        assert_eq!(take_in(b""), Err(Refused::Kind));
    }
}
