//! Dates: TOML dates in, ISO text in the building, words on paper.

use jiff::civil::Date;
use toml::de::DeValue;

use super::entry::Entry;
use crate::error::Kind;

/// First and last year that a date of a job may have.
const YEARS: (u16, u16) = (2000, 2099);

/// An ISO date in words: `14 October 2026`. A text that is no date comes back as it is.
pub fn in_words(iso: &str) -> String {
    match iso.parse::<Date>() {
        Ok(date) => date.strftime("%-d %B %Y").to_string(),
        Err(_) => iso.to_owned(),
    }
}

impl Entry<'_> {
    /// A date without a time, as ISO text.
    pub fn date(&self) -> Option<String> {
        let wanted = format!("a date, year-month-day, {} to {}", YEARS.0, YEARS.1);
        let DeValue::Datetime(found) = self.present(&wanted)? else {
            self.wrong_type(&wanted, "write it without quotes, for example 2026-10-14");
            return None;
        };
        let (Some(date), None) = (found.date, found.time) else {
            self.wrong_type(&wanted, "write the date alone, for example 2026-10-14");
            return None;
        };
        let real = i16::try_from(date.year)
            .ok()
            .zip(i8::try_from(date.month).ok().zip(i8::try_from(date.day).ok()))
            .and_then(|(year, (month, day))| Date::new(year, month, day).ok())
            .filter(|_| (YEARS.0..=YEARS.1).contains(&date.year));
        if real.is_none() {
            self.fault(Kind::NotAllowed, format_args!("`{}` is {date}", self.key))
                .at(self.place(), "no date of a job")
                .allowed(&wanted)
                .help("check the year, month and day");
        }
        real.map(|d| d.to_string())
    }
}

#[cfg(test)]
mod tests {
    use super::in_words;

    #[test]
    fn dates_in_words() {
        assert_eq!(in_words("2026-10-14"), "14 October 2026");
        assert_eq!(in_words("2026-02-01"), "1 February 2026");
        assert_eq!(in_words("not visited"), "not visited");
    }
}
