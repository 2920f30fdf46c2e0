//! Plans that cannot be led down, and openings and floors that cannot be.

use super::read;

const PLAN: &str = include_str!("../../../jobs/end-terrace.toml");

/// A slip in the plan: what it is called, the text put for another, where the caret stands, what is said.
type Slip = (&'static str, &'static str, &'static str, &'static str, &'static [&'static str]);

const SLIPS: &[Slip] = &[
    (
        "floor without a wall at its edge",
        "to = [\"5.0 m\", \"8.0 m\"]\nspans = \"y\"\n\n[[plan.floors]]\nmark = \"RF\"",
        "to = [\"5.0 m\", \"8.6 m\"]\nspans = \"y\"\n\n[[plan.floors]]\nmark = \"RF\"",
        "\"F2\"",
        &[
            "no support at an edge over x = 0.00 m to",
            "3.40 |cross wall",
            "8.60 |nothing",
            "before the removal",
        ],
    ),
    (
        "floor that spans past everything",
        "to = [\"5.0 m\", \"3.4 m\"]\nspans = \"y\"",
        "to = [\"6.4 m\", \"3.4 m\"]\nspans = \"y\"",
        "\"F1\"",
        &["over x = 5.00 m to 6.40 m"],
    ),
    (
        "wall above nothing",
        "from = [\"0 m\", \"3.4 m\"]\nto = [\"5.0 m\", \"3.4 m\"]\nstoreys = [\"first\"]",
        "from = [\"0 m\", \"3.0 m\"]\nto = [\"5.0 m\", \"3.0 m\"]\nstoreys = [\"first\"]",
        "\"bedroom wall\"",
        &["in storey \"first\" nothing stands under it", "reaches no ground"],
    ),
    (
        "beam that ends beyond its bearing",
        "to = [\"3.90 m\", \"3.4 m\"]",
        "to = [\"5.60 m\", \"3.4 m\"]",
        "\"B1\"",
        &["the end near (5.60 m, 3.40 m) has no bearing", "once the wall is out"],
    ),
    (
        "opening at the end of a wall",
        "from = \"1.1 m\", width = \"1.8 m\"",
        "from = \"1.1 m\", width = \"3.9 m\"",
        "openings",
        &["opening 1 reaches the end of the wall", "5000 mm long"],
    ),
    (
        "openings that overlap",
        "from = \"2.4 m\", width = \"1.8 m\", sill",
        "from = \"1.4 m\", width = \"1.8 m\", sill",
        "openings",
        &["openings 1 and 2 overlap"],
    ),
    (
        "opening higher than its storey",
        "sill = \"0.9 m\", height = \"1.2 m\" },\n]\n\n[[plan.walls]]\nmark = \"front",
        "sill = \"1.9 m\", height = \"1.2 m\" },\n]\n\n[[plan.walls]]\nmark = \"front",
        "\"1.2 m\"",
        &["higher than its storey", "2.40 m together"],
    ),
    (
        "weight that is not in the list",
        "of = [\"timber floor with lath and plaster\"]",
        "of = [\"timber floor with lath and plasters\"]",
        "\"timber floor with lath and plasters\"",
        &["there is no weight", "write \"timber floor with lath and plaster\""],
    ),
    (
        "dead load twice",
        "of = [\"timber floor with lath and plaster\"]",
        "of = [\"timber floor with lath and plaster\"]\ndead = \"0.6 kN/m2\"",
        "\"0.6 kN/m2\"",
        &["the dead load is given twice"],
    ),
    (
        "dead load without a source",
        "source = \"Slates 0.75 kN/m2 on slope at 30 degrees, ceiling 0.25 kN/m2; snow by the job's own sheet.\"\n",
        "",
        "area_loads.roof",
        &["`source` is missing"],
    ),
    (
        "floor of nothing",
        "load = \"roof\"",
        "load = \"rooff\"",
        "\"rooff\"",
        &["there is no area load \"rooff\"", "write \"roof\""],
    ),
    (
        "floor without area",
        "from = [\"0 m\", \"3.4 m\"]\nto = [\"5.0 m\", \"8.0 m\"]",
        "from = [\"0 m\", \"3.4 m\"]\nto = [\"5.0 m\", \"3.4 m\"]",
        "[\"5.0 m\", \"3.4 m\"]",
        &["the floor has no area"],
    ),
    (
        "beam askew",
        "to = [\"3.90 m\", \"3.4 m\"]",
        "to = [\"3.90 m\", \"3.6 m\"]",
        "[\"3.90 m\", \"3.6 m\"]",
        &["neither along x nor along y"],
    ),
    (
        "wall askew under floors",
        "from = [\"0 m\", \"8.0 m\"]\nto = [\"5.0 m\", \"8.0 m\"]\nopenings",
        "from = [\"0 m\", \"8.0 m\"]\nto = [\"5.0 m\", \"8.2 m\"]\nopenings",
        "[\"5.0 m\", \"8.2 m\"]",
        &["neither along x nor along y"],
    ),
    (
        "return longer than its wall",
        "title = \"Length at the party wall\"",
        "title = \"Length at the party wall\"\nlength = \"1150 mm\"",
        "\"1150 mm\"",
        &["not as long as its wall on the plan", "950 mm long on the plan"],
    ),
    (
        "head held by the wall that comes out",
        "propped_by = [\"rear wall\", \"front wall\"]",
        "propped_by = [\"rear wall\", \"cross wall\"]",
        "\"cross wall\"",
        &["\"cross wall\" cannot prop it", "comes out"],
    ),
    (
        "panel between a wall along it",
        "between = [\"R2\", \"front wall\"]",
        "between = [\"R2\", \"party wall\"]",
        "\"party wall\"",
        &["runs along the panel"],
    ),
    (
        "panel between one wall and itself",
        "between = [\"R2\", \"front wall\"]",
        "between = [\"R2\", \"R2\"]",
        "[\"R2\", \"R2\"]",
        &["the panel would be 0 mm long"],
    ),
    (
        "neighbours not said",
        "neighbours = [\"left\"]                 # sides of the plan on which a neighbour adjoins; [] for none\n",
        "",
        "[plan]",
        &["`neighbours` is missing"],
    ),
    (
        "neighbour on no side",
        "neighbours = [\"left\"]",
        "neighbours = [\"west\"]",
        "\"west\"",
        &["\"left\", \"right\", \"down\" or \"up\""],
    ),
    (
        "storey that is not there",
        "storeys = [\"first\"]",
        "storeys = [\"second\"]",
        "\"second\"",
        &["there is no storey \"second\""],
    ),
];

#[test]
fn each_slip_in_a_plan_is_said_where_it_stands() {
    for (name, from, to, caret, said) in SLIPS {
        assert!(PLAN.contains(from), "{name}: the job has changed");
        let text = PLAN.replacen(from, to, 1);
        let Err(report) = read("plan.toml", &text) else { panic!("{name}: read without a word") };
        let shown = report.render(false);
        let records = report.records();
        let line = text.lines().nth(records[0].line - 1).unwrap_or_default();
        assert!(line[records[0].column - 1..].starts_with(caret) || line.contains(caret), "{name}: {shown}");
        for words in *said {
            assert!(shown.contains(words), "{name}: \"{words}\" is not said in\n{shown}");
        }
    }
}

#[test]
fn loads_given_by_hand_stay_as_they_are() {
    let text = PLAN.replacen(
        "[returns.junction]\nto = \"party wall\"",
        "[[returns.loads]]\nwhat = \"beam B1\"\ndead = \"20 kN\"\nimposed = \"13 kN\"\nat = \"875 mm\"\n\n[returns.junction]\nto = \"party wall\"",
        1,
    );
    let b = read("plan.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
    assert_eq!(b.returns[0].loads.len(), 1);
    assert_eq!(b.returns[0].loads[0].dead.base(), 20e3);
    assert!(b.returns[1].loads.iter().all(|l| l.source == crate::building::LED));
}
