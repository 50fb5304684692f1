//! The arithmetic that every formula is written in.
//!
//! A formula is written once, generic over [`Real`], and runs as a single number (`f64`, `f32`), as a row of numbers
//! ([`Lanes`]) or with its derivatives ([`Dual`]). All of them are made of IEEE `+ − × ÷ √` and integer moves of bits in one
//! fixed order, so that a result has the same bits on every face and every processor.

mod coefficients;
mod dual;
mod elementary;
mod lanes;
mod normal;
mod scalar;

#[cfg(test)]
mod tests;

use core::ops::{Add, Div, Mul, Neg, Sub};

pub use dual::Dual;
#[allow(unused_imports, reason = "so far only the tests run formulas on lanes")]
pub use lanes::Lanes;
pub use normal::normal_probability;
pub use scalar::Scalar;

/// The result of a comparison: one truth value, or one per lane.
pub trait Mask: Copy {
    /// False, in every lane.
    const NONE: Self;

    /// Both.
    fn and(self, other: Self) -> Self;
    /// Either or both.
    fn or(self, other: Self) -> Self;
    /// The opposite.
    fn not(self) -> Self;
    /// The one truth value, if it is one: what a branch may go by.
    fn known(self) -> Option<bool>;
}

/// Numbers that a formula can be evaluated in. Sealed by being unreachable from outside the crate.
pub trait Real:
    Copy + Add<Output = Self> + Sub<Output = Self> + Mul<Output = Self> + Div<Output = Self> + Neg<Output = Self>
{
    /// What a comparison returns.
    type Mask: Mask;

    /// The distance from 1 to the next number.
    const EPSILON: f64;

    /// The nearest representable value of a published constant, in every lane.
    fn constant(value: f64) -> Self;
    /// Square root, correctly rounded; NaN below zero.
    fn sqrt(self) -> Self;
    /// Natural exponential.
    fn exp(self) -> Self;
    /// Natural logarithm; −∞ at ±0, NaN below.
    fn ln(self) -> Self;
    /// Arc tangent.
    fn atan(self) -> Self;
    /// `self < other`; false when either is NaN.
    fn lt(self, other: Self) -> Self::Mask;
    /// `self <= other`; false when either is NaN.
    fn le(self, other: Self) -> Self::Mask;
    /// `a` where the mask holds, `b` elsewhere.
    fn select(mask: Self::Mask, a: Self, b: Self) -> Self;

    /// `select` of two costly values: a single number evaluates only the one it takes, lanes evaluate both; the bits are the same.
    #[inline(always)]
    fn pick<T: Choose<Self>>(mask: Self::Mask, a: impl FnOnce() -> T, b: impl FnOnce() -> T) -> T {
        match mask.known() {
            Some(true) => a(),
            Some(false) => b(),
            None => T::choose(mask, a(), b()),
        }
    }

    /// Another value for what is the same but for rounding; derivatives stay.
    #[inline(always)]
    fn rounded_to(self, value: Self) -> Self {
        value
    }

    /// The root that repeated steps have found. A number with derivatives takes implicit steps here: the way to the root is not
    /// differentiated.
    #[inline(always)]
    fn at_root(self, _step: impl Fn(Self) -> Self) -> Self {
        self
    }

    /// The same of two unknowns.
    #[inline(always)]
    fn at_root_of_two(a: Self, b: Self, _step: impl Fn(Self, Self) -> (Self, Self)) -> (Self, Self) {
        (a, b)
    }

    /// The smaller; `self` where they cannot be compared.
    #[inline(always)]
    fn at_most(self, limit: Self) -> Self {
        Self::select(limit.lt(self), limit, self)
    }

    /// The larger; `self` where they cannot be compared.
    #[inline(always)]
    fn at_least(self, limit: Self) -> Self {
        Self::select(self.lt(limit), limit, self)
    }
}

/// Values that can be chosen between lane by lane: a number, or a structure of numbers.
pub trait Choose<R: Real>: Sized {
    /// `a` where the mask holds, `b` elsewhere.
    fn choose(mask: R::Mask, a: Self, b: Self) -> Self;
}

impl<R: Real> Choose<R> for R {
    #[inline(always)]
    fn choose(mask: R::Mask, a: Self, b: Self) -> Self {
        R::select(mask, a, b)
    }
}

/// A published constant in the arithmetic at hand: `x * k(1.86)`.
#[inline(always)]
pub fn k<R: Real>(value: f64) -> R {
    R::constant(value)
}

/// `c₀ + c₁ x + c₂ x² + …` by Horner's rule, coefficients in ascending order; 0 without any.
#[inline(always)]
pub fn polynomial<R: Real, const N: usize>(x: R, coefficients: [f64; N]) -> R {
    let mut descending = coefficients.iter().rev();
    let leading = descending.next().map_or(0.0, |&c| c);
    descending.fold(k(leading), |sum, &c| sum * x + k(c))
}

/// `xⁿ` by repeated squaring; the exponent is a constant of the formula, never data.
#[inline(always)]
pub fn power<R: Real>(x: R, exponent: u32) -> R {
    let (mut result, mut square, mut rest) = (k(1.0), x, exponent);
    while rest != 0 {
        if rest & 1 == 1 {
            result = result * square;
        }
        square = square * square;
        rest >>= 1;
    }
    result
}
