//! `f64` and `f32` as [`Real`], and the public bound [`Scalar`].

use super::{Mask, Real, elementary};

impl Mask for bool {
    const NONE: Self = false;

    #[inline(always)]
    fn and(self, other: Self) -> Self {
        self & other
    }
    #[inline(always)]
    fn or(self, other: Self) -> Self {
        self | other
    }
    #[inline(always)]
    fn not(self) -> Self {
        !self
    }
    #[inline(always)]
    fn known(self) -> Option<bool> {
        Some(self)
    }
}

/// The scalar that public types are generic over: `f64` (default) or `f32`. Sealed.
///
/// Every formula has one text for both; `f32` carries about seven digits, which a small controller may prefer.
pub trait Scalar:
    Real<Mask = bool> + num_traits::float::FloatCore + core::fmt::Debug + core::fmt::Display + 'static
{
    /// The value as `f64`, exact for both types.
    fn to_f64(self) -> f64;
}

macro_rules! scalar {
    ($type:ty, $sqrt:path, $exp:path, $ln:path, $atan:path) => {
        impl Real for $type {
            type Mask = bool;

            const EPSILON: f64 = <$type>::EPSILON as f64;

            #[inline(always)]
            fn constant(value: f64) -> Self {
                value as $type
            }
            #[inline(always)]
            fn sqrt(self) -> Self {
                $sqrt(self)
            }
            #[inline(always)]
            fn exp(self) -> Self {
                $exp(self)
            }
            #[inline(always)]
            fn ln(self) -> Self {
                $ln(self)
            }
            #[inline(always)]
            fn atan(self) -> Self {
                $atan(self)
            }
            #[inline(always)]
            fn lt(self, other: Self) -> bool {
                self < other
            }
            #[inline(always)]
            fn le(self, other: Self) -> bool {
                self <= other
            }
            #[inline(always)]
            fn select(mask: bool, a: Self, b: Self) -> Self {
                if mask { a } else { b }
            }
        }

        impl Scalar for $type {
            #[inline(always)]
            fn to_f64(self) -> f64 {
                self.into()
            }
        }
    };
}

scalar!(f64, elementary::sqrt_f64, elementary::exp_f64, elementary::ln_f64, elementary::atan_f64);
scalar!(f32, elementary::sqrt_f32, elementary::exp_f32, elementary::ln_f32, elementary::atan_f32);
