//! A row of `f64` that moves through a formula together; the compiler turns it into vector instructions.
#![allow(clippy::indexing_slicing, reason = "constant-length arrays under loops of the same length: no check remains")]

use core::ops::{Add, Div, Mul, Neg, Sub};

use super::{Mask, Real};

/// `N` independent values of `T`.
#[derive(Clone, Copy, Debug)]
pub struct Lanes<T, const N: usize>(pub [T; N]);

impl<T: Copy, const N: usize> Lanes<T, N> {
    #[inline(always)]
    fn zip<U: Copy, V>(self, other: Lanes<U, N>, f: impl Fn(T, U) -> V) -> [V; N] {
        core::array::from_fn(|i| f(self.0[i], other.0[i]))
    }
}

macro_rules! operator {
    ($($trait:ident $method:ident),*) => {$(
        impl<T: Real, const N: usize> $trait for Lanes<T, N> {
            type Output = Self;
            #[inline(always)]
            fn $method(self, other: Self) -> Self {
                Self(self.zip(other, T::$method))
            }
        }
    )*};
}
operator!(Add add, Sub sub, Mul mul, Div div);

impl<T: Real, const N: usize> Neg for Lanes<T, N> {
    type Output = Self;
    #[inline(always)]
    fn neg(self) -> Self {
        Self(self.0.map(T::neg))
    }
}

impl<M: Mask, const N: usize> Mask for [M; N] {
    #[inline(always)]
    fn and(self, other: Self) -> Self {
        core::array::from_fn(|i| self[i].and(other[i]))
    }
    #[inline(always)]
    fn or(self, other: Self) -> Self {
        core::array::from_fn(|i| self[i].or(other[i]))
    }
    #[inline(always)]
    fn not(self) -> Self {
        self.map(M::not)
    }
}

impl<T: Real, const N: usize> Real for Lanes<T, N> {
    type Mask = [T::Mask; N];

    #[inline(always)]
    fn constant(value: f64) -> Self {
        Self([T::constant(value); N])
    }
    #[inline(always)]
    fn sqrt(self) -> Self {
        Self(self.0.map(T::sqrt))
    }
    #[inline(always)]
    fn exp(self) -> Self {
        Self(self.0.map(T::exp))
    }
    #[inline(always)]
    fn ln(self) -> Self {
        Self(self.0.map(T::ln))
    }
    #[inline(always)]
    fn atan(self) -> Self {
        Self(self.0.map(T::atan))
    }
    #[inline(always)]
    fn lt(self, other: Self) -> Self::Mask {
        self.zip(other, T::lt)
    }
    #[inline(always)]
    fn le(self, other: Self) -> Self::Mask {
        self.zip(other, T::le)
    }
    #[inline(always)]
    fn select(mask: Self::Mask, a: Self, b: Self) -> Self {
        Self(core::array::from_fn(|i| T::select(mask[i], a.0[i], b.0[i])))
    }
}
