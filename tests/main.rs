//! The one test binary: every binary would link the typesetter again.
//!
//! * `trace`: the three locks and the three renderings
//! * `examples`: one file a published source, and two hand calculations
//! * `archive`: packs worked again and compared
//! * `bounds`: the limit analyses of panels
//! * `signing`: packs signed, and their signatures verified
//! * `properties`: what must be monotone, symmetric or continuous
//! * `sheets`: every demo job as text
//! * `pdf`: the packs, read back
//! * `house`: the house style of a practice
//! * `cli`: the command as a person runs it
//! * `jobs`: job files for tests and benchmarks
//! * `conventions`: arrows between modules, coverage files, the glossary

#![allow(non_snake_case, missing_docs, reason = "symbols as the standards write them; tests need no docs")]

mod archive;
mod bounds;
mod cli;
mod conventions;
mod examples;
mod house;
mod jobs;
mod pdf;
mod properties;
mod sheets;
mod signing;
mod trace;
