//! What the drawings of a return show, from its models and its worst cases.

use super::returns::Checked;
use super::returns::actions::{self, Case, Direction, Toe as Pressed};
use super::returns::build::Inputs;
use super::returns::check::Check;
use super::returns::in_plane;
use super::returns::margins;
use super::returns::matrix::Matrix;
use super::returns::model::{At, Model};
use super::shapes::{layers, leaf_material};
use crate::building::{BaseJoint, BuildUp, Building, Head, Path, Proof, Return, ShareBy};
use crate::quantity::print::Shown;
use crate::quantity::{Dyn, Force, Length, Stress as Pressure, print};
use crate::sketch::{
    Action, Curve, Drawing, Flange, Frame, Layer, MarginPlot, PlacedLoad, ReturnActions, ReturnElevation,
    ReturnSection, Side, Stress, Toe, Wind, margin_plot, return_actions, return_elevation, return_section,
};
use crate::standards::annex::Annex;
use crate::trace::Sheet;

/// Frames on the sheet, mm: elevation and section side by side, the diagram under the lower one.
const ELEVATION: Frame = Frame::new(100.0, 90.0);
const SECTION: Frame = Frame::new(62.0, 64.0);
const ACTIONS: Frame = Frame::new(62.0, 44.0);

/// The three drawings of a return.
pub fn drawings(b: &Building, r: &Return, checked: &Checked, annex: &Annex) -> Vec<Drawing> {
    let Some(build_up) = b.build_up(&r.build_up) else { return Vec::new() };
    // Where each leaf acts the loaded one is drawn.
    let loaded = if build_up.loaded().0 == 0 { "outer-" } else { "inner-" };
    let drawn = |m: &Model| m.leaf.is_empty() || m.leaf == loaded;
    let Some((m, matrix)) = checked.models.iter().find(|(m, _)| drawn(m)) else { return Vec::new() };
    let case = drawn_case(m, matrix.as_ref(), annex);
    let mut out = vec![
        return_elevation(&elevation(b, r, m, build_up, case, annex), ELEVATION),
        return_section(&section(b, r, m, matrix.as_ref(), build_up, annex), SECTION),
        return_actions(&diagram(r, m, case, annex), ACTIONS),
    ];
    // The case of the force is too long for a label beside it.
    out[0].caption = format!("{}; {}", out[0].caption, case.name());
    out[1].caption = format!("{}; {}", out[1].caption, worst(matrix.as_ref(), Check::Toe).name());
    out[2].caption.push_str("; moment of wind and tilt");
    if !m.sheared() && m.lateral.M_k.base() == 0.0 {
        // A held head passes its force on: there is nothing to draw along the height.
        out.truncate(2);
    }
    for (drawing, kind) in out.iter_mut().zip(["elevation", "section", "actions"]) {
        drawing.name = format!("{}-{kind}", r.mark);
    }
    out
}

/// Its largest use against its length and against the wind.
pub fn plots(i: &Inputs<'_>) -> Vec<Drawing> {
    let Some(course) = margins::course(i) else { return Vec::new() };
    let used = print::ratio(course.here);
    let mm = |l: f64| print::show("l", Length::new(l).dynamic());
    let kn = |q: f64| print::show("q_net", Pressure::new(q).dynamic());
    let plot = |kind: &str,
                assumption: &str,
                points: &[(f64, Option<f64>)],
                here: f64,
                print: &dyn Fn(f64) -> Shown| {
        let middle = points.len() / 2;
        let ticks = [0, middle, points.len().saturating_sub(1)];
        margin_plot(&MarginPlot {
            name: format!("{}-by-{kind}", i.ret.mark),
            mark: i.ret.mark.clone(),
            assumption: assumption.to_owned(),
            points: points.to_vec(),
            here: (here, course.here),
            printed: (print(here).to_string(), used.clone()),
            ticks: ticks.iter().filter_map(|&n| points.get(n)).map(|p| (p.0, print(p.0).value)).collect(),
        })
    };
    vec![
        plot("length", "length, mm", &course.by_length, i.ret.length.base(), &mm),
        plot("wind", "net overall pressure, kN/m²", &course.by_wind, i.wind.overall.base(), &kn),
    ]
}

fn worst(matrix: Option<&Matrix>, check: Check) -> Case {
    matrix
        .and_then(|x| {
            let k = x.checks.iter().position(|c| *c == check)?;
            x.worst(k).map(|i| x.cases[i])
        })
        .unwrap_or(Case::all()[0])
}

/// The case in which it would overturn first; where a held head leaves the foot without wind, that of the greatest
/// force at the head.
fn drawn_case(m: &Model, matrix: Option<&Matrix>, annex: &Annex) -> Case {
    if m.sheared() {
        return worst(matrix, Check::Overturning);
    }
    let at_head = |c: &Case| design(m, *c, annex).H_Ed.base();
    let greater = |a: Case, b: Case| if at_head(&b) > at_head(&a) { b } else { a };
    Case::all().into_iter().reduce(greater).unwrap_or(Case::all()[0])
}

fn show(symbol: &str, value: Dyn, words: &str) -> Action {
    Action::new(symbol, &print::show(symbol, value).to_string(), words)
}

fn wind(case: Case) -> Wind {
    if case.direction == Direction::ToFree { Wind::Toward } else { Wind::Away }
}

fn elevation(
    b: &Building,
    r: &Return,
    m: &Model,
    build_up: &BuildUp,
    case: Case,
    annex: &Annex,
) -> ReturnElevation {
    let design = design(m, case, annex);
    let (k, leaf) = build_up.loaded();
    let loads = r.loads.iter().filter(|l| l.leaf == k).enumerate().map(|(n, l)| PlacedLoad {
        x: l.at.base(),
        action: Action::new(
            &format!("N_{}", n + 1),
            &format!("{} + {}", kn(l.dead), print::show("Q", l.imposed.dynamic())),
            &l.what,
        ),
    });
    let flat = |f: Force| f > Force::ZERO;
    let through_floor = r.path == Path::UpAndDown;
    // Where the storey shares by stiffness the front of this return does not come into it.
    let by_stiffness = through_floor
        && b.stability
            .as_ref()
            .is_some_and(|st| st.share_by == ShareBy::Stiffness && st.walls.iter().any(|w| w.mark == r.mark));
    ReturnElevation {
        mark: r.mark.clone(),
        length: m.l.base(),
        height: m.h.base(),
        words: format!("{} {}", print::show("t", leaf.thickness.dynamic()), leaf_material(b, leaf).word()),
        wall: Side::Left,
        wall_layers: wall_layers(b, r),
        junction: match (r.junction.bonded, r.junction.proof) {
            (true, Proof::Assumed) => "bonded, assumed".to_owned(),
            (true, _) => "bonded".to_owned(),
            (false, _) => "not counted".to_owned(),
        },
        prop: match &r.head {
            Head::Free => None,
            Head::Propped(walls) => Some(walls.join(", ")),
        },
        dpc: r.base == BaseJoint::Dpc,
        removed: (b.removed.storey == r.storey).then_some(b.removed.length.base()),
        loads: loads.collect(),
        head_forces: if flat(design.H_Ed) {
            vec![show("H_Ed", design.H_Ed.dynamic(), "")]
        } else {
            Vec::new()
        },
        head_moment: (design.M_h.base() > 0.0).then(|| show("M_h", design.M_h.dynamic(), "from above")),
        line_load: (design.w_Ed.base() > 0.0).then(|| show("w_Ed", design.w_Ed.dynamic(), "")),
        tributary: (!by_stiffness).then_some(r.tributary_width.base()),
        through_floor,
        wind: wind(case),
    }
}

fn kn(f: Force) -> String {
    print::show("G", f.dynamic()).value
}

/// The wall that the return meets: a plan wall of that mark, or one leaf of the thickness given.
fn wall_layers(b: &Building, r: &Return) -> Vec<Layer> {
    let met = b.plan.iter().find(|w| w.mark == r.junction.to).and_then(|w| b.build_up(&w.build_up));
    match met {
        Some(build_up) => {
            let mut inside_first = layers(b, build_up);
            inside_first.reverse();
            inside_first
        }
        None => vec![Layer::Leaf {
            thickness: r.junction.thickness.base(),
            material: crate::sketch::hatch::Material::Block,
        }],
    }
}

fn section(
    b: &Building,
    r: &Return,
    m: &Model,
    matrix: Option<&Matrix>,
    build_up: &BuildUp,
    annex: &Annex,
) -> ReturnSection {
    let (k, _) = build_up.loaded();
    let all = layers(b, build_up);
    // A cavity lies between the leaves of the drawing.
    let loaded = if all.len() == 3 && k == 1 { 2 } else { 0 };
    ReturnSection {
        mark: r.mark.clone(),
        length: m.l.base(),
        layers: all,
        loaded,
        wall: Side::Left,
        wall_layers: wall_layers(b, r),
        bonded: r.junction.bonded,
        flange: m.flange.map(|f| Flange { width: f.b_f.base(), thickness: f.t_f.base() }),
        stress: matrix.and_then(|x| stress(m, x, annex)),
    }
}

/// The stress block of the case that uses the toe most.
fn stress(m: &Model, matrix: &Matrix, annex: &Annex) -> Option<Stress> {
    let case = worst(Some(matrix), Check::Toe);
    let mut s = Sheet::silent();
    let a = actions::at(&mut s, m, annex, case, At::Foot);
    let st = in_plane::stresses(&mut s, m, &a);
    let sigma = st.sigma_toe?;
    let (l, t_f) = (m.l, a.flange.map_or(Length::ZERO, |f| f.t_f));
    let free = a.toe == Pressed::Free;
    let depth = l + t_f;
    let whole = if free || a.flange.is_none() { st.l_c } else { st.l_c + t_f };
    let compressed = if whole > depth { depth } else { whole };
    let full = a.flange.is_none() && st.l_c >= l;
    // With a flange the straight line of stress may reach nought beyond the section.
    let beyond = a.flange.is_some() && st.c > depth;
    let heel = (full || beyond).then(|| {
        let e = l / 2.0 - st.a;
        let at = if beyond {
            sigma * (1.0 - (depth / st.c).base())
        } else {
            a.N_Ed / (m.t * l) * (1.0 - (e * 6.0 / l).base())
        };
        ((at / sigma).base(), show("sigma", at.dynamic(), ""))
    });
    Some(Stress {
        toe: if free { Toe::Free } else { Toe::Wall },
        // What was worked out is drawn to the millimetre, so that its label is exact.
        compressed: compressed.base().round(),
        middle: (l / 2.0).base(),
        resultant: if free { (l - st.a).base() } else { (st.a - t_f).base() }.round(),
        force: show("N_Ed", a.N_Ed.dynamic(), ""),
        at_toe: show("sigma", sigma.dynamic(), ""),
        at_heel: heel,
    })
}

fn design(m: &Model, case: Case, annex: &Annex) -> actions::Design {
    let mut s = Sheet::silent();
    let (.., gamma_W) = actions::factors(&mut s, case, annex, m.helping);
    actions::design(&mut s, m, annex, gamma_W)
}

/// Moment and shear of wind and tilt along the height; the moment of the vertical loads is constant
/// and stands beside it on the sheet.
fn diagram(r: &Return, m: &Model, case: Case, annex: &Annex) -> ReturnActions {
    let d = design(m, case, annex);
    let h = m.h;
    let moment = |z: Length| {
        if m.propped {
            d.M_h + d.w_Ed * z * (h - z) / 2.0
        } else {
            d.M_h + d.H_Ed * (h - z) + d.w_Ed * (h - z) * (h - z) / 2.0
        }
    };
    let shear = |z: Length| {
        if m.propped { d.w_Ed * (h / 2.0 - z) } else { d.H_Ed + d.w_Ed * (h - z) }
    };
    let places: Vec<Length> = (0..=20).map(|i| h * (f64::from(i) / 20.0)).collect();
    let value = |name: &str, q: Dyn| print::show(name, q).to_string();
    let mut printed: Vec<Length> = vec![Length::ZERO, h];
    if m.propped {
        printed.insert(1, h / 2.0);
    }
    ReturnActions {
        mark: r.mark.clone(),
        height: h.base(),
        propped: m.propped,
        case: case.name(),
        curves: vec![
            Curve {
                symbol: "M_W".to_owned(),
                words: "moment".to_owned(),
                samples: places.iter().map(|&z| (z.base(), moment(z).base() / 1e6)).collect(),
                values: printed.iter().map(|&z| (z.base(), value("M_W", moment(z).dynamic()))).collect(),
            },
            Curve {
                symbol: "V_Ed".to_owned(),
                words: "shear".to_owned(),
                samples: places.iter().map(|&z| (z.base(), shear(z).base() / 1e3)).collect(),
                values: [Length::ZERO, h]
                    .iter()
                    .map(|&z| (z.base(), value("V_Ed", shear(z).dynamic())))
                    .collect(),
            },
        ],
    }
}
