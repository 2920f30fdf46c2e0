//! The language of the checks: its locks, its three renderings, what it prints and how it reads units.

mod columns;
mod functions;
mod locks;
mod once;
mod print;
mod renderings;
mod silent;
mod units;
