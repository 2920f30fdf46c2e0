//! A formula in words, for readers that speak: the alternative text of every equation.

use super::math::{self, Node};
use super::parse::Op;
use super::{Step, text};
use crate::quantity::print;

/// A step as one sentence.
pub fn step(step: &Step) -> String {
    let mut out =
        format!("{} equals {}", speak(&math::symbol(&step.result.name)), speak(&math::formula(step)));
    if let Some(values) = math::substitution(step) {
        out.push_str(&format!(", that is {}", speak(&values)));
    }
    let result = print::show(&step.result.name, step.result.value);
    out.push_str(&format!(", equals {}", unit_words(&result.to_string())));
    out
}

/// A node in words.
pub fn speak(n: &Node) -> String {
    match n {
        Node::Sym(base, sub) if sub.is_empty() => base.clone(),
        Node::Sym(base, sub) => format!("{base} sub {}", sub.replace(',', " ")),
        Node::Num(digits) => digits.replace('−', "minus "),
        Node::Val(s) => unit_words(&s.to_string()),
        Node::Unit(u) => unit_words(u),
        Node::Times(items) => items.iter().map(speak).collect::<Vec<_>>().join(" times "),
        Node::Plus(a, b) => format!("{} plus {}", speak(a), speak(b)),
        Node::Minus(a, b) => format!("{} minus {}", speak(a), speak(b)),
        Node::Neg(a) => format!("minus {}", speak(a)),
        Node::Frac(a, b) => format!("{} over {}", speak(a), speak(b)),
        Node::Power(a, b) => match b.as_ref() {
            Node::Num(d) if d == "2" => format!("{} squared", speak(a)),
            Node::Num(d) if d == "3" => format!("{} cubed", speak(a)),
            _ => format!("{} to the power {}", speak(a), speak(b)),
        },
        Node::Sqrt(a) => format!("the square root of {}", speak(a)),
        Node::Cbrt(a) => format!("the cube root of {}", speak(a)),
        Node::Call("min", items) => format!("the least of {}", list(items)),
        Node::Call("max", items) => format!("the greatest of {}", list(items)),
        Node::Call(name, items) => format!("{name} of {}", list(items)),
        Node::Abs(a) => format!("the size of {}", speak(a)),
        Node::Paren(a) => format!("open bracket {} close bracket", speak(a)),
        Node::Rel(op, a, b) => {
            let words = match op {
                Op::Le => "is at most",
                Op::Lt => "is less than",
                Op::Ge => "is at least",
                Op::Gt => "is more than",
            };
            format!("{} {words} {}", speak(a), speak(b))
        }
    }
}

fn list(items: &[Node]) -> String {
    items.iter().map(speak).collect::<Vec<_>>().join(", and ")
}

fn unit_words(text: &str) -> String {
    let text = text.replace('−', "minus ");
    [
        ("× 10³ ", "thousand "),
        ("× 10⁶ ", "million "),
        ("kNm/m", "kilonewton metres per metre"),
        ("kNm", "kilonewton metres"),
        ("kN/m²", "kilonewtons per square metre"),
        ("kN/m³", "kilonewtons per cubic metre"),
        ("kN/m", "kilonewtons per metre"),
        ("N/mm²", "newtons per square millimetre"),
        ("N/mm", "newtons per millimetre"),
        ("kN", "kilonewtons"),
        ("mm⁴", "millimetres to the fourth"),
        ("mm³", "cubic millimetres"),
        ("mm²", "square millimetres"),
        ("mm", "millimetres"),
    ]
    .iter()
    .fold(text, |t, (unit, words)| t.replace(unit, words))
}

/// A relation as one sentence.
pub fn relation(symbols: &Node, values: &Node) -> String {
    format!("{}: {}", speak(symbols), speak(values))
}

/// The plain text of a node, for captions.
pub fn plain(n: &Node) -> String {
    text::node(n)
}
