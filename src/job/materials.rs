//! `[materials]` and `[build_ups]`: masonry by name, and walls built of it.

use super::limits::{Limits, Odd};
use super::names::{Names, Seen};
use super::reader::Table;
use super::words::{GROUPS, MORTARS, PERPENDS, STRENGTHS, UNITS};
use crate::building::{BuildUp, Leaf, Material, UnitStrength};
use crate::error::Kind;
use crate::quantity::{Length, Stress};
use crate::standards::masonry::{Mortar, UnitKind};

pub(super) const UNIT_STRENGTH: Limits = Limits::new(0.5, 200.0, "N/mm2").odd(&[
    Odd::Below(1.5, "weaker than any unit sold"),
    Odd::Above(125.0, "stronger than engineering brick"),
]);
pub(super) const UNIT_HEIGHT: Limits = Limits::new(30.0, 600.0, "mm");
pub(super) const UNIT_WIDTH: Limits = Limits::new(40.0, 600.0, "mm");
pub(super) const ABSORPTION: Limits =
    Limits::new(0.5, 50.0, "%").odd(&[Odd::Above(30.0, "more than clay bricks take up")]);
pub(super) const DENSITY: Limits = Limits::new(4.0, 30.0, "kN/m3");
pub(super) const F_B: Limits = Limits::new(0.5, 200.0, "N/mm2");
pub(super) const F_K: Limits =
    Limits::new(0.1, 60.0, "N/mm2").odd(&[Odd::Above(20.0, "high for a masonry wall")]);
pub(super) const F_VK0: Limits = Limits::new(0.0, 1.0, "N/mm2")
    .odd(&[Odd::Above(0.3, "more than the tables give, so a test must stand behind it")]);
pub(super) const F_XK: Limits = Limits::new(0.0, 3.0, "N/mm2")
    .odd(&[Odd::Above(2.0, "more than the tables give, so a test must stand behind it")]);

/// Usual weight of masonry in kN/m3 by kind of unit. Common practice, no published source: it only
/// raises a warning.
const USUAL_WEIGHT: &[(UnitKind, f64, f64)] = &[
    (UnitKind::ClayBrick, 14.0, 23.0),
    (UnitKind::CalciumSilicateBrick, 16.0, 22.0),
    (UnitKind::ConcreteBrick, 16.0, 24.0),
    (UnitKind::AggregateBlock, 6.0, 23.0),
    (UnitKind::AacBlock, 4.0, 9.0),
    (UnitKind::ManufacturedStone, 17.0, 25.0),
    (UnitKind::NaturalStone, 17.0, 30.0),
];

pub(super) const THICKNESS: Limits = Limits::new(40.0, 600.0, "mm")
    .odd(&[Odd::Below(75.0, "thin for a wall that carries or braces: plaster and render are not masonry")]);
pub(super) const CHASE: Limits = Limits::new(0.0, 100.0, "mm");
pub(super) const CAVITY: Limits = Limits::new(10.0, 300.0, "mm")
    .odd(&[Odd::Below(40.0, "narrow for a cavity"), Odd::Above(200.0, "wide for a cavity")]);
/// 2.5 ties per square metre is the usual least (from memory, check against PD 6697); it only raises a warning.
pub(super) const TIES: Limits = Limits::new(0.2, 20.0, "per m2").odd(&[
    Odd::Below(2.5, "fewer than the usual 2.5 per m2"),
    Odd::Above(6.0, "more than walls usually have"),
]);
pub(super) const TIE_STRENGTH: Limits = Limits::new(0.1, 20.0, "kN");

/// Least thickness that a chase may leave.
const LEAST_LEFT: Length = Length::new(40.0);

/// Reads one material; its name is that of its table.
pub fn material(name: &str, t: &Table<'_>) -> Option<Material> {
    let unit = t.need("unit").pick(UNITS);
    let group = t.need("group").whole(GROUPS);
    let strength = unit_strength(t);
    let laid_flat = t.may("laid_flat").flag().unwrap_or(false);
    let mortar = t.need("mortar").pick(MORTARS);
    let water_absorption = t.may("water_absorption").quantity(&ABSORPTION).map(crate::quantity::Num::base);
    let density = t.need("density").quantity(&DENSITY);
    let perpends_filled = t.may("perpends").pick(PERPENDS).unwrap_or(true);
    let source = t.may("source").text();
    let f_b = t.may("f_b").cause(|e| e.quantity(&F_B));
    let f_k = t.may("f_k").cause(|e| e.quantity::<1, -2, 0>(&F_K));
    let f_vk0 = t.may("f_vk0").cause(|e| e.quantity(&F_VK0));
    let f_xk1 = t.may("f_xk1").cause(|e| e.quantity::<1, -2, 0>(&F_XK));
    let f_xk2 = t.may("f_xk2").cause(|e| e.quantity(&F_XK));
    t.finish();

    if let Some(unit) = unit {
        fits_unit(t, unit, mortar, laid_flat);
        let usual = USUAL_WEIGHT.iter().find(|(kind, ..)| *kind == unit);
        if let (Some((_, low, high)), Some(density)) = (usual, density) {
            let weight: f64 = crate::quantity::Weight::base(density) * 1e6;
            if weight < *low || weight > *high {
                let kind = t.peek("unit").unwrap_or_default();
                t.warn(format_args!(
                    "density is {weight:.1} kN/m3, outside the {low} to {high} kN/m3 usual for {kind}"
                ));
            }
        }
    }
    if let (Some(f_k), Some(UnitStrength::Mean { strength, .. } | UnitStrength::Normalised(strength))) =
        (&f_k, &strength)
        && f_k.value > *strength
    {
        t.clash("`f_k` of the wall is more than the strength of its units", "f_k", "strength")
            .allowed("at most the strength of the unit")
            .help("correct one of the two: a wall is weaker than its units");
    }
    if mortar == Some(Mortar::Lime) && f_xk1.as_ref().is_some_and(|c| c.value > Stress::ZERO) {
        t.warn("`f_xk1` is stated for lime mortar, which is otherwise taken to have none");
    }
    Some(Material {
        name: name.to_owned(),
        unit: unit?,
        group: group?,
        strength: strength?,
        laid_flat,
        mortar: mortar?,
        water_absorption,
        density: density?,
        perpends_filled,
        source,
        f_b,
        f_k,
        f_vk0,
        f_xk1,
        f_xk2,
    })
}

fn unit_strength(t: &Table<'_>) -> Option<UnitStrength> {
    let strength = t.need("strength").quantity(&UNIT_STRENGTH);
    let mean = t.need("strength_is").pick(STRENGTHS);
    let height = t.may("unit_height").quantity(&UNIT_HEIGHT);
    let width = t.may("unit_width").quantity(&UNIT_WIDTH);
    if mean == Some(false) {
        for key in ["unit_height", "unit_width"].into_iter().filter(|key| t.has(key)) {
            t.warn(format_args!("`{key}` is not used, because the strength given is the normalised one"));
        }
        return strength.map(UnitStrength::Normalised);
    }
    if mean == Some(true) {
        for key in ["unit_height", "unit_width"].into_iter().filter(|key| !t.has(key)) {
            t.fault(Kind::Contradiction, format_args!("the strength is the mean, but `{key}` is missing"))
                .at(t.place("strength_is"), "needs the size of the unit for the shape factor")
                .and(t.head(), format!("has no `{key}`"))
                .allowed("the mean strength with `unit_height` and `unit_width`, or the normalised strength")
                .help(format!("add {key} = \"... mm\", or give the normalised strength"));
        }
    }
    mean?;
    Some(UnitStrength::Mean { strength: strength?, height: height?, width: width? })
}

fn fits_unit(t: &Table<'_>, unit: UnitKind, mortar: Option<Mortar>, laid_flat: bool) {
    let kind = t.peek("unit").unwrap_or_default();
    let absorption = t.has("water_absorption");
    if absorption && unit != UnitKind::ClayBrick {
        t.clash(
            format_args!("`water_absorption` belongs to clay brick, not to {kind}"),
            "water_absorption",
            "unit",
        )
        .allowed("`water_absorption` with \"clay brick\" only")
        .help("take it out, or correct the unit");
    }
    let stated = t.has("f_xk1") && t.has("f_xk2");
    if unit == UnitKind::ClayBrick && !absorption && !stated && mortar.is_some_and(|m| m != Mortar::Lime) {
        t.fault(Kind::Missing, "clay brick without `water_absorption` has no flexural strength")
            .at(t.place("unit"), "clay brick")
            .allowed("`water_absorption`, or `f_xk1` and `f_xk2` each with a reason, or lime mortar")
            .help("add water_absorption = \"... %\"; where it is not known, 13 % enters the weakest row, over 12 %");
    }
    if laid_flat && unit != UnitKind::AggregateBlock {
        t.clash(format_args!("`laid_flat` belongs to aggregate blocks, not to {kind}"), "laid_flat", "unit")
            .allowed("`laid_flat` with \"aggregate block\" only")
            .help("take it out, or correct the unit");
    }
}

/// Reads one build-up; its name is that of its table.
pub fn build_up<'a>(name: &str, t: &Table<'a>, materials: &Names<'a, Material>) -> Option<BuildUp> {
    let cavity = t.may("cavity").quantity(&CAVITY);
    let ties = t.may("ties").quantity(&TIES);
    let tie_strength = t.may("tie_strength").cause(|e| e.quantity(&TIE_STRENGTH));
    let collar_joint = t.may("collar_joint").flag();
    let tables = t.need("leaves").tables(&format!("{}, leaf", t.name), "");
    let leaves: Vec<Option<Leaf>> =
        tables.iter().map(|leaf_table| leaf(leaf_table, tables.len(), materials)).collect();
    t.finish();

    if tables.len() > 2 {
        t.fault(Kind::NotAllowed, format_args!("it has {} leaves", tables.len()))
            .at(tables[2].head(), "one too many")
            .allowed("one leaf, or two with a cavity")
            .help("lining and insulation are not leaves: take them out");
    }
    if tables.len() == 2 && !t.has("cavity") {
        t.fault(Kind::Contradiction, "it has two leaves and no `cavity`")
            .at(t.head(), "has no `cavity`")
            .and(tables[1].head(), "the second leaf")
            .allowed("one leaf, or two with a cavity")
            .help("add cavity = \"... mm\"; a solid wall is one leaf of its whole thickness");
    }
    if tables.len() == 1 {
        for key in ["cavity", "ties", "tie_strength"].into_iter().filter(|key| t.has(key)) {
            t.fault(Kind::Contradiction, format_args!("it has one leaf and `{key}`"))
                .at(t.place(key), format!("`{key}`"))
                .and(tables[0].head(), "the only leaf")
                .allowed("cavity and ties with two leaves only")
                .help("add the other leaf, or take this line out");
        }
    }
    if tables.len() == 2 && !t.has("ties") {
        t.warn("`ties` are not given, so nothing shows that the leaves act together");
    }
    one_loaded(t, &tables);
    if let (true, Some(Some(leaf))) = (tables.len() == 1, leaves.first()) {
        inner_joint(t, collar_joint, &tables[0], leaf, materials);
    } else if collar_joint.is_some() && tables.len() == 2 {
        t.clash("a wall of two leaves has a cavity and no collar joint", "collar_joint", "leaves")
            .allowed("`collar_joint` in a solid wall of one leaf")
            .help("take `collar_joint` out");
    }
    Some(BuildUp {
        name: name.to_owned(),
        leaves: leaves.into_iter().collect::<Option<Vec<_>>>().filter(|l| matches!(l.len(), 1 | 2))?,
        cavity,
        ties,
        tie_strength,
        collar_joint: collar_joint.unwrap_or(false),
    })
}

fn leaf<'a>(t: &Table<'a>, count: usize, materials: &Names<'a, Material>) -> Option<Leaf> {
    let material = materials.refer(&t.need("material"));
    let whole: Option<Length> = t.need("thickness").quantity(&THICKNESS);
    let chase: Option<Length> = t.may("chase").quantity(&CHASE);
    let loaded = t.may("loaded").flag();
    t.finish();
    let chase = chase.unwrap_or(Length::ZERO);
    let whole = whole?;
    if chase.base() > 0.0 && whole - chase < LEAST_LEFT {
        t.clash("the chase leaves less than 40 mm of the leaf", "chase", "thickness")
            .allowed("a chase that leaves 40 mm")
            .help("correct the depth of the chase, or its leaf");
    } else if chase * 3.0 > whole {
        t.warn("the chase is deeper than a third of the leaf");
    }
    Some(Leaf { material: material?, thickness: whole - chase, chase, loaded: loaded.unwrap_or(count == 1) })
}

/// Exactly one leaf carries the floors; where two are marked, both are named.
fn one_loaded(t: &Table<'_>, leaves: &[Table<'_>]) {
    let yes = |leaf: &&Table<'_>| leaf.peek_flag("loaded") == Some(true);
    let no = |leaf: &Table<'_>| leaf.peek_flag("loaded") == Some(false);
    let loaded: Vec<_> = leaves.iter().filter(yes).collect();
    match (leaves.len(), loaded.as_slice()) {
        (_, [first, second, ..]) => {
            second
                .fault(Kind::Contradiction, "two leaves are marked as loaded")
                .at(second.place("loaded"), "loaded")
                .and(first.place("loaded"), "loaded as well")
                .allowed("exactly one loaded leaf")
                .help("mark the leaf that carries floor and roof; put loads on the other under [[returns.loads]]");
        }
        (2, []) => {
            t.fault(Kind::Missing, "neither leaf is marked as loaded")
                .at(t.head(), "two leaves")
                .allowed("exactly one loaded leaf")
                .help("add loaded = true to the leaf that carries floor and roof");
        }
        (1, []) if no(&leaves[0]) => {
            t.fault(Kind::Contradiction, "the only leaf is marked as not loaded")
                .at(leaves[0].place("loaded"), "not loaded")
                .and(leaves[0].head(), "the only leaf")
                .allowed("a single leaf is the loaded one")
                .help("take this line out");
        }
        _ => {}
    }
}

/// A wall thicker than its units has a mortar joint inside it, which lowers K (3.6.1.2(6)).
fn inner_joint<'a>(
    t: &Table<'a>,
    collar_joint: Option<bool>,
    leaf_table: &Table<'a>,
    leaf: &Leaf,
    materials: &Names<'a, Material>,
) {
    let Some(material) = materials.get(&leaf.material) else { return };
    let Some(Material { strength: UnitStrength::Mean { width, .. }, .. }) = &material.item else { return };
    let thick = leaf.thickness + leaf.chase;
    let several = thick > *width * 1.5;
    match collar_joint {
        None if several => t
            .fault(
                Kind::Missing,
                "the wall is thicker than its units, so a joint runs inside it, but `collar_joint` is not given",
            )
            .at(leaf_table.place("thickness"), "thickness of the wall")
            .and(material.table.place("unit_width"), "width of its units")
            .allowed("collar_joint = true (K is taken 0.8 times) or false")
            .help("add collar_joint = true to the build-up; false only where every unit runs through the wall"),
        Some(false) if several => {
            t.warn("`collar_joint` is false although the wall is thicker than its units");
        }
        Some(true) if !several => t
            .fault(Kind::Contradiction, "`collar_joint` is true, but the wall is as thick as one unit")
            .at(t.place("collar_joint"), "a joint inside the wall")
            .and(material.table.place("unit_width"), "width of its units")
            .allowed("a collar joint in a wall thicker than one unit")
            .help("take `collar_joint` out, or correct the width of the unit"),
        _ => {}
    }
    if thick < *width - Length::new(10.0) {
        t.warn("the leaf is thinner than its units are wide");
    }
}

/// Reads every named table of one sort.
pub fn by_name<'a, T>(
    what: &'static str,
    tables: Vec<(String, super::reader::Span, Table<'a>)>,
    mut read: impl FnMut(&str, &Table<'a>) -> Option<T>,
) -> Names<'a, T> {
    let mut names = Names::new(what);
    for (name, place, table) in tables {
        let item = read(&name, &table);
        names.refuse_twice(table.reader, &name, &place);
        names.push(Seen { name, place, table, item });
    }
    names
}
