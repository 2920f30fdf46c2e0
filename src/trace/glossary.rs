//! What each symbol means, in one place.

/// Symbols by name, with their meaning.
pub const GLOSSARY: &[(&str, &str)] = &[];
