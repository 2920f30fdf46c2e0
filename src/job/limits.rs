//! What a number may be: limits as data, beside the field that they belong to.

use crate::quantity::{Dim, print, unit};

/// The range of a value in one unit. Outside it is an error; odd values inside it give a warning.
#[derive(Debug)]
pub struct Limits {
    /// The unit of the figures, as typed; empty for a bare number.
    pub unit: &'static str,
    /// Least value allowed.
    pub low: f64,
    /// Greatest value allowed.
    pub high: f64,
    /// Values that are possible but seldom right.
    pub odd: &'static [Odd],
}

/// A value that is possible but odd, and why.
#[derive(Debug)]
pub enum Odd {
    /// Less than this.
    Below(f64, &'static str),
    /// More than this.
    Above(f64, &'static str),
}

impl Limits {
    /// From `low` to `high`, both included, in `unit`.
    pub const fn new(low: f64, high: f64, unit: &'static str) -> Self {
        Self { unit, low, high, odd: &[] }
    }

    /// The same limits with values that deserve a warning.
    pub const fn odd(self, odd: &'static [Odd]) -> Self {
        Self { odd, ..self }
    }

    /// What one of the unit is worth in newtons, millimetres and seconds.
    fn factor(&self) -> f64 {
        unit::find(self.unit).map_or(1.0, |u| u.factor)
    }

    /// Whether a value in base units is allowed. A number that is not finite is not.
    pub fn allow(&self, base: f64) -> bool {
        let scaled = base / self.factor();
        // 0.05 kN/m2 typed at the limit must not fail by the last bit of a division.
        let slack = 1e-9 * scaled.abs();
        scaled.is_finite() && scaled >= self.low - slack && scaled <= self.high + slack
    }

    /// Why a value in base units is odd, with the bound that it passes.
    pub fn oddity(&self, base: f64) -> Option<String> {
        let scaled = base / self.factor();
        self.odd.iter().find_map(|odd| match *odd {
            Odd::Below(bound, why) if scaled < bound * (1.0 - 1e-9) => {
                Some(format!("under {}: {why}", self.figure(bound)))
            }
            Odd::Above(bound, why) if scaled > bound * (1.0 + 1e-9) => {
                Some(format!("over {}: {why}", self.figure(bound)))
            }
            _ => None,
        })
    }

    /// `50 mm to 6000 mm`.
    pub fn words(&self) -> String {
        format!("{} to {}", self.figure(self.low), self.figure(self.high))
    }

    /// A value in base units as it would be typed.
    pub fn shown(&self, base: f64) -> String {
        self.figure(base / self.factor())
    }

    fn figure(&self, x: f64) -> String {
        let gap = if self.unit.is_empty() { "" } else { " " };
        // A figure that may be typed again has the hyphen that a keyboard has.
        format!("{}{gap}{}", print::literal(x).replace('−', "-"), self.unit)
    }
}

impl Limits {
    /// What a quantity of these limits is called, with its article.
    pub fn called(&self) -> &'static str {
        match self.unit {
            "mm" | "m" => "a length",
            "kN" => "a force",
            "kNm" => "a moment",
            "kN/m" => "a load per length",
            "kN/m2" => "a pressure",
            "N/mm2" => "a strength",
            "kN/m3" => "a weight per volume",
            "per m2" => "a number per area",
            "m/s" => "a speed",
            _ => "a quantity",
        }
    }

    /// The units that may be typed, those that these limits are given in first.
    pub fn units(&self, dim: Dim) -> String {
        let mut units = unit::allowed(dim);
        units.sort_by_key(|u| *u != self.unit);
        one_of(&units)
    }

    /// The unit that was meant behind `number`, where the text has `found` or nothing: near in
    /// spelling, and such that the value is allowed.
    pub fn meant(&self, dim: Dim, number: f64, found: &str) -> Option<&'static str> {
        let distance = |u: &str| strsim::damerau_levenshtein(&found.to_lowercase(), &u.to_lowercase());
        unit::allowed(dim)
            .into_iter()
            .filter(|u| found.is_empty() || distance(u) <= 2)
            .filter(|u| unit::find(u).is_some_and(|u| self.allow(number * u.factor)))
            .min_by_key(|u| (if found.is_empty() { 0 } else { distance(u) }, *u != self.unit))
    }
}

/// Words joined as a choice: `a, b or c`.
pub fn one_of<S: AsRef<str>>(words: &[S]) -> String {
    let words: Vec<&str> = words.iter().map(AsRef::as_ref).collect();
    match words.as_slice() {
        [] => "nothing".to_owned(),
        [only] => (*only).to_owned(),
        [first @ .., last] => format!("{} or {last}", first.join(", ")),
    }
}

/// The spelling in `among` that is nearest to `word`, where one is near enough to be meant.
/// Of several equally near none is named: M5 is no slip for M6, and a guess could be the stronger.
pub fn nearest<'w>(word: &str, among: impl IntoIterator<Item = &'w str>) -> Option<&'w str> {
    let lower = word.to_lowercase();
    let reach = (word.chars().count() / 3).clamp(1, 4);
    let mut near: Vec<(usize, &str)> = among
        .into_iter()
        .map(|w| (strsim::damerau_levenshtein(&lower, &w.to_lowercase()), w))
        .filter(|(distance, _)| *distance <= reach)
        .collect();
    near.sort_by_key(|(distance, _)| *distance);
    match near.as_slice() {
        [first, second, ..] if first.0 == second.0 => None,
        [first, ..] => Some(first.1),
        [] => None,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn of_equally_near_words_none_is_named() {
        let mortars = ["M12", "M6", "M4", "M2", "lime"];
        assert_eq!(nearest("M5", mortars), None);
        assert_eq!(nearest("lme", mortars), Some("lime"));
    }

    const LENGTH: Limits = Limits::new(50.0, 6000.0, "mm").odd(&[Odd::Below(200.0, "a short nib")]);

    #[test]
    fn limits_include_their_ends_and_refuse_what_is_not_a_number() {
        assert!(LENGTH.allow(50.0) && LENGTH.allow(6000.0));
        for x in [49.9, 6000.1, f64::NAN, f64::INFINITY, -50.0] {
            assert!(!LENGTH.allow(x), "{x}");
        }
        let wind = Limits::new(0.05, 10.0, "kN/m2");
        assert!(wind.allow(0.05e-3) && wind.allow(10e-3) && !wind.allow(10.01e-3));
        assert_eq!(wind.words(), "0.05 kN/m2 to 10 kN/m2");
    }

    #[test]
    fn odd_values_name_the_bound() {
        assert_eq!(LENGTH.oddity(90.0).as_deref(), Some("under 200 mm: a short nib"));
        assert_eq!(LENGTH.oddity(200.0), None);
    }

    #[test]
    fn the_unit_that_was_meant_fits_the_value() {
        let dim = crate::quantity::Length::ZERO.dynamic().dim;
        let height = Limits::new(1.5, 6.0, "m");
        assert_eq!(height.meant(dim, 2400.0, ""), Some("mm"));
        assert_eq!(height.meant(dim, 2.4, ""), Some("m"));
        assert_eq!(height.meant(dim, 2400.0, "mn"), Some("mm"));
        assert_eq!(height.meant(dim, 1e9, ""), None);
        assert_eq!(height.units(dim), "m, mm, cm or km");
    }

    #[test]
    fn the_nearest_word_must_be_near() {
        let words = ["timber floor", "concrete floor", "none"];
        assert_eq!(nearest("concret floor", words), Some("concrete floor"));
        assert_eq!(nearest("Timber Floor", words), Some("timber floor"));
        assert_eq!(nearest("steel deck", words), None);
        assert_eq!(one_of(&words), "timber floor, concrete floor or none");
    }
}
