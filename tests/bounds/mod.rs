//! The limit analyses of panels: against exact values, against other solvers, and against each other.

mod annex_e;
mod both;
mod by_hand;
mod laws;
mod moment_field;
mod openings;
mod random;
mod weakest_pattern;
