//! The limit analyses of panels: against exact values, against other solvers, and against each other.

mod both;
mod by_hand;
mod moment_field;
mod weakest_pattern;
