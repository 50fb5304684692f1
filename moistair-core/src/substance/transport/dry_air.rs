//! Dry air: Lemmon & Jacobsen, Int. J. Thermophys. 25 (2004) 21, dilute gas and residual of viscosity and thermal conductivity.
//!
//! Uncertainty as published (figures from memory): about 1 % in viscosity and 2 % in conductivity of the gas at these temperatures.
//!
//! The critical enhancement of the conductivity, Eqs. (7) to (11) there, is left out. In a state of moist air it is at most 6e-4 of the
//! conductivity (−80 °C, 1.1 MPa; 5e-6 at 101 kPa), nothing above −7.9 °C; and where it sets in, at 265.262 K, it would give the
//! conductivity an infinite slope. The tests add it, and reproduce the published table with it.

use super::Transport;
use crate::real::{Real, k, polynomial, power};
use crate::substance::dry_air::{REDUCING_DENSITY, REDUCING_TEMPERATURE};

/// Molar mass of the publication, g/mol.
const MOLAR_MASS: f64 = 28.9586;
/// Lennard-Jones energy ε/k, K.
const ENERGY: f64 = 103.3;
/// Lennard-Jones size σ, nm.
const SIZE: f64 = 0.360;
/// ln Ω = Σ bᵢ (ln T k/ε)ⁱ: Table II.
const COLLISION_INTEGRAL: [f64; 5] = [0.431, -0.4623, 0.08406, 0.005341, -0.00331];

/// `N τᵗ δᵈ exp(−δˡ)`, without the exponential where `l` is zero.
struct Term {
    n: f64,
    t: f64,
    d: u32,
    l: u32,
}

const fn term(n: f64, t: f64, d: u32, l: u32) -> Term {
    Term { n, t, d, l }
}

/// Table III, µPa s.
const VISCOSITY: [Term; 5] = [
    term(10.72, 0.2, 1, 0),
    term(1.122, 0.05, 4, 0),
    term(0.002019, 2.4, 9, 0),
    term(-8.876, 0.6, 1, 1),
    term(-0.02916, 3.6, 8, 1),
];

/// Table IV, mW/(m K): N₁ goes with the viscosity of the dilute gas, N₂ and N₃ are its conductivity, the others the residual.
const DILUTE_VISCOSITY: f64 = 1.308;
const CONDUCTIVITY: [Term; 8] = [
    term(1.405, -1.1, 0, 0),
    term(-1.036, -0.3, 0, 0),
    term(8.743, 0.1, 1, 0),
    term(14.76, 0.0, 2, 0),
    term(-16.62, 0.5, 3, 2),
    term(3.793, 2.7, 7, 2),
    term(-6.142, 0.3, 7, 2),
    term(-0.3778, 1.3, 11, 2),
];

/// At a temperature, K, and a density, kg/m³.
pub fn transport<R: Real>(kelvins: R, density: R) -> Transport<R> {
    let ln_tau = (k::<R>(REDUCING_TEMPERATURE) / kelvins).ln();
    let delta = density / k(REDUCING_DENSITY);
    let sum = |terms: &[Term]| terms.iter().fold(k::<R>(0.0), |sum, term| sum + term.at(ln_tau, delta));
    let dilute = dilute_viscosity(kelvins);
    Transport {
        viscosity: (dilute + sum(&VISCOSITY)) * k(1e-6),
        conductivity: (dilute * k(DILUTE_VISCOSITY) + sum(&CONDUCTIVITY)) * k(1e-3),
    }
}

impl Term {
    fn at<R: Real>(&self, ln_tau: R, delta: R) -> R {
        let value = (ln_tau * k(self.t)).exp() * power(delta, self.d) * k(self.n);
        if self.l == 0 { value } else { value * (-power(delta, self.l)).exp() }
    }
}

/// η⁰ = 0.0266958 √(M T) / (σ² Ω), µPa s.
fn dilute_viscosity<R: Real>(kelvins: R) -> R {
    let collision_integral = polynomial((kelvins / k(ENERGY)).ln(), COLLISION_INTEGRAL).exp();
    (kelvins * k(MOLAR_MASS)).sqrt() * k(0.0266958 / (SIZE * SIZE)) / collision_integral
}
