//! Every check by its sheet, with its clause and one line on what it compares: for `perpend checks`.
//!
//! Ids are those of the verdicts, without the number that tells repeated ones apart and without `-before` or `-after`.

/// A check that ends in a verdict.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Known {
    /// The kind of sheet that it stands on.
    pub on: &'static str,
    /// Ids of its verdicts.
    pub ids: &'static [&'static str],
    /// The clause, or what it rests on where no clause has it.
    pub clause: &'static str,
    /// What is compared.
    pub words: &'static str,
}

const fn known(
    on: &'static str,
    ids: &'static [&'static str],
    clause: &'static str,
    words: &'static str,
) -> Known {
    Known { on, ids, clause, words }
}

const RETURN: &str = "Return, wind in its plane and load on it";
const PANEL: &str = "Panel, wind across it, before and after the removal";
const BEARING: &str = "Bearing of a beam";
const FOOTING: &str = "Footing under a return";
const FLOOR: &str = "Floor and its edge";
const WHOLE: &str = "The whole building against wind";
const PIER: &str = "Lengths of wall between openings, before and after the removal";

/// All of them, in the order of the sheets. Clauses without a number of a standard are of EN 1996-1-1.
pub static ALL: &[Known] = &[
    known(
        WHOLE,
        &["alone-x", "alone-y"],
        "6.2, first principles",
        "each length of wall alone: does the removal leave it with more than it carries?",
    ),
    known(
        WHOLE,
        &["bracing-x", "bracing-y"],
        "6.2, first principles",
        "all bracing walls together against the wind on the house",
    ),
    known(PIER, &["pier-slenderness"], "5.5.1.4(2)", "effective height over effective thickness, at most 27"),
    known(
        PIER,
        &["pier-head", "pier-middle", "pier-foot"],
        "6.1.2.1(1) eq. 6.1",
        "vertical load against the resistance at head, middle and foot",
    ),
    known(PIER, &["pier-flexure"], "6.3.1, by analogy", "bending by wind at mid-height with the load on it"),
    known(PIER, &["pier-edge"], "first principles", "stress at the pressed edge at mid-height"),
    known(
        PIER,
        &["pier-other"],
        "6.1.2",
        "the largest use of the lengths of wall whose own sheets are not printed",
    ),
    known(RETURN, &["slenderness"], "5.5.1.4(2)", "effective height over effective thickness, at most 27"),
    known(
        RETURN,
        &["shear", "shear-head"],
        "6.2(1) eq. 6.12",
        "shear in plane on the compressed length, at foot and head",
    ),
    known(RETURN, &["sliding"], "first principles", "shear against friction at the damp-proof course"),
    known(
        RETURN,
        &["overturning"],
        "EN 1990 6.4.2, first principles",
        "overturning moment against the moment of the load about the edge",
    ),
    known(
        RETURN,
        &["toe", "middle"],
        "first principles, not a formula of the code",
        "load against the strength of a uniform stress block at the toe, at foot and mid-height",
    ),
    known(
        RETURN,
        &["middle", "middle-edge"],
        "6.3.1, by analogy",
        "or there, uncracked, the moment in plane against flexural strength with the load on it, and the stress at the \
         pressed edge (first principles)",
    ),
    known(
        RETURN,
        &["vertical-foot", "vertical-middle", "vertical-head"],
        "6.1.2.1(1) eq. 6.1",
        "vertical load against the resistance at foot, middle and head",
    ),
    known(
        RETURN,
        &["junction"],
        "3.6.2(7), 6.2",
        "vertical shear between a return and the flange that is counted",
    ),
    known(
        FOOTING,
        &["pressure"],
        "first principles; allowable stated",
        "pressure on the ground in each combination against the allowable pressure",
    ),
    known(
        BEARING,
        &["bearing"],
        "6.1.3(1) eq. 6.9",
        "load of the beam against masonry under the beam or its padstone",
    ),
    known(
        BEARING,
        &["padstone"],
        "EN 1992-1-1 12.6.1",
        "load of the beam against the concrete of the padstone",
    ),
    known(BEARING, &["middle"], "6.1.3(5), 6.1.2.1(1)", "vertical load against the wall at mid-height below"),
    known(
        PANEL,
        &["flexure", "vertical", "horizontal", "cantilever"],
        "6.3.1(2) eq. 6.14",
        "wind across the panel against bending across the bed joints, or of both leaves together (6.3.1(6))",
    ),
    known(
        PANEL,
        &["flexure-parallel"],
        "6.3.1(2) eq. 6.14",
        "wind across the panel against bending parallel to the bed joints",
    ),
    known(
        PANEL,
        &["limit"],
        "6.3.1, by limit analysis",
        "wind on the panel with its openings against the safe side, where the job has that decide; of both leaves together (6.3.1(6))",
    ),
    known(
        PANEL,
        &["pattern"],
        "limit analysis",
        "wind against the weakest crack pattern, where the hand route decides",
    ),
    known(PANEL, &["arching"], "6.3.2(5)", "wind on the panel as an arch between its supports"),
    known(PANEL, &["ties"], "6.5", "wind that the ties pass against their strength"),
    known(
        PANEL,
        &["leans", "brings"],
        "statics",
        "the returns that hold its ends: adequate, and counting as much wind as it brings",
    ),
    known(
        FLOOR,
        &["strap"],
        "2.4.1",
        "force on one strap against its strength with the masonry that holds it",
    ),
    known(FLOOR, &["none"], "statics", "a floor edge that nothing straps to the wall"),
    known(
        FLOOR,
        &["shear-flow"],
        "statics",
        "shear flow in the floor as a diaphragm against the strength stated",
    ),
];

/// Checks to which a verdict of this id may belong.
pub fn of(id: &str) -> impl Iterator<Item = &'static Known> {
    ALL.iter().filter(move |k| k.ids.iter().any(|name| fits(id, name)))
}

/// Whether an id is that of `name`, with the state, the leaf, a mark or a number behind it or nothing.
fn fits(id: &str, name: &str) -> bool {
    let Some(mut rest) = id.strip_prefix(name) else { return false };
    for end in ["-outer", "-inner", "-after"] {
        rest = rest.strip_prefix(end).unwrap_or(rest);
    }
    rest.is_empty()
        || rest.strip_prefix('-').is_some_and(|end| {
            end.chars().all(|c| c.is_ascii_digit()) || end.starts_with(|c: char| c.is_ascii_uppercase())
        })
}
