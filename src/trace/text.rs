//! The sheet as plain text: the first renderer, for the terminal, snapshots and reviewable diffs.

use super::entry::{Entry, Relation, Table, Value};
use super::math::{self, Node};
use super::parse::Op;
use super::{Columns, Row, Sheet, Step, Verdict, symbol};
use crate::quantity::print;

/// Width of the working, before the clause.
const WIDTH: usize = 96;

/// The whole sheet.
pub fn sheet(sheet: &Sheet) -> String {
    let mut out = String::new();
    for entry in &sheet.entries {
        out.push_str(&self::entry(entry));
    }
    out
}

/// One entry, with its line ends.
pub fn entry(entry: &Entry) -> String {
    match entry {
        Entry::Heading(1, text) => format!("\n{text}\n{}\n", "=".repeat(text.chars().count())),
        Entry::Heading(_, text) => format!("\n{text}\n{}\n", "-".repeat(text.chars().count())),
        Entry::Given { value, words, source } => line(&format!("{}   {words}", shown(value)), source),
        Entry::Lookup { value, words, clause, rows, source } => {
            let entered: Vec<String> = rows.iter().map(|(k, v)| format!("{k}: {v}")).collect();
            let mut out = line(&format!("{}   {words}", shown(value)), clause);
            out.push_str(&format!("      {}  [{source}]\n", entered.join("; ")));
            out
        }
        Entry::Found { value, words, clause } => line(&format!("{}   {words}", shown(value)), clause),
        Entry::Step(s) => line(&step(s), &s.clause),
        Entry::Decide { relation, words, clause } | Entry::Require { relation, words, clause } => {
            let (symbols, values) = (relation_of(entry, relation), math::relation_values(relation));
            line(&format!("{}: {}; {words}", node(&symbols), node(&values)), clause)
        }
        Entry::Verify(v) => line(&verdict(v), &v.clause),
        Entry::Outside(o) => line(&format!("OUTSIDE THE METHOD {}: {}", o.id, o.words), &o.clause),
        Entry::Unshown(u) => {
            let what = u.hold.as_ref().map_or("NOT ADEQUATE".to_owned(), |h| format!("hold point {h}"));
            line(&format!("NOT SHOWN {}: {}: {what}", u.words, u.finding), &u.clause)
        }
        Entry::Rule { words, clause, finding, met, .. } => {
            line(&format!("rule, {words}: {finding}: {}", if *met { "met" } else { "not met" }), clause)
        }
        Entry::Note(text) => format!("  Note: {text}\n"),
        Entry::Table(t) => table(t),
        Entry::Columns(c) => columns(c),
        Entry::Drawings(names) => format!("  [drawing {}]\n", names.join(", ")),
    }
}

/// Columns: each row with the numbers of the first column that has it, then the results of all.
fn columns(c: &Columns) -> String {
    let mut out = format!("  Columns: {}\n", c.heads.join(" | "));
    for row in &c.rows {
        out.push_str(&self::row(c, row));
    }
    out.push_str("  End of columns\n");
    out
}

fn row(c: &Columns, row: &Row) -> String {
    let Some((_, lead)) = row.lead() else { return String::new() };
    let show = |v: &Value| print::show(&v.name, v.value).to_string();
    let cells = |of: &dyn Fn(&Entry) -> Option<String>| {
        let cell = |e: &Option<Entry>| e.as_ref().and_then(of).unwrap_or_else(|| "–".to_owned());
        row.cells.iter().map(cell).collect::<Vec<_>>().join(" | ")
    };
    let values = || cells(&|e| e.value().map(show));
    match lead {
        Entry::Given { value, words, .. } | Entry::Found { value, words, .. } => {
            line(&format!("{} = {}   {words}", node(&math::symbol(&value.name)), values()), &row.sources())
        }
        Entry::Lookup { value, words, .. } => {
            let mut out = line(
                &format!("{} = {}   {words}", node(&math::symbol(&value.name)), values()),
                &row.sources(),
            );
            for (i, entered) in row.entered().into_iter().enumerate().filter(|(_, e)| !e.is_empty()) {
                out.push_str(&format!("      {}: {entered}\n", c.heads[i]));
            }
            out
        }
        Entry::Step(s) => {
            let whole = step(s);
            let (before, _) = whole.rsplit_once(" = ").unwrap_or((&whole, ""));
            line(&format!("{before} = {}", values()), &row.sources())
        }
        Entry::Decide { relation, .. } | Entry::Require { relation, .. } => {
            let (symbols, numbers) = (relation_of(lead, relation), math::relation_values(relation));
            let says = cells(&|e| e.relation().map(|r| row.way(e, r).to_owned()));
            let left = format!("{}: {}: {says}; {}", node(&symbols), node(&numbers), row.words());
            line(&left, &row.sources())
        }
        Entry::Verify(_) => {
            let of = |(i, e): (usize, &Option<Entry>)| match e {
                Some(Entry::Verify(v)) => Some(line(&format!("{}: {}", c.heads[i], verdict(v)), &v.clause)),
                _ => None,
            };
            row.cells.iter().enumerate().filter_map(of).collect()
        }
        other => entry(other),
    }
}

/// A branch as it was found to be, whose words are those of the way it went; a limit as it is written.
fn relation_of(entry: &Entry, relation: &Relation) -> Node {
    match entry {
        Entry::Decide { .. } => math::relation_found(relation),
        _ => math::relation(relation),
    }
}

/// `V_Rd = f_vd t l_c = 0.181 N/mm² × 100 mm × 640 mm = 11.6 kN`.
pub fn step(s: &Step) -> String {
    let mut out = String::new();
    if !s.words.is_empty() {
        out.push_str(&format!("{}: ", s.words));
    }
    out.push_str(&format!("{} = {}", node(&math::symbol(&s.result.name)), node(&math::formula(s))));
    if let Some(values) = math::substitution(s) {
        out.push_str(&format!(" = {}", node(&values)));
    }
    out.push_str(&format!(" = {}", print::show(&s.result.name, s.result.value)));
    out
}

fn verdict(v: &Verdict) -> String {
    let sign = if v.holds { "≤" } else { ">" };
    let case = if v.case.is_empty() { String::new() } else { format!(" [{}]", v.case) };
    format!(
        "CHECK {}: {} {sign} {}: use {}: {}{case}",
        v.words,
        shown(&v.demand),
        shown(&v.resistance),
        print::ratio(v.ratio),
        if v.holds { "adequate" } else { "NOT ADEQUATE" },
    )
}

fn shown(v: &Value) -> String {
    format!("{} = {}", node(&math::symbol(&v.name)), print::show(&v.name, v.value))
}

fn line(left: &str, right: &str) -> String {
    let width = left.chars().count() + 2;
    if right.is_empty() {
        return format!("  {left}\n");
    }
    let gap = WIDTH.saturating_sub(width).max(2);
    format!("  {left}{}[{right}]\n", " ".repeat(gap))
}

fn table(t: &Table) -> String {
    let heads: Vec<String> = t.columns.iter().map(|c| c.head.clone()).collect();
    let all: Vec<&Vec<String>> = std::iter::once(&heads).chain(&t.rows).collect();
    let width = |i: usize| all.iter().filter_map(|r| r.get(i)).map(|c| c.chars().count()).max().unwrap_or(0);
    let mut out = format!("  {}\n", t.caption);
    for (n, row) in all.iter().enumerate() {
        let strong = n > 0 && t.strong.contains(&(n - 1));
        let cells: Vec<String> = row
            .iter()
            .enumerate()
            .map(|(i, c)| {
                let pad = " ".repeat(width(i).saturating_sub(c.chars().count()));
                if t.columns.get(i).is_some_and(|c| c.numeric) {
                    format!("{pad}{c}")
                } else {
                    format!("{c}{pad}")
                }
            })
            .collect();
        let mark = if strong { "*" } else { " " };
        out.push_str(format!("   {mark}{}", cells.join("  ")).trim_end());
        out.push('\n');
    }
    out
}

/// A node in plain text.
pub fn node(n: &Node) -> String {
    match n {
        Node::Sym(base, sub) if sub.is_empty() => symbol::letter(base).to_owned(),
        Node::Sym(base, sub) => format!("{}_{sub}", symbol::letter(base)),
        Node::Num(digits) => digits.clone(),
        Node::Val(s) => s.to_string(),
        Node::Unit(u) => u.clone(),
        Node::Times(items) => product(items),
        Node::Plus(a, b) => format!("{} + {}", node(a), node(b)),
        Node::Minus(a, b) => format!("{} − {}", node(a), node(b)),
        Node::Neg(a) => format!("−{}", node(a)),
        Node::Frac(a, b) => format!("{} / {}", node_over(a), node_under(b)),
        Node::Power(a, b) => format!("{}^{}", node(a), node_under(b)),
        Node::Sqrt(a) => format!("√({})", node(a)),
        Node::Cbrt(a) => format!("∛({})", node(a)),
        Node::Call(name, items) => {
            format!("{name}({})", items.iter().map(node).collect::<Vec<_>>().join("; "))
        }
        Node::Abs(a) => format!("|{}|", node(a)),
        Node::Paren(a) => format!("({})", node(a)),
        Node::Rel(op, a, b) => format!("{} {} {}", node(a), Op::sign(*op), node(b)),
    }
}

/// A product. Symbols stand side by side; between two figures, and throughout a product of values, a sign
/// stands.
fn product(items: &[Node]) -> String {
    let values = items.iter().any(|i| matches!(i, Node::Val(_)));
    let mut out = String::new();
    for (i, item) in items.iter().enumerate() {
        if i > 0 {
            out.push_str(if values || starts_with_figure(item) { " × " } else { " " });
        }
        out.push_str(&node_factor(item));
    }
    out
}

fn starts_with_figure(n: &Node) -> bool {
    match n {
        Node::Num(_) | Node::Val(_) => true,
        Node::Power(base, _) => starts_with_figure(base),
        _ => false,
    }
}

fn node_factor(n: &Node) -> String {
    // A fraction inside a product reads wrongly without brackets only where something follows it.
    match n {
        Node::Frac(..) => format!("({})", node(n)),
        _ => node(n),
    }
}

fn node_over(n: &Node) -> String {
    match n {
        Node::Plus(..) | Node::Minus(..) => format!("({})", node(n)),
        _ => node(n),
    }
}

fn node_under(n: &Node) -> String {
    match n {
        Node::Sym(..) | Node::Num(_) | Node::Val(_) | Node::Paren(_) | Node::Call(..) | Node::Sqrt(_) => {
            node(n)
        }
        _ => format!("({})", node(n)),
    }
}
