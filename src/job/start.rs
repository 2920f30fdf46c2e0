//! The jobs that an engineer starts from.

/// The commented start job, which is the first demo job: valid as it stands.
pub const TEMPLATE: &str = include_str!("../../jobs/rear-opening.toml");

/// The shorter start job, worked from its plan: valid as it stands.
pub const FROM_PLAN: &str = include_str!("../../jobs/semi.toml");

/// The commented practice file: valid as it stands, without files beside it.
pub const PRACTICE: &str = include_str!("../../jobs/practice/start.toml");
