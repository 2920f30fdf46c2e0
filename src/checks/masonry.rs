//! Strengths of a leaf of masonry: derived by the tables, or stated with a reason; the sheet says which.

use crate::building::{BuildUp, Building, Cause, Material, UnitStrength};
use crate::quantity::functions::{MPA, min, mpa, pow};
use crate::quantity::{Length, Num, Stress, Weight};
use crate::standards::annex::Annex;
use crate::standards::masonry::{Category, ExecutionClass, Group, Mortar, UnitKind};
use crate::standards::source::OutOfTable;
use crate::standards::tables::gamma_m::{Action, gamma_m};
use crate::standards::tables::{compressive, flexural, shear};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, lookup};

/// Strengths and factors of one leaf.
#[derive(Clone, Debug, PartialEq)]
pub struct Masonry {
    /// Material by name.
    pub name: String,
    /// Thickness the strengths were taken at.
    pub thickness: Length,
    /// Normalised unit strength.
    pub f_b: Stress,
    /// Characteristic compressive strength.
    pub f_k: Stress,
    /// Initial shear strength.
    pub f_vk0: Stress,
    /// Flexural strength, failure parallel to the bed joints.
    pub f_xk1: Stress,
    /// Flexural strength, failure across the bed joints; none for lime unless stated.
    pub f_xk2: Option<Stress>,
    /// Material factor, compression.
    pub gamma_c: Num,
    /// Material factor, flexure.
    pub gamma_f: Num,
    /// Material factor, shear.
    pub gamma_v: Num,
    /// Where it comes from.
    pub gamma_c_source: String,
    /// Where it comes from.
    pub gamma_f_source: String,
    /// Where it comes from.
    pub gamma_v_source: String,
    /// Weight per volume.
    pub density: Weight,
    /// Perpends filled.
    pub perpends_filled: bool,
}

/// Works out the strengths of `material` at `thickness` in `build_up` on the sheet.
///
/// # Errors
/// [`Outside`] where a table does not reach and no strength is stated.
pub fn derive(
    s: &mut Sheet,
    b: &Building,
    annex: &Annex,
    material: &Material,
    build_up: &BuildUp,
    thickness: Length,
) -> Result<Masonry, Outside> {
    let f_b = unit_strength(s, material)?;
    let f_k = compressive_strength(s, annex, material, build_up, f_b)?;
    let f_vk0 = match &material.f_vk0 {
        Some(stated) => {
            given!(s, "initial shear strength", &because(stated), f_vk0 = stated.value);
            f_vk0
        }
        None => {
            lookup!(
                s,
                "3.6.2(6), UK NA Table NA.5",
                "initial shear strength",
                f_vk0 = shear::f_vk0(material.unit, material.mortar),
                MPA
            );
            f_vk0
        }
    };
    let (f_xk1, f_xk2) = flexural_strengths(s, material, thickness)?;
    let [c, f, v] = factors(s, b);
    Ok(Masonry {
        name: material.name.clone(),
        thickness,
        f_b,
        f_k,
        f_vk0,
        f_xk1,
        f_xk2,
        gamma_c: c.0,
        gamma_f: f.0,
        gamma_v: v.0,
        gamma_c_source: c.1,
        gamma_f_source: f.1,
        gamma_v_source: v.1,
        density: material.density,
        perpends_filled: material.perpends_filled,
    })
}

fn because<T>(cause: &Cause<T>) -> String {
    format!("stated: {}", cause.reason)
}

fn outside(clause: &str, e: &OutOfTable) -> Outside {
    Outside::new("strength", clause, e.to_string())
}

fn unit_strength(s: &mut Sheet, material: &Material) -> Result<Stress, Outside> {
    if let Some(stated) = &material.f_b {
        given!(s, "normalised unit strength", &because(stated), f_b = stated.value);
        return Ok(f_b);
    }
    match material.strength {
        UnitStrength::Normalised(value) => {
            given!(s, "normalised unit strength", "job file", f_b = value);
            Ok(f_b)
        }
        UnitStrength::Mean { strength, height, width } => {
            given!(s, "mean unit strength, air dry", "job file", f_u = strength);
            let looked = compressive::shape_factor(height.base(), width.base())
                .map_err(|e| outside("EN 772-1 Table A.1", &e))?;
            lookup!(s, "EN 772-1 Table A.1", "shape factor", delta = looked, Num::new(1.0));
            calc!(s, "EN 772-1 Annex A", "normalised unit strength", f_b = delta * f_u);
            Ok(f_b)
        }
    }
}

fn compressive_strength(
    s: &mut Sheet,
    annex: &Annex,
    material: &Material,
    build_up: &BuildUp,
    f_b: Stress,
) -> Result<Stress, Outside> {
    if let Some(stated) = &material.f_k {
        given!(s, "characteristic compressive strength", &because(stated), f_k = stated.value);
        return Ok(f_k);
    }
    let group = if material.group == 2 { Group::Two } else { Group::One };
    let looked = compressive::k(material.unit, group, material.laid_flat)
        .map_err(|e| outside("UK NA Table NA.4", &e))?;
    lookup!(s, "3.6.1.2(2), UK NA Table NA.4", "constant K", K = looked, Num::new(1.0));
    let K = if build_up.collar_joint {
        given!(
            s,
            "factor for a joint parallel to the face",
            "3.6.1.2(6)",
            k_c = Num::new(compressive::COLLAR_JOINT)
        );
        given!(s, "constant K of the table", "above", K_t = K);
        calc!(s, "3.6.1.2(6)", "constant K, joint parallel to the face", K = k_c * K_t);
        K
    } else {
        K
    };
    let strength_source = match material.mortar {
        Mortar::Lime => "lime mortar: cautious assumption from memory (L)",
        _ => "EN 998-2, strength class",
    };
    given!(s, "mortar strength", strength_source, f_mc = material.mortar.f_m() * MPA);
    let limit = "3.6.1.2(2), UK NA";
    given!(s, "largest mortar strength that counts", limit, f_ml = annex.f_m_limit * MPA);
    given!(s, "largest unit strength that counts", limit, f_bm = annex.f_b_limit * MPA);
    calc!(s, limit, "mortar strength that counts", f_m = min(f_mc, min(f_ml, 2.0 * f_b)));
    calc!(s, limit, "unit strength that counts", f_bl = min(f_b, f_bm));
    calc!(
        s,
        "3.6.1.2(1) eq. 3.1",
        "characteristic compressive strength",
        f_k = K * pow(mpa(f_bl), 0.7) * pow(mpa(f_m), 0.3) * MPA
    );
    Ok(f_k)
}

fn flexural_strengths(
    s: &mut Sheet,
    material: &Material,
    thickness: Length,
) -> Result<(Stress, Option<Stress>), Outside> {
    let declared = match material.strength {
        UnitStrength::Mean { strength, .. } => strength,
        UnitStrength::Normalised(value) => value,
    };
    let unit = flexural::Unit {
        kind: material.unit,
        water_absorption: material.water_absorption.map(|w| w * 100.0),
        strength: declared.base(),
        thickness: thickness.base(),
    };
    let clause = "3.6.3(3), UK NA Table NA.6";
    let f_xk1 = match &material.f_xk1 {
        Some(stated) => {
            given!(
                s,
                "flexural strength, failure parallel to the bed joints",
                &because(stated),
                f_xk1 = stated.value
            );
            f_xk1
        }
        None => {
            let looked = flexural::f_xk1(&unit, material.mortar).map_err(|e| outside(clause, &e))?;
            lookup!(s, clause, "flexural strength, failure parallel to the bed joints", f_xk1 = looked, MPA);
            f_xk1
        }
    };
    let f_xk2 = match &material.f_xk2 {
        Some(stated) => {
            given!(
                s,
                "flexural strength, failure across the bed joints",
                &because(stated),
                f_xk2 = stated.value
            );
            Some(f_xk2)
        }
        // Lime mortar has none unless it is stated: no error, the panel checks then leave the method.
        None if material.mortar == Mortar::Lime => None,
        None => {
            let looked = flexural::f_xk2(&unit, material.mortar).map_err(|e| outside(clause, &e))?;
            lookup!(s, clause, "flexural strength, failure across the bed joints", f_xk2 = looked, MPA);
            Some(f_xk2)
        }
    };
    Ok((f_xk1, f_xk2))
}

/// Material factors: compression, flexure, shear, each with where it comes from.
/// Material factors of compression, flexure and shear, each with its source.
pub fn factors(s: &mut Sheet, b: &Building) -> [(Num, String); 3] {
    let category = if b.basis.unit_category == 1 { Category::One } else { Category::Two };
    let class = if b.basis.execution_class == 1 { ExecutionClass::One } else { ExecutionClass::Two };
    let source = |stated: &Option<Cause<f64>>| match stated {
        Some(c) => because(c),
        None => format!("UK NA Table NA.1, {category}, execution {class}"),
    };
    let basis = &b.basis;
    let value = |stated: &Option<Cause<f64>>, action| {
        Num::new(stated.as_ref().map_or_else(|| gamma_m(action, category, class).value, |c| c.value))
    };
    let (c, f, v) = (&basis.gamma_m_compression, &basis.gamma_m_flexure, &basis.gamma_m_shear);
    given!(s, "material factor, compression", &source(c), gamma_Mc = value(c, Action::Compression));
    given!(s, "material factor, flexure", &source(f), gamma_Mf = value(f, Action::Flexure));
    given!(s, "material factor, shear", &source(v), gamma_Mv = value(v, Action::Shear));
    [(gamma_Mc, source(c)), (gamma_Mf, source(f)), (gamma_Mv, source(v))]
}

/// A short name of a kind of unit for tables.
pub fn kind(unit: UnitKind) -> String {
    unit.to_string()
}
