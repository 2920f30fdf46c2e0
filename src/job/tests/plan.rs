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
        "outer wall that stops short of a corner",
        "from = [\"0 m\", \"0 m\"]\nto = [\"5.0 m\", \"0 m\"]",
        "from = [\"0 m\", \"0 m\"]\nto = [\"4.4 m\", \"0 m\"]",
        "\"rear wall\"",
        &[
            "the outside of storey \"ground\" does not close: it ends at (4.40 m, 0.00 m), 600 mm from \"flank wall\"",
            "free_end = true",
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
        "source = \"Slates 0.75 kN/m2 on slope at 30 degrees, ceiling 0.25 kN/m2; snow from RH's snow calculation, page 1.\"\n",
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
        "mark = \"R1\"\nhead",
        "mark = \"R1\"\nlength = \"1150 mm\"\nhead",
        "\"1150 mm\"",
        &["not as long as its wall on the plan", "842 mm long on the plan"],
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
        "[panels.after]\n",
        "[panels.after]\nbetween = [\"R2\", \"party wall\"]\n",
        "\"party wall\"",
        &["runs along the panel"],
    ),
    (
        "panel between one wall and itself",
        "[panels.after]\n",
        "[panels.after]\nbetween = [\"R2\", \"R2\"]\n",
        "[\"R2\", \"R2\"]",
        &["the panel would be 0 mm long"],
    ),
    (
        "panel that the plan does not show",
        "between = [\"R2\", \"front wall\"]",
        "between = [\"R1\", \"front wall\"]",
        "[\"R1\", \"front wall\"]",
        &[
            "the plan shows no such panel on \"flank wall\"",
            "[\"rear wall\", \"R2\"] or [\"R2\", \"front wall\"]",
            "give the panel by hand",
        ],
    ),
    (
        "one of two panels, not said which",
        "between = [\"R2\", \"front wall\"]\n\n[panels.before]\n",
        "\n[panels.before_]\n",
        "\"flank wall\"",
        &["the plan shows several panels on its wall", "[\"R2\", \"front wall\"]", "add `between`"],
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
        "[returns.junction]\nbonded = false\nproof = \"seen\"\nwords = \"Straight joint",
        "[[returns.loads]]\nwhat = \"beam B1\"\ndead = \"20 kN\"\nimposed = \"13 kN\"\nat = \"767 mm\"\n\n[returns.junction]\nbonded = false\nproof = \"seen\"\nwords = \"Straight joint",
        1,
    );
    let b = read("plan.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
    assert_eq!(b.returns[0].loads.len(), 1);
    assert_eq!(b.returns[0].loads[0].dead.base(), 20e3);
    assert!(b.returns[1].loads.iter().all(|l| l.source == crate::building::LED));
}

#[test]
fn what_the_job_leaves_out_comes_from_the_plan() {
    let b = read("plan.toml", PLAN).unwrap_or_else(|r| panic!("{}", r.render(false)));
    let r = &b.returns[1];
    assert_eq!((r.length.base(), r.tributary_width.base(), r.height.base()), (1117.5, 4000.0, 2450.0));
    assert_eq!((r.junction.to.as_str(), r.junction.thickness.base()), ("flank wall", 102.5));
    // Two storeys of wall are met, 2.70 and 2.40 m.
    assert_eq!(r.supported_wall_height.base(), 5100.0);
    // From 3.4 m plus half of 215 mm to the window at 5.2 m.
    assert_eq!(r.nearest_opening.map(|l| l.base()), Some(1692.5));
    // The flank wall carries no floor: 12.5 kN/m would be the two leaves, the loaded one has its own weight.
    assert!(r.junction.dead.base() > 5.0 && r.junction.dead.base() < 14.0, "{}", r.junction.dead.base());
    let of = |p: &crate::building::Panel| (p.mark.clone(), p.before.length.base(), p.after.length.base());
    let panels: Vec<_> = b.panels.iter().map(of).collect();
    assert_eq!(panels, [("P1".to_owned(), 4600.0, 4600.0), ("P2".to_owned(), 3400.0, 3400.0)]);
    assert_eq!(b.found.added, ["P2"]);
    assert!(b.panels[1].edges_taken && !b.panels[0].edges_taken);
}

#[test]
fn a_plan_alone_is_a_job() {
    let (a, z) = (PLAN.find("[[returns]]").unwrap_or(0), PLAN.find("[collapse]").unwrap_or(0));
    let text = format!("{}{}", &PLAN[..a], &PLAN[z..]);
    let links = text.find("[[links]]").unwrap_or(0);
    let after = text.find("[[assumptions]]").unwrap_or(0);
    let text = format!(
        "{}[[links]]\nlink = \"wind face\"\nproof = \"calculated\"\n\n{}",
        &text[..links],
        &text[after..]
    );
    let b = read("plan.toml", &text).unwrap_or_else(|r| panic!("{}", r.render(false)));
    assert_eq!(b.found.added, ["R1", "R2", "P1", "P2"]);
    assert!(b.returns.iter().all(|r| !r.loads.is_empty() && r.head == crate::building::Head::Free));
    assert!(b.panels.iter().all(|p| p.edges_taken));
}
