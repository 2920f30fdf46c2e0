//! The roof as a whole: its uplift, and its part along the wind.

use super::inside;
use super::velocity::Onto;
use crate::building::{self, Building, FloorKind, Roof, RoofForm, Site};
use crate::quantity::functions::max;
use crate::quantity::{Length, LineLoad, Stress};
use crate::standards::annex::Annex;
use crate::standards::en1991_1_4::roof::{self, RoofWind};
use crate::trace::{Outside, Sheet};
use crate::{calc, given, verify};

/// The roof under wind along one direction.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Along {
    /// Mean uplift per area on plan; below nought it presses.
    pub uplift: Stress,
    /// Force along the wind per length across it.
    pub force: LineLoad,
    /// Height of a gable that the wind meets, upright between the slopes; nil where it meets slopes or eaves.
    pub gable: Length,
}

/// The roof under wind along x and along y, and the uplift of the job's roofs against it.
///
/// # Errors
/// [`Outside`] of the tables of roofs.
pub fn both(
    s: &mut Sheet,
    b: &Building,
    site: &Site,
    roof: &Roof,
    onto: &[Onto; 4],
) -> Result<[Along; 2], Outside> {
    s.heading(1, "Roof");
    let heads = ["wind along x".to_owned(), "wind along y".to_owned()];
    let found = s.columns(&heads, |s, i| {
        given!(
            s,
            "peak pressure, the greater of both senses",
            "above",
            q_p = max(onto[2 * i].q_p, onto[2 * i + 1].q_p)
        );
        let (along, across) = if i == 0 { site.size } else { (site.size.1, site.size.0) };
        given!(s, "height to the ridge", "job file", h = site.height);
        given!(s, "depth along the wind", "job file", d = along);
        given!(s, "breadth across it", "job file", b = across);
        let r_hd = (h / d).base();
        let inside = |o: &Onto| inside::of(&mut Sheet::silent(), site, o.side, r_hd).map(|x| x.pressure);
        given!(
            s,
            "internal pressure",
            "7.2.9, as for the panels",
            c_pi = max(inside(&onto[2 * i])?, inside(&onto[2 * i + 1])?)
        );
        let direction = if i == 0 { building::Along::X } else { building::Along::Y };
        let on_eaves = direction != roof.ridge;
        let all: Vec<RoofWind> = match roof.form {
            RoofForm::Flat => vec![roof::flat(s, q_p, c_pi, h, b, d, roof.pitch)?],
            RoofForm::Duopitch if on_eaves => {
                vec![roof::duopitch_on_eaves(s, q_p, c_pi, h, b, d, roof.pitch)?]
            }
            RoofForm::Duopitch => vec![roof::duopitch_on_gable(s, q_p, c_pi, h, b, d, roof.pitch)?],
            RoofForm::Monopitch if on_eaves => vec![
                roof::monopitch_on_low_eaves(s, q_p, c_pi, h, b, d, roof.pitch)?,
                roof::monopitch_on_high_eaves(s, q_p, c_pi, h, b, d, roof.pitch)?,
            ],
            RoofForm::Monopitch => vec![roof::monopitch_on_side(s, q_p, c_pi, h, b, d, roof.pitch)?],
        };
        let nil = RoofWind { uplift: Stress::new(f64::NEG_INFINITY), along: LineLoad::ZERO };
        let most = all
            .into_iter()
            .fold(nil, |m, w| RoofWind { uplift: max(m.uplift, w.uplift), along: max(m.along, w.along) });
        Ok(Along {
            uplift: most.uplift,
            force: most.along,
            gable: if on_eaves || roof.form == RoofForm::Flat {
                Length::ZERO
            } else {
                site.height - roof.eaves
            },
        })
    });
    let all: Vec<Along> = found.into_iter().collect::<Result<_, _>>()?;
    let both = [all[0], all[1]];
    against_loads(s, b, both);
    Ok(both)
}

/// Whether an area load lies over a top storey.
fn is_roof(b: &Building, name: &str) -> bool {
    let over = |mark: &str| b.storey(mark).is_some_and(|x| x.floor_above == FloorKind::Roof);
    b.floors.iter().any(|f| f.load == name && over(&f.storey))
}

/// Gives the roofs of the plan the uplift of the wind where the job states none; yields the names of those
/// whose uplift nothing says.
pub fn lift(b: &mut Building) -> Vec<String> {
    let asks = |b: &Building, a: &building::AreaLoad| !a.uplift_given && is_roof(b, &a.name);
    if !b.area_loads.iter().any(|a| asks(b, a)) {
        return Vec::new();
    }
    // A site outside the method has no uplift; its sheet says so and nothing is adequate then.
    let Ok(wind) = super::pressures(&mut Sheet::silent(), b, &Annex::UK) else { return Vec::new() };
    let roof = wind.derived.and_then(|d| d.roof);
    let mut unknown = Vec::new();
    for n in 0..b.area_loads.len() {
        if !asks(b, &b.area_loads[n]) {
            continue;
        }
        match roof {
            Some([x, y]) => b.area_loads[n].uplift = max(max(x.uplift, y.uplift), Stress::ZERO),
            None => unknown.push(b.area_loads[n].name.clone()),
        }
    }
    unknown
}

/// The uplift with which the take-down works must cover the one of the wind.
fn against_loads(s: &mut Sheet, b: &Building, both: [Along; 2]) {
    for load in b.area_loads.iter().filter(|a| is_roof(b, &a.name)) {
        given!(
            s,
            "uplift for wind along x, not below nought",
            "above",
            q_ux = max(both[0].uplift, Stress::ZERO)
        );
        given!(s, "for wind along y", "above", q_uy = max(both[1].uplift, Stress::ZERO));
        calc!(s, "5.3", "uplift of the roof per area on plan, characteristic", q_W = max(q_ux, q_uy));
        if !load.uplift_given && load.uplift == q_W {
            s.note(format!("The load take-down works with this uplift of {}.", load.name));
            continue;
        }
        let source = format!("area load {}", load.name);
        given!(s, "uplift in the load take-down", &source, q_U = load.uplift);
        verify!(
            s,
            "roof-uplift",
            "5.3, 7.2.3 to 7.2.5",
            "uplift of the roof that the take-down works with",
            q_W <= q_U
        );
        if q_W > q_U {
            s.note(format!(
                "Write uplift = \"{:.2} kN/m2\" or more under [area_loads.{}]: dead load that the roof lifts does not help.",
                (q_W.base() * 1e5).ceil() / 100.0,
                load.name
            ));
        }
    }
}
