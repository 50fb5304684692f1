//! A row of `f64` that moves through a formula together; the compiler turns it into vector instructions.
#![cfg_attr(not(test), allow(dead_code, reason = "so far only the tests run formulas on lanes"))]
#![allow(
    clippy::indexing_slicing,
    clippy::needless_range_loop,
    reason = "constant-length arrays under loops of the same length: no check remains, and chained iterators cost speed"
)]

use core::ops::{Add, Div, Mul, Neg, Sub};

use super::{Mask, Real};

/// `N` independent values of `T`.
#[derive(Clone, Copy, Debug)]
pub struct Lanes<T, const N: usize>(pub [T; N]);

// Plain loops that change an array in place: `array::map` and `array::from_fn` leave calls that are not made inline.
impl<T: Copy, const N: usize> Lanes<T, N> {
    #[inline(always)]
    fn each(mut self, f: impl Fn(T) -> T) -> Self {
        for value in &mut self.0 {
            *value = f(*value);
        }
        self
    }

    #[inline(always)]
    fn with(mut self, other: Self, f: impl Fn(T, T) -> T) -> Self {
        for i in 0..N {
            self.0[i] = f(self.0[i], other.0[i]);
        }
        self
    }

    #[inline(always)]
    fn compare<M: Mask>(self, other: Self, f: impl Fn(T, T) -> M) -> [M; N] {
        let mut mask = <[M; N]>::NONE;
        for i in 0..N {
            mask[i] = f(self.0[i], other.0[i]);
        }
        mask
    }
}

macro_rules! operator {
    ($($trait:ident $method:ident),*) => {$(
        impl<T: Real, const N: usize> $trait for Lanes<T, N> {
            type Output = Self;
            #[inline(always)]
            fn $method(self, other: Self) -> Self {
                self.with(other, T::$method)
            }
        }
    )*};
}
operator!(Add add, Sub sub, Mul mul, Div div);

impl<T: Real, const N: usize> Neg for Lanes<T, N> {
    type Output = Self;
    #[inline(always)]
    fn neg(self) -> Self {
        self.each(T::neg)
    }
}

impl<M: Mask, const N: usize> Mask for [M; N] {
    const NONE: Self = [M::NONE; N];

    #[inline(always)]
    fn and(mut self, other: Self) -> Self {
        for i in 0..N {
            self[i] = self[i].and(other[i]);
        }
        self
    }
    #[inline(always)]
    fn or(mut self, other: Self) -> Self {
        for i in 0..N {
            self[i] = self[i].or(other[i]);
        }
        self
    }
    #[inline(always)]
    fn not(mut self) -> Self {
        for value in &mut self {
            *value = value.not();
        }
        self
    }
    #[inline(always)]
    fn known(self) -> Option<bool> {
        None
    }
}

impl<T: Real, const N: usize> Real for Lanes<T, N> {
    type Mask = [T::Mask; N];

    const EPSILON: f64 = T::EPSILON;

    #[inline(always)]
    fn constant(value: f64) -> Self {
        Self([T::constant(value); N])
    }
    #[inline(always)]
    fn sqrt(self) -> Self {
        self.each(T::sqrt)
    }
    #[inline(always)]
    fn exp(self) -> Self {
        self.each(T::exp)
    }
    #[inline(always)]
    fn ln(self) -> Self {
        self.each(T::ln)
    }
    #[inline(always)]
    fn atan(self) -> Self {
        self.each(T::atan)
    }
    #[inline(always)]
    fn lt(self, other: Self) -> Self::Mask {
        self.compare(other, T::lt)
    }
    #[inline(always)]
    fn le(self, other: Self) -> Self::Mask {
        self.compare(other, T::le)
    }
    #[inline(always)]
    fn select(mask: Self::Mask, mut a: Self, b: Self) -> Self {
        for i in 0..N {
            a.0[i] = T::select(mask[i], a.0[i], b.0[i]);
        }
        a
    }
}
