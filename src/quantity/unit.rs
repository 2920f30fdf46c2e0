//! Units by name: what a job file may write, and what a sheet prints.

use super::{Dim, Dyn};

/// One unit: how it is typed, how it is printed, and what it is worth.
#[derive(Debug)]
pub struct Unit {
    /// As typed in a job file, ASCII.
    pub typed: &'static str,
    /// As printed.
    pub printed: &'static str,
    /// Its dimension.
    pub dim: Dim,
    /// One of it in newtons, millimetres and seconds.
    pub factor: f64,
}

const fn unit(typed: &'static str, printed: &'static str, exponents: (i8, i8, i8), factor: f64) -> Unit {
    let (force, length, time) = exponents;
    Unit { typed, printed, dim: Dim { force, length, time }, factor }
}

/// Every unit, the usual one of each dimension first.
pub const UNITS: &[Unit] = &[
    unit("mm", "mm", (0, 1, 0), 1.0),
    unit("m", "m", (0, 1, 0), 1e3),
    unit("cm", "cm", (0, 1, 0), 10.0),
    unit("km", "km", (0, 1, 0), 1e6),
    unit("mm2", "mm²", (0, 2, 0), 1.0),
    unit("m2", "m²", (0, 2, 0), 1e6),
    unit("kN", "kN", (1, 0, 0), 1e3),
    unit("N", "N", (1, 0, 0), 1.0),
    unit("kNm", "kNm", (1, 1, 0), 1e6),
    unit("Nmm", "Nmm", (1, 1, 0), 1.0),
    unit("kN/m", "kN/m", (1, -1, 0), 1.0),
    unit("N/mm2", "N/mm²", (1, -2, 0), 1.0),
    unit("kN/m2", "kN/m²", (1, -2, 0), 1e-3),
    unit("N/m2", "N/m²", (1, -2, 0), 1e-6),
    unit("MPa", "MPa", (1, -2, 0), 1.0),
    unit("kPa", "kPa", (1, -2, 0), 1e-3),
    unit("Pa", "Pa", (1, -2, 0), 1e-6),
    unit("kN/m3", "kN/m³", (1, -3, 0), 1e-6),
    unit("m/s", "m/s", (0, 1, -1), 1e3),
    unit("kg/m3", "kg/m³", (1, -4, 2), 1e-12),
    unit("per m2", "per m²", (0, -2, 0), 1e-6),
    unit("/m2", "per m²", (0, -2, 0), 1e-6),
    unit("%", "%", (0, 0, 0), 0.01),
];

/// Units that exist only on paper.
const KNM_PER_M: Unit = unit("kNm/m", "kNm/m", (1, 0, 0), 1e3);
const MM3: Unit = unit("mm3", "× 10³ mm³", (0, 3, 0), 1e3);
const MM3_LARGE: Unit = unit("mm3", "× 10⁶ mm³", (0, 3, 0), 1e6);
const MM2_LARGE: Unit = unit("mm2", "× 10³ mm²", (0, 2, 0), 1e3);
const MM4: Unit = unit("mm4", "× 10⁶ mm⁴", (0, 4, 0), 1e6);
const NONE: Unit = unit("", "", (0, 0, 0), 1.0);
const N_MM: Unit = unit("N/mm", "N/mm", (1, -1, 0), 1.0);

/// The unit named `name`, as typed or as printed.
pub fn find(name: &str) -> Option<&'static Unit> {
    UNITS.iter().find(|u| u.typed == name || u.printed == name)
}

/// The names a job file may write for a dimension, the usual one first.
pub fn allowed(dim: Dim) -> Vec<&'static str> {
    UNITS.iter().filter(|u| u.dim == dim).map(|u| u.typed).collect()
}

/// What is wrong with the text of a quantity.
#[derive(Debug, Clone, PartialEq)]
pub enum Misread {
    /// No number in front.
    NoNumber,
    /// A number with nothing behind it.
    NoUnit,
    /// A unit nobody knows; perhaps this one was meant.
    UnknownUnit {
        /// As found.
        found: String,
        /// The nearest spelling that would fit the dimension.
        nearest: Option<&'static str>,
    },
    /// A known unit of another dimension.
    WrongDimension {
        /// As found.
        found: &'static str,
    },
}

/// Reads `"900 mm"` as a quantity of dimension `dim`.
///
/// # Errors
/// [`Misread`] where there is no number, no unit, an unknown unit or one of another dimension.
pub fn read(text: &str, dim: Dim) -> Result<Dyn, Misread> {
    let text = text.trim();
    let split = text
        .char_indices()
        .find(|&(i, c)| !(c.is_ascii_digit() || c == '.' || ((c == '-' || c == '+') && i == 0)))
        .map_or(text.len(), |(i, _)| i);
    let (number, name) = text.split_at(split);
    let value: f64 = number.parse().map_err(|_| Misread::NoNumber)?;
    let name = name.trim();
    if name.is_empty() {
        return if dim == Dim::NONE { Ok(Dyn::number(value)) } else { Err(Misread::NoUnit) };
    }
    match find(name) {
        Some(u) if u.dim == dim => Ok(Dyn { value: value * u.factor, dim }),
        Some(u) => Err(Misread::WrongDimension { found: u.typed }),
        None => Err(Misread::UnknownUnit { found: name.to_owned(), nearest: nearest(name, dim) }),
    }
}

fn nearest(name: &str, dim: Dim) -> Option<&'static str> {
    allowed(dim)
        .into_iter()
        .map(|u| (strsim::damerau_levenshtein(&name.to_lowercase(), &u.to_lowercase()), u))
        .filter(|(distance, _)| *distance <= 2)
        .min()
        .map(|(_, u)| u)
}

/// Lengths from 10 m, mm, and areas from 1 m², mm², are those of sites and walls and are printed in metres.
const LONG: f64 = 1e4;
const WIDE: f64 = 1e6;

/// The unit a value is printed in: by its dimension, and where a dimension has two customs by the
/// letter of its symbol (`f sigma tau E`: N/mm²; `q w g p`: kN/m²; a force called `m` or `M`: kNm/m).
pub fn for_print(symbol: &str, value: Dyn) -> &'static Unit {
    let letter = symbol.split('_').next().unwrap_or(symbol);
    let size = value.value.abs();
    let Dim { force, length, time } = value.dim;
    let name = match (force, length, time) {
        (0, 0, 0) => return &NONE,
        (0, 1, 0) if size >= LONG => "m",
        (0, 1, 0) => "mm",
        (0, 2, 0) if size >= WIDE => "m2",
        (0, 2, 0) if size >= 1e5 => return &MM2_LARGE,
        (0, 2, 0) => "mm2",
        (0, 3, 0) if size >= 1e6 => return &MM3_LARGE,
        (0, 3, 0) => return &MM3,
        (0, 4, 0) => return &MM4,
        (1, 0, 0) if matches!(letter, "m" | "M") => return &KNM_PER_M,
        (1, 0, 0) => "kN",
        (1, 1, 0) => "kNm",
        (1, -1, 0) if letter == "K" => return &N_MM,
        (1, -1, 0) => "kN/m",
        (1, -2, 0) if matches!(letter, "q" | "w" | "W" | "g" | "p" | "G" | "Q") => "kN/m2",
        (1, -2, 0) => "N/mm2",
        (1, -3, 0) => "kN/m3",
        (0, 1, -1) => "m/s",
        (1, -4, 2) => "kg/m3",
        (0, -2, 0) => "per m2",
        _ => return &NONE,
    };
    find(name).unwrap_or(&NONE)
}
