//! What is verified, in sheet order. A new check is one new file and one line in [`LIST`]; its place
//! in the list is its place in the pack.

pub mod bearings;
pub mod catalogue;
pub mod chain;
pub mod diaphragm;
pub mod floor_edge;
pub mod footings;
pub mod found;
pub mod links;
pub mod loads;
pub mod margins;
pub mod masonry;
pub mod materials;
pub mod outcome;
pub mod panels;
pub mod piers;
pub mod plan;
pub mod returns;
pub mod stability;
pub mod takedown;
pub mod whole;
pub mod wind;

mod bearing_sheet;
mod bearing_views;
mod panel_brings;
mod panel_cracks;
pub mod panel_sheet;
mod panel_views;
mod place;
mod return_sheet;
mod return_views;
mod shapes;
mod spans;

use crate::building::{Building, TakeDown, take_down};
use crate::sketch::Drawing;
use crate::standards::annex::Annex;
use crate::trace::{Fault, Outside, Sheet};
use crate::wind::{Wind, pressures};
use outcome::{About, Hold, Outcome};
use stability::Storey;

/// One section of the pack: a sheet with its drawings.
pub struct Section {
    /// Unique id, also the anchor: `wind`, `R1`.
    pub id: String,
    /// Mark of what is checked; empty for sheets about the whole job.
    pub mark: String,
    /// Title.
    pub title: String,
    /// The working.
    pub sheet: Sheet,
    /// Drawings named by the sheet's entries.
    pub drawings: Vec<Drawing>,
    /// Marks of what it is held by: what they wait for, it waits for.
    pub leans: Vec<String>,
}

impl Section {
    /// A section without a mark or drawings.
    pub fn plain(id: &str, title: &str, sheet: Sheet) -> Self {
        Self {
            id: id.to_owned(),
            mark: String::new(),
            title: title.to_owned(),
            sheet,
            drawings: Vec::new(),
            leans: Vec::new(),
        }
    }

    /// All whose hold points concern it, with commas between.
    pub fn concerns(&self) -> String {
        std::iter::once(&self.mark).chain(&self.leans).cloned().collect::<Vec<_>>().join(", ")
    }
}

/// What the checks work from: the building and what several of them need.
pub struct Job<'a> {
    /// The building.
    pub building: &'a Building,
    /// National values.
    pub annex: Annex,
    /// Wind on the site.
    pub wind: Result<Wind, Outside>,
    /// Loads led down, where its plan has floors.
    pub down: Option<TakeDown>,
    /// The storey's sharing, where it is given.
    pub storey: Option<Result<Storey, Outside>>,
    /// The whole building against wind, where its plan has floors.
    pub whole: Vec<whole::Direction>,
    /// Every length of wall between openings, where the plan has floors.
    pub piers: Vec<piers::Used>,
    /// Hold points, given and found.
    pub holds: Vec<Hold>,
    /// Marks of what earlier sheets did not find adequate.
    pub failing: Vec<String>,
    /// Marks of what earlier sheets left outside the method, and that does not fail.
    pub outside: Vec<String>,
    /// Whether drawings are wanted: they take longer than all checks together.
    pub drawn: bool,
}

impl<'a> Job<'a> {
    /// Works out what several checks need, on silent sheets.
    pub fn new(building: &'a Building) -> Self {
        let annex = Annex::UK;
        let wind = pressures(&mut Sheet::silent(), building, &annex);
        let storey = building.stability.as_ref().map(|st| {
            let pressures = stability::pressures(building, &wind.clone()?, st);
            stability::share(&mut Sheet::silent(), building, st, pressures, &annex)
        });
        let holds = outcome::holds(building);
        let down = take_down(building).and_then(Result::ok);
        let mut job = Self {
            building,
            annex,
            wind,
            down,
            storey,
            whole: Vec::new(),
            piers: Vec::new(),
            holds,
            failing: Vec::new(),
            outside: Vec::new(),
            drawn: true,
        };
        job.whole = whole::of(&job);
        let found = whole::holds(&job);
        outcome::add(&mut job.holds, found, &About::House);
        job.piers = piers::of(&job);
        let found = piers::holds(&job);
        outcome::add(&mut job.holds, found, &About::BeamEnds);
        let found = panel_sheet::holds(&job);
        outcome::add(&mut job.holds, found, &About::Panel);
        outcome::add(&mut job.holds, found::holds(building), &About::Plan);
        job
    }

    /// Mark of the hold point with this text.
    pub fn hold_of(&self, text: &str) -> Option<String> {
        self.holds.iter().find(|h| h.text == text).map(|h| h.mark.clone())
    }

    /// Drawings, where they are wanted.
    pub fn drawings<D: IntoIterator<Item = Drawing>>(&self, draw: impl FnOnce() -> D) -> Vec<Drawing> {
        if self.drawn { draw().into_iter().collect() } else { Vec::new() }
    }

    /// The storey's sharing, where it was given and could be worked out.
    pub fn sharing(&self) -> Option<&Storey> {
        self.storey.as_ref().and_then(|r| r.as_ref().ok())
    }
}

/// Names drawings on a sheet, beside each other.
fn named(s: &mut Sheet, drawings: &[Drawing]) {
    if !drawings.is_empty() {
        s.drawings(&drawings.iter().map(|d| d.name.as_str()).collect::<Vec<_>>());
    }
}

/// A check: what it adds to the pack.
type Check = fn(&Job<'_>) -> Vec<Section>;

/// Every check, in sheet order.
pub const LIST: &[Check] = &[
    margins::sections,
    plan::sections,
    found::sections,
    takedown::sections,
    loads::sections,
    wind::sections,
    materials::sections,
    stability::sections,
    whole::sections,
    piers::sections,
    return_sheet::sections,
    bearing_sheet::sections,
    panel_sheet::sections,
    floor_edge::sections,
    diaphragm::sections,
    chain::sections,
];

/// Everything that was checked.
pub struct Results {
    /// Sections in sheet order.
    pub sections: Vec<Section>,
    /// Hold points.
    pub holds: Vec<Hold>,
    /// The outcome of the whole job.
    pub outcome: Outcome,
    /// What is no verdict and belongs on the front sheets all the same.
    pub remarks: Vec<String>,
}

impl Results {
    /// Broken locks of any sheet: internal errors, none of which may reach paper.
    pub fn faults(&self) -> impl Iterator<Item = (&str, &Fault)> {
        self.sections.iter().flat_map(|s| s.sheet.faults.iter().map(move |f| (s.id.as_str(), f)))
    }
}

/// Checks a building and draws it.
pub fn run(building: &Building) -> Results {
    of(Job::new(building))
}

/// Checks a building without its drawings, for whoever wants the results alone.
pub fn results(building: &Building) -> Results {
    of(Job { drawn: false, ..Job::new(building) })
}

fn of(mut job: Job<'_>) -> Results {
    let mut sections: Vec<Section> = Vec::new();
    for check in LIST {
        let found = check(&job);
        // A sheet of several things names them with commas between.
        let marks = |s: &Section| s.mark.split(", ").map(str::to_owned).collect::<Vec<_>>();
        let (hold, fail): (Vec<&Section>, Vec<&Section>) =
            found.iter().partition(|s| outcome::holds_all(&s.sheet));
        job.failing.extend(fail.into_iter().flat_map(marks));
        job.outside.extend(hold.into_iter().filter(|s| !s.sheet.outside.is_empty()).flat_map(marks));
        sections.extend(found);
    }
    let outcome = outcome::of_job(&sections, &job.holds);
    let remarks = remarks(&job);
    Results { sections, holds: job.holds, outcome, remarks }
}

/// The house as it stands, where calculation does not show it, before and after alike.
fn remarks(job: &Job<'_>) -> Vec<String> {
    let told = |walls: Vec<String>, what: &str, sheet: &str| {
        let some = match walls.len() {
            0 => return None,
            1 => "1 length of wall".to_owned(),
            n => format!("{n} lengths of wall"),
        };
        Some(format!(
            "As the house stands: {some} used above 1 {what}, on the sheet \"{sheet}\"; the removal adds nothing to them"
        ))
    };
    [
        told(whole::as_it_stands(job), "against wind, each taken alone", "The whole building against wind"),
        told(
            piers::as_it_stands(job),
            "by vertical load, with the wind across where it reaches them",
            "Lengths of wall between openings",
        ),
    ]
    .into_iter()
    .flatten()
    .collect()
}

#[cfg(test)]
mod tests;
