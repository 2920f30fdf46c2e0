//! The job that an engineer starts from.

/// The commented start job, which is the first demo job: valid as it stands.
pub const TEMPLATE: &str = include_str!("../../jobs/rear-opening.toml");
