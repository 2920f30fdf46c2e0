//! Numbers with dimensions: force, length and time, in newtons, millimetres and seconds.
//!
//! `Q<F, L, T>` holds one `f64` in the base units `N^F mm^L s^T`, so a stress in N/mm² is stored
//! as the number an engineer writes down. The compiler refuses to add a length to a force; a
//! product of two quantities has the product's dimension.
//!
//! * [`Q`] and its names ([`Length`], [`Stress`], …) in this file
//! * `ops`: `+ - * /` and the table of products
//! * [`functions`]: `min max sqrt sq cube exp ln pow`, and the visible steps to bare numbers
//! * [`Dyn`]: the same number with its dimension as data, for the trace
//! * [`mod@unit`]: units by name: reading `"900 mm"`, and the unit a value is printed in
//! * [`mod@print`]: digits: three significant, ratios rounded up
//! * [`colour`]: colours and their contrast

pub mod colour;
mod dynamic;
pub mod functions;
mod ops;
pub mod print;
pub mod unit;

pub use dynamic::{Dim, Dyn};

/// A quantity of dimension `N^F mm^L s^T`, held in those base units.
#[derive(Clone, Copy, PartialEq, PartialOrd, Default)]
pub struct Q<const F: i8, const L: i8, const T: i8>(f64);

/// A bare number: ratio, factor, strain.
pub type Num = Q<0, 0, 0>;
/// Length, mm.
pub type Length = Q<0, 1, 0>;
/// Area, mm².
pub type Area = Q<0, 2, 0>;
/// Section modulus or volume, mm³.
pub type Volume = Q<0, 3, 0>;
/// Second moment of area, mm⁴.
pub type Inertia = Q<0, 4, 0>;
/// Force, N; also a moment per unit length, N·mm/mm.
pub type Force = Q<1, 0, 0>;
/// Moment, N·mm.
pub type Moment = Q<1, 1, 0>;
/// Force per length, N/mm (equal to kN/m).
pub type LineLoad = Q<1, -1, 0>;
/// Stress or pressure, N/mm².
pub type Stress = Q<1, -2, 0>;
/// Weight per volume, N/mm³.
pub type Weight = Q<1, -3, 0>;
/// Number per area, 1/mm² (wall ties).
pub type PerArea = Q<0, -2, 0>;
/// Speed, mm/s.
pub type Speed = Q<0, 1, -1>;
/// Mass per volume, N·s²/mm⁴ (1 kg/m³ = 1e-12).
pub type Density = Q<1, -4, 2>;

impl<const F: i8, const L: i8, const T: i8> Q<F, L, T> {
    /// Zero of this dimension.
    pub const ZERO: Self = Self(0.0);

    /// The quantity that is `base` in newtons, millimetres and seconds.
    pub const fn new(base: f64) -> Self {
        Self(base)
    }

    /// The number in newtons, millimetres and seconds.
    pub const fn base(self) -> f64 {
        self.0
    }

    /// The same number with its dimension as data.
    pub const fn dynamic(self) -> Dyn {
        Dyn { value: self.0, dim: Dim { force: F, length: L, time: T } }
    }

    /// The absolute value.
    pub fn abs(self) -> Self {
        Self(self.0.abs())
    }

    /// Whether the number is neither infinite nor undefined.
    pub const fn is_finite(self) -> bool {
        self.0.is_finite()
    }
}

impl From<f64> for Num {
    fn from(value: f64) -> Self {
        Self(value)
    }
}

impl<const F: i8, const L: i8, const T: i8> std::fmt::Debug for Q<F, L, T> {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        write!(f, "{:?} N^{F} mm^{L} s^{T}", self.0)
    }
}
