//! A formula as mathematics: the tree that plain text, speech and the page are all written from.

use serde_json::{Value as Json, json};

use super::entry::{Relation, Step, Value};
use super::expr::{Expr, Fun};
use super::parse::Op;
use super::symbol;
use crate::quantity::print::{self, Shown};
use crate::quantity::{Dim, Dyn};

/// A node of set mathematics.
#[derive(Clone, Debug, PartialEq)]
pub enum Node {
    /// A symbol: base and subscript (empty for none).
    Sym(String, String),
    /// Digits.
    Num(String),
    /// Digits with a unit.
    Val(Shown),
    /// A unit standing alone as a factor.
    Unit(String),
    /// A product.
    Times(Vec<Node>),
    /// `a + b`
    Plus(Box<Node>, Box<Node>),
    /// `a − b`
    Minus(Box<Node>, Box<Node>),
    /// `−a`
    Neg(Box<Node>),
    /// A fraction.
    Frac(Box<Node>, Box<Node>),
    /// A power.
    Power(Box<Node>, Box<Node>),
    /// A square root.
    Sqrt(Box<Node>),
    /// A cube root.
    Cbrt(Box<Node>),
    /// A named function.
    Call(&'static str, Vec<Node>),
    /// `|a|`
    Abs(Box<Node>),
    /// `(a)`
    Paren(Box<Node>),
    /// A relation.
    Rel(Op, Box<Node>, Box<Node>),
}

/// Whether symbols are set as themselves or as their values.
#[derive(Clone, Copy)]
enum View<'a> {
    Symbols,
    Values(&'a [Value]),
}

/// The symbol named `name`.
pub fn symbol(name: &str) -> Node {
    let (base, subscript) = symbol::split(name);
    Node::Sym(base, subscript)
}

/// A step's formula in symbols.
pub fn formula(step: &Step) -> Node {
    node(&step.formula, View::Symbols)
}

/// A step's formula with the values put in; `None` where that would only repeat the result.
pub fn substitution(step: &Step) -> Option<Node> {
    match step.formula {
        Expr::Symbol(_) | Expr::Number(_) => None,
        _ => Some(node(&step.formula, View::Values(&step.symbols))),
    }
}

/// A relation in symbols, with the sign that was written.
pub fn relation(r: &Relation) -> Node {
    pair(r.op, node(&r.left, View::Symbols), node(&r.right, View::Symbols))
}

/// A relation in symbols, with the sign that is true.
pub fn relation_found(r: &Relation) -> Node {
    let op = if r.holds { r.op } else { r.op.opposite() };
    pair(op, node(&r.left, View::Symbols), node(&r.right, View::Symbols))
}

/// A relation in values, with the sign that is true.
pub fn relation_values(r: &Relation) -> Node {
    let op = if r.holds { r.op } else { r.op.opposite() };
    let side = |e: &Expr| match e {
        // A computed side is worth its number, not its working.
        Expr::Symbol(_) | Expr::Number(_) => node(e, View::Values(&r.symbols)),
        _ => e
            .eval(&|n| r.symbols.iter().find(|v| v.name == n).map(|v| v.value))
            .map_or_else(|| node(e, View::Values(&r.symbols)), |v| shown_node(print::show(letter(e), v))),
    };
    pair(op, side(&r.left), side(&r.right))
}

/// A relation of two symbols.
pub fn pair(op: Op, left: Node, right: Node) -> Node {
    Node::Rel(op, Box::new(left), Box::new(right))
}

/// The first symbol of a formula lends its letter to the unit of the whole.
fn letter(e: &Expr) -> &str {
    match e {
        Expr::Symbol(name) => name,
        Expr::Neg(a) | Expr::Add(a, _) | Expr::Sub(a, _) => letter(a),
        Expr::Mul(a, b) | Expr::Div(a, b) => {
            if matches!(**a, Expr::Number(_)) {
                letter(b)
            } else {
                letter(a)
            }
        }
        Expr::Call(_, args) => args.first().map_or("", letter),
        Expr::Number(_) | Expr::Unit(_) => "",
    }
}

fn shown_node(shown: Shown) -> Node {
    if shown.unit.is_empty() { Node::Num(shown.value) } else { Node::Val(shown) }
}

fn node(e: &Expr, view: View<'_>) -> Node {
    match e {
        Expr::Number(x) => Node::Num(print::literal(*x)),
        Expr::Symbol(name) => match view {
            View::Symbols => symbol(name),
            View::Values(values) => value(name, values, |v| v),
        },
        Expr::Unit(unit) => Node::Unit(unit.printed.to_owned()),
        Expr::Neg(a) => Node::Neg(Box::new(in_sum(node(a, view)))),
        Expr::Add(a, b) => Node::Plus(Box::new(node(a, view)), Box::new(signed(node(b, view)))),
        Expr::Sub(a, b) => Node::Minus(Box::new(node(a, view)), Box::new(signed(in_sum(node(b, view))))),
        Expr::Mul(a, b) => product(node(a, view), node(b, view), view),
        Expr::Div(a, b) => Node::Frac(Box::new(node(a, view)), Box::new(node(b, view))),
        Expr::Call(fun, args) => call(*fun, args, view),
    }
}

fn value(name: &str, values: &[Value], scale: impl Fn(Dyn) -> Dyn) -> Node {
    match values.iter().find(|v| v.name == name) {
        Some(v) => shown_node(print::show(name, scale(v.value))),
        None => symbol(name),
    }
}

/// Units vanish from a product of symbols and stand at the end of a product of values.
fn product(a: Node, b: Node, view: View<'_>) -> Node {
    let mut factors = match a {
        Node::Times(items) => items,
        other => vec![in_product(other)],
    };
    match b {
        Node::Unit(_) if matches!(view, View::Symbols) => {}
        other => factors.push(in_product(other)),
    }
    if factors.len() == 1 { factors.remove(0) } else { Node::Times(factors) }
}

fn call(fun: Fun, args: &[Expr], view: View<'_>) -> Node {
    let arg = |i: usize| node(&args[i], view);
    let two = || Node::Num("2".to_owned());
    let bare = |factor: f64| match (&args[0], view) {
        // An empirical formula takes the number alone.
        (Expr::Symbol(name), View::Values(values)) => values
            .iter()
            .find(|v| v.name == *name)
            .map_or_else(|| symbol(name), |v| Node::Num(print::significant(v.value.value * factor))),
        _ => arg(0),
    };
    match fun {
        Fun::Min | Fun::Max => {
            let name = fun.name();
            let mut flat = Vec::new();
            for a in args {
                match node(a, view) {
                    Node::Call(inner, items) if inner == name => flat.extend(items),
                    other => flat.push(other),
                }
            }
            Node::Call(name, flat)
        }
        Fun::Abs => Node::Abs(Box::new(arg(0))),
        Fun::Sq => Node::Power(Box::new(in_power(arg(0))), Box::new(two())),
        Fun::Cube => Node::Power(Box::new(in_power(arg(0))), Box::new(Node::Num("3".to_owned()))),
        Fun::Sqrt => Node::Sqrt(Box::new(arg(0))),
        Fun::Cbrt => Node::Cbrt(Box::new(arg(0))),
        Fun::Exp | Fun::Ln => Node::Call(fun.name(), vec![arg(0)]),
        Fun::Log10 => Node::Call("log", vec![arg(0)]),
        Fun::Pow => Node::Power(Box::new(in_power(arg(0))), Box::new(arg(1))),
        Fun::Mpa => bare(1.0),
        Fun::Metres => bare(1e-3),
        Fun::SquareMetres => bare(1e-6),
    }
}

fn paren(n: Node) -> Node {
    Node::Paren(Box::new(n))
}

fn in_sum(n: Node) -> Node {
    if matches!(n, Node::Plus(..) | Node::Minus(..)) { paren(n) } else { n }
}

fn in_product(n: Node) -> Node {
    match &n {
        Node::Plus(..) | Node::Minus(..) | Node::Neg(_) => paren(n),
        Node::Val(s) if s.value.starts_with('−') => paren(n),
        Node::Num(s) if s.starts_with('−') => paren(n),
        _ => n,
    }
}

fn signed(n: Node) -> Node {
    match &n {
        Node::Neg(_) => paren(n),
        Node::Val(s) if s.value.starts_with('−') => paren(n),
        Node::Num(s) if s.starts_with('−') => paren(n),
        _ => n,
    }
}

fn in_power(n: Node) -> Node {
    match &n {
        Node::Sym(..) | Node::Paren(_) | Node::Call(..) | Node::Abs(_) => n,
        Node::Num(s) if !s.starts_with('−') => n,
        _ => paren(n),
    }
}

impl Node {
    /// The tree as nested arrays, the first element naming the node.
    pub fn json(&self) -> Json {
        let many = |head: Vec<Json>, items: &[Self]| {
            Json::Array(head.into_iter().chain(items.iter().map(Self::json)).collect())
        };
        match self {
            Self::Sym(base, sub) => json!(["sym", base, sub]),
            Self::Num(digits) => json!(["num", digits]),
            Self::Val(s) => json!(["val", s.value, s.unit]),
            Self::Unit(u) => json!(["val", "", u]),
            Self::Times(items) => many(vec![json!("times")], items),
            Self::Plus(a, b) => json!(["plus", a.json(), b.json()]),
            Self::Minus(a, b) => json!(["minus", a.json(), b.json()]),
            Self::Neg(a) => json!(["neg", a.json()]),
            Self::Frac(a, b) => json!(["frac", a.json(), b.json()]),
            Self::Power(a, b) => json!(["power", a.json(), b.json()]),
            Self::Sqrt(a) => json!(["sqrt", a.json()]),
            Self::Cbrt(a) => json!(["cbrt", a.json()]),
            Self::Call(name, items) => {
                json!(["call", name, items.iter().map(Self::json).collect::<Vec<_>>()])
            }
            Self::Abs(a) => json!(["abs", a.json()]),
            Self::Paren(a) => json!(["paren", a.json()]),
            Self::Rel(op, a, b) => {
                let name = match op {
                    Op::Le => "le",
                    Op::Lt => "lt",
                    Op::Ge => "ge",
                    Op::Gt => "gt",
                };
                json!([name, a.json(), b.json()])
            }
        }
    }
}

/// Whether a dimension is that of a bare number.
pub fn is_number(dim: Dim) -> bool {
    dim == Dim::NONE
}
