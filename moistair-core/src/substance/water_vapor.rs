//! Water vapor: IAPWS R6-95(2018), ideal-gas part in full, residual expanded in powers of density.

use super::{Jet, water};
#[cfg(test)]
use super::{Term, density_series};
use crate::real::{Real, k};

pub use water::{CRITICAL_DENSITY as REDUCING_DENSITY, GAS_CONSTANT, MOLAR_MASS};

/// Orders of density kept. Up to ρ⁴ and ρ⁶ are felt (ρ⁶: 2e-9 of the pressure of saturated steam at 20 °C, 2e-5 at
/// 100 °C); ρ⁵ stays below 1e-9 up to 100 °C, below 1e-7 at 150 °C, and is carried because it costs nothing. The seventh
/// and further stay below 2e-11.
pub const ORDERS: usize = 6;

#[cfg(test)]
const WEIGHTS: [[f64; ORDERS]; 51] = Term::weights(water::TERMS);

/// n°₄ to n°₈ and γ°₄ to γ°₈ of R6-95 Table 1.
const OSCILLATORS: [(f64, f64); 5] = [
    (0.012436, 1.28728967),
    (0.97315, 3.53734222),
    (1.27950, 7.74073708),
    (0.96956, 9.24437796),
    (0.24873, 27.5075105),
];

/// The part of φ° that depends on temperature: R6-95 Eq. (5) less ln δ.
pub fn ideal<R: Real>(kelvins: R) -> Jet<R> {
    const N: [f64; 3] = [-8.3204464837497, 6.6832105275932, 3.00632];
    let tau = k::<R>(water::CRITICAL_TEMPERATURE) / kelvins;
    let polynomial = Jet {
        value: k::<R>(N[0]) + tau * k(N[1]) + tau.ln() * k(N[2]),
        first: tau * k(N[1]) + k(N[2]),
        second: k(-N[2]),
    };
    OSCILLATORS.iter().fold(polynomial, |sum, &(n, gamma)| sum.plus(Jet::oscillator(tau, n, gamma)))
}

/// φ°ₑₓ of IAPWS G9-12, which extends the ideal part down to 50 K and is added to it below 130 K. No state is so cold (its vapor
/// down to −100 °C at most), and none takes it: for tests.
#[cfg(test)]
pub fn cold_extension<R: Real>(kelvins: R) -> Jet<R> {
    const E: f64 = 0.278296458178592;
    const EPSILON: f64 = water::CRITICAL_TEMPERATURE / 130.0;
    let tau = k::<R>(water::CRITICAL_TEMPERATURE) / kelvins;
    let (inverse, ratio) = (k::<R>(1.0) / tau, tau * k(1.0 / EPSILON));
    let ln_ratio = ratio.ln();
    // τ²φ_ττ = τ² (1/ε − 1/τ)³, and its integrals.
    let rest = ratio - k(1.0);
    Jet {
        value: (-(inverse * k(0.5)) - (tau + k(EPSILON)) * ln_ratio * k(3.0 / (EPSILON * EPSILON))
            + (ratio * k(9.0) + ratio * ratio - k(9.0)) * k(0.5 / EPSILON))
            * k(E),
        first: (inverse * k(0.5) - (tau * ln_ratio + tau + k(EPSILON)) * k(3.0 / (EPSILON * EPSILON))
            + (ratio * k(4.5) + ratio * ratio) * k(1.0 / EPSILON))
            * k(E),
        second: rest * rest * rest * inverse * k(E),
    }
}

/// Coefficients of δ¹ to δ⁶ of φʳ.
#[cfg(test)]
pub fn residual<R: Real>(kelvins: R) -> [Jet<R>; ORDERS] {
    density_series(&water::TERMS, &WEIGHTS, k::<R>(water::CRITICAL_TEMPERATURE) / kelvins)
}
