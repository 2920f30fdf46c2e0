//! A quantity whose dimension is data: what the trace stores and evaluates again.

use super::Q;

/// Exponents of newton, millimetre and second.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, Default)]
pub struct Dim {
    /// Exponent of N.
    pub force: i8,
    /// Exponent of mm.
    pub length: i8,
    /// Exponent of s.
    pub time: i8,
}

impl Dim {
    /// No dimension.
    pub const NONE: Self = Self {
        force: 0,
        length: 0,
        time: 0,
    };

    /// The dimension of a product.
    pub const fn times(self, other: Self) -> Self {
        Self {
            force: self.force + other.force,
            length: self.length + other.length,
            time: self.time + other.time,
        }
    }

    /// The dimension of a quotient.
    pub const fn over(self, other: Self) -> Self {
        Self {
            force: self.force - other.force,
            length: self.length - other.length,
            time: self.time - other.time,
        }
    }

    /// The dimension of a whole power.
    pub const fn power(self, n: i8) -> Self {
        Self {
            force: self.force * n,
            length: self.length * n,
            time: self.time * n,
        }
    }

    /// The dimension of an `n`th root, where every exponent divides by `n`.
    pub const fn root(self, n: i8) -> Option<Self> {
        if self.force % n == 0 && self.length % n == 0 && self.time % n == 0 {
            Some(Self {
                force: self.force / n,
                length: self.length / n,
                time: self.time / n,
            })
        } else {
            None
        }
    }
}

impl std::fmt::Display for Dim {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        write!(f, "N^{} mm^{} s^{}", self.force, self.length, self.time)
    }
}

/// A number in base units with its dimension.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Dyn {
    /// The number in newtons, millimetres and seconds.
    pub value: f64,
    /// Its dimension.
    pub dim: Dim,
}

impl Dyn {
    /// A bare number.
    pub const fn number(value: f64) -> Self {
        Self {
            value,
            dim: Dim::NONE,
        }
    }

    /// The typed quantity, where the dimension agrees.
    pub fn typed<const F: i8, const L: i8, const T: i8>(self) -> Option<Q<F, L, T>> {
        (self.dim
            == Dim {
                force: F,
                length: L,
                time: T,
            })
        .then_some(Q::new(self.value))
    }

    /// Equal to the last bit, dimension too.
    pub fn same(self, other: Self) -> bool {
        self.dim == other.dim && self.value.to_bits() == other.value.to_bits()
    }
}
