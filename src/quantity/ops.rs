//! `+ - * /` on quantities.
//!
//! Stable Rust cannot add const generics, so products come from a table: every pair of the
//! dimensions listed at the end. A product that the table lacks is a compile error that names both.

use std::ops::{Add, Div, Mul, Neg, Sub};

use super::{Num, Q};

impl<const F: i8, const L: i8, const T: i8> Add for Q<F, L, T> {
    type Output = Self;
    fn add(self, other: Self) -> Self {
        Self(self.0 + other.0)
    }
}

impl<const F: i8, const L: i8, const T: i8> Sub for Q<F, L, T> {
    type Output = Self;
    fn sub(self, other: Self) -> Self {
        Self(self.0 - other.0)
    }
}

impl<const F: i8, const L: i8, const T: i8> Neg for Q<F, L, T> {
    type Output = Self;
    fn neg(self) -> Self {
        Self(-self.0)
    }
}

impl<const F: i8, const L: i8, const T: i8> std::iter::Sum for Q<F, L, T> {
    fn sum<I: Iterator<Item = Self>>(items: I) -> Self {
        items.fold(Self::ZERO, Add::add)
    }
}

impl<const F: i8, const L: i8, const T: i8> Mul<f64> for Q<F, L, T> {
    type Output = Self;
    fn mul(self, factor: f64) -> Self {
        Self(self.0 * factor)
    }
}

impl<const F: i8, const L: i8, const T: i8> Mul<Q<F, L, T>> for f64 {
    type Output = Q<F, L, T>;
    fn mul(self, q: Q<F, L, T>) -> Q<F, L, T> {
        Q(self * q.0)
    }
}

impl<const F: i8, const L: i8, const T: i8> Div<f64> for Q<F, L, T> {
    type Output = Self;
    fn div(self, divisor: f64) -> Self {
        Self(self.0 / divisor)
    }
}

impl Add<f64> for Num {
    type Output = Self;
    fn add(self, other: f64) -> Self {
        Self(self.0 + other)
    }
}

impl Add<Num> for f64 {
    type Output = Num;
    fn add(self, other: Num) -> Num {
        Q(self + other.0)
    }
}

impl Sub<f64> for Num {
    type Output = Self;
    fn sub(self, other: f64) -> Self {
        Self(self.0 - other)
    }
}

impl Sub<Num> for f64 {
    type Output = Num;
    fn sub(self, other: Num) -> Num {
        Q(self - other.0)
    }
}

macro_rules! pair {
    ($f1:literal $l1:literal $t1:literal, $f2:literal $l2:literal $t2:literal) => {
        impl Mul<Q<$f2, $l2, $t2>> for Q<$f1, $l1, $t1> {
            type Output = Q<{ $f1 + $f2 }, { $l1 + $l2 }, { $t1 + $t2 }>;
            fn mul(self, other: Q<$f2, $l2, $t2>) -> Self::Output {
                Q(self.0 * other.0)
            }
        }
        impl Div<Q<$f2, $l2, $t2>> for Q<$f1, $l1, $t1> {
            type Output = Q<{ $f1 - $f2 }, { $l1 - $l2 }, { $t1 - $t2 }>;
            fn div(self, other: Q<$f2, $l2, $t2>) -> Self::Output {
                Q(self.0 / other.0)
            }
        }
    };
}

macro_rules! all_pairs {
    ($([$($a:literal)*])*; $list:tt) => { $(all_pairs!(@row [$($a)*] $list);)* };
    (@row [$f:literal $l:literal $t:literal] [$([$f2:literal $l2:literal $t2:literal])*]) => {
        $(pair!($f $l $t, $f2 $l2 $t2);)*
    };
}

macro_rules! dimensions {
    ($($d:tt)*) => { all_pairs!($($d)*; [$($d)*]); };
}

// Force, length, time: bare number, L to L⁶, 1/L to 1/L³, F/L⁴ to F·L³, F², speed and its square, density.
dimensions! {
    [0 0 0] [0 1 0] [0 2 0] [0 3 0] [0 4 0] [0 5 0] [0 6 0] [0 -1 0] [0 -2 0] [0 -3 0]
    [1 -4 0] [1 -3 0] [1 -2 0] [1 -1 0] [1 0 0] [1 1 0] [1 2 0] [1 3 0]
    [-1 0 0] [-1 1 0] [-1 2 0] [0 1 -1] [0 2 -2] [1 -4 2]
}

impl Div<Num> for f64 {
    type Output = Num;
    fn div(self, divisor: Num) -> Num {
        Q(self / divisor.0)
    }
}

impl PartialEq<f64> for Num {
    fn eq(&self, other: &f64) -> bool {
        self.0 == *other
    }
}

impl PartialOrd<f64> for Num {
    fn partial_cmp(&self, other: &f64) -> Option<std::cmp::Ordering> {
        self.0.partial_cmp(other)
    }
}
