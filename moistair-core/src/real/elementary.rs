//! Square root, exponential, logarithm and arc tangent for `f64` and `f32`.
//!
//! Choices are selections between two values, never branches; no table, no fused multiply-add, no conversion between
//! integer and floating-point numbers: a loop over an array becomes vector instructions, and every processor gives the
//! same bits. One text serves both types.
//!
//! | x         | exp x                     | ln x  | atan x |
//! |-----------|---------------------------|-------|--------|
//! | NaN       | NaN                       | NaN   | NaN    |
//! | +∞        | +∞                        | +∞    | +π/2   |
//! | −∞        | +0                        | NaN   | −π/2   |
//! | +0        | 1                         | −∞    | +0     |
//! | −0        | 1                         | −∞    | −0     |
//! | below 0   |                           | NaN   |        |
//! | subnormal | 1                         | as accurate as elsewhere | x |
//! | result above the largest number    | +∞  |       |        |
//! | result below the smallest *normal* number | +0 |   |     |
//!
//! Largest error in units in the last place: measured, and the bound that the tests hold it to. `f64` against decimal
//! arithmetic at 2.4 million random arguments, of which the worst are in the tests' table; `f32` at every argument,
//! against `f64`.
//!
//! |             | exp           | ln            | atan          |
//! |-------------|---------------|---------------|---------------|
//! | `f64`       | 0.952, 1.0    | 0.843, 0.9    | 1.417, 1.5    |
//! | `f32`       | 1.008, 1.01   | 0.840, 0.85   | 1.392, 1.40   |

use super::coefficients;
use super::polynomial;

/// Square root, correctly rounded: the machine's instruction, or `libm`'s algorithm where `std` is not there.
#[inline(always)]
pub fn sqrt_f64(x: f64) -> f64 {
    #[cfg(feature = "std")]
    return x.sqrt();
    #[cfg(not(feature = "std"))]
    return libm::sqrt(x);
}

/// Square root of an `f32`; see [`sqrt_f64`].
#[inline(always)]
pub fn sqrt_f32(x: f32) -> f32 {
    #[cfg(feature = "std")]
    return x.sqrt();
    #[cfg(not(feature = "std"))]
    return libm::sqrtf(x);
}

macro_rules! elementary {
    ($float:ident, $bits:ident, $constants:path, $exp:ident, $ln:ident, $atan:ident) => {
        #[doc = concat!("Exponential of an `", stringify!($float), "`.")]
        ///
        /// x = n·ln 2 + r with |r| ≤ ln(2)/2; eʳ = 1 + r + r²·q(r); the exponent field takes n.
        #[inline(always)]
        pub fn $exp(x: $float) -> $float {
            use $constants::*;
            // Adding 1.5 times the unit of the last place's reach rounds to an integer, left in the lowest bits.
            const ROUND: $float = 1.5 * (1_u64 << ($float::MANTISSA_DIGITS - 1)) as $float;
            let shifted = x * core::$float::consts::LOG2_E + ROUND;
            let n = shifted - ROUND;
            let r = (x - n * LN_2_HIGH) - n * LN_2_LOW;
            let square = r * r;
            let q = polynomial(square, EXP_EVEN) + r * polynomial(square, EXP_ODD);
            let mantissa = 1.0 + (r + square * q);
            let exponent = shifted.to_bits() << ($float::MANTISSA_DIGITS - 1);
            let value = $float::from_bits(mantissa.to_bits().wrapping_add(exponent));
            let value = if x <= EXP_LARGEST { value } else { x + $float::INFINITY };
            if x < EXP_SMALLEST { 0.0 } else { value }
        }

        #[doc = concat!("Natural logarithm of an `", stringify!($float), "`.")]
        ///
        /// x = 2ⁿ·(1 + f) with 1/√2 ≤ 1 + f < √2; s = f/(2 + f), z = s²; ln(1 + f) = 2 artanh s = 2 s + s·z·q(z), where
        /// 2 s = f − f²/2 + s·f²/2 keeps the leading term exact.
        #[inline(always)]
        pub fn $ln(x: $float) -> $float {
            use $constants::*;
            const FRACTION: u32 = $float::MANTISSA_DIGITS - 1;
            const SCALE: $float = (1_u64 << $float::MANTISSA_DIGITS) as $float;
            // An integer below 2^FRACTION in the lowest bits of 2^FRACTION is added to it.
            const INTEGER: $float = (1_u64 << FRACTION) as $float;
            const BIAS: $float = INTEGER + ($float::MAX_EXP - 1) as $float;
            const SCALED_BIAS: $float = BIAS + $float::MANTISSA_DIGITS as $float;
            const LOWEST: $bits = core::$float::consts::FRAC_1_SQRT_2.to_bits();
            const OFFSET: $bits = (1.0 as $float).to_bits() - LOWEST;
            let subnormal = x < $float::MIN_POSITIVE;
            let scaled = if subnormal { x * SCALE } else { x };
            let bias = if subnormal { SCALED_BIAS } else { BIAS };
            let shifted = scaled.to_bits().wrapping_add(OFFSET);
            let n = $float::from_bits((shifted >> FRACTION) | INTEGER.to_bits()) - bias;
            let f = $float::from_bits((shifted & ((1 << FRACTION) - 1)).wrapping_add(LOWEST)) - 1.0;
            let s = f / (2.0 + f);
            let z = s * s;
            let square = z * z;
            let q = polynomial(square, LN_EVEN) + z * polynomial(square, LN_ODD);
            let half_square = 0.5 * f * f;
            let value = n * LN_2_HIGH + (f - (half_square - (s * (half_square + z * q) + n * LN_2_LOW)));
            let value = if x <= $float::MAX { value } else { x + $float::INFINITY };
            let value = if x == 0.0 { $float::NEG_INFINITY } else { value };
            if x < 0.0 { $float::NAN } else { value }
        }

        #[doc = concat!("Arc tangent of an `", stringify!($float), "`.")]
        ///
        /// With a = |x|: atan a = π/4 + atan((a − 1)/(a + 1)) above ½ and π/2 − atan(1/a) above 2, so that |t| ≤ ½ and
        /// z = t² ≤ ¼; atan t = t + t·z·q(z).
        #[inline(always)]
        pub fn $atan(x: $float) -> $float {
            use core::$float::consts::{FRAC_PI_2, FRAC_PI_4};
            use $constants::*;
            let sign = x.to_bits() & (-0.0 as $float).to_bits();
            let a = $float::from_bits(x.to_bits() ^ sign);
            let (middle, large) = (a > 0.5, a > 2.0);
            let above = if middle { a - 1.0 } else { a };
            let below = if middle { a + 1.0 } else { 1.0 };
            let t = if large { -1.0 } else { above } / if large { a } else { below };
            let start = if middle { FRAC_PI_4 } else { 0.0 };
            let start = if large { FRAC_PI_2 } else { start };
            let rest = if middle { QUARTER_PI_LOW } else { 0.0 };
            let rest = if large { HALF_PI_LOW } else { rest };
            let z = t * t;
            let square = z * z;
            let q = polynomial(square, ATAN_EVEN) + z * polynomial(square, ATAN_ODD);
            let value = start + (t + (t * z * q + rest));
            $float::from_bits(value.to_bits() | sign)
        }
    };
}

elementary!(f64, u64, coefficients::double, exp_f64, ln_f64, atan_f64);
elementary!(f32, u32, coefficients::single, exp_f32, ln_f32, atan_f32);
