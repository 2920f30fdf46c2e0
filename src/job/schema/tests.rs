//! The schema held against the reader: its keys, its forms, what either takes, and the metaschema.

use std::collections::{BTreeMap, BTreeSet};

use jsonschema::Validator;
use serde_json::{Map, Value, json};
use toml::de::{DeTable, DeValue};

use super::super::reader::{Reader, Table};
use super::super::tests::{DEMOS, GOOD};
use super::super::{read, start, whole};
use super::schema;
use crate::error::Kind;

/// A job with the tables that no other has. It need not be a good one: it is read for its keys and forms.
const REST: &str = include_str!("tests/rest.toml");
/// What that one cannot have beside the rest of it.
const APART: &[&str] = &[
    "[basis]\ngamma_M = { value = 3.0, reason = \"Existing walls.\" }",
    "[wind.site]\nc_o = { value = 1.1, reason = \"From the map.\" }",
];

fn jobs() -> impl Iterator<Item = (&'static str, &'static str)> {
    let through = ("through-room.toml", include_str!("../../../jobs/through-room.toml"));
    let start = [("start --plan", start::FROM_PLAN), ("start", start::TEMPLATE)];
    DEMOS.iter().copied().chain([through, ("good.toml", GOOD)]).chain(start)
}

fn validator() -> Validator {
    jsonschema::draft202012::options()
        .should_validate_formats(true)
        .build(&schema())
        .expect("the schema is one")
}

/// A value of TOML as an editor holds it against a schema: dates are texts.
fn as_json(value: &DeValue<'_>) -> Value {
    match value {
        DeValue::String(text) => json!(text),
        DeValue::Integer(i) => json!(i.as_str().parse::<i64>().expect("a decimal number")),
        DeValue::Float(x) => json!(x.as_str().parse::<f64>().expect("a number")),
        DeValue::Boolean(yes) => json!(yes),
        DeValue::Datetime(date) => json!(date.to_string()),
        DeValue::Array(items) => items.iter().map(|v| as_json(v.get_ref())).collect(),
        DeValue::Table(map) => of_table(map),
    }
}

fn of_table(map: &DeTable<'_>) -> Value {
    Value::Object(
        map.iter().map(|(k, v)| (k.get_ref().to_string(), as_json(v.get_ref()))).collect::<Map<_, _>>(),
    )
}

fn tree(text: &str) -> toml::Spanned<DeTable<'_>> {
    DeTable::parse(text).expect("TOML")
}

/// The parts of the schema that a value of this form is held against.
fn parts<'s>(form: &'s Value, value: &DeValue<'_>) -> Vec<&'s Value> {
    let wanted = match value {
        DeValue::Table(_) => "object",
        DeValue::Array(_) => "array",
        _ => "",
    };
    let all = form["anyOf"].as_array().map_or_else(|| vec![form], |forms| forms.iter().collect());
    all.into_iter().filter(|f| wanted.is_empty() || f["type"] == wanted).collect()
}

/// Calls `see` with every table of the file, the schema's form of it and the path there without names and numbers.
fn walk<'s>(
    value: &DeValue<'_>,
    form: &'s Value,
    path: &str,
    see: &mut dyn FnMut(&DeTable<'_>, &'s Value, &str),
) {
    for form in parts(form, value) {
        match value {
            DeValue::Array(items) => {
                items.iter().for_each(|v| walk(v.get_ref(), &form["items"], &format!("{path}[]"), see));
            }
            DeValue::Table(map) => {
                see(map, form, path);
                for (key, v) in map {
                    let known = form["properties"].get(key.get_ref().as_ref());
                    let (form, name) = match known {
                        Some(known) => (known, key.get_ref().as_ref()),
                        None => (&form["additionalProperties"], "*"),
                    };
                    walk(v.get_ref(), form, &format!("{path}.{name}"), see);
                }
            }
            _ => {}
        }
    }
}

#[test]
fn the_schema_is_a_schema() {
    let schema = schema();
    assert!(jsonschema::meta::is_valid(&schema), "{:?}", jsonschema::meta::validate(&schema).err());
    assert_eq!(schema["$schema"], "https://json-schema.org/draft/2020-12/schema");
}

#[test]
fn every_job_of_the_project_fits() {
    let validator = validator();
    for (name, text) in jobs() {
        let job = of_table(tree(text).get_ref());
        let faults: Vec<String> =
            validator.iter_errors(&job).map(|e| format!("{}: {e}", e.instance_path())).collect();
        assert!(faults.is_empty(), "{name}: {}", faults.join("\n"));
    }
}

/// Between them the jobs have every table; the reader asks each for the keys of the schema and no others.
#[test]
fn the_reader_asks_for_the_keys_of_the_schema_and_no_others() {
    let schema = schema();
    let mut known: BTreeMap<String, BTreeSet<String>> = BTreeMap::new();
    let mut asked: BTreeMap<String, BTreeSet<String>> = BTreeMap::new();
    every_form(&schema, "", &mut |path, form| {
        if let Some(properties) = form["properties"].as_object() {
            known.entry(path.to_owned()).or_default().extend(properties.keys().cloned());
        }
    });
    for text in jobs().map(|(_, text)| text).chain([REST]).chain(APART.iter().copied()) {
        let tree = tree(text);
        let reader = Reader::default();
        whole(&Table::new(&reader, String::new(), tree.get_ref(), 0..0), None);
        let log = reader.asked.borrow();
        see_root(tree.get_ref(), &schema, &mut |map, _, path| {
            let address = std::ptr::from_ref(map).addr();
            let keys = log.iter().filter(|(at, _)| *at == address).map(|(_, key)| (*key).to_owned());
            asked.entry(path.to_owned()).or_default().extend(keys);
        });
    }
    asked.retain(|_, keys| !keys.is_empty());
    let none = BTreeSet::new();
    let paths: BTreeSet<&String> = known.keys().chain(asked.keys()).collect();
    let apart: Vec<String> = (paths.into_iter())
        .map(|path| (path, asked.get(path).unwrap_or(&none), known.get(path).unwrap_or(&none)))
        .filter(|(_, asked, known)| asked != known)
        .map(|(path, asked, known)| {
            let alone =
                |a: &BTreeSet<String>, b: &BTreeSet<String>| a.difference(b).cloned().collect::<Vec<_>>();
            format!("{path}: reader alone {:?}, schema alone {:?}", alone(asked, known), alone(known, asked))
        })
        .collect();
    assert!(apart.is_empty(), "{}", apart.join("\n"));
}

fn see_root<'s>(root: &DeTable<'_>, schema: &'s Value, see: &mut dyn FnMut(&DeTable<'_>, &'s Value, &str)) {
    see(root, schema, "");
    for (key, v) in root {
        let key = key.get_ref().as_ref();
        walk(v.get_ref(), &schema["properties"][key], &format!(".{key}"), see);
    }
}

/// Calls `see` with every form of the schema and the path to it.
fn every_form<'s>(form: &'s Value, path: &str, see: &mut dyn FnMut(&str, &'s Value)) {
    see(path, form);
    for one in form["anyOf"].as_array().into_iter().flatten() {
        every_form(one, path, see);
    }
    for (key, one) in form["properties"].as_object().into_iter().flatten() {
        every_form(one, &format!("{path}.{key}"), see);
    }
    if form["items"].is_object() {
        every_form(&form["items"], &format!("{path}[]"), see);
    }
    if form["additionalProperties"].is_object() {
        every_form(&form["additionalProperties"], &format!("{path}.*"), see);
    }
}

#[test]
fn every_form_has_its_words_and_examples_that_fit_it() {
    let mut seen = 0;
    every_form(&schema(), "", &mut |path, form| {
        seen += 1;
        let words = form["description"].as_str().unwrap_or_default();
        assert!(words.len() > 3 && words.ends_with('.'), "{path}: {words:?}");
        assert!(!words.contains("..;") && !words.contains("  "), "{path}: {words:?}");
        for example in form["examples"].as_array().into_iter().flatten() {
            assert!(jsonschema::is_valid(form, example), "{path}: {example}");
        }
    });
    assert!(seen > 300, "{seen} forms");
}

/// What a slip puts in place of a value, with the same in the words of a job file.
const SLIPS: &[&str] =
    &["7", "0.5", "\"no such thing\"", "\"7 parsec\"", "\"\"", "true", "[]", DATE, "{}", "[\"x\"]"];

/// A date is a text once it is JSON: a schema cannot tell the two apart, the reader can.
const DATE: &str = "2026-10-14";

/// One value of every place of the jobs is taken out or replaced: what the schema refuses the reader refuses
/// too, and where the schema takes it the reader has nothing against its kind, its unit or its words.
#[test]
fn the_schema_refuses_nothing_that_the_reader_takes_and_takes_no_wrong_kind() {
    let validator = validator();
    let form = schema();
    let mut seen = BTreeSet::new();
    let mut wrong: Vec<String> = Vec::new();
    let (mut refused, mut all) = (0, 0);
    for (name, text) in jobs() {
        let mut changed = Vec::new();
        see_root(tree(text).get_ref(), &form, &mut |map, form, path| {
            for (key, value) in map {
                let key_name = key.get_ref().as_ref();
                if !seen.insert(format!("{path}.{key_name}")) || path.is_empty() {
                    continue;
                }
                let one = &form["properties"][key_name];
                let examples = one["examples"].as_array().into_iter().flatten().map(Value::to_string);
                let written = SLIPS.iter().map(|s| (*s).to_owned()).chain(examples);
                // A head, [name], is no place for another value.
                let span = value.span();
                if text[..span.start].ends_with("= ") {
                    changed.extend(written.map(|w| (format!("{path}.{key_name} = {w}"), span.clone(), w)));
                    changed.push((
                        format!("{path}.{key_name} taken out"),
                        key.span().start..span.end,
                        String::new(),
                    ));
                    let slip = format!("x{key_name}");
                    changed.push((format!("{path}.{key_name} misspelt"), key.span(), slip));
                }
            }
        });
        for (what, span, written) in changed {
            let job = format!("{}{written}{}", &text[..span.start], &text[span.end..]);
            let Ok(tree) = DeTable::parse(&job) else { continue };
            let fits = validator.is_valid(&of_table(tree.get_ref()));
            let found = read(name, &job);
            all += 1;
            refused += usize::from(!fits);
            match found {
                Ok(_) if !fits => wrong.push(format!("{name}: {what}: the reader alone takes it")),
                Err(report) if fits && written != DATE => {
                    let kinds = [Kind::WrongType, Kind::Unit, Kind::UnknownEntry];
                    let form = report.diagnostics().iter().find(|d| kinds.contains(&d.kind));
                    wrong.extend(
                        form.map(|d| format!("{name}: {what}: the schema alone takes it: {}", d.message)),
                    );
                }
                _ => {}
            }
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
    assert!(all > 1500 && refused * 2 > all, "{refused} of {all} refused");
}

/// The same for tables that no whole job has: there the reader is asked whether it faults the place, and the
/// schema's form of that place alone whether the value fits.
#[test]
fn forms_of_the_rest_agree_with_the_reader_place_by_place() {
    let schema = schema();
    let mut wrong: Vec<String> = Vec::new();
    let mut all = 0;
    for text in [REST].into_iter().chain(APART.iter().copied()) {
        let mut places = Vec::new();
        see_root(tree(text).get_ref(), &schema, &mut |map, form, path| {
            for (key, value) in map {
                let one = &form["properties"][key.get_ref().as_ref()];
                // A head, [name], is no place for another value.
                let entry = text[..value.span().start].ends_with("= ");
                if one.is_object() && entry {
                    places.push((format!("{path}.{}", key.get_ref()), value.span(), one));
                }
            }
        });
        for (place, span, form) in places {
            let form = jsonschema::draft202012::new(form).expect("a schema");
            for slip in SLIPS.iter().filter(|slip| **slip != DATE) {
                let job = format!("{}{slip}{}", &text[..span.start], &text[span.end..]);
                let fits = form.is_valid(&of_table(tree(&format!("x = {slip}")).get_ref())["x"]);
                let Err(report) = read("rest.toml", &job) else { continue };
                let here = span.start..span.start + slip.len();
                let mut faults = report.diagnostics().iter().filter(|d| here.contains(&d.span.start));
                let refused = faults.clone().next().is_some();
                let kind = faults.any(|d| matches!(d.kind, Kind::WrongType | Kind::Unit));
                all += 1;
                if fits && kind || !fits && !refused {
                    wrong.push(format!(
                        "{place} = {slip}: fits the schema {fits}, refused by the reader {refused}"
                    ));
                }
            }
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
    assert!(all > 500, "{all} places");
}

#[test]
fn plain_slips_are_refused_at_their_place() {
    let validator = validator();
    let slips = [
        ("mu = 0.4", "nu = 0.4", "/returns/0"),
        ("head = \"propped\"", "head = \"proped\"", "/returns/0/head"),
        ("length = \"640 mm\"", "length = 640", "/returns/0/length"),
        ("length = \"640 mm\"", "length = \"640 kN\"", "/returns/0/length"),
        ("[stability]", "[stabilty]", ""),
        ("group = 1", "group = 3", "/materials"),
        ("letter = \"A\"\ndate = 2026-10-21", "letter = \"A\"\ndate = \"October\"", "/revisions/0/date"),
    ];
    for (from, to, place) in slips {
        assert!(GOOD.contains(from), "{from}");
        let slip = GOOD.replacen(from, to, 1);
        let job = of_table(tree(&slip).get_ref());
        let places: Vec<String> =
            validator.iter_errors(&job).map(|e| e.instance_path().to_string()).collect();
        assert!(
            places.iter().any(|p| if place == "/materials" { p.starts_with(place) } else { p == place }),
            "{to}: {places:?}"
        );
    }
}
