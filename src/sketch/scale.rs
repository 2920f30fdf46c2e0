//! Scales a draughtsman uses, and the choice between them.

use super::drawing::Drawing;

/// Preferred scales (`1:n`), largest drawing first. Common practice in the UK, no published source.
pub const PREFERRED: [f64; 8] = [5.0, 10.0, 20.0, 25.0, 50.0, 100.0, 200.0, 500.0];

/// Scales of maps, for what stands in the land.
pub const SITE: [f64; 9] = [250.0, 500.0, 1000.0, 2000.0, 2500.0, 5000.0, 10_000.0, 25_000.0, 50_000.0];

/// A scale `1:n`.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Scale(pub f64);

/// The paper a drawing may cover, mm.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Frame {
    /// Greatest width, mm on paper.
    pub width: f64,
    /// Greatest height, mm on paper.
    pub height: f64,
}

impl Frame {
    /// A frame of `width` x `height` mm.
    pub const fn new(width: f64, height: f64) -> Self {
        Self { width, height }
    }

    /// Whether a finished drawing stays inside.
    pub fn holds(&self, drawing: &Drawing) -> bool {
        drawing.width <= self.width && drawing.height <= self.height
    }
}

impl Scale {
    /// Length on paper (mm) of a full-size length (mm).
    pub fn paper(self, full_size: f64) -> f64 {
        full_size / self.0
    }

    /// `1:20`.
    pub fn text(self) -> String {
        format!("1:{}", self.0)
    }
}

/// The drawing at the largest preferred scale, from `from` (`1:from`) downwards, that fits the
/// frame; at the one that sticks out least if none fits.
pub fn fit(frame: Frame, from: f64, draw: impl Fn(Scale) -> Drawing) -> Drawing {
    let [drawing] = fit_all(frame, from, |scale| [draw(scale)]);
    drawing
}

/// The drawing at the largest scale of a map that fits the frame.
pub fn fit_site(frame: Frame, draw: impl Fn(Scale) -> Drawing) -> Drawing {
    let [drawing] = fit_in(&SITE, |scale| [draw(scale)], |drawings| over(&drawings[0], frame));
    drawing
}

/// Drawings to be compared, at one scale: the largest at which each of them fits the frame.
pub fn fit_all<const N: usize>(
    frame: Frame,
    from: f64,
    draw: impl Fn(Scale) -> [Drawing; N],
) -> [Drawing; N] {
    fit_by(from, draw, |drawings| drawings.iter().map(|d| over(d, frame)).sum())
}

/// Drawings to be compared side by side, at one scale: the largest at which the row, with `gap`
/// between them, fits the frame.
pub fn fit_row<const N: usize>(
    frame: Frame,
    gap: f64,
    from: f64,
    draw: impl Fn(Scale) -> [Drawing; N],
) -> [Drawing; N] {
    fit_by(from, draw, |drawings| over_row(drawings, frame, gap))
}

/// Drawings to be compared, at one scale: side by side as by [`fit_row`]; where that is smaller than `1:least`, one
/// below the other at that scale if each of them fits the frame.
pub fn fit_row_or_column<const N: usize>(
    frame: Frame,
    gap: f64,
    (from, least): (f64, f64),
    draw: impl Fn(Scale) -> [Drawing; N],
) -> [Drawing; N] {
    let drawings = draw(Scale(least));
    if over_row(&drawings, frame, gap) > 0.0 && drawings.iter().all(|d| frame.holds(d)) {
        return drawings;
    }
    fit_row(frame, gap, from, draw)
}

/// Clear space that the page leaves between drawings side by side, mm.
pub const APART: f64 = 8.0;

/// Two drawings to be compared, at one scale: the largest at which they fit `row` beside each other, or
/// each of them `alone` one above the other. The page finds the same by their widths.
///
/// `least` is the full size (mm) of what each of them shows at least: scales at which not even that has room are
/// not drawn, but for the smallest.
pub fn fit_pair(
    (row, alone): (Frame, Frame),
    least: (f64, f64),
    from: f64,
    draw: impl Fn(Scale) -> [Drawing; 2],
) -> [Drawing; 2] {
    let hopeless = |scale: Scale| {
        let (width, height) = (scale.paper(least.0), scale.paper(least.1));
        let in_row = 2.0 * width + APART <= row.width && height <= row.height;
        !in_row && (width > alone.width || height > alone.height)
    };
    let smallest = PREFERRED[PREFERRED.len() - 1];
    let from = PREFERRED.into_iter().find(|n| *n >= from && !hopeless(Scale(*n))).unwrap_or(smallest);
    fit_by(from, draw, |drawings| {
        over_row(drawings, row, APART).min(drawings.iter().map(|d| over(d, alone)).sum())
    })
}

/// By how much a drawing sticks out of its frame, mm.
fn over(d: &Drawing, frame: Frame) -> f64 {
    (d.width - frame.width).max(0.0) + (d.height - frame.height).max(0.0)
}

/// By how much a row of drawings, `gap` apart, sticks out of its frame, mm.
fn over_row(drawings: &[Drawing], frame: Frame, gap: f64) -> f64 {
    let width: f64 = drawings.iter().map(|d| d.width + gap).sum::<f64>() - gap;
    let height = drawings.iter().map(|d| d.height).fold(0.0, f64::max);
    (width - frame.width).max(0.0) + (height - frame.height).max(0.0)
}

/// The drawings at the largest preferred scale at which nothing sticks out; else where least does.
///
/// Labels do not shrink with the scale, so each candidate is drawn completely and then measured.
fn fit_by<const N: usize>(
    from: f64,
    draw: impl Fn(Scale) -> [Drawing; N],
    excess: impl Fn(&[Drawing; N]) -> f64,
) -> [Drawing; N] {
    let first = PREFERRED.iter().position(|n| *n >= from).unwrap_or(PREFERRED.len() - 1);
    fit_in(&PREFERRED[first..], draw, excess)
}

/// As [`fit_by`], from a list of scales that is not empty.
fn fit_in<const N: usize>(
    scales: &[f64],
    draw: impl Fn(Scale) -> [Drawing; N],
    excess: impl Fn(&[Drawing; N]) -> f64,
) -> [Drawing; N] {
    let mut best: Option<(f64, [Drawing; N])> = None;
    for n in scales {
        let drawings = draw(Scale(*n));
        let over = excess(&drawings);
        if over <= 0.0 {
            return drawings;
        }
        best = Some(match best {
            // Past some scale only the labels are left and nothing is gained.
            Some(last) if last.0 <= over => last,
            _ => (over, drawings),
        });
    }
    best.expect("a list of scales is not empty").1
}

#[cfg(test)]
mod tests {
    use super::*;

    fn square(side: f64) -> impl Fn(Scale) -> Drawing {
        let empty = String::new;
        move |scale| Drawing {
            name: empty(),
            caption: empty(),
            scale: scale.text(),
            alt: empty(),
            width: scale.paper(side),
            height: scale.paper(side),
            items: vec![],
        }
    }

    #[test]
    fn the_largest_preferred_scale_that_fits_is_taken() {
        let frame = Frame::new(100.0, 120.0);
        assert_eq!(fit(frame, 5.0, square(2000.0)).scale, "1:20");
        assert_eq!(fit(frame, 5.0, square(2001.0)).scale, "1:25");
        assert_eq!(fit(frame, 10.0, square(100.0)).scale, "1:10");
    }

    #[test]
    fn drawings_to_be_compared_share_the_scale_of_the_larger() {
        let both = fit_all(Frame::new(100.0, 100.0), 5.0, |s| [square(400.0)(s), square(4000.0)(s)]);
        assert_eq!(both.map(|drawing| drawing.scale), ["1:50", "1:50"]);
    }

    #[test]
    fn what_never_fits_is_drawn_as_small_as_it_goes() {
        assert_eq!(fit(Frame::new(10.0, 10.0), 5.0, square(90_000.0)).scale, "1:500");
    }
    #[test]
    fn a_pair_stands_side_by_side_or_one_above_the_other_whichever_is_larger() {
        let frames = (Frame::new(170.0, 150.0), Frame::new(170.0, 100.0));
        let pair = |side: f64| {
            let drawn = std::cell::RefCell::new(Vec::new());
            let [a, b] = fit_pair(frames, (side, side), 50.0, |s| {
                drawn.borrow_mut().push(s.0);
                [square(side)(s), square(side)(s)]
            });
            assert_eq!(a.scale, b.scale);
            (a.scale, drawn.into_inner())
        };
        // 81 mm each in a row, 100 mm each where one stands above the other.
        assert_eq!(pair(4050.0), ("1:50".to_owned(), vec![50.0]));
        assert_eq!(pair(5000.0), ("1:50".to_owned(), vec![50.0]));
        // Scales without hope are not drawn; what never fits is drawn once.
        assert_eq!(pair(10_001.0), ("1:200".to_owned(), vec![200.0]));
        assert_eq!(pair(90_000.0), ("1:500".to_owned(), vec![500.0]));
    }
}
