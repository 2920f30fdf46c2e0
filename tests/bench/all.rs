//! How long things take, inside one process. `cargo bench`; whole processes are measured from outside.

mod bounds;
mod check;
#[path = "../jobs/mod.rs"]
mod jobs;
mod many;
mod row;
mod sheet;

fn main() {
    divan::main();
}
