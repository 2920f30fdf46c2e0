//! The sheet: records, or stays silent.

use std::collections::HashMap;

use super::entry::{Entry, Outside, Relation, Step, Table, Unshown, Value, Verdict};
use super::expr::UNIT_CONSTS;
use super::parse;
use crate::quantity::{Dyn, Q};

/// A value that a sheet can note: a quantity or a bare number.
pub trait Traced {
    /// The value with its dimension as data.
    fn traced(&self) -> Dyn;
}

impl<const F: i8, const L: i8, const T: i8> Traced for Q<F, L, T> {
    fn traced(&self) -> Dyn {
        self.dynamic()
    }
}

impl Traced for f64 {
    fn traced(&self) -> Dyn {
        Dyn::number(*self)
    }
}

/// A broken lock: the sheet would have printed something that it did not compute.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Fault {
    /// The step, as `f_vk = …`.
    pub step: String,
    /// What is wrong.
    pub what: String,
}

/// What stands on a sheet, and how it was last printed.
pub(super) type Memory = (HashMap<String, Dyn>, HashMap<String, String>);

/// A sheet. `id` names it (`"R1"`), for anchors and cross-references.
#[derive(Clone, Debug, Default)]
pub struct Sheet {
    recording: bool,
    /// Entries in order; empty on a silent sheet.
    pub entries: Vec<Entry>,
    /// Verdicts, kept on every sheet.
    pub verdicts: Vec<Verdict>,
    /// Checks that left their range, kept on every sheet.
    pub outside: Vec<Outside>,
    /// What no verdict shows, kept on every sheet.
    pub unshown: Vec<Unshown>,
    /// Broken locks.
    pub faults: Vec<Fault>,
    /// The case printed with each verdict until it changes.
    pub case: String,
    /// What the verdicts are of, where a sheet has several of a kind: `outer leaf`.
    pub of: String,
    scope: HashMap<String, Dyn>,
    /// How each standing symbol was last printed, so that nothing is printed twice.
    printed: HashMap<String, String>,
}

impl Sheet {
    /// A sheet that records.
    pub fn recorder() -> Self {
        Self { recording: true, ..Self::default() }
    }

    /// A sheet that keeps only verdicts.
    pub fn silent() -> Self {
        Self::default()
    }

    /// Whether entries are kept.
    pub const fn recording(&self) -> bool {
        self.recording
    }

    /// What stands under `name`.
    pub fn standing(&self, name: &str) -> Option<Dyn> {
        self.scope.get(name).copied()
    }

    /// The largest ratio, and whether everything holds.
    pub fn holds(&self) -> bool {
        self.outside.is_empty() && self.verdicts.iter().all(|v| v.holds)
    }

    /// A heading of level 1 or 2.
    pub fn heading(&mut self, level: u8, text: impl Into<String>) {
        self.push(|| Entry::Heading(level, text.into()));
    }

    /// A remark, once.
    pub fn note(&mut self, text: impl Into<String>) {
        if self.recording {
            let entry = Entry::Note(text.into());
            if !self.entries.contains(&entry) {
                self.entries.push(entry);
            }
        }
    }

    /// A table, made only when recording.
    pub fn table(&mut self, table: impl FnOnce() -> Table) {
        self.push(|| Entry::Table(table()));
    }

    /// A place for drawings side by side.
    pub fn drawings(&mut self, names: &[&str]) {
        self.push(|| Entry::Drawings(names.iter().map(|&n| n.to_owned()).collect()));
    }

    /// A rule printed as information.
    pub fn rule(&mut self, id: &str, clause: &str, words: &str, finding: String, met: bool) {
        self.push(|| Entry::Rule {
            id: id.to_owned(),
            words: words.to_owned(),
            clause: clause.to_owned(),
            finding,
            met,
        });
    }

    /// Notes a check that left its range.
    pub fn leave(&mut self, mut outside: Outside) {
        outside.id = self.unique(&outside.id);
        self.push(|| Entry::Outside(outside.clone()));
        self.outside.push(outside);
    }

    /// Whether anything on it is a result.
    pub fn judges(&self) -> bool {
        !self.verdicts.is_empty() || !self.outside.is_empty() || !self.unshown.is_empty()
    }

    /// Notes what no verdict shows.
    pub fn unshown(&mut self, unshown: Unshown) {
        self.push(|| Entry::Unshown(unshown.clone()));
        self.unshown.push(unshown);
    }

    /// Records an input, unless it stands already with this value; see [`given!`](crate::given).
    pub fn given(&mut self, name: &str, words: &str, source: &str, value: Dyn) {
        if self.scope.get(name).is_some_and(|there| there.same(value)) {
            return;
        }
        let value = self.stand(name, value);
        self.entries.push(Entry::Given { value, words: words.to_owned(), source: source.to_owned() });
    }

    /// Records a table value; see [`lookup!`](crate::lookup).
    pub fn lookup(
        &mut self,
        name: &str,
        words: &str,
        clause: &str,
        value: Dyn,
        rows: Vec<(String, String)>,
        source: String,
    ) {
        let value = self.stand(name, value);
        let (words, clause) = (words.to_owned(), clause.to_owned());
        self.entries.push(Entry::Lookup { value, words, clause, rows, source });
    }

    /// Records the result of a search; see [`found!`](crate::found).
    pub fn found(&mut self, name: &str, words: &str, clause: &str, value: Dyn) {
        let value = self.stand(name, value);
        self.entries.push(Entry::Found { value, words: words.to_owned(), clause: clause.to_owned() });
    }

    /// Records a step and tries its locks; see [`calc!`](crate::calc).
    pub fn step(
        &mut self,
        name: &str,
        words: &str,
        clause: &str,
        tokens: &str,
        value: Dyn,
        symbols: &[(&str, Dyn)],
    ) {
        let printed = format!("{name} = {tokens}");
        let Some(formula) = parse::formula(tokens) else {
            return self.fault(printed, "the formula cannot be read".to_owned());
        };
        self.check_standing(&printed, symbols);
        match formula.eval(&|n| self.standing(n)) {
            Some(again) if again.same(value) => {}
            Some(again) => {
                self.fault(printed, format!("printed formula gives {again:?}, computed was {value:?}"));
            }
            None => self.fault(printed, "the printed formula cannot be evaluated".to_owned()),
        }
        // The same formula with the same symbols as the last time stands above.
        if self.scope.get(name).is_some_and(|there| there.same(value))
            && self.printed.get(name).is_some_and(|last| *last == signature(tokens, symbols))
        {
            return;
        }
        let result = self.stand(name, value);
        self.printed.insert(name.to_owned(), signature(tokens, symbols));
        self.entries.push(Entry::Step(Step {
            words: words.to_owned(),
            clause: clause.to_owned(),
            result,
            formula,
            symbols: values(symbols),
        }));
    }

    /// Records a branch; see [`decide!`](crate::decide).
    pub fn decide(&mut self, words: &str, clause: &str, tokens: &str, holds: bool, symbols: &[(&str, Dyn)]) {
        if self.said(tokens, symbols) {
            return;
        }
        if let Some(relation) = self.relation(tokens, holds, symbols) {
            self.entries.push(Entry::Decide { relation, words: words.to_owned(), clause: clause.to_owned() });
        }
    }

    /// Records a limit of application; see [`require!`](crate::require).
    pub fn require(&mut self, words: &str, clause: &str, tokens: &str, holds: bool, symbols: &[(&str, Dyn)]) {
        if let Some(relation) = self.relation(tokens, holds, symbols) {
            self.entries.push(Entry::Require {
                relation,
                words: words.to_owned(),
                clause: clause.to_owned(),
            });
        }
    }

    /// Notes a verdict, on silent sheets too; see [`verify!`](crate::verify). Yields the ratio.
    pub fn verify(
        &mut self,
        id: &str,
        words: &str,
        clause: &str,
        demand: (&str, Dyn),
        resistance: (&str, Dyn),
        holds: bool,
    ) -> f64 {
        let ratio = use_ratio(demand.1.value, resistance.1.value, holds);
        if self.recording {
            let printed = format!("{} <= {}", demand.0, resistance.0);
            self.check_standing(&printed, &[demand, resistance]);
            if demand.1.dim != resistance.1.dim {
                self.fault(printed, "demand and resistance differ in dimension".to_owned());
            }
        }
        let verdict = Verdict {
            id: self.unique(id),
            words: if self.of.is_empty() { words.to_owned() } else { format!("{words}, {}", self.of) },
            clause: clause.to_owned(),
            demand: Value { name: demand.0.to_owned(), value: demand.1 },
            resistance: Value { name: resistance.0.to_owned(), value: resistance.1 },
            ratio,
            holds,
            case: self.case.clone(),
        };
        self.push(|| Entry::Verify(verdict.clone()));
        self.verdicts.push(verdict);
        ratio
    }

    /// An id that nothing on this sheet has yet.
    fn unique(&self, id: &str) -> String {
        let taken =
            |id: &str| self.verdicts.iter().any(|v| v.id == id) || self.outside.iter().any(|o| o.id == id);
        if !taken(id) {
            return id.to_owned();
        }
        (2..).map(|n| format!("{id}-{n}")).find(|id| !taken(id)).unwrap_or_default()
    }

    /// Notes a broken lock.
    pub fn fault(&mut self, step: String, what: String) {
        self.faults.push(Fault { step, what });
    }

    /// Whether this relation with these values was printed last time it came up.
    fn said(&mut self, tokens: &str, symbols: &[(&str, Dyn)]) -> bool {
        let now = signature(tokens, symbols);
        let key = format!("?{tokens}");
        if self.printed.get(&key).is_some_and(|last| *last == now) {
            return true;
        }
        self.printed.insert(key, now);
        false
    }

    /// What stands and how it was printed; see [`Sheet::columns`].
    pub(super) fn memory(&self) -> Memory {
        (self.scope.clone(), self.printed.clone())
    }

    /// Lets the same stand again.
    pub(super) fn remember(&mut self, (scope, printed): Memory) {
        (self.scope, self.printed) = (scope, printed);
    }

    fn push(&mut self, entry: impl FnOnce() -> Entry) {
        if self.recording {
            self.entries.push(entry());
        }
    }

    fn stand(&mut self, name: &str, value: Dyn) -> Value {
        self.scope.insert(name.to_owned(), value);
        self.printed.remove(name);
        Value { name: name.to_owned(), value }
    }

    fn check_standing(&mut self, printed: &str, symbols: &[(&str, Dyn)]) {
        for (name, value) in symbols {
            if UNIT_CONSTS.iter().any(|u| u.name == *name) {
                continue;
            }
            match self.standing(name) {
                None => self.fault(printed.to_owned(), format!("{name} does not stand on this sheet")),
                Some(there) if !there.same(*value) => self.fault(
                    printed.to_owned(),
                    format!("{name} stands as {there:?} but was used as {value:?}"),
                ),
                Some(_) => {}
            }
        }
    }

    fn relation(&mut self, tokens: &str, holds: bool, symbols: &[(&str, Dyn)]) -> Option<Relation> {
        let Some((left, op, right)) = parse::relation(tokens) else {
            self.fault(tokens.to_owned(), "the relation cannot be read".to_owned());
            return None;
        };
        self.check_standing(tokens, symbols);
        let sides = left.eval(&|n| self.standing(n)).zip(right.eval(&|n| self.standing(n)));
        let again = sides.filter(|(a, b)| a.dim == b.dim).map(|(a, b)| op.holds(a.value, b.value));
        if again != Some(holds) {
            self.fault(tokens.to_owned(), format!("printed relation gives {again:?}, decided was {holds}"));
        }
        Some(Relation { left, op, right, symbols: values(symbols), holds })
    }
}

/// Demand over resistance. Where nothing resists it is infinite; where the comparison and the
/// rounded quotient disagree, the comparison rules.
fn use_ratio(demand: f64, resistance: f64, holds: bool) -> f64 {
    let ratio = if resistance > 0.0 {
        demand / resistance
    } else if holds {
        1.0
    } else {
        f64::INFINITY
    };
    if !holds && ratio <= 1.0 { 1.0_f64.next_up() } else { ratio }
}

/// A formula with the values it was worked with.
fn signature(tokens: &str, symbols: &[(&str, Dyn)]) -> String {
    let values: Vec<String> = symbols.iter().map(|(n, v)| format!("{n}={:x}", v.value.to_bits())).collect();
    format!("{tokens}|{}", values.join(","))
}

fn values(symbols: &[(&str, Dyn)]) -> Vec<Value> {
    let mut out: Vec<Value> = Vec::new();
    for &(name, value) in symbols {
        if !out.iter().any(|v| v.name == name) {
            out.push(Value { name: name.to_owned(), value });
        }
    }
    out
}
