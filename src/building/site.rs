//! The wind on the site: where it stands, what lies around it, and how the job reads it.

use super::{Along, Cause, Side, WindRoute};
use crate::quantity::{Area, Length, Speed, Stress};
use crate::standards::en1991_1_4::{Ground, Slope};
use crate::standards::masonry::TerrainCategory;

/// Wind on the site: the route that decides, and the figures of each route that were given.
#[derive(Clone, Debug)]
pub struct Wind {
    /// Which route decides.
    pub route: WindRoute,
    /// Route 1.
    pub stated: Option<StatedWind>,
    /// Routes 2 and 3.
    pub site: Option<Site>,
}

/// A net pressure with a written reason.
#[derive(Clone, Debug)]
pub struct StatedWind {
    /// Net on the building, for returns and storeys.
    pub overall: Stress,
    /// Net on a panel.
    pub panel: Stress,
    /// Why this figure.
    pub reason: String,
}

/// The site, for EN 1991-1-4 clause 4 and for the charts of the UK annex.
#[derive(Clone, Debug)]
pub struct Site {
    /// Map value of the basic wind velocity.
    pub v_map: Speed,
    /// Altitude above sea level; at the foot of the hill where orography counts.
    pub altitude: Length,
    /// Height of the building.
    pub height: Length,
    /// Size of the whole building with its neighbours along x and along y of the plan.
    pub size: (Length, Length),
    /// Season factor; default 1.0 with an empty reason.
    pub c_season: Cause<f64>,
    /// Yearly probability that the wind is stronger; default 0.02 with an empty reason.
    pub p: Cause<f64>,
    /// The ground.
    pub orography: Orography,
    /// Buildings upwind that lift the wind.
    pub town: Option<Town>,
    /// Whether windward and leeward pressures are taken as not fully correlated (0.85).
    pub lack_of_correlation: bool,
    /// A face that opens.
    pub dominant: Option<Dominant>,
    /// The roof, where its wind is worked out.
    pub roof: Option<Roof>,
    /// Exposure by direction; one without bearings for every direction.
    pub sectors: Vec<Sector>,
}

/// The ground around.
#[derive(Clone, Debug)]
pub enum Orography {
    /// No hill, with the reason.
    None(String),
    /// A factor, with the reason.
    Stated(Cause<f64>),
    /// A feature of Annex A.3.
    Feature(Feature),
}

/// A hill, ridge, cliff or escarpment.
#[derive(Clone, Debug)]
pub struct Feature {
    /// Which.
    pub form: Ground,
    /// Height of the feature.
    pub height: Length,
    /// Length of the slope upwind, along the wind.
    pub upwind: Length,
    /// Length of the slope downwind.
    pub downwind: Length,
    /// From the crest to the site, positive downwind.
    pub from_crest: Length,
    /// Where this was read, and by whom.
    pub words: String,
}

impl Feature {
    /// As Annex A.3 has it.
    pub const fn slope(&self) -> Slope {
        Slope {
            ground: self.form,
            height: self.height,
            upwind: self.upwind,
            downwind: self.downwind,
            from_crest: self.from_crest,
        }
    }
}

/// Buildings upwind, for the displacement height of A.5.
#[derive(Clone, Debug)]
pub struct Town {
    /// Their mean height.
    pub buildings: Length,
    /// From them to the building.
    pub apart: Length,
    /// Who saw it, and where.
    pub words: String,
}

/// A face whose openings dominate, 7.2.9(5).
#[derive(Clone, Debug)]
pub struct Dominant {
    /// The face.
    pub side: Side,
    /// Area of its openings.
    pub area: Area,
    /// Area of the openings of all other faces.
    pub others: Area,
    /// Which opening.
    pub words: String,
}

/// Form of a roof.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum RoofForm {
    /// Two slopes.
    Duopitch,
    /// One slope.
    Monopitch,
    /// Flat, sharp eaves.
    Flat,
}

/// The roof.
#[derive(Clone, Debug)]
pub struct Roof {
    /// Its form.
    pub form: RoofForm,
    /// Pitch, degrees; nil for a flat roof.
    pub pitch: f64,
    /// Direction of the ridge, or of the eaves of a single slope.
    pub ridge: Along,
    /// Height of the eaves.
    pub eaves: Length,
}

/// Exposure to wind from some directions.
#[derive(Clone, Debug)]
pub struct Sector {
    /// Degrees clockwise from north, multiples of 30; empty for any direction.
    pub bearings: Vec<u16>,
    /// Terrain category, for the terrain route.
    pub category: Option<TerrainCategory>,
    /// What was read from the charts.
    pub readings: Option<Readings>,
}

/// Factors read from UK Figures NA.7 and NA.8, with the distances they were read at.
#[derive(Clone, Debug)]
pub struct Readings {
    /// Exposure factor.
    pub c_e: f64,
    /// Correction in towns; none in the country.
    pub c_eT: Option<f64>,
    /// Distance to the shore upwind.
    pub shore: Length,
    /// Distance into the town upwind.
    pub into_town: Option<Length>,
    /// Who read them, and when.
    pub words: String,
}
