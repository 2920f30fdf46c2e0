//! The functions a formula may call.
//!
//! Each has a twin of the same name in `trace::expr`, which evaluates the printed formula again; a
//! test holds the two lists against each other.

use super::{Area, Density, Force, Length, Num, Q, Speed, Stress};

/// One newton per square millimetre: turns a bare number into a stress.
pub const MPA: Stress = Q::new(1.0);
/// One millimetre.
pub const MM: Length = Q::new(1.0);
/// One kilonewton.
pub const KN: Force = Q::new(1e3);
/// One metre per second.
pub const M_S: Speed = Q::new(1e3);
/// One kilogram per cubic metre, as N·s²/mm⁴.
pub const KG_M3: Density = Q::new(1e-12);

/// The smaller of two quantities.
pub fn min<const F: i8, const L: i8, const T: i8>(a: Q<F, L, T>, b: Q<F, L, T>) -> Q<F, L, T> {
    Q(a.0.min(b.0))
}

/// The larger of two quantities.
pub fn max<const F: i8, const L: i8, const T: i8>(a: Q<F, L, T>, b: Q<F, L, T>) -> Q<F, L, T> {
    Q(a.0.max(b.0))
}

/// The absolute value.
pub fn abs<const F: i8, const L: i8, const T: i8>(a: Q<F, L, T>) -> Q<F, L, T> {
    Q(a.0.abs())
}

/// A quantity whose square has a name in the table of products.
pub trait Square: Copy + std::ops::Mul<Self> {}
impl<X: Copy + std::ops::Mul<X>> Square for X {}

/// `a²`.
pub fn sq<X: Square>(a: X) -> X::Output {
    a * a
}

/// `a³`.
pub fn cube<X: Square>(a: X) -> <X::Output as std::ops::Mul<X>>::Output
where
    X::Output: std::ops::Mul<X>,
{
    a * a * a
}

/// Square root, of a bare number or of an area.
pub trait Root {
    /// What the root yields.
    type Output;
    /// The square root.
    fn root(self) -> Self::Output;
}

impl Root for Num {
    type Output = Num;
    fn root(self) -> Num {
        Q(self.0.sqrt())
    }
}

impl Root for Area {
    type Output = Length;
    fn root(self) -> Length {
        Q(self.0.sqrt())
    }
}

/// The square root.
pub fn sqrt<X: Root>(x: X) -> X::Output {
    x.root()
}

/// The cube root of a volume, as the effective thickness of a cavity wall needs it.
pub fn cbrt(x: Q<0, 3, 0>) -> Length {
    Q(x.0.cbrt())
}

/// e to the power of a bare number.
pub fn exp(x: Num) -> Num {
    Q(x.0.exp())
}

/// Natural logarithm.
pub fn ln(x: Num) -> Num {
    Q(x.0.ln())
}

/// Logarithm to base 10.
pub fn log10(x: Num) -> Num {
    Q(x.0.log10())
}

/// `x` to the power `y`, both bare numbers.
pub fn pow(x: impl Into<Num>, y: impl Into<Num>) -> Num {
    Q(x.into().0.powf(y.into().0))
}

/// A stress as the bare number of N/mm², for an empirical formula.
pub fn mpa(x: Stress) -> Num {
    Q(x.0)
}

/// A length as the bare number of metres, for an empirical formula.
pub fn metres(x: Length) -> Num {
    Q(x.0 / 1e3)
}

/// An area as the bare number of square metres, for an empirical formula.
pub fn square_metres(x: Area) -> Num {
    Q(x.0 / 1e6)
}
