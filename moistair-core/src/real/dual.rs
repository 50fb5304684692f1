//! A number with its partial derivatives: forward differentiation through the text of a formula.
//!
//! The value part of every operation is that operation of the numbers beneath, so that a value has the same bits with and without
//! derivatives. Comparisons go by the value: at a kink the derivative is that of the branch which the value takes.
#![allow(clippy::suspicious_arithmetic_impl, reason = "the product rule adds and the quotient rule subtracts")]

use core::ops::{Add, Div, Mul, Neg, Sub};

use super::{Mask, Real, k};

/// A value and its partial derivatives with respect to `K` inputs.
#[derive(Clone, Copy, Debug)]
pub struct Dual<R, const K: usize> {
    pub value: R,
    pub partials: [R; K],
}

impl<R: Real, const K: usize> Dual<R, K> {
    /// A value that depends on no input.
    #[inline(always)]
    pub fn plain(value: R) -> Self {
        Self { value, partials: [k(0.0); K] }
    }

    /// One of the inputs themselves, counted from 0.
    #[inline(always)]
    pub fn input(value: R, place: usize) -> Self {
        let mut input = Self::plain(value);
        if let Some(partial) = input.partials.get_mut(place) {
            *partial = k(1.0);
        }
        input
    }

    /// A function of this number with a given value and slope.
    #[inline(always)]
    fn function(mut self, value: R, slope: R) -> Self {
        for partial in &mut self.partials {
            *partial = *partial * slope;
        }
        Self { value, ..self }
    }

    /// A value whose partial derivatives are formed of those of two numbers.
    #[inline(always)]
    fn of_two(value: R, mut a: Self, b: Self, f: impl Fn(R, R) -> R) -> Self {
        for (partial, other) in a.partials.iter_mut().zip(b.partials) {
            *partial = f(*partial, other);
        }
        Self { value, ..a }
    }

    /// The partial derivatives that a solve's step leaves when its unknown enters with those of `with`, at the root's value.
    #[inline(always)]
    fn after(self, with: Self, step: impl Fn(Self) -> Self) -> Self {
        Self { value: self.value, ..step(Self { value: self.value, ..with }) }
    }
}

impl<R: Real, const K: usize> Add for Dual<R, K> {
    type Output = Self;
    #[inline(always)]
    fn add(self, other: Self) -> Self {
        Self::of_two(self.value + other.value, self, other, |a, b| a + b)
    }
}

impl<R: Real, const K: usize> Sub for Dual<R, K> {
    type Output = Self;
    #[inline(always)]
    fn sub(self, other: Self) -> Self {
        Self::of_two(self.value - other.value, self, other, |a, b| a - b)
    }
}

impl<R: Real, const K: usize> Mul for Dual<R, K> {
    type Output = Self;
    #[inline(always)]
    fn mul(self, other: Self) -> Self {
        Self::of_two(self.value * other.value, self, other, |a, b| a * other.value + self.value * b)
    }
}

impl<R: Real, const K: usize> Div for Dual<R, K> {
    type Output = Self;
    #[inline(always)]
    fn div(self, other: Self) -> Self {
        let quotient = self.value / other.value;
        Self::of_two(quotient, self, other, |a, b| (a - quotient * b) / other.value)
    }
}

impl<R: Real, const K: usize> Neg for Dual<R, K> {
    type Output = Self;
    #[inline(always)]
    fn neg(self) -> Self {
        let value = -self.value;
        Self::of_two(value, self, self, |a, _| -a)
    }
}

impl<R: Real, const K: usize> Real for Dual<R, K> {
    type Mask = R::Mask;

    const EPSILON: f64 = R::EPSILON;

    #[inline(always)]
    fn constant(value: f64) -> Self {
        Self::plain(R::constant(value))
    }
    #[inline(always)]
    fn sqrt(self) -> Self {
        let root = self.value.sqrt();
        self.function(root, k::<R>(0.5) / root)
    }
    #[inline(always)]
    fn exp(self) -> Self {
        let value = self.value.exp();
        self.function(value, value)
    }
    #[inline(always)]
    fn ln(self) -> Self {
        self.function(self.value.ln(), k::<R>(1.0) / self.value)
    }
    #[inline(always)]
    fn atan(self) -> Self {
        self.function(self.value.atan(), k::<R>(1.0) / (k::<R>(1.0) + self.value * self.value))
    }
    #[inline(always)]
    fn lt(self, other: Self) -> Self::Mask {
        self.value.lt(other.value)
    }
    #[inline(always)]
    fn le(self, other: Self) -> Self::Mask {
        self.value.le(other.value)
    }
    #[inline(always)]
    fn select(mask: Self::Mask, a: Self, b: Self) -> Self {
        Self::of_two(R::select(mask, a.value, b.value), a, b, |a, b| R::select(mask, a, b))
    }

    #[inline(always)]
    fn rounded_to(self, value: Self) -> Self {
        Self { value: value.value, ..self }
    }

    /// With N the step, x = N(x, a) at the root gives x_a = N_a + N_x x_a: one step with plain x has N_a, one with N_a for x_a has
    /// N_a + N_x N_a. Where the solve's slope is exact N_x is nothing but rounding.
    #[inline(always)]
    fn at_root(self, step: impl Fn(Self) -> Self) -> Self {
        let first = self.after(Self::plain(self.value), &step);
        let second = self.after(first, &step);
        Self::of_two(self.value, first, second, |first, second| {
            let share = (second - first) / first; // N_x, unless rounding is all that there is
            let small = k::<R>(-0.25).lt(share).and(share.lt(k(0.25)));
            R::select(small, first / (k::<R>(1.0) - share), second)
        })
    }

    /// The same for two unknowns, without the last refinement: their slopes are Newton's own.
    #[inline(always)]
    fn at_root_of_two(a: Self, b: Self, step: impl Fn(Self, Self) -> (Self, Self)) -> (Self, Self) {
        let mut with = (Self::plain(a.value), Self::plain(b.value));
        for _ in 0..2 {
            let (next_a, next_b) = step(with.0, with.1);
            with = (next_a.rounded_to(a), next_b.rounded_to(b));
        }
        with
    }
}
