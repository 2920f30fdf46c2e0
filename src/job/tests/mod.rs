//! The reader against good jobs, bad jobs and noise.

mod bad;
mod noise;
mod plan;
mod slips;

use super::read;

/// A whole valid job, apart from the demo jobs so that those may change.
pub const GOOD: &str = include_str!("good.toml");

/// Every demo job, by file name.
pub const DEMOS: &[(&str, &str)] = &[
    ("rear-opening.toml", super::start::TEMPLATE),
    ("short-nib.toml", include_str!("../../../jobs/short-nib.toml")),
    ("lime-terrace.toml", include_str!("../../../jobs/lime-terrace.toml")),
    ("concrete-hall.toml", include_str!("../../../jobs/concrete-hall.toml")),
    ("semi.toml", include_str!("../../../jobs/semi.toml")),
    ("bungalow.toml", include_str!("../../../jobs/bungalow.toml")),
    ("end-terrace.toml", include_str!("../../../jobs/end-terrace.toml")),
    ("hold-points.toml", include_str!("../../../jobs/hold-points.toml")),
];

#[test]
fn every_demo_job_reads_without_error_or_warning_and_says_what_it_shows() {
    for (name, text) in DEMOS {
        assert!(text.starts_with("# Shows "), "{name} does not say in its first line what it shows");
        match read(name, text) {
            Ok(building) => assert_eq!(building.warnings, Vec::<String>::new(), "{name}"),
            Err(report) => panic!("{}", report.render(false)),
        }
    }
}

#[test]
fn the_fixture_becomes_the_building_that_it_describes() {
    let building = read("good.toml", GOOD).unwrap_or_else(|r| panic!("{}", r.render(false)));
    insta::with_settings!({ prepend_module_to_snapshot => false }, {
        insta::assert_debug_snapshot!("building", building);
    });
}

#[test]
fn nothing_given_for_a_thing_means_its_usual_value() {
    let building = read("good.toml", GOOD).unwrap_or_else(|r| panic!("{}", r.render(false)));
    let r2 = building.returns.iter().find(|r| r.mark == "R2").expect("the fixture has R2");
    assert_eq!(r2.mu.value.base(), 0.4);
    assert!(r2.mu.reason.is_empty());
    // The inner leaf is the loaded one, and a load without a leaf stands on the only one.
    assert_eq!(building.build_ups[0].loaded().0, 1);
    assert_eq!(r2.loads[0].leaf, 0);
    assert_eq!(building.basis.helping_factor.value, 0.9);
}

#[test]
fn a_photograph_points_at_parts_as_inline_tables_or_under_heads_of_their_own() {
    let inline = "marks = [{ of = \"R1\", at = [\"32 %\", \"60 %\"] }, { of = \"B1-R2\", at = [\"100 %\", \"0 %\"] }]\n";
    let heads = "[[photographs.marks]]\nof = \"R1\"\nat = [\"32 %\", \"60 %\"]\n\n\
                 [[photographs.marks]]\nof = \"B1-R2\"\nat = [\"100 %\", \"0 %\"]\n";
    for marks in [inline, heads] {
        let text = format!("{GOOD}\n[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\n{marks}");
        let building = read("marks.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
        let found: Vec<_> = building.photographs[0].marks.iter().map(|m| (m.of.as_str(), m.at)).collect();
        assert_eq!(found, [("R1", (0.32, 0.6)), ("B1-R2", (1.0, 0.0))]);
    }
    let plain = format!("{GOOD}\n[[photographs]]\nfile = \"nib.jpg\"\ncaption = \"Nib\"\n");
    assert!(read("plain.toml", &plain).expect("a valid job").photographs[0].marks.is_empty());
}

#[test]
fn a_chase_comes_off_the_leaf() {
    let text = GOOD.replacen("thickness = \"102.5 mm\"", "thickness = \"102.5 mm\"\nchase = \"20 mm\"", 1);
    let building = read("chase.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
    let leaf = &building.build_ups[0].leaves[0];
    assert_eq!((leaf.thickness.base(), leaf.chase.base()), (82.5, 20.0));
}

#[test]
fn one_factor_on_everything_sets_all_three() {
    let text = GOOD.replacen("[basis]", "[basis]\ngamma_M = { value = 3.0, reason = \"existing walls\" }", 1);
    let basis = read("gamma.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false))).basis;
    for factor in [basis.gamma_m_compression, basis.gamma_m_flexure, basis.gamma_m_shear] {
        assert_eq!(factor.map(|c| c.value), Some(3.0));
    }
}

#[test]
fn line_ends_and_byte_order_marks_of_other_systems_are_read() {
    let text = GOOD.replace('\n', "\r\n");
    assert!(read("crlf.toml", &text).is_ok());
    assert!(read("bom.toml", &format!("\u{feff}{GOOD}")).is_ok());
    let report =
        read("crlf.toml", &text.replace("mu = 0.4", "mu = 4")).expect_err("a factor without a reason");
    let line = GOOD.lines().position(|l| l == "mu = 0.4").expect("the fixture states it") + 1;
    let record = &report.records()[0];
    assert_eq!((record.line, record.column), (line, 6));
}

#[test]
fn blanks_in_names_count_once() {
    let text = GOOD.replace("mark = \"rear wall\"", "mark = \" rear  wall\"");
    let building = read("blanks.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
    assert_eq!(building.plan[0].mark, "rear wall");
}

/// Two bearings of different loads whose lengths meet; beside each other they are read.
#[test]
fn bearings_do_not_lie_on_each_other() {
    let with = |at: &str| {
        let load = format!(
            "[[returns.loads]]\nwhat = \"beam B2\"\ndead = \"1 kN\"\nimposed = \"0 kN\"\nat = \"{at}\"\n\n[returns.junction]\nto = \"rear wall\""
        );
        let bearing = "[[bearings]]\nmark = \"B2-R1\"\nbeam = \"B2\"\non = \"R1\"\nload = \"beam B2\"\n\
                       bearing_length = \"100 mm\"\nbearing_width = \"100 mm\"\n\n[[padstones]]";
        GOOD.replacen("[returns.junction]\nto = \"rear wall\"", &load, 1).replacen(
            "[[padstones]]",
            bearing,
            1,
        )
    };
    // B1-R1 is 190 mm long about 540 mm: it begins at 445 mm.
    assert!(read("beside.toml", &with("395 mm")).is_ok());
    let report = read("meets.toml", &with("396 mm")).expect_err("a millimetre of overlap");
    let shown = report.render(false);
    assert_eq!(report.diagnostics().len(), 1, "{shown}");
    assert!(shown.contains("bearing B2-R1: it lies where B1-R1 bears already"), "{shown}");
}

#[test]
fn padstones_that_no_bearing_uses_are_a_warning() {
    let (before, rest) = GOOD.split_once("[[bearings]]").expect("the fixture has bearings");
    let stones = &rest[rest.find("[[padstones]]").expect("and padstones")..];
    let building =
        read("idle.toml", &format!("{before}{stones}")).unwrap_or_else(|r| panic!("{}", r.render(false)));
    assert_eq!(building.warnings, ["padstones: there are no [[bearings]] that could use them"]);
}
