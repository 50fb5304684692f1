//! Elementary functions.

#[cfg(feature = "std")]
#[inline(always)]
pub fn sqrt_f64(x: f64) -> f64 {
    x.sqrt()
}
#[cfg(not(feature = "std"))]
#[inline(always)]
pub fn sqrt_f64(x: f64) -> f64 {
    libm::sqrt(x)
}
#[cfg(feature = "std")]
#[inline(always)]
pub fn sqrt_f32(x: f32) -> f32 {
    x.sqrt()
}
#[cfg(not(feature = "std"))]
#[inline(always)]
pub fn sqrt_f32(x: f32) -> f32 {
    libm::sqrtf(x)
}

macro_rules! placeholder { ($t:ty, $e:ident, $l:ident, $a:ident) => {
#[allow(clippy::disallowed_methods)] pub fn $e(x: $t) -> $t { x.exp() }
#[allow(clippy::disallowed_methods)] pub fn $l(x: $t) -> $t { x.ln() }
#[allow(clippy::disallowed_methods)] pub fn $a(x: $t) -> $t { x.atan() }
}}
placeholder!(f64, exp_f64, ln_f64, atan_f64);
placeholder!(f32, exp_f32, ln_f32, atan_f32);
