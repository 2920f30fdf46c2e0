//! The sheet as data: what a check computed, how, and by which clause.
//!
//! The same tokens compute the number, print the formula, print the substitution, speak it and are
//! evaluated again. Three locks keep the print honest, each an internal [`Fault`] when it breaks:
//!
//! 1. [`calc!`](crate::calc) uses its tokens as Rust and as text, so what is printed is what ran;
//! 2. on a recording sheet the printed formula is evaluated again from the printed symbols and must
//!    equal the computed value to the last bit, dimension too;
//! 3. every symbol of a formula must already stand on that sheet with exactly that value.
//!
//! On a silent sheet nothing is kept but the verdicts, so a search can run the check itself.
//!
//! * [`Sheet`] and its [`Entry`]s; [`Columns`] where the same work is done on several things
//! * [`expr`]: a formula as a tree: parsed, evaluated
//! * [`symbol`]: names to symbols, and what each means
//! * [`math`], [`text`], [`spoken`]: the three renderings
//! * the macros `given! lookup! found! calc! decide! require! verify!`

mod columns;
mod entry;
pub mod expr;
pub mod glossary;
mod macros;
pub mod math;
mod parse;
mod sheet;
pub mod spoken;
pub mod symbol;
pub mod text;

pub use columns::{Columns, Row};
pub use entry::{Column, Entry, Outside, Relation, Step, Table, Unshown, Value, Verdict};
pub use parse::Op;
pub use sheet::{Fault, Sheet, Traced};
