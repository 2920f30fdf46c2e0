//! The limit analyses of panels: against exact values, against other solvers, and against each other.

mod annex_e;
mod both;
mod by_hand;
mod demos;
mod dpc;
mod first_crack;
mod first_crack_clamps;
mod first_crack_laws;
mod laws;
mod moment_field;
mod openings;
mod random;
mod weakest_pattern;
