//! Wind on the site: stated with a reason, by terrain category, or by the charts as the engineer reads them.
//!
//! * [`velocity`]: the peak pressure of the wind onto each side of the building
//! * [`walls`]: overall pressures along x and y; [`inside`]: internal pressure
//! * [`panels`]: net pressures on each panel by its place and size; [`roof`]: uplift and the part along the wind
//! * `tables`: all pressures in one place; [`routes`]: the routes side by side

pub mod inside;
pub mod panels;
pub mod place;
pub mod roof;
pub mod routes;
pub mod sides;
mod tables;
pub mod velocity;
pub mod walls;

use crate::building::{
    Along, Building, Panel, Return, Side, Site, StatedWind, WindRoute, line_of, storey_height,
};
use crate::given;
use crate::quantity::functions::max;
use crate::quantity::{Length, Stress};
use crate::solve::descent::Axis;
use crate::standards::annex::Annex;
use crate::trace::{Outside, Sheet};

/// Sides of the building, in the order in which everything here lists them.
pub const SIDES: [Side; 4] = [Side::Left, Side::Right, Side::Down, Side::Up];

/// Net characteristic pressures that a check takes.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Pressures {
    /// Overall, windward and leeward together: returns and storeys.
    pub overall: Stress,
    /// Net on a panel, the worst place and sign.
    pub panel: Stress,
}

/// Wind as the checks take it.
#[derive(Clone, Debug, PartialEq)]
pub struct Wind {
    /// Where neither direction nor place is known: the worst of all.
    pub worst: Pressures,
    /// What was worked out for the site, where it decides.
    pub derived: Option<Derived>,
}

/// What the site gives.
#[derive(Clone, Debug, PartialEq)]
pub struct Derived {
    /// Peak pressure of the wind onto each of [`SIDES`], with the bearing that governs.
    pub onto: [velocity::Onto; 4],
    /// Net overall pressures for wind along x and along y, the worse sense.
    pub along: [walls::Overall; 2],
    /// Every panel.
    pub panels: Vec<panels::Net>,
    /// The roof for wind along x and along y.
    pub roof: Option<[roof::Along; 2]>,
}

impl Derived {
    /// The worst of everything.
    pub fn worst(&self) -> Pressures {
        let overall = max(self.along[0].top, self.along[1].top);
        let panel = self.panels.iter().map(|p| p.worst).reduce(max).unwrap_or(Stress::ZERO);
        Pressures { overall, panel }
    }
}

impl Wind {
    /// Pressures for wind along a direction, at the top of the building.
    pub fn along(&self, along: Along) -> Pressures {
        let overall = self.derived.as_ref().map_or(self.worst.overall, |d| d.along[along as usize].top);
        Pressures { overall, ..self.worst }
    }

    /// Pressures for wind along a direction on what the floor over storey `k` collects.
    pub fn level(&self, b: &Building, along: Along, k: usize) -> Pressures {
        let strips = self.derived.iter().flat_map(|d| &d.along[along as usize].strips);
        let top = collected_up_to(b, k);
        let own = strips.into_iter().find(|(strip, _)| top <= strip.to);
        own.map_or_else(|| self.along(along), |(_, overall)| Pressures { overall: *overall, ..self.worst })
    }

    /// Pressures for a return: its own, or those of [`Wind::site_at`].
    pub fn of_return(&self, b: &Building, r: &Return) -> Pressures {
        let site = self.site_at(b, r);
        let overall = r.wind.as_ref().map_or(site.overall, |stated| stated.value);
        Pressures { overall, ..site }
    }

    /// What the site gives for a return: the wind along it, where the plan or the storey says how it lies.
    pub fn site_at(&self, b: &Building, r: &Return) -> Pressures {
        let drawn = b.plan.iter().find(|w| w.mark == r.mark).and_then(line_of);
        let drawn = drawn.map(|p| if p.along == Axis::X { Along::X } else { Along::Y });
        let along = drawn.or(b.stability.as_ref().map(|s| s.wind_along));
        let storey = b.storeys.iter().position(|s| s.mark == r.storey);
        match (along, storey) {
            (Some(along), Some(k)) => self.level(b, along, k),
            _ => self.worst,
        }
    }

    /// Net pressure on a panel.
    pub fn of_panel(&self, p: &Panel) -> Stress {
        let net = self.derived.iter().flat_map(|d| &d.panels).find(|n| n.mark == p.mark);
        net.map_or(self.worst.panel, |n| n.worst)
    }

    /// Whether the wind that decides on a panel draws it outward.
    pub fn off_panel(&self, p: &Panel) -> bool {
        let net = self.derived.iter().flat_map(|d| &d.panels).find(|n| n.mark == p.mark);
        net.is_some_and(|n| n.outward > n.inward)
    }

    /// Force of the roof along the wind per length across it, where the roof is worked out.
    pub fn roof(&self, along: Along) -> Option<roof::Along> {
        self.derived.as_ref()?.roof.map(|r| r[along as usize])
    }
}

/// Returns and panels that state less wind than the site gives them, a sentence each.
pub fn stated_low(b: &Building) -> Vec<String> {
    let own = b.returns.iter().any(|r| r.wind.is_some()) || b.panels.iter().any(|p| p.wind.is_some());
    let Some(wind) = own.then(|| pressures(&mut Sheet::silent(), b, &Annex::UK).ok()).flatten() else {
        return Vec::new();
    };
    let words = |mark: &str, stated: Stress, site: Stress| {
        (stated < site * 0.995).then(|| {
            let show = |q: Stress| crate::quantity::print::show("q_net", q.dynamic());
            format!(
                "wind: {mark} states {}, less than the {} that the site gives there: whoever states it answers for the \
                 difference",
                show(stated),
                show(site)
            )
        })
    };
    let of_return = |r: &Return| words(&r.mark, r.wind.as_ref()?.value, wind.site_at(b, r).overall);
    let of_panel = |p: &Panel| words(&p.mark, p.wind.as_ref()?.value, wind.of_panel(p));
    b.returns.iter().filter_map(of_return).chain(b.panels.iter().filter_map(of_panel)).collect()
}

/// Height over ground of the wind face that the floor over storey `k` collects; the ground lies under the lowest floor
/// by what the building is higher than its storeys.
fn collected_up_to(b: &Building, k: usize) -> Length {
    let height = |k: usize| storey_height(b, k);
    let storeys: Length = (0..=k).map(height).sum();
    let over = if k + 1 < b.storeys.len() { height(k + 1) / 2.0 } else { b.storeys[k].total_height };
    let whole = b.storeys.first().map_or(Length::ZERO, |s| s.total_height);
    let plinth = b.wind.site.as_ref().map_or(Length::ZERO, |s| s.height - whole);
    storeys + over + max(plinth, Length::ZERO)
}

/// Works out the wind by the job's route; what the other gives stands beside it where it was given.
///
/// # Errors
/// [`Outside`] where the site leaves the range of EN 1991-1-4.
pub fn pressures(s: &mut Sheet, b: &Building, annex: &Annex) -> Result<Wind, Outside> {
    let derived = of_site(s, b, annex)?;
    let used = decided(s, b, annex, derived.as_ref());
    used.ok_or_else(|| Outside::new("wind", "EN 1991-1-4", "no wind is given"))
}

/// What the site gives, where the job describes it: by the route that decides; beside a stated pressure by the charts
/// where they were read, else by the terrain.
pub fn of_site(s: &mut Sheet, b: &Building, annex: &Annex) -> Result<Option<Derived>, Outside> {
    b.wind.site.as_ref().map(|site| by_route(s, b, site, by_charts(b, site), annex)).transpose()
}

fn by_charts(b: &Building, site: &Site) -> bool {
    match b.wind.route {
        WindRoute::Charts => true,
        WindRoute::Terrain => false,
        WindRoute::Stated => routes::described(site, true),
    }
}

/// The wind by the route that decides, with the others beside it.
pub fn decided(s: &mut Sheet, b: &Building, annex: &Annex, derived: Option<&Derived>) -> Option<Wind> {
    let wind = match (b.wind.route, &b.wind.stated, derived) {
        (WindRoute::Stated, Some(st), _) | (_, Some(st), None) => {
            Wind { worst: by_statement(s, st), derived: None }
        }
        (_, _, Some(d)) => Wind { worst: d.worst(), derived: Some(d.clone()) },
        (_, None, None) => return None,
    };
    let known = derived.zip(b.wind.site.as_ref()).map(|(d, site)| (d, by_charts(b, site)));
    routes::beside(s, b, annex, known);
    Some(wind)
}

fn by_statement(s: &mut Sheet, st: &StatedWind) -> Pressures {
    s.heading(1, "Stated");
    let source = format!("stated: {}", st.reason);
    given!(s, "net overall pressure, for returns and storeys", &source, q_net = st.overall);
    let overall = q_net;
    given!(s, "net pressure on a panel", &source, q_panel = st.panel);
    s.note("A stated pressure is an assumption: confirm it against the site.");
    Pressures { overall, panel: q_panel }
}

/// What the site gives by the charts, or else by the terrain.
fn by_route(
    s: &mut Sheet,
    b: &Building,
    site: &Site,
    charts: bool,
    annex: &Annex,
) -> Result<Derived, Outside> {
    let onto = velocity::onto(s, b, site, charts, annex)?;
    let along = walls::overall(s, site, &onto, charts, annex)?;
    let panels = panels::all(s, b, site, &onto)?;
    let roof = match &site.roof {
        Some(roof) => Some(roof::both(s, b, site, roof, &onto)?),
        None => None,
    };
    let derived = Derived { onto, along, panels, roof };
    tables::pressures(s, b, site, &derived);
    Ok(derived)
}
