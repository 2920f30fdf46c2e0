//! Searches that print nothing.

pub mod root;
