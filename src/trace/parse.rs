//! Rust tokens of a formula, as text, to an [`Expr`]. The grammar is the part of Rust that formulas
//! use: numbers, names, calls, `+ - * /`, brackets, and one relation at the top.

use super::expr::{Expr, Fun, UNIT_CONSTS};

/// A relation between two formulas.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Op {
    /// `<=`
    Le,
    /// `<`
    Lt,
    /// `>=`
    Ge,
    /// `>`
    Gt,
}

impl Op {
    /// Whether the relation holds between two numbers.
    pub fn holds(self, a: f64, b: f64) -> bool {
        match self {
            Self::Le => a <= b,
            Self::Lt => a < b,
            Self::Ge => a >= b,
            Self::Gt => a > b,
        }
    }

    /// Its sign.
    pub const fn sign(self) -> &'static str {
        match self {
            Self::Le => "≤",
            Self::Lt => "<",
            Self::Ge => "≥",
            Self::Gt => ">",
        }
    }

    /// The sign that stands where the relation does not hold.
    pub const fn opposite(self) -> Self {
        match self {
            Self::Le => Self::Gt,
            Self::Lt => Self::Ge,
            Self::Ge => Self::Lt,
            Self::Gt => Self::Le,
        }
    }
}

/// Parses a formula; `None` where it is not one.
pub fn formula(text: &str) -> Option<Expr> {
    let mut p = Parser { rest: text.trim() };
    let e = p.sum()?;
    p.rest.is_empty().then_some(e)
}

/// Parses `a <= b` and its kin.
pub fn relation(text: &str) -> Option<(Expr, Op, Expr)> {
    for (sign, op) in [("<=", Op::Le), (">=", Op::Ge), ("<", Op::Lt), (">", Op::Gt)] {
        if let Some((a, b)) = text.split_once(sign) {
            return Some((formula(a)?, op, formula(b)?));
        }
    }
    None
}

struct Parser<'a> {
    rest: &'a str,
}

impl Parser<'_> {
    fn eat(&mut self, c: char) -> bool {
        match self.rest.strip_prefix(c) {
            Some(rest) => {
                self.rest = rest.trim_start();
                true
            }
            None => false,
        }
    }

    fn sum(&mut self) -> Option<Expr> {
        let mut left = self.product()?;
        loop {
            if self.eat('+') {
                left = Expr::Add(Box::new(left), Box::new(self.product()?));
            } else if self.eat('-') {
                left = Expr::Sub(Box::new(left), Box::new(self.product()?));
            } else {
                return Some(left);
            }
        }
    }

    fn product(&mut self) -> Option<Expr> {
        let mut left = self.unary()?;
        loop {
            if self.eat('*') {
                left = Expr::Mul(Box::new(left), Box::new(self.unary()?));
            } else if self.eat('/') {
                left = Expr::Div(Box::new(left), Box::new(self.unary()?));
            } else {
                return Some(left);
            }
        }
    }

    fn unary(&mut self) -> Option<Expr> {
        if self.eat('-') { Some(Expr::Neg(Box::new(self.unary()?))) } else { self.atom() }
    }

    fn atom(&mut self) -> Option<Expr> {
        if self.eat('(') {
            let inner = self.sum()?;
            return self.eat(')').then_some(inner);
        }
        let end = self
            .rest
            .find(|c: char| !(c.is_ascii_alphanumeric() || c == '_' || c == '.'))
            .unwrap_or(self.rest.len());
        let (word, rest) = self.rest.split_at(end);
        self.rest = rest.trim_start();
        if word.starts_with(|c: char| c.is_ascii_digit()) {
            return word.parse().ok().map(Expr::Number);
        }
        if self.rest.starts_with('(') {
            return self.call(word);
        }
        if let Some(unit) = UNIT_CONSTS.iter().find(|u| u.name == word) {
            return Some(Expr::Unit(unit));
        }
        (!word.is_empty()).then(|| Expr::Symbol(word.to_owned()))
    }

    fn call(&mut self, name: &str) -> Option<Expr> {
        let (fun, arity) = Fun::find(name)?;
        self.eat('(');
        let mut args = vec![self.sum()?];
        while self.eat(',') {
            args.push(self.sum()?);
        }
        (self.eat(')') && args.len() == arity).then_some(Expr::Call(fun, args))
    }
}
