//! What must hold for any valid job: monotone, mirrored, continuous, adding up, without faults.

mod bearings;
mod choices;
mod continuity;
mod flange;
mod floors;
mod footing;
mod found;
mod honest;
mod jobs;
mod loads;
mod margins;
mod margins_below;
mod outcome;
mod remedy;
mod returns;
mod sharing;
mod site;
mod whole;

use perpend::building::{BaseJoint, Building, FromAbove, Head, Load, Path, Return};
use perpend::checks::Job;
use perpend::checks::returns::build::{Change, Inputs, models};
use perpend::checks::returns::check::Check;
use perpend::checks::returns::matrix::Matrix;
use perpend::checks::returns::model::Model;
use perpend::checks::returns::run::{Ready, prepare};
use perpend::quantity::{Force, Length, Moment};
use perpend::standards::annex::Annex;
use perpend::trace::Sheet;
use proptest::prelude::*;

use super::examples::job::{BLOCK_140, with_return};

/// What the properties vary in a return.
#[derive(Clone, Debug)]
struct Case {
    l: f64,
    h: f64,
    bonded: bool,
    propped: bool,
    dpc: bool,
    path: u8,
    b_t: f64,
    /// Dead, imposed, uplift in kN; place over the length; eccentricity across, mm.
    loads: Vec<(f64, f64, f64, f64, f64)>,
    /// Force in kN and moment in kNm from above.
    above: (f64, f64),
    flange: (f64, f64, f64),
}

const RETURN: &str = r#"
[[returns]]
mark = "R1"
title = "Return"
build_up = "wall"
storey = "ground"
length = "600 mm"
height = "2.5 m"
base = "dpc"
head = "free"
path = "sideways"
tributary_width = "0.8 m"
restraint = "timber floor"
supported_wall_height = "5 m"

[[returns.loads]]
what = "beam"
dead = "1 kN"
imposed = "1 kN"
at = "1 mm"

[returns.junction]
to = "front wall"
bonded = true
proof = "seen"
words = "Bonded."
thickness = "140 mm"
left = "2 m"
right = "2 m"
dead = "9 kN/m"
"#;

/// The building of the text that all cases start from.
fn base() -> Building {
    perpend::job::read("properties.toml", &with_return(BLOCK_140, RETURN)).unwrap_or_else(|e| panic!("{e:?}"))
}

/// The building of a case.
fn building(c: &Case) -> Building {
    let mut b = base();
    let r: &mut Return = &mut b.returns[0];
    r.length = Length::new(c.l);
    r.height = Length::new(c.h);
    r.junction.bonded = c.bonded;
    r.junction.left = Length::new(c.flange.0);
    r.junction.right = Length::new(c.flange.1);
    r.junction.thickness = Length::new(c.flange.2);
    r.base = if c.dpc { BaseJoint::Dpc } else { BaseJoint::Bonded };
    r.head =
        if c.propped { Head::Propped(vec!["left wall".into(), "right wall".into()]) } else { Head::Free };
    r.path = [Path::Sideways, Path::UpAndDown, Path::Both][usize::from(c.path)];
    r.tributary_width = Length::new(c.b_t);
    r.from_above = FromAbove { force: Force::new(c.above.0 * 1e3), moment: Moment::new(c.above.1 * 1e6) };
    let pattern = r.loads[0].clone();
    r.loads = c
        .loads
        .iter()
        .map(|&(dead, imposed, uplift, at, across)| Load {
            dead: Force::new(dead * 1e3),
            imposed: Force::new(imposed * 1e3),
            uplift: Force::new(uplift * 1e3),
            at: Length::new(at * c.l),
            eccentricity: Length::new(across),
            ..pattern.clone()
        })
        .collect();
    b
}

/// Any return within reason: some adequate, some far from it.
fn any_case() -> impl Strategy<Value = Case> {
    let load = (1.0..60.0_f64, 0.0..30.0_f64, 0.0..1.0_f64, 0.0..1.0_f64, -20.0..20.0_f64);
    (
        (300.0..2500.0_f64, 2000.0..3000.0_f64, any::<bool>(), any::<bool>(), any::<bool>(), 0..3_u8),
        0.0..2.0_f64,
        prop::collection::vec(load, 1..3),
        (0.0..1.5_f64, 0.0..1.5_f64),
        (0.0..1500.0_f64, 0.0..1500.0_f64, 90.0..220.0_f64),
    )
        .prop_map(|((l, h, bonded, propped, dpc, path), b_t, loads, above, flange)| Case {
            l,
            h,
            bonded,
            propped,
            dpc,
            path,
            b_t: b_t * 1e3,
            loads,
            above,
            flange,
        })
}

/// Runs `with` on the inputs of return R1.
fn with_inputs<T>(b: &Building, with: impl FnOnce(&Inputs<'_>) -> T) -> T {
    let job = Job::new(b);
    let Ok(worst) = job.wind.as_ref().map(|w| w.worst) else { panic!("wind") };
    with(&Inputs { building: b, ret: &b.returns[0], wind: worst, storey: job.sharing(), annex: &job.annex })
}

/// Model and matrix of the return, `None` where it is outside the method before any case.
fn worked(b: &Building, change: Change) -> Option<(Model, Ready, Matrix)> {
    with_inputs(b, |i| {
        let m = models(&mut Sheet::silent(), i, change).ok()?.remove(0);
        let ready = prepare(&mut Sheet::silent(), &m, &Annex::UK)?;
        let matrix = Matrix::run(&m, &Annex::UK, ready);
        Some((m, ready, matrix))
    })
}

/// The worst ratio of each check that applies; `NaN` where a check gave no verdict.
fn worst(matrix: &Matrix) -> Vec<(Check, f64)> {
    let of = |k: usize| matrix.ratios.iter().map(|r| r[k]).fold(f64::NAN, f64::max);
    matrix.checks.iter().enumerate().map(|(k, &c)| (c, of(k))).collect()
}
