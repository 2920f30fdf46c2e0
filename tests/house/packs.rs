//! What a pack makes of a practice: its look, its factors, and what no template may leave out.

use std::path::Path;

use perpend::archive::{Held, PRACTICE, held};
use perpend::building::Practice;
use perpend::house::House;
use perpend::job::practice::read;
use perpend::pack::look::Assets;
use perpend::{Source, check_for, draw_for, pack, photographs, recheck, report, set, summarise};

use super::{STYLES, house, practice};
use crate::jobs;

fn made(text: &str, house: &House) -> Result<Vec<u8>, String> {
    let (b, results) = draw_for("job.toml", text, Some(&house.practice)).expect("a valid job");
    let from = Source { text, folder: Path::new("jobs"), house: Some(house) };
    set(&b, &results, &from).map(|made| made.pdf).map_err(|e| e.to_string())
}

fn plain(lines: &str) -> Practice {
    read("practice.toml", &practice(lines)).unwrap_or_else(|e| panic!("{}", e.render(false)))
}

#[test]
fn demo_jobs_have_no_flaw_in_either_style() {
    let mut all = Vec::new();
    for style in STYLES {
        let house = house(style);
        // The first style has our own face and templates: one job shows its heads.
        for (name, text) in
            jobs::demos().into_iter().filter(|(name, _)| style != "leaf" || name == "rear-opening")
        {
            let (b, results) = draw_for(&name, &text, Some(&house.practice)).expect("a valid job");
            let data = report::pack(&b, &results, &text, &perpend::digest(&text));
            let files = photographs(&b, Path::new("jobs")).expect("its photographs");
            let flaws =
                pack::inspect(&data, &files, Some(&house.look)).unwrap_or_else(|e| panic!("{name}: {e}"));
            all.extend(flaws.iter().map(|flaw| format!("{style}, {name}: {flaw}")));
            pack::evict(2);
        }
    }
    assert!(all.is_empty(), "{} flaws\n{}", all.len(), all.join("\n"));
}

#[test]
fn summaries_stay_on_two_pages_in_either_style() {
    for style in STYLES {
        let house = house(style);
        for (name, text) in jobs::demos() {
            let (b, results) = check_for(&name, &text, Some(&house.practice)).expect("a valid job");
            let from = Source { text: &text, folder: Path::new(""), house: Some(&house) };
            let made = summarise(&b, &results, &from).unwrap_or_else(|e| panic!("{name}: {e}"));
            assert!(made.typeset.pages <= 2, "{style}, {name}: {} pages", made.typeset.pages);
            assert_eq!(made.typeset.warnings, Vec::<String>::new(), "{style}, {name}");
        }
    }
}

#[test]
fn the_practice_file_travels_in_the_pack_and_is_worked_again() {
    let house = house("board");
    let pdf = made(jobs::START, &house).expect("a pack");
    assert_eq!(pdf, made(jobs::START, &house).expect("a pack"), "same job, same practice, same bytes");
    let inside = held(pdf).expect("a pack");
    assert_eq!(inside.practice.as_deref(), Some(house.practice.text.as_str()));
    assert!(recheck("pack", inside.clone()).expect("a valid job").stands());
    // One changed sign of it is told, even in a remark.
    let changed = inside.practice.clone().map(|text| text.replacen("on a drawing", "on a Drawing", 1));
    let found = recheck("pack", Held { practice: changed, ..inside.clone() }).expect("a valid job");
    assert!(found.same_job && !found.same_practice && !found.stands());
    let gone = recheck("pack", Held { practice: None, ..inside.clone() }).expect("a valid job");
    assert!(!gone.same_practice && !gone.stands());
    let broken = recheck("pack", Held { practice: Some("[".to_owned()), ..inside }).map(|_| ());
    assert!(broken.expect_err("no TOML").to_string().contains(PRACTICE));
}

/// A factor of the practice counts where the job states none, with its reason; the job's own prevails.
#[test]
fn factors_of_the_practice_count_where_the_job_is_silent() {
    let practice = plain("[basis]\nhelping_factor = { value = 0.85, reason = \"walls are weighed by eye\" }");
    let silent = jobs::START.replacen("helping_factor = 0.9", "# helping_factor = 0.9", 1);
    assert_ne!(silent, jobs::START);
    let factor = |text: &str| {
        let b = draw_for("job.toml", text, Some(&practice)).expect("a valid job").0;
        (b.basis.helping_factor.value, b.basis.helping_factor.reason)
    };
    assert_eq!(factor(&silent), (0.85, "By the practice's file: walls are weighed by eye".to_owned()));
    assert_eq!(factor(jobs::START), (0.9, String::new()));
    let ratio = |text: &str, practice: Option<&Practice>| {
        let results = draw_for("job.toml", text, practice).expect("a valid job").1;
        let all = results.sections.iter().flat_map(|s| &s.sheet.verdicts);
        all.filter(|v| v.words.starts_with("sliding")).map(|v| v.ratio).fold(0.0, f64::max)
    };
    // Sliding is resisted by helping dead load alone: the use grows as the factor falls.
    let (own, house) = (ratio(&silent, None), ratio(&silent, Some(&practice)));
    assert!((house / own - 0.9 / 0.85).abs() < 1e-9, "{own} {house}");
}

#[test]
fn padstones_of_the_practice_serve_jobs_that_give_none() {
    let stone = |name: &str| {
        format!(
            "[[padstones]]\nname = \"{name}\"\nlength = \"440 mm\"\nwidth = \"100 mm\"\nheight = \"215 mm\"\nstrength = \"30 N/mm2\"\n"
        )
    };
    let practice = plain(&stone("EA1"));
    let without: String = jobs::START.split("\n[[padstones]]").next().expect("a text").to_owned()
        + jobs::START.rsplit("\n[[padstones]]").next().expect("a text").split_once("\n\n").expect("more").1;
    let names = |text: &str| -> Vec<String> {
        let b = draw_for("job.toml", text, Some(&practice)).unwrap_or_else(|e| panic!("{e}")).0;
        b.padstones.into_iter().map(|p| p.name).collect()
    };
    assert_eq!(names(&without), ["EA1"]);
    let own = names(jobs::START);
    assert!(!own.is_empty() && !own.contains(&"EA1".to_owned()), "{own:?}");
}

/// Our own templates with one file of a practice in place of ours.
fn with_template(path: &str, text: String) -> House {
    let practice = plain("[style]\ntemplates = \"t\"");
    let assets = Assets { templates: vec![(path.to_owned(), text.into_bytes())], ..Assets::default() };
    House::new(practice, assets).expect("a practice")
}

fn ours(path: &str) -> String {
    std::fs::read_to_string(Path::new("templates").join(path)).expect("a template")
}

#[test]
fn no_template_may_leave_out_what_every_pack_must_say() {
    let without = |path: &str, line: &str| {
        let text = ours(path);
        let rest: String = text.lines().filter(|l| !l.contains(line)).map(|l| format!("{l}\n")).collect();
        assert_ne!(rest, text, "{line}");
        made(jobs::START, &with_template(path, rest)).expect_err("a pack that leaves something out")
    };
    let cautions = without("pack.typ", "#cautions(");
    assert!(cautions.contains("leave out what every pack must say"), "{cautions}");
    assert!(cautions.contains("Temporary support comes before any masonry is cut"), "{cautions}");
    assert!(cautions.contains("take `templates` out"), "{cautions}");
    assert!(without("pack.typ", "#assumptions(").contains("leave out"));
    assert!(without("pack.typ", "#outcome(").contains("leave out"));
    let unsigned = without("parts/furniture.typ", "firm(unsigned)");
    assert!(unsigned.contains("not valid unless signed (page 1)"), "{unsigned}");
    // A failure that is printed as something else is a failure that is left out.
    let scale = ours("parts/scale.typ")
        + "\n#let tone(verdict) = body => if verdict == body { [fine] } else { body }\n";
    let nib = jobs::demos().into_iter().find(|(name, _)| name == "short-nib").expect("a job that fails").1;
    let softened = made(&nib, &with_template("parts/scale.typ", scale)).expect_err("a softened failure");
    assert!(softened.contains(": not adequate"), "{softened}");
    // The same templates, whole, are taken.
    assert!(made(jobs::START, &with_template("pack.typ", ours("pack.typ"))).is_ok());
}

#[test]
fn a_template_sees_nothing_outside_its_world() {
    for (line, found) in [
        ("#read(\"/etc/passwd\")", "file not found"),
        ("#read(\"../../Cargo.toml\")", "pack.typ:1"),
        ("#import \"@preview/example:0.1.0\": thing", "pack.typ:1"),
        ("#datetime.today()", "pack.typ:1"),
        ("#while true { }", "pack.typ:1"),
    ] {
        let text = format!("{line}\n{}", ours("pack.typ"));
        let error = made(jobs::START, &with_template("pack.typ", text)).expect_err(line);
        assert!(error.contains(found), "{found} is not in\n{error}");
        assert!(error.contains("Mend the templates of the practice"), "{error}");
    }
}

/// What is there and cannot be read is not said: one word of a caution, hidden in each way that a template has.
#[test]
fn what_cannot_be_read_is_not_said() {
    let with = |how: &str| {
        let text = ours("pack.typ").replacen(
            "#cautions(",
            &format!("#show \"Temporary\": it => {how}\n#cautions("),
            1,
        );
        made(jobs::START, &with_template("pack.typ", text)).map(|pdf| pdf.len())
    };
    for hidden in [
        "text(fill: white, it)",
        "text(fill: rgb(0, 0, 0, 20), it)",
        "text(fill: gradient.linear(white, white), it)",
        "text(size: 2pt, it)",
        "box(std.scale(10%, it))",
        "box(move(dx: 400mm, it))",
        "box(clip: true, height: 0pt, it)",
        "box[#it#place(top + left, rect(width: 100%, height: 1em, fill: white))]",
        "box(fill: black, it)",
        // The rest of the page with it.
        "it\n#set page(fill: black)",
    ] {
        let error = with(hidden).expect_err(hidden);
        assert!(error.contains("Temporary support comes before any masonry is cut"), "{hidden}: {error}");
    }
    assert!(with("box(fill: black, text(fill: white, it))").is_ok(), "white on black can be read");
}

/// A last line that goes to a new sheet while it is on the last one: sheet numbers would name the wrong sheets.
#[test]
fn sheets_that_do_not_come_to_rest_are_refused() {
    let moving = "#metadata(none)<z>\n#context if counter(page).final().first() == query(<z>).first().location().page() \
                  { pagebreak() }\nend\n";
    let text = ours("pack.typ") + moving;
    let made = made(jobs::START, &with_template("pack.typ", text)).map(|pdf| pdf.len());
    let error = made.expect_err("sheets that move");
    assert!(error.contains("do not come to rest"), "{error}");
}
