//! A formula as a tree: parsed from its Rust tokens, evaluated on dynamic quantities.

use crate::quantity::{Dim, Dyn, functions};

/// A node of a formula.
#[derive(Clone, Debug, PartialEq)]
pub enum Expr {
    /// A number as written.
    Number(f64),
    /// A symbol that stands on the sheet.
    Symbol(String),
    /// A unit used as a factor (`MPA`, `MM`, `KN`).
    Unit(&'static UnitConst),
    /// `-a`
    Neg(Box<Expr>),
    /// `a + b`
    Add(Box<Expr>, Box<Expr>),
    /// `a - b`
    Sub(Box<Expr>, Box<Expr>),
    /// `a * b`
    Mul(Box<Expr>, Box<Expr>),
    /// `a / b`
    Div(Box<Expr>, Box<Expr>),
    /// A function of one or two arguments.
    Call(Fun, Vec<Expr>),
}

/// A unit that a formula may multiply by.
#[derive(Debug, PartialEq)]
pub struct UnitConst {
    /// As named in the code.
    pub name: &'static str,
    /// As printed.
    pub printed: &'static str,
    value: Dyn,
}

const fn constant(name: &'static str, printed: &'static str, value: Dyn) -> UnitConst {
    UnitConst { name, printed, value }
}

/// The units of `quantity::functions`, by name.
pub const UNIT_CONSTS: &[UnitConst] = &[
    constant("MPA", "N/mm²", functions::MPA.dynamic()),
    constant("MM", "mm", functions::MM.dynamic()),
    constant("KN", "kN", functions::KN.dynamic()),
    constant("M_S", "m/s", functions::M_S.dynamic()),
    constant("KG_M3", "kg/m³", functions::KG_M3.dynamic()),
];

/// The functions of `quantity::functions`, by name.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
#[allow(missing_docs, reason = "the names are the functions'")]
pub enum Fun {
    Min,
    Max,
    Abs,
    Sq,
    Cube,
    Sqrt,
    Cbrt,
    Exp,
    Ln,
    Log10,
    Pow,
    Mpa,
    Metres,
    SquareMetres,
}

const FUNCTIONS: &[(&str, Fun, usize)] = &[
    ("min", Fun::Min, 2),
    ("max", Fun::Max, 2),
    ("abs", Fun::Abs, 1),
    ("sq", Fun::Sq, 1),
    ("cube", Fun::Cube, 1),
    ("sqrt", Fun::Sqrt, 1),
    ("cbrt", Fun::Cbrt, 1),
    ("exp", Fun::Exp, 1),
    ("ln", Fun::Ln, 1),
    ("log10", Fun::Log10, 1),
    ("pow", Fun::Pow, 2),
    ("mpa", Fun::Mpa, 1),
    ("metres", Fun::Metres, 1),
    ("square_metres", Fun::SquareMetres, 1),
];

impl Fun {
    /// The function named `name` and how many arguments it takes.
    pub fn find(name: &str) -> Option<(Self, usize)> {
        FUNCTIONS.iter().find(|f| f.0 == name).map(|f| (f.1, f.2))
    }

    /// Its name.
    pub fn name(self) -> &'static str {
        FUNCTIONS.iter().find(|f| f.1 == self).map_or("", |f| f.0)
    }
}

impl Expr {
    /// Evaluates the tree, with `symbol` giving what a name stands for. `None` where a name is
    /// unknown or dimensions do not fit.
    pub fn eval(&self, symbol: &impl Fn(&str) -> Option<Dyn>) -> Option<Dyn> {
        let with = |value, dim| Some(Dyn { value, dim });
        match self {
            Self::Number(x) => Some(Dyn::number(*x)),
            Self::Symbol(name) => symbol(name),
            Self::Unit(unit) => Some(unit.value),
            Self::Neg(a) => a.eval(symbol).map(|a| Dyn { value: -a.value, ..a }),
            Self::Add(a, b) | Self::Sub(a, b) => {
                let (x, y) = (a.eval(symbol)?, b.eval(symbol)?);
                let sum = if matches!(self, Self::Add(..)) { x.value + y.value } else { x.value - y.value };
                if x.dim == y.dim { with(sum, x.dim) } else { None }
            }
            Self::Mul(a, b) => {
                let (x, y) = (a.eval(symbol)?, b.eval(symbol)?);
                with(x.value * y.value, x.dim.times(y.dim))
            }
            Self::Div(a, b) => {
                let (x, y) = (a.eval(symbol)?, b.eval(symbol)?);
                with(x.value / y.value, x.dim.over(y.dim))
            }
            Self::Call(fun, args) => {
                let args: Option<Vec<Dyn>> = args.iter().map(|a| a.eval(symbol)).collect();
                call(*fun, &args?)
            }
        }
    }

    /// Calls `visit` with every symbol, in reading order.
    pub fn symbols(&self, visit: &mut impl FnMut(&str)) {
        match self {
            Self::Number(_) | Self::Unit(_) => {}
            Self::Symbol(name) => visit(name),
            Self::Neg(a) => a.symbols(visit),
            Self::Add(a, b) | Self::Sub(a, b) | Self::Mul(a, b) | Self::Div(a, b) => {
                a.symbols(visit);
                b.symbols(visit);
            }
            Self::Call(_, args) => args.iter().for_each(|a| a.symbols(visit)),
        }
    }
}

fn call(fun: Fun, args: &[Dyn]) -> Option<Dyn> {
    let a = *args.first()?;
    let b = args.get(1).copied();
    let pure = |value| (a.dim == Dim::NONE).then_some(Dyn::number(value));
    match fun {
        Fun::Min | Fun::Max => {
            let b = b?;
            let value = if fun == Fun::Min { a.value.min(b.value) } else { a.value.max(b.value) };
            (a.dim == b.dim).then_some(Dyn { value, dim: a.dim })
        }
        Fun::Abs => Some(Dyn { value: a.value.abs(), dim: a.dim }),
        Fun::Sq => Some(Dyn { value: a.value * a.value, dim: a.dim.power(2) }),
        Fun::Cube => Some(Dyn { value: a.value * a.value * a.value, dim: a.dim.power(3) }),
        Fun::Sqrt => Some(Dyn { value: a.value.sqrt(), dim: a.dim.root(2)? }),
        Fun::Cbrt => Some(Dyn { value: a.value.cbrt(), dim: a.dim.root(3)? }),
        Fun::Exp => pure(a.value.exp()),
        Fun::Ln => pure(a.value.ln()),
        Fun::Log10 => pure(a.value.log10()),
        Fun::Pow => (b?.dim == Dim::NONE).then_some(pure(a.value.powf(b?.value))).flatten(),
        Fun::Mpa => (a.dim == functions::MPA.dynamic().dim).then_some(Dyn::number(a.value)),
        Fun::Metres => (a.dim == functions::MM.dynamic().dim).then_some(Dyn::number(a.value / 1e3)),
        Fun::SquareMetres => {
            (a.dim == functions::MM.dynamic().dim.power(2)).then_some(Dyn::number(a.value / 1e6))
        }
    }
}
