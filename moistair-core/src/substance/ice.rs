//! Ice Ih: IAPWS R10-06(2009), the Gibbs energy g(T, p).

use super::pure_phase::PurePhase;
use crate::quantity::ZERO_CELSIUS;
use crate::real::{Real, k, polynomial};

/// The equation is evaluated between these, °C; outside, at the nearer end.
pub const RANGE: (f64, f64) = (-105.0, 5.0);

const TRIPLE_TEMPERATURE: f64 = 273.16;
const TRIPLE_PRESSURE: f64 = 611.657;
const NORMAL_PRESSURE: f64 = 101_325.0;
/// Residual entropy with the reference state of IAPWS-95, J/(kg K).
const S0: f64 = -0.332733756492168e4;
const G0: [f64; 5] =
    [-0.632020233335886e6, 0.655022213658955, -0.189369929326131e-7, 0.339746123271053e-14, -0.556464869058991e-21];
const T1: Complex<f64> = Complex { re: 0.368017112855051e-1, im: 0.510878114959572e-1 };
const R1: Complex<f64> = Complex { re: 0.447050716285388e2, im: 0.656876847463481e2 };
const T2: Complex<f64> = Complex { re: 0.337315741065416, im: 0.335449415919309 };
const R20: Complex<f64> = Complex { re: -0.725974574329220e2, im: -0.781008427112870e2 };
const R21: Complex<f64> = Complex { re: -0.557107698030123e-4, im: 0.464578634580806e-4 };
const R22: Complex<f64> = Complex { re: 0.234801409215913e-10, im: -0.285651142904972e-10 };

#[derive(Clone, Copy)]
struct Complex<R> {
    re: R,
    im: R,
}

impl<R: Real> Complex<R> {
    fn constant(value: Complex<f64>) -> Self {
        Self { re: k(value.re), im: k(value.im) }
    }
    fn times(self, other: Self) -> Self {
        Self { re: self.re * other.re - self.im * other.im, im: self.re * other.im + self.im * other.re }
    }
    fn plus(self, other: Self) -> Self {
        Self { re: self.re + other.re, im: self.im + other.im }
    }
    fn minus(self, other: Self) -> Self {
        Self { re: self.re - other.re, im: self.im - other.im }
    }
    fn scaled(self, factor: R) -> Self {
        Self { re: self.re * factor, im: self.im * factor }
    }
    /// `1/z`.
    fn inverse(self) -> Self {
        let norm = self.re * self.re + self.im * self.im;
        Self { re: self.re / norm, im: -(self.im / norm) }
    }
    /// Principal logarithm for a positive imaginary part: the argument is π/2 − atan(re/im).
    fn ln(self) -> Self {
        let norm = self.re * self.re + self.im * self.im;
        Self { re: norm.ln() * k(0.5), im: k::<R>(core::f64::consts::FRAC_PI_2) - (self.re / self.im).atan() }
    }
}

/// Ice at `celsius`, `pascals`: R10-06 Eq. (1), (2), (3) with its derivatives g_T and g_p (Table 4).
pub fn at<R: Real>(celsius: R, pascals: R) -> PurePhase<R> {
    equation(celsius.at_least(k(RANGE.0)).at_most(k(RANGE.1)), pascals)
}

fn equation<R: Real>(celsius: R, pascals: R) -> PurePhase<R> {
    let tau = (celsius + k(ZERO_CELSIUS)) / k(TRIPLE_TEMPERATURE);
    // π − π₀
    let y = (pascals - k(NORMAL_PRESSURE)) / k(TRIPLE_PRESSURE);
    let g0 = polynomial(y, G0);
    let g0_y = polynomial(y, [G0[1], 2.0 * G0[2], 3.0 * G0[3], 4.0 * G0[4]]);
    let r2 = Complex::constant(R20).plus(Complex::constant(R21).scaled(y)).plus(Complex::constant(R22).scaled(y * y));
    let r2_y = Complex::constant(R21).plus(Complex::constant(R22).scaled(y * k(2.0)));
    let (first, second) = (Vibration::at(T1, tau), Vibration::at(T2, tau));
    let sum = Complex::constant(R1).times(first.value).plus(r2.times(second.value));
    let slope = Complex::constant(R1).times(first.slope).plus(r2.times(second.slope));
    let gibbs = g0 - tau * k(S0 * TRIPLE_TEMPERATURE) + sum.re * k(TRIPLE_TEMPERATURE);
    let entropy = k::<R>(S0) - slope.re; // s = −g_T
    let volume = (g0_y + r2_y.times(second.value).re * k(TRIPLE_TEMPERATURE)) / k(TRIPLE_PRESSURE);
    PurePhase { gibbs, enthalpy: gibbs + entropy * tau * k(TRIPLE_TEMPERATURE), volume }
}

/// `(t−τ) ln(t−τ) + (t+τ) ln(t+τ) − 2t ln t − τ²/t` and its derivative in τ.
struct Vibration<R> {
    value: Complex<R>,
    slope: Complex<R>,
}

impl<R: Real> Vibration<R> {
    fn at(t: Complex<f64>, tau: R) -> Self {
        let t = Complex::<R>::constant(t);
        let (below, above) = (Complex { re: t.re - tau, im: t.im }, Complex { re: t.re + tau, im: t.im });
        let (ln_below, ln_above, ln_t) = (below.ln(), above.ln(), t.ln());
        let over_t = t.inverse().scaled(tau);
        let value = below
            .times(ln_below)
            .plus(above.times(ln_above))
            .minus(t.times(ln_t).scaled(k(2.0)))
            .minus(over_t.scaled(tau));
        let slope = ln_above.minus(ln_below).minus(over_t.scaled(k(2.0)));
        Self { value, slope }
    }
}

#[cfg(test)]
mod tests;
