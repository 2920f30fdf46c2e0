//! Bad job files and the diagnostic that each must give: one slip, one diagnostic, at its place.

use super::slips::{self, Slip};
use super::{GOOD, read};

impl Slip {
    /// The bad text, and the byte at which the caret must stand: in the changed part, or else at the
    /// nearest place before it, or else behind it.
    fn apply(&self) -> (String, usize) {
        let start = GOOD.find(self.from).unwrap_or_else(|| panic!("{}: the good job lacks it", self.name));
        let mut text = GOOD.to_owned();
        text.replace_range(start..start + self.from.len(), self.to);
        let within = self.to.rfind(self.caret).map(|i| start + i);
        let before = || text[..start].rfind(self.caret);
        let after = || text[start..].find(self.caret).map(|i| start + i);
        let at = within.or_else(before).or_else(after);
        let at = at.unwrap_or_else(|| panic!("{}: nowhere is {:?}", self.name, self.caret));
        (text, at)
    }

    /// The report as text, or what is wrong with it.
    fn judge(&self) -> Result<String, String> {
        let (text, at) = self.apply();
        let report = match read("bad.toml", &text) {
            Ok(_) => return Err("it was read without a word".to_owned()),
            Err(report) => report,
        };
        let shown = report.render(false);
        let [d] = report.diagnostics() else { return Err(format!("more than one diagnostic:\n{shown}")) };
        if !self.caret.is_empty() {
            let (before, column) = text[..at].rsplit_once('\n').unwrap_or(("", &text[..at]));
            let line = before.split('\n').count() + 1;
            let place = format!("--> bad.toml:{line}:{}\n", column.chars().count() + 1);
            if text[d.span.clone()] != *self.caret || !shown.contains(&place) {
                return Err(format!("not under {:?} {place}{shown}", self.caret));
            }
        }
        match self.says.iter().find(|words| !shown.contains(**words)) {
            Some(words) => Err(format!("lacks {words:?}\n{shown}")),
            None => Ok(shown),
        }
    }
}

#[test]
fn each_slip_gives_one_diagnostic_at_its_place() {
    let (mut all, mut wrong) = (String::new(), String::new());
    for slip in slips::all() {
        match slip.judge() {
            Ok(shown) => all.push_str(&format!("## {}\n\n{shown}\n", slip.name)),
            Err(why) => wrong.push_str(&format!("## {}: {why}\n", slip.name)),
        }
    }
    assert!(wrong.is_empty(), "{wrong}");
    insta::with_settings!({ prepend_module_to_snapshot => false, omit_expression => true }, {
        insta::assert_snapshot!("bad", all);
    });
}

/// Many slips at once: every one of them is shown, in the order of the file.
#[test]
fn all_errors_of_a_file_are_shown_at_once() {
    let changes = [
        ("number = \"2419\"", "number = 2419"),
        ("visited = 2026-10-14", "visited = \"14 October\""),
        ("overall = \"0.50 kN/m2\"", "overall = \"0.50 kN/m\""),
        ("mortar = \"M4\"\nwater", "mortar = \"M3\"\nwater"),
        ("cavity = \"75 mm\"\n", ""),
        ("share_by = \"tributary width\"", "share_by = \"stiffness\""),
        ("length = \"640 mm\"", "lenght = \"640 mm\""),
        ("at = \"460 mm\"", "at = \"1.46 m\""),
        ("wall_at = \"3.10 m\"\n\n[[links]]", "wall_at = \"9 m\"\n\n[[links]]"),
        ("for = [\"R2\"]", "for = [\"r2\"]"),
    ];
    let mut text = GOOD.to_owned();
    for (from, to) in changes {
        assert!(text.contains(from), "the good job lacks {from:?}");
        text = text.replacen(from, to, 1);
    }
    let report = read("many.toml", &text).expect_err("ten slips");
    assert_eq!(report.diagnostics().len(), changes.len(), "{}", report.render(false));
    insta::with_settings!({ prepend_module_to_snapshot => false, omit_expression => true }, {
        insta::assert_snapshot!("many", report.render(false));
    });
    let records = report.records();
    assert!(records.windows(2).all(|pair| pair[0].line <= pair[1].line));
    assert_eq!((records[0].line, records[0].column), (4, 10));
    assert_eq!(records[0].message, "job: `number` is the number 2419");
}

/// Colours are escapes round the same words.
#[test]
fn colours_change_no_word() {
    let text = GOOD.replacen("length = \"640 mm\"", "length = 640", 1);
    let report = read("bad.toml", &text).expect_err("a bare number");
    let mut plain = String::new();
    let coloured = report.render(true);
    let mut pieces = coloured.split('\u{1b}');
    plain.push_str(pieces.next().unwrap_or_default());
    pieces.for_each(|piece| plain.push_str(piece.split_once('m').map_or(piece, |(_, words)| words)));
    assert!(coloured.contains('\u{1b}'));
    assert_eq!(plain, report.render(false));
}

/// An entry that nobody reads is named in every table, so none can be overlooked.
#[test]
fn an_unknown_entry_is_named_under_every_head() {
    let mut heads = 0;
    for (i, line) in GOOD.lines().enumerate() {
        if !line.starts_with('[') || line == "[responsible]" {
            continue;
        }
        heads += 1;
        let mut lines: Vec<&str> = GOOD.lines().collect();
        lines.insert(i + 1, "zzzzzz = 1");
        let report = match read("unknown.toml", &lines.join("\n")) {
            Ok(_) => panic!("{line} takes an unknown entry"),
            Err(report) => report,
        };
        let shown = report.render(false);
        assert_eq!(report.diagnostics().len(), 1, "{line}:\n{shown}");
        assert!(shown.contains("nobody reads an entry `zzzzzz`"), "{line}:\n{shown}");
    }
    assert!(heads > 40, "{heads} heads in the good job");
}

/// Possible but odd: read, and said aloud with the mark, the value and why.
#[test]
fn odd_values_are_warnings() {
    let odd = [
        (
            "length = \"640 mm\"",
            "length = \"180 mm\"",
            "return R1: length is 180 mm, under 200 mm: a nib this short",
        ),
        (
            "overall = \"0.50 kN/m2\"",
            "overall = \"5 kN/m2\"",
            "stated wind: overall is 5 kN/m2, over 2 kN/m2: ",
        ),
        (
            "clear_height = \"2.40 m\"\nfloor_above = \"roof\"",
            "clear_height = \"4.0 m\"\nfloor_above = \"roof\"",
            "storey first: clear height is 4.0 m, over 3.6 m: ",
        ),
        (
            "density = \"19 kN/m3\"",
            "density = \"25 kN/m3\"",
            "material \"grey block\": density is 25.0 kN/m3, outside the 6 to 23 kN/m3 usual",
        ),
        (
            "ties = \"2.5 per m2\"",
            "ties = \"1.5 per m2\"",
            "build-up \"outer cavity wall\": ties is 1.5 per m2, under 2.5 per m2: ",
        ),
        (
            "storeys_above_force = \"9 kN\"\n",
            "",
            "stability: about 3.5 m of wind face above the strip is not counted",
        ),
        (
            "dead = \"18 kN\"",
            "dead = \"18 kN\"\nuplift = \"12 kN\"",
            "return R1, load beam B1: the uplift is more than its dead load holds down",
        ),
        (
            "height = \"2.40 m\"\nposition = [\"3.2 m\", \"0.32 m\"]",
            "height = \"2.00 m\"\nposition = [\"3.2 m\", \"0.32 m\"]",
            "return R1: height is 2000 mm, but storey \"ground\" is 2400 mm high",
        ),
        (
            "visited = 2026-10-14",
            "visited = 2026-10-24",
            "job: the visit on 24 October 2026 was after the calculation was made on 20 October 2026",
        ),
        (
            "thickness = \"100 mm\"\nleft = \"1.8 m\"",
            "thickness = \"200 mm\"\nleft = \"1.8 m\"",
            "return R1, junction: thickness is 200.0 mm, but the loaded leaf of \"outer cavity wall\" is 100.0 mm",
        ),
        (
            "spacing = \"1.0 m\"",
            "spacing = \"2.4 m\"",
            "floor edge E1: spacing is 2.4 m, over 2 m: more than Approved Document A, 2C, has for straps",
        ),
        (
            "strip_height = \"2.65 m\"\njoists",
            "strip_height = \"2.4 m\"\njoists",
            "floor edge E1: the floor collects a strip of 2.40 m here, but 2.65 m under [stability]",
        ),
        (
            "span = \"6.2 m\"",
            "span = \"3.2 m\"",
            "diaphragm: the span is 3.20 m, but two neighbouring bracing walls stand 6.40 m apart after the removal",
        ),
        (
            "value = \"5.0 kN/m\"",
            "value = \"50 kN/m\"",
            "diaphragm, `resistance`: value is 50 kN/m, over 8 kN/m: ",
        ),
        ("[[links]]\nlink = \"dpc\"\nproof = \"calculated\"\n", "", "links: nothing is said about dpc"),
        (
            "right = { edge = \"simple\", reason = \"Nib R1",
            "right = { edge = \"continuous\", reason = \"Nib R1",
            "panel P1: length and edges are the same before and after",
        ),
        (
            "tributary_width = \"0.40 m\"",
            "tributary_width = \"6.30 m\"",
            "stability: the returns' tributary widths add up to 6.50 m on a front of 6.40 m",
        ),
        (
            "bearing_length = \"156 mm\"",
            "bearing_length = \"60 mm\"",
            "bearing B1-R2: bearing length is 60 mm, under 75 mm: short for the end of a beam",
        ),
        (
            "height = \"145 mm\"",
            "height = \"50 mm\"",
            "padstone PS 300: height is 50 mm, under 65 mm: flat for a padstone",
        ),
    ];
    // The load and its bearing stand where they stay on the shortest and lowest return of the list.
    let good = GOOD
        .replacen("at = \"540 mm\"", "at = \"100 mm\"", 1)
        .replacen("bearing_length = \"190 mm\"", "bearing_length = \"160 mm\"", 1)
        .replacen("level = \"2.35 m\"\n", "", 1);
    let mut wrong = String::new();
    for (from, to, says) in odd {
        assert!(good.contains(from), "the good job lacks {from:?}");
        match read("odd.toml", &good.replacen(from, to, 1)) {
            Ok(building) if building.warnings.iter().any(|w| w.starts_with(says)) => {}
            Ok(building) => wrong.push_str(&format!("{says}: {:?}\n", building.warnings)),
            Err(report) => wrong.push_str(&format!("{says}:\n{}", report.render(false))),
        }
    }
    assert!(wrong.is_empty(), "{wrong}");
}
