//! When a signature was given.

use std::time::Duration;

use jiff::Timestamp;
use jiff::civil::Date;
use jiff::tz::TimeZone;

/// A moment, in universal time, to the second. A pack has no clock; a signature says when it was given.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub struct Moment(Timestamp);

impl Moment {
    /// Now, by the clock of this computer.
    pub fn now() -> Self {
        Self(Timestamp::now())
    }

    /// A date (`2026-12-02`, its first moment) or a date with a time (`2026-12-02T14:05:00Z`).
    pub fn read(text: &str) -> Option<Self> {
        let day = || text.parse::<Date>().ok()?.to_zoned_datetime(TimeZone::UTC).ok().map(|z| z.timestamp());
        // A date with a time parses as a date too, and would lose its time.
        let found = if text.contains(':') { text.parse().ok() } else { day() };
        // A certificate and a PDF write four digits of the year.
        found.map(Self).filter(|m| (1970..=9999).contains(&m.0.to_zoned_datetime(TimeZone::UTC).year()))
    }

    /// As a PDF writes it: `D:20261202140500Z`.
    pub fn pdf(self) -> String {
        self.print("D:%Y%m%d%H%M%SZ")
    }

    /// From a PDF; `None` where it is not written as [`Moment::pdf`] or with an offset.
    pub fn from_pdf(text: &str) -> Option<Self> {
        let digits = text.strip_prefix("D:")?;
        let (stamp, zone) = digits.split_at_checked(14)?;
        let offset = match zone {
            "" | "Z" => "+0000".to_owned(),
            other => other.replace('\'', ""),
        };
        jiff::fmt::strtime::parse("%Y%m%d%H%M%S%z", format!("{stamp}{offset}"))
            .and_then(|parsed| parsed.to_timestamp())
            .ok()
            .map(Self)
    }

    /// In words: `2 December 2026, 14:05 UTC`.
    pub fn words(self) -> String {
        self.print("%-d %B %Y, %H:%M UTC")
    }

    /// Since the beginning of 1970; nil before.
    pub fn since_1970(self) -> Duration {
        Duration::from_secs(u64::try_from(self.0.as_second()).unwrap_or(0))
    }

    fn print(self, format: &str) -> String {
        self.0.to_zoned_datetime(TimeZone::UTC).strftime(format).to_string()
    }
}

#[cfg(test)]
mod tests {
    use super::Moment;

    #[test]
    fn moments_are_read_and_written() {
        let noon = Moment::read("2026-12-02T14:05:00Z").expect("a moment");
        assert_eq!(noon.pdf(), "D:20261202140500Z");
        assert_eq!(noon.words(), "2 December 2026, 14:05 UTC");
        for same in
            ["D:20261202140500Z", "D:20261202140500", "D:20261202150500+01'00'", "D:20261202150500+01'00"]
        {
            assert_eq!(Moment::from_pdf(same), Some(noon), "{same}");
        }
        assert_eq!(Moment::read("2026-12-02").expect("a day").pdf(), "D:20261202000000Z");
        for wrong in ["2026-13-02", "yesterday", "", "2026-12-02T25:00:00Z", "-000001-01-01"] {
            assert_eq!(Moment::read(wrong), None, "{wrong}");
        }
    }
}
