//! The forms that an entry can have, as the reader reads them: each is one small piece of the schema.
//!
//! What the words say of a value ends with what is allowed and an example, both from the same place
//! as the rule itself.

use serde_json::{Map, Value, json};

use super::super::entry::{LINE, PROSE};
use super::super::limits::{Limits, one_of};
use crate::quantity::Q;
use crate::quantity::unit::{self, UNITS};

/// A table whose entries are all known.
pub struct Form {
    properties: Map<String, Value>,
    required: Vec<&'static str>,
    what: String,
}

impl Form {
    /// A table that is described as `what`.
    pub fn new(what: &str) -> Self {
        Self { properties: Map::new(), required: Vec::new(), what: what.to_owned() }
    }

    /// An entry that must be there, whatever else stands in the file.
    pub fn need(mut self, key: &'static str, value: Value) -> Self {
        self.required.push(key);
        self.may(key, value)
    }

    /// An entry that may be left out, always or where something else stands in the file.
    pub fn may(mut self, key: &'static str, value: Value) -> Self {
        self.properties.insert(key.to_owned(), value);
        self
    }

    /// The schema of the table.
    pub fn done(self) -> Value {
        json!({
            "description": self.what,
            "type": "object",
            "properties": self.properties,
            "required": self.required,
            "additionalProperties": false,
        })
    }
}

/// A quantity with its unit.
pub fn quantity(limits: &Limits, what: &str, example: &str) -> Value {
    json!({
        "description": format!("{what} {}; for example \"{example}\".", limits.words()),
        "type": "string",
        "pattern": pattern(limits),
        "examples": [example],
    })
}

/// Two quantities in a list.
pub fn pair(limits: &Limits, what: &str, example: [&str; 2]) -> Value {
    let [a, b] = example;
    json!({
        "description": format!("{what} Each {}; for example [\"{a}\", \"{b}\"].", limits.words()),
        "type": "array",
        "items": quantity(limits, "One of the two.", a),
        "minItems": 2,
        "maxItems": 2,
        "examples": [example],
    })
}

/// A number and every unit that the reader takes for the dimension of these limits, typed or printed.
fn pattern(limits: &Limits) -> String {
    let units: Vec<&str> = unit::find(limits.unit).map_or_else(Vec::new, |own| {
        let same = UNITS.iter().filter(|u| u.dim == own.dim);
        let mut names: Vec<&str> = same.flat_map(|u| [u.typed, u.printed]).collect();
        names.sort_unstable();
        names.dedup();
        names
    });
    format!("^\\s*[+-]?([0-9]+\\.?[0-9]*|\\.[0-9]+)\\s*({})\\s*$", units.join("|"))
}

/// A bare number.
pub fn figure(limits: &Limits, what: &str, example: f64) -> Value {
    json!({
        "description": format!("{what} A bare number, {}; for example {example}.", limits.words()),
        "type": "number",
        "minimum": limits.low,
        "maximum": limits.high,
        "examples": [example],
    })
}

/// A factor with a usual value, which may stand bare; any other carries its reason.
pub fn factor(usual: f64, limits: &Limits, what: &str, example: f64) -> Value {
    let words = format!("{what} Usual and without the entry: {usual}; another with its reason.");
    let bare = json!({ "description": format!("The usual value, {usual}."), "const": usual });
    either(&words, vec![bare, cause(figure(limits, what, example))])
}

/// A quantity with a usual value, which may stand bare; any other carries its reason.
pub fn usually<const F: i8, const L: i8, const T: i8>(
    usual: Q<F, L, T>,
    limits: &Limits,
    what: &str,
    example: &str,
) -> Value {
    let usual = limits.shown(usual.base());
    let words = format!("{what} Usual and without the entry: {usual}; another with its reason.");
    let bare = quantity(limits, &format!("The usual value, {usual}, and no other."), &usual);
    either(&words, vec![bare, cause(quantity(limits, what, example))])
}

/// A value that carries its reason: `{ value = ..., reason = "..." }`.
pub fn cause(value: Value) -> Value {
    let words = value["description"].as_str().unwrap_or_default();
    let words = format!("{words} Written {{ value = ..., reason = \"...\" }}.");
    let reason = text("Why it is this, and how that is known.", "Measured, RH, 14 October 2026.");
    Form::new(&words).need("value", value).need("reason", reason).done()
}

/// One of several forms.
pub fn either(what: &str, forms: Vec<Value>) -> Value {
    json!({ "description": what, "anyOf": forms })
}

/// One of a list of words.
pub fn choice(words: &[&str], what: &str) -> Value {
    let quoted: Vec<String> = words.iter().map(|w| format!("\"{w}\"")).collect();
    json!({ "description": format!("{what} {}.", one_of(&quoted)), "type": "string", "enum": words })
}

/// One of the words of a table of words.
pub fn pick<T>(table: &[(&str, T)], what: &str) -> Value {
    let words: Vec<&str> = table.iter().map(|(word, _)| *word).collect();
    choice(&words, what)
}

/// One of a few whole numbers.
pub fn whole(numbers: &[u8], what: &str) -> Value {
    let words: Vec<String> = numbers.iter().map(u8::to_string).collect();
    json!({ "description": format!("{what} {}.", one_of(&words)), "type": "integer", "enum": numbers })
}

/// `true` or `false`.
pub fn flag(what: &str) -> Value {
    json!({ "description": format!("{what} true or false."), "type": "boolean" })
}

/// A date without a time.
pub fn date(what: &str) -> Value {
    json!({
        "description": format!("{what} A date without quotes, for example 2026-10-14."),
        "type": "string",
        "format": "date",
    })
}

/// A text in one line.
pub fn line(what: &str, example: &str) -> Value {
    written(&format!("{what} One line, up to {LINE} characters; for example \"{example}\"."), example)
}

/// A text of some sentences.
pub fn text(what: &str, example: &str) -> Value {
    written(&format!("{what} Up to {PROSE} characters; for example \"{example}\"."), example)
}

/// A path or mark has its own pattern; any other text must not be empty.
fn written(what: &str, example: &str) -> Value {
    json!({ "description": what, "type": "string", "pattern": "\\S", "examples": [example] })
}

/// A mark that goes into file names.
pub fn mark(longest: usize, what: &str, example: &str) -> Value {
    let rest = longest.saturating_sub(1);
    json!({
        "description": format!(
            "{what} Letters, digits, - and _, a letter or digit first, up to {longest}; for example \"{example}\"."
        ),
        "type": "string",
        "pattern": format!("^\\s*[A-Za-z0-9][A-Za-z0-9_-]{{0,{rest}}}\\s*$"),
        "examples": [example],
    })
}

/// A list of `item`, from `least` to `most` of them.
pub fn list(item: Value, (least, most): (usize, Option<usize>), what: &str) -> Value {
    let mut list = json!({ "description": what, "type": "array", "items": item });
    if least > 0 {
        list["minItems"] = json!(least);
    }
    if let Some(most) = most {
        list["maxItems"] = json!(most);
    }
    list
}

/// Tables under one head, `[[returns]]`, at least one where `needed`.
pub fn tables(one: Value, needed: bool, what: &str) -> Value {
    list(one, (usize::from(needed), None), what)
}

/// Entries whose names the job file makes: `[materials."red brick"]`.
pub fn named(one: Value, what: &str) -> Value {
    json!({ "description": what, "type": "object", "additionalProperties": one })
}
