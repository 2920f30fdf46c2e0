//! Colours, and how well one is read on another.

/// A colour on screen or paper.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Colour {
    /// Red, green and blue, each 0 to 255.
    pub rgb: [u8; 3],
}

/// Least contrast of small text with its ground: W3C, WCAG 2.1, success criterion 1.4.3 (from memory).
pub const CONTRAST: f64 = 4.5;

impl Colour {
    /// White paper.
    pub const PAPER: Self = Self { rgb: [255; 3] };

    /// The colour of `#1f3d52`; `None` for anything but a # and six hexadecimal digits.
    pub fn from_hex(text: &str) -> Option<Self> {
        let digits =
            text.strip_prefix('#').filter(|d| d.len() == 6 && d.bytes().all(|b| b.is_ascii_hexdigit()))?;
        let part = |at: usize| u8::from_str_radix(digits.get(at..at + 2)?, 16).ok();
        Some(Self { rgb: [part(0)?, part(2)?, part(4)?] })
    }

    /// `#1f3d52`.
    pub fn hex(self) -> String {
        let [r, g, b] = self.rgb;
        format!("#{r:02x}{g:02x}{b:02x}")
    }

    /// Contrast with white paper, 1 for white to 21 for black.
    pub fn contrast(self) -> f64 {
        self.contrast_on(Self::PAPER)
    }

    /// Contrast with another colour, 1 for the same to 21 for black on white: contrast ratio as defined in W3C, Web
    /// Content Accessibility Guidelines (WCAG) 2.1, 2018, section 5 (formulas entered from memory).
    pub fn contrast_on(self, ground: Self) -> f64 {
        let (a, b) = (self.luminance(), ground.luminance());
        (a.max(b) + 0.05) / (a.min(b) + 0.05)
    }

    /// Relative luminance, 0 for black to 1 for white, as defined there.
    fn luminance(self) -> f64 {
        let linear = |c: u8| {
            let c = f64::from(c) / 255.0;
            if c <= 0.03928 { c / 12.92 } else { ((c + 0.055) / 1.055).powf(2.4) }
        };
        let [r, g, b] = self.rgb.map(linear);
        0.2126 * r + 0.7152 * g + 0.0722 * b
    }
}

#[cfg(test)]
mod tests {
    use super::Colour;

    #[test]
    fn contrast_runs_from_white_to_black() {
        let of = |hex: &str| Colour::from_hex(hex).expect("a colour").contrast();
        assert!((of("#ffffff") - 1.0).abs() < 1e-9 && (of("#000000") - 21.0).abs() < 1e-9);
        // By hand: 0x80/255 = 0.50196, ((0.50196 + 0.055)/1.055)^2.4 = 0.21586; 1.05/0.26586 = 3.949.
        assert!((of("#808080") - 3.949).abs() < 1e-3, "{}", of("#808080"));
        // Pure red: luminance 0.2126, 1.05/0.2626 = 3.998.
        assert!((of("#ff0000") - 3.998).abs() < 1e-3, "{}", of("#ff0000"));
    }

    #[test]
    fn only_six_digits_are_a_colour() {
        for wrong in ["", "#", "1f3d52", "#1f3d5", "#1f3d522", "#1f3d5g", "#1f3d+2", "red", "#é3d52"] {
            assert_eq!(Colour::from_hex(wrong), None, "{wrong}");
        }
        assert_eq!(Colour::from_hex("#1F3d52").map(Colour::hex).as_deref(), Some("#1f3d52"));
    }
}
