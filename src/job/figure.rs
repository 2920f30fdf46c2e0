//! Figures of an entry: quantities with their unit, bare numbers, and factors with a usual value.

use toml::de::DeValue;

use super::entry::{Entry, quoted, short};
use super::limits::Limits;
use crate::building::Cause;
use crate::error::Kind;
use crate::quantity::unit::Misread;
use crate::quantity::{Dim, Q, unit};

impl Entry<'_> {
    /// A quantity with its unit, within `limits`.
    pub fn quantity<const F: i8, const L: i8, const T: i8>(&self, limits: &Limits) -> Option<Q<F, L, T>> {
        let dim = Dim { force: F, length: L, time: T };
        let wanted = format!("{} with its unit, {}", limits.called(), limits.words());
        let DeValue::String(text) = self.present(&wanted)? else {
            self.no_unit(dim, &wanted, limits);
            return None;
        };
        let bare = dim == Dim::NONE && !text.trim_end().ends_with('%');
        match unit::read(text, dim).and_then(|v| if bare { Err(Misread::NoUnit) } else { Ok(v) }) {
            Ok(value) => self.within(value.value, text.trim(), limits).then(|| Q::new(value.value)),
            Err(misread) => {
                self.misread(text, dim, misread, &wanted, limits);
                None
            }
        }
    }

    /// A bare number within `limits`.
    pub fn number(&self, limits: &Limits) -> Option<f64> {
        let wanted = format!("a number, {}", limits.words());
        self.present(&wanted)?;
        let Some(value) = self.bare() else {
            self.wrong_type(&wanted, "write a number without quotes");
            return None;
        };
        self.within(value, &self.shown(), limits).then_some(value)
    }

    /// Two quantities: `["0 m", "6.4 m"]`.
    pub fn pair<const F: i8, const L: i8, const T: i8>(
        &self,
        limits: &Limits,
    ) -> Option<(Q<F, L, T>, Q<F, L, T>)> {
        let wanted = format!("two quantities in square brackets, each {}", limits.words());
        let items = self.list(&wanted)?;
        let [a, b] = items.as_slice() else {
            self.fault(Kind::WrongType, format_args!("`{}` has {} items", self.key, items.len()))
                .at(self.place(), "two belong here")
                .allowed(&wanted)
                .help(format!("write {} = [\"0 {unit}\", \"6.4 {unit}\"]", self.key, unit = limits.unit));
            return None;
        };
        let (a, b) = (a.quantity(limits), b.quantity(limits));
        Some((a?, b?))
    }

    /// A factor with a usual value: the usual one may stand bare or be left out, any other needs a reason.
    pub fn factor(&self, usual: f64, limits: &Limits) -> Option<Cause<f64>> {
        let usually = || Some(Cause { value: usual, reason: String::new() });
        let Some((value, _)) = &self.value else { return usually() };
        let bare = self.bare();
        if bare == Some(usual) {
            return usually();
        }
        if bare.is_none() && !matches!(value, DeValue::Table(_)) {
            let wanted = format!("{usual}, or {{ value = ..., reason = \"...\" }} with {}", limits.words());
            self.wrong_type(&wanted, "write a number without quotes");
            return None;
        }
        self.cause(|e| e.number(limits))
    }

    fn within(&self, base: f64, typed: &str, limits: &Limits) -> bool {
        if !limits.allow(base) {
            self.fault(Kind::NotAllowed, format_args!("`{}` is {}", self.key, short(typed)))
                .at(self.place(), "outside the limits")
                .allowed(limits.words())
                .help("check the figure and its unit; a true value outside these limits is beyond what the tool judges");
            return false;
        }
        if let Some(why) = limits.oddity(base) {
            let what = self.key.replace('_', " ");
            self.reader.warn(format!("{}: {what} is {typed}, {why}", self.whose));
        }
        true
    }

    fn no_unit(&self, dim: Dim, wanted: &str, limits: &Limits) {
        let Some(number) = self.bare() else {
            let help = format!("write it in double quotes with its unit, {}", limits.units(dim));
            self.wrong_type(wanted, &help);
            return;
        };
        let unit = limits.meant(dim, number, "").unwrap_or(limits.unit);
        let example = format!("{} = \"{} {unit}\"", self.key, self.source());
        self.fault(Kind::Unit, format_args!("`{}` is {} without a unit", self.key, self.shown()))
            .at(self.place(), "no unit")
            .allowed(format!("{wanted}; units: {}", limits.units(dim)))
            .help(format!("write the unit and the quotes, for example {example}"));
    }

    fn misread(&self, text: &str, dim: Dim, misread: Misread, wanted: &str, limits: &Limits) {
        let units = limits.units(dim);
        let (found, label, help) = match misread {
            Misread::NoNumber => (
                "has no number in front".to_owned(),
                "no number",
                format!("write a number and a unit, {units}"),
            ),
            Misread::NoUnit => {
                let number = text.trim().parse().unwrap_or(f64::NAN);
                let unit = limits.meant(dim, number, "").unwrap_or(limits.unit);
                let help = format!("write the unit, for example \"{} {unit}\"", short(text.trim()));
                ("has no unit".to_owned(), "no unit", help)
            }
            Misread::UnknownUnit { found, nearest } => {
                let number = text.trim().strip_suffix(&found).and_then(|n| n.trim().parse().ok());
                let meant = limits.meant(dim, number.unwrap_or(f64::NAN), &found).or(nearest);
                let help = match meant {
                    _ if found.starts_with(',') => "write a point in place of the comma".to_owned(),
                    Some(near) => format!("write the unit as {near}"),
                    None => format!("write one of the units {units}"),
                };
                (format!("has the unknown unit {}", quoted(&found)), "unknown unit", help)
            }
            Misread::WrongDimension { found } => (
                format!("has the unit {found}, which is not that of {}", limits.called()),
                "unit of another kind",
                format!("write one of the units {units}"),
            ),
        };
        self.fault(Kind::Unit, format_args!("`{}`, {}, {found}", self.key, quoted(text)))
            .at(self.place(), label)
            .allowed(format!("{wanted}; units: {units}"))
            .help(help);
    }

    /// The value where it is a bare number.
    fn bare(&self) -> Option<f64> {
        match self.value.as_ref().map(|(v, _)| *v)? {
            DeValue::Integer(i) => {
                i64::from_str_radix(i.as_str(), i.radix()).ok().map(|x| x as f64).or(Some(f64::NAN))
            }
            DeValue::Float(x) => x.as_str().parse::<f64>().ok().or(Some(f64::NAN)),
            _ => None,
        }
    }
}
