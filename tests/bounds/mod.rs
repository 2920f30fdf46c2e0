//! The limit analyses of panels: against exact values, against other solvers, and against each other.

mod both;
mod moment_field;
mod weakest_pattern;
