//! The sample pack is set, looked over, and set again.

use super::*;

const SAMPLE: &str = include_str!("../../tests/data/sample-pack.json");

#[test]
fn the_sample_is_set_without_a_warning() {
    let pack = typeset_json(SAMPLE, &[], "sample").unwrap();
    assert_eq!(pack.warnings, Vec::<String>::new());
    assert!(pack.pdf.starts_with(b"%PDF-"));
    assert!(pack.pages > 3);
}

#[test]
fn the_sample_has_no_flaw() {
    let data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let flaws: Vec<String> = inspect(&data, &[], None).unwrap().iter().map(ToString::to_string).collect();
    assert!(flaws.is_empty(), "{}", flaws.join("\n"));
}

#[test]
fn the_same_data_gives_the_same_bytes() {
    let first = typeset_json(SAMPLE, &[], "sample").unwrap();
    evict(0);
    let second = typeset_json(SAMPLE, &[], "sample").unwrap();
    assert!(first.pdf == second.pdf);
}

/// Labels spoilt in each way, and labels beside them that are sound.
#[test]
fn the_audit_finds_flaws() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let label = |x: f64, y: f64, rotate: f64, text: &str| {
        serde_json::json!({"kind": "label", "x": x, "y": y, "anchor": "middle", "size": 8.0, "rotate": rotate,
            "runs": [{"text": text, "style": "plain"}], "width": 10.0, "height": 3.0, "role": "note"})
    };
    let stroke = |y: f64| serde_json::json!({"kind": "stroke", "pen": "leader", "path": [["M", 0.0, y], ["L", 60.0, y]]});
    let area = serde_json::json!({"kind": "fill", "ink": "mask",
        "path": [["M", 40.0, 25.0], ["L", 60.0, 25.0], ["L", 60.0, 35.0], ["L", 40.0, 35.0], ["Z"]]});
    let items = [
        label(10.0, 5.0, 0.0, "first"),
        label(11.0, 5.0, 0.0, "second"),
        label(170.0, 5.0, 0.0, "far right"),
        stroke(14.0),
        label(10.0, 15.0, 0.0, "on the line"),
        label(10.0, 21.0, 0.0, "struck"),
        stroke(20.0),
        label(50.0, 31.0, 0.0, "covered"),
        label(20.0, 31.0, 0.0, "clear"),
        label(28.0, 33.0, -90.0, "upright"),
        stroke(38.0),
        serde_json::json!({"kind": "fill", "ink": "mask",
            "path": [["M", 5.0, 36.0], ["L", 15.0, 36.0], ["L", 15.0, 40.0], ["L", 5.0, 40.0], ["Z"]]}),
        label(10.0, 39.0, 0.0, "cleared"),
        stroke(33.0),
        area,
    ];
    let drawing = serde_json::json!({"name": "flawed", "caption": "flawed", "scale": "1:20", "alt": "flawed",
        "width": 60.0, "height": 40.0, "items": items});
    data["sections"][0]["blocks"] = serde_json::json!([{"kind": "drawing", "drawing": drawing}]);
    let mut flaws: Vec<Flaw> =
        inspect(&data, &[], None).unwrap().into_iter().map(|finding| finding.flaw).collect();
    flaws.sort_by_key(|flaw| format!("{flaw:?}"));
    let expected = [
        Flaw::Crossed("covered".into()),
        Flaw::Crossed("on the line".into()),
        Flaw::Crossed("struck".into()),
        Flaw::Crossed("upright".into()),
        Flaw::Outside("far right".into()),
        Flaw::Overlap("first".into(), "second".into()),
    ];
    assert_eq!(flaws, expected);
}

#[test]
fn a_sign_without_a_glyph_is_refused() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    data["cautions"][0] = "The lintel is marked \u{6881}.".into();
    let error = typeset(&data, &[], "sample", None).unwrap_err();
    assert!(matches!(&error, PackError::Export(_)), "{error}");
    let flaws = inspect(&data, &[], None).unwrap();
    assert!(flaws.iter().any(|finding| matches!(finding.flaw, Flaw::Missing(_))), "{flaws:?}");
}

#[test]
fn a_photograph_that_is_not_there_is_named() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    data["photographs"] = serde_json::json!([{"path": "/photo/0.jpg", "caption": "R1 from the garden", "mark": "R1", "words": "",
            "alt": "R1 from the garden", "marks": []}]);
    let error = typeset(&data, &[], "sample", None).unwrap_err();
    let PackError::Template(lines) = &error else { panic!("{error}") };
    assert!(lines.iter().any(|line| line.contains("photo/0.jpg")), "{error}");
}

/// Long titles, long words, long tables and long formulas still keep clear of each other.
#[test]
fn long_words_keep_clear() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let words = "vertical load on the toe of the return at the damp-proof course, before and after the wall comes out";
    data["job"]["title"] = words.into();
    data["outcome"]["words"] =
        "adequate once 3 hold points are closed and the junction of R1 has been seen".into();
    data["warnings"] = serde_json::json!([words, words, words]);
    data["checked"] =
        serde_json::json!({"text": "", "name": "Ines Okafor", "letters": "IO", "date": "22 October 2026"});
    let rows = vec![data["schedule"].as_array().unwrap().clone(); 8].concat();
    data["schedule"] = rows.into();
    data["inputs"] = format!("{}\n{}\n", "x".repeat(300), words.repeat(4)).into();
    for section in data["sections"].as_array_mut().unwrap() {
        section["title"] = words.into();
        section["outcome"] = serde_json::json!({"kind": "conditional", "words": words});
        for block in section["blocks"].as_array_mut().unwrap() {
            let kind = block["kind"].as_str().unwrap().to_owned();
            if kind == "table" {
                let rows = vec![block["rows"].as_array().unwrap().clone(); 30].concat();
                block["rows"] = rows.into();
            } else if kind == "verify" {
                block["case"] = words.into();
                block["ratio"] = "12.40".into();
                block["bar"] = 2.0.into();
            }
            if block.get("words").is_some() {
                block["words"] = words.into();
            }
            if block.get("clause").is_some() {
                block["clause"] = "EN 1996-1-1 6.1.2.1(3) with the UK National Annex, from memory".into();
            }
        }
    }
    let pack = typeset(&data, &[], "sample", None).unwrap();
    assert_eq!(pack.warnings, Vec::<String>::new());
    let flaws: Vec<String> = inspect(&data, &[], None).unwrap().iter().map(ToString::to_string).collect();
    assert!(flaws.is_empty(), "{}", flaws.join("\n"));
}

/// Every sheet carries the title block: number, sheet, who made and checked it, revision,
/// status, program and digest, and that it is not signed.
#[test]
fn every_sheet_says_what_it_is() {
    let data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let world = world::World::new(Kind::Pack, SAMPLE.as_bytes().to_vec(), &[], None);
    let document = pdf::compile(&world).unwrap().0;
    let sheets = audit::sheets(&document);
    let digest = data["digest"].as_str().unwrap();
    for (index, words) in sheets.iter().enumerate() {
        let number = format!("sheet {} of {}", index + 1, sheets.len());
        for part in [
            "2419",
            &number,
            "Rowan Hale",
            "20 October 2026",
            "self-checked",
            "revision A",
            "for building control",
            "Perpend 0.1.0",
            digest,
            "not signed",
        ] {
            assert!(words.contains(part), "sheet {}: {part} is not in {words}", index + 1);
        }
    }
}

/// Words from a job print as they stand: nothing in them is read as markup or code.
#[test]
fn words_print_literally() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let words = "#panic(1) *bold* _it_ $x$ <b> @ref [a] \\ // \"q\" = -- `raw`";
    data["cautions"][0] = words.into();
    data["job"]["title"] = words.into();
    data["inputs"] = words.into();
    let pack = typeset(&data, &[], "sample", None).unwrap();
    assert_eq!(pack.warnings, Vec::<String>::new());
    let all = printed(&data);
    assert!(all.contains("#panic(1) *bold* _it_ $x$ <b> @ref [a]"), "{all}");
}

fn printed(data: &serde_json::Value) -> String {
    let world = world::World::new(Kind::Pack, serde_json::to_vec(data).unwrap(), &[], None);
    audit::sheets(&pdf::compile(&world).unwrap().0).concat()
}

/// 420 lines of a job file, a fifth of them longer than a column, take three sheets at most.
#[test]
fn a_long_job_file_takes_three_sheets() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let pages = |data: &serde_json::Value| typeset(data, &[], "sample", None).unwrap().pages;
    data["inputs"] = "".into();
    let without = pages(&data);
    let line = |n: usize| match n % 5 {
        0 => String::new(),
        1 => format!("reason = \"{}\"", "opened up on site, seen by the engineer ".repeat(2)),
        _ => "tributary_width = \"2.60 m\"".to_owned(),
    };
    data["inputs"] = (1..=420).map(line).collect::<Vec<_>>().join("\n").into();
    assert!(pages(&data) <= without + 3);
    assert_eq!(inspect(&data, &[], None).unwrap(), vec![]);
}

/// Words in a column of numbers, and a first column of words, have room in a table of many columns.
#[test]
fn words_in_a_table_have_room() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let number = |head: &str| serde_json::json!({"head": head, "align": "decimal"});
    let columns: Vec<_> = std::iter::once(serde_json::json!({"head": "check", "align": "left"}))
        .chain(["H f", "H j", "W f", "W j", "Q f", "Q j", "G f", "G j"].map(number))
        .collect();
    let row = |first: &str, rest: &str| {
        std::iter::once(first).chain(std::iter::repeat_n(rest, 8)).map(str::to_owned).collect::<Vec<_>>()
    };
    let rows = [
        row("vertical resistance in the middle", "0.14*"),
        row("overturning", "12 345.60"),
        row("toe", "none, outside"),
    ];
    data["sections"][0]["blocks"] = serde_json::json!([
        {"kind": "table", "caption": "cases", "columns": columns, "rows": rows, "strong": [1]}]);
    let flaws: Vec<String> = inspect(&data, &[], None).unwrap().iter().map(ToString::to_string).collect();
    assert!(flaws.is_empty(), "{}", flaws.join("\n"));
}

/// Three drawings of which two stand side by side: the third finds room, and no captions meet.
#[test]
fn captions_of_neighbours_stay_apart() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let caption = "R1 elevation, looking at its face; single hatching: brick; paired hatching: block";
    let drawing = |width: f64, height: f64| {
        serde_json::json!({"name": "one", "caption": caption, "scale": "1:50", "alt": "a wall", "width": width, "height": height,
            "items": [{"kind": "stroke", "pen": "outline", "path": [["M", 0.0, 0.0], ["L", width, height]]}]})
    };
    for (first, second, third) in
        [(94.0, 58.0, 93.0), (90.0, 72.0, 70.0), (50.0, 50.0, 50.0), (120.0, 90.0, 165.0)]
    {
        data["sections"][0]["blocks"] = serde_json::json!([
            {"kind": "drawings", "drawings": [drawing(first, 76.0), drawing(second, 58.0)]},
            {"kind": "note", "text": "between"},
            {"kind": "drawings", "drawings": [drawing(third, 35.0)]}]);
        let flaws: Vec<String> = inspect(&data, &[], None).unwrap().iter().map(ToString::to_string).collect();
        assert!(flaws.is_empty(), "{first} {second} {third}: {}", flaws.join("\n"));
    }
}

/// A formula longer than the sheet is wide keeps to the sheet.
#[test]
fn a_long_formula_keeps_to_the_sheet() {
    let mut data: serde_json::Value = serde_json::from_str(SAMPLE).unwrap();
    let value = serde_json::json!(["val", "12 345.6", "kN/m\u{b2}"]);
    let square = serde_json::json!(["power", ["paren", value], ["num", "2"]]);
    for parts in [2, 4, 8, 16] {
        let mut sum = vec![serde_json::json!("plus")];
        sum.extend(std::iter::repeat_n(square.clone(), parts));
        let step = serde_json::json!({"kind": "step", "clause": "6.1.2.1(2)", "words": "a long sum", "symbol": ["sym", "N", "Ed"],
            "formula": ["sym", "x"], "substitution": sum, "spoken": "a long sum", "result": {"value": "1", "unit": "kN"}});
        data["sections"][0]["blocks"] = serde_json::json!([step]);
        let flaws: Vec<String> = inspect(&data, &[], None).unwrap().iter().map(ToString::to_string).collect();
        assert!(flaws.is_empty(), "{parts}: {}", flaws.join("\n"));
    }
}
