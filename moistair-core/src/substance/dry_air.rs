//! Dry air: Lemmon, Jacobsen, Penoncello & Friend, J. Phys. Chem. Ref. Data 29 (2000) 331, as taken over by IAPWS G8-10
//! (Table 3 there: ideal part with the reference state of moist air; Table 4: residual).

#[cfg(test)]
use super::density_series;
#[cfg(any(feature = "helmholtz", test))]
use super::{Jet, Term};
#[cfg(any(feature = "helmholtz", test))]
use crate::real::{Real, k};

/// Molar mass, kg/mol: G8-10 Table 2.
pub const MOLAR_MASS: f64 = 0.02896546;
/// Specific gas constant, J/(kg K): R = 8.31451 J/(mol K) of the publication over the molar mass.
pub const GAS_CONSTANT: f64 = 8.31451 / MOLAR_MASS;
/// Reducing temperature, K.
pub const REDUCING_TEMPERATURE: f64 = 132.6312;
/// Reducing density, kg/m³: 10447.7 mol/m³.
pub const REDUCING_DENSITY: f64 = 10447.7 * MOLAR_MASS;

/// Orders of density kept. The fifth is felt at 1.1 MPa (8e-7 of the pressure at −80 °C, 6e-8 at 20 °C); the sixth stays below
/// 3e-8.
pub const ORDERS: usize = 5;

/// `n δⁱ τʲ exp(−δˡ)`, G8-10 Table 4.
#[cfg(any(feature = "helmholtz", test))]
pub const TERMS: [Term; 19] = [
    Term::new(0, 1, 0.0, 0.118160747229),
    Term::new(0, 1, 0.33, 0.713116392079),
    Term::new(0, 1, 1.01, -0.161824192067e1),
    Term::new(0, 2, 0.0, 0.714140178971e-1),
    Term::new(0, 3, 0.0, -0.865421396646e-1),
    Term::new(0, 3, 0.15, 0.134211176704),
    Term::new(0, 4, 0.0, 0.112626704218e-1),
    Term::new(0, 4, 0.2, -0.420533228842e-1),
    Term::new(0, 4, 0.35, 0.349008431982e-1),
    Term::new(0, 6, 1.35, 0.164957183186e-3),
    Term::new(1, 1, 1.6, -0.101365037912),
    Term::new(1, 3, 0.8, -0.173813690970),
    Term::new(1, 5, 0.95, -0.472103183731e-1),
    Term::new(1, 6, 1.25, -0.122523554253e-1),
    Term::new(2, 1, 3.6, -0.146629609713),
    Term::new(2, 3, 6.0, -0.316055879821e-1),
    Term::new(2, 11, 3.25, 0.233594806142e-3),
    Term::new(3, 1, 3.5, 0.148287891978e-1),
    Term::new(3, 3, 15.0, -0.938782884667e-2),
];

#[cfg(test)]
const WEIGHTS: [[f64; ORDERS]; 19] = Term::weights(TERMS);

/// The part of α° that depends on temperature: G8-10 Eq. (5), (6), less ln δ.
#[cfg(any(feature = "helmholtz", test))]
pub fn ideal<R: Real>(kelvins: R) -> Jet<R> {
    /// n₁ to n₅ with τ⁻³ to τ¹.
    const POWERS: [(f64, f64); 5] = [
        (0.605719400e-7, -3.0),
        (-0.210274769e-4, -2.0),
        (-0.158860716e-3, -1.0),
        (0.974502517439480e1, 0.0),
        (0.100986147428912e2, 1.0),
    ];
    let tau = k::<R>(REDUCING_TEMPERATURE) / kelvins;
    let inverse = kelvins / k(REDUCING_TEMPERATURE);
    let powers = [inverse * inverse * inverse, inverse * inverse, inverse, k(1.0), tau];
    let mut sum = Jet { value: tau.ln() * k(N7), first: k(N7), second: k(-N7) };
    const N7: f64 = 0.249088803200e1;
    for (power, (n, exponent)) in powers.into_iter().zip(POWERS) {
        sum = sum.plus(Jet::power(power, exponent, n));
    }
    sum.plus(Jet::power(tau * tau.sqrt(), 1.5, -0.195363420e-3))
        .plus(Jet::oscillator(tau, 0.791309509, 0.253636500e2))
        .plus(Jet::oscillator(tau, 0.212236768, 0.169074100e2))
        .plus(dissociation(tau))
}

/// `n₁₀ ln(2/3 + e^{n₁₃ τ})`.
#[cfg(any(feature = "helmholtz", test))]
fn dissociation<R: Real>(tau: R) -> Jet<R> {
    const N: f64 = -0.197938904;
    const RATE: f64 = 0.873127900e2;
    let x = tau * k(RATE);
    // (2/3 + eˣ) = eˣ (1 + ⅔ e⁻ˣ): keeps the exponential small.
    let decay = (-x).exp() * k(2.0 / 3.0);
    let rest = decay + k(1.0);
    let share = k::<R>(1.0) / rest;
    Jet { value: (x + rest.ln()) * k(N), first: x * share * k(N), second: x * x * share * (k::<R>(1.0) - share) * k(N) }
}

/// Coefficients of δ¹ to δ⁵ of αʳ.
#[cfg(test)]
pub fn residual<R: Real>(kelvins: R) -> [Jet<R>; ORDERS] {
    density_series(&TERMS, &WEIGHTS, k::<R>(REDUCING_TEMPERATURE) / kelvins)
}
