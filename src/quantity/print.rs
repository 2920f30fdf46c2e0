//! Numbers as text: the one place that decides digits.

use super::{Dyn, unit};

/// A number and its unit, as printed. The unit is empty for a bare number.
#[derive(Clone, Debug, PartialEq, Eq, serde::Serialize)]
pub struct Shown {
    /// Digits, with a thin space between thousands and a true minus sign.
    pub value: String,
    /// The unit, in upright type.
    pub unit: String,
}

impl std::fmt::Display for Shown {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        f.write_str(&self.value)?;
        if self.unit.is_empty() { Ok(()) } else { write!(f, " {}", self.unit) }
    }
}

/// A value in the unit its symbol asks for, with three significant digits; lengths to the
/// millimetre, or to a tenth where the tenth is there; from 10 m in metres.
pub fn show(symbol: &str, value: Dyn) -> Shown {
    let unit = unit::for_print(symbol, value);
    let scaled = value.value / unit.factor;
    let digits = match unit.printed {
        "mm" if scaled.abs() >= 10.0 => length(scaled),
        "m" => group(format!("{scaled:.3}").trim_end_matches('0').trim_end_matches('.')),
        _ => significant(scaled),
    };
    Shown { value: digits, unit: unit.printed.to_owned() }
}

fn length(mm: f64) -> String {
    let tenths = (mm * 10.0).round() / 10.0;
    let close = (mm - tenths).abs() < 1e-6;
    if close && tenths.fract() != 0.0 { group(&format!("{tenths:.1}")) } else { group(&format!("{mm:.0}")) }
}

/// Three significant digits; a number that needs fewer is printed with fewer.
pub fn significant(x: f64) -> String {
    if !x.is_finite() {
        return if x.is_nan() { "undefined".to_owned() } else { "∞".to_owned() };
    }
    if x == 0.0 {
        return "0".to_owned();
    }
    // The exponent after rounding: 9.996 is written as 10.0, not as 10.00.
    let magnitude = format!("{x:.2e}").split_once('e').and_then(|(_, e)| e.parse::<i32>().ok()).unwrap_or(0);
    let decimals = (2 - magnitude).max(0);
    let text = format!("{x:.prec$}", prec = decimals as usize);
    let exact = text.parse::<f64>().is_ok_and(|back| (back - x).abs() <= 1e-9 * x.abs());
    if exact && text.contains('.') {
        return group(text.trim_end_matches('0').trim_end_matches('.'));
    }
    group(&text)
}

/// A use ratio with two decimals, rounded up, so that 1.004 prints as 1.01.
pub fn ratio(x: f64) -> String {
    if x.is_nan() || x.is_infinite() {
        return "∞".to_owned();
    }
    if x > 99.0 {
        return "> 99".to_owned();
    }
    // A ratio of exactly two decimals must not be pushed up by its binary tail.
    let hundredths = (x * 100.0 - 1e-9).ceil() / 100.0;
    let hundredths = if x > 1.0 && hundredths <= 1.0 { 1.01 } else { hundredths };
    // Adding nought turns a negative nought into nought.
    format!("{:.2}", hundredths.max(0.0) + 0.0)
}

/// A number as a formula writes it: `0.065`, `2`, without digits it does not need.
pub fn literal(x: f64) -> String {
    minus(format!("{x}"))
}

fn group(digits: &str) -> String {
    let (whole, rest) = digits.split_once('.').map_or((digits, None), |(w, r)| (w, Some(r)));
    let (sign, whole) = whole.strip_prefix('-').map_or(("", whole), |w| ("-", w));
    let mut out = String::new();
    for (i, c) in whole.chars().enumerate() {
        if i > 0 && (whole.len() - i).is_multiple_of(3) && whole.len() > 4 {
            out.push('\u{2009}');
        }
        out.push(c);
    }
    if let Some(rest) = rest {
        out.push('.');
        out.push_str(rest);
    }
    minus(format!("{sign}{out}"))
}

fn minus(text: String) -> String {
    text.replace('-', "−")
}
